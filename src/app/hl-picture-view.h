/* Pages of the diagram area that are drawn anew as a whole: heat diagram of the selection, bands of the plant.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gtk/gtk.h>
#include "app/hl-session.h"
G_BEGIN_DECLS

#define HL_TYPE_PICTURE_VIEW (hl_picture_view_get_type ())
G_DECLARE_FINAL_TYPE (HlPictureView, hl_picture_view, HL, PICTURE_VIEW, GtkWidget)
GtkWidget *hl_heat_view_new  (HlSession *session);
GtkWidget *hl_bands_view_new (HlSession *session);
typedef enum { HL_BANDS_PAGE_ENERGY, HL_BANDS_PAGE_EXERGY, HL_BANDS_PAGE_BARS } HlBandsPage;
void       hl_bands_view_show (HlPictureView *self, HlBandsPage page);
/* The component whose heat is shown; -1: all exchangers. */
int        hl_picture_view_component (HlPictureView *self);
G_END_DECLS
