/* The media that files of coefficients describe: those that the library carries, read when first asked for, and the user's own.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/helmholtz-private.h"

#include <string.h>

#include "fluid/gas-private.h"
#include "fluid/liquid-private.h"
#include "hl-fluid-data.h"

#define RESOURCES "/local/heatloom/fluids/"

G_DEFINE_QUARK (hl-fluid-error-quark, hl_fluid_error)

/* A fluid lives as long as the program, so pointers to it may be kept anywhere;
 * a file that is loaded again leaves the older one to those who hold it. */
static GMutex lock;
static GHashTable *known;              /* id -> HlHelmholtz, guarded by lock */
static GSList *older;                  /* what a file that was read again replaced, guarded by lock */

static const struct { const char *word; HlReference reference; } references[] = {
  { "IIR", HL_REFERENCE_IIR }, { "NBP", HL_REFERENCE_NBP }, { "ASHRAE", HL_REFERENCE_ASHRAE },
};

static GBytes *
carried (const char *id)
{
  g_autofree char *path = g_strconcat (RESOURCES, id, ".json", NULL);
  return g_resource_lookup_data (hl_fluid_data_get_resource (), path, G_RESOURCE_LOOKUP_FLAGS_NONE, NULL);
}

static HlHelmholtz *
read_fluid (const char *text, gssize length, const char *where, GError **error)
{
  HlHelmholtz *eq = hl_helmholtz_read (text, length, where, error);
  if (eq != NULL && !hl_helmholtz_prepare (eq, where, error))
    g_clear_pointer (&eq, hl_helmholtz_free);
  return eq;
}

static HlHelmholtz *
read_carried (const char *id)
{
  g_autoptr (GError) error = NULL;
  g_autoptr (GBytes) bytes = carried (id);
  if (bytes == NULL)
    return NULL;
  gsize size;
  const char *text = g_bytes_get_data (bytes, &size);
  HlHelmholtz *eq = read_fluid (text, (gssize) size, id, &error);
  if (eq == NULL)
    g_critical ("%s", error->message);
  return eq;
}

static const HlHelmholtz *
find (const char *id);

/* "isopentane@IIR": another zero of enthalpy and entropy. */
static HlHelmholtz *
make_reference (const char *id)
{
  const char *at = strchr (id, '@');
  if (at == NULL)
    return NULL;
  g_autofree char *base_id = g_strndup (id, (gsize) (at - id));
  for (gsize i = 0; i < G_N_ELEMENTS (references); i++)
    if (strcmp (at + 1, references[i].word) == 0)
      {
        const HlHelmholtz *base = find (base_id);
        return base != NULL ? hl_helmholtz_with_reference (base, references[i].reference, id) : NULL;
      }
  return NULL;
}

static const HlHelmholtz *
find (const char *id)
{
  HlHelmholtz *eq = known != NULL ? g_hash_table_lookup (known, id) : NULL;
  if (eq != NULL)
    return eq;
  eq = strchr (id, '@') != NULL ? make_reference (id) : read_carried (id);
  if (eq == NULL)
    return NULL;
  if (known == NULL)
    known = g_hash_table_new (g_str_hash, g_str_equal);
  g_hash_table_insert (known, (gpointer) eq->fluid.id, eq);
  return eq;
}

const HlFluid *
hl_registry_lookup (const char *id)
{
  g_mutex_lock (&lock);
  const HlHelmholtz *eq = find (id);
  g_mutex_unlock (&lock);
  return eq != NULL ? &eq->fluid : NULL;
}

/**
 * hl_fluid_with_reference:
 * @fluid: a fluid
 * @reference: which state has the customary zero of enthalpy and entropy
 *
 * The same fluid with its enthalpy and entropy shifted: IIR h = 200 kJ/kg and
 * s = 1 kJ/(kg K) for saturated liquid at 273.15 K, NBP h = s = 0 for saturated
 * liquid at 101325 Pa, ASHRAE the same at 233.15 K.  Its id is that of the fluid
 * followed by "@IIR", "@NBP" or "@ASHRAE", and hl_fluid_lookup() knows it.
 *
 * Returns: (nullable): the fluid; itself for HL_REFERENCE_PUBLISHED; NULL where that state does not
 *   exist, and for water by IF97, whose zero the release fixes
 */
