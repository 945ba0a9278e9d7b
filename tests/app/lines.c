/* Lines by hand: a segment dragged aside, an end moved to another port, what the pointer is told.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "windows.h"
#include "app/hl-edit.h"
#include <string.h>

static const HlStream *
stream_of (HlWindow *window, const char *id)
{
  return hl_plant_find_stream (plant_of (window), id);
}

/* On the line between two ports that face each other, beside its label. */
static void
point_of (HlWindow *window, const char *from, const char *from_port, const char *to, const char *to_port, double *x, double *y)
{
  double x0, y0, x1, y1;
  locate (canvas_of (window), from, from_port, &x0, &y0);
  locate (canvas_of (window), to, to_port, &x1, &y1);
  *x = x0 + 0.2 * (x1 - x0);
  *y = y0 + 0.2 * (y1 - y0);
}

/* Two valves in a row, and a third below. */
static HlWindow *
valves (void)
{
  HlWindow *window = new_window ();
  act (window, "add-component-at", "(sii)", "valve", 0, 0);
  act (window, "add-component-at", "(sii)", "valve", 30, 0);
  act (window, "add-component-at", "(sii)", "valve", 30, 20);
  act (window, "connect", "(ssss)", "V1", "outlet", "V2", "inlet");
  act (window, "zoom-fit", NULL);
  spin (50);
  return window;
}

static void
test_a_segment_is_dragged_aside_and_back (void)
{
  HlWindow *window = valves ();
  HlCanvas *canvas = canvas_of (window);
  double x, y, zoom = hl_canvas_get_zoom (canvas);
  point_of (window, "V1", "outlet", "V2", "inlet", &x, &y);
  drag (canvas, x, y, x, y + 60 * zoom);
  g_assert_cmpstr (hl_session_undo_name (hl_window_session (window)), ==, "Bend stream 1");
  g_assert_cmpuint (stream_of (window, "1")->n_route, ==, 2);
  g_assert_cmpint (stream_of (window, "1")->route[0].y, ==, 6);
  g_assert_cmpint (stream_of (window, "1")->route[1].y, ==, 6);
  spin (30);
  /* The same segment once more, from where it lies now. */
  drag (canvas, x, y + 60 * zoom, x, y + 80 * zoom);
  for (guint n = 0; n < stream_of (window, "1")->n_route; n++)
    g_assert_cmpint (ABS (stream_of (window, "1")->route[n].y - 4), <=, 4);      /* 8 along the segment, the stubs at 0 */
  g_assert_true (is_enabled (window, "straighten"));
  act (window, "straighten", NULL);
  g_assert_cmpuint (stream_of (window, "1")->n_route, ==, 0);
  g_assert_false (is_enabled (window, "straighten"));
  end_window (window);
}

static void
test_escape_lets_a_bend_be (void)
{
  HlWindow *window = valves ();
  HlCanvas *canvas = canvas_of (window);
  GtkEventController *gesture = primary_drag (canvas);
  double x, y;
  point_of (window, "V1", "outlet", "V2", "inlet", &x, &y);
  g_signal_emit_by_name (gesture, "drag-begin", x, y);
  g_signal_emit_by_name (gesture, "drag-update", 0.0, 50.0);
  g_assert_cmpuint (stream_of (window, "1")->n_route, >, 0);
  g_assert_true (hl_canvas_cancel (canvas));
  g_assert_cmpuint (stream_of (window, "1")->n_route, ==, 0);
  g_signal_emit_by_name (gesture, "drag-end", 0.0, 50.0);
  g_assert_cmpuint (stream_of (window, "1")->n_route, ==, 0);
  end_window (window);
}

static void
test_an_end_goes_to_another_port (void)
{
  HlWindow *window = valves ();
  HlCanvas *canvas = canvas_of (window);
  double x, y, to_x, to_y;
  act (window, "set-value", "(ss)", "stream:1.m", "5 kg/s");
  locate (canvas, "V2", "inlet", &x, &y);
  locate (canvas, "V3", "inlet", &to_x, &to_y);
  drag (canvas, x - 9, y, to_x, to_y);
  g_assert_cmpstr (hl_session_undo_name (hl_window_session (window)), ==, "Move the end of stream 1 to V3");
  g_assert_cmpstr (stream_of (window, "1")->to_id, ==, "V3");
  g_assert_cmpstr (stream_of (window, "1")->from_id, ==, "V1");
  g_assert_nonnull (hl_values_find (&stream_of (window, "1")->values, g_intern_static_string ("m")));     /* it keeps what was said of it */
  act (window, "undo", NULL);
  g_assert_cmpstr (stream_of (window, "1")->to_id, ==, "V2");
  spin (30);
  /* The outlet's end, too; and let go over nothing it stays. */
  locate (canvas, "V1", "outlet", &x, &y);
  locate (canvas, "V3", "outlet", &to_x, &to_y);
  drag (canvas, x + 9, y, to_x, to_y);
  g_assert_cmpstr (stream_of (window, "1")->from_id, ==, "V3");
  act (window, "undo", NULL);
  spin (30);
  drag (canvas, x + 9, y, x + 20, y + 150);
  g_assert_cmpstr (stream_of (window, "1")->from_id, ==, "V1");
  g_assert_cmpstr (stream_of (window, "1")->to_id, ==, "V2");
  end_window (window);
}

static void
test_an_end_goes_nowhere_that_it_cannot (void)
{
  HlWindow *window = valves ();
  g_autoptr (GError) error = NULL;
  g_assert_null (hl_edit_replug (plant_of (window), "1", "V3", "no port", &error));
  g_assert_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_ADDRESS);
  g_clear_error (&error);
  act (window, "connect", "(ssss)", "V2", "outlet", "V3", "inlet");
  g_assert_null (hl_edit_replug (plant_of (window), "1", "V3", "inlet", &error));      /* taken */
  g_assert_nonnull (error);
  end_window (window);
}

static void
test_the_pointer_is_told_what_a_line_carries (void)
{
  HlWindow *window = new_window ();
  GtkTooltip *tooltip = g_object_new (GTK_TYPE_TOOLTIP, NULL);
  gboolean is_shown = FALSE;
  double x, y;
  draw_loop (window);
  act (window, "zoom-fit", NULL);
  spin (50);
  locate (canvas_of (window), "T1", "exhaust", &x, &y);
  g_signal_emit_by_name (canvas_of (window), "query-tooltip", (int) x, (int) y + 8, FALSE, tooltip, &is_shown);
  g_assert_true (is_shown);
  g_object_unref (tooltip);
  end_window (window);
}

int
main (int argc, char **argv)
{
  if (!windows_init (&argc, &argv))
    return 0;
  g_test_add_func ("/app/lines/bend", test_a_segment_is_dragged_aside_and_back);
  g_test_add_func ("/app/lines/escape", test_escape_lets_a_bend_be);
  g_test_add_func ("/app/lines/replug", test_an_end_goes_to_another_port);
  g_test_add_func ("/app/lines/refused", test_an_end_goes_nowhere_that_it_cannot);
  g_test_add_func ("/app/lines/tooltip", test_the_pointer_is_told_what_a_line_carries);
  return windows_run ();
}
