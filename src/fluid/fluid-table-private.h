/* The table of (p,h) from the inside.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "fluid/fluid-table.h"
#include "fluid/helmholtz-private.h"
G_BEGIN_DECLS

/* Pressure counts as x: below the critical one sqrt(ln(pc/p)), in which saturation is smooth, above it ln(p/pc).
 * Enthalpy counts as y from 0 to 1: from the saturation line outwards to the coldest or hottest isotherm, so that no
 * cell straddles the line; above the critical pressure from the coldest to the hottest. */
enum { HL_TABLE_LIQUID, HL_TABLE_VAPOUR, HL_TABLE_ABOVE, HL_N_TABLE_REGIONS };
#define HL_TABLE_NX 97
#define HL_TABLE_NY 97
#define HL_TABLE_SMALLEST_P 1e-4      /* of the critical pressure */
#define HL_TABLE_X_LOW 0.2            /* p = 0.961 pc */
#define HL_TABLE_ABOVE_LOW 0.04       /* p = 1.041 pc */
#define HL_TABLE_LARGEST_P 12.0       /* of the critical pressure */
#define HL_TABLE_T_MISS 1e-3          /* [K] */
#define HL_TABLE_S_MISS 1e-6          /* relative to the larger of s and R */
#define HL_TABLE_V_MISS 1e-5          /* relative */

/* A value with its slopes over x and y in steps of the grid, and the mixed one. */
typedef struct { double f, x, y, xy; } HlTableNode;
typedef struct { HlTableNode T, s, v; } HlTableNodes;
typedef struct { double f, x; } HlTableEdge;

typedef struct {
  double       x_low, x_step;
  HlTableEdge  inner[HL_TABLE_NX], outer[HL_TABLE_NX];       /* h at y = 0 and 1 */
  HlTableNodes nodes[HL_TABLE_NX][HL_TABLE_NY];
  guint8       is_good[HL_TABLE_NX - 1][HL_TABLE_NY - 1];
} HlTableRegion;

/* Both ends of the dome along x, of the subcritical regions. */
typedef struct { HlTableEdge T, h[2], s[2], v[2]; } HlTableLine;

/* All that goes to disk. */
typedef struct {
  HlTableRegion regions[HL_N_TABLE_REGIONS];
  HlTableLine   line[HL_TABLE_NX];
  guint8        is_line_good[HL_TABLE_NX - 1];
} HlTableData;

struct _HlFluidTable {
  const HlHelmholtz *eq;
  double             R, Tc, pc, ln_pc;
  double             per_step[HL_N_TABLE_REGIONS];
  HlTableData        data;
};

/* fluid-table-build.c: FALSE where the medium cannot have one; @share is written for others to read. */
gboolean hl_table_build (HlFluidTable *table, gint *percent);

/* fluid-table-cache.c */
gboolean hl_table_load  (HlFluidTable *table);
void     hl_table_save  (const HlFluidTable *table);
char    *hl_table_path  (const HlHelmholtz *eq);           /* of its file in the user's cache folder */

/* fluid-table.c: without regard to the promise. */
void     hl_table_prepare (HlFluidTable *table);           /* after the grids are placed or read */
gboolean hl_table_lookup (const HlFluidTable *table, guint region, double p, double x, double x_p, double h, HlState *state, gboolean *is_good);
gboolean hl_table_below  (const HlFluidTable *table, double p, double x, double x_p, double h, HlState *state, gboolean *is_good);
void     hl_table_x (const HlFluidTable *table, double p, double *x, double *x_p);

/* Cubic through both ends of a step with slopes over that step, at u in 0..1. */
static inline double
hl_hermite (double f0, double d0, double f1, double d1, double u, double *slope)
{
  double c2 = 3.0 * (f1 - f0) - 2.0 * d0 - d1, c3 = d0 + d1 - 2.0 * (f1 - f0);
  *slope = d0 + u * (2.0 * c2 + u * 3.0 * c3);
  return f0 + u * (d0 + u * (c2 + u * c3));
}

G_END_DECLS
