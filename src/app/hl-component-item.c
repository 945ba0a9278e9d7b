/* A component on the canvas.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-component-item.h"
#include "app/hl-appearance.h"
#include "draw/symbols.h"
#include "plant/i18n.h"

#define MARGIN 12.0       /* round the symbol's box, for the selection frame [px] */
#define FRAME   3.0       /* selection frame outside the symbol's box */

struct _HlComponentItem {
  GtkWidget    parent_instance;
  HlComponent *component;
  char        *description;
  gboolean     is_selected, is_lit;
};

G_DEFINE_FINAL_TYPE (HlComponentItem, hl_component_item, GTK_TYPE_WIDGET)

static void
half_size (HlComponentItem *self, double *half_width, double *half_height)
{
  int w = 0, h = 0;
  if (self->component != NULL)
    hl_component_half_size (self->component, &w, &h);
  *half_width = w * HL_UNIT;
  *half_height = h * HL_UNIT;
}

static void
rounded_box (cairo_t *cr, double x, double y, double width, double height, double r)
{
  cairo_new_sub_path (cr);
  cairo_arc (cr, x + width - r, y + r, r, -G_PI / 2, 0);
  cairo_arc (cr, x + width - r, y + height - r, r, 0, G_PI / 2);
  cairo_arc (cr, x + r, y + height - r, r, G_PI / 2, G_PI);
  cairo_arc (cr, x + r, y + r, r, G_PI, 3 * G_PI / 2);
  cairo_close_path (cr);
}

static void
draw_frame (cairo_t *cr, HlComponentItem *self, const HlTheme *theme)
{
  double hw, hh;
  half_size (self, &hw, &hh);
  rounded_box (cr, -hw - FRAME, -hh - FRAME, 2 * (hw + FRAME), 2 * (hh + FRAME), 7);
  cairo_set_source_rgba (cr, theme->accent.r, theme->accent.g, theme->accent.b, self->is_selected ? 0.09 : 0.05);
  cairo_fill_preserve (cr);
  hl_set_colour (cr, &theme->accent);
  cairo_set_line_width (cr, self->is_selected ? 1.75 : 1.25);
  if (!self->is_selected)
    cairo_set_dash (cr, (double[]) { 3, 3 }, 2, 0);
  cairo_stroke (cr);
}

static void
hl_component_item_snapshot (GtkWidget *widget, GtkSnapshot *snapshot)
{
  HlComponentItem *self = HL_COMPONENT_ITEM (widget);
  double width = gtk_widget_get_width (widget), height = gtk_widget_get_height (widget);
  cairo_t *cr;
  if (self->component == NULL)
    return;
  cr = gtk_snapshot_append_cairo (snapshot, &GRAPHENE_RECT_INIT (0, 0, width, height));
  cairo_translate (cr, width / 2, height / 2);
  if (self->is_selected || self->is_lit)
    draw_frame (cr, self, hl_appearance_theme ());
  hl_draw_symbol (cr, hl_appearance_theme (), self->component);
  cairo_destroy (cr);
}

static void
hl_component_item_measure (GtkWidget *widget, GtkOrientation orientation, int for_size, int *minimum, int *natural,
                           int *minimum_baseline, int *natural_baseline)
{
  graphene_rect_t box;
  hl_component_item_box (HL_COMPONENT_ITEM (widget), &box);
  *minimum = *natural = orientation == GTK_ORIENTATION_HORIZONTAL ? box.size.width : box.size.height;
}

/* The margin is for drawing only: it must not catch what lies beside the symbol. */
static gboolean
hl_component_item_contains (GtkWidget *widget, double x, double y)
{
  double hw, hh;
  half_size (HL_COMPONENT_ITEM (widget), &hw, &hh);
  return ABS (x - gtk_widget_get_width (widget) / 2.0) <= hw + 3 && ABS (y - gtk_widget_get_height (widget) / 2.0) <= hh + 3;
}

static gboolean
hl_component_item_focus (GtkWidget *widget, GtkDirectionType direction)
{
  if (gtk_widget_has_focus (widget))
    return FALSE;
  return gtk_widget_grab_focus (widget);
}

