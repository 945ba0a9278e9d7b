/* Bypass and letdown station: steam is throttled, and water sprayed into it.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/spray.h"
#include "plant/i18n.h"

static void
emit_bypass_station (HlEmit *emit)
{
  hl_spray_emit (emit, FALSE);
}

static void
check (HlChecker *checker)
{
  const HlNodeResult *steam = hl_check_port (checker, "steam"), *out = hl_check_port (checker, "outlet");
  if (steam != NULL && out != NULL && steam->has_pressure && out->has_pressure && out->p > steam->p * (1.0 + 1e-9))
    {
      g_autofree char *p_in = hl_check_text (checker, HL_DIMENSION_PRESSURE, steam->p), *p = hl_check_text (checker, HL_DIMENSION_PRESSURE, out->p);
      HlFinding *finding = hl_check_add (checker, HL_GRADE_ERROR, "pressure-rises", "outlet.p",
        g_strdup_printf (_("Station %s is to let steam down from %s to %s, which is no lower. Lower the pressure behind it."), checker->component->id, p_in, p));
      hl_check_offer (checker, finding, "outlet.p");
      return;
    }
  hl_spray_check (checker, out);
}

/* The valve throttles first; the spray joins at the pressure behind it. */
static void
processes (HlProcessSink *sink)
{
  int steam = hl_process_node (sink, "steam"), out = hl_process_node (sink, "outlet");
  HlState throttled;
  if (steam < 0 || out < 0 || !sink->states[steam].has_state || !sink->states[out].has_state
      || hl_fluid_state_ph (hl_model_node (sink->model, steam)->fluid, sink->states[out].p, sink->states[steam].st.h, &throttled) != HL_OK)
    return;
  hl_process_add_to (sink, HL_PROCESS_THROTTLING, steam, &throttled);
  hl_process_add_from (sink, HL_PROCESS_MIXING, &throttled, out);
  hl_process_add (sink, HL_PROCESS_MIXING, hl_process_node (sink, "spray"), out);
}

const HlComponentModel hl_bypass_station_model = { "bypass_station", emit_bypass_station, check, processes };
