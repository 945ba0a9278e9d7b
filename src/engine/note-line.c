/* Single lines of the calculation note: the equation that found a number, its terms, and where each comes from.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/note-private.h"
#include "engine/names.h"
#include "plant/i18n.h"
#include <math.h>
#include <string.h>

void
hl_note_term_clear (HlNoteTerm *term)
{
  g_free (term->name);
  g_free (term->shown);
  g_free (term->source);
}

void
hl_note_line_free (HlNoteLine *line)
{
  if (line == NULL)
    return;
  for (guint k = 0; k < line->n_terms; k++)
    hl_note_term_clear (&line->terms[k]);
  g_free (line->terms);
  g_free (line->formula);
  g_free (line->words);
  g_free (line->numbers);
  g_free (line);
}

HlNoteLine *
hl_note_line_new (HlNoteKind kind, guint n_terms, guint result)
{
  HlNoteLine *line = g_new0 (HlNoteLine, 1);
  line->kind = kind;
  line->n_together = 1;
  line->n_terms = n_terms;
  line->result = result;
  line->terms = g_new0 (HlNoteTerm, n_terms);
  return line;
}

/* --- terms -------------------------------------------------------------------- */

char *
hl_note_origin (const HlSolution *solution, int root, HlOrigin *origin)
{
  HlSystem *system = solution->model->system;
  for (guint k = 0; k < system->specs->len; k++)
    {
      const HlSpec *spec = hl_system_spec (system, k);
      if (system->root[spec->var] != root || (spec->origin != HL_ORIGIN_TIED && system->fixed_by[root] != (int) k))
        continue;
      *origin = spec->origin;
      if (spec->address.key[0] == '\0')
        return g_strdup (_("constant"));
      const HlValue *value = hl_plant_value (solution->plant, &spec->address);
      if (spec->origin == HL_ORIGIN_TIED && value != NULL)
        {
          g_autofree char *tie = hl_tie_format (solution->plant, &spec->address, value);
          return g_strdup_printf (_("tied: =%s"), tie);
        }
      const HlQuantityKind *kind = hl_plant_quantity_kind (solution->plant, &spec->address);
      const HlComponent *owner = spec->address.owner == HL_OWNER_COMPONENT ? hl_plant_find_component (solution->plant, spec->address.id) : NULL;
      const char *source = kind != NULL ? hl_component_default_source (owner, kind) : NULL;
      if (spec->origin == HL_ORIGIN_ASSUMED && source != NULL)
        return g_strdup_printf (_("assumed; %s"), _(source));
      return g_strdup (hl_origin_name (spec->origin));
    }
  *origin = HL_ORIGIN_FOUND;
  return g_strdup (_("found"));
}

HlNoteTerm
hl_note_term_of_var (const HlSolution *solution, int var)
{
  const HlModel *model = solution->model;
  HlNoteTerm term = { .address = hl_name_address (model, var), .value = hl_system_value (model->system, var) };
  const HlQuantityKind *kind = hl_plant_quantity_kind (solution->plant, &term.address);
  term.dimension = kind != NULL ? kind->dimension : hl_name_dimension (hl_system_var (model->system, var)->kind);
  term.name = hl_name_var (model, var);
  term.shown = hl_name_value (model, var);
  term.source = hl_note_origin (solution, model->system->root[var], &term.origin);
  if (kind == NULL)
    term.address.key = g_intern_static_string ("");
  return term;
}

HlNoteTerm
hl_note_term_of_address (const HlSolution *solution, const HlAddress *address, double value)
{
  const HlQuantityKind *kind = hl_plant_quantity_kind (solution->plant, address);
  HlNoteTerm term = { .address = *address, .value = value, .origin = HL_ORIGIN_FOUND };
  term.dimension = kind != NULL ? kind->dimension : HL_DIMENSION_RATIO;
  term.name = hl_plant_describe (solution->plant, address);
  term.shown = kind != NULL ? hl_quantity_format (kind, value, hl_plant_units (solution->plant))
                            : hl_units_format (value, term.dimension, hl_plant_units (solution->plant));
  term.source = g_strdup (_("found"));
  return term;
}

