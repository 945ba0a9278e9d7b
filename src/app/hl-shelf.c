/* The strip that components are taken from.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-shelf.h"
#include "app/compat.h"
#include "app/hl-appearance.h"
#include "app/hl-trace.h"
#include "draw/symbols.h"
#include "plant/i18n.h"

#define SYMBOL_SIZE 32
#define COLUMNS 2

/* One kind: its symbol over its word */

#define HL_TYPE_SHELF_ITEM (hl_shelf_item_get_type ())
G_DECLARE_FINAL_TYPE (HlShelfItem, hl_shelf_item, HL, SHELF_ITEM, GtkWidget)

struct _HlShelfItem {
  GtkWidget     parent_instance;
  const HlKind *kind;
  GtkWidget    *label;
};

G_DEFINE_FINAL_TYPE (HlShelfItem, hl_shelf_item, GTK_TYPE_WIDGET)

static void
draw_kind (GtkSnapshot *snapshot, const HlKind *kind, double x, double y, double size)
{
  graphene_rect_t bounds = GRAPHENE_RECT_INIT (x, y, size, size);
  cairo_t *cr = gtk_snapshot_append_cairo (snapshot, &bounds);
  cairo_translate (cr, x + size / 2, y + size / 2);
  hl_draw_kind (cr, hl_appearance_theme (), kind, size - 2);
  cairo_destroy (cr);
}

static void
add_to_plant (GtkWidget *widget)
{
  gtk_widget_activate_action (widget, "win.add-component", "s", HL_SHELF_ITEM (widget)->kind->id);
}

static gboolean
add_key_cb (GtkWidget *widget, GVariant *arguments, gpointer data)
{
  add_to_plant (widget);
  return TRUE;
}

static void
released_cb (GtkGestureClick *gesture, int n_press, double x, double y, gpointer data)
{
  gtk_widget_grab_focus (GTK_WIDGET (data));
  if (n_press == 2)
    add_to_plant (GTK_WIDGET (data));
}

static GdkContentProvider *
drag_prepare_cb (GtkDragSource *source, double x, double y, gpointer data)
{
  g_autofree char *text = g_strconcat (HL_SHELF_DRAG_PREFIX, HL_SHELF_ITEM (data)->kind->id, NULL);
  return gdk_content_provider_new_typed (G_TYPE_STRING, text);
}

static void
drag_begin_cb (GtkDragSource *source, GdkDrag *drag, gpointer data)
{
  GtkSnapshot *snapshot = gtk_snapshot_new ();
  GdkPaintable *icon;
  draw_kind (snapshot, HL_SHELF_ITEM (data)->kind, 0, 0, 44);
  icon = gtk_snapshot_free_to_paintable (snapshot, &GRAPHENE_SIZE_INIT (44, 44));
  gtk_drag_source_set_icon (source, icon, 22, 22);
  g_object_unref (icon);
}

static void
hl_shelf_item_measure (GtkWidget *widget, GtkOrientation orientation, int for_size, int *minimum, int *natural,
                       int *minimum_baseline, int *natural_baseline)
{
  HlShelfItem *self = HL_SHELF_ITEM (widget);
  gtk_widget_measure (self->label, orientation, for_size, minimum, natural, NULL, NULL);
  if (orientation == GTK_ORIENTATION_HORIZONTAL)
    {
      *minimum = MAX (*minimum, SYMBOL_SIZE);
      *natural = MAX (*natural, SYMBOL_SIZE);
    }
  else
    {
      *minimum += SYMBOL_SIZE + 1;
      *natural += SYMBOL_SIZE + 1;
    }
}

/* A long word takes a second line. */
static GtkSizeRequestMode
hl_shelf_item_get_request_mode (GtkWidget *widget)
{
  return GTK_SIZE_REQUEST_HEIGHT_FOR_WIDTH;
}

static void
hl_shelf_item_size_allocate (GtkWidget *widget, int width, int height, int baseline)
{
  GskTransform *down = gsk_transform_translate (NULL, &GRAPHENE_POINT_INIT (0, SYMBOL_SIZE + 1));
  gtk_widget_allocate (HL_SHELF_ITEM (widget)->label, width, MAX (0, height - SYMBOL_SIZE - 1), -1, down);
}

