/* Open heater, deaerator: steam and waters mix at one pressure, and leave as liquid.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/mixing.h"
#include "plant/i18n.h"
#include <math.h>

#define NODE(emit, n) hl_model_node ((emit)->model, n)

/* Where nothing is let off, the circuit closes and its balances depend on each other: no flow of the vent in them. */
static gboolean
has_vent (HlEmit *emit)
{
  return hl_component_option (emit->component, "vent") != 0 && !hl_emit_is_fixed_at (emit, "vent_fraction", 0.0);
}

/* Saturated steam leaves at the vent, beside the water at the outlet, the last of the nodes. */
static void
emit_vented (HlEmit *emit, const int *nodes, int n, int vent)
{
  HlSystem *system = emit->system;
  int flows[HL_MIXING_MOST + 1], pairs[2 * HL_MIXING_MOST + 2];
  double signs[HL_MIXING_MOST + 1];
  int share = hl_emit_own (emit, "vent_fraction", HL_VAR_RATIO), h = hl_emit_own (emit, "vent_h", HL_VAR_ENTHALPY);
  int all = hl_emit_constant (emit, HL_VAR_RATIO, 1.0);
  const HlNode *out = NODE (emit, nodes[n - 1]);
  hl_system_var (system, h)->start = 2.7e6;
  for (int k = 0; k < n; k++)
    {
      flows[k] = pairs[2 * k] = NODE (emit, nodes[k])->m;
      pairs[2 * k + 1] = NODE (emit, nodes[k])->h;
      signs[k] = k < n - 1 ? 1.0 : -1.0;
    }
  flows[n] = pairs[2 * n] = vent;
  pairs[2 * n + 1] = h;
  signs[n] = -1.0;
  hl_mixing_merge_pressures (emit, nodes, n);
  hl_emit_balance (emit, flows, n - 1, flows + n - 1, 2);
  hl_emit_done (emit, hl_add_energy (system, HL_VAR_POWER, pairs, signs, n + 1, NULL, NULL, 0), NULL, -1);
  hl_emit_done (emit, hl_add_product (system, out->m, share, vent), NULL, -1);
  hl_emit_done (emit, hl_add_enthalpy_at_quality (system, out->fluid, out->p, all, h), N_("{2} = h″({0})"), 2);
}

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
  if (has_vent (emit))
    emit_vented (emit, nodes, n, hl_emit_own (emit, "vent_flow", HL_VAR_FLOW));
  else
    {
      hl_mixing_emit (emit, nodes, n);
      if (hl_component_option (emit->component, "vent") != 0)
        {
          int vent = hl_emit_own (emit, "vent_flow", HL_VAR_FLOW);
          hl_emit_own (emit, "vent_fraction", HL_VAR_RATIO);
          hl_emit_done (emit, hl_add_linear (emit->system, HL_VAR_FLOW, &vent, (const double[]) { 1.0 }, 1, 0.0), N_("{0} = 0: nothing is let off"), 0);
        }
    }
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
