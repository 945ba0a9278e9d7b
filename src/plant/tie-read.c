/* What a person may type for a quantity: a number with a unit, arithmetic, or a tie to other quantities.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/plant-private.h"
#include "plant/tie-private.h"
#include "plant/units-private.h"
#include "plant/i18n.h"
#include <math.h>
#include <string.h>

#define MOST_TYPED 400
#define MOST_FILED 4000
#define MOST_DEPTH 32

/* A part of the expression that is read already.
 *
 * A number in °C, °F or barg is a difference plus a datum.  What it stands for shows only in its company: "20 °C + 5 °C" is
 * 25 °C, "T1.exhaust.T - 5 °C" takes 5 K off, and "max(T1.exhaust.T; 60 °C)" means 60 °C as such.  Until then the datum
 * is kept apart.  A bare number takes its unit from its company too. */
typedef struct _Part Part;
struct _Part {
  HlTieOp      op;
  guint        n;
  Part       **operands;
  HlAddress    of;               /* of QUANTITY */
  gboolean     is_constant;      /* no quantity in it */
  gboolean     is_bare;          /* a number that nobody gave a unit */
  gboolean     is_unknown;       /* a quantity that the plant does not have: fits everywhere */
  double       number, datum;    /* of NUMBER [SI] */
  const HlUnit *unit;            /* the unit with a datum that was used in it */
  HlBaseUnits  base;
  HlDimension  dimension;        /* how a number beside it is meant and shown; HL_N_DIMENSIONS: none has these units */
  double       weight;           /* temperatures: how often the zero point counts; NaN: cannot be said */
};

typedef struct {
  const HlPlant *plant;
  HlDimension    dimension;      /* of the quantity that gets the value */
  gboolean       is_file;        /* bare numbers are SI, and quantities may have vanished */
  const char    *text, *at;
  guint          depth;
  GPtrArray     *parts;          /* all of them, to be freed */
  GError       **error;
} Parser;

static Part *read_sum (Parser *parser);

static gpointer
refuse (Parser *parser, const char *format, ...) G_GNUC_PRINTF (2, 3);
static gpointer
refuse (Parser *parser, const char *format, ...)
{
  g_autofree char *why = NULL;
  va_list arguments;
  va_start (arguments, format);
  why = g_strdup_vprintf (format, arguments);
  va_end (arguments);
  g_set_error (parser->error, HL_PLANT_ERROR, HL_PLANT_ERROR_CONTENT, _("“=%s”: %s"), parser->text, why);
  return NULL;
}

static void
free_part (gpointer data)
{
  Part *part = data;
  g_free (part->operands);
  g_free (part);
}

static Part *
part_new (Parser *parser, HlTieOp op, Part *const *operands, guint n)
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

/* --- words, numbers and units --------------------------------------------------- */

static void
skip_spaces (Parser *parser)
{
  while (*parser->at == ' ')
    parser->at++;
}

static gboolean
is_word (char c)
{
  return g_ascii_isalnum (c) || c == '_' || (guchar) c >= 0x80;
}

/* Length of the longest piece at @at that spells a unit; 0: none. */
static gsize
unit_length (const char *at, HlDimension dimension, const HlUnit **unit, const HlUnit **ambiguous)
{
  gsize most = MIN (strlen (at), 24);
  for (gsize length = most; length > 0; length--)
    {
      int open = 0;
      gboolean balanced = TRUE;
      if (at[length - 1] == ' ' || at[length] == ':' || (is_word (at[length]) && is_word (at[length - 1])))
        continue;
      for (gsize i = 0; i < length && balanced; i++)
        {
          open += at[i] == '(' ? 1 : at[i] == ')' ? -1 : 0;
          balanced = open >= 0;
        }
      if (!balanced || open != 0)
        continue;
      *unit = hl_unit_find (at, length, dimension, ambiguous);
      if (*unit != NULL)
        return length;
    }
  return 0;
}

