/* How tables are filled.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "draw/tables.h"
G_BEGIN_DECLS
HlTable *hl_table_new          (const char *title, guint n_columns, guint n_rows);
void     hl_table_head         (HlTable *table, guint column, const char *heading, gboolean is_number);
void     hl_table_set_text     (HlTable *table, guint row, guint column, const char *text);
/* A number in the unit that people read it in.  Returns that unit. */
const char *hl_table_set_value (HlTable *table, guint row, guint column, double si, HlDimension dimension, gboolean is_percent, HlUnitSet units);
G_END_DECLS