static void
hl_shelf_item_snapshot (GtkWidget *widget, GtkSnapshot *snapshot)
{
  HlShelfItem *self = HL_SHELF_ITEM (widget);
  draw_kind (snapshot, self->kind, (gtk_widget_get_width (widget) - SYMBOL_SIZE) / 2.0, 0, SYMBOL_SIZE);
  gtk_widget_snapshot_child (widget, self->label, snapshot);
}

static void
hl_shelf_item_css_changed (GtkWidget *widget, GtkCssStyleChange *change)
{
  GTK_WIDGET_CLASS (hl_shelf_item_parent_class)->css_changed (widget, change);
  gtk_widget_queue_draw (widget);
}

static void
hl_shelf_item_dispose (GObject *object)
{
  g_clear_pointer (&HL_SHELF_ITEM (object)->label, gtk_widget_unparent);
  G_OBJECT_CLASS (hl_shelf_item_parent_class)->dispose (object);
}

static void
hl_shelf_item_init (HlShelfItem *self)
{
  GtkGesture *click = gtk_gesture_click_new ();
  GtkDragSource *drag = gtk_drag_source_new ();

  self->label = gtk_label_new (NULL);
  gtk_label_set_wrap (GTK_LABEL (self->label), TRUE);
  gtk_label_set_justify (GTK_LABEL (self->label), GTK_JUSTIFY_CENTER);
  gtk_widget_set_parent (self->label, GTK_WIDGET (self));
  gtk_widget_set_focusable (GTK_WIDGET (self), TRUE);
  g_signal_connect (click, "released", G_CALLBACK (released_cb), self);
  gtk_widget_add_controller (GTK_WIDGET (self), GTK_EVENT_CONTROLLER (click));
  g_signal_connect (drag, "prepare", G_CALLBACK (drag_prepare_cb), self);
  g_signal_connect (drag, "drag-begin", G_CALLBACK (drag_begin_cb), self);
  gtk_widget_add_controller (GTK_WIDGET (self), GTK_EVENT_CONTROLLER (drag));
}

static void
hl_shelf_item_class_init (HlShelfItemClass *class)
{
  GtkWidgetClass *widget = GTK_WIDGET_CLASS (class);
  G_OBJECT_CLASS (class)->dispose = hl_shelf_item_dispose;
  widget->measure = hl_shelf_item_measure;
  widget->get_request_mode = hl_shelf_item_get_request_mode;
  widget->size_allocate = hl_shelf_item_size_allocate;
  widget->snapshot = hl_shelf_item_snapshot;
  widget->css_changed = hl_shelf_item_css_changed;
  gtk_widget_class_set_css_name (widget, "shelfitem");
  gtk_widget_class_set_accessible_role (widget, GTK_ACCESSIBLE_ROLE_BUTTON);
  gtk_widget_class_add_binding (widget, GDK_KEY_Return, 0, add_key_cb, NULL);
  gtk_widget_class_add_binding (widget, GDK_KEY_KP_Enter, 0, add_key_cb, NULL);
  gtk_widget_class_add_binding (widget, GDK_KEY_space, 0, add_key_cb, NULL);
}

static GtkWidget *
shelf_item_new (const HlKind *kind)
{
  HlShelfItem *self = g_object_new (HL_TYPE_SHELF_ITEM, NULL);
  g_autofree char *tip = g_strdup_printf ("%s\n%s", _(kind->name), _(kind->help));
  self->kind = kind;
  gtk_label_set_text (GTK_LABEL (self->label), _(kind->shelf_name));
  hl_compat_set_tip (GTK_WIDGET (self), tip);
  gtk_accessible_update_property (GTK_ACCESSIBLE (self), GTK_ACCESSIBLE_PROPERTY_LABEL, _(kind->name),
                                  GTK_ACCESSIBLE_PROPERTY_DESCRIPTION, _(kind->help), -1);
  return GTK_WIDGET (self);
}

/* The strip */

struct _HlShelf {
  GtkWidget  parent_instance;
  GtkWidget *scrolled;
};

G_DEFINE_FINAL_TYPE (HlShelf, hl_shelf, GTK_TYPE_WIDGET)

