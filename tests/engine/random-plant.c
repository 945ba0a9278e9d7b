/* The steam side of a random plant: boiler, expansion with all that takes steam from it, and where the exhaust goes.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "random-plant.h"
#include <math.h>
#include <string.h>

#define BETWEEN(b, purpose, n, low, high) random_between ((b)->seed, purpose, n, low, high)
#define CHANCE(b, purpose, n, share) random_chance ((b)->seed, purpose, n, share)

const char *
random_add (RandomBuild *b, const char *letter, const char *format, ...)
{
  int n = GPOINTER_TO_INT (g_hash_table_lookup (b->counts, letter)) + 1;
  g_hash_table_insert (b->counts, (gpointer) letter, GINT_TO_POINTER (n));
  va_list args;
  va_start (args, format);
  g_autofree char *words = g_strdup_vprintf (format, args), *id = g_strdup_printf ("%s%d", letter, n);
  va_end (args);
  char *space = strchr (words, ' ');
  int length = space != NULL ? (int) (space - words) : (int) strlen (words);
  g_string_append_printf (b->items, "new %.*s %s%s\n", length, words, id, space != NULL ? space : "");
  return g_intern_string (id);
}

const char *
random_port (const char *id, const char *format, ...)
{
  va_list args;
  va_start (args, format);
  g_autofree char *port = g_strdup_vprintf (format, args), *whole = g_strconcat (id, ".", port, NULL);
  va_end (args);
  return g_intern_string (whole);
}

void
random_join (RandomBuild *b, const char *from, const char *to)
{
  g_string_append_printf (b->lines, "%s > %s\n", from, to);
}

void
random_return (RandomBuild *b, const char *port, double p, double T, int slot, gboolean is_free)
{
  g_assert (b->n_returns < MOST_RETURNS);
  b->returns[b->n_returns++] = (RandomReturn) { port, p, T, slot, is_free };
}

double
random_T_sat (double p)
{
  HlSaturation sat;
  g_assert_cmpint (hl_fluid_saturation_p (hl_fluid_water (), p, &sat), ==, HL_OK);
  return sat.T;
}

double
random_p_sat (double T)
{
  HlSaturation sat;
  g_assert_cmpint (hl_fluid_saturation_T (hl_fluid_water (), T, &sat), ==, HL_OK);
  return sat.p;
}

/* --- where the exhaust goes ------------------------------------------------------ */

static void
choose_end (RandomBuild *b)
{
  double rise = BETWEEN (b, "rise", 0, 6.0, 14.0), least = BETWEEN (b, "condenser-ttd", 0, 2.8, 8.0);
  switch (b->d->sink)
    {
    case SINK_TOWER: b->T_end = BETWEEN (b, "wet-bulb", 0, 280.0, 297.0) + BETWEEN (b, "approach", 0, 3.0, 10.0) + rise + least; break;
    case SINK_AIR: b->T_end = BETWEEN (b, "air", 0, 270.0, 308.0) + BETWEEN (b, "itd", 0, 12.0, 35.0); break;
    case SINK_PLAIN: b->T_end = random_T_sat (random_decades (b->seed, "vacuum", 0, 3500.0, 15000.0)); break;
    case SINK_PROCESS: b->T_end = random_T_sat (random_decades (b->seed, "back-pressure", 0, 2e5, 10e5)); break;
    case SINK_DISTRICT: b->T_end = BETWEEN (b, "flow-T", 9, 335.0, 390.0) + BETWEEN (b, "district-ttd", 9, 2.0, 8.0); break;
    default: b->T_end = BETWEEN (b, "cooling-T", 0, 278.0, 300.0) + rise + least;
    }
  b->p_end = random_p_sat (b->T_end);
}

