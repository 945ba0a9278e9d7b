/* Air-cooled condenser: saturation lies a difference above the air; fans take a part of gross power.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/shell.h"
#include "plant/i18n.h"
#include <math.h>

#define NODE(emit, n) hl_model_node ((emit)->model, n)

static void
emit_air_condenser (HlEmit *emit)
{
  int steam = hl_emit_port (emit, "steam"), out = hl_emit_port (emit, "condensate");
  int subcooling = hl_emit_own (emit, "subcooling", HL_VAR_TEMPERATURE_DIFFERENCE), heat = hl_emit_own (emit, "heat", HL_VAR_POWER);
  int air = hl_emit_site (emit, "air", "ambient_T", hl_plant_site (emit->model->plant)->ambient_T);
  int difference = hl_emit_own (emit, "initial_difference", HL_VAR_TEMPERATURE_DIFFERENCE), T_sat = hl_emit_hidden (emit, "saturation_T", HL_VAR_TEMPERATURE);
  NODE (emit, steam)->is_exhaust = TRUE;
  hl_shell_emit (emit, steam, hl_emit_optional (emit, "drain"), out, subcooling, heat, TRUE);
  hl_emit_done (emit, hl_add_saturation (emit->system, NODE (emit, steam)->fluid, NODE (emit, steam)->p, T_sat), NULL, 1);
  hl_emit_done (emit, hl_add_linear (emit->system, HL_VAR_TEMPERATURE, (const int[]) { T_sat, air, difference }, (const double[]) { 1.0, -1.0, -1.0 }, 3, 0.0),
                N_("{0} = {1} + {2}"), -1);
  int size = hl_emit_own (emit, "conductance", HL_VAR_CONDUCTANCE);
  hl_emit_done (emit, hl_add_quotient (emit->system, size, heat, difference), NULL, 0);
  /* The share of gross power becomes the fans' power where the plant's results are put together; without gross power it says
   * nothing, and only a power put in counts. */
  if (emit->model->has_gross)
    hl_emit_own (emit, "fan_fraction", HL_VAR_RATIO);
  if (emit->model->has_gross || hl_emit_has_value (emit, "fan_power"))
    hl_emit_sum (emit, HL_SUM_MOTOR_POWER, hl_emit_own (emit, "fan_power", HL_VAR_POWER));
  hl_emit_sum (emit, HL_SUM_REJECTED, heat);
}

static void
check (HlChecker *checker)
{
  const HlNodeResult *steam = hl_check_port (checker, "steam");
  double difference;
  hl_shell_check (checker, "drain", "condensate");
  if (!checker->model->has_gross && hl_model_own_var (checker->model, checker->index, "fan_power") < 0)
    {
      HlFinding *none = hl_check_add (checker, HL_GRADE_CAUTION, "fans-not-counted", "fan_power",
        g_strdup_printf (_("Fans of %s are to take a part of gross power, and this plant has none: they are not counted. Give their power itself."),
                         checker->component->id));
      hl_check_offer (checker, none, "fan_power");
    }
  if (steam == NULL || !steam->has_pressure || !hl_check_own (checker, "initial_difference", &difference) || difference >= 2.0)
    return;
  g_autofree char *d = hl_check_text (checker, HL_DIMENSION_TEMPERATURE_DIFFERENCE, fabs (difference));
  HlFinding *finding = difference < 0.0
    ? hl_check_add (checker, HL_GRADE_ERROR, "temperature-cross", "initial_difference",
        g_strdup_printf (_("Steam of %s would condense %s below the temperature of the air that cools it. Raise the condenser pressure."), checker->component->id, d))
    : hl_check_add (checker, HL_GRADE_CAUTION, "small-difference", "initial_difference",
        g_strdup_printf (_("Only %s remain between steam and air of %s; 15 to 35 K are usual."), d, checker->component->id));
  hl_check_offer (checker, finding, "initial_difference");
  hl_check_offer (checker, finding, "steam.p");
}

static void
processes (HlProcessSink *sink)
{
  int out = hl_process_node (sink, "condensate");
  hl_process_add (sink, HL_PROCESS_COOLING, hl_process_node (sink, "steam"), out);
  hl_process_add (sink, HL_PROCESS_THROTTLING, hl_process_node (sink, "drain"), out);
}

const HlComponentModel hl_air_condenser_model = { "air_condenser", emit_air_condenser, check, processes };
