/* Evaporator with its drum: flue gas boils water at one pressure; pinch and approach.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/bank.h"
#include "engine/exchanger-curve.h"
#include "plant/i18n.h"
#include <math.h>

#define NODE(emit, n) hl_model_node ((emit)->model, n)
enum { TUBES_FINNED, TUBES_BARE };

/* Steam, and where it is let off water, leave saturated; what the feed lacks to boiling is made up in the drum. */
static int
emit_drum (HlEmit *emit, int feed, int steam, int blowdown)
{
  HlSystem *system = emit->system;
  const HlNode *f = NODE (emit, feed), *s = NODE (emit, steam);
  int heat = hl_emit_own (emit, "heat", HL_VAR_POWER), all = hl_emit_constant (emit, HL_VAR_RATIO, 1.0);
  int pairs[6] = { s->m, s->h }, n = 1;
  double signs[3] = { 1.0 };
  hl_emit_guess (emit, steam, 2.75e6);
  hl_system_merge (system, f->p, s->p);
  hl_emit_done (emit, hl_add_enthalpy_at_quality (system, s->fluid, s->p, all, s->h), N_("{2} = h″({0})"), -1);
  if (blowdown >= 0)
    {
      HlNode *b = NODE (emit, blowdown);
      int none = hl_emit_constant (emit, HL_VAR_TEMPERATURE_DIFFERENCE, 0.0), share = hl_emit_own (emit, "blowdown_fraction", HL_VAR_RATIO);
      b->subcooling = none;
      hl_system_merge (system, f->p, b->p);
      hl_emit_balance (emit, &f->m, 1, (const int[]) { s->m, b->m }, 2);
      hl_emit_done (emit, hl_add_product (system, f->m, share, b->m), NULL, 2);
      hl_emit_done (emit, hl_add_liquid (system, b->fluid, b->p, none, b->h), N_("{2} = h′({0})"), -1);
      pairs[2 * n] = b->m;
      pairs[2 * n + 1] = b->h;
      signs[n++] = 1.0;
    }
  else
    hl_system_merge (system, f->m, s->m);
  pairs[2 * n] = f->m;
  pairs[2 * n + 1] = f->h;
  signs[n++] = -1.0;
  hl_emit_done (emit, hl_add_energy (system, HL_VAR_POWER, pairs, signs, n, &heat, (const double[]) { -1.0 }, 1), NULL, -1);
  return heat;
}

static void
emit_gas (HlEmit *emit, int gas_in, int gas_out, int heat)
{
  HlSystem *system = emit->system;
  const HlNode *in = NODE (emit, gas_in), *out = NODE (emit, gas_out);
  int loss = hl_emit_own (emit, "gas_pressure_loss", HL_VAR_RATIO), share = hl_emit_own (emit, "heat_loss_fraction", HL_VAR_RATIO);
  int lost = hl_emit_own (emit, "heat_loss", HL_VAR_POWER), given = hl_emit_hidden (emit, "gas_heat", HL_VAR_POWER);
  hl_system_merge (system, in->m, out->m);
  hl_emit_done (emit, hl_add_pressure_loss (system, in->p, out->p, loss), NULL, -1);
  const int pairs[] = { in->m, in->h, out->m, out->h };
  hl_emit_done (emit, hl_add_energy (system, HL_VAR_POWER, pairs, (const double[]) { 1.0, -1.0 }, 2, &given, (const double[]) { -1.0 }, 1),
                N_("{4} = {0} × ({1} − {3})"), -1);
  hl_emit_done (emit, hl_add_product (system, given, share, lost), NULL, 2);
  hl_emit_done (emit, hl_add_linear (system, HL_VAR_POWER, (const int[]) { heat, given, lost }, (const double[]) { 1.0, -1.0, 1.0 }, 3, 0.0),
                N_("{0} = {1} − {2}"), -1);
}

