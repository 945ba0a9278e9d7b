/* Turbine section: groups between extractions, each with its efficiency, or one straight line in h and s.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/turbine.h"
#include "engine/flow-constant.h"
#include "engine/wet-expansion.h"
#include "plant/i18n.h"
#include <math.h>

#define NODE(emit, n) hl_model_node ((emit)->model, n)
#define MOST_OUTLETS 32
enum { BY_GROUP, STRAIGHT_LINE };
enum { WETNESS_NONE, WETNESS_BAUMANN };
enum { LOSS_NONE, LOSS_COUNTED };

static const char *
outlet_key (int n_extractions, int k)
{
  return k <= n_extractions ? hl_key ("extraction", k) : "exhaust";
}

/* Where each group begins and ends: inlet, extractions, end of the expansion. */
typedef struct {
  const HlFluid *fluid;
  int p[MOST_OUTLETS], h[MOST_OUTLETS], n_groups;
  int factor;                     /* of Baumann's rule; -1: moisture costs nothing */
} Line;

static void
add_expansion (HlEmit *emit, const Line *line, int from, int to, int efficiency)
{
  HlEquation *e = line->factor < 0
    ? hl_add_expansion (emit->system, line->fluid, line->p[from], line->h[from], line->p[to], efficiency, line->h[to])
    : hl_add_wet_expansion (emit->system, line->fluid, line->p[from], line->h[from], line->p[to], efficiency, line->factor, line->h[to]);
  hl_emit_done (emit, e, NULL, -1);
}

static void
add_overall (HlEmit *emit, const Line *line, int from, int to, int efficiency)
{
  hl_emit_done (emit, hl_add_overall_efficiency (emit->system, line->fluid, line->p[from], line->h[from], line->p[to], efficiency, line->h[to]), NULL, 3);
}

/* Every group expands from the state that the one before it left. */
static void
emit_groups (HlEmit *emit, const Line *line, int section)
{
  gboolean section_is_used = FALSE;
  for (int k = 1; k <= line->n_groups; k++)
    {
      const char *key = hl_key ("group_efficiency", k);
      int efficiency = hl_emit_own (emit, key, HL_VAR_RATIO);
      if (!hl_emit_has_value (emit, key))
        {
          hl_system_merge (emit->system, section, efficiency);
          efficiency = section;
          section_is_used = TRUE;
        }
      add_expansion (emit, line, k - 1, k, efficiency);
    }
  /* Where every group has its own, that of the section is what comes of them; one still assumed for it has no say. */
  if (!section_is_used && !hl_emit_has_value (emit, "isentropic_efficiency"))
    add_overall (emit, line, 0, line->n_groups, section);
}

static void
emit_straight_line (HlEmit *emit, const Line *line, int section)
{
  int end = line->n_groups;
  add_expansion (emit, line, 0, end, section);
  for (int k = 1; k <= end; k++)
    {
      int efficiency = hl_emit_own (emit, hl_key ("group_efficiency", k), HL_VAR_RATIO);
      if (k < end)
        hl_emit_done (emit, hl_add_straight_line (emit->system, line->fluid, line->p[0], line->h[0], line->p[end], line->h[end], line->p[k], line->h[k]), NULL, -1);
      if (!hl_emit_has_value (emit, hl_key ("group_efficiency", k)))
        add_overall (emit, line, k - 1, k, efficiency);
    }
}

/* The expansion ends before the loss of the leaving steam turns back into heat at the exhaust. */
static int
end_of_expansion (HlEmit *emit, const HlNode *exhaust)
{
  if (hl_component_option (emit->component, "leaving_loss") != LOSS_COUNTED)
    return exhaust->h;
  int end = hl_emit_own (emit, "expansion_end_h", HL_VAR_ENTHALPY), loss = hl_emit_own (emit, "exhaust_loss", HL_VAR_ENTHALPY);
  hl_system_var (emit->system, end)->scale = hl_fluid_scale (exhaust->fluid);
  hl_system_var (emit->system, end)->start = hl_fluid_scale_enthalpy (hl_fluid_scale (exhaust->fluid), 2.3e6);
  hl_emit_done (emit, hl_add_linear (emit->system, HL_VAR_ENTHALPY, (const int[]) { exhaust->h, end, loss }, (const double[]) { 1.0, -1.0, -1.0 }, 3, 0.0),
                N_("{0} = {1} + {2}"), -1);
  return end;
}

static void
emit_expansion (HlEmit *emit, const int *nodes, int n_groups, int section)
{
  Line line = { .n_groups = n_groups, .factor = -1 };
  for (int k = 0; k <= n_groups; k++)
    {
      line.p[k] = NODE (emit, nodes[k])->p;
      line.h[k] = k < n_groups ? NODE (emit, nodes[k])->h : end_of_expansion (emit, NODE (emit, nodes[k]));
    }
  line.fluid = NODE (emit, nodes[0])->fluid;
  if (hl_component_option (emit->component, "wetness") == WETNESS_BAUMANN)
    line.factor = hl_emit_own (emit, "baumann_factor", HL_VAR_RATIO);
  if (hl_component_option (emit->component, "expansion") == STRAIGHT_LINE)
    emit_straight_line (emit, &line, section);
  else
    emit_groups (emit, &line, section);
  if (line.factor >= 0)
    add_overall (emit, &line, 0, n_groups, hl_emit_own (emit, "overall_efficiency", HL_VAR_RATIO));

  int y = hl_emit_own (emit, "exhaust_moisture", HL_VAR_RATIO);
  if (hl_emit_has_value (emit, "exhaust_moisture"))
    hl_emit_done (emit, hl_add_enthalpy_at_moisture (emit->system, line.fluid, line.p[n_groups], y, line.h[n_groups]), NULL, -1);
  else
    hl_emit_done (emit, hl_add_moisture (emit->system, line.fluid, line.p[n_groups], line.h[n_groups], y), NULL, 2);
}

