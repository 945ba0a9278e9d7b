/* Boundary: where a stream enters or leaves the drawing.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/components.h"

enum { SOURCE, SINK };

static void
emit_boundary (HlEmit *emit)
{
  hl_emit_port (emit, hl_component_option (emit->component, "direction") == SOURCE ? "outlet" : "inlet");
}

const HlComponentModel hl_boundary_model = { "boundary", emit_boundary, NULL, NULL };
