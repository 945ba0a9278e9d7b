/* Lines for whoever drives the program from outside.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-trace.h"
#include <stdio.h>

gboolean
hl_trace_is_on (void)
{
  static gsize once = 0;
  static gboolean is_on = FALSE;
  if (g_once_init_enter (&once))
    {
      is_on = g_strcmp0 (g_getenv ("HEATLOOM_TRACE"), "1") == 0;
      g_once_init_leave (&once, 1);
    }
  return is_on;
}

void
hl_trace (const char *format, ...)
{
  va_list args;
  if (!hl_trace_is_on ())
    return;
  va_start (args, format);
  vprintf (format, args);
  va_end (args);
  putchar ('\n');
  fflush (stdout);    /* the reader waits for the line */
}

void
hl_trace_place (const char *word, const char *name, GtkWidget *widget, double x, double y)
{
  GtkNative *native = gtk_widget_get_native (widget);
  graphene_point_t place;
  double dx, dy;
  if (!hl_trace_is_on () || native == NULL
      || !gtk_widget_compute_point (widget, GTK_WIDGET (native), &GRAPHENE_POINT_INIT ((float) x, (float) y), &place))
    return;
  gtk_native_get_surface_transform (native, &dx, &dy);
  hl_trace ("%s %s %.0f %.0f", word, name, place.x + dx, place.y + dy);
}