/* {k} stands for term k. */
char *
hl_note_fill_in (const HlNoteLine *line, const char *pattern, gboolean with_numbers)
{
  GString *out = g_string_new (NULL);
  for (const char *at = pattern; *at != '\0'; at++)
    {
      char *end = NULL;
      guint64 k = *at == '{' ? g_ascii_strtoull (at + 1, &end, 10) : 0;
      if (end == NULL || *end != '}' || k >= line->n_terms)
        {
          g_string_append_c (out, *at);
          continue;
        }
      g_string_append (out, with_numbers ? line->terms[k].shown : line->terms[k].name);
      at = end;
    }
  return g_string_free (out, FALSE);
}

/* --- solved equations ----------------------------------------------------------- */

typedef struct {
  HlSystem *system;
  const int *equations, *vars;
  int       n, *of_equation;         /* [n] place of the variable that each equation finds; -1 */
  gboolean *is_seen;
} Pairing;

static gboolean
holds (const Pairing *p, int equation, int var)
{
  const HlEquation *e = hl_system_equation (p->system, p->equations[equation]);
  const int *vars = hl_equation_vars (p->system, e);
  for (int k = 0; k < e->n; k++)
    if (vars[k] == p->vars[var])
      return TRUE;
  return FALSE;
}

static gboolean
augment (Pairing *p, int var)
{
  for (int e = 0; e < p->n; e++)
    {
      if (p->is_seen[e] || !holds (p, e, var))
        continue;
      p->is_seen[e] = TRUE;
      if (p->of_equation[e] < 0 || augment (p, p->of_equation[e]))
        {
          p->of_equation[e] = var;
          return TRUE;
        }
    }
  return FALSE;
}

/* Equations that name what they compute find that; the others of a block take what is left. */
int *
hl_note_pair (HlSystem *system, const int *equations, const int *vars, int n)
{
  g_autofree int *place = g_new (int, n);
  g_autofree gboolean *is_seen = g_new0 (gboolean, n);
  int *found_by = g_new (int, n);
  Pairing p = { system, equations, vars, n, place, is_seen };
  for (int e = 0; e < n; e++)
    place[e] = -1;
  for (int v = 0; v < n; v++)
    {
      found_by[v] = -1;
      for (int e = 0; e < n && found_by[v] < 0; e++)
        {
          const HlEquation *equation = hl_system_equation (system, equations[e]);
          if (place[e] < 0 && equation->output >= 0 && hl_equation_vars (system, equation)[equation->output] == vars[v])
            place[e] = found_by[v] = v;
        }
    }
  for (int v = 0; v < n; v++)
    if (found_by[v] < 0)
      {
        memset (is_seen, 0, sizeof (gboolean) * (gsize) n);
        augment (&p, v);
      }
  for (int e = 0; e < n; e++)
    if (place[e] >= 0)
      found_by[place[e]] = e;
  return found_by;
}

/* Factors and quotients hold for absolute temperatures only. */
static void
show_in_kelvin (HlNoteTerm *term)
{
  if (term->dimension != HL_DIMENSION_TEMPERATURE)
    return;
  g_free (term->shown);
  term->shown = g_strdup_printf ("%.2f K", term->value);
}

/* A definition says of what: by the kinds of quantities that it relates, the most telling first. */
static const char *
source_of (const HlModel *model, const HlEquation *e)
{
  static const struct { HlVarKind kind; const char *source; } rows[] = {
    { HL_VAR_CONDUCTANCE, N_("heat = UA × mean temperature difference: textbooks of heat transfer, from memory") },
    { HL_VAR_HEAT_RATE, N_("definition of the heat rate: heat to the working fluid over generator output") },
    { HL_VAR_STEAM_RATE, N_("definition of the steam rate: live steam over gross power") },
    { HL_VAR_LENGTH, N_("difference of heights") },
    { HL_VAR_ENTHALPY, N_("conservation of energy") },
    { HL_VAR_PRESSURE, N_("definition of the pressure loss: a part of the pressure before it; of a rise: the difference") },
    { HL_VAR_TEMPERATURE_DIFFERENCE, N_("definition of the temperature difference") },
    { HL_VAR_RATIO, N_("definition of an efficiency or share: one flow, power or heat over another") },
    { HL_VAR_POWER, N_("sum of powers or heats") },
    { HL_VAR_FLOW, N_("conservation of mass") },
  };
  const char *source = hl_equation_source (e);
  if (!g_str_equal (source, "definition"))
    return source;
  for (guint k = 0; k < G_N_ELEMENTS (rows); k++)
    for (int i = 0; i < e->n; i++)
      if (hl_system_var (model->system, g_array_index (model->system->raw, int, e->first + i))->kind == rows[k].kind)
        return rows[k].source;
  return source;
}

