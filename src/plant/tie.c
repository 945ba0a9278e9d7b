/* Ties: a quantity as an expression of others, calculated step by step with exact derivatives.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/tie-private.h"
#include "plant/units.h"
#include <math.h>
#include <string.h>

/* --- building ------------------------------------------------------------------- */

void
hl_tie_draft_init (HlTieDraft *draft)
{
  draft->steps = g_array_new (FALSE, TRUE, sizeof (HlTieStep));
  draft->operands = g_array_new (FALSE, FALSE, sizeof (guint));
  draft->of = g_array_new (FALSE, FALSE, sizeof (HlAddress));
}

void
hl_tie_draft_clear (HlTieDraft *draft)
{
  g_clear_pointer (&draft->steps, g_array_unref);
  g_clear_pointer (&draft->operands, g_array_unref);
  g_clear_pointer (&draft->of, g_array_unref);
}

guint
hl_tie_draft_number (HlTieDraft *draft, double number, HlDimension dimension)
{
  HlTieStep step = { .op = HL_TIE_NUMBER, .number = number, .dimension = dimension };
  g_array_append_val (draft->steps, step);
  return draft->steps->len - 1;
}

guint
hl_tie_draft_quantity (HlTieDraft *draft, const HlAddress *of)
{
  HlTieStep step = { .op = HL_TIE_QUANTITY };
  while (step.quantity < draft->of->len && !hl_address_equal (of, &g_array_index (draft->of, HlAddress, step.quantity)))
    step.quantity++;
  if (step.quantity == draft->of->len)
    g_array_append_vals (draft->of, of, 1);
  g_array_append_val (draft->steps, step);
  return draft->steps->len - 1;
}

guint
hl_tie_draft_op (HlTieDraft *draft, HlTieOp op, const guint *operands, guint n)
{
  HlTieStep step = { .op = op, .n = n, .first = draft->operands->len };
  g_array_append_vals (draft->operands, operands, n);
  g_array_append_val (draft->steps, step);
  return draft->steps->len - 1;
}

/* Whether the steps' values are linear in all quantities together: 0 a number, 1 linear, 2 not. */
static gboolean
is_linear (const HlTie *tie)
{
  g_autofree guint8 *degree = g_new0 (guint8, tie->n_steps);
  for (guint i = 0; i < tie->n_steps; i++)
    {
      const HlTieStep *step = &tie->steps[i];
      guint a = step->n > 0 ? degree[tie->operands[step->first]] : 0, b = step->n > 1 ? degree[tie->operands[step->first + 1]] : 0;
      switch (step->op)
        {
        case HL_TIE_NUMBER: degree[i] = 0; break;
        case HL_TIE_QUANTITY: degree[i] = 1; break;
        case HL_TIE_NEGATE: degree[i] = (guint8) a; break;
        case HL_TIE_ADD:
        case HL_TIE_SUBTRACT: degree[i] = (guint8) MAX (a, b); break;
        case HL_TIE_MULTIPLY: degree[i] = (guint8) MIN (a + b, 2u); break;
        case HL_TIE_DIVIDE: degree[i] = (guint8) (b > 0 ? 2 : a); break;
        default: degree[i] = 2; break;
        }
    }
  return degree[tie->n_steps - 1] <= 1;
}

/* Everything that tells two ties apart: the text, and how each number is shown. */
static char *
identity (const HlTie *tie)
{
  GString *text = g_string_new (tie->text);
  g_string_append_c (text, '|');
  for (guint i = 0; i < tie->n_steps; i++)
    if (tie->steps[i].op == HL_TIE_NUMBER)
      g_string_append_printf (text, "%d,", (int) tie->steps[i].dimension);
  g_string_append_c (text, tie->is_level_free ? 'y' : 'n');
  return g_string_free (text, FALSE);
}

static void
free_tie (HlTie *tie)
{
  g_free (tie->steps);
  g_free (tie->operands);
  g_free (tie->of);
  g_free (tie->text);
  g_free (tie);
}

