/* Gland seal: a given part of the steam leaks off at constant enthalpy.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/components.h"
#include "plant/i18n.h"

#define NODE(emit, n) hl_model_node ((emit)->model, n)

static void
emit_gland_seal (HlEmit *emit)
{
  HlSystem *system = emit->system;
  int in_node = hl_emit_port (emit, "inlet"), out_node = hl_emit_port (emit, "outlet"), leak_node = hl_emit_port (emit, "leak");
  int share = hl_emit_own (emit, "leak_fraction", HL_VAR_RATIO);
  hl_emit_guess (emit, in_node, 3.2e6);
  const HlNode *in = NODE (emit, in_node), *out = NODE (emit, out_node), *leak = NODE (emit, leak_node);
  hl_system_merge (system, in->p, out->p);
  hl_system_merge (system, in->h, out->h);
  hl_system_merge (system, in->h, leak->h);
  hl_emit_balance (emit, &in->m, 1, (const int[]) { out->m, leak->m }, 2);
  hl_emit_done (emit, hl_add_product (system, in->m, share, leak->m), NULL, -1);
}

static void
check (HlChecker *checker)
{
  const HlNodeResult *in = hl_check_port (checker, "inlet"), *leak = hl_check_port (checker, "leak");
  if (in == NULL || leak == NULL || !in->has_pressure || !leak->has_pressure || leak->p <= in->p * (1.0 + 1e-9))
    return;
  g_autofree char *p_in = hl_check_text (checker, HL_DIMENSION_PRESSURE, in->p), *p = hl_check_text (checker, HL_DIMENSION_PRESSURE, leak->p);
  HlFinding *finding = hl_check_add (checker, HL_GRADE_ERROR, "pressure-rises", "leak.p",
    g_strdup_printf (_("Steam cannot leak from gland %s at %s into %s. Lead the leak-off to a lower pressure."), checker->component->id, p_in, p));
  hl_check_offer (checker, finding, "leak.p");
}

static void
processes (HlProcessSink *sink)
{
  hl_process_add (sink, HL_PROCESS_THROTTLING, hl_process_node (sink, "inlet"), hl_process_node (sink, "leak"));
}

const HlComponentModel hl_gland_seal_model = { "gland_seal", emit_gland_seal, check, processes };
