/* Pages of the diagram area that are drawn anew as a whole: heat diagram of the selection, bands of the plant.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-picture-view.h"
#include "app/hl-appearance.h"
#include "app/hl-pane.h"
#include "draw/bands.h"
#include "draw/heat-diagram.h"
#include "plant/i18n.h"

struct _HlPictureView {
  GtkWidget  parent_instance;
  HlSession *session;
  gboolean   shows_bands;
};

G_DEFINE_FINAL_TYPE (HlPictureView, hl_picture_view, GTK_TYPE_WIDGET)

/* Where the present solution failed, the last good one, drawn grey. */
static HlSolution *
solution_to_show (HlPictureView *self, gboolean *is_stale)
{
  HlSolution *now = hl_session_solution (self->session), *good = hl_session_last_good (self->session);

  *is_stale = !hl_solution_is_solved (now);
  return *is_stale && good != NULL ? good : now;
}

int
hl_picture_view_component (HlPictureView *self)
{
  guint n;
  const char *const *ids = hl_session_selection (self->session, &n);
  gboolean is_stale;
  HlSolution *solution = solution_to_show (self, &is_stale);
  int component = n == 1 ? hl_plant_component_index (hl_solution_plant (solution), ids[0]) : -1;
  g_autoptr (HlHeatCurve) curve = component >= 0 ? hl_heat_curve_new (solution, component) : NULL;

  return curve != NULL ? component : HL_HEAT_ALL;
}

static void
draw (HlPictureView *self, cairo_t *cr, int width, int height)
{
  gboolean is_stale;
  HlSolution *solution = solution_to_show (self, &is_stale);
  HlUnitSet units = hl_plant_units (hl_solution_plant (solution));

  if (self->shows_bands)
    {
      g_autoptr (HlBandsPicture) picture = hl_bands_picture_new (solution, units, width, height);
      hl_bands_picture_draw (picture, cr, hl_appearance_theme (), is_stale);
    }
  else
    {
      g_autoptr (HlHeatDiagram) diagram = hl_heat_diagram_new (solution, hl_picture_view_component (self), units, width, height);
      hl_heat_diagram_draw (diagram, cr, hl_appearance_theme (), is_stale);
    }
}

static void
hl_picture_view_snapshot (GtkWidget *widget, GtkSnapshot *snapshot)
{
  int width = gtk_widget_get_width (widget), height = gtk_widget_get_height (widget);

  if (width < 40 || height < 40)
    return;
  cairo_t *cr = gtk_snapshot_append_cairo (snapshot, &GRAPHENE_RECT_INIT (0, 0, width, height));
  draw (HL_PICTURE_VIEW (widget), cr, width, height);
  cairo_destroy (cr);
}

static void
hl_picture_view_measure (GtkWidget *widget, GtkOrientation orientation, int for_size, int *minimum, int *natural, int *min_base, int *nat_base)
{
  *minimum = orientation == GTK_ORIENTATION_HORIZONTAL ? 260 : 170;
  *natural = orientation == GTK_ORIENTATION_HORIZONTAL ? 560 : 280;
}

static void
hl_picture_view_css_changed (GtkWidget *widget, GtkCssStyleChange *change)
{
  GTK_WIDGET_CLASS (hl_picture_view_parent_class)->css_changed (widget, change);
  gtk_widget_queue_draw (widget);
}

static void
hl_picture_view_dispose (GObject *object)
{
  HlPictureView *self = HL_PICTURE_VIEW (object);

  if (self->session != NULL)
    g_signal_handlers_disconnect_by_data (self->session, self);
  g_clear_object (&self->session);
  G_OBJECT_CLASS (hl_picture_view_parent_class)->dispose (object);
}

static void
hl_picture_view_class_init (HlPictureViewClass *klass)
{
  GtkWidgetClass *widget_class = GTK_WIDGET_CLASS (klass);

  G_OBJECT_CLASS (klass)->dispose = hl_picture_view_dispose;
  widget_class->snapshot = hl_picture_view_snapshot;
  widget_class->measure = hl_picture_view_measure;
  widget_class->css_changed = hl_picture_view_css_changed;
  gtk_widget_class_set_css_name (widget_class, "pictureview");
  gtk_widget_class_set_accessible_role (widget_class, GTK_ACCESSIBLE_ROLE_IMG);
}

static void
hl_picture_view_init (HlPictureView *self)
{
  gtk_widget_set_overflow (GTK_WIDGET (self), GTK_OVERFLOW_HIDDEN);
}

static GtkWidget *
view_new (HlSession *session, gboolean shows_bands, const char *label)
{
  HlPictureView *self = g_object_new (HL_TYPE_PICTURE_VIEW, NULL);

  self->session = g_object_ref (session);
  self->shows_bands = shows_bands;
  hl_pane_set_accessible (GTK_WIDGET (self), label, NULL);
  g_signal_connect_swapped (session, "changed", G_CALLBACK (gtk_widget_queue_draw), self);
  g_signal_connect_swapped (session, "selection-changed", G_CALLBACK (gtk_widget_queue_draw), self);
  return GTK_WIDGET (self);
}

GtkWidget *
hl_heat_view_new (HlSession *session)
{
  return view_new (session, FALSE, _("Temperature over heat of the selected exchanger, or of all"));
}

GtkWidget *
hl_bands_view_new (HlSession *session)
{
  return view_new (session, TRUE, _("Energy bands"));
}
