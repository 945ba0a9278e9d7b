/* Gland seal: a given part of the steam leaks off at a shaft seal or valve stem.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/kinds.h"

static const HlPortKind ports[] = {
  { .key = "inlet", .name = N_("steam inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_LEFT, .x = -2, .y = 0 },
  { .key = "outlet", .name = N_("steam outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_RIGHT, .x = 2, .y = 0 },
  { .key = "leak", .name = N_("leak-off"), .direction = HL_PORT_OUT, .side = HL_SIDE_DOWN, .x = 0, .y = 1 },
};

static const HlQuantityKind quantities[] = {
  { .key = "leak_fraction", .sign = "m/m", .name = N_("Leakage of flow"), .group = N_("Leakage"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_PERCENT,
    /* xgettext:no-c-format */
    DEFAULT (0.005, N_("common practice, no source: glands and valve stems 0.2-2 % of live steam, small machines more")),
    RANGE (0.002, 0.02), LIMITS_FRACTION, .yield_rank = 50,
    .help = N_("Steam that leaks off over the steam that comes in. A plain balance: no formula for the labyrinth is used, the part is given.") },
  { .key = "leak.p", .sign = "p", .name = N_("Leak-off pressure"), .group = N_("Leakage"),
    .dimension = HL_DIMENSION_PRESSURE, .flags = HL_QUANTITY_USUAL,
    NO_DEFAULT, RANGE (0.9e5, 30e5), LIMITS_PRESSURE, .yield_rank = 20,
    .help = N_("Pressure behind the seal, at the same enthalpy; mostly what the leakage flows into decides it.") },
  { .key = "leak.m", .sign = "m", .name = N_("Leakage"), .group = N_("Leakage"),
    .dimension = HL_DIMENSION_MASS_FLOW, .flags = HL_QUANTITY_RESULT, NO_DEFAULT, NO_RANGE, LIMITS_FLOW, .yield_rank = 20,
    .help = N_("Steam that leaks off.") },
};

const HlKind hl_kind_gland_seal = {
  .id = "gland_seal", .letter = "GS", .name = N_("Gland seal"), .shelf_name = N_("gland seal"), .shelf_group = N_("Expand"),
  .help = N_("Lets a given part of the steam leak off, throttled to the pressure behind the seal."),
  .half_width = 2, .half_height = 1,
  .ports = ROWS (ports), .quantities = ROWS (quantities),
};
