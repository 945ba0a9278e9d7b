/* Elevations of vessels and pumps, and the net positive suction head that comes of them.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/model.h"
G_BEGIN_DECLS

/* The elevation of a component that has one put in. */
void hl_heads_emit_elevation (HlEmit *emit);
/* NPSH of a pump whose option asks for it. */
void hl_heads_emit_suction   (HlEmit *emit, int inlet);
/* Static heads of such pumps from the elevations of the vessels that they draw from: when all components have their variables. */
void hl_heads_add            (HlModel *model);
/* Component that a pump draws from through pipes, valves and junctions: the nearest that is a vessel, tank or shell; -1. */
int  hl_heads_vessel         (const HlModel *model, int pump);
G_END_DECLS
