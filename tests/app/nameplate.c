/* The nameplate: typing, origins, and rows that stay while the plant changes.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-nameplate.h"
#include "app/hl-quantity-row.h"
#include "app/hl-shared-row.h"
#include "app/hl-tie-completion.h"
#include "panes.h"

typedef struct { HlSession *session; GtkWidget *window, *nameplate; } Fixture;

static void
set_up (Fixture *f, gconstpointer id)
{
  f->session = loop_session ();
  g_assert_true (hl_solution_is_solved (hl_session_solution (f->session)));
  f->nameplate = hl_nameplate_new (f->session);
  f->window = window_with (f->nameplate);
  hl_session_select (f->session, id, FALSE);
}

static void
tear_down (Fixture *f, gconstpointer id)
{
  close_window (f->window, f->session);
}

static gboolean
is_row_of (GtkWidget *widget, gconstpointer data)
{
  if (!HL_IS_QUANTITY_ROW (widget))
    return FALSE;
  g_autofree char *text = hl_address_to_text (hl_quantity_row_address (HL_QUANTITY_ROW (widget)));
  return g_str_equal (text, data);
}

static GtkWidget *
find_row (Fixture *f, const char *address)
{
  HlAddress parsed;

  g_assert_true (hl_address_parse (address, NULL, &parsed, NULL));
  g_autofree char *canonical = hl_address_to_text (&parsed);
  return find_widget (f->nameplate, is_row_of, canonical);
}

static GtkWidget *
entry_of (Fixture *f, const char *address)
{
  GtkWidget *row = find_row (f, address);
  g_assert_nonnull (row);
  return find_type (row, GTK_TYPE_ENTRY);
}

static void
type_text (Fixture *f, const char *address, const char *text)
{
  GtkWidget *entry = entry_of (f, address);

  gtk_widget_grab_focus (entry);
  gtk_editable_set_text (GTK_EDITABLE (entry), text);
  g_signal_emit_by_name (entry, "activate");
  settle_down ();
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

static const char *
text_of (Fixture *f, const char *address)
{
  return gtk_editable_get_text (GTK_EDITABLE (entry_of (f, address)));
}

static void
test_text_with_unit_is_given (Fixture *f, gconstpointer data)
{
  type_text (f, "T1.inlet.p", "8 MPa");
  const HlValue *value = value_of (f, "T1.inlet.p");
  g_assert_nonnull (value);
  g_assert_cmpint (value->origin, ==, HL_ORIGIN_GIVEN);
  g_assert_cmpfloat_with_epsilon (value->value, 80e5, 1e-3);
  g_assert_true (hl_solution_is_solved (hl_session_solution (f->session)));
  g_assert_true (g_str_has_prefix (text_of (f, "T1.inlet.p"), "80"));       /* shown in bar, the unit of the sheet */
  g_assert_true (hl_session_can_undo (f->session));
}

static void
test_bad_text_stays_with_its_error (Fixture *f, gconstpointer data)
{
  g_autoptr (GError) error = NULL;
  HlAddress other = hl_address_component ("T1", g_intern_static_string ("exhaust.p"));

  type_text (f, "T1.inlet.p", "80 baar");
  g_assert_cmpfloat_with_epsilon (value_of (f, "T1.inlet.p")->value, 65e5, 1e-3);
  g_assert_cmpstr (text_of (f, "T1.inlet.p"), ==, "80 baar");
  g_assert_true (shows_text (find_row (f, "T1.inlet.p"), "baar"));           /* what is wrong */
  g_assert_true (shows_text (find_row (f, "T1.inlet.p"), "bar"));            /* what would do */

  /* Another edit leaves the text alone. */
  g_assert_true (hl_session_set_text (f->session, &other, "0.1 bar", &error));
  g_assert_cmpstr (text_of (f, "T1.inlet.p"), ==, "80 baar");
  g_assert_true (shows_text (find_row (f, "T1.inlet.p"), "baar"));

  type_text (f, "T1.inlet.p", "80 bar");
  g_assert_false (shows_text (find_row (f, "T1.inlet.p"), "baar"));
  g_assert_cmpfloat_with_epsilon (value_of (f, "T1.inlet.p")->value, 80e5, 1e-3);
}

