/* The main window: places the panes, follows the session with title and size.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-window-private.h"
#include "app/compat.h"
#include "app/hl-diagram-view.h"
#include "app/hl-findings.h"
#include "app/hl-glance.h"
#include "app/hl-ledger-view.h"
#include "app/hl-picture-view.h"
#include "app/hl-nameplate.h"
#include "app/hl-quantity-row.h"
#include "app/hl-settings.h"
#include "app/hl-shelf.h"
#include "app/hl-start.h"
#include "app/hl-status-strip.h"
#include "app/hl-trace.h"
#include "app/hl-variants-view.h"
#include "plant/i18n.h"

#define AUTOSAVE_DELAY 2000       /* milliseconds after an edit */
#define GLANCE_WIDTH 262
#define GLANCE_FROM_WIDTH 740     /* the glance card needs this much in the work area, beside the diagram */

enum { PROP_SESSION = 1, N_PROPERTIES };
static GParamSpec *properties[N_PROPERTIES];

G_DEFINE_FINAL_TYPE (HlWindow, hl_window, GTK_TYPE_APPLICATION_WINDOW)

/* Where the rows of the nameplate are, for whoever drives the program from outside */

static void
trace_rows (GtkWidget *widget)
{
  for (GtkWidget *child = gtk_widget_get_first_child (widget); child != NULL; child = gtk_widget_get_next_sibling (child))
    if (HL_IS_QUANTITY_ROW (child) && gtk_widget_get_mapped (child))
      {
        g_autofree char *address = hl_address_to_text (hl_quantity_row_address (HL_QUANTITY_ROW (child)));
        hl_trace_place ("row", address, child, gtk_widget_get_width (child) * 0.62, 17);
      }
    else if (g_object_get_data (G_OBJECT (child), HL_OPTION_NAME) != NULL && gtk_widget_get_mapped (child))
      hl_trace_place ("option", g_object_get_data (G_OBJECT (child), HL_OPTION_NAME), child, 16, gtk_widget_get_height (child) / 2.0);
    else
      trace_rows (child);
}

static gboolean
trace_cb (gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  self->trace_source = 0;
  trace_rows (self->nameplate_bin);
  hl_trace ("rows");
  return G_SOURCE_REMOVE;
}

static void
trace_later (HlWindow *self)
{
  if (!hl_trace_is_on ())
    return;
  g_clear_handle_id (&self->trace_source, g_source_remove);
  self->trace_source = g_timeout_add (120, trace_cb, self);
}

/* Following the session */

static void
update_title (HlWindow *self)
{
  g_autofree char *name = hl_session_display_name (self->session);
  g_autofree char *file = NULL, *window_title = NULL;
  const char *path = hl_session_path (self->session);

  if (path != NULL)
    file = g_path_get_basename (path);
  gtk_label_set_text (self->title_label, name);
  gtk_label_set_text (self->subtitle_label, file != NULL ? file : _("not saved yet"));
  hl_compat_set_tip (GTK_WIDGET (self->subtitle_label), path);
  gtk_widget_set_visible (self->dirty_dot, hl_session_is_dirty (self->session));
  window_title = g_strdup_printf ("Heatloom – %s", name);
  gtk_window_set_title (GTK_WINDOW (self), window_title);
}

static void
update_history_tooltips (HlWindow *self)
{
  const char *undo = hl_session_undo_name (self->session), *redo = hl_session_redo_name (self->session);
  g_autofree char *undo_text = undo != NULL ? g_strdup_printf (_("Undo: %s"), undo) : g_strdup (_("Nothing to undo"));
  g_autofree char *redo_text = redo != NULL ? g_strdup_printf (_("Redo: %s"), redo) : g_strdup (_("Nothing to redo"));
  hl_compat_set_tip (GTK_WIDGET (self->undo_button), undo_text);
  hl_compat_set_tip (GTK_WIDGET (self->redo_button), redo_text);
}