static void
add_water_cooled (RandomBuild *b, const char *exhaust)
{
  double rise = BETWEEN (b, "rise", 0, 6.0, 14.0), least = BETWEEN (b, "condenser-ttd", 0, 2.8, 8.0);
  double subcooling = b->d->trims ? BETWEEN (b, "subcooling", 0, 0.0, 4.0) : 0.0;
  double loss = b->d->trims ? BETWEEN (b, "water-loss", 0, 0.0, 0.2) : 0.0;
  g_autofree char *inlet = b->d->sink == SINK_CONDENSER ? g_strdup_printf ("cooling_inlet_T=%.12g", b->T_end - rise - least) : g_strdup ("-cooling_inlet_T -cooling_p");
  const char *c = random_add (b, "C", "condenser %s cooling_rise=%.6g terminal_difference=%.6g subcooling=%.6g cooling_pressure_loss=%.6g", inlet, rise, least, subcooling, loss);
  random_join (b, exhaust, random_port (c, "steam"));
  b->source = random_port (c, "condensate");
  b->drain_port = random_port (c, "drain");
  if (b->d->sink == SINK_LINES)
    {
      const char *from = random_add (b, "Y", "boundary direction:0 outlet.p=3e5 outlet.T=%.12g", b->T_end - rise - least), *to = random_add (b, "Y", "boundary direction:1");
      random_join (b, random_port (from, "outlet"), random_port (c, "cooling_inlet"));
      random_join (b, random_port (c, "cooling_outlet"), random_port (to, "inlet"));
    }
  if (b->d->sink == SINK_TOWER)
    {
      const char *tower = random_add (b, "CT", "cooling_tower air:1 wet_bulb_T=%.12g approach=%.12g", BETWEEN (b, "wet-bulb", 0, 280.0, 297.0), BETWEEN (b, "approach", 0, 3.0, 10.0));
      const char *pump = random_add (b, "P", "pump isentropic_efficiency=%.4g", BETWEEN (b, "circulating", 0, 0.65, 0.87));
      random_join (b, random_port (tower, "water_outlet"), random_port (pump, "inlet"));
      random_join (b, random_port (pump, "outlet"), random_port (c, "cooling_inlet"));
      random_join (b, random_port (c, "cooling_outlet"), random_port (tower, "water_inlet"));
    }
}

static double
return_share (RandomBuild *b, int n)
{
  return CHANCE (b, "loses", n, 0.4) ? BETWEEN (b, "return-share", n, 0.2, 0.95) : 1.0;
}

/* Water that makes up for what processes keep: one place for all, else their shares would be open. */
static void
add_make_up (RandomBuild *b, double share)
{
  if (share < 1.0 && !b->has_make_up)
    {
      b->has_make_up = TRUE;
      double T = BETWEEN (b, "make-up-T", 0, 278.0, 300.0);
      random_return (b, random_port (random_add (b, "W", "make_up outlet.T=%.6g", T), "outlet"), NAN, T, -1, TRUE);
    }
}

static void
add_sink (RandomBuild *b, const char *exhaust)
{
  const char *id;
  double share;
  b->p_source = b->p_end;
  switch (b->d->sink)
    {
    case SINK_AIR:
      id = random_add (b, "AC", "air_condenser air:1 ambient_T=%.12g initial_difference=%.12g fan_fraction=%.4g", BETWEEN (b, "air", 0, 270.0, 308.0),
                       BETWEEN (b, "itd", 0, 12.0, 35.0), BETWEEN (b, "fans", 0, 0.007, 0.025));
      break;
    case SINK_PLAIN:
      id = random_add (b, "C", "condenser cooling:1 steam.p=%.12g", b->p_end);
      break;
    case SINK_PROCESS:
      share = return_share (b, 9);
      b->p_source = fmax (BETWEEN (b, "condensate-p", 9, 0.5, 0.95) * b->p_end, 1.1e5);
      id = random_add (b, "U", "steam_user return_fraction=%.6g condensate.T=%.6g condensate.p=%.12g", share, BETWEEN (b, "condensate-T", 9, 320.0, 365.0), b->p_source);
      random_join (b, exhaust, random_port (id, "steam"));
      b->source = random_port (id, "condensate");
      add_make_up (b, share);
      return;
    case SINK_DISTRICT:
      id = random_add (b, "DH", "district_heater flow_T=%.12g terminal_difference=%.12g return_T=%.6g", BETWEEN (b, "flow-T", 9, 335.0, 390.0),
                       BETWEEN (b, "district-ttd", 9, 2.0, 8.0), BETWEEN (b, "return-T", 9, 305.0, 325.0));
      random_join (b, exhaust, random_port (id, "steam"));
      b->source = random_port (id, "drain");
      b->drain_port = random_port (id, "drain_inlet");
      return;
    default:
      add_water_cooled (b, exhaust);
      return;
    }
  random_join (b, exhaust, random_port (id, "steam"));
  b->source = random_port (id, "condensate");
  b->drain_port = random_port (id, "drain");
}

