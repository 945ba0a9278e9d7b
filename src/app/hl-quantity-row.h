/* One quantity of the nameplate: name, value with unit, origin, and below them errors and the explanation.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gtk/gtk.h>
#include "app/hl-session.h"
G_BEGIN_DECLS

#define HL_TYPE_QUANTITY_ROW (hl_quantity_row_get_type ())
G_DECLARE_FINAL_TYPE (HlQuantityRow, hl_quantity_row, HL, QUANTITY_ROW, GtkWidget)

GtkWidget       *hl_quantity_row_new     (HlSession *session, const HlAddress *address, const char *name);
/* Shows the present value.  Text that is being typed stays. */
void             hl_quantity_row_update  (HlQuantityRow *self);
const HlAddress *hl_quantity_row_address (HlQuantityRow *self);
void             hl_quantity_row_show_explanation (HlQuantityRow *self, gboolean shown);

/* Text typed but not committed, or NULL; taking it leaves the row without (before it is removed).  g_free(). */
char            *hl_quantity_row_take_draft (HlQuantityRow *self);
/* Puts such text back with what is wrong with it; changes nothing. */
void             hl_quantity_row_put_draft  (HlQuantityRow *self, const char *text);
G_END_DECLS
