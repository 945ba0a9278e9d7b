/* Open heater, deaerator: steam and waters mix at one pressure, and leave as liquid.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/mixing.h"
#include "plant/i18n.h"
#include <math.h>

#define NODE(emit, n) hl_model_node ((emit)->model, n)

static void
emit_open_heater (HlEmit *emit)
{
  int nodes[HL_MIXING_MOST], n = 0, n_inlets = MIN (hl_component_option (emit->component, "inlets"), HL_MIXING_MOST - 2);
  int subcooling = hl_emit_own (emit, "outlet_subcooling", HL_VAR_TEMPERATURE_DIFFERENCE), heat = hl_emit_own (emit, "heat", HL_VAR_POWER);
  nodes[n++] = hl_emit_port (emit, "steam");
  hl_emit_guess (emit, nodes[0], 2.8e6);
  for (int k = 1; k <= n_inlets; k++)
    nodes[n++] = hl_emit_port (emit, hl_key ("inlet", k));
  nodes[n++] = hl_emit_port (emit, "outlet");
  hl_mixing_emit (emit, nodes, n);
  const HlNode *steam = NODE (emit, nodes[0]);
  HlNode *out = NODE (emit, nodes[n - 1]);
  out->subcooling = subcooling;
  hl_emit_done (emit, hl_add_liquid (emit->system, out->fluid, out->p, subcooling, out->h), NULL, -1);
  const int pairs[] = { steam->m, steam->h, steam->m, out->h };
  hl_emit_done (emit, hl_add_energy (emit->system, HL_VAR_POWER, pairs, (const double[]) { 1.0, -1.0 }, 2, &heat, (const double[]) { -1.0 }, 1),
                N_("{4} = {0} × ({1} − {3})"), 4);
}

/* --- checks and processes -------------------------------------------------------- */

static void
check (HlChecker *checker)
{
  const HlNodeResult *steam = hl_check_port (checker, "steam"), *out = hl_check_port (checker, "outlet");
  if (steam != NULL && steam->has_flow && steam->has_state && out != NULL && out->has_state && steam->m < -1e-9 * checker->model->system->flow_scale)
    {
      g_autofree char *m = hl_check_text (checker, HL_DIMENSION_MASS_FLOW, steam->m);
      g_autofree char *T = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, out->st.T);
      HlFinding *finding = hl_check_add (checker, HL_GRADE_ERROR, "heater-too-hot", "steam.p",
        g_strdup_printf (_("Open heater %s needs %s of steam, less than nothing: what flows in brings more heat than water at %s takes. Raise its pressure."),
                         checker->component->id, m, T));
      hl_check_offer (checker, finding, "steam.p");
    }
  hl_check_entropy (checker);
}

static void
processes (HlProcessSink *sink)
{
  static const char *const steam[] = { "steam", NULL };
  hl_mixing_processes (sink, steam, "inlet", hl_component_option (sink->component, "inlets"));
}

const HlComponentModel hl_open_heater_model = { "open_heater", emit_open_heater, check, processes };
