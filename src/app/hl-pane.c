/* What the panes share: headings, cards and the marks of findings.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-pane.h"
#include "app/hl-appearance.h"

#include <math.h>

HlUnitSet
hl_pane_units (HlSession *session)
{
  return hl_plant_units (hl_session_plant (session));
}

GtkWidget *
hl_pane_label (const char *text, const char *css_class)
{
  GtkWidget *label = gtk_label_new (text);
  gtk_label_set_xalign (GTK_LABEL (label), 0.0f);
  if (css_class != NULL)
    gtk_widget_add_css_class (label, css_class);
  return label;
}

GtkWidget *
hl_pane_heading (const char *text)
{
  g_autofree char *upper = g_utf8_strup (text, -1);
  GtkWidget *label = hl_pane_label (upper, "pane-heading");
  gtk_label_set_ellipsize (GTK_LABEL (label), PANGO_ELLIPSIZE_END);
  gtk_accessible_update_property (GTK_ACCESSIBLE (label), GTK_ACCESSIBLE_PROPERTY_LABEL, text, -1);
  return label;
}

void
hl_pane_set_accessible (GtkWidget *widget, const char *label, const char *description)
{
  gtk_accessible_update_property (GTK_ACCESSIBLE (widget), GTK_ACCESSIBLE_PROPERTY_LABEL, label, -1);
  if (description != NULL)
    gtk_accessible_update_property (GTK_ACCESSIBLE (widget), GTK_ACCESSIBLE_PROPERTY_DESCRIPTION, description, -1);
}

void
hl_pane_clear (GtkWidget *box)
{
  GtkWidget *child;
  while ((child = gtk_widget_get_first_child (box)) != NULL)
    gtk_box_remove (GTK_BOX (box), child);
}

/* --- marks --- */

#define MARK_SIZE 14.0

struct _HlGradeMark {
  GtkWidget   parent_instance;
  HlGradeShape shape;
};

G_DEFINE_FINAL_TYPE (HlGradeMark, hl_grade_mark, GTK_TYPE_WIDGET)

static void
polygon (cairo_t *cr, double radius, int corners, double turn)
{
  cairo_new_path (cr);
  for (int i = 0; i < corners; i++)
    {
      double a = turn + 2.0 * G_PI * i / corners;
      cairo_line_to (cr, radius * cos (a), radius * sin (a));
    }
  cairo_close_path (cr);
}

static void
exclamation (cairo_t *cr, double from, double to, double dot)
{
  cairo_move_to (cr, 0.0, from);
  cairo_line_to (cr, 0.0, to);
  cairo_stroke (cr);
  cairo_arc (cr, 0.0, dot, 0.95, 0.0, 2.0 * G_PI);
  cairo_fill (cr);
}

/* Good: disc with a tick.  Hint: ring with an i.  Caution: standing diamond.  Warning: triangle.  Error: octagon with a cross. */
static void
draw_mark (cairo_t *cr, const HlTheme *theme, HlGradeShape shape)
{
  const HlColour *colours[] = { &theme->good, &theme->hint, &theme->caution, &theme->warning, &theme->error };
  const double r = MARK_SIZE / 2.0 - 0.5;

  cairo_set_line_cap (cr, CAIRO_LINE_CAP_ROUND);
  cairo_set_line_join (cr, CAIRO_LINE_JOIN_ROUND);
  cairo_set_line_width (cr, 1.6);
  hl_set_colour (cr, colours[shape]);
  switch (shape)
    {
    case HL_SHAPE_GOOD:
      cairo_arc (cr, 0.0, 0.0, r, 0.0, 2.0 * G_PI);
      cairo_fill (cr);
      hl_set_colour (cr, &theme->card);
      cairo_move_to (cr, -2.8, 0.2);
      cairo_line_to (cr, -0.8, 2.3);
      cairo_line_to (cr, 3.0, -2.2);
      cairo_stroke (cr);
      break;
    case HL_SHAPE_HINT:
      cairo_arc (cr, 0.0, 0.0, r - 0.7, 0.0, 2.0 * G_PI);
      cairo_stroke (cr);
      exclamation (cr, 3.0, -0.2, -2.9);
      break;
    case HL_SHAPE_CAUTION:
      polygon (cr, r, 4, 0.0);
      cairo_fill_preserve (cr);
      cairo_stroke (cr);
      hl_set_colour (cr, &theme->card);
      exclamation (cr, -3.1, 0.2, 3.0);
      break;
    case HL_SHAPE_WARNING:
      cairo_translate (cr, 0.0, 1.4);
      polygon (cr, r, 3, -G_PI / 2.0);
      cairo_fill_preserve (cr);
      cairo_stroke (cr);
      hl_set_colour (cr, &theme->card);
      exclamation (cr, -3.2, 0.0, 2.4);
      break;
    case HL_SHAPE_ERROR:
      polygon (cr, r, 8, G_PI / 8.0);
      cairo_fill_preserve (cr);
      cairo_stroke (cr);
      hl_set_colour (cr, &theme->card);
      cairo_move_to (cr, -2.2, -2.2);
      cairo_line_to (cr, 2.2, 2.2);
      cairo_move_to (cr, 2.2, -2.2);
      cairo_line_to (cr, -2.2, 2.2);
      cairo_stroke (cr);
      break;
    }
}

static void
hl_grade_mark_snapshot (GtkWidget *widget, GtkSnapshot *snapshot)
{
  int width = gtk_widget_get_width (widget), height = gtk_widget_get_height (widget);
  cairo_t *cr = gtk_snapshot_append_cairo (snapshot, &GRAPHENE_RECT_INIT (-1, -1, width + 2, height + 2));
  cairo_translate (cr, width / 2.0, height / 2.0);
  draw_mark (cr, hl_appearance_theme (), HL_GRADE_MARK (widget)->shape);
  cairo_destroy (cr);
}

static void
hl_grade_mark_measure (GtkWidget *widget, GtkOrientation orientation, int for_size, int *minimum, int *natural, int *min_base, int *nat_base)
{
  *minimum = *natural = (int) MARK_SIZE;
}

static void
hl_grade_mark_class_init (HlGradeMarkClass *klass)
{
  GtkWidgetClass *widget_class = GTK_WIDGET_CLASS (klass);
  widget_class->snapshot = hl_grade_mark_snapshot;
  widget_class->measure = hl_grade_mark_measure;
  gtk_widget_class_set_css_name (widget_class, "mark");
  gtk_widget_class_set_accessible_role (widget_class, GTK_ACCESSIBLE_ROLE_PRESENTATION);   /* the word stands beside it */
}

static void
hl_grade_mark_init (HlGradeMark *self)
{
  gtk_widget_set_valign (GTK_WIDGET (self), GTK_ALIGN_CENTER);
  gtk_widget_set_halign (GTK_WIDGET (self), GTK_ALIGN_CENTER);
}

GtkWidget *
hl_grade_mark_new (HlGradeShape shape)
{
  HlGradeMark *self = g_object_new (HL_TYPE_GRADE_MARK, NULL);
  self->shape = shape;
  return GTK_WIDGET (self);
}

void
hl_grade_mark_set_shape (HlGradeMark *self, HlGradeShape shape)
{
  if (self->shape == shape)
    return;
  self->shape = shape;
  gtk_widget_queue_draw (GTK_WIDGET (self));
}

HlGradeShape
hl_grade_mark_of (HlGrade grade)
{
  static const HlGradeShape shapes[] = { HL_SHAPE_HINT, HL_SHAPE_CAUTION, HL_SHAPE_WARNING, HL_SHAPE_ERROR };
  return shapes[grade];
}
