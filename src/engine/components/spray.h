/* Water sprayed into steam: what desuperheaters and letdown stations share.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/components/components.h"
G_BEGIN_DECLS

/* @has_loss: the outlet's pressure follows from a loss; else it is free. */
void hl_spray_emit  (HlEmit *emit, gboolean has_loss);
/* @where: the state whose pressure the spray must overcome. */
void hl_spray_check (HlChecker *checker, const HlNodeResult *where);
G_END_DECLS
