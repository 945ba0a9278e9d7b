/* For templates: a plant under construction.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "plant/template.h"
G_BEGIN_DECLS

typedef struct { HlPlant *plant; } HlDraft;

HlDraft  hl_draft_begin  (char *title);                            /* takes @title */
HlPlant *hl_draft_end    (HlDraft *draft);                         /* (transfer full) */
/* A component with its assumed values; @option (nullable) is set to @choice. */
void     hl_draft_put    (HlDraft *draft, const char *kind, const char *id, const char *name, int x, int y, gboolean is_mirrored,
                          const char *option, int choice);
void     hl_draft_turn   (HlDraft *draft, const char *id, int turn);                 /* quarter turns, after mirroring */
void     hl_draft_assume (HlDraft *draft, const char *address, double value);        /* SI; NaN: let it be found */
/* A line by port addresses "T1.exhaust", with its bends. */
void     hl_draft_line   (HlDraft *draft, const char *from, const char *to, const HlGridPoint *bends, guint n_bends);
void     hl_draft_shaft  (HlDraft *draft, const char *const *joins, guint n);

/* Bends of a line that runs down or up to the lane @y between two columns. */
#define HL_LANE(x0, y, x1) (const HlGridPoint[]) { { (x0), (y) }, { (x1), (y) } }, 2
#define HL_BEND(x, y)      (const HlGridPoint[]) { { (x), (y) } }, 1
#define HL_STRAIGHT        NULL, 0

HlPlant *hl_template_steam_build         (int heaters, gboolean has_reheat);      /* 0 heaters: the simple loop */
HlPlant *hl_template_extraction_build    (void);
HlPlant *hl_template_back_pressure_build (void);
G_END_DECLS