static void
test_wrong_dimension_and_limit_are_refused (Fixture *f, gconstpointer data)
{
  type_text (f, "T1.isentropic_efficiency", "80 bar");
  g_assert_cmpint (value_of (f, "T1.isentropic_efficiency")->origin, ==, HL_ORIGIN_ASSUMED);
  type_text (f, "T1.isentropic_efficiency", "1.4");
  g_assert_cmpint (value_of (f, "T1.isentropic_efficiency")->origin, ==, HL_ORIGIN_ASSUMED);
  g_assert_cmpstr (text_of (f, "T1.isentropic_efficiency"), ==, "1.4");
  g_assert_true (shows_text (find_row (f, "T1.isentropic_efficiency"), "1.4"));
}

static void
test_tie_and_text_of_a_tie (Fixture *f, gconstpointer data)
{
  type_text (f, "T1.exhaust.p", "=0.001*T1.inlet.p");
  const HlValue *value = value_of (f, "T1.exhaust.p");
  g_assert_nonnull (value);
  g_assert_cmpint (value->origin, ==, HL_ORIGIN_TIED);
  double factor, one = 1.0;
  g_assert_true (hl_tie_evaluate (value->tie, &one, &factor, NULL));
  g_assert_cmpfloat_with_epsilon (factor, 0.001, 1e-12);
  g_assert_true (hl_solution_is_solved (hl_session_solution (f->session)));
  /* With the focus the expression can be edited; without it the number is shown. */
  g_assert_true (g_str_has_prefix (text_of (f, "T1.exhaust.p"), "="));
  gtk_widget_grab_focus (entry_of (f, "T1.inlet.p"));
  settle_down ();
  g_assert_true (g_str_has_prefix (text_of (f, "T1.exhaust.p"), "0.065"));   /* 0.001 of 65 bar */
}

static void
test_bad_tie_is_refused (Fixture *f, gconstpointer data)
{
  type_text (f, "T1.exhaust.p", "=0.1*X9.inlet.p");
  g_assert_cmpint (value_of (f, "T1.exhaust.p")->origin, ==, HL_ORIGIN_GIVEN);
  g_assert_cmpstr (text_of (f, "T1.exhaust.p"), ==, "=0.1*X9.inlet.p");
  g_assert_true (shows_text (find_row (f, "T1.exhaust.p"), "X9"));
}

static void
test_emptied_entry_is_no_longer_given (Fixture *f, gconstpointer data)
{
  type_text (f, "T1.isentropic_efficiency", "0.8");
  g_assert_cmpint (value_of (f, "T1.isentropic_efficiency")->origin, ==, HL_ORIGIN_GIVEN);
  type_text (f, "T1.isentropic_efficiency", "");
  const HlValue *value = value_of (f, "T1.isentropic_efficiency");
  g_assert_true (value == NULL || value->origin == HL_ORIGIN_ASSUMED);
}

static void
choose_origin (Fixture *f, const char *address, const char *origin)
{
  GtkWidget *row = find_row (f, address);
  g_assert_true (gtk_widget_activate_action (row, "row.origin", "s", origin));
  settle_down ();
}

static void
test_origin_menu_changes_the_origin (Fixture *f, gconstpointer data)
{
  choose_origin (f, "T1.isentropic_efficiency", "given");
  g_assert_cmpint (value_of (f, "T1.isentropic_efficiency")->origin, ==, HL_ORIGIN_GIVEN);
  g_assert_cmpfloat_with_epsilon (value_of (f, "T1.isentropic_efficiency")->value, 0.83, 1e-12);
  g_assert_true (shows_text (find_row (f, "T1.isentropic_efficiency"), hl_origin_name (HL_ORIGIN_GIVEN)));
  choose_origin (f, "T1.isentropic_efficiency", "assumed");
  g_assert_cmpint (value_of (f, "T1.isentropic_efficiency")->origin, ==, HL_ORIGIN_ASSUMED);
  g_assert_true (shows_text (find_row (f, "T1.isentropic_efficiency"), hl_origin_name (HL_ORIGIN_ASSUMED)));
}

/* "Tied" asks for the expression: nothing changes until one has been typed. */
static void
test_origin_tied_starts_an_expression (Fixture *f, gconstpointer data)
{
  choose_origin (f, "T1.exhaust.p", "tied");
  g_assert_cmpstr (text_of (f, "T1.exhaust.p"), ==, "=");
  g_assert_cmpint (value_of (f, "T1.exhaust.p")->origin, ==, HL_ORIGIN_GIVEN);
}

