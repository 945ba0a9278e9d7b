/* Condenser with its cooling water: of its own, or connected.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/components.h"
#include "plant/i18n.h"
#include <math.h>

#define NODE(emit, n) hl_model_node ((emit)->model, n)
enum { COOLING_WATER, COOLING_NONE };

/* Cooling water which is drawn nowhere: inlet temperature, rise and terminal difference add up to saturation. */
static void
emit_own_cooling (HlEmit *emit, const HlFluid *fluid, int T_sat, int heat, int rise, int difference)
{
  int T_in = hl_emit_own (emit, "cooling_inlet_T", HL_VAR_TEMPERATURE), flow = hl_emit_own (emit, "cooling_flow", HL_VAR_FLOW);
  int p = hl_emit_own (emit, "cooling_p", HL_VAR_PRESSURE);
  hl_emit_done (emit, hl_add_linear (emit->system, HL_VAR_TEMPERATURE, (const int[]) { T_sat, T_in, rise, difference },
                                     (const double[]) { 1.0, -1.0, -1.0, -1.0 }, 4, 0.0), N_("{0} = {1} + {2} + {3}"), -1);
  hl_emit_done (emit, hl_add_cooling_heat (emit->system, fluid, heat, flow, T_in, rise, p), NULL, 1);
}

static void
emit_connected_cooling (HlEmit *emit, int T_sat, int heat, int rise, int difference)
{
  int in = hl_emit_port (emit, "cooling_inlet"), out = hl_emit_port (emit, "cooling_outlet");
  int T_in = hl_emit_T (emit, in, hl_emit_has_value (emit, "cooling_inlet_T")), T_out = hl_emit_T (emit, out, TRUE);
  hl_system_merge (emit->system, T_in, hl_emit_own (emit, "cooling_inlet_T", HL_VAR_TEMPERATURE));
  hl_system_merge (emit->system, NODE (emit, in)->m, hl_emit_own (emit, "cooling_flow", HL_VAR_FLOW));
  hl_system_merge (emit->system, NODE (emit, in)->m, NODE (emit, out)->m);
  if (hl_component_quantity_kind (emit->component, "cooling_pressure_loss") != NULL)
    {
      int loss = hl_emit_own (emit, "cooling_pressure_loss", HL_VAR_RATIO);
      hl_emit_done (emit, hl_add_pressure_loss (emit->system, NODE (emit, in)->p, NODE (emit, out)->p, loss), NULL, -1);
    }
  else
    hl_system_merge (emit->system, NODE (emit, in)->p, NODE (emit, out)->p);
  hl_emit_done (emit, hl_add_linear (emit->system, HL_VAR_TEMPERATURE, (const int[]) { T_out, T_in, rise },
                                     (const double[]) { 1.0, -1.0, -1.0 }, 3, 0.0), N_("{0} = {1} + {2}"), 2);
  hl_emit_done (emit, hl_add_linear (emit->system, HL_VAR_TEMPERATURE, (const int[]) { T_sat, T_out, difference },
                                     (const double[]) { 1.0, -1.0, -1.0 }, 3, 0.0), N_("{0} = {1} + {2}"), 2);
  const int pairs[] = { NODE (emit, in)->m, NODE (emit, out)->h, NODE (emit, in)->m, NODE (emit, in)->h };
  hl_emit_done (emit, hl_add_energy (emit->system, HL_VAR_POWER, pairs, (const double[]) { 1.0, -1.0 }, 2, &heat, (const double[]) { -1.0 }, 1),
                N_("{4} = {0} × ({1} − {3})"), -1);
}

