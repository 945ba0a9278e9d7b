/* The inside of a comparison of variants.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <string.h>
#include "draw/tables-private.h"
#include "draw/variants.h"
#include "engine/equal-duty.h"
G_BEGIN_DECLS

typedef struct {
  HlSolution *solution, *compared;
  GArray     *duties;          /* HlDuty; NULL for the reference, and where none are asked for */
} HlColumn;

struct _HlComparison {
  gatomicrefcount ref_count;
  HlDocument   *document;
  guint         reference;     /* column */
  gboolean      at_duty;
  GArray       *columns;       /* HlColumn */
  GArray       *rows;          /* HlComparisonRow */
  GStringChunk *texts;         /* of cells */
  GPtrArray    *notes;         /* char * */
};

HlPlant *hl_column_plant     (const HlComparison *comparison, guint column);
void     hl_comparison_fill  (HlComparison *comparison);        /* rows and notes, once all is solved */
G_END_DECLS
