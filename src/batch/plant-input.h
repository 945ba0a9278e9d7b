/* The plant of a command: read from a file, with the values of --set.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "batch/command.h"
#include "engine/engine.h"
G_BEGIN_DECLS

HlPlant *hl_input_plant  (const char *path, GError **error);    /* "-": standard input */
/* Every --set in turn; appends to @yielded, of HlYield, what gave way. */
gboolean hl_input_values (HlPlant **plant, const HlArguments *arguments, GArray *yielded, GError **error);
G_END_DECLS
