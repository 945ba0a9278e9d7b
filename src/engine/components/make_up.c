/* Make-up water: comes from outside in the state that is given, after a treatment that may lose some.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/components.h"
#include "plant/i18n.h"

static HlStatus
treatment (G_GNUC_UNUSED const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  *r = x[0] * (1.0 - x[1]) - x[2];
  dr[0] = 1.0 - x[1];
  dr[1] = -x[0];
  dr[2] = -1.0;
  return HL_OK;
}

static void
emit_make_up (HlEmit *emit)
{
  int out = hl_emit_port (emit, "outlet");
  hl_emit_guess (emit, out, 63e3);
  if (hl_component_option (emit->component, "treatment") == 0)
    return;
  int loss = hl_emit_own (emit, "treatment_loss", HL_VAR_RATIO), raw = hl_emit_own (emit, "raw_flow", HL_VAR_FLOW);
  const int vars[] = { raw, loss, hl_model_node (emit->model, out)->m };
  hl_emit_done (emit, hl_system_add_equation (emit->system, treatment, HL_VAR_FLOW, HL_ALL_LINEAR, vars, 3, NULL, 0), N_("{0} = {2} ÷ (1 − {1})"), 0);
}

const HlComponentModel hl_make_up_model = { "make_up", emit_make_up, NULL, NULL };
