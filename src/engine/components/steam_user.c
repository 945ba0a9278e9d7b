/* Process steam user: takes heat, returns part of its condensate.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/components.h"
#include "plant/i18n.h"
#include <math.h>

static void
emit_steam_user (HlEmit *emit)
{
  const int steam_node = hl_emit_port (emit, "steam"), out_node = hl_emit_port (emit, "condensate");
  const HlNode *steam = hl_model_node (emit->model, steam_node), *out = hl_model_node (emit->model, out_node);
  int heat = hl_emit_own (emit, "heat", HL_VAR_POWER), returned = hl_emit_own (emit, "return_fraction", HL_VAR_RATIO);
  int lost = hl_emit_own (emit, "lost_flow", HL_VAR_FLOW);
  hl_emit_guess (emit, steam_node, 2.9e6);
  const int pairs[] = { steam->m, steam->h, steam->m, out->h };
  hl_emit_done (emit, hl_add_energy (emit->system, HL_VAR_POWER, pairs, (const double[]) { 1.0, -1.0 }, 2, &heat, (const double[]) { -1.0 }, 1),
                N_("{4} = {0} × ({1} − {3})"), 4);
  hl_emit_sum (emit, HL_SUM_DELIVERED, heat);
  /* Where all of it comes back, the circuit closes and its balances depend on each other: one flow, nothing lost. */
  if (hl_emit_is_fixed_at (emit, "return_fraction", 1.0))
    {
      hl_system_merge (emit->system, steam->m, out->m);
      hl_emit_done (emit, hl_add_linear (emit->system, HL_VAR_FLOW, &lost, (const double[]) { 1.0 }, 1, 0.0), N_("{0} = 0: all of it comes back"), 0);
      return;
    }
  hl_emit_done (emit, hl_add_product (emit->system, steam->m, returned, out->m), NULL, -1);
  const int flows[] = { out->m, lost };
  hl_emit_balance (emit, &steam->m, 1, flows, 2);
}

static void
check (HlChecker *checker)
{
  const HlNodeResult *steam = hl_check_port (checker, "steam"), *out = hl_check_port (checker, "condensate");
  if (steam == NULL || out == NULL)
    return;
  if (steam->has_pressure && out->has_pressure && out->p > steam->p * (1.0 + 1e-9))
    {
      g_autofree char *p_in = hl_check_text (checker, HL_DIMENSION_PRESSURE, steam->p);
      g_autofree char *p_out = hl_check_text (checker, HL_DIMENSION_PRESSURE, out->p);
      HlFinding *finding = hl_check_add (checker, HL_GRADE_CAUTION, "pressure-rises", "condensate.p",
        g_strdup_printf (_("Condensate of %s comes back at %s, above its steam's %s: a condensate pump is silently taken for granted."), checker->component->id, p_out, p_in));
      hl_check_offer (checker, finding, "condensate.p");
    }
  if (steam->has_state && out->has_state && steam->st.h <= out->st.h)
    {
      HlFinding *finding = hl_check_add (checker, HL_GRADE_ERROR, "heat-runs-backwards", "condensate.T",
        g_strdup_printf (_("Condensate of %s holds more heat than its steam. Lower the condensate temperature."), checker->component->id));
      hl_check_offer (checker, finding, "condensate.T");
    }
}

static void
processes (HlProcessSink *sink)
{
  hl_process_add_trapped (sink, hl_process_node (sink, "steam"), hl_process_node (sink, "condensate"));
}

const HlComponentModel hl_steam_user_model = { "steam_user", emit_steam_user, check, processes };
