/* What the dimensions of quantities are made of, so that expressions can be checked.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/tie-private.h"
#include "plant/i18n.h"
#include <string.h>

#define BASE(kg, m, s, K) { { 4 * (kg), 4 * (m), 4 * (s), 4 * (K) } }

/* Ratios, heat rates and counts have none.  Temperatures and pressures share theirs with their differences. */
static const HlBaseUnits bases[HL_N_DIMENSIONS] = {
  [HL_DIMENSION_PRESSURE] = BASE (1, -1, -2, 0),
  [HL_DIMENSION_PRESSURE_DIFFERENCE] = BASE (1, -1, -2, 0),
  [HL_DIMENSION_TEMPERATURE] = BASE (0, 0, 0, 1),
  [HL_DIMENSION_TEMPERATURE_DIFFERENCE] = BASE (0, 0, 0, 1),
  [HL_DIMENSION_MASS_FLOW] = BASE (1, 0, -1, 0),
  [HL_DIMENSION_ENTHALPY] = BASE (0, 2, -2, 0),
  [HL_DIMENSION_ENTROPY] = BASE (0, 2, -2, -1),
  [HL_DIMENSION_VOLUME] = BASE (-1, 3, 0, 0),
  [HL_DIMENSION_POWER] = BASE (1, 2, -3, 0),
  [HL_DIMENSION_CONDUCTANCE] = BASE (1, 2, -3, -1),
  [HL_DIMENSION_LENGTH] = BASE (0, 1, 0, 0),
  [HL_DIMENSION_STEAM_RATE] = BASE (0, -2, 2, 0),
  [HL_DIMENSION_VOLUME_FLOW] = BASE (0, 3, -1, 0),
  [HL_DIMENSION_AREA] = BASE (0, 2, 0, 0),
  [HL_DIMENSION_APERTURE] = BASE (0, 2, 0, 0),
  [HL_DIMENSION_IRRADIANCE] = BASE (1, 0, -3, 0),
  [HL_DIMENSION_EMISSION] = BASE (0, -2, 2, 0),
};

HlBaseUnits
hl_dimension_base (HlDimension dimension)
{
  static const HlBaseUnits none = { { 0, 0, 0, 0 } };
  return (guint) dimension < HL_N_DIMENSIONS ? bases[dimension] : none;
}

gboolean
hl_base_equal (HlBaseUnits a, HlBaseUnits b)
{
  return memcmp (a.power, b.power, sizeof a.power) == 0;
}

gboolean
hl_base_is_none (HlBaseUnits base)
{
  return hl_base_equal (base, bases[HL_DIMENSION_RATIO]);
}

HlDimension
hl_dimension_of_base (HlBaseUnits base)
{
  for (guint k = 0; k < HL_N_DIMENSIONS; k++)
    if (hl_base_equal (bases[k], base))
      return (HlDimension) k;
  return HL_N_DIMENSIONS;
}

/* "kg2 m-1": only units whose power has the wanted sign. */
static void
add_units (GString *text, HlBaseUnits base, int sign)
{
  static const char *const names[] = { "kg", "m", "s", "K" };
  gboolean any = FALSE;
  for (guint k = 0; k < 4; k++)
    {
      int power = sign * base.power[k];
      if (power <= 0)
        continue;
      g_string_append_printf (text, "%s%s", any ? " " : "", names[k]);
      if (power != 4 && power % 4 == 0)
        g_string_append_printf (text, "%d", power / 4);
      else if (power != 4)
        g_string_append_printf (text, "^%g", power / 4.0);
      any = TRUE;
    }
  if (!any && sign > 0)
    g_string_append_c (text, '1');
}

char *
hl_base_name (HlBaseUnits base)
{
  HlDimension dimension = hl_dimension_of_base (base);
  if (dimension != HL_N_DIMENSIONS)
    return g_strdup (hl_dimension_name (dimension));
  g_autoptr (GString) above = g_string_new (NULL), below = g_string_new (NULL);
  add_units (above, base, 1);
  add_units (below, base, -1);
  if (below->len > 0)
    return g_strdup_printf (_("number in %s/(%s)"), above->str, below->str);
  return g_strdup_printf (_("number in %s"), above->str);
}

HlBaseUnits
hl_base_product (HlBaseUnits a, HlBaseUnits b, int sign)
{
  HlBaseUnits product;
  for (guint k = 0; k < 4; k++)
    product.power[k] = (gint8) CLAMP (a.power[k] + sign * b.power[k], -120, 120);
  return product;
}

gboolean
hl_base_root (HlBaseUnits base, HlBaseUnits *root)
{
  for (guint k = 0; k < 4; k++)
    {
      if (base.power[k] % 2 != 0)
        return FALSE;
      root->power[k] = (gint8) (base.power[k] / 2);
    }
  return TRUE;
}
