/* Results of the plant as a whole: powers, heats, efficiencies; any of them may be given instead of a flow.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/model.h"
#include "plant/i18n.h"

#define MOST_TERMS 100

/* sum = all of the parts.  A sum of very many goes over partial sums. */
static void
add_sum (HlEmit *emit, HlVarKind kind, const int *parts, int n, int sum)
{
  int vars[MOST_TERMS + 1];
  double factors[MOST_TERMS + 1];
  if (n > MOST_TERMS)
    {
      g_autofree int *partial = g_new (int, n / MOST_TERMS + 1);
      int n_partial = 0;
      for (int first = 0; first < n; first += MOST_TERMS)
        {
          partial[n_partial] = hl_emit_hidden (emit, "partial_sum", kind);
          add_sum (emit, kind, parts + first, MIN (MOST_TERMS, n - first), partial[n_partial++]);
        }
      add_sum (emit, kind, partial, n_partial, sum);
      return;
    }
  for (int k = 0; k < n; k++)
    {
      vars[k] = parts[k];
      factors[k] = 1.0;
    }
  vars[n] = sum;
  factors[n] = -1.0;
  hl_emit_done (emit, hl_add_linear (emit->system, kind, vars, factors, n + 1, 0.0), NULL, n);
}

/* total = sum of the parts; -1 where there are none. */
static int
total (HlEmit *emit, const char *key, HlVarKind kind, HlSum sum)
{
  const GArray *parts = emit->model->sums[sum];
  if (parts->len == 0)
    return -1;
  int var = hl_emit_own (emit, key, kind);
  add_sum (emit, kind, (const int *) (const void *) parts->data, (int) parts->len, var);
  return var;
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
  int n_components = (int) hl_plant_n_components (model->plant);
  g_autoptr (GArray) parts = g_array_new (FALSE, FALSE, sizeof (int));
  for (int c = 0; c < n_components; c++)
    {
      int part = hl_model_own_var (model, c, "fuel_heat_hhv");
      if (part >= 0)
        g_array_append_val (parts, part);
    }
  if (parts->len == 0)
    return -1;
  int sum = hl_emit_hidden (emit, "fuel_heat_hhv", HL_VAR_POWER);
  add_sum (emit, HL_VAR_POWER, (const int *) (const void *) parts->data, (int) parts->len, sum);
  return sum;
}

/* Fans take a part of gross power. */
static void
emit_fans (HlEmit *emit, int gross)
{
  const HlModel *model = emit->model;
  for (int c = 0; c < (int) hl_plant_n_components (model->plant); c++)
    {
      int fraction = hl_model_own_var (model, c, "fan_fraction"), power = hl_model_own_var (model, c, "fan_power");
      if (fraction < 0 || power < 0)
        continue;
      HlEquation *e = hl_add_product (emit->system, gross, fraction, power);
      e->component = c;
    }
}

/* A plant without generator whose compressors lift heat: what it does for the power it takes. */
static void
emit_reverse_cycle (HlEmit *emit, int motors, int taken_up, int delivered)
{
  int input = hl_emit_own (emit, "power_input", HL_VAR_POWER);
  hl_system_merge (emit->system, motors, input);
  quotient (emit, "cop", HL_VAR_RATIO, delivered, input);
  quotient (emit, "cop_cooling", HL_VAR_RATIO, taken_up, input);
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
  if (gross >= 0)
    emit_fans (emit, gross);
  int heat = total (emit, "heat_input", HL_VAR_POWER, HL_SUM_HEAT_INPUT);
  int fuel = total (emit, "fuel_heat", HL_VAR_POWER, HL_SUM_FUEL_HEAT);
  total (emit, "fuel_flow", HL_VAR_FLOW, HL_SUM_FUEL_FLOW);
  int co2 = total (emit, "co2_flow", HL_VAR_FLOW, HL_SUM_CO2);
  total (emit, "biogenic_co2_flow", HL_VAR_FLOW, HL_SUM_BIOGENIC_CO2);
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
  else if (motors >= 0)
    hl_system_merge (emit->system, motors, hl_emit_own (emit, "own_consumption", HL_VAR_POWER));
  if (gross < 0 && motors >= 0 && model->sums[HL_SUM_COMPRESSOR_POWER]->len > 0)
    emit_reverse_cycle (emit, motors, heat, delivered);
  if (turbines >= 0)
    quotient (emit, "cycle_efficiency", HL_VAR_RATIO, pumps >= 0 ? difference (emit, "shaft_power_net", turbines, pumps) : turbines, heat);
  quotient (emit, "gross_efficiency", HL_VAR_RATIO, gross, basis);
  quotient (emit, "net_efficiency_lhv", HL_VAR_RATIO, net, basis);
  quotient (emit, "net_efficiency_hhv", HL_VAR_RATIO, net, fuel_heat_hhv (emit));
  if (net >= 0 && basis >= 0 && delivered >= 0)
    quotient (emit, "utilisation", HL_VAR_RATIO, sum_of_two (emit, "useful", FALSE, net, delivered), basis);
  quotient (emit, "specific_co2", HL_VAR_STEAM_RATE, co2, net);
  quotient (emit, "heat_rate", HL_VAR_HEAT_RATE, heat, gross);
  if (gross >= 0 && model->sums[HL_SUM_LIVE_STEAM]->len > 0)
    quotient (emit, "steam_rate", HL_VAR_STEAM_RATE, total (emit, "live_steam", HL_VAR_FLOW, HL_SUM_LIVE_STEAM), gross);
  quotient (emit, "back_work_ratio", HL_VAR_RATIO, pumps, turbines);
}
