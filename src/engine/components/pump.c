/* Pump with its motor, or driven by a shaft.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/pump.h"
#include "engine/components/drive.h"
#include "engine/heads.h"
#include "plant/i18n.h"
#include <math.h>

void
hl_pump_emit (HlEmit *emit)
{
  const int in_node = hl_emit_port (emit, "inlet"), out_node = hl_emit_port (emit, "outlet");
  const HlNode *in = hl_model_node (emit->model, in_node), *out = hl_model_node (emit->model, out_node);
  int efficiency = hl_emit_own (emit, "isentropic_efficiency", HL_VAR_RATIO);
  int rise = hl_emit_own (emit, "pressure_rise", HL_VAR_PRESSURE_DIFFERENCE), power = hl_emit_own (emit, "power", HL_VAR_POWER);
  hl_system_merge (emit->system, in->m, out->m);
  hl_emit_done (emit, hl_add_compression (emit->system, in->fluid, in->p, in->h, out->p, efficiency, out->h), NULL, -1);
  hl_emit_done (emit, hl_add_pressure_rise (emit->system, in->p, out->p, rise), NULL, 2);
  const int pairs[] = { in->m, out->h, in->m, in->h };
  hl_emit_done (emit, hl_add_energy (emit->system, HL_VAR_POWER, pairs, (const double[]) { 1.0, -1.0 }, 2, &power, (const double[]) { -1.0 }, 1),
                N_("{4} = {0} × ({1} − {3})"), 4);
  hl_drive_emit (emit, power);
  hl_heads_emit_suction (emit, in_node);
}

/* A deaerator's pressure falls after a trip, and with it what keeps the water at a feed pump from boiling: more is asked of those. */
static gboolean
is_feed_pump (const HlChecker *checker)
{
  int vessel = hl_heads_vessel (checker->model, checker->index);
  return vessel >= 0 && g_str_equal (hl_plant_component (checker->model->plant, (guint) vessel)->kind->id, "open_heater");
}

static void
check_suction (HlChecker *checker)
{
  double available, required, head, loss;
  const char *id = checker->component->id;
  if (!hl_check_own (checker, "npsh_available", &available) || !hl_check_own (checker, "static_head", &head)
      || !hl_check_own (checker, "suction_loss", &loss))
    return;
  gboolean has_limit = hl_check_own (checker, "npsh_required", &required), is_feed = is_feed_pump (checker);
  g_autofree char *a = hl_check_text (checker, HL_DIMENSION_LENGTH, available), *r = hl_check_text (checker, HL_DIMENSION_LENGTH, has_limit ? required : 0.0);
  HlFinding *finding = NULL;
  if (head <= 0.0 && available - head + loss < 0.05)
    finding = hl_check_add (checker, HL_GRADE_WARNING, "suction-saturated", "static_head",
      g_strdup_printf (_("%s draws saturated liquid without static head: it would boil at the pump. Raise the vessel above it, or lower the pump."), id));
  else if (has_limit && available < required)
    finding = hl_check_add (checker, HL_GRADE_WARNING, "npsh", "npsh_available",
      g_strdup_printf (_("NPSH available at %s is %s, less than the %s required: it would cavitate. Raise the vessel, lower the pump, or cut the loss of its suction line."), id, a, r));
  else if (has_limit && is_feed && available < 1.8 * required)
    finding = hl_check_add (checker, HL_GRADE_CAUTION, "npsh", "npsh_available",
      g_strdup_printf (_("NPSH available at feed pump %s is %s for %s required; 1.8 to 2.5 times as much is usual, for when the deaerator's pressure falls (POWER magazine)."), id, a, r));
  else if (has_limit && available < fmin (1.1 * required, required + 0.6))
    finding = hl_check_add (checker, HL_GRADE_CAUTION, "npsh", "npsh_available",
      g_strdup_printf (_("NPSH available at %s is %s for %s required; a tenth or 0.6 m more is usual (ANSI/HI 9.6.1)."), id, a, r));
  if (finding == NULL)
    return;
  hl_check_offer (checker, finding, "static_head");
  hl_check_offer (checker, finding, "elevation");
  hl_check_offer (checker, finding, "suction_loss");
}

void
hl_pump_check (HlChecker *checker)
{
  check_suction (checker);
  const HlNodeResult *in = hl_check_port (checker, "inlet"), *out = hl_check_port (checker, "outlet");
  if (in == NULL || out == NULL)
    return;
  if (in->has_pressure && out->has_pressure && out->p < in->p * (1.0 - 1e-9))
    {
      g_autofree char *p_in = hl_check_text (checker, HL_DIMENSION_PRESSURE, in->p);
      g_autofree char *p_out = hl_check_text (checker, HL_DIMENSION_PRESSURE, out->p);
      HlFinding *finding = hl_check_add (checker, HL_GRADE_ERROR, "pressure-falls", "outlet.p",
        g_strdup_printf (_("%s is to pump from %s down to %s. Raise its outlet pressure, or put a valve in its place."), checker->component->id, p_in, p_out));
      hl_check_offer (checker, finding, "outlet.p");
    }
  if (in->has_state && in->st.phase == HL_PHASE_TWO_PHASE && in->st.x > 1e-6)
    hl_check_add (checker, HL_GRADE_ERROR, "pump-steam", "inlet.x",
      g_strdup_printf (hl_check_is_water (checker, "inlet") ? _("%s draws water with %.1f %% steam in it: a pump needs liquid. Condense it first.")
                                                     : _("%s draws liquid with %.1f %% vapour in it: a pump needs liquid. Condense it first."), checker->component->id, 100.0 * in->st.x));
  else if (in->has_state && in->st.phase == HL_PHASE_VAPOUR)
    hl_check_add (checker, HL_GRADE_ERROR, "pump-steam", "inlet.x",
      g_strdup_printf (hl_check_is_water (checker, "inlet") ? _("%s draws steam: a pump needs liquid. Condense it first.")
                                                     : _("%s draws vapour: a pump needs liquid. Condense it first."), checker->component->id));
  hl_check_entropy (checker);
}

void
hl_pump_processes (HlProcessSink *sink)
{
  hl_process_add (sink, HL_PROCESS_COMPRESSION, hl_process_node (sink, "inlet"), hl_process_node (sink, "outlet"));
}

const HlComponentModel hl_pump_model = { "pump", hl_pump_emit, hl_pump_check, hl_pump_processes };
