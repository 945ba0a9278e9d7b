/* Fired boiler: a heat source with fuel, efficiency or the losses that make it, and CO2.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/heat-source.h"
#include "plant/i18n.h"
#include <math.h>

/* --- losses ------------------------------------------------------------------- */

/* fraction = (T_gas - T_air) (A / (21 - O2) + B) / 100 with O2 in % of dry flue gas; with excess air e, 21 - O2 = 21 / (1 + e). */
static HlStatus
siegert (G_GNUC_UNUSED const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  double rise = x[1] - x[2], dry = (1.0 + x[3]) / 2100.0, slope = x[4] * dry + x[5] / 100.0;
  *r = x[0] - rise * slope;
  dr[0] = 1.0;
  dr[1] = -slope;
  dr[2] = slope;
  dr[3] = -rise * x[4] / 2100.0;
  dr[4] = -rise * dry;
  dr[5] = -rise / 100.0;
  return HL_OK;
}

/* O2 (1 + e) = 0.21 e */
static HlStatus
oxygen (G_GNUC_UNUSED const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  *r = x[0] * (1.0 + x[1]) - 0.21 * x[1];
  dr[0] = 1.0 + x[1];
  dr[1] = x[0] - 0.21;
  return HL_OK;
}

/* Q_rc = C Q^0.7 in MW; below a watt it goes on straight, so that an iteration may pass zero. */
static HlStatus
radiation (G_GNUC_UNUSED const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  const double least = 1.0;
  double q = fmax (x[2], least), power = 1e6 * pow (1e-6 * q, 0.7), slope = 0.7 * power / q;
  power += slope * (x[2] - q);
  *r = x[0] - x[1] * power;
  dr[0] = 1.0;
  dr[1] = -power;
  dr[2] = -x[1] * slope;
  return HL_OK;
}

static void
emit_losses (HlEmit *emit, int heat, int fuel_heat, int all)
{
  HlSystem *system = emit->system;
  int T_gas = hl_emit_own (emit, "flue_gas_T", HL_VAR_TEMPERATURE), air = hl_emit_own (emit, "excess_air", HL_VAR_RATIO);
  int o2 = hl_emit_own (emit, "flue_gas_oxygen", HL_VAR_RATIO);
  int dry = hl_emit_own (emit, "dry_gas_constant", HL_VAR_RATIO), wet = hl_emit_own (emit, "wet_gas_constant", HL_VAR_RATIO);
  int unburned_share = hl_emit_own (emit, "unburned_fraction", HL_VAR_RATIO), c = hl_emit_own (emit, "radiation_coefficient", HL_VAR_RATIO);
  int stack = hl_emit_own (emit, "stack_loss", HL_VAR_POWER), unburned = hl_emit_own (emit, "unburned_loss", HL_VAR_POWER);
  int walls = hl_emit_own (emit, "radiation_loss", HL_VAR_POWER), share = hl_emit_hidden (emit, "stack_loss_fraction", HL_VAR_RATIO);
  int T_air = hl_emit_constant (emit, HL_VAR_TEMPERATURE, hl_plant_site (emit->model->plant)->ambient_T);
  HlEquation *e = hl_system_add_equation (system, siegert, HL_VAR_RATIO, 1, (const int[]) { share, T_gas, T_air, air, dry, wet }, 6, NULL, 0);
  e->source = N_("Siegert's formula, constants from memory of the German 1. BImSchV or calculated");
  hl_emit_done (emit, e, N_("{0} = ({1} − {2}) × ({4} × (1 + {3}) ÷ 21 + {5}) ÷ 100"), 0);
  hl_emit_done (emit, hl_system_add_equation (system, oxygen, HL_VAR_RATIO, 3, (const int[]) { o2, air }, 2, NULL, 0),
                N_("{0} = 0.21 × {1} ÷ (1 + {1})"), 0);
  hl_emit_done (emit, hl_add_product (system, fuel_heat, share, stack), NULL, 2);
  hl_emit_done (emit, hl_add_product (system, fuel_heat, unburned_share, unburned), NULL, 2);
  e = hl_system_add_equation (system, radiation, HL_VAR_POWER, 3, (const int[]) { walls, c, heat }, 3, NULL, 0);
  e->source = N_("EN 12952-15, from memory, to be checked");
  hl_emit_done (emit, e, N_("{0} = {1} × {2}^0.7, powers in MW"), 0);
  hl_emit_done (emit, hl_add_linear (system, HL_VAR_POWER, (const int[]) { all, stack, unburned, walls }, (const double[]) { 1.0, -1.0, -1.0, -1.0 }, 4, 0.0),
                N_("{0} = {1} + {2} + {3}"), -1);
}

/* --- fuel ------------------------------------------------------------------------ */

