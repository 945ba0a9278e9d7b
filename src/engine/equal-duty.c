/* Plants compared at equal duty: flows, powers and heats that one gives are given to the other.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/equal-duty.h"
#include "plant/i18n.h"
#include <math.h>

static void
duty_clear (gpointer data)
{
  g_free (((HlDuty *) data)->why_not);
  g_free (((HlDuty *) data)->yielded);
}

static void
add_duties (GArray *duties, const HlPlant *plant, const HlValues *values, HlOwner owner, const char *id)
{
  for (guint i = 0; i < values->n; i++)
    {
      const HlValueEntry *entry = &values->entries[i];
      HlDuty duty = { .address = { owner, g_intern_string (id), g_intern_string (entry->key) }, .value = entry->value.value };
      const HlQuantityKind *kind = hl_plant_quantity_kind (plant, &duty.address);
      if (entry->value.origin != HL_ORIGIN_TIED && kind != NULL && fabs (duty.value) > 0.0    /* no loss is no duty */
          && (kind->dimension == HL_DIMENSION_MASS_FLOW || kind->dimension == HL_DIMENSION_POWER))
        g_array_append_val (duties, duty);
    }
}

static GArray *
duties_of (const HlPlant *plant)
{
  GArray *duties = g_array_new (FALSE, TRUE, sizeof (HlDuty));
  g_array_set_clear_func (duties, duty_clear);
  add_duties (duties, plant, hl_plant_values (plant), HL_OWNER_PLANT, "");
  for (guint i = 0; i < hl_plant_n_components (plant); i++)
    add_duties (duties, plant, &hl_plant_component (plant, i)->values, HL_OWNER_COMPONENT, hl_plant_component (plant, i)->id);
  for (guint i = 0; i < hl_plant_n_streams (plant); i++)
    add_duties (duties, plant, &hl_plant_stream (plant, i)->values, HL_OWNER_STREAM, hl_plant_stream (plant, i)->id);
  return duties;
}

static gboolean
has_value (const HlPlant *plant, const HlDuty *duty)
{
  const HlValue *value = hl_plant_value_wherever (plant, &duty->address, NULL);
  return value != NULL && value->origin != HL_ORIGIN_TIED && fabs (value->value - duty->value) <= 1e-9 * fabs (duty->value);
}

static char *
yielded_text (const GArray *yielded)
{
  GString *text = g_string_new (NULL);
  for (guint i = 0; yielded != NULL && i < yielded->len; i++)
    g_string_append_printf (text, "%s%s", i > 0 ? "; " : "", g_array_index (yielded, HlYield, i).text);
  return g_string_free (text, text->len == 0);
}

/* Takes over the solution where the duty can be held. */
static void
hold (HlDuty *duty, HlSolution **solution)
{
  HlPlant *plant = hl_solution_plant (*solution);
  HlValue value = { .origin = HL_ORIGIN_GIVEN, .value = duty->value };
  g_autoptr (HlPlant) with_duty = NULL, settled = NULL;
  g_autoptr (HlSolution) solved = NULL;
  g_autoptr (GArray) yielded = NULL;
  double found;
  duty->is_held = has_value (plant, duty);
  if (duty->is_held)
    return;
  if (hl_plant_quantity_kind (plant, &duty->address) == NULL)
    {
      duty->why_not = g_strdup (_("there is no such quantity here"));
      return;
    }
  if (hl_solution_is_solved (*solution) && hl_solution_value (*solution, &duty->address, &found)
      && fabs (found - duty->value) <= 1e-9 * fabs (duty->value))     /* it comes out the same by itself */
    {
      duty->is_held = TRUE;
      return;
    }
  with_duty = hl_plant_with_value (plant, &duty->address, &value, NULL);
  settled = with_duty != NULL ? hl_settle (with_duty, &duty->address, &yielded) : NULL;
  solved = settled != NULL ? hl_solve (settled, *solution) : NULL;
  duty->is_held = solved != NULL && hl_solution_is_solved (solved);
  if (!duty->is_held)
    {
      duty->why_not = solved != NULL ? hl_solution_summary (solved) : g_strdup (_("the value lies outside its limits here"));
      return;
    }
  duty->yielded = yielded_text (yielded);
  hl_solution_unref (*solution);
  *solution = g_steal_pointer (&solved);
}

HlSolution *
hl_solve_at_duty (HlSolution *other, const HlSolution *reference, GArray **duties)
{
  g_autoptr (GArray) all = NULL;
  HlSolution *solution;
  g_return_val_if_fail (other != NULL && reference != NULL, NULL);
  all = duties_of (hl_solution_plant (reference));
  solution = hl_solution_ref (other);
  for (guint i = 0; i < all->len; i++)
    hold (&g_array_index (all, HlDuty, i), &solution);
  if (duties != NULL)
    *duties = g_steal_pointer (&all);
  return solution;
}
