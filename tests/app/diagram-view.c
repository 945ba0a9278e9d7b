/* The diagram view: a click on a state selects its stream, the pointer reads off, failure shows the last good one.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-diagram-view.h"
#include "app/hl-lever.h"
#include "draw/state-diagram.h"
#include "panes.h"
#include <math.h>

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

static const HlValue *
value_of (Fixture *f, const char *text)
{
  HlAddress address;
  g_autoptr (GError) error = NULL;

  hl_address_parse (text, hl_session_plant (f->session), &address, &error);
  g_assert_no_error (error);
  return hl_plant_value (hl_session_plant (f->session), &address);
}

static gpointer
grab (Fixture *f, guint stream, double *x, double *y)
{
  gpointer drag = controller_of (f->view, GTK_TYPE_GESTURE_DRAG);

  gtk_test_widget_wait_for_draw (f->window);
  place_of (f, stream, x, y);
  g_signal_emit_by_name (controller_of (f->view, GTK_TYPE_GESTURE_CLICK), "pressed", 1, *x, *y);
  g_signal_emit_by_name (drag, "drag-begin", *x, *y);
  return drag;
}

/* Live steam: up and down is its temperature, given at the boiler; sideways its pressure, given at the turbine. */
static void
test_pointer_says_what_a_drag_changes (Fixture *f, gconstpointer data)
{
  double x, y;

  gtk_test_widget_wait_for_draw (f->window);
  place_of (f, 0, &x, &y);
  g_signal_emit_by_name (controller_of (f->view, GTK_TYPE_EVENT_CONTROLLER_MOTION), "motion", x, y);
  g_assert_true (shows_text (f->view, "↕ steam temperature of B1 · ↔ inlet pressure of T1"));
}

static void
test_drag_upwards_moves_the_temperature (Fixture *f, gconstpointer data)
{
  double x, y, s, T;
  gpointer drag = grab (f, 0, &x, &y);
  g_autoptr (HlStateDiagram) diagram = hl_state_diagram_new (hl_session_solution (f->session), HL_UNITS_METRIC,
                                                             gtk_widget_get_width (f->view), gtk_widget_get_height (f->view));

  g_signal_emit_by_name (drag, "drag-update", 0.0, 3.0);
  g_assert_true (hl_session_plant (f->session) == hl_session_base (f->session));
  g_signal_emit_by_name (drag, "drag-update", 0.0, 40.0);                    /* down: colder */
  /* The state is where the pointer is, as far as an isobar goes down steeply: within two pixels. */
  double now = value_of (f, "B1.steam.T")->value, place_x, place_y;
  g_assert_true (hl_state_diagram_to_state (diagram, x, y + 40.0, &s, &T));
  g_assert_cmpfloat (now, <, 758.15 - 10.0);
  HlStreamResult result;
  hl_solution_stream (hl_session_solution (f->session), 0, &result);
  hl_state_diagram_to_pixel (diagram, result.state.s, result.state.T, &place_x, &place_y);
  g_assert_cmpfloat_with_epsilon (result.state.T, now, 1e-6);
  g_assert_cmpfloat_with_epsilon (value_of (f, "T1.inlet.p")->value, 65e5, 1e-3);
  /* The nearest point of its path to the pointer: the way to the pointer is square to the path. */
  double ahead_x, ahead_y;
  HlState ahead;
  g_assert_cmpint (hl_fluid_state_pT (result.fluid, 65e5, now + 1.0, &ahead), ==, HL_OK);
  hl_state_diagram_to_pixel (diagram, ahead.s, ahead.T, &ahead_x, &ahead_y);
  double along_x = ahead_x - place_x, along_y = ahead_y - place_y, length = hypot (along_x, along_y);
  g_assert_cmpfloat (fabs (((x - place_x) * along_x + (y + 40.0 - place_y) * along_y) / length), <, 1.0);
  g_assert_true (shows_text (f->view, "steam temperature of B1: 485.0 °C → "));
  g_assert_false (hl_session_can_undo (f->session));
  g_signal_emit_by_name (drag, "drag-end", 0.0, 40.0);
  g_assert_cmpfloat_with_epsilon (value_of (f, "B1.steam.T")->value, now, 1e-9);
  g_assert_true (hl_session_plant (f->session) == hl_session_base (f->session));
  hl_session_undo (f->session);
  g_assert_cmpfloat_with_epsilon (value_of (f, "B1.steam.T")->value, 758.15, 1e-9);
  g_assert_false (hl_session_can_undo (f->session));
}

