/* What turbine sections and their relatives share.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/components/components.h"
G_BEGIN_DECLS

void hl_turbine_emit      (HlEmit *emit);
void hl_turbine_check     (HlChecker *checker);
void hl_turbine_processes (HlProcessSink *sink);
G_END_DECLS
