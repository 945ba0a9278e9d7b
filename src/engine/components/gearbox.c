/* Gearbox: loses a part of the power that passes through it, whichever way that runs.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/components.h"
#include "plant/i18n.h"
#include <math.h>

/* out = efficiency in; where power runs the other way, in = efficiency out, both negative. */
static HlStatus
passage (G_GNUC_UNUSED const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  double in = x[0], efficiency = x[1];
  if (!(efficiency > 0.0))
    return HL_OUTSIDE_RANGE;
  *r = x[2] - (in >= 0.0 ? in * efficiency : in / efficiency);
  dr[0] = in >= 0.0 ? -efficiency : -1.0 / efficiency;
  dr[1] = in >= 0.0 ? -in : in / (efficiency * efficiency);
  dr[2] = 1.0;
  return HL_OK;
}

void
hl_gearbox_emit_passage (HlModel *model, int gearbox, int in, int efficiency, int out, gboolean is_sure)
{
  HlEquation *e;
  if (is_sure)
    e = hl_add_product (model->system, in, efficiency, out);
  else
    {
      e = hl_system_add_equation (model->system, passage, HL_VAR_POWER, 4, (const int[]) { in, efficiency, out }, 3, NULL, 0);
      e->says = N_("{2} = {0} × {1}, or {0} ÷ {1} where power runs back");
      e->output = 2;
    }
  e->component = gearbox;
}

static void
emit_gearbox (HlEmit *emit)
{
  int in = hl_emit_own (emit, "input_power", HL_VAR_POWER), efficiency = hl_emit_own (emit, "efficiency", HL_VAR_RATIO);
  int out = hl_emit_own (emit, "output_power", HL_VAR_POWER), loss = hl_emit_own (emit, "loss", HL_VAR_POWER);
  hl_emit_done (emit, hl_add_linear (emit->system, HL_VAR_POWER, (const int[]) { loss, in, out }, (const double[]) { 1.0, -1.0, 1.0 }, 3, 0.0),
                N_("{0} = {1} − {2}"), 0);
  if (emit->model->is_on_shaft[emit->index])
    return;                                    /* its passage comes with the shaft, which knows which way power runs */
  hl_gearbox_emit_passage (emit->model, emit->index, in, efficiency, out, TRUE);
  hl_emit_done (emit, hl_add_linear (emit->system, HL_VAR_POWER, &in, (const double[]) { 1.0 }, 1, 0.0), N_("{0} = 0: on no shaft"), 0);
}

/* A gearbox with nothing beyond it passes nothing on. */
static gboolean
is_at_end (const HlChecker *checker)
{
  const HlShaft *shaft = hl_plant_shaft_of (checker->model->plant, checker->component->id);
  return shaft != NULL && shaft->n_joins > 0
         && (shaft->joins[0] == checker->component->id || shaft->joins[shaft->n_joins - 1] == checker->component->id);
}

static void
check (HlChecker *checker)
{
  if (!checker->model->is_on_shaft[checker->index])
    hl_check_add (checker, HL_GRADE_WARNING, "no-shaft", "",
                  g_strdup_printf (_("Gearbox %s is on no shaft that carries power. Join it to what drives and what is driven."), checker->component->id));
  else if (is_at_end (checker))
    hl_check_add (checker, HL_GRADE_WARNING, "gearbox-at-end", "",
                  g_strdup_printf (_("Gearbox %s stands at the end of its shaft: no power passes through it. Join it between the machines that it is to connect."),
                                   checker->component->id));
}

const HlComponentModel hl_gearbox_model = { "gearbox", emit_gearbox, check, NULL };
