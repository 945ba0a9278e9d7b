/* Parts of the nameplate: its head, the rows that are not quantities, and what fills it for each kind of selection.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "app/hl-nameplate-body.h"
#include "app/hl-nameplate.h"
#include "app/hl-quantity-row.h"
G_BEGIN_DECLS

/* --- the head: picture, id, free name, one or two quiet lines (hl-nameplate-head.c) --- */
#define HL_TYPE_NAMEPLATE_HEAD (hl_nameplate_head_get_type ())
G_DECLARE_FINAL_TYPE (HlNameplateHead, hl_nameplate_head, HL, NAMEPLATE_HEAD, GtkWidget)
GtkWidget *hl_nameplate_head_new    (HlSession *session);
void       hl_nameplate_head_update (HlNameplateHead *self);
void       hl_nameplate_head_focus  (HlNameplateHead *self);

/* --- rows that are not quantities (hl-nameplate-rows.c) --- */
/* An option of a component: a count or one of several words. */
GtkWidget *hl_option_row_new    (HlSession *session, const char *id, const HlOptionKind *option);
void       hl_option_row_update (GtkWidget *row);
/* A number of the site. */
typedef enum { HL_SITE_ALTITUDE, HL_SITE_AMBIENT_T, HL_SITE_WET_BULB_T, HL_SITE_DEAD_T, HL_SITE_DEAD_P, HL_N_SITE_NUMBERS } HlSiteNumber;
GtkWidget *hl_site_row_new      (HlSession *session, HlSiteNumber which);
void       hl_site_row_update   (GtkWidget *row);
GtkWidget *hl_units_row_new     (HlSession *session);
void       hl_units_row_update  (GtkWidget *row);
/* A line that leads to a component or stream: a name, and a quiet text beside it, or under it when tall. */
GtkWidget *hl_link_row_new      (HlSession *session, gboolean is_tall);
void       hl_link_row_set      (GtkWidget *row, const char *name, const char *text, const char *id);
/* Exhaust moisture between good and bad. */
GtkWidget *hl_limit_row_new     (void);
void       hl_limit_row_set     (GtkWidget *row, const char *name, double value, double caution, double warning);

/* --- fillers: between begin and end of the body --- */
void hl_nameplate_fill_component (HlNameplateBody *body, HlSession *session, const HlComponent *component);
void hl_nameplate_fill_stream    (HlNameplateBody *body, HlSession *session, const HlStream *stream);
void hl_nameplate_fill_plant     (HlNameplateBody *body, HlSession *session);
void hl_nameplate_fill_many      (HlNameplateBody *body, HlSession *session);
/* The row of @address: made or updated, and put. */
void hl_nameplate_put_quantity   (HlNameplateBody *body, HlSession *session, const char *heading, const HlAddress *address, const char *name);
/* "16.67 kg/s · 65 bar · 485.0 °C", or x in the two-phase region; "" where nothing is known.  g_free(). */
char *hl_nameplate_stream_text   (HlSession *session, const HlStream *stream);
G_END_DECLS
