/* Rules of practice: hints and cautions about plants that can be, and where each limit comes from.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/checks.h"
G_BEGIN_DECLS

/* Adds what is seldom wise about a plant whose numbers are all known. */
void        hl_check_practice  (HlChecker *checker);
/* Where the limit behind findings of this code comes from, translated; NULL for laws and structure. */
const char *hl_practice_source (const char *code);
G_END_DECLS
