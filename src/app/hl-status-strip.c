/* One line that says how things stand; opens the findings and the assumed values.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-status-strip.h"
#include "app/hl-assumed.h"
#include "app/hl-findings.h"
#include "app/hl-pane.h"
#include "plant/i18n.h"

#define MESSAGE_SECONDS 8

struct _HlStatusStrip {
  GtkWidget  parent_instance;
  HlSession *session;
  GtkWidget *mark, *head, *line, *assumed, *assumed_label, *findings, *findings_label, *findings_mark;
  guint      message_source;       /* while a message stands in the line */
};

G_DEFINE_FINAL_TYPE (HlStatusStrip, hl_status_strip, GTK_TYPE_WIDGET)

static gboolean
is_empty (HlStatusStrip *self)
{
  return hl_plant_n_components (hl_session_plant (self->session)) == 0;
}

/* "Solved · 12.00 MW net · 31.2 % · 3 values assumed": the first part is set bold, and what the button says is left
 * out.  Where nothing is solved the summary is the sentence of the gravest finding. */
static char *
split_summary (HlStatusStrip *self, const char *summary, char **head)
{
  const HlSolution *solution = hl_session_solution (self->session);
  const char *assumed = gtk_label_get_text (GTK_LABEL (self->assumed_label));

  if (is_empty (self) || !hl_solution_is_solved (solution))
    {
      *head = g_strdup (is_empty (self) ? _("Empty sheet") : _("Not solved"));
      return g_strdup (strcmp (summary, *head) != 0 ? summary : "");
    }
  g_auto (GStrv) parts = g_strsplit (summary, " · ", -1);
  GString *rest = g_string_new (NULL);
  for (guint n = 1; parts[n] != NULL; n++)
    if (strcmp (parts[n], assumed) != 0)
      g_string_append_printf (rest, "%s%s", rest->len > 0 ? " · " : "", parts[n]);
  *head = g_strdup (parts[0]);
  return g_string_free (rest, FALSE);
}

static void
show_summary (HlStatusStrip *self)
{
  g_autofree char *summary = hl_solution_summary (hl_session_solution (self->session)), *head = NULL;
  g_autofree char *rest = split_summary (self, summary, &head);

  gtk_label_set_text (GTK_LABEL (self->head), head);
  gtk_label_set_text (GTK_LABEL (self->line), rest);
  gtk_widget_remove_css_class (self->line, "message");
  hl_pane_set_accessible (GTK_WIDGET (self), summary, NULL);
  gtk_widget_set_tooltip_text (self->line, *rest != '\0' ? rest : NULL);
}

static HlGradeShape
mark_now (HlStatusStrip *self)
{
  if (is_empty (self))
    return HL_SHAPE_HINT;
  return hl_solution_is_solved (hl_session_solution (self->session)) ? HL_SHAPE_GOOD : HL_SHAPE_ERROR;
}

static void
show_assumed (HlStatusStrip *self)
{
  guint n = hl_plant_n_assumed (hl_session_plant (self->session));
  g_autofree char *text = g_strdup_printf (ngettext_hl ("%u value assumed", "%u values assumed", n), n);

  gtk_label_set_text (GTK_LABEL (self->assumed_label), text);
  gtk_widget_set_visible (self->assumed, n > 0);
  hl_pane_set_accessible (self->assumed, text, _("Opens the list of values that nobody has confirmed yet"));
}

static char *
count_of_grade (HlGrade grade, guint n)
{
  switch (grade)
    {
    case HL_GRADE_HINT:
      return g_strdup_printf (ngettext_hl ("%u hint", "%u hints", n), n);
    case HL_GRADE_CAUTION:
      return g_strdup_printf (ngettext_hl ("%u caution", "%u cautions", n), n);
    case HL_GRADE_WARNING:
      return g_strdup_printf (ngettext_hl ("%u warning", "%u warnings", n), n);
    default:
      return g_strdup_printf (ngettext_hl ("%u error", "%u errors", n), n);
    }
}