/* --- what takes steam ------------------------------------------------------------- */

typedef enum { TAKES_HEATER, TAKES_USER, TAKES_DISTRICT, TAKES_FEED_TURBINE, TAKES_TRANSFORMER, TAKES_NOTHING, REHEAT } Taker;
typedef struct { double p; Taker taker; int n; double loss; } Point;

enum { MOST_POINTS = 32 };
typedef struct { Point at[MOST_POINTS]; int n; } Points;

static void
add_point (Points *points, double p, Taker taker, int n, double loss)
{
  points->at[points->n++] = (Point) { p, taker, n, loss };
}

static int
compare_points (gconstpointer a, gconstpointer b)
{
  const Point *first = a, *second = b;
  return first->p < second->p ? 1 : first->p > second->p ? -1 : 0;
}

/* Saturation temperatures of the heaters, from the exhaust's upwards. */
static void
choose_heaters (RandomBuild *b)
{
  double T_most = fmin (random_T_sat (fmin (0.7 * b->p_live, 160e5)), 570.0);
  int n = MIN (b->d->heaters, (int) ((T_most - b->T_end - 12.0) / 14.0));
  b->n_heaters = MAX (n, 0);
  if (b->n_heaters == 0)
    return;
  double rise = fmax (BETWEEN (b, "final-T", 0, 0.45, 0.9) * (T_most - b->T_end), 14.0 * n) / n;
  for (int k = 0; k < n; k++)
    {
      b->T_heater[k] = b->T_end + rise * (k + 1 + (k + 1 < n ? BETWEEN (b, "uneven", k, -0.2, 0.2) : 0.0));
      b->p_heater[k] = random_p_sat (b->T_heater[k]);
    }
  for (int k = 0; k < b->d->open_heaters; k++)
    b->is_open[random_below (b->seed, "which-open", k, n)] = TRUE;
}

/* Steam for heaters, from the hottest down: not from where a reheater has just lost its pressure, but from before it. */
static void
add_heaters (RandomBuild *b, Points *points, const double *reheat, int n_reheats)
{
  double above = b->p_live;
  gboolean taken[2] = { FALSE, FALSE };
  int lowest = 0;
  for (int k = b->n_heaters - 1; k >= 0; k--)
    {
      double loss = b->d->trims && CHANCE (b, "heater-pipe", k, 0.6) ? BETWEEN (b, "pipe-loss", k, 0.02, 0.06) : 0.0;
      double p = fmin (b->p_heater[k] / (1.0 - loss), above / 1.15);
      for (int j = 0; j < n_reheats; j++)
        if (p > 0.78 * reheat[j] && p < 1.1 * reheat[j])
          {
            p = taken[j] ? 0.78 * reheat[j] : reheat[j];
            taken[j] = TRUE;
          }
      if (p < 1.15 * b->p_end)
        {
          lowest = k + 1;
          break;
        }
      add_point (points, p, TAKES_HEATER, k, loss);
      above = p;
    }
  /* Where there was no room for the coldest ones, the others take their places. */
  b->n_heaters -= lowest;
  for (int k = 0; k < b->n_heaters; k++)
    b->is_open[k] = b->is_open[k + lowest];
  for (int k = 0; k < points->n; k++)
    if (points->at[k].taker == TAKES_HEATER)
      points->at[k].n -= lowest;
}

