/* What the files of this folder share about components and their values.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "plant/component.h"
G_BEGIN_DECLS

#define HL_MAX_ID 32                        /* characters of an id */

/* An id starts with a letter (a stream's: or a digit) and goes on with letters, digits and '_'. */
gboolean hl_id_is_valid        (const char *id, gboolean may_start_with_digit);

/* Text with '#' replaced by @number, interned; @number 0: the text itself. */
const char *hl_numbered_key    (const char *key, int number);
/* Whether @key is @pattern with '#' standing for one of 1 to @most; @number: which, 0 for a pattern without '#'. */
gboolean hl_key_matches        (const char *pattern, int most, const char *key, int *number);

void     hl_values_set         (HlValues *values, const char *key, const HlValue *value);   /* NULL: removes */
void     hl_values_copy        (HlValues *to, const HlValues *from);
void     hl_values_clear       (HlValues *values);
gboolean hl_value_equal         (const HlValue *a, const HlValue *b);
gboolean hl_values_equal       (const HlValues *a, const HlValues *b);

HlShaft *hl_shaft_copy_without (const HlShaft *shaft, const char *id);

gboolean hl_json_object_equal  (JsonObject *a, JsonObject *b);   /* NULL equals an empty object */
G_END_DECLS
