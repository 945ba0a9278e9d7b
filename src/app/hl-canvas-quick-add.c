/* A component by typing its name at the pointer: a box with a search over all kinds.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-canvas-private.h"
#include "app/hl-appearance.h"
#include "app/hl-trace.h"
#include "draw/symbols.h"
#include "plant/i18n.h"

#define LIST_HEIGHT 228
#define SYMBOL_SIZE 22

typedef struct {
  HlCanvas  *canvas;
  GtkWidget *popover, *entry, *list;
  double     vx, vy;             /* where the component goes */
} QuickAdd;

/* How well a kind fits what was typed: 0 not at all; the beginning of a word counts more than its middle. */
static int
fit_of (const char *name, const char *typed)
{
  g_autofree char *low_name = g_utf8_casefold (name, -1), *low = g_utf8_casefold (typed, -1);
  const char *found = strstr (low_name, low);
  if (*low == '\0')
    return 1;
  if (found == NULL)
    return 0;
  return found == low_name ? 3 : found[-1] == ' ' || found[-1] == '-' ? 2 : 1;
}

static const HlKind *
kind_of (GtkListBoxRow *row)
{
  return g_object_get_data (G_OBJECT (row), "kind");
}

static int
fit_of_row (GtkListBoxRow *row, const QuickAdd *self)
{
  g_autofree char *typed = g_strstrip (g_strdup (gtk_editable_get_text (GTK_EDITABLE (self->entry))));
  const HlKind *kind = kind_of (row);
  int by_shelf = fit_of (_(kind->shelf_name), typed), by_name = fit_of (_(kind->name), typed), by_id = fit_of (kind->id, typed);
  return MAX (MAX (by_shelf, by_name), by_id);
}

static gboolean
filter_cb (GtkListBoxRow *row, gpointer data)
{
  return fit_of_row (row, data) > 0;
}

static int
sort_cb (GtkListBoxRow *a, GtkListBoxRow *b, gpointer data)
{
  int by_fit = fit_of_row (b, data) - fit_of_row (a, data);
  guint place_a = GPOINTER_TO_UINT (g_object_get_data (G_OBJECT (a), "place")), place_b = GPOINTER_TO_UINT (g_object_get_data (G_OBJECT (b), "place"));
  return by_fit != 0 ? by_fit : (int) place_a - (int) place_b;
}

static GtkListBoxRow *
first_shown (const QuickAdd *self)
{
  for (GtkWidget *row = gtk_widget_get_first_child (self->list); row != NULL; row = gtk_widget_get_next_sibling (row))
    if (GTK_IS_LIST_BOX_ROW (row) && gtk_widget_get_child_visible (row))
      return GTK_LIST_BOX_ROW (row);
  return NULL;
}

static void
typed_cb (QuickAdd *self)
{
  gtk_list_box_invalidate_filter (GTK_LIST_BOX (self->list));
  gtk_list_box_invalidate_sort (GTK_LIST_BOX (self->list));
  gtk_list_box_select_row (GTK_LIST_BOX (self->list), first_shown (self));
}

static void
take (QuickAdd *self, GtkListBoxRow *row)
{
  HlCanvas *canvas = self->canvas;
  const HlKind *kind = row != NULL ? kind_of (row) : NULL;
  double vx = self->vx, vy = self->vy;
  if (kind == NULL)
    {
      gtk_widget_error_bell (self->entry);
      return;
    }
  gtk_popover_popdown (GTK_POPOVER (self->popover));
  hl_canvas_put (canvas, kind, vx, vy);
}

static void
row_activated_cb (GtkListBox *list, GtkListBoxRow *row, QuickAdd *self)
{
  take (self, row);
}

static void
entered_cb (QuickAdd *self)
{
  GtkListBoxRow *chosen = gtk_list_box_get_selected_row (GTK_LIST_BOX (self->list));
  take (self, chosen != NULL ? chosen : first_shown (self));
}