static void
file_changed_cb (HlWindow *self)
{
  update_title (self);
  update_history_tooltips (self);
  hl_window_update_actions (self);     /* what needs a file */
}

static void
update_start (HlWindow *self)
{
  gboolean is_empty = hl_plant_n_components (hl_session_plant (self->session)) == 0;
  if (is_empty && self->start == NULL)
    {
      self->start = hl_start_new ();
      hl_canvas_drop_through (self->canvas, self->start);
      gtk_overlay_add_overlay (GTK_OVERLAY (self->canvas_bin), self->start);
    }
  if (self->start != NULL)
    gtk_widget_set_visible (self->start, is_empty);
}

static void
changed_cb (HlWindow *self)
{
  update_start (self);
  hl_window_update_actions (self);
  hl_window_update_variants (self);
  hl_window_update_legend (self);
  trace_later (self);
}

static void
selection_changed_cb (HlWindow *self)
{
  hl_window_update_actions (self);
  trace_later (self);
}

static void
zoom_changed_cb (HlWindow *self)
{
  g_autofree char *text = g_strdup_printf ("%.0f %%", 100.0 * hl_canvas_get_zoom (self->canvas));
  gtk_label_set_text (self->zoom_label, text);
}

/* Panes */

/* A page that is built when it is first looked at. */
static const struct { const char *name, *title; GtkWidget *(*build) (HlSession *session); } late_tabs[] = {
  { "heat", N_("Heat"), hl_heat_view_new },
  { "bands", N_("Bands"), hl_bands_view_new },
  { "ledger", N_("Ledger"), hl_ledger_view_new },
  { "variants", N_("Variants"), hl_variants_view_new },
  { "findings", N_("Findings"), hl_findings_new },
};

static void
add_tabs (HlWindow *self)
{
  gtk_stack_add_titled (self->stack, hl_diagram_view_new (self->session), "state", _("State"));
  for (guint n = 0; n < G_N_ELEMENTS (late_tabs); n++)
    gtk_stack_add_titled (self->stack, gtk_box_new (GTK_ORIENTATION_VERTICAL, 0), late_tabs[n].name, _(late_tabs[n].title));
}

static void
tab_shown_cb (HlWindow *self)
{
  const char *name = gtk_stack_get_visible_child_name (self->stack);
  GtkWidget *page = gtk_stack_get_visible_child (self->stack);
  for (guint n = 0; n < G_N_ELEMENTS (late_tabs); n++)
    if (g_strcmp0 (name, late_tabs[n].name) == 0 && gtk_widget_get_first_child (page) == NULL)
      {
        GtkWidget *content = late_tabs[n].build (self->session);
        gtk_widget_set_hexpand (content, TRUE);
        gtk_widget_set_vexpand (content, TRUE);
        gtk_box_append (GTK_BOX (page), content);
      }
}

static void
fill_panes (HlWindow *self)
{
  self->canvas = HL_CANVAS (hl_canvas_new (self->session));
  gtk_overlay_set_child (GTK_OVERLAY (self->canvas_bin), GTK_WIDGET (self->canvas));
  gtk_box_append (GTK_BOX (self->shelf_bin), hl_shelf_new ());
  gtk_box_append (GTK_BOX (self->strip_bin), hl_status_strip_new (self->session));
  gtk_box_append (GTK_BOX (self->nameplate_bin), hl_nameplate_new (self->session));
  gtk_box_append (GTK_BOX (self->glance_bin), hl_glance_new (self->session));
  add_tabs (self);
  g_signal_connect_object (self->stack, "notify::visible-child", G_CALLBACK (tab_shown_cb), self, G_CONNECT_SWAPPED);
  for (GtkWidget *bin[] = { self->strip_bin, self->nameplate_bin, self->glance_bin, NULL }, **b = bin; *b != NULL; b++)
    {
      gtk_widget_set_hexpand (gtk_widget_get_first_child (*b), TRUE);
      gtk_widget_set_vexpand (gtk_widget_get_first_child (*b), *b != self->strip_bin);
    }
  gtk_widget_set_hexpand (self->glance_bin, FALSE);     /* its width is its own, the diagram takes the rest */
  gtk_widget_set_vexpand (self->glance_bin, FALSE);
}

