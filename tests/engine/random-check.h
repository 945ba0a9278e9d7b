/* A solution looked at from outside: balances, second law, given values, all recomputed from the states of the streams.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "plants.h"
G_BEGIN_DECLS

typedef struct {
  double mass, energy;      /* worst balance of a component, over the largest flow of the plant */
  double given;             /* largest departure from a value that was put in, relative */
  double machine;           /* of a turbine group or pump from its efficiency [J/kg] over 1 MJ/kg */
  guint  n_broken_laws;     /* states that break the second law or flow backwards */
  char   text[600];         /* the worst of what was found, in words */
} RandomCheck;

RandomCheck random_check   (const HlSolution *solution);
/* Largest difference of two solutions of the same plant, whatever the order of its parts; relative. */
double      random_compare (const HlSolution *a, const HlSolution *b, char *where, gsize size);
G_END_DECLS
