/* Closed feedwater heater: terminal difference, drain cooler, drain cascaded; three zones.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/components.h"
#include "engine/heater-zones.h"
#include "plant/i18n.h"
#include <math.h>

#define NODE(emit, n) hl_model_node ((emit)->model, n)

static void
emit_temperatures (HlEmit *emit, int steam, int drain, int feed_in, int feed_out)
{
  HlSystem *system = emit->system;
  int T_sat = hl_emit_own (emit, "saturation_T", HL_VAR_TEMPERATURE);
  int difference = hl_emit_own (emit, "terminal_difference", HL_VAR_TEMPERATURE_DIFFERENCE);
  int approach = hl_emit_own (emit, "drain_approach", HL_VAR_TEMPERATURE_DIFFERENCE);
  int subcooling = hl_emit_own (emit, "drain_subcooling", HL_VAR_TEMPERATURE_DIFFERENCE);
  NODE (emit, drain)->subcooling = subcooling;
  int T_out = hl_emit_T (emit, feed_out, TRUE), T_in = hl_emit_T (emit, feed_in, FALSE), T_drain = hl_emit_T (emit, drain, FALSE);
  int p = NODE (emit, steam)->p;
  hl_emit_done (emit, hl_add_saturation (system, NODE (emit, steam)->fluid, p, T_sat), NULL, 1);
  hl_emit_done (emit, hl_add_linear (system, HL_VAR_TEMPERATURE, (const int[]) { T_sat, T_out, difference }, (const double[]) { 1.0, -1.0, -1.0 }, 3, 0.0),
                N_("{1} = {0} − {2}"), 2);
  hl_emit_done (emit, hl_add_linear (system, HL_VAR_TEMPERATURE, (const int[]) { T_drain, T_in, approach }, (const double[]) { 1.0, -1.0, -1.0 }, 3, 0.0),
                N_("{0} = {1} + {2}"), 2);
  hl_emit_done (emit, hl_add_liquid (system, NODE (emit, drain)->fluid, p, subcooling, NODE (emit, drain)->h), NULL, -1);
}

static void
emit_closed_heater (HlEmit *emit)
{
  HlSystem *system = emit->system;
  int steam = hl_emit_port (emit, "steam"), drain = hl_emit_port (emit, "drain"), other = hl_emit_optional (emit, "drain_inlet");
  int feed_in = hl_emit_port (emit, "feed_inlet"), feed_out = hl_emit_port (emit, "feed_outlet");
  int loss = hl_emit_own (emit, "feed_pressure_loss", HL_VAR_RATIO), heat = hl_emit_own (emit, "heat", HL_VAR_POWER);
  int ua = hl_emit_own (emit, "UA", HL_VAR_CONDUCTANCE);
  hl_emit_guess (emit, steam, 2.9e6);
  hl_system_merge (system, NODE (emit, steam)->p, NODE (emit, drain)->p);
  hl_system_merge (system, NODE (emit, feed_in)->m, NODE (emit, feed_out)->m);
  hl_emit_done (emit, hl_add_pressure_loss (system, NODE (emit, feed_in)->p, NODE (emit, feed_out)->p, loss), NULL, -1);
  emit_temperatures (emit, steam, drain, feed_in, feed_out);

  int flows[2], pairs[6], n = 0;
  double signs[3];
  const int in[] = { steam, other };
  for (int k = 0; k < 2; k++)
    if (in[k] >= 0)
      {
        flows[n] = pairs[2 * n] = NODE (emit, in[k])->m;
        pairs[2 * n + 1] = NODE (emit, in[k])->h;
        signs[n++] = 1.0;
      }
  pairs[2 * n] = NODE (emit, drain)->m;
  pairs[2 * n + 1] = NODE (emit, drain)->h;
  signs[n] = -1.0;
  hl_emit_balance (emit, flows, n, &pairs[2 * n], 1);
  hl_emit_done (emit, hl_add_energy (system, HL_VAR_POWER, pairs, signs, n + 1, &heat, (const double[]) { -1.0 }, 1), NULL, -1);
  const int feed[] = { NODE (emit, feed_in)->m, NODE (emit, feed_out)->h, NODE (emit, feed_in)->m, NODE (emit, feed_in)->h };
  hl_emit_done (emit, hl_add_energy (system, HL_VAR_POWER, feed, (const double[]) { 1.0, -1.0 }, 2, &heat, (const double[]) { -1.0 }, 1),
                N_("{4} = {0} × ({1} − {3})"), -1);
  const int zones[HL_N_ZONE_INPUTS] = {
    NODE (emit, steam)->p, NODE (emit, steam)->m, NODE (emit, steam)->h, NODE (emit, drain)->m, NODE (emit, drain)->h,
    NODE (emit, feed_in)->m, NODE (emit, feed_in)->p, NODE (emit, feed_in)->h, NODE (emit, feed_out)->p, NODE (emit, feed_out)->h };
  hl_emit_done (emit, hl_add_heater_conductance (system, NODE (emit, steam)->fluid, NODE (emit, feed_in)->fluid, zones, ua), NULL, -1);
}

/* --- checks ------------------------------------------------------------------- */

