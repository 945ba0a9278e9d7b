/* Component kinds as tables: ports, options, quantities.  Everyone reads these: nameplate, JSON, engine, batch, docs.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "plant/units.h"
G_BEGIN_DECLS

typedef enum { HL_PORT_IN, HL_PORT_OUT } HlPortDirection;
typedef enum { HL_SIDE_RIGHT, HL_SIDE_DOWN, HL_SIDE_LEFT, HL_SIDE_UP } HlSide;   /* clockwise, so that turning adds */

/* An option of a component: a count, or one of several words.  Stored in the file under its key. */
typedef struct {
  const char        *key;              /* "extractions", "expansion" */
  const char        *name;             /* N_("Extractions") */
  int                least, most;      /* of a count; of a choice 0 and n_choices - 1 */
  int                usual;            /* default */
  const char *const *choices;          /* words of the file, NULL-terminated; NULL for a count */
  const char *const *choice_names;     /* N_() words for the screen */
} HlOptionKind;

/* What the x of a port counts from; y always counts from the centre. */
typedef enum { HL_ANCHOR_CENTRE, HL_ANCHOR_LEFT_EDGE, HL_ANCHOR_RIGHT_EDGE } HlAnchor;
typedef struct { int x, y; HlSide side; } HlPortPlace;

typedef struct {
  const char      *key;                /* "steam"; "extraction#" when repeated */
  const char      *name;               /* N_("steam outlet") */
  HlPortDirection  direction;
  HlSide           side;               /* where a line leaves, unturned */
  int              x, y;               /* from the symbol's centre [grid units], x right, y down, unturned; of number 1 */
  int              side_circuit;       /* ports of one number share a mass balance inside the component */
  gboolean         is_optional;        /* may stay unconnected */
  const char      *repeat;             /* key of the count option, or NULL */
  const char      *when_option;        /* the port exists only when this choice option ... */
  int              when_choice;        /* ... has this value, or HL_UNLESS (value); when_option NULL: always */
  HlAnchor         anchor;             /* edges move with the width, see widen_option */
  int              step_x;             /* of a repeated port: each number lies this much further right */
  const HlPortPlace *places;           /* of a repeated port: place of each number from 1, instead of x, y, side; or NULL */
  const char      *medium;             /* what flows here where no line says otherwise; NULL: water */
} HlPortKind;

typedef enum {
  HL_QUANTITY_ASSUMED = 1 << 0,        /* a new component carries the default as assumed */
  HL_QUANTITY_USUAL   = 1 << 1,        /* the engineer usually gives it: ranks mends, comes back when a value is let go */
  HL_QUANTITY_RESULT  = 1 << 2,        /* shown as a result; may still be given */
  HL_QUANTITY_PERCENT = 1 << 3,        /* a ratio that people read in percent: see hl_quantity_format() */
  HL_QUANTITY_DERIVED = 1 << 8,        /* read from a solution: no value can be put in, nothing tied to it */
} HlQuantityFlags;

/* A default that depends on a choice: a fuel's heating value.  Source NULL: the row's own default holds. */
typedef struct { double value; const char *source; } HlChoiceDefault;

typedef struct {
  const char      *key;                /* "isentropic_efficiency", "exhaust.p", "extraction#.p", "group_efficiency#" */
  const char      *sign;               /* short sign on drawings and in the note: "η", "TTD" */
  const char      *name;               /* N_("Isentropic efficiency") */
  const char      *group;              /* N_("Expansion"): heading in the nameplate */
  HlDimension      dimension;
  HlQuantityFlags  flags;
  double           default_value;      /* SI; NaN: none */
  const char      *default_source;     /* N_("common practice, no source: 5-50 MW industrial sets") */
  double           credible_low, credible_high;   /* SI; NaN: no range.  Outside: a hint */
  double           above, at_most;     /* hard limits: a value must be > above and <= at_most */
  int              yield_rank;         /* assumed values of low rank yield first */
  const char      *help;               /* N_("one sentence") */
  const char      *repeat;             /* key of the count option, or NULL */
  int              repeat_extra;       /* repeated count + this many times (groups = extractions + 1) */
  const char      *when_option;        /* exists only when this choice option ... */
  int              when_choice;        /* ... has this value, or HL_UNLESS (value) */
  const double    *numbered_defaults;  /* of a repeated quantity: defaults of numbers 1 to most [SI], instead of default_value; or NULL */
  const char      *default_option;     /* the default follows this choice option; or NULL */
  const HlChoiceDefault *choice_defaults;  /* by choice of default_option */
  const char      *found_option;       /* a choice that lets it follow from others: taking it drops the value; or NULL */
  int              found_choice;
} HlQuantityKind;

