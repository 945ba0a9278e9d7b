/* The head of the nameplate: picture, id, free name and a quiet line or two.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-appearance.h"
#include "app/hl-nameplate-private.h"
#include "app/hl-pane.h"
#include "draw/symbols.h"
#include "plant/i18n.h"

#define PICTURE_SIZE 40

struct _HlNameplateHead {
  GtkWidget  parent_instance;
  HlSession *session;
  GtkWidget *picture, *words, *id, *kind, *name, *line, *detail;
  const char *name_of;        /* id of the component whose name is shown, interned; NULL: the plant's title */
  char      *shown_name;
  gboolean   is_updating;
};

G_DEFINE_FINAL_TYPE (HlNameplateHead, hl_nameplate_head, GTK_TYPE_WIDGET)

static const char *
only_selected (HlNameplateHead *self)
{
  guint n;
  const char *const *ids = hl_session_selection (self->session, &n);
  return n == 1 ? ids[0] : NULL;
}

/* --- the picture --- */

static void
draw_ring (cairo_t *cr, const HlTheme *theme, HlSession *session, const char *id)
{
  HlStreamResult result;
  int index = hl_plant_stream_index (hl_session_plant (session), id);
  PangoLayout *layout;
  int width, height;

  hl_solution_stream (hl_session_solution (session), (guint) index, &result);
  const HlColour *colour = hl_stream_colour (theme, &result, FALSE);
  hl_set_colour (cr, colour);
  cairo_set_line_width (cr, 2.0);
  cairo_arc (cr, 0.0, 0.0, 14.0, 0.0, 2.0 * G_PI);
  cairo_stroke (cr);
  layout = pango_cairo_create_layout (cr);
  g_autofree char *font = g_strdup_printf ("%s Bold %d", theme->font, strlen (id) > 2 ? 7 : 10);
  PangoFontDescription *description = pango_font_description_from_string (font);
  pango_layout_set_font_description (layout, description);
  pango_layout_set_text (layout, id, -1);
  pango_layout_get_pixel_size (layout, &width, &height);
  cairo_move_to (cr, -width / 2.0, -height / 2.0);
  pango_cairo_show_layout (cr, layout);
  pango_font_description_free (description);
  g_object_unref (layout);
}

static void
draw_picture_cb (GtkDrawingArea *area, cairo_t *cr, int width, int height, gpointer data)
{
  HlNameplateHead *self = data;
  const char *id = only_selected (self);
  const HlTheme *theme = hl_appearance_theme ();
  const HlPlant *plant = hl_session_plant (self->session);
  const HlComponent *component = id != NULL ? hl_plant_find_component (plant, id) : NULL;

  cairo_translate (cr, width / 2.0, height / 2.0);
  if (component != NULL)
    hl_draw_kind (cr, theme, component->kind, PICTURE_SIZE - 2);
  else if (id != NULL && hl_plant_find_stream (plant, id) != NULL)
    draw_ring (cr, theme, self->session, id);
}

/* --- the name: of a component, or the title of the plant --- */

static void
commit_name (HlNameplateHead *self)
{
  HlPlant *plant = hl_session_plant (self->session);
  const char *text = gtk_editable_get_text (GTK_EDITABLE (self->name));
  const HlComponent *component = self->name_of != NULL ? hl_plant_find_component (plant, self->name_of) : NULL;

  if (self->is_updating || g_strcmp0 (text, self->shown_name) == 0)
    return;
  g_free (self->shown_name);
  self->shown_name = g_strdup (text);
  if (component != NULL)
    {
      g_autofree char *step = g_strdup_printf (_("Name %s"), component->id);
      HlComponent *copy = hl_component_copy (component);
      hl_component_set_name (copy, text);
      hl_session_apply (self->session, step, hl_plant_with_component (plant, copy), NULL, FALSE);
    }
  else if (self->name_of == NULL)
    hl_session_apply (self->session, _("Name the plant"), hl_plant_with_title (plant, text), NULL, FALSE);
}

