/* Heating surfaces on a gas path: what they share.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/components/exchange.h"
G_BEGIN_DECLS

/* Gas that heats what flows through a coil. */
extern const HlExchangeSides hl_bank_sides;

/* difference = T_sat(p of @node) - T of @node; where the difference has a value it sets the state. */
void hl_bank_emit_below_saturation (HlEmit *emit, const char *key, int node);
G_END_DECLS
