/* The diagram view: a click on a state selects its stream, the pointer reads off, failure shows the last good one.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-diagram-view.h"
#include "draw/state-diagram.h"
#include "panes.h"

typedef struct { HlSession *session; GtkWidget *window, *view; } Fixture;

static void
set_up (Fixture *f, gconstpointer data)
{
  f->session = loop_session ();
  f->view = hl_diagram_view_new (f->session);
  f->window = window_with (f->view);
}

static void
tear_down (Fixture *f, gconstpointer data)
{
  close_window (f->window, f->session);
}

static gpointer
controller_of (GtkWidget *widget, GType type)
{
  g_autoptr (GListModel) controllers = gtk_widget_observe_controllers (widget);

  for (guint n = 0; n < g_list_model_get_n_items (controllers); n++)
    {
      g_autoptr (GtkEventController) controller = g_list_model_get_item (controllers, n);
      if (G_TYPE_CHECK_INSTANCE_TYPE (controller, type))
        return controller;              /* the widget keeps it */
    }
  g_assert_not_reached ();
}

/* Where the view shows the state of @stream: the same diagram at the same size says it. */
static void
place_of (Fixture *f, guint stream, double *x, double *y)
{
  HlStreamResult result;
  HlSolution *solution = hl_session_solution (f->session);
  g_autoptr (HlStateDiagram) diagram = hl_state_diagram_new (solution, HL_UNITS_METRIC, gtk_widget_get_width (f->view), gtk_widget_get_height (f->view));

  hl_solution_stream (solution, stream, &result);
  g_assert_true (result.has_state);
  hl_state_diagram_to_pixel (diagram, result.state.s, result.state.T, x, y);
}

/* In the p-h diagram states lie elsewhere, and are found there. */
static void
test_the_chooser_changes_the_axes (Fixture *f, gconstpointer data)
{
  HlSolution *solution = hl_session_solution (f->session);
  HlStreamResult result;
  double x, y;

  hl_diagram_view_set_kind (HL_DIAGRAM_VIEW (f->view), HL_STATE_DIAGRAM_PH);
  gtk_test_widget_wait_for_draw (f->window);
  g_autoptr (HlStateDiagram) diagram = hl_state_diagram_new_of_kind (solution, HL_STATE_DIAGRAM_PH, HL_UNITS_METRIC,
                                                                     gtk_widget_get_width (f->view), gtk_widget_get_height (f->view));
  hl_solution_stream (solution, 1, &result);
  hl_state_diagram_to_pixel (diagram, result.state.h, result.state.p, &x, &y);
  g_signal_emit_by_name (controller_of (f->view, GTK_TYPE_GESTURE_CLICK), "pressed", 1, x, y);
  g_assert_true (hl_session_is_selected (f->session, "2"));
  g_signal_emit_by_name (controller_of (f->view, GTK_TYPE_EVENT_CONTROLLER_MOTION), "motion", x / 2.0, y / 2.0);
  g_assert_true (shows_text (f->view, " bar"));
  g_assert_true (shows_text (f->view, "kJ/kg"));
}

static void
test_click_on_a_state_selects_its_stream (Fixture *f, gconstpointer data)
{
  double x, y;

  place_of (f, 0, &x, &y);
  g_signal_emit_by_name (controller_of (f->view, GTK_TYPE_GESTURE_CLICK), "pressed", 1, x, y);
  g_assert_true (hl_session_is_selected (f->session, "1"));
  place_of (f, 1, &x, &y);
  g_signal_emit_by_name (controller_of (f->view, GTK_TYPE_GESTURE_CLICK), "pressed", 1, x, y);
  g_assert_true (hl_session_is_selected (f->session, "2"));
  g_assert_false (hl_session_is_selected (f->session, "1"));
  g_signal_emit_by_name (controller_of (f->view, GTK_TYPE_GESTURE_CLICK), "pressed", 1, x, y / 3.0);   /* far from any */
  g_assert_false (hl_session_is_selected (f->session, "2"));
}

static void
test_pointer_reads_off (Fixture *f, gconstpointer data)
{
  double x, y;

  place_of (f, 0, &x, &y);
  g_signal_emit_by_name (controller_of (f->view, GTK_TYPE_EVENT_CONTROLLER_MOTION), "motion", x, y);
  g_assert_true (shows_text (f->view, "65.00 bar"));             /* the state itself */
  g_signal_emit_by_name (controller_of (f->view, GTK_TYPE_EVENT_CONTROLLER_MOTION), "motion", x / 2.0, y * 3.0);
  g_assert_false (shows_text (f->view, "bar"));
  g_assert_true (shows_text (f->view, "kJ/(kg K)"));             /* entropy and temperature under the pointer */
  g_signal_emit_by_name (controller_of (f->view, GTK_TYPE_EVENT_CONTROLLER_MOTION), "leave");
  g_assert_false (shows_text (f->view, "kJ/(kg K)"));
}

static void
test_empty_sheet_says_so (Fixture *f, gconstpointer data)
{
  g_assert_false (shows_text (f->view, "States appear here"));
  hl_session_reset (f->session, hl_plant_new (), NULL);
  gtk_test_widget_wait_for_draw (f->window);
  g_assert_true (shows_text (f->view, "States appear here"));
}

/* With a value taken away nothing solves: the last good states can still be read off. */
static void
test_failure_keeps_the_last_good_states (Fixture *f, gconstpointer data)
{
  HlAddress address = hl_address_component ("T1", g_intern_static_string ("isentropic_efficiency"));
  HlPlant *plant = hl_plant_with_value (hl_session_plant (f->session), &address, NULL, NULL);
  double x, y;

  place_of (f, 1, &x, &y);
  hl_session_apply (f->session, "take away", plant, NULL, FALSE);
  g_assert_false (hl_solution_is_solved (hl_session_solution (f->session)));
  gtk_test_widget_wait_for_draw (f->window);
  g_signal_emit_by_name (controller_of (f->view, GTK_TYPE_GESTURE_CLICK), "pressed", 1, x, y);
  g_assert_true (hl_session_is_selected (f->session, "2"));
}

int
main (int argc, char **argv)
{
  if (!test_init (&argc, &argv))
    return 0;
#define ADD(name, func) g_test_add ("/app/diagram-view/" name, Fixture, NULL, set_up, func, tear_down)
  ADD ("click on a state selects its stream", test_click_on_a_state_selects_its_stream);
  ADD ("the chooser changes the axes", test_the_chooser_changes_the_axes);
  ADD ("pointer reads off", test_pointer_reads_off);
  ADD ("empty sheet says so", test_empty_sheet_says_so);
  ADD ("failure keeps the last good states", test_failure_keeps_the_last_good_states);
#undef ADD
  return g_test_run ();
}
