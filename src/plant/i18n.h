/* Translation marks of everything that a person reads.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <glib.h>
#include <libintl.h>

#define _(text)               ((const char *) dgettext (GETTEXT_PACKAGE, text))
#define N_(text)              (text)
#define C_(context, text)     g_dpgettext2 (GETTEXT_PACKAGE, context, text)
#define ngettext_hl(one, many, n) ((const char *) dngettext (GETTEXT_PACKAGE, one, many, n))