/* Sizes */

gboolean
hl_window_diagram_is_beside (HlWindow *self)
{
  return gtk_orientable_get_orientation (GTK_ORIENTABLE (self->work)) == GTK_ORIENTATION_HORIZONTAL;
}

static void
update_glance (HlWindow *self)
{
  gtk_widget_set_visible (self->glance_bin, hl_window_diagram_is_beside (self) || self->is_wide);
}

static gboolean
fold_cb (gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  self->fold_source = 0;
  self->is_wide = gtk_widget_get_width (GTK_WIDGET (self->work)) >= GLANCE_FROM_WIDTH;
  update_glance (self);
  return G_SOURCE_REMOVE;
}

static void
hl_window_size_allocate (GtkWidget *widget, int width, int height, int baseline)
{
  HlWindow *self = HL_WINDOW (widget);
  GTK_WIDGET_CLASS (hl_window_parent_class)->size_allocate (widget, width, height, baseline);
  if (self->fold_source == 0 && (gtk_widget_get_width (GTK_WIDGET (self->work)) >= GLANCE_FROM_WIDTH) != self->is_wide)
    self->fold_source = g_idle_add (fold_cb, self);    /* visibility must not change while sizes are given out */
}

static int
remembered (const char *key, int fallback)
{
  return MAX (100, hl_settings_get_int (key, fallback));
}

/* A paned counts from its start; what is remembered is the size of its end, which does not follow the window. */
static void
set_end_size (GtkPaned *paned, int whole, int end)
{
  gtk_paned_set_position (paned, MAX (200, whole - end));
}

static int
end_size (GtkPaned *paned)
{
  gboolean is_horizontal = gtk_orientable_get_orientation (GTK_ORIENTABLE (paned)) == GTK_ORIENTATION_HORIZONTAL;
  GtkWidget *end = gtk_paned_get_end_child (paned);
  return is_horizontal ? gtk_widget_get_width (end) : gtk_widget_get_height (end);
}

static void
remember_diagram_size (HlWindow *self)
{
  int size = end_size (self->work);
  if (size > 50)
    hl_settings_set_int (hl_window_diagram_is_beside (self) ? "diagram-beside-size" : "diagram-below-size", size);
}

/* The diagram's share of @whole pixels: what is remembered, but never so much that the canvas gets narrow. */
static int
diagram_size (gboolean is_beside, int whole)
{
  return is_beside ? MIN (remembered ("diagram-beside-size", 540), whole * 45 / 100)
                   : MIN (remembered ("diagram-below-size", 290), whole * 34 / 100);
}

/* A paned that has just been turned still reckons with its former length, so the division follows the next allocation. */
static gboolean
divide_cb (gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  gboolean is_beside = hl_window_diagram_is_beside (self);
  int whole = is_beside ? gtk_widget_get_width (GTK_WIDGET (self->work)) : gtk_widget_get_height (GTK_WIDGET (self->work));
  if (self->divide_after++ < 1)
    {
      gtk_widget_queue_allocate (GTK_WIDGET (self->work));
      self->divide_source = g_timeout_add (20, divide_cb, self);
      return G_SOURCE_REMOVE;
    }
  self->divide_after = 0;
  self->divide_source = 0;
  set_end_size (self->work, whole, diagram_size (is_beside, whole));
  return G_SOURCE_REMOVE;
}