static void
name_activate_cb (GtkEntry *entry, HlNameplateHead *self)
{
  commit_name (self);
}

static void
name_leave_cb (GtkEventControllerFocus *controller, HlNameplateHead *self)
{
  commit_name (self);
}

static gboolean
name_key_cb (GtkEventControllerKey *controller, guint key, guint code, GdkModifierType state, HlNameplateHead *self)
{
  if (key != GDK_KEY_Escape || g_strcmp0 (gtk_editable_get_text (GTK_EDITABLE (self->name)), self->shown_name) == 0)
    return GDK_EVENT_PROPAGATE;
  gtk_editable_set_text (GTK_EDITABLE (self->name), self->shown_name != NULL ? self->shown_name : "");
  return GDK_EVENT_STOP;
}

/* Room for about so many characters of the title at its full size, and at the next smaller one. */
#define SHORT_TITLE 26
#define LONG_TITLE  38

static void
fit_name (HlNameplateHead *self)
{
  long length = g_utf8_strlen (gtk_editable_get_text (GTK_EDITABLE (self->name)), -1);

  gtk_widget_remove_css_class (self->name, "long");
  gtk_widget_remove_css_class (self->name, "longer");
  if (length > SHORT_TITLE)
    gtk_widget_add_css_class (self->name, length > LONG_TITLE ? "longer" : "long");
}

static void
show_name (HlNameplateHead *self, const char *of, const char *name, const char *placeholder)
{
  gtk_widget_set_visible (self->name, name != NULL);
  if (self->name_of != of)
    {
      commit_name (self);                     /* what was typed belongs to the one before */
      self->name_of = of;
      g_clear_pointer (&self->shown_name, g_free);
    }
  if (name == NULL)
    return;
  gtk_entry_set_placeholder_text (GTK_ENTRY (self->name), placeholder);
  if (g_strcmp0 (self->shown_name, name) == 0)
    return;                                   /* and what is being typed stays */
  g_free (self->shown_name);
  self->shown_name = g_strdup (name);
  self->is_updating = TRUE;
  gtk_editable_set_text (GTK_EDITABLE (self->name), name);
  self->is_updating = FALSE;
}

/* --- update --- */

static void
show_component (HlNameplateHead *self, const HlComponent *component)
{
  gtk_label_set_text (GTK_LABEL (self->id), component->id);
  gtk_label_set_text (GTK_LABEL (self->kind), _(component->kind->name));
  gtk_label_set_text (GTK_LABEL (self->line), "");
  gtk_widget_set_tooltip_text (self->kind, component->kind->help != NULL ? _(component->kind->help) : NULL);
  gtk_label_set_text (GTK_LABEL (self->detail), "");
  hl_pane_set_accessible (self->name, _("Name"), component->id);
  show_name (self, component->id, component->name != NULL ? component->name : "", _("give it a name"));
}

static char *
port_words (const HlPlant *plant, const char *id, const char *port)
{
  const HlComponent *component = hl_plant_find_component (plant, id);
  guint n;

  if (component == NULL || !hl_component_find_port (component, port, &n))
    return g_strdup (id);
  g_autofree char *name = hl_component_port_name (component, n);
  return g_strdup_printf ("%s %s", id, name);
}

/* Two phases are wet steam where the medium boils, gas with its condensate where it does not. */
static const char *
phase_words (const HlStreamResult *result)
{
  if (result->state.phase != HL_PHASE_TWO_PHASE)
    return _(hl_phase_name (result->state.phase));
  return result->fluid != NULL && !hl_fluid_has_dome (result->fluid) ? _("gas with condensate") : _("wet steam");
}

