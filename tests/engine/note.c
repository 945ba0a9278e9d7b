/* The calculation note, replayed: a small calculator of its own reads each formula, puts in the terms, and has to arrive at
 * the number that the solver found.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plants.h"
#include "engine/note.h"
#include <math.h>
#include <string.h>

/* --- a calculator ------------------------------------------------------------------ */

/* A number and whether it is an entropy: h(p, T) and h(p, s) are told apart by that. */
typedef struct { double v; gboolean is_entropy; } Number;

typedef struct {
  const HlNoteLine *line;
  const char *at;
  double result;              /* put in instead of the line's own */
} Calculator;

static Number sum (Calculator *c);

static void
skip (Calculator *c)
{
  while (*c->at == ' ')
    c->at++;
}

static gboolean
take (Calculator *c, const char *sign)
{
  skip (c);
  if (!g_str_has_prefix (c->at, sign))
    return FALSE;
  c->at += strlen (sign);
  return TRUE;
}

static guint
arguments (Calculator *c, Number *list, guint most)
{
  guint n = 0;
  do
    {
      g_assert_cmpuint (n, <, most);
      list[n++] = sum (c);
    }
  while (take (c, ","));
  g_assert_true (take (c, ")"));
  return n;
}

static HlState
state_ph (const Calculator *c, const Number *a)
{
  HlState st;
  g_assert_cmpint (hl_fluid_state_ph (c->line->fluid, a[0].v, a[1].v, &st), ==, HL_OK);
  return st;
}

static gboolean
call (Calculator *c, Number *out)
{
  static const char *const names[] = { "T_sat(", "h′(", "h″(", "h(", "s(", "T(", "v(", "ln(", "max(", "min(", "sqrt(", "p_sat(" };
  Number a[40];
  guint which = 0, n;
  HlState st;
  HlSaturation sat;
  while (which < G_N_ELEMENTS (names) && !take (c, names[which]))
    which++;
  if (which == G_N_ELEMENTS (names))
    return FALSE;
  n = arguments (c, a, G_N_ELEMENTS (a));
  *out = (Number) { 0.0, which == 4 };
  if (which <= 2)
    {
      g_assert_cmpint (hl_fluid_saturation_p (c->line->fluid, a[0].v, &sat), ==, HL_OK);
      out->v = which == 0 ? sat.T : which == 1 ? sat.h_liquid : sat.h_vapour;
    }
  else if (which == 3 && a[1].is_entropy)
    {
      g_assert_cmpint (hl_fluid_state_ps (c->line->fluid, a[0].v, a[1].v, &st), ==, HL_OK);
      out->v = st.h;
    }
  else if (which == 3)
    {
      /* On the saturation line itself, what is asked for is the liquid. */
      if (hl_fluid_saturation_p (c->line->fluid, a[0].v, &sat) == HL_OK && fabs (a[1].v - sat.T) < 1e-9)
        out->v = sat.h_liquid;
      else
        {
          g_assert_cmpint (hl_fluid_state_pT (c->line->fluid, a[0].v, a[1].v, &st), ==, HL_OK);
          out->v = st.h;
        }
    }
  else if (which <= 6)
    {
      st = state_ph (c, a);
      out->v = which == 4 ? st.s : which == 5 ? st.T : st.v;
    }
  else if (which == 7)
    out->v = log (a[0].v);
  else if (which == 10)
    out->v = sqrt (a[0].v);
  else if (which == 11)
    {
      g_assert_cmpint (hl_fluid_saturation_T (c->line->fluid, state_ph (c, a).T, &sat), ==, HL_OK);
      out->v = sat.p;
    }
  else
    for (guint k = 0; k < n; k++)
      out->v = k == 0 ? a[k].v : which == 8 ? fmax (out->v, a[k].v) : fmin (out->v, a[k].v);
  return TRUE;
}

