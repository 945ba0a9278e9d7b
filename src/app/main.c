/* heatloom: the window program.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-application.h"

int
main (int argc, char **argv)
{
  g_autoptr (HlApplication) application = NULL;
  hl_application_prepare_process ();
  g_set_application_name ("Heatloom");
  application = hl_application_new (g_getenv ("HEATLOOM_NON_UNIQUE") != NULL ? G_APPLICATION_NON_UNIQUE : 0);
  return g_application_run (G_APPLICATION (application), argc, argv);
}
