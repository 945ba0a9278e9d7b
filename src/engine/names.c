/* Words and numbers for variables and equations, for findings and explanations.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/names.h"
#include "plant/i18n.h"
#include <math.h>
#include <stdlib.h>
#include <string.h>

/* Sums that no address reaches. */
static const struct { const char *key, *name; } hidden[] = {
  { "turbine_power", N_("shaft power of the turbines") },
  { "pump_power", N_("shaft power of the pumps") },
  { "motor_power", N_("power of motors and fans") },
  { "shaft_power_net", N_("shaft power of turbines less pumps") },
  { "live_steam", N_("live steam flow") },
  { "fuel_heat_hhv", N_("fuel heat (HHV)") },
  { "partial_sum", N_("partial sum") },
  { "useful", N_("net power and heat delivered") },
  { "moisture_flow", N_("moisture of the steam as a flow") },
  { "ambient_T", N_("air temperature of the site") },
  { "wet_bulb_T", N_("wet bulb temperature of the site") },
  { "water_outlet_p", N_("outlet pressure of the water") },
  { "water_inlet_h", N_("inlet enthalpy of the water") },
  { "water_outlet_h", N_("outlet enthalpy of the water") },
  { "group_flow", N_("flow through group") },
  { "vent_h", N_("enthalpy of the vent steam") },
  { "saturation_T", N_("saturation temperature") },
};

/* Does the kind's table list this state at this port? */
static gboolean
is_listed (const HlModel *model, int component, const char *port, const char *letter, HlAddress *address)
{
  char key[128];
  if (component < 0)
    return FALSE;
  const HlComponent *c = hl_plant_component (model->plant, (guint) component);
  g_snprintf (key, sizeof key, "%s.%s", port, letter);
  for (guint n = 0; n < hl_component_n_quantities (c); n++)
    {
      HlQuantity quantity = hl_component_quantity (c, n);
      if (g_str_equal (quantity.key, key))
        {
          *address = hl_address_component (c->id, quantity.key);
          return TRUE;
        }
    }
  return FALSE;
}

HlAddress
hl_name_address (const HlModel *model, int var)
{
  HlAddress address = hl_system_var (model->system, var)->address, better;
  address.key = g_intern_string (address.key);
  if (address.owner != HL_OWNER_STREAM)
    return address;
  int stream = hl_plant_stream_index (model->plant, address.id);
  if (stream < 0)
    return address;
  const HlNode *node = hl_model_node (model, stream);
  if (is_listed (model, node->component, node->port, address.key, &better)
      || is_listed (model, node->to_component, node->to_port, address.key, &better))
    return better;
  return address;
}

char *
hl_name_var (const HlModel *model, int var)
{
  HlAddress address = hl_name_address (model, var);
  if (hl_plant_quantity_kind (model->plant, &address) != NULL)
    return hl_plant_describe (model->plant, &address);
  for (guint k = 0; k < G_N_ELEMENTS (hidden); k++)
    {
      gsize length = strlen (hidden[k].key);
      if (strncmp (address.key, hidden[k].key, length) != 0 || strspn (address.key + length, "0123456789") != strlen (address.key + length))
        continue;
      /* Of several alike each has its number. */
      g_autofree char *name = address.key[length] != '\0' ? g_strdup_printf ("%s %s", _(hidden[k].name), address.key + length) : g_strdup (_(hidden[k].name));
      return address.owner == HL_OWNER_PLANT ? g_steal_pointer (&name) : g_strdup_printf (_("%s of %s"), name, address.id);
    }
  return hl_plant_describe (model->plant, &address);
}

HlDimension
hl_name_dimension (HlVarKind kind)
{
  switch (kind)
    {
    case HL_VAR_FLOW: return HL_DIMENSION_MASS_FLOW;
    case HL_VAR_PRESSURE: return HL_DIMENSION_PRESSURE;
    case HL_VAR_ENTHALPY: return HL_DIMENSION_ENTHALPY;
    case HL_VAR_TEMPERATURE: return HL_DIMENSION_TEMPERATURE;
    case HL_VAR_TEMPERATURE_DIFFERENCE: return HL_DIMENSION_TEMPERATURE_DIFFERENCE;
    case HL_VAR_ENTROPY: return HL_DIMENSION_ENTROPY;
    case HL_VAR_VOLUME: return HL_DIMENSION_VOLUME;
    case HL_VAR_RATIO: return HL_DIMENSION_RATIO;
    case HL_VAR_POWER: return HL_DIMENSION_POWER;
    case HL_VAR_CONDUCTANCE: return HL_DIMENSION_CONDUCTANCE;
    case HL_VAR_PRESSURE_DIFFERENCE: return HL_DIMENSION_PRESSURE_DIFFERENCE;
    case HL_VAR_HEAT_RATE: return HL_DIMENSION_HEAT_RATE;
    case HL_VAR_STEAM_RATE: return HL_DIMENSION_STEAM_RATE;
    case HL_VAR_LENGTH: return HL_DIMENSION_LENGTH;
    case HL_VAR_AREA: return HL_DIMENSION_AREA;
    case HL_VAR_APERTURE: return HL_DIMENSION_APERTURE;
    case HL_VAR_IRRADIANCE: return HL_DIMENSION_IRRADIANCE;
    }
  return HL_DIMENSION_RATIO;
}

