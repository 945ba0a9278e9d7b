/* The window by its actions and by gestures in the same process: a loop is drawn from nothing, valued, saved and read back.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "windows.h"
#include "app/hl-findings.h"
#include "app/hl-ledger-view.h"
#include <glib/gstdio.h>

static double
value_of (HlWindow *window, const char *text)
{
  HlSolution *solution = hl_session_solution (hl_window_session (window));
  HlAddress address;
  double value = 0;
  g_assert_true (hl_address_parse (text, plant_of (window), &address, NULL));
  g_assert_true (hl_solution_value (solution, &address, &value));
  return value;
}

static void
test_a_loop_from_nothing_by_actions (void)
{
  HlWindow *window = new_window (), *other;
  g_autofree char *folder = g_dir_make_tmp ("heatloom-window-XXXXXX", NULL);
  g_autofree char *path = g_build_filename (folder, "loop.heatloom", NULL);
  HlSession *session = hl_window_session (window);
  double power;

  draw_loop (window);
  g_assert_cmpuint (hl_plant_n_streams (plant_of (window)), ==, 4);
  g_assert_cmpuint (hl_plant_n_shafts (plant_of (window)), ==, 1);
  g_assert_true (hl_solution_is_solved (hl_session_solution (session)));      /* from usual values alone */
  act (window, "set-value", "(ss)", "C1.steam.p", "0.07 bar");
  act (window, "set-value", "(ss)", "T1.inlet.p", "65 bar");
  act (window, "set-value", "(ss)", "Q1.steam.T", "485 °C");
  act (window, "set-value", "(ss)", "plant.net_power", "12 MW");
  g_assert_true (hl_solution_is_solved (hl_session_solution (session)));
  power = value_of (window, "plant.net_power");
  g_assert_cmpfloat_with_epsilon (power, 12e6, 1.0);
  /* The pump works against the whole pressure of the loop. */
  g_assert_cmpfloat (value_of (window, "P1.outlet.p"), >=, 65e5 * (1 - 1e-9));

  act (window, "save-to", "s", path);
  g_assert_false (hl_session_is_dirty (session));
  other = new_window ();
  act (other, "open-path", "s", path);
  g_assert_true (hl_plant_equal (plant_of (other), plant_of (window)));
  g_assert_cmpfloat_with_epsilon (value_of (other, "plant.net_power"), power, 1e-3);
  end_window (other);

  for (int n = 0; n < 14; n++)
    act (window, "undo", NULL);
  g_assert_cmpuint (hl_plant_n_components (plant_of (window)), ==, 0);
  g_assert_false (is_enabled (window, "undo"));
  g_assert_true (is_enabled (window, "redo"));
  end_window (window);
  g_remove (path);
  g_rmdir (folder);
}

static void
test_actions_are_enabled_where_they_make_sense (void)
{
  HlWindow *window = new_window ();
  HlSession *session = hl_window_session (window);

  g_assert_false (is_enabled (window, "delete"));
  g_assert_false (is_enabled (window, "undo"));
  g_assert_false (is_enabled (window, "export"));
  act (window, "add-component", "s", "pump");
  g_assert_true (hl_session_is_selected (session, "P1"));
  g_assert_true (is_enabled (window, "delete"));
  g_assert_true (is_enabled (window, "turn"));
  g_assert_true (is_enabled (window, "export"));
  g_assert_false (is_enabled (window, "leave-shaft"));
  act (window, "deselect", NULL);
  g_assert_false (is_enabled (window, "delete"));
  g_assert_true (is_enabled (window, "select-all"));
  end_window (window);
}

