/* Findings: mends as buttons, and the strip and list that show them.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-assumed.h"
#include "app/hl-findings.h"
#include "app/hl-glance.h"
#include "app/hl-nameplate.h"
#include "app/hl-status-strip.h"
#include "panes.h"

typedef struct { HlSession *session; GtkWidget *window, *findings, *strip, *glance, *nameplate; } Fixture;

static void
set_up (Fixture *f, gconstpointer data)
{
  GtkWidget *box = gtk_box_new (GTK_ORIENTATION_VERTICAL, 0);

  f->session = loop_session ();
  f->findings = hl_findings_new (f->session);
  f->strip = hl_status_strip_new (f->session);
  f->glance = hl_glance_new (f->session);
  f->nameplate = hl_nameplate_new (f->session);
  gtk_box_append (GTK_BOX (box), f->findings);
  gtk_box_append (GTK_BOX (box), f->strip);
  gtk_box_append (GTK_BOX (box), f->glance);
  gtk_box_append (GTK_BOX (box), f->nameplate);
  f->window = window_with (box);
}

static void
tear_down (Fixture *f, gconstpointer data)
{
  close_window (f->window, f->session);
}

/* Takes a value away without settling, so that one is missing. */
static void
take_away (Fixture *f, const char *id, const char *key)
{
  g_autoptr (GError) error = NULL;
  HlAddress address = hl_address_component (id, g_intern_string (key));
  HlPlant *plant = hl_plant_with_value (hl_session_plant (f->session), &address, NULL, &error);

  g_assert_no_error (error);
  hl_session_apply (f->session, "take away", plant, NULL, FALSE);
  settle_down ();
}

static const HlMend *
find_mend (Fixture *f, HlMendKind kind)
{
  const HlSolution *solution = hl_session_solution (f->session);

  for (guint n = 0; n < hl_solution_n_findings (solution); n++)
    for (guint m = 0; m < hl_solution_finding (solution, n)->n_mends; m++)
      if (hl_solution_finding (solution, n)->mends[m].kind == kind)
        return &hl_solution_finding (solution, n)->mends[m];
  return NULL;
}

static void
test_missing_value_is_said_and_mended (Fixture *f, gconstpointer data)
{
  take_away (f, "T1", "isentropic_efficiency");
  g_assert_false (hl_solution_is_solved (hl_session_solution (f->session)));
  const HlFinding *finding = hl_solution_finding (hl_session_solution (f->session), 0);
  g_assert_true (shows_text (f->findings, finding->text));
  g_assert_true (shows_text (f->findings, hl_grade_name (finding->grade)));   /* the word beside the mark */

  const HlMend *mend = find_mend (f, HL_MEND_GIVE);
  g_assert_nonnull (mend);
  GtkWidget *button = find_button (f->findings, mend->text);
  g_assert_nonnull (button);
  g_signal_emit_by_name (button, "clicked");
  settle_down ();
  g_assert_true (hl_solution_is_solved (hl_session_solution (f->session)));
  g_assert_true (hl_session_can_undo (f->session));
}

/* The loop's exhaust is moist: the caution is put aside, shown again, and taken back; each is one step. */
static void
test_a_finding_is_dismissed_and_restored (Fixture *f, gconstpointer data)
{
  const HlSolution *solution = hl_session_solution (f->session);
  guint n = hl_solution_n_findings (solution), wet = 0;
  while (wet < n && !g_str_equal (hl_solution_finding (solution, wet)->code, "exhaust-moisture"))
    wet++;
  g_assert_cmpuint (wet, <, n);
  g_autofree char *text = g_strdup (hl_solution_finding (solution, wet)->text);
  GtkWidget *row = gtk_widget_get_ancestor (find_widget (f->findings, is_label_with, text), GTK_TYPE_LIST_BOX_ROW);
  g_assert_null (find_button (f->findings, "Restore"));
  g_signal_emit_by_name (find_button (row, "Dismiss"), "clicked");
  settle_down ();
  g_assert_cmpuint (hl_solution_n_findings (hl_session_solution (f->session)), ==, n - 1);
  g_assert_false (shows_text (f->findings, text));
  g_assert_cmpstr (hl_session_undo_name (f->session), ==, "Dismiss a finding");
  g_assert_true (hl_session_is_dirty (f->session));

  GtkWidget *toggle = find_type (f->findings, GTK_TYPE_CHECK_BUTTON);
  g_assert_cmpstr (gtk_check_button_get_label (GTK_CHECK_BUTTON (toggle)), ==, "Show 1 dismissed");
  g_assert_true (gtk_widget_get_visible (toggle));
  gtk_check_button_set_active (GTK_CHECK_BUTTON (toggle), TRUE);
  settle_down ();
  g_assert_true (shows_text (f->findings, text));
  g_signal_emit_by_name (find_button (f->findings, "Restore"), "clicked");
  settle_down ();
  g_assert_cmpuint (hl_solution_n_findings (hl_session_solution (f->session)), ==, n);
  g_assert_false (gtk_widget_get_visible (toggle));
  hl_session_undo (f->session);
  g_assert_cmpuint (hl_solution_n_dismissed (hl_session_solution (f->session)), ==, 1);
  hl_session_undo (f->session);
  g_assert_cmpuint (hl_solution_n_dismissed (hl_session_solution (f->session)), ==, 0);
}