static void
emit_condenser (HlEmit *emit)
{
  int steam = hl_emit_port (emit, "steam"), out = hl_emit_port (emit, "condensate"), drain = hl_emit_optional (emit, "drain");
  int subcooling = hl_emit_own (emit, "subcooling", HL_VAR_TEMPERATURE_DIFFERENCE), heat = hl_emit_own (emit, "heat", HL_VAR_POWER);
  int p = NODE (emit, steam)->p, n = 0, flows[2], pairs[6];
  double signs[3];
  NODE (emit, steam)->is_exhaust = TRUE;
  NODE (emit, out)->subcooling = subcooling;
  hl_system_merge (emit->system, p, NODE (emit, out)->p);
  hl_emit_done (emit, hl_add_liquid (emit->system, NODE (emit, out)->fluid, p, subcooling, NODE (emit, out)->h), NULL, -1);
  const int in[] = { steam, drain };
  for (int k = 0; k < 2; k++)
    if (in[k] >= 0)
      {
        flows[n] = pairs[2 * n] = NODE (emit, in[k])->m;
        pairs[2 * n + 1] = NODE (emit, in[k])->h;
        signs[n++] = 1.0;
      }
  pairs[2 * n] = NODE (emit, out)->m;
  pairs[2 * n + 1] = NODE (emit, out)->h;
  signs[n] = -1.0;
  hl_emit_balance (emit, flows, n, &pairs[2 * n], 1);
  hl_emit_done (emit, hl_add_energy (emit->system, HL_VAR_POWER, pairs, signs, n + 1, &heat, (const double[]) { -1.0 }, 1), NULL, 2 * (n + 1));
  hl_emit_sum (emit, HL_SUM_REJECTED, heat);

  gboolean is_connected = hl_emit_optional (emit, "cooling_inlet") >= 0 || hl_emit_optional (emit, "cooling_outlet") >= 0;
  if (!is_connected && hl_component_option (emit->component, "cooling") == COOLING_NONE)
    return;
  int T_sat = hl_emit_hidden (emit, "saturation_T", HL_VAR_TEMPERATURE);
  int rise = hl_emit_own (emit, "cooling_rise", HL_VAR_TEMPERATURE_DIFFERENCE);
  int difference = hl_emit_own (emit, "terminal_difference", HL_VAR_TEMPERATURE_DIFFERENCE);
  int mean = hl_emit_own (emit, "log_mean_difference", HL_VAR_TEMPERATURE_DIFFERENCE), ua = hl_emit_own (emit, "UA", HL_VAR_CONDUCTANCE);
  hl_emit_done (emit, hl_add_saturation (emit->system, NODE (emit, steam)->fluid, p, T_sat), NULL, 1);
  if (is_connected)
    emit_connected_cooling (emit, T_sat, heat, rise, difference);
  else
    emit_own_cooling (emit, emit->model->water, T_sat, heat, rise, difference);
  hl_emit_done (emit, hl_add_log_mean (emit->system, mean, rise, difference), NULL, 0);
  hl_emit_done (emit, hl_add_quotient (emit->system, ua, heat, mean), NULL, 0);
  if (hl_emit_has_value (emit, "cleanliness") || hl_emit_has_value (emit, "clean_UA"))
    {
      int cleanliness = hl_emit_own (emit, "cleanliness", HL_VAR_RATIO), clean = hl_emit_own (emit, "clean_UA", HL_VAR_CONDUCTANCE);
      hl_emit_done (emit, hl_add_quotient (emit->system, clean, ua, cleanliness), NULL, 0);
    }
}

/* --- checks ------------------------------------------------------------------- */

