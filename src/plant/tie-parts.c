/* Parts of an expression while it is read: their dimensions, their units, and what a °C means in its company.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/tie-parts.h"
#include "plant/i18n.h"
#include <math.h>

gpointer
hl_tie_refuse (Parser *parser, const char *format, ...)
{
  g_autofree char *why = NULL;
  va_list arguments;
  va_start (arguments, format);
  why = g_strdup_vprintf (format, arguments);
  va_end (arguments);
  g_set_error (parser->error, HL_PLANT_ERROR, HL_PLANT_ERROR_CONTENT, _("“=%s”: %s"), parser->text, why);
  return NULL;
}

void
hl_part_free (gpointer data)
{
  Part *part = data;
  g_free (part->operands);
  g_free (part);
}

Part *
hl_part_new (Parser *parser, HlTieOp op, Part *const *operands, guint n)
{
  Part *part = g_new0 (Part, 1);
  part->op = op;
  part->n = n;
  part->operands = n > 0 ? g_memdup2 (operands, n * sizeof *operands) : NULL;
  part->is_constant = op != HL_TIE_QUANTITY;
  part->weight = NAN;
  for (guint k = 0; k < n; k++)
    {
      part->is_constant &= operands[k]->is_constant;
      part->is_unknown |= operands[k]->is_unknown;
    }
  g_ptr_array_add (parser->parts, part);
  return part;
}

static gboolean
has_datum (const Part *part)
{
  return fabs (part->datum) > 0.0;
}

static gboolean
is_temperature (HlBaseUnits base)
{
  return hl_base_equal (base, hl_dimension_base (HL_DIMENSION_TEMPERATURE));
}

static gboolean
is_one (double weight)
{
  return fabs (weight - 1.0) < 1e-9;
}

static gboolean
is_none (double weight)
{
  return fabs (weight) < 1e-9;
}

/* --- numbers in company --------------------------------------------------------- */

static void
read_as_difference (Part *part)
{
  part->datum = 0.0;
  part->weight = 0.0;
  if (part->dimension == HL_DIMENSION_TEMPERATURE)
    part->dimension = HL_DIMENSION_TEMPERATURE_DIFFERENCE;
  if (part->dimension == HL_DIMENSION_PRESSURE)
    part->dimension = HL_DIMENSION_PRESSURE_DIFFERENCE;
}

/* The number as such, with its datum: "60 °C" is 333.15 K. */
static void
read_as_level (Part *part)
{
  part->number = hl_add_exactly (part->number, part->datum);
  part->datum = 0.0;
  part->weight = 1.0;
}

/* A bare number beside something takes the plant's unit for that, with its datum; in a file it is SI. */
static Part *
give_unit (Parser *parser, Part *part, const Part *company)
{
  HlUnitSet set = hl_plant_units (parser->plant);
  HlDimension dimension = company->dimension;
  if (!part->is_bare || company->is_bare)
    return part;
  if (dimension == HL_N_DIMENSIONS)
    {
      g_autofree char *name = hl_base_name (company->base);
      return hl_tie_refuse (parser, _("a number without unit cannot be added to a %s"), name);
    }
  part->is_bare = FALSE;
  part->dimension = dimension;
  part->base = company->base;
  if (parser->is_file)
    return part;
  double shown = part->number, zero = hl_units_from_display (0.0, dimension, set);
  part->datum = dimension == HL_DIMENSION_TEMPERATURE ? zero : 0.0;
  part->number = dimension == HL_DIMENSION_TEMPERATURE ? hl_units_from_display (shown, HL_DIMENSION_TEMPERATURE_DIFFERENCE, set)
                                                       : hl_units_from_display (shown, dimension, set);
  if (has_datum (part))
    part->unit = hl_unit_find (hl_units_label (dimension, set), strlen (hl_units_label (dimension, set)), dimension, &(const HlUnit *) { NULL });
  return part;
}

/* Whether a °C in a sum is a temperature or a difference: see what it is added to.  FALSE with error where that is open. */
static gboolean
settle_number (Parser *parser, Part *number, const Part *company, gboolean is_right, gboolean is_subtraction)
{
  gboolean wants_difference = hl_dimension_is_difference (parser->dimension), is_level;
  if (number->unit != NULL && number->unit->nature == HL_UNIT_GAUGE)
    return hl_tie_refuse (parser, _("%s counts from the ambient pressure and cannot be added; write the difference in bar, kPa or psi"), number->unit->text) != NULL;
  if (!is_temperature (number->base))
    {
      read_as_difference (number);
      return TRUE;
    }
  if (is_one (company->weight))
    is_level = is_subtraction && (!is_right || wants_difference);
  else if (is_none (company->weight) && is_right && !is_subtraction && has_datum (number) && !wants_difference)
    return hl_tie_refuse (parser, _("write the temperature first, and then what is added to it")) != NULL;
  else if (is_none (company->weight))
    is_level = !is_right && !wants_difference;
  else if (has_datum (number))
    return hl_tie_refuse (parser, _("it cannot be said whether %s is a temperature or a difference here; write it in K"), number->unit->text) != NULL;
  else
    is_level = FALSE;
  if (!is_level)
    {
      read_as_difference (number);
      return TRUE;
    }
  read_as_level (number);
  number->dimension = HL_DIMENSION_TEMPERATURE;
  return TRUE;
}

