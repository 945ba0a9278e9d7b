/* heatloom-batch fluids: every medium with its equation and range, as Markdown.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include <stdio.h>
#include <string.h>
#include "batch/command.h"
#include "fluid/fluid-cycle.h"
#include "fluid/fluid-facts.h"
#include "plant/fluid-words.h"
#include "plant/i18n.h"
#include "plant/units.h"

static void
print_fluid (const HlFluid *fluid)
{
  HlFluidLimits limits;
  hl_fluid_limits (fluid, &limits);
  g_autofree char *low = hl_units_format (limits.T_min, HL_DIMENSION_TEMPERATURE, HL_UNITS_METRIC);
  g_autofree char *high = hl_units_format (limits.T_max, HL_DIMENSION_TEMPERATURE, HL_UNITS_METRIC);
  g_autofree char *p_max = hl_units_format (limits.p_max, HL_DIMENSION_PRESSURE, HL_UNITS_METRIC);
  g_autofree char *T_critical = hl_units_format (limits.T_critical, HL_DIMENSION_TEMPERATURE, HL_UNITS_METRIC);
  g_autofree char *p_critical = hl_units_format (limits.p_critical, HL_DIMENSION_PRESSURE, HL_UNITS_METRIC);
  printf ("| `%s` | %s | %s | ", hl_fluid_id (fluid), _(hl_fluid_name (fluid)), hl_fluid_formulation (fluid));
  printf (_("%s to %s"), low, high);
  if (hl_fluid_has_dome (fluid))
    printf (" | %s | %s, %s |\n", p_max, T_critical, p_critical);
  else
    printf (" | %s | %s |\n", p_max, _("has no dome"));
}

/* --- compared by a simple cycle --------------------------------------------------- */

typedef struct { const HlFluid *fluid; HlFluidCycle cycle; } Candidate;

/* The best first; what cannot be, last. */
static int
compare_candidates (gconstpointer a, gconstpointer b)
{
  const Candidate *first = a, *second = b;
  gboolean is_first = first->cycle.possible == HL_CYCLE_POSSIBLE, is_second = second->cycle.possible == HL_CYCLE_POSSIBLE;
  if (is_first != is_second)
    return is_first ? -1 : 1;
  if (!is_first)
    return strcmp (hl_fluid_id (first->fluid), hl_fluid_id (second->fluid));
  return first->cycle.efficiency > second->cycle.efficiency ? -1 : 1;
}

static void
print_candidate (const Candidate *candidate)
{
  const HlFluidCycle *cycle = &candidate->cycle;
  HlFluidFacts facts;
  hl_fluid_facts (candidate->fluid, &facts);
  g_autofree char *safety = hl_words_of_safety (candidate->fluid);
  printf ("| `%s` | %s | %s | %s | ", hl_fluid_id (candidate->fluid), hl_words_of_fluid (candidate->fluid), hl_words_of_expansion (facts.expansion), safety);
  if (cycle->possible != HL_CYCLE_POSSIBLE)
    {
      printf ("%s | | | | |\n", hl_words_of_cycle (cycle->possible));
      return;
    }
  g_autofree char *hot = hl_units_format (cycle->p_evaporation, HL_DIMENSION_PRESSURE, HL_UNITS_METRIC);
  g_autofree char *cold = hl_units_format (cycle->p_condensation, HL_DIMENSION_PRESSURE, HL_UNITS_METRIC);
  printf ("%s | %s | %.2f | %.2f %% | ", hot, cold, cycle->volume_ratio, 100.0 * cycle->efficiency);
  if (cycle->moisture > 0.0)
    printf (_("%.1f %% moisture"), 100.0 * cycle->moisture);
  else
    printf (_("%.1f K superheated"), cycle->superheat);
  printf (" |\n");
}

static gboolean
read_temperature (const HlArguments *arguments, const char *name, double *T, GError **error)
{
  const char *text = hl_arguments_value (arguments, name);
  if (text == NULL)
    {
      g_set_error (error, HL_BATCH_ERROR, HL_BATCH_ERROR_USAGE, _("--source and --sink belong together: --source '150 °C' --sink '20 °C'"));
      return FALSE;
    }
  if (hl_units_parse (text, HL_DIMENSION_TEMPERATURE, HL_UNITS_METRIC, 101325.0, T, error))
    return TRUE;
  g_prefix_error (error, "--%s '%s': ", name, text);
  return FALSE;
}

static HlExit
compare_fluids (const HlArguments *arguments)
{
  g_autoptr (GError) error = NULL;
  double T_source, T_sink;
  if (!read_temperature (arguments, "source", &T_source, &error) || !read_temperature (arguments, "sink", &T_sink, &error))
    return hl_complain (HL_EXIT_USAGE, g_steal_pointer (&error));
  g_auto (GStrv) ids = hl_fluid_list ();
  g_autoptr (GArray) list = g_array_new (FALSE, FALSE, sizeof (Candidate));
  for (guint i = 0; ids[i] != NULL; i++)
    {
      Candidate candidate = { .fluid = hl_fluid_lookup (ids[i]) };
      if (!hl_fluid_has_dome (candidate.fluid))
        continue;
      hl_fluid_cycle (candidate.fluid, T_source, T_sink, &candidate.cycle);
      g_array_append_val (list, candidate);
    }
  g_array_sort (list, compare_candidates);
  printf ("| %s | %s | %s | %s | %s | %s | %s | %s | %s |\n|---|---|---|---|---|---|---|---|---|\n", _("Medium"), _("Name"), _("Expansion"), _("Safety class"),
          _("Evaporation"), _("Condensation"), _("Volume ratio"), _("Cycle efficiency"), _("Exhaust"));
  for (guint i = 0; i < list->len; i++)
    print_candidate (&g_array_index (list, Candidate, i));
  return HL_EXIT_DONE;
}

static HlExit
run_fluids (const HlArguments *arguments)
{
  if (hl_arguments_value (arguments, "source") != NULL || hl_arguments_value (arguments, "sink") != NULL)
    return compare_fluids (arguments);
  g_auto(GStrv) ids = hl_fluid_list ();
  printf ("| %s | %s | %s | %s | %s | %s |\n|---|---|---|---|---|---|\n", _("Medium"), _("Name"), _("Equation"), _("Temperatures"),
          _("Highest pressure"), _("Critical point"));
  for (guint i = 0; ids[i] != NULL; i++)
    print_fluid (hl_fluid_lookup (ids[i]));
  return HL_EXIT_DONE;
}

static const HlBatchOption options[] = {
  { "source", N_("TEMPERATURE"), FALSE, N_("compare the media by a simple cycle whose heat source is this hot, sorted by efficiency") },
  { "sink", N_("TEMPERATURE"), FALSE, N_("and whose heat sink is this cold") },
};

const HlBatchCommand hl_command_fluids = {
  .name = "fluids",
  .usage = N_("[--source TEMPERATURE --sink TEMPERATURE]"),
  .details = N_(
    "The cycle: saturated vapour 10 K below the source, expanded with an isentropic efficiency of 0.82, condensed 10 K above\n"
    "the sink, pumped back with 0.65; no recuperator, no losses. It compares media; it is no medium's best.\n"),
  .options = options, .n_options = G_N_ELEMENTS (options),
  .summary = N_("print every medium with its equation of state and its range, as Markdown"),
  .least = 0, .most = 0,
  .run = run_fluids,
};
