/* Recuperator: two streams in counterflow.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/exchange.h"

const HlComponentModel hl_recuperator_model = { "recuperator", hl_exchange_emit, hl_exchange_check, hl_exchange_processes };
