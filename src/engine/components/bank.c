/* Economiser, superheater, reheater, air preheater: flue gas that heats what flows through a coil.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/bank.h"
#include "plant/i18n.h"
#include <math.h>

#define NODE(emit, n) hl_model_node ((emit)->model, n)

const HlExchangeSides hl_bank_sides = {
  "gas_inlet", "gas_outlet", "inlet", "outlet", "gas_pressure_loss", "pressure_loss", .has_end_differences = TRUE, .loses_heat = TRUE,
};
static const HlExchangeSides air_sides = {
  "gas_inlet", "gas_outlet", "air_inlet", "air_outlet", "gas_pressure_loss", "pressure_loss",
  .has_end_differences = TRUE, .has_effectiveness = TRUE, .loses_heat = TRUE,
};

void
hl_bank_emit_below_saturation (HlEmit *emit, const char *key, int node)
{
  int T_sat = hl_emit_hidden (emit, "saturation_T", HL_VAR_TEMPERATURE), T = hl_emit_T (emit, node, hl_emit_has_value (emit, key));
  int difference = hl_emit_own (emit, key, HL_VAR_TEMPERATURE_DIFFERENCE);
  hl_emit_done (emit, hl_add_saturation (emit->system, NODE (emit, node)->fluid, NODE (emit, node)->p, T_sat), NULL, 1);
  hl_emit_done (emit, hl_add_linear (emit->system, HL_VAR_TEMPERATURE, (const int[]) { difference, T_sat, T }, (const double[]) { 1.0, -1.0, 1.0 }, 3, 0.0),
                N_("{0} = {1} − {2}"), 0);
}

/* --- economiser -------------------------------------------------------------------- */

static void
emit_economiser (HlEmit *emit)
{
  hl_emit_sum (emit, HL_SUM_HEAT_INPUT, hl_exchange_emit_sides (emit, &hl_bank_sides));
  hl_bank_emit_below_saturation (emit, "approach", hl_emit_port (emit, "outlet"));
}

static void
check_economiser (HlChecker *checker)
{
  const HlNodeResult *out = hl_check_port (checker, "outlet");
  hl_exchange_check_sides (checker, &hl_bank_sides);
  if (out == NULL || !out->has_state || (out->st.phase != HL_PHASE_TWO_PHASE && out->st.phase != HL_PHASE_VAPOUR) || !(out->st.x > 1e-6 || out->st.phase == HL_PHASE_VAPOUR))
    return;
  HlFinding *finding = out->st.phase == HL_PHASE_VAPOUR
    ? hl_check_add (checker, HL_GRADE_WARNING, "steaming-economiser", "approach",
        g_strdup_printf (_("%s boils all of its water: an economiser is not built for that. Let less heat pass, or send more water through it."), checker->component->id))
    : hl_check_add (checker, HL_GRADE_CAUTION, "steaming-economiser", "approach",
        g_strdup_printf (_("%s steams: %.1f %% of its water leaves as steam, which may block or hammer. Raise the approach, or send more water through it."),
                         checker->component->id, 100.0 * out->st.x));
  hl_check_offer (checker, finding, "approach");
  hl_check_offer (checker, finding, "outlet.T");
}

static void
processes (HlProcessSink *sink)
{
  hl_exchange_processes_sides (sink, &hl_bank_sides);
}

/* --- superheater, reheater ------------------------------------------------------------- */

static void
emit_steam_bank (HlEmit *emit)
{
  hl_emit_guess (emit, hl_emit_port (emit, "inlet"), 2.8e6);
  hl_emit_guess (emit, hl_emit_port (emit, "outlet"), 3.2e6);
  hl_emit_sum (emit, HL_SUM_HEAT_INPUT, hl_exchange_emit_sides (emit, &hl_bank_sides));
}

static void
check_steam_bank (HlChecker *checker)
{
  double difference;
  hl_exchange_check_sides (checker, &hl_bank_sides);
  if (!hl_check_own (checker, "hot_end_difference", &difference) || difference < 2.0 || difference >= 20.0)
    return;
  g_autofree char *d = hl_check_text (checker, HL_DIMENSION_TEMPERATURE_DIFFERENCE, difference);
  HlFinding *finding = hl_check_add (checker, HL_GRADE_CAUTION, "superheater-difference", "hot_end_difference",
    g_strdup_printf (_("Steam of %s leaves only %s below the gas that comes in; common are 20 to 60 K. Lower the steam temperature."), checker->component->id, d));
  hl_check_offer (checker, finding, "hot_end_difference");
  hl_check_offer (checker, finding, "outlet.T");
}

/* --- air preheater ------------------------------------------------------------------------ */

static void
emit_air_preheater (HlEmit *emit)
{
  hl_exchange_emit_sides (emit, &air_sides);
}

static void
check_air_preheater (HlChecker *checker)
{
  hl_exchange_check_sides (checker, &air_sides);
}

static void
air_processes (HlProcessSink *sink)
{
  hl_exchange_processes_sides (sink, &air_sides);
}

const HlComponentModel hl_economiser_model = { "economiser", emit_economiser, check_economiser, processes };
const HlComponentModel hl_superheater_model = { "superheater", emit_steam_bank, check_steam_bank, processes };
const HlComponentModel hl_reheater_model = { "reheater", emit_steam_bank, check_steam_bank, processes };
const HlComponentModel hl_air_preheater_model = { "air_preheater", emit_air_preheater, check_air_preheater, air_processes };
