/* Shortest decimal text of a double, fast for the sizes that states have.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "batch/number.h"

#include <float.h>
#include <math.h>
#include <stdio.h>
#include <string.h>

/* Powers of ten up to 10^27 are exact in the 64-bit significand of an x87 long double (5^27 < 2^64).  A type with
 * fewer digits takes the slow way only. */
#define HAS_WIDE_TYPE (LDBL_MANT_DIG >= 64)
#define LARGEST_POWER 27

static const long double powers[LARGEST_POWER + 1] = {
  1e0L, 1e1L, 1e2L, 1e3L, 1e4L, 1e5L, 1e6L, 1e7L, 1e8L, 1e9L, 1e10L, 1e11L, 1e12L, 1e13L, 1e14L, 1e15L, 1e16L, 1e17L,
  1e18L, 1e19L, 1e20L, 1e21L, 1e22L, 1e23L, 1e24L, 1e25L, 1e26L, 1e27L,
};

static gsize
print_slowly (double value, char *text)
{
  for (int digits = 15; digits <= 17; digits++)
    {
      g_snprintf (text, HL_NUMBER_SIZE, "%.*g", digits, value);
      if (digits == 17 || g_ascii_strtod (text, NULL) == value)
        break;
    }
  return strlen (text);
}

static long double
scale (long double value, int power)
{
  return power >= 0 ? value * powers[power] : value / powers[-power];
}

/* value = digits * 10^exponent with the fewest digits that read back, 15 to 17 before zeros are dropped; FALSE where
 * the wide type cannot tell. */
static gboolean
find_digits (double value, guint64 *digits, int *exponent)
{
  int binary;
  frexp (value, &binary);
  int leading = (int) floor ((binary - 1) * 0.30102999566398120);    /* log10 (2); exact, or one too small */
  if (leading < -10 || leading > LARGEST_POWER - 2)
    return FALSE;
  guint64 full = (guint64) llrintl (scale (value, 16 - leading));
  if (full >= 100000000000000000u)
    full = (guint64) llrintl (scale (value, 16 - ++leading));
  if (full < 10000000000000000u || full >= 100000000000000000u)
    return FALSE;

  /* Fewer digits will do when they lie inside the half step to the next double; just at its edge the wide type may
   * round the wrong way, and there one digit more costs nothing. */
  long double reach = 0.49L * (value - nextafter (value, 0.0));
  for (int dropped = 2; dropped >= 1; dropped--)
    {
      guint64 step = dropped == 2 ? 100 : 10, fewer = (full + step / 2) / step;
      if (fabsl (scale ((long double) fewer, leading - 16 + dropped) - value) < reach)
        {
          *digits = fewer;
          *exponent = leading - 16 + dropped;
          return TRUE;
        }
    }
  *digits = full;
  *exponent = leading - 16;
  return TRUE;
}

static char *
print_zeros (char *out, int n)
{
  while (n-- > 0)
    *out++ = '0';
  return out;
}

gsize
hl_number_print (double value, char *text)
{
  guint64 whole;
  int exponent, n = 0;
  if (!HAS_WIDE_TYPE || value == 0.0 || !isfinite (value) || !find_digits (fabs (value), &whole, &exponent))
    return print_slowly (value, text);
  for (; whole % 10 == 0; whole /= 10)
    exponent++;
  char reversed[24];
  for (; whole > 0; whole /= 10)
    reversed[n++] = (char) ('0' + whole % 10);
  int n_whole = n + exponent;              /* digits before the decimal point */
  if (n_whole < -4 || n_whole > 17)
    return print_slowly (value, text);

  char *out = text;
  if (value < 0.0)
    *out++ = '-';
  if (n_whole <= 0)
    {
      *out++ = '0';
      *out++ = '.';
      out = print_zeros (out, -n_whole);
    }
  for (int i = n - 1; i >= 0; i--)
    {
      *out++ = reversed[i];
      if (i > 0 && n - i == n_whole)
        *out++ = '.';
    }
  out = print_zeros (out, exponent);
  *out = '\0';
  return (gsize) (out - text);
}

gboolean
hl_number_read (const char *text, double *value)
{
  char *end;
  double read = g_ascii_strtod (text, &end);
  if (end == text || !isfinite (read))
    return FALSE;
  while (g_ascii_isspace (*end))
    end++;
  if (*end != '\0')
    return FALSE;
  *value = read;
  return TRUE;
}
