/* Throttle valve: pressure falls, enthalpy stays.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/components.h"

static void
emit_valve (HlEmit *emit)
{
  const int in_node = hl_emit_port (emit, "inlet"), out_node = hl_emit_port (emit, "outlet");
  const HlNode *in = hl_model_node (emit->model, in_node), *out = hl_model_node (emit->model, out_node);
  int loss = hl_emit_own (emit, "pressure_loss", HL_VAR_RATIO);
  hl_system_merge (emit->system, in->m, out->m);
  hl_system_merge (emit->system, in->h, out->h);
  hl_emit_done (emit, hl_add_pressure_loss (emit->system, in->p, out->p, loss), NULL, -1);
}

static void
processes (HlProcessSink *sink)
{
  hl_process_add (sink, HL_PROCESS_THROTTLING, hl_process_node (sink, "inlet"), hl_process_node (sink, "outlet"));
}

const HlComponentModel hl_valve_model = { "valve", emit_valve, hl_check_pressure_falls, processes };