static void
show_stream (HlNameplateHead *self, const HlStream *stream)
{
  const HlPlant *plant = hl_session_plant (self->session);
  const HlFluid *fluid = hl_fluid_lookup (stream->medium);
  g_autofree char *title = g_strdup_printf (_("Stream %s"), stream->id);
  g_autofree char *from = port_words (plant, stream->from_id, stream->from_port);
  g_autofree char *to = port_words (plant, stream->to_id, stream->to_port);
  g_autofree char *way = g_strdup_printf (_("%s → %s"), from, to);
  g_autofree char *line = NULL;
  HlStreamResult result;
  const char *medium = fluid != NULL ? _(hl_fluid_name (fluid)) : stream->medium;

  hl_solution_stream (hl_session_solution (self->session), (guint) hl_plant_stream_index (plant, stream->id), &result);
  if (result.has_state)
    line = g_strdup_printf ("%s, %s", medium, phase_words (&result));
  else
    line = g_strdup (medium);
  gtk_label_set_text (GTK_LABEL (self->id), title);
  gtk_label_set_text (GTK_LABEL (self->line), way);
  gtk_widget_set_tooltip_text (self->line, way);
  gtk_label_set_text (GTK_LABEL (self->detail), line);
  gtk_widget_set_visible (self->name, FALSE);
}

static void
show_plant (HlNameplateHead *self)
{
  const HlPlant *plant = hl_session_plant (self->session);
  guint components = hl_plant_n_components (plant), streams = hl_plant_n_streams (plant);
  g_autofree char *first = g_strdup_printf (ngettext_hl ("%u component", "%u components", components), components);
  g_autofree char *second = g_strdup_printf (ngettext_hl ("%u stream", "%u streams", streams), streams);
  g_autofree char *line = g_strdup_printf ("%s, %s", first, second);

  gtk_label_set_text (GTK_LABEL (self->line), line);
  gtk_widget_set_tooltip_text (self->line, NULL);
  gtk_label_set_text (GTK_LABEL (self->detail), "");
  hl_pane_set_accessible (self->name, _("Title of the plant"), NULL);
  show_name (self, NULL, hl_plant_title (plant), _("give it a title"));
}

void
hl_nameplate_head_update (HlNameplateHead *self)
{
  const HlPlant *plant = hl_session_plant (self->session);
  const char *id = only_selected (self);
  const HlComponent *component = id != NULL ? hl_plant_find_component (plant, id) : NULL;
  const HlStream *stream = id != NULL ? hl_plant_find_stream (plant, id) : NULL;
  guint n;

  hl_session_selection (self->session, &n);
  if (component != NULL)
    show_component (self, component);
  else if (stream != NULL)
    show_stream (self, stream);
  else if (n == 0)
    show_plant (self);
  else
    {
      g_autofree char *title = g_strdup_printf (_("%u selected"), n);
      gtk_label_set_text (GTK_LABEL (self->id), title);
      gtk_label_set_text (GTK_LABEL (self->line), _("Choose one to see its quantities"));
      gtk_label_set_text (GTK_LABEL (self->detail), "");
      gtk_widget_set_visible (self->name, FALSE);
    }
  /* The title of a plant takes the whole line. */
  gtk_widget_set_visible (self->id, n > 0);
  if (n == 0)
    gtk_widget_add_css_class (self->name, "whole");
  else
    gtk_widget_remove_css_class (self->name, "whole");
  gtk_widget_set_tooltip_text (self->name, n == 0 ? hl_plant_title (plant) : component != NULL ? component->name : NULL);
  gtk_widget_set_visible (self->kind, component != NULL);
  gtk_widget_set_visible (self->line, component == NULL);
  gtk_widget_set_visible (self->picture, component != NULL || stream != NULL);
  gtk_widget_set_visible (self->detail, *gtk_label_get_text (GTK_LABEL (self->detail)) != '\0');
  gtk_widget_queue_draw (self->picture);
}

void
hl_nameplate_head_focus (HlNameplateHead *self)
{
  if (gtk_widget_get_visible (self->name))
    gtk_widget_grab_focus (self->name);
}

static void
hl_nameplate_head_dispose (GObject *object)
{
  HlNameplateHead *self = HL_NAMEPLATE_HEAD (object);
  GtkWidget *child;

  self->is_updating = TRUE;
  while ((child = gtk_widget_get_first_child (GTK_WIDGET (self))) != NULL)
    gtk_widget_unparent (child);
  g_clear_object (&self->session);
  g_clear_pointer (&self->shown_name, g_free);
  G_OBJECT_CLASS (hl_nameplate_head_parent_class)->dispose (object);
}

