/* Flue-gas condenser: cools flue gas below the dew point of its water.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/bank.h"
#include "fluid/gas.h"
#include "plant/i18n.h"
#include <math.h>

enum { SERVES_CYCLE, SERVES_HEAT };

/* condensate = m M_w max(0, n_water - n_dry p_sat(T) / (p - p_sat(T))), moles per kg of the gas; a: n_water, n_dry, M_w. */
static HlStatus
condensate (const HlEquation *e, const double *a, const double *x, double *r, double *dr)
{
  HlState st;
  HlSaturation sat;
  double p = exp (x[1]);
  HlStatus status = hl_fluid_state_ph (e->fluid, p, x[2], &st);
  if (status != HL_OK)
    return status;
  *r = x[3];
  dr[0] = dr[1] = dr[2] = 0.0;
  dr[3] = 1.0;
  if (!(a[0] > 0.0) || hl_fluid_saturation_T (hl_fluid_water (), st.T, &sat) != HL_OK || !(sat.p < p))
    return HL_OK;
  double dry = p - sat.p, liquid = a[0] - a[1] * sat.p / dry;
  if (!(liquid > 0.0))
    return HL_OK;
  double to_T = -a[1] * p / (dry * dry) / sat.T_p, to_p = a[1] * sat.p / (dry * dry);
  *r = x[3] - x[0] * a[2] * liquid;
  dr[0] = -a[2] * liquid;
  dr[1] = -x[0] * a[2] * p * (to_p + to_T * st.T_p);
  dr[2] = -x[0] * a[2] * to_T * st.T_h;
  return HL_OK;
}

static void
emit_condensate (HlEmit *emit)
{
  const HlNode *out = hl_model_node (emit->model, hl_emit_port (emit, "gas_outlet"));
  int flow = hl_emit_own (emit, "condensate_flow", HL_VAR_FLOW), water = hl_gas_species_find ("H2O");
  double a[3] = { 0.0, 0.0, 0.0 };
  if (hl_fluid_is_gas (out->fluid) && water >= 0)
    {
      g_autofree double *moles = g_new0 (double, hl_gas_n_species ());
      HlFluidLimits limits;
      hl_gas_moles (out->fluid, moles);
      hl_fluid_limits (out->fluid, &limits);
      a[0] = moles[water] / limits.molar_mass;
      a[1] = (1.0 - moles[water]) / limits.molar_mass;
      a[2] = hl_gas_species_molar_mass ((guint) water);
    }
  HlEquation *e = hl_system_add_equation (emit->system, condensate, HL_VAR_FLOW, 1u << 0 | 1u << 3, (const int[]) { out->m, out->p, out->h, flow }, 4, a, 3);
  e->fluid = out->fluid;
  e->source = N_("vapour left in the gas: its saturation pressure by IAPWS-IF97");
  hl_emit_done (emit, e, N_("{3} = {0} × water of the gas at ({1}, {2}) beyond saturation, 0 above the dew point"), 3);
}

static void
emit_flue_gas_condenser (HlEmit *emit)
{
  int heat = hl_exchange_emit_sides (emit, &hl_bank_sides);
  emit_condensate (emit);
  hl_emit_sum (emit, hl_component_option (emit->component, "serves") == SERVES_HEAT ? HL_SUM_DELIVERED : HL_SUM_HEAT_INPUT, heat);
}

static void
check (HlChecker *checker)
{
  double flow;
  hl_exchange_check_sides (checker, &hl_bank_sides);
  if (!hl_check_own (checker, "condensate_flow", &flow) || flow > 0.0)
    return;
  HlFinding *finding = hl_check_add (checker, HL_GRADE_HINT, "nothing-condenses", "gas_outlet.T",
    g_strdup_printf (_("Nothing condenses in %s: its gas leaves above the dew point. Cool it further, with colder water."), checker->component->id));
  hl_check_offer (checker, finding, "gas_outlet.T");
}

static void
processes (HlProcessSink *sink)
{
  hl_exchange_processes_sides (sink, &hl_bank_sides);
}

const HlComponentModel hl_flue_gas_condenser_model = { "flue_gas_condenser", emit_flue_gas_condenser, check, processes };