static Part *
read_unit (Parser *parser, Part *part)
{
  const HlUnit *unit = NULL, *ambiguous = NULL;
  const char *start = parser->at;
  gsize length = unit_length (start, parser->dimension, &unit, &ambiguous);
  if (length == 0)
    {
      const char *end = start;
      g_autofree char *would_do = hl_unit_suggestions (parser->dimension), *word = NULL;
      while (*end != '\0' && strchr (" +-*/);,", *end) == NULL)
        end++;
      word = g_strndup (start, (gsize) (end - start));
      return refuse (parser, _("the unit “%s” is not known; for a %s these would do: %s"), word, hl_dimension_name (parser->dimension), would_do);
    }
  parser->at += length;
  if (ambiguous != NULL)
    return refuse (parser, _("the unit “%s” may mean %s or %s; mind small and capital letters"), unit->text, unit->text, ambiguous->text);
  if (unit->nature == HL_UNIT_REFUSED)
    return refuse (parser, "%s", _(unit->why));
  part->is_bare = FALSE;
  part->dimension = unit->dimension;
  part->base = hl_dimension_base (unit->dimension);
  part->datum = unit->nature == HL_UNIT_GAUGE ? hl_plant_site_pressure (parser->plant) : unit->offset;
  part->unit = has_datum (part) || unit->nature != HL_UNIT_PLAIN ? unit : NULL;
  part->number = hl_multiply_exactly (part->number, unit->factor);
  return part;
}

static Part *
read_number (Parser *parser, double sign)
{
  const char *end;
  Part *part = part_new (parser, HL_TIE_NUMBER, NULL, 0);
  if (!hl_units_read_number (parser->at, &part->number, &end, parser->error))
    return NULL;
  part->number *= sign;
  part->is_bare = TRUE;
  part->dimension = HL_DIMENSION_RATIO;
  parser->at = end;
  skip_spaces (parser);
  if ((is_word (*parser->at) && strchr (parser->at, ':') != parser->at + 1) || *parser->at == '%')
    return read_unit (parser, part);
  return part;
}

static Part *
read_address (Parser *parser, const char *end)
{
  g_autofree char *word = g_strndup (parser->at, (gsize) (end - parser->at));
  g_autoptr (GError) why = NULL;
  Part *part = part_new (parser, HL_TIE_QUANTITY, NULL, 0);
  if (!hl_address_parse (word, parser->plant, &part->of, &why))
    {
      if (!parser->is_file || !hl_address_parse (word, NULL, &part->of, NULL))
        {
          g_propagate_error (parser->error, g_steal_pointer (&why));
          return NULL;
        }
      part->is_unknown = TRUE;
    }
  const HlQuantityKind *kind = hl_plant_quantity_kind (parser->plant, &part->of);
  part->dimension = kind != NULL ? kind->dimension : parser->dimension;
  part->base = hl_dimension_base (part->dimension);
  part->weight = part->dimension == HL_DIMENSION_TEMPERATURE ? 1.0 : 0.0;
  parser->at = end;
  return part;
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
      return refuse (parser, _("a number without unit cannot be added to a %s"), name);
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
    return refuse (parser, _("%s counts from the ambient pressure and cannot be added; write the difference in bar, kPa or psi"), number->unit->text) != NULL;
  if (!is_temperature (number->base))
    {
      read_as_difference (number);
      return TRUE;
    }
  if (is_one (company->weight))
    is_level = is_subtraction && (!is_right || wants_difference);
  else if (is_none (company->weight) && is_right && !is_subtraction && has_datum (number) && !wants_difference)
    return refuse (parser, _("write the temperature first, and then what is added to it")) != NULL;
  else if (is_none (company->weight))
    is_level = !is_right && !wants_difference;
  else if (has_datum (number))
    return refuse (parser, _("it cannot be said whether %s is a temperature or a difference here; write it in K"), number->unit->text) != NULL;
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
    return refuse (parser, "%s", _(NO_SCALING)) != NULL;
  return TRUE;
}

static Part *
not_too_large (Parser *parser, Part *part)
{
  if (part->op == HL_TIE_NUMBER && !isfinite (part->number))
    return refuse (parser, _("a number in it grows too large"));
  return part;
}

static Part *
negate (Parser *parser, Part *part)
{
  if (!may_scale (parser, part))
    return NULL;
  if (part->op == HL_TIE_NUMBER)
    {
      part->number = -part->number;
      return part;
    }
  Part *result = part_new (parser, HL_TIE_NEGATE, &part, 1);
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
    return refuse (parser, _("%s counts from the ambient pressure and cannot be added; write the difference in bar, kPa or psi"), right->unit->text);
  if (has_datum (right) && !has_datum (left) && !hl_dimension_is_difference (parser->dimension))
    return refuse (parser, _("write the temperature first, and then what is added to it"));
  left->number += subtract ? -right->number : right->number;
  return not_too_large (parser, left);
}

