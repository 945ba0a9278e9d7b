/* Turbine section: groups between extractions, each with its efficiency, or one straight line in h and s.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/components.h"
#include "plant/i18n.h"
#include <math.h>

#define NODE(emit, n) hl_model_node ((emit)->model, n)
#define MOST_OUTLETS 32
enum { BY_GROUP, STRAIGHT_LINE };

static const char *
outlet_key (int n_extractions, int k)
{
  return k <= n_extractions ? hl_key ("extraction", k) : "exhaust";
}

/* Every group expands from the state that the one before it left. */
static void
emit_groups (HlEmit *emit, const int *nodes, int n_groups, int section)
{
  gboolean section_is_used = FALSE;
  for (int k = 1; k <= n_groups; k++)
    {
      const char *key = hl_key ("group_efficiency", k);
      int efficiency = hl_emit_own (emit, key, HL_VAR_RATIO);
      const HlNode *in = NODE (emit, nodes[k - 1]), *out = NODE (emit, nodes[k]);
      if (!hl_emit_has_value (emit, key))
        {
          hl_system_merge (emit->system, section, efficiency);
          efficiency = section;
          section_is_used = TRUE;
        }
      hl_emit_done (emit, hl_add_expansion (emit->system, in->fluid, in->p, in->h, out->p, efficiency, out->h), NULL, -1);
    }
  /* Where every group has its own, that of the section is what comes of them; one still assumed for it has no say. */
  if (!section_is_used && !hl_emit_has_value (emit, "isentropic_efficiency"))
    {
      const HlNode *in = NODE (emit, nodes[0]), *out = NODE (emit, nodes[n_groups]);
      hl_emit_done (emit, hl_add_overall_efficiency (emit->system, in->fluid, in->p, in->h, out->p, section, out->h), NULL, 3);
    }
}

static void
emit_straight_line (HlEmit *emit, const int *nodes, int n_groups, int section)
{
  const HlNode *in = NODE (emit, nodes[0]), *end = NODE (emit, nodes[n_groups]);
  hl_emit_done (emit, hl_add_expansion (emit->system, in->fluid, in->p, in->h, end->p, section, end->h), NULL, -1);
  for (int k = 1; k <= n_groups; k++)
    {
      const HlNode *from = NODE (emit, nodes[k - 1]), *to = NODE (emit, nodes[k]);
      int efficiency = hl_emit_own (emit, hl_key ("group_efficiency", k), HL_VAR_RATIO);
      if (k < n_groups)
        hl_emit_done (emit, hl_add_straight_line (emit->system, in->fluid, in->p, in->h, end->p, end->h, to->p, to->h), NULL, -1);
      if (!hl_emit_has_value (emit, hl_key ("group_efficiency", k)))
        hl_emit_done (emit, hl_add_overall_efficiency (emit->system, in->fluid, from->p, from->h, to->p, efficiency, to->h), NULL, 3);
    }
}

static void
emit_turbine (HlEmit *emit)
{
  int n_extractions = MIN (hl_component_option (emit->component, "extractions"), MOST_OUTLETS - 2), n_groups = n_extractions + 1;
  int nodes[MOST_OUTLETS], flows[MOST_OUTLETS], pairs[2 * MOST_OUTLETS];
  double signs[MOST_OUTLETS];
  int section = hl_emit_own (emit, "isentropic_efficiency", HL_VAR_RATIO);
  nodes[0] = hl_emit_port (emit, "inlet");
  hl_emit_guess (emit, nodes[0], 3.3e6);
  for (int k = 1; k <= n_groups; k++)
    {
      nodes[k] = hl_emit_port (emit, outlet_key (n_extractions, k));
      hl_emit_guess (emit, nodes[k], k == n_groups ? 2.3e6 : 2.9e6);
    }
  if (hl_component_option (emit->component, "expansion") == STRAIGHT_LINE)
    emit_straight_line (emit, nodes, n_groups, section);
  else
    emit_groups (emit, nodes, n_groups, section);

  for (int k = 0; k <= n_groups; k++)
    {
      flows[k] = pairs[2 * k] = NODE (emit, nodes[k])->m;
      pairs[2 * k + 1] = NODE (emit, nodes[k])->h;
      signs[k] = k == 0 ? 1.0 : -1.0;
    }
  hl_emit_balance (emit, flows, 1, flows + 1, n_groups);
  int internal = hl_emit_own (emit, "internal_power", HL_VAR_POWER), power = hl_emit_own (emit, "power", HL_VAR_POWER);
  int mechanical = hl_emit_own (emit, "mechanical_efficiency", HL_VAR_RATIO), y = hl_emit_own (emit, "exhaust_moisture", HL_VAR_RATIO);
  const HlNode *exhaust = NODE (emit, nodes[n_groups]);
  hl_emit_done (emit, hl_add_energy (emit->system, HL_VAR_POWER, pairs, signs, n_groups + 1, &internal, (const double[]) { -1.0 }, 1), NULL,
                2 * (n_groups + 1));
  hl_emit_done (emit, hl_add_product (emit->system, internal, mechanical, power), NULL, 2);
  if (hl_emit_has_value (emit, "exhaust_moisture"))
    hl_emit_done (emit, hl_add_enthalpy_at_moisture (emit->system, exhaust->fluid, exhaust->p, y, exhaust->h), NULL, -1);
  else
    hl_emit_done (emit, hl_add_moisture (emit->system, exhaust->fluid, exhaust->p, exhaust->h, y), NULL, 2);
  hl_emit_sum (emit, HL_SUM_TURBINE_POWER, power);
  if (!emit->model->is_on_shaft[emit->index])
    hl_emit_sum (emit, HL_SUM_GROSS, power);
}

