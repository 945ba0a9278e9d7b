/* Elevations of vessels and pumps, and the net positive suction head that comes of them.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/heads.h"
#include "plant/i18n.h"
#include <math.h>

#define GRAVITY 9.80665     /* [m/s2] standard acceleration of free fall: 3rd CGPM, 1901 */

/* npsh = static head - loss + (p - p_sat(T)) v / g: pressure at the pump's inlet over that at which it would boil there, as a
 * head.  The streams' pressures hold no static head; it counts here. */
static HlStatus
suction_head (const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  HlState st;
  HlSaturation sat;
  double p = exp (x[0]);
  HlStatus status = hl_fluid_state_ph (e->fluid, p, x[1], &st);
  if (status == HL_OK)
    status = hl_fluid_saturation_T (e->fluid, st.T, &sat);
  if (status != HL_OK)
    return status;
  double over = p - sat.p, slope = 1.0 / sat.T_p;                /* dp_sat/dT */
  *r = x[4] - x[2] + x[3] - over * st.v / GRAVITY;
  dr[0] = -p * ((1.0 - slope * st.T_p) * st.v + over * st.v_p) / GRAVITY;
  dr[1] = -(-slope * st.T_h * st.v + over * st.v_h) / GRAVITY;
  dr[2] = -1.0;
  dr[3] = 1.0;
  dr[4] = 1.0;
  return HL_OK;
}

void
hl_heads_emit_elevation (HlEmit *emit)
{
  if (hl_emit_has_value (emit, "elevation"))
    hl_emit_own (emit, "elevation", HL_VAR_LENGTH);
}

void
hl_heads_emit_suction (HlEmit *emit, int inlet)
{
  if (hl_component_option (emit->component, "suction") == 0)
    return;
  const HlNode *in = hl_model_node (emit->model, inlet);
  int head = hl_emit_own (emit, "static_head", HL_VAR_LENGTH), loss = hl_emit_own (emit, "suction_loss", HL_VAR_LENGTH);
  int npsh = hl_emit_own (emit, "npsh_available", HL_VAR_LENGTH);
  if (hl_emit_has_value (emit, "npsh_required"))
    hl_emit_own (emit, "npsh_required", HL_VAR_LENGTH);
  HlEquation *e = hl_system_add_equation (emit->system, suction_head, HL_VAR_LENGTH, 4 | 8 | 16, (const int[]) { in->p, in->h, head, loss, npsh }, 5, NULL, 0);
  e->fluid = in->fluid;
  hl_emit_done (emit, e, N_("{4} = {2} − {3} + ({0} − p_sat({0}, {1})) × v({0}, {1}) ÷ g"), 4);
}

/* Lines and what joins or parts them, where no level stands. */
static gboolean
passes_on (const HlKind *kind)
{
  static const char *const ids[] = { "pipe", "valve", "splitter", "mixer", "header" };
  for (guint k = 0; k < G_N_ELEMENTS (ids); k++)
    if (g_str_equal (kind->id, ids[k]))
      return TRUE;
  return FALSE;
}

int
hl_heads_vessel (const HlModel *model, int pump)
{
  int n = (int) hl_plant_n_components (model->plant), at = pump;
  for (int steps = 0; steps < n; steps++)
    {
      int node = hl_model_port_node (model, at, "inlet");
      if (node < 0)
        node = hl_model_port_node (model, at, "inlet1");
      at = node >= 0 ? hl_model_node (model, node)->component : -1;
      if (at < 0 || hl_model_node (model, node)->stream < 0)
        return -1;
      if (!passes_on (hl_plant_component (model->plant, (guint) at)->kind))
        return at;
    }
  return -1;
}

void
hl_heads_add (HlModel *model)
{
  for (int c = 0; c < (int) hl_plant_n_components (model->plant); c++)
    {
      int head = hl_model_own_var (model, c, "static_head"), own = hl_model_own_var (model, c, "elevation");
      int vessel = head >= 0 && own >= 0 ? hl_heads_vessel (model, c) : -1;
      int level = vessel >= 0 ? hl_model_own_var (model, vessel, "elevation") : -1;
      if (level < 0)
        continue;
      HlEquation *e = hl_add_linear (model->system, HL_VAR_LENGTH, (const int[]) { head, level, own }, (const double[]) { 1.0, -1.0, 1.0 }, 3, 0.0);
      e->component = c;
      e->says = N_("{0} = {1} − {2}");
      e->output = 0;
    }
}
