/* Reads a coefficient file (JSON) into the form that is evaluated, and refuses what cannot be right.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/helmholtz-private.h"

#include <json-glib/json-glib.h>
#include <math.h>
#include <string.h>

#define MAX_LENGTH (1024 * 1024)

/* Where in the file the reader is, for messages: "fluid.json: residual[1]". */
typedef struct {
  const char *where;
  GError    **error;
} Reader;

static gboolean G_GNUC_PRINTF (2, 3)
refuse (Reader *reader, const char *format, ...)
{
  va_list args;
  va_start (args, format);
  g_autofree char *text = g_strdup_vprintf (format, args);
  va_end (args);
  if (reader->error == NULL || *reader->error == NULL)
    g_set_error (reader->error, HL_FLUID_ERROR, HL_FLUID_ERROR_FILE, "%s: %s", reader->where, text);
  return FALSE;
}

static JsonNode *
member (JsonObject *object, const char *key)
{
  JsonNode *node = json_object_get_member (object, key);
  return node != NULL && !JSON_NODE_HOLDS_NULL (node) ? node : NULL;
}

static gboolean
is_number (JsonNode *node)
{
  if (node == NULL || !JSON_NODE_HOLDS_VALUE (node))
    return FALSE;
  GType type = json_node_get_value_type (node);
  return type == G_TYPE_DOUBLE || type == G_TYPE_INT64;
}

static gboolean
read_number (Reader *reader, JsonObject *object, const char *path, const char *key, double above, double *value)
{
  JsonNode *node = member (object, key);
  if (!is_number (node))
    return refuse (reader, "%s%s is missing or no number", path, key);
  *value = json_node_get_double (node);
  if (!(*value > above && isfinite (*value)))
    return refuse (reader, "%s%s is %g; it must be a finite number above %g", path, key, *value, above);
  return TRUE;
}

static gboolean
read_any_number (Reader *reader, JsonObject *object, const char *path, const char *key, double *value)
{
  return read_number (reader, object, path, key, -G_MAXDOUBLE, value);
}

static gboolean
read_text (Reader *reader, JsonObject *object, const char *key, gboolean is_needed, char **text)
{
  JsonNode *node = member (object, key);
  if (node == NULL && !is_needed)
    return TRUE;
  if (node == NULL || !JSON_NODE_HOLDS_VALUE (node) || json_node_get_value_type (node) != G_TYPE_STRING
      || json_node_get_string (node)[0] == '\0')
    return refuse (reader, "\"%s\" is missing or no text", key);
  g_free (*text);
  *text = json_node_dup_string (node);
  return TRUE;
}

static JsonObject *
read_object (Reader *reader, JsonObject *object, const char *key)
{
  JsonNode *node = member (object, key);
  if (node != NULL && JSON_NODE_HOLDS_OBJECT (node))
    return json_node_get_object (node);
  refuse (reader, "\"%s\" is missing or no object { ... }", key);
  return NULL;
}

static JsonArray *
read_array (Reader *reader, JsonObject *object, const char *path, const char *key)
{
  JsonNode *node = member (object, key);
  if (node != NULL && JSON_NODE_HOLDS_ARRAY (node))
    return json_node_get_array (node);
  refuse (reader, "%s\"%s\" is missing or no list [ ... ]", path, key);
  return NULL;
}

