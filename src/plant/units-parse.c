/* Numbers and units out of what people type.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/units-private.h"
#include "plant/i18n.h"
#include <math.h>
#include <string.h>

G_DEFINE_QUARK (hl-units-error-quark, hl_units_error)

char *
hl_units_tidy (const char *text)
{
  static const struct { const char *from, *to; } signs[] = {
    { "º", "°" }, { "˚", "°" }, { "℃", "°C" }, { "℉", "°F" }, { "\u212a", "K" }, { "−", "-" }, { "²", "2" }, { "³", "3" },
    { "⋅", "·" }, { "×", "*" }, { "\u00a0", " " }, { "\u202f", " " }, { "\u2009", " " }, { "\t", " " },
  };
  GString *tidy = g_string_new (NULL);
  for (const char *at = text; *at != '\0';)
    {
      gboolean replaced = FALSE;
      for (guint i = 0; i < G_N_ELEMENTS (signs) && !replaced; i++)
        if (g_str_has_prefix (at, signs[i].from))
          {
            g_string_append (tidy, signs[i].to);
            at += strlen (signs[i].from);
            replaced = TRUE;
          }
      if (!replaced)
        g_string_append_c (tidy, *at++);
    }
  return g_strstrip (g_string_free (tidy, FALSE));
}

static const char *
skip_digits (const char *at)
{
  while (g_ascii_isdigit (*at))
    at++;
  return at;
}

/* "1,234" may be a thousand or a decimal comma; "0,234" and "1,23" cannot be mistaken. */
static gboolean
comma_is_ambiguous (const char *whole, const char *comma)
{
  const char *end = skip_digits (comma + 1);
  return end - (comma + 1) == 3 && comma - whole <= 3 && *whole != '0';
}

static gboolean
refuse_thousands (const char *text, GError **error)
{
  g_autofree char *plain = g_strdup (text);
  char *at = strchr (plain, ',');
  memmove (at, at + 1, strlen (at));
  plain[skip_digits (plain + (plain[0] == '-' || plain[0] == '+')) - plain] = '\0';
  g_set_error (error, HL_UNITS_ERROR, HL_UNITS_ERROR_NO_NUMBER,
               _("“%s”: the comma may separate thousands or decimals; write %s, or a decimal point"), text, plain);
  return FALSE;
}

gboolean
hl_units_read_number (const char *text, double *number, const char **end, GError **error)
{
  g_autofree char *digits = NULL;
  const char *at = text, *whole, *behind;
  char *comma;
  if (*at == '+' || *at == '-')
    at++;
  whole = at;
  at = skip_digits (at);
  behind = at;
  if (*at == '.' || (*at == ',' && g_ascii_isdigit (at[1])))
    {
      behind = skip_digits (at + 1);
      if (*at == ',' && comma_is_ambiguous (whole, at))
        return refuse_thousands (text, error);
    }
  if (behind - whole < 1 || (behind - whole == 1 && !g_ascii_isdigit (*whole)))
    {
      g_set_error (error, HL_UNITS_ERROR, HL_UNITS_ERROR_NO_NUMBER, _("“%s”: a number must stand first"), text);
      return FALSE;
    }
  if ((*behind == '.' || *behind == ',' || *behind == '\'') && g_ascii_isdigit (behind[1]))
    {
      g_set_error (error, HL_UNITS_ERROR, HL_UNITS_ERROR_NO_NUMBER,
                   _("“%s”: a number has one decimal point or comma and no separators of thousands"), text);
      return FALSE;
    }
  if ((*behind == 'e' || *behind == 'E')
      && (g_ascii_isdigit (behind[1]) || ((behind[1] == '+' || behind[1] == '-') && g_ascii_isdigit (behind[2]))))
    behind = skip_digits (behind + 2);
  digits = g_strndup (text, (gsize) (behind - text));
  comma = strchr (digits, ',');
  if (comma != NULL)
    *comma = '.';
  *number = g_ascii_strtod (digits, NULL);
  *end = behind;
  if (isfinite (*number))
    return TRUE;
  g_set_error (error, HL_UNITS_ERROR, HL_UNITS_ERROR_NOT_FINITE, _("“%s”: the number is too large"), text);
  return FALSE;
}