static void
emit_evaporator_drum (HlEmit *emit)
{
  HlSystem *system = emit->system;
  int gas_in = hl_emit_port (emit, "gas_inlet"), gas_out = hl_emit_port (emit, "gas_outlet"), feed = hl_emit_port (emit, "feed");
  int steam = hl_emit_port (emit, "steam"), blowdown = hl_component_option (emit->component, "blowdown") != 0 ? hl_emit_port (emit, "blowdown") : -1;
  int heat = emit_drum (emit, feed, steam, blowdown);
  emit_gas (emit, gas_in, gas_out, heat);
  int T_sat = hl_emit_hidden (emit, "saturation_T", HL_VAR_TEMPERATURE), h_liquid = hl_emit_hidden (emit, "h_liquid", HL_VAR_ENTHALPY);
  int none = hl_emit_constant (emit, HL_VAR_TEMPERATURE_DIFFERENCE, 0.0), ua = hl_emit_own (emit, "UA", HL_VAR_CONDUCTANCE);
  int p = NODE (emit, steam)->p;
  hl_emit_done (emit, hl_add_saturation (system, NODE (emit, steam)->fluid, p, T_sat), NULL, 1);
  static const struct { const char *key; int sign; } ends[] = { { "pinch", 1 }, { "hot_end_difference", 1 }, { "approach", -1 } };
  const int nodes[] = { gas_out, gas_in, feed };
  for (guint k = 0; k < G_N_ELEMENTS (ends); k++)
    {
      int T = hl_emit_T (emit, nodes[k], hl_emit_has_value (emit, ends[k].key)), d = hl_emit_own (emit, ends[k].key, HL_VAR_TEMPERATURE_DIFFERENCE);
      hl_emit_done (emit, hl_add_linear (system, HL_VAR_TEMPERATURE, (const int[]) { d, T, T_sat }, (const double[]) { 1.0, -ends[k].sign, ends[k].sign }, 3, 0.0),
                    ends[k].sign > 0 ? N_("{0} = {1} − {2}") : N_("{0} = {2} − {1}"), 0);
    }
  /* The surface boils water from saturated liquid to vapour. */
  hl_emit_done (emit, hl_add_liquid (system, NODE (emit, steam)->fluid, p, none, h_liquid), N_("{2} = h′({0})"), 2);
  const HlNode *in = NODE (emit, gas_in), *out = NODE (emit, gas_out), *s = NODE (emit, steam);
  const int inputs[HL_N_CURVE_INPUTS] = { in->p, in->h, out->p, out->h, p, h_liquid, p, s->h };
  hl_emit_done (emit, hl_add_exchanger_conductance (system, in->fluid, s->fluid, inputs, heat, ua), NULL, -1);
  hl_emit_sum (emit, HL_SUM_HEAT_INPUT, heat);
  hl_emit_sum (emit, HL_SUM_LIVE_STEAM, s->m);
}

/* --- checks ------------------------------------------------------------------------ */