/* Columns of equal length into rows of doubles: rows[i * n_columns + c]. */
static gboolean
read_columns (Reader *reader, JsonObject *object, const char *path, const char *const *keys, guint n_columns, double **rows, guint *n_rows)
{
  g_autofree double *values = NULL;
  guint n = 0;
  for (guint c = 0; c < n_columns; c++)
    {
      JsonArray *array = read_array (reader, object, path, keys[c]);
      if (array == NULL)
        return FALSE;
      guint length = json_array_get_length (array);
      if (c == 0)
        {
          n = length;
          if (n == 0 || n > HL_HELMHOLTZ_MAX_TERMS)
            return refuse (reader, "%s\"%s\" has %u numbers; 1 to %d are allowed", path, keys[c], n, HL_HELMHOLTZ_MAX_TERMS);
          values = g_new0 (double, n * n_columns);
        }
      if (length != n)
        return refuse (reader, "%s\"%s\" has %u numbers but \"%s\" has %u; each term needs one of both", path, keys[c], length, keys[0], n);
      for (guint i = 0; i < n; i++)
        {
          JsonNode *node = json_array_get_element (array, i);
          double value = is_number (node) ? json_node_get_double (node) : NAN;
          if (!isfinite (value))
            return refuse (reader, "%s\"%s\"[%u] is no finite number", path, keys[c], i);
          values[i * n_columns + c] = value;
        }
    }
  *rows = g_steal_pointer (&values);
  *n_rows = n;
  return TRUE;
}

/* Appends rows of doubles to an array of records that are nothing but doubles. */
static gboolean
append_rows (Reader *reader, const char *path, gpointer *records, guint *n_records, const double *rows, guint n_rows, guint n_columns)
{
  if (*n_records + n_rows > HL_HELMHOLTZ_MAX_TERMS)
    return refuse (reader, "%smore than %d terms of one kind", path, HL_HELMHOLTZ_MAX_TERMS);
  double *all = g_renew (double, *records, (*n_records + n_rows) * n_columns);
  memcpy (all + *n_records * n_columns, rows, n_rows * n_columns * sizeof (double));
  *records = all;
  *n_records += n_rows;
  return TRUE;
}

static gboolean
read_rows (Reader *reader, JsonObject *object, const char *path, const char *const *keys, guint n_columns, gpointer *records, guint *n_records)
{
  g_autofree double *rows = NULL;
  guint n = 0;
  return read_columns (reader, object, path, keys, n_columns, &rows, &n)
         && append_rows (reader, path, records, n_records, rows, n, n_columns);
}

static gboolean
read_power (Reader *reader, JsonObject *object, const char *path, HlHelmholtz *eq)
{
  static const char *const keys[] = { "n", "d", "t", "l" };
  g_autofree double *rows = NULL;
  guint n = 0;
  HlPowerTerms *power = &eq->power;
  if (!read_columns (reader, object, path, keys, 4, &rows, &n))
    return FALSE;
  if (power->n_terms + n > HL_HELMHOLTZ_MAX_TERMS)
    return refuse (reader, "%smore than %d terms of one kind", path, HL_HELMHOLTZ_MAX_TERMS);
  power->n = g_renew (double, power->n, power->n_terms + n);
  power->d = g_renew (double, power->d, power->n_terms + n);
  power->t = g_renew (double, power->t, power->n_terms + n);
  power->l = g_renew (guint8, power->l, power->n_terms + n);
  for (guint i = 0; i < n; i++)
    {
      const double *row = rows + 4 * i;
      if (!(row[3] >= 0.0 && row[3] <= HL_HELMHOLTZ_MAX_POWER && row[3] - floor (row[3]) <= 0.0))
        return refuse (reader, "%s\"l\"[%u] is %g; kind \"power\" takes whole numbers from 0 to %d, others belong to kind \"exponential\"",
                       path, i, row[3], HL_HELMHOLTZ_MAX_POWER);
      guint at = power->n_terms + i;
      power->n[at] = row[0];
      power->d[at] = row[1];
      power->t[at] = row[2];
      power->l[at] = (guint8) row[3];
      eq->power_l_max = MAX (eq->power_l_max, power->l[at]);
    }
  power->n_terms += n;
  return TRUE;
}

