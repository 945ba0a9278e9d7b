/* A solution as text for a terminal.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "batch/solve-output.h"

#include <math.h>
#include <stdlib.h>
#include "plant/i18n.h"

static void
print_pair (FILE *out, const char *name, const char *text)
{
  fprintf (out, "  %s%*s%s\n", name, (int) MAX (1, 36 - g_utf8_strlen (name, -1)), "", text);
}

static char *
address_text (const HlAddress *address)
{
  if (address->key == NULL || *address->key == '\0')
    return g_strdup (address->owner == HL_OWNER_PLANT ? "plant" : address->id);
  return hl_address_to_text (address);
}

static void
print_finding (FILE *out, const HlFinding *finding, gboolean is_dismissed)
{
  g_autofree char *at = address_text (&finding->at);
  if (is_dismissed)
    fprintf (out, _("%s, dismissed: %s: %s\n"), hl_grade_name (finding->grade), at, finding->text);
  else
    fprintf (out, "%s: %s: %s\n", hl_grade_name (finding->grade), at, finding->text);
  if (finding->source != NULL)
    fprintf (out, "    [%s]\n", finding->source);
  for (guint k = 0; k < finding->n_mends && !is_dismissed; k++)
    fprintf (out, "    → %s\n", finding->mends[k].text);
}

void
hl_print_findings (FILE *out, const HlSolution *solution, HlGrade at_least)
{
  for (guint i = 0; i < hl_solution_n_findings (solution); i++)
    if (hl_solution_finding (solution, i)->grade >= at_least)
      print_finding (out, hl_solution_finding (solution, i), FALSE);
}

void
hl_print_dismissed (FILE *out, const HlSolution *solution)
{
  for (guint i = 0; i < hl_solution_n_dismissed (solution); i++)
    print_finding (out, hl_solution_dismissed (solution, i), TRUE);
}

void
hl_print_solution (FILE *out, const HlSolution *solution, const GArray *yielded)
{
  const HlPlant *plant = hl_solution_plant (solution);
  g_autofree char *summary = hl_solution_summary (solution);
  if (*hl_plant_title (plant) != '\0')
    fprintf (out, "%s\n", hl_plant_title (plant));
  fprintf (out, "%s\n", summary);

  /* Figures of a plant that is not solved are where the search stood, and mislead. */
  guint n_results = hl_solution_is_solved (solution) ? hl_solution_n_results (solution) : 0;
  if (n_results > 0)
    fprintf (out, "\n");
  for (guint i = 0; i < n_results; i++)
    {
      double value;
      const HlQuantityKind *kind = hl_solution_result (solution, i, &value);
      g_autofree char *text = hl_quantity_format (kind, value, hl_plant_units (plant));
      print_pair (out, _(kind->name), text);
    }

  if (yielded->len > 0)
    fprintf (out, "\n");
  for (guint i = 0; i < yielded->len; i++)
    fprintf (out, "%s: %s\n", _("yielded"), g_array_index (yielded, HlYield, i).text);

  if (hl_solution_n_findings (solution) > 0)
    fprintf (out, "\n");
  hl_print_findings (out, solution, HL_GRADE_HINT);
}

/* What a person varies: 1 % of the value, or 1 K of a temperature, whose zero is arbitrary. */
static double
step_of (const HlPlant *plant, const HlSensitivity *s)
{
  const HlQuantityKind *kind = hl_plant_quantity_kind (plant, &s->given);
  return kind != NULL && kind->dimension == HL_DIMENSION_TEMPERATURE ? 1.0 : 0.01 * s->value;
}

static int
compare_effects (gconstpointer a, gconstpointer b, gpointer plant)
{
  const HlSensitivity *x = a, *y = b;
  double left = fabs (x->derivative * step_of (plant, x)), right = fabs (y->derivative * step_of (plant, y));
  return left < right ? 1 : left > right ? -1 : 0;
}

void
hl_print_sensitivity (FILE *out, const HlSolution *solution, const HlAddress *result)
{
  HlPlant *plant = hl_solution_plant (solution);
  const HlQuantityKind *kind = hl_plant_quantity_kind (plant, result);
  g_autofree char *name = hl_plant_describe (plant, result);
  g_autoptr (GArray) list = hl_solution_sensitivities (solution, result);
  double now;
  if (list == NULL || kind == NULL || !hl_solution_value (solution, result, &now))
    {
      fprintf (out, _("\nNo derivative of %s: it is not found, or the plant is not solved.\n"), name);
      return;
    }
  g_array_sort_with_data (list, compare_effects, plant);
  g_autofree char *text = hl_quantity_format (kind, now, hl_plant_units (plant));
  fprintf (out, _("\nEffect on %s (%s) of 1 %% more of each value put in, of a temperature 1 K more:\n"), name, text);
  for (guint k = 0; k < list->len; k++)
    {
      const HlSensitivity *s = &g_array_index (list, HlSensitivity, k);
      double effect = s->derivative * step_of (plant, s);
      const HlQuantityKind *given = hl_plant_quantity_kind (plant, &s->given);
      if (given == NULL || !(fabs (effect) > 1e-12 * fabs (now)))
        continue;
      g_autofree char *what = hl_plant_describe (plant, &s->given), *value = hl_quantity_format (given, s->value, hl_plant_units (plant));
      g_autofree char *left = g_strdup_printf ("%s = %s", what, value);
      fprintf (out, "  %s%*s%+.4f %%\n", left, (int) MAX (1, 60 - g_utf8_strlen (left, -1)), "", 100.0 * effect / fabs (now));
    }
}