const HlTie *
hl_tie_intern (HlTieDraft *draft, gboolean is_level_free)
{
  static GMutex mutex;
  static GHashTable *known;
  HlTie *tie = g_new0 (HlTie, 1);
  tie->n_steps = draft->steps->len;
  tie->n_operands = draft->operands->len;
  tie->n_of = draft->of->len;
  tie->steps = (HlTieStep *) (void *) g_array_free (g_steal_pointer (&draft->steps), FALSE);
  tie->operands = (guint *) (void *) g_array_free (g_steal_pointer (&draft->operands), FALSE);
  tie->of = (HlAddress *) (void *) g_array_free (g_steal_pointer (&draft->of), FALSE);
  tie->is_linear = is_linear (tie);
  tie->is_level_free = is_level_free;
  tie->text = hl_tie_write (tie, HL_TIE_AS_FILE, HL_UNITS_SI);
  char *key = identity (tie);
  g_mutex_lock (&mutex);
  if (known == NULL)
    known = g_hash_table_new (g_str_hash, g_str_equal);
  HlTie *same = g_hash_table_lookup (known, key);
  if (same == NULL)
    {
      g_hash_table_insert (known, key, tie);
      g_mutex_unlock (&mutex);
      return tie;
    }
  g_mutex_unlock (&mutex);
  g_free (key);
  free_tie (tie);
  return same;
}

const HlTie *
hl_tie_linear (const HlAddress *of, double factor, double offset)
{
  HlTieDraft draft;
  g_return_val_if_fail (of != NULL, NULL);
  hl_tie_draft_init (&draft);
  guint at = hl_tie_draft_quantity (&draft, of);
  if (factor < 1.0 || factor > 1.0)
    {
      guint by = hl_tie_draft_number (&draft, factor, HL_DIMENSION_RATIO);
      at = hl_tie_draft_op (&draft, HL_TIE_MULTIPLY, (const guint[]) { by, at }, 2);
    }
  if (fabs (offset) > 0.0)
    {
      guint by = hl_tie_draft_number (&draft, fabs (offset), HL_DIMENSION_RATIO);
      hl_tie_draft_op (&draft, offset > 0.0 ? HL_TIE_ADD : HL_TIE_SUBTRACT, (const guint[]) { at, by }, 2);
    }
  return hl_tie_intern (&draft, FALSE);
}

const HlTie *
hl_tie_mapped (const HlTie *tie, HlTieMap map, gpointer data)
{
  HlTieDraft draft;
  gboolean is_changed = FALSE;
  g_return_val_if_fail (tie != NULL && map != NULL, NULL);
  g_autofree HlAddress *of = g_memdup2 (tie->of, tie->n_of * sizeof (HlAddress));
  for (guint k = 0; k < tie->n_of; k++)
    {
      map (&of[k], data);
      is_changed |= !hl_address_equal (&of[k], &tie->of[k]);
    }
  if (!is_changed)
    return tie;
  hl_tie_draft_init (&draft);
  for (guint i = 0; i < tie->n_steps; i++)
    {
      const HlTieStep *step = &tie->steps[i];
      if (step->op == HL_TIE_QUANTITY)
        hl_tie_draft_quantity (&draft, &of[step->quantity]);
      else if (step->op == HL_TIE_NUMBER)
        hl_tie_draft_number (&draft, step->number, step->dimension);
      else
        hl_tie_draft_op (&draft, step->op, tie->operands + step->first, step->n);
    }
  return hl_tie_intern (&draft, tie->is_level_free);
}

/* --- reading -------------------------------------------------------------------- */

guint
hl_tie_n_of (const HlTie *tie)
{
  return tie->n_of;
}

const HlAddress *
hl_tie_of (const HlTie *tie, guint n)
{
  g_return_val_if_fail (n < tie->n_of, NULL);
  return &tie->of[n];
}

gboolean
hl_tie_is_linear (const HlTie *tie)
{
  return tie->is_linear;
}

gboolean
hl_tie_is_level_free (const HlTie *tie)
{
  return tie->is_level_free;
}

char *
hl_tie_formula (const HlTie *tie, gboolean in_si, HlUnitSet units)
{
  g_return_val_if_fail (tie != NULL, NULL);
  return hl_tie_write (tie, in_si ? HL_TIE_AS_FORMULA : HL_TIE_AS_WORDS, units);
}