/* --- checks ------------------------------------------------------------------- */

static void
check_outlet (HlChecker *checker, const char *above, const char *outlet, const HlNodeResult **last)
{
  const HlNodeResult *out = hl_check_port (checker, outlet);
  if (out == NULL || !out->has_pressure)
    return;
  if (*last != NULL && out->p > (*last)->p * (1.0 + 1e-9))
    {
      g_autofree char *p_in = hl_check_text (checker, HL_DIMENSION_PRESSURE, (*last)->p);
      g_autofree char *p_out = hl_check_text (checker, HL_DIMENSION_PRESSURE, out->p);
      g_autofree char *key = g_strconcat (outlet, ".p", NULL);
      g_autofree char *above_key = g_strconcat (above, ".p", NULL);
      HlAddress at = hl_address_component (checker->component->id, g_intern_string (key));
      HlAddress before = hl_address_component (checker->component->id, g_intern_string (above_key));
      g_autofree char *name = hl_plant_describe (checker->model->plant, &at), *before_name = hl_plant_describe (checker->model->plant, &before);
      HlFinding *finding = hl_check_add (checker, HL_GRADE_ERROR, "pressure-rises", key,
        g_strdup_printf (_("Steam cannot expand in %s: %s (%s) is above %s (%s). Lower the first or raise the second."),
                         checker->component->id, name, p_out, before_name, p_in));
      hl_check_offer (checker, finding, key);
      hl_check_offer (checker, finding, above_key);
    }
  *last = out;
}

static void
check (HlChecker *checker)
{
  int n_extractions = hl_component_option (checker->component, "extractions");
  const HlNodeResult *last = hl_check_port (checker, "inlet"), *exhaust = hl_check_port (checker, "exhaust");
  if (last != NULL && !last->has_pressure)
    last = NULL;
  for (int k = 1; k <= n_extractions + 1; k++)
    check_outlet (checker, k == 1 ? "inlet" : hl_key ("extraction", k - 1), outlet_key (n_extractions, k), &last);
  hl_check_entropy (checker);
  const HlNodeResult *inlet = hl_check_port (checker, "inlet");
  if (inlet != NULL && inlet->has_state && inlet->st.phase == HL_PHASE_LIQUID)
    {
      g_autofree char *T = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, inlet->st.T);
      HlFinding *finding = hl_check_add (checker, HL_GRADE_ERROR, "water-at-turbine", "inlet.T",
        g_strdup_printf (_("Water, not steam, reaches %s: at its inlet pressure %s is below boiling. Raise the temperature or lower the pressure."),
                         checker->component->id, T));
      hl_check_offer (checker, finding, "inlet.T");
      hl_check_offer (checker, finding, "inlet.p");
      return;
    }
  double y;
  if (exhaust == NULL || !exhaust->has_state || !hl_check_own (checker, "exhaust_moisture", &y) || !(y > 0.10 && y <= 1.0))
    return;
  g_autofree char *p = hl_check_text (checker, HL_DIMENSION_PRESSURE, exhaust->p);
  HlFinding *finding = hl_check_add (checker, y > 0.12 ? HL_GRADE_WARNING : HL_GRADE_CAUTION, "exhaust-moisture", "exhaust_moisture",
    g_strdup_printf (_("Exhaust of %s holds %.1f %% moisture at %s; above %d %% the last blades erode. Raise the exhaust pressure or the inlet temperature, or reheat."),
                     checker->component->id, 100.0 * y, p, y > 0.12 ? 12 : 10));
  hl_check_offer (checker, finding, "exhaust.p");
  hl_check_offer (checker, finding, "inlet.T");
}

static void
processes (HlProcessSink *sink)
{
  int n_extractions = hl_component_option (sink->component, "extractions"), from = hl_process_node (sink, "inlet");
  for (int k = 1; k <= n_extractions + 1; k++)
    {
      int to = hl_process_node (sink, outlet_key (n_extractions, k));
      hl_process_add (sink, HL_PROCESS_EXPANSION, from, to);
      if (to >= 0)
        from = to;
    }
}

const HlComponentModel hl_turbine_model = { "turbine", emit_turbine, check, processes };
