/* What a person may type for a quantity: a number with a unit, arithmetic, or a tie to other quantities.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/tie-parts.h"
#include "plant/i18n.h"
#include <math.h>
#include <string.h>

#define MOST_TYPED 400
#define MOST_FILED 4000
#define MOST_DEPTH 32

static Part *read_sum (Parser *parser);

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
      return hl_tie_refuse (parser, _("the unit “%s” is not known; for a %s these would do: %s"), word, hl_dimension_name (parser->dimension), would_do);
    }
  parser->at += length;
  if (ambiguous != NULL)
    return hl_tie_refuse (parser, _("the unit “%s” may mean %s or %s; mind small and capital letters"), unit->text, unit->text, ambiguous->text);
  if (unit->nature == HL_UNIT_REFUSED)
    return hl_tie_refuse (parser, "%s", _(unit->why));
  part->is_bare = FALSE;
  part->dimension = unit->dimension;
  part->base = hl_dimension_base (unit->dimension);
  part->datum = unit->nature == HL_UNIT_GAUGE ? hl_plant_site_pressure (parser->plant) : unit->offset;
  part->unit = fabs (part->datum) > 0.0 || unit->nature != HL_UNIT_PLAIN ? unit : NULL;
  part->number = hl_multiply_exactly (part->number, unit->factor);
  return part;
}

static Part *
read_number (Parser *parser, double sign)
{
  const char *end;
  Part *part = hl_part_new (parser, HL_TIE_NUMBER, NULL, 0);
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
  Part *part = hl_part_new (parser, HL_TIE_QUANTITY, NULL, 0);
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

/* --- functions -------------------------------------------------------------------- */

/* "min(", "max(", "sqrt(": values apart by a semicolon, or by a comma where it is no decimal one. */
static Part *
read_function (Parser *parser, HlTieOp op)
{
  g_autoptr (GPtrArray) list = g_ptr_array_new ();
  if (++parser->depth > MOST_DEPTH)
    return hl_tie_refuse (parser, _("too many brackets"));
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
    return hl_tie_refuse (parser, _("a closing bracket is missing"));
  parser->at++;
  if (op == HL_TIE_SQRT)
    return list->len == 1 ? hl_part_root (parser, list->pdata[0]) : hl_tie_refuse (parser, _("sqrt takes one value"));
  if (list->len < 2)
    return hl_tie_refuse (parser, _("min and max take two values or more, with a semicolon between them"));
  return hl_part_extreme (parser, op, (Part **) list->pdata, list->len);
}

/* --- the grammar -------------------------------------------------------------------- */

static Part *
read_brackets (Parser *parser)
{
  parser->at++;
  if (++parser->depth > MOST_DEPTH)
    return hl_tie_refuse (parser, _("too many brackets"));
  Part *part = read_sum (parser);
  if (part == NULL)
    return NULL;
  parser->depth--;
  if (*parser->at != ')')
    return hl_tie_refuse (parser, _("a closing bracket is missing"));
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
  return hl_tie_refuse (parser, _("there is no function “%s”; there are min, max and sqrt"), word);
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
    return *parser->at == '\0' ? hl_tie_refuse (parser, _("a number or a quantity is missing at the end"))
                               : hl_tie_refuse (parser, _("a number or a quantity must stand before “%s”"), parser->at);
  return part != NULL && sign < 0.0 ? hl_part_negate (parser, part) : part;
}

static Part *
read_product (Parser *parser)
{
  Part *part = read_primary (parser);
  for (skip_spaces (parser); part != NULL && (*parser->at == '*' || *parser->at == '/'); skip_spaces (parser))
    {
      gboolean divide = *parser->at++ == '/';
      Part *right = read_primary (parser);
      part = right != NULL ? hl_part_multiply (parser, part, right, divide) : NULL;
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
      part = right != NULL ? hl_part_add (parser, part, right, subtract) : NULL;
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
      return hl_tie_refuse (parser, _("that is a %s, but a %s is wanted"), name, hl_dimension_name (parser->dimension)) != NULL;
    }
  if (!hl_base_equal (part->base, hl_dimension_base (parser->dimension)))
    {
      g_autofree char *name = hl_base_name (part->base);
      return hl_tie_refuse (parser, _("that comes out as a %s, but a %s is wanted; tie like to like"), name, hl_dimension_name (parser->dimension)) != NULL;
    }
  if (parser->is_file || part->is_constant)
    return TRUE;
  if (parser->dimension == HL_DIMENSION_TEMPERATURE && is_none (part->weight))
    return hl_tie_refuse (parser, _("that comes out as a difference of temperatures, but a temperature is wanted; add it to one")) != NULL;
  if (parser->dimension == HL_DIMENSION_TEMPERATURE_DIFFERENCE && is_one (part->weight))
    return hl_tie_refuse (parser, _("that comes out as a temperature, but a difference of temperatures is wanted; subtract another one")) != NULL;
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
      return hl_tie_refuse (parser, _("the text is not UTF-8, or too long")) != NULL;
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
  g_autoptr (GPtrArray) parts = g_ptr_array_new_with_free_func (hl_part_free);
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
    hl_tie_refuse (&parser, _("the text is not UTF-8, or too long"));
  else
    {
      tidy = hl_units_tidy (text);
      parser.dimension = kind->dimension;
      parser.text = parser.at = tidy;
      part = read_sum (&parser);
    }
  if (part != NULL && *parser.at != '\0')
    part = hl_tie_refuse (&parser, _("“%s” is not understood; between two terms stands +, -, * or /"), parser.at);
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
