/* District heater: steam condenses against district water, of its own or in lines.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/shell.h"
#include "engine/heater-zones.h"
#include "plant/i18n.h"
#include <math.h>

#define NODE(emit, n) hl_model_node ((emit)->model, n)

/* Variables of the water at both ends, wherever they come from. */
typedef struct { const HlFluid *fluid; int m, p_in, h_in, T_in, p_out, h_out, T_out; } Water;

static void
use_lines (HlEmit *emit, Water *water)
{
  int in = hl_emit_port (emit, "water_inlet"), out = hl_emit_port (emit, "water_outlet");
  int T_in = hl_emit_T (emit, in, hl_emit_has_value (emit, "return_T")), T_out = hl_emit_T (emit, out, TRUE);
  hl_system_merge (emit->system, NODE (emit, in)->m, NODE (emit, out)->m);
  hl_system_merge (emit->system, T_in, water->T_in);
  hl_system_merge (emit->system, T_out, water->T_out);
  hl_system_merge (emit->system, NODE (emit, in)->m, water->m);
  hl_system_merge (emit->system, NODE (emit, in)->p, water->p_in);
  water->fluid = NODE (emit, in)->fluid;
  water->p_out = NODE (emit, out)->p;
  water->h_in = NODE (emit, in)->h;
  water->h_out = NODE (emit, out)->h;
}

static void
use_own (HlEmit *emit, Water *water)
{
  const HlFluid *fluid = water->fluid = emit->model->water;
  water->p_out = hl_emit_own (emit, "water_outlet_p", HL_VAR_PRESSURE);
  water->h_in = hl_emit_own (emit, "water_inlet_h", HL_VAR_ENTHALPY);
  water->h_out = hl_emit_own (emit, "water_outlet_h", HL_VAR_ENTHALPY);
  hl_system_var (emit->system, water->h_in)->start = 2e5;
  hl_system_var (emit->system, water->h_out)->start = 4e5;
  hl_emit_done (emit, hl_add_enthalpy_at_temperature (emit->system, fluid, water->p_in, water->T_in, water->h_in), NULL, -1);
  hl_emit_done (emit, hl_add_enthalpy_at_temperature (emit->system, fluid, water->p_out, water->T_out, water->h_out), NULL, -1);
}

static gboolean
has_lines (HlEmit *emit)
{
  return hl_emit_optional (emit, "water_inlet") >= 0 || hl_emit_optional (emit, "water_outlet") >= 0;
}

static void
emit_district_heater (HlEmit *emit)
{
  HlSystem *system = emit->system;
  int steam = hl_emit_port (emit, "steam"), drain = hl_emit_port (emit, "drain");
  int subcooling = hl_emit_own (emit, "drain_subcooling", HL_VAR_TEMPERATURE_DIFFERENCE), heat = hl_emit_own (emit, "heat", HL_VAR_POWER);
  Water water = { .m = hl_emit_own (emit, "water_flow", HL_VAR_FLOW), .p_in = hl_emit_own (emit, "water_p", HL_VAR_PRESSURE),
                  .T_in = hl_emit_own (emit, "return_T", HL_VAR_TEMPERATURE), .T_out = hl_emit_own (emit, "flow_T", HL_VAR_TEMPERATURE) };
  int loss = hl_emit_own (emit, "water_pressure_loss", HL_VAR_RATIO), ua = hl_emit_own (emit, "UA", HL_VAR_CONDUCTANCE);
  int difference = hl_emit_own (emit, "terminal_difference", HL_VAR_TEMPERATURE_DIFFERENCE), T_sat = hl_emit_hidden (emit, "saturation_T", HL_VAR_TEMPERATURE);
  hl_emit_guess (emit, steam, 2.7e6);
  NODE (emit, steam)->is_exhaust = TRUE;
  hl_shell_emit (emit, steam, hl_emit_optional (emit, "drain_inlet"), drain, subcooling, heat, FALSE);
  if (has_lines (emit))
    use_lines (emit, &water);
  else
    use_own (emit, &water);
  hl_emit_done (emit, hl_add_pressure_loss (system, water.p_in, water.p_out, loss), NULL, -1);
  hl_emit_done (emit, hl_add_saturation (system, NODE (emit, steam)->fluid, NODE (emit, steam)->p, T_sat), NULL, 1);
  hl_emit_done (emit, hl_add_linear (system, HL_VAR_TEMPERATURE, (const int[]) { T_sat, water.T_out, difference }, (const double[]) { 1.0, -1.0, -1.0 }, 3, 0.0),
                N_("{0} = {1} + {2}"), -1);
  const int pairs[] = { water.m, water.h_out, water.m, water.h_in };
  hl_emit_done (emit, hl_add_energy (system, HL_VAR_POWER, pairs, (const double[]) { 1.0, -1.0 }, 2, &heat, (const double[]) { -1.0 }, 1),
                N_("{4} = {0} × ({1} − {3})"), -1);
  const int zones[HL_N_ZONE_INPUTS] = {
    NODE (emit, steam)->p, NODE (emit, steam)->m, NODE (emit, steam)->h, NODE (emit, drain)->m, NODE (emit, drain)->h,
    water.m, water.p_in, water.h_in, water.p_out, water.h_out };
  hl_emit_done (emit, hl_add_heater_conductance (system, NODE (emit, steam)->fluid, water.fluid, zones, ua), NULL, -1);
  hl_emit_sum (emit, HL_SUM_DELIVERED, heat);
}

