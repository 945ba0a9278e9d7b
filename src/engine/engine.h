/* The way in: settle what was edited, and solve.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/solution.h"
G_BEGIN_DECLS

/* Solves a plant.  Never NULL: what cannot be solved comes back with findings and with what was found up to there.
 * @start: (nullable): an earlier solution, of this or a similar plant, to start from (matched by ids).
 * Any thread; no globals. */
HL_PUBLIC HlSolution *hl_solve (HlPlant *plant, const HlSolution *start);

/* Assumed values yield: where the value at @edited (nullable: a change of topology) has made the set surplus, one assumed value
 * in the over-determined part becomes found, and so on until it fits or nothing can yield; where it has fallen short because a
 * value was let go, the usual quantity of that component comes back as assumed.
 * @yielded: (out) (optional): element-type HlYield, g_array_unref() it.
 * Returns: (transfer full): the settled plant, possibly @plant itself. */
typedef struct { HlAddress address; gboolean came_back; char text[160]; } HlYield;   /* text: "terminal temperature difference of C1 is now found" */
HL_PUBLIC HlPlant *hl_settle (HlPlant *plant, const HlAddress *edited, GArray **yielded);
/* The same next to the last solution: where only the size of values has changed since, there is nothing to settle.  @last: or NULL. */
HL_PUBLIC HlPlant *hl_settle_from (HlPlant *plant, const HlAddress *edited, const HlSolution *last, GArray **yielded);
G_END_DECLS