HlNoteLine *
hl_note_line_of_equation (const HlSolution *solution, int equation, int root)
{
  const HlModel *model = solution->model;
  const HlEquation *e = hl_system_equation (model->system, equation);
  const int *vars = hl_equation_vars (model->system, e);
  HlNoteLine *line = hl_note_line_new (HL_NOTE_EQUATION, (guint) e->n, 0);
  for (int k = e->n - 1; k >= 0; k--)
    {
      line->terms[k] = hl_note_term_of_var (solution, g_array_index (model->system->raw, int, e->first + k));
      if (vars[k] == root)
        line->result = (guint) k;
    }
  if (e->output >= 0 && vars[e->output] == root)
    line->result = (guint) e->output;
  if (hl_equation_is_tie (e) && !hl_tie_is_level_free (e->tie))
    for (guint k = 0; k < line->n_terms; k++)
      show_in_kelvin (&line->terms[k]);
  g_autofree char *pattern = hl_name_template (model, equation, FALSE);
  line->formula = hl_name_template (model, equation, TRUE);
  line->words = hl_note_fill_in (line, pattern, FALSE);
  line->numbers = hl_note_fill_in (line, pattern, TRUE);
  line->source = _(source_of (model, e));
  line->fluid = e->fluid;
  line->other_fluid = e->other_fluid != NULL ? e->other_fluid : e->fluid;
  line->properties = e->fluid != NULL ? hl_fluid_formulation (e->fluid) : NULL;
  return line;
}

static HlNoteLine *
line_of_var (const HlSolution *solution, int root)
{
  const HlStructure *s = solution->structure;
  HlSystem *system = solution->model->system;
  if (system->fixed_by[root] >= 0 || !solution->numbers.is_known[root])
    return NULL;
  for (int k = 0; k < s->n_last; k++)
    {
      const HlEquation *e = hl_system_equation (system, s->last[k]);
      if (hl_equation_vars (system, e)[e->output] != root)
        continue;
      HlNoteLine *line = hl_note_line_of_equation (solution, s->last[k], root);
      line->step = (guint) (s->n_blocks + k) + 1;
      return line;
    }
  for (int k = 0; k < s->n_blocks; k++)
    for (int i = s->start[k]; i < s->start[k + 1]; i++)
      {
        if (s->vars[i] != root)
          continue;
        int first = s->start[k], n = s->start[k + 1] - first;
        g_autofree int *found_by = hl_note_pair (system, s->equations + first, s->vars + first, n);
        HlNoteLine *line = hl_note_line_of_equation (solution, s->equations[first + MAX (found_by[i - first], 0)], root);
        line->step = (guint) k + 1;
        line->n_together = (guint) n;
        return line;
      }
  return NULL;
}

/* --- states and results ---------------------------------------------------------- */

HlNoteLine *
hl_note_line_of_state (const HlSolution *solution, int node, char letter, const HlAddress *address)
{
  const HlNode *n = hl_model_node (solution->model, node);
  double value;
  if (!solution->states[node].has_state || strchr ("Tsvx", letter) == NULL || !hl_solution_value (solution, address, &value))
    return NULL;
  HlNoteLine *line = hl_note_line_new (HL_NOTE_STATE, 3, 0);
  line->terms[0] = hl_note_term_of_address (solution, address, value);
  line->terms[1] = hl_note_term_of_var (solution, n->p);
  line->terms[2] = hl_note_term_of_var (solution, n->h);
  line->formula = letter == 'x' ? g_strdup ("{0} = ({2} − h′({1})) ÷ (h″({1}) − h′({1}))") : g_strdup_printf ("{0} = %c({1}, {2})", letter);
  line->words = hl_note_fill_in (line, line->formula, FALSE);
  line->numbers = hl_note_fill_in (line, line->formula, TRUE);
  line->source = _("property of the medium");
  line->fluid = line->other_fluid = n->fluid;
  line->properties = hl_fluid_formulation (n->fluid);
  return line;
}

