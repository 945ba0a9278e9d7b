/* Findings about what is missing, too much, open, or failed to solve.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/finding-private.h"
#include "engine/model.h"
#include "engine/numbers.h"
G_BEGIN_DECLS

/* Returns whether numbers may be tried. */
gboolean hl_diagnose_structure (const HlModel *model, const HlStructure *structure, HlFindings *findings);
/* Ties to what is gone, and in circles; FALSE where they run in a circle. */
gboolean hl_diagnose_ties      (const HlModel *model, HlFindings *findings);
void     hl_diagnose_numbers   (const HlModel *model, const HlStructure *structure, const HlNumbers *numbers, HlFindings *findings);

/* Two media in one circuit: a finding for each such circuit.  Returns whether there is one. */
gboolean hl_diagnose_media     (const HlModel *model, HlFindings *findings);

/* Values that somebody put in and that take part in the equations of the over-determined part: indices of specs.
 * Returns (transfer full), element-type int. */
GArray  *hl_diagnose_surplus   (const HlModel *model, const int *equations, int n);
/* Circuits that lose water and get none. */
gboolean hl_diagnose_leaks (const HlModel *model, HlFindings *findings);
G_END_DECLS