/* What is wrong cannot be put aside. */
static void
test_an_error_has_no_dismissal (Fixture *f, gconstpointer data)
{
  take_away (f, "T1", "isentropic_efficiency");
  const HlFinding *finding = hl_solution_finding (hl_session_solution (f->session), 0);
  GtkWidget *row = gtk_widget_get_ancestor (find_widget (f->findings, is_label_with, finding->text), GTK_TYPE_LIST_BOX_ROW);
  g_assert_null (find_button (row, "Dismiss"));
}

static void
test_strip_says_how_things_stand (Fixture *f, gconstpointer data)
{
  g_autofree char *good = hl_solution_summary (hl_session_solution (f->session));
  g_auto (GStrv) parts = g_strsplit (good, " · ", -1);

  g_assert_true (shows_text (f->strip, parts[0]));
  g_assert_true (shows_text (f->strip, parts[1]));
  take_away (f, "T1", "isentropic_efficiency");
  g_autofree char *bad = hl_solution_summary (hl_session_solution (f->session));
  g_assert_false (shows_text (f->strip, parts[1]));
  g_assert_true (shows_text (f->strip, "Not solved"));
  g_assert_true (shows_text (f->strip, bad));
  g_assert_true (shows_text (f->strip, "1 error"));
}

static void
test_strip_shows_a_message_beside_the_state (Fixture *f, gconstpointer data)
{
  g_autofree char *summary = hl_solution_summary (hl_session_solution (f->session));
  g_auto (GStrv) parts = g_strsplit (summary, " · ", -1);

  g_signal_emit_by_name (f->session, "message", "efficiency of T1 is now found");
  g_assert_true (shows_text (f->strip, "efficiency of T1 is now found"));
  g_assert_true (shows_text (f->strip, parts[0]));
  g_signal_emit_by_name (f->session, "message", "");
  g_assert_false (shows_text (f->strip, "efficiency of T1 is now found"));
}

static void
test_strip_counts_assumed_values (Fixture *f, gconstpointer data)
{
  HlAddress address = hl_address_component ("T1", g_intern_static_string ("isentropic_efficiency"));
  guint n = hl_plant_n_assumed (hl_session_plant (f->session));
  g_autofree char *before = g_strdup_printf ("%u ", n), *after = g_strdup_printf ("%u ", n - 1);
  g_autoptr (GError) error = NULL;

  g_assert_true (shows_text (f->strip, before));
  g_assert_true (hl_session_set_text (f->session, &address, "0.85", &error));
  g_assert_true (shows_text (f->strip, after));
}

static void
test_assumed_list_leads_to_the_value (Fixture *f, gconstpointer data)
{
  GtkWidget *list = hl_assumed_new (f->session);

  gtk_box_append (GTK_BOX (gtk_window_get_child (GTK_WINDOW (f->window))), list);
  settle_down ();
  g_autofree char *words = NULL;
  HlAddress address = hl_address_component ("T1", g_intern_static_string ("mechanical_efficiency"));
  words = hl_plant_describe (hl_session_plant (f->session), &address);
  g_assert_true (shows_text (list, words));
  GtkWidget *row = gtk_widget_get_ancestor (find_widget (list, is_label_with, words), GTK_TYPE_LIST_BOX_ROW);
  gtk_widget_activate (row);
  settle_down ();
  g_assert_true (hl_session_is_selected (f->session, "T1"));
}

static void
test_glance_shows_results_and_says_when_they_are_old (Fixture *f, gconstpointer data)
{
  g_assert_true (shows_text (f->glance, "12.00 MW"));
  g_assert_false (gtk_widget_has_css_class (f->glance, "stale"));
  take_away (f, "T1", "isentropic_efficiency");
  g_assert_true (shows_text (f->glance, "12.00 MW"));
  g_assert_true (gtk_widget_has_css_class (f->glance, "stale"));
}

int
main (int argc, char **argv)
{
  if (!test_init (&argc, &argv))
    return 0;
#define ADD(name, func) g_test_add ("/app/findings/" name, Fixture, NULL, set_up, func, tear_down)
  ADD ("missing value is said and mended", test_missing_value_is_said_and_mended);
  ADD ("a finding is dismissed and restored", test_a_finding_is_dismissed_and_restored);
  ADD ("an error has no dismissal", test_an_error_has_no_dismissal);
  ADD ("strip says how things stand", test_strip_says_how_things_stand);
  ADD ("strip shows a message beside the state", test_strip_shows_a_message_beside_the_state);
  ADD ("strip counts assumed values", test_strip_counts_assumed_values);
  ADD ("assumed list leads to the value", test_assumed_list_leads_to_the_value);
  ADD ("glance shows results and says when they are old", test_glance_shows_results_and_says_when_they_are_old);
#undef ADD
  return g_test_run ();
}
