/* Components, streams, shafts and their values.  Fill one in, add it to a plant, then never change it.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <json-glib/json-glib.h>
#include "plant/address.h"
#include "plant/kind.h"
G_BEGIN_DECLS

typedef enum {
  HL_ORIGIN_FOUND,      /* solved; such a quantity has no HlValue */
  HL_ORIGIN_GIVEN,      /* typed by the engineer */
  HL_ORIGIN_ASSUMED,    /* a sourced default nobody has confirmed yet */
  HL_ORIGIN_TIED,       /* an expression of other quantities */
} HlOrigin;
HL_PUBLIC const char *hl_origin_id   (HlOrigin origin);   /* "given" */
HL_PUBLIC const char *hl_origin_name (HlOrigin origin);   /* translated */

/* A quantity as an expression of others, in SI.  Interned: compare and copy as pointers, never free. */
typedef struct _HlTie HlTie;
HL_PUBLIC guint            hl_tie_n_of      (const HlTie *tie);            /* quantities that it names, each once */
HL_PUBLIC const HlAddress *hl_tie_of        (const HlTie *tie, guint n);
/* @of: [n_of] values of the quantities; @derivatives: (out) [n_of] exact, or NULL.  FALSE where the result is no finite number. */
HL_PUBLIC gboolean         hl_tie_evaluate  (const HlTie *tie, const double *of, double *value, double *derivatives);
HL_PUBLIC gboolean         hl_tie_is_linear (const HlTie *tie);
/* Its right side with {1} for the first quantity: in SI "0.5 × ({1} + 2000000)", or with the units of a set, "0.5 × ({1} + 20 bar)".  g_free() */
HL_PUBLIC char            *hl_tie_formula   (const HlTie *tie, gboolean in_si, HlUnitSet units);
/* Whether it holds for temperatures in °C and °F too, or only in K, as 0.9*T1.inlet.T does. */
HL_PUBLIC gboolean         hl_tie_is_level_free (const HlTie *tie);
HL_PUBLIC const HlTie     *hl_tie_linear    (const HlAddress *of, double factor, double offset);   /* factor * of + offset */
/* The same with each address as @map leaves it, for copies and new ids. */
typedef void (*HlTieMap) (HlAddress *address, gpointer data);
HL_PUBLIC const HlTie     *hl_tie_mapped    (const HlTie *tie, HlTieMap map, gpointer data);

typedef struct {
  HlOrigin     origin;  /* GIVEN, ASSUMED or TIED */
  double       value;   /* SI; of a tie: unused */
  const HlTie *tie;     /* of a tie */
} HlValue;

/* Values by interned key, kept sorted by key text. */
typedef struct { const char *key; HlValue value; } HlValueEntry;
typedef struct { guint n; HlValueEntry *entries; } HlValues;
HL_PUBLIC const HlValue *hl_values_find (const HlValues *values, const char *key);   /* NULL: found */

typedef struct _HlComponent {
  gatomicrefcount ref_count;
  const HlKind *kind;
  const char   *id;            /* interned */
  char         *name;          /* free text, may be "" */
  int           x, y;          /* centre of the symbol [grid units]; 1 unit = 10 px at zoom 1 */
  int           turn;          /* quarter turns clockwise, 0 to 3 */
  gboolean      is_mirrored;   /* left-right, before turning */
  int          *options;       /* [kind->n_options] count, or index of the choice */
  HlValues      values;
  JsonObject   *extra;         /* unknown keys of the file, written back; or NULL */
} HlComponent;

HL_PUBLIC HlComponent *hl_component_new   (const HlKind *kind, const char *id, int x, int y);  /* with its assumed values */
HL_PUBLIC HlComponent *hl_component_new_bare (const HlKind *kind, const char *id, int x, int y); /* without any value */
HL_PUBLIC HlComponent *hl_component_copy  (const HlComponent *component);                      /* to be changed and added */
HL_PUBLIC HlComponent *hl_component_ref   (HlComponent *component);
HL_PUBLIC void         hl_component_unref (HlComponent *component);
HL_PUBLIC void         hl_component_set_name   (HlComponent *component, const char *name);
HL_PUBLIC void         hl_component_set_option (HlComponent *component, const char *key, int value);  /* clamps; drops values of vanished keys; keys
                                                                     that appear, and assumed values whose default follows the option, get
                                                                     their assumed default, unless the component has no value at all */
