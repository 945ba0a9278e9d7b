/* The state of a fluid from any two of p, T, h, s, x and density.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "fluid/fluid.h"
G_BEGIN_DECLS

typedef enum {
  HL_STATE_P, HL_STATE_T, HL_STATE_H, HL_STATE_S, HL_STATE_RHO, HL_STATE_X,
  HL_N_STATE_KEYS
} HlStateKey;

/* [SI]; the order of the two does not matter.  Where two states answer, none is chosen: @message says so.
 * @message: (out): why there is no state; g_free(). */
gboolean hl_state_from_pair (const HlFluid *fluid, HlStateKey first, double first_value, HlStateKey second, double second_value,
                             HlState *state, char **message);
G_END_DECLS
