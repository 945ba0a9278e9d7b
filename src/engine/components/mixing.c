/* What open heater, splitter and mixer have in common: streams of one pressure meet or part.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/mixing.h"

#define NODE(emit, n) hl_model_node ((emit)->model, n)

void
hl_mixing_merge_pressures (HlEmit *emit, const int *nodes, int n)
{
  for (int k = 1; k < n; k++)
    hl_system_merge (emit->system, NODE (emit, nodes[0])->p, NODE (emit, nodes[k])->p);
}

/* All but the last node flow in, the last one flows out. */
void
hl_mixing_emit (HlEmit *emit, const int *nodes, int n)
{
  int flows[HL_MIXING_MOST], pairs[2 * HL_MIXING_MOST];
  double signs[HL_MIXING_MOST];
  for (int k = 0; k < n; k++)
    {
      flows[k] = pairs[2 * k] = NODE (emit, nodes[k])->m;
      pairs[2 * k + 1] = NODE (emit, nodes[k])->h;
      signs[k] = k < n - 1 ? 1.0 : -1.0;
    }
  hl_mixing_merge_pressures (emit, nodes, n);
  hl_emit_balance (emit, flows, n - 1, flows + n - 1, 1);
  hl_emit_done (emit, hl_add_energy (emit->system, HL_VAR_POWER, pairs, signs, n, NULL, NULL, 0), NULL, -1);
}

void
hl_mixing_processes (HlProcessSink *sink, const char *const *first, const char *base, int n)
{
  int out = hl_process_node (sink, "outlet");
  for (; first != NULL && *first != NULL; first++)
    hl_process_add (sink, HL_PROCESS_MIXING, hl_process_node (sink, *first), out);
  for (int k = 1; k <= n; k++)
    hl_process_add (sink, HL_PROCESS_MIXING, hl_process_node (sink, hl_key (base, k)), out);
}
