/* heatloom-batch note: the calculation note of one plant.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include <stdio.h>
#include "batch/command.h"
#include "batch/json-text.h"
#include "batch/plant-input.h"
#include "batch/solve-output.h"
#include "draw/export.h"
#include "engine/note.h"
#include "plant/i18n.h"

static void
write_term (HlJsonText *json, const HlNoteTerm *term)
{
  g_autofree char *at = term->address.key[0] != '\0' ? hl_address_to_text (&term->address) : g_strdup ("");
  hl_json_text_begin (json, NULL, '{', TRUE);
  hl_json_text_string (json, "at", at);
  hl_json_text_string (json, "name", term->name);
  hl_json_text_number (json, "value", term->value);
  hl_json_text_string (json, "unit", hl_dimension_si_unit (term->dimension));
  hl_json_text_string (json, "shown", term->shown);
  hl_json_text_string (json, "origin", hl_origin_id (term->origin));
  hl_json_text_string (json, "source", term->source);
  hl_json_text_end (json);
}

static void
write_line (HlJsonText *json, const HlNoteLine *line)
{
  hl_json_text_begin (json, NULL, '{', FALSE);
  hl_json_text_number (json, "step", line->step);
  hl_json_text_number (json, "together", line->n_together);
  hl_json_text_string (json, "formula", line->formula);
  hl_json_text_number (json, "result", line->result);
  hl_json_text_string (json, "words", line->words);
  hl_json_text_string (json, "numbers", line->numbers);
  hl_json_text_string (json, "source", line->source);
  hl_json_text_string (json, "properties", line->properties != NULL ? line->properties : "");
  hl_json_text_begin (json, "terms", '[', FALSE);
  for (guint k = 0; k < line->n_terms; k++)
    write_term (json, &line->terms[k]);
  hl_json_text_end (json);
  hl_json_text_end (json);
}

static char *
note_json (const HlNote *note)
{
  HlJsonText *json = hl_json_text_new ();
  hl_json_text_begin (json, NULL, '{', FALSE);
  hl_json_text_begin (json, "inputs", '[', FALSE);
  for (guint k = 0; k < hl_note_n_inputs (note); k++)
    write_term (json, hl_note_input (note, k));
  hl_json_text_end (json);
  hl_json_text_begin (json, "lines", '[', FALSE);
  for (guint k = 0; k < hl_note_n_lines (note); k++)
    write_line (json, hl_note_line (note, k));
  hl_json_text_end (json);
  hl_json_text_end (json);
  return hl_json_text_finish (json);
}

static HlExit
run_note (const HlArguments *arguments)
{
  g_autoptr (GError) error = NULL;
  HlExit failure;
  g_autoptr (HlPlant) plant = hl_input_plant (arguments, NULL, NULL, &failure, &error);
  if (plant == NULL)
    return hl_complain (failure, g_steal_pointer (&error));
  g_autoptr (GArray) yielded = g_array_new (FALSE, FALSE, sizeof (HlYield));
  if (!hl_input_values (&plant, arguments, yielded, &error))
    return hl_complain (HL_EXIT_USAGE, g_steal_pointer (&error));
  g_autoptr (HlSolution) solution = hl_solve (plant, NULL);
  g_autoptr (HlNote) note = hl_note_new (solution);
  const char *json_path = hl_arguments_value (arguments, "json");
  g_autofree char *text = json_path != NULL ? note_json (note) : hl_note_to_text (note);
  if (!hl_export_text_file (text, json_path != NULL ? json_path : "-", &error))
    return hl_complain (HL_EXIT_FILE, g_steal_pointer (&error));
  hl_print_findings (stderr, solution, HL_GRADE_ERROR);
  return hl_solution_is_solved (solution) ? HL_EXIT_DONE : HL_EXIT_PLANT;
}

static const HlBatchOption note_options[] = {
  { "variant", N_("NAME"), FALSE, N_("take this variant of the plant instead of its base") },
  { "set", N_("ADDRESS=VALUE"), TRUE, N_("give a value, as 'T1.inlet.p=80 bar'; may be repeated") },
  { "json", N_("FILE"), FALSE, N_("write the note as JSON instead of text, in SI") },
};

const HlBatchCommand hl_command_note = {
  .name = "note",
  .usage = N_("PLANT [options]"),
  .summary = N_("print how every number was found: its equation, with numbers put in"),
  .details = N_("The numbers come in the order of solving. Behind each stand the values that it was made of and where they come from.\n"),
  .least = 1, .most = 1,
  .options = note_options, .n_options = G_N_ELEMENTS (note_options),
  .run = run_note,
};
