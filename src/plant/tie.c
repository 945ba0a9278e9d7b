/* What a person may type for a quantity: a number with a unit, arithmetic, or a tie to another quantity.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/plant-private.h"
#include "plant/units-private.h"
#include "plant/i18n.h"
#include <math.h>
#include <string.h>

#define MAX_TEXT  400
#define MAX_DEPTH 32

typedef struct {
  const HlPlant *plant;
  HlDimension    dimension;      /* of the quantity that gets the value */
  gboolean       bare_is_si;     /* bare numbers are SI (files), not of the plant's unit set (people) */
  const char    *text, *at;
  guint          depth;
  GError       **error;
} Parser;

/* factor * of + plain + constant + datum.  A number in °C or barg is a difference plus a datum; the datum counts
 * only where the number stands for an absolute value, so "20 °C + 5 °C" is 25 °C and "T1.exhaust.T - 5 °C" takes 5 K off. */
typedef struct {
  gboolean  has_of;
  double    factor;
  HlAddress of;
  double    plain;               /* sum of bare numbers */
  gboolean  has_constant;
  double    constant;            /* sum of numbers with units [SI] */
  double    datum;               /* [SI] */
  const HlUnit *gauge;           /* the gauge unit that was used */
} Sum;

static gboolean read_sum (Parser *parser, Sum *sum);

static gboolean
refuse (Parser *parser, const char *format, ...) G_GNUC_PRINTF (2, 3);
static gboolean
refuse (Parser *parser, const char *format, ...)
{
  g_autofree char *why = NULL;
  va_list arguments;
  va_start (arguments, format);
  why = g_strdup_vprintf (format, arguments);
  va_end (arguments);
  g_set_error (parser->error, HL_PLANT_ERROR, HL_PLANT_ERROR_CONTENT, _("“=%s”: %s"), parser->text, why);
  return FALSE;
}

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
      if (at[length - 1] == ' ' || (is_word (at[length]) && is_word (at[length - 1])))
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

static gboolean
read_unit (Parser *parser, double number, Sum *sum)
{
  const HlUnit *unit = NULL, *ambiguous = NULL;
  const char *start = parser->at;
  gsize length = unit_length (start, parser->dimension, &unit, &ambiguous);
  double zero, si;
  if (length == 0)
    {
      const char *end = start;
      g_autofree char *would_do = hl_unit_suggestions (parser->dimension), *word = NULL;
      while (*end != '\0' && strchr (" +-*)", *end) == NULL)
        end++;
      word = g_strndup (start, (gsize) (end - start));
      return refuse (parser, _("the unit “%s” is not known; for a %s these would do: %s"), word, hl_dimension_name (parser->dimension), would_do);
    }
  parser->at += length;
  if (ambiguous != NULL)
    return refuse (parser, _("the unit “%s” may mean %s or %s; mind small and capital letters"), unit->text, unit->text, ambiguous->text);
  if (unit->nature == HL_UNIT_REFUSED)
    return refuse (parser, "%s", _(unit->why));
  if (unit->dimension == HL_DIMENSION_RATIO)
    {
      sum->plain = hl_multiply_exactly (number, unit->factor);
      return TRUE;
    }
  if (unit->dimension != hl_unit_dimension (parser->dimension))
    return refuse (parser, _("%s is a unit of %s, but a %s is wanted"), unit->text, hl_dimension_name (unit->dimension), hl_dimension_name (parser->dimension));
  if (hl_dimension_is_difference (parser->dimension) && unit->nature != HL_UNIT_PLAIN)
    return hl_unit_to_si (unit, number, parser->dimension, 0.0, &si, parser->error);
  sum->has_constant = TRUE;
  sum->constant = hl_multiply_exactly (number, unit->factor);
  zero = unit->nature == HL_UNIT_GAUGE ? hl_plant_site_pressure (parser->plant) : unit->offset;
  sum->datum = hl_dimension_is_difference (parser->dimension) ? 0.0 : zero;
  sum->gauge = unit->nature == HL_UNIT_GAUGE ? unit : NULL;
  return TRUE;
}

static gboolean
read_constant (Parser *parser, double sign, Sum *sum)
{
  const char *end;
  double number;
  if (!hl_units_read_number (parser->at, &number, &end, parser->error))
    return FALSE;
  number *= sign;
  parser->at = end;
  skip_spaces (parser);
  if (is_word (*parser->at) || *parser->at == '%')
    return read_unit (parser, number, sum);
  sum->plain = number;
  return TRUE;
}

static gboolean
read_address (Parser *parser, Sum *sum)
{
  const char *end = parser->at;
  g_autofree char *word = NULL;
  while (is_word (*end) || *end == '.' || *end == ':')
    end++;
  word = g_strndup (parser->at, (gsize) (end - parser->at));
  if (!hl_address_parse (word, parser->plant, &sum->of, parser->error))
    return FALSE;
  parser->at = end;
  sum->has_of = TRUE;
  sum->factor = 1.0;
  return TRUE;
}

