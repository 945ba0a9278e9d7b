/* The ledger's columns, shared by window, CSV and text.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "draw/theme.h"
G_BEGIN_DECLS

typedef struct {
  const char  *key;         /* "m", "p", "T", "x", "h", "s", "e", "v", "id", "from", "to", "medium", "phase", "volume_flow", "origin" */
  const char  *name;        /* N_("Flow") */
  HlDimension  dimension;
  gboolean     is_text;
} HlLedgerColumn;
guint                 hl_ledger_n_columns (void);
const HlLedgerColumn *hl_ledger_column    (guint n);
char                 *hl_ledger_heading   (guint column, HlUnitSet units);   /* "Flow [kg/s]", translated; g_free() */
/* Cell as text in the unit set, "" where unknown; @value gets the SI number of a numeric cell (NaN unknown). g_free() the text. */
char                 *hl_ledger_cell      (const HlSolution *solution, guint stream, guint column, HlUnitSet units, double *value);
G_END_DECLS
