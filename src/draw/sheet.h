/* The drawing as a sheet: title line, key results, legend, caution.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "draw/canvas-picture.h"
G_BEGIN_DECLS
/* Size at which the drawing keeps its scale. */
void hl_sheet_usual_size (const HlTheme *theme, const HlPlant *plant, const HlSolution *solution, double *width, double *height);
G_END_DECLS
