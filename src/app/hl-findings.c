/* The list of findings with their mends as buttons.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-findings.h"
#include "app/hl-pane.h"
#include "plant/i18n.h"

struct _HlFindings {
  GtkWidget  parent_instance;
  HlSession *session;
  GtkWidget *scroller, *list, *empty, *error, *show_dismissed;
  int        fit_width, fit_most;   /* height follows the list up to fit_most; 0: fills its place */
  char      *shown;            /* what stands in the list, to leave it alone while nothing changes */
};

G_DEFINE_FINAL_TYPE (HlFindings, hl_findings, GTK_TYPE_WIDGET)

/* A mend is looked up again when its button is pressed: the solution may be another one by then. */
typedef struct { HlFindings *self; guint finding, mend; } Press;

static void
free_press (gpointer data, GClosure *closure)
{
  g_free (data);
}

static void
show_error (HlFindings *self, const char *text)
{
  gtk_label_set_text (GTK_LABEL (self->error), text != NULL ? text : "");
  gtk_widget_set_visible (self->error, text != NULL);
}

static gboolean
shows_dismissed (HlFindings *self)
{
  return gtk_check_button_get_active (GTK_CHECK_BUTTON (self->show_dismissed));
}

/* Row @n of the list; dismissed ones come last. */
static const HlFinding *
finding_of_row (const HlSolution *solution, guint n)
{
  guint open = hl_solution_n_findings (solution);
  if (n < open)
    return hl_solution_finding (solution, n);
  return n - open < hl_solution_n_dismissed (solution) ? hl_solution_dismissed (solution, n - open) : NULL;
}

static void
dismiss_clicked_cb (GtkButton *button, gpointer data)
{
  Press *press = data;
  HlFindings *self = press->self;
  g_autoptr (HlSolution) solution = hl_solution_ref (hl_session_solution (self->session));
  const HlFinding *finding = finding_of_row (solution, press->finding);

  if (finding == NULL)
    return;
  g_object_ref (self);
  hl_session_dismiss (self->session, finding, press->finding < hl_solution_n_findings (solution));
  g_object_unref (self);
}

/* The popover that shows the list closes when the mend leads elsewhere. */
static void
close_popover (HlFindings *self)
{
  GtkWidget *popover = gtk_widget_get_ancestor (GTK_WIDGET (self), GTK_TYPE_POPOVER);
  if (popover != NULL)
    gtk_popover_popdown (GTK_POPOVER (popover));
}

static void
mend_clicked_cb (GtkButton *button, gpointer data)
{
  Press *press = data;
  HlFindings *self = press->self;
  g_autoptr (HlSolution) solution = hl_solution_ref (hl_session_solution (self->session));
  g_autoptr (GError) error = NULL;

  if (press->finding >= hl_solution_n_findings (solution))
    return;
  const HlFinding *finding = hl_solution_finding (solution, press->finding);
  if (press->mend >= finding->n_mends)
    return;
  const HlMend *mend = &finding->mends[press->mend];
  gboolean is_jump = mend->kind == HL_MEND_EDIT || mend->kind == HL_MEND_CONNECT;
  g_object_ref (self);
  if (is_jump)
    close_popover (self);
  show_error (self, hl_session_mend (self->session, mend, &error) ? NULL : error->message);
  g_object_unref (self);
}

static void
row_activated_cb (GtkListBox *list, GtkListBoxRow *row, HlFindings *self)
{
  const HlSolution *solution = hl_session_solution (self->session);
  guint n = (guint) gtk_list_box_row_get_index (row);

  const HlFinding *finding = finding_of_row (solution, n);

  if (finding == NULL)
    return;
  HlAddress at = finding->at;
  close_popover (self);
  if (at.key != NULL && *at.key != '\0')
    hl_session_go_to (self->session, &at);
  else
    hl_session_select (self->session, at.owner == HL_OWNER_PLANT ? NULL : at.id, FALSE);
}

