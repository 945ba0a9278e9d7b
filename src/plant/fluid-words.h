/* Words for what is known of media, translated.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "fluid/fluid-cycle.h"
#include "fluid/fluid-facts.h"
G_BEGIN_DECLS

HL_PUBLIC const char *hl_words_of_fluid     (const HlFluid *fluid);       /* its name */
HL_PUBLIC gboolean    hl_words_know_fluid   (const HlFluid *fluid);       /* whether that can be translated */
HL_PUBLIC const char *hl_words_of_expansion (HlExpansionType type);       /* "wet" */
HL_PUBLIC char       *hl_words_of_safety    (const HlFluid *fluid);       /* "A3", "flammable", "–" where nothing is known; g_free() */

/* Why a medium has no cycle between two temperatures: "above its critical temperature"; "" where it has one. */
HL_PUBLIC const char *hl_words_of_cycle (HlCyclePossible possible);
G_END_DECLS
