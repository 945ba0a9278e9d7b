/* The calculation note: every found number of a solution with its equation, in the order of solving.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/note-private.h"
#include "engine/names.h"
#include "fluid/fluid-facts.h"
#include "plant/i18n.h"

struct _HlNote {
  HlSolution *solution;
  GArray     *inputs;       /* HlNoteTerm */
  GPtrArray  *lines;        /* HlNoteLine */
};

/* --- collecting ----------------------------------------------------------------- */

/* Values which somebody put in and which hold: one for each class of equal quantities. */
static void
add_inputs (HlNote *note)
{
  const HlSolution *solution = note->solution;
  HlSystem *system = solution->model->system;
  for (guint k = 0; k < system->specs->len; k++)
    {
      const HlSpec *spec = hl_system_spec (system, k);
      if (spec->origin == HL_ORIGIN_TIED || spec->address.key[0] == '\0' || system->fixed_by[system->root[spec->var]] != (int) k)
        continue;
      HlNoteTerm term = hl_note_term_of_var (solution, spec->var);
      term.address = spec->address;
      g_free (term.name);
      term.name = hl_plant_describe (solution->plant, &term.address);
      g_array_append_val (note->inputs, term);
    }
}

static void
add_solved (HlNote *note)
{
  const HlSolution *solution = note->solution;
  const HlStructure *s = solution->structure;
  HlSystem *system = solution->model->system;
  for (int k = 0; k < s->n_blocks; k++)
    {
      int first = s->start[k], n = s->start[k + 1] - first;
      g_autofree int *found_by = hl_note_pair (system, s->equations + first, s->vars + first, n);
      for (int i = 0; i < n; i++)
        {
          if (found_by[i] < 0 || !solution->numbers.is_known[s->vars[first + i]])
            continue;
          HlNoteLine *line = hl_note_line_of_equation (solution, s->equations[first + found_by[i]], s->vars[first + i]);
          line->step = (guint) k + 1;
          line->n_together = (guint) n;
          g_ptr_array_add (note->lines, line);
        }
    }
  for (int k = 0; k < s->n_last; k++)
    {
      const HlEquation *e = hl_system_equation (system, s->last[k]);
      int root = hl_equation_vars (system, e)[e->output];
      if (!solution->numbers.is_known[root])
        continue;
      HlNoteLine *line = hl_note_line_of_equation (solution, s->last[k], root);
      line->step = (guint) (s->n_blocks + k) + 1;
      g_ptr_array_add (note->lines, line);
    }
}

static void
add_line (HlNote *note, HlNoteLine *line, guint *step)
{
  if (line == NULL)
    return;
  line->step = ++*step;
  g_ptr_array_add (note->lines, line);
}

/* What no equation needed: properties of the streams, and results that look over all of them. */
static void
add_read (HlNote *note)
{
  const HlSolution *solution = note->solution;
  guint step = (guint) (solution->structure->n_blocks + solution->structure->n_last), n;
  for (guint i = 0; i < hl_plant_n_streams (solution->plant); i++)
    {
      static const char *const letters[] = { "T", "s", "v", "x", "e" };
      const HlNode *node = hl_model_node (solution->model, (int) i);
      const int vars[] = { node->T, node->s, node->v, node->x, -1 };
      for (guint k = 0; k < G_N_ELEMENTS (letters); k++)
        {
          HlAddress address = hl_address_stream (hl_plant_stream (solution->plant, i)->id, g_intern_static_string (letters[k]));
          if (vars[k] < 0)
            add_line (note, hl_note_line_at (solution, &address), &step);
        }
    }
  const HlQuantityKind *kinds = hl_common_quantities (&n);
  for (guint c = 0; c < hl_plant_n_components (solution->plant); c++)
    for (guint k = 0; k < n; k++)
      {
        HlAddress address = hl_address_component (hl_plant_component (solution->plant, c)->id, kinds[k].key);
        add_line (note, hl_note_line_at (solution, &address), &step);
      }
  kinds = hl_plant_quantities (&n);
  for (guint k = 0; k < n; k++)
    {
      HlAddress address = hl_address_plant (g_intern_string (kinds[k].key));
      if (hl_model_find_var (solution->model, &address) < 0)
        add_line (note, hl_note_line_at (solution, &address), &step);
    }
}

HlNote *
hl_note_new (const HlSolution *solution)
{
  g_return_val_if_fail (solution != NULL, NULL);
  HlNote *note = g_new0 (HlNote, 1);
  note->solution = hl_solution_ref ((HlSolution *) solution);
  note->inputs = g_array_new (FALSE, FALSE, sizeof (HlNoteTerm));
  g_array_set_clear_func (note->inputs, (GDestroyNotify) hl_note_term_clear);
  note->lines = g_ptr_array_new_with_free_func ((GDestroyNotify) hl_note_line_free);
  add_inputs (note);
  add_solved (note);
  add_read (note);
  return note;
}

void
hl_note_free (HlNote *note)
{
  if (note == NULL)
    return;
  g_array_unref (note->inputs);
  g_ptr_array_unref (note->lines);
  hl_solution_unref (note->solution);
  g_free (note);
}

guint
hl_note_n_inputs (const HlNote *note)
{
  return note->inputs->len;
}