/* n, d, t, g, l of delta, and the tau part if there is one. */
static gboolean
read_exponential (Reader *reader, JsonObject *object, const char *path, gboolean is_double, HlHelmholtz *eq)
{
  static const char *const single[] = { "n", "d", "t", "g", "l" }, *const both[] = { "n", "d", "t", "l", "m" };
  g_autofree double *rows = NULL;
  guint n = 0;
  if (!read_columns (reader, object, path, is_double ? both : single, 5, &rows, &n))
    return FALSE;
  for (guint i = 0; i < n; i++)
    {
      const double *row = rows + 5 * i;
      HlExponentialTerm term = { row[0], row[1], row[2], row[3], row[4], 0.0, 0.0 };
      if (is_double)
        term = (HlExponentialTerm) { row[0], row[1], row[2], row[3] != 0.0, row[3], row[4] != 0.0, row[4] };
      if (!append_rows (reader, path, (gpointer *) &eq->exponential, &eq->n_exponential, (const double *) &term, 1, 7))
        return FALSE;
    }
  return TRUE;
}

static gboolean
read_residual_term (Reader *reader, JsonObject *object, const char *kind, const char *path, HlHelmholtz *eq)
{
  static const char *const gaussian[] = { "n", "d", "t", "eta", "epsilon", "beta", "gamma" };
  static const char *const gao[] = { "n", "d", "t", "eta", "epsilon", "beta", "gamma", "b" };
  static const char *const non_analytic[] = { "n", "a", "b", "beta", "A", "B", "C", "D" };
  if (strcmp (kind, "power") == 0)
    return read_power (reader, object, path, eq);
  if (strcmp (kind, "exponential") == 0)
    return read_exponential (reader, object, path, FALSE, eq);
  if (strcmp (kind, "double_exponential") == 0)
    return read_exponential (reader, object, path, TRUE, eq);
  if (strcmp (kind, "gaussian") == 0)
    return read_rows (reader, object, path, gaussian, 7, (gpointer *) &eq->gaussian, &eq->n_gaussian);
  if (strcmp (kind, "gao_b") == 0)
    return read_rows (reader, object, path, gao, 8, (gpointer *) &eq->gao, &eq->n_gao);
  if (strcmp (kind, "non_analytic") == 0)
    return read_rows (reader, object, path, non_analytic, 8, (gpointer *) &eq->non_analytic, &eq->n_non_analytic);
  return refuse (reader, "%sunknown kind \"%s\"; known are power, exponential, double_exponential, gaussian, gao_b, non_analytic", path, kind);
}

static gboolean
read_planck (Reader *reader, JsonObject *object, const char *path, gboolean is_general, HlHelmholtz *eq)
{
  static const char *const keys[] = { "n", "t", "c", "d" };
  g_autofree double *rows = NULL;
  guint n = 0, n_columns = is_general ? 4 : 2;
  if (!read_columns (reader, object, path, keys, n_columns, &rows, &n))
    return FALSE;
  for (guint i = 0; i < n; i++)
    {
      const double *row = rows + n_columns * i;
      HlPlanckTerm term = { row[0], 1.0, -1.0, -row[1] };
      if (is_general)
        term = (HlPlanckTerm) { row[0], row[2], row[3], row[1] };
      else if (!(row[1] > 0.0))
        return refuse (reader, "%s\"t\"[%u] is %g; it must lie above 0", path, i, row[1]);
      if (!append_rows (reader, path, (gpointer *) &eq->planck, &eq->n_planck, (const double *) &term, 1, 4))
        return FALSE;
    }
  return TRUE;
}

