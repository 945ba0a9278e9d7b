/* Tables to hand over: the same cells as CSV, text, workbook, on the sheet and in the report.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/engine.h"
G_BEGIN_DECLS

/* One result of the plant, with what it counts from. */
typedef struct {
  char         key[48];       /* stable: "gross_power", "own_consumption:P1" */
  const char  *group;         /* translated: "Power" */
  char        *name;          /* translated */
  const char  *basis;         /* translated, "" where the name says all: "fuel heat on the lower heating value" */
  gboolean     is_part;       /* of the sum in an earlier line */
  gboolean     is_percent;
  HlDimension  dimension;
  double       value;         /* SI */
} HlSummaryLine;
typedef struct _HlSummary HlSummary;
HlSummary           *hl_summary_new     (const HlSolution *solution);      /* no lines where the plant is not solved */
void                 hl_summary_free    (HlSummary *summary);
guint                hl_summary_n_lines (const HlSummary *summary);
const HlSummaryLine *hl_summary_line    (const HlSummary *summary, guint n);
const HlSummaryLine *hl_summary_find    (const HlSummary *summary, const char *key);   /* NULL: its terms do not exist here */
/* Value with its unit as people read it: "12.00 MW", "38.21 %".  g_free(). */
char                *hl_summary_text    (const HlSummaryLine *line, HlUnitSet units);
G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlSummary, hl_summary_free)

/* A cell: what people read, and for numbers the value itself in the unit shown. */
typedef struct {
  char   *text;               /* never NULL; a number without its unit */
  double  number;             /* NaN: a text, or a number that is not known */
  int     decimals;           /* of the number as rounded for people */
} HlTableCell;
typedef struct {
  char     *heading;          /* translated, with the unit where the whole column has one: "Flow [kg/s]" */
  gboolean  is_number;        /* numbers end together, words start together */
} HlTableColumn;
typedef struct {
  char          *title;
  guint          n_columns, n_rows;
  HlTableColumn *columns;
  HlTableCell   *cells;       /* [n_rows n_columns]; hl_table_cell() */
  gboolean      *is_head;     /* [n_rows] stands for itself, printed heavier; the others below it are its parts, printed further in */
  gboolean       has_parts;   /* some rows are parts of others */
} HlTable;
HlTable           *hl_table_summary    (const HlSolution *solution, HlUnitSet units);   /* group, quantity, value, unit, basis, key */
HlTable           *hl_table_streams    (const HlSolution *solution, HlUnitSet units);   /* the ledger */
HlTable           *hl_table_components (const HlSolution *solution, HlUnitSet units);   /* every known quantity of each component */
/* Values that the plant file carries, with their sources; only the assumed ones where @assumed_only. */
HlTable           *hl_table_values     (const HlSolution *solution, HlUnitSet units, gboolean assumed_only);
HlTable           *hl_table_exergy      (const HlSolution *solution, HlUnitSet units);   /* spent, made, lost, destroyed by component, the plant last */
HlTable           *hl_table_exchangers  (const HlSolution *solution, HlUnitSet units);   /* zones of every exchanger with UA and mean difference */
HlTable           *hl_table_findings   (const HlSolution *solution);
HlTable           *hl_table_pick       (const HlTable *table, const guint *rows, guint n);    /* these rows only */
void               hl_table_free       (HlTable *table);
const HlTableCell *hl_table_cell       (const HlTable *table, guint row, guint column);
char              *hl_table_csv        (const HlTable *table);    /* RFC 4180, ten digits, decimal points; g_free() */
char              *hl_table_tabbed      (const HlTable *table);    /* tabs between the columns, rounded, for the clipboard; g_free() */
char              *hl_table_text       (const HlTable *table);    /* aligned columns, rounded; g_free() */
G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlTable, hl_table_free)
G_END_DECLS
