/* A plant: components, streams, shafts and site; a value that is never modified once shared.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "plant/component.h"
G_BEGIN_DECLS

typedef struct {
  double altitude;                 /* [m] */
  double ambient_T, wet_bulb_T;    /* [K] */
  double dead_T, dead_p;           /* dead state of exergy [K], [Pa] */
} HlSite;

#define HL_PLANT_ERROR (hl_plant_error_quark ())
HL_PUBLIC GQuark hl_plant_error_quark (void);
typedef enum {
  HL_PLANT_ERROR_FILE,             /* cannot be read or written */
  HL_PLANT_ERROR_SYNTAX,           /* not JSON, cut short */
  HL_PLANT_ERROR_FOREIGN,          /* JSON, but not a Heatloom file, or of a later version */
  HL_PLANT_ERROR_CONTENT,          /* unknown kind, port, quantity; wrong type; duplicate id */
  HL_PLANT_ERROR_OUT_OF_RANGE,     /* a value outside its hard limits */
  HL_PLANT_ERROR_ADDRESS,          /* no such quantity */
} HlPlantError;

HL_PUBLIC HlPlant *hl_plant_new   (void);                     /* empty, with its assumed plant quantities, metric */
HL_PUBLIC HlPlant *hl_plant_ref   (HlPlant *plant);           /* atomic */
HL_PUBLIC void     hl_plant_unref (HlPlant *plant);
G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlPlant, hl_plant_unref)

/* Reading.  Indices run in file order; pointers stay valid as long as the plant. */
HL_PUBLIC const char        *hl_plant_title         (const HlPlant *plant);
HL_PUBLIC HlUnitSet          hl_plant_units         (const HlPlant *plant);
HL_PUBLIC const char        *hl_plant_formulation   (const HlPlant *plant);   /* "if97" or "iapws95", see plant/circuit.h */
HL_PUBLIC const HlSite      *hl_plant_site          (const HlPlant *plant);
HL_PUBLIC double             hl_plant_site_pressure (const HlPlant *plant);   /* from the altitude [Pa] */
HL_PUBLIC guint              hl_plant_n_components  (const HlPlant *plant);
HL_PUBLIC const HlComponent *hl_plant_component     (const HlPlant *plant, guint n);
HL_PUBLIC const HlComponent *hl_plant_find_component (const HlPlant *plant, const char *id);
HL_PUBLIC int                hl_plant_component_index (const HlPlant *plant, const char *id);   /* -1: none */
HL_PUBLIC guint              hl_plant_n_streams     (const HlPlant *plant);
HL_PUBLIC const HlStream    *hl_plant_stream        (const HlPlant *plant, guint n);
HL_PUBLIC const HlStream    *hl_plant_find_stream   (const HlPlant *plant, const char *id);
HL_PUBLIC int                hl_plant_stream_index  (const HlPlant *plant, const char *id);
HL_PUBLIC const HlStream    *hl_plant_stream_at     (const HlPlant *plant, const char *component_id, const char *port);  /* NULL: unconnected */
HL_PUBLIC guint              hl_plant_n_shafts      (const HlPlant *plant);
HL_PUBLIC const HlShaft     *hl_plant_shaft         (const HlPlant *plant, guint n);
HL_PUBLIC const HlShaft     *hl_plant_shaft_of      (const HlPlant *plant, const char *component_id);  /* NULL: none */
HL_PUBLIC const HlValues    *hl_plant_values        (const HlPlant *plant);
HL_PUBLIC const HlValue     *hl_plant_value         (const HlPlant *plant, const HlAddress *address);   /* NULL: found or none */
HL_PUBLIC const HlQuantityKind *hl_plant_quantity_kind (const HlPlant *plant, const HlAddress *address);/* NULL: no such quantity */
HL_PUBLIC char              *hl_plant_describe      (const HlPlant *plant, const HlAddress *address);   /* translated: "isentropic efficiency of T1"; g_free() */
HL_PUBLIC guint              hl_plant_n_assumed     (const HlPlant *plant);
/* The same state is known at a port and at its stream: the value there whichever of the three addresses carries it. */
HL_PUBLIC const HlValue     *hl_plant_state_value   (const HlPlant *plant, const HlStream *stream, const char *key, HlAddress *where);

/* The value that fixes a quantity, at this address or at another name of the same state (port or stream); hl_plant_value()
 * looks at exactly this address.  @where: (out) (optional): the address that carries it. */
HL_PUBLIC const HlValue     *hl_plant_value_wherever (const HlPlant *plant, const HlAddress *address, HlAddress *where);