static void
test_drag_sideways_moves_the_pressure (Fixture *f, gconstpointer data)
{
  double x, y;
  gpointer drag = grab (f, 0, &x, &y);

  g_signal_emit_by_name (drag, "drag-update", 12.0, 0.0);                    /* to more entropy: less pressure */
  g_assert_cmpfloat (value_of (f, "T1.inlet.p")->value, <, 60e5);
  g_assert_cmpfloat_with_epsilon (value_of (f, "B1.steam.T")->value, 758.15, 1e-9);
  g_assert_true (hl_solution_is_solved (hl_session_solution (f->session)));
  g_signal_emit_by_name (drag, "drag-end", 12.0, 0.0);
  g_assert_true (hl_session_can_undo (f->session));
}

static void
test_escape_takes_a_drag_back (Fixture *f, gconstpointer data)
{
  double x, y;
  gboolean handled = FALSE;
  gpointer drag = grab (f, 0, &x, &y);

  g_signal_emit_by_name (drag, "drag-update", 0.0, -30.0);
  g_assert_cmpfloat (value_of (f, "B1.steam.T")->value, >, 758.15);
  g_signal_emit_by_name (controller_of (f->view, GTK_TYPE_EVENT_CONTROLLER_KEY), "key-pressed", GDK_KEY_Escape, 0u, 0, &handled);
  g_assert_true (handled);
  g_assert_cmpfloat_with_epsilon (value_of (f, "B1.steam.T")->value, 758.15, 1e-9);
  g_signal_emit_by_name (drag, "drag-update", 0.0, -50.0);                   /* the button is still down */
  g_signal_emit_by_name (drag, "drag-end", 0.0, -50.0);
  g_assert_cmpfloat_with_epsilon (value_of (f, "B1.steam.T")->value, 758.15, 1e-9);
  g_assert_false (hl_session_can_undo (f->session));
}

/* Far beyond what the plant can do: it stops where it still solves. */
static void
test_drag_stops_where_the_plant_ends (Fixture *f, gconstpointer data)
{
  double x, y;
  gpointer drag = grab (f, 1, &x, &y);

  for (int n = 1; n <= 20; n++)
    g_signal_emit_by_name (drag, "drag-update", 0.0, -100.0 * n);            /* exhaust pressure far above the inlet */
  g_assert_true (hl_solution_is_solved (hl_session_solution (f->session)));
  g_assert_cmpfloat (value_of (f, "T1.exhaust.p")->value, >, 7000.0);
  g_assert_cmpfloat (value_of (f, "T1.exhaust.p")->value, <, 65e5);
  g_signal_emit_by_name (drag, "drag-end", 0.0, -2000.0);
  g_assert_true (hl_solution_is_solved (hl_session_solution (f->session)));
}

/* Pipes in a row; the two in the middle follow the first one. */
static const char pipes_text[] =
  "{\"heatloom\": 1, \"title\": \"Pipes\", \"units\": \"metric\",\n"
  " \"components\": [\n"
  "  {\"id\": \"Y1\", \"kind\": \"boundary\", \"at\": [0, 0], \"direction\": \"source\", \"given\": {\"outlet.T\": 600.0, \"outlet.p\": 2000000.0, \"outlet.m\": 5.0}},\n"
  "  {\"id\": \"L1\", \"kind\": \"pipe\", \"at\": [10, 0], \"given\": {\"pressure_loss\": 0.1, \"heat_loss\": 1000.0}},\n"
  "  {\"id\": \"L2\", \"kind\": \"pipe\", \"at\": [20, 0], \"given\": {\"pressure_loss\": 0.1, \"heat_loss\": 1000.0}},\n"
  "  {\"id\": \"L3\", \"kind\": \"pipe\", \"at\": [30, 0], \"given\": {\"pressure_loss\": 0.1, \"heat_loss\": 1000.0}},\n"
  "  {\"id\": \"L4\", \"kind\": \"pipe\", \"at\": [40, 0], \"given\": {\"pressure_loss\": 0.1, \"heat_loss\": 1000.0}},\n"
  "  {\"id\": \"Y2\", \"kind\": \"boundary\", \"at\": [50, 0], \"direction\": \"sink\"}],\n"
  " \"streams\": [\n"
  "  {\"id\": \"1\", \"from\": \"Y1.outlet\", \"to\": \"L1.inlet\"},\n"
  "  {\"id\": \"2\", \"from\": \"L1.outlet\", \"to\": \"L2.inlet\"},\n"
  "  {\"id\": \"3\", \"from\": \"L2.outlet\", \"to\": \"L3.inlet\"},\n"
  "  {\"id\": \"4\", \"from\": \"L3.outlet\", \"to\": \"L4.inlet\"},\n"
  "  {\"id\": \"5\", \"from\": \"L4.outlet\", \"to\": \"Y2.inlet\"}]}\n";

