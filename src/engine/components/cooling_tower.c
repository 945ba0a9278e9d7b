/* Wet cooling tower: cools circulating water towards the wet bulb; counts what must be made up.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/components.h"
#include "plant/i18n.h"
#include <math.h>

#define NODE(emit, n) hl_model_node ((emit)->model, n)

/* make-up (cycles - 1) = evaporation cycles: salts come in with the make-up and leave, cycles times as dense, with the blowdown
 * and the drift. */
static HlStatus
concentration (G_GNUC_UNUSED const HlEquation *e, G_GNUC_UNUSED const double *a, const double *x, double *r, double *dr)
{
  *r = x[0] * (x[2] - 1.0) - x[1] * x[2];
  dr[0] = x[2] - 1.0;
  dr[1] = -x[2];
  dr[2] = x[0] - x[1];
  return HL_OK;
}

/* What leaves is made good at the state of the outlet, so that the water's circuit stays closed. */
static void
emit_water (HlEmit *emit, int m)
{
  HlSystem *system = emit->system;
  int share = hl_emit_own (emit, "evaporation_fraction", HL_VAR_RATIO), drift_share = hl_emit_own (emit, "drift_fraction", HL_VAR_RATIO);
  int cycles = hl_emit_own (emit, "cycles", HL_VAR_RATIO), evaporation = hl_emit_own (emit, "evaporation", HL_VAR_FLOW);
  int drift = hl_emit_own (emit, "drift", HL_VAR_FLOW), blowdown = hl_emit_own (emit, "blowdown", HL_VAR_FLOW);
  int make_up = hl_emit_own (emit, "make_up_flow", HL_VAR_FLOW);
  hl_emit_done (emit, hl_add_product (system, m, share, evaporation), NULL, 2);
  hl_emit_done (emit, hl_add_product (system, m, drift_share, drift), NULL, 2);
  hl_emit_done (emit, hl_system_add_equation (system, concentration, HL_VAR_FLOW, 7, (const int[]) { make_up, evaporation, cycles }, 3, NULL, 0),
                N_("{0} = {1} × {2} ÷ ({2} − 1)"), 0);
  hl_emit_done (emit, hl_add_linear (system, HL_VAR_FLOW, (const int[]) { blowdown, make_up, evaporation, drift },
                                     (const double[]) { 1.0, -1.0, 1.0, 1.0 }, 4, 0.0), N_("{0} = {1} − {2} − {3}"), 0);
}

static void
emit_cooling_tower (HlEmit *emit)
{
  HlSystem *system = emit->system;
  int in = hl_emit_port (emit, "water_inlet"), out = hl_emit_port (emit, "water_outlet");
  int wet_bulb = hl_emit_site (emit, "air", "wet_bulb_T", hl_plant_site (emit->model->plant)->wet_bulb_T);
  int approach = hl_emit_own (emit, "approach", HL_VAR_TEMPERATURE_DIFFERENCE), range = hl_emit_own (emit, "range", HL_VAR_TEMPERATURE_DIFFERENCE);
  int lift = hl_emit_own (emit, "lift", HL_VAR_PRESSURE_DIFFERENCE), heat = hl_emit_own (emit, "heat", HL_VAR_POWER);
  int T_in = hl_emit_T (emit, in, hl_emit_has_value (emit, "range")), T_out = hl_emit_T (emit, out, TRUE);
  hl_emit_guess (emit, in, 1.3e5);
  hl_emit_guess (emit, out, 9e4);
  hl_system_merge (system, NODE (emit, in)->m, NODE (emit, out)->m);
  hl_emit_done (emit, hl_add_pressure_rise (system, NODE (emit, out)->p, NODE (emit, in)->p, lift), NULL, -1);
  hl_emit_done (emit, hl_add_linear (system, HL_VAR_TEMPERATURE, (const int[]) { T_out, wet_bulb, approach }, (const double[]) { 1.0, -1.0, -1.0 }, 3, 0.0),
                N_("{0} = {1} + {2}"), -1);
  hl_emit_done (emit, hl_add_linear (system, HL_VAR_TEMPERATURE, (const int[]) { T_in, T_out, range }, (const double[]) { 1.0, -1.0, -1.0 }, 3, 0.0),
                N_("{2} = {0} − {1}"), 2);
  const int pairs[] = { NODE (emit, in)->m, NODE (emit, in)->h, NODE (emit, out)->m, NODE (emit, out)->h };
  hl_emit_done (emit, hl_add_energy (system, HL_VAR_POWER, pairs, (const double[]) { 1.0, -1.0 }, 2, &heat, (const double[]) { -1.0 }, 1),
                N_("{4} = {0} × ({1} − {3})"), 4);
  emit_water (emit, NODE (emit, in)->m);
}

static void
check (HlChecker *checker)
{
  double approach, range, blowdown;
  if (hl_check_own (checker, "approach", &approach) && approach < 2.5)
    {
      g_autofree char *d = hl_check_text (checker, HL_DIMENSION_TEMPERATURE_DIFFERENCE, approach);
      HlFinding *finding = approach <= 0.0
        ? hl_check_add (checker, HL_GRADE_ERROR, "below-wet-bulb", "approach",
            g_strdup_printf (_("Water would leave %s at the wet bulb temperature or below it: evaporation cannot cool so far. Raise the approach."), checker->component->id))
        : hl_check_add (checker, HL_GRADE_CAUTION, "small-approach", "approach",
            g_strdup_printf (_("The approach of %s is %s; about 2.5 K is the least that towers are built for."), checker->component->id, d));
      hl_check_offer (checker, finding, "approach");
      hl_check_offer (checker, finding, "wet_bulb_T");
    }
  if (hl_check_own (checker, "range", &range) && range < -1e-9)
    hl_check_add (checker, HL_GRADE_ERROR, "heat-runs-backwards", "range",
      g_strdup_printf (_("Water would leave %s hotter than it comes in. Raise the cooling water rise or lower the approach."), checker->component->id));
  if (hl_check_own (checker, "blowdown", &blowdown) && blowdown < 0.0)
    {
      HlFinding *finding = hl_check_add (checker, HL_GRADE_ERROR, "negative-blowdown", "cycles",
        g_strdup_printf (_("Drift alone keeps the water of %s thinner than its cycles of concentration say. Lower them."), checker->component->id));
      hl_check_offer (checker, finding, "cycles");
    }
}

static void
processes (HlProcessSink *sink)
{
  hl_process_add (sink, HL_PROCESS_COOLING, hl_process_node (sink, "water_inlet"), hl_process_node (sink, "water_outlet"));
}

const HlComponentModel hl_cooling_tower_model = { "cooling_tower", emit_cooling_tower, check, processes };