static gboolean
refuse_unit (const char *text, const char *unit_text, const HlUnit *unit, const HlUnit *ambiguous, HlDimension dimension, GError **error)
{
  g_autofree char *would_do = hl_unit_suggestions (dimension);
  if (unit == NULL)
    g_set_error (error, HL_UNITS_ERROR, HL_UNITS_ERROR_UNKNOWN_UNIT, _("“%s”: the unit “%s” is not known; for a %s these would do: %s"),
                 text, unit_text, hl_dimension_name (dimension), would_do);
  else if (ambiguous != NULL)
    g_set_error (error, HL_UNITS_ERROR, HL_UNITS_ERROR_UNKNOWN_UNIT, _("“%s”: the unit “%s” may mean %s or %s; mind small and capital letters"),
                 text, unit_text, unit->text, ambiguous->text);
  else if (unit->dimension != hl_unit_dimension (dimension))
    g_set_error (error, HL_UNITS_ERROR, HL_UNITS_ERROR_WRONG_DIMENSION, _("“%s”: %s is a unit of %s, but a %s is wanted here; these would do: %s"),
                 text, unit->text, hl_dimension_name (unit->dimension), hl_dimension_name (dimension), would_do);
  else
    g_set_error (error, HL_UNITS_ERROR, HL_UNITS_ERROR_UNKNOWN_UNIT, _("“%s”: %s"), text, _(unit->why));
  return FALSE;
}

gboolean
hl_unit_to_si (const HlUnit *unit, double number, HlDimension dimension, double site_pressure, double *si, GError **error)
{
  double value = hl_multiply_exactly (number, unit->factor);
  if (hl_dimension_is_difference (dimension))
    {
      if (unit->nature != HL_UNIT_PLAIN)
        {
          g_autofree char *would_do = hl_unit_suggestions (dimension);
          g_set_error (error, HL_UNITS_ERROR, HL_UNITS_ERROR_WRONG_DIMENSION,
                       _("%s says gauge or absolute, but a difference of pressures is neither; these would do: %s"), unit->text, would_do);
          return FALSE;
        }
    }
  else
    value = hl_add_exactly (value, unit->nature == HL_UNIT_GAUGE ? site_pressure : unit->offset);
  if (!isfinite (value))
    {
      g_set_error (error, HL_UNITS_ERROR, HL_UNITS_ERROR_NOT_FINITE, _("%g %s is too large"), number, unit->text);
      return FALSE;
    }
  if (value < 0.0 && dimension == HL_DIMENSION_TEMPERATURE)
    g_set_error (error, HL_UNITS_ERROR, HL_UNITS_ERROR_IMPOSSIBLE, _("%g %s lies below absolute zero"), number, unit->text);
  else if (value < 0.0 && dimension == HL_DIMENSION_PRESSURE)
    g_set_error (error, HL_UNITS_ERROR, HL_UNITS_ERROR_IMPOSSIBLE, _("%g %s would be an absolute pressure below zero; for a vacuum write the absolute pressure"),
                 number, unit->text);
  else
    {
      *si = value;
      return TRUE;
    }
  return FALSE;
}

gboolean
hl_units_parse (const char *text, HlDimension dimension, HlUnitSet set, double site_pressure, double *si, GError **error)
{
  g_autofree char *tidy = NULL;
  const char *rest;
  const HlUnit *unit, *ambiguous = NULL;
  double number;
  g_return_val_if_fail (text != NULL && si != NULL && (guint) dimension < HL_N_DIMENSIONS && (guint) set < HL_N_UNIT_SETS, FALSE);
  if (!g_utf8_validate (text, -1, NULL) || strlen (text) > 200)
    {
      g_set_error_literal (error, HL_UNITS_ERROR, HL_UNITS_ERROR_NO_NUMBER, _("The text is not UTF-8, or too long for a number with a unit"));
      return FALSE;
    }
  tidy = hl_units_tidy (text);
  if (*tidy == '\0')
    {
      g_autofree char *would_do = hl_unit_suggestions (dimension);
      g_set_error (error, HL_UNITS_ERROR, HL_UNITS_ERROR_NO_NUMBER, _("Nothing is written here; write a number and a unit: %s"), would_do);
      return FALSE;
    }
  if (!hl_units_read_number (tidy, &number, &rest, error))
    return FALSE;
  while (*rest == ' ')
    rest++;
  if (*rest == '\0')
    {
      if (*hl_units_label (dimension, set) == '\0')
        {
          *si = number;
          return TRUE;
        }
      rest = hl_units_label (dimension, set);
    }
  else if (g_ascii_isdigit (*rest))
    {
      g_set_error (error, HL_UNITS_ERROR, HL_UNITS_ERROR_NO_NUMBER, _("“%s”: write the number without a space between thousands"), tidy);
      return FALSE;
    }
  unit = hl_unit_find (rest, strlen (rest), dimension, &ambiguous);
  if (unit == NULL || ambiguous != NULL || unit->dimension != hl_unit_dimension (dimension) || unit->nature == HL_UNIT_REFUSED)
    return refuse_unit (tidy, rest, unit, ambiguous, dimension, error);
  return hl_unit_to_si (unit, number, dimension, site_pressure, si, error);
}