static void
choose_points (RandomBuild *b, Points *points)
{
  double p = b->p_live, reheat[2];
  int n_reheats = 0;
  for (int k = 0; k < b->d->reheats && p > 12.0 * b->p_end; k++)
    {
      p *= BETWEEN (b, "reheat-ratio", k, 0.16, 0.34);
      if (p > 3.0 * b->p_end)
        {
          reheat[n_reheats++] = p;
          add_point (points, p, REHEAT, n_reheats, 0.0);
        }
    }
  add_heaters (b, points, reheat, n_reheats);
  double highest = 0.5 * b->p_live, lowest = 1.3 * b->p_end;
  if (highest < 1.5 * lowest)
    return;
  for (int k = 0; k < b->d->users; k++)
    add_point (points, random_decades (b->seed, "user-p", k, fmax (lowest, 1.5e5), fmax (fmin (highest, 25e5), 2e5)), TAKES_USER, k, 0.0);
  if (b->d->districts)
    add_point (points, fmax (random_p_sat (BETWEEN (b, "flow-T", 0, 335.0, 390.0) + 6.0), lowest), TAKES_DISTRICT, 0, 0.0);
  if (b->d->feed_turbine && b->d->sink <= SINK_PLAIN)
    add_point (points, fmin (random_decades (b->seed, "feed-turbine-p", 0, 3e5, 14e5), highest), TAKES_FEED_TURBINE, 0, 0.0);
  if (b->d->transformer)
    add_point (points, random_decades (b->seed, "transformer-p", 0, fmax (lowest, 3e5), fmax (fmin (highest, 20e5), 4e5)), TAKES_TRANSFORMER, 0, 0.0);
  for (int k = 0; k < b->d->splits; k++)
    add_point (points, random_decades (b->seed, "split-p", k, lowest, highest), TAKES_NOTHING, k, 0.0);
}

static gboolean
is_same (double a, double b)
{
  return fabs (a / b - 1.0) < 1e-9;
}

/* All but heaters and reheats give way: to the reheat, where they would lie just below it, or to a place off their neighbours. */
static void
settle_points (Points *points)
{
  int kept = 0;
  qsort (points->at, (gsize) points->n, sizeof (Point), compare_points);
  for (int k = 0; k < points->n; k++)
    {
      Point point = points->at[k];
      gboolean gives_way = point.taker != REHEAT && point.taker != TAKES_HEATER;
      for (int j = 0; gives_way && j < points->n; j++)
        if (points->at[j].taker == REHEAT && point.p > 0.78 * points->at[j].p && point.p < 1.1 * points->at[j].p)
          point.p = points->at[j].p;
      for (int j = 0; gives_way && j < points->n; j++)
        if (points->at[j].taker == TAKES_HEATER && point.p > 0.9 * points->at[j].p && point.p < 1.1 * points->at[j].p)
          point.p = points->at[j].p;
      /* Two that take steam at the same place take it by splitters; two ends of sections are one. */
      if (gives_way && point.taker == TAKES_NOTHING && kept > 0 && points->at[kept - 1].p < 1.1 * point.p)
        continue;
      if (gives_way && kept > 0 && !is_same (points->at[kept - 1].p, point.p) && points->at[kept - 1].p < 1.08 * point.p)
        point.p = points->at[kept - 1].p;
      points->at[kept++] = point;
    }
  points->n = kept;
  qsort (points->at, (gsize) points->n, sizeof (Point), compare_points);
  /* The reheat comes last among those at its pressure: they take cold steam. */
  for (int k = 0; k + 1 < points->n; k++)
    if (points->at[k].taker == REHEAT && is_same (points->at[k].p, points->at[k + 1].p))
      {
        Point reheat = points->at[k];
        points->at[k] = points->at[k + 1];
        points->at[k + 1] = reheat;
      }
}

/* A closed circuit of its own that makes steam for a process from the plant's. */
static void
add_transformer (RandomBuild *b, const char *steam, double p)
{
  double T = random_T_sat (p), p_cold = random_p_sat (T - BETWEEN (b, "transformer-dT", 0, 12.0, 30.0));
  const char *e = random_add (b, "E", "exchanger -pinch hot_outlet.T=%.12g", T - BETWEEN (b, "transformer-out", 0, 2.0, 8.0));
  const char *user = random_add (b, "U", "steam_user heat=%.6g condensate.T=%.6g condensate.p=%.12g", b->size * BETWEEN (b, "transformer-heat", 0, 0.02, 0.15),
                                 BETWEEN (b, "transformer-condensate", 0, 330.0, 360.0), fmin (2.5e5, 0.8 * p_cold));
  const char *pump = random_add (b, "P", "pump outlet.p=%.12g", p_cold);
  const char *cold = CHANCE (b, "transformer-x", 0, 0.5) ? "x=0.97" : NULL;
  if (cold != NULL)
    g_string_append_printf (b->rest, "set %s.steam.%s\n", user, cold);
  else
    g_string_append_printf (b->rest, "set %s.steam.T=%.12g\n", user, random_T_sat (p_cold) + 2.0);
  random_join (b, steam, random_port (e, "hot_inlet"));
  random_join (b, random_port (user, "condensate"), random_port (pump, "inlet"));
  random_join (b, random_port (pump, "outlet"), random_port (e, "cold_inlet"));
  random_join (b, random_port (e, "cold_outlet"), random_port (user, "steam"));
  random_return (b, random_port (e, "hot_outlet"), p, T - 5.0, -1, FALSE);
}

