/* heatloom-batch: solves and checks plants, and tabulates states, without a window.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include <locale.h>
#include <stdio.h>
#include <string.h>
#include "batch/command.h"
#include "plant/i18n.h"

static const HlBatchCommand *const commands[] = {
  &hl_command_solve, &hl_command_check, &hl_command_note, &hl_command_variants, &hl_command_state, &hl_command_kinds, &hl_command_fluids, &hl_command_fuel, &hl_command_template,
};

static const char caution[] = N_(
  "Caution: the figures serve concepts and comparisons. Pressure equipment, steam, and flammable or toxic fluids\n"
  "are dangerous; local codes and licensed practice decide what may be built and run.\n");

static void
start_translations (void)
{
  /* A locale that is not there leaves the program in English, which is all that can be done. */
  setlocale (LC_ALL, "");
  setlocale (LC_NUMERIC, "C");
  const char *uninstalled = g_getenv ("APP_LOCALEDIR");
  bindtextdomain (GETTEXT_PACKAGE, uninstalled != NULL ? uninstalled : HL_LOCALEDIR);
  bind_textdomain_codeset (GETTEXT_PACKAGE, "UTF-8");
  textdomain (GETTEXT_PACKAGE);
}

static void
print_padded (const char *text, glong width)
{
  printf ("  %s%*s", text, (int) MAX (1, width - g_utf8_strlen (text, -1)), "");
}

static void
print_help (void)
{
  printf (_("Usage: heatloom-batch COMMAND ...\n\nSolves and checks thermal plants, and tabulates states of media, without a window.\n\n"));
  printf (_("Commands:\n"));
  for (guint i = 0; i < G_N_ELEMENTS (commands); i++)
    {
      print_padded (commands[i]->name, 10);
      printf ("%s\n", _(commands[i]->summary));
    }
  printf (_("\nheatloom-batch COMMAND --help says more about one; heatloom-batch --version tells the version.\n"
            "A file name - means standard input or standard output.\n"
            "Exit status: 0 done, 1 the plant has errors, 2 the command line is wrong, 3 a file cannot be read or written.\n\n"));
  fputs (_(caution), stdout);
}

static void
print_command_help (const HlBatchCommand *command)
{
  g_autofree char *usage = hl_command_usage (command);
  printf (_("Usage: %s\n\n%s\n"), usage, _(command->summary));
  if (command->n_options > 0)
    printf (_("\nOptions:\n"));
  for (guint i = 0; i < command->n_options; i++)
    {
      const HlBatchOption *option = &command->options[i];
      g_autofree char *text = g_strdup_printf ("--%s%s%s", option->name, option->values != NULL ? " " : "",
                                               option->values != NULL ? _(option->values) : "");
      print_padded (text, 26);
      printf ("%s\n", _(option->help));
    }
  if (command->details != NULL)
    printf ("\n%s", _(command->details));
  printf ("\n");
  fputs (_(caution), stdout);
}

static const HlBatchCommand *
find_command (const char *name, GError **error)
{
  g_autoptr(GString) list = g_string_new (NULL);
  for (guint i = 0; i < G_N_ELEMENTS (commands); i++)
    {
      if (strcmp (commands[i]->name, name) == 0)
        return commands[i];
      g_string_append_printf (list, "%s%s", i > 0 ? ", " : "", commands[i]->name);
    }
  g_set_error (error, HL_BATCH_ERROR, HL_BATCH_ERROR_USAGE,
               _("there is no command “%s”; the commands are %s (heatloom-batch --help)"), name, list->str);
  return NULL;
}

static HlExit
run_command (int argc, char **argv)
{
  g_autoptr(GError) error = NULL;
  const HlBatchCommand *command = find_command (argv[0], &error);
  if (command == NULL)
    return hl_complain (HL_EXIT_USAGE, g_steal_pointer (&error));
  if (argc == 2 && strcmp (argv[1], "--help") == 0)
    {
      print_command_help (command);
      return HL_EXIT_DONE;
    }
  g_autoptr(HlArguments) arguments = hl_arguments_parse (command, argc - 1, argv + 1, &error);
  if (arguments == NULL)
    return hl_complain (HL_EXIT_USAGE, g_steal_pointer (&error));
  return command->run (arguments);
}

int
main (int argc, char **argv)
{
  start_translations ();
  HlExit status = HL_EXIT_DONE;
  if (argc < 2)
    {
      fprintf (stderr, "heatloom-batch: %s\n", _("a command is missing; heatloom-batch --help lists them"));
      return HL_EXIT_USAGE;
    }
  if (strcmp (argv[1], "--help") == 0)
    print_help ();
  else if (strcmp (argv[1], "--version") == 0)
    printf ("heatloom-batch %s\n", HL_VERSION);
  else
    status = run_command (argc - 1, argv + 1);

  if (fflush (stdout) != 0 || ferror (stdout))
    {
      fprintf (stderr, "heatloom-batch: %s\n", _("standard output could not be written to the end"));
      return HL_EXIT_FILE;
    }
  return status;
}
