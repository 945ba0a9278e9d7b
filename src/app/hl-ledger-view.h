/* The table of all streams: sortable, its selection linked with the session, copied as text with Ctrl+C.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gtk/gtk.h>
#include "app/hl-session.h"
G_BEGIN_DECLS

#define HL_TYPE_LEDGER_VIEW (hl_ledger_view_get_type ())
G_DECLARE_FINAL_TYPE (HlLedgerView, hl_ledger_view, HL, LEDGER_VIEW, GtkWidget)
GtkWidget *hl_ledger_view_new (HlSession *session);
/* Selected rows (all when none is) of the columns shown, headings first, cells parted by tabs.  g_free(). */
char      *hl_ledger_view_text (HlLedgerView *self);
G_END_DECLS