static void
test_edits_of_the_selection (void)
{
  HlWindow *window = new_window ();
  HlSession *session = hl_window_session (window);
  guint n;

  draw_loop (window);
  act (window, "select", "s", "P1");
  act (window, "move", "(ii)", 2, -3);
  g_assert_cmpint (hl_plant_find_component (plant_of (window), "P1")->x, ==, 22);
  g_assert_cmpstr (hl_session_undo_name (session), ==, "Move P1");
  act (window, "turn", NULL);
  g_assert_cmpint (hl_plant_find_component (plant_of (window), "P1")->turn, ==, 1);
  act (window, "mirror", NULL);
  g_assert_true (hl_plant_find_component (plant_of (window), "P1")->is_mirrored);
  act (window, "select-all", NULL);
  act (window, "duplicate", NULL);
  g_assert_cmpuint (hl_plant_n_components (plant_of (window)), ==, 10);
  g_assert_cmpuint (hl_plant_n_streams (plant_of (window)), ==, 8);
  hl_session_selection (session, &n);
  g_assert_cmpuint (n, ==, 5);
  g_assert_true (hl_session_is_selected (session, "T2"));
  act (window, "delete", NULL);
  g_assert_cmpuint (hl_plant_n_components (plant_of (window)), ==, 5);

  /* On and off a shaft. */
  act (window, "select", "s", "T1");
  act (window, "leave-shaft", NULL);
  g_assert_null (hl_plant_shaft_of (plant_of (window), "T1"));
  g_assert_false (is_enabled (window, "join-selection"));
  hl_session_select (session, "G1", TRUE);
  g_assert_true (is_enabled (window, "join-selection"));
  hl_session_select (session, "C1", TRUE);
  g_assert_false (is_enabled (window, "join-selection"));      /* a condenser has no shaft */
  hl_session_select (session, "C1", TRUE);
  hl_session_select (session, "P1", TRUE);
  act (window, "join-selection", NULL);
  g_assert_cmpuint (hl_plant_shaft_of (plant_of (window), "T1")->n_joins, ==, 3);
  g_assert_false (is_enabled (window, "join-selection"));      /* they are on one already */
  act (window, "undo", NULL);

  act (window, "connect", "(ssss)", "T1", "exhaust", "P1", "inlet");     /* taken: refused, nothing changes */
  g_assert_cmpuint (hl_plant_n_streams (plant_of (window)), ==, 4);
  end_window (window);
}

static void
test_the_clipboard_carries_components_between_windows (void)
{
  HlWindow *window = new_window (), *other = new_window ();
  const HlStream *line;

  draw_loop (window);
  act (window, "set-value", "(ss)", "T1.inlet.p", "72 bar");
  act (window, "select", "s", "T1");
  hl_session_select (hl_window_session (window), "G1", TRUE);
  hl_session_select (hl_window_session (window), "C1", TRUE);
  act (window, "copy", NULL);
  g_assert_cmpuint (hl_plant_n_components (plant_of (window)), ==, 5);
  act (other, "add-component-at", "(sii)", "turbine", 0, 0);
  act (other, "paste", NULL);
  for (int n = 0; n < 500 && hl_plant_n_components (plant_of (other)) == 1; n++)     /* the clipboard answers in its own time */
    spin (10);
  g_assert_cmpuint (hl_plant_n_components (plant_of (other)), ==, 4);
  line = hl_plant_stream_at (plant_of (other), "T2", "exhaust");
  g_assert_nonnull (line);
  g_assert_cmpstr (line->to_id, ==, "C1");
  g_assert_cmpuint (hl_plant_shaft_of (plant_of (other), "T2")->n_joins, ==, 2);
  g_assert_cmpfloat_with_epsilon (hl_values_find (&hl_plant_find_component (plant_of (other), "T2")->values, g_intern_string ("inlet.p"))->value, 72e5, 1e-6);
  act (other, "cut", NULL);
  g_assert_cmpuint (hl_plant_n_components (plant_of (other)), ==, 1);
  gdk_clipboard_set_text (gtk_widget_get_clipboard (GTK_WIDGET (other)), "not a plant");
  act (other, "paste", NULL);
  spin (50);
  g_assert_cmpuint (hl_plant_n_components (plant_of (other)), ==, 1);
  end_window (other);
  end_window (window);
}

