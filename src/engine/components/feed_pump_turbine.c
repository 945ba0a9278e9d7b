/* Feed pump turbine: a turbine section that drives pumps and gives no electricity.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/turbine.h"
#include "plant/i18n.h"

static void
check (HlChecker *checker)
{
  if (!checker->model->is_on_shaft[checker->index])
    hl_check_add (checker, HL_GRADE_WARNING, "no-shaft", "",
                  g_strdup_printf (_("Feed pump turbine %s drives nothing, and its power is lost. Join it to a pump."), checker->component->id));
  hl_turbine_check (checker);
}

const HlComponentModel hl_feed_pump_turbine_model = { "feed_pump_turbine", hl_turbine_emit, check, hl_turbine_processes };