/* --- calculating ---------------------------------------------------------------- */

/* Which operand decides a minimum or maximum; of equals the first. */
static guint
chosen (const HlTie *tie, const HlTieStep *step, const double *values)
{
  guint best = tie->operands[step->first];
  for (guint k = 1; k < step->n; k++)
    {
      guint other = tie->operands[step->first + k];
      if (step->op == HL_TIE_MIN ? values[other] < values[best] : values[other] > values[best])
        best = other;
    }
  return best;
}

static void
calculate (const HlTie *tie, const double *of, double *values)
{
  for (guint i = 0; i < tie->n_steps; i++)
    {
      const HlTieStep *step = &tie->steps[i];
      const guint *operands = tie->operands + step->first;
      switch (step->op)
        {
        case HL_TIE_NUMBER: values[i] = step->number; break;
        case HL_TIE_QUANTITY: values[i] = of[step->quantity]; break;
        case HL_TIE_NEGATE: values[i] = -values[operands[0]]; break;
        case HL_TIE_ADD: values[i] = values[operands[0]] + values[operands[1]]; break;
        case HL_TIE_SUBTRACT: values[i] = values[operands[0]] - values[operands[1]]; break;
        case HL_TIE_MULTIPLY: values[i] = values[operands[0]] * values[operands[1]]; break;
        case HL_TIE_DIVIDE: values[i] = values[operands[0]] / values[operands[1]]; break;
        case HL_TIE_MIN:
        case HL_TIE_MAX: values[i] = values[chosen (tie, step, values)]; break;
        case HL_TIE_SQRT: values[i] = sqrt (values[operands[0]]); break;
        }
    }
}

/* What the result owes to each step, from the last backwards. */
static void
differentiate (const HlTie *tie, const double *values, double *owed, double *derivatives)
{
  for (guint k = 0; k < tie->n_of; k++)
    derivatives[k] = 0.0;
  for (guint i = 0; i < tie->n_steps; i++)
    owed[i] = i + 1 == tie->n_steps ? 1.0 : 0.0;
  for (guint i = tie->n_steps; i-- > 0;)
    {
      const HlTieStep *step = &tie->steps[i];
      const guint *operands = tie->operands + step->first;
      switch (step->op)
        {
        case HL_TIE_NUMBER:
          break;
        case HL_TIE_QUANTITY:
          derivatives[step->quantity] += owed[i];
          break;
        case HL_TIE_NEGATE:
          owed[operands[0]] -= owed[i];
          break;
        case HL_TIE_ADD:
          owed[operands[0]] += owed[i];
          owed[operands[1]] += owed[i];
          break;
        case HL_TIE_SUBTRACT:
          owed[operands[0]] += owed[i];
          owed[operands[1]] -= owed[i];
          break;
        case HL_TIE_MULTIPLY:
          owed[operands[0]] += owed[i] * values[operands[1]];
          owed[operands[1]] += owed[i] * values[operands[0]];
          break;
        case HL_TIE_DIVIDE:
          owed[operands[0]] += owed[i] / values[operands[1]];
          owed[operands[1]] -= owed[i] * values[i] / values[operands[1]];
          break;
        case HL_TIE_MIN:
        case HL_TIE_MAX:
          owed[chosen (tie, step, values)] += owed[i];
          break;
        case HL_TIE_SQRT:
          owed[operands[0]] += owed[i] * 0.5 / values[i];
          break;
        }
    }
}

gboolean
hl_tie_evaluate (const HlTie *tie, const double *of, double *value, double *derivatives)
{
  double values[HL_TIE_MOST_STEPS], owed[HL_TIE_MOST_STEPS];
  calculate (tie, of, values);
  *value = values[tie->n_steps - 1];
  if (!isfinite (*value))
    return FALSE;
  if (derivatives == NULL)
    return TRUE;
  differentiate (tie, values, owed, derivatives);
  for (guint k = 0; k < tie->n_of; k++)
    if (!isfinite (derivatives[k]))
      return FALSE;
  return TRUE;
}
