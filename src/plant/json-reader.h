/* Reading members of JSON objects: what all parts of a plant file have in common.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "plant/plant-private.h"
G_BEGIN_DECLS

typedef struct {
  HlPlant      *plant;
  HlJsonPlaces  places;
  const char   *list;        /* list of the item being read, or NULL */
  guint         item;
  const char   *id;          /* its id once known */
  GError      **error;
} HlReader;

/* Refusals: set the error with file, line, item and @key (nullable) before the reason; always FALSE. */
gboolean    hl_reader_refuse_as   (HlReader *reader, HlPlantError code, const char *key, const char *why);
gboolean    hl_reader_refuse      (HlReader *reader, const char *key, const char *format, ...) G_GNUC_PRINTF (3, 4);
gboolean    hl_reader_refuse_with (HlReader *reader, const char *key, GError *why);   /* takes the error of a check */

char       *hl_reader_clip        (const char *text);                                 /* at most 40 characters, for messages */
JsonNode   *hl_reader_member      (JsonObject *object, const char *key);              /* NULL: absent */
const char *hl_reader_type        (JsonNode *node);                                   /* "a list", in words */
gboolean    hl_reader_is_string   (JsonNode *node);
gboolean    hl_reader_is_number   (JsonNode *node);

/* These leave @result alone where the key is absent. */
gboolean    hl_reader_string      (HlReader *reader, JsonObject *object, const char *key, const char **result);
gboolean    hl_reader_object      (HlReader *reader, JsonObject *object, const char *key, JsonObject **result);
gboolean    hl_reader_list        (HlReader *reader, JsonObject *object, const char *key, guint most, JsonArray **result);
gboolean    hl_reader_int         (HlReader *reader, JsonObject *object, const char *key, int least, int most, int *result);
gboolean    hl_reader_boolean     (HlReader *reader, JsonObject *object, const char *key, gboolean *result);
gboolean    hl_reader_point       (HlReader *reader, JsonObject *object, const char *key, HlGridPoint *point);
gboolean    hl_reader_node_to_point (JsonNode *node, HlGridPoint *point);

/* plant-json-read.c */
typedef gboolean (*HlReadMore) (HlReader *reader, JsonObject *top, gpointer data);     /* FALSE: refused, with the error set */
HlPlant    *hl_plant_read           (const char *text, gssize length, const char *name, HlReadMore more, gpointer data, GError **error);
GByteArray *hl_plant_load_text      (const char *path, char **name, GError **error);   /* with a 0 behind its end */
HlPlant    *hl_plant_with_json_item (const HlPlant *plant, JsonObject *object, GError **error);   /* a component, stream or shaft */
gboolean    hl_reader_option        (HlReader *reader, JsonObject *object, HlComponent *component, guint n);
gboolean    hl_reader_route         (HlReader *reader, JsonObject *object, HlStream *stream);      /* no bends where none are told */
gboolean    hl_reader_label         (HlReader *reader, JsonObject *object, HlStream *stream);
/* dismissals.c: the list "dismissed". */
gboolean    hl_plant_read_dismissed (HlReader *reader, JsonObject *top);

/* What is not in @known, nor an option of @kind (nullable), to be written back; NULL: nothing. */
JsonObject *hl_reader_unknown     (JsonObject *object, const char *const *known, const HlKind *kind);
G_END_DECLS
