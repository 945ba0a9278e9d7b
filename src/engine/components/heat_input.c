/* Heat input: feed to live steam, whatever the heat comes from.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/heat-source.h"

static void
emit_heat_input (HlEmit *emit)
{
  hl_heat_source_emit (emit);
  /* No equation needs it; exergy does. */
  if (hl_emit_has_value (emit, "source_T"))
    hl_emit_own (emit, "source_T", HL_VAR_TEMPERATURE);
}

const HlComponentModel hl_heat_input_model = { "heat_input", emit_heat_input, hl_heat_source_check, hl_heat_source_processes };
