/* Flash vessel: what flows in is throttled to its pressure and parts into saturated vapour and liquid.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/components.h"
#include "plant/i18n.h"
#include <math.h>

#define NODE(emit, n) hl_model_node ((emit)->model, n)

static void
emit_flash_vessel (HlEmit *emit)
{
  HlSystem *system = emit->system;
  int in = hl_emit_port (emit, "inlet"), steam = hl_emit_port (emit, "steam"), drain = hl_emit_port (emit, "drain");
  int share = hl_emit_own (emit, "flash_fraction", HL_VAR_RATIO);
  int all = hl_emit_constant (emit, HL_VAR_RATIO, 1.0), none = hl_emit_constant (emit, HL_VAR_TEMPERATURE_DIFFERENCE, 0.0);
  const HlNode *a = NODE (emit, in), *v = NODE (emit, steam);
  HlNode *l = NODE (emit, drain);
  l->subcooling = none;
  hl_emit_guess (emit, steam, 2.7e6);
  hl_system_merge (system, v->p, l->p);
  hl_emit_balance (emit, &a->m, 1, (const int[]) { v->m, l->m }, 2);
  hl_emit_done (emit, hl_add_enthalpy_at_quality (system, v->fluid, v->p, all, v->h), N_("{2} = h″({0})"), -1);
  hl_emit_done (emit, hl_add_liquid (system, l->fluid, l->p, none, l->h), N_("{2} = h′({0})"), -1);
  const int pairs[] = { a->m, a->h, v->m, v->h, l->m, l->h };
  hl_emit_done (emit, hl_add_energy (system, HL_VAR_POWER, pairs, (const double[]) { 1.0, -1.0, -1.0 }, 3, NULL, NULL, 0), NULL, -1);
  hl_emit_done (emit, hl_add_quotient (system, share, v->m, a->m), NULL, 0);
}

static void
check (HlChecker *checker)
{
  const HlNodeResult *in = hl_check_port (checker, "inlet"), *steam = hl_check_port (checker, "steam"), *drain = hl_check_port (checker, "drain");
  if (in == NULL || steam == NULL || drain == NULL || !in->has_state || !steam->has_state || !drain->has_state)
    return;
  g_autofree char *p_in = hl_check_text (checker, HL_DIMENSION_PRESSURE, in->p), *p = hl_check_text (checker, HL_DIMENSION_PRESSURE, steam->p);
  HlFinding *finding = NULL;
  if (in->p < steam->p * (1.0 - 1e-9))
    finding = hl_check_add (checker, HL_GRADE_ERROR, "pressure-rises", "steam.p",
      g_strdup_printf (_("What flows into %s arrives at %s, below its pressure, %s. Lower the pressure of the vessel."), checker->component->id, p_in, p));
  else if (in->st.h < drain->st.h)
    finding = hl_check_add (checker, HL_GRADE_ERROR, "nothing-flashes", "steam.p",
      g_strdup_printf (_("What flows into %s is too cold to flash at %s. Lower the pressure of the vessel."), checker->component->id, p));
  else if (in->st.h > steam->st.h)
    finding = hl_check_add (checker, HL_GRADE_ERROR, "nothing-to-part", "",
      g_strdup_printf (_("Superheated steam flows into %s: there is no liquid to part it from."), checker->component->id));
  if (finding != NULL)
    hl_check_offer (checker, finding, "steam.p");
  hl_check_entropy (checker);
}

static void
processes (HlProcessSink *sink)
{
  int in = hl_process_node (sink, "inlet"), steam = hl_process_node (sink, "steam"), drain = hl_process_node (sink, "drain");
  HlState flashed;
  if (in < 0 || steam < 0 || !sink->states[in].has_state || !sink->states[steam].has_state
      || hl_fluid_state_ph (hl_model_node (sink->model, in)->fluid, sink->states[steam].p, sink->states[in].st.h, &flashed) != HL_OK)
    return;
  hl_process_add_to (sink, HL_PROCESS_THROTTLING, in, &flashed);
  hl_process_add_from (sink, HL_PROCESS_MIXING, &flashed, steam);
  hl_process_add_from (sink, HL_PROCESS_MIXING, &flashed, drain);
}

const HlComponentModel hl_flash_vessel_model = { "flash_vessel", emit_flash_vessel, check, processes };
