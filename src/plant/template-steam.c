/* Templates of steam power plants: simple, regenerative and reheat with any number of feedwater heaters.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/template-draft.h"
#include "plant/i18n.h"
#include <math.h>

#define MOST_HEATERS 8
#define HEATER_STEP 14        /* columns between heaters [grid units] */
#define TOP_ROW 9             /* turbines and generator */
#define STEAM_LANE 4          /* live steam above them */
#define REHEAT_LANE 1
#define EXHAUST_LANE 16
#define FIRST_LANE 19         /* of extraction steam; two units apart */
#define LOW_ROW 46            /* condensate pump, low-pressure heaters, deaerator */
#define HIGH_ROW 55           /* feed pump, high-pressure heaters */
#define LIVE_PRESSURE 50e5
#define LIVE_PRESSURE_REHEAT 125e5
#define REHEAT_PRESSURE 30e5
#define EXHAUST_GUESS 302.15  /* temperature of the condenser as the assumed cooling makes it, to share the heating out [K] */

/* Everything that the drawing needs to know before it begins. */
typedef struct {
  int      n, n_high, n_first;       /* heaters; above the deaerator; fed from the high-pressure section */
  gboolean has_reheat;
  double   p[MOST_HEATERS];          /* extraction pressures, the highest first [Pa] */
  int      heater_x[MOST_HEATERS];   /* columns, the deaerator's among them */
  int      pump_x, condenser_x, turbine1_x, turbine2_x;
  HlDraft  draft;
} Layout;

/* Equal temperature rises from the condenser to the feedwater; the end of the feedwater a part n/(n+1) of the way to
 * the boiler's saturation temperature, as is best for many small heaters, but at most 72 % of it.
 * Source: common practice, no source. */
static void
share_out (Layout *l, double live_pressure)
{
  HlSaturation saturation;
  double top = 550.0, part = fmin (l->n / (l->n + 1.0), 0.72);
  if (hl_fluid_saturation_p (hl_fluid_water (), live_pressure, &saturation) == HL_OK)
    top = saturation.T;
  for (int k = 0; k < l->n; k++)
    {
      double T = EXHAUST_GUESS + (top - EXHAUST_GUESS) * part * (l->n - k) / l->n, bar;
      if (hl_fluid_saturation_T (hl_fluid_water (), T, &saturation) == HL_OK)
        {
          bar = saturation.p / 1e5;
          l->p[k] = 1e5 * (bar >= 10.0 ? round (bar) : bar >= 1.0 ? round (10.0 * bar) / 10.0 : round (100.0 * bar) / 100.0);
        }
      if (l->has_reheat && l->p[k] > 1.05 * REHEAT_PRESSURE)
        l->n_first = k + 1;
    }
}

static void
place (Layout *l)
{
  int x = 24, first, last;
  l->n_high = l->n / 2;
  for (int k = 0; k < l->n_high; k++, x += HEATER_STEP)
    l->heater_x[k] = x;
  l->pump_x = x;
  if (l->n > 0)
    l->heater_x[l->n_high] = x += 20;
  for (int k = l->n_high + 1; k < l->n; k++)
    l->heater_x[k] = x += HEATER_STEP + (k == l->n_high + 1 ? 1 : 0);
  l->condenser_x = MAX (x + 24, l->has_reheat ? 84 : 44);
  first = 26 + MAX (2, l->n_first + 1);
  last = l->condenser_x - 22 - MAX (2, l->n - l->n_first + 1);
  l->turbine1_x = l->has_reheat ? first : l->n == 0 ? 26 : MAX (26 + l->n + 1, (first + last) / 2 - 2);
  l->turbine2_x = MAX (l->turbine1_x + l->n + 16, (l->turbine1_x + last) / 2 + 4);
  l->condenser_x = MAX (l->condenser_x, (l->has_reheat ? l->turbine2_x : l->turbine1_x) + l->n + 18);
}

static int
half_width (int extractions)
{
  return MAX (2, extractions + 1);
}

/* --- pieces ------------------------------------------------------------------------- */

