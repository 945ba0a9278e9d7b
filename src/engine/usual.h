/* What is usual: values that a kind's table knows, pressures between their neighbours along an expansion.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/model.h"
#include "engine/numbers.h"
G_BEGIN_DECLS

typedef struct { HlModel *model; HlStructure *structure; } HlUsualSource;
HlUsual hl_usual (HlUsualSource *source);    /* keeps the pointer */
G_END_DECLS
