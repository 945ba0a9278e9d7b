/* Circuits: connected parts of the mass-balance graph; the two sides of an exchanger are two.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/model.h"
G_BEGIN_DECLS

/* [n nodes] a number for the circuit of each node; g_free(). */
int     *hl_circuits          (const HlModel *model);
/* Does any port of @a share a circuit with any port of @b? */
gboolean hl_circuits_shared   (const HlModel *model, const int *circuits, int a, int b);
/* [n nodes] cooling water and the like: a circuit through a condenser's tubes that drives no turbine; g_free(). */
gboolean *hl_circuits_service (const HlModel *model, const int *circuits);
G_END_DECLS
