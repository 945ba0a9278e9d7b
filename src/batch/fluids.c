/* heatloom-batch fluids: every medium with its equation and range, as Markdown.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include <stdio.h>
#include "batch/command.h"
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

static HlExit
run_fluids (const HlArguments *arguments G_GNUC_UNUSED)
{
  g_auto(GStrv) ids = hl_fluid_list ();
  printf ("| %s | %s | %s | %s | %s | %s |\n|---|---|---|---|---|---|\n", _("Medium"), _("Name"), _("Equation"), _("Temperatures"),
          _("Highest pressure"), _("Critical point"));
  for (guint i = 0; ids[i] != NULL; i++)
    print_fluid (hl_fluid_lookup (ids[i]));
  return HL_EXIT_DONE;
}

const HlBatchCommand hl_command_fluids = {
  .name = "fluids",
  .summary = N_("print every medium with its equation of state and its range, as Markdown"),
  .least = 0, .most = 0,
  .run = run_fluids,
};
