/* What exchanger and recuperator have in common: two streams in counterflow, sampled along the heat that passes.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/exchange.h"
#include "engine/exchanger-curve.h"
#include "plant/i18n.h"
#include <math.h>

#define NODE(emit, n) hl_model_node ((emit)->model, n)

typedef struct { int hot_in, hot_out, cold_in, cold_out; } Ends;

/* One side: same flow, a pressure loss, and the heat; @sign 1 where it is taken up. */
static void
emit_side (HlEmit *emit, int in, int out, const char *loss_key, double sign, int heat)
{
  int loss = hl_emit_own (emit, loss_key, HL_VAR_RATIO);
  hl_system_merge (emit->system, NODE (emit, in)->m, NODE (emit, out)->m);
  hl_emit_done (emit, hl_add_pressure_loss (emit->system, NODE (emit, in)->p, NODE (emit, out)->p, loss), NULL, -1);
  const int out_first[] = { NODE (emit, out)->m, NODE (emit, out)->h, NODE (emit, in)->m, NODE (emit, in)->h };
  const int in_first[] = { NODE (emit, in)->m, NODE (emit, in)->h, NODE (emit, out)->m, NODE (emit, out)->h };
  hl_emit_done (emit, hl_add_energy (emit->system, HL_VAR_POWER, sign > 0.0 ? out_first : in_first, (const double[]) { 1.0, -1.0 }, 2,
                                     &heat, (const double[]) { -1.0 }, 1), N_("{4} = {0} × ({1} − {3})"), -1);
}

/* Difference at one end; a temperature that only serves to state it must drive its state. */
static void
emit_end (HlEmit *emit, const char *key, int hot, int cold, gboolean hot_is_found)
{
  gboolean drives = hl_emit_has_value (emit, key);
  int T_hot = hl_emit_T (emit, hot, drives && hot_is_found), T_cold = hl_emit_T (emit, cold, drives && !hot_is_found);
  int difference = hl_emit_own (emit, key, HL_VAR_TEMPERATURE_DIFFERENCE);
  hl_emit_done (emit, hl_add_linear (emit->system, HL_VAR_TEMPERATURE, (const int[]) { difference, T_hot, T_cold }, (const double[]) { 1.0, -1.0, 1.0 }, 3, 0.0),
                N_("{0} = {1} − {2}"), 0);
}

/* In the order of the option's words. */
void
hl_exchange_count (HlEmit *emit, int heat)
{
  static const int sums[] = { -1, HL_SUM_HEAT_INPUT, HL_SUM_DELIVERED, HL_SUM_REJECTED };
  int counts = hl_component_option (emit->component, "counts");
  if (counts >= 0 && counts < (int) G_N_ELEMENTS (sums) && sums[counts] >= 0)
    hl_emit_sum (emit, (HlSum) sums[counts], heat);
}

void
hl_exchange_emit (HlEmit *emit)
{
  const Ends n = { hl_emit_port (emit, "hot_inlet"), hl_emit_port (emit, "hot_outlet"), hl_emit_port (emit, "cold_inlet"), hl_emit_port (emit, "cold_outlet") };
  int heat = hl_emit_own (emit, "heat", HL_VAR_POWER), pinch = hl_emit_own (emit, "pinch", HL_VAR_TEMPERATURE_DIFFERENCE);
  int share = hl_emit_own (emit, "effectiveness", HL_VAR_RATIO), ua = hl_emit_own (emit, "UA", HL_VAR_CONDUCTANCE);
  hl_exchange_count (emit, heat);
  emit_side (emit, n.hot_in, n.hot_out, "hot_pressure_loss", -1.0, heat);
  emit_side (emit, n.cold_in, n.cold_out, "cold_pressure_loss", 1.0, heat);
  emit_end (emit, "hot_end_difference", n.hot_in, n.cold_out, FALSE);
  emit_end (emit, "cold_end_difference", n.hot_out, n.cold_in, TRUE);
  const HlNode *hot_in = NODE (emit, n.hot_in), *hot_out = NODE (emit, n.hot_out), *cold_in = NODE (emit, n.cold_in), *cold_out = NODE (emit, n.cold_out);
  const int inputs[HL_N_CURVE_INPUTS] = { hot_in->p, hot_in->h, hot_out->p, hot_out->h, cold_in->p, cold_in->h, cold_out->p, cold_out->h };
  hl_emit_done (emit, hl_add_exchanger_pinch (emit->system, hot_in->fluid, cold_in->fluid, inputs, pinch), NULL, -1);
  hl_emit_done (emit, hl_add_exchanger_conductance (emit->system, hot_in->fluid, cold_in->fluid, inputs, heat, ua), NULL, -1);
  hl_emit_done (emit, hl_add_exchanger_effectiveness (emit->system, hot_in->fluid, cold_in->fluid, inputs, hot_in->m, cold_in->m, heat, share), NULL, -1);
}

