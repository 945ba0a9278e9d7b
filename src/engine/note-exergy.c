/* Lines of the calculation note for the second law: exergy of streams, balances of components and of the plant.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/note-private.h"
#include "plant/i18n.h"
#include <math.h>
#include <string.h>

/* A line that grows: its terms, and its formula beside them. */
typedef struct {
  const HlSolution *solution;
  GArray           *terms;      /* HlNoteTerm */
  GString          *formula;
  const HlFluid    *fluid;      /* of water without a line; or NULL */
  int               dead_T;     /* place of the dead state's temperature among the terms; -1 */
} Writer;

static void
put (Writer *w, HlNoteTerm term)
{
  g_array_append_val (w->terms, term);
}

/* A number that no address reaches. */
static void
put_number (Writer *w, char *name, HlDimension dimension, double value, HlOrigin origin, const char *source)
{
  HlNoteTerm term = { .address = hl_address_plant (g_intern_static_string ("")), .name = name, .dimension = dimension, .value = value,
                      .origin = origin, .source = g_strdup (source) };
  /* Ratios of temperatures are those of absolute ones. */
  term.shown = dimension == HL_DIMENSION_TEMPERATURE ? g_strdup_printf ("%.2f K", value)
                                                     : hl_units_format (value, dimension, hl_plant_units (w->solution->plant));
  put (w, term);
}

static guint
dead_T (Writer *w)
{
  if (w->dead_T >= 0)
    return (guint) w->dead_T;
  w->dead_T = (int) w->terms->len;
  put_number (w, g_strdup (_("dead state temperature")), HL_DIMENSION_TEMPERATURE, w->solution->exergy->T0, HL_ORIGIN_GIVEN, hl_origin_name (HL_ORIGIN_GIVEN));
  return (guint) w->dead_T;
}

static void
put_dead_p (Writer *w)
{
  put_number (w, g_strdup (_("dead state pressure")), HL_DIMENSION_PRESSURE, w->solution->exergy->p0, HL_ORIGIN_GIVEN, hl_origin_name (HL_ORIGIN_GIVEN));
}

static void
put_state (Writer *w, int node, char letter, double value)
{
  HlAddress address = hl_system_var (w->solution->model->system, hl_model_node (w->solution->model, node)->h)->address;
  g_autofree char *key = g_strdup (address.key);
  key[strlen (key) - 1] = letter;
  address.key = g_intern_string (key);
  put (w, hl_note_term_of_address (w->solution, &address, value));
}

static HlNoteLine *
finish (Writer *w, HlNoteKind kind, const char *source)
{
  HlNoteLine *line = hl_note_line_new (kind, w->terms->len, 0);
  memcpy (line->terms, w->terms->data, sizeof (HlNoteTerm) * w->terms->len);
  g_array_unref (w->terms);
  line->formula = g_string_free (w->formula, FALSE);
  line->words = hl_note_fill_in (line, line->formula, FALSE);
  line->numbers = hl_note_fill_in (line, line->formula, TRUE);
  line->source = source;
  line->fluid = line->other_fluid = w->fluid;
  line->properties = w->fluid != NULL ? hl_fluid_formulation (w->fluid) : NULL;
  return line;
}

static Writer
begin (const HlSolution *solution, const HlAddress *address, double value)
{
  Writer w = { solution, g_array_new (FALSE, FALSE, sizeof (HlNoteTerm)), g_string_new ("{0} = "), NULL, -1 };
  put (&w, hl_note_term_of_address (solution, address, value));
  return w;
}

HlNoteLine *
hl_note_line_of_stream_exergy (const HlSolution *solution, int node, const HlAddress *address)
{
  const HlNode *n = hl_model_node (solution->model, node);
  const HlState *st = &solution->states[node].st;
  double e;
  if (!hl_solution_value (solution, address, &e))
    return NULL;
  Writer w = begin (solution, address, e);
  put (&w, hl_note_term_of_var (solution, n->h));
  put_state (&w, node, 's', st->s);
  put_dead_p (&w);
  guint T = dead_T (&w);
  g_string_append_printf (w.formula, "{1} − h({3}, {%u}) − {%u} × ({2} − s({3}, h({3}, {%u})))", T, T, T);
  w.fluid = n->fluid;
  return finish (&w, HL_NOTE_STATE, _("definition of physical flow exergy"));
}

