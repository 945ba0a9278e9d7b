/* What can be solved, in which order, and what is missing or too much: seen from the pattern of the equations alone.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/system.h"
G_BEGIN_DECLS

typedef struct {
  gatomicrefcount ref_count;
  gboolean is_sound;                 /* nothing was found to say about it: set by who looks */
  /* Blocks in the order of solving: block k owns entries start[k] to start[k+1]-1 of equations[] and vars[]. */
  int  n_blocks, n_solved, largest;
  int *start, *equations, *vars;
  /* Equations that only compute something for show, in the order of computing. */
  int  n_last, *last;
  /* Any one of the open variables would, once given, make one missing value less. */
  int  n_missing, n_open, *open;
  int  n_open_equations, *open_equations;
  gboolean *is_open;                 /* [n vars] of roots, computed ones included */
  /* Any one of these equations may go. */
  int  n_surplus, n_over, *over;
} HlStructure;

HlStructure *hl_structure_new  (HlSystem *system);
HlStructure *hl_structure_ref  (HlStructure *structure);
void         hl_structure_free (HlStructure *structure);     /* lets go of one reference */
G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlStructure, hl_structure_free)
G_END_DECLS
