/* Where a gas path begins and ends: source of hot gas, fan, stack with its dew points.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/components.h"
#include "fluid/gas.h"
#include "plant/i18n.h"
#include <math.h>

#define NODE(emit, n) hl_model_node ((emit)->model, n)
#define MMHG 133.3224     /* conventional millimetre of mercury [Pa] */

/* heat = m (h - h0), h0 of the same gas at 25 °C with all its water as vapour: what counts as sensible heat. */
static int
emit_sensible_heat (HlEmit *emit, int node)
{
  const HlNode *n = NODE (emit, node);
  HlState cold;
  double zero = 0.0;
  if (hl_fluid_is_gas (n->fluid))
    zero = hl_gas_zero_enthalpy (n->fluid);
  else if (hl_fluid_state_pT (n->fluid, 101325.0, 298.15, &cold) == HL_OK)
    zero = cold.h;
  int heat = hl_emit_own (emit, "heat", HL_VAR_POWER), h0 = hl_emit_constant (emit, HL_VAR_ENTHALPY, zero);
  const int pairs[] = { n->m, n->h, n->m, h0 };
  hl_emit_done (emit, hl_add_energy (emit->system, HL_VAR_POWER, pairs, (const double[]) { 1.0, -1.0 }, 2, &heat, (const double[]) { -1.0 }, 1),
                N_("{4} = {0} × ({1} − {3})"), 4);
  return heat;
}

static void
emit_gas_source (HlEmit *emit)
{
  emit_sensible_heat (emit, hl_emit_port (emit, "outlet"));
}

/* --- stack ------------------------------------------------------------------------ */

/* T = T_sat(y p) */
static HlStatus
water_dew_point (const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  HlSaturation sat;
  double total = exp (x[0]), p = x[2] * total;
  HlStatus status = hl_fluid_saturation_p (e->fluid, p, &sat);
  if (status != HL_OK)
    return status;
  *r = x[1] - sat.T;
  dr[0] = -sat.T_p * p;
  dr[1] = 1.0;
  dr[2] = -sat.T_p * total;
  return HL_OK;
}

/* 1000/T = 2.276 - 0.0294 ln a - 0.0858 ln b + 0.0062 ln a ln b, a and b the partial pressures of water and SO3 in mmHg. */
static HlStatus
acid_dew_point (G_GNUC_UNUSED const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  if (!(x[1] > 0.0 && x[3] > 0.0))
    return HL_OUTSIDE_RANGE;
  double water = x[0] + log (x[3] / MMHG), acid = x[0] + log (x[1] / MMHG);
  double inverse = (2.276 - 0.0294 * water - 0.0858 * acid + 0.0062 * water * acid) / 1000.0, T = 1.0 / inverse;
  double to_water = (-0.0294 + 0.0062 * acid) / 1000.0, to_acid = (-0.0858 + 0.0062 * water) / 1000.0;
  *r = x[2] - T;
  dr[0] = T * T * (to_water + to_acid);
  dr[1] = T * T * to_acid / x[1];
  dr[2] = 1.0;
  dr[3] = T * T * to_water / x[3];
  return HL_OK;
}

static double
water_fraction (const HlFluid *fluid)
{
  int water = hl_gas_species_find ("H2O");
  if (!hl_fluid_is_gas (fluid) || water < 0)
    return 0.0;
  g_autofree double *moles = g_new0 (double, hl_gas_n_species ());
  hl_gas_moles (fluid, moles);
  return moles[water];
}

static void
emit_stack (HlEmit *emit)
{
  HlSystem *system = emit->system;
  int in = hl_emit_port (emit, "inlet");
  hl_emit_sum (emit, HL_SUM_REJECTED, emit_sensible_heat (emit, in));
  hl_emit_T (emit, in, FALSE);
  double y = water_fraction (NODE (emit, in)->fluid);
  int p = NODE (emit, in)->p;
  gboolean has_acid = hl_component_option (emit->component, "gas") != 0;
  int so3 = has_acid ? hl_emit_own (emit, "so3_fraction", HL_VAR_RATIO) : -1;
  if (!(y > 0.0))
    return;
  int share = hl_emit_constant (emit, HL_VAR_RATIO, y);
  HlEquation *e = hl_system_add_equation (system, water_dew_point, HL_VAR_TEMPERATURE, 2,
                                          (const int[]) { p, hl_emit_own (emit, "water_dew_point", HL_VAR_TEMPERATURE), share }, 3, NULL, 0);
  e->fluid = hl_fluid_water ();
  hl_emit_done (emit, e, N_("{1} = T_sat({2} × {0})"), 1);
  if (!has_acid)
    return;
  e = hl_system_add_equation (system, acid_dew_point, HL_VAR_TEMPERATURE, 4,
                              (const int[]) { p, so3, hl_emit_own (emit, "acid_dew_point", HL_VAR_TEMPERATURE), share }, 4, NULL, 0);
  e->source = N_("F. H. Verhoff, J. T. Banchero: Chem. Eng. Prog. 70 (1974), quoted from a secondary text");
  hl_emit_done (emit, e, N_("{2} = 1000 ÷ (2.276 − 0.0294 × ln({3} × {0} ÷ 133.3224) − 0.0858 × ln({1} × {0} ÷ 133.3224) + 0.0062 × ln({3} × {0} ÷ 133.3224) × ln({1} × {0} ÷ 133.3224))"), 2);
}

