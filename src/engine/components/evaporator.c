/* Evaporator: an exchanger, or a heat of no drawn source, whose cold side leaves as superheated vapour.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/exchange.h"
#include "plant/i18n.h"
#include <math.h>

enum { SOURCE_STREAM, SOURCE_NONE };

/* Above saturation; 0 where the medium leaves saturated or wet. */
static HlStatus
superheat_of (const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  HlSaturation sat;
  HlState st;
  double p = exp (x[0]);
  HlStatus status = hl_fluid_saturation_p (e->fluid, p, &sat);
  if (status != HL_OK)
    return status;
  *r = x[2];
  dr[0] = dr[1] = 0.0;
  dr[2] = 1.0;
  if (x[1] <= sat.h_vapour)
    return HL_OK;
  if ((status = hl_fluid_state_ph (e->fluid, p, x[1], &st)) != HL_OK)
    return status;
  *r = x[2] - (st.T - sat.T);
  dr[0] = (sat.T_p - st.T_p) * p;
  dr[1] = -st.T_h;
  return HL_OK;
}

/* Heat of no drawn source. */
static void
emit_alone (HlEmit *emit, const HlNode *in, const HlNode *out)
{
  int loss = hl_emit_own (emit, "cold_pressure_loss", HL_VAR_RATIO), heat = hl_emit_own (emit, "heat", HL_VAR_POWER);
  hl_system_merge (emit->system, in->m, out->m);
  hl_emit_done (emit, hl_add_pressure_loss (emit->system, in->p, out->p, loss), NULL, -1);
  const int pairs[] = { out->m, out->h, in->m, in->h };
  hl_emit_done (emit, hl_add_energy (emit->system, HL_VAR_POWER, pairs, (const double[]) { 1.0, -1.0 }, 2, &heat, (const double[]) { -1.0 }, 1),
                N_("{4} = {0} × ({1} − {3})"), 4);
  hl_exchange_count (emit, heat);
}

static void
emit_evaporator (HlEmit *emit)
{
  const int in_node = hl_emit_port (emit, "cold_inlet"), out_node = hl_emit_port (emit, "cold_outlet");
  int superheat = hl_emit_own (emit, "superheat", HL_VAR_TEMPERATURE_DIFFERENCE), T_sat = hl_emit_own (emit, "evaporation_T", HL_VAR_TEMPERATURE);
  hl_emit_guess (emit, in_node, 7e5);
  hl_emit_guess (emit, out_node, 2.8e6);
  if (hl_component_option (emit->component, "source") == SOURCE_STREAM)
    hl_exchange_emit (emit);
  else
    emit_alone (emit, hl_model_node (emit->model, in_node), hl_model_node (emit->model, out_node));
  const HlNode *out = hl_model_node (emit->model, out_node);
  hl_emit_done (emit, hl_add_saturation (emit->system, out->fluid, out->p, T_sat), NULL, 1);
  if (hl_emit_has_value (emit, "superheat"))
    {
      hl_emit_done (emit, hl_add_vapour (emit->system, out->fluid, out->p, superheat, out->h), NULL, -1);
      return;
    }
  HlEquation *e = hl_system_add_equation (emit->system, superheat_of, HL_VAR_TEMPERATURE_DIFFERENCE, 4, (const int[]) { out->p, out->h, superheat }, 3, NULL, 0);
  e->fluid = out->fluid;
  hl_emit_done (emit, e, N_("{2} = T({0}, {1}) − T_sat({0}), 0 where not superheated"), 2);
}

/* Close below the critical point liquid and vapour hardly differ. */
static void
check_near_critical (HlChecker *checker, const HlNodeResult *out)
{
  HlFluidLimits limits;
  double T;
  hl_fluid_limits (hl_check_fluid (checker, "cold_outlet"), &limits);
  if (!out->has_pressure || !hl_check_own (checker, "evaporation_T", &T) || !(out->p > 0.95 * limits.p_critical || T > limits.T_critical - 15.0))
    return;
  g_autofree char *at = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, T), *top = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, limits.T_critical);
  HlFinding *finding = hl_check_add (checker, HL_GRADE_CAUTION, "near-critical", "evaporation_T",
    g_strdup_printf (_("%s evaporates at %s, close to the critical temperature %s: properties and control are difficult there. Stay 15 K below, or go above the critical pressure with a heat exchanger."),
                     checker->component->id, at, top));
  hl_check_offer (checker, finding, "evaporation_T");
}

static void
check (HlChecker *checker)
{
  const HlNodeResult *out = hl_check_port (checker, "cold_outlet"), *in = hl_check_port (checker, "cold_inlet");
  if (hl_component_option (checker->component, "source") == SOURCE_STREAM)
    hl_exchange_check (checker);
  else if (in != NULL && out != NULL && in->has_state && out->has_state && out->st.h < in->st.h - 1e-3)
    hl_check_offer (checker, hl_check_add (checker, HL_GRADE_ERROR, "heat-runs-backwards", "superheat",
      g_strdup_printf (_("%s would cool what it is to evaporate: what comes in holds more heat than the vapour that leaves."), checker->component->id)), "superheat");
  if (out == NULL)
    return;
  check_near_critical (checker, out);
  if (out->has_state && out->st.phase == HL_PHASE_TWO_PHASE && out->st.x < 1.0 - 1e-6)
    hl_check_add (checker, HL_GRADE_CAUTION, "leaves-wet", "superheat",
      g_strdup_printf (_("%s does not evaporate all of its medium: %.1f %% leave as liquid. Give it more heat, or a separator behind it."),
                       checker->component->id, 100.0 * (1.0 - out->st.x)));
}

static void
processes (HlProcessSink *sink)
{
  hl_exchange_processes (sink);
}

const HlComponentModel hl_evaporator_model = { "evaporator", emit_evaporator, check, processes };
