/* What open heater, splitter and mixer have in common: streams of one pressure meet or part.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/components/components.h"
G_BEGIN_DECLS

#define HL_MIXING_MOST 16     /* ports */

void hl_mixing_merge_pressures (HlEmit *emit, const int *nodes, int n);
/* All but the last node flow in, the last one flows out: one pressure, balances of mass and energy. */
void hl_mixing_emit            (HlEmit *emit, const int *nodes, int n);
/* From each of the ports @first (NULL-terminated, nullable) and @base 1 to @n to the outlet. */
void hl_mixing_processes       (HlProcessSink *sink, const char *const *first, const char *base, int n);
G_END_DECLS