static GtkWidget *
group_heading (const char *text)
{
  g_autofree char *upper = g_utf8_strup (text, -1);
  GtkWidget *label = gtk_label_new (upper);
  gtk_label_set_xalign (GTK_LABEL (label), 0.0f);
  gtk_widget_add_css_class (label, "shelf-heading");
  gtk_accessible_update_property (GTK_ACCESSIBLE (label), GTK_ACCESSIBLE_PROPERTY_LABEL, text, -1);
  return label;
}

static GtkWidget *
fill (void)
{
  GtkWidget *box = gtk_box_new (GTK_ORIENTATION_VERTICAL, 0), *grid = NULL;
  const char *group = NULL;
  int place = 0;

  gtk_widget_add_css_class (box, "shelf");
  for (guint n = 0; n < hl_kind_count (); n++)
    {
      const HlKind *kind = hl_kind_nth (n);
      if (g_strcmp0 (group, kind->shelf_group) != 0)
        {
          group = kind->shelf_group;
          place = 0;
          grid = gtk_grid_new ();
          gtk_grid_set_column_homogeneous (GTK_GRID (grid), TRUE);
          gtk_box_append (GTK_BOX (box), group_heading (_(group)));
          gtk_box_append (GTK_BOX (box), grid);
        }
      gtk_grid_attach (GTK_GRID (grid), shelf_item_new (kind), place % COLUMNS, place / COLUMNS, 1, 1);
      place++;
      if (place == 1)     /* keeps a lone item in its own column */
        gtk_grid_attach (GTK_GRID (grid), gtk_box_new (GTK_ORIENTATION_HORIZONTAL, 0), 1, 100, 1, 1);
    }
  return box;
}

static void
trace_places (HlShelf *self, GtkWidget *widget)
{
  for (GtkWidget *child = gtk_widget_get_first_child (widget); child != NULL; child = gtk_widget_get_next_sibling (child))
    {
      if (HL_IS_SHELF_ITEM (child))
        hl_trace_place ("shelf", HL_SHELF_ITEM (child)->kind->id, child, gtk_widget_get_width (child) / 2.0, SYMBOL_SIZE / 2.0);
      else
        trace_places (self, child);
    }
}

static gboolean
trace_cb (gpointer data)
{
  trace_places (HL_SHELF (data), GTK_WIDGET (data));
  return G_SOURCE_REMOVE;
}

static void
hl_shelf_map (GtkWidget *widget)
{
  GTK_WIDGET_CLASS (hl_shelf_parent_class)->map (widget);
  if (hl_trace_is_on ())
    g_timeout_add_full (G_PRIORITY_DEFAULT, 200, trace_cb, g_object_ref (widget), g_object_unref);
}

static void
hl_shelf_dispose (GObject *object)
{
  g_clear_pointer (&HL_SHELF (object)->scrolled, gtk_widget_unparent);
  G_OBJECT_CLASS (hl_shelf_parent_class)->dispose (object);
}

static void
hl_shelf_init (HlShelf *self)
{
  self->scrolled = gtk_scrolled_window_new ();
  gtk_scrolled_window_set_policy (GTK_SCROLLED_WINDOW (self->scrolled), GTK_POLICY_NEVER, GTK_POLICY_AUTOMATIC);
  gtk_scrolled_window_set_child (GTK_SCROLLED_WINDOW (self->scrolled), fill ());
  gtk_widget_set_vexpand (self->scrolled, TRUE);
  gtk_widget_set_parent (self->scrolled, GTK_WIDGET (self));
}

static void
hl_shelf_class_init (HlShelfClass *class)
{
  GtkWidgetClass *widget = GTK_WIDGET_CLASS (class);
  G_OBJECT_CLASS (class)->dispose = hl_shelf_dispose;
  widget->map = hl_shelf_map;
  gtk_widget_class_set_layout_manager_type (widget, GTK_TYPE_BIN_LAYOUT);
  gtk_widget_class_set_accessible_role (widget, GTK_ACCESSIBLE_ROLE_GROUP);
}

GtkWidget *
hl_shelf_new (void)
{
  GtkWidget *shelf = g_object_new (HL_TYPE_SHELF, NULL);
  gtk_accessible_update_property (GTK_ACCESSIBLE (shelf), GTK_ACCESSIBLE_PROPERTY_LABEL, _("Shelf of components"), -1);
  return shelf;
}
