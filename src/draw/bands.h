/* Bands: where the energy, or the exergy, of the whole plant comes from and where it goes, widths to scale.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "draw/theme.h"
G_BEGIN_DECLS

/* In the order in which they join and leave the main band. */
typedef enum {
  HL_BAND_FUEL,          /* in: fuel, by lower heating value */
  HL_BAND_FIRING_LOSS,   /* out: flue gas and other losses of a boiler */
  HL_BAND_HEAT,          /* in: heat from elsewhere */
  HL_BAND_POWER,         /* in: electricity from outside, where the plant needs more than it gives */
  HL_BAND_WATER_IN,      /* in: make-up and what comes in at boundaries */
  HL_BAND_PUMPS,         /* comes back: power that pumps give to the water */
  HL_BAND_HEAT_LOSS,     /* out: of pipes */
  HL_BAND_DESTROYED,     /* gone: exergy destroyed on the way of the steam */
  HL_BAND_DELIVERED,     /* out: process heat */
  HL_BAND_WATER_OUT,     /* out: water lost, and what leaves at boundaries */
  HL_BAND_REJECTED,      /* out: to the surroundings */
  HL_BAND_SHAFT_LOSS,    /* out: bearings, gears, generators */
  HL_BAND_OWN,           /* out: losses of motors, and other consumers */
  HL_BAND_NET,           /* out: net power */
  HL_BAND_REST,          /* what no component accounts for; above 0 out, below 0 in */
} HlBandKind;
typedef struct { HlBandKind kind; char *name; double power; } HlBand;   /* [W] */

typedef struct {
  GArray  *bands;        /* of HlBand, by kind */
  double   input;        /* fuel, heat and power from outside [W]: what percentages refer to */
  gboolean is_complete;  /* every value was known, and the bands can be drawn */
} HlBands;
HlBands *hl_bands_new  (const HlSolution *solution);
/* The same of exergy: what is destroyed stands among what leaves. */
HlBands *hl_bands_new_exergy (const HlSolution *solution);
void     hl_bands_free (HlBands *bands);
/* Sum of one kind. */
double   hl_bands_sum  (const HlBands *bands, HlBandKind kind);
G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlBands, hl_bands_free)

typedef struct _HlBandsPicture HlBandsPicture;
typedef enum { HL_BANDS_ENERGY, HL_BANDS_EXERGY } HlBandsOf;
HlBandsPicture *hl_bands_picture_new_of (const HlSolution *solution, HlBandsOf of, HlUnitSet units, double width, double height);
/* Of energy. */
HlBandsPicture *hl_bands_picture_new  (const HlSolution *solution, HlUnitSet units, double width, double height);
void            hl_bands_picture_free (HlBandsPicture *picture);
/* So much at the right of the title belongs to something else. */
void            hl_bands_picture_keep_clear (HlBandsPicture *picture, double right);
void            hl_bands_picture_draw (const HlBandsPicture *picture, cairo_t *cr, const HlTheme *theme, gboolean is_stale);
G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlBandsPicture, hl_bands_picture_free)
G_END_DECLS