/* --- checks ------------------------------------------------------------------- */

static void
check (HlChecker *checker)
{
  double difference, flow_T, return_T, subcooling;
  hl_shell_check (checker, "drain_inlet", "drain");
  if (!hl_check_own (checker, "terminal_difference", &difference) || !hl_check_own (checker, "flow_T", &flow_T)
      || !hl_check_own (checker, "return_T", &return_T) || !hl_check_own (checker, "drain_subcooling", &subcooling))
    return;
  g_autofree char *T_sat = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, flow_T + difference);
  g_autofree char *T_flow = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, flow_T);
  g_autofree char *T_return = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, return_T);
  HlFinding *finding = NULL;
  if (flow_T <= return_T)
    finding = hl_check_add (checker, HL_GRADE_ERROR, "heat-runs-backwards", "flow_T",
      g_strdup_printf (_("District water of %s would leave at %s, no hotter than it returns: %s. Raise the flow temperature."), checker->component->id, T_flow, T_return));
  else if (difference < 0.0)
    finding = hl_check_add (checker, HL_GRADE_ERROR, "temperature-cross", "flow_T",
      g_strdup_printf (_("District water of %s would leave at %s, but the steam condenses at %s. Raise the steam pressure or lower the flow temperature."),
                       checker->component->id, T_flow, T_sat));
  else if (flow_T + difference - subcooling < return_T)
    finding = hl_check_add (checker, HL_GRADE_ERROR, "temperature-cross", "drain_subcooling",
      g_strdup_printf (_("The drain of %s would leave colder than the district water that cools it, %s. Lower the subcooling."), checker->component->id, T_return));
  else if (difference < 2.0)
    {
      g_autofree char *d = hl_check_text (checker, HL_DIMENSION_TEMPERATURE_DIFFERENCE, difference);
      finding = hl_check_add (checker, difference < 1.0 ? HL_GRADE_WARNING : HL_GRADE_CAUTION, "small-difference", "terminal_difference",
        g_strdup_printf (_("Only %s remain between steam and district water of %s; less than 2 K asks for a very large surface."), d, checker->component->id));
    }
  if (finding == NULL)
    return;
  hl_check_offer (checker, finding, finding->at.key);
  hl_check_offer (checker, finding, "steam.p");
}

static void
processes (HlProcessSink *sink)
{
  int drain = hl_process_node (sink, "drain");
  hl_process_add (sink, HL_PROCESS_COOLING, hl_process_node (sink, "steam"), drain);
  hl_process_add (sink, HL_PROCESS_THROTTLING, hl_process_node (sink, "drain_inlet"), drain);
  hl_process_add (sink, HL_PROCESS_HEATING, hl_process_node (sink, "water_inlet"), hl_process_node (sink, "water_outlet"));
}

const HlComponentModel hl_district_heater_model = { "district_heater", emit_district_heater, check, processes };
