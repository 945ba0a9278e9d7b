/* Numbers for the unknowns: block by block in triangular order, then a look at the whole.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/structure.h"
G_BEGIN_DECLS

typedef enum {
  HL_FAILED_NOT,
  HL_FAILED_RANGE,          /* no start within the fluid's range could be evaluated */
  HL_FAILED_STEPS,          /* ran out of steps, or nothing near solves it */
  HL_FAILED_SINGULAR,       /* solved, or not, but the answer is not the only one */
} HlFailed;

#define HL_NULL_MOST 6
typedef struct {
  HlFailed failed;
  int      block;                     /* that failed; -1: none, or the polish of the whole */
  int      worst;                     /* its equation with the largest residual */
  double   residual;                  /* scaled, of the whole or of the failed block */
  int      n_iterations;
  guint64  n_evaluations, n_property_calls;
  double   condition;                 /* largest condition estimate of a block */
  int      n_null, null_vars[HL_NULL_MOST];   /* variables of the direction that nothing holds */
  gboolean *is_known;                 /* [n vars] of roots; g_free() */
} HlNumbers;

/* What is usual, asked only where a block cannot be solved from its start. */
typedef struct {
  gpointer data;
  /* @usual: [n vars] a usual value of a root, as carried, or NaN; @is_unusual: [n vars] is a fixed root one that is seldom put in?
   * Both come set to NaN and FALSE. */
  gboolean first;              /* blocks begin with usual values, whatever the start */
  int      variant;            /* 0: as they are; else each a little off, in a way of its own */
  void   (*tell) (gpointer data, const gboolean *is_known, double *usual, gboolean *is_unusual);
} HlUsual;

/* @usual: or NULL. */
void hl_numbers_solve (HlSystem *system, const HlStructure *structure, const HlUsual *usual, HlNumbers *numbers);
void hl_numbers_skip  (HlSystem *system, HlNumbers *numbers);   /* only what was put in is known */
G_END_DECLS
