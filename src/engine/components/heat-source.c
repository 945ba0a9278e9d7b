/* What heat input and fired boiler have in common: feed to live steam, and reheats.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/heat-source.h"
#include "plant/i18n.h"
#include <math.h>

#define NODE(emit, n) hl_model_node ((emit)->model, n)

/* One pass from @in to @out: same flow, a pressure loss, and the heat that it takes. */
static int
heated_pass (HlEmit *emit, const char *in_key, const char *out_key, const char *loss_key, const char *heat_key)
{
  int in = hl_emit_port (emit, in_key), out = hl_emit_port (emit, out_key);
  int loss = hl_emit_own (emit, loss_key, HL_VAR_RATIO), heat = hl_emit_own (emit, heat_key, HL_VAR_POWER);
  hl_emit_guess (emit, out, 3.3e6);
  hl_system_merge (emit->system, NODE (emit, in)->m, NODE (emit, out)->m);
  hl_emit_done (emit, hl_add_pressure_loss (emit->system, NODE (emit, in)->p, NODE (emit, out)->p, loss), NULL, -1);
  const int pairs[] = { NODE (emit, out)->m, NODE (emit, out)->h, NODE (emit, in)->m, NODE (emit, in)->h };
  hl_emit_done (emit, hl_add_energy (emit->system, HL_VAR_POWER, pairs, (const double[]) { 1.0, -1.0 }, 2, &heat, (const double[]) { -1.0 }, 1),
                N_("{4} = {0} × ({1} − {3})"), 4);
  return heat;
}

/* Feed to steam and, a part of it, to saturated water at the pressure of the drum, which is let off. */
static int
pass_with_blowdown (HlEmit *emit)
{
  HlSystem *system = emit->system;
  int feed = hl_emit_port (emit, "feed"), steam = hl_emit_port (emit, "steam"), water = hl_emit_port (emit, "blowdown");
  int loss = hl_emit_own (emit, "pressure_loss", HL_VAR_RATIO), drum_loss = hl_emit_own (emit, "economiser_pressure_loss", HL_VAR_RATIO);
  int share = hl_emit_own (emit, "blowdown_fraction", HL_VAR_RATIO), heat = hl_emit_own (emit, "main_heat", HL_VAR_POWER);
  int none = hl_emit_constant (emit, HL_VAR_TEMPERATURE_DIFFERENCE, 0.0);
  hl_emit_guess (emit, steam, 3.3e6);
  const HlNode *f = NODE (emit, feed), *s = NODE (emit, steam);
  HlNode *b = NODE (emit, water);
  b->subcooling = none;
  hl_emit_balance (emit, &f->m, 1, (const int[]) { s->m, b->m }, 2);
  hl_emit_done (emit, hl_add_product (system, f->m, share, b->m), NULL, 2);
  hl_emit_done (emit, hl_add_pressure_loss (system, f->p, s->p, loss), NULL, -1);
  hl_emit_done (emit, hl_add_pressure_loss (system, f->p, b->p, drum_loss), NULL, -1);
  hl_emit_done (emit, hl_add_liquid (system, b->fluid, b->p, none, b->h), N_("{2} = h′({0})"), -1);
  const int pairs[] = { s->m, s->h, b->m, b->h, f->m, f->h };
  hl_emit_done (emit, hl_add_energy (system, HL_VAR_POWER, pairs, (const double[]) { 1.0, 1.0, -1.0 }, 3, &heat, (const double[]) { -1.0 }, 1),
                N_("{6} = {0} × {1} + {2} × {3} − {4} × {5}"), 6);
  return heat;
}

int
hl_heat_source_emit (HlEmit *emit)
{
  int n_reheats = hl_component_option (emit->component, "reheats"), vars[16], n = 0;
  double factors[16];
  vars[n] = hl_component_option (emit->component, "blowdown") != 0 ? pass_with_blowdown (emit)
                                                                   : heated_pass (emit, "feed", "steam", "pressure_loss", "main_heat");
  factors[n++] = 1.0;
  for (int k = 1; k <= n_reheats && n < 15; k++)
    {
      vars[n] = heated_pass (emit, hl_key ("cold_reheat", k), hl_key ("hot_reheat", k), hl_key ("reheat_pressure_loss", k), hl_key ("reheat_heat", k));
      factors[n++] = 1.0;
    }
  vars[n] = hl_emit_own (emit, "heat", HL_VAR_POWER);
  factors[n] = -1.0;
  hl_emit_done (emit, hl_add_linear (emit->system, HL_VAR_POWER, vars, factors, n + 1, 0.0), NULL, n);
  hl_emit_sum (emit, HL_SUM_HEAT_INPUT, vars[n]);
  hl_emit_sum (emit, HL_SUM_LIVE_STEAM, NODE (emit, hl_emit_port (emit, "steam"))->m);
  return vars[n];
}

/* --- checks: steam temperatures that piping steels stand, reheat pressure ---------- */

