/* Reads files of liquids, those of the library and the user's own, and refuses what cannot be right.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/liquid-private.h"

#include <json-glib/json-glib.h>
#include <math.h>
#include <string.h>

#include "hl-liquid-data.h"

#define RESOURCES "/local/heatloom/liquids/"
#define N_CHECKS 200

static GMutex lock;
static GHashTable *known;              /* id -> HlLiquid, guarded by lock */
static GSList *older;                  /* what a file that was read again replaced, guarded by lock */

static G_GNUC_PRINTF (3, 4) gboolean
refuse (const char *where, GError **error, const char *format, ...)
{
  va_list args;
  va_start (args, format);
  g_autofree char *text = g_strdup_vprintf (format, args);
  va_end (args);
  g_set_error (error, HL_FLUID_ERROR, HL_FLUID_ERROR_FILE, "%s: %s", where, text);
  return FALSE;
}

void
hl_liquid_free (HlLiquid *liquid)
{
  if (liquid == NULL)
    return;
  g_free ((char *) liquid->fluid.id);
  g_free ((char *) liquid->fluid.name);
  g_free ((char *) liquid->fluid.formulation);
  g_free (liquid->source);
  g_free (liquid->note);
  g_free (liquid);
}

static gboolean
is_number (JsonNode *node)
{
  return node != NULL && JSON_NODE_HOLDS_VALUE (node) && (json_node_get_value_type (node) == G_TYPE_DOUBLE || json_node_get_value_type (node) == G_TYPE_INT64)
         && isfinite (json_node_get_double (node));
}

static gboolean
read_text (JsonObject *root, const char *key, gboolean is_needed, const char *where, char **text, GError **error)
{
  JsonNode *node = json_object_get_member (root, key);
  if (node == NULL && !is_needed)
    return TRUE;
  if (node == NULL || !JSON_NODE_HOLDS_VALUE (node) || json_node_get_value_type (node) != G_TYPE_STRING || (is_needed && json_node_get_string (node)[0] == '\0'))
    return refuse (where, error, "\"%s\" is missing or no text", key);
  *text = json_node_dup_string (node);
  return TRUE;
}

static gboolean
read_polynomial (JsonObject *root, const char *key, const char *where, HlPolynomial *polynomial, GError **error)
{
  JsonNode *node = json_object_get_member (root, key);
  if (node == NULL || !JSON_NODE_HOLDS_ARRAY (node))
    return refuse (where, error, "\"%s\" is missing or no list [ ... ]", key);
  JsonArray *array = json_node_get_array (node);
  polynomial->n = json_array_get_length (array);
  if (polynomial->n == 0 || polynomial->n > HL_LIQUID_MAX_TERMS)
    return refuse (where, error, "\"%s\" has %u numbers; 1 to %d are allowed", key, polynomial->n, HL_LIQUID_MAX_TERMS);
  for (guint i = 0; i < polynomial->n; i++)
    {
      JsonNode *element = json_array_get_element (array, i);
      if (!is_number (element))
        return refuse (where, error, "\"%s\"[%u] is no finite number", key, i);
      polynomial->a[i] = json_node_get_double (element);
    }
  return TRUE;
}

static gboolean
read_range (JsonObject *root, const char *where, HlFluidLimits *limits, GError **error)
{
  static const char *const keys[] = { "T_min_K", "T_max_K", "p_max_Pa" };
  double values[3];
  JsonNode *node = json_object_get_member (root, "range");
  if (node == NULL || !JSON_NODE_HOLDS_OBJECT (node))
    return refuse (where, error, "\"range\" is missing or no object { ... }");
  for (gsize i = 0; i < G_N_ELEMENTS (keys); i++)
    {
      JsonNode *number = json_object_get_member (json_node_get_object (node), keys[i]);
      if (!is_number (number) || !(json_node_get_double (number) > 0.0))
        return refuse (where, error, "range.%s is missing or no number above 0", keys[i]);
      values[i] = json_node_get_double (number);
    }
  if (!(values[0] < values[1]))
    return refuse (where, error, "range.T_min_K %g is not below range.T_max_K %g", values[0], values[1]);
  *limits = (HlFluidLimits) {
    .p_min = 0.0, .p_max = values[2], .T_min = values[0], .T_max = values[1],
    .p_critical = NAN, .T_critical = NAN, .v_critical = NAN, .p_triple = NAN, .T_triple = NAN, .molar_mass = NAN,
  };
  return TRUE;
}

