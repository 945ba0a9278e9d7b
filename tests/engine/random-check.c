/* A solution looked at from outside: balances, second law, given values, all recomputed from the states of the streams.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "random-check.h"
#include <math.h>
#include <string.h>

#define ENTROPY_SLACK 2e-3      /* [J/(kg K)]: formulations of neighbouring regions differ by less */
#define CROSS_SLACK   0.02      /* [K] */

typedef struct {
  const HlSolution  *s;
  HlPlant           *plant;
  const HlComponent *c;
  RandomCheck       *check;
  double             flow, power;       /* largest of the plant */
} Look;

static void G_GNUC_PRINTF (2, 3)
say (Look *look, const char *format, ...)
{
  va_list args;
  if (look->check->text[0] != '\0')
    return;
  va_start (args, format);
  g_vsnprintf (look->check->text, sizeof look->check->text, format, args);
  va_end (args);
}

static gboolean
port_result (const Look *look, const char *port, HlStreamResult *result)
{
  const HlStream *stream = hl_plant_stream_at (look->plant, look->c->id, g_intern_string (port));
  if (stream == NULL)
    return FALSE;
  hl_solution_stream (look->s, (guint) hl_plant_stream_index (look->plant, stream->id), result);
  return result->has_flow && result->has_state;
}

static double
own (const Look *look, const char *key)
{
  HlAddress address = hl_address_component (look->c->id, g_intern_string (key));
  double value;
  return hl_solution_value (look->s, &address, &value) ? value : NAN;
}

static void
broken (Look *look, const char *what, double how_much)
{
  look->check->n_broken_laws++;
  say (look, "%s: %s (%.6g)", look->c->id, what, how_much);
}

/* --- balances ---------------------------------------------------------------------- */

/* Heat and power that a kind takes in besides its streams; NaN: no rule is known here. */
static double
taken_in (const Look *look)
{
  const char *kind = look->c->kind->id;
  HlStreamResult out;
  if (g_str_equal (kind, "boiler") || g_str_equal (kind, "heat_input"))
    return own (look, "heat");
  if (g_str_equal (kind, "turbine"))
    return -own (look, "internal_power");
  if (g_str_equal (kind, "pump") || g_str_equal (kind, "compressor"))
    return own (look, "power");
  if (g_str_equal (kind, "pipe"))
    return -own (look, "heat_loss");
  if (g_str_equal (kind, "condenser"))
    return hl_plant_stream_at (look->plant, look->c->id, g_intern_string ("cooling_inlet")) != NULL ? 0.0 : -own (look, "heat");
  if (g_str_equal (kind, "district_heater"))
    return hl_plant_stream_at (look->plant, look->c->id, g_intern_string ("water_inlet")) != NULL ? 0.0 : -own (look, "heat");
  if (g_str_equal (kind, "air_condenser") || g_str_equal (kind, "cooling_tower"))
    return -own (look, "heat");
  if (g_str_equal (kind, "steam_user"))
    return port_result (look, "condensate", &out) ? -own (look, "heat") - own (look, "lost_flow") * out.state.h : NAN;
  static const char *const adiabatic[] = { "valve", "mixer", "splitter", "open_heater", "closed_heater", "exchanger", "recuperator", "flash_vessel",
                                           "moisture_separator", "desuperheater" };
  for (guint k = 0; k < G_N_ELEMENTS (adiabatic); k++)
    if (g_str_equal (kind, adiabatic[k]))
      return 0.0;
  return NAN;
}

typedef struct { double mass[4], energy, entropy, flow; gboolean backwards; guint n; } Sums;

static void
add_up (const Look *look, Sums *sums)
{
  memset (sums, 0, sizeof *sums);
  for (guint n = 0; n < hl_component_n_ports (look->c); n++)
    {
      HlPort port = hl_component_port (look->c, n);
      HlStreamResult r;
      if (!port_result (look, port.key, &r))
        continue;
      double sign = port.kind->direction == HL_PORT_IN ? 1.0 : -1.0;
      sums->mass[port.kind->side_circuit & 3] += sign * r.m;
      sums->energy += sign * r.m * r.state.h;
      sums->entropy -= sign * r.m * r.state.s;
      sums->flow = fmax (sums->flow, fabs (r.m));
      sums->backwards |= r.m < -1e-9 * look->flow;
      sums->n++;
    }
}