static void
add_district (RandomBuild *b, const char *steam)
{
  double flow_T = BETWEEN (b, "flow-T", 0, 335.0, 390.0), least = BETWEEN (b, "district-ttd", 0, 2.0, 5.0), subcooling = BETWEEN (b, "district-sub", 0, 0.0, 5.0);
  const char *valve = random_add (b, "V", "valve");
  const char *id = random_add (b, "DH", "district_heater heat=%.6g flow_T=%.12g terminal_difference=%.6g return_T=%.6g drain_subcooling=%.6g",
                               b->size * BETWEEN (b, "district-heat", 0, 0.02, 0.3), flow_T, least, BETWEEN (b, "return-T", 0, 305.0, 325.0), subcooling);
  random_join (b, steam, random_port (valve, "inlet"));
  random_join (b, random_port (valve, "outlet"), random_port (id, "steam"));
  random_return (b, random_port (id, "drain"), random_p_sat (flow_T + least), flow_T + least - subcooling, -1, FALSE);
}

static void
add_user (RandomBuild *b, const char *steam, int n)
{
  double share = return_share (b, n), T = BETWEEN (b, "condensate-T", n, 320.0, 365.0);
  if (b->d->spray && b->spray_port == NULL)
    {
      const char *spray = random_add (b, "DS", "desuperheater -outlet.T outlet_superheat=%.6g", BETWEEN (b, "superheat", 0, 5.0, 12.0));
      random_join (b, steam, random_port (spray, "steam"));
      b->spray_port = random_port (spray, "spray");
      steam = random_port (spray, "outlet");
    }
  const char *id = random_add (b, "U", "steam_user heat=%.6g return_fraction=%.6g condensate.T=%.6g condensate.p=%%P%d", b->size * BETWEEN (b, "user-heat", n, 0.02, 0.25), share, T, b->n_returns);
  random_join (b, steam, random_port (id, "steam"));
  random_return (b, random_port (id, "condensate"), NAN, T, -1, FALSE);
  add_make_up (b, share);
}

/* What takes steam at this point is joined to @steam. */
static void
serve (RandomBuild *b, const Point *point, const char *steam, const char **turbine_exhaust)
{
  switch (point->taker)
    {
    case TAKES_HEATER:
      if (point->loss > 0.0)
        {
          const char *pipe = random_add (b, "L", "pipe pressure_loss=%.12g", point->loss);
          random_join (b, steam, random_port (pipe, "inlet"));
          steam = random_port (pipe, "outlet");
        }
      b->heater_steam[point->n] = steam;
      b->p_heater[point->n] = point->p * (1.0 - point->loss);
      b->T_heater[point->n] = random_T_sat (b->p_heater[point->n]);
      break;
    case TAKES_USER: add_user (b, steam, point->n); break;
    case TAKES_DISTRICT: add_district (b, steam); break;
    case TAKES_TRANSFORMER: add_transformer (b, steam, point->p); break;
    case TAKES_FEED_TURBINE:
      b->feed_pump = random_add (b, "T", "turbine -inlet.p isentropic_efficiency=%.4g", BETWEEN (b, "feed-turbine", 0, 0.72, 0.84));
      random_join (b, steam, random_port (b->feed_pump, "inlet"));
      *turbine_exhaust = random_port (b->feed_pump, "exhaust");
      break;
    default: break;
    }
}

