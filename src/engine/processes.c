/* What happens to the medium inside components, collected for state diagrams.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/processes.h"
#include <math.h>

int
hl_process_node (const HlProcessSink *sink, const char *port)
{
  return hl_model_port_node (sink->model, sink->index, port);
}

static void
add (HlProcessSink *sink, HlProcess *process, const HlNodeResult *flow)
{
  process->component = (guint) sink->index;
  process->m = flow->has_flow ? flow->m : NAN;
  if (process->kind == HL_PROCESS_EXPANSION || process->kind == HL_PROCESS_COMPRESSION)
    process->has_isentropic = hl_fluid_state_ps (process->fluid, process->to.p, process->from.s, &process->isentropic) == HL_OK;
  g_array_append_val (sink->out, *process);
}

void
hl_process_add_trapped (HlProcessSink *sink, int from, int to)
{
  guint n = sink->out->len;
  HlState before_trap;
  hl_process_add (sink, HL_PROCESS_COOLING, from, to);
  if (sink->out->len == n)
    return;
  HlProcess *cooling = &g_array_index (sink->out, HlProcess, n);
  if (!(cooling->to.p < cooling->from.p * (1.0 - 1e-9))
      || hl_fluid_state_ph (cooling->fluid, cooling->from.p, cooling->to.h, &before_trap) != HL_OK)
    return;
  HlProcess trap = *cooling;
  trap.kind = HL_PROCESS_THROTTLING;
  trap.from_stream = cooling->to_stream = -1;
  trap.from = cooling->to = before_trap;
  g_array_append_val (sink->out, trap);
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
    .kind = kind, .from_stream = from_node->stream, .to_stream = to_node->stream,
    .from = a->st, .to = b->st, .fluid = from_node->fluid, .is_service = a->is_service && b->is_service,
  };
  add (sink, &process, a);
}

void
hl_process_add_to (HlProcessSink *sink, HlProcessKind kind, int from, const HlState *to)
{
  if (from < 0 || !sink->states[from].has_state)
    return;
  const HlNode *node = hl_model_node (sink->model, from);
  HlProcess process = {
    .kind = kind, .from_stream = node->stream, .to_stream = -1,
    .from = sink->states[from].st, .to = *to, .fluid = node->fluid, .is_service = sink->states[from].is_service,
  };
  add (sink, &process, &sink->states[from]);
}

void
hl_process_add_from (HlProcessSink *sink, HlProcessKind kind, const HlState *from, int to)
{
  if (to < 0 || !sink->states[to].has_state)
    return;
  const HlNode *node = hl_model_node (sink->model, to);
  HlProcess process = {
    .kind = kind, .from_stream = -1, .to_stream = node->stream,
    .from = *from, .to = sink->states[to].st, .fluid = node->fluid, .is_service = sink->states[to].is_service,
  };
  add (sink, &process, &sink->states[to]);
}

gboolean
hl_process_own (const HlProcessSink *sink, const char *key, double *value)
{
  int var = hl_model_own_var (sink->model, sink->index, key);
  if (var < 0 || !sink->is_known[sink->model->system->root[var]])
    return FALSE;
  *value = hl_system_value (sink->model->system, var);
  return TRUE;
}
