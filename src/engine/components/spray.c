/* Water sprayed into steam: mixes to a temperature.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/spray.h"
#include "plant/i18n.h"

#define NODE(emit, n) hl_model_node ((emit)->model, n)

void
hl_spray_emit (HlEmit *emit, gboolean has_loss)
{
  HlSystem *system = emit->system;
  int steam = hl_emit_port (emit, "steam"), spray = hl_emit_port (emit, "spray"), out = hl_emit_port (emit, "outlet");
  int superheat = hl_emit_own (emit, "outlet_superheat", HL_VAR_TEMPERATURE_DIFFERENCE);
  int share = hl_emit_own (emit, "spray_fraction", HL_VAR_RATIO), T_sat = hl_emit_hidden (emit, "saturation_T", HL_VAR_TEMPERATURE);
  int T = hl_emit_T (emit, out, hl_emit_has_value (emit, "outlet_superheat"));
  hl_emit_guess (emit, steam, 3.1e6);
  hl_emit_guess (emit, out, 2.85e6);
  if (has_loss)
    {
      int loss = hl_emit_own (emit, "pressure_loss", HL_VAR_RATIO);
      hl_emit_done (emit, hl_add_pressure_loss (system, NODE (emit, steam)->p, NODE (emit, out)->p, loss), NULL, -1);
    }
  const HlNode *a = NODE (emit, steam), *w = NODE (emit, spray), *b = NODE (emit, out);
  hl_emit_balance (emit, (const int[]) { a->m, w->m }, 2, &b->m, 1);
  const int pairs[] = { a->m, a->h, w->m, w->h, b->m, b->h };
  hl_emit_done (emit, hl_add_energy (system, HL_VAR_POWER, pairs, (const double[]) { 1.0, 1.0, -1.0 }, 3, NULL, NULL, 0), NULL, -1);
  hl_emit_done (emit, hl_add_saturation (system, b->fluid, b->p, T_sat), NULL, 1);
  hl_emit_done (emit, hl_add_linear (system, HL_VAR_TEMPERATURE, (const int[]) { T, T_sat, superheat }, (const double[]) { 1.0, -1.0, -1.0 }, 3, 0.0),
                N_("{2} = {0} − {1}"), 2);
  hl_emit_done (emit, hl_add_quotient (system, share, w->m, b->m), NULL, 0);
}

void
hl_spray_check (HlChecker *checker, const HlNodeResult *where)
{
  const HlNodeResult *steam = hl_check_port (checker, "steam"), *spray = hl_check_port (checker, "spray"), *out = hl_check_port (checker, "outlet");
  double superheat;
  if (steam == NULL || spray == NULL || out == NULL || where == NULL || !steam->has_state || !spray->has_state || !out->has_state)
    return;
  g_autofree char *T_in = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, steam->st.T), *T_out = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, out->st.T);
  g_autofree char *p = hl_check_text (checker, HL_DIMENSION_PRESSURE, where->p), *p_spray = hl_check_text (checker, HL_DIMENSION_PRESSURE, spray->p);
  HlFinding *finding = NULL;
  if (spray->p < where->p * (1.0 - 1e-9))
    finding = hl_check_add (checker, HL_GRADE_ERROR, "spray-uphill", "spray.p",
      g_strdup_printf (_("The spray of %s arrives at %s, below the steam's %s: it cannot flow in. Take it behind the feed pump."), checker->component->id, p_spray, p));
  else if (out->st.h > steam->st.h)
    finding = hl_check_add (checker, HL_GRADE_ERROR, "heat-runs-backwards", "outlet.T",
      g_strdup_printf (_("Steam comes into %s at %s and is to leave hotter, at %s: a spray only cools. Lower the outlet temperature."), checker->component->id, T_in, T_out));
  else if (hl_check_own (checker, "outlet_superheat", &superheat) && superheat < 5.0)
    finding = hl_check_add (checker, HL_GRADE_CAUTION, "small-superheat", "outlet.T",
      g_strdup_printf (_("Steam leaves %s less than 5 K above saturation: part of the spray may not evaporate."), checker->component->id));
  if (finding != NULL)
    hl_check_offer (checker, finding, finding->at.key);
  hl_check_entropy (checker);
}
