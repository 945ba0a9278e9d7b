/* Generator: electricity from what its shaft leaves.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/components.h"
#include "plant/i18n.h"
#include <math.h>

static void
emit_generator (HlEmit *emit)
{
  int shaft = hl_emit_own (emit, "shaft_power", HL_VAR_POWER), power = hl_emit_own (emit, "power", HL_VAR_POWER);
  int efficiency = hl_emit_own (emit, "efficiency", HL_VAR_RATIO);
  hl_emit_done (emit, hl_add_product (emit->system, shaft, efficiency, power), NULL, 2);
  if (!emit->model->is_on_shaft[emit->index])
    hl_emit_done (emit, hl_add_linear (emit->system, HL_VAR_POWER, &shaft, (const double[]) { 1.0 }, 1, 0.0), N_("{0} = 0: on no shaft"), 0);
  hl_emit_sum (emit, HL_SUM_GROSS, power);
}

static void
check (HlChecker *checker)
{
  double power;
  if (!checker->model->is_on_shaft[checker->index])
    hl_check_add (checker, HL_GRADE_WARNING, "no-shaft", "",
                  g_strdup_printf (_("Generator %s is on no shaft and gives no power. Join it to a turbine."), checker->component->id));
  else if (hl_check_own (checker, "shaft_power", &power) && power < -1e-9 * hl_system_scale (checker->model->system, HL_VAR_POWER))
    {
      g_autofree char *text = hl_check_text (checker, HL_DIMENSION_POWER, power);
      hl_check_add (checker, HL_GRADE_ERROR, "shaft-power", "shaft_power",
                    g_strdup_printf (_("The shaft of generator %s takes more power than its turbines give: %s is left."), checker->component->id, text));
    }
}

const HlComponentModel hl_generator_model = { "generator", emit_generator, check, NULL };
