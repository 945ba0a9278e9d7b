/* Reads a command's arguments by its table of options.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "batch/command.h"

#include <stdio.h>
#include <string.h>
#include "plant/i18n.h"

G_DEFINE_QUARK (hl-batch-error-quark, hl_batch_error)

typedef struct {
  const HlBatchOption *option;
  char               **values;    /* [words of option->values], borrowed from argv or owned where it came as --option=value */
  guint                n_values;
} GivenOption;

struct _HlArguments {
  GPtrArray *words;               /* of char *, borrowed */
  GArray    *given;               /* of GivenOption, in the order of the command line */
};

static void
given_option_clear (gpointer data)
{
  g_free (((GivenOption *) data)->values);
}

static guint
count_values (const HlBatchOption *option)
{
  guint n = option->values != NULL;
  for (const char *c = option->values; c != NULL && *c != '\0'; c++)
    n += *c == ' ';
  return n;
}

static char *
list_options (const HlBatchCommand *command)
{
  GString *list = g_string_new (NULL);
  for (guint i = 0; i < command->n_options; i++)
    g_string_append_printf (list, "%s--%s", i > 0 ? ", " : "", command->options[i].name);
  return g_string_free (list, FALSE);
}

static const HlBatchOption *
find_option (const HlBatchCommand *command, const char *name, gsize length, GError **error)
{
  for (guint i = 0; i < command->n_options; i++)
    if (strlen (command->options[i].name) == length && strncmp (command->options[i].name, name, length) == 0)
      return &command->options[i];
  g_autofree char *list = list_options (command);
  if (command->n_options == 0)
    g_set_error (error, HL_BATCH_ERROR, HL_BATCH_ERROR_USAGE, _("%s takes no option, but got --%.*s"),
                 command->name, (int) length, name);
  else
    g_set_error (error, HL_BATCH_ERROR, HL_BATCH_ERROR_USAGE, _("%s has no option --%.*s; it has %s"),
                 command->name, (int) length, name, list);
  return NULL;
}

/* Takes the option at argv[*i] with its values and moves *i to the last one. */
static gboolean
take_option (HlArguments *self, const HlBatchCommand *command, int argc, char **argv, int *i, GError **error)
{
  const char *name = argv[*i] + 2;
  char *value_start = strchr (argv[*i], '=');
  gsize length = value_start != NULL ? (gsize) (value_start - name) : strlen (name);
  const HlBatchOption *option = find_option (command, name, length, error);
  if (option == NULL)
    return FALSE;
  if (!option->is_repeatable)
    for (guint k = 0; k < self->given->len; k++)
      if (g_array_index (self->given, GivenOption, k).option == option)
        {
          g_set_error (error, HL_BATCH_ERROR, HL_BATCH_ERROR_USAGE, _("--%s is given twice"), option->name);
          return FALSE;
        }

  guint n_values = count_values (option), n = 0;
  if (value_start != NULL && n_values == 0)
    {
      g_set_error (error, HL_BATCH_ERROR, HL_BATCH_ERROR_USAGE, _("--%s takes no value"), option->name);
      return FALSE;
    }
  g_autofree char **values = g_new0 (char *, n_values + 1);
  if (value_start != NULL)
    values[n++] = value_start + 1;
  while (n < n_values && *i + 1 < argc)
    values[n++] = argv[++*i];
  if (n < n_values)
    {
      g_set_error (error, HL_BATCH_ERROR, HL_BATCH_ERROR_USAGE, _("--%s needs a value: --%s %s"), option->name,
                   option->name, _(option->values));
      return FALSE;
    }
  GivenOption given = { option, g_steal_pointer (&values), n_values };
  g_array_append_val (self->given, given);
  return TRUE;
}

HlArguments *
hl_arguments_parse (const HlBatchCommand *command, int argc, char **argv, GError **error)
{
  g_autoptr(HlArguments) self = g_new0 (HlArguments, 1);
  self->words = g_ptr_array_new ();
  self->given = g_array_new (FALSE, TRUE, sizeof (GivenOption));
  g_array_set_clear_func (self->given, given_option_clear);

  gboolean only_words = FALSE;
  for (int i = 0; i < argc; i++)
    {
      if (!only_words && strcmp (argv[i], "--") == 0)
        only_words = TRUE;
      else if (!only_words && g_str_has_prefix (argv[i], "--"))
        {
          if (!take_option (self, command, argc, argv, &i, error))
            return NULL;
        }
      else if (!only_words && argv[i][0] == '-' && argv[i][1] != '\0')
        {
          g_set_error (error, HL_BATCH_ERROR, HL_BATCH_ERROR_USAGE,
                       _("options are written in full with two hyphens; %s is not one"), argv[i]);
          return NULL;
        }
      else
        g_ptr_array_add (self->words, argv[i]);
    }

  g_autofree char *usage = hl_command_usage (command);
  if (self->words->len < command->least)
    g_set_error (error, HL_BATCH_ERROR, HL_BATCH_ERROR_USAGE, _("something is missing; the usage is: %s"), usage);
  else if (self->words->len > command->most)
    g_set_error (error, HL_BATCH_ERROR, HL_BATCH_ERROR_USAGE, _("“%s” is one word too many; the usage is: %s"),
                 (char *) self->words->pdata[command->most], usage);
  else
    return g_steal_pointer (&self);
  return NULL;
}

void
hl_arguments_free (HlArguments *self)
{
  g_ptr_array_unref (self->words);
  g_array_unref (self->given);
  g_free (self);
}

guint
hl_arguments_n_words (const HlArguments *self)
{
  return self->words->len;
}

const char *
hl_arguments_word (const HlArguments *self, guint n)
{
  return n < self->words->len ? self->words->pdata[n] : NULL;
}

char *const *
hl_arguments_option (const HlArguments *self, const char *name, guint n)
{
  for (guint i = 0; i < self->given->len; i++)
    {
      const GivenOption *given = &g_array_index (self->given, GivenOption, i);
      if (strcmp (given->option->name, name) == 0 && n-- == 0)
        return given->values;
    }
  return NULL;
}

const char *
hl_arguments_value (const HlArguments *self, const char *name)
{
  char *const *values = hl_arguments_option (self, name, 0);
  return values != NULL ? values[0] : NULL;
}

guint
hl_arguments_count_standard_output (const HlArguments *self, const char *const *names)
{
  guint n = 0;
  for (guint i = 0; i < self->given->len; i++)
    {
      const GivenOption *given = &g_array_index (self->given, GivenOption, i);
      if (g_strv_contains (names, given->option->name) && given->n_values > 0)
        n += strcmp (given->values[given->n_values - 1], "-") == 0;
    }
  return n;
}

char *
hl_command_usage (const HlBatchCommand *command)
{
  return g_strjoin (" ", "heatloom-batch", command->name, command->usage != NULL ? _(command->usage) : NULL, NULL);
}

HlExit
hl_complain (HlExit status, GError *error)
{
  fflush (stdout);
  fprintf (stderr, "heatloom-batch: %s\n", error->message);
  g_error_free (error);
  return status;
}