/* --- a component -------------------------------------------------------------------- */

static void
put_flow (Writer *w, const HlExergyTerm *term, gboolean of_entropy)
{
  const HlSolution *solution = w->solution;
  const HlState *st = &solution->states[term->node].st;
  guint k = w->terms->len;
  double e = NAN;
  put (w, hl_note_term_of_var (solution, term->power));
  hl_exergy_of_state (solution, hl_model_node (solution->model, term->node)->fluid, st, &e);
  put_state (w, term->node, of_entropy ? 's' : 'e', of_entropy ? st->s : e);
  g_string_append_printf (w->formula, "{%u} × {%u}", k, k + 1);
}

/* Water without a line: by its pressure and enthalpy. */
static void
put_water (Writer *w, const HlExergyTerm *term, gboolean of_entropy)
{
  guint T = of_entropy ? 0 : dead_T (w), k = w->terms->len;
  w->fluid = term->fluid;
  put (w, hl_note_term_of_var (w->solution, term->power));
  put (w, hl_note_term_of_var (w->solution, term->p));
  put (w, hl_note_term_of_var (w->solution, term->h));
  if (of_entropy)
    {
      g_string_append_printf (w->formula, "{%u} × s({%u}, {%u})", k, k + 1, k + 2);
      return;
    }
  put_dead_p (w);
  g_string_append_printf (w->formula, "{%u} × ({%u} − h({%u}, {%u}) − {%u} × (s({%u}, {%u}) − s({%u}, h({%u}, {%u}))))", k, k + 2, k + 3, T, T, k + 1, k + 2,
                          k + 3, k + 3, T);
}

/* A temperature as it is meant in quotients: absolute.  Returns its words. */
static char *
put_temperature (Writer *w, const HlExergyT *t, double *T)
{
  const HlSystem *system = w->solution->model->system;
  guint k = w->terms->len;
  if (t->node >= 0)
    {
      *T = w->solution->states[t->node].st.T;
      put_state (w, t->node, 'T', *T);
    }
  else if (t->var >= 0)
    {
      *T = hl_system_value (system, t->var);
      put (w, hl_note_term_of_var (w->solution, t->var));
    }
  else
    {
      *T = t->constant;
      put_number (w, g_strdup (_("air temperature of the site")), HL_DIMENSION_TEMPERATURE, *T, HL_ORIGIN_GIVEN, hl_origin_name (HL_ORIGIN_GIVEN));
    }
  HlNoteTerm *term = &g_array_index (w->terms, HlNoteTerm, k);
  g_free (term->shown);
  term->shown = g_strdup_printf ("%.2f K", *T);
  if (t->plus < 0)
    return g_strdup_printf ("{%u}", k);
  put (w, hl_note_term_of_var (w->solution, t->plus));
  *T += hl_system_value (system, t->plus);
  return g_strdup_printf ("({%u} + {%u})", k, k + 1);
}

static void
put_heat (Writer *w, const HlExergyTerm *term, gboolean of_entropy)
{
  double a, b;
  guint T0 = of_entropy ? 0 : dead_T (w), k = w->terms->len;
  put (w, hl_note_term_of_var (w->solution, term->power));
  g_autofree char *first = put_temperature (w, &term->a, &a), *second = put_temperature (w, &term->b, &b), *mean = NULL;
  if (fabs (a - b) > 1e-4 * a)
    mean = g_strdup_printf ("((%s − %s) ÷ ln(%s ÷ %s))", first, second, first, second);
  else
    mean = g_strdup_printf ("((%s + %s) ÷ 2)", first, second);
  if (of_entropy)
    g_string_append_printf (w->formula, "{%u} ÷ %s", k, mean);
  else
    g_string_append_printf (w->formula, "{%u} × (1 − {%u} ÷ %s)", k, T0, mean);
}

