/* Unsaved work kept in a file of its own a moment after each edit, and found again after a crash.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "app/hl-session.h"
G_BEGIN_DECLS

typedef struct _HlAutosave HlAutosave;

/* Watches @session, and writes @delay milliseconds after an edit. */
HlAutosave *hl_autosave_new     (HlSession *session, guint delay);
void        hl_autosave_now     (HlAutosave *self);              /* writes at once, and returns when that is done */
void        hl_autosave_free    (HlAutosave *self);              /* ends in good order: what was kept is removed */

/* What programs that are gone have kept of the plant in the file @path, or (NULL) of plants without a file: paths, newest first. */
GPtrArray  *hl_autosave_find    (const char *path);
void        hl_autosave_discard (const char *kept);              /* removes what hl_autosave_find() found */
char       *hl_autosave_time    (const char *kept);              /* "14:05, 1 December": when it was written; g_free() */

G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlAutosave, hl_autosave_free)
G_END_DECLS
