/* Expansion whose wet part loses efficiency with moisture, by Baumann's rule.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/equations.h"
G_BEGIN_DECLS

/* @efficiency holds for dry steam; from the saturation line on the drop at constant entropy yields only (1 - factor y) of it, y
 * the mean of the moisture at both ends of the wet part (Baumann 1921). */
HlEquation *hl_add_wet_expansion (HlSystem *system, const HlFluid *fluid, int p_in, int h_in, int p_out, int efficiency, int factor, int h_out);
G_END_DECLS