static void
test_gestures_move_and_connect (void)
{
  HlWindow *window = new_window ();
  HlSession *session = hl_window_session (window);
  HlCanvas *canvas = canvas_of (window);
  double x, y, to_x, to_y, zoom;

  act (window, "add-component-at", "(sii)", "turbine", 0, 0);
  act (window, "add-component-at", "(sii)", "condenser", 8, 12);
  act (window, "zoom-fit", NULL);
  spin (30);
  zoom = hl_canvas_get_zoom (canvas);

  locate (canvas, "T1", NULL, &x, &y);
  drag (canvas, x, y, x - 40 * zoom, y + 20 * zoom);
  g_assert_cmpint (hl_plant_find_component (plant_of (window), "T1")->x, ==, -4);
  g_assert_cmpint (hl_plant_find_component (plant_of (window), "T1")->y, ==, 2);
  g_assert_cmpstr (hl_session_undo_name (session), ==, "Move T1");
  g_assert_true (hl_session_is_selected (session, "T1"));

  locate (canvas, "T1", "exhaust", &x, &y);
  locate (canvas, "C1", "steam", &to_x, &to_y);
  drag (canvas, x, y, to_x + 3, to_y - 3);
  g_assert_cmpuint (hl_plant_n_streams (plant_of (window)), ==, 1);
  g_assert_cmpstr (hl_session_undo_name (session), ==, "Connect T1 to C1");

  /* From an inlet to an inlet there is no line. */
  locate (canvas, "T1", "inlet", &x, &y);
  locate (canvas, "C1", "condensate", &to_x, &to_y);
  drag (canvas, to_x, to_y, 5, 5);
  g_assert_cmpuint (hl_plant_n_streams (plant_of (window)), ==, 1);
  drag (canvas, x, y, to_x, to_y);
  g_assert_cmpuint (hl_plant_n_streams (plant_of (window)), ==, 2);     /* condensate straight to the turbine: legal, if odd */
  act (window, "undo", NULL);

  /* A line that ends on another line meets it in a mixer. */
  act (window, "add-component-at", "(sii)", "valve", -16, 8);
  act (window, "zoom-fit", NULL);
  spin (30);
  zoom = hl_canvas_get_zoom (canvas);
  locate (canvas, "V1", "outlet", &x, &y);
  locate (canvas, "T1", "exhaust", &to_x, &to_y);
  drag (canvas, x, y, to_x, to_y + 20 * zoom);
  g_assert_cmpstr (hl_session_undo_name (session), ==, "Connect V1 to stream 1");
  g_assert_nonnull (hl_plant_find_component (plant_of (window), "M1"));
  g_assert_cmpstr (hl_plant_stream_at (plant_of (window), "V1", "outlet")->to_id, ==, "M1");
  g_assert_cmpstr (hl_plant_stream_at (plant_of (window), "C1", "steam")->from_id, ==, "M1");

  /* A rubber band over everything selects everything. */
  act (window, "deselect", NULL);
  drag (canvas, 2, 2, gtk_widget_get_width (GTK_WIDGET (canvas)) - 2, gtk_widget_get_height (GTK_WIDGET (canvas)) - 2);
  g_assert_true (hl_session_is_selected (session, "T1"));
  g_assert_true (hl_session_is_selected (session, "C1"));
  end_window (window);
}

static void
test_escape_in_the_middle_of_a_move_puts_it_back (void)
{
  HlWindow *window = new_window ();
  HlSession *session = hl_window_session (window);
  HlCanvas *canvas = canvas_of (window);
  GtkEventController *gesture = primary_drag (canvas);
  double x, y;

  act (window, "add-component-at", "(sii)", "turbine", 0, 0);
  spin (20);
  locate (canvas, "T1", NULL, &x, &y);
  g_signal_emit_by_name (gesture, "drag-begin", x, y);
  g_signal_emit_by_name (gesture, "drag-update", 60.0, 60.0);
  g_assert_cmpint (hl_plant_find_component (plant_of (window), "T1")->x, >, 0);
  act (window, "deselect", NULL);
  g_assert_cmpint (hl_plant_find_component (plant_of (window), "T1")->x, ==, 0);
  g_signal_emit_by_name (gesture, "drag-update", 80.0, 80.0);
  g_signal_emit_by_name (gesture, "drag-end", 80.0, 80.0);
  g_assert_cmpint (hl_plant_find_component (plant_of (window), "T1")->x, ==, 0);
  g_assert_cmpstr (hl_session_undo_name (session), ==, "Add turbine T1");
  end_window (window);
}

static void
test_components_are_named_for_assistive_technology (void)
{
  HlWindow *window = new_window ();
  GtkWidget *canvas = GTK_WIDGET (canvas_of (window)), *item;

  act (window, "add-component-at", "(sii)", "turbine", 0, 0);
  item = gtk_widget_get_first_child (canvas);
  g_assert_nonnull (item);
  gtk_test_accessible_assert_role (canvas, GTK_ACCESSIBLE_ROLE_GROUP);
  gtk_test_accessible_assert_role (item, GTK_ACCESSIBLE_ROLE_IMG);
  gtk_test_accessible_assert_property (item, GTK_ACCESSIBLE_PROPERTY_LABEL, "T1 Turbine section");
  gtk_test_accessible_assert_state (item, GTK_ACCESSIBLE_STATE_SELECTED, TRUE);
  g_assert_true (gtk_widget_get_focusable (item));
  end_window (window);
}