static HlNoteLine *
line_of_carnot (const HlSolution *solution, const HlAddress *address, double value)
{
  int ends[2];
  if (!hl_results_extremes (solution, &ends[0], &ends[1]))
    return NULL;
  HlNoteLine *line = hl_note_line_new (HL_NOTE_RESULT, 3, 0);
  line->terms[0] = hl_note_term_of_address (solution, address, value);
  for (int k = 0; k < 2; k++)
    {
      const HlNode *node = hl_model_node (solution->model, ends[k]);
      if (node->T >= 0)
        {
          line->terms[1 + k] = hl_note_term_of_var (solution, node->T);
          continue;
        }
      HlAddress T = hl_system_var (solution->model->system, node->h)->address;
      g_autofree char *key = g_strdup (T.key);
      key[strlen (key) - 1] = 'T';
      T.key = g_intern_string (key);
      line->terms[1 + k] = hl_note_term_of_address (solution, &T, solution->states[ends[k]].st.T);
    }
  for (int k = 1; k <= 2; k++)
    show_in_kelvin (&line->terms[k]);
  line->formula = g_strdup ("{0} = 1 − {1} ÷ {2}");
  line->source = _("Carnot: lowest and highest temperature of the working fluid");
  return line;
}

static HlNoteLine *
line_of_moisture (const HlSolution *solution, const HlAddress *address, double value)
{
  const HlModel *model = solution->model;
  g_autoptr (GArray) vars = g_array_new (FALSE, FALSE, sizeof (int));
  for (guint c = 0; c < hl_plant_n_components (solution->plant); c++)
    {
      int var = hl_model_own_var (model, (int) c, "exhaust_moisture");
      if (var >= 0 && solution->numbers.is_known[model->system->root[var]])
        g_array_append_val (vars, var);
    }
  HlNoteLine *line = hl_note_line_new (HL_NOTE_RESULT, vars->len + 1, 0);
  GString *formula = g_string_new ("{0} = max(");
  line->terms[0] = hl_note_term_of_address (solution, address, value);
  for (guint k = 1; k <= vars->len; k++)
    {
      line->terms[k] = hl_note_term_of_var (solution, g_array_index (vars, int, k - 1));
      g_string_append_printf (formula, k > 1 ? ", {%u}" : "{%u}", k);
    }
  line->formula = g_string_free (g_string_append_c (formula, ')'), FALSE);
  line->source = _("the wettest turbine exhaust");
  return line;
}

static HlNoteLine *
line_of_result (const HlSolution *solution, const HlAddress *address)
{
  double value;
  HlNoteLine *line = NULL;
  if (!hl_solution_value (solution, address, &value))
    return NULL;
  if (g_str_equal (address->key, "carnot_efficiency"))
    line = line_of_carnot (solution, address, value);
  else if (g_str_equal (address->key, "exhaust_moisture"))
    line = line_of_moisture (solution, address, value);
  if (line == NULL)
    return NULL;
  line->words = hl_note_fill_in (line, line->formula, FALSE);
  line->numbers = hl_note_fill_in (line, line->formula, TRUE);
  return line;
}

HlNoteLine *
hl_note_line_at (const HlSolution *solution, const HlAddress *address)
{
  int node = -1;
  char letter = '\0';
  int var = hl_model_find_var (solution->model, address);
  gboolean is_state = hl_model_find_state (solution->model, address, &node, &letter);
  if (var >= 0)
    {
      int root = solution->model->system->root[var];
      if (solution->numbers.is_known[root])
        return line_of_var (solution, root);
    }
  if (is_state && letter == 'e')
    return hl_note_line_of_stream_exergy (solution, node, address);
  if (is_state)
    return hl_note_line_of_state (solution, node, letter, address);
  if (g_str_has_prefix (address->key, "exergy_"))
    return hl_note_line_of_exergy (solution, address);
  return address->owner == HL_OWNER_PLANT ? line_of_result (solution, address) : NULL;
}