static Number
primary (Calculator *c)
{
  Number number = { 0.0, FALSE };
  char *end;
  if (call (c, &number))
    return number;
  if (take (c, "−"))
    {
      number = primary (c);
      number.v = -number.v;
      return number;
    }
  if (take (c, "("))
    {
      number = sum (c);
      g_assert_true (take (c, ")"));
      return number;
    }
  if (take (c, "{"))
    {
      guint k = (guint) g_ascii_strtoull (c->at, &end, 10);
      g_assert_cmpuint (k, <, c->line->n_terms);
      c->at = end;
      g_assert_true (take (c, "}"));
      const HlNoteTerm *term = &c->line->terms[k];
      gboolean is_result = k == c->line->result || g_str_equal (term->name, c->line->terms[c->line->result].name);
      return (Number) { is_result ? c->result : term->value, term->dimension == HL_DIMENSION_ENTROPY };
    }
  skip (c);
  if (*c->at == 'g' && !g_ascii_isalpha (c->at[1]))
    {
      c->at++;
      return (Number) { 9.80665, FALSE };      /* standard acceleration of free fall */
    }
  number.v = g_ascii_strtod (c->at, &end);
  if (end == c->at)
    g_error ("“%s”: cannot read “%s”", c->line->formula, c->at);
  c->at = end;
  return number;
}

/* With the root before it and the square behind it. */
static Number
power (Calculator *c)
{
  gboolean is_root = take (c, "√");
  Number number = primary (c);
  if (take (c, "²"))
    number.v *= number.v;
  if (is_root)
    number.v = sqrt (number.v);
  return number;
}

static Number
product (Calculator *c)
{
  Number left = power (c);
  for (;;)
    {
      if (take (c, "×"))
        left.v *= power (c).v;
      else if (take (c, "÷"))
        left.v /= power (c).v;
      else
        return left;
    }
}

static Number
sum (Calculator *c)
{
  Number left = product (c);
  for (;;)
    {
      if (take (c, "+"))
        left.v += product (c).v;
      else if (take (c, "−"))
        left.v -= product (c).v;
      else
        return left;
    }
}

/* Left side less right side, with @result for the line's result. */
static double
difference (const HlNoteLine *line, double result)
{
  Calculator c = { line, line->formula, result };
  double left = sum (&c).v;
  g_assert_true (take (&c, "="));
  double right = sum (&c).v;
  if (take (&c, ", 0 where "))
    right = fmax (right, 0.0);
  else if (!take (&c, ":"))         /* a remark */
    g_assert_cmpstr (c.at, ==, "");
  return left - right;
}

/* --- formulas in words --------------------------------------------------------------- */

static double
term (const HlNoteLine *line, guint k)
{
  return line->terms[k].value;
}

static double
temperature (const HlFluid *fluid, double p, double h)
{
  HlState st;
  g_assert_cmpint (hl_fluid_state_ph (fluid, p, h, &st), ==, HL_OK);
  return st.T;
}

static double
share (double heat, double d1, double d2)
{
  if (!(heat > 0.0))
    return 0.0;
  return heat * (fabs (d1 - d2) < 1e-9 * d1 ? 1.0 / d1 : log (d1 / d2) / (d1 - d2));
}

/* Three zones of a heater, from end to end of the feed water; the order of the terms is that of the formula's inputs. */
static double
zones (const HlNoteLine *line)
{
  double p = term (line, 0), m_steam = term (line, 1), h_steam = term (line, 2), m_drain = term (line, 3), h_drain = term (line, 4);
  double m_feed = term (line, 5), p_in = term (line, 6), h_in = term (line, 7), p_out = term (line, 8), h_out = term (line, 9);
  HlSaturation sat;
  g_assert_cmpint (hl_fluid_saturation_p (line->fluid, p, &sat), ==, HL_OK);
  double superheat = m_steam * fmax (0.0, h_steam - sat.h_vapour), subcooling = m_drain * fmax (0.0, sat.h_liquid - h_drain);
  double condensing = m_feed * (h_out - h_in) - superheat - subcooling;
  double T1 = temperature (line->other_fluid, p_in, h_in + subcooling / m_feed), T2 = temperature (line->other_fluid, p_out, h_out - superheat / m_feed);
  return share (subcooling, sat.T - T1, temperature (line->fluid, p, h_drain) - temperature (line->other_fluid, p_in, h_in))
         + share (condensing, sat.T - T1, sat.T - T2)
         + share (superheat, sat.T - T2, temperature (line->fluid, p, h_steam) - temperature (line->other_fluid, p_out, h_out));
}

