/* Documents: a base plant, its variants, and what can be done with them.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/document-private.h"
#include "plant/i18n.h"
#include <string.h>

/* Variants */

HlVariant *
hl_variant_new (const char *name, GPtrArray *changes, JsonObject *extra)
{
  HlVariant *variant = g_new0 (HlVariant, 1);
  g_atomic_ref_count_init (&variant->ref_count);
  variant->name = g_strdup (name);
  variant->changes = changes;
  variant->extra = extra;
  return variant;
}

static HlVariant *
variant_ref (HlVariant *variant)
{
  g_atomic_ref_count_inc (&variant->ref_count);
  return variant;
}

static gpointer
copy_variant (gconstpointer variant, gpointer data)
{
  (void) data;
  return variant_ref ((HlVariant *) variant);
}

void
hl_variant_unref (HlVariant *variant)
{
  if (!g_atomic_ref_count_dec (&variant->ref_count))
    return;
  g_free (variant->name);
  g_ptr_array_unref (variant->changes);
  g_clear_pointer (&variant->extra, json_object_unref);
  g_free (variant);
}

static JsonObject *
extra_of (const HlVariant *variant)
{
  return variant->extra != NULL ? json_object_ref (variant->extra) : NULL;
}

static void
made_clear (gpointer data)
{
  HlMade *made = data;
  hl_plant_unref (made->plant);
  g_ptr_array_unref (made->unapplied);
}

static void
made_unref (HlMade *made)
{
  if (made != NULL)
    g_atomic_rc_box_release_full (made, made_clear);
}

gboolean
hl_variant_name_is_good (const char *name, GError **error)
{
  g_autofree char *trimmed = g_strstrip (g_strdup (name));
  if (g_str_equal (trimmed, name) && *name != '\0' && strlen (name) <= HL_MAX_VARIANT_NAME && strchr (name, '\n') == NULL)
    return TRUE;
  g_set_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_CONTENT,
               _("a variant needs a name in one line, of 1 to %d bytes, without space at its ends"), HL_MAX_VARIANT_NAME);
  return FALSE;
}

/* Life */

/* Ids that variants add must not be given to anything else, lest a change meet the wrong component. */
static HlPlant *
reserve_ids (HlPlant *base, const GPtrArray *variants)
{
  g_autoptr (GHashTable) ids = g_hash_table_new (g_str_hash, g_str_equal);
  HlPlant *reserving;
  for (guint i = 0; i < variants->len; i++)
    {
      const HlVariant *variant = variants->pdata[i];
      for (guint j = 0; j < variant->changes->len; j++)
        if (hl_change_kind (variant->changes->pdata[j]) != HL_CHANGE_SET)
          g_hash_table_add (ids, (gpointer) g_intern_string (hl_change_where (variant->changes->pdata[j])));
    }
  if (g_hash_table_size (ids) == 0 && base->reserved == NULL)
    return base;
  if (base->reserved != NULL && g_hash_table_size (ids) == g_hash_table_size (base->reserved))
    {
      GHashTableIter iter;
      gpointer id;
      gboolean is_same = TRUE;
      g_hash_table_iter_init (&iter, ids);
      while (is_same && g_hash_table_iter_next (&iter, &id, NULL))
        is_same = g_hash_table_contains (base->reserved, id);
      if (is_same)
        return base;
    }
  reserving = hl_plant_with_reserved (base, ids);
  hl_plant_unref (base);
  return reserving;
}

static void
share_made (HlDocument *document, const HlDocument *former)
{
  if (former == NULL || former->base != document->base)
    return;
  g_mutex_lock ((GMutex *) &former->lock);
  for (guint i = 0; i < document->variants->len; i++)
    for (guint j = 0; document->made[i] == NULL && j < former->variants->len; j++)
      if (former->variants->pdata[j] == document->variants->pdata[i] && former->made[j] != NULL)
        document->made[i] = g_atomic_rc_box_acquire (former->made[j]);
  g_mutex_unlock ((GMutex *) &former->lock);
}