static GtkWidget *
mend_buttons (HlFindings *self, const HlFinding *finding, guint n)
{
  GtkWidget *flow = gtk_flow_box_new ();

  gtk_flow_box_set_selection_mode (GTK_FLOW_BOX (flow), GTK_SELECTION_NONE);
  gtk_flow_box_set_column_spacing (GTK_FLOW_BOX (flow), 6);
  gtk_flow_box_set_row_spacing (GTK_FLOW_BOX (flow), 4);
  gtk_flow_box_set_max_children_per_line (GTK_FLOW_BOX (flow), 4);
  gtk_widget_add_css_class (flow, "mends");
  for (guint m = 0; m < finding->n_mends; m++)
    {
      Press *press = g_new (Press, 1);
      GtkWidget *label = gtk_label_new (finding->mends[m].text), *button = gtk_button_new ();
      *press = (Press) { self, n, m };
      gtk_label_set_ellipsize (GTK_LABEL (label), PANGO_ELLIPSIZE_END);
      gtk_button_set_child (GTK_BUTTON (button), label);
      gtk_widget_set_tooltip_text (button, finding->mends[m].text);
      gtk_widget_set_halign (button, GTK_ALIGN_START);
      gtk_widget_add_css_class (button, "mend");
      hl_pane_set_accessible (button, finding->mends[m].text, NULL);
      g_signal_connect_data (button, "clicked", G_CALLBACK (mend_clicked_cb), press, free_press, 0);
      gtk_flow_box_insert (GTK_FLOW_BOX (flow), button, -1);
      gtk_widget_set_focusable (gtk_widget_get_parent (button), FALSE);
    }
  return flow;
}

static GtkWidget *
dismiss_button (HlFindings *self, guint n, gboolean is_dismissed)
{
  GtkWidget *button = gtk_button_new_with_label (is_dismissed ? _("Restore") : _("Dismiss"));
  Press *press = g_new (Press, 1);

  *press = (Press) { self, n, 0 };
  gtk_widget_add_css_class (button, "flat");
  gtk_widget_add_css_class (button, "dismiss");
  gtk_widget_set_valign (button, GTK_ALIGN_START);
  gtk_widget_set_tooltip_text (button, is_dismissed ? _("List it among the findings again") : _("Accept it as it is: it is kept with the plant, and listed as dismissed"));
  g_signal_connect_data (button, "clicked", G_CALLBACK (dismiss_clicked_cb), press, free_press, 0);
  return button;
}

static GtkWidget *
finding_row (HlFindings *self, const HlFinding *finding, guint n, gboolean is_dismissed)
{
  GtkWidget *line = gtk_box_new (GTK_ORIENTATION_HORIZONTAL, 10), *words = gtk_box_new (GTK_ORIENTATION_VERTICAL, 4);
  GtkWidget *mark = hl_grade_mark_new (hl_grade_mark_of (finding->grade)), *grade = hl_pane_label (hl_grade_name (finding->grade), "grade");
  GtkWidget *text = hl_pane_label (finding->text, NULL), *row = gtk_list_box_row_new ();

  gtk_widget_add_css_class (grade, hl_grade_id (finding->grade));
  gtk_label_set_width_chars (GTK_LABEL (grade), 8);
  gtk_widget_set_valign (mark, GTK_ALIGN_START);
  gtk_widget_set_valign (grade, GTK_ALIGN_START);
  gtk_label_set_wrap (GTK_LABEL (text), TRUE);
  gtk_label_set_wrap_mode (GTK_LABEL (text), PANGO_WRAP_WORD_CHAR);
  gtk_widget_set_hexpand (words, TRUE);
  gtk_box_append (GTK_BOX (words), text);
  if (finding->source != NULL)
    {
      g_autofree char *source = g_strdup_printf (_("Source: %s"), finding->source);
      GtkWidget *label = hl_pane_label (source, "quiet");
      gtk_label_set_wrap (GTK_LABEL (label), TRUE);
      gtk_box_append (GTK_BOX (words), label);
    }
  if (finding->n_mends > 0 && !is_dismissed)
    gtk_box_append (GTK_BOX (words), mend_buttons (self, finding, n));
  gtk_box_append (GTK_BOX (line), mark);
  gtk_box_append (GTK_BOX (line), grade);
  gtk_box_append (GTK_BOX (line), words);
  if (hl_finding_may_be_dismissed (finding))
    gtk_box_append (GTK_BOX (line), dismiss_button (self, n, is_dismissed));
  if (is_dismissed)
    gtk_widget_add_css_class (row, "dismissed");
  gtk_list_box_row_set_child (GTK_LIST_BOX_ROW (row), line);
  hl_pane_set_accessible (row, hl_grade_name (finding->grade), finding->text);
  return row;
}