/* Share of the way from 0 to 1 at which the liquid or the vapour is saturated; NaN where it is not. */
static double
saturated_at (const HlFluid *fluid, double p1, double h1, double p2, double h2, gboolean vapour)
{
  double low = 0.0, high = 1.0, sign = 0.0;
  for (int step = 0; step < 80; step++)
    {
      double z = step == 0 ? 0.0 : step == 1 ? 1.0 : 0.5 * (low + high), p = p1 * pow (p2 / p1, z);
      HlSaturation sat;
      if (hl_fluid_saturation_p (fluid, p, &sat) != HL_OK)
        return NAN;
      double d = h1 + z * (h2 - h1) - (vapour ? sat.h_vapour : sat.h_liquid);
      if (step == 0)
        sign = d > 0.0 ? 1.0 : -1.0;
      else if (step == 1 && d * sign > 0.0)
        return NAN;
      else if (step > 1)
        *(d * sign > 0.0 ? &low : &high) = z;
    }
  return 0.5 * (low + high);
}

static int
ascending (gconstpointer a, gconstpointer b)
{
  double x = *(const double *) a, y = *(const double *) b;
  return x < y ? -1 : x > y;
}

/* Both sides in counterflow at 24 equal parts, and where one of them begins or ends to boil. */
static void
walk (const HlNoteLine *line, double heat, double *least, double *ua)
{
  double cuts[32], last = NAN;
  guint n = 0;
  const HlFluid *fluids[] = { line->fluid, line->other_fluid };
  for (guint k = 0; k <= 24; k++)
    cuts[n++] = k / 24.0;
  for (guint side = 0; side < 2; side++)
    for (int vapour = 0; vapour < 2; vapour++)
      {
        double z = saturated_at (fluids[side], term (line, 4 * side), term (line, 4 * side + 1), term (line, 4 * side + 2), term (line, 4 * side + 3), vapour);
        if (!isnan (z))
          cuts[n++] = side == 0 ? z : 1.0 - z;
      }
  qsort (cuts, n, sizeof *cuts, ascending);
  *least = INFINITY;
  *ua = 0.0;
  for (guint k = 0; k < n; k++)
    {
      double T[2];
      for (guint side = 0; side < 2; side++)
        {
          double z = side == 0 ? cuts[k] : 1.0 - cuts[k];
          double p1 = term (line, 4 * side), h1 = term (line, 4 * side + 1), p2 = term (line, 4 * side + 2), h2 = term (line, 4 * side + 3);
          T[side] = temperature (fluids[side], p1 * pow (p2 / p1, z), h1 + z * (h2 - h1));
        }
      double d = T[0] - T[1];
      *least = fmin (*least, d);
      if (k > 0)
        *ua += share (heat * (cuts[k] - cuts[k - 1]), last, d);
      last = d;
    }
}

/* Expansion of which the wet part loses by Baumann's rule: where the dry line meets the saturated vapour is looked for by halving. */
static double
wet_exit (const HlNoteLine *line)
{
  double p_in = term (line, 0), h_in = term (line, 1), p_out = term (line, 2), eta = term (line, 3), factor = term (line, 4);
  HlState in, end, at;
  HlSaturation sat;
  g_assert_cmpint (hl_fluid_state_ph (line->fluid, p_in, h_in, &in), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_ps (line->fluid, p_out, in.s, &end), ==, HL_OK);
  double dry = h_in - eta * (h_in - end.h), low = log (p_out), high = log (p_in), y_start = 0.0;
  g_assert_cmpint (hl_fluid_saturation_p (line->fluid, p_out, &sat), ==, HL_OK);
  if (dry >= sat.h_vapour)
    return dry;
  HlSaturation sat_in;
  if (hl_fluid_saturation_p (line->fluid, p_in, &sat_in) == HL_OK && h_in < sat_in.h_vapour)
    {
      low = high;
      y_start = (sat_in.h_vapour - h_in) / (sat_in.h_vapour - sat_in.h_liquid);
    }
  for (int step = 0; step < 80 && high > low; step++)
    {
      double p = exp (0.5 * (low + high));
      HlSaturation here;
      g_assert_cmpint (hl_fluid_state_ps (line->fluid, p, in.s, &at), ==, HL_OK);
      gboolean is_dry = hl_fluid_saturation_p (line->fluid, p, &here) != HL_OK || h_in - eta * (h_in - at.h) > here.h_vapour;
      *(is_dry ? &high : &low) = log (p);
    }
  double p_start = exp (0.5 * (low + high)), h_start = h_in;
  g_assert_cmpint (hl_fluid_state_ps (line->fluid, p_start, in.s, &at), ==, HL_OK);
  h_start = h_in - eta * (h_in - at.h);
  g_assert_cmpint (hl_fluid_state_ph (line->fluid, p_start, h_start, &at), ==, HL_OK);
  g_assert_cmpint (hl_fluid_state_ps (line->fluid, p_out, at.s, &end), ==, HL_OK);
  double y_out = (sat.h_vapour - term (line, 5)) / (sat.h_vapour - sat.h_liquid);
  return dry + eta * factor * 0.5 * (y_start + y_out) * (h_start - end.h);
}

