/* Open heater and deaerator, splitter and mixer: where streams of one pressure meet or part.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/components.h"
#include "plant/i18n.h"
#include <math.h>

#define NODE(emit, n) hl_model_node ((emit)->model, n)
#define MOST_PORTS 16

static void
merge_pressures (HlEmit *emit, const int *nodes, int n)
{
  for (int k = 1; k < n; k++)
    hl_system_merge (emit->system, NODE (emit, nodes[0])->p, NODE (emit, nodes[k])->p);
}

/* All but the last node flow in, the last one flows out. */
static void
emit_mixing (HlEmit *emit, const int *nodes, int n)
{
  int flows[MOST_PORTS], pairs[2 * MOST_PORTS];
  double signs[MOST_PORTS];
  for (int k = 0; k < n; k++)
    {
      flows[k] = pairs[2 * k] = NODE (emit, nodes[k])->m;
      pairs[2 * k + 1] = NODE (emit, nodes[k])->h;
      signs[k] = k < n - 1 ? 1.0 : -1.0;
    }
  merge_pressures (emit, nodes, n);
  hl_emit_balance (emit, flows, n - 1, flows + n - 1, 1);
  hl_emit_done (emit, hl_add_energy (emit->system, HL_VAR_POWER, pairs, signs, n, NULL, NULL, 0), NULL, -1);
}

static void
emit_open_heater (HlEmit *emit)
{
  int nodes[MOST_PORTS], n = 0, n_inlets = MIN (hl_component_option (emit->component, "inlets"), MOST_PORTS - 2);
  int subcooling = hl_emit_own (emit, "outlet_subcooling", HL_VAR_TEMPERATURE_DIFFERENCE), heat = hl_emit_own (emit, "heat", HL_VAR_POWER);
  nodes[n++] = hl_emit_port (emit, "steam");
  hl_emit_guess (emit, nodes[0], 2.8e6);
  for (int k = 1; k <= n_inlets; k++)
    nodes[n++] = hl_emit_port (emit, hl_key ("inlet", k));
  nodes[n++] = hl_emit_port (emit, "outlet");
  emit_mixing (emit, nodes, n);
  const HlNode *steam = NODE (emit, nodes[0]);
  HlNode *out = NODE (emit, nodes[n - 1]);
  out->subcooling = subcooling;
  hl_emit_done (emit, hl_add_liquid (emit->system, out->fluid, out->p, subcooling, out->h), NULL, -1);
  const int pairs[] = { steam->m, steam->h, steam->m, out->h };
  hl_emit_done (emit, hl_add_energy (emit->system, HL_VAR_POWER, pairs, (const double[]) { 1.0, -1.0 }, 2, &heat, (const double[]) { -1.0 }, 1),
                N_("{4} = {0} × ({1} − {3})"), 4);
}

static void
emit_splitter (HlEmit *emit)
{
  int nodes[MOST_PORTS], flows[MOST_PORTS], n = 0, n_outlets = MIN (hl_component_option (emit->component, "outlets"), MOST_PORTS - 1);
  nodes[n++] = hl_emit_port (emit, "inlet");
  for (int k = 1; k <= n_outlets; k++)
    nodes[n++] = hl_emit_port (emit, hl_key ("outlet", k));
  merge_pressures (emit, nodes, n);
  for (int k = 0; k < n; k++)
    flows[k] = NODE (emit, nodes[k])->m;
  hl_emit_balance (emit, flows, 1, flows + 1, n - 1);
  for (int k = 1; k < n; k++)
    {
      int fraction = hl_emit_own (emit, hl_key ("fraction", k), HL_VAR_RATIO);
      hl_system_merge (emit->system, NODE (emit, nodes[0])->h, NODE (emit, nodes[k])->h);
      hl_emit_done (emit, hl_add_quotient (emit->system, fraction, flows[k], flows[0]), NULL, 0);
    }
}

static void
emit_mixer (HlEmit *emit)
{
  int nodes[MOST_PORTS], n = 0, n_inlets = MIN (hl_component_option (emit->component, "inlets"), MOST_PORTS - 1);
  for (int k = 1; k <= n_inlets; k++)
    nodes[n++] = hl_emit_port (emit, hl_key ("inlet", k));
  nodes[n++] = hl_emit_port (emit, "outlet");
  emit_mixing (emit, nodes, n);
}

/* --- checks and processes -------------------------------------------------------- */

static void
check_open_heater (HlChecker *checker)
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
mixing_processes (HlProcessSink *sink, const char *const *first, const char *base, int n)
{
  int out = hl_process_node (sink, "outlet");
  for (; first != NULL && *first != NULL; first++)
    hl_process_add (sink, HL_PROCESS_MIXING, hl_process_node (sink, *first), out);
  for (int k = 1; k <= n; k++)
    hl_process_add (sink, HL_PROCESS_MIXING, hl_process_node (sink, hl_key (base, k)), out);
}

static void
open_heater_processes (HlProcessSink *sink)
{
  static const char *const steam[] = { "steam", NULL };
  mixing_processes (sink, steam, "inlet", hl_component_option (sink->component, "inlets"));
}

static void
mixer_processes (HlProcessSink *sink)
{
  mixing_processes (sink, NULL, "inlet", hl_component_option (sink->component, "inlets"));
}

const HlComponentModel hl_open_heater_model = { "open_heater", emit_open_heater, check_open_heater, open_heater_processes };
const HlComponentModel hl_splitter_model = { "splitter", emit_splitter, NULL, NULL };
const HlComponentModel hl_mixer_model = { "mixer", emit_mixer, hl_check_entropy, mixer_processes };
