/* Desuperheater: water sprayed into steam brings it to a temperature.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/components/spray.h"

static void
emit_desuperheater (HlEmit *emit)
{
  hl_spray_emit (emit, TRUE);
}

static void
check (HlChecker *checker)
{
  hl_spray_check (checker, hl_check_port (checker, "steam"));
}

static void
processes (HlProcessSink *sink)
{
  int out = hl_process_node (sink, "outlet");
  hl_process_add (sink, HL_PROCESS_MIXING, hl_process_node (sink, "steam"), out);
  hl_process_add (sink, HL_PROCESS_MIXING, hl_process_node (sink, "spray"), out);
}

const HlComponentModel hl_desuperheater_model = { "desuperheater", emit_desuperheater, check, processes };
