/* What makes a fuel: substances with their heats of formation, the named fuels.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "fluid/fuel.h"
#include "fluid/gas-private.h"
G_BEGIN_DECLS

/* A substance that fuels consist of; those that are species of gases take their heat of formation from there. */
typedef struct {
  const char *formula;
  guint       C, H, O, N, S;
  double      h_formation;          /* [J/mol] at 298.15 K; NaN: that of the species of this formula */
  gboolean    is_liquid;
} HlFuelSubstance;

typedef struct {
  const char *name;                 /* id */
  const char *text;                 /* what hl_fuel_find() would take */
  double      fossil_share;
  const char *source;
} HlNamedFuel;

extern const HlFuelSubstance hl_fuel_substances[];
extern const guint           hl_n_fuel_substances;
extern const HlNamedFuel     hl_named_fuels[];
extern const guint           hl_n_named_fuels;

/* Enthalpies of what burning leaves, from the elements at 298.15 K [J/mol]. */
double hl_fuel_product_h      (const char *formula);
double hl_fuel_evaporation_h  (void);           /* of water at 298.15 K [J/mol] */

G_END_DECLS
