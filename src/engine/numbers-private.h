/* Damped Newton for blocks of several unknowns.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/numbers.h"
G_BEGIN_DECLS

typedef struct _HlBlockWork HlBlockWork;

HlBlockWork *hl_block_work_new  (HlSystem *system);
void         hl_block_work_free (HlBlockWork *work);
/* Solves a block, from where the unknowns stand, else from other starts.  On failure fills in worst and null_vars. */
HlFailed     hl_block_solve     (HlBlockWork *work, const int *equations, const int *vars, int n, const HlUsual *usual, HlNumbers *numbers);
/* Newton alone; @offset: [n] or NULL, what the scaled residuals are to be short of zero. */
HlFailed     hl_block_newton    (HlBlockWork *work, const int *equations, const int *vars, int n, const double *offset, HlNumbers *numbers);
/* By way of an easier block, with usual values instead of unusual ones that were put in, and from its answer step by step. */
HlFailed     hl_block_relax     (HlBlockWork *work, const int *equations, const int *vars, int n, const HlUsual *usual, HlNumbers *numbers);
void         hl_block_keep_flows (HlBlockWork *work, gboolean keeps);      /* no flow turns round on the way */
void         hl_block_set_bold  (HlBlockWork *work, int n_steps);         /* so many steps are taken even where they make things worse */
HlFailed     hl_scalar_solve    (HlSystem *system, int equation, int var, HlNumbers *numbers);
gboolean     hl_numbers_inside  (const HlVar *var, double x);     /* can it be, at all? */
HlSystem    *hl_block_system    (HlBlockWork *work);
/* A few undamped steps on everything; keeps what is better. */
void         hl_block_polish    (HlBlockWork *work, const int *equations, const int *vars, int n, HlNumbers *numbers);
G_END_DECLS
