/* States by (p,h) from a table, for iterating: about as exact as the equation and some ten times as fast.  SI throughout.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "fluid/fluid.h"
G_BEGIN_DECLS

/* A table is made once for each medium, in a thread of its own, and kept on disk in the user's cache folder.  It lives as long as the
 * program and may be read in any thread.  Where it has no answer - near the critical point, at its edges, wherever it would miss by
 * more than it promises - it says HL_OUTSIDE_RANGE, and the equation decides.
 * What it promises: T to 1 mK, s to 1e-6, v to 1e-5, relative to the larger of s and R.
 * Slopes are those of the table, within 0.1 % nearly everywhere; cv and w are left NaN. */
typedef struct _HlFluidTable HlFluidTable;

typedef enum { HL_TABLE_NONE, HL_TABLE_BUILDING, HL_TABLE_READY, HL_TABLE_IMPOSSIBLE } HlTableState;

HL_PUBLIC const HlFluidTable *hl_fluid_table          (const HlFluid *fluid);      /* asks for it; NULL while it is not ready */
HL_PUBLIC const HlFluidTable *hl_fluid_table_wait     (const HlFluid *fluid);      /* NULL where the medium has none: water by IF97, gases, liquids */
HL_PUBLIC HlTableState        hl_fluid_table_progress (const HlFluid *fluid, double *share);       /* 0 to 1 while it is made */
HL_PUBLIC HlStatus            hl_fluid_table_state_ph (const HlFluidTable *table, double p, double h, HlState *state) G_GNUC_WARN_UNUSED_RESULT;
HL_PUBLIC double              hl_fluid_table_coverage (const HlFluidTable *table);                 /* share of its cells that keep the promise */

G_END_DECLS
