/* Header: several streams join at one pressure and part again in the mixed state.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/mixing.h"

#define NODE(emit, n) hl_model_node ((emit)->model, n)

/* Σ in m h = Σ out m × the one enthalpy of all outlets. */
static void
emit_header (HlEmit *emit)
{
  int nodes[HL_MIXING_MOST], flows[HL_MIXING_MOST], pairs[2 * HL_MIXING_MOST], n = 0;
  double signs[HL_MIXING_MOST];
  int n_in = hl_component_option (emit->component, "inlets"), n_out = MIN (hl_component_option (emit->component, "outlets"), HL_MIXING_MOST - n_in);
  for (int k = 1; k <= n_in; k++)
    nodes[n++] = hl_emit_port (emit, hl_key ("inlet", k));
  for (int k = 1; k <= n_out; k++)
    nodes[n++] = hl_emit_port (emit, hl_key ("outlet", k));
  hl_mixing_merge_pressures (emit, nodes, n);
  hl_system_merge (emit->system, NODE (emit, nodes[0])->p, hl_emit_own (emit, "pressure", HL_VAR_PRESSURE));
  for (int k = 0; k < n; k++)
    {
      flows[k] = pairs[2 * k] = NODE (emit, nodes[k])->m;
      pairs[2 * k + 1] = NODE (emit, nodes[k])->h;
      signs[k] = k < n_in ? 1.0 : -1.0;
      if (k > n_in || (k == n_in && n_in == 1))
        hl_system_merge (emit->system, NODE (emit, nodes[n_in == 1 ? 0 : n_in])->h, NODE (emit, nodes[k])->h);
    }
  hl_emit_balance (emit, flows, n_in, flows + n_in, n_out);
  if (n_in > 1)
    hl_emit_done (emit, hl_add_energy (emit->system, HL_VAR_POWER, pairs, signs, n, NULL, NULL, 0), NULL, -1);
}

static void
check (HlChecker *checker)
{
  hl_check_entropy (checker);
}

static void
processes (HlProcessSink *sink)
{
  int out = hl_process_node (sink, "outlet1");
  for (int k = 1; k <= hl_component_option (sink->component, "inlets"); k++)
    hl_process_add (sink, HL_PROCESS_MIXING, hl_process_node (sink, hl_key ("inlet", k)), out);
}

const HlComponentModel hl_header_model = { "header", emit_header, check, processes };
