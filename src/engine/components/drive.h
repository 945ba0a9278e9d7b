/* The motor of a driven machine, and pressure ratios.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/components/components.h"
G_BEGIN_DECLS

/* Adds motor_power, and motor_efficiency unless a shaft drives the machine; @power: its shaft power. */
void hl_drive_emit (HlEmit *emit, int power);
/* ratio = p_out / p_in */
HlEquation *hl_drive_add_ratio (HlSystem *system, int p_in, int p_out, int ratio);
G_END_DECLS