HlDocument *
hl_document_build (HlPlant *base, GPtrArray *variants, const HlDocument *former)
{
  HlDocument *document = g_new0 (HlDocument, 1);
  g_atomic_ref_count_init (&document->ref_count);
  g_mutex_init (&document->lock);
  document->variants = variants;
  document->base = reserve_ids (base, variants);
  document->made = g_new0 (HlMade *, variants->len + 1);
  share_made (document, former);
  return document;
}

static GPtrArray *
variant_list (void)
{
  return g_ptr_array_new_with_free_func ((GDestroyNotify) hl_variant_unref);
}

HlDocument *
hl_document_new (HlPlant *base)
{
  g_return_val_if_fail (base != NULL, NULL);
  return hl_document_build (base, variant_list (), NULL);
}

HlDocument *
hl_document_ref (HlDocument *document)
{
  g_return_val_if_fail (document != NULL, NULL);
  g_atomic_ref_count_inc (&document->ref_count);
  return document;
}

void
hl_document_unref (HlDocument *document)
{
  if (document == NULL || !g_atomic_ref_count_dec (&document->ref_count))
    return;
  for (guint i = 0; i < document->variants->len; i++)
    made_unref (document->made[i]);
  g_free (document->made);
  g_mutex_clear (&document->lock);
  hl_plant_unref (document->base);
  g_ptr_array_unref (document->variants);
  g_free (document);
}

/* Reading */

static HlVariant *
variant_at (const HlDocument *document, int variant)
{
  return variant >= 0 && (guint) variant < document->variants->len ? document->variants->pdata[variant] : NULL;
}

guint
hl_document_n_variants (const HlDocument *document)
{
  g_return_val_if_fail (document != NULL, 0);
  return document->variants->len;
}

const char *
hl_document_variant_name (const HlDocument *document, int variant)
{
  HlVariant *found;
  g_return_val_if_fail (document != NULL, NULL);
  found = variant_at (document, variant);
  return found != NULL ? found->name : "";
}

int
hl_document_find_variant (const HlDocument *document, const char *name)
{
  g_return_val_if_fail (document != NULL && name != NULL, HL_DOCUMENT_BASE);
  for (guint i = 0; i < document->variants->len; i++)
    if (g_str_equal (((HlVariant *) document->variants->pdata[i])->name, name))
      return (int) i;
  return HL_DOCUMENT_BASE;
}

static HlMade *
made_of (const HlDocument *document, int variant)
{
  HlMade **made = &document->made[variant];
  g_mutex_lock ((GMutex *) &document->lock);
  if (*made == NULL)
    {
      *made = g_atomic_rc_box_new0 (HlMade);
      (*made)->unapplied = hl_unapplied_list ();
      (*made)->plant = hl_changes_apply (variant_at (document, variant)->changes, document->base, (*made)->unapplied);
    }
  g_mutex_unlock ((GMutex *) &document->lock);
  return *made;
}

HlPlant *
hl_document_plant (const HlDocument *document, int variant)
{
  g_return_val_if_fail (document != NULL, NULL);
  return variant_at (document, variant) != NULL ? made_of (document, variant)->plant : document->base;
}

const GPtrArray *
hl_document_changes (const HlDocument *document, int variant)
{
  static GPtrArray *none = NULL;
  HlVariant *found;
  g_return_val_if_fail (document != NULL, NULL);
  found = variant_at (document, variant);
  if (g_once_init_enter (&none))
    g_once_init_leave (&none, g_ptr_array_new ());
  return found != NULL ? found->changes : none;
}

const GPtrArray *
hl_document_unapplied (const HlDocument *document, int variant)
{
  g_return_val_if_fail (document != NULL, NULL);
  return variant_at (document, variant) != NULL ? made_of (document, variant)->unapplied
                                                : hl_document_changes (document, HL_DOCUMENT_BASE);
}

static gboolean
changes_equal (const GPtrArray *a, const GPtrArray *b)
{
  if (a == b)
    return TRUE;
  if (a->len != b->len)
    return FALSE;
  for (guint i = 0; i < a->len; i++)
    if (!hl_change_equal (a->pdata[i], b->pdata[i]))
      return FALSE;
  return TRUE;
}

