/* Pages of the diagram area that are drawn anew as a whole: heat diagram of the selection, bands of the plant.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-picture-view.h"
#include "app/hl-appearance.h"
#include "app/hl-pane.h"
#include "draw/bands.h"
#include "draw/exergy-bars.h"
#include "draw/heat-diagram.h"
#include "plant/i18n.h"

struct _HlPictureView {
  GtkWidget  parent_instance;
  HlSession *session;
  GtkWidget *chooser;        /* of the bands page; NULL: heat */
};

#define CHOOSER_MARGIN 8

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

static HlBandsPage
chosen_page (HlPictureView *self)
{
  return (HlBandsPage) gtk_drop_down_get_selected (GTK_DROP_DOWN (self->chooser));
}

/* The chooser stands at the right of the title. */
static void
draw_bands (HlPictureView *self, cairo_t *cr, HlSolution *solution, gboolean is_stale, int width, int height)
{
  HlUnitSet units = hl_plant_units (hl_solution_plant (solution));
  double clear = gtk_widget_get_width (self->chooser) + 2.0 * CHOOSER_MARGIN;

  if (chosen_page (self) == HL_BANDS_PAGE_BARS)
    {
      g_autoptr (HlExergyBars) bars = hl_exergy_bars_new (solution, units, width, height);
      hl_exergy_bars_keep_clear (bars, clear);
      hl_exergy_bars_draw (bars, cr, hl_appearance_theme (), is_stale);
      return;
    }
  g_autoptr (HlBandsPicture) picture = hl_bands_picture_new_of (solution, chosen_page (self) == HL_BANDS_PAGE_EXERGY ? HL_BANDS_EXERGY : HL_BANDS_ENERGY,
                                                                units, width, height);
  hl_bands_picture_keep_clear (picture, clear);
  hl_bands_picture_draw (picture, cr, hl_appearance_theme (), is_stale);
}

static void
draw (HlPictureView *self, cairo_t *cr, int width, int height)
{
  gboolean is_stale;
  HlSolution *solution = solution_to_show (self, &is_stale);
  HlUnitSet units = hl_plant_units (hl_solution_plant (solution));

  if (self->chooser != NULL)
    draw_bands (self, cr, solution, is_stale, width, height);
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
  if (HL_PICTURE_VIEW (widget)->chooser != NULL)
    gtk_widget_snapshot_child (widget, HL_PICTURE_VIEW (widget)->chooser, snapshot);
}

static void
hl_picture_view_size_allocate (GtkWidget *widget, int width, G_GNUC_UNUSED int height, G_GNUC_UNUSED int baseline)
{
  HlPictureView *self = HL_PICTURE_VIEW (widget);
  GtkRequisition size;

  if (self->chooser == NULL)
    return;
  gtk_widget_get_preferred_size (self->chooser, NULL, &size);
  gtk_widget_size_allocate (self->chooser, &(GtkAllocation) { MAX (0, width - size.width - CHOOSER_MARGIN), CHOOSER_MARGIN, size.width, size.height }, -1);
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
  g_clear_pointer (&self->chooser, gtk_widget_unparent);
  G_OBJECT_CLASS (hl_picture_view_parent_class)->dispose (object);
}

static void
hl_picture_view_class_init (HlPictureViewClass *klass)
{
  GtkWidgetClass *widget_class = GTK_WIDGET_CLASS (klass);

  G_OBJECT_CLASS (klass)->dispose = hl_picture_view_dispose;
  widget_class->snapshot = hl_picture_view_snapshot;
  widget_class->measure = hl_picture_view_measure;
  widget_class->size_allocate = hl_picture_view_size_allocate;
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
view_new (HlSession *session, const char *label)
{
  HlPictureView *self = g_object_new (HL_TYPE_PICTURE_VIEW, NULL);

  self->session = g_object_ref (session);
  hl_pane_set_accessible (GTK_WIDGET (self), label, NULL);
  g_signal_connect_swapped (session, "changed", G_CALLBACK (gtk_widget_queue_draw), self);
  g_signal_connect_swapped (session, "selection-changed", G_CALLBACK (gtk_widget_queue_draw), self);
  return GTK_WIDGET (self);
}

GtkWidget *
hl_heat_view_new (HlSession *session)
{
  return view_new (session, _("Temperature over heat of the selected exchanger, or of all"));
}

GtkWidget *
hl_bands_view_new (HlSession *session)
{
  const char *const pages[] = { _("Energy"), _("Exergy"), _("Exergy, bars"), NULL };
  GtkWidget *view = view_new (session, _("Energy and exergy of the plant"));
  HlPictureView *self = HL_PICTURE_VIEW (view);

  self->chooser = gtk_drop_down_new_from_strings (pages);
  hl_pane_set_accessible (self->chooser, _("What the picture shows"), NULL);
  gtk_widget_set_tooltip_text (self->chooser, _("What the picture shows"));
  gtk_widget_set_parent (self->chooser, view);
  g_signal_connect_swapped (self->chooser, "notify::selected", G_CALLBACK (gtk_widget_queue_draw), view);
  return view;
}

void
hl_bands_view_show (HlPictureView *self, HlBandsPage page)
{
  g_return_if_fail (HL_IS_PICTURE_VIEW (self) && self->chooser != NULL);
  gtk_drop_down_set_selected (GTK_DROP_DOWN (self->chooser), page);
}
