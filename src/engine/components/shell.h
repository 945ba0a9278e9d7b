/* The condensing side that several kinds have: steam and a drain flow in, liquid flows out, at one pressure.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/components/components.h"
G_BEGIN_DECLS

/* @drain: node of a drain that flows in, or -1.  @subcooling, @heat: variables.  @computes_heat: the heat follows from this side. */
void hl_shell_emit (HlEmit *emit, int steam, int drain, int outlet, int subcooling, int heat, gboolean computes_heat);
/* A drain that would flow in uphill, and nothing to condense: findings about @drain and @outlet. */
void hl_shell_check (HlChecker *checker, const char *drain, const char *outlet);
G_END_DECLS
