/* Pipe with pressure and heat loss, and throttle valve.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/components.h"
#include "plant/i18n.h"
#include <math.h>

static void
emit_pipe (HlEmit *emit)
{
  const int in_node = hl_emit_port (emit, "inlet"), out_node = hl_emit_port (emit, "outlet");
  int loss = hl_emit_own (emit, "pressure_loss", HL_VAR_RATIO), heat_loss = hl_emit_own (emit, "heat_loss", HL_VAR_POWER);
  int drop = hl_emit_own (emit, "temperature_drop", HL_VAR_TEMPERATURE_DIFFERENCE);
  int T_in = hl_emit_T (emit, in_node, FALSE), T_out = hl_emit_T (emit, out_node, hl_emit_has_value (emit, "temperature_drop"));
  const HlNode *in = hl_model_node (emit->model, in_node), *out = hl_model_node (emit->model, out_node);
  hl_system_merge (emit->system, in->m, out->m);
  hl_emit_done (emit, hl_add_pressure_loss (emit->system, in->p, out->p, loss), NULL, -1);
  hl_emit_done (emit, hl_add_linear (emit->system, HL_VAR_TEMPERATURE, (const int[]) { T_in, T_out, drop }, (const double[]) { 1.0, -1.0, -1.0 }, 3, 0.0),
                N_("{2} = {0} − {1}"), 2);
  /* Without heat loss the flow has no part in the balance, and must not seem to. */
  if (hl_emit_is_fixed_at (emit, "heat_loss", 0.0))
    hl_emit_done (emit, hl_add_linear (emit->system, HL_VAR_ENTHALPY, (const int[]) { in->h, out->h, heat_loss }, (const double[]) { 1.0, -1.0, 0.0 }, 3, 0.0),
                  N_("{1} = {0}: {2} lost"), -1);
  else
    {
      const int pairs[] = { in->m, in->h, in->m, out->h };
      hl_emit_done (emit, hl_add_energy (emit->system, HL_VAR_POWER, pairs, (const double[]) { 1.0, -1.0 }, 2, &heat_loss, (const double[]) { -1.0 }, 1),
                    N_("{4} = {0} × ({1} − {3})"), 4);
    }
}

static void
emit_valve (HlEmit *emit)
{
  const int in_node = hl_emit_port (emit, "inlet"), out_node = hl_emit_port (emit, "outlet");
  const HlNode *in = hl_model_node (emit->model, in_node), *out = hl_model_node (emit->model, out_node);
  int loss = hl_emit_own (emit, "pressure_loss", HL_VAR_RATIO);
  hl_system_merge (emit->system, in->m, out->m);
  hl_system_merge (emit->system, in->h, out->h);
  hl_emit_done (emit, hl_add_pressure_loss (emit->system, in->p, out->p, loss), NULL, -1);
}

static void
check (HlChecker *checker)
{
  const HlNodeResult *in = hl_check_port (checker, "inlet"), *out = hl_check_port (checker, "outlet");
  if (in == NULL || out == NULL || !in->has_pressure || !out->has_pressure || out->p <= in->p * (1.0 + 1e-9))
    return;
  g_autofree char *p_in = hl_check_text (checker, HL_DIMENSION_PRESSURE, in->p);
  g_autofree char *p_out = hl_check_text (checker, HL_DIMENSION_PRESSURE, out->p);
  HlFinding *finding = hl_check_add (checker, HL_GRADE_ERROR, "pressure-rises", "outlet.p",
    g_strdup_printf (_("Pressure would rise through %s, from %s to %s. Lower the pressure behind it, or raise the one before it."),
                     checker->component->id, p_in, p_out));
  hl_check_offer (checker, finding, "outlet.p");
  hl_check_offer (checker, finding, "inlet.p");
}

static void
pipe_processes (HlProcessSink *sink)
{
  hl_process_add (sink, HL_PROCESS_LINE, hl_process_node (sink, "inlet"), hl_process_node (sink, "outlet"));
}

static void
valve_processes (HlProcessSink *sink)
{
  hl_process_add (sink, HL_PROCESS_THROTTLING, hl_process_node (sink, "inlet"), hl_process_node (sink, "outlet"));
}

const HlComponentModel hl_pipe_model = { "pipe", emit_pipe, check, pipe_processes };
const HlComponentModel hl_valve_model = { "valve", emit_valve, check, valve_processes };
