/* What the files of the bands share: the finished picture.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "draw/bands.h"
#include "draw/layout.h"
G_BEGIN_DECLS

typedef enum { HL_STRIP_IN, HL_STRIP_DOWN, HL_STRIP_UP, HL_STRIP_END } HlStripWay;
typedef struct {
  HlBandKind  kind;
  HlStripWay  way;
  double      power;
  double      x;                /* where it leaves the main band; IN: where it begins */
  double      edge;             /* y of the main band's outer edge there */
  double      width;            /* to scale */
  double      tip;              /* y of its end; END: x */
  char       *lines[3];         /* name, power, percentage; NULL none */
  HlBox       label;
  double      size;             /* of the text */
  int         align;
} HlStrip;

struct _HlBandsPicture {
  double      width, height, text_size, clear;
  HlBandsOf   of;
  HlBands    *bands;
  char       *title, *remark;
  double      scale;            /* pixels a watt */
  double      radius;           /* of the inner side of a bend */
  double      left, right;      /* ends of the main band */
  double      steam_from, power_from;     /* where it changes its nature */
  double      top;              /* of the main band at its left end */
  GArray     *strips;           /* of HlStrip in order */
  gboolean    has_loop;         /* pumps' power comes back */
  double      loop_from, loop_to, loop_width, loop_level, loop_edge;
};
/* "T1 turbine"; g_free(). */
char *hl_bands_label (const HlComponent *component);
/* Drops what is rounding only, sorts by kind, and says whether what is left can be drawn. */
void  hl_bands_clean (HlBands *bands);
/* Upper and lower edge of the main band just right of @x. */
void hl_bands_picture_edges (const HlBandsPicture *picture, double x, double *top, double *bottom);
G_END_DECLS
