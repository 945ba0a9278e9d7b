/* Ejector: motive and suction stream mix to a pressure between both, by a given ratio.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/drive.h"
#include "plant/i18n.h"

#define NODE(emit, n) hl_model_node ((emit)->model, n)

static void
emit_ejector (HlEmit *emit)
{
  HlSystem *system = emit->system;
  int motive = hl_emit_port (emit, "motive"), suction = hl_emit_port (emit, "suction"), out = hl_emit_port (emit, "outlet");
  int ratio = hl_emit_own (emit, "entrainment_ratio", HL_VAR_RATIO);
  int rise = hl_emit_own (emit, "compression_ratio", HL_VAR_RATIO), fall = hl_emit_own (emit, "expansion_ratio", HL_VAR_RATIO);
  hl_emit_guess (emit, motive, 2.9e6);
  hl_emit_guess (emit, suction, 2.6e6);
  hl_emit_guess (emit, out, 2.8e6);
  const HlNode *a = NODE (emit, motive), *b = NODE (emit, suction), *c = NODE (emit, out);
  hl_emit_balance (emit, (const int[]) { a->m, b->m }, 2, &c->m, 1);
  hl_emit_done (emit, hl_add_product (system, a->m, ratio, b->m), NULL, -1);
  const int pairs[] = { a->m, a->h, b->m, b->h, c->m, c->h };
  hl_emit_done (emit, hl_add_energy (system, HL_VAR_POWER, pairs, (const double[]) { 1.0, 1.0, -1.0 }, 3, NULL, NULL, 0), NULL, -1);
  hl_emit_done (emit, hl_drive_add_ratio (system, b->p, c->p, rise), NULL, 2);
  hl_emit_done (emit, hl_drive_add_ratio (system, b->p, a->p, fall), NULL, 2);
}

static void
check (HlChecker *checker)
{
  const HlNodeResult *motive = hl_check_port (checker, "motive"), *suction = hl_check_port (checker, "suction"), *out = hl_check_port (checker, "outlet");
  const char *id = checker->component->id;
  if (motive == NULL || suction == NULL || out == NULL || !motive->has_pressure || !suction->has_pressure || !out->has_pressure)
    return;
  g_autofree char *p_in = hl_check_text (checker, HL_DIMENSION_PRESSURE, motive->p), *p_low = hl_check_text (checker, HL_DIMENSION_PRESSURE, suction->p);
  g_autofree char *p = hl_check_text (checker, HL_DIMENSION_PRESSURE, out->p);
  HlFinding *finding = NULL;
  if (out->p > motive->p * (1.0 + 1e-9))
    finding = hl_check_add (checker, HL_GRADE_ERROR, "pressure-rises", "outlet.p",
      g_strdup_printf (_("Ejector %s is to deliver at %s, above its motive steam's %s. Lower the outlet pressure."), id, p, p_in));
  else if (out->p < suction->p * (1.0 - 1e-9))
    finding = hl_check_add (checker, HL_GRADE_ERROR, "nothing-to-lift", "outlet.p",
      g_strdup_printf (_("Ejector %s is to lift from %s down to %s: a mixer and a valve do that. Raise the outlet pressure."), id, p_low, p));
  if (finding != NULL)
    hl_check_offer (checker, finding, "outlet.p");
  hl_check_entropy (checker);
}

static void
processes (HlProcessSink *sink)
{
  int out = hl_process_node (sink, "outlet");
  hl_process_add (sink, HL_PROCESS_MIXING, hl_process_node (sink, "motive"), out);
  hl_process_add (sink, HL_PROCESS_MIXING, hl_process_node (sink, "suction"), out);
}

const HlComponentModel hl_ejector_model = { "ejector", emit_ejector, check, processes };
