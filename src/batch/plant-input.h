/* The plant of a command: read from a file, with the values of --set.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "batch/command.h"
#include "engine/engine.h"
#include "plant/document.h"
G_BEGIN_DECLS

HlDocument *hl_input_document (const char *path, GError **error);    /* "-": standard input */
/* The variant that an option names; HL_DOCUMENT_BASE where it is not given. */
gboolean hl_input_variant (const HlDocument *document, const HlArguments *arguments, const char *option, int *variant, GError **error);
/* The plant of the first word, in the variant of --variant; @document, @variant: (out) (optional): what it was taken from. Says on standard error which of its changes do not apply. */
HlPlant *hl_input_plant  (const HlArguments *arguments, HlDocument **document, int *variant, HlExit *failure, GError **error);
/* Every --set in turn; appends to @yielded, of HlYield, what gave way. */
gboolean hl_input_values (HlPlant **plant, const HlArguments *arguments, GArray *yielded, GError **error);
G_END_DECLS