/* How many of the gravest grade, and how many others: "1 error, 2 more". */
static void
show_findings (HlStatusStrip *self)
{
  const HlSolution *solution = hl_session_solution (self->session);
  guint n = hl_solution_n_findings (solution);
  g_autofree char *text = NULL;

  gtk_widget_set_visible (self->findings, n > 0);
  if (n == 0)
    return;
  const HlFinding *gravest = hl_solution_finding (solution, 0);
  guint alike = 0;
  while (alike < n && hl_solution_finding (solution, alike)->grade == gravest->grade)
    alike++;
  g_autofree char *count = count_of_grade (gravest->grade, alike);
  text = alike == n ? g_strdup (count) : g_strdup_printf (_("%s, %u more"), count, n - alike);
  gtk_label_set_text (GTK_LABEL (self->findings_label), text);
  gtk_widget_set_tooltip_text (self->findings, gravest->text);
  hl_grade_mark_set_shape (HL_GRADE_MARK (self->findings_mark), hl_grade_mark_of (gravest->grade));
  for (HlGrade grade = HL_GRADE_HINT; grade <= HL_GRADE_ERROR; grade++)
    gtk_widget_remove_css_class (self->findings, hl_grade_id (grade));
  gtk_widget_add_css_class (self->findings, hl_grade_id (gravest->grade));
  hl_pane_set_accessible (self->findings, text, gravest->text);
}

static void
update (HlStatusStrip *self)
{
  hl_grade_mark_set_shape (HL_GRADE_MARK (self->mark), mark_now (self));
  show_assumed (self);
  show_findings (self);
  if (self->message_source == 0)
    show_summary (self);
}

/* --- messages --- */

static gboolean
message_over_cb (gpointer data)
{
  HlStatusStrip *self = data;
  self->message_source = 0;
  show_summary (self);
  return G_SOURCE_REMOVE;
}

/* A message takes the quiet part of the line for a while; the first word, how things stand, stays. */
static void
message_cb (HlSession *session, const char *text, HlStatusStrip *self)
{
  g_clear_handle_id (&self->message_source, g_source_remove);
  show_summary (self);
  if (text == NULL || *text == '\0')
    return;
  gtk_label_set_text (GTK_LABEL (self->line), text);
  gtk_widget_set_tooltip_text (self->line, text);
  gtk_widget_add_css_class (self->line, "message");
  hl_pane_set_accessible (GTK_WIDGET (self), text, NULL);
  self->message_source = g_timeout_add_seconds (MESSAGE_SECONDS, message_over_cb, self);
}

/* --- popovers, made when first opened --- */

static void
give_popover (GtkMenuButton *button, GtkWidget *content)
{
  GtkWidget *popover = gtk_popover_new ();

  gtk_widget_add_css_class (popover, "pane-popover");
  gtk_popover_set_child (GTK_POPOVER (popover), content);
  gtk_menu_button_set_popover (button, popover);
}

static void
limit_height (GtkWidget *content, int most)
{
  for (GtkWidget *child = gtk_widget_get_first_child (content); child != NULL; child = gtk_widget_get_next_sibling (child))
    if (GTK_IS_SCROLLED_WINDOW (child))
      gtk_scrolled_window_set_max_content_height (GTK_SCROLLED_WINDOW (child), most);
}

static void
open_findings_cb (GtkMenuButton *button, gpointer data)
{
  HlStatusStrip *self = data;
  if (gtk_menu_button_get_popover (button) != NULL)
    return;
  GtkWidget *findings = hl_findings_new (self->session);
  hl_findings_fit_height (HL_FINDINGS (findings), 540, 340);
  give_popover (button, findings);
}

static void
open_assumed_cb (GtkMenuButton *button, gpointer data)
{
  HlStatusStrip *self = data;
  if (gtk_menu_button_get_popover (button) != NULL)
    return;
  GtkWidget *assumed = hl_assumed_new (self->session);
  limit_height (assumed, 320);
  gtk_widget_set_size_request (assumed, 460, -1);
  give_popover (button, assumed);
}