static void
put_turbines (Layout *l)
{
  int n_last = l->n - l->n_first;
  const char *const one[] = { "T1", "G1" }, *const two[] = { "T1", "T2", "G1" };
  hl_draft_put (&l->draft, "boiler", "B1", _("boiler"), 8, 30, FALSE, "reheats", l->has_reheat ? 1 : 0);
  if (l->has_reheat)
    {
      hl_draft_put (&l->draft, "turbine", "T1", _("high-pressure section"), l->turbine1_x, TOP_ROW, FALSE, "extractions", l->n_first);
      hl_draft_put (&l->draft, "turbine", "T2", _("low-pressure section"), l->turbine2_x, TOP_ROW, FALSE, "extractions", n_last);
      hl_draft_assume (&l->draft, "plant.net_power", 100e6);
      hl_draft_assume (&l->draft, "T1.inlet.p", LIVE_PRESSURE_REHEAT);
      hl_draft_assume (&l->draft, "B1.steam.T", 813.15);
      hl_draft_assume (&l->draft, "B1.hot_reheat1.T", 813.15);
      hl_draft_assume (&l->draft, "T1.exhaust.p", REHEAT_PRESSURE);
      hl_draft_assume (&l->draft, "T2.inlet.p", NAN);
    }
  else
    {
      hl_draft_put (&l->draft, "turbine", "T1", _("turbine"), l->turbine1_x, TOP_ROW, FALSE, "extractions", l->n);
      hl_draft_assume (&l->draft, "T1.inlet.p", LIVE_PRESSURE);
      hl_draft_assume (&l->draft, "B1.steam.T", 803.15);
    }
  hl_draft_put (&l->draft, "generator", "G1", _("generator"),
                l->has_reheat ? l->turbine2_x + half_width (n_last) + 7 : l->turbine1_x + half_width (l->n) + 7, TOP_ROW, FALSE, NULL, 0);
  hl_draft_shaft (&l->draft, l->has_reheat ? two : one, l->has_reheat ? 3 : 2);
}

static void
draw_steam (Layout *l)
{
  int inlet1 = l->turbine1_x - half_width (l->has_reheat ? l->n_first : l->n);
  int exhaust1 = l->turbine1_x + half_width (l->n_first), inlet2 = l->turbine2_x - half_width (l->n - l->n_first);
  int exhaust2 = l->has_reheat ? l->turbine2_x + half_width (l->n - l->n_first) : l->turbine1_x + half_width (l->n);
  hl_draft_line (&l->draft, "B1.steam", "T1.inlet", HL_LANE (8, STEAM_LANE, inlet1));
  if (l->has_reheat)
    {
      const HlGridPoint hot[] = { { 14, 29 }, { 14, REHEAT_LANE }, { inlet2, REHEAT_LANE } };
      const HlGridPoint cold[] = { { exhaust1, EXHAUST_LANE }, { 17, EXHAUST_LANE }, { 17, 31 } };
      hl_draft_line (&l->draft, "T1.exhaust", "B1.cold_reheat1", cold, G_N_ELEMENTS (cold));
      hl_draft_line (&l->draft, "B1.hot_reheat1", "T2.inlet", hot, G_N_ELEMENTS (hot));
    }
  hl_draft_line (&l->draft, l->has_reheat ? "T2.exhaust" : "T1.exhaust", "C1.steam", HL_LANE (exhaust2, EXHAUST_LANE, l->condenser_x));
}

static char *
heater_port (int k, const char *port)
{
  return g_strdup_printf ("H%d.%s", k, port);
}

/* Heater of extraction @k; the deaerator has a letter of its own and is not counted. */
static int
heater_number (const Layout *l, int k)
{
  return k < l->n_high ? k + 1 : k;
}

/* Extraction @k, counted from the highest pressure; each runs in a lane of its own, so that no two cross. */
static void
draw_extraction (Layout *l, int k)
{
  gboolean is_first = k < l->n_first || !l->has_reheat;
  int number = is_first ? k + 1 : k - l->n_first + 1, of = l->has_reheat ? (is_first ? l->n_first : l->n - l->n_first) : l->n;
  int x = (is_first ? l->turbine1_x : l->turbine2_x) - half_width (of) + 2 * number, lane = l->heater_x[k] < x ? k : l->n - 1 - k;
  g_autofree char *from = g_strdup_printf ("%s.extraction%d", is_first ? "T1" : "T2", number);
  g_autofree char *pressure = g_strdup_printf ("%s.p", from);
  g_autofree char *to = k == l->n_high ? g_strdup ("D1.steam") : heater_port (heater_number (l, k), "steam");
  hl_draft_assume (&l->draft, pressure, l->p[k]);
  if (l->heater_x[k] == x)
    hl_draft_line (&l->draft, from, to, HL_STRAIGHT);
  else
    hl_draft_line (&l->draft, from, to, HL_LANE (x, FIRST_LANE + 2 * lane, l->heater_x[k]));
}

