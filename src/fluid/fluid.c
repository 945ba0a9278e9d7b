/* What is common to all fluids: names of statuses and phases.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/fluid.h"

const char *
hl_status_describe (HlStatus status)
{
  switch (status)
    {
    case HL_OK: return "ok";
    case HL_OUTSIDE_RANGE: return "outside the published range of the fluid";
    case HL_NOT_CONVERGED: return "the iteration did not converge";
    }
  return "unknown status";
}

const char *
hl_phase_name (HlPhase phase)
{
  switch (phase)
    {
    case HL_PHASE_LIQUID: return "liquid";
    case HL_PHASE_TWO_PHASE: return "two-phase";
    case HL_PHASE_VAPOUR: return "vapour";
    case HL_PHASE_SUPERCRITICAL: return "supercritical";
    }
  return "unknown";
}
