/* Circuits: streams that share their medium, joined through the components they pass; the two sides of an exchanger are two.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "plant/plant.h"
G_BEGIN_DECLS

/* Side of a kind that a port belongs to: ports of one side share a mass balance, and so a medium.  @port as at a component: "inlet2". */
HL_PUBLIC int         hl_kind_side_of_port  (const HlKind *kind, const char *port);
/* For every stream the lowest index of a stream in its circuit.  [n streams]; g_free(). */
HL_PUBLIC int        *hl_plant_circuits     (const HlPlant *plant);
/* Medium of the circuit that a port belongs to: that of a line on the same side of its component; NULL where there is none. */
HL_PUBLIC const char *hl_plant_port_medium  (const HlPlant *plant, const char *component_id, const char *port);
/* Medium that a new line between two ports carries: of the circuit it leaves, else of the one it enters, else what its ports are made for. */
HL_PUBLIC const char *hl_plant_line_medium  (const HlPlant *plant, const char *from_id, const char *from_port, const char *to_id, const char *to_port);
/* The whole circuit of a stream on another medium; NULL with error for an unknown stream or medium.  (transfer full) */
HL_PUBLIC HlPlant    *hl_plant_with_medium  (const HlPlant *plant, const char *stream_id, const char *medium, GError **error);

/* What a medium's word means in this plant: water by the plant's formulation.  NULL when unknown. */
HL_PUBLIC const HlFluid *hl_plant_fluid     (const HlPlant *plant, const char *medium);

/* Formulations of water: the word of the file, as a person reads it. */
typedef struct { const char *id, *name; } HlFormulation;
HL_PUBLIC const HlFormulation *hl_formulations (guint *n);
HL_PUBLIC const char *hl_plant_formulation_name (const HlPlant *plant);    /* "IAPWS-IF97" */
HL_PUBLIC HlPlant    *hl_plant_with_formulation (const HlPlant *plant, const char *formulation);   /* one of the list */
G_END_DECLS