static void
test_found_value_shows_and_typing_gives_it (Fixture *f, gconstpointer data)
{
  HlAddress power = hl_address_component ("T1", g_intern_static_string ("power"));
  double before;

  g_assert_null (value_of (f, "T1.power"));
  g_assert_true (hl_solution_value (hl_session_solution (f->session), &power, &before));
  g_assert_cmpfloat (before, >, 12e6);                                       /* net power and losses */
  g_assert_cmpfloat_with_epsilon (g_ascii_strtod (text_of (f, "T1.power"), NULL), before / 1e6, 0.01);
  /* An untouched found value stays found when Return is pressed. */
  g_signal_emit_by_name (entry_of (f, "T1.power"), "activate");
  g_assert_null (value_of (f, "T1.power"));
}

static void
test_return_confirms_an_assumed_value (Fixture *f, gconstpointer data)
{
  gtk_widget_grab_focus (entry_of (f, "T1.mechanical_efficiency"));
  g_signal_emit_by_name (entry_of (f, "T1.mechanical_efficiency"), "activate");
  g_assert_cmpint (value_of (f, "T1.mechanical_efficiency")->origin, ==, HL_ORIGIN_GIVEN);
  g_assert_cmpfloat_with_epsilon (value_of (f, "T1.mechanical_efficiency")->value, 0.985, 1e-12);
}

static void
test_rows_keep_widget_and_typing_through_changes (Fixture *f, gconstpointer data)
{
  GtkWidget *row = find_row (f, "T1.inlet.p"), *entry = entry_of (f, "T1.inlet.p");
  HlAddress other = hl_address_component ("T1", g_intern_static_string ("exhaust.p"));
  g_autoptr (GError) error = NULL;

  gtk_widget_grab_focus (entry);
  gtk_editable_set_text (GTK_EDITABLE (entry), "7");                         /* half of "70 bar" */
  g_assert_true (hl_session_set_text (f->session, &other, "0.2 bar", &error));
  hl_session_undo (f->session);
  settle_down ();
  g_assert_true (find_row (f, "T1.inlet.p") == row);
  g_assert_cmpstr (text_of (f, "T1.inlet.p"), ==, "7");
  g_assert_nonnull (gtk_widget_get_focus_child (row));
}

static void
test_option_adds_rows_and_keeps_the_others (Fixture *f, gconstpointer data)
{
  GtkWidget *row = find_row (f, "T1.inlet.p"), *spin = find_type (f->nameplate, GTK_TYPE_SPIN_BUTTON);

  g_assert_null (find_row (f, "T1.extraction1.p"));
  gtk_spin_button_set_value (GTK_SPIN_BUTTON (spin), 1);
  settle_down ();
  g_assert_cmpint (hl_component_option (hl_plant_find_component (hl_session_plant (f->session), "T1"), "extractions"), ==, 1);
  g_assert_nonnull (find_row (f, "T1.extraction1.p"));
  g_assert_true (find_row (f, "T1.inlet.p") == row);
  hl_session_undo (f->session);
  settle_down ();
  g_assert_null (find_row (f, "T1.extraction1.p"));
  g_assert_cmpint (gtk_spin_button_get_value_as_int (GTK_SPIN_BUTTON (spin)), ==, 0);
}

static void
test_draft_survives_another_selection (Fixture *f, gconstpointer data)
{
  type_text (f, "T1.inlet.p", "eighty");
  hl_session_select (f->session, "P1", FALSE);
  settle_down ();
  g_assert_null (find_row (f, "T1.inlet.p"));
  hl_session_select (f->session, "T1", FALSE);
  settle_down ();
  g_assert_cmpstr (text_of (f, "T1.inlet.p"), ==, "eighty");
  g_assert_true (shows_text (find_row (f, "T1.inlet.p"), "eighty"));         /* with its error */
  g_assert_cmpfloat_with_epsilon (value_of (f, "T1.inlet.p")->value, 65e5, 1e-3);
}

/* The pressure of stream 1 is the one given at the turbine: there it is changed, not given twice. */
static void
test_stream_edits_the_value_where_it_lives (Fixture *f, gconstpointer data)
{
  type_text (f, "stream:1.p", "70 bar");
  g_assert_cmpfloat_with_epsilon (value_of (f, "T1.inlet.p")->value, 70e5, 1e-3);
  g_assert_null (value_of (f, "stream:1.p"));
}

