/* Notices when another program changes or removes the file that a window shows.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gio/gio.h>
G_BEGIN_DECLS

typedef enum {
  HL_FILE_SAME,         /* as it was when it was last read or written here, or there is no file to watch */
  HL_FILE_CHANGED,
  HL_FILE_REMOVED,
} HlFileState;

typedef struct _HlFileWatch HlFileWatch;
typedef void (*HlFileWatchNotice) (HlFileState state, gpointer data);

/* @notice runs in the main loop, once for each new content of the file. */
HlFileWatch *hl_file_watch_new    (HlFileWatchNotice notice, gpointer data);
void         hl_file_watch_free   (HlFileWatch *self);
/* What lies at @path (nullable) at this moment counts as known from now on. */
void         hl_file_watch_follow (HlFileWatch *self, const char *path);
/* Asks the disk, without waiting for the system's notice. */
HlFileState  hl_file_watch_state  (HlFileWatch *self);
G_END_DECLS