/* Up and down choose in the list while the entry keeps the focus. */
static gboolean
key_cb (GtkEventControllerKey *keys, guint key, guint code, GdkModifierType state, QuickAdd *self)
{
  GtkListBoxRow *row = gtk_list_box_get_selected_row (GTK_LIST_BOX (self->list));
  GtkWidget *next = row != NULL ? GTK_WIDGET (row) : NULL;
  if (key != GDK_KEY_Down && key != GDK_KEY_Up)
    return FALSE;
  do
    next = next == NULL ? NULL : key == GDK_KEY_Down ? gtk_widget_get_next_sibling (next) : gtk_widget_get_prev_sibling (next);
  while (next != NULL && !gtk_widget_get_child_visible (next));
  if (next != NULL)
    {
      gtk_list_box_select_row (GTK_LIST_BOX (self->list), GTK_LIST_BOX_ROW (next));
      /* The list scrolls to its focused row; the entry takes the focus back and goes on being typed into. */
      gtk_widget_grab_focus (next);
      gtk_entry_grab_focus_without_selecting (GTK_ENTRY (self->entry));
      gtk_editable_set_position (GTK_EDITABLE (self->entry), -1);
    }
  return TRUE;
}

static void
draw_symbol_cb (GtkDrawingArea *area, cairo_t *cr, int width, int height, gpointer kind)
{
  cairo_translate (cr, width / 2.0, height / 2.0);
  hl_draw_kind (cr, hl_appearance_theme (), kind, SYMBOL_SIZE);
}

static GtkWidget *
row_new (const HlKind *kind, guint place)
{
  GtkWidget *row = gtk_list_box_row_new (), *box = gtk_box_new (GTK_ORIENTATION_HORIZONTAL, 8), *symbol = gtk_drawing_area_new ();
  GtkWidget *name = gtk_label_new (_(kind->name)), *group = gtk_label_new (_(kind->shelf_group));
  gtk_drawing_area_set_content_width (GTK_DRAWING_AREA (symbol), SYMBOL_SIZE + 4);
  gtk_drawing_area_set_content_height (GTK_DRAWING_AREA (symbol), SYMBOL_SIZE + 4);
  gtk_drawing_area_set_draw_func (GTK_DRAWING_AREA (symbol), draw_symbol_cb, (gpointer) kind, NULL);
  gtk_label_set_xalign (GTK_LABEL (name), 0.0f);
  gtk_widget_set_hexpand (name, TRUE);
  gtk_widget_add_css_class (group, "quiet");
  gtk_box_append (GTK_BOX (box), symbol);
  gtk_box_append (GTK_BOX (box), name);
  gtk_box_append (GTK_BOX (box), group);
  gtk_list_box_row_set_child (GTK_LIST_BOX_ROW (row), box);
  gtk_accessible_update_property (GTK_ACCESSIBLE (row), GTK_ACCESSIBLE_PROPERTY_LABEL, _(kind->name), -1);
  g_object_set_data (G_OBJECT (row), "kind", (gpointer) kind);
  g_object_set_data (G_OBJECT (row), "place", GUINT_TO_POINTER (place));
  return row;
}

