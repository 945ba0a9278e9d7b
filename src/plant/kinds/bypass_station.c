/* Bypass and letdown station: throttles steam to a pressure and sprays it to a temperature.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/kinds/kinds.h"

static const HlPortKind ports[] = {
  { .key = "steam", .name = N_("steam inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_LEFT, .x = -3, .y = 0 },
  { .key = "outlet", .name = N_("outlet"), .direction = HL_PORT_OUT, .side = HL_SIDE_RIGHT, .x = 3, .y = 0 },
  { .key = "spray", .name = N_("spray water inlet"), .direction = HL_PORT_IN, .side = HL_SIDE_DOWN, .x = 1, .y = 1 },
};

static const HlQuantityKind quantities[] = {
  { .key = "outlet.p", .sign = "p", .name = N_("Outlet pressure"), .group = N_("Steam"),
    .dimension = HL_DIMENSION_PRESSURE, .flags = HL_QUANTITY_USUAL,
    NO_DEFAULT, RANGE (0.05e5, 60e5), LIMITS_PRESSURE, .yield_rank = 19,
    .help = N_("Pressure behind the station; mostly the net that it feeds decides it.") },
  { .key = "outlet.T", .sign = "T", .name = N_("Outlet temperature"), .group = N_("Steam"),
    .dimension = HL_DIMENSION_TEMPERATURE, .flags = HL_QUANTITY_ASSUMED | HL_QUANTITY_USUAL,
    DEFAULT (473.15, N_("an example, no source: 200 °C")), RANGE (373.15, 853.15), LIMITS_TEMPERATURE, .yield_rank = 20,
    .help = N_("Temperature of the steam behind the spray.") },
  { .key = "outlet_superheat", .sign = "ΔT", .name = N_("Superheat"), .group = N_("Steam"),
    .dimension = HL_DIMENSION_TEMPERATURE_DIFFERENCE, .flags = HL_QUANTITY_RESULT,
    NO_DEFAULT, RANGE (5.0, 300.0), LIMITS (-1000.0, 1000.0), .yield_rank = 21,
    .help = N_("Outlet temperature above saturation; another way to say the outlet temperature.") },
  { .key = "spray_fraction", .sign = "m/m", .name = N_("Spray of outlet flow"), .group = N_("Result"),
    .dimension = HL_DIMENSION_RATIO, .flags = HL_QUANTITY_RESULT | HL_QUANTITY_PERCENT,
    NO_DEFAULT, NO_RANGE, LIMITS_FRACTION,
    .help = N_("Spray water over the steam that leaves.") },
};

const HlKind hl_kind_bypass_station = {
  .id = "bypass_station", .letter = "BP", .name = N_("Bypass, letdown station"), .shelf_name = N_("letdown station"), .shelf_group = N_("Expand"),
  .help = N_("Throttles steam past the turbine and sprays it down: to the condenser, or to a net of lower pressure."),
  .half_width = 3, .half_height = 1,
  .ports = ROWS (ports), .quantities = ROWS (quantities),
};