/* Cross product of the two ways from the inlet, relative. */
static double
off_the_line (const HlNoteLine *line)
{
  HlState st[3];
  for (guint k = 0; k < 3; k++)
    g_assert_cmpint (hl_fluid_state_ph (line->fluid, term (line, 2 * k), term (line, 2 * k + 1), &st[k]), ==, HL_OK);
  double ds = st[1].s - st[0].s, dh = st[1].h - st[0].h;
  return ((st[2].s - st[0].s) * dh - (st[2].h - st[0].h) * ds) / (fabs (dh) * 1e3);
}

static gboolean
replay_words (const HlNoteLine *line, double *found, double *is)
{
  double least, ua;
  *is = line->terms[line->n_terms - 1].value;
  if (strstr (line->formula, "desuperheating, condensing") != NULL)
    *found = zones (line);
  else if (strstr (line->formula, "least difference") != NULL)
    walk (line, 0.0, found, &ua);
  else if (strstr (line->formula, "sum over parts") != NULL)
    walk (line, term (line, 8), &least, found);
  else if (strstr (line->formula, "mean moisture") != NULL)
    *found = wet_exit (line);
  else if (strstr (line->formula, "straight line") != NULL)
    {
      *found = 1.0 + off_the_line (line);
      *is = 1.0;
    }
  else if (strstr (line->formula, "least of") != NULL)
    {
      HlState hot, cold, end;
      g_assert_cmpint (hl_fluid_state_ph (line->fluid, term (line, 1), term (line, 2), &hot), ==, HL_OK);
      g_assert_cmpint (hl_fluid_state_ph (line->other_fluid, term (line, 5), term (line, 6), &cold), ==, HL_OK);
      g_assert_cmpint (hl_fluid_state_pT (line->fluid, term (line, 3), cold.T, &end), ==, HL_OK);
      double most = term (line, 0) * (hot.h - end.h);
      g_assert_cmpint (hl_fluid_state_pT (line->other_fluid, term (line, 7), hot.T, &end), ==, HL_OK);
      *found = term (line, 8) / fmin (most, term (line, 4) * (end.h - cold.h));
    }
  else
    return FALSE;
  return TRUE;
}

/* --- tests ------------------------------------------------------------------------------ */

static void
replay (const HlNoteLine *line)
{
  const HlNoteTerm *result = &line->terms[line->result];
  double found, is;
  if (replay_words (line, &found, &is))
    {
      if (!(fabs (found - is) <= 1e-8 * fabs (is)))
        g_error ("%s: replayed %.12g, noted %.12g", line->words, found, is);
      return;
    }
  /* The formula may stand in any form: a step of Newton's method from the noted number must not lead away from it. */
  double x = result->value, r = difference (line, x), step = 1e-5 * fmax (fabs (x), 1e-3);
  double slope = (difference (line, x + step) - difference (line, x - step)) / (2.0 * step);
  if (strstr (line->formula, ", 0 where ") != NULL && fabs (slope) < 1e-12)
    slope = 1.0;
  if (!(fabs (slope) > 0.0))
    g_error ("“%s” does not find %s", line->formula, result->name);
  if (!(fabs (r / slope) <= 1e-8 * fmax (fabs (x), 1e-3)))
    g_error ("%s\n%s: replayed %.12g, noted %.12g", line->words, line->formula, x - r / slope, x);
}

