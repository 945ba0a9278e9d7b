/* heatloom-batch template: a plant to start from, as a file.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "command.h"
#include "plant/i18n.h"
#include "plant/template.h"
#include <stdio.h>
#include <stdlib.h>

static void
print_list (void)
{
  for (guint n = 0; n < hl_template_count (); n++)
    {
      const HlTemplate *template = hl_template_nth (n);
      printf ("%-22s %s", template->id, _(template->help));
      if (template->most > 0)
        printf (_(" Heaters: %d to %d."), template->least, template->most);
      printf ("\n");
    }
}

static gboolean
read_heaters (const HlArguments *arguments, const HlTemplate *template, int *heaters, GError **error)
{
  const char *text = hl_arguments_value (arguments, "heaters");
  gint64 number;
  *heaters = template->usual;
  if (text == NULL)
    return TRUE;
  if (template->most == 0)
    {
      g_set_error (error, HL_BATCH_ERROR, HL_BATCH_ERROR_USAGE, _("the template “%s” has no choice of heaters; leave out --heaters"), template->id);
      return FALSE;
    }
  if (!g_ascii_string_to_signed (text, 10, template->least, template->most, &number, NULL))
    {
      g_set_error (error, HL_BATCH_ERROR, HL_BATCH_ERROR_USAGE, _("“%s” is no number of heaters from %d to %d"), text, template->least, template->most);
      return FALSE;
    }
  *heaters = (int) number;
  return TRUE;
}

static HlExit
run_template (const HlArguments *arguments)
{
  g_autoptr (GError) error = NULL;
  const HlTemplate *template;
  int heaters;
  if (hl_arguments_n_words (arguments) == 0)
    {
      print_list ();
      return HL_EXIT_DONE;
    }
  template = hl_template_lookup (hl_arguments_word (arguments, 0));
  if (template == NULL)
    {
      g_set_error (&error, HL_BATCH_ERROR, HL_BATCH_ERROR_USAGE, _("there is no template “%s”; heatloom-batch template lists them"), hl_arguments_word (arguments, 0));
      return hl_complain (HL_EXIT_USAGE, g_steal_pointer (&error));
    }
  if (!read_heaters (arguments, template, &heaters, &error))
    return hl_complain (HL_EXIT_USAGE, g_steal_pointer (&error));
  g_autoptr (HlPlant) plant = hl_template_build (template, heaters);
  g_autofree char *text = hl_plant_to_json (plant);
  fputs (text, stdout);
  return HL_EXIT_DONE;
}

static const HlBatchOption options[] = {
  { "heaters", N_("N"), FALSE, N_("number of feedwater heaters") },
};

const HlBatchCommand hl_command_template = {
  .name = "template",
  .usage = N_("[NAME] [--heaters N]"),
  .summary = N_("write a plant to start from to standard output; without a name, list them"),
  .least = 0, .most = 1,
  .options = options, .n_options = G_N_ELEMENTS (options),
  .run = run_template,
};
