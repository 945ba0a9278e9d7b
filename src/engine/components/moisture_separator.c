/* Moisture separator: takes a part of the water out of wet steam.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/components.h"
#include "plant/i18n.h"
#include <math.h>

#define NODE(emit, n) hl_model_node ((emit)->model, n)

static void
emit_moisture_separator (HlEmit *emit)
{
  HlSystem *system = emit->system;
  int in = hl_emit_port (emit, "inlet"), steam = hl_emit_port (emit, "steam"), drain = hl_emit_port (emit, "drain");
  int loss = hl_emit_own (emit, "pressure_loss", HL_VAR_RATIO), part = hl_emit_own (emit, "separation", HL_VAR_RATIO);
  int y = hl_emit_own (emit, "inlet_moisture", HL_VAR_RATIO), y_out = hl_emit_own (emit, "outlet_moisture", HL_VAR_RATIO);
  int water = hl_emit_hidden (emit, "moisture_flow", HL_VAR_FLOW), none = hl_emit_constant (emit, HL_VAR_TEMPERATURE_DIFFERENCE, 0.0);
  const HlNode *a = NODE (emit, in), *v = NODE (emit, steam);
  HlNode *l = NODE (emit, drain);
  l->subcooling = none;
  hl_emit_guess (emit, steam, 2.7e6);
  hl_system_merge (system, v->p, l->p);
  hl_emit_done (emit, hl_add_pressure_loss (system, a->p, v->p, loss), NULL, -1);
  hl_emit_balance (emit, &a->m, 1, (const int[]) { v->m, l->m }, 2);
  hl_emit_done (emit, hl_add_liquid (system, l->fluid, l->p, none, l->h), N_("{2} = h′({0})"), -1);
  hl_emit_done (emit, hl_add_moisture (system, a->fluid, v->p, a->h, y), NULL, -1);
  hl_emit_done (emit, hl_add_product (system, a->m, y, water), NULL, -1);
  hl_emit_done (emit, hl_add_product (system, water, part, l->m), NULL, -1);
  const int pairs[] = { a->m, a->h, v->m, v->h, l->m, l->h };
  hl_emit_done (emit, hl_add_energy (system, HL_VAR_POWER, pairs, (const double[]) { 1.0, -1.0, -1.0 }, 3, NULL, NULL, 0), NULL, -1);
  hl_emit_done (emit, hl_add_moisture (system, v->fluid, v->p, v->h, y_out), NULL, 2);
}

static void
check (HlChecker *checker)
{
  double y;
  if (hl_check_own (checker, "inlet_moisture", &y) && y <= 1e-9)
    hl_check_add (checker, HL_GRADE_HINT, "nothing-to-part", "",
      g_strdup_printf (_("Dry steam flows through %s: there is no water to take out."), checker->component->id));
  hl_check_entropy (checker);
}

static void
processes (HlProcessSink *sink)
{
  int in = hl_process_node (sink, "inlet");
  hl_process_add (sink, HL_PROCESS_MIXING, in, hl_process_node (sink, "steam"));
  hl_process_add (sink, HL_PROCESS_MIXING, in, hl_process_node (sink, "drain"));
}

const HlComponentModel hl_moisture_separator_model = { "moisture_separator", emit_moisture_separator, check, processes };
