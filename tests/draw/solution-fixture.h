/* Stands in for the solver where a test of pictures needs known states.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/engine.h"
G_BEGIN_DECLS
/* States by the kind a stream comes from, flows by its number: nothing is solved, so texts and colours are known beforehand. */
HlSolution *hl_fixture_solution (HlPlant *plant, gboolean is_solved);
G_END_DECLS