/* --- the expansion ---------------------------------------------------------------- */

typedef struct {
  GString *shafts[2];
  int n;
} Shafts;

/* One section from @inlet through the points up to @last, which is where it ends; returns the port of its exhaust. */
static const char *
add_section (RandomBuild *b, const Points *points, int first, int last, const char *inlet, double p_inlet, double p_exhaust, gboolean is_last,
             const char **turbine_exhaust, Shafts *shafts)
{
  int number = shafts->n++, n_extractions = 0, n_groups;
  GString *words = g_string_new (NULL);
  for (int k = first; k < last; k++)
    n_extractions += points->at[k].taker != TAKES_NOTHING;
  n_groups = n_extractions + 1;
  gboolean tricks = b->d->tricks && !CHANCE (b, "plain-section", number, 0.4);
  g_string_append_printf (words, "turbine extractions:%d", n_extractions);
  if (tricks)
    g_string_append_printf (words, " expansion:%d wetness:%d leaving_loss:%d", CHANCE (b, "straight", number, 0.3), CHANCE (b, "baumann", number, 0.3), is_last && CHANCE (b, "leaving", number, 0.4));
  if (p_inlet > 0.0)
    g_string_append_printf (words, " inlet.p=%.12g", p_inlet);
  else
    g_string_append (words, " -inlet.p");
  int extraction = 0;
  for (int k = first; k < last; k++)
    if (points->at[k].taker != TAKES_NOTHING)
      g_string_append_printf (words, " extraction%d.p=%.12g", ++extraction, points->at[k].p);
  if (p_exhaust > 0.0)
    g_string_append_printf (words, " exhaust.p=%.12g", p_exhaust);
  g_string_append_printf (words, " isentropic_efficiency=%.5g mechanical_efficiency=%.5g", BETWEEN (b, "efficiency", number, 0.72, 0.92), BETWEEN (b, "mechanical", number, 0.96, 0.995));
  for (int k = 1; tricks && k <= n_groups; k++)
    if (CHANCE (b, "own-efficiency", 16 * number + k, 0.2) && strstr (words->str, "expansion:1") == NULL)
      g_string_append_printf (words, " group_efficiency%d=%.5g", k, BETWEEN (b, "group-efficiency", 16 * number + k, 0.7, 0.93));
  const char *id = random_add (b, "T", "%s", words->str);
  g_string_free (words, TRUE);
  g_string_append_printf (shafts->shafts[b->d->second_shaft && number > 0], " %s", id);
  random_join (b, inlet, random_port (id, "inlet"));
  extraction = 0;
  for (int k = first; k < last; k++)
    if (points->at[k].taker != TAKES_NOTHING)
      serve (b, &points->at[k], random_port (id, "extraction%d", ++extraction), turbine_exhaust);
  return random_port (id, "exhaust");
}

/* Takers at the exhaust of a section, by splitters. */
static const char *
serve_exhaust (RandomBuild *b, const Points *points, int first, int last, const char *exhaust, const char **turbine_exhaust)
{
  for (int k = first; k < last; k++)
    if (points->at[k].taker != TAKES_NOTHING)
      {
        const char *split = random_add (b, "X", "splitter outlets:2");
        random_join (b, exhaust, random_port (split, "inlet"));
        exhaust = random_port (split, "outlet1");
        serve (b, &points->at[k], random_port (split, "outlet2"), turbine_exhaust);
      }
  return exhaust;
}

/* Water taken out between two sections, where there may be some. */
static const char *
add_separator (RandomBuild *b, const char *steam, double p)
{
  double loss = BETWEEN (b, "separator-loss", 0, 0.01, 0.04);
  const char *id = random_add (b, "MS", "moisture_separator pressure_loss=%.6g separation=%.6g", loss, BETWEEN (b, "separation", 0, 0.7, 0.99));
  random_join (b, steam, random_port (id, "inlet"));
  p *= 1.0 - loss;
  random_return (b, random_port (id, "drain"), p, random_T_sat (p), -1, FALSE);
  return random_port (id, "steam");
}

static gboolean
same_pressure (const Points *points, int a, int c)
{
  return c < points->n && is_same (points->at[a].p, points->at[c].p);
}

