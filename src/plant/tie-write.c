/* Ties as text: for files, for entries, and as formulas with {k} for the quantities.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/tie-private.h"
#include "plant/units.h"
#include <math.h>

typedef struct {
  const HlTie *tie;
  HlTieStyle   style;
  HlUnitSet    units;
  GString     *out;
} Writer;

/* Where a number stands: among terms it takes the units of its neighbour, in a product it needs its own. */
typedef enum { TERM, FACTOR } Place;

static int
strength (HlTieOp op)
{
  switch (op)
    {
    case HL_TIE_ADD:
    case HL_TIE_SUBTRACT:
      return 1;
    case HL_TIE_MULTIPLY:
    case HL_TIE_DIVIDE:
      return 2;
    case HL_TIE_NEGATE:
      return 3;
    default:
      return 4;
    }
}

static gboolean
is_formula (const Writer *w)
{
  return w->style == HL_TIE_AS_FORMULA || w->style == HL_TIE_AS_WORDS;
}

static void
write_number (Writer *w, const HlTieStep *step, Place place)
{
  g_autofree char *number = NULL;
  gboolean is_plain = hl_base_is_none (hl_dimension_base (step->dimension));
  const char *minus = is_formula (w) && step->number < 0.0 ? "−" : step->number < 0.0 ? "-" : "";
  if (w->style == HL_TIE_AS_FORMULA)
    {
      g_string_append_printf (w->out, "%.17g", step->number);
      return;
    }
  if ((w->style == HL_TIE_AS_TYPED || w->style == HL_TIE_AS_WORDS) && step->dimension != HL_DIMENSION_RATIO && step->dimension != HL_DIMENSION_COUNT)
    number = step->dimension == HL_DIMENSION_TEMPERATURE ? hl_units_format_exact (step->number, step->dimension, w->units)
                                                         : hl_units_format_exact (fabs (step->number), step->dimension, w->units);
  else
    number = hl_number_to_text (fabs (step->number));
  if (step->dimension != HL_DIMENSION_TEMPERATURE || w->style == HL_TIE_AS_FILE)
    g_string_append (w->out, minus);
  g_string_append (w->out, number);
  if (w->style == HL_TIE_AS_FILE && place == FACTOR && !is_plain)
    g_string_append_printf (w->out, " %s", hl_dimension_si_unit (step->dimension));
}

static void write_step (Writer *w, guint n, int least, Place place);

static void
write_between (Writer *w, const HlTieStep *step, const char *plain, const char *formula)
{
  const guint *operands = w->tie->operands + step->first;
  gboolean is_sum = strength (step->op) == 1;
  Place place = is_sum ? TERM : FACTOR;
  write_step (w, operands[0], strength (step->op), place);
  if (is_formula (w))
    g_string_append_printf (w->out, " %s ", formula);
  else if (is_sum && w->style == HL_TIE_AS_TYPED)
    g_string_append_printf (w->out, " %s ", plain);
  else
    g_string_append (w->out, plain);
  write_step (w, operands[1], strength (step->op) + 1, place);
}

static void
write_call (Writer *w, const HlTieStep *step, const char *name)
{
  g_string_append_printf (w->out, "%s(", name);
  for (guint k = 0; k < step->n; k++)
    {
      if (k > 0)
        g_string_append (w->out, is_formula (w) ? ", " : w->style == HL_TIE_AS_TYPED ? "; " : ";");
      write_step (w, w->tie->operands[step->first + k], 0, step->op == HL_TIE_SQRT ? FACTOR : TERM);
    }
  g_string_append_c (w->out, ')');
}

static void
write_quantity (Writer *w, guint n)
{
  if (is_formula (w))
    {
      g_string_append_printf (w->out, "{%u}", n + 1);
      return;
    }
  g_autofree char *text = hl_address_to_text (&w->tie->of[n]);
  g_string_append (w->out, text);
}

static void
write_step (Writer *w, guint n, int least, Place place)
{
  const HlTieStep *step = &w->tie->steps[n];
  gboolean in_brackets = strength (step->op) < least;
  if (in_brackets)
    g_string_append_c (w->out, '(');
  switch (step->op)
    {
    case HL_TIE_NUMBER:
      write_number (w, step, place);
      break;
    case HL_TIE_QUANTITY:
      write_quantity (w, step->quantity);
      break;
    case HL_TIE_NEGATE:
      g_string_append (w->out, is_formula (w) ? "−" : "-");
      write_step (w, w->tie->operands[step->first], strength (step->op), FACTOR);
      break;
    case HL_TIE_ADD:
      write_between (w, step, "+", "+");
      break;
    case HL_TIE_SUBTRACT:
      write_between (w, step, "-", "−");
      break;
    case HL_TIE_MULTIPLY:
      write_between (w, step, "*", "×");
      break;
    case HL_TIE_DIVIDE:
      write_between (w, step, "/", "÷");
      break;
    case HL_TIE_MIN:
      write_call (w, step, "min");
      break;
    case HL_TIE_MAX:
      write_call (w, step, "max");
      break;
    case HL_TIE_SQRT:
      write_call (w, step, "sqrt");
      break;
    }
  if (in_brackets)
    g_string_append_c (w->out, ')');
}

char *
hl_tie_write (const HlTie *tie, HlTieStyle style, HlUnitSet units)
{
  Writer w = { tie, style, units, g_string_new (NULL) };
  write_step (&w, tie->n_steps - 1, 0, TERM);
  return g_string_free (w.out, FALSE);
}
