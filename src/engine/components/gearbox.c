/* Gearbox: loses a part of what the drivers of its shaft give.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/components.h"
#include "plant/i18n.h"

static void
emit_gearbox (HlEmit *emit)
{
  int in = hl_emit_own (emit, "input_power", HL_VAR_POWER), efficiency = hl_emit_own (emit, "efficiency", HL_VAR_RATIO);
  int out = hl_emit_own (emit, "output_power", HL_VAR_POWER), loss = hl_emit_own (emit, "loss", HL_VAR_POWER);
  hl_emit_done (emit, hl_add_product (emit->system, in, efficiency, out), NULL, 2);
  hl_emit_done (emit, hl_add_linear (emit->system, HL_VAR_POWER, (const int[]) { loss, in, out }, (const double[]) { 1.0, -1.0, 1.0 }, 3, 0.0),
                N_("{0} = {1} − {2}"), 0);
  if (!emit->model->is_on_shaft[emit->index])
    hl_emit_done (emit, hl_add_linear (emit->system, HL_VAR_POWER, &in, (const double[]) { 1.0 }, 1, 0.0), N_("{0} = 0: on no shaft"), 0);
}

static void
check (HlChecker *checker)
{
  if (!checker->model->is_on_shaft[checker->index])
    hl_check_add (checker, HL_GRADE_WARNING, "no-shaft", "",
                  g_strdup_printf (_("Gearbox %s is on no shaft that carries power. Join it to what drives and what is driven."), checker->component->id));
}

const HlComponentModel hl_gearbox_model = { "gearbox", emit_gearbox, check, NULL };
