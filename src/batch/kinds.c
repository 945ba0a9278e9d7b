/* heatloom-batch kinds: every component with its ports, options and quantities, as Markdown.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include <math.h>
#include <stdio.h>
#include <string.h>
#include "batch/command.h"
#include "plant/i18n.h"
#include "plant/kind.h"

/* "N" stands for the number of a repeated port or quantity: extraction1, extraction2 ... */
static void
print_key (const char *key)
{
  printf ("| `");
  for (const char *c = key; *c != '\0'; c++)
    putchar (*c == '#' ? 'N' : *c);
  printf ("` ");
}

/* A bar would end the cell. */
static void
print_cell (const char *text)
{
  printf ("| ");
  for (const char *c = text; *c != '\0'; c++)
    if (*c == '|')
      printf ("\\|");
    else
      putchar (*c == '\n' ? ' ' : *c);
  printf (*text != '\0' ? " " : "");
}

/* The choice that something needs to exist. */
static char *
choice_text (const HlKind *kind, const char *option, int choice)
{
  const char *const *choices = kind->options[hl_kind_find_option (kind, option)].choices;
  if (choice < 0)
    return g_strdup_printf (_("unless `%s` = %s"), option, choices[HL_UNLESS (choice)]);
  return g_strdup_printf (_("with `%s` = %s"), option, choices[choice]);
}

static void
print_ports (const HlKind *kind)
{
  if (kind->n_ports == 0)
    return;
  printf ("\n| %s | | %s | %s |\n|---|---|---|---|\n", _("Port"), _("Name"), _("Exists"));
  for (guint i = 0; i < kind->n_ports; i++)
    {
      const HlPortKind *port = &kind->ports[i];
      g_autofree char *exists = NULL;
      if (port->repeat != NULL)
        exists = g_strdup_printf (_("N = 1 to `%s`"), port->repeat);
      else if (port->when_option != NULL)
        exists = choice_text (kind, port->when_option, port->when_choice);
      g_autofree char *cell = g_strjoin (exists != NULL && port->is_optional ? ", " : "", exists != NULL ? exists : "",
                                         port->is_optional ? _("may stay open") : "", NULL);
      print_key (port->key);
      print_cell (port->direction == HL_PORT_IN ? _("in") : _("out"));
      print_cell (_(port->name));
      print_cell (cell);
      printf ("|\n");
    }
}

static void
print_options (const HlKind *kind)
{
  if (kind->n_options == 0)
    return;
  printf ("\n| %s | %s | %s | %s |\n|---|---|---|---|\n", _("Option"), _("Name"), _("Values"), _("Usual"));
  for (guint i = 0; i < kind->n_options; i++)
    {
      const HlOptionKind *option = &kind->options[i];
      g_autofree char *values = option->choices != NULL ? g_strjoinv (", ", (char **) option->choices)
                                                        : g_strdup_printf (_("%d to %d"), option->least, option->most);
      g_autofree char *usual = option->choices != NULL ? g_strdup (option->choices[option->usual])
                                                       : g_strdup_printf ("%d", option->usual);
      print_key (option->key);
      print_cell (_(option->name));
      print_cell (values);
      print_cell (usual);
      printf ("|\n");
    }
}

/* Defaults that follow an option: one after the other, each with its choice. */
static char *
choice_defaults_text (const HlKind *kind, const HlQuantityKind *quantity)
{
  const HlOptionKind *option = &kind->options[hl_kind_find_option (kind, quantity->default_option)];
  GString *text = g_string_new (NULL);
  for (int k = 0; k <= option->most; k++)
    {
      const HlChoiceDefault *chosen = &quantity->choice_defaults[k];
      if (chosen->source == NULL)
        continue;
      g_autofree char *value = hl_quantity_format (quantity, chosen->value, HL_UNITS_METRIC);
      g_string_append_printf (text, "; %s: %s (%s)", option->choices[k], value, _(chosen->source));
    }
  return g_string_free (text, FALSE);
}

static char *
default_text (const HlKind *kind, const HlQuantityKind *quantity)
{
  if (kind != NULL && quantity->default_option != NULL)
    {
      g_autofree char *first = default_text (NULL, quantity), *others = choice_defaults_text (kind, quantity);
      return g_strconcat (first, others, NULL);
    }
  if (!isfinite (quantity->default_value))
    return g_strdup ("");
  g_autofree char *value = hl_quantity_format (quantity, quantity->default_value, HL_UNITS_METRIC);
  if (quantity->default_source == NULL || *quantity->default_source == '\0')
    return g_steal_pointer (&value);
  return g_strdup_printf ("%s (%s)", value, _(quantity->default_source));
}

static char *
role_text (const HlQuantityKind *quantity)
{
  const char *words[4];
  guint n = 0;
  if ((quantity->flags & HL_QUANTITY_ASSUMED) != 0)
    words[n++] = _("assumed");
  if ((quantity->flags & HL_QUANTITY_USUAL) != 0)
    words[n++] = _("usually given");
  if ((quantity->flags & HL_QUANTITY_RESULT) != 0)
    words[n++] = _("result");
  words[n] = NULL;
  return g_strjoinv (", ", (char **) words);
}

