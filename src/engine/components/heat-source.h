/* What heat input and fired boiler have in common: feed to live steam, and reheats.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/components/components.h"
G_BEGIN_DECLS

int  hl_heat_source_emit      (HlEmit *emit);          /* returns the heat to the working fluid */
void hl_heat_source_check     (HlChecker *checker);
void hl_heat_source_processes (HlProcessSink *sink);
G_END_DECLS
