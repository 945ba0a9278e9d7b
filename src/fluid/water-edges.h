/* Edges of the regions at given pressure, approximately: which region has a value of h or s, in most cases without its equation.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "fluid/if97-private.h"
#include "fluid/if97-sum.h"

#include <math.h>
G_BEGIN_DECLS

/* The second argument of a pair with p. */
typedef enum { HL_KEY_H, HL_KEY_S } HlKey;

/* Saturated liquid and vapour up to psat(623.15 K); above that pressure
 * region 1 at 623.15 K and region 2 at the B23 boundary. */
typedef enum { HL_EDGE_LIQUID, HL_EDGE_VAPOUR, HL_EDGE_13, HL_EDGE_B23, HL_N_EDGES } HlEdge;

/* Polynomials of sixth degree, fitted for this library to the regions' own
 * equations for the least largest error, in (p/(64 Pa^(1/4))^4)^(1/4) for the
 * first two edges and (p/100 MPa)^(1/2) for the others.  The margin is above
 * the largest error (1116, 738, 191, 3282 J/kg and 4.7, 11.3, 0.31, 5.6
 * J/(kg K)): a value outside it lies on that side of the edge for certain. */
static const struct { double margin, c[7]; } hl_edges[HL_N_EDGES][2] = {
  [HL_EDGE_LIQUID] = {
    { 1200.0, { -258918.607, 3992537.37, -9784064.27, 20684466.7, -23980895.0, 14163875.1, -3137833.96 } },
    { 5.0, { -999.629247, 16304.344, -51717.895, 116842.525, -150103.024, 100142.467, -26681.7542 } },
  },
  [HL_EDGE_VAPOUR] = {
    { 800.0, { 2369496.45, 2147036.41, -7349163.04, 19806039.6, -31427799.1, 25381308.1, -8370507.96 } },
    { 12.0, { 10965.2495, -31252.2321, 120300.644, -280463.7, 366464.067, -247652.608, 66848.1794 } },
  },
  [HL_EDGE_13] = {
    { 210.0, { 4691669.42, -24206475.3, 81635455.9, -148885064.0, 152540740.0, -82770724.7, 18548512.1 } },
    { 0.34, { 8719.35953, -39197.974, 131788.063, -240700.876, 246610.351, -133802.818, 29981.9862 } },
  },
  [HL_EDGE_B23] = {
    { 3500.0, { -36731743.1, 346439324.0, -1246001930.0, 2347300200.0, -2448220280.0, 1343251880.0, -303227791.0 } },
    { 6.0, { -57826.3439, 562557.581, -2041462.95, 3870023.45, -4057098.29, 2235140.18, -506241.26 } },
  },
};

HL_IF97_INLINE double
hl_edge_variable (HlEdge edge, double p)
{
  return edge <= HL_EDGE_VAPOUR ? sqrt (sqrt (p)) * (1.0 / 64.0) : sqrt (p) * 1e-4;
}

/* The edge's approximate h [J/kg] or s [J/(kg K)] from the variable above. */
HL_IF97_INLINE double
hl_edge_value (HlEdge edge, HlKey key, double z)
{
  const double *c = hl_edges[edge][key].c;
  double z2 = z * z;
  return (c[0] + c[1] * z) + z2 * ((c[2] + c[3] * z) + z2 * ((c[4] + c[5] * z) + z2 * c[6]));
}

G_END_DECLS
