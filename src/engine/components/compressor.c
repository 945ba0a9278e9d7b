/* Compressor for vapour, with its motor or driven by a shaft.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/drive.h"
#include "plant/i18n.h"
#include <math.h>

static void
emit_compressor (HlEmit *emit)
{
  const int in_node = hl_emit_port (emit, "inlet"), out_node = hl_emit_port (emit, "outlet");
  const HlNode *in = hl_model_node (emit->model, in_node), *out = hl_model_node (emit->model, out_node);
  int efficiency = hl_emit_own (emit, "isentropic_efficiency", HL_VAR_RATIO);
  int ratio = hl_emit_own (emit, "pressure_ratio", HL_VAR_RATIO), power = hl_emit_own (emit, "power", HL_VAR_POWER);
  hl_emit_guess (emit, in_node, 2.7e6);
  hl_emit_guess (emit, out_node, 3e6);
  hl_system_merge (emit->system, in->m, out->m);
  hl_emit_done (emit, hl_add_compression (emit->system, in->fluid, in->p, in->h, out->p, efficiency, out->h), NULL, -1);
  hl_emit_done (emit, hl_drive_add_ratio (emit->system, in->p, out->p, ratio), NULL, 2);
  const int pairs[] = { in->m, out->h, in->m, in->h };
  hl_emit_done (emit, hl_add_energy (emit->system, HL_VAR_POWER, pairs, (const double[]) { 1.0, -1.0 }, 2, &power, (const double[]) { -1.0 }, 1),
                N_("{4} = {0} × ({1} − {3})"), 4);
  hl_drive_emit (emit, power);
  hl_emit_sum (emit, HL_SUM_COMPRESSOR_POWER, power);
}

static void
check (HlChecker *checker)
{
  const HlNodeResult *in = hl_check_port (checker, "inlet"), *out = hl_check_port (checker, "outlet");
  if (in == NULL || out == NULL)
    return;
  if (in->has_pressure && out->has_pressure && out->p < in->p * (1.0 - 1e-9))
    {
      g_autofree char *p_in = hl_check_text (checker, HL_DIMENSION_PRESSURE, in->p), *p_out = hl_check_text (checker, HL_DIMENSION_PRESSURE, out->p);
      HlFinding *finding = hl_check_add (checker, HL_GRADE_ERROR, "pressure-falls", "outlet.p",
        g_strdup_printf (_("%s is to compress from %s down to %s. Raise its outlet pressure, or put a valve in its place."), checker->component->id, p_in, p_out));
      hl_check_offer (checker, finding, "outlet.p");
    }
  if (in->has_state && in->st.phase == HL_PHASE_LIQUID)
    hl_check_add (checker, HL_GRADE_ERROR, "compressor-liquid", "inlet.x",
      g_strdup_printf (_("%s draws liquid: a compressor needs vapour. Evaporate it first, or put a pump in its place."), checker->component->id));
  else if (in->has_state && in->st.phase == HL_PHASE_TWO_PHASE && in->st.x < 1.0 - 1e-6)
    hl_check_add (checker, HL_GRADE_WARNING, "compressor-liquid", "inlet.x",
      g_strdup_printf (_("%s draws vapour with %.1f %% liquid in it: drops damage a compressor. Evaporate all of it."), checker->component->id, 100.0 * (1.0 - in->st.x)));
  hl_check_entropy (checker);
}

static void
processes (HlProcessSink *sink)
{
  hl_process_add (sink, HL_PROCESS_COMPRESSION, hl_process_node (sink, "inlet"), hl_process_node (sink, "outlet"));
}

const HlComponentModel hl_compressor_model = { "compressor", emit_compressor, check, processes };
