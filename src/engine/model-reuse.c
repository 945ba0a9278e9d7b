/* A model taken over by a plant that differs in the size of its values only: nothing of its structure is made anew.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/model.h"
#include <math.h>
#include <string.h>

/* The same quantities put in, in the same way; ties, which are equations, to the letter. */
static gboolean
same_set (const HlValues *a, const HlValues *b)
{
  if (a->n != b->n)
    return FALSE;
  for (guint k = 0; k < a->n; k++)
    {
      const HlValueEntry *first = &a->entries[k], *second = &b->entries[k];
      if (first->key != second->key || first->value.origin != second->value.origin || first->value.tie != second->value.tie
          || isfinite (first->value.value) != isfinite (second->value.value) || (first->value.value > 0.0) != (second->value.value > 0.0))
        return FALSE;
    }
  return TRUE;
}

static gboolean
same_component (const HlComponent *a, const HlComponent *b)
{
  return a->kind == b->kind && a->id == b->id && (a->kind->n_options == 0 || memcmp (a->options, b->options, a->kind->n_options * sizeof *a->options) == 0)
         && same_set (&a->values, &b->values);
}

static gboolean
same_stream (const HlStream *a, const HlStream *b)
{
  return a->id == b->id && a->from_id == b->from_id && a->from_port == b->from_port && a->to_id == b->to_id && a->to_port == b->to_port
         && a->medium == b->medium && same_set (&a->values, &b->values);
}

static gboolean
same_shaft (const HlShaft *a, const HlShaft *b)
{
  if (a->n_joins != b->n_joins)
    return FALSE;
  for (guint k = 0; k < a->n_joins; k++)
    if (a->joins[k] != b->joins[k])
      return FALSE;
  return TRUE;
}

/* Where a component's equations depend on a value being just this one, they must still do so, or still not. */
static gboolean
forms_hold (const HlModel *model, HlPlant *plant)
{
  for (guint k = 0; k < model->forms->len; k++)
    {
      const HlForm *form = &g_array_index (model->forms, HlForm, k);
      const HlComponent *component = hl_plant_component (plant, (guint) form->component);
      if (component == hl_plant_component (model->plant, (guint) form->component))
        continue;
      const HlValue *value = hl_values_find (&component->values, g_intern_string (form->key));
      if (hl_value_is_fixed_at (value, form->at) != form->holds)
        return FALSE;
    }
  return TRUE;
}

gboolean
hl_model_fits (const HlModel *model, HlPlant *plant)
{
  HlPlant *old = model->plant;
  guint n = hl_plant_n_components (old), n_streams = hl_plant_n_streams (old), n_shafts = hl_plant_n_shafts (old);
  if (old == plant)
    return TRUE;
  if (n != hl_plant_n_components (plant) || n_streams != hl_plant_n_streams (plant) || n_shafts != hl_plant_n_shafts (plant)
      || memcmp (hl_plant_site (old), hl_plant_site (plant), sizeof (HlSite)) != 0 || !g_str_equal (hl_plant_formulation (old), hl_plant_formulation (plant))
      || !same_set (hl_plant_values (old), hl_plant_values (plant)))
    return FALSE;
  for (guint k = 0; k < n; k++)
    if (hl_plant_component (old, k) != hl_plant_component (plant, k) && !same_component (hl_plant_component (old, k), hl_plant_component (plant, k)))
      return FALSE;
  for (guint k = 0; k < n_streams; k++)
    if (hl_plant_stream (old, k) != hl_plant_stream (plant, k) && !same_stream (hl_plant_stream (old, k), hl_plant_stream (plant, k)))
      return FALSE;
  for (guint k = 0; k < n_shafts; k++)
    if (hl_plant_shaft (old, k) != hl_plant_shaft (plant, k) && !same_shaft (hl_plant_shaft (old, k), hl_plant_shaft (plant, k)))
      return FALSE;
  return forms_hold (model, plant);
}

/* Values of one owner, put where they stand among the specs. */
static void
take_values (HlSystem *system, HlOwner owner, const char *id, const HlValues *values)
{
  for (guint k = 0; k < system->specs->len; k++)
    {
      HlSpec *spec = hl_system_spec (system, k);
      if (spec->origin == HL_ORIGIN_TIED || spec->address.owner != owner || (owner != HL_OWNER_PLANT && spec->address.id != id))
        continue;
      for (guint i = 0; i < values->n; i++)
        if (g_str_equal (values->entries[i].key, spec->address.key))
          {
            int root = system->root[spec->var];
            spec->si = values->entries[i].value.value;
            spec->value = hl_var_from_si (hl_system_var (system, spec->var)->kind, spec->si);
            if (system->fixed_by[root] == (int) k)
              system->x[root] = spec->value;
          }
    }
}

static HlSystem *
copy_system (const HlSystem *old)
{
  HlSystem *system = g_memdup2 (old, sizeof *old);
  system->vars = g_array_ref (old->vars);
  system->equations = g_array_ref (old->equations);
  system->index = g_array_ref (old->index);
  system->raw = g_array_ref (old->raw);
  system->constants = g_array_ref (old->constants);
  system->specs = g_array_sized_new (FALSE, FALSE, sizeof (HlSpec), old->specs->len);
  g_array_append_vals (system->specs, old->specs->data, old->specs->len);
  g_atomic_rc_box_acquire (system->root);
  g_atomic_rc_box_acquire (system->fixed_by);
  system->x = g_memdup2 (old->x, sizeof (double) * MAX (old->vars->len, 1));
  return system;
}

HlModel *
hl_model_with_values (const HlModel *old, HlPlant *plant)
{
  HlModel *model = g_memdup2 (old, sizeof *old);
  model->plant = hl_plant_ref (plant);
  model->system = copy_system (old->system);
  g_array_ref (model->nodes);
  g_array_ref (model->ports);
  g_array_ref (model->own);
  g_array_ref (model->open_ports);
  g_array_ref (model->broken_ties);
  g_array_ref (model->forms);
  for (int k = 0; k < HL_N_SUMS; k++)
    {
      g_array_ref (model->sums[k]);
      g_array_ref (model->sums_of[k]);
    }
  g_atomic_rc_box_acquire (model->first_port);
  g_atomic_rc_box_acquire (model->first_own);
  g_atomic_rc_box_acquire (model->is_on_shaft);
  for (guint k = 0; k < hl_plant_n_components (plant); k++)
    {
      const HlComponent *component = hl_plant_component (plant, k);
      if (component != hl_plant_component (old->plant, k))
        take_values (model->system, HL_OWNER_COMPONENT, component->id, &component->values);
    }
  for (guint k = 0; k < hl_plant_n_streams (plant); k++)
    {
      const HlStream *stream = hl_plant_stream (plant, k);
      if (stream != hl_plant_stream (old->plant, k))
        take_values (model->system, HL_OWNER_STREAM, stream->id, &stream->values);
    }
  take_values (model->system, HL_OWNER_PLANT, "", hl_plant_values (plant));
  hl_system_rescale (model->system);
  return model;
}
