/* What exchanger and recuperator have in common: two streams in counterflow.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/components/components.h"
G_BEGIN_DECLS

void hl_exchange_emit      (HlEmit *emit);
void hl_exchange_count     (HlEmit *emit, int heat);      /* to the plant's sum that the option "counts" names */
void hl_exchange_check     (HlChecker *checker);
void hl_exchange_processes (HlProcessSink *sink);
G_END_DECLS
