/* Random plants that can be solved: drawn up from a seed, written in the text of plants.h.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "plants.h"
G_BEGIN_DECLS

/* Where the exhaust goes. */
typedef enum {
  SINK_CONDENSER,         /* cooling water counted inside */
  SINK_LINES,             /* cooling water from boundary to boundary */
  SINK_TOWER,             /* with cooling tower and circulating pump */
  SINK_AIR,
  SINK_PLAIN,             /* pressure given, no cooling drawn */
  SINK_PROCESS,           /* back-pressure into a process */
  SINK_DISTRICT,          /* back-pressure into a heating network */
  N_SINKS
} RandomSink;

/* What is drawn; each a small number, so that a failing plant can be made smaller one by one. */
typedef struct {
  guint32 seed;
  int swaps;              /* values given instead of others */
  int users, districts, feed_turbine, transformer, spray, separator, twin, splits, second_shaft, gearbox;
  int reheats, heaters, open_heaters, forward;
  int trims;              /* valves, pipes and losses along the lines */
  int tricks;             /* options and efficiencies out of the common run */
  int sink;
} RandomDesign;

RandomDesign random_design       (guint32 seed);
/* The next simpler design after step *@step, which moves on; FALSE when there is none left. */
gboolean     random_simpler      (const RandomDesign *design, int *step, RandomDesign *simpler);
char        *random_describe     (const RandomDesign *design);
char        *random_plant_text   (const RandomDesign *design);      /* for test_plant() */

/* A number from 0 to 1 that only depends on the seed, its purpose and its count: what is left out moves nothing else. */
double       random_number       (guint32 seed, const char *purpose, int count);
int          random_below        (guint32 seed, const char *purpose, int count, int n);
double       random_between      (guint32 seed, const char *purpose, int count, double low, double high);
double       random_decades      (guint32 seed, const char *purpose, int count, double low, double high);   /* evenly in the logarithm */
gboolean     random_chance       (guint32 seed, const char *purpose, int count, double share);

/* --- for random-plant.c and random-feed.c ----------------------------------- */

enum { MOST_HEATERS = 9, MOST_RETURNS = 24 };

typedef struct {
  const char *port;       /* it comes from here */
  double      p, T;       /* about */
  int         slot;       /* behind that many heaters; -1: the lowest one warm enough */
  gboolean    is_free;    /* takes the pressure of what it flows into */
} RandomReturn;

typedef struct {
  const RandomDesign *d;
  guint32    seed;
  GString   *items, *lines, *rest;
  GHashTable *counts;
  double     p_live, T_live, p_end, T_end, p_feed;
  int        n_heaters;
  double     T_heater[MOST_HEATERS], p_heater[MOST_HEATERS];      /* saturation and shell, cold to hot */
  gboolean   is_open[MOST_HEATERS];
  const char *heater_steam[MOST_HEATERS];                         /* port that brings its steam */
  RandomReturn returns[MOST_RETURNS];
  int        n_returns;
  const char *source;     /* port of the condensate */
  double     p_source;
  const char *drain_port; /* of the condenser, while nothing flows in there */
  const char *boiler, *feed_pump;
  gboolean    has_make_up;
  const char *spray_port; /* waits for feed water */
  double     size;        /* net power [W] */
} RandomBuild;

const char *random_add   (RandomBuild *b, const char *letter, const char *format, ...) G_GNUC_PRINTF (3, 4);   /* "kind words": its id */
const char *random_port  (const char *id, const char *format, ...) G_GNUC_PRINTF (2, 3);
void        random_join  (RandomBuild *b, const char *from, const char *to);
void        random_return (RandomBuild *b, const char *port, double p, double T, int slot, gboolean is_free);
double      random_T_sat (double p);
double      random_p_sat (double T);
void        random_feed  (RandomBuild *b);        /* from the condensate to the boiler */
G_END_DECLS