static gboolean
check_outlet (HlChecker *checker, double T_sat, const HlNodeResult *steam, const HlNodeResult *out)
{
  double T_hottest = steam->has_state ? fmax (steam->st.T, T_sat) : T_sat;
  if (out == NULL || !out->has_state || out->st.T <= T_hottest)
    return FALSE;
  g_autofree char *sat = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, T_sat);
  g_autofree char *hot = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, T_hottest);
  g_autofree char *T = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, out->st.T);
  HlFinding *finding = hl_check_add (checker, HL_GRADE_ERROR, "heater-outlet-too-hot", "feed_outlet.T",
    T_hottest > T_sat + 0.05
      ? g_strdup_printf (_("Heater %s: steam arrives at %s and condenses at %s, but the feedwater is to leave at %s. Lower the feedwater outlet temperature or raise the steam pressure."),
                         checker->component->id, hot, sat, T)
      : g_strdup_printf (_("Heater %s: steam condenses at %s, but the feedwater is to leave at %s. Lower the feedwater outlet temperature or raise the steam pressure."),
                         checker->component->id, sat, T));
  hl_check_offer (checker, finding, "feed_outlet.T");
  hl_check_offer (checker, finding, "terminal_difference");
  hl_check_offer (checker, finding, "steam.p");
  return TRUE;
}

/* Both ends of every zone that carries heat. */
static void
check_zones (HlChecker *checker, const HlHeaterZones *zones, double all)
{
  static const char *const names[] = { N_("desuperheating"), N_("condensing"), N_("subcooling") };
  double least = INFINITY;
  int worst = 0;
  for (int k = 0; k < HL_N_ZONES; k++)
    {
      if (fabs (zones->heat[k]) <= 1e-6 * fabs (all))
        continue;
      double d = fmin (zones->hot_in[k] - zones->feed_out[k], zones->hot_out[k] - zones->feed_in[k]);
      if (d < least)
        {
          least = d;
          worst = k;
        }
    }
  if (!(least < 2.0))
    return;
  g_autofree char *d = hl_check_text (checker, HL_DIMENSION_TEMPERATURE_DIFFERENCE, fabs (least));
  HlFinding *finding;
  if (least < -1e-6)
    finding = hl_check_add (checker, HL_GRADE_ERROR, "temperature-cross", "terminal_difference",
      g_strdup_printf (_("Heater %s: in its %s zone the feedwater would be %s hotter than the steam side. Raise the terminal difference or the steam pressure."),
                       checker->component->id, _(names[worst]), d));
  else
    finding = hl_check_add (checker, least < 1.0 ? HL_GRADE_WARNING : HL_GRADE_CAUTION, "small-difference", "terminal_difference",
      g_strdup_printf (_("Heater %s: only %s remain in its %s zone; less than 2 K asks for a very large surface."), checker->component->id, d, _(names[worst])));
  hl_check_offer (checker, finding, "terminal_difference");
  hl_check_offer (checker, finding, worst == HL_ZONE_SUBCOOLING ? "drain_approach" : "steam.p");
}