static void
emit_co2 (HlEmit *emit, int fuel_heat)
{
  static const struct { const char *factor, *flow; HlSum sum; } kinds[] = {
    { "co2_factor", "co2_flow", HL_SUM_CO2 }, { "biogenic_co2_factor", "biogenic_co2_flow", HL_SUM_BIOGENIC_CO2 },
  };
  for (guint k = 0; k < G_N_ELEMENTS (kinds); k++)
    {
      int factor = hl_emit_own (emit, kinds[k].factor, HL_VAR_STEAM_RATE), flow = hl_emit_own (emit, kinds[k].flow, HL_VAR_FLOW);
      hl_emit_done (emit, hl_add_product (emit->system, fuel_heat, factor, flow), NULL, 2);
      hl_emit_sum (emit, kinds[k].sum, flow);
    }
}

static void
emit_boiler (HlEmit *emit)
{
  int heat = hl_heat_source_emit (emit);
  int efficiency = hl_emit_own (emit, "efficiency", HL_VAR_RATIO), fuel_heat = hl_emit_own (emit, "fuel_heat", HL_VAR_POWER);
  int lhv = hl_emit_own (emit, "fuel_lhv", HL_VAR_ENTHALPY), flow = hl_emit_own (emit, "fuel_flow", HL_VAR_FLOW);
  int loss = hl_emit_own (emit, "flue_loss", HL_VAR_POWER), ratio = hl_emit_own (emit, "fuel_hhv_ratio", HL_VAR_RATIO);
  if (hl_emit_has_value (emit, "fuel_exergy_ratio"))
    hl_emit_own (emit, "fuel_exergy_ratio", HL_VAR_RATIO);
  hl_emit_done (emit, hl_add_quotient (emit->system, fuel_heat, heat, efficiency), NULL, 0);
  hl_emit_done (emit, hl_add_quotient (emit->system, flow, fuel_heat, lhv), NULL, 0);
  hl_emit_done (emit, hl_add_linear (emit->system, HL_VAR_POWER, (const int[]) { loss, fuel_heat, heat },
                                     (const double[]) { 1.0, -1.0, 1.0 }, 3, 0.0), N_("{0} = {1} − {2}"), 0);
  hl_emit_done (emit, hl_add_product (emit->system, fuel_heat, ratio, hl_emit_own (emit, "fuel_heat_hhv", HL_VAR_POWER)), NULL, 2);
  if (hl_component_option (emit->component, "efficiency_by") != 0)
    emit_losses (emit, heat, fuel_heat, loss);
  if (hl_component_option (emit->component, "fuel") != 0)
    emit_co2 (emit, fuel_heat);
  hl_emit_sum (emit, HL_SUM_FUEL_HEAT, fuel_heat);
  hl_emit_sum (emit, HL_SUM_FUEL_FLOW, flow);
}

/* --- checks ------------------------------------------------------------------------ */

static gboolean
has_sulphur (int fuel)
{
  static const char *const clean[] = { "not named", "natural gas", "diesel oil", "wood" };
  const HlKind *kind = hl_kind_lookup ("boiler");
  const char *word = kind->options[hl_kind_find_option (kind, "fuel")].choices[fuel];
  for (guint k = 0; k < G_N_ELEMENTS (clean); k++)
    if (g_str_equal (word, clean[k]))
      return FALSE;
  return TRUE;
}

static void
check_flue_gas (HlChecker *checker)
{
  double T;
  if (hl_component_option (checker->component, "efficiency_by") == 0 || !hl_check_own (checker, "flue_gas_T", &T))
    return;
  gboolean sulphur = has_sulphur (hl_component_option (checker->component, "fuel"));
  double air = hl_plant_site (checker->model->plant)->ambient_T, least = sulphur ? 403.15 : 363.15;
  g_autofree char *text = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, T), *at_least = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, least);
  HlFinding *finding = NULL;
  if (T < air)
    finding = hl_check_add (checker, HL_GRADE_ERROR, "flue-gas-too-cold", "flue_gas_T",
      g_strdup_printf (_("Flue gas of %s would leave at %s, colder than the air that comes in. Less heat must reach the water, or more fuel."),
                       checker->component->id, text));
  else if (T < least - 1e-6)
    finding = hl_check_add (checker, HL_GRADE_CAUTION, "flue-gas-too-cold", "flue_gas_T",
      g_strdup_printf (sulphur ? _("Flue gas of %s leaves at %s; with sulphur in the fuel acid condenses on surfaces: common are %s and more.")
                               : _("Flue gas of %s leaves at %s; even with clean fuel common are %s and more."),
                       checker->component->id, text, at_least));
  if (finding == NULL)
    return;
  hl_check_offer (checker, finding, "flue_gas_T");
  hl_check_offer (checker, finding, "efficiency");
}

static void
check (HlChecker *checker)
{
  hl_heat_source_check (checker);
  check_flue_gas (checker);
}

const HlComponentModel hl_boiler_model = { "boiler", emit_boiler, check, hl_heat_source_processes };
