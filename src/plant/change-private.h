/* Making changes, and reading and writing them as JSON.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "plant/change.h"
#include "plant/json-reader.h"
G_BEGIN_DECLS

/* Each takes a node or object of its own. */
HlChange   *hl_change_new_set    (const char *where, JsonNode *to, const char *origin);    /* @origin NULL: given, or not a quantity */
HlChange   *hl_change_new_remove (const char *id);
HlChange   *hl_change_new_add    (JsonObject *item);
JsonNode   *hl_change_to         (const HlChange *change);                                 /* (transfer none) what is set; NULL otherwise */
const char *hl_change_origin     (const HlChange *change);                                 /* "given" or "assumed" of a number; NULL: not said */
JsonObject *hl_change_item       (const HlChange *change);                                 /* (transfer none) what is added; NULL otherwise */
/* The form only: whether it applies shows with a plant. */
HlChange   *hl_change_read       (HlReader *reader, const char *path, JsonNode *node);     /* NULL: refused */
void        hl_change_append     (GString *out, const HlChange *change);

/* Whether @b says what @a says, with more beside it that the program does not know. */
gboolean    hl_change_says       (const HlChange *a, const HlChange *b);

/* Attributes that are no quantities and yet can be set: of a component, of a stream. */
gboolean    hl_is_component_look (const char *key);     /* at, turn, mirror */
gboolean    hl_is_stream_look    (const char *key);     /* route, label */
/* The owner's id and what follows; FALSE where the text has not that form. */
gboolean    hl_change_split      (const char *where, gboolean *is_stream, char **id, char **key);
G_END_DECLS