static GtkWidget *
opener (HlStatusStrip *self, GtkWidget *mark, GtkWidget *label, GtkMenuButtonCreatePopupFunc func)
{
  GtkWidget *button = gtk_menu_button_new (), *box = gtk_box_new (GTK_ORIENTATION_HORIZONTAL, 6);

  if (mark != NULL)
    gtk_box_append (GTK_BOX (box), mark);
  gtk_box_append (GTK_BOX (box), label);
  gtk_menu_button_set_child (GTK_MENU_BUTTON (button), box);
  gtk_menu_button_set_has_frame (GTK_MENU_BUTTON (button), FALSE);
  gtk_menu_button_set_direction (GTK_MENU_BUTTON (button), GTK_ARROW_UP);
  gtk_menu_button_set_create_popup_func (GTK_MENU_BUTTON (button), func, self, NULL);
  gtk_widget_set_parent (button, GTK_WIDGET (self));
  return button;
}

static void
hl_status_strip_dispose (GObject *object)
{
  HlStatusStrip *self = HL_STATUS_STRIP (object);
  GtkWidget *child;

  g_clear_handle_id (&self->message_source, g_source_remove);
  if (self->session != NULL)
    g_signal_handlers_disconnect_by_data (self->session, self);
  while ((child = gtk_widget_get_first_child (GTK_WIDGET (self))) != NULL)
    gtk_widget_unparent (child);
  g_clear_object (&self->session);
  G_OBJECT_CLASS (hl_status_strip_parent_class)->dispose (object);
}

static void
hl_status_strip_class_init (HlStatusStripClass *klass)
{
  GtkWidgetClass *widget_class = GTK_WIDGET_CLASS (klass);
  G_OBJECT_CLASS (klass)->dispose = hl_status_strip_dispose;
  gtk_widget_class_set_layout_manager_type (widget_class, GTK_TYPE_BOX_LAYOUT);
  gtk_widget_class_set_css_name (widget_class, "statusstrip");
  gtk_widget_class_set_accessible_role (widget_class, GTK_ACCESSIBLE_ROLE_STATUS);
}

static void
hl_status_strip_init (HlStatusStrip *self)
{
  gtk_box_layout_set_spacing (GTK_BOX_LAYOUT (gtk_widget_get_layout_manager (GTK_WIDGET (self))), 8);
  self->mark = hl_grade_mark_new (HL_SHAPE_GOOD);
  gtk_widget_set_parent (self->mark, GTK_WIDGET (self));
  self->head = hl_pane_label ("", "head");
  gtk_widget_set_parent (self->head, GTK_WIDGET (self));
  self->line = hl_pane_label ("", "line");
  gtk_label_set_ellipsize (GTK_LABEL (self->line), PANGO_ELLIPSIZE_END);
  gtk_widget_set_hexpand (self->line, TRUE);
  gtk_widget_set_parent (self->line, GTK_WIDGET (self));
  self->assumed_label = gtk_label_new ("");
  self->assumed = opener (self, NULL, self->assumed_label, open_assumed_cb);
  gtk_widget_add_css_class (self->assumed, "assumed");
  self->findings_label = gtk_label_new ("");
  self->findings_mark = hl_grade_mark_new (HL_SHAPE_HINT);
  self->findings = opener (self, self->findings_mark, self->findings_label, open_findings_cb);
  gtk_widget_add_css_class (self->findings, "grade");
}

GtkWidget *
hl_status_strip_new (HlSession *session)
{
  HlStatusStrip *self = g_object_new (HL_TYPE_STATUS_STRIP, NULL);

  self->session = g_object_ref (session);
  g_signal_connect_swapped (session, "changed", G_CALLBACK (update), self);
  g_signal_connect (session, "message", G_CALLBACK (message_cb), self);
  update (self);
  return GTK_WIDGET (self);
}