static void
replay_all (HlPlant *plant)
{
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  test_assert_solved (s);
  g_autoptr (HlNote) note = hl_note_new (s);
  g_autoptr (GHashTable) known = g_hash_table_new_full (g_str_hash, g_str_equal, g_free, NULL);
  g_assert_cmpuint (hl_note_n_lines (note), >, 20);
  for (guint k = 0; k < hl_note_n_lines (note); k++)
    {
      const HlNoteLine *line = hl_note_line (note, k);
      replay (line);
      g_assert_null (strchr (line->words, '{'));
      g_assert_null (strchr (line->numbers, '{'));
      g_assert_cmpstr (line->source, !=, "");
      const HlNoteTerm *result = &line->terms[line->result];
      double value;
      if (result->address.key[0] == '\0')
        continue;
      g_assert_true (hl_solution_value (s, &result->address, &value));
      test_assert_near (value, result->value, 1e-9);
      /* Each number is found once. */
      if (!g_hash_table_add (known, hl_address_to_text (&result->address)))
        g_error ("%s is found twice", result->name);
    }
}

static void
test_replay_of_the_test_plants (void)
{
  const char *const texts[] = { test_simple_loop, test_reheat_plant, test_large_plant, test_industrial_plant };
  for (guint k = 0; k < G_N_ELEMENTS (texts); k++)
    {
      g_autoptr (HlPlant) plant = test_plant (texts[k]);
      replay_all (plant);
    }
}

/* Moisture, exhaust loss, straight line, exchangers: what the plants above have not. */
static void
test_replay_of_special_forms (void)
{
  const char *const texts[] = {
    "heat_input Q1 steam.T=758.15 pressure_loss=0\n"
    "turbine T1 extractions:1 expansion:1 leaving_loss:1 inlet.p=65e5 extraction1.p=5e5 exhaust.p=7000 isentropic_efficiency=0.83 exhaust_loss=25e3 mechanical_efficiency=0.985\n"
    "generator G1 efficiency=0.98\ncondenser C1 subcooling=0 cooling_inlet_T=288.15 cooling_rise=10 cooling_p=2e5\n"
    "pump P1 isentropic_efficiency=0.75 motor_efficiency=0.95\nopen_heater D1 inlets:1 outlet_subcooling=0\n"
    "pump P2 isentropic_efficiency=0.75 motor_efficiency=0.95\n"
    "Q1.steam > T1.inlet\nT1.exhaust > C1.steam\nT1.extraction1 > D1.steam\nC1.condensate > P1.inlet\nP1.outlet > D1.inlet1\nD1.outlet > P2.inlet\nP2.outlet > Q1.feed\n"
    "shaft T1 G1\nplant net_power=12e6 other_consumption_fraction=0\n",
    "heat_input Q1 steam.T=758.15 pressure_loss=0\n"
    "turbine T1 wetness:1 inlet.p=65e5 exhaust.p=7000 isentropic_efficiency=0.85 baumann_factor=1 mechanical_efficiency=0.985\n"
    "generator G1 efficiency=0.98\ncondenser C1 subcooling=0 cooling_inlet_T=288.15 cooling_rise=10 cooling_p=2e5\n"
    "pump P1 isentropic_efficiency=0.75 motor_efficiency=0.95\n"
    "Q1.steam > T1.inlet\nT1.exhaust > C1.steam\nC1.condensate > P1.inlet\nP1.outlet > Q1.feed\n"
    "shaft T1 G1\nplant net_power=12e6 other_consumption_fraction=0\n",
  };
  for (guint k = 0; k < G_N_ELEMENTS (texts); k++)
    {
      g_autoptr (HlPlant) plant = test_plant (texts[k]);
      replay_all (plant);
    }
}

