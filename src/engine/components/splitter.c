/* Splitter: one stream parts into several of the same state.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/mixing.h"

#define NODE(emit, n) hl_model_node ((emit)->model, n)

static void
emit_splitter (HlEmit *emit)
{
  int nodes[HL_MIXING_MOST], flows[HL_MIXING_MOST], n = 0, n_outlets = MIN (hl_component_option (emit->component, "outlets"), HL_MIXING_MOST - 1);
  nodes[n++] = hl_emit_port (emit, "inlet");
  for (int k = 1; k <= n_outlets; k++)
    nodes[n++] = hl_emit_port (emit, hl_key ("outlet", k));
  hl_mixing_merge_pressures (emit, nodes, n);
  for (int k = 0; k < n; k++)
    flows[k] = NODE (emit, nodes[k])->m;
  hl_emit_balance (emit, flows, 1, flows + 1, n - 1);
  for (int k = 1; k < n; k++)
    {
      int fraction = hl_emit_own (emit, hl_key ("fraction", k), HL_VAR_RATIO);
      hl_system_merge (emit->system, NODE (emit, nodes[0])->h, NODE (emit, nodes[k])->h);
      hl_emit_done (emit, hl_add_quotient (emit->system, fraction, flows[k], flows[0]), NULL, 0);
    }
}

const HlComponentModel hl_splitter_model = { "splitter", emit_splitter, NULL, NULL };