static gboolean
read_ideal_term (Reader *reader, JsonObject *object, const char *kind, const char *path, HlHelmholtz *eq)
{
  static const char *const power[] = { "n", "t" };
  double a1 = 0.0, a2 = 0.0;
  gboolean is_lead = strcmp (kind, "lead") == 0;
  if (is_lead || strcmp (kind, "offset") == 0)
    {
      if (!read_any_number (reader, object, path, "a1", &a1) || !read_any_number (reader, object, path, "a2", &a2))
        return FALSE;
      eq->ideal_a1 += a1;
      eq->ideal_a2 += a2;
      return TRUE;
    }
  if (strcmp (kind, "log_tau") == 0)
    {
      if (!read_any_number (reader, object, path, "a", &a1))
        return FALSE;
      eq->ideal_log += a1;
      return TRUE;
    }
  if (strcmp (kind, "power") == 0)
    return read_rows (reader, object, path, power, 2, (gpointer *) &eq->ideal_power, &eq->n_ideal_power);
  if (strcmp (kind, "planck_einstein") == 0)
    return read_planck (reader, object, path, FALSE, eq);
  if (strcmp (kind, "planck_einstein_general") == 0)
    return read_planck (reader, object, path, TRUE, eq);
  return refuse (reader, "%sunknown kind \"%s\"; known are lead, offset, log_tau, power, planck_einstein, planck_einstein_general", path, kind);
}

typedef gboolean (*ReadTerm) (Reader *reader, JsonObject *object, const char *kind, const char *path, HlHelmholtz *eq);

/* Reads a list of terms; counts those of one kind that must be there exactly once. */
static gboolean
read_terms (Reader *reader, JsonObject *root, const char *key, ReadTerm read, const char *once, HlHelmholtz *eq)
{
  JsonArray *array = read_array (reader, root, "", key);
  guint n_once = 0;
  if (array == NULL)
    return FALSE;
  if (json_array_get_length (array) == 0)
    return refuse (reader, "\"%s\" has no terms", key);
  for (guint i = 0; i < json_array_get_length (array); i++)
    {
      g_autofree char *path = g_strdup_printf ("%s[%u].", key, i);
      JsonNode *node = json_array_get_element (array, i);
      if (!JSON_NODE_HOLDS_OBJECT (node))
        return refuse (reader, "%s[%u] is no object { ... }", key, i);
      JsonNode *kind = member (json_node_get_object (node), "kind");
      if (kind == NULL || !JSON_NODE_HOLDS_VALUE (kind) || json_node_get_value_type (kind) != G_TYPE_STRING)
        return refuse (reader, "%s\"kind\" is missing or no text", path);
      if (!read (reader, json_node_get_object (node), json_node_get_string (kind), path, eq))
        return FALSE;
      n_once += g_strcmp0 (json_node_get_string (kind), once) == 0;
    }
  if (once != NULL && n_once != 1)
    return refuse (reader, "\"%s\" has %u terms of kind \"%s\"; exactly one is needed, it stands for ln(delta)", key, n_once, once);
  return TRUE;
}

static gboolean
read_density_start (Reader *reader, JsonObject *starts, const char *key, double molar_mass, HlDensityStart *start)
{
  static const struct { const char *form; int value; } forms[] = {
    { "linear", HL_START_LINEAR }, { "exp", HL_START_EXP }, { "exp_tau", HL_START_EXP_TAU },
  };
  static const char *const columns[] = { "n", "t" };
  g_autofree char *path = g_strdup_printf ("saturation_start.%s.", key), *form = NULL;
  JsonObject *object = read_object (reader, starts, key);
  if (object == NULL || !read_text (reader, object, "form", TRUE, &form) || !read_number (reader, object, path, "T_K", 0.0, &start->T)
      || !read_number (reader, object, path, "rho_mol_per_m3", 0.0, &start->density)
      || !read_rows (reader, object, path, columns, 2, (gpointer *) &start->terms, &start->n_terms))
    return FALSE;
  start->density *= molar_mass;
  for (gsize i = 0; i < G_N_ELEMENTS (forms); i++)
    if (strcmp (form, forms[i].form) == 0)
      {
        start->form = forms[i].value;
        return TRUE;
      }
  return refuse (reader, "%sform is \"%s\"; known are linear, exp, exp_tau", path, form);
}