static Part *
add (Parser *parser, Part *left, Part *right, gboolean subtract)
{
  if (give_unit (parser, left, right) == NULL || give_unit (parser, right, left) == NULL)
    return NULL;
  if (!hl_base_equal (left->base, right->base) && !left->is_unknown && !right->is_unknown)
    {
      g_autofree char *one = hl_base_name (left->base), *other = hl_base_name (right->base);
      return refuse (parser, subtract ? _("a %2$s cannot be subtracted from a %1$s; both must be of one kind") : _("a %1$s and a %2$s cannot be added; both must be of one kind"),
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
  Part *result = part_new (parser, subtract ? HL_TIE_SUBTRACT : HL_TIE_ADD, (Part *[]) { left, right }, 2);
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

static Part *
multiply (Parser *parser, Part *left, Part *right, gboolean divide)
{
  gboolean is_left_one = left->is_bare && is_one (left->number), is_right_one = right->is_bare && is_one (right->number);
  if (divide && right->op == HL_TIE_NUMBER && fabs (right->number) < G_MINDOUBLE)
    return refuse (parser, _("division by zero"));
  if ((!(is_left_one && !divide) && !may_scale (parser, right)) || (!is_right_one && !may_scale (parser, left)))
    return NULL;
  if (left->op == HL_TIE_NUMBER && right->op == HL_TIE_NUMBER)
    {
      Part *number = multiply_numbers (parser, left, right, divide);
      if (number != NULL || (parser->error != NULL && *parser->error != NULL))
        return number;
    }
  else if ((left->op == HL_TIE_NUMBER && is_none (left->number) && !right->is_constant) || (right->op == HL_TIE_NUMBER && is_none (right->number) && !left->is_constant))
    return refuse (parser, _("a factor of 0 leaves nothing of what it multiplies; give the number instead"));
  Part *result = part_new (parser, divide ? HL_TIE_DIVIDE : HL_TIE_MULTIPLY, (Part *[]) { left, right }, 2);
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

static Part *
root_of (Parser *parser, Part *part)
{
  HlBaseUnits base;
  if (!may_scale (parser, part))
    return NULL;
  if (!hl_base_root (part->base, &base))
    return refuse (parser, _("that root has no unit; the root of a pressure times a pressure has one"));
  if (part->op == HL_TIE_NUMBER && part->number < 0.0)
    return refuse (parser, _("a number below zero has no root"));
  Part *result = part_new (parser, HL_TIE_SQRT, &part, 1);
  result->base = base;
  result->dimension = hl_dimension_of_base (base);
  return result;
}

static Part *
extreme (Parser *parser, HlTieOp op, Part **list, guint n)
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
          return refuse (parser, _("a %s and a %s cannot be compared; all must be of one kind"), one, other);
        }
      if (list[k]->op == HL_TIE_NUMBER && (company->is_constant ? hl_dimension_is_difference (parser->dimension) : is_none (company->weight) && is_temperature (company->base)))
        read_as_difference (list[k]);
      else if (list[k]->op == HL_TIE_NUMBER)
        read_as_level (list[k]);
    }
  Part *result = part_new (parser, op, list, n);
  result->base = company->base;
  result->dimension = company->dimension;
  result->weight = list[0]->weight;
  for (guint k = 1; k < n; k++)
    if (!is_none (list[k]->weight - result->weight))
      result->weight = NAN;
  return result;
}

/* "min(", "max(", "sqrt(": values apart by a semicolon, or by a comma where it is no decimal one. */
static Part *
read_function (Parser *parser, HlTieOp op)
{
  g_autoptr (GPtrArray) list = g_ptr_array_new ();
  if (++parser->depth > MOST_DEPTH)
    return refuse (parser, _("too many brackets"));
  do
    {
      parser->at++;
      Part *part = read_sum (parser);
      if (part == NULL)
        return NULL;
      g_ptr_array_add (list, part);
    }
  while (*parser->at == ';' || *parser->at == ',');
  parser->depth--;
  if (*parser->at != ')')
    return refuse (parser, _("a closing bracket is missing"));
  parser->at++;
  if (op == HL_TIE_SQRT)
    return list->len == 1 ? root_of (parser, list->pdata[0]) : refuse (parser, _("sqrt takes one value"));
  if (list->len < 2)
    return refuse (parser, _("min and max take two values or more, with a semicolon between them"));
  return extreme (parser, op, (Part **) list->pdata, list->len);
}

/* --- the grammar -------------------------------------------------------------------- */

static Part *
read_brackets (Parser *parser)
{
  parser->at++;
  if (++parser->depth > MOST_DEPTH)
    return refuse (parser, _("too many brackets"));
  Part *part = read_sum (parser);
  if (part == NULL)
    return NULL;
  parser->depth--;
  if (*parser->at != ')')
    return refuse (parser, _("a closing bracket is missing"));
  parser->at++;
  return part;
}

static Part *
read_name (Parser *parser)
{
  static const struct { const char *name; HlTieOp op; } functions[] = { { "min", HL_TIE_MIN }, { "max", HL_TIE_MAX }, { "sqrt", HL_TIE_SQRT } };
  const char *end = parser->at, *bracket;
  while (is_word (*end) || *end == '.' || *end == ':')
    end++;
  for (bracket = end; *bracket == ' '; bracket++)
    ;
  if (*bracket != '(')
    return read_address (parser, end);
  for (guint k = 0; k < G_N_ELEMENTS (functions); k++)
    if (strlen (functions[k].name) == (gsize) (end - parser->at) && g_ascii_strncasecmp (parser->at, functions[k].name, (gsize) (end - parser->at)) == 0)
      {
        parser->at = bracket;
        return read_function (parser, functions[k].op);
      }
  g_autofree char *word = g_strndup (parser->at, (gsize) (end - parser->at));
  return refuse (parser, _("there is no function “%s”; there are min, max and sqrt"), word);
}

static Part *
read_primary (Parser *parser)
{
  double sign = 1.0;
  Part *part;
  skip_spaces (parser);
  while (*parser->at == '-' || *parser->at == '+')
    {
      sign = *parser->at == '-' ? -sign : sign;
      parser->at++;
      skip_spaces (parser);
    }
  if (g_ascii_isdigit (*parser->at) || *parser->at == '.' || *parser->at == ',')
    return read_number (parser, sign);
  if (*parser->at == '(')
    part = read_brackets (parser);
  else if (is_word (*parser->at))
    part = read_name (parser);
  else
    return *parser->at == '\0' ? refuse (parser, _("a number or a quantity is missing at the end"))
                               : refuse (parser, _("a number or a quantity must stand before “%s”"), parser->at);
  return part != NULL && sign < 0.0 ? negate (parser, part) : part;
}

static Part *
read_product (Parser *parser)
{
  Part *part = read_primary (parser);
  for (skip_spaces (parser); part != NULL && (*parser->at == '*' || *parser->at == '/'); skip_spaces (parser))
    {
      gboolean divide = *parser->at++ == '/';
      Part *right = read_primary (parser);
      part = right != NULL ? multiply (parser, part, right, divide) : NULL;
    }
  return part;
}

static Part *
read_sum (Parser *parser)
{
  Part *part = read_product (parser);
  for (skip_spaces (parser); part != NULL && (*parser->at == '+' || *parser->at == '-'); skip_spaces (parser))
    {
      gboolean subtract = *parser->at++ == '-';
      Part *right = read_product (parser);
      part = right != NULL ? add (parser, part, right, subtract) : NULL;
    }
  return part;
}

/* --- what comes out ------------------------------------------------------------------ */

static guint
draft_of (HlTieDraft *draft, const Part *part)
{
  g_autofree guint *operands = g_new (guint, part->n + 1);
  if (part->op == HL_TIE_NUMBER)
    return hl_tie_draft_number (draft, part->number, part->dimension);
  if (part->op == HL_TIE_QUANTITY)
    return hl_tie_draft_quantity (draft, &part->of);
  for (guint k = 0; k < part->n; k++)
    operands[k] = draft_of (draft, part->operands[k]);
  return hl_tie_draft_op (draft, part->op, operands, part->n);
}

static gboolean
has_level (const Part *part)
{
  if (part->op == HL_TIE_QUANTITY && part->dimension == HL_DIMENSION_TEMPERATURE)
    return TRUE;
  for (guint k = 0; k < part->n; k++)
    if (has_level (part->operands[k]))
      return TRUE;
  return FALSE;
}

/* Of constants that no single unit fits. */
static double
constant_value (const Part *part)
{
  double first = part->n > 0 ? constant_value (part->operands[0]) : part->number, second;
  for (guint k = 1; k < part->n; k++)
    {
      second = constant_value (part->operands[k]);
      first = part->op == HL_TIE_ADD ? first + second : part->op == HL_TIE_SUBTRACT ? first - second
            : part->op == HL_TIE_MULTIPLY ? first * second : part->op == HL_TIE_DIVIDE ? first / second
            : part->op == HL_TIE_MIN ? fmin (first, second) : fmax (first, second);
    }
  return part->op == HL_TIE_NEGATE ? -first : part->op == HL_TIE_SQRT ? sqrt (first) : first;
}

static gboolean
conclude_constant (Parser *parser, Part *part, HlValue *value)
{
  gboolean is_difference = hl_dimension_is_difference (parser->dimension);
  if (part->op == HL_TIE_NUMBER && is_difference && part->unit != NULL && part->unit->nature != HL_UNIT_PLAIN)
    return hl_unit_to_si (part->unit, 0.0, parser->dimension, 0.0, &(double) { 0.0 }, parser->error);
  *value = (HlValue) { .origin = HL_ORIGIN_GIVEN };
  if (part->op == HL_TIE_NUMBER && part->is_bare)
    value->value = parser->is_file ? part->number : hl_units_from_display (part->number, parser->dimension, hl_plant_units (parser->plant));
  else if (part->op == HL_TIE_NUMBER)
    value->value = is_difference ? part->number : hl_add_exactly (part->number, part->datum);
  else
    value->value = constant_value (part);
  return TRUE;
}

/* The dimension must be that of the quantity; a person also learns that a difference of temperatures is no temperature. */
static gboolean
check_dimension (Parser *parser, const Part *part)
{
  if (part->is_unknown || (part->op == HL_TIE_NUMBER && part->is_bare))
    return TRUE;
  if (part->op == HL_TIE_NUMBER && !hl_base_equal (part->base, hl_dimension_base (parser->dimension)))
    {
      g_autofree char *name = hl_base_name (part->base);
      return refuse (parser, _("that is a %s, but a %s is wanted"), name, hl_dimension_name (parser->dimension)) != NULL;
    }
  if (!hl_base_equal (part->base, hl_dimension_base (parser->dimension)))
    {
      g_autofree char *name = hl_base_name (part->base);
      return refuse (parser, _("that comes out as a %s, but a %s is wanted; tie like to like"), name, hl_dimension_name (parser->dimension)) != NULL;
    }
  if (parser->is_file || part->is_constant)
    return TRUE;
  if (parser->dimension == HL_DIMENSION_TEMPERATURE && is_none (part->weight))
    return refuse (parser, _("that comes out as a difference of temperatures, but a temperature is wanted; add it to one")) != NULL;
  if (parser->dimension == HL_DIMENSION_TEMPERATURE_DIFFERENCE && is_one (part->weight))
    return refuse (parser, _("that comes out as a temperature, but a difference of temperatures is wanted; subtract another one")) != NULL;
  return TRUE;
}

static gboolean
conclude (Parser *parser, Part *part, HlValue *value)
{
  HlTieDraft draft;
  if (!check_dimension (parser, part))
    return FALSE;
  if (part->is_constant)
    return conclude_constant (parser, part, value);
  hl_tie_draft_init (&draft);
  draft_of (&draft, part);
  if (draft.steps->len > HL_TIE_MOST_STEPS)
    {
      hl_tie_draft_clear (&draft);
      return refuse (parser, _("the text is not UTF-8, or too long")) != NULL;
    }
  gboolean fits = parser->dimension == HL_DIMENSION_TEMPERATURE ? is_one (part->weight)
                : parser->dimension == HL_DIMENSION_TEMPERATURE_DIFFERENCE ? is_none (part->weight) : FALSE;
  *value = (HlValue) { .origin = HL_ORIGIN_TIED, .tie = hl_tie_intern (&draft, fits || !has_level (part)) };
  return TRUE;
}

gboolean
hl_tie_read (const HlPlant *plant, const HlAddress *address, const char *text, gboolean is_file, HlValue *value, GError **error)
{
  const HlQuantityKind *kind = hl_plant_quantity_kind (plant, address);
  g_autofree char *tidy = NULL, *where = hl_address_to_text (address);
  g_autoptr (GPtrArray) parts = g_ptr_array_new_with_free_func (free_part);
  GError *why = NULL;
  Parser parser = { plant, HL_DIMENSION_RATIO, is_file, "…", NULL, 0, parts, &why };
  HlValue read = { .origin = HL_ORIGIN_FOUND };
  Part *part = NULL;
  if (kind == NULL)
    {
      g_set_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_ADDRESS, _("There is no quantity %s in this plant"), where);
      return FALSE;
    }
  if (!g_utf8_validate (text, -1, NULL) || strlen (text) > (is_file ? MOST_FILED : MOST_TYPED))
    refuse (&parser, _("the text is not UTF-8, or too long"));
  else
    {
      tidy = hl_units_tidy (text);
      parser.dimension = kind->dimension;
      parser.text = parser.at = tidy;
      part = read_sum (&parser);
    }
  if (part != NULL && *parser.at != '\0')
    part = refuse (&parser, _("“%s” is not understood; between two terms stands +, -, * or /"), parser.at);
  if (part == NULL || !conclude (&parser, part, &read)
      || !(read.origin == HL_ORIGIN_TIED ? hl_plant_check_tie (plant, address, read.tie, &why)
                                         : hl_quantity_check (kind, where, read.value, hl_plant_units (plant), &why)))
    {
      g_propagate_error (error, why);
      return FALSE;
    }
  /* What a person typed is kept as a file would give it back. */
  if (is_file || read.origin != HL_ORIGIN_TIED || !hl_tie_read (plant, address, read.tie->text, TRUE, value, NULL))
    *value = read;
  return TRUE;
}