/* Where no state is given nearby, a loss is what moves; with the losses tied, nothing does. */
static void
test_losses_come_last_and_nothing_is_said (Fixture *f, gconstpointer data)
{
  static const char *const ties[][2] = { { "L2.pressure_loss", "=L1.pressure_loss" }, { "L2.heat_loss", "=L1.heat_loss" },
                                         { "L3.pressure_loss", "=L1.pressure_loss" }, { "L3.heat_loss", "=L1.heat_loss" } };
  g_autoptr (GError) error = NULL;
  HlPlant *plant = hl_plant_from_json (pipes_text, -1, "pipes", &error);

  g_assert_no_error (error);
  hl_session_reset (f->session, plant, NULL);
  g_assert_true (hl_solution_is_solved (hl_session_solution (f->session)));
  g_autoptr (GArray) levers = hl_levers_new (hl_session_solution (f->session), 2);
  g_autoptr (HlStateDiagram) diagram = hl_state_diagram_new_of_kind (hl_session_solution (f->session), HL_STATE_DIAGRAM_PH, HL_UNITS_METRIC, 600, 600);
  const HlLever *lever = hl_levers_along (levers, diagram, HL_STATE_DIAGRAM_PH, 0.0, 1.0);
  g_assert_nonnull (lever);
  g_autofree char *address = hl_address_to_text (&lever->address);
  g_assert_cmpstr (address, ==, "L2.pressure_loss");

  for (guint n = 0; n < G_N_ELEMENTS (ties); n++)
    {
      HlAddress which;
      g_assert_true (hl_address_parse (ties[n][0], hl_session_plant (f->session), &which, NULL));
      g_assert_true (hl_session_set_text (f->session, &which, ties[n][1], &error));
    }
  g_assert_true (hl_solution_is_solved (hl_session_solution (f->session)));
  hl_diagram_view_set_kind (HL_DIAGRAM_VIEW (f->view), HL_STATE_DIAGRAM_PH);
  gtk_test_widget_wait_for_draw (f->window);
  HlStreamResult result;
  double x, y;
  g_autoptr (HlStateDiagram) shown = hl_state_diagram_new_of_kind (hl_session_solution (f->session), HL_STATE_DIAGRAM_PH, HL_UNITS_METRIC,
                                                                   gtk_widget_get_width (f->view), gtk_widget_get_height (f->view));
  hl_solution_stream (hl_session_solution (f->session), 2, &result);
  hl_state_diagram_to_pixel (shown, result.state.h, result.state.p, &x, &y);
  g_signal_emit_by_name (controller_of (f->view, GTK_TYPE_EVENT_CONTROLLER_MOTION), "motion", x, y);
  g_assert_true (shows_text (f->view, "Nothing given nearby moves this state"));
  gpointer drag = controller_of (f->view, GTK_TYPE_GESTURE_DRAG);
  g_signal_emit_by_name (drag, "drag-begin", x, y);
  g_signal_emit_by_name (drag, "drag-update", 0.0, 50.0);
  g_assert_true (hl_session_plant (f->session) == hl_session_base (f->session));
  g_signal_emit_by_name (drag, "drag-end", 0.0, 50.0);
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
  ADD ("pointer says what a drag changes", test_pointer_says_what_a_drag_changes);
  ADD ("drag upwards moves the temperature", test_drag_upwards_moves_the_temperature);
  ADD ("drag sideways moves the pressure", test_drag_sideways_moves_the_pressure);
  ADD ("Escape takes a drag back", test_escape_takes_a_drag_back);
  ADD ("drag stops where the plant ends", test_drag_stops_where_the_plant_ends);
  ADD ("losses come last, and nothing is said", test_losses_come_last_and_nothing_is_said);
#undef ADD
  return g_test_run ();
}
