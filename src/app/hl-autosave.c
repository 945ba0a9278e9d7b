/* Unsaved work kept in a file of its own a moment after each edit, and found again after a crash.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-autosave.h"
#include "app/hl-trace.h"
#include <errno.h>
#include <glib/gstdio.h>
#include <signal.h>
#include <string.h>
#include <unistd.h>

#define UNSAVED_NAME "unsaved"
#define KEPT_WORD ".autosave-"      /* ".loop.heatloom.autosave-PROCESS-NUMBER" */

/* One file to keep work in.  The thread that writes it and the session that ends it meet at the lock, so that nothing is
 * written after the end. */
typedef struct {
  GMutex   lock;
  char    *path;
  gboolean is_over;
} Keep;

struct _HlAutosave {
  HlSession *session;
  guint      delay;
  guint      source;
  Keep      *keep;        /* atomic box; NULL while nothing is unsaved */
  char      *for_path;    /* the session's path that @keep was made for */
  HlDocument *written;    /* what @keep holds or is about to */
};

/* Where */

static char *
state_folder (void)
{
  return g_build_filename (g_get_user_state_dir (), "heatloom", NULL);
}

/* The folder that work on @path is kept in, and the first part of the names in it. */
static char *
place_for (const char *path, char **stem)
{
  g_autofree char *name = path != NULL ? g_path_get_basename (path) : g_strdup (UNSAVED_NAME);
  char *folder = path != NULL ? g_path_get_dirname (path) : state_folder ();
  *stem = g_strconcat (".", name, KEPT_WORD, NULL);
  return folder;
}

static char *
new_path (const char *path)
{
  static int number = 0;
  g_autofree char *stem = NULL, *folder = place_for (path, &stem), *name = NULL;
  if (path != NULL && g_access (folder, W_OK) != 0)     /* a folder that may only be read: kept as a plant without a file */
    {
      g_free (folder);
      g_free (stem);
      stem = NULL;
      folder = place_for (NULL, &stem);
    }
  g_mkdir_with_parents (folder, 0700);
  name = g_strdup_printf ("%s%d-%d", stem, (int) getpid (), ++number);
  return g_build_filename (folder, name, NULL);
}

/* Writing */

static Keep *
keep_new (const char *path)
{
  Keep *keep = g_atomic_rc_box_new0 (Keep);
  g_mutex_init (&keep->lock);
  keep->path = new_path (path);
  return keep;
}

static void
keep_clear (gpointer data)
{
  Keep *keep = data;
  g_mutex_clear (&keep->lock);
  g_free (keep->path);
}

static void
keep_unref (gpointer keep)
{
  g_atomic_rc_box_release_full (keep, keep_clear);
}

static void
keep_end (Keep *keep)
{
  g_mutex_lock (&keep->lock);
  keep->is_over = TRUE;
  g_unlink (keep->path);
  g_mutex_unlock (&keep->lock);
  keep_unref (keep);
}

static void
keep_write (Keep *keep, HlDocument *document)
{
  g_autoptr (GError) error = NULL;
  g_mutex_lock (&keep->lock);
  if (keep->is_over)
    ;
  else if (hl_document_save (document, keep->path, &error))
    hl_trace ("kept %s", keep->path);
  else
    g_info ("unsaved work could not be kept: %s", error->message);
  g_mutex_unlock (&keep->lock);
}

static void
write_thread (GTask *task, gpointer source, gpointer document, GCancellable *cancellable)
{
  keep_write (g_object_get_data (G_OBJECT (task), "keep"), document);
  g_task_return_boolean (task, TRUE);
}

/* What is to be written now, or NULL. */
static HlDocument *
document_to_write (HlAutosave *self)
{
  HlDocument *document = hl_session_document (self->session);
  if (!hl_session_is_dirty (self->session) || document == self->written)
    return NULL;
  if (self->keep == NULL)
    {
      self->keep = keep_new (hl_session_path (self->session));
      self->for_path = g_strdup (hl_session_path (self->session));
    }
  g_clear_pointer (&self->written, hl_document_unref);
  self->written = hl_document_ref (document);
  return document;
}