static void
put_fuel (Writer *w, const HlExergyTerm *term, gboolean of_entropy)
{
  guint k = w->terms->len;
  put (w, hl_note_term_of_var (w->solution, term->power));
  if (term->ratio >= 0)
    put (w, hl_note_term_of_var (w->solution, term->ratio));
  else
    put_number (w, g_strdup (_("fuel exergy over heating value")), HL_DIMENSION_RATIO, term->ratio_value, HL_ORIGIN_ASSUMED, _("assumed; the usual value of its kind"));
  if (of_entropy)
    g_string_append_printf (w->formula, "{%u} × (1 − {%u}) ÷ {%u}", k, k + 1, dead_T (w));
  else
    g_string_append_printf (w->formula, "{%u} × {%u}", k, k + 1);
}

static void
put_term (Writer *w, const HlExergyTerm *term, double weight, gboolean of_entropy)
{
  gboolean is_first = g_str_has_suffix (w->formula->str, "= ") || g_str_has_suffix (w->formula->str, "(");
  g_string_append (w->formula, weight < 0.0 ? (is_first ? "0 − " : " − ") : is_first ? "" : " + ");
  if (term->form == HL_TERM_FLOW)
    put_flow (w, term, of_entropy);
  else if (term->form == HL_TERM_WATER)
    put_water (w, term, of_entropy);
  else if (term->form == HL_TERM_HEAT)
    put_heat (w, term, of_entropy);
  else if (term->form == HL_TERM_FUEL)
    put_fuel (w, term, of_entropy);
  else
    {
      if (of_entropy)
        g_string_append_printf (w->formula, "{%u} ÷ {%u}", w->terms->len, (guint) w->dead_T);
      else
        g_string_append_printf (w->formula, "{%u}", w->terms->len);
      put (w, hl_note_term_of_var (w->solution, term->power));
    }
}

static HlNoteLine *
line_of_ratio (const HlSolution *solution, const HlAddress *address, double value, const char *top, const char *bottom)
{
  Writer w = begin (solution, address, value);
  const char *keys[] = { top, bottom };
  for (guint k = 0; k < 2; k++)
    {
      HlAddress part = *address;
      double number = NAN;
      part.key = g_intern_string (keys[k]);
      hl_solution_value (solution, &part, &number);
      put (&w, hl_note_term_of_address (solution, &part, number));
    }
  g_string_append (w.formula, "{1} ÷ {2}");
  return finish (&w, HL_NOTE_RESULT, _("definition of exergy efficiency"));
}

static HlNoteLine *
line_of_component (const HlSolution *solution, guint component, const HlAddress *address, double value)
{
  const HlExergy *exergy = solution->exergy;
  gboolean of_entropy = g_str_equal (address->key, "exergy_destruction");
  guint n = 0;
  if (g_str_equal (address->key, "exergy_efficiency"))
    return line_of_ratio (solution, address, value, "exergy_product", "exergy_fuel");
  Writer w = begin (solution, address, value);
  if (of_entropy)
    g_string_append_printf (w.formula, "{%u} × (", dead_T (&w));
  for (guint k = exergy->first[component]; k < exergy->first[component + 1]; k++)
    {
      const HlExergyTerm *term = &g_array_index (exergy->terms, HlExergyTerm, k);
      double weight = of_entropy ? -term->sign : term->sign * hl_exergy_weight (solution, component, term, address->key);
      if (term->role == HL_ROLE_LEAK && !of_entropy)
        continue;
      /* Power carries no entropy. */
      if (of_entropy && term->form == HL_TERM_POWER && term->role != HL_ROLE_LEAK)
        continue;
      if (!(fabs (weight) > 0.0))
        continue;
      put_term (&w, term, weight, of_entropy);
      n++;
    }
  if (n == 0)
    g_string_append (w.formula, "0");
  if (of_entropy)
    g_string_append (w.formula, ")");
  return finish (&w, HL_NOTE_RESULT, of_entropy ? _("Gouy and Stodola: dead state temperature times entropy produced")
                                                : _(exergy->results[component].words));
}

/* --- the plant ------------------------------------------------------------------------ */

