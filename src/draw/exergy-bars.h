/* Bars: exergy that each component destroys, and that leaves the plant through it, largest first.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "draw/layout.h"
#include "draw/theme.h"
G_BEGIN_DECLS

typedef struct {
  int      component;      /* index of the plant; -1: others together, or consumers that are not drawn */
  gboolean is_loss;        /* leaves unused; else destroyed inside */
  gboolean is_mixed;       /* of those that stand together some do this, some that */
  double   power;          /* [W] */
  double   efficiency;     /* of the component; NaN none */
  char    *name, *number;
  HlBox    bar, name_box, number_box;
  double   size;           /* of the name's text */
} HlExergyBar;

typedef struct _HlExergyBars HlExergyBars;
HlExergyBars      *hl_exergy_bars_new   (const HlSolution *solution, HlUnitSet units, double width, double height);
/* So much at the right of the title belongs to something else. */
void               hl_exergy_bars_keep_clear (HlExergyBars *bars, double right);
void               hl_exergy_bars_free  (HlExergyBars *bars);
guint              hl_exergy_bars_n     (const HlExergyBars *bars);      /* 0: not known, and the picture says so */
const HlExergyBar *hl_exergy_bars_nth   (const HlExergyBars *bars, guint n);
void               hl_exergy_bars_draw  (const HlExergyBars *bars, cairo_t *cr, const HlTheme *theme, gboolean is_stale);
G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlExergyBars, hl_exergy_bars_free)

/* What a drawing lays over a component: exergy destroyed in it, as a part of all that comes into the plant, and in words ("1.23 MW · 4.5 %", g_free()).
 * FALSE where nothing is known, or nothing destroyed. */
gboolean hl_exergy_overlay (const HlSolution *solution, guint component, double *part, char **text);
G_END_DECLS
