/* What is wrong with a solution, or unwise about it: laws first, then practice.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/checks.h"
#include "engine/components/components.h"
#include "engine/practice.h"
#include "plant/i18n.h"
#include <math.h>
#include <string.h>

const HlNodeResult *
hl_check_port (const HlChecker *checker, const char *port)
{
  int node = hl_model_port_node (checker->model, checker->index, port);
  return node >= 0 ? &checker->states[node] : NULL;
}

const HlFluid *
hl_check_fluid (const HlChecker *checker, const char *port)
{
  int node = hl_model_port_node (checker->model, checker->index, port);
  return node >= 0 ? hl_model_node (checker->model, node)->fluid : checker->model->water;
}

gboolean
hl_check_is_water (const HlChecker *checker, const char *port)
{
  const HlFluid *fluid = hl_check_fluid (checker, port);
  return fluid == hl_fluid_water () || g_str_equal (hl_fluid_id (fluid), "water-95");
}

gboolean
hl_check_own (const HlChecker *checker, const char *key, double *value)
{
  int var = hl_model_own_var (checker->model, checker->index, key);
  if (var < 0 || !checker->is_known[checker->model->system->root[var]])
    return FALSE;
  *value = hl_system_value (checker->model->system, var);
  return TRUE;
}

char *
hl_check_text (const HlChecker *checker, HlDimension dimension, double value)
{
  return hl_units_format (value, dimension, hl_plant_units (checker->model->plant));
}

HlFinding *
hl_check_add (HlChecker *checker, HlGrade grade, const char *code, const char *key, char *text)
{
  return hl_findings_add (checker->findings, grade, code, hl_address_component (checker->component->id, g_intern_string (key)), text);
}

void
hl_check_offer (HlChecker *checker, HlFinding *finding, const char *key)
{
  HlAddress address = hl_address_component (checker->component->id, g_intern_string (key));
  if (hl_component_quantity_kind (checker->component, address.key) == NULL)
    return;
  g_autofree char *name = hl_plant_describe (checker->model->plant, &address);
  hl_finding_mend (finding, HL_MEND_EDIT, address, NAN, g_strdup_printf (_("Change %s"), name));
}

/* By the same balance that exergy is counted with: flows and heat with their entropy, friction left out. */
void
hl_check_entropy (HlChecker *checker)
{
  const HlModel *model = checker->model;
  double produced = checker->exergy->results[checker->index].produced, flow = 0.0;
  for (int k = model->first_port[checker->index]; k < model->first_port[checker->index + 1]; k++)
    {
      const HlNodeResult *node = &checker->states[g_array_index (model->ports, HlPortNode, k).node];
      if (!node->has_flow || !node->has_state || node->m < -1e-9 * model->system->flow_scale)
        return;
      flow = fmax (flow, node->m);
    }
  if (!(produced < -1e-3 * flow && flow > 1e-6 * model->system->flow_scale))
    return;
  for (guint k = 0; k < checker->findings->list->len; k++)
    {
      const HlFinding *finding = &g_array_index (checker->findings->list, HlFinding, k);
      if (finding->grade == HL_GRADE_ERROR && finding->at.id == checker->component->id)
        return;
    }
  hl_check_add (checker, HL_GRADE_ERROR, "entropy-destroyed", "",
    g_strdup_printf (_("%s would destroy entropy, %.3f kW/K: against the second law. Check its efficiency, and the pressures and temperatures around it."),
                     checker->component->id, -produced / 1e3));
}

/* For what lies in a line: pressure may not rise from inlet to outlet. */
void
hl_check_pressure_falls (HlChecker *checker)
{
  const HlNodeResult *in = hl_check_port (checker, "inlet"), *out = hl_check_port (checker, "outlet");
  if (in == NULL || out == NULL || !in->has_pressure || !out->has_pressure || out->p <= in->p * (1.0 + 1e-9))
    return;
  g_autofree char *p_in = hl_check_text (checker, HL_DIMENSION_PRESSURE, in->p);
  g_autofree char *p_out = hl_check_text (checker, HL_DIMENSION_PRESSURE, out->p);
  HlFinding *finding = hl_check_add (checker, HL_GRADE_ERROR, "pressure-rises", "outlet.p",
    g_strdup_printf (_("Pressure would rise through %s, from %s to %s. Lower the pressure behind it, or raise the one before it."),
                     checker->component->id, p_in, p_out));
  hl_check_offer (checker, finding, "outlet.p");
  hl_check_offer (checker, finding, "inlet.p");
}

/* --- flows ---------------------------------------------------------------------- */

