/* Two streams in counterflow: what exchangers, recuperators and the heating surfaces of a gas path have in common.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/components/components.h"
G_BEGIN_DECLS

/* Which ports and quantities of a kind are the two sides. */
typedef struct {
  const char *hot_in, *hot_out, *cold_in, *cold_out;
  const char *hot_loss, *cold_loss;        /* pressure losses; NULL: none */
  gboolean    has_end_differences;         /* hot_end_difference, cold_end_difference */
  gboolean    has_effectiveness;
  gboolean    loses_heat;                  /* heat_loss_fraction of what the hot side gives, heat_loss */
} HlExchangeSides;

/* Everything but what a kind adds; returns the heat that reaches the cold side. */
int  hl_exchange_emit_sides      (HlEmit *emit, const HlExchangeSides *sides);
void hl_exchange_check_sides     (HlChecker *checker, const HlExchangeSides *sides);
void hl_exchange_processes_sides (HlProcessSink *sink, const HlExchangeSides *sides);

/* With the ports of the exchanger and the recuperator. */
void hl_exchange_emit      (HlEmit *emit);
void hl_exchange_count     (HlEmit *emit, int heat);      /* to the plant's sum that the option "counts" names */
void hl_exchange_check     (HlChecker *checker);
void hl_exchange_processes (HlProcessSink *sink);
G_END_DECLS
