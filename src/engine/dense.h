/* Small dense linear systems, with a look at their null space.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <glib.h>
G_BEGIN_DECLS

/* Factors @a (n x n, by rows) in place with row pivoting.  A pivot below @least times the largest entry is lifted to it, so
 * that a singular matrix can still be worked with.  Returns how many were lifted. */
int    hl_dense_factor (int n, double *a, int *pivot, double least);
void   hl_dense_solve  (int n, const double *a, const int *pivot, double *b);
/* Inverse iteration on a factored matrix: @v becomes the direction that the matrix shrinks most, largest entry 1.
 * Returns the shrinkage. */
double hl_dense_null   (int n, const double *a, const int *pivot, double *v);
G_END_DECLS