static gboolean
due_cb (gpointer data)
{
  HlAutosave *self = data;
  HlDocument *document = document_to_write (self);
  self->source = 0;
  if (document != NULL)
    {
      g_autoptr (GTask) task = g_task_new (NULL, NULL, NULL, NULL);
      g_task_set_task_data (task, hl_document_ref (document), (GDestroyNotify) hl_document_unref);
      g_object_set_data_full (G_OBJECT (task), "keep", g_atomic_rc_box_acquire (self->keep), keep_unref);
      g_task_run_in_thread (task, write_thread);
    }
  return G_SOURCE_REMOVE;
}

void
hl_autosave_now (HlAutosave *self)
{
  HlDocument *document = document_to_write (self);
  if (document != NULL)
    keep_write (self->keep, document);
}

static void
end (HlAutosave *self)
{
  g_clear_handle_id (&self->source, g_source_remove);
  g_clear_pointer (&self->keep, keep_end);
  g_clear_pointer (&self->for_path, g_free);
  g_clear_pointer (&self->written, hl_document_unref);
}

static void
file_changed_cb (HlSession *session, HlAutosave *self)
{
  if (!hl_session_is_dirty (session) || (self->keep != NULL && g_strcmp0 (self->for_path, hl_session_path (session)) != 0))
    end (self);
  if (self->source == 0 && hl_session_is_dirty (session))
    self->source = g_timeout_add (self->delay, due_cb, self);
}

HlAutosave *
hl_autosave_new (HlSession *session, guint delay)
{
  HlAutosave *self = g_new0 (HlAutosave, 1);
  self->session = g_object_ref (session);
  self->delay = delay;
  g_signal_connect (session, "file-changed", G_CALLBACK (file_changed_cb), self);
  return self;
}

void
hl_autosave_free (HlAutosave *self)
{
  g_signal_handlers_disconnect_by_data (self->session, self);
  end (self);
  g_object_unref (self->session);
  g_free (self);
}

/* Finding */

static char *
program_of (int process)
{
  g_autofree char *link = g_strdup_printf ("/proc/%d/exe", process);
  return g_file_read_link (link, NULL);
}

/* A number that another program has by now does not count as alive. */
static gboolean
is_alive (int process)
{
  g_autofree char *other = program_of (process), *own = program_of ((int) getpid ());
  if (kill (process, 0) != 0 && errno == ESRCH)
    return FALSE;
  return other == NULL || own == NULL || strcmp (other, own) == 0;
}

/* Whether @name is @stem with two numbers behind it, and which process the first one is. */
static gboolean
is_kept (const char *name, const char *stem, int *process)
{
  int number, length = 0;
  if (!g_str_has_prefix (name, stem) || sscanf (name + strlen (stem), "%d-%d%n", process, &number, &length) != 2)
    return FALSE;
  return length > 0 && name[strlen (stem) + (gsize) length] == '\0' && *process > 0;
}

static gint64
written_at (const char *path)
{
  GStatBuf about;
  return g_stat (path, &about) == 0 ? (gint64) about.st_mtime : 0;
}

static int
newest_first (gconstpointer a, gconstpointer b)
{
  gint64 time_a = written_at (*(char *const *) a), time_b = written_at (*(char *const *) b);
  return time_a < time_b ? 1 : time_a > time_b ? -1 : g_strcmp0 (*(char *const *) a, *(char *const *) b);
}

GPtrArray *
hl_autosave_find (const char *path)
{
  g_autofree char *stem = NULL, *folder = place_for (path, &stem);
  GPtrArray *found = g_ptr_array_new_with_free_func (g_free);
  GDir *dir = g_dir_open (folder, 0, NULL);
  const char *name;
  int process;
  if (dir == NULL)
    return found;
  while ((name = g_dir_read_name (dir)) != NULL)
    if (is_kept (name, stem, &process) && !is_alive (process))
      g_ptr_array_add (found, g_build_filename (folder, name, NULL));
  g_dir_close (dir);
  g_ptr_array_sort (found, newest_first);
  return found;
}

void
hl_autosave_discard (const char *kept)
{
  g_unlink (kept);
}

char *
hl_autosave_time (const char *kept)
{
  g_autoptr (GDateTime) time = g_date_time_new_from_unix_local (written_at (kept));
  return g_date_time_format (time, "%H:%M, %-e %B");
}