static void
scale (Sum *sum, double by)
{
  sum->factor *= by;
  sum->plain *= by;
  sum->constant *= by;
}

static gboolean
is_plain (const Sum *sum)
{
  return !sum->has_of && !sum->has_constant;
}

static gboolean
has_datum (const Sum *sum)
{
  return fabs (sum->datum) > 0.0;
}

static gboolean
read_primary (Parser *parser, Sum *sum)
{
  double sign = 1.0;
  gboolean done = FALSE;
  *sum = (Sum) { 0 };
  skip_spaces (parser);
  while (*parser->at == '-' || *parser->at == '+')
    {
      sign = *parser->at == '-' ? -sign : sign;
      parser->at++;
      skip_spaces (parser);
    }
  if (g_ascii_isdigit (*parser->at) || *parser->at == '.' || *parser->at == ',')
    return read_constant (parser, sign, sum);
  if (*parser->at == '(')
    {
      parser->at++;
      if (++parser->depth > MAX_DEPTH)
        return refuse (parser, _("too many brackets"));
      if (!read_sum (parser, sum))
        return FALSE;
      parser->depth--;
      if (*parser->at != ')')
        return refuse (parser, _("a closing bracket is missing"));
      parser->at++;
      done = TRUE;
    }
  else if (is_word (*parser->at))
    {
      if (!read_address (parser, sum))
        return FALSE;
      done = TRUE;
    }
  if (!done)
    return *parser->at == '\0' ? refuse (parser, _("a number or a quantity is missing at the end"))
                               : refuse (parser, _("a number or a quantity must stand before “%s”"), parser->at);
  if (sign < 0.0 && has_datum (sum) && !sum->has_of)
    return refuse (parser, _("a temperature in °C or °F, or a gauge pressure, cannot be negated or multiplied; write it in K or as absolute pressure"));
  scale (sum, sign);
  return TRUE;
}

static gboolean
multiply (Parser *parser, Sum *left, const Sum *right, gboolean divide)
{
  double by = right->plain;
  Sum scaled = *left;
  if (divide && !is_plain (right))
    return refuse (parser, _("only a plain number may stand behind “/”"));
  if (divide && fabs (right->plain) < G_MINDOUBLE)
    return refuse (parser, _("division by zero"));
  if (divide)
    by = 1.0 / right->plain;
  else if (!is_plain (right))
    {
      if (!is_plain (left))
        return refuse (parser, _("two quantities cannot be multiplied; a tie is one other quantity times a factor plus an offset"));
      by = left->plain;
      scaled = *right;
    }
  if (has_datum (&scaled) && (by < 1.0 || by > 1.0))
    return refuse (parser, _("a temperature in °C or °F, or a gauge pressure, cannot be negated or multiplied; write it in K or as absolute pressure"));
  if (divide && !is_plain (&scaled))
    {
      /* x/3 is not exactly x*(1/3) */
      scaled.factor /= right->plain;
      scaled.plain /= right->plain;
      scaled.constant /= right->plain;
    }
  else if (divide)
    scaled.plain /= right->plain;
  else
    scale (&scaled, by);
  *left = scaled;
  return TRUE;
}

static gboolean
read_product (Parser *parser, Sum *sum)
{
  if (!read_primary (parser, sum))
    return FALSE;
  for (skip_spaces (parser); *parser->at == '*' || *parser->at == '/'; skip_spaces (parser))
    {
      gboolean divide = *parser->at++ == '/';
      Sum right;
      if (!read_primary (parser, &right) || !multiply (parser, sum, &right, divide))
        return FALSE;
    }
  return TRUE;
}

static gboolean
add (Parser *parser, Sum *left, Sum *right, gboolean subtract)
{
  if (left->has_of && right->has_of && !hl_address_equal (&left->of, &right->of))
    return refuse (parser, _("two quantities cannot be added; a tie is one other quantity times a factor plus an offset"));
  if (right->gauge != NULL)
    return refuse (parser, _("%s counts from the ambient pressure and cannot be added; write the difference in bar, kPa or psi"), right->gauge->text);
  if (has_datum (right) && !left->has_of && !has_datum (left) && !right->has_of)
    return refuse (parser, _("write the temperature first, and then what is added to it"));
  if (subtract)
    scale (right, -1.0);
  if (right->has_of)
    left->of = right->of;
  left->has_of = left->has_of || right->has_of;
  left->factor += right->factor;
  left->plain += right->plain;
  left->has_constant = left->has_constant || right->has_constant;
  left->constant += right->constant;
  return TRUE;
}

static gboolean
read_sum (Parser *parser, Sum *sum)
{
  if (!read_product (parser, sum))
    return FALSE;
  for (skip_spaces (parser); *parser->at == '+' || *parser->at == '-'; skip_spaces (parser))
    {
      gboolean subtract = *parser->at++ == '-';
      Sum right;
      if (!read_product (parser, &right) || !add (parser, sum, &right, subtract))
        return FALSE;
    }
  return TRUE;
}