/* In when_choice: every choice but this one. */
#define HL_UNLESS(choice) (-1 - (choice))

/* Design and rating: at other conditions than those of design the size @frozen keeps its value, and @found is what it finds. */
typedef struct {
  const char *frozen, *found;          /* keys of quantities; with '#' numbered, once for each */
  const char *repeat;                  /* key of the count option, or NULL */
  int         frozen_ahead;            /* the frozen one's number is this much larger */
} HlRating;

/* Lower limit of a quantity that may be zero but not negative: the limit itself is excluded. */
#define HL_FROM_ZERO (-G_MINDOUBLE)

typedef enum {
  HL_SHAFT_NONE,
  HL_SHAFT_DRIVES,                     /* turbine: gives power to the shaft */
  HL_SHAFT_DRIVEN,                     /* pump: may take power from a shaft instead of its motor */
  HL_SHAFT_LOSS,                       /* gearbox: loses a part of what passes through it */
  HL_SHAFT_GENERATOR,                  /* takes what the others leave */
} HlShaftRole;

typedef struct {
  const char           *id;            /* word of the file: "turbine" */
  const char           *letter;        /* ids are this letter and a number: "T" */
  const char           *name;          /* N_("Turbine section") */
  const char           *shelf_name;    /* N_("turbine") */
  const char           *shelf_group;   /* N_("Expand") */
  const char           *help;          /* N_("one sentence") */
  HlShaftRole           shaft;
  gboolean              only_drives;   /* gives its power to machines: without one drawn it is no electricity */
  int                   half_width, half_height;    /* half the symbol's box [grid units], option counts at least */
  int                   widen_per;     /* half the box's width grows to at least (count + 1) * this, count of widen_option */
  const char           *widen_option;
  const HlPortKind     *ports;         guint n_ports;
  const HlOptionKind   *options;       guint n_options;
  const HlQuantityKind *quantities;    guint n_quantities;
  const HlRating       *ratings;       guint n_ratings;
} HlKind;

/* What every component has beside the rows of its kind: results of the second law. */
HL_PUBLIC const HlQuantityKind *hl_common_quantities (guint *n);

HL_PUBLIC guint         hl_kind_count  (void);
HL_PUBLIC const HlKind *hl_kind_nth    (guint n);               /* in shelf order */
HL_PUBLIC const HlKind *hl_kind_lookup (const char *id);        /* NULL when unknown */
HL_PUBLIC int           hl_kind_find_option (const HlKind *kind, const char *key);   /* index or -1 */

/* Default of a quantity [SI]; @number counts repeated quantities from 1; NaN: none. */
HL_PUBLIC double        hl_quantity_default (const HlQuantityKind *quantity, int number);
/* A value with its unit, as people read this quantity: like hl_units_format(), but ratios marked HL_QUANTITY_PERCENT
 * (efficiencies of the plant, pressure losses, moisture) as "38.21 %", the other ratios as "0.830".  g_free(). */
HL_PUBLIC char         *hl_quantity_format  (const HlQuantityKind *quantity, double si, HlUnitSet set);
/* The same with every digit, for entries: parses back to the same value in any unit set. */
HL_PUBLIC char         *hl_quantity_format_exact (const HlQuantityKind *quantity, double si, HlUnitSet set);

/* Quantities of the plant as a whole ("net_power" ...), and of a stream ("m", "p", "T", "h", "s", "x", "v"). */
HL_PUBLIC const HlQuantityKind *hl_plant_quantities  (guint *n);
HL_PUBLIC const HlQuantityKind *hl_stream_quantities (guint *n);
HL_PUBLIC const HlQuantityKind *hl_stream_quantity_lookup (const char *key);
HL_PUBLIC const HlQuantityKind *hl_plant_quantity_lookup  (const char *key);
G_END_DECLS