/* Everything that the list shows as one text. */
static char *
fingerprint (const HlSolution *solution, gboolean with_dismissed)
{
  guint open = hl_solution_n_findings (solution), aside = hl_solution_n_dismissed (solution);
  GString *text = g_string_new (NULL);

  g_string_append_printf (text, "%u %u\n", open, aside);
  for (guint n = 0; n < open + (with_dismissed ? aside : 0); n++)
    {
      const HlFinding *finding = finding_of_row (solution, n);
      g_string_append_printf (text, "%d %s\n", (int) finding->grade, finding->text);
      for (guint m = 0; m < finding->n_mends; m++)
        g_string_append_printf (text, "  %s\n", finding->mends[m].text);
    }
  return g_string_free (text, FALSE);
}

/* A scrolled list does not know how high its text becomes at the width that it gets: it is measured. */
static void
fit_height (HlFindings *self)
{
  int height;

  if (self->fit_most == 0)
    return;
  gtk_widget_measure (self->list, GTK_ORIENTATION_VERTICAL, self->fit_width, NULL, &height, NULL, NULL);
  gtk_scrolled_window_set_max_content_height (GTK_SCROLLED_WINDOW (self->scroller), self->fit_most);
  gtk_scrolled_window_set_min_content_height (GTK_SCROLLED_WINDOW (self->scroller), MIN (height, self->fit_most));
}

static void
update (HlFindings *self)
{
  const HlSolution *solution = hl_session_solution (self->session);
  guint n_findings = hl_solution_n_findings (solution), n_dismissed = hl_solution_n_dismissed (solution);
  guint n_rows = n_findings + (shows_dismissed (self) ? n_dismissed : 0);
  char *now = fingerprint (solution, shows_dismissed (self));
  GtkListBoxRow *row;

  if (g_strcmp0 (now, self->shown) == 0)
    {
      g_free (now);
      return;
    }
  g_free (self->shown);
  self->shown = now;
  show_error (self, NULL);
  while ((row = gtk_list_box_get_row_at_index (GTK_LIST_BOX (self->list), 0)) != NULL)
    gtk_list_box_remove (GTK_LIST_BOX (self->list), GTK_WIDGET (row));
  for (guint n = 0; n < n_rows; n++)
    gtk_list_box_append (GTK_LIST_BOX (self->list), finding_row (self, finding_of_row (solution, n), n, n >= n_findings));
  gtk_widget_set_visible (self->scroller, n_rows > 0);
  gtk_widget_set_visible (self->empty, n_findings == 0);
  g_autofree char *label = g_strdup_printf (ngettext_hl ("Show %u dismissed", "Show %u dismissed", n_dismissed), n_dismissed);
  gtk_check_button_set_label (GTK_CHECK_BUTTON (self->show_dismissed), label);
  gtk_widget_set_visible (self->show_dismissed, n_dismissed > 0);
  fit_height (self);
}

static void
hl_findings_root (GtkWidget *widget)
{
  GTK_WIDGET_CLASS (hl_findings_parent_class)->root (widget);
  fit_height (HL_FINDINGS (widget));            /* the style sheet counts from here */
}