/* --- operations ------------------------------------------------------------------ */

#define NO_SCALING N_("a temperature in °C or °F, or a gauge pressure, cannot be negated or multiplied; write it in K or as absolute pressure")

/* A sum with a number in °C or barg has a meaning of its own, but none when multiplied. */
static const HlUnit *
datum_unit (const Part *part)
{
  return part->unit != NULL && (part->unit->nature == HL_UNIT_GAUGE || fabs (part->unit->offset) > 0.0) ? part->unit : NULL;
}

/* What carries a datum is no quantity that could be multiplied; a difference does not carry one. */
static gboolean
may_scale (Parser *parser, Part *part)
{
  if (part->op == HL_TIE_NUMBER && hl_dimension_is_difference (parser->dimension) && is_temperature (part->base))
    read_as_difference (part);
  else if (part->unit != NULL && (part->op != HL_TIE_NUMBER || has_datum (part)))
    return hl_tie_refuse (parser, "%s", _(NO_SCALING)) != NULL;
  return TRUE;
}

static Part *
not_too_large (Parser *parser, Part *part)
{
  if (part->op == HL_TIE_NUMBER && !isfinite (part->number))
    return hl_tie_refuse (parser, _("a number in it grows too large"));
  return part;
}

Part *
hl_part_negate (Parser *parser, Part *part)
{
  if (!may_scale (parser, part))
    return NULL;
  if (part->op == HL_TIE_NUMBER)
    {
      part->number = -part->number;
      return part;
    }
  Part *result = hl_part_new (parser, HL_TIE_NEGATE, &part, 1);
  result->base = part->base;
  result->dimension = part->dimension;
  result->weight = -part->weight;
  return result;
}

/* Two constants: one is kept as the sum, its datum and its unit stay. */
static Part *
add_numbers (Parser *parser, Part *left, Part *right, gboolean subtract)
{
  if (right->unit != NULL && right->unit->nature == HL_UNIT_GAUGE)
    return hl_tie_refuse (parser, _("%s counts from the ambient pressure and cannot be added; write the difference in bar, kPa or psi"), right->unit->text);
  if (has_datum (right) && !has_datum (left) && !hl_dimension_is_difference (parser->dimension))
    return hl_tie_refuse (parser, _("write the temperature first, and then what is added to it"));
  left->number += subtract ? -right->number : right->number;
  return not_too_large (parser, left);
}

Part *
hl_part_add (Parser *parser, Part *left, Part *right, gboolean subtract)
{
  if (give_unit (parser, left, right) == NULL || give_unit (parser, right, left) == NULL)
    return NULL;
  if (!hl_base_equal (left->base, right->base) && !left->is_unknown && !right->is_unknown)
    {
      g_autofree char *one = hl_base_name (left->base), *other = hl_base_name (right->base);
      return hl_tie_refuse (parser, subtract ? _("a %2$s cannot be subtracted from a %1$s; both must be of one kind") : _("a %1$s and a %2$s cannot be added; both must be of one kind"),
                     one, other);
    }
  if (left->op == HL_TIE_NUMBER && right->op == HL_TIE_NUMBER)
    return add_numbers (parser, left, right, subtract);
  if (left->op == HL_TIE_NUMBER && !settle_number (parser, left, right, FALSE, subtract))
    return NULL;
  if (right->op == HL_TIE_NUMBER && !settle_number (parser, right, left, TRUE, subtract))
    return NULL;
  if (right->op == HL_TIE_NUMBER && right->number < 0.0 && right->dimension != HL_DIMENSION_TEMPERATURE)
    {
      right->number = -right->number;
      subtract = !subtract;
    }
  Part *result = hl_part_new (parser, subtract ? HL_TIE_SUBTRACT : HL_TIE_ADD, (Part *[]) { left, right }, 2);
  const Part *known = left->is_unknown ? right : left;
  result->base = known->base;
  result->dimension = left->op == HL_TIE_NUMBER ? right->dimension : left->dimension;
  result->weight = left->weight + (subtract ? -right->weight : right->weight);
  result->unit = datum_unit (left) != NULL ? left->unit : datum_unit (right);
  return result;
}