static void
check_difference (HlChecker *checker)
{
  double difference, rise;
  if (!hl_check_own (checker, "terminal_difference", &difference) || !hl_check_own (checker, "cooling_rise", &rise))
    return;
  const HlNodeResult *steam = hl_check_port (checker, "steam");
  double least = fmin (difference, difference + rise);
  if (!(least < 2.0) || steam == NULL || !steam->has_pressure)
    return;
  HlSaturation sat;
  if (hl_fluid_saturation_p (hl_check_fluid (checker, "steam"), steam->p, &sat) != HL_OK)
    return;
  g_autofree char *T_sat = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, sat.T);
  g_autofree char *T_out = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, sat.T - difference);
  g_autofree char *d = hl_check_text (checker, HL_DIMENSION_TEMPERATURE_DIFFERENCE, least);
  HlFinding *finding;
  if (least < 0.0)
    finding = hl_check_add (checker, HL_GRADE_ERROR, "temperature-cross", "terminal_difference",
      g_strdup_printf (_("Cooling water of %s would leave at %s, but the steam condenses at %s. Raise the condenser pressure or lower the cooling water temperature."),
                       checker->component->id, T_out, T_sat));
  else
    finding = hl_check_add (checker, least < 1.0 ? HL_GRADE_WARNING : HL_GRADE_CAUTION, "small-difference", "terminal_difference",
      g_strdup_printf (_("Only %s remain between steam and cooling water of %s; less than 2 K asks for a very large surface."), d, checker->component->id));
  hl_check_offer (checker, finding, "terminal_difference");
  hl_check_offer (checker, finding, "steam.p");
  hl_check_offer (checker, finding, "cooling_inlet_T");
}

static void
check (HlChecker *checker)
{
  const HlNodeResult *steam = hl_check_port (checker, "steam"), *out = hl_check_port (checker, "condensate");
  const HlNodeResult *drain = hl_check_port (checker, "drain");
  double rise;
  check_difference (checker);
  if (hl_check_own (checker, "cooling_rise", &rise) && rise < 0.0)
    {
      g_autofree char *d = hl_check_text (checker, HL_DIMENSION_TEMPERATURE_DIFFERENCE, -rise);
      HlFinding *finding = hl_check_add (checker, HL_GRADE_ERROR, "heat-runs-backwards", "cooling_rise",
        g_strdup_printf (_("Cooling water of %s would leave %s colder than it comes in. Raise the condenser pressure or lower the cooling water temperature."),
                         checker->component->id, d));
      hl_check_offer (checker, finding, "cooling_rise");
      hl_check_offer (checker, finding, "steam.p");
    }
  if (steam != NULL && drain != NULL && steam->has_pressure && drain->has_pressure && drain->p < steam->p * (1.0 - 1e-9))
    {
      g_autofree char *p_drain = hl_check_text (checker, HL_DIMENSION_PRESSURE, drain->p);
      g_autofree char *p_shell = hl_check_text (checker, HL_DIMENSION_PRESSURE, steam->p);
      hl_check_add (checker, HL_GRADE_ERROR, "drain-uphill", "drain.p",
        g_strdup_printf (_("The drain into %s arrives at %s, below the shell's %s: it cannot flow in. Pump it, or lead it elsewhere."), checker->component->id, p_drain, p_shell));
    }
  if (steam != NULL && out != NULL && steam->has_state && out->has_state && steam->st.h <= out->st.h)
    hl_check_add (checker, HL_GRADE_ERROR, "nothing-to-condense", "",
      g_strdup_printf (_("What enters %s holds no more heat than its condensate: there is nothing to condense."), checker->component->id));
  if (steam != NULL && steam->has_pressure && steam->p < 3000.0 && hl_check_is_water (checker, "steam"))
    {
      g_autofree char *p = hl_check_text (checker, HL_DIMENSION_PRESSURE, steam->p);
      HlFinding *finding = hl_check_add (checker, HL_GRADE_CAUTION, "condenser-pressure", "steam.p",
        g_strdup_printf (_("Condenser pressure of %s is %s; below 30 mbar the last blades and the air extraction grow large."), checker->component->id, p));
      hl_check_offer (checker, finding, "steam.p");
      hl_check_offer (checker, finding, "cooling_inlet_T");
    }
}

static void
processes (HlProcessSink *sink)
{
  int out = hl_process_node (sink, "condensate");
  hl_process_add (sink, HL_PROCESS_COOLING, hl_process_node (sink, "steam"), out);
  hl_process_add (sink, HL_PROCESS_THROTTLING, hl_process_node (sink, "drain"), out);
  hl_process_add (sink, HL_PROCESS_HEATING, hl_process_node (sink, "cooling_inlet"), hl_process_node (sink, "cooling_outlet"));
}

const HlComponentModel hl_condenser_model = { "condenser", emit_condenser, check, processes };
