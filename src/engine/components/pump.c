/* Pump with its motor, or driven by a shaft.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/drive.h"
#include "plant/i18n.h"
#include <math.h>

static void
emit_pump (HlEmit *emit)
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
}

static void
check (HlChecker *checker)
{
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

static void
processes (HlProcessSink *sink)
{
  hl_process_add (sink, HL_PROCESS_COMPRESSION, hl_process_node (sink, "inlet"), hl_process_node (sink, "outlet"));
}

const HlComponentModel hl_pump_model = { "pump", emit_pump, check, processes };