static void
test_unsaved_work_is_asked_about (void)
{
  HlWindow *window = new_window ();
  g_autofree char *folder = g_dir_make_tmp ("heatloom-window-XXXXXX", NULL);
  g_autofree char *path = g_build_filename (folder, "pump.heatloom", NULL);

  act (window, "add-component-at", "(sii)", "pump", 0, 0);
  act (window, "new", NULL);
  g_assert_cmpuint (hl_plant_n_components (plant_of (window)), ==, 1);     /* not before the answer */
  answer (window, "Cancel");
  g_assert_cmpuint (hl_plant_n_components (plant_of (window)), ==, 1);
  act (window, "new", NULL);
  answer (window, "Discard");
  g_assert_cmpuint (hl_plant_n_components (plant_of (window)), ==, 0);

  act (window, "add-component-at", "(sii)", "pump", 0, 0);
  act (window, "save-to", "s", path);
  act (window, "add-component-at", "(sii)", "valve", 9, 9);
  act (window, "new", NULL);
  answer (window, "Save");
  g_assert_cmpuint (hl_plant_n_components (plant_of (window)), ==, 0);
  act (window, "open-path", "s", path);                                     /* nothing unsaved: no question */
  g_assert_cmpuint (hl_plant_n_components (plant_of (window)), ==, 2);

  act (window, "add-component-at", "(sii)", "valve", 18, 9);
  g_object_add_weak_pointer (G_OBJECT (window), (gpointer *) &window);
  gtk_window_close (GTK_WINDOW (window));
  spin (50);
  g_assert_nonnull (window);
  answer (window, "Discard");
  spin (50);
  g_assert_null (window);
  g_remove (path);
  g_rmdir (folder);
}

static void
test_a_bad_file_is_told_and_nothing_lost (void)
{
  HlWindow *window = new_window ();
  act (window, "open-path", "s", "/nowhere/at/all.heatloom");
  answer (window, "Close");
  g_assert_cmpuint (hl_plant_n_components (plant_of (window)), ==, 0);
  g_assert_null (hl_session_path (hl_window_session (window)));
  end_window (window);
}

static void
test_zoom_keeps_what_lies_in_the_middle (void)
{
  HlWindow *window = new_window ();
  HlCanvas *canvas = canvas_of (window);
  int x0, y0, x1, y1;

  draw_loop (window);
  act (window, "zoom-fit", NULL);
  spin (30);
  hl_canvas_middle (canvas, &x0, &y0);
  act (window, "zoom-in", NULL);
  act (window, "zoom-in", NULL);
  hl_canvas_middle (canvas, &x1, &y1);
  g_assert_cmpint (ABS (x1 - x0), <=, 2);
  g_assert_cmpint (ABS (y1 - y0), <=, 2);
  act (window, "zoom-normal", NULL);
  g_assert_cmpfloat_with_epsilon (hl_canvas_get_zoom (canvas), 1.0, 1e-12);
  for (int n = 0; n < 40; n++)
    act (window, "zoom-out", NULL);
  g_assert_cmpfloat (hl_canvas_get_zoom (canvas), >, 0.1);
  act (window, "zoom-fit", NULL);
  spin (30);
  for (guint n = 0; n < hl_plant_n_components (plant_of (window)); n++)
    {
      double x, y;
      locate (canvas, hl_plant_component (plant_of (window), n)->id, NULL, &x, &y);
      g_assert_true (x > 0 && y > 0 && x < gtk_widget_get_width (GTK_WIDGET (canvas)) && y < gtk_widget_get_height (GTK_WIDGET (canvas)));
    }
  end_window (window);
}

static void
test_both_looks_and_both_places_of_the_diagram (void)
{
  HlWindow *window = new_window ();
  draw_loop (window);
  for (int n = 0; n < 2; n++)
    {
      g_action_group_change_action_state (G_ACTION_GROUP (window), "look", g_variant_new_string (n == 0 ? "dark" : "light"));
      act (window, "diagram-beside", NULL);
      gtk_test_widget_wait_for_draw (GTK_WIDGET (window));
      g_assert_cmpint (gtk_widget_get_width (GTK_WIDGET (canvas_of (window))), >, 200);
      g_assert_cmpint (gtk_widget_get_height (GTK_WIDGET (canvas_of (window))), >, 150);
    }
  end_window (window);
}