static gboolean
check_id (const char *id, const char *where, GError **error)
{
  for (const char *c = id; *c != '\0'; c++)
    if (!(g_ascii_islower (*c) || g_ascii_isdigit (*c) || *c == '-'))
      return refuse (where, error, "id \"%s\" may have small letters, digits and - only", id);
  return TRUE;
}

/* cp of x = (T - 273.15)/100 as a polynomial of T: Horner's rule on polynomials. */
static void
expand_in_T (HlLiquid *liquid)
{
  double *c = liquid->s_of_T;
  memset (c, 0, sizeof liquid->s_of_T);
  for (guint i = liquid->cp.n; i-- > 0;)
    {
      for (guint k = HL_LIQUID_MAX_TERMS - 1; k > 0; k--)
        c[k] = c[k - 1] / 100.0 - c[k] * HL_LIQUID_T0 / 100.0;
      c[0] = -c[0] * HL_LIQUID_T0 / 100.0 + liquid->cp.a[i];
    }
}

/* What physics forbids over the range: no density or heat capacity, a temperature that falls when heated. */
static gboolean
check_values (const HlLiquid *liquid, const char *where, GError **error)
{
  const HlFluidLimits *limits = &liquid->fluid.limits;
  for (int i = 0; i <= N_CHECKS; i++)
    {
      double T = limits->T_min + (limits->T_max - limits->T_min) * i / N_CHECKS, x = (T - HL_LIQUID_T0) / 100.0;
      const struct { const char *what; double value, least, most; } rows[] = {
        { "density", hl_polynomial (&liquid->density, x), 100.0, 25000.0 },
        { "heat capacity", hl_polynomial (&liquid->cp, x), 100.0, 20000.0 },
        { "conductivity", hl_liquid_conductivity (liquid, T), 1e-3, 500.0 },
        { "viscosity", hl_liquid_viscosity (liquid, T), 1e-6, 1e4 },
      };
      HlState state;
      for (gsize k = 0; k < G_N_ELEMENTS (rows); k++)
        if (!(rows[k].value >= rows[k].least && rows[k].value <= rows[k].most))
          return refuse (where, error, "at %g K the %s is %g; a liquid has %g to %g", T, rows[k].what, rows[k].value, rows[k].least, rows[k].most);
      if (hl_liquid_state_pT (&liquid->fluid, limits->p_max, T, &state) != HL_OK || !(state.cp > 0.0))
        return refuse (where, error, "at %g K and the highest pressure the heat capacity is %g; the density bends too much", T, state.cp);
    }
  return TRUE;
}

static void
fill_calls (HlLiquid *liquid)
{
  HlFluid *fluid = &liquid->fluid;
  fluid->data = liquid;
  fluid->state_pT = hl_liquid_state_pT;
  fluid->state_ph = hl_liquid_state_ph;
  fluid->state_ps = hl_liquid_state_ps;
  fluid->state_hs = hl_liquid_state_hs;
  fluid->state_px = hl_liquid_no_state;
  fluid->state_Tx = hl_liquid_no_state;
  fluid->state_dT = hl_liquid_no_state;
  fluid->saturation_p = hl_liquid_no_saturation;
  fluid->saturation_T = hl_liquid_no_saturation;
  fluid->explain_failure = hl_liquid_explain_failure;
}

gboolean
hl_liquid_is_file (const char *text, gssize length)
{
  return g_strstr_len (text, length, "\"heatloom_liquid\"") != NULL;
}

HlLiquid *
hl_liquid_read (const char *text, gssize length, const char *where, GError **error)
{
  g_autoptr (JsonParser) parser = json_parser_new ();
  g_autoptr (GError) why = NULL;
  if (!json_parser_load_from_data (parser, text, length, &why))
    {
      refuse (where, error, "no JSON: %s", why->message);
      return NULL;
    }
  JsonNode *node = json_parser_get_root (parser);
  JsonObject *root = node != NULL && JSON_NODE_HOLDS_OBJECT (node) ? json_node_get_object (node) : NULL;
  if (root == NULL || !is_number (json_object_get_member (root, "heatloom_liquid")) || json_object_get_int_member (root, "heatloom_liquid") != 1)
    {
      refuse (where, error, "\"heatloom_liquid\" is not 1; this program reads version 1 of the form");
      return NULL;
    }
  HlLiquid *liquid = g_new0 (HlLiquid, 1);
  char *id = NULL, *name = NULL, *formulation = NULL;
  gboolean is_good = read_text (root, "id", TRUE, where, &id, error) && check_id (id, where, error) && read_text (root, "name", TRUE, where, &name, error)
                     && read_text (root, "formulation", TRUE, where, &formulation, error) && read_text (root, "source", TRUE, where, &liquid->source, error)
                     && read_text (root, "note", FALSE, where, &liquid->note, error) && read_range (root, where, &liquid->fluid.limits, error)
                     && read_polynomial (root, "density_kg_per_m3", where, &liquid->density, error)
                     && read_polynomial (root, "heat_capacity_J_per_kgK", where, &liquid->cp, error)
                     && read_polynomial (root, "conductivity_W_per_mK", where, &liquid->conductivity, error)
                     && read_polynomial (root, "ln_viscosity_Pas", where, &liquid->ln_viscosity, error);
  liquid->fluid.id = id;
  liquid->fluid.name = name;
  liquid->fluid.formulation = formulation;
  fill_calls (liquid);
  expand_in_T (liquid);
  if (is_good && check_values (liquid, where, error))
    return liquid;
  hl_liquid_free (liquid);
  return NULL;
}