static void
add_expansion (RandomBuild *b, const Points *points, const char *inlet, double p_inlet, Shafts *shafts)
{
  const char *turbine_exhaust = NULL;
  gboolean separated = FALSE;
  int first = 0;
  for (int k = 0; k < points->n; k++)
    {
      /* A section ends at a reheat, where one is to be split, and where it has extractions enough. */
      int group_end = k;
      while (same_pressure (points, k, group_end + 1))
        group_end++;
      gboolean is_reheat = points->at[group_end].taker == REHEAT;
      gboolean ends = is_reheat || group_end > k || k - first >= 6 || points->at[k].taker == TAKES_NOTHING;
      if (!ends)
        continue;
      const char *exhaust = add_section (b, points, first, k, inlet, p_inlet, points->at[k].p, FALSE, &turbine_exhaust, shafts);
      exhaust = serve_exhaust (b, points, k, group_end + !is_reheat, exhaust, &turbine_exhaust);
      p_inlet = -1.0;
      inlet = exhaust;
      if (is_reheat)
        {
          int n = points->at[group_end].n;
          random_join (b, exhaust, random_port (b->boiler, "cold_reheat%d", n));
          inlet = random_port (b->boiler, "hot_reheat%d", n);
        }
      else if (b->d->separator && !separated)
        {
          separated = TRUE;
          inlet = add_separator (b, exhaust, points->at[k].p);
        }
      else if (b->d->trims && CHANCE (b, "crossover", k, 0.5))
        {
          const char *pipe = random_add (b, "L", "pipe pressure_loss=%.6g heat_loss=%.6g", BETWEEN (b, "crossover-loss", k, 0.005, 0.03), b->size * BETWEEN (b, "crossover-heat", k, 0.0, 1e-3));
          random_join (b, exhaust, random_port (pipe, "inlet"));
          inlet = random_port (pipe, "outlet");
        }
      first = group_end + 1;
      k = group_end;
    }
  double p_exhaust = b->d->sink == SINK_PROCESS ? b->p_end : -1.0;
  const char *twin = NULL;
  if (b->d->twin)
    {
      const char *split = random_add (b, "X", "splitter outlets:2 fraction1=%.6g", BETWEEN (b, "twin-share", 0, 0.5, 0.75));
      random_join (b, inlet, random_port (split, "inlet"));
      inlet = random_port (split, "outlet1");
      twin = add_section (b, points, 0, 0, random_port (split, "outlet2"), -1.0, -1.0, TRUE, &turbine_exhaust, shafts);
    }
  const char *exhaust = add_section (b, points, first, points->n, inlet, p_inlet, p_exhaust, TRUE, &turbine_exhaust, shafts);
  for (int k = 0; k < 2; k++)
    if ((k == 0 ? twin : turbine_exhaust) != NULL)
      {
        const char *mixer = random_add (b, "M", "mixer inlets:2");
        random_join (b, exhaust, random_port (mixer, "inlet1"));
        random_join (b, k == 0 ? twin : turbine_exhaust, random_port (mixer, "inlet2"));
        exhaust = random_port (mixer, "outlet");
      }
  add_sink (b, exhaust);
}

static void
add_shafts (RandomBuild *b, const Shafts *shafts)
{
  for (int k = 0; k < 2; k++)
    {
      if (shafts->shafts[k]->len == 0)
        continue;
      const char *generator = random_add (b, "G", "generator efficiency=%.5g", BETWEEN (b, "generator", k, 0.95, 0.99));
      g_string_append_printf (b->rest, "shaft%s %s", shafts->shafts[k]->str, generator);
      if (k == 0 && b->d->gearbox)
        g_string_append_printf (b->rest, " %s", random_add (b, "GB", "gearbox efficiency=0.98"));
      g_string_append_c (b->rest, '\n');
    }
}

