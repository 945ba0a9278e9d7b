/* The inside of a plant: shared lists and their index.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "plant/component-private.h"
#include "plant/plant.h"
G_BEGIN_DECLS

typedef struct { const char *id, *port; } HlPortKey;

/* Look-ups by id.  They hold positions, not pointers, so that an edit which keeps ids and connections shares them. */
typedef struct {
  gatomicrefcount ref_count;
  GHashTable *components, *streams, *shafts;   /* id -> position + 1 */
  GHashTable *ports;                           /* HlPortKey -> position of the stream + 1 */
  GHashTable *shaft_of;                        /* component id -> position of the shaft + 1 */
  HlPortKey  *port_keys;
} HlPlantIndex;

struct _HlPlant {
  gatomicrefcount ref_count;
  char          *title;                        /* GRefString */
  const char    *formulation;                  /* interned */
  HlUnitSet      units;
  HlSite         site;
  GPtrArray     *components, *streams, *shafts;   /* never changed once the plant is shared */
  HlPlantIndex  *index;
  HlValues       values;
  GArray        *dismissed;                    /* HlDismissal; never changed once the plant is shared; or NULL */
  JsonObject    *extra, *site_extra, *plant_extra;   /* unknown keys of the file; or NULL */
  GHashTable    *reserved;                     /* interned ids that hl_plant_free_id() must not give out, as variants use them; or NULL */
};

/* A plant under construction: fill in, then hl_plant_index(). */
HlPlant *hl_plant_alloc      (void);
HlPlant *hl_plant_share      (const HlPlant *plant);      /* same content, everything shared, to be changed */
void     hl_plant_index      (HlPlant *plant);            /* builds the index from the lists */
HlPlant *hl_plant_with_reserved (const HlPlant *plant, GHashTable *reserved);   /* set of interned ids, never changed from now on */
/* Replace a shared list by a copy of one's own, its items still shared. */
void     hl_plant_own_components (HlPlant *plant);
void     hl_plant_own_streams    (HlPlant *plant);
void     hl_plant_own_shafts     (HlPlant *plant);

/* Stream and state quantity behind an address; NULL where it is not a state of a connected port or stream. */
const HlStream *hl_plant_stream_of_address (const HlPlant *plant, const HlAddress *address, const char **key);
/* The @n-th of the three addresses of a stream's state: 0 the stream, 1 its outlet port, 2 its inlet port. */
HlAddress       hl_stream_alias            (const HlStream *stream, const char *key, guint n);
gboolean        hl_addresses_same          (const HlPlant *plant, const HlAddress *a, const HlAddress *b);

/* Limits of the site [m], [K], [Pa]: ISO 2533's troposphere ends at 11 km; the others keep to the surface of the Earth. */
#define HL_SITE_LEAST_ALTITUDE (-1000.0)
#define HL_SITE_MOST_ALTITUDE 11000.0
#define HL_SITE_LEAST_T 173.15
#define HL_SITE_MOST_T 373.15
#define HL_SITE_LEAST_P 1e3
#define HL_SITE_MOST_P 1e7
/* dismissals.c; the first two work on a plant of one's own */
void     hl_plant_forget_dismissed (HlPlant *plant);      /* of what is gone */
void     hl_plant_map_dismissed    (HlPlant *plant, HlTieMap map, gpointer data);
gboolean hl_dismissals_equal       (const HlPlant *a, const HlPlant *b);
char    *hl_dismissal_at_to_text   (const HlAddress *at);

/* plant-check.c */
gboolean hl_quantity_may_be_put_in (const HlQuantityKind *kind, const char *where, GError **error);
gboolean hl_quantity_check        (const HlQuantityKind *kind, const char *where, double value, HlUnitSet set, GError **error);
gboolean hl_plant_check_tie       (const HlPlant *plant, const HlAddress *address, const HlTie *tie, GError **error);

/* tie-read.c */
/* What stands behind "=".  GIVEN or TIED; checked against limits and for what it names.  @is_file: bare numbers are SI, and a
 * quantity that has vanished is taken as it stands. */
gboolean hl_tie_read    (const HlPlant *plant, const HlAddress *address, const char *text, gboolean is_file, HlValue *value, GError **error);
char    *hl_tie_to_text (const HlValue *value);           /* as in a file: "2*C1.steam.p+10000" */

/* json-text.c: JSON text to nodes, strictly and within bounds */
typedef struct {
  const char *name;                     /* of the file, for messages */
  GHashTable *lines;                    /* key of the top object -> GArray of guint: line of each item */
} HlJsonPlaces;
JsonNode *hl_json_parse     (const char *text, gsize length, const char *name, HlJsonPlaces *places, GError **error);
guint     hl_json_line      (const HlJsonPlaces *places, const char *list, guint item);   /* 0: not known */
void      hl_json_append_string (GString *out, const char *text);
void      hl_json_append_node   (GString *out, JsonNode *node);

/* plant-json-write.c */
void      hl_json_append_component (GString *out, const HlComponent *component);
void      hl_json_append_stream    (GString *out, const HlStream *stream);
void      hl_json_append_shaft     (GString *out, const HlShaft *shaft);
void      hl_json_append_plant     (GString *out, const HlPlant *plant);      /* without the last brace */
gboolean  hl_json_save             (const char *text, const char *path, GError **error);   /* temporary file, sync, rename */
G_END_DECLS
