/* Tables of states: a CSV of pairs in, the same rows with every property out.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <stdio.h>
#include "fluid/fluid.h"
G_BEGIN_DECLS

/* Counts the rows and those without a state.  FALSE where the table itself is wrong. */
gboolean hl_state_table (const HlFluid *fluid, FILE *in, FILE *out, gulong *n_rows, gulong *n_failed, GError **error);
G_END_DECLS