/* SI value of a difference that is written in the plant's units. */
static double
bare_difference (const Parser *parser, double number)
{
  HlUnitSet set = hl_plant_units (parser->plant);
  if (parser->bare_is_si)
    return number;
  return hl_units_from_display (number, parser->dimension, set) - hl_units_from_display (0.0, parser->dimension, set);
}

static gboolean
conclude (Parser *parser, const Sum *sum, HlValue *value)
{
  *value = (HlValue) { .origin = HL_ORIGIN_GIVEN };
  if (sum->has_of && sum->gauge != NULL)
    return refuse (parser, _("%s counts from the ambient pressure and cannot be added; write the difference in bar, kPa or psi"), sum->gauge->text);
  if (sum->has_of)
    {
      value->origin = HL_ORIGIN_TIED;
      value->tie_of = sum->of;
      value->tie_factor = sum->factor;
      value->tie_offset = sum->constant;
      if (fabs (sum->plain) > 0.0)
        value->tie_offset += bare_difference (parser, sum->plain);
    }
  else if (sum->has_constant)
    value->value = hl_add_exactly (sum->constant + (fabs (sum->plain) > 0.0 ? bare_difference (parser, sum->plain) : 0.0), sum->datum);
  else if (parser->bare_is_si)
    value->value = sum->plain;
  else
    value->value = hl_units_from_display (sum->plain, parser->dimension, hl_plant_units (parser->plant));
  return TRUE;
}

gboolean
hl_tie_read (const HlPlant *plant, const HlAddress *address, const char *text, gboolean bare_is_si, HlValue *value, GError **error)
{
  const HlQuantityKind *kind = hl_plant_quantity_kind (plant, address);
  g_autofree char *tidy = NULL, *where = hl_address_to_text (address);
  Parser parser = { plant, HL_DIMENSION_COUNT, bare_is_si, "…", NULL, 0, error };
  Sum sum;
  HlValue read;
  if (kind == NULL)
    {
      g_set_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_ADDRESS, _("There is no quantity %s in this plant"), where);
      return FALSE;
    }
  if (!g_utf8_validate (text, -1, NULL) || strlen (text) > MAX_TEXT)
    return refuse (&parser, _("the text is not UTF-8, or too long"));
  tidy = hl_units_tidy (text);
  parser.dimension = kind->dimension;
  parser.text = parser.at = tidy;
  if (!read_sum (&parser, &sum))
    return FALSE;
  if (*parser.at != '\0')
    return refuse (&parser, _("“%s” is not understood; between two terms stands +, -, * or /"), parser.at);
  if (!conclude (&parser, &sum, &read))
    return FALSE;
  if (read.origin == HL_ORIGIN_TIED ? !hl_plant_check_tie (plant, address, &read, error)
                                    : !hl_quantity_check (kind, where, read.value, hl_plant_units (plant), error))
    return FALSE;
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

/* Factor and address: "0.23*B1.steam.p". */
static GString *
factor_times_address (const HlValue *value)
{
  g_autofree char *of = hl_address_to_text (&value->tie_of), *factor = hl_number_to_text (value->tie_factor);
  GString *text = g_string_new (NULL);
  if (!g_str_equal (factor, "1"))
    g_string_append_printf (text, "%s*", factor);
  g_string_append (text, of);
  return text;
}

char *
hl_tie_to_text (const HlValue *value)
{
  GString *text = factor_times_address (value);
  g_autofree char *offset = hl_number_to_text (value->tie_offset);
  if (value->tie_offset > 0.0)
    g_string_append_printf (text, "+%s", offset);
  else if (value->tie_offset < 0.0)
    g_string_append (text, offset);
  return g_string_free (text, FALSE);
}

static HlDimension
difference_of (HlDimension dimension)
{
  return dimension == HL_DIMENSION_PRESSURE ? HL_DIMENSION_PRESSURE_DIFFERENCE
         : dimension == HL_DIMENSION_TEMPERATURE ? HL_DIMENSION_TEMPERATURE_DIFFERENCE : dimension;
}

char *
hl_tie_format (const HlPlant *plant, const HlAddress *address, const HlValue *value)
{
  const HlQuantityKind *kind;
  GString *text;
  g_return_val_if_fail (plant != NULL && address != NULL && value != NULL && value->origin == HL_ORIGIN_TIED, NULL);
  kind = hl_plant_quantity_kind (plant, address);
  g_return_val_if_fail (kind != NULL, NULL);
  text = factor_times_address (value);
  if (fabs (value->tie_offset) > 0.0)
    {
      g_autofree char *offset = hl_units_format_exact (fabs (value->tie_offset), difference_of (kind->dimension), hl_plant_units (plant));
      g_string_append_printf (text, " %c %s", value->tie_offset < 0.0 ? '-' : '+', offset);
    }
  return g_string_free (text, FALSE);
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
