/* Organic expander: one expansion by its isentropic efficiency.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/components.h"
#include "plant/i18n.h"
#include <math.h>

static HlStatus
volume_ratio (const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  HlState in, out;
  HlStatus status;
  double p_in = exp (x[0]), p_out = exp (x[2]);
  if ((status = hl_fluid_state_ph (e->fluid, p_in, x[1], &in)) != HL_OK
      || (status = hl_fluid_state_ph (e->fluid, p_out, x[3], &out)) != HL_OK)
    return status;
  double ratio = out.v / in.v;
  *r = x[4] - ratio;
  dr[0] = ratio / in.v * in.v_p * p_in;
  dr[1] = ratio / in.v * in.v_h;
  dr[2] = -out.v_p * p_out / in.v;
  dr[3] = -out.v_h / in.v;
  dr[4] = 1.0;
  return HL_OK;
}

static void
emit_expander (HlEmit *emit)
{
  HlSystem *system = emit->system;
  const int in_node = hl_emit_port (emit, "inlet"), out_node = hl_emit_port (emit, "exhaust");
  const HlNode *in = hl_model_node (emit->model, in_node), *out = hl_model_node (emit->model, out_node);
  int efficiency = hl_emit_own (emit, "isentropic_efficiency", HL_VAR_RATIO), mechanical = hl_emit_own (emit, "mechanical_efficiency", HL_VAR_RATIO);
  int ratio = hl_emit_own (emit, "volume_ratio", HL_VAR_RATIO), y = hl_emit_own (emit, "exhaust_moisture", HL_VAR_RATIO);
  int internal = hl_emit_own (emit, "internal_power", HL_VAR_POWER), power = hl_emit_own (emit, "power", HL_VAR_POWER);
  hl_emit_guess (emit, in_node, 2.9e6);
  hl_emit_guess (emit, out_node, 2.7e6);
  hl_system_merge (system, in->m, out->m);
  hl_emit_done (emit, hl_add_expansion (system, in->fluid, in->p, in->h, out->p, efficiency, out->h), NULL, -1);
  HlEquation *volume = hl_system_add_equation (system, volume_ratio, HL_VAR_RATIO, 1u << 4, (const int[]) { in->p, in->h, out->p, out->h, ratio }, 5, NULL, 0);
  volume->fluid = in->fluid;
  hl_emit_done (emit, volume, N_("{4} = v({2}, {3}) ÷ v({0}, {1})"), 4);
  if (hl_emit_has_value (emit, "exhaust_moisture"))
    hl_emit_done (emit, hl_add_enthalpy_at_moisture (system, out->fluid, out->p, y, out->h), NULL, -1);
  else
    hl_emit_done (emit, hl_add_moisture (system, out->fluid, out->p, out->h, y), NULL, 2);
  const int pairs[] = { in->m, in->h, out->m, out->h };
  hl_emit_done (emit, hl_add_energy (system, HL_VAR_POWER, pairs, (const double[]) { 1.0, -1.0 }, 2, &internal, (const double[]) { -1.0 }, 1),
                N_("{4} = {0} × ({1} − {3})"), 4);
  hl_emit_done (emit, hl_add_product (system, internal, mechanical, power), NULL, 2);
  hl_emit_sum (emit, HL_SUM_TURBINE_POWER, power);
  if (!emit->model->is_on_shaft[emit->index])
    hl_emit_sum (emit, HL_SUM_GROSS, power);
}

static void
check_moisture (HlChecker *checker, const HlNodeResult *out)
{
  double y;
  if (!out->has_state || !hl_check_own (checker, "exhaust_moisture", &y) || !(y > 0.10 && y <= 1.0))
    return;
  g_autofree char *p = hl_check_text (checker, HL_DIMENSION_PRESSURE, out->p);
  HlFinding *finding = hl_check_add (checker, y > 0.12 ? HL_GRADE_WARNING : HL_GRADE_CAUTION, "exhaust-moisture", "exhaust_moisture",
    g_strdup_printf (_("Exhaust of %s holds %.1f %% moisture at %s; above %d %% the last blades erode. Raise the exhaust pressure or the inlet temperature, or reheat."),
                     checker->component->id, 100.0 * y, p, y > 0.12 ? 12 : 10));
  hl_check_offer (checker, finding, "exhaust.p");
}

static void
check (HlChecker *checker)
{
  const HlNodeResult *in = hl_check_port (checker, "inlet"), *out = hl_check_port (checker, "exhaust");
  if (in == NULL || out == NULL)
    return;
  if (in->has_pressure && out->has_pressure && out->p > in->p * (1.0 + 1e-9))
    {
      g_autofree char *p_in = hl_check_text (checker, HL_DIMENSION_PRESSURE, in->p), *p_out = hl_check_text (checker, HL_DIMENSION_PRESSURE, out->p);
      HlFinding *finding = hl_check_add (checker, HL_GRADE_ERROR, "pressure-rises", "exhaust.p",
        g_strdup_printf (_("%s is to expand from %s up to %s. Lower its exhaust pressure or raise its inlet pressure."), checker->component->id, p_in, p_out));
      hl_check_offer (checker, finding, "exhaust.p");
      hl_check_offer (checker, finding, "inlet.p");
    }
  if (in->has_state && in->st.phase == HL_PHASE_LIQUID)
    hl_check_offer (checker, hl_check_add (checker, HL_GRADE_ERROR, "liquid-at-turbine", "inlet.p",
      g_strdup_printf (_("Liquid reaches %s: an expander needs vapour. Heat the medium further or lower the inlet pressure."), checker->component->id)), "inlet.p");
  check_moisture (checker, out);
  hl_check_entropy (checker);
}

static void
processes (HlProcessSink *sink)
{
  hl_process_add (sink, HL_PROCESS_EXPANSION, hl_process_node (sink, "inlet"), hl_process_node (sink, "exhaust"));
}

const HlComponentModel hl_expander_model = { "expander", emit_expander, check, processes };