static void
test_going_to_a_quantity_focuses_its_row (Fixture *f, gconstpointer data)
{
  HlAddress address = hl_address_component ("T1", g_intern_static_string ("exhaust.p"));
  HlAddress state = hl_address_component ("P1", g_intern_static_string ("inlet.T"));

  hl_session_go_to (f->session, &address);
  settle_down ();
  g_assert_true (hl_session_is_selected (f->session, "T1"));
  g_assert_nonnull (gtk_widget_get_focus_child (find_row (f, "T1.exhaust.p")));
  /* The nameplate of a pump has no inlet temperature: that of its stream has. */
  hl_session_go_to (f->session, &state);
  settle_down ();
  g_assert_true (hl_session_is_selected (f->session, "3"));
}

static void
test_nothing_selected_shows_the_plant (Fixture *f, gconstpointer data)
{
  g_assert_nonnull (find_row (f, "plant.net_power"));
  type_text (f, "plant.net_power", "9 MW");
  g_assert_cmpfloat_with_epsilon (value_of (f, "plant.net_power")->value, 9e6, 1e-3);
}

static void
test_several_selected_are_listed (Fixture *f, gconstpointer data)
{
  const char *ids[] = { g_intern_static_string ("T1"), g_intern_static_string ("P1"), g_intern_static_string ("2") };

  hl_session_select_many (f->session, ids, G_N_ELEMENTS (ids));
  settle_down ();
  g_assert_true (shows_text (f->nameplate, "T1"));
  g_assert_true (shows_text (f->nameplate, "P1"));
  g_signal_emit_by_name (find_button (f->nameplate, "P1"), "clicked");
  g_assert_true (hl_session_is_selected (f->session, "P1"));
  g_assert_false (hl_session_is_selected (f->session, "T1"));
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

static void
press (Fixture *f, const char *address, guint key, GdkModifierType state)
{
  gboolean handled = FALSE;

  g_signal_emit_by_name (controller_of (find_row (f, address), GTK_TYPE_EVENT_CONTROLLER_KEY), "key-pressed", key, 0u, state, &handled);
  settle_down ();
  g_assert_true (handled);
}

static void
test_ctrl_arrows_step_the_value (Fixture *f, gconstpointer data)
{
  gtk_widget_grab_focus (entry_of (f, "T1.inlet.p"));
  press (f, "T1.inlet.p", GDK_KEY_Up, GDK_CONTROL_MASK);
  g_assert_cmpfloat_with_epsilon (value_of (f, "T1.inlet.p")->value, 65.5e5, 1e-3);     /* 1 % of 65 bar, rounded */
  press (f, "T1.inlet.p", GDK_KEY_Up, GDK_CONTROL_MASK);
  press (f, "T1.inlet.p", GDK_KEY_Down, GDK_CONTROL_MASK | GDK_SHIFT_MASK);
  g_assert_cmpfloat_with_epsilon (value_of (f, "T1.inlet.p")->value, 65.95e5, 1e-3);
  g_assert_cmpstr (text_of (f, "T1.inlet.p"), ==, "65.95");
  g_assert_true (hl_solution_is_solved (hl_session_solution (f->session)));
  /* Presses close to each other are one step. */
  hl_session_undo (f->session);
  g_assert_cmpfloat_with_epsilon (value_of (f, "T1.inlet.p")->value, 65e5, 1e-3);
  g_assert_false (hl_session_can_undo (f->session));
}

/* An efficiency steps by a hundredth, and is given from then on; its limit holds. */
static void
test_ctrl_arrows_keep_the_limits (Fixture *f, gconstpointer data)
{
  press (f, "T1.mechanical_efficiency", GDK_KEY_Up, GDK_CONTROL_MASK);
  g_assert_cmpfloat_with_epsilon (value_of (f, "T1.mechanical_efficiency")->value, 1.0, 1e-9);
  g_assert_cmpint (value_of (f, "T1.mechanical_efficiency")->origin, ==, HL_ORIGIN_GIVEN);
  press (f, "T1.mechanical_efficiency", GDK_KEY_Up, GDK_CONTROL_MASK);
  g_assert_cmpfloat_with_epsilon (value_of (f, "T1.mechanical_efficiency")->value, 1.0, 1e-9);
  g_assert_true (shows_text (find_row (f, "T1.mechanical_efficiency"), "1.01"));
}

static void
test_found_and_unread_values_do_not_step (Fixture *f, gconstpointer data)
{
  press (f, "T1.power", GDK_KEY_Up, GDK_CONTROL_MASK);
  g_assert_null (value_of (f, "T1.power"));
  g_assert_true (shows_text (find_row (f, "T1.power"), "given or assumed"));
  gtk_widget_grab_focus (entry_of (f, "T1.inlet.p"));
  gtk_editable_set_text (GTK_EDITABLE (entry_of (f, "T1.inlet.p")), "eighty");
  press (f, "T1.inlet.p", GDK_KEY_Up, GDK_CONTROL_MASK);
  g_assert_cmpstr (text_of (f, "T1.inlet.p"), ==, "eighty");
  g_assert_cmpfloat_with_epsilon (value_of (f, "T1.inlet.p")->value, 65e5, 1e-3);
  g_assert_false (hl_session_can_undo (f->session));
}

static gboolean
has_drag (GtkWidget *widget, gconstpointer data)
{
  return gtk_widget_has_css_class (widget, "line");
}

static gboolean
is_name (GtkWidget *widget, gconstpointer data)
{
  return gtk_widget_has_css_class (widget, "name");
}

/* The gesture on a row's line, begun on the name of the quantity. */
static gpointer
begin_drag (Fixture *f, const char *address)
{
  GtkWidget *row = find_row (f, address), *line = find_widget (row, has_drag, NULL), *name = find_widget (row, is_name, NULL);
  gpointer drag = controller_of (line, GTK_TYPE_GESTURE_DRAG);
  graphene_rect_t bounds;

  gtk_test_widget_wait_for_draw (f->window);
  g_assert_true (gtk_widget_compute_bounds (name, line, &bounds));
  g_signal_emit_by_name (drag, "drag-begin", bounds.origin.x + 12.0, bounds.origin.y + bounds.size.height / 2.0);
  return drag;
}

static void
test_drag_on_the_name_moves_the_value (Fixture *f, gconstpointer data)
{
  gpointer drag = begin_drag (f, "T1.inlet.p");

  g_signal_emit_by_name (drag, "drag-update", 3.0, 0.0);
  g_assert_true (hl_session_plant (f->session) == hl_session_base (f->session));
  g_signal_emit_by_name (drag, "drag-update", 6.0 + 60.0, 0.0);              /* ten steps of 0.5 bar */
  g_assert_cmpfloat_with_epsilon (value_of (f, "T1.inlet.p")->value, 70e5, 1e-3);
  g_assert_true (hl_solution_plant (hl_session_solution (f->session)) == hl_session_plant (f->session));   /* solved live */
  g_assert_true (g_str_has_prefix (text_of (f, "T1.inlet.p"), "70"));
  g_assert_false (hl_session_can_undo (f->session));
  g_signal_emit_by_name (drag, "drag-update", 6.0 - 60.0, 0.0);
  g_assert_cmpfloat_with_epsilon (value_of (f, "T1.inlet.p")->value, 60e5, 1e-3);
  g_signal_emit_by_name (drag, "drag-end", 6.0 - 60.0, 0.0);
  g_assert_cmpfloat_with_epsilon (value_of (f, "T1.inlet.p")->value, 60e5, 1e-3);
  g_assert_true (hl_session_plant (f->session) == hl_session_base (f->session));
  hl_session_undo (f->session);
  g_assert_cmpfloat_with_epsilon (value_of (f, "T1.inlet.p")->value, 65e5, 1e-3);
  g_assert_false (hl_session_can_undo (f->session));
}

static void
test_escape_and_undo_end_a_drag (Fixture *f, gconstpointer data)
{
  gpointer drag = begin_drag (f, "T1.inlet.p");

  g_signal_emit_by_name (drag, "drag-update", 66.0, 0.0);
  press (f, "T1.inlet.p", GDK_KEY_Escape, 0);
  g_assert_cmpfloat_with_epsilon (value_of (f, "T1.inlet.p")->value, 65e5, 1e-3);
  g_signal_emit_by_name (drag, "drag-update", 90.0, 0.0);                    /* over, though the button is still down */
  g_assert_cmpfloat_with_epsilon (value_of (f, "T1.inlet.p")->value, 65e5, 1e-3);
  g_signal_emit_by_name (drag, "drag-end", 90.0, 0.0);
  g_assert_false (hl_session_can_undo (f->session));
  /* The row goes while its value is dragged: nothing stays of it. */
  drag = begin_drag (f, "T1.inlet.p");
  g_signal_emit_by_name (drag, "drag-update", 66.0, 0.0);
  hl_session_select (f->session, "P1", FALSE);
  settle_down ();
  g_assert_cmpfloat_with_epsilon (value_of (f, "T1.inlet.p")->value, 65e5, 1e-3);
  g_assert_true (hl_session_plant (f->session) == hl_session_base (f->session));
}

/* --- several at once --- */

static gboolean
is_shared_named (GtkWidget *widget, gconstpointer data)
{
  return HL_IS_SHARED_ROW (widget) && find_widget (widget, is_label_with, data) != NULL;
}

static GtkWidget *
shared_entry (Fixture *f, const char *name)
{
  GtkWidget *row = find_widget (f->nameplate, is_shared_named, name);

  g_assert_nonnull (row);
  return find_type (row, GTK_TYPE_ENTRY);
}

static void
select_turbine_and_pump (Fixture *f)
{
  const char *ids[] = { g_intern_static_string ("T1"), g_intern_static_string ("P1"), g_intern_static_string ("2") };

  hl_session_select_many (f->session, ids, G_N_ELEMENTS (ids));
  gtk_test_widget_wait_for_draw (f->window);
  settle_down ();
}

static void
test_common_quantities_edit_together (Fixture *f, gconstpointer data)
{
  select_turbine_and_pump (f);
  GtkWidget *entry = shared_entry (f, "Isentropic efficiency");
  g_assert_cmpstr (gtk_editable_get_text (GTK_EDITABLE (entry)), ==, "");             /* 0.83 and 0.75 */
  g_assert_cmpstr (gtk_entry_get_placeholder_text (GTK_ENTRY (entry)), ==, "various");
  g_assert_false (shows_text (f->nameplate, "Exhaust pressure"));                     /* a pump has none */
  gtk_editable_set_text (GTK_EDITABLE (entry), "80 %");
  g_signal_emit_by_name (entry, "activate");
  settle_down ();
  g_assert_cmpfloat_with_epsilon (value_of (f, "T1.isentropic_efficiency")->value, 0.8, 1e-12);
  g_assert_cmpfloat_with_epsilon (value_of (f, "P1.isentropic_efficiency")->value, 0.8, 1e-12);
  g_assert_cmpint (value_of (f, "P1.isentropic_efficiency")->origin, ==, HL_ORIGIN_GIVEN);
  g_assert_cmpstr (gtk_editable_get_text (GTK_EDITABLE (entry)), ==, "0.800");
  hl_session_undo (f->session);
  settle_down ();
  g_assert_cmpfloat_with_epsilon (value_of (f, "T1.isentropic_efficiency")->value, 0.83, 1e-12);
  g_assert_cmpfloat_with_epsilon (value_of (f, "P1.isentropic_efficiency")->value, 0.75, 1e-12);
  g_assert_false (hl_session_can_undo (f->session));
}

static void
test_bad_common_text_changes_none (Fixture *f, gconstpointer data)
{
  select_turbine_and_pump (f);
  GtkWidget *entry = shared_entry (f, "Isentropic efficiency");
  gtk_editable_set_text (GTK_EDITABLE (entry), "1.7");
  g_signal_emit_by_name (entry, "activate");
  g_assert_true (shows_text (f->nameplate, "1.7"));                                   /* with what is wrong */
  g_assert_cmpfloat_with_epsilon (value_of (f, "T1.isentropic_efficiency")->value, 0.83, 1e-12);
  g_assert_false (hl_session_can_undo (f->session));
  /* Another selection drops it. */
  hl_session_select (f->session, "P1", FALSE);
  settle_down ();
  g_assert_false (hl_session_can_undo (f->session));
}

/* --- completion of ties --- */

static void
test_word_of_a_tie (void)
{
  static const struct { const char *text; int cursor; gboolean is_word; int start, end; } rows[] = {
    { "=", 1, TRUE, 1, 1 }, { "=B1", 3, TRUE, 1, 3 }, { "=0.23*B1.st", 11, TRUE, 6, 11 }, { "=0.23*", 6, TRUE, 6, 6 },
    { "=0.23", 5, FALSE, 0, 0 }, { "=T1.inlet.p - ", 14, FALSE, 0, 0 }, { "80 bar", 6, FALSE, 0, 0 }, { "=B1.steam.p", 3, TRUE, 1, 11 },
    { "", 0, FALSE, 0, 0 }, { "=B1", 0, FALSE, 0, 0 },
    { "=B1.steam.p + T1", 16, TRUE, 14, 16 }, { "=max(", 5, TRUE, 5, 5 }, { "=max(T1.p; C", 12, TRUE, 11, 12 }, { "=(B1.heat-C1.h)/2", 14, TRUE, 10, 14 },
    { "=1/", 3, TRUE, 3, 3 }, { "=(B1.heat + 2", 13, FALSE, 0, 0 },
  };
  for (guint n = 0; n < G_N_ELEMENTS (rows); n++)
    {
      int start = 0, end = 0;
      g_test_message ("%s at %d", rows[n].text, rows[n].cursor);
      g_assert_cmpint (hl_tie_word (rows[n].text, rows[n].cursor, &start, &end), ==, rows[n].is_word);
      if (!rows[n].is_word)
        continue;
      g_assert_cmpint (start, ==, rows[n].start);
      g_assert_cmpint (end, ==, rows[n].end);
    }
}

static void
press_in_entry (Fixture *f, const char *address, guint key)
{
  gboolean handled = FALSE;

  g_signal_emit_by_name (controller_of (entry_of (f, address), GTK_TYPE_EVENT_CONTROLLER_KEY), "key-pressed", key, 0u, 0, &handled);
  g_assert_true (handled);
}

static void
type_draft (Fixture *f, const char *address, const char *text)
{
  gtk_widget_grab_focus (entry_of (f, address));
  settle_down ();
  gtk_editable_set_text (GTK_EDITABLE (entry_of (f, address)), text);
  gtk_editable_set_position (GTK_EDITABLE (entry_of (f, address)), -1);
  settle_down ();
}

static GtkWidget *
offer_of (Fixture *f, const char *address)
{
  GtkWidget *list = find_type (find_row (f, address), GTK_TYPE_LIST_BOX);
  return gtk_widget_get_ancestor (list, GTK_TYPE_POPOVER);
}

static void
test_matches_have_the_dimension_and_their_value (Fixture *f, gconstpointer data)
{
  HlAddress own = hl_address_component ("T1", g_intern_static_string ("exhaust.p"));
  g_autoptr (GPtrArray) all = hl_tie_matches (hl_session_solution (f->session), &own, "");
  g_autoptr (GPtrArray) boiler = hl_tie_matches (hl_session_solution (f->session), &own, "b1.st");
  gboolean has_inlet = FALSE;

  for (guint n = 0; n < all->len; n++)
    {
      const HlTieMatch *match = g_ptr_array_index (all, n);
      g_assert_cmpint (hl_plant_quantity_kind (hl_session_plant (f->session), &match->address)->dimension, ==, HL_DIMENSION_PRESSURE);
      g_assert_false (hl_address_equal (&match->address, &own));
      g_assert_cmpstr (match->text, !=, "C1.steam.p");                       /* the same state by another name */
      has_inlet |= g_str_equal (match->text, "T1.inlet.p") && g_str_has_prefix (match->value, "65");
    }
  g_assert_true (has_inlet);
  g_assert_cmpuint (boiler->len, >, 0);
  g_assert_cmpstr (((HlTieMatch *) g_ptr_array_index (boiler, 0))->text, ==, "B1.steam.p");
  g_assert_cmpuint (boiler->len, <, all->len);
  /* A tie may multiply what is of another kind: that comes last. */
  g_autoptr (GPtrArray) flow = hl_tie_matches (hl_session_solution (f->session), &own, "t1.inlet.");
  g_assert_cmpuint (flow->len, >, 2);
  g_assert_cmpstr (((HlTieMatch *) g_ptr_array_index (flow, 0))->text, ==, "T1.inlet.p");
  gboolean has_flow = FALSE;
  for (guint n = 1; n < flow->len; n++)
    has_flow |= g_str_equal (((HlTieMatch *) g_ptr_array_index (flow, n))->text, "T1.inlet.m");
  g_assert_true (has_flow);
}

static void
test_completion_by_keys (Fixture *f, gconstpointer data)
{
  type_draft (f, "T1.exhaust.p", "=0.001*B1.st");
  g_assert_true (gtk_widget_get_visible (offer_of (f, "T1.exhaust.p")));
  press_in_entry (f, "T1.exhaust.p", GDK_KEY_Down);
  press_in_entry (f, "T1.exhaust.p", GDK_KEY_Return);
  g_assert_cmpstr (text_of (f, "T1.exhaust.p"), ==, "=0.001*B1.steam.p");
  settle_down ();
  g_assert_false (gtk_widget_get_visible (offer_of (f, "T1.exhaust.p")));
  g_assert_cmpint (value_of (f, "T1.exhaust.p")->origin, ==, HL_ORIGIN_GIVEN);                /* only completed yet */
  g_signal_emit_by_name (entry_of (f, "T1.exhaust.p"), "activate");
  settle_down ();
  g_assert_cmpint (value_of (f, "T1.exhaust.p")->origin, ==, HL_ORIGIN_TIED);

  /* Tab takes the first; Escape leaves the text and closes, a second one restores it. */
  type_draft (f, "T1.exhaust.p", "=0.002*B1.st");
  press_in_entry (f, "T1.exhaust.p", GDK_KEY_Tab);
  g_assert_cmpstr (text_of (f, "T1.exhaust.p"), ==, "=0.002*B1.steam.p");
  type_draft (f, "T1.exhaust.p", "=T1");
  press_in_entry (f, "T1.exhaust.p", GDK_KEY_Escape);
  g_assert_cmpstr (text_of (f, "T1.exhaust.p"), ==, "=T1");
  press_in_entry (f, "T1.exhaust.p", GDK_KEY_Escape);
  g_assert_true (g_str_has_prefix (text_of (f, "T1.exhaust.p"), "=0.001"));
}

int
main (int argc, char **argv)
{
  if (!test_init (&argc, &argv))
    return 0;
#define ADD(name, id, func) g_test_add ("/app/nameplate/" name, Fixture, id, set_up, func, tear_down)
  ADD ("text with a unit is given", "T1", test_text_with_unit_is_given);
  ADD ("bad text stays with its error", "T1", test_bad_text_stays_with_its_error);
  ADD ("wrong dimension and limit are refused", "T1", test_wrong_dimension_and_limit_are_refused);
  ADD ("tie and text of a tie", "T1", test_tie_and_text_of_a_tie);
  ADD ("bad tie is refused", "T1", test_bad_tie_is_refused);
  ADD ("emptied entry is no longer given", "T1", test_emptied_entry_is_no_longer_given);
  ADD ("origin menu changes the origin", "T1", test_origin_menu_changes_the_origin);
  ADD ("origin tied starts an expression", "T1", test_origin_tied_starts_an_expression);
  ADD ("found value shows", "T1", test_found_value_shows_and_typing_gives_it);
  ADD ("return confirms an assumed value", "T1", test_return_confirms_an_assumed_value);
  ADD ("rows keep widget and typing through changes", "T1", test_rows_keep_widget_and_typing_through_changes);
  ADD ("option adds rows and keeps the others", "T1", test_option_adds_rows_and_keeps_the_others);
  ADD ("draft survives another selection", "T1", test_draft_survives_another_selection);
  ADD ("stream edits the value where it lives", "1", test_stream_edits_the_value_where_it_lives);
  ADD ("going to a quantity focuses its row", "P1", test_going_to_a_quantity_focuses_its_row);
  ADD ("nothing selected shows the plant", NULL, test_nothing_selected_shows_the_plant);
  ADD ("several selected are listed", NULL, test_several_selected_are_listed);
  ADD ("Ctrl and arrows step the value", "T1", test_ctrl_arrows_step_the_value);
  ADD ("Ctrl and arrows keep the limits", "T1", test_ctrl_arrows_keep_the_limits);
  ADD ("found and unread values do not step", "T1", test_found_and_unread_values_do_not_step);
  ADD ("drag on the name moves the value", "T1", test_drag_on_the_name_moves_the_value);
  ADD ("Escape and undo end a drag", "T1", test_escape_and_undo_end_a_drag);
  ADD ("common quantities edit together", "T1", test_common_quantities_edit_together);
  ADD ("bad common text changes none", "T1", test_bad_common_text_changes_none);
  ADD ("matches have the dimension and their value", "T1", test_matches_have_the_dimension_and_their_value);
  ADD ("completion by keys", "T1", test_completion_by_keys);
#undef ADD
  g_test_add_func ("/app/nameplate/word of a tie", test_word_of_a_tie);
  return g_test_run ();
}
