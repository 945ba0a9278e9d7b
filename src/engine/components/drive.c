/* The motor of a driven machine, which it has no need of on a shaft; pressure ratios.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/drive.h"
#include "plant/i18n.h"
#include <math.h>

static HlStatus
ratio_of (G_GNUC_UNUSED const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  double ratio = exp (x[1] - x[0]);
  *r = x[2] - ratio;
  dr[0] = ratio;
  dr[1] = -ratio;
  dr[2] = 1.0;
  return HL_OK;
}

HlEquation *
hl_drive_add_ratio (HlSystem *system, int p_in, int p_out, int ratio)
{
  HlEquation *e = hl_system_add_equation (system, ratio_of, HL_VAR_RATIO, 4, (const int[]) { p_in, p_out, ratio }, 3, NULL, 0);
  e->says = N_("{2} = {1} ÷ {0}");
  return e;
}

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