static char *
range_text (const HlQuantityKind *quantity)
{
  if (!isfinite (quantity->credible_low) || !isfinite (quantity->credible_high))
    return g_strdup ("");
  g_autofree char *low = hl_quantity_format (quantity, quantity->credible_low, HL_UNITS_METRIC);
  g_autofree char *high = hl_quantity_format (quantity, quantity->credible_high, HL_UNITS_METRIC);
  return g_strdup_printf (_("%s to %s"), low, high);
}

/* When the quantity exists, and what it means. */
static char *
meaning_text (const HlKind *kind, const HlQuantityKind *quantity)
{
  g_autofree char *exists = NULL;
  if (quantity->repeat != NULL && quantity->repeat_extra > 0)
    exists = g_strdup_printf (_("N = 1 to `%s` + %d"), quantity->repeat, quantity->repeat_extra);
  else if (quantity->repeat != NULL)
    exists = g_strdup_printf (_("N = 1 to `%s`"), quantity->repeat);
  else if (quantity->when_option != NULL)
    exists = choice_text (kind, quantity->when_option, quantity->when_choice);
  const char *help = quantity->help != NULL && *quantity->help != '\0' ? _(quantity->help) : "";
  return g_strjoin (exists != NULL && *help != '\0' ? ": " : "", exists != NULL ? exists : "", help, NULL);
}

static void
print_quantities (const HlKind *kind, const HlQuantityKind *quantities, guint n)
{
  if (n == 0)
    return;
  printf ("\n| %s | %s | %s | %s | %s | %s | %s |\n|---|---|---|---|---|---|---|\n", _("Quantity"), _("Name"), _("SI unit"), _("Role"),
          _("Default"), _("Credible"), _("Meaning"));
  for (guint i = 0; i < n; i++)
    {
      const HlQuantityKind *quantity = &quantities[i];
      g_autofree char *role = role_text (quantity), *initial = default_text (kind, quantity);
      g_autofree char *range = range_text (quantity), *meaning = meaning_text (kind, quantity);
      print_key (quantity->key);
      print_cell (_(quantity->name));
      print_cell (hl_dimension_si_unit (quantity->dimension));
      print_cell (role);
      print_cell (initial);
      print_cell (range);
      print_cell (meaning);
      printf ("|\n");
    }
}

/* What keeps its value when the plant is rated at other conditions than it was designed for. */
static void
print_ratings (const HlKind *kind)
{
  if (kind->n_ratings == 0)
    return;
  printf ("\n| %s | %s |\n|---|---|\n", _("Frozen in rating"), _("Then found"));
  for (guint i = 0; i < kind->n_ratings; i++)
    {
      const HlRating *rating = &kind->ratings[i];
      g_autofree char *ahead = g_strdup_printf ("N+%d", rating->frozen_ahead);
      g_auto (GStrv) frozen = g_strsplit (rating->frozen, "#", 2), found = g_strsplit (rating->found, "#", 2);
      g_autofree char *frozen_key = g_strjoinv (rating->frozen_ahead > 0 ? ahead : "N", frozen), *found_key = g_strjoinv ("N", found);
      print_key (frozen_key);
      print_key (found_key);
      printf ("|\n");
    }
}

static void
print_kind (const HlKind *kind)
{
  printf ("\n## %s\n\n", _(kind->name));
  if (kind->help != NULL && *kind->help != '\0')
    printf ("%s ", _(kind->help));
  printf (_("Kind `%s`, letter %s."), kind->id, kind->letter);
  printf ("\n");
  print_ports (kind);
  print_options (kind);
  print_quantities (kind, kind->quantities, kind->n_quantities);
  print_ratings (kind);
}

static HlExit
run_kinds (const HlArguments *arguments G_GNUC_UNUSED)
{
  guint n;
  printf ("# %s\n\n", _("Components"));
  printf (_("What `heatloom-batch kinds` prints: every kind of component with its ports, options and quantities. Each port also\n"
            "has the state of its stream: `T1.inlet.p`, and likewise T, h, s, x, m, v. N is a number from 1. A value outside its credible\n"
            "range brings a hint.\n"));
  for (guint i = 0; i < hl_kind_count (); i++)
    print_kind (hl_kind_nth (i));
  printf ("\n## %s\n\n", _("Every component"));
  printf ("%s\n", _("Beside its own quantities each component has these, where what they count from is known. They are read from the finished solution and cannot be put in."));
  const HlQuantityKind *quantities = hl_common_quantities (&n);
  print_quantities (NULL, quantities, n);
  printf ("\n## %s\n\n", _("The plant as a whole"));
  printf ("%s\n", _("Addresses begin with `plant.`"));
  quantities = hl_plant_quantities (&n);
  print_quantities (NULL, quantities, n);
  printf ("\n## %s\n\n", _("Streams"));
  printf ("%s\n", _("Addresses are the stream's id and the key; a bare number is written `m:1` or `stream:1.m`."));
  quantities = hl_stream_quantities (&n);
  print_quantities (NULL, quantities, n);
  return HL_EXIT_DONE;
}

const HlBatchCommand hl_command_kinds = {
  .name = "kinds",
  .summary = N_("print every kind of component with its ports and quantities, as Markdown"),
  .least = 0, .most = 0,
  .run = run_kinds,
};