static void
check_balances (Look *look, const Sums *sums)
{
  const char *kind = look->c->kind->id;
  if (sums->n == 0 || g_str_equal (kind, "boundary") || g_str_equal (kind, "make_up"))
    return;
  double lost = g_str_equal (kind, "steam_user") ? own (look, "lost_flow") : 0.0;
  for (int side = 0; side < 4; side++)
    {
      double off = fabs (sums->mass[side] - (side == 0 ? lost : 0.0)) / look->flow;
      if (off > look->check->mass)
        look->check->mass = off;
      if (off > 2e-9)
        say (look, "%s: mass balance off by %.3g of the largest flow", look->c->id, off);
    }
  double in = taken_in (look);
  if (isnan (in))
    {
      say (look, "%s: no energy balance for the kind %s", look->c->id, kind);
      look->check->energy = INFINITY;
      return;
    }
  double off = fabs (sums->energy + in) / look->power;
  look->check->energy = fmax (look->check->energy, off);
  if (off > 2e-9)
    say (look, "%s: energy balance off by %.3g of the largest power", look->c->id, off);
}

/* --- second law -------------------------------------------------------------------- */

static void
check_entropy (Look *look, const Sums *sums)
{
  const char *kind = look->c->kind->id;
  if (sums->n < 2 || sums->flow < 1e-6 * look->flow || sums->backwards)
    return;
  gboolean closed = g_str_equal (kind, "turbine") || g_str_equal (kind, "pump") || g_str_equal (kind, "compressor")
    || (g_str_equal (kind, "pipe") && fabs (own (look, "heat_loss")) < 1e-9)
    || (!isnan (taken_in (look)) && fabs (taken_in (look)) < 1e-300);
  if (closed && sums->entropy < -ENTROPY_SLACK * sums->flow)
    broken (look, "entropy destroyed [J/(kg K)]", -sums->entropy / sums->flow);
}

static double
T_at (const HlFluid *fluid, double p, double h)
{
  HlState st;
  return hl_fluid_state_ph (fluid, p, h, &st) == HL_OK ? st.T : NAN;
}

/* Counterflow with heat evenly divided: @hot falls from its inlet's enthalpy, @cold rises towards its outlet's. */
static void
check_counterflow (Look *look, const char *hot_in, const char *hot_out, const char *cold_in, const char *cold_out)
{
  HlStreamResult a, b, c, d;
  double worst = INFINITY;
  if (!port_result (look, hot_in, &a) || !port_result (look, hot_out, &b) || !port_result (look, cold_in, &c) || !port_result (look, cold_out, &d))
    return;
  for (int k = 0; k <= 100; k++)
    {
      double w = k / 100.0;
      double hot = T_at (a.fluid, exp (log (b.state.p) + w * log (a.state.p / b.state.p)), b.state.h + w * (a.state.h - b.state.h));
      double cold = T_at (c.fluid, exp (log (c.state.p) + w * log (d.state.p / c.state.p)), c.state.h + w * (d.state.h - c.state.h));
      worst = fmin (worst, hot - cold);
    }
  if (worst < -CROSS_SLACK)
    broken (look, "temperatures cross [K]", worst);
  if (a.m > 1e-6 * look->flow && a.state.h < b.state.h - 1.0)
    broken (look, "heat runs from cold to hot [J/kg]", a.state.h - b.state.h);
}

/* Feed in tubes, steam round them: differences where the zones of the shell meet, from the cold end on. */
static void
check_shell (Look *look, const char *feed_in, const char *feed_out)
{
  HlStreamResult steam, drain, in, out;
  HlSaturation sat;
  if (!port_result (look, "steam", &steam) || !port_result (look, "drain", &drain) || !port_result (look, feed_in, &in) || !port_result (look, feed_out, &out)
      || hl_fluid_saturation_p (steam.fluid, steam.state.p, &sat) != HL_OK || in.m < 1e-6 * look->flow)
    return;
  double cooled = drain.m * fmax (sat.h_liquid - drain.state.h, 0.0), dry = steam.m * fmax (steam.state.h - sat.h_vapour, 0.0);
  double after_drain = T_at (in.fluid, in.state.p, in.state.h + cooled / in.m), before_dry = T_at (out.fluid, out.state.p, out.state.h - dry / in.m);
  double at_end = drain.state.T - in.state.T, at_hot = fmax (steam.state.T, sat.T) - out.state.T;
  double worst = fmin (fmin (at_end, at_hot), fmin (sat.T - after_drain, sat.T - before_dry));
  if (worst < -CROSS_SLACK)
    broken (look, "temperatures cross [K]", worst);
  if (drain.state.h > sat.h_liquid + 1.0)
    broken (look, "drain hotter than saturation [J/kg]", drain.state.h - sat.h_liquid);
  if (steam.m > 1e-6 * look->flow && steam.state.h < drain.state.h)
    broken (look, "steam colder than its drain [J/kg]", steam.state.h - drain.state.h);
}

