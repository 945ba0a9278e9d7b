/* Motor on a shaft: gives what the other machines leave open.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/components.h"
#include "plant/i18n.h"

static void
emit_motor (HlEmit *emit)
{
  int power = hl_emit_own (emit, "power", HL_VAR_POWER), efficiency = hl_emit_own (emit, "efficiency", HL_VAR_RATIO);
  int electric = hl_emit_own (emit, "motor_power", HL_VAR_POWER);
  hl_emit_done (emit, hl_add_quotient (emit->system, electric, power, efficiency), NULL, 0);
  if (!emit->model->is_on_shaft[emit->index])
    hl_emit_done (emit, hl_add_linear (emit->system, HL_VAR_POWER, &power, (const double[]) { 1.0 }, 1, 0.0), N_("{0} = 0: on no shaft"), 0);
  hl_emit_sum (emit, HL_SUM_MOTOR_POWER, electric);
}

static void
check (HlChecker *checker)
{
  double power;
  if (!checker->model->is_on_shaft[checker->index])
    hl_check_add (checker, HL_GRADE_WARNING, "no-shaft", "",
                  g_strdup_printf (_("Motor %s drives nothing. Join it to a pump or a compressor."), checker->component->id));
  else if (hl_check_own (checker, "power", &power) && power < 0.0)
    {
      g_autofree char *text = hl_check_text (checker, HL_DIMENSION_POWER, -power);
      hl_check_add (checker, HL_GRADE_ERROR, "shaft-power", "power",
                    g_strdup_printf (_("The shaft of motor %s would drive it with %s. Put a generator in its place."), checker->component->id, text));
    }
}

const HlComponentModel hl_motor_model = { "motor", emit_motor, check, NULL };