static Part *
multiply_numbers (Parser *parser, Part *left, Part *right, gboolean divide)
{
  gboolean is_left_plain = hl_base_is_none (left->base);
  HlBaseUnits base = hl_base_product (left->base, right->base, divide ? -1 : 1);
  HlDimension dimension = hl_dimension_of_base (base);
  if (dimension == HL_N_DIMENSIONS)
    return NULL;
  left->number = divide ? left->number / right->number : left->number * right->number;
  if (is_left_plain && !divide)
    {
      left->unit = right->unit;
      left->datum = right->datum;
      left->dimension = right->dimension;
    }
  else if (!hl_base_is_none (right->base))
    left->dimension = dimension;
  left->base = base;
  left->is_bare &= right->is_bare;
  return not_too_large (parser, left);
}

Part *
hl_part_multiply (Parser *parser, Part *left, Part *right, gboolean divide)
{
  gboolean is_left_one = left->is_bare && is_one (left->number), is_right_one = right->is_bare && is_one (right->number);
  if (divide && right->op == HL_TIE_NUMBER && fabs (right->number) < G_MINDOUBLE)
    return hl_tie_refuse (parser, _("division by zero"));
  if ((!(is_left_one && !divide) && !may_scale (parser, right)) || (!is_right_one && !may_scale (parser, left)))
    return NULL;
  if (left->op == HL_TIE_NUMBER && right->op == HL_TIE_NUMBER)
    {
      Part *number = multiply_numbers (parser, left, right, divide);
      if (number != NULL || (parser->error != NULL && *parser->error != NULL))
        return number;
    }
  else if ((left->op == HL_TIE_NUMBER && is_none (left->number) && !right->is_constant) || (right->op == HL_TIE_NUMBER && is_none (right->number) && !left->is_constant))
    return hl_tie_refuse (parser, _("a factor of 0 leaves nothing of what it multiplies; give the number instead"));
  Part *result = hl_part_new (parser, divide ? HL_TIE_DIVIDE : HL_TIE_MULTIPLY, (Part *[]) { left, right }, 2);
  result->base = hl_base_product (left->base, right->base, divide ? -1 : 1);
  result->dimension = hl_base_is_none (right->base) ? left->dimension : hl_base_is_none (left->base) && !divide ? right->dimension
                                                                                                                 : hl_dimension_of_base (result->base);
  if (right->op == HL_TIE_NUMBER && hl_base_is_none (right->base))
    result->weight = divide ? left->weight / right->number : left->weight * right->number;
  else if (left->op == HL_TIE_NUMBER && hl_base_is_none (left->base) && !divide)
    result->weight = left->number * right->weight;
  return result;
}

/* --- functions -------------------------------------------------------------------- */

Part *
hl_part_root (Parser *parser, Part *part)
{
  HlBaseUnits base;
  if (!may_scale (parser, part))
    return NULL;
  if (!hl_base_root (part->base, &base))
    return hl_tie_refuse (parser, _("that root has no unit; the root of a pressure times a pressure has one"));
  if (part->op == HL_TIE_NUMBER && part->number < 0.0)
    return hl_tie_refuse (parser, _("a number below zero has no root"));
  Part *result = hl_part_new (parser, HL_TIE_SQRT, &part, 1);
  result->base = base;
  result->dimension = hl_dimension_of_base (base);
  return result;
}

Part *
hl_part_extreme (Parser *parser, HlTieOp op, Part **list, guint n)
{
  Part *company = NULL;
  for (guint k = 0; k < n; k++)
    if (company == NULL || company->is_bare || (company->is_constant && !list[k]->is_constant))
      company = list[k];
  if (company->is_bare && !parser->is_file)
    {
      Part wanted = { .dimension = parser->dimension, .base = hl_dimension_base (parser->dimension) };
      for (guint k = 0; k < n; k++)
        if (give_unit (parser, list[k], &wanted) == NULL)
          return NULL;
    }
  for (guint k = 0; k < n; k++)
    {
      if (give_unit (parser, list[k], company) == NULL)
        return NULL;
      if (!hl_base_equal (list[k]->base, company->base) && !list[k]->is_unknown && !company->is_unknown)
        {
          g_autofree char *one = hl_base_name (company->base), *other = hl_base_name (list[k]->base);
          return hl_tie_refuse (parser, _("a %s and a %s cannot be compared; all must be of one kind"), one, other);
        }
      if (list[k]->op == HL_TIE_NUMBER && (company->is_constant ? hl_dimension_is_difference (parser->dimension) : is_none (company->weight) && is_temperature (company->base)))
        read_as_difference (list[k]);
      else if (list[k]->op == HL_TIE_NUMBER)
        read_as_level (list[k]);
    }
  Part *result = hl_part_new (parser, op, list, n);
  result->base = company->base;
  result->dimension = company->dimension;
  result->weight = list[0]->weight;
  for (guint k = 1; k < n; k++)
    if (!is_none (list[k]->weight - result->weight))
      result->weight = NAN;
  return result;
}
