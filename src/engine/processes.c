/* What happens to the medium inside components, collected for state diagrams.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/processes.h"
#include <math.h>

int
hl_process_node (const HlProcessSink *sink, const char *port)
{
  return hl_model_port_node (sink->model, sink->index, port);
}

void
hl_process_add (HlProcessSink *sink, HlProcessKind kind, int from, int to)
{
  if (from < 0 || to < 0)
    return;
  const HlNodeResult *a = &sink->states[from], *b = &sink->states[to];
  const HlNode *from_node = hl_model_node (sink->model, from), *to_node = hl_model_node (sink->model, to);
  if (!a->has_state || !b->has_state)
    return;
  HlProcess process = {
    .kind = kind, .component = (guint) sink->index,
    .from_stream = from_node->stream, .to_stream = to_node->stream,
    .from = a->st, .to = b->st, .fluid = from_node->fluid,
    .m = a->has_flow ? a->m : NAN, .is_service = a->is_service && b->is_service,
  };
  if (kind == HL_PROCESS_EXPANSION || kind == HL_PROCESS_COMPRESSION)
    process.has_isentropic = hl_fluid_state_ps (from_node->fluid, b->st.p, a->st.s, &process.isentropic) == HL_OK;
  g_array_append_val (sink->out, process);
}