/* --- checks ------------------------------------------------------------------- */

static void
offer_differences (HlChecker *checker, HlFinding *finding)
{
  hl_check_offer (checker, finding, "pinch");
  hl_check_offer (checker, finding, "hot_outlet.T");
  hl_check_offer (checker, finding, "cold_outlet.T");
}

static void
check_curve (HlChecker *checker, const HlExchangerCurve *curve)
{
  int worst = 0;
  for (int k = 1; k < curve->n; k++)
    if (curve->hot[k] - curve->cold[k] < curve->hot[worst] - curve->cold[worst])
      worst = k;
  double least = curve->hot[worst] - curve->cold[worst];
  if (!(least < 2.0))
    return;
  g_autofree char *d = hl_check_text (checker, HL_DIMENSION_TEMPERATURE_DIFFERENCE, fabs (least));
  g_autofree char *T = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, curve->hot[worst]);
  double percent = 100.0 * curve->share[worst];
  if (least < -1e-6)
    offer_differences (checker, hl_check_add (checker, HL_GRADE_ERROR, "temperature-cross", "pinch",
      g_strdup_printf (_("In %s the cold side would be %s hotter than the hot side, where %.0f %% of the heat has passed from the cold end and the hot side is at %s. Let less heat pass, or change the temperatures or pressures."),
                       checker->component->id, d, percent, T)));
  else
    offer_differences (checker, hl_check_add (checker, least < 1.0 ? HL_GRADE_WARNING : HL_GRADE_CAUTION, "small-difference", "pinch",
      g_strdup_printf (_("In %s only %s remain between the two sides, where the hot side is at %s; less than 2 K asks for a very large surface."),
                       checker->component->id, d, T)));
}

void
hl_exchange_check (HlChecker *checker)
{
  const HlNodeResult *hot_in = hl_check_port (checker, "hot_inlet"), *hot_out = hl_check_port (checker, "hot_outlet");
  const HlNodeResult *cold_in = hl_check_port (checker, "cold_inlet"), *cold_out = hl_check_port (checker, "cold_outlet");
  if (hot_in == NULL || hot_out == NULL || cold_in == NULL || cold_out == NULL || !hot_in->has_state || !hot_out->has_state || !cold_in->has_state
      || !cold_out->has_state)
    return;
  if (hot_out->st.h > hot_in->st.h + 1e-3 || cold_out->st.h < cold_in->st.h - 1e-3)
    {
      g_autofree char *hot = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, hot_in->st.T);
      g_autofree char *cold = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, cold_in->st.T);
      offer_differences (checker, hl_check_add (checker, HL_GRADE_ERROR, "heat-runs-backwards", "",
        g_strdup_printf (_("In %s heat would pass from the cold side, which comes in at %s, to the hot side, at %s. Exchange the two lines, or change the outlet temperature."),
                         checker->component->id, cold, hot)));
      return;
    }
  const double inputs[HL_N_CURVE_INPUTS] = { log (hot_in->p), hot_in->st.h, log (hot_out->p), hot_out->st.h,
                                             log (cold_in->p), cold_in->st.h, log (cold_out->p), cold_out->st.h };
  const HlModel *model = checker->model;
  HlExchangerCurve curve;
  if (hl_exchanger_curve (hl_model_node (model, hl_model_port_node (model, checker->index, "hot_inlet"))->fluid,
                          hl_model_node (model, hl_model_port_node (model, checker->index, "cold_inlet"))->fluid, inputs, &curve) == HL_OK)
    check_curve (checker, &curve);
  hl_check_entropy (checker);
}

void
hl_exchange_processes (HlProcessSink *sink)
{
  hl_process_add (sink, HL_PROCESS_COOLING, hl_process_node (sink, "hot_inlet"), hl_process_node (sink, "hot_outlet"));
  hl_process_add (sink, HL_PROCESS_HEATING, hl_process_node (sink, "cold_inlet"), hl_process_node (sink, "cold_outlet"));
}