static void
check_flows (HlChecker *checker)
{
  const HlModel *model = checker->model;
  HlPlant *plant = model->plant;
  double least = 1e-9 * model->system->flow_scale;
  g_autofree gboolean *said = g_new0 (gboolean, model->system->vars->len + 1);
  for (guint i = 0; i < hl_plant_n_streams (plant); i++)
    {
      const HlNodeResult *node = &checker->states[i];
      int root = model->system->root[hl_model_node (model, (int) i)->m];
      if (!node->has_flow || node->m >= -least || said[root])
        continue;
      said[root] = TRUE;
      const HlStream *stream = hl_plant_stream (plant, i);
      g_autofree char *m = hl_check_text (checker, HL_DIMENSION_MASS_FLOW, node->m);
      hl_findings_add (checker->findings, HL_GRADE_ERROR, "negative-flow", hl_address_stream (stream->id, g_intern_static_string ("m")),
        g_strdup_printf (_("Stream %s from %s to %s would flow backwards: %s. The values around it ask for the impossible."), stream->id, stream->from_id, stream->to_id, m));
    }
}

/* A set of values that only says how things relate is met by a plant in which nothing flows. */
static void
check_anything_flows (HlChecker *checker)
{
  const HlModel *model = checker->model;
  guint n = hl_plant_n_streams (model->plant);
  double largest = 0.0;
  for (guint i = 0; i < n; i++)
    largest = fmax (largest, fabs (checker->states[i].m));
  if (n == 0 || largest > 1e-9 * model->system->flow_scale)
    return;
  HlFinding *finding = hl_findings_add (checker->findings, HL_GRADE_ERROR, "nothing-flows", hl_address_plant (g_intern_static_string ("net_power")),
    g_strdup (_("Nothing flows: the values given say how flows and powers relate, but not how large they are. Give the net power or a flow.")));
  HlAddress net = hl_address_plant (g_intern_static_string ("net_power"));
  hl_finding_mend (finding, HL_MEND_EDIT, net, NAN, g_strdup (_("Enter net power of the plant")));
}

/* No component but a machine raises a pressure: a loss that had to be found may not come out negative. */
static void
check_losses (HlChecker *checker)
{
  const HlComponent *component = checker->component;
  for (guint k = 0; k < checker->findings->list->len; k++)
    {
      const HlFinding *finding = &g_array_index (checker->findings->list, HlFinding, k);
      if (finding->at.id == component->id && g_str_equal (finding->code, "pressure-rises"))
        return;
    }
  const HlModel *model = checker->model;
  for (int k = model->first_own[checker->index]; k < model->first_own[checker->index + 1]; k++)
    {
      const char *key = g_array_index (model->own, HlOwn, k).key;
      double loss;
      if (strstr (key, "pressure_loss") == NULL || !hl_check_own (checker, key, &loss) || loss >= -1e-9)
        continue;
      const HlQuantityKind *kind = hl_component_quantity_kind (component, key);
      if (kind == NULL)
        continue;
      HlAddress address = hl_address_component (component->id, g_intern_string (key));
      g_autofree char *name = hl_plant_describe (checker->model->plant, &address);
      g_autofree char *text = hl_quantity_format (kind, loss, hl_plant_units (checker->model->plant));
      HlFinding *finding = hl_check_add (checker, HL_GRADE_ERROR, "pressure-rises", key,
        g_strdup_printf (_("Pressure would rise through %s: %s comes out as %s. Lower the pressure behind it, or raise the one before it."),
                         component->id, name, text));
      hl_check_offer (checker, finding, key);
    }
}

/* Value of a quantity that nobody typed, known and not told about under another name; FALSE otherwise. */
static gboolean
found_value (const HlChecker *checker, const HlAddress *address, gboolean *said, double *value)
{
  const HlSystem *system = checker->model->system;
  int var = checker->is_complete ? hl_model_find_var (checker->model, address) : -1;
  if (var < 0 || !checker->is_known[system->root[var]] || said[system->root[var]])
    return FALSE;
  for (guint k = 0; k < checker->findings->list->len; k++)
    if (hl_address_equal (&g_array_index (checker->findings->list, HlFinding, k).at, address))
      return FALSE;
  *value = hl_system_value (system, var);
  return TRUE;
}

/* Usual pressures and temperatures are those of water: of other media they say nothing. */
static gboolean
range_holds (const HlChecker *checker, const HlQuantity *quantity)
{
  const char *dot = strchr (quantity->key, '.');
  if (dot == NULL || (quantity->kind->dimension != HL_DIMENSION_PRESSURE && quantity->kind->dimension != HL_DIMENSION_TEMPERATURE))
    return TRUE;
  g_autofree char *port = g_strndup (quantity->key, (gsize) (dot - quantity->key));
  return hl_model_port_node (checker->model, checker->index, port) < 0 || hl_check_is_water (checker, port);
}