static void
check_drain_inlet (HlChecker *checker, const HlNodeResult *steam)
{
  const HlNodeResult *other = hl_check_port (checker, "drain_inlet");
  if (other == NULL || !other->has_pressure || other->p >= steam->p * (1.0 - 1e-9))
    return;
  g_autofree char *p_drain = hl_check_text (checker, HL_DIMENSION_PRESSURE, other->p);
  g_autofree char *p_shell = hl_check_text (checker, HL_DIMENSION_PRESSURE, steam->p);
  hl_check_add (checker, HL_GRADE_ERROR, "drain-uphill", "drain_inlet.p",
    g_strdup_printf (_("The drain into %s arrives at %s, below the shell's %s: it cannot flow in. Pump it, or lead it elsewhere."), checker->component->id, p_drain, p_shell));
}

static void
check (HlChecker *checker)
{
  const HlNodeResult *steam = hl_check_port (checker, "steam"), *drain = hl_check_port (checker, "drain");
  const HlNodeResult *in = hl_check_port (checker, "feed_inlet"), *out = hl_check_port (checker, "feed_outlet");
  HlSaturation sat;
  if (steam == NULL || !steam->has_pressure || hl_fluid_saturation_p (hl_check_fluid (checker, "steam"), steam->p, &sat) != HL_OK)
    return;
  check_drain_inlet (checker, steam);
  if (check_outlet (checker, sat.T, steam, out))
    return;
  double subcooling;
  if (hl_check_own (checker, "drain_subcooling", &subcooling) && subcooling < -1e-6)
    {
      g_autofree char *T_drain = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, sat.T - subcooling);
      g_autofree char *T_sat = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, sat.T);
      HlFinding *finding = hl_check_add (checker, HL_GRADE_ERROR, "drain-too-hot", "drain_approach",
        g_strdup_printf (_("Heater %s: its drain would leave at %s, above saturation, %s. Lower the drain approach."), checker->component->id, T_drain, T_sat));
      hl_check_offer (checker, finding, "drain_approach");
      return;
    }
  if (!steam->has_state || drain == NULL || !drain->has_state || in == NULL || !in->has_state || out == NULL || !out->has_state
      || !steam->has_flow || !drain->has_flow || !in->has_flow || !(in->m > 0.0))
    return;
  const double inputs[HL_N_ZONE_INPUTS] = { log (steam->p), steam->m, steam->st.h, drain->m, drain->st.h, in->m, log (in->p), in->st.h, log (out->p), out->st.h };
  HlHeaterZones zones;
  if (hl_heater_zones (hl_check_fluid (checker, "steam"), hl_check_fluid (checker, "feed_inlet"), inputs, &zones) == HL_OK)
    check_zones (checker, &zones, in->m * (out->st.h - in->st.h));
  hl_check_entropy (checker);
}

static void
processes (HlProcessSink *sink)
{
  int drain = hl_process_node (sink, "drain");
  hl_process_add (sink, HL_PROCESS_COOLING, hl_process_node (sink, "steam"), drain);
  hl_process_add (sink, HL_PROCESS_THROTTLING, hl_process_node (sink, "drain_inlet"), drain);
  hl_process_add (sink, HL_PROCESS_HEATING, hl_process_node (sink, "feed_inlet"), hl_process_node (sink, "feed_outlet"));
}

const HlComponentModel hl_closed_heater_model = { "closed_heater", emit_closed_heater, check, processes };
