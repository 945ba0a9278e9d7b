/* Light or dark: one style sheet, with the colours of draw/theme.c put in, and the theme that pictures on screen take.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gtk/gtk.h>
#include "draw/theme.h"
G_BEGIN_DECLS

typedef enum { HL_LOOK_SYSTEM, HL_LOOK_LIGHT, HL_LOOK_DARK } HlLook;

void           hl_look_start    (void);           /* once, when the display is open */
void           hl_look_set      (HlLook look);    /* every widget then gets its css_changed vfunc: drawings redraw there */
HlLook         hl_look_get      (void);
const HlTheme *hl_look_theme    (void);           /* of the window as it is now */
HlLook         hl_look_from_id  (const char *id); /* "system", "light", "dark" */
const char    *hl_look_id       (HlLook look);
G_END_DECLS
