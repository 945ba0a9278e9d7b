/* Control stage: a turbine stage whose pressure ratio is given.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/drive.h"
#include "engine/components/turbine.h"

static void
emit_control_stage (HlEmit *emit)
{
  hl_turbine_emit (emit);
  int in = hl_emit_port (emit, "inlet"), out = hl_emit_port (emit, "exhaust");
  int ratio = hl_emit_own (emit, "pressure_ratio", HL_VAR_RATIO);
  hl_emit_done (emit, hl_drive_add_ratio (emit->system, hl_model_node (emit->model, in)->p, hl_model_node (emit->model, out)->p, ratio), NULL, -1);
}

const HlComponentModel hl_control_stage_model = { "control_stage", emit_control_stage, hl_turbine_check, hl_turbine_processes };
