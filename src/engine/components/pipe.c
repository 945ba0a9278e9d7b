/* Pipe with pressure and heat loss.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/components.h"
#include "plant/i18n.h"
#include <math.h>

static void
emit_pipe (HlEmit *emit)
{
  const int in_node = hl_emit_port (emit, "inlet"), out_node = hl_emit_port (emit, "outlet");
  int loss = hl_emit_own (emit, "pressure_loss", HL_VAR_RATIO), heat_loss = hl_emit_own (emit, "heat_loss", HL_VAR_POWER);
  int drop = hl_emit_own (emit, "temperature_drop", HL_VAR_TEMPERATURE_DIFFERENCE);
  int T_in = hl_emit_T (emit, in_node, FALSE), T_out = hl_emit_T (emit, out_node, hl_emit_has_value (emit, "temperature_drop"));
  const HlNode *in = hl_model_node (emit->model, in_node), *out = hl_model_node (emit->model, out_node);
  hl_system_merge (emit->system, in->m, out->m);
  hl_emit_done (emit, hl_add_pressure_loss (emit->system, in->p, out->p, loss), NULL, -1);
  hl_emit_done (emit, hl_add_linear (emit->system, HL_VAR_TEMPERATURE, (const int[]) { T_in, T_out, drop }, (const double[]) { 1.0, -1.0, -1.0 }, 3, 0.0),
                N_("{2} = {0} − {1}"), 2);
  /* Without heat loss the flow has no part in the balance, and must not seem to. */
  if (hl_emit_is_fixed_at (emit, "heat_loss", 0.0))
    hl_emit_done (emit, hl_add_linear (emit->system, HL_VAR_ENTHALPY, (const int[]) { in->h, out->h, heat_loss }, (const double[]) { 1.0, -1.0, 0.0 }, 3, 0.0),
                  N_("{1} = {0}: {2} lost"), -1);
  else
    {
      const int pairs[] = { in->m, in->h, in->m, out->h };
      hl_emit_done (emit, hl_add_energy (emit->system, HL_VAR_POWER, pairs, (const double[]) { 1.0, -1.0 }, 2, &heat_loss, (const double[]) { -1.0 }, 1),
                    N_("{4} = {0} × ({1} − {3})"), 4);
    }
}

static void
processes (HlProcessSink *sink)
{
  hl_process_add (sink, HL_PROCESS_LINE, hl_process_node (sink, "inlet"), hl_process_node (sink, "outlet"));
}

const HlComponentModel hl_pipe_model = { "pipe", emit_pipe, hl_check_pressure_falls, processes };
