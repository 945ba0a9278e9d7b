/* How a found value came about: its line of the calculation note, as text.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/note-private.h"
#include "engine/names.h"
#include "plant/i18n.h"

/* What else is solved in the same step, and where. */
static void
write_together (const HlSolution *solution, const HlNoteLine *line, GString *text)
{
  const HlStructure *s = solution->structure;
  if (line->n_together < 2)
    return;
  g_autofree char *where = hl_name_components (solution->model, s->equations + s->start[line->step - 1], (int) line->n_together);
  g_string_append_printf (text, _("\nSolved together with %d other quantities of %s."), (int) line->n_together - 1, where);
}

static char *
explain_input (const HlSolution *solution, const HlAddress *address)
{
  int var = hl_model_find_var (solution->model, address);
  if (var < 0 || !solution->numbers.is_known[solution->model->system->root[var]])
    return NULL;
  HlOrigin origin;
  g_autofree char *name = hl_plant_describe (solution->plant, address), *value = hl_name_value (solution->model, var);
  g_autofree char *source = hl_note_origin (solution, solution->model->system->root[var], &origin);
  return g_strdup_printf ("%s = %s\n%s", name, value, source);
}

char *
hl_solution_explain (const HlSolution *solution, const HlAddress *address)
{
  g_return_val_if_fail (solution != NULL && address != NULL, NULL);
  g_autoptr (HlNoteLine) line = hl_note_line_at (solution, address);
  if (line == NULL)
    return explain_input (solution, address);
  g_autofree char *name = hl_plant_describe (solution->plant, address);
  GString *text = g_string_new (NULL);
  g_string_append_printf (text, "%s = %s\n%s\n%s", name, line->terms[line->result].shown, line->words, line->numbers);
  hl_note_write_terms (line, text);
  g_string_append_printf (text, "\n%s: %s", _("Source"), line->source);
  if (line->properties != NULL)
    g_string_append_printf (text, "\n%s: %s", _("Properties"), line->properties);
  write_together (solution, line, text);
  return g_string_free (text, FALSE);
}
