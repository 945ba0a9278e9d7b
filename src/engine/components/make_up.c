/* Make-up water: comes from outside in the state that is given.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/components.h"

static void
emit_make_up (HlEmit *emit)
{
  hl_emit_guess (emit, hl_emit_port (emit, "outlet"), 63e3);
}

const HlComponentModel hl_make_up_model = { "make_up", emit_make_up, NULL, NULL };
