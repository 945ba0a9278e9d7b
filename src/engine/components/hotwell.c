/* Hotwell: condensate, drains and make-up meet at one pressure.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/mixing.h"
#include "plant/i18n.h"

static void
emit_hotwell (HlEmit *emit)
{
  int nodes[HL_MIXING_MOST], n = 0, n_inlets = MIN (hl_component_option (emit->component, "inlets"), HL_MIXING_MOST - 1);
  for (int k = 1; k <= n_inlets; k++)
    nodes[n++] = hl_emit_port (emit, hl_key ("inlet", k));
  nodes[n++] = hl_emit_port (emit, "outlet");
  if (n_inlets > 1)
    {
      hl_mixing_emit (emit, nodes, n);
      return;
    }
  /* One inlet passes on as it is. */
  const HlNode *in = hl_model_node (emit->model, nodes[0]), *out = hl_model_node (emit->model, nodes[1]);
  hl_system_merge (emit->system, in->m, out->m);
  hl_system_merge (emit->system, in->p, out->p);
  hl_system_merge (emit->system, in->h, out->h);
}

static void
check (HlChecker *checker)
{
  const HlNodeResult *out = hl_check_port (checker, "outlet");
  if (out != NULL && out->has_state && out->st.phase == HL_PHASE_TWO_PHASE && out->st.x > 1e-6)
    hl_check_add (checker, HL_GRADE_WARNING, "hotwell-steam", "outlet.x",
      g_strdup_printf (_("What flows into hotwell %s would leave it with %.1f %% steam. Lead hot drains into the condenser, or cool them first."),
                       checker->component->id, 100.0 * out->st.x));
  hl_check_entropy (checker);
}

static void
processes (HlProcessSink *sink)
{
  hl_mixing_processes (sink, NULL, "inlet", hl_component_option (sink->component, "inlets"));
}

const HlComponentModel hl_hotwell_model = { "hotwell", emit_hotwell, check, processes };
