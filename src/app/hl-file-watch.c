/* Notices when another program changes or removes the file that a window shows.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-file-watch.h"

struct _HlFileWatch {
  HlFileWatchNotice notice;
  gpointer          data;
  char             *path;
  GFileMonitor     *monitor;
  char             *known;       /* mark of the content that the window knows */
  char             *told;        /* mark of the content that was last told about */
};

/* Stands for the content of a file: other size, time of change or file, other mark.  NULL where there is none. */
static char *
mark_of (const char *path)
{
  g_autoptr (GFile) file = g_file_new_for_path (path);
  g_autoptr (GFileInfo) info = g_file_query_info (file,
    G_FILE_ATTRIBUTE_ETAG_VALUE "," G_FILE_ATTRIBUTE_STANDARD_SIZE "," G_FILE_ATTRIBUTE_UNIX_INODE, G_FILE_QUERY_INFO_NONE, NULL, NULL);
  if (info == NULL)
    return NULL;
  return g_strdup_printf ("%s %" G_GOFFSET_FORMAT " %" G_GUINT64_FORMAT, g_file_info_get_etag (info), g_file_info_get_size (info),
                          g_file_info_get_attribute_uint64 (info, G_FILE_ATTRIBUTE_UNIX_INODE));
}

static HlFileState
state_of (const HlFileWatch *self, const char *mark)
{
  if (g_strcmp0 (mark, self->known) == 0)
    return HL_FILE_SAME;
  return mark == NULL ? HL_FILE_REMOVED : HL_FILE_CHANGED;
}

static void
event_cb (GFileMonitor *monitor, GFile *file, GFile *other, GFileMonitorEvent event, gpointer data)
{
  HlFileWatch *self = data;
  g_autofree char *mark = NULL;
  HlFileState state;

  /* A program that writes in place goes through states cut short: wait until it is done. */
  if (event == G_FILE_MONITOR_EVENT_CHANGED || event == G_FILE_MONITOR_EVENT_ATTRIBUTE_CHANGED)
    return;
  mark = mark_of (self->path);
  if (g_strcmp0 (mark, self->told) == 0)
    return;
  g_free (self->told);
  self->told = g_strdup (mark);
  state = state_of (self, mark);
  self->notice (state, self->data);
}

HlFileWatch *
hl_file_watch_new (HlFileWatchNotice notice, gpointer data)
{
  HlFileWatch *self = g_new0 (HlFileWatch, 1);
  self->notice = notice;
  self->data = data;
  return self;
}

static void
forget (HlFileWatch *self)
{
  if (self->monitor != NULL)
    {
      g_signal_handlers_disconnect_by_data (self->monitor, self);
      g_file_monitor_cancel (self->monitor);
      g_clear_object (&self->monitor);
    }
  g_clear_pointer (&self->path, g_free);
  g_clear_pointer (&self->known, g_free);
  g_clear_pointer (&self->told, g_free);
}

void
hl_file_watch_free (HlFileWatch *self)
{
  forget (self);
  g_free (self);
}

void
hl_file_watch_follow (HlFileWatch *self, const char *path)
{
  char *own_path = g_strdup (path);
  g_autoptr (GFile) file = own_path != NULL ? g_file_new_for_path (own_path) : NULL;

  forget (self);
  self->path = own_path;
  if (file == NULL)
    return;
  self->known = mark_of (own_path);
  self->told = g_strdup (self->known);
  self->monitor = g_file_monitor_file (file, G_FILE_MONITOR_WATCH_MOVES, NULL, NULL);
  if (self->monitor != NULL)
    g_signal_connect (self->monitor, "changed", G_CALLBACK (event_cb), self);
}

HlFileState
hl_file_watch_state (HlFileWatch *self)
{
  g_autofree char *mark = self->path != NULL ? mark_of (self->path) : NULL;
  return self->path != NULL ? state_of (self, mark) : HL_FILE_SAME;
}
