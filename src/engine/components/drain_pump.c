/* Drain pump: a pump for condensate of heaters.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/pump.h"

const HlComponentModel hl_drain_pump_model = { "drain_pump", hl_pump_emit, hl_pump_check, hl_pump_processes };