static void
hl_component_item_css_changed (GtkWidget *widget, GtkCssStyleChange *change)
{
  GTK_WIDGET_CLASS (hl_component_item_parent_class)->css_changed (widget, change);
  gtk_widget_queue_draw (widget);
}

static void
hl_component_item_finalize (GObject *object)
{
  HlComponentItem *self = HL_COMPONENT_ITEM (object);
  g_clear_pointer (&self->component, hl_component_unref);
  g_clear_pointer (&self->description, g_free);
  G_OBJECT_CLASS (hl_component_item_parent_class)->finalize (object);
}

static void
hl_component_item_init (HlComponentItem *self)
{
  gtk_widget_set_focusable (GTK_WIDGET (self), TRUE);
}

static void
hl_component_item_class_init (HlComponentItemClass *class)
{
  GtkWidgetClass *widget = GTK_WIDGET_CLASS (class);
  G_OBJECT_CLASS (class)->finalize = hl_component_item_finalize;
  widget->snapshot = hl_component_item_snapshot;
  widget->measure = hl_component_item_measure;
  widget->contains = hl_component_item_contains;
  widget->focus = hl_component_item_focus;
  widget->css_changed = hl_component_item_css_changed;
  gtk_widget_class_set_css_name (widget, "component");
  gtk_widget_class_set_accessible_role (widget, GTK_ACCESSIBLE_ROLE_IMG);
}

GtkWidget *
hl_component_item_new (void)
{
  return g_object_new (HL_TYPE_COMPONENT_ITEM, NULL);
}

static void
update_accessible (HlComponentItem *self)
{
  const HlComponent *component = self->component;
  gboolean has_name = component->name != NULL && *component->name != '\0';
  g_autofree char *label = g_strdup_printf (has_name ? "%s %s, %s" : "%s %s", component->id, _(component->kind->name), component->name);
  gtk_accessible_update_property (GTK_ACCESSIBLE (self), GTK_ACCESSIBLE_PROPERTY_LABEL, label,
                                  GTK_ACCESSIBLE_PROPERTY_DESCRIPTION, self->description != NULL ? self->description : "", -1);
}

void
hl_component_item_show (HlComponentItem *self, const HlComponent *component, const char *description, gboolean is_selected)
{
  /* Components never change once shared: another pointer is the only way to another look. */
  gboolean is_other = self->component != component;
  gboolean is_redescribed = g_strcmp0 (self->description, description) != 0;

  if (is_other)
    {
      HlComponent *next = hl_component_ref ((HlComponent *) component);
      g_clear_pointer (&self->component, hl_component_unref);
      self->component = next;
      gtk_widget_queue_resize (GTK_WIDGET (self));
    }
  if (is_redescribed)
    {
      g_free (self->description);
      self->description = g_strdup (description);
    }
  if (is_other || is_redescribed)
    update_accessible (self);
  if (is_selected != self->is_selected)
    {
      self->is_selected = is_selected;
      gtk_accessible_update_state (GTK_ACCESSIBLE (self), GTK_ACCESSIBLE_STATE_SELECTED, is_selected, -1);
      gtk_widget_queue_draw (GTK_WIDGET (self));
    }
  if (is_other)
    gtk_widget_queue_draw (GTK_WIDGET (self));
}

void
hl_component_item_set_lit (HlComponentItem *self, gboolean is_lit)
{
  if (is_lit == self->is_lit)
    return;
  self->is_lit = is_lit;
  gtk_widget_queue_draw (GTK_WIDGET (self));
}

const char *
hl_component_item_id (HlComponentItem *self)
{
  return self->component != NULL ? self->component->id : NULL;
}

void
hl_component_item_box (HlComponentItem *self, graphene_rect_t *box)
{
  double hw, hh;
  half_size (self, &hw, &hh);
  if (self->component == NULL)
    *box = GRAPHENE_RECT_INIT (0, 0, 0, 0);
  else
    *box = GRAPHENE_RECT_INIT (self->component->x * HL_UNIT - hw - MARGIN, self->component->y * HL_UNIT - hh - MARGIN,
                               2 * (hw + MARGIN), 2 * (hh + MARGIN));
}