static gboolean
check_dew_point (HlChecker *checker, double T, const char *key, double margin, HlGrade grade, const char *code, const char *text)
{
  double dew;
  if (!hl_check_own (checker, key, &dew) || T >= dew + margin)
    return FALSE;
  g_autofree char *now = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, T), *at = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, dew);
  HlFinding *finding = hl_check_add (checker, grade, code, "inlet.T", g_strdup_printf (text, checker->component->id, now, at));
  hl_check_offer (checker, finding, "inlet.T");
  hl_check_offer (checker, finding, "so3_fraction");
  return TRUE;
}

static void
check_stack (HlChecker *checker)
{
  const HlNodeResult *in = hl_check_port (checker, "inlet");
  if (in == NULL || !in->has_state)
    return;
  double T = in->st.T;
  gboolean has_acid = hl_component_option (checker->component, "gas") != 0;
  if (check_dew_point (checker, T, "water_dew_point", 0.0, HL_GRADE_CAUTION, "below-water-dew-point",
                       _("Gas reaches stack %s at %s, below the dew point of its water, %s: it drips, and needs a wet stack and a drain."))
      || (has_acid && check_dew_point (checker, T, "acid_dew_point", 10.0, HL_GRADE_CAUTION, "below-acid-dew-point",
                       _("Gas reaches stack %s at %s, less than 10 K above its acid dew point, %s: sulphuric acid condenses on what is colder. Leave it hotter."))))
    return;
  double least = has_acid ? 423.15 : 363.15;
  if (T >= least - 1e-6)
    return;
  g_autofree char *now = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, T), *at = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, least);
  HlFinding *finding = hl_check_add (checker, HL_GRADE_HINT, "cold-stack", "inlet.T",
    g_strdup_printf (_("Gas reaches stack %s at %s; common are %s and more, for draught and against corrosion."), checker->component->id, now, at));
  hl_check_offer (checker, finding, "inlet.T");
}

/* --- fan -------------------------------------------------------------------------- */

static void
emit_fan (HlEmit *emit)
{
  HlSystem *system = emit->system;
  const int in_node = hl_emit_port (emit, "inlet"), out_node = hl_emit_port (emit, "outlet");
  const HlNode *in = NODE (emit, in_node), *out = NODE (emit, out_node);
  int efficiency = hl_emit_own (emit, "isentropic_efficiency", HL_VAR_RATIO), motor = hl_emit_own (emit, "motor_efficiency", HL_VAR_RATIO);
  int rise = hl_emit_own (emit, "pressure_rise", HL_VAR_PRESSURE_DIFFERENCE), warmer = hl_emit_own (emit, "temperature_rise", HL_VAR_TEMPERATURE_DIFFERENCE);
  int power = hl_emit_own (emit, "power", HL_VAR_POWER), motor_power = hl_emit_own (emit, "motor_power", HL_VAR_POWER);
  int T_in = hl_emit_T (emit, in_node, FALSE), T_out = hl_emit_T (emit, out_node, hl_emit_has_value (emit, "temperature_rise"));
  hl_system_merge (system, in->m, out->m);
  hl_emit_done (emit, hl_add_pressure_rise (system, in->p, out->p, rise), NULL, -1);
  hl_emit_done (emit, hl_add_compression (system, in->fluid, in->p, in->h, out->p, efficiency, out->h), NULL, -1);
  hl_emit_done (emit, hl_add_linear (system, HL_VAR_TEMPERATURE, (const int[]) { warmer, T_out, T_in }, (const double[]) { 1.0, -1.0, 1.0 }, 3, 0.0),
                N_("{0} = {1} − {2}"), 0);
  const int pairs[] = { in->m, out->h, in->m, in->h };
  hl_emit_done (emit, hl_add_energy (system, HL_VAR_POWER, pairs, (const double[]) { 1.0, -1.0 }, 2, &power, (const double[]) { -1.0 }, 1),
                N_("{4} = {0} × ({1} − {3})"), 4);
  if (emit->model->is_on_shaft[emit->index])
    {
      hl_emit_done (emit, hl_add_linear (system, HL_VAR_POWER, &motor_power, (const double[]) { 1.0 }, 1, 0.0), N_("{0} = 0: driven by its shaft"), 0);
      return;
    }
  hl_emit_done (emit, hl_add_quotient (system, motor_power, power, motor), NULL, 0);
  hl_emit_sum (emit, HL_SUM_MOTOR_POWER, motor_power);
}

static void
check_fan (HlChecker *checker)
{
  double rise;
  const HlNodeResult *in = hl_check_port (checker, "inlet");
  if (hl_check_own (checker, "pressure_rise", &rise) && rise < -1e-6)
    {
      HlFinding *finding = hl_check_add (checker, HL_GRADE_ERROR, "pressure-falls", "pressure_rise",
        g_strdup_printf (_("The pressure would fall in fan %s. Raise the pressure behind it, or leave it out."), checker->component->id));
      hl_check_offer (checker, finding, "pressure_rise");
      hl_check_offer (checker, finding, "outlet.p");
    }
  if (in != NULL && in->has_state && in->st.phase == HL_PHASE_LIQUID)
    hl_check_add (checker, HL_GRADE_ERROR, "fan-liquid", "inlet.T",
      g_strdup_printf (_("Fan %s draws liquid: it moves gas. Put a pump in its place, or change the medium."), checker->component->id));
  hl_check_entropy (checker);
}

static void
fan_processes (HlProcessSink *sink)
{
  hl_process_add (sink, HL_PROCESS_COMPRESSION, hl_process_node (sink, "inlet"), hl_process_node (sink, "outlet"));
}

const HlComponentModel hl_gas_source_model = { "gas_source", emit_gas_source, NULL, NULL };
const HlComponentModel hl_stack_model = { "stack", emit_stack, check_stack, NULL };
const HlComponentModel hl_fan_model = { "fan", emit_fan, check_fan, fan_processes };
