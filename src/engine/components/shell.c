/* The condensing side that several kinds have: steam and a drain flow in, liquid flows out, at one pressure.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/shell.h"
#include "plant/i18n.h"
#include <math.h>

#define NODE(emit, n) hl_model_node ((emit)->model, n)

void
hl_shell_emit (HlEmit *emit, int steam, int drain, int outlet, int subcooling, int heat, gboolean computes_heat)
{
  int p = NODE (emit, steam)->p, n = 0, flows[2], pairs[6];
  double signs[3];
  NODE (emit, outlet)->subcooling = subcooling;
  hl_system_merge (emit->system, p, NODE (emit, outlet)->p);
  hl_emit_done (emit, hl_add_liquid (emit->system, NODE (emit, outlet)->fluid, p, subcooling, NODE (emit, outlet)->h), NULL, -1);
  const int in[] = { steam, drain };
  for (int k = 0; k < 2; k++)
    if (in[k] >= 0)
      {
        flows[n] = pairs[2 * n] = NODE (emit, in[k])->m;
        pairs[2 * n + 1] = NODE (emit, in[k])->h;
        signs[n++] = 1.0;
      }
  pairs[2 * n] = NODE (emit, outlet)->m;
  pairs[2 * n + 1] = NODE (emit, outlet)->h;
  signs[n] = -1.0;
  hl_emit_balance (emit, flows, n, &pairs[2 * n], 1);
  hl_emit_done (emit, hl_add_energy (emit->system, HL_VAR_POWER, pairs, signs, n + 1, &heat, (const double[]) { -1.0 }, 1), NULL,
                computes_heat ? 2 * (n + 1) : -1);
}

void
hl_shell_check (HlChecker *checker, const char *drain_key, const char *outlet_key)
{
  const HlNodeResult *steam = hl_check_port (checker, "steam"), *drain = hl_check_port (checker, drain_key), *out = hl_check_port (checker, outlet_key);
  if (steam != NULL && drain != NULL && steam->has_pressure && drain->has_pressure && drain->p < steam->p * (1.0 - 1e-9))
    {
      g_autofree char *p_drain = hl_check_text (checker, HL_DIMENSION_PRESSURE, drain->p);
      g_autofree char *p_shell = hl_check_text (checker, HL_DIMENSION_PRESSURE, steam->p);
      g_autofree char *key = g_strconcat (drain_key, ".p", NULL);
      hl_check_add (checker, HL_GRADE_ERROR, "drain-uphill", key,
        g_strdup_printf (_("The drain into %s arrives at %s, below the shell's %s: it cannot flow in. Pump it, or lead it elsewhere."), checker->component->id, p_drain, p_shell));
    }
  if (steam != NULL && out != NULL && steam->has_state && out->has_state && steam->st.h <= out->st.h)
    hl_check_add (checker, HL_GRADE_ERROR, "nothing-to-condense", "",
      g_strdup_printf (_("What enters %s holds no more heat than its condensate: there is nothing to condense."), checker->component->id));
}
