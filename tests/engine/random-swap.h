/* The same plant with other values put in: each given in place of one that it hangs on.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "random-plant.h"
G_BEGIN_DECLS

/* Gives one quantity that was found, at the value found, and lets go another on which it depends noticeably: of the same component
 * or one joined to it, or of the plant; or, where not @is_near, any one.
 * Returns: (transfer full) (nullable): NULL where count @count of this seed finds none. */
HlPlant *random_swap    (const HlSolution *solution, guint32 seed, int count, gboolean is_near, char **what);
/* The same plant with its components and streams in another order. */
HlPlant *random_reorder (HlPlant *plant, guint32 seed);
G_END_DECLS