static void
test_replay_of_an_exchanger (void)
{
  const char *const ends[] = { "pinch=8", "UA=60e3", "effectiveness=0.8" };
  for (guint k = 0; k < G_N_ELEMENTS (ends); k++)
    {
      g_autofree char *text = g_strdup_printf (
        "boundary Y1 direction:0 outlet.p=10e5 outlet.T=473.15 outlet.m=2\nboundary Y2 direction:1\n"
        "boundary Y3 direction:0 outlet.p=5e5 outlet.T=303.15 outlet.m=20\nboundary Y4 direction:1\n"
        "exchanger X1 hot_pressure_loss=0.01 cold_pressure_loss=0.02 %s\n"
        "Y1.outlet > X1.hot_inlet\nX1.hot_outlet > Y2.inlet\nY3.outlet > X1.cold_inlet\nX1.cold_outlet > Y4.inlet\n", ends[k]);
      g_autoptr (HlPlant) plant = test_plant (text);
      replay_all (plant);
    }
}

/* Ties of one quantity and of several; the words and numbers of each. */
static void
test_replay_of_ties (void)
{
  static const struct { const char *plant, *address, *tie, *words, *numbers; } rows[] = {
    { "simple", "T1.exhaust.p", "=0.001*T1.inlet.p + 0.01 bar", "exhaust pressure of T1 = 0.001 × inlet pressure of T1 + 0.01 bar", "0.07500 bar = 0.001 × 65.00 bar + 0.01 bar" },
    { "reheat", "T2.extraction1.p", "=sqrt(T1.exhaust.p*T2.exhaust.p)", "extraction pressure 1 of T2 = sqrt(exhaust pressure of T1 × exhaust pressure of T2)",
      "1.428 bar = sqrt(34.00 bar × 0.06000 bar)" },
    { "reheat", "T2.extraction1.p", "=-(2*T2.exhaust.p - T1.exhaust.p/4)", "extraction pressure 1 of T2 = −(2 × exhaust pressure of T2 − exhaust pressure of T1 ÷ 4)",
      "8.380 bar = −(2 × 0.06000 bar − 34.00 bar ÷ 4)" },
    { "reheat", "T2.extraction1.p", "=min(max(T2.exhaust.p; 0.3*T1.exhaust.p); 5 bar)", "extraction pressure 1 of T2 = min(max(exhaust pressure of T2, 0.3 × exhaust pressure of T1), 5 bar)",
      "5.000 bar = min(max(0.06000 bar, 0.3 × 34.00 bar), 5 bar)" },
    { "reheat", "B1.hot_reheat1.T", "=B1.steam.T - 10 K", "reheat temperature 1 of B1 = steam temperature of B1 − 10 K", "530.0 °C = 540.0 °C − 10 K" },
    /* A factor holds for absolute temperatures only. */
    { "reheat", "B1.hot_reheat1.T", "=0.98*B1.steam.T", "reheat temperature 1 of B1 = 0.98 × steam temperature of B1", "796.89 K = 0.98 × 813.15 K" },
    { "simple", "plant.net_power", "=0.25*(Q1.heat + C1.heat) - 5 MW", "net power of the plant = 0.25 × (heat to working fluid of Q1 + heat rejected of C1) − 5 MW", NULL },
  };
  for (guint n = 0; n < G_N_ELEMENTS (rows); n++)
    {
      g_autoptr (HlPlant) plant = test_plant (g_str_equal (rows[n].plant, "simple") ? test_simple_loop : test_reheat_plant);
      HlAddress address;
      HlValue value;
      g_autoptr (GError) error = NULL;
      g_assert_true (hl_address_parse (rows[n].address, plant, &address, NULL));
      hl_value_parse (plant, &address, rows[n].tie, &value, &error);
      g_assert_no_error (error);
      g_autoptr (HlPlant) tied = hl_plant_with_value (plant, &address, &value, &error);
      g_assert_no_error (error);
      replay_all (tied);
      g_autoptr (HlSolution) s = hl_solve (tied, NULL);
      g_autoptr (HlNote) note = hl_note_new (s);
      const HlNoteLine *found = NULL;
      for (guint k = 0; k < hl_note_n_lines (note); k++)
        if (g_str_equal (hl_note_line (note, k)->source, "tie that was put in"))
          found = hl_note_line (note, k);
      g_assert_nonnull (found);
      g_assert_cmpstr (found->words, ==, rows[n].words);
      if (rows[n].numbers != NULL)
        g_assert_cmpstr (found->numbers, ==, rows[n].numbers);
    }
}