static void
join (Writer *w, const char *sign)
{
  g_string_append (w->formula, g_str_has_suffix (w->formula->str, "= ") ? (*sign == '-' ? "0 − " : "") : *sign == '-' ? " − " : " + ");
}

/* A number that has an address of its own. */
static gboolean
put_address (Writer *w, HlAddress address, double expected, double sign)
{
  double value;
  if (!hl_solution_value (w->solution, &address, &value) || !(fabs (value - sign * expected) <= 1e-9 * fabs (expected)))
    return FALSE;
  join (w, sign < 0.0 ? "-" : "+");
  g_string_append_printf (w->formula, "{%u}", w->terms->len);
  put (w, hl_note_term_of_address (w->solution, &address, value));
  return TRUE;
}

/* The terms at the doors of components that belong to a flow, one by one. */
static void
put_doors (Writer *w, const HlExergyFlow *flow, double sign)
{
  const HlExergy *exergy = w->solution->exergy;
  for (guint k = 0; k < exergy->terms->len; k++)
    {
      const HlExergyTerm *term = &g_array_index (exergy->terms, HlExergyTerm, k);
      if (hl_exergy_is_part (w->solution, k, flow))
        put_term (w, term, sign * term->sign, FALSE);
    }
}

static void
put_plant_flow (Writer *w, const HlExergyFlow *flow)
{
  static const char *const keys[] = {
    [HL_EXERGY_FUEL] = "exergy_fuel", [HL_EXERGY_HEAT] = "exergy_fuel", [HL_EXERGY_DESTRUCTION] = "exergy_destruction", [HL_EXERGY_LOSS] = "exergy_loss",
    [HL_EXERGY_DELIVERED] = "exergy_product", [HL_EXERGY_OTHER] = "other_consumption", [HL_EXERGY_NET] = "net_power", [HL_EXERGY_ELECTRICITY] = "net_power",
  };
  const char *key = (guint) flow->kind < G_N_ELEMENTS (keys) && keys[flow->kind] != NULL ? keys[flow->kind] : "";
  HlAddress address = flow->component < 0 ? hl_address_plant (g_intern_string (key))
    : hl_address_component (hl_plant_component (w->solution->plant, (guint) flow->component)->id, g_intern_string (key));
  if (put_address (w, address, flow->power, flow->kind == HL_EXERGY_ELECTRICITY ? -1.0 : 1.0))
    return;
  if (flow->component >= 0)
    {
      gboolean comes_in = hl_exergy_flow_counts ((int) flow->kind, "exergy_input");
      put_doors (w, flow, comes_in ? 1.0 : -1.0);
      return;
    }
  join (w, "+");
  g_string_append_printf (w->formula, "{%u}", w->terms->len);
  put_number (w, g_strdup (_("electricity taken")), HL_DIMENSION_POWER, flow->power, HL_ORIGIN_FOUND, hl_origin_name (HL_ORIGIN_FOUND));
}

static HlNoteLine *
line_of_plant (const HlSolution *solution, const HlAddress *address, double value)
{
  if (g_str_equal (address->key, "exergy_efficiency"))
    return line_of_ratio (solution, address, value, "exergy_product", "exergy_input");
  Writer w = begin (solution, address, value);
  for (guint k = 0; k < solution->exergy->flows->len; k++)
    {
      const HlExergyFlow *flow = &g_array_index (solution->exergy->flows, HlExergyFlow, k);
      if (hl_exergy_flow_counts ((int) flow->kind, address->key))
        put_plant_flow (&w, flow);
    }
  if (w.terms->len == 1)
    g_string_append (w.formula, "0");
  return finish (&w, HL_NOTE_RESULT, _("exergy balance over the doors of the plant and its components"));
}

HlNoteLine *
hl_note_line_of_exergy (const HlSolution *solution, const HlAddress *address)
{
  double value;
  if (!hl_solution_value (solution, address, &value))
    return NULL;
  if (address->owner == HL_OWNER_PLANT)
    return line_of_plant (solution, address, value);
  int component = hl_plant_component_index (solution->plant, address->id);
  return component >= 0 ? line_of_component (solution, (guint) component, address, value) : NULL;
}
