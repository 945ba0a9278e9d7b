/* Numbers as text for machines: the shortest that reads back to the same value.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <glib.h>
G_BEGIN_DECLS

#define HL_NUMBER_SIZE 32

/* Writes a finite @value and a final NUL, and returns the length without it.  @text: [HL_NUMBER_SIZE]. */
gsize    hl_number_print (double value, char *text);
/* The whole of @text must be one finite number, with a decimal point; blanks around it are fine. */
gboolean hl_number_read  (const char *text, double *value);
G_END_DECLS