/* Kinds that none of the plants above has. */
static void
test_replay_of_other_kinds (void)
{
  static const char *const texts[] = {
    "boundary Y1 direction:0 outlet.p=40e5 outlet.m=3 outlet.x=0\nboundary Y2 direction:1 inlet.p=4e5\nboundary Y3 direction:1\n"
    "flash_vessel FV1\nY1.outlet > FV1.inlet\nFV1.steam > Y2.inlet\nFV1.drain > Y3.inlet\n",
    "boundary Y1 direction:0 outlet.p=40e5 outlet.T=673.15 outlet.m=10\nboundary Y2 direction:0 outlet.p=60e5 outlet.T=400\nboundary Y3 direction:1\n"
    "desuperheater DS1 pressure_loss=0.02 outlet_superheat=30\nY1.outlet > DS1.steam\nY2.outlet > DS1.spray\nDS1.outlet > Y3.inlet\n",
    "heat_input Q1 steam.T=758.15 pressure_loss=0\nturbine T1 inlet.p=65e5 isentropic_efficiency=0.83 mechanical_efficiency=0.985\n"
    "generator G1 efficiency=0.98\ncondenser C1 subcooling=0 cooling_rise=10 terminal_difference=5 cooling_pressure_loss=0 cleanliness=0.85\n"
    "pump P1 isentropic_efficiency=0.75 motor_efficiency=0.95\npump P2 isentropic_efficiency=0.8 motor_efficiency=0.95\n"
    "cooling_tower CT1 air:1 wet_bulb_T=291.15 approach=6 water_outlet.p=1e5 lift=1e5 evaporation_fraction=0.016 drift_fraction=0.0001 cycles=5\n"
    "Q1.steam > T1.inlet\nT1.exhaust > C1.steam\nC1.condensate > P1.inlet\nP1.outlet > Q1.feed\n"
    "CT1.water_outlet > P2.inlet\nP2.outlet > C1.cooling_inlet\nC1.cooling_outlet > CT1.water_inlet\nshaft T1 G1\nplant net_power=12e6 other_consumption_fraction=0\n",
    "heat_input Q1 pressure_loss=0 steam.T=420\nturbine T1 inlet.p=10e5 isentropic_efficiency=0.82 mechanical_efficiency=0.985\ngenerator G1 efficiency=0.96\n"
    "condenser C1 subcooling=0 cooling_inlet_T=288.15 cooling_rise=8 cooling_p=2e5 terminal_difference=5\npump P1 isentropic_efficiency=0.7 motor_efficiency=0.95\n"
    "Q1.steam > T1.inlet\nT1.exhaust > C1.steam\nC1.condensate > P1.inlet\nP1.outlet > Q1.feed\nmedium 1 isopentane\nshaft T1 G1\nplant net_power=1e6 other_consumption_fraction=0\n",
  };
  for (guint k = 0; k < G_N_ELEMENTS (texts); k++)
    {
      g_autoptr (HlPlant) plant = test_plant (texts[k]);
      g_test_message ("plant %u", k);
      replay_all (plant);
    }
}

/* The plants that come with the program, and no line in them that says nothing of its source. */
static void
test_replay_of_the_examples (void)
{
  g_autofree char *folder = g_test_build_filename (G_TEST_DIST, "..", "data", "examples", NULL);
  g_autoptr (GDir) dir = g_dir_open (folder, 0, NULL);
  guint n = 0;
  g_assert_nonnull (dir);
  for (const char *name = g_dir_read_name (dir); name != NULL; name = g_dir_read_name (dir))
    {
      g_autofree char *path = g_build_filename (folder, name, NULL);
      g_autoptr (GError) error = NULL;
      if (!g_str_has_suffix (name, ".heatloom"))
        continue;
      g_test_message ("%s", name);
      g_autoptr (HlPlant) plant = hl_plant_load (path, &error);
      g_assert_no_error (error);
      replay_all (plant);
      g_autoptr (HlSolution) s = hl_solve (plant, NULL);
      g_autoptr (HlNote) note = hl_note_new (s);
      for (guint k = 0; k < hl_note_n_lines (note); k++)
        if (g_str_equal (hl_note_line (note, k)->source, "definition"))
          g_error ("%s: “%s” is only a definition", name, hl_note_line (note, k)->words);
      n++;
    }
  g_assert_cmpuint (n, >=, 3);
}

