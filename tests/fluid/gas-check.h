/* What the tests of gases share: reading the table of published values, making a gas by its id.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <math.h>
#include <string.h>

#include "fluid/gas.h"
#include "validation.h"

static inline const HlFluid *
gas_of (const char *id)
{
  g_autoptr (GError) error = NULL;
  const HlFluid *fluid = hl_fluid_find (id, &error);
  g_assert_no_error (error);
  return fluid;
}

/* What a kind of row is on the page of validation. */
static const struct { const char *kind, *section, *words; } published_kinds[] = {
  { "cp", "Media: gases", "heat capacity" }, { "s", "Media: gases", "entropy" }, { "h_f", "Media: gases", "enthalpy of formation" }, { "dh", "Media: gases", "enthalpy above 298.15 K" },
  { "M", "Media: gases", "molar mass" }, { "cp_mass", "Media: gases", "heat capacity" }, { "dh_300", "Media: gases", "enthalpy above 300 K" }, { "w", "Media: gases", "speed of sound" },
  { "s_liquid", "Media: gases", "entropy of the liquid" }, { "latent", "Media: gases", "heat of evaporation" }, { "p_ice", "Media: gases", "pressure over ice" },
  { "rho", "Media: liquids", "density" }, { "cp_liquid", "Media: liquids", "heat capacity" }, { "lambda", "Media: liquids", "thermal conductivity" }, { "mu", "Media: liquids", "viscosity" },
  { "humid_w", "Media: humid air", "humidity ratio" }, { "humid_h", "Media: humid air", "enthalpy" }, { "humid_dew", "Media: humid air", "dew point" },
  { "humid_phi", "Media: humid air", "relative humidity" }, { "humid_v", "Media: humid air", "volume" }, { "saturated_w", "Media: humid air", "saturated humidity ratio" },
  { "saturated_h", "Media: humid air", "saturated enthalpy" },
  { "hhv_mole", "Media: fuels", "higher heating value" }, { "lhv", "Media: fuels", "lower heating value" }, { "hhv", "Media: fuels", "higher heating value" },
  { "co2_heat", "Media: fuels", "CO2" }, { "hhv_ratio", "Media: fuels", "HHV/LHV" }, { "air_needed", "Media: fuels", "air needed" }, { "flame", "Media: fuels", "flame temperature" },
};

/* The same value by this program, in the unit of the row. */
typedef double (*OurValue) (const char *kind, const char *subject, const char *at);

/* Asserts the rows "kind,subject,at,value,unit,tolerance,source" of data/published-gases.csv that are of @kind; the source may hold commas. */
static inline guint
check_published (const char *kind, OurValue our_value)
{
  g_autofree char *path = g_test_build_filename (G_TEST_DIST, "fluid", "data", "published-gases.csv", NULL), *text = NULL;
  guint n = 0, k = 0;
  g_assert_true (g_file_get_contents (path, &text, NULL, NULL));
  while (strcmp (published_kinds[k].kind, kind) != 0)
    g_assert_cmpuint (++k, <, G_N_ELEMENTS (published_kinds));
  g_auto (GStrv) lines = g_strsplit (text, "\n", -1);
  for (guint i = 0; lines[i] != NULL; i++)
    {
      g_auto (GStrv) cells = g_strsplit (lines[i], ",", 7);
      if (g_strv_length (cells) != 7 || strcmp (cells[0], kind) != 0)
        continue;
      gboolean is_excess = strcmp (kind, "flame") == 0, is_known = strstr (cells[6], "by definition") != NULL;
      g_autofree char *subject = g_strdup_printf (is_excess ? "%s, excess air %s" : "%s, %s K", cells[1], cells[2]);
      g_autofree char *source = g_strdup_printf ("%s%s", cells[6], is_known ? "" : ", from memory");
      validate (published_kinds[k].section, subject, source, published_kinds[k].words, cells[4], g_ascii_strtod (cells[3], NULL),
                our_value (kind, cells[1], cells[2]), g_ascii_strtod (cells[5], NULL), 6);
      n++;
    }
  g_assert_cmpuint (n, >, 0);
  return n;
}