static void
test_pages_are_built_when_they_are_first_shown (void)
{
  HlWindow *window = new_window ();
  g_assert_null (find_widget (GTK_WIDGET (window), hl_ledger_view_get_type ()));
  g_assert_null (find_widget (GTK_WIDGET (window), hl_findings_get_type ()));
  for (int n = 0; n < 2; n++)     /* the second time nothing is added */
    {
      act (window, "tab", "s", "ledger");
      g_assert_nonnull (find_widget (GTK_WIDGET (window), hl_ledger_view_get_type ()));
      act (window, "tab", "s", "findings");
      g_assert_nonnull (find_widget (GTK_WIDGET (window), hl_findings_get_type ()));
    }
  g_assert_null (gtk_widget_get_next_sibling (find_widget (GTK_WIDGET (window), hl_findings_get_type ())));
  end_window (window);
}

static const HlComponent *
component_of (HlWindow *window, const char *id)
{
  return hl_plant_find_component (plant_of (window), id);
}

static void
test_components_line_up_and_space_evenly (void)
{
  HlWindow *window = new_window ();
  HlSession *session = hl_window_session (window);
  int hw_turbine, hw_valve, h;
  act (window, "add-component-at", "(sii)", "turbine", 0, 0);
  act (window, "add-component-at", "(sii)", "valve", 11, 20);
  g_assert_false (is_enabled (window, "align"));
  act (window, "add-component-at", "(sii)", "valve", 40, 50);
  act (window, "select-all", NULL);
  hl_component_half_size (component_of (window, "T1"), &hw_turbine, &h);
  hl_component_half_size (component_of (window, "V1"), &hw_valve, &h);

  act (window, "align", "s", "left");
  g_assert_cmpstr (hl_session_undo_name (session), ==, "Align 3 items");
  g_assert_cmpint (component_of (window, "T1")->x, ==, 0);
  g_assert_cmpint (component_of (window, "V1")->x, ==, hw_valve - hw_turbine);
  g_assert_cmpint (component_of (window, "V2")->x, ==, hw_valve - hw_turbine);
  g_assert_cmpint (component_of (window, "V1")->y, ==, 20);
  act (window, "align", "s", "left");      /* nothing moves: no step */
  act (window, "undo", NULL);
  g_assert_cmpint (component_of (window, "V1")->x, ==, 11);
  act (window, "align", "s", "right");
  g_assert_cmpint (component_of (window, "T1")->x, ==, 40 + hw_valve - hw_turbine);
  g_assert_cmpint (component_of (window, "V1")->x, ==, 40);
  act (window, "undo", NULL);

  act (window, "distribute", "s", "across");
  g_assert_cmpint (component_of (window, "T1")->x, ==, 0);
  g_assert_cmpint (component_of (window, "V1")->x, ==, 20);
  g_assert_cmpint (component_of (window, "V2")->x, ==, 40);
  act (window, "distribute", "s", "down");
  g_assert_cmpint (component_of (window, "V1")->y, ==, 25);
  act (window, "align", "s", "middle");
  g_assert_cmpint (component_of (window, "T1")->y, ==, component_of (window, "V2")->y);
  hl_session_select (session, "V2", TRUE);
  g_assert_true (is_enabled (window, "align"));
  g_assert_false (is_enabled (window, "distribute"));     /* two have nothing between them */
  end_window (window);
}

int
main (int argc, char **argv)
{
  if (!windows_init (&argc, &argv))
    return 0;
  g_test_add_func ("/app/window/loop-by-actions", test_a_loop_from_nothing_by_actions);
  g_test_add_func ("/app/window/enabled", test_actions_are_enabled_where_they_make_sense);
  g_test_add_func ("/app/window/selection", test_edits_of_the_selection);
  g_test_add_func ("/app/window/clipboard", test_the_clipboard_carries_components_between_windows);
  g_test_add_func ("/app/window/gestures", test_gestures_move_and_connect);
  g_test_add_func ("/app/window/escape", test_escape_in_the_middle_of_a_move_puts_it_back);
  g_test_add_func ("/app/window/accessible", test_components_are_named_for_assistive_technology);
  g_test_add_func ("/app/window/unsaved", test_unsaved_work_is_asked_about);
  g_test_add_func ("/app/window/bad-file", test_a_bad_file_is_told_and_nothing_lost);
  g_test_add_func ("/app/window/zoom", test_zoom_keeps_what_lies_in_the_middle);
  g_test_add_func ("/app/window/looks", test_both_looks_and_both_places_of_the_diagram);
  g_test_add_func ("/app/window/pages", test_pages_are_built_when_they_are_first_shown);
  g_test_add_func ("/app/window/order", test_components_line_up_and_space_evenly);
  return windows_run ();
}