void
hl_window_place_diagram (HlWindow *self, gboolean is_beside)
{
  GtkOrientation across = is_beside ? GTK_ORIENTATION_VERTICAL : GTK_ORIENTATION_HORIZONTAL;
  int width = gtk_widget_get_width (GTK_WIDGET (self->work));

  if (is_beside == hl_window_diagram_is_beside (self))
    return;
  if (width > 0)
    remember_diagram_size (self);
  gtk_orientable_set_orientation (GTK_ORIENTABLE (self->work), is_beside ? GTK_ORIENTATION_HORIZONTAL : GTK_ORIENTATION_VERTICAL);
  gtk_orientable_set_orientation (GTK_ORIENTABLE (self->diagram_area), across);
  gtk_widget_set_size_request (self->glance_bin, is_beside ? -1 : GLANCE_WIDTH, -1);
  if (width > 0 && self->divide_source == 0)
    self->divide_source = g_idle_add (divide_cb, self);
  hl_settings_set_bool ("diagram-beside", is_beside);
  update_glance (self);
}

/* Before the first allocation the sizes of the panes follow from the remembered size of the window. */
static void
restore_geometry (HlWindow *self)
{
  int width = remembered ("window-width", 1280), height = remembered ("window-height", 800);
  gboolean is_beside = hl_settings_get_bool ("diagram-beside", FALSE);
  int work_width, shelf = 145;

  gtk_window_set_default_size (GTK_WINDOW (self), width, height);
  if (hl_settings_get_bool ("window-maximized", FALSE))
    gtk_window_maximize (GTK_WINDOW (self));
  work_width = width - shelf - remembered ("nameplate-size", 320);
  gtk_widget_set_size_request (self->glance_bin, GLANCE_WIDTH, -1);
  hl_window_place_diagram (self, is_beside);
  gtk_paned_set_position (self->outer, work_width);
  if (is_beside)
    set_end_size (self->work, work_width, diagram_size (TRUE, work_width));
  else
    set_end_size (self->work, height - 48, diagram_size (FALSE, height - 48));
}

static void
remember_geometry (HlWindow *self)
{
  int width, height;
  gtk_window_get_default_size (GTK_WINDOW (self), &width, &height);
  hl_settings_set_bool ("window-maximized", gtk_window_is_maximized (GTK_WINDOW (self)));
  if (!gtk_window_is_maximized (GTK_WINDOW (self)) && width > 0)
    {
      hl_settings_set_int ("window-width", width);
      hl_settings_set_int ("window-height", height);
    }
  if (end_size (self->outer) > 50)
    hl_settings_set_int ("nameplate-size", end_size (self->outer));
  remember_diagram_size (self);
}

/* Life */

static void
really_close (HlWindow *self, gpointer data)
{
  self->may_close = TRUE;
  gtk_window_close (GTK_WINDOW (self));
}

static gboolean
hl_window_close_request (GtkWindow *window)
{
  HlWindow *self = HL_WINDOW (window);
  if (!self->may_close && hl_session_is_dirty (self->session))
    {
      hl_window_when_safe (self, really_close, NULL, NULL);
      return TRUE;
    }
  remember_geometry (self);
  return GTK_WINDOW_CLASS (hl_window_parent_class)->close_request (window);
}

static void
frame_cb (GdkFrameClock *clock, gpointer data)
{
  hl_trace ("frame");
}

static void
hl_window_realize (GtkWidget *widget)
{
  GTK_WIDGET_CLASS (hl_window_parent_class)->realize (widget);
  if (hl_trace_is_on ())
    g_signal_connect_object (gtk_widget_get_frame_clock (widget), "after-paint", G_CALLBACK (frame_cb), widget, 0);
}

static void
hl_window_init (HlWindow *self)
{
  gtk_widget_init_template (GTK_WIDGET (self));
}

