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
