/* The "Hand over" window: what to export, in which format and theme, with a live preview.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gtk/gtk.h>
#include "app/hl-session.h"
G_BEGIN_DECLS

typedef enum {
  HL_HAND_OVER_DRAWING,
  HL_HAND_OVER_STATE_DIAGRAM,
  HL_HAND_OVER_HS_DIAGRAM,
  HL_HAND_OVER_PH_DIAGRAM,
  HL_HAND_OVER_HEAT,
  HL_HAND_OVER_BANDS,
  HL_HAND_OVER_EXERGY_BANDS,
  HL_HAND_OVER_EXERGY_BARS,
  HL_HAND_OVER_LEDGER,            /* before it the pictures of hl_export_picture() */
  HL_HAND_OVER_SHEET,             /* the drawing on A3 with title block */
  HL_HAND_OVER_REPORT,
  HL_HAND_OVER_WORKBOOK,
} HlHandOver;

#define HL_TYPE_EXPORT_DIALOG (hl_export_dialog_get_type ())
G_DECLARE_FINAL_TYPE (HlExportDialog, hl_export_dialog, HL, EXPORT_DIALOG, GtkWindow)
void     hl_export_dialog_present (GtkWindow *parent, HlSession *session);
/* Writes what is chosen to @path; FALSE with the message shown inline. */
gboolean hl_export_dialog_write   (HlExportDialog *self, const char *path);
G_END_DECLS