static void
hl_window_constructed (GObject *object)
{
  HlWindow *self = HL_WINDOW (object);
  G_OBJECT_CLASS (hl_window_parent_class)->constructed (object);
  if (self->session == NULL)
    self->session = hl_session_new ();
  self->autosave = hl_autosave_new (self->session, AUTOSAVE_DELAY);
  fill_panes (self);
  hl_window_add_actions (self);
  hl_window_add_view_actions (self);
  hl_window_add_file_actions (self);
  hl_window_add_variant_actions (self);
  hl_window_add_compare_actions (self);
  hl_window_watch_disk (self);
  hl_window_fill_menus (self);
  g_signal_connect_object (self->session, "changed", G_CALLBACK (changed_cb), self, G_CONNECT_SWAPPED);
  g_signal_connect_object (self->session, "selection-changed", G_CALLBACK (selection_changed_cb), self, G_CONNECT_SWAPPED);
  g_signal_connect_object (self->session, "file-changed", G_CALLBACK (file_changed_cb), self, G_CONNECT_SWAPPED);
  g_signal_connect_object (self->canvas, "notify::zoom", G_CALLBACK (zoom_changed_cb), self, G_CONNECT_SWAPPED);
  restore_geometry (self);
  update_glance (self);
  changed_cb (self);
  file_changed_cb (self);
}

static void
hl_window_set_property (GObject *object, guint id, const GValue *value, GParamSpec *spec)
{
  if (id == PROP_SESSION)
    HL_WINDOW (object)->session = g_value_dup_object (value);
  else
    G_OBJECT_WARN_INVALID_PROPERTY_ID (object, id, spec);
}

static void
hl_window_dispose (GObject *object)
{
  HlWindow *self = HL_WINDOW (object);
  g_clear_handle_id (&self->fold_source, g_source_remove);
  g_clear_handle_id (&self->divide_source, g_source_remove);
  g_clear_handle_id (&self->trace_source, g_source_remove);
  g_clear_pointer (&self->autosave, hl_autosave_free);
  hl_window_unwatch_disk (self);
  G_OBJECT_CLASS (hl_window_parent_class)->dispose (object);
}

static void
hl_window_finalize (GObject *object)
{
  g_clear_object (&HL_WINDOW (object)->session);
  G_OBJECT_CLASS (hl_window_parent_class)->finalize (object);
}

static void
hl_window_class_init (HlWindowClass *class)
{
  GtkWidgetClass *widget = GTK_WIDGET_CLASS (class);
  G_OBJECT_CLASS (class)->constructed = hl_window_constructed;
  G_OBJECT_CLASS (class)->set_property = hl_window_set_property;
  G_OBJECT_CLASS (class)->dispose = hl_window_dispose;
  G_OBJECT_CLASS (class)->finalize = hl_window_finalize;
  GTK_WINDOW_CLASS (class)->close_request = hl_window_close_request;
  widget->size_allocate = hl_window_size_allocate;
  widget->realize = hl_window_realize;
  properties[PROP_SESSION] = g_param_spec_object ("session", NULL, NULL, HL_TYPE_SESSION, G_PARAM_WRITABLE | G_PARAM_CONSTRUCT_ONLY | G_PARAM_STATIC_STRINGS);
  g_object_class_install_properties (G_OBJECT_CLASS (class), N_PROPERTIES, properties);
  gtk_widget_class_set_template_from_resource (widget, "/local/heatloom/Heatloom/hl-window.ui");
  static const struct { const char *name; gssize offset; } children[] = {
#define CHILD(field) { #field, G_STRUCT_OFFSET (HlWindow, field) }
    CHILD (open_button), CHILD (menu_button), CHILD (undo_button), CHILD (redo_button), CHILD (export_button),
    CHILD (title_label), CHILD (subtitle_label), CHILD (dirty_dot), CHILD (outer), CHILD (work), CHILD (shelf_bin),
    CHILD (canvas_bin), CHILD (strip_bin), CHILD (nameplate_bin), CHILD (notice_bin), CHILD (zoom_label),
    CHILD (diagram_area), CHILD (stack), CHILD (glance_bin), CHILD (variant_button), CHILD (variant_label),
#undef CHILD
  };
  for (guint n = 0; n < G_N_ELEMENTS (children); n++)
    gtk_widget_class_bind_template_child_full (widget, children[n].name, FALSE, children[n].offset);
}

HlWindow *
hl_window_new (GtkApplication *application, HlSession *session)
{
  return g_object_new (HL_TYPE_WINDOW, "application", application, "session", session, NULL);
}

HlSession *
hl_window_session (HlWindow *self)
{
  return self->session;
}