HL_PUBLIC void         hl_component_set_value  (HlComponent *component, const char *key, const HlValue *value);  /* NULL: let it be found */
HL_PUBLIC int          hl_component_option     (const HlComponent *component, const char *key);       /* 0 when it has none */
/* Default of a quantity [SI] and where it comes from, with the choices of the component put in; a @component of NULL has none. */
HL_PUBLIC double       hl_component_default        (const HlComponent *component, const HlQuantityKind *quantity, int number);
HL_PUBLIC const char  *hl_component_default_source (const HlComponent *component, const HlQuantityKind *quantity);   /* untranslated; NULL */

/* Ports and quantities with the counts of this component put in. */
typedef struct {
  const HlPortKind *kind;
  const char       *key;       /* interned: "extraction2" */
  int               number;    /* from 1; 0 when not repeated */
} HlPort;
typedef struct {
  const HlQuantityKind *kind;
  const char           *key;   /* interned: "extraction2.p" */
  int                   number;
} HlQuantity;
HL_PUBLIC guint     hl_component_n_ports   (const HlComponent *component);
HL_PUBLIC HlPort    hl_component_port      (const HlComponent *component, guint n);
HL_PUBLIC gboolean  hl_component_find_port (const HlComponent *component, const char *key, guint *n);
HL_PUBLIC char     *hl_component_port_name (const HlComponent *component, guint n);   /* translated "extraction 2"; g_free() */
HL_PUBLIC guint     hl_component_n_quantities (const HlComponent *component);
HL_PUBLIC HlQuantity hl_component_quantity    (const HlComponent *component, guint n);
HL_PUBLIC char     *hl_component_quantity_name (const HlComponent *component, guint n); /* translated, with its number; g_free() */
/* Sizes that rating freezes, and what each then finds: interned keys of quantities. */
typedef struct { const char *frozen, *found; } HlRatingPair;
HL_PUBLIC guint        hl_component_n_ratings (const HlComponent *component);
HL_PUBLIC HlRatingPair hl_component_rating    (const HlComponent *component, guint n);
/* Kind of any key that may stand in an address: own quantities and <port>.<p|T|h|s|x|m|v>; NULL when there is none. */
HL_PUBLIC const HlQuantityKind *hl_component_quantity_kind (const HlComponent *component, const char *key);

/* Geometry with turn and mirror put in, in grid units of the canvas. */
HL_PUBLIC void   hl_component_half_size  (const HlComponent *component, int *half_width, int *half_height);  /* turned */
HL_PUBLIC void   hl_component_port_place (const HlComponent *component, guint n, int *x, int *y, HlSide *side);
/* Where a shaft line ends: @end 0 the left, 1 the right end of the unturned symbol; of a driven machine above and below. */
HL_PUBLIC void   hl_component_shaft_place (const HlComponent *component, int end, int *x, int *y);

typedef struct { int x, y; } HlGridPoint;
typedef struct _HlStream {
  gatomicrefcount ref_count;
  const char   *id;                        /* interned */
  const char   *from_id, *from_port;       /* interned: "B1", "steam" (an outlet) */
  const char   *to_id, *to_port;           /* interned (an inlet) */
  const char   *medium;                    /* interned fluid id, "water" */
  HlGridPoint  *route; guint n_route;      /* hand-set bends */
  gboolean      has_label_place; int label_x, label_y;
  HlValues      values;
  JsonObject   *extra;
} HlStream;
HL_PUBLIC HlStream *hl_stream_new   (const char *id, const char *from_id, const char *from_port, const char *to_id, const char *to_port);
HL_PUBLIC HlStream *hl_stream_copy  (const HlStream *stream);
HL_PUBLIC HlStream *hl_stream_ref   (HlStream *stream);
HL_PUBLIC void      hl_stream_unref (HlStream *stream);
HL_PUBLIC void      hl_stream_set_value (HlStream *stream, const char *key, const HlValue *value);

typedef struct _HlShaft {
  gatomicrefcount ref_count;
  const char   *id;
  guint         n_joins;
  const char  **joins;                     /* [n_joins] interned component ids */
  JsonObject   *extra;
} HlShaft;
HL_PUBLIC HlShaft *hl_shaft_new   (const char *id, const char *const *joins, guint n_joins);
HL_PUBLIC HlShaft *hl_shaft_ref   (HlShaft *shaft);
HL_PUBLIC void     hl_shaft_unref (HlShaft *shaft);

G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlComponent, hl_component_unref)
G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlStream, hl_stream_unref)
G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlShaft, hl_shaft_unref)
G_END_DECLS