const HlFluid *
hl_fluid_with_reference (const HlFluid *fluid, HlReference reference)
{
  const char *at = strchr (fluid->id, '@');
  g_autofree char *base_id = at != NULL ? g_strndup (fluid->id, (gsize) (at - fluid->id)) : g_strdup (fluid->id);
  if (reference == HL_REFERENCE_PUBLISHED)
    return at != NULL ? hl_fluid_lookup (base_id) : fluid;
  for (gsize i = 0; i < G_N_ELEMENTS (references); i++)
    if (references[i].reference == reference)
      {
        g_autofree char *id = g_strconcat (base_id, "@", references[i].word, NULL);
        return hl_fluid_lookup (id);
      }
  return NULL;
}

static gboolean
is_of_the_program (const char *id)
{
  g_autoptr (GBytes) ours = carried (id);
  return ours != NULL || strcmp (id, hl_water_if97.id) == 0 || hl_gas_lookup (id, NULL) != NULL;
}

static const HlFluid *
load_liquid (const char *text, gssize length, const char *where, GError **error)
{
  HlLiquid *liquid = hl_liquid_read (text, length, where, error);
  if (liquid == NULL || !is_of_the_program (liquid->fluid.id))
    return liquid != NULL ? hl_liquid_keep (liquid, where, error) : NULL;
  g_set_error (error, HL_FLUID_ERROR, HL_FLUID_ERROR_FILE, "%s: id \"%s\" belongs to a medium of the program; choose another id", where, liquid->fluid.id);
  hl_liquid_free (liquid);
  return NULL;
}

/**
 * hl_fluid_load_file:
 * @path: a coefficient file as in data/fluids/ or data/liquids/, UTF-8 JSON
 * @error: says what is wrong, where, and how to mend it
 *
 * Adds the user's own fluid under the id in its file, for the rest of the
 * program.  Read again, the newer one answers further look-ups.
 *
 * Returns: (nullable): the fluid; NULL with @error set
 */
const HlFluid *
hl_fluid_load_file (const char *path, GError **error)
{
  g_autofree char *text = NULL, *where = g_filename_display_name (path);
  gsize length;
  g_return_val_if_fail (path != NULL, NULL);
  if (!g_file_get_contents (path, &text, &length, error))
    return NULL;
  if (hl_liquid_is_file (text, (gssize) length))
    return load_liquid (text, (gssize) length, where, error);
  HlHelmholtz *eq = read_fluid (text, (gssize) length, where, error);
  if (eq == NULL)
    return NULL;
  if (is_of_the_program (eq->fluid.id) || hl_liquid_lookup (eq->fluid.id) != NULL)
    {
      g_set_error (error, HL_FLUID_ERROR, HL_FLUID_ERROR_FILE, "%s: id \"%s\" belongs to a medium of the program; choose another id", where, eq->fluid.id);
      hl_helmholtz_free (eq);
      return NULL;
    }
  g_mutex_lock (&lock);
  if (known == NULL)
    known = g_hash_table_new (g_str_hash, g_str_equal);
  HlHelmholtz *replaced = g_hash_table_lookup (known, eq->fluid.id);
  if (replaced != NULL)
    older = g_slist_prepend (older, replaced);
  g_hash_table_replace (known, (gpointer) eq->fluid.id, eq);
  g_mutex_unlock (&lock);
  return &eq->fluid;
}

static gint
compare_ids (gconstpointer a, gconstpointer b)
{
  return strcmp (*(const char *const *) a, *(const char *const *) b);
}

/**
 * hl_fluid_list:
 *
 * Returns: (transfer full): ids of all media, water first, then by name of id, then liquids without vapour, gases last; free with g_strfreev()
 */
char **
hl_fluid_list (void)
{
  GPtrArray *ids = g_ptr_array_new ();
  g_auto (GStrv) files = g_resource_enumerate_children (hl_fluid_data_get_resource (), RESOURCES, G_RESOURCE_LOOKUP_FLAGS_NONE, NULL);
  for (guint i = 0; files != NULL && files[i] != NULL; i++)
    g_ptr_array_add (ids, g_strndup (files[i], strlen (files[i]) - strlen (".json")));
  g_mutex_lock (&lock);
  if (known != NULL)
    {
      GHashTableIter iter;
      gpointer key;
      g_hash_table_iter_init (&iter, known);
      while (g_hash_table_iter_next (&iter, &key, NULL))
        {
          g_autoptr (GBytes) ours = carried (key);
          if (ours == NULL && strchr (key, '@') == NULL)
            g_ptr_array_add (ids, g_strdup (key));
        }
    }
  g_mutex_unlock (&lock);
  g_ptr_array_sort (ids, compare_ids);
  g_ptr_array_insert (ids, 0, g_strdup (hl_water_if97.id));
  hl_liquid_list (ids);
  hl_gas_list (ids);
  g_ptr_array_add (ids, NULL);
  return (char **) g_ptr_array_free (ids, FALSE);
}
