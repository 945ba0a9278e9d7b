/* Expansion valve: pressure falls at constant enthalpy, a part flashes to vapour.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/components.h"
#include "plant/i18n.h"
#include <math.h>

/* Vapour mass fraction behind the valve, 0 where all stays liquid. */
static HlStatus
flash (const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  HlSaturation sat;
  double p = exp (x[0]);
  *r = x[2];
  dr[0] = dr[1] = 0.0;
  dr[2] = 1.0;
  if (hl_fluid_saturation_p (e->fluid, p, &sat) != HL_OK || x[1] <= sat.h_liquid)
    return HL_OK;
  double span = sat.h_vapour - sat.h_liquid, q = (x[1] - sat.h_liquid) / span;
  *r = x[2] - q;
  dr[0] = (sat.h_liquid_p + q * (sat.h_vapour_p - sat.h_liquid_p)) / span * p;
  dr[1] = -1.0 / span;
  return HL_OK;
}

static void
emit_expansion_valve (HlEmit *emit)
{
  const int in_node = hl_emit_port (emit, "inlet"), out_node = hl_emit_port (emit, "outlet");
  const HlNode *in = hl_model_node (emit->model, in_node), *out = hl_model_node (emit->model, out_node);
  int drop = hl_emit_own (emit, "pressure_drop", HL_VAR_PRESSURE_DIFFERENCE), fraction = hl_emit_own (emit, "flash_fraction", HL_VAR_RATIO);
  hl_system_merge (emit->system, in->m, out->m);
  hl_system_merge (emit->system, in->h, out->h);
  hl_emit_done (emit, hl_add_pressure_rise (emit->system, out->p, in->p, drop), NULL, 2);
  HlEquation *e = hl_system_add_equation (emit->system, flash, HL_VAR_RATIO, 4, (const int[]) { out->p, out->h, fraction }, 3, NULL, 0);
  e->fluid = out->fluid;
  hl_emit_done (emit, e, N_("{2} = ({1} − h′({0})) ÷ (h″({0}) − h′({0})), 0 where liquid"), 2);
}

static void
check (HlChecker *checker)
{
  const HlNodeResult *in = hl_check_port (checker, "inlet");
  hl_check_pressure_falls (checker);
  if (in != NULL && in->has_state && in->st.phase == HL_PHASE_TWO_PHASE && in->st.x > 1e-6)
    hl_check_add (checker, HL_GRADE_CAUTION, "flash-gas", "inlet.x",
      g_strdup_printf (_("Liquid with %.1f %% vapour in it reaches %s: an expansion valve wants liquid alone. Condense all of it, or cool it a few kelvin below saturation."),
                       100.0 * in->st.x, checker->component->id));
}

static void
processes (HlProcessSink *sink)
{
  hl_process_add (sink, HL_PROCESS_THROTTLING, hl_process_node (sink, "inlet"), hl_process_node (sink, "outlet"));
}

const HlComponentModel hl_expansion_valve_model = { "expansion_valve", emit_expansion_valve, check, processes };