static void
check_steam (HlChecker *checker, const char *port, const char *key)
{
  static const struct { double above; HlGrade grade; const char *text; } limits[] = {
    { 973.15, HL_GRADE_WARNING, N_("Steam of %s leaves at %s: above 700 °C only nickel alloys will do.") },
    { 893.15, HL_GRADE_WARNING, N_("Steam of %s leaves at %s: above 620 °C the piping must be austenitic steel.") },
    { 866.15, HL_GRADE_CAUTION, N_("Steam of %s leaves at %s: above 593 °C use steel P92 rather than P91.") },
    { 823.15, HL_GRADE_CAUTION, N_("Steam of %s leaves at %s: above 550 °C low-alloy Cr-Mo steels end.") },
  };
  const HlNodeResult *steam = hl_check_port (checker, port);
  if (steam == NULL || !steam->has_state)
    return;
  for (guint k = 0; k < G_N_ELEMENTS (limits); k++)
    if (steam->st.T > limits[k].above + 1e-6)
      {
        g_autofree char *T = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, steam->st.T);
        HlFinding *finding = hl_check_add (checker, limits[k].grade, "steam-temperature", key,
                                           g_strdup_printf (_(limits[k].text), checker->component->id, T));
        hl_check_offer (checker, finding, key);
        return;
      }
}

/* Close below the critical pressure liquid and vapour hardly differ: drum level, and properties, become hard to hold. */
static void
check_evaporation (HlChecker *checker, const HlNodeResult *steam)
{
  HlFluidLimits limits;
  hl_fluid_limits (hl_check_fluid (checker, "steam"), &limits);
  if (steam == NULL || !steam->has_pressure || !(steam->p > 0.95 * limits.p_critical && steam->p < limits.p_critical))
    return;
  g_autofree char *p = hl_check_text (checker, HL_DIMENSION_PRESSURE, steam->p);
  HlFinding *finding = hl_check_add (checker, HL_GRADE_CAUTION, "near-critical", "steam.p",
    g_strdup_printf (_("%s evaporates at %s, above 95 %% of the critical pressure: control is difficult there. Stay below, or go above the critical pressure."),
                     checker->component->id, p));
  hl_check_offer (checker, finding, "steam.p");
}

static void
check_pass (HlChecker *checker, const char *in_key, const char *out_key)
{
  const HlNodeResult *in = hl_check_port (checker, in_key), *out = hl_check_port (checker, out_key);
  if (in == NULL || out == NULL || !in->has_state || !out->has_state || out->st.h >= in->st.h)
    return;
  g_autofree char *h_in = hl_check_text (checker, HL_DIMENSION_ENTHALPY, in->st.h);
  g_autofree char *h_out = hl_check_text (checker, HL_DIMENSION_ENTHALPY, out->st.h);
  g_autofree char *key = g_strconcat (out_key, ".T", NULL);
  HlFinding *finding = hl_check_add (checker, HL_GRADE_ERROR, "heat-runs-backwards", key,
                                     g_strdup_printf (_("%s would cool what it is to heat: in at %s, out at %s. Raise the outlet temperature."),
                                                      checker->component->id, h_in, h_out));
  hl_check_offer (checker, finding, key);
}

void
hl_heat_source_check (HlChecker *checker)
{
  const HlNodeResult *steam = hl_check_port (checker, "steam");
  check_steam (checker, "steam", "steam.T");
  check_evaporation (checker, steam);
  check_pass (checker, "feed", "steam");
  for (int k = 1; k <= hl_component_option (checker->component, "reheats"); k++)
    {
      const HlNodeResult *cold = hl_check_port (checker, hl_key ("cold_reheat", k));
      g_autofree char *key = g_strconcat (hl_key ("hot_reheat", k), ".T", NULL);
      check_steam (checker, hl_key ("hot_reheat", k), key);
      check_pass (checker, hl_key ("cold_reheat", k), hl_key ("hot_reheat", k));
      if (k > 1 || steam == NULL || cold == NULL || !steam->has_pressure || !cold->has_pressure)
        continue;
      double ratio = cold->p / steam->p;
      if (!(ratio < 0.15 || ratio > 0.35))
        continue;
      g_autofree char *cold_key = g_strconcat (hl_key ("cold_reheat", k), ".p", NULL);
      HlFinding *finding = hl_check_add (checker, HL_GRADE_HINT, "reheat-pressure", cold_key,
                                         g_strdup_printf (_("Reheat of %s runs at %.0f %% of the live steam pressure; the best is often 20 to 25 %%."),
                                                          checker->component->id, 100.0 * ratio));
      hl_check_offer (checker, finding, cold_key);
    }
}

void
hl_heat_source_processes (HlProcessSink *sink)
{
  int feed = hl_process_node (sink, "feed"), steam = hl_process_node (sink, "steam"), water = hl_process_node (sink, "blowdown");
  hl_process_add (sink, HL_PROCESS_HEATING, feed, steam);
  if (water >= 0 && steam >= 0 && sink->states[feed].has_state)
    {
      /* The way of the steam carries the steam alone, that of the blowdown what is let off. */
      guint n = sink->out->len;
      if (n > 0)
        g_array_index (sink->out, HlProcess, n - 1).m = sink->states[steam].m;
      hl_process_add (sink, HL_PROCESS_HEATING, feed, water);
      if (sink->out->len > n)
        g_array_index (sink->out, HlProcess, n).m = sink->states[water].m;
    }
  for (int k = 1; k <= hl_component_option (sink->component, "reheats"); k++)
    hl_process_add (sink, HL_PROCESS_HEATING, hl_process_node (sink, hl_key ("cold_reheat", k)), hl_process_node (sink, hl_key ("hot_reheat", k)));
}