/* Up to which temperature the substance itself is known to last. */
static gboolean
read_stability (Reader *reader, JsonObject *root, HlHelmholtz *eq)
{
  eq->T_stable = NAN;
  if (member (root, "stable_to") == NULL)
    return TRUE;
  JsonObject *stable = read_object (reader, root, "stable_to");
  if (stable == NULL || !read_number (reader, stable, "stable_to.", "T_K", 0.0, &eq->T_stable)
      || !read_text (reader, stable, "source", TRUE, &eq->stable_source))
    return FALSE;
  JsonNode *weak = member (stable, "weak");
  eq->is_stable_weak = weak == NULL || !JSON_NODE_HOLDS_VALUE (weak) || json_node_get_boolean (weak);
  return TRUE;
}

static gboolean
read_words (Reader *reader, JsonObject *root, HlHelmholtz *eq)
{
  char *id = NULL, *name = NULL, *formulation = NULL;
  gboolean ok = read_text (reader, root, "id", TRUE, &id) && read_text (reader, root, "name", TRUE, &name)
                && read_text (reader, root, "formulation", TRUE, &formulation) && read_text (reader, root, "source", TRUE, &eq->source)
                && read_text (reader, root, "formula", FALSE, &eq->formula) && read_text (reader, root, "cas", FALSE, &eq->cas)
                && read_text (reader, root, "note", FALSE, &eq->note) && read_text (reader, root, "zero", FALSE, &eq->zero)
                && read_text (reader, root, "safety_class", FALSE, &eq->safety_class)
                && read_text (reader, root, "safety_class_source", FALSE, &eq->safety_source)
                && read_text (reader, root, "gwp100_source", FALSE, &eq->gwp_source) && read_text (reader, root, "hazard", FALSE, &eq->hazard)
                && read_stability (reader, root, eq);
  eq->fluid.id = id;
  eq->fluid.name = name;
  eq->fluid.formulation = formulation;
  if (ok && (strspn (id, "abcdefghijklmnopqrstuvwxyz0123456789-") != strlen (id) || strlen (id) > 40))
    ok = refuse (reader, "id is \"%s\"; an id has up to 40 small letters a-z, digits and -", id);
  eq->gwp100 = NAN;
  if (ok && member (root, "gwp100") != NULL)
    ok = read_number (reader, root, "", "gwp100", -1e-9, &eq->gwp100);
  GPtrArray *aliases = g_ptr_array_new ();
  if (ok && member (root, "aliases") != NULL)
    {
      JsonArray *array = read_array (reader, root, "", "aliases");
      ok = array != NULL;
      for (guint i = 0; ok && i < json_array_get_length (array); i++)
        {
          const char *alias = JSON_NODE_HOLDS_VALUE (json_array_get_element (array, i)) ? json_array_get_string_element (array, i) : NULL;
          if (alias != NULL)
            g_ptr_array_add (aliases, g_strdup (alias));
          else
            ok = refuse (reader, "aliases[%u] is no text", i);
        }
    }
  g_ptr_array_add (aliases, NULL);
  eq->aliases = (GStrv) g_ptr_array_free (aliases, FALSE);
  return ok;
}

