/* Damped Newton for blocks of several unknowns.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/numbers.h"
G_BEGIN_DECLS

typedef struct _HlBlockWork HlBlockWork;

HlBlockWork *hl_block_work_new  (HlSystem *system);
void         hl_block_work_free (HlBlockWork *work);
/* Solves a block, from where the unknowns stand, else from other starts.  On failure fills in worst and null_vars. */
HlFailed     hl_block_solve     (HlBlockWork *work, const int *equations, const int *vars, int n, HlNumbers *numbers);
/* A few undamped steps on everything; keeps what is better. */
void         hl_block_polish    (HlBlockWork *work, const int *equations, const int *vars, int n, HlNumbers *numbers);
G_END_DECLS
