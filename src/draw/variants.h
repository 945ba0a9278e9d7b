/* The variants of a document side by side: solved, compared with one of them, as rows and as a table.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "draw/tables.h"
#include "plant/document.h"
G_BEGIN_DECLS

typedef struct _HlComparison HlComparison;

/* @reference: a variant or HL_DOCUMENT_BASE.  @at_duty: the others are solved with the flows, powers and heats that the reference
 * gives.  @former: (nullable): an earlier one; what it has solved of the same plants is taken over. */
HlComparison *hl_comparison_new  (HlDocument *document, int reference, gboolean at_duty, const HlComparison *former);
HlComparison *hl_comparison_ref  (HlComparison *comparison);
void          hl_comparison_unref (HlComparison *comparison);
G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlComparison, hl_comparison_unref)

/* Columns: 0 the base, then the variants. */
guint         hl_comparison_n_columns (const HlComparison *comparison);
guint         hl_comparison_reference (const HlComparison *comparison);              /* column */
const char   *hl_comparison_name      (const HlComparison *comparison, guint column);   /* translated "base" for the base */
HlSolution   *hl_comparison_solution  (const HlComparison *comparison, guint column);   /* (transfer none) as it stands */
HlSolution   *hl_comparison_compared  (const HlComparison *comparison, guint column);   /* (transfer none) at equal duty where that is asked for */

typedef enum { HL_ROW_CHANGE, HL_ROW_RESULT, HL_ROW_DUTY } HlRowGroup;
typedef struct {
  gboolean is_own;          /* a change of this variant; a duty that is not held; a result that differs from the reference's */
  gboolean is_known;        /* @value is a number */
  double   value;           /* SI */
  char    *text;            /* with its unit; "" where there is nothing */
  char    *difference;      /* of results, from the reference: "+0.52 MW"; "" where there is none */
} HlComparisonCell;
typedef struct {
  HlRowGroup  group;
  char       *name;         /* translated */
  char       *key;          /* address, or key of the summary */
  gboolean    is_number, is_percent;
  HlDimension dimension;
  HlComparisonCell *cells;  /* [columns] */
} HlComparisonRow;
guint                  hl_comparison_n_rows (const HlComparison *comparison);
const HlComparisonRow *hl_comparison_row    (const HlComparison *comparison, guint row);

/* What must be said beside the rows: changes that do not apply, variants without a solution, duties that cannot be held. */
guint         hl_comparison_n_notes (const HlComparison *comparison);
const char   *hl_comparison_note    (const HlComparison *comparison, guint n);

HlTable      *hl_table_variants (const HlComparison *comparison);    /* the rows, the differences in columns of their own, the notes below */
G_END_DECLS
