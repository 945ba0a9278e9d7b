/* What pumps share.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/components/components.h"
G_BEGIN_DECLS

void hl_pump_emit      (HlEmit *emit);
void hl_pump_check     (HlChecker *checker);
void hl_pump_processes (HlProcessSink *sink);
G_END_DECLS