static GBytes *
carried (const char *id)
{
  g_autofree char *path = g_strconcat (RESOURCES, id, ".json", NULL);
  return g_resource_lookup_data (hl_liquid_data_get_resource (), path, G_RESOURCE_LOOKUP_FLAGS_NONE, NULL);
}

const HlFluid *
hl_liquid_lookup (const char *id)
{
  g_autoptr (GError) error = NULL;
  g_mutex_lock (&lock);
  HlLiquid *liquid = known != NULL ? g_hash_table_lookup (known, id) : NULL;
  g_autoptr (GBytes) bytes = liquid == NULL ? carried (id) : NULL;
  if (bytes != NULL)
    {
      gsize size;
      const char *text = g_bytes_get_data (bytes, &size);
      if ((liquid = hl_liquid_read (text, (gssize) size, id, &error)) == NULL)
        g_error ("%s", error->message);      /* it is compiled in: the build is broken */
      if (known == NULL)
        known = g_hash_table_new (g_str_hash, g_str_equal);
      g_hash_table_insert (known, (gpointer) liquid->fluid.id, liquid);
    }
  g_mutex_unlock (&lock);
  return liquid != NULL ? &liquid->fluid : NULL;
}

const HlFluid *
hl_liquid_keep (HlLiquid *liquid, const char *where, GError **error)
{
  g_autoptr (GBytes) ours = carried (liquid->fluid.id);
  if (ours != NULL)
    {
      refuse (where, error, "id \"%s\" belongs to a medium of the program; choose another id", liquid->fluid.id);
      hl_liquid_free (liquid);
      return NULL;
    }
  /* What is read again leaves the older one to those who hold it. */
  g_mutex_lock (&lock);
  if (known == NULL)
    known = g_hash_table_new (g_str_hash, g_str_equal);
  HlLiquid *replaced = g_hash_table_lookup (known, liquid->fluid.id);
  if (replaced != NULL)
    older = g_slist_prepend (older, replaced);
  g_hash_table_replace (known, (gpointer) liquid->fluid.id, liquid);
  g_mutex_unlock (&lock);
  return &liquid->fluid;
}

static gint
compare_ids (gconstpointer a, gconstpointer b)
{
  return strcmp (*(const char *const *) a, *(const char *const *) b);
}

void
hl_liquid_list (GPtrArray *ids)
{
  g_autoptr (GPtrArray) own = g_ptr_array_new ();
  g_auto (GStrv) files = g_resource_enumerate_children (hl_liquid_data_get_resource (), RESOURCES, G_RESOURCE_LOOKUP_FLAGS_NONE, NULL);
  for (guint i = 0; files != NULL && files[i] != NULL; i++)
    g_ptr_array_add (own, g_strndup (files[i], strlen (files[i]) - strlen (".json")));
  g_mutex_lock (&lock);
  if (known != NULL)
    {
      GHashTableIter iter;
      gpointer key;
      g_hash_table_iter_init (&iter, known);
      while (g_hash_table_iter_next (&iter, &key, NULL))
        {
          g_autoptr (GBytes) ours = carried (key);
          if (ours == NULL)
            g_ptr_array_add (own, g_strdup (key));
        }
    }
  g_mutex_unlock (&lock);
  g_ptr_array_sort (own, compare_ids);
  for (guint i = 0; i < own->len; i++)
    g_ptr_array_add (ids, own->pdata[i]);
}

/**
 * hl_fluid_is_liquid:
 * @fluid: a fluid
 *
 * Returns: TRUE for a liquid by polynomials, which has no vapour
 */
gboolean
hl_fluid_is_liquid (const HlFluid *fluid)
{
  return fluid->state_pT == hl_liquid_state_pT;
}