static void
hl_findings_dispose (GObject *object)
{
  HlFindings *self = HL_FINDINGS (object);
  GtkWidget *child;

  if (self->session != NULL)
    g_signal_handlers_disconnect_by_data (self->session, self);
  while ((child = gtk_widget_get_first_child (GTK_WIDGET (self))) != NULL)
    gtk_widget_unparent (child);
  g_clear_object (&self->session);
  g_clear_pointer (&self->shown, g_free);
  G_OBJECT_CLASS (hl_findings_parent_class)->dispose (object);
}

static void
hl_findings_class_init (HlFindingsClass *klass)
{
  GtkWidgetClass *widget_class = GTK_WIDGET_CLASS (klass);
  G_OBJECT_CLASS (klass)->dispose = hl_findings_dispose;
  gtk_widget_class_set_layout_manager_type (widget_class, GTK_TYPE_BOX_LAYOUT);
  widget_class->root = hl_findings_root;
  gtk_widget_class_set_css_name (widget_class, "findings");
}

static void
hl_findings_init (HlFindings *self)
{
  gtk_orientable_set_orientation (GTK_ORIENTABLE (gtk_widget_get_layout_manager (GTK_WIDGET (self))), GTK_ORIENTATION_VERTICAL);
  self->error = hl_pane_label ("", "note");
  gtk_widget_add_css_class (self->error, "error");
  gtk_label_set_wrap (GTK_LABEL (self->error), TRUE);
  gtk_widget_set_visible (self->error, FALSE);
  gtk_widget_set_parent (self->error, GTK_WIDGET (self));

  self->list = gtk_list_box_new ();
  gtk_list_box_set_selection_mode (GTK_LIST_BOX (self->list), GTK_SELECTION_NONE);
  gtk_list_box_set_activate_on_single_click (GTK_LIST_BOX (self->list), TRUE);
  g_signal_connect (self->list, "row-activated", G_CALLBACK (row_activated_cb), self);
  hl_pane_set_accessible (self->list, _("Findings"), _("Return goes to the place that a finding is about"));
  self->scroller = gtk_scrolled_window_new ();
  gtk_scrolled_window_set_policy (GTK_SCROLLED_WINDOW (self->scroller), GTK_POLICY_NEVER, GTK_POLICY_AUTOMATIC);
  gtk_scrolled_window_set_child (GTK_SCROLLED_WINDOW (self->scroller), self->list);
  gtk_scrolled_window_set_propagate_natural_height (GTK_SCROLLED_WINDOW (self->scroller), TRUE);
  gtk_widget_set_vexpand (self->scroller, TRUE);
  gtk_widget_set_parent (self->scroller, GTK_WIDGET (self));

  self->empty = gtk_box_new (GTK_ORIENTATION_HORIZONTAL, 8);
  gtk_widget_add_css_class (self->empty, "empty");
  gtk_box_append (GTK_BOX (self->empty), hl_grade_mark_new (HL_SHAPE_GOOD));
  gtk_box_append (GTK_BOX (self->empty), hl_pane_label (_("Nothing to remark."), "quiet"));
  gtk_widget_set_parent (self->empty, GTK_WIDGET (self));

  self->show_dismissed = gtk_check_button_new ();
  gtk_widget_add_css_class (self->show_dismissed, "show-dismissed");
  gtk_widget_set_visible (self->show_dismissed, FALSE);
  gtk_widget_set_parent (self->show_dismissed, GTK_WIDGET (self));
}

void
hl_findings_fit_height (HlFindings *self, int width, int most)
{
  self->fit_width = width;
  self->fit_most = most;
  gtk_widget_set_size_request (GTK_WIDGET (self), width, -1);
  fit_height (self);
}

GtkWidget *
hl_findings_new (HlSession *session)
{
  HlFindings *self = g_object_new (HL_TYPE_FINDINGS, NULL);

  self->session = g_object_ref (session);
  g_signal_connect_swapped (session, "changed", G_CALLBACK (update), self);
  g_signal_connect_swapped (self->show_dismissed, "toggled", G_CALLBACK (update), self);
  update (self);
  return GTK_WIDGET (self);
}