gboolean
hl_tie_parse (const HlPlant *plant, const HlAddress *address, const char *text, HlValue *value, GError **error)
{
  HlValue read;
  g_return_val_if_fail (plant != NULL && address != NULL && text != NULL && value != NULL, FALSE);
  if (!hl_tie_read (plant, address, text, FALSE, &read, error))
    return FALSE;
  if (read.origin != HL_ORIGIN_TIED)
    {
      g_set_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_CONTENT,
                   _("“=%s” names no other quantity; a tie is for instance =0.23*B1.steam.p"), text);
      return FALSE;
    }
  *value = read;
  return TRUE;
}

char *
hl_tie_to_text (const HlValue *value)
{
  return g_strdup (value->tie->text);
}

char *
hl_tie_format (const HlPlant *plant, const HlAddress *address, const HlValue *value)
{
  g_return_val_if_fail (plant != NULL && address != NULL && value != NULL && value->origin == HL_ORIGIN_TIED, NULL);
  return hl_tie_write (value->tie, HL_TIE_AS_TYPED, hl_plant_units (plant));
}

gboolean
hl_value_parse (const HlPlant *plant, const HlAddress *address, const char *text, HlValue *value, GError **error)
{
  const HlQuantityKind *kind;
  g_autofree char *where = NULL, *trimmed = NULL;
  double si;
  g_return_val_if_fail (plant != NULL && address != NULL && text != NULL && value != NULL, FALSE);
  trimmed = g_strstrip (g_strdup (text));
  if (trimmed[0] == '=')
    return hl_tie_read (plant, address, trimmed + 1, FALSE, value, error);
  where = hl_address_to_text (address);
  kind = hl_plant_quantity_kind (plant, address);
  if (kind == NULL)
    {
      g_set_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_ADDRESS, _("There is no quantity %s in this plant"), where);
      return FALSE;
    }
  if (!hl_units_parse (trimmed, kind->dimension, hl_plant_units (plant), hl_plant_site_pressure (plant), &si, error)
      || !hl_quantity_check (kind, where, si, hl_plant_units (plant), error))
    return FALSE;
  *value = (HlValue) { .origin = HL_ORIGIN_GIVEN, .value = si };
  return TRUE;
}