/* A value outside the range of its kind's table is worth a hint, whether typed or found. */
static void
check_credible (HlChecker *checker, gboolean *said)
{
  const HlComponent *component = checker->component;
  HlUnitSet units = hl_plant_units (checker->model->plant);
  for (guint k = 0; k < hl_component_n_quantities (component); k++)
    {
      HlQuantity quantity = hl_component_quantity (component, k);
      const HlQuantityKind *kind = quantity.kind;
      const HlValue *typed = hl_values_find (&component->values, quantity.key);
      HlAddress address = hl_address_component (component->id, quantity.key);
      gboolean is_given = typed != NULL && typed->origin == HL_ORIGIN_GIVEN;
      double value = is_given ? typed->value : NAN;
      if ((isnan (kind->credible_low) && isnan (kind->credible_high)) || !range_holds (checker, &quantity) || (typed != NULL && typed->origin == HL_ORIGIN_ASSUMED)
          || (!is_given && !found_value (checker, &address, said, &value)) || !(value < kind->credible_low || value > kind->credible_high))
        continue;
      int var = hl_model_find_var (checker->model, &address);
      if (var >= 0)
        said[checker->model->system->root[var]] = TRUE;
      g_autofree char *name = hl_plant_describe (checker->model->plant, &address);
      g_autofree char *text = hl_quantity_format (kind, value, units), *low = hl_quantity_format (kind, kind->credible_low, units);
      g_autofree char *high = hl_quantity_format (kind, kind->credible_high, units);
      HlFinding *finding = hl_check_add (checker, HL_GRADE_HINT, "unusual-value", quantity.key,
        g_strdup_printf (is_given ? _("Unusual value: %s is %s; common are %s to %s.") : _("Unusual value: %s comes out as %s; common are %s to %s."), name, text, low, high));
      hl_check_offer (checker, finding, quantity.key);
    }
}

/* What is unwise is said with the source of the limit. */
static void
name_sources (HlChecker *checker)
{
  for (guint k = 0; k < checker->findings->list->len; k++)
    {
      HlFinding *finding = &g_array_index (checker->findings->list, HlFinding, k);
      if (finding->grade != HL_GRADE_ERROR && finding->source == NULL)
        finding->source = hl_practice_source (finding->code);
    }
}

/* Pressure and enthalpy may come out as numbers that are no state of the medium. */
static void
check_range (HlChecker *checker)
{
  const HlModel *model = checker->model;
  for (guint i = 0; i < hl_plant_n_streams (model->plant); i++)
    {
      const HlNode *node = hl_model_node (model, (int) i);
      const HlNodeResult *state = &checker->states[i];
      if (state->has_state || !state->has_pressure || !checker->is_known[model->system->root[node->h]])
        continue;
      const HlStream *stream = hl_plant_stream (model->plant, i);
      HlAddress at = hl_address_stream (stream->id, g_intern_static_string ("h"));
      g_autofree char *why = hl_fluid_explain_failure (node->fluid, HL_OUTSIDE_RANGE, "ph", state->p, hl_system_value (model->system, node->h));
      g_autofree char *name = hl_plant_describe (model->plant, &at);
      hl_findings_add (checker->findings, HL_GRADE_ERROR, "outside-range", at,
        g_strdup_printf (_("%s: a state lies outside the range of the property formulation: %s. Look at %s."), stream->from_id, why, name));
      return;
    }
}

void
hl_check_all (HlChecker *checker)
{
  g_autofree gboolean *said = g_new0 (gboolean, checker->model->system->vars->len + 1);
  for (guint c = 0; c < hl_plant_n_components (checker->model->plant); c++)
    {
      checker->index = (int) c;
      checker->component = hl_plant_component (checker->model->plant, c);
      const HlComponentModel *model = hl_component_model (checker->component->kind);
      if (model != NULL && model->check != NULL)
        model->check (checker);
      hl_check_entropy (checker);
      check_losses (checker);
      check_credible (checker, said);
    }
  checker->component = NULL;
  if (checker->is_complete)
    check_range (checker);
  /* Where something graver is known, flows run backwards because of it. */
  if (checker->is_complete && !hl_findings_have (checker->findings, HL_GRADE_ERROR))
    {
      check_flows (checker);
      check_anything_flows (checker);
    }
  if (checker->is_complete && !hl_findings_have (checker->findings, HL_GRADE_ERROR))
    hl_check_practice (checker);
  checker->component = NULL;
  name_sources (checker);
}
