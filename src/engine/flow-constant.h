/* Flow constant of a group of turbine stages: the ellipse law.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/system.h"
G_BEGIN_DECLS

/* flow = constant sqrt ((p_in^2 - p_out^2) / (p_in v_in)) */
HlEquation *hl_add_flow_constant (HlSystem *system, const HlFluid *fluid, int flow, int p_in, int h_in, int p_out, int constant);
G_END_DECLS