/* Live steam, from boiler or heat input to the first section; returns its port, and the pressure that is put in there or -1. */
static const char *
add_boiler (RandomBuild *b, const Points *points, double *p_inlet)
{
  int n = 0;
  GString *words = g_string_new (NULL);
  for (int k = 0; k < points->n; k++)
    n += points->at[k].taker == REHEAT;
  double loss = b->d->trims ? BETWEEN (b, "boiler-loss", 0, 0.03, 0.15) : 0.0;
  gboolean at_boiler = CHANCE (b, "p-at-boiler", 0, 0.3);
  g_string_append_printf (words, "reheats:%d steam.T=%.12g pressure_loss=%.6g", n, b->T_live, loss);
  for (int k = 1; k <= n; k++)
    g_string_append_printf (words, " hot_reheat%d.T=%.12g reheat_pressure_loss%d=%.6g", k, b->T_live + BETWEEN (b, "reheat-T", k, -15.0, 15.0), k, BETWEEN (b, "reheat-loss", k, 0.05, 0.12));
  double valve_loss = b->d->trims && CHANCE (b, "stop-valve", 0, 0.5) ? BETWEEN (b, "stop-loss", 0, 0.02, 0.05) : 0.0;
  if (at_boiler)
    g_string_append_printf (words, " steam.p=%.12g", b->p_live / (1.0 - valve_loss));
  b->boiler = CHANCE (b, "fired", 0, 0.7) ? random_add (b, "B", "boiler %s efficiency=%.5g", words->str, BETWEEN (b, "boiler", 0, 0.8, 0.95)) : random_add (b, "Q", "heat_input %s", words->str);
  g_string_free (words, TRUE);
  *p_inlet = at_boiler ? -1.0 : b->p_live;
  b->p_feed = b->p_live / (1.0 - valve_loss) / (1.0 - loss);
  const char *steam = random_port (b->boiler, "steam");
  if (valve_loss > 0.0)
    {
      const char *valve = random_add (b, "V", "valve pressure_loss=%.12g", valve_loss);
      random_join (b, steam, random_port (valve, "inlet"));
      steam = random_port (valve, "outlet");
    }
  return steam;
}

/* Pressures of condensate that had to wait until it was known where it flows. */
static char *
fill_in (RandomBuild *b, const char *text)
{
  GString *filled = g_string_new (NULL);
  for (const char *c = text; *c != '\0'; c++)
    if (c[0] == '%' && c[1] == 'P')
      {
        char *end;
        int n = (int) strtol (c + 2, &end, 10);
        g_string_append_printf (filled, "%.12g", b->returns[n].p);
        c = end - 1;
      }
    else
      g_string_append_c (filled, *c);
  return g_string_free (filled, FALSE);
}

char *
random_plant_text (const RandomDesign *design)
{
  RandomBuild b = { .d = design, .seed = design->seed, .items = g_string_new (NULL), .lines = g_string_new (NULL), .rest = g_string_new (NULL),
                    .counts = g_hash_table_new (g_str_hash, g_str_equal) };
  Points points = { .n = 0 };
  Shafts shafts = { { g_string_new (NULL), g_string_new (NULL) }, 0 };
  b.size = random_decades (b.seed, "size", 0, 5e5, 6e8);
  choose_end (&b);
  b.p_live = random_decades (b.seed, "live-p", 0, fmax (design->reheats > 0 ? 70e5 : 20e5, 4.0 * b.p_end), 260e5);
  b.T_live = random_between (b.seed, "live-T", 0, fmax (b.p_live < 220e5 ? random_T_sat (b.p_live) + 30.0 : 680.0, 640.0), 880.0);
  choose_heaters (&b);
  choose_points (&b, &points);
  settle_points (&points);
  double p_inlet;
  const char *steam = add_boiler (&b, &points, &p_inlet);
  add_expansion (&b, &points, steam, p_inlet, &shafts);
  random_feed (&b);
  add_shafts (&b, &shafts);
  g_string_append_printf (b.rest, "plant net_power=%.12g other_consumption_fraction=%.4g\n", b.size, random_between (b.seed, "others", 0, 0.0, 0.06));
  g_autofree char *items = fill_in (&b, b.items->str);
  char *text = g_strconcat (items, b.lines->str, b.rest->str, NULL);
  g_string_free (b.items, TRUE);
  g_string_free (b.lines, TRUE);
  g_string_free (b.rest, TRUE);
  g_hash_table_unref (b.counts);
  for (int k = 0; k < 2; k++)
    g_string_free (shafts.shafts[k], TRUE);
  return text;
}
