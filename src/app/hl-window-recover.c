/* Offers work that a crash has left behind.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-window-private.h"
#include "app/hl-confirm.h"
#include "app/hl-trace.h"
#include "plant/i18n.h"

enum { LATER, DISCARD, RECOVER };

typedef struct {
  HlWindow *window;
  char     *kept;
} Offer;

/* One undoable step upon what the file holds; the kept file goes once its content is kept for this process. */
gboolean
hl_window_recover (HlWindow *self, const char *kept, GError **error)
{
  HlDocument *document = hl_document_load (kept, error);
  if (document == NULL)
    return FALSE;
  if (hl_session_path (self->session) == NULL)
    hl_session_reset (self->session, hl_plant_new (), NULL);
  hl_session_apply_document (self->session, _("Recover unsaved work"), document, HL_DOCUMENT_BASE);
  hl_autosave_now (self->autosave);
  hl_autosave_discard (kept);
  hl_canvas_fit (self->canvas);
  g_signal_emit_by_name (self->session, "message", _("Recovered unsaved work; save it to keep it"));
  hl_trace ("recovered");
  return TRUE;
}

static void
answer_cb (int button, gpointer data)
{
  Offer *offer = data;
  g_autoptr (GError) error = NULL;
  if (button == RECOVER && !hl_window_recover (offer->window, offer->kept, &error))
    hl_window_show_error (offer->window, _("The unsaved work could not be read"), error);
  else if (button == DISCARD)
    {
      hl_autosave_discard (offer->kept);
      hl_window_offer_recovery (offer->window);     /* there may be more */
    }
  g_object_unref (offer->window);
  g_free (offer->kept);
  g_free (offer);
}

void
hl_window_offer_recovery (HlWindow *self)
{
  const char *const buttons[] = { _("Later"), _("Discard"), _("Recover"), NULL };
  g_autoptr (GPtrArray) found = hl_autosave_find (hl_session_path (self->session));
  g_autofree char *name = NULL, *title = NULL, *time = NULL, *text = NULL;
  Offer *offer;
  if (found->len == 0)
    return;
  offer = g_new (Offer, 1);
  offer->window = g_object_ref (self);
  offer->kept = g_strdup (g_ptr_array_index (found, 0));
  time = hl_autosave_time (offer->kept);
  if (hl_session_path (self->session) != NULL)
    {
      name = g_path_get_basename (hl_session_path (self->session));
      title = g_strdup_printf (_("Recover unsaved work on “%s”?"), name);
    }
  else
    title = g_strdup (_("Recover a plant that was never saved?"));
  /* Translators: %s is a time and a date */
  text = g_strdup_printf (_("Heatloom ended without being closed. What was changed until %s has been kept."), time);
  hl_trace ("offer %s", offer->kept);
  hl_confirm (GTK_WINDOW (self), title, text, buttons, answer_cb, offer);
}