const HlNoteTerm *
hl_note_input (const HlNote *note, guint n)
{
  g_return_val_if_fail (n < note->inputs->len, NULL);
  return &g_array_index (note->inputs, HlNoteTerm, n);
}

guint
hl_note_n_lines (const HlNote *note)
{
  return note->lines->len;
}

const HlNoteLine *
hl_note_line (const HlNote *note, guint n)
{
  g_return_val_if_fail (n < note->lines->len, NULL);
  return g_ptr_array_index (note->lines, n);
}

/* --- text ------------------------------------------------------------------------ */

void
hl_note_write_terms (const HlNoteLine *line, GString *text)
{
  for (guint k = 0; k < line->n_terms; k++)
    {
      const HlNoteTerm *term = &line->terms[k];
      gboolean is_seen = g_str_equal (term->name, line->terms[line->result].name);
      for (guint j = 0; j < k && !is_seen; j++)
        is_seen = g_str_equal (term->name, line->terms[j].name);
      if (!is_seen)
        g_string_append_printf (text, "\n  %s = %s  (%s)", term->name, term->shown, term->source);
    }
}

static void
write_line (const HlNoteLine *line, gboolean is_first, GString *text)
{
  const HlNoteTerm *result = &line->terms[line->result];
  g_string_append_printf (text, "\n%u. %s = %s\n  %s\n  %s", line->step, result->name, result->shown, line->words, line->numbers);
  if (line->kind != HL_NOTE_STATE)
    hl_note_write_terms (line, text);
  g_string_append_printf (text, "\n  [%s", line->source);
  if (line->properties != NULL)
    g_string_append_printf (text, "; %s", line->properties);
  g_string_append (text, "]\n");
  if (is_first && line->n_together > 1)
    g_string_append_printf (text, ngettext_hl ("  Solved together with the %u line that follows.\n", "  Solved together with the %u lines that follow.\n", line->n_together - 1),
                            line->n_together - 1);
}

/* State in which enthalpy and entropy are zero, or what they are there. */
static const char *
zero_words (const HlFluid *fluid)
{
  static const struct { const char *zero, *words; } rows[] = {
    { "NBP", N_("h = s = 0 for the saturated liquid at 1.01325 bar") },
    { "IIR", N_("h = 200 kJ/kg, s = 1 kJ/(kg K) for the saturated liquid at 0 °C") },
    { "ASHRAE", N_("h = s = 0 for the saturated liquid at −40 °C") },
  };
  HlFluidFacts facts;
  hl_fluid_facts (fluid, &facts);
  if (fluid == hl_fluid_water () || g_str_equal (hl_fluid_id (fluid), "water-95"))
    return _("u = s = 0 for the saturated liquid at the triple point");
  for (guint k = 0; k < G_N_ELEMENTS (rows); k++)
    if (g_strcmp0 (facts.zero, rows[k].zero) == 0)
      return _(rows[k].words);
  return _("zero of h and s as published");
}

/* Every medium with its equation and zero: enthalpies of two tables compare only where their zeros agree. */
static void
write_media (const HlSolution *solution, GString *text)
{
  const HlModel *model = solution->model;
  g_autoptr (GPtrArray) fluids = g_ptr_array_new ();
  for (guint i = 0; i < hl_plant_n_streams (solution->plant); i++)
    {
      const HlFluid *fluid = hl_model_node (model, (int) i)->fluid;
      if (g_ptr_array_find (fluids, fluid, NULL))
        continue;
      if (fluids->len == 0)
        g_string_append_printf (text, "\n%s\n", _("Media"));
      g_ptr_array_add (fluids, (gpointer) fluid);
      g_string_append_printf (text, "  %s: %s; %s\n", _(hl_fluid_name (fluid)), hl_fluid_formulation (fluid), zero_words (fluid));
    }
}

char *
hl_note_to_text (const HlNote *note)
{
  g_return_val_if_fail (note != NULL, NULL);
  GString *text = g_string_new (NULL);
  const char *title = hl_plant_title (note->solution->plant);
  g_autofree char *summary = hl_solution_summary (note->solution);
  g_string_append_printf (text, "%s%s%s\n%s\n", _("Calculation note"), *title != '\0' ? ": " : "", title, summary);
  write_media (note->solution, text);
  g_string_append_printf (text, "\n%s\n", _("Put in"));
  for (guint k = 0; k < note->inputs->len; k++)
    {
      const HlNoteTerm *term = hl_note_input (note, k);
      g_string_append_printf (text, "  %s = %s  (%s)\n", term->name, term->shown, term->source);
    }
  g_string_append_printf (text, "\n%s\n", _("Found, in the order of solving"));
  HlNoteKind last = HL_NOTE_EQUATION;
  guint step = 0;
  for (guint k = 0; k < note->lines->len; k++)
    {
      const HlNoteLine *line = hl_note_line (note, k);
      if (line->kind != last && line->kind == HL_NOTE_STATE)
        g_string_append_printf (text, "\n%s\n", _("States of the streams"));
      else if (line->kind != last)
        g_string_append_printf (text, "\n%s\n", _("Over all states"));
      write_line (line, line->step != step, text);
      last = line->kind;
      step = line->step;
    }
  return g_string_free (text, FALSE);
}
