/* Changing a value step by step or under a gesture: solved live, one undoable step.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "app/hl-session.h"
G_BEGIN_DECLS

/* Steps in the units shown, never in SI: 1 K, 0.01 of an efficiency, about one percent of anything else; fine: a tenth of it. */
double   hl_scrub_step (const HlQuantityKind *kind, double si, HlUnitSet units, gboolean is_fine);
/* The value @amount [shown units] further, rounded to a multiple of @step; @si itself where that changes nothing. */
double   hl_scrub_moved (const HlPlant *plant, const HlQuantityKind *kind, double si, double amount, double step);

/* The stream whose state @address names, and the key there; NULL for every other quantity. */
const HlStream *hl_state_stream (const HlPlant *plant, const HlAddress *address, const char **key);
/* The value at @address or at another name of the same state, where it is given or assumed: only those can be moved. */
const HlValue *hl_scrub_value_at (const HlPlant *plant, const HlAddress *address, HlAddress *where);

/* By keys: up or down by so many steps; presses that follow each other closely are one undoable step. */
gboolean hl_scrub_by_keys (HlSession *session, const HlAddress *address, int steps, gboolean is_fine, GError **error);

/* By a gesture, between begin and finish or cancel, which free it. */
typedef struct _HlScrub HlScrub;
HlScrub *hl_scrub_begin   (HlSession *session, const HlAddress *address);    /* NULL: neither given nor assumed */
const HlAddress *hl_scrub_address (const HlScrub *scrub);
double   hl_scrub_start   (const HlScrub *scrub);                            /* the value before [SI] */
gboolean hl_scrub_to      (HlScrub *scrub, double si);                       /* FALSE: outside its limits, nothing changes */
void     hl_scrub_finish  (HlScrub *scrub);
void     hl_scrub_cancel  (HlScrub *scrub);
void     hl_scrub_cancel_later (HlScrub *scrub);                             /* where no change may be told at once */
G_END_DECLS
