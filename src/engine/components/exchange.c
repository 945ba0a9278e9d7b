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
  hl_system_merge (emit->system, NODE (emit, in)->m, NODE (emit, out)->m);
  if (loss_key == NULL)
    hl_system_merge (emit->system, NODE (emit, in)->p, NODE (emit, out)->p);
  else
    hl_emit_done (emit, hl_add_pressure_loss (emit->system, NODE (emit, in)->p, NODE (emit, out)->p, hl_emit_own (emit, loss_key, HL_VAR_RATIO)), NULL, -1);
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

/* What the casing loses, the hot side gives beside the heat that arrives. */
static int
emit_heat_loss (HlEmit *emit, int heat)
{
  int share = hl_emit_own (emit, "heat_loss_fraction", HL_VAR_RATIO), loss = hl_emit_own (emit, "heat_loss", HL_VAR_POWER);
  int given = hl_emit_hidden (emit, "gas_heat", HL_VAR_POWER);
  hl_emit_done (emit, hl_add_product (emit->system, given, share, loss), NULL, 2);
  hl_emit_done (emit, hl_add_linear (emit->system, HL_VAR_POWER, (const int[]) { heat, given, loss }, (const double[]) { 1.0, -1.0, 1.0 }, 3, 0.0),
                N_("{0} = {1} − {2}"), -1);
  return given;
}

int
hl_exchange_emit_sides (HlEmit *emit, const HlExchangeSides *sides)
{
  const Ends n = { hl_emit_port (emit, sides->hot_in), hl_emit_port (emit, sides->hot_out), hl_emit_port (emit, sides->cold_in), hl_emit_port (emit, sides->cold_out) };
  int heat = hl_emit_own (emit, "heat", HL_VAR_POWER), pinch = hl_emit_own (emit, "pinch", HL_VAR_TEMPERATURE_DIFFERENCE);
  int ua = hl_emit_own (emit, "UA", HL_VAR_CONDUCTANCE), given = sides->loses_heat ? emit_heat_loss (emit, heat) : heat;
  hl_exchange_count (emit, heat);
  emit_side (emit, n.hot_in, n.hot_out, sides->hot_loss, -1.0, given);
  emit_side (emit, n.cold_in, n.cold_out, sides->cold_loss, 1.0, heat);
  if (sides->has_end_differences)
    {
      emit_end (emit, "hot_end_difference", n.hot_in, n.cold_out, FALSE);
      emit_end (emit, "cold_end_difference", n.hot_out, n.cold_in, TRUE);
    }
  const HlNode *hot_in = NODE (emit, n.hot_in), *hot_out = NODE (emit, n.hot_out), *cold_in = NODE (emit, n.cold_in), *cold_out = NODE (emit, n.cold_out);
  const int inputs[HL_N_CURVE_INPUTS] = { hot_in->p, hot_in->h, hot_out->p, hot_out->h, cold_in->p, cold_in->h, cold_out->p, cold_out->h };
  hl_emit_done (emit, hl_add_exchanger_pinch (emit->system, hot_in->fluid, cold_in->fluid, inputs, pinch), NULL, -1);
  hl_emit_done (emit, hl_add_exchanger_conductance (emit->system, hot_in->fluid, cold_in->fluid, inputs, heat, ua), NULL, -1);
  if (sides->has_effectiveness)
    hl_emit_done (emit, hl_add_exchanger_effectiveness (emit->system, hot_in->fluid, cold_in->fluid, inputs, hot_in->m, cold_in->m, heat,
                                                        hl_emit_own (emit, "effectiveness", HL_VAR_RATIO)), NULL, -1);
  return heat;
}

static const HlExchangeSides usual_sides = {
  "hot_inlet", "hot_outlet", "cold_inlet", "cold_outlet", "hot_pressure_loss", "cold_pressure_loss",
  .has_end_differences = TRUE, .has_effectiveness = TRUE,
};

void
hl_exchange_emit (HlEmit *emit)
{
  hl_exchange_emit_sides (emit, &usual_sides);
}

/* --- checks ------------------------------------------------------------------- */

static void
offer_differences (HlChecker *checker, HlFinding *finding)
{
  hl_check_offer (checker, finding, "pinch");
  static const char *const keys[] = { "hot_outlet.T", "cold_outlet.T", "hot_end_difference", "approach", "terminal_difference", "gas_outlet.T" };
  guint n_offered = 0;
  for (guint k = 0; k < G_N_ELEMENTS (keys) && n_offered < 2; k++)
    if (hl_component_quantity_kind (checker->component, keys[k]) != NULL)
      {
        hl_check_offer (checker, finding, keys[k]);
        n_offered++;
      }
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
hl_exchange_check_sides (HlChecker *checker, const HlExchangeSides *sides)
{
  const HlNodeResult *hot_in = hl_check_port (checker, sides->hot_in), *hot_out = hl_check_port (checker, sides->hot_out);
  const HlNodeResult *cold_in = hl_check_port (checker, sides->cold_in), *cold_out = hl_check_port (checker, sides->cold_out);
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
  if (hl_exchanger_curve (hl_model_node (model, hl_model_port_node (model, checker->index, sides->hot_in))->fluid,
                          hl_model_node (model, hl_model_port_node (model, checker->index, sides->cold_in))->fluid, inputs, &curve) == HL_OK)
    check_curve (checker, &curve);
  /* Heat that the casing loses takes entropy with it. */
  if (!sides->loses_heat)
    hl_check_entropy (checker);
}

void
hl_exchange_check (HlChecker *checker)
{
  hl_exchange_check_sides (checker, &usual_sides);
}

/* --- processes ------------------------------------------------------------------ */

void
hl_exchange_processes_sides (HlProcessSink *sink, const HlExchangeSides *sides)
{
  hl_process_add (sink, HL_PROCESS_COOLING, hl_process_node (sink, sides->hot_in), hl_process_node (sink, sides->hot_out));
  hl_process_add (sink, HL_PROCESS_HEATING, hl_process_node (sink, sides->cold_in), hl_process_node (sink, sides->cold_out));
}

void
hl_exchange_processes (HlProcessSink *sink)
{
  hl_exchange_processes_sides (sink, &usual_sides);
}