static void
fill_popover (QuickAdd *self)
{
  GtkWidget *box = gtk_box_new (GTK_ORIENTATION_VERTICAL, 6), *scroll = gtk_scrolled_window_new ();
  GtkEventController *keys = gtk_event_controller_key_new ();

  self->entry = gtk_entry_new ();
  gtk_entry_set_placeholder_text (GTK_ENTRY (self->entry), _("Name of a component"));
  gtk_accessible_update_property (GTK_ACCESSIBLE (self->entry), GTK_ACCESSIBLE_PROPERTY_LABEL, _("Name of the component to add"), -1);
  self->list = gtk_list_box_new ();
  gtk_list_box_set_filter_func (GTK_LIST_BOX (self->list), filter_cb, self, NULL);
  gtk_list_box_set_sort_func (GTK_LIST_BOX (self->list), sort_cb, self, NULL);
  for (guint n = 0; n < hl_kind_count (); n++)
    gtk_list_box_append (GTK_LIST_BOX (self->list), row_new (hl_kind_nth (n), n));
  gtk_scrolled_window_set_policy (GTK_SCROLLED_WINDOW (scroll), GTK_POLICY_NEVER, GTK_POLICY_AUTOMATIC);
  gtk_widget_set_size_request (scroll, 300, LIST_HEIGHT);
  gtk_scrolled_window_set_child (GTK_SCROLLED_WINDOW (scroll), self->list);
  gtk_box_append (GTK_BOX (box), self->entry);
  gtk_box_append (GTK_BOX (box), scroll);
  gtk_popover_set_child (GTK_POPOVER (self->popover), box);
  gtk_widget_add_css_class (self->popover, "quick-add");

  g_signal_connect_swapped (self->entry, "changed", G_CALLBACK (typed_cb), self);
  g_signal_connect_swapped (self->entry, "activate", G_CALLBACK (entered_cb), self);
  g_signal_connect (self->list, "row-activated", G_CALLBACK (row_activated_cb), self);
  gtk_event_controller_set_propagation_phase (keys, GTK_PHASE_CAPTURE);
  g_signal_connect (keys, "key-pressed", G_CALLBACK (key_cb), self);
  gtk_widget_add_controller (self->entry, keys);
}

static void
ask_at (HlCanvas *canvas, double vx, double vy)
{
  QuickAdd *self = g_new0 (QuickAdd, 1);
  self->canvas = canvas;
  self->vx = vx;
  self->vy = vy;
  self->popover = gtk_popover_new ();
  g_object_set_data_full (G_OBJECT (self->popover), "quick-add", self, g_free);
  fill_popover (self);
  hl_canvas_set_popover (canvas, self->popover, vx, vy);
  gtk_widget_grab_focus (self->entry);
  typed_cb (self);
  hl_trace ("quick-add");
}

void
hl_canvas_quick_add (HlCanvas *self)
{
  int width = gtk_widget_get_width (GTK_WIDGET (self)), height = gtk_widget_get_height (GTK_WIDGET (self));
  gboolean is_over = self->last_x > 0 && self->last_y > 0 && self->last_x < width && self->last_y < height;
  ask_at (self, is_over ? self->last_x : width / 2.0, is_over ? self->last_y : height / 2.0);
}

static gboolean
key_asks_cb (GtkWidget *widget, GVariant *arguments, gpointer data)
{
  hl_canvas_quick_add (HL_CANVAS (widget));
  return TRUE;
}

static void
pressed_cb (GtkGestureClick *click, int n_press, double vx, double vy, HlCanvas *self)
{
  HlPortRef port;
  if (n_press != 2 || hl_canvas_component_at (self, vx, vy) != NULL || hl_canvas_label_at (self, vx, vy) >= 0
      || hl_canvas_port_at (self, vx, vy, &port))
    return;
  ask_at (self, vx, vy);
}

void
hl_canvas_add_quick_add (HlCanvas *self)
{
  static const guint keys[] = { GDK_KEY_slash, GDK_KEY_KP_Divide, GDK_KEY_Insert };
  GtkEventController *controller = gtk_shortcut_controller_new ();
  GtkGesture *click = gtk_gesture_click_new ();
  for (guint n = 0; n < G_N_ELEMENTS (keys); n++)
    gtk_shortcut_controller_add_shortcut (GTK_SHORTCUT_CONTROLLER (controller),
                                          gtk_shortcut_new (gtk_keyval_trigger_new (keys[n], 0), gtk_callback_action_new (key_asks_cb, NULL, NULL)));
  gtk_widget_add_controller (GTK_WIDGET (self), controller);
  gtk_gesture_single_set_button (GTK_GESTURE_SINGLE (click), GDK_BUTTON_PRIMARY);
  g_signal_connect (click, "released", G_CALLBACK (pressed_cb), self);
  gtk_widget_add_controller (GTK_WIDGET (self), GTK_EVENT_CONTROLLER (click));
}
