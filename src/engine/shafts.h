/* Shafts: lines of machines in order, whose powers balance part by part.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/model.h"
G_BEGIN_DECLS

/* Which components sit on a shaft that carries power on, and whether the plant gives electricity at all: before components emit. */
void hl_shafts_look (HlModel *model);
/* Balances of the shafts: when all components have their variables. */
void hl_shafts_add  (HlModel *model);
G_END_DECLS