static gboolean
read_numbers (Reader *reader, JsonObject *root, HlHelmholtz *eq)
{
  double M = 0.0, R = 0.0, critical = 0.0, reducing = 0.0;
  JsonObject *range, *point, *unit, *starts;
  if (!read_number (reader, root, "", "molar_mass_kg_per_mol", 0.0, &M) || !read_number (reader, root, "", "gas_constant_J_per_molK", 0.0, &R)
      || !read_any_number (reader, root, "", "acentric_factor", &eq->acentric_factor)
      || (range = read_object (reader, root, "range")) == NULL || (point = read_object (reader, root, "critical")) == NULL
      || (unit = read_object (reader, root, "reducing")) == NULL || (starts = read_object (reader, root, "saturation_start")) == NULL)
    return FALSE;
  if (M > 2.0)
    return refuse (reader, "molar_mass_kg_per_mol is %g; that is more than 2 kg/mol: is it in g/mol?", M);
  if (fabs (R / 8.314 - 1.0) > 1e-3)
    return refuse (reader, "gas_constant_J_per_molK is %g; it must be the authors' value close to 8.314", R);
  if (!read_number (reader, range, "range.", "T_min_K", 0.0, &eq->T_min) || !read_number (reader, range, "range.", "T_max_K", eq->T_min, &eq->T_max)
      || !read_number (reader, range, "range.", "p_max_Pa", 0.0, &eq->p_max)
      || !read_number (reader, point, "critical.", "T_K", eq->T_min, &eq->Tc) || !read_number (reader, point, "critical.", "p_Pa", 0.0, &eq->pc)
      || !read_number (reader, point, "critical.", "rho_mol_per_m3", 0.0, &critical)
      || !read_number (reader, unit, "reducing.", "T_K", 0.0, &eq->T_reducing)
      || !read_number (reader, unit, "reducing.", "rho_mol_per_m3", 0.0, &reducing)
      || !read_density_start (reader, starts, "rho_liquid", M, &eq->start_liquid)
      || !read_density_start (reader, starts, "rho_vapour", M, &eq->start_vapour))
    return FALSE;
  if (!(eq->T_max > eq->Tc && eq->p_max > eq->pc))
    return refuse (reader, "range ends at %g K and %g Pa; it must reach beyond the critical point at %g K and %g Pa", eq->T_max, eq->p_max, eq->Tc, eq->pc);
  eq->R = R / M;
  eq->dc = critical * M;
  eq->d_reducing = reducing * M;
  eq->fluid.limits.molar_mass = M;
  return TRUE;
}

static gboolean
read_root (Reader *reader, JsonObject *root, HlHelmholtz *eq)
{
  double version = 0.0;
  if (!read_number (reader, root, "", "heatloom_fluid", 0.0, &version))
    return FALSE;
  if (fabs (version - 1.0) > 0.0)
    return refuse (reader, "heatloom_fluid is %g; this program reads version 1", version);
  return read_words (reader, root, eq) && read_numbers (reader, root, eq)
         && read_terms (reader, root, "ideal", read_ideal_term, "lead", eq)
         && read_terms (reader, root, "residual", read_residual_term, NULL, eq);
}

/**
 * hl_helmholtz_read:
 * @text: a coefficient file
 * @length: its length, or -1
 * @where: name of the file for messages
 * @error: says what is wrong, where, and how to mend it
 *
 * Reads and checks the figures; hl_helmholtz_prepare() makes a fluid of them.
 *
 * Returns: (transfer full): free with hl_helmholtz_free(); NULL on failure
 */
HlHelmholtz *
hl_helmholtz_read (const char *text, gssize length, const char *where, GError **error)
{
  Reader reader = { .where = where, .error = error };
  g_autoptr (JsonParser) parser = json_parser_new ();
  g_autoptr (GError) broken = NULL;
  gsize size = length < 0 ? strlen (text) : (gsize) length;
  if (size > MAX_LENGTH)
    {
      refuse (&reader, "the file has %" G_GSIZE_FORMAT " bytes; at most %d are read", size, MAX_LENGTH);
      return NULL;
    }
  if (!json_parser_load_from_data (parser, text, (gssize) size, &broken))
    {
      refuse (&reader, "this is no JSON: %s", broken->message);
      return NULL;
    }
  JsonNode *root = json_parser_get_root (parser);
  if (root == NULL || !JSON_NODE_HOLDS_OBJECT (root))
    {
      refuse (&reader, "the file must hold one object { ... }");
      return NULL;
    }
  HlHelmholtz *eq = g_new0 (HlHelmholtz, 1);
  if (read_root (&reader, json_node_get_object (root), eq))
    return eq;
  hl_helmholtz_free (eq);
  return NULL;
}