static void
check_pressures (Look *look)
{
  static const struct { const char *kind, *in, *out; double sign; } rows[] = {
    { "turbine", "inlet", "exhaust", 1.0 }, { "pump", "inlet", "outlet", -1.0 }, { "compressor", "inlet", "outlet", -1.0 }, { "valve", "inlet", "outlet", 1.0 },
    { "pipe", "inlet", "outlet", 1.0 }, { "boiler", "feed", "steam", 1.0 }, { "heat_input", "feed", "steam", 1.0 }, { "closed_heater", "feed_inlet", "feed_outlet", 1.0 },
    { "exchanger", "hot_inlet", "hot_outlet", 1.0 }, { "exchanger", "cold_inlet", "cold_outlet", 1.0 }, { "closed_heater", "drain_inlet", "drain", 1.0 },
    { "condenser", "drain", "condensate", 1.0 },
  };
  HlStreamResult in, out;
  for (guint k = 0; k < G_N_ELEMENTS (rows); k++)
    if (g_str_equal (look->c->kind->id, rows[k].kind) && port_result (look, rows[k].in, &in) && port_result (look, rows[k].out, &out)
        && rows[k].sign * (in.state.p - out.state.p) < -1e-8 * in.state.p)
      broken (look, "pressure the wrong way [Pa]", out.state.p - in.state.p);
}

static void
check_kind (Look *look)
{
  const char *kind = look->c->kind->id;
  check_pressures (look);
  if (g_str_equal (kind, "exchanger") || g_str_equal (kind, "recuperator"))
    check_counterflow (look, "hot_inlet", "hot_outlet", "cold_inlet", "cold_outlet");
  else if (g_str_equal (kind, "closed_heater"))
    check_shell (look, "feed_inlet", "feed_outlet");
  else if (g_str_equal (kind, "district_heater"))
    {
      if (own (look, "terminal_difference") < -CROSS_SLACK)
        broken (look, "district water hotter than the steam [K]", own (look, "terminal_difference"));
      if (own (look, "flow_T") < own (look, "return_T"))
        broken (look, "district water cooled [K]", own (look, "flow_T") - own (look, "return_T"));
    }
  else if (g_str_equal (kind, "condenser") && (own (look, "terminal_difference") < -CROSS_SLACK || own (look, "cooling_rise") < 0.0))
    broken (look, "cooling water hotter than the steam [K]", own (look, "terminal_difference"));
  else if (g_str_equal (kind, "air_condenser") && own (look, "initial_difference") < -CROSS_SLACK)
    broken (look, "air hotter than the steam [K]", own (look, "initial_difference"));
}

/* --- machines ------------------------------------------------------------------------ */

static void
check_step (Look *look, const HlStreamResult *in, const HlStreamResult *out, double efficiency, gboolean expands)
{
  HlState ideal;
  if (!isfinite (efficiency) || hl_fluid_state_ps (in->fluid, out->state.p, in->state.s, &ideal) != HL_OK)
    return;
  double h = expands ? in->state.h - efficiency * (in->state.h - ideal.h) : in->state.h + (ideal.h - in->state.h) / efficiency;
  double off = fabs (h - out->state.h) / 1e6;
  look->check->machine = fmax (look->check->machine, off);
  if (off > 2e-8)
    say (look, "%s: enthalpy off by %.3g MJ/kg from its efficiency", look->c->id, off);
}

static void
check_machines (Look *look)
{
  HlStreamResult in, out;
  if ((g_str_equal (look->c->kind->id, "pump") || g_str_equal (look->c->kind->id, "compressor")) && port_result (look, "inlet", &in) && port_result (look, "outlet", &out))
    check_step (look, &in, &out, own (look, "isentropic_efficiency"), FALSE);
  if (!g_str_equal (look->c->kind->id, "turbine") || hl_component_option (look->c, "expansion") != 0 || hl_component_option (look->c, "wetness") != 0
      || hl_component_option (look->c, "leaving_loss") != 0)
    return;
  int n = hl_component_option (look->c, "extractions");
  if (!port_result (look, "inlet", &in))
    return;
  for (int k = 1; k <= n + 1; k++)
    {
      g_autofree char *port = k <= n ? g_strdup_printf ("extraction%d", k) : g_strdup ("exhaust"), *key = g_strdup_printf ("group_efficiency%d", k);
      if (!port_result (look, port, &out))
        return;
      check_step (look, &in, &out, own (look, key), TRUE);
      in = out;
    }
}

/* --- given values ---------------------------------------------------------------------- */

