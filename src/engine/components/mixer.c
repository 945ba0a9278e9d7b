/* Mixer: streams of one pressure become one.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/mixing.h"

static void
emit_mixer (HlEmit *emit)
{
  int nodes[HL_MIXING_MOST], n = 0, n_inlets = MIN (hl_component_option (emit->component, "inlets"), HL_MIXING_MOST - 1);
  for (int k = 1; k <= n_inlets; k++)
    nodes[n++] = hl_emit_port (emit, hl_key ("inlet", k));
  nodes[n++] = hl_emit_port (emit, "outlet");
  hl_mixing_emit (emit, nodes, n);
}

static void
processes (HlProcessSink *sink)
{
  hl_mixing_processes (sink, NULL, "inlet", hl_component_option (sink->component, "inlets"));
}

const HlComponentModel hl_mixer_model = { "mixer", emit_mixer, hl_check_entropy, processes };
