/* The report: everything about one solved plant as one PDF to hand over.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "draw/sheet-paper.h"
G_BEGIN_DECLS
/* @paper of the drawing; the other pages are A4, or Letter with the American sizes.  The same bytes for the same input. */
GBytes *hl_export_report (const HlSolution *solution, HlPaper paper, const HlSheetFields *fields, GError **error);
G_END_DECLS