gboolean
hl_document_equal (const HlDocument *a, const HlDocument *b)
{
  g_return_val_if_fail (a != NULL && b != NULL, FALSE);
  if (a == b)
    return TRUE;
  if (a->variants->len != b->variants->len || !hl_plant_equal (a->base, b->base))
    return FALSE;
  for (guint i = 0; i < a->variants->len; i++)
    {
      const HlVariant *first = a->variants->pdata[i], *second = b->variants->pdata[i];
      if (first != second
          && (!g_str_equal (first->name, second->name) || !changes_equal (first->changes, second->changes)
              || !hl_json_object_equal (first->extra, second->extra)))
        return FALSE;
    }
  return TRUE;
}

/* Editing */

static GPtrArray *
copy_variants (const HlDocument *document)
{
  GPtrArray *copy = g_ptr_array_copy (document->variants, copy_variant, NULL);
  g_ptr_array_set_free_func (copy, (GDestroyNotify) hl_variant_unref);
  return copy;
}

static void
replace_variant (GPtrArray *variants, guint n, HlVariant *variant)
{
  hl_variant_unref (variants->pdata[n]);
  variants->pdata[n] = variant;
}

/* The base with title, units, formulation and unknown keys of @plant: those are the same in all variants. */
static HlPlant *
with_frame_of (HlPlant *base, const HlPlant *plant)
{
  HlPlant *edited;
  JsonObject **to[3], *from[3] = { plant->extra, plant->site_extra, plant->plant_extra };
  if (g_str_equal (base->title, plant->title) && base->units == plant->units && base->formulation == plant->formulation
      && hl_json_object_equal (base->extra, plant->extra)
      && hl_json_object_equal (base->site_extra, plant->site_extra) && hl_json_object_equal (base->plant_extra, plant->plant_extra))
    return hl_plant_ref (base);
  edited = hl_plant_share (base);
  to[0] = &edited->extra;
  to[1] = &edited->site_extra;
  to[2] = &edited->plant_extra;
  g_ref_string_release (edited->title);
  edited->title = g_ref_string_acquire (plant->title);
  edited->units = plant->units;
  edited->formulation = plant->formulation;
  for (int i = 0; i < 3; i++)
    {
      g_clear_pointer (to[i], json_object_unref);
      *to[i] = from[i] != NULL ? json_object_ref (from[i]) : NULL;
    }
  return edited;
}

/* The changes that make @plant of @base; a change that stays what it was keeps what the file said beside it.  Those that do
 * not apply at present wait at the end. */
static GPtrArray *
changes_of_variant (const HlPlant *base, const HlPlant *plant, const GPtrArray *former, const GPtrArray *unapplied)
{
  GPtrArray *changes = hl_changes_between (base, plant);
  for (guint i = 0; i < changes->len; i++)
    for (guint j = 0; j < former->len; j++)
      if (hl_change_says (changes->pdata[i], former->pdata[j]))
        {
          hl_change_unref (changes->pdata[i]);
          changes->pdata[i] = hl_change_ref (former->pdata[j]);
          break;
        }
  for (guint i = 0; unapplied != NULL && i < unapplied->len; i++)
    g_ptr_array_add (changes, hl_change_ref (((HlUnapplied *) unapplied->pdata[i])->change));
  return changes;
}

HlDocument *
hl_document_with_plant (const HlDocument *document, int variant, const HlPlant *plant)
{
  HlVariant *former;
  GPtrArray *variants;
  HlPlant *base;
  const GPtrArray *unapplied;
  g_return_val_if_fail (document != NULL && plant != NULL, NULL);
  former = variant_at (document, variant);
  variants = copy_variants (document);
  if (former == NULL)
    return hl_document_build (hl_plant_ref ((HlPlant *) plant), variants, document);
  unapplied = hl_document_unapplied (document, variant);
  base = with_frame_of (document->base, plant);
  replace_variant (variants, (guint) variant,
                   hl_variant_new (former->name, changes_of_variant (base, plant, former->changes, unapplied), extra_of (former)));
  return hl_document_build (base, variants, document);
}

static gboolean
name_is_free (const HlDocument *document, const char *name, int except, GError **error)
{
  int other;
  if (!hl_variant_name_is_good (name, error))
    return FALSE;
  other = hl_document_find_variant (document, name);
  if (other == HL_DOCUMENT_BASE || other == except)
    return TRUE;
  g_set_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_CONTENT, _("there is a variant “%s” already; choose another name"), name);
  return FALSE;
}

