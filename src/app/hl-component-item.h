/* A component on the canvas: draws its symbol, takes the focus, has a name for assistive technology.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gtk/gtk.h>
#include "plant/plant.h"
G_BEGIN_DECLS
#define HL_TYPE_COMPONENT_ITEM (hl_component_item_get_type ())
G_DECLARE_FINAL_TYPE (HlComponentItem, hl_component_item, HL, COMPONENT_ITEM, GtkWidget)
GtkWidget  *hl_component_item_new         (void);
/* Redraws only where something is another one. @description: the key figure. */
void        hl_component_item_show        (HlComponentItem *self, const HlComponent *component, const char *description, gboolean is_selected);
void        hl_component_item_set_lit     (HlComponentItem *self, gboolean is_lit);      /* a valid target of the line being drawn */
const char *hl_component_item_id          (HlComponentItem *self);                       /* interned */
/* Box in canvas pixels at zoom 1. */
void        hl_component_item_box         (HlComponentItem *self, graphene_rect_t *box);
G_END_DECLS
