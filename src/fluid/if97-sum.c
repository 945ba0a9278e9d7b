/* Integers by which sums are weighted.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/if97-sum.h"

#define TEN(n) \
  { n, n }, { n + 1, n + 1 }, { n + 2, n + 2 }, { n + 3, n + 3 }, { n + 4, n + 4 }, \
  { n + 5, n + 5 }, { n + 6, n + 6 }, { n + 7, n + 7 }, { n + 8, n + 8 }, { n + 9, n + 9 }

const HlIf97Pair hl_if97_integers[41] = { TEN (0.0), TEN (10.0), TEN (20.0), TEN (30.0), { 40.0, 40.0 } };