static void
hl_nameplate_head_class_init (HlNameplateHeadClass *klass)
{
  GtkWidgetClass *widget_class = GTK_WIDGET_CLASS (klass);
  G_OBJECT_CLASS (klass)->dispose = hl_nameplate_head_dispose;
  gtk_widget_class_set_layout_manager_type (widget_class, GTK_TYPE_BOX_LAYOUT);
  gtk_widget_class_set_css_name (widget_class, "nameplatehead");
}

static void
build_name (HlNameplateHead *self)
{
  GtkEventController *focus = gtk_event_controller_focus_new (), *keys = gtk_event_controller_key_new ();

  self->name = gtk_entry_new ();
  gtk_widget_add_css_class (self->name, "free-name");
  gtk_widget_set_hexpand (self->name, TRUE);
  gtk_editable_set_width_chars (GTK_EDITABLE (self->name), 6);
  g_signal_connect (self->name, "activate", G_CALLBACK (name_activate_cb), self);
  g_signal_connect_swapped (self->name, "changed", G_CALLBACK (fit_name), self);
  g_signal_connect (focus, "leave", G_CALLBACK (name_leave_cb), self);
  gtk_widget_add_controller (self->name, focus);
  gtk_event_controller_set_propagation_phase (keys, GTK_PHASE_CAPTURE);
  g_signal_connect (keys, "key-pressed", G_CALLBACK (name_key_cb), self);
  gtk_widget_add_controller (self->name, keys);
}

static void
hl_nameplate_head_init (HlNameplateHead *self)
{
  GtkWidget *first = gtk_box_new (GTK_ORIENTATION_HORIZONTAL, 8);

  self->picture = gtk_drawing_area_new ();
  gtk_widget_set_size_request (self->picture, PICTURE_SIZE, PICTURE_SIZE);
  gtk_widget_set_valign (self->picture, GTK_ALIGN_CENTER);
  gtk_drawing_area_set_draw_func (GTK_DRAWING_AREA (self->picture), draw_picture_cb, self, NULL);
  gtk_widget_set_parent (self->picture, GTK_WIDGET (self));

  self->words = gtk_box_new (GTK_ORIENTATION_VERTICAL, 1);
  gtk_widget_set_hexpand (self->words, TRUE);
  gtk_widget_set_valign (self->words, GTK_ALIGN_CENTER);
  gtk_widget_set_parent (self->words, GTK_WIDGET (self));
  self->id = hl_pane_label ("", "title");
  build_name (self);
  gtk_box_append (GTK_BOX (first), self->id);
  self->kind = hl_pane_label ("", "quiet");
  gtk_widget_set_valign (self->kind, GTK_ALIGN_BASELINE);
  gtk_widget_set_valign (self->id, GTK_ALIGN_BASELINE);
  gtk_label_set_ellipsize (GTK_LABEL (self->kind), PANGO_ELLIPSIZE_END);
  gtk_box_append (GTK_BOX (first), self->kind);
  gtk_box_append (GTK_BOX (self->words), first);
  gtk_box_append (GTK_BOX (self->words), self->name);
  self->line = hl_pane_label ("", "quiet");
  self->detail = hl_pane_label ("", "quiet");
  gtk_label_set_ellipsize (GTK_LABEL (self->line), PANGO_ELLIPSIZE_END);
  gtk_label_set_ellipsize (GTK_LABEL (self->detail), PANGO_ELLIPSIZE_END);
  gtk_box_append (GTK_BOX (self->words), self->line);
  gtk_box_append (GTK_BOX (self->words), self->detail);
}

GtkWidget *
hl_nameplate_head_new (HlSession *session)
{
  HlNameplateHead *self = g_object_new (HL_TYPE_NAMEPLATE_HEAD, NULL);
  self->session = g_object_ref (session);
  hl_nameplate_head_update (self);
  return GTK_WIDGET (self);
}