/* What flows through a group is what came in less what was extracted before it. */
static void
emit_sizes (HlEmit *emit, const int *nodes, int n_groups)
{
  int through = NODE (emit, nodes[0])->m;
  for (int k = 1; k <= n_groups; k++)
    {
      const HlNode *from = NODE (emit, nodes[k - 1]), *to = NODE (emit, nodes[k]);
      if (k > 1 && k == n_groups)
        through = to->m;
      else if (k > 1)
        {
          int rest = hl_emit_hidden (emit, hl_key ("group_flow", k), HL_VAR_FLOW);
          hl_emit_done (emit, hl_add_linear (emit->system, HL_VAR_FLOW, (const int[]) { rest, through, from->m }, (const double[]) { 1.0, -1.0, 1.0 }, 3, 0.0),
                        N_("{0} = {1} − {2}"), 0);
          through = rest;
        }
      HlEquation *e = hl_add_flow_constant (emit->system, from->fluid, through, from->p, from->h, to->p, hl_emit_own (emit, hl_key ("flow_constant", k), HL_VAR_AREA));
      hl_emit_done (emit, e, NULL, -1);
    }
}

void
hl_turbine_emit (HlEmit *emit)
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
  emit_expansion (emit, nodes, n_groups, section);

  for (int k = 0; k <= n_groups; k++)
    {
      flows[k] = pairs[2 * k] = NODE (emit, nodes[k])->m;
      pairs[2 * k + 1] = NODE (emit, nodes[k])->h;
      signs[k] = k == 0 ? 1.0 : -1.0;
    }
  hl_emit_balance (emit, flows, 1, flows + 1, n_groups);
  emit_sizes (emit, nodes, n_groups);
  int internal = hl_emit_own (emit, "internal_power", HL_VAR_POWER), power = hl_emit_own (emit, "power", HL_VAR_POWER);
  int mechanical = hl_emit_own (emit, "mechanical_efficiency", HL_VAR_RATIO);
  hl_emit_done (emit, hl_add_energy (emit->system, HL_VAR_POWER, pairs, signs, n_groups + 1, &internal, (const double[]) { -1.0 }, 1), NULL,
                2 * (n_groups + 1));
  hl_emit_done (emit, hl_add_product (emit->system, internal, mechanical, power), NULL, 2);
  hl_emit_sum (emit, HL_SUM_TURBINE_POWER, power);
  if (!emit->model->is_on_shaft[emit->index] && !emit->component->kind->only_drives)
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
        g_strdup_printf (hl_check_is_water (checker, "inlet") ? _("Steam cannot expand in %s: %s (%s) is above %s (%s). Lower the first or raise the second.")
                           : _("Vapour cannot expand in %s: %s (%s) is above %s (%s). Lower the first or raise the second."),
                         checker->component->id, name, p_out, before_name, p_in));
      hl_check_offer (checker, finding, key);
      hl_check_offer (checker, finding, above_key);
    }
  *last = out;
}

void
hl_turbine_check (HlChecker *checker)
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
        g_strdup_printf (hl_check_is_water (checker, "inlet")
                           ? _("Water, not steam, reaches %s: at its inlet pressure %s is below boiling. Raise the temperature or lower the pressure.")
                           : _("Liquid, not vapour, reaches %s: at its inlet pressure %s is below boiling. Raise the temperature or lower the pressure."),
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

/* State at the end of the expansion, where a leaving loss sets it apart from the exhaust. */
static gboolean
find_end (const HlProcessSink *sink, int exhaust, HlState *end)
{
  double h;
  return exhaust >= 0 && sink->states[exhaust].has_state && hl_process_own (sink, "expansion_end_h", &h)
         && hl_fluid_state_ph (hl_model_node (sink->model, exhaust)->fluid, sink->states[exhaust].p, h, end) == HL_OK;
}

void
hl_turbine_processes (HlProcessSink *sink)
{
  int n_extractions = hl_component_option (sink->component, "extractions"), from = hl_process_node (sink, "inlet");
  for (int k = 1; k <= n_extractions + 1; k++)
    {
      int to = hl_process_node (sink, outlet_key (n_extractions, k));
      HlState end;
      if (k > n_extractions && find_end (sink, to, &end))
        {
          hl_process_add_to (sink, HL_PROCESS_EXPANSION, from, &end);
          hl_process_add_from (sink, HL_PROCESS_LINE, &end, to);
        }
      else
        hl_process_add (sink, HL_PROCESS_EXPANSION, from, to);
      if (to >= 0)
        from = to;
    }
}

const HlComponentModel hl_turbine_model = { "turbine", hl_turbine_emit, hl_turbine_check, hl_turbine_processes };
