/* Solar field: heat by irradiance, aperture and a given efficiency.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/components.h"
#include "plant/i18n.h"

/* heat = irradiance x efficiency x area */
static HlStatus
collected (G_GNUC_UNUSED const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  *r = x[1] * x[2] * x[3] - x[0];
  dr[0] = -1.0;
  dr[1] = x[2] * x[3];
  dr[2] = x[1] * x[3];
  dr[3] = x[1] * x[2];
  return HL_OK;
}

static void
emit_solar_field (HlEmit *emit)
{
  HlSystem *system = emit->system;
  int in_node = hl_emit_port (emit, "inlet"), out_node = hl_emit_port (emit, "outlet");
  const HlNode *in = hl_model_node (emit->model, in_node), *out = hl_model_node (emit->model, out_node);
  int irradiance = hl_emit_own (emit, "irradiance", HL_VAR_IRRADIANCE), efficiency = hl_emit_own (emit, "efficiency", HL_VAR_RATIO);
  int area = hl_emit_own (emit, "aperture", HL_VAR_APERTURE), heat = hl_emit_own (emit, "heat", HL_VAR_POWER);
  hl_system_merge (system, in->m, out->m);
  hl_emit_done (emit, hl_add_pressure_loss (system, in->p, out->p, hl_emit_own (emit, "pressure_loss", HL_VAR_RATIO)), NULL, -1);
  const int pairs[] = { out->m, out->h, in->m, in->h };
  hl_emit_done (emit, hl_add_energy (system, HL_VAR_POWER, pairs, (const double[]) { 1.0, -1.0 }, 2, &heat, (const double[]) { -1.0 }, 1),
                N_("{4} = {0} × ({1} − {3})"), 4);
  HlEquation *e = hl_system_add_equation (system, collected, HL_VAR_POWER, HL_ALL_LINEAR, (const int[]) { heat, irradiance, efficiency, area }, 4, NULL, 0);
  e->source = N_("definition of the field's efficiency, which is given");
  hl_emit_done (emit, e, N_("{3} = {0} ÷ ({1} × {2})"), 3);
  hl_emit_sum (emit, HL_SUM_HEAT_INPUT, heat);
}

static void
check (HlChecker *checker)
{
  const HlNodeResult *in = hl_check_port (checker, "inlet"), *out = hl_check_port (checker, "outlet");
  if (in == NULL || out == NULL || !in->has_state || !out->has_state || out->st.h >= in->st.h)
    return;
  g_autofree char *T_in = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, in->st.T), *T_out = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, out->st.T);
  HlFinding *finding = hl_check_add (checker, HL_GRADE_ERROR, "heat-runs-backwards", "outlet.T",
    g_strdup_printf (_("%s would cool what it is to heat: in at %s, out at %s. Raise the outlet temperature."), checker->component->id, T_in, T_out));
  hl_check_offer (checker, finding, "outlet.T");
}

static void
processes (HlProcessSink *sink)
{
  hl_process_add (sink, HL_PROCESS_HEATING, hl_process_node (sink, "inlet"), hl_process_node (sink, "outlet"));
}

const HlComponentModel hl_solar_field_model = { "solar_field", emit_solar_field, check, processes };