/* Editing: each returns a new plant (transfer full) that shares what it did not change. */
HL_PUBLIC HlPlant *hl_plant_with_title     (const HlPlant *plant, const char *title);
HL_PUBLIC HlPlant *hl_plant_with_units     (const HlPlant *plant, HlUnitSet units);
HL_PUBLIC HlPlant *hl_plant_with_site      (const HlPlant *plant, const HlSite *site);
HL_PUBLIC HlPlant *hl_plant_with_component (const HlPlant *plant, HlComponent *component);  /* (transfer full) adds, or replaces the one of that id; streams on vanished ports go, ties to vanished quantities stay and become a finding */
HL_PUBLIC HlPlant *hl_plant_with_stream    (const HlPlant *plant, HlStream *stream);        /* (transfer full) adds or replaces; another line at one of its ports goes */
HL_PUBLIC HlPlant *hl_plant_with_shaft     (const HlPlant *plant, HlShaft *shaft);          /* (transfer full); a component is on one shaft at most: joining takes it off its former one */
HL_PUBLIC HlPlant *hl_plant_without        (const HlPlant *plant, const char *const *ids);  /* NULL-terminated ids of components, streams, shafts; attached streams and shafts left with less than two go too; ties to them stay and become a finding */
/* NULL value: let it be found.  A state has one value: another name of the same state (port or stream) loses its own.  Checks the hard limits, and that what a tie names is not the quantity itself and has the dimensions; what is not there may be named, as in a file. */
HL_PUBLIC HlPlant *hl_plant_with_value     (const HlPlant *plant, const HlAddress *address, const HlValue *value, GError **error);

/* The ties of these components and streams with each address as @map leaves it; one that then names what is not there, or does not fit, goes. */
HL_PUBLIC HlPlant *hl_plant_with_ties_mapped (const HlPlant *plant, const char *const *ids, HlTieMap map, gpointer data);
/* The component, stream or shaft @id under another id; lines, shafts and ties follow. */
HL_PUBLIC HlPlant *hl_plant_with_id        (const HlPlant *plant, const char *id, const char *new_id, GError **error);
/* Findings that were looked at and put aside: by code and place. */
typedef struct {
  const char *code;                /* interned */
  HlAddress   at;                  /* key "" for the whole component or plant */
  JsonObject *extra;               /* unknown keys of the file, written back; or NULL */
} HlDismissal;
HL_PUBLIC guint              hl_plant_n_dismissed    (const HlPlant *plant);
HL_PUBLIC const HlDismissal *hl_plant_dismissed      (const HlPlant *plant, guint n);
HL_PUBLIC gboolean           hl_plant_is_dismissed   (const HlPlant *plant, const char *code, const HlAddress *at);
HL_PUBLIC HlPlant           *hl_plant_with_dismissed (const HlPlant *plant, const char *code, const HlAddress *at, gboolean is_dismissed);
HL_PUBLIC char    *hl_plant_free_id        (const HlPlant *plant, const char *letter);      /* "T2"; "" gives the next stream number "7"; g_free() */
/* Why a line from one port to another cannot be, or NULL (outlet to inlet, both free, not the same component's same side ...). */
HL_PUBLIC gboolean hl_plant_can_connect    (const HlPlant *plant, const char *from_id, const char *from_port,
                                            const char *to_id, const char *to_port, GError **error);
HL_PUBLIC gboolean hl_plant_equal          (const HlPlant *a, const HlPlant *b);            /* same content */

/* JSON.  Messages name the file position or key path, what is wrong and a mend.  Unknown keys are kept. */
HL_PUBLIC HlPlant *hl_plant_from_json (const char *text, gssize length, const char *name, GError **error);
HL_PUBLIC char    *hl_plant_to_json   (const HlPlant *plant);                               /* one item a line; g_free() */
HL_PUBLIC HlPlant *hl_plant_load      (const char *path, GError **error);
HL_PUBLIC gboolean hl_plant_save      (const HlPlant *plant, const char *path, GError **error);   /* temporary file, sync, rename */

/* "0.23*B1.steam.p", "T2.exhaust.T - 5 K", "(B1.steam.p + 20 bar)/2", "max(H1.heat; H2.heat)": the text after "=" of a tie
 * of the quantity @address. */
HL_PUBLIC gboolean hl_tie_parse  (const HlPlant *plant, const HlAddress *address, const char *text, HlValue *value, GError **error);
HL_PUBLIC char    *hl_tie_format (const HlPlant *plant, const HlAddress *address, const HlValue *value);   /* without "="; g_free() */
/* What a person may type for a quantity: "80 bar", or "=tie". Given, or tied. */
HL_PUBLIC gboolean hl_value_parse (const HlPlant *plant, const HlAddress *address, const char *text, HlValue *value, GError **error);
G_END_DECLS
