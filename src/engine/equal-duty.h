/* Plants compared at equal duty: flows, powers and heats that one gives are given to the other.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/engine.h"
G_BEGIN_DECLS

/* What became of one duty. */
typedef struct {
  HlAddress address;
  double    value;         /* of the reference [SI] */
  gboolean  is_held;       /* the other plant has it too */
  char     *why_not;       /* translated; NULL where it is held */
  char     *yielded;       /* translated: the assumed values that made room; NULL: none */
} HlDuty;

/* Solves @other once more with the duties of @reference: every mass flow, power and heat but zero that is given or assumed there (a tied
 * one follows what it is tied to).  Where that makes one value too many, an assumed one yields; where none can, or the plant has
 * no solution like that, the duty is left as it was and the reason told.
 * @duties: (out) (optional) (element-type HlDuty): g_array_unref() it.
 * Returns: (transfer full): the solution, @other itself where nothing was to be changed. */
HL_PUBLIC HlSolution *hl_solve_at_duty (HlSolution *other, const HlSolution *reference, GArray **duties);
G_END_DECLS
