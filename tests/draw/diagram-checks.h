/* What must hold for every state diagram: texts apart, inside, and as wide as their boxes.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "draw/state-diagram-private.h"
G_BEGIN_DECLS

/* Ends the test where a text meets another one, a dot, a leader or the axes, or where something is painted off the picture. */
void          check_diagram     (const HlStateDiagram *diagram);
/* States whose number found no room. */
guint         n_without_number  (const HlStateDiagram *diagram);
const HlMark *mark_at           (const HlStateDiagram *diagram, guint n);

/* From a small pane to a large window. */
static const struct { double width, height; } diagram_sizes[] = { { 400, 300 }, { 700, 300 }, { 960, 600 }, { 1280, 420 }, { 1600, 1000 } };
G_END_DECLS