/* Usual pinches by the temperature of the gas that comes in: V. Ganapathy. */
static void
check_pinch (HlChecker *checker, double pinch, double T_gas)
{
  static const struct { double to_T, low, high; } usual[2][2] = {
    [TUBES_FINNED] = { { 923.15, 6.0, 17.0 }, { 1253.15, 17.0, 33.0 } },
    [TUBES_BARE] = { { 923.15, 44.0, 72.0 }, { 1253.15, 72.0, 83.0 } },
  };
  int tubes = hl_component_option (checker->component, "tubes") == TUBES_BARE ? TUBES_BARE : TUBES_FINNED, row = T_gas > usual[tubes][0].to_T ? 1 : 0;
  double low = usual[tubes][row].low, high = usual[tubes][row].high;
  if (T_gas < 643.15 || T_gas > usual[tubes][1].to_T || (pinch >= low - 1e-6 && pinch <= high + 1e-6))
    return;
  g_autofree char *d = hl_check_text (checker, HL_DIMENSION_TEMPERATURE_DIFFERENCE, pinch), *T = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, T_gas);
  g_autofree char *from = hl_check_text (checker, HL_DIMENSION_TEMPERATURE_DIFFERENCE, low), *to = hl_check_text (checker, HL_DIMENSION_TEMPERATURE_DIFFERENCE, high);
  HlFinding *finding = pinch < low
    ? hl_check_add (checker, HL_GRADE_CAUTION, "small-pinch", "pinch",
        g_strdup_printf (_("The pinch of %s is %s; for gas of %s common are %s to %s (V. Ganapathy). Less asks for a very large surface."), checker->component->id, d, T, from, to))
    : hl_check_add (checker, HL_GRADE_HINT, "large-pinch", "pinch",
        g_strdup_printf (_("The pinch of %s is %s; for gas of %s common are %s to %s (V. Ganapathy). More leaves heat in the gas."), checker->component->id, d, T, from, to));
  hl_check_offer (checker, finding, "pinch");
}

static void
check (HlChecker *checker)
{
  const HlNodeResult *gas = hl_check_port (checker, "gas_inlet"), *steam = hl_check_port (checker, "steam"), *feed = hl_check_port (checker, "feed");
  HlSaturation sat;
  double pinch;
  if (gas == NULL || steam == NULL || !gas->has_state || !steam->has_pressure || !hl_check_own (checker, "pinch", &pinch)
      || hl_fluid_saturation_p (hl_check_fluid (checker, "steam"), steam->p, &sat) != HL_OK)
    return;
  if (gas->st.T <= sat.T || pinch < -1e-6)
    {
      g_autofree char *T = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, sat.T), *T_gas = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, gas->st.T);
      g_autofree char *T_out = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, sat.T + pinch);
      HlFinding *finding = hl_check_add (checker, HL_GRADE_ERROR, "temperature-cross", "pinch",
        g_strdup_printf (_("%s boils at %s, but its gas comes at %s and would leave at %s. Lower the pressure, let less heat pass, or bring hotter gas."),
                         checker->component->id, T, T_gas, T_out));
      hl_check_offer (checker, finding, "pinch");
      hl_check_offer (checker, finding, "steam.p");
      return;
    }
  check_pinch (checker, pinch, gas->st.T);
  if (feed != NULL && feed->has_state && feed->st.phase != HL_PHASE_LIQUID && feed->st.x > 1e-6)
    hl_check_add (checker, HL_GRADE_HINT, "drum-feed-steams", "approach",
      g_strdup_printf (_("The feed of %s reaches the drum partly as steam."), checker->component->id));
}

/* The feed is brought to boiling in the drum; the surface boils, at one temperature, as much as its heat is enough for. */
static void
processes (HlProcessSink *sink)
{
  int feed = hl_process_node (sink, "feed"), steam = hl_process_node (sink, "steam");
  HlState liquid;
  double heat;
  hl_process_add (sink, HL_PROCESS_COOLING, hl_process_node (sink, "gas_inlet"), hl_process_node (sink, "gas_outlet"));
  if (feed < 0 || steam < 0 || !sink->states[steam].has_state || !hl_process_own (sink, "heat", &heat)
      || hl_fluid_state_px (hl_model_node (sink->model, steam)->fluid, sink->states[steam].p, 0.0, &liquid) != HL_OK)
    return;
  hl_process_add_to (sink, HL_PROCESS_MIXING, feed, &liquid);
  guint n = sink->out->len;
  hl_process_add_from (sink, HL_PROCESS_HEATING, &liquid, steam);
  if (sink->out->len > n)
    g_array_index (sink->out, HlProcess, n).m = heat / (sink->states[steam].st.h - liquid.h);
}

const HlComponentModel hl_evaporator_drum_model = { "evaporator_drum", emit_evaporator_drum, check, processes };