HlDocument *
hl_document_with_variant (const HlDocument *document, const char *name, int from, GError **error)
{
  HlVariant *model;
  GPtrArray *variants;
  g_return_val_if_fail (document != NULL && name != NULL, NULL);
  if (!name_is_free (document, name, HL_DOCUMENT_BASE, error))
    return NULL;
  if (document->variants->len >= HL_MAX_VARIANTS)
    {
      g_set_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_CONTENT, _("a plant holds %d variants at most; delete one first"), HL_MAX_VARIANTS);
      return NULL;
    }
  model = variant_at (document, from);
  variants = copy_variants (document);
  g_ptr_array_insert (variants, model != NULL ? from + 1 : (int) variants->len,
                      hl_variant_new (name, model != NULL ? g_ptr_array_ref (model->changes)
                                                          : g_ptr_array_new_with_free_func ((GDestroyNotify) hl_change_unref), NULL));
  return hl_document_build (hl_plant_ref (document->base), variants, document);
}

HlDocument *
hl_document_with_name (const HlDocument *document, int variant, const char *name, GError **error)
{
  HlVariant *former;
  GPtrArray *variants;
  g_return_val_if_fail (document != NULL && name != NULL, NULL);
  former = variant_at (document, variant);
  g_return_val_if_fail (former != NULL, NULL);
  if (!name_is_free (document, name, variant, error))
    return NULL;
  variants = copy_variants (document);
  replace_variant (variants, (guint) variant, hl_variant_new (name, g_ptr_array_ref (former->changes), extra_of (former)));
  return hl_document_build (hl_plant_ref (document->base), variants, document);
}

HlDocument *
hl_document_without (const HlDocument *document, int variant)
{
  GPtrArray *variants;
  g_return_val_if_fail (document != NULL && variant_at (document, variant) != NULL, NULL);
  variants = copy_variants (document);
  g_ptr_array_remove_index (variants, (guint) variant);
  return hl_document_build (hl_plant_ref (document->base), variants, document);
}

HlDocument *
hl_document_with_order (const HlDocument *document, int variant, int place)
{
  GPtrArray *variants;
  HlVariant *moved;
  g_return_val_if_fail (document != NULL && variant_at (document, variant) != NULL, NULL);
  variants = copy_variants (document);
  moved = g_ptr_array_steal_index (variants, (guint) variant);
  g_ptr_array_insert (variants, CLAMP (place, 0, (int) variants->len), moved);
  return hl_document_build (hl_plant_ref (document->base), variants, document);
}

HlDocument *
hl_document_promoted (const HlDocument *document, int variant)
{
  GPtrArray *variants;
  HlPlant *base;
  g_autofree char *former = NULL;
  g_return_val_if_fail (document != NULL && variant_at (document, variant) != NULL, NULL);
  base = hl_document_plant (document, variant);
  former = hl_document_free_name (document, _("former base"));
  variants = copy_variants (document);
  for (guint i = 0; i < variants->len; i++)
    {
      HlVariant *old = variants->pdata[i];
      gboolean is_promoted = (int) i == variant;
      const HlPlant *plant = is_promoted ? document->base : hl_document_plant (document, (int) i);
      GPtrArray *changes = changes_of_variant (base, plant, old->changes, is_promoted ? NULL : hl_document_unapplied (document, (int) i));
      replace_variant (variants, i, hl_variant_new (is_promoted ? former : old->name, changes, is_promoted ? NULL : extra_of (old)));
    }
  return hl_document_build (hl_plant_ref (base), variants, document);
}

char *
hl_document_free_name (const HlDocument *document, const char *stem)
{
  g_return_val_if_fail (document != NULL && stem != NULL, NULL);
  if (hl_document_find_variant (document, stem) == HL_DOCUMENT_BASE)
    return g_strdup (stem);
  for (guint n = 2;; n++)
    {
      g_autofree char *name = g_strdup_printf ("%s %u", stem, n);
      if (hl_document_find_variant (document, name) == HL_DOCUMENT_BASE)
        return g_steal_pointer (&name);
    }
}