/* Steps run in solving order: what a line uses was put in, or found in the same step or before. */
static void
test_order (void)
{
  g_autoptr (HlPlant) plant = test_plant (test_large_plant);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  g_autoptr (HlNote) note = hl_note_new (s);
  for (guint k = 1; k < hl_note_n_lines (note); k++)
    g_assert_cmpuint (hl_note_line (note, k)->step, >=, hl_note_line (note, k - 1)->step);
  /* A term's name stands for its class of equal quantities: compare values, which differ where the quantities do. */
  for (guint k = 0; k < hl_note_n_lines (note); k++)
    {
      const HlNoteLine *line = hl_note_line (note, k);
      for (guint t = 0; t < line->n_terms; t++)
        {
          const HlNoteTerm *use = &line->terms[t];
          gboolean is_known = use->origin == HL_ORIGIN_GIVEN || use->origin == HL_ORIGIN_ASSUMED;
          for (guint j = 0; j < hl_note_n_lines (note) && !is_known && hl_note_line (note, j)->step <= line->step; j++)
            is_known = fabs (hl_note_line (note, j)->terms[hl_note_line (note, j)->result].value - use->value) <= 1e-12 * fabs (use->value);
          if (!is_known)
            g_error ("%s uses %s, which is not found yet", line->words, use->name);
        }
    }
}

static void
test_text (void)
{
  g_autoptr (HlPlant) plant = test_plant (test_simple_loop);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  g_autoptr (HlNote) note = hl_note_new (s);
  g_autofree char *text = hl_note_to_text (note);
  const char *const wanted[] = {
    "Calculation note\nSolved", "\nPut in\n", "  inlet pressure of T1 = 65.00 bar  (given)\n", "\nFound, in the order of solving\n",
    "\n  enthalpy of stream 2 = enthalpy of stream 1 − isentropic efficiency of T1 × (enthalpy of stream 1 − h(exhaust pressure of T1, s(inlet pressure of T1, enthalpy of stream 1)))\n",
    "[definition of the isentropic efficiency; IAPWS-IF97", "\nStates of the streams\n", "\nOver all states\n", "Solved together with the 10 lines that follow.",
    "[Carnot: lowest and highest temperature of the working fluid]",
  };
  for (guint k = 0; k < G_N_ELEMENTS (wanted); k++)
    if (strstr (text, wanted[k]) == NULL)
      g_error ("“%s” is not in the note:\n%s", wanted[k], text);
}

/* What is missing has no line; the rest has. */
static void
test_an_incomplete_plant (void)
{
  g_autoptr (HlPlant) plant = test_plant_let_go (test_plant (test_simple_loop), "T1.exhaust.p");
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  g_autoptr (HlNote) note = hl_note_new (s);
  for (guint k = 0; k < hl_note_n_lines (note); k++)
    replay (hl_note_line (note, k));
  g_assert_cmpuint (hl_note_n_inputs (note), >, 5);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/engine/note/replay", test_replay_of_the_test_plants);
  g_test_add_func ("/engine/note/replay-special-forms", test_replay_of_special_forms);
  g_test_add_func ("/engine/note/replay-exchanger", test_replay_of_an_exchanger);
  g_test_add_func ("/engine/note/replay-other-kinds", test_replay_of_other_kinds);
  g_test_add_func ("/engine/note/replay-examples", test_replay_of_the_examples);
  g_test_add_func ("/engine/note/replay-ties", test_replay_of_ties);
  g_test_add_func ("/engine/note/order", test_order);
  g_test_add_func ("/engine/note/text", test_text);
  g_test_add_func ("/engine/note/incomplete", test_an_incomplete_plant);
  return g_test_run ();
}
