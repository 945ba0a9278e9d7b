/* Heat and bands pages: they draw, follow the selection, and keep no session.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-picture-view.h"
#include "panes.h"

static void
test_heat_follows_the_selection (void)
{
  HlSession *session = loop_session ();
  GtkWidget *view = hl_heat_view_new (session), *window = window_with (view);
  int condenser = hl_plant_component_index (hl_session_plant (session), "C1");

  g_assert_cmpint (hl_picture_view_component (HL_PICTURE_VIEW (view)), ==, -1);
  hl_session_select (session, "C1", FALSE);
  g_assert_cmpint (condenser, >=, 0);
  g_assert_cmpint (hl_picture_view_component (HL_PICTURE_VIEW (view)), ==, condenser);
  gtk_test_widget_wait_for_draw (window);
  hl_session_select (session, "T1", FALSE);           /* no exchanger */
  g_assert_cmpint (hl_picture_view_component (HL_PICTURE_VIEW (view)), ==, -1);
  gtk_test_widget_wait_for_draw (window);
  close_window (window, session);
}

static void
test_bands_show_energy_exergy_and_bars (void)
{
  HlSession *session = loop_session ();
  GtkWidget *view = hl_bands_view_new (session), *window = window_with (view);

  for (HlBandsPage page = HL_BANDS_PAGE_ENERGY; page <= HL_BANDS_PAGE_BARS; page++)
    {
      hl_bands_view_show (HL_PICTURE_VIEW (view), page);
      gtk_test_widget_wait_for_draw (window);
    }
  close_window (window, session);
}

static void
test_bands_draw_an_empty_sheet_too (void)
{
  HlSession *session = loop_session ();
  GtkWidget *window = window_with (hl_bands_view_new (session));

  hl_session_reset (session, hl_plant_new (), NULL);
  gtk_test_widget_wait_for_draw (window);
  close_window (window, session);
}

int
main (int argc, char **argv)
{
  if (!test_init (&argc, &argv))
    return 0;
  g_test_add_func ("/app/picture-view/heat follows the selection", test_heat_follows_the_selection);
  g_test_add_func ("/app/picture-view/bands show energy, exergy and bars", test_bands_show_energy_exergy_and_bars);
  g_test_add_func ("/app/picture-view/bands draw an empty sheet too", test_bands_draw_an_empty_sheet_too);
  return g_test_run ();
}