/* Condenser and condensate pump at the right, the heaters against the flow of the drawing, the deaerator between the rows. */
static void
put_feed_train (Layout *l)
{
  hl_draft_put (&l->draft, "condenser", "C1", _("condenser"), l->condenser_x, 30, FALSE, NULL, 0);
  hl_draft_assume (&l->draft, "C1.cooling_inlet_T", 293.15);
  hl_draft_put (&l->draft, "pump", "P1", l->n > 0 ? _("condensate pump") : _("feed pump"), l->condenser_x - 8, LOW_ROW, TRUE, NULL, 0);
  for (int k = 0; k < l->n; k++)
    {
      g_autofree char *id = g_strdup_printf ("H%d", heater_number (l, k));
      if (k != l->n_high)
        hl_draft_put (&l->draft, "closed_heater", id, "", l->heater_x[k], k < l->n_high ? HIGH_ROW : LOW_ROW, FALSE, NULL, 0);
    }
  if (l->n == 0)
    return;
  hl_draft_put (&l->draft, "open_heater", "D1", _("deaerator"), l->heater_x[l->n_high], LOW_ROW, FALSE, "inlets", l->n_high > 0 ? 2 : 1);
  hl_draft_put (&l->draft, "pump", "P2", _("feed pump"), l->pump_x, HIGH_ROW, TRUE, NULL, 0);
  if (l->n_high > 0)
    hl_draft_put (&l->draft, "valve", "V1", _("drain valve"), l->pump_x, HIGH_ROW + 6, FALSE, NULL, 0);
}

static void
draw_feed_water (Layout *l)
{
  g_autofree char *from = g_strdup ("P1.outlet");
  hl_draft_line (&l->draft, "C1.condensate", "P1.inlet", HL_BEND (l->condenser_x, LOW_ROW));
  for (int k = l->n - 1; k >= 0; k--)
    {
      g_autofree char *in = k == l->n_high ? g_strdup ("D1.inlet1") : heater_port (heater_number (l, k), "feed_inlet");
      hl_draft_line (&l->draft, from, in, HL_STRAIGHT);
      g_free (from);
      if (k == l->n_high)
        {
          hl_draft_line (&l->draft, "D1.outlet", "P2.inlet", HL_BEND (l->heater_x[k], HIGH_ROW));
          from = g_strdup ("P2.outlet");
        }
      else
        from = heater_port (heater_number (l, k), "feed_outlet");
    }
  hl_draft_line (&l->draft, from, "B1.feed", HL_BEND (8, l->n > 0 ? HIGH_ROW : LOW_ROW));
}

/* From heater @k below the row to the next colder one of the same row. */
static void
draw_cascade (Layout *l, int k, int row)
{
  int x = l->heater_x[k], next = l->heater_x[k + 1] - 5;
  const HlGridPoint bends[] = { { x, row + 5 }, { next, row + 5 }, { next, row - 1 } };
  g_autofree char *from = heater_port (heater_number (l, k), "drain"), *to = heater_port (heater_number (l, k + 1), "drain_inlet");
  hl_draft_line (&l->draft, from, to, bends, G_N_ELEMENTS (bends));
}

/* Drains run to the next colder heater; the last of the upper ones is throttled into the deaerator, the last of all runs
 * into the condenser. */
static void
draw_drains (Layout *l)
{
  for (int k = 0; k < l->n; k++)
    {
      g_autofree char *from = heater_port (heater_number (l, k), "drain");
      int x = l->heater_x[k], tank = l->heater_x[l->n_high] - 8, rise = l->condenser_x - 14;
      if (k == l->n_high - 1)
        {
          const HlGridPoint bends[] = { { tank, HIGH_ROW + 6 }, { tank, LOW_ROW } };
          hl_draft_line (&l->draft, from, "V1.inlet", HL_BEND (x, HIGH_ROW + 6));
          hl_draft_line (&l->draft, "V1.outlet", "D1.inlet2", bends, G_N_ELEMENTS (bends));
        }
      else if (k == l->n - 1 && k != l->n_high)
        {
          const HlGridPoint bends[] = { { x, LOW_ROW + 5 }, { rise, LOW_ROW + 5 }, { rise, 29 } };
          hl_draft_line (&l->draft, from, "C1.drain", bends, G_N_ELEMENTS (bends));
        }
      else if (k != l->n_high)
        draw_cascade (l, k, k < l->n_high ? HIGH_ROW : LOW_ROW);
    }
}

static char *
title (int heaters, gboolean has_reheat)
{
  if (heaters == 0)
    return g_strdup (_("Simple loop"));
  return g_strdup_printf (has_reheat ? ngettext ("Reheat plant with %d feedwater heater", "Reheat plant with %d feedwater heaters", (gulong) heaters)
                                     : ngettext ("Plant with %d feedwater heater", "Plant with %d feedwater heaters", (gulong) heaters), heaters);
}

HlPlant *
hl_template_steam_build (int heaters, gboolean has_reheat)
{
  Layout l = { .n = MIN (heaters, MOST_HEATERS), .has_reheat = has_reheat, .draft = hl_draft_begin (title (heaters, has_reheat)) };
  share_out (&l, has_reheat ? LIVE_PRESSURE_REHEAT : LIVE_PRESSURE);
  place (&l);
  put_turbines (&l);
  put_feed_train (&l);
  draw_steam (&l);
  draw_feed_water (&l);
  draw_drains (&l);
  for (int k = 0; k < l.n; k++)
    draw_extraction (&l, k);
  return hl_draft_end (&l.draft);
}
