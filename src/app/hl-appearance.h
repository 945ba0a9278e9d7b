/* Light or dark: one style sheet, with the colours of draw/theme.c put in, and the theme that pictures on screen take.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gtk/gtk.h>
#include "draw/theme.h"
G_BEGIN_DECLS

typedef enum { HL_APPEARANCE_SYSTEM, HL_APPEARANCE_LIGHT, HL_APPEARANCE_DARK } HlAppearance;

void           hl_appearance_start    (void);           /* once, when the display is open */
void           hl_appearance_set      (HlAppearance look);    /* every widget then gets its css_changed vfunc: drawings redraw there */
HlAppearance         hl_appearance_get      (void);
const HlTheme *hl_appearance_theme    (void);           /* of the window as it is now */
HlAppearance         hl_appearance_from_id  (const char *id); /* "system", "light", "dark" */
const char    *hl_appearance_id       (HlAppearance look);
G_END_DECLS
