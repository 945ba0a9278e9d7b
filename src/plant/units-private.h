/* The table of units, and how a text names one.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "plant/units.h"
G_BEGIN_DECLS

typedef enum {
  HL_UNIT_PLAIN,        /* SI value = number * factor + offset */
  HL_UNIT_GAUGE,        /* counts from the site's ambient pressure */
  HL_UNIT_ABSOLUTE,     /* says "absolute", so it cannot be a difference */
  HL_UNIT_REFUSED,      /* has no safe meaning: see why */
} HlUnitNature;

typedef struct {
  const char   *text;           /* as people write it: "kJ/(kg K)" */
  HlDimension   dimension;      /* of a difference the dimension of the whole: PRESSURE, TEMPERATURE */
  double        factor, offset;
  HlUnitNature  nature;
  const char   *why;            /* N_(): why it is refused, and what to write */
} HlUnit;

/* The unit that @text (@length bytes) names for this dimension, else for any; NULL when it is none.
 * @ambiguous: (out): the spelling fits several units that differ by letter case only. */
const HlUnit *hl_unit_find   (const char *text, gsize length, HlDimension dimension, const HlUnit **ambiguous);
/* Pressure and temperature for their differences, otherwise @dimension. */
HlDimension   hl_unit_dimension (HlDimension dimension);
gboolean      hl_dimension_is_difference (HlDimension dimension);
/* number * factor, number / factor and number + offset as with decimal digits: 0.07 bar is 7000 Pa, 83 % is 0.83,
 * 485.1 °C is 758.25 K, where doubles alone would often end at a neighbour. */
double        hl_multiply_exactly (double number, double factor);
double        hl_divide_exactly   (double number, double factor);
double        hl_add_exactly      (double number, double offset);
/* Units that would do, in words: "bar, bara, barg, mbar ...". */
char         *hl_unit_suggestions (HlDimension dimension);

/* Replaces the many signs for degree, minus, powers and spaces by one each.  g_free(). */
char         *hl_units_tidy  (const char *text);
/* A number at the start of @text: sets @end behind it.  @error: (nullable). */
gboolean      hl_units_read_number (const char *text, double *number, const char **end, GError **error);
/* A number with one of these units to SI, by dimension. */
gboolean      hl_unit_to_si  (const HlUnit *unit, double number, HlDimension dimension, double site_pressure, double *si, GError **error);
G_END_DECLS
