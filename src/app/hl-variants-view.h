/* The page of variants: what they change, what comes of it, and how they differ from one of them.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gtk/gtk.h>
#include "app/hl-session.h"
#include "draw/variants.h"
G_BEGIN_DECLS
#define HL_TYPE_VARIANTS_VIEW (hl_variants_view_get_type ())
G_DECLARE_FINAL_TYPE (HlVariantsView, hl_variants_view, HL, VARIANTS_VIEW, GtkWidget)

GtkWidget    *hl_variants_view_new        (HlSession *session);
/* What the page shows, brought up to date first; NULL where the plant has no variants.  (transfer none) */
HlComparison *hl_variants_view_comparison (HlVariantsView *self);
void          hl_variants_view_set_reference (HlVariantsView *self, int variant);
void          hl_variants_view_set_at_duty   (HlVariantsView *self, gboolean at_duty);
G_END_DECLS