char *
hl_name_value (const HlModel *model, int var)
{
  HlAddress address = hl_name_address (model, var);
  const HlQuantityKind *kind = hl_plant_quantity_kind (model->plant, &address);
  double value = hl_system_value (model->system, var);
  HlUnitSet units = hl_plant_units (model->plant);
  return kind != NULL ? hl_quantity_format (kind, value, units)
                      : hl_units_format (value, hl_name_dimension (hl_system_var (model->system, var)->kind), units);
}

static char *
word (const HlModel *model, const HlEquation *e, int k, gboolean with_numbers)
{
  int raw = g_array_index (model->system->raw, int, e->first + k);
  return with_numbers ? hl_name_value (model, raw) : hl_name_var (model, raw);
}

/* {k} stands for variable k. */
static char *
fill_in (const HlModel *model, const HlEquation *e, const char *pattern, gboolean with_numbers)
{
  GString *out = g_string_new (NULL);
  for (const char *at = pattern; *at != '\0'; at++)
    {
      char *end;
      long k = *at == '{' ? strtol (at + 1, &end, 10) : -1;
      if (k < 0 || k >= e->n || *end != '}')
        {
          g_string_append_c (out, *at);
          continue;
        }
      g_autofree char *text = word (model, e, (int) k, with_numbers);
      g_string_append (out, text);
      at = end;
    }
  return g_string_free (out, FALSE);
}

static void
add_term (GString *side, double factor, const char *text)
{
  if (side->len > 0)
    g_string_append (side, " + ");
  if (fabs (fabs (factor) - 1.0) > 0.0)
    g_string_append_printf (side, "%.17g × ", fabs (factor));
  g_string_append (side, text);
}

/* Terms with a plus on the left, those with a minus on the right. */
static char *
template_of_terms (const HlModel *model, const HlEquation *e)
{
  const double *a = &g_array_index (model->system->constants, double, e->first_constant);
  gboolean is_energy = hl_equation_is_energy (e);
  int n_pairs = is_energy ? (int) a[0] : 0;
  const double *signs = a + 1, *factors = is_energy ? a + 1 + n_pairs : a;
  GString *left = g_string_new (NULL), *right = g_string_new (NULL);
  for (int k = 0; k < n_pairs; k++)
    {
      g_autofree char *text = g_strdup_printf ("{%d} × {%d}", 2 * k, 2 * k + 1);
      add_term (signs[k] > 0.0 ? left : right, signs[k], text);
    }
  for (int k = 2 * n_pairs; k < e->n; k++)
    {
      g_autofree char *text = g_strdup_printf ("{%d}", k);
      double factor = factors[k - 2 * n_pairs];
      if (fabs (factor) > 0.0)
        add_term (factor > 0.0 ? left : right, factor, text);
    }
  char *text = g_strdup_printf ("%s = %s", left->len > 0 ? left->str : "0", right->len > 0 ? right->str : "0");
  g_string_free (left, TRUE);
  g_string_free (right, TRUE);
  return text;
}

char *
hl_name_template (const HlModel *model, int equation, gboolean in_si)
{
  const HlEquation *e = hl_system_equation (model->system, equation);
  if (e->says != NULL)
    return g_strdup (in_si ? e->says : _(e->says));
  if (hl_equation_is_tie (e))
    {
      g_autofree char *formula = hl_tie_formula (e->tie, in_si, hl_plant_units (model->plant));
      return g_strdup_printf ("{0} = %s", formula);
    }
  if (hl_equation_is_energy (e) || hl_equation_is_linear (e))
    return template_of_terms (model, e);
  double value = hl_var_to_si (e->kind, g_array_index (model->system->constants, double, e->first_constant));
  if (in_si)
    return g_strdup_printf ("{0} = %.17g", value);
  g_autofree char *text = hl_units_format (value, hl_name_dimension (e->kind), hl_plant_units (model->plant));
  return g_strdup_printf ("{0} = %s", text);
}

char *
hl_name_equation (const HlModel *model, int equation, gboolean with_numbers)
{
  const HlEquation *e = hl_system_equation (model->system, equation);
  g_autofree char *pattern = hl_name_template (model, equation, FALSE);
  return fill_in (model, e, pattern, with_numbers && (e->says != NULL || e->n > 1));
}

char *
hl_name_list (char *const *names, guint n, gboolean is_choice)
{
  GString *text = g_string_new (n > 0 ? names[0] : "");
  for (guint k = 1; k < n; k++)
    {
      g_string_append (text, k + 1 < n ? ", " : is_choice ? _(" or ") : _(" and "));
      g_string_append (text, names[k]);
    }
  return g_string_free (text, FALSE);
}

char *
hl_name_components (const HlModel *model, const int *equations, int n)
{
  g_autoptr (GPtrArray) ids = g_ptr_array_new ();
  for (int k = 0; k < n; k++)
    {
      int c = hl_system_equation (model->system, equations[k])->component;
      if (c < 0)
        continue;
      const char *id = hl_plant_component (model->plant, (guint) c)->id;
      if (!g_ptr_array_find (ids, id, NULL))
        g_ptr_array_add (ids, (gpointer) id);
    }
  if (ids->len == 0)
    return g_strdup (_("the plant"));
  if (ids->len > 5)
    g_ptr_array_set_size (ids, 5);
  return hl_name_list ((char **) ids->pdata, ids->len, FALSE);
}
