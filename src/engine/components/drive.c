/* The motor of a driven machine, which it has no need of on a shaft.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/drive.h"
#include "plant/i18n.h"

void
hl_drive_emit (HlEmit *emit, int power)
{
  int electric = hl_emit_own (emit, "motor_power", HL_VAR_POWER);
  hl_emit_sum (emit, HL_SUM_PUMP_POWER, power);
  if (emit->model->is_on_shaft[emit->index])
    {
      hl_emit_done (emit, hl_add_linear (emit->system, HL_VAR_POWER, &electric, (const double[]) { 1.0 }, 1, 0.0), N_("{0} = 0: driven by its shaft"), 0);
      return;
    }
  int efficiency = hl_emit_own (emit, "motor_efficiency", HL_VAR_RATIO);
  hl_emit_done (emit, hl_add_quotient (emit->system, electric, power, efficiency), NULL, 0);
  hl_emit_sum (emit, HL_SUM_MOTOR_POWER, electric);
}
