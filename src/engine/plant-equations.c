/* Results of the plant as a whole: powers, heats, efficiencies; any of them may be given instead of a flow.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/model.h"
#include "plant/i18n.h"

/* total = sum of the parts; -1 where there are none. */
static int
total (HlEmit *emit, const char *key, HlVarKind kind, HlSum sum)
{
  const GArray *parts = emit->model->sums[sum];
  int vars[HL_EQUATION_MOST];
  double factors[HL_EQUATION_MOST];
  if (parts->len == 0)
    return -1;
  g_return_val_if_fail (parts->len < HL_EQUATION_MOST, -1);
  int n = (int) parts->len;
  for (int k = 0; k < n; k++)
    {
      vars[k] = g_array_index (parts, int, k);
      factors[k] = 1.0;
    }
  vars[n] = hl_emit_own (emit, key, kind);
  factors[n] = -1.0;
  hl_emit_done (emit, hl_add_linear (emit->system, kind, vars, factors, n + 1, 0.0), NULL, n);
  return vars[n];
}

static void
quotient (HlEmit *emit, const char *key, HlVarKind kind, int top, int bottom)
{
  if (top < 0 || bottom < 0)
    return;
  int var = hl_emit_own (emit, key, kind);
  hl_emit_done (emit, hl_add_quotient (emit->system, var, top, bottom), NULL, 0);
}

/* a - b as a variable, named only in explanations. */
static int
difference (HlEmit *emit, const char *key, int a, int b)
{
  int var = hl_emit_hidden (emit, key, HL_VAR_POWER);
  hl_emit_done (emit, hl_add_linear (emit->system, HL_VAR_POWER, (const int[]) { var, a, b }, (const double[]) { 1.0, -1.0, 1.0 }, 3, 0.0),
                N_("{0} = {1} − {2}"), 0);
  return var;
}

static int
sum_of_two (HlEmit *emit, const char *key, gboolean is_own, int a, int b)
{
  if (a < 0)
    return b;
  if (b < 0)
    return a;
  int var = is_own ? hl_emit_own (emit, key, HL_VAR_POWER) : hl_emit_hidden (emit, key, HL_VAR_POWER);
  hl_emit_done (emit, hl_add_linear (emit->system, HL_VAR_POWER, (const int[]) { var, a, b }, (const double[]) { 1.0, -1.0, -1.0 }, 3, 0.0),
                N_("{0} = {1} + {2}"), 0);
  return var;
}

/* Fuel heat on the higher heating value, boiler by boiler. */
static int
fuel_heat_hhv (HlEmit *emit)
{
  const HlModel *model = emit->model;
  int n_components = (int) hl_plant_n_components (model->plant), vars[HL_EQUATION_MOST], n = 0;
  double factors[HL_EQUATION_MOST / 2], minus = -1.0;
  for (int c = 0; c < n_components && n < HL_EQUATION_MOST / 2 - 2; c++)
    {
      int heat = hl_model_own_var (model, c, "fuel_heat");
      int ratio = hl_model_own_var (model, c, "fuel_hhv_ratio");
      if (heat < 0 || ratio < 0)
        continue;
      vars[2 * n] = heat;
      vars[2 * n + 1] = ratio;
      factors[n++] = 1.0;
    }
  if (n == 0)
    return -1;
  int sum = hl_emit_hidden (emit, "fuel_heat_hhv", HL_VAR_POWER);
  hl_emit_done (emit, hl_add_energy (emit->system, HL_VAR_POWER, vars, factors, n, &sum, &minus, 1), NULL, 2 * n);
  return sum;
}

void
hl_emit_plant (HlModel *model)
{
  HlEmit plant = { model, model->system, NULL, -1 }, *emit = &plant;
  int turbines = -1, pumps = -1, net = -1;
  if (model->sums[HL_SUM_TURBINE_POWER]->len > 0)
    turbines = total (emit, "turbine_power", HL_VAR_POWER, HL_SUM_TURBINE_POWER);
  if (model->sums[HL_SUM_PUMP_POWER]->len > 0)
    pumps = total (emit, "pump_power", HL_VAR_POWER, HL_SUM_PUMP_POWER);
  int gross = total (emit, "gross_power", HL_VAR_POWER, HL_SUM_GROSS);
  int heat = total (emit, "heat_input", HL_VAR_POWER, HL_SUM_HEAT_INPUT);
  int fuel = total (emit, "fuel_heat", HL_VAR_POWER, HL_SUM_FUEL_HEAT);
  total (emit, "fuel_flow", HL_VAR_FLOW, HL_SUM_FUEL_FLOW);
  int delivered = total (emit, "heat_delivered", HL_VAR_POWER, HL_SUM_DELIVERED);
  total (emit, "heat_rejected", HL_VAR_POWER, HL_SUM_REJECTED);
  int basis = fuel >= 0 ? fuel : heat;

  int own = -1, motors = model->sums[HL_SUM_MOTOR_POWER]->len > 0 ? total (emit, "motor_power", HL_VAR_POWER, HL_SUM_MOTOR_POWER) : -1;
  if (gross >= 0)
    {
      int fraction = hl_emit_own (emit, "other_consumption_fraction", HL_VAR_RATIO), other = hl_emit_own (emit, "other_consumption", HL_VAR_POWER);
      hl_emit_done (emit, hl_add_product (emit->system, gross, fraction, other), NULL, 2);
      own = hl_emit_own (emit, "own_consumption", HL_VAR_POWER);
      if (motors >= 0)
        hl_emit_done (emit, hl_add_linear (emit->system, HL_VAR_POWER, (const int[]) { own, motors, other }, (const double[]) { 1.0, -1.0, -1.0 }, 3, 0.0),
                      N_("{0} = {1} + {2}"), 0);
      else
        hl_system_merge (emit->system, own, other);
      net = hl_emit_own (emit, "net_power", HL_VAR_POWER);
      hl_emit_done (emit, hl_add_linear (emit->system, HL_VAR_POWER, (const int[]) { net, gross, own }, (const double[]) { 1.0, -1.0, 1.0 }, 3, 0.0),
                    N_("{0} = {1} − {2}"), 0);
    }
  if (turbines >= 0)
    quotient (emit, "cycle_efficiency", HL_VAR_RATIO, pumps >= 0 ? difference (emit, "shaft_power_net", turbines, pumps) : turbines, heat);
  quotient (emit, "gross_efficiency", HL_VAR_RATIO, gross, basis);
  quotient (emit, "net_efficiency_lhv", HL_VAR_RATIO, net, basis);
  quotient (emit, "net_efficiency_hhv", HL_VAR_RATIO, net, fuel_heat_hhv (emit));
  if (net >= 0 && basis >= 0 && delivered >= 0)
    quotient (emit, "utilisation", HL_VAR_RATIO, sum_of_two (emit, "useful", FALSE, net, delivered), basis);
  quotient (emit, "heat_rate", HL_VAR_HEAT_RATE, heat, gross);
  if (gross >= 0 && model->sums[HL_SUM_LIVE_STEAM]->len > 0)
    quotient (emit, "steam_rate", HL_VAR_STEAM_RATE, total (emit, "live_steam", HL_VAR_FLOW, HL_SUM_LIVE_STEAM), gross);
  quotient (emit, "back_work_ratio", HL_VAR_RATIO, pumps, turbines);
}