static void
check_value (Look *look, const HlAddress *address, const HlValue *value)
{
  double found;
  if (value->origin == HL_ORIGIN_TIED || !hl_solution_value (look->s, address, &found))
    return;
  const HlQuantityKind *kind = hl_plant_quantity_kind (look->plant, address);
  double unit = kind != NULL && kind->dimension == HL_DIMENSION_TEMPERATURE_DIFFERENCE ? 300.0 : kind != NULL && kind->dimension == HL_DIMENSION_MASS_FLOW ? look->flow
    : kind != NULL && kind->dimension == HL_DIMENSION_POWER ? look->power : kind != NULL && kind->dimension == HL_DIMENSION_RATIO ? 1.0 : fabs (value->value);
  double off = fabs (found - value->value) / unit;
  look->check->given = fmax (look->check->given, off);
  if (off > 2e-8)
    {
      g_autofree char *text = hl_address_to_text (address);
      say (look, "%s was given as %.12g, but is %.12g", text, value->value, found);
    }
}

static void
check_values (Look *look)
{
  for (guint n = 0; n < hl_plant_n_components (look->plant); n++)
    {
      const HlComponent *c = hl_plant_component (look->plant, n);
      for (guint k = 0; k < c->values.n; k++)
        {
          HlAddress address = hl_address_component (c->id, c->values.entries[k].key);
          check_value (look, &address, &c->values.entries[k].value);
        }
    }
  for (guint n = 0; n < hl_plant_n_streams (look->plant); n++)
    {
      const HlStream *stream = hl_plant_stream (look->plant, n);
      for (guint k = 0; k < stream->values.n; k++)
        {
          HlAddress address = hl_address_stream (stream->id, stream->values.entries[k].key);
          check_value (look, &address, &stream->values.entries[k].value);
        }
    }
  const HlValues *values = hl_plant_values (look->plant);
  for (guint k = 0; k < values->n; k++)
    {
      HlAddress address = hl_address_plant (values->entries[k].key);
      check_value (look, &address, &values->entries[k].value);
    }
}

RandomCheck
random_check (const HlSolution *solution)
{
  RandomCheck check = { 0.0 };
  Look look = { .s = solution, .plant = hl_solution_plant (solution), .check = &check, .flow = 1e-300, .power = 1e-300 };
  for (guint n = 0; n < hl_plant_n_streams (look.plant); n++)
    {
      HlStreamResult r;
      hl_solution_stream (solution, n, &r);
      if (!r.has_flow || !r.has_state)
        {
          say (&look, "stream %s has no state", hl_plant_stream (look.plant, n)->id);
          check.mass = INFINITY;
          continue;
        }
      look.flow = fmax (look.flow, fabs (r.m));
      look.power = fmax (look.power, fabs (r.m * r.state.h));
    }
  for (guint n = 0; n < hl_plant_n_streams (look.plant); n++)
    {
      HlStreamResult r;
      hl_solution_stream (solution, n, &r);
      if (!(r.m >= -1e-9 * look.flow))
        {
          check.n_broken_laws++;
          say (&look, "stream %s flows backwards (%.6g kg/s)", hl_plant_stream (look.plant, n)->id, r.m);
        }
    }
  for (guint n = 0; n < hl_plant_n_components (look.plant); n++)
    {
      Sums sums;
      look.c = hl_plant_component (look.plant, n);
      add_up (&look, &sums);
      check_balances (&look, &sums);
      check_entropy (&look, &sums);
      check_kind (&look);
      check_machines (&look);
    }
  check_values (&look);
  return check;
}

double
random_compare (const HlSolution *a, const HlSolution *b, char *where, gsize size)
{
  HlPlant *plant = hl_solution_plant (a);
  double worst = 0.0, flow = 1e-300;
  for (guint n = 0; n < hl_plant_n_streams (plant); n++)
    {
      HlStreamResult r;
      hl_solution_stream (a, n, &r);
      flow = fmax (flow, fabs (r.m));
    }
  for (guint n = 0; n < hl_plant_n_streams (plant); n++)
    {
      const char *id = hl_plant_stream (plant, n)->id;
      HlStreamResult r, t;
      hl_solution_stream (a, n, &r);
      hl_solution_stream (b, (guint) hl_plant_stream_index (hl_solution_plant (b), id), &t);
      double off = fmax (fabs (r.m - t.m) / flow, fmax (fabs (r.state.p / t.state.p - 1.0), fabs (r.state.h - t.state.h) / 1e6));
      if (!(off <= worst))
        {
          worst = isnan (off) ? INFINITY : off;
          g_snprintf (where, size, "stream %s: m %.12g and %.12g, p %.12g and %.12g, h %.12g and %.12g", id, r.m, t.m, r.state.p, t.state.p, r.state.h, t.state.h);
        }
    }
  return worst;
}
