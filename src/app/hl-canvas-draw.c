/* What the canvas paints under and over its children.  Nodes are kept while what they show stays the same, so that only what
 * changed is painted again.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-canvas-private.h"
#include "app/hl-appearance.h"

#define DOT_STEP (2 * HL_UNIT)

void
hl_kept_node_clear (gpointer data)
{
  HlKeptNode *kept = data;
  g_clear_pointer (&kept->key, g_byte_array_unref);
  g_clear_pointer (&kept->node, gsk_render_node_unref);
}

/* Keys */

static void
add_bytes (GByteArray *key, gconstpointer data, gsize size)
{
  g_byte_array_append (key, data, (guint) size);
}

static void
add_text (GByteArray *key, const char *text)
{
  if (text != NULL)
    add_bytes (key, text, strlen (text));
  add_bytes (key, "\0", 1);
}

static void
add_flags (GByteArray *key, gboolean a, gboolean b)
{
  const HlTheme *theme = hl_appearance_theme ();
  guint8 flags[2] = { a != FALSE, b != FALSE };
  add_bytes (key, &theme, sizeof theme);
  add_bytes (key, flags, sizeof flags);
}

/* What of a result decides the colour of a line. */
static void
add_result (GByteArray *key, const HlStreamResult *result)
{
  guint8 has = (guint8) (result->has_state ? 1 : 0);
  add_bytes (key, &has, 1);
  add_bytes (key, &result->fluid, sizeof result->fluid);
  if (result->has_state)
    {
      add_bytes (key, &result->state.phase, sizeof result->state.phase);
      add_bytes (key, &result->state.x, sizeof result->state.x);
      add_bytes (key, &result->state.T, sizeof result->state.T);
    }
}

/* Nodes */

typedef struct {
  const HlTheme          *theme;
  const HlStreamPlace    *place;
  const HlStream         *stream;
  const HlStreamResult   *result;
  const HlComponentPlace *component;
  const HlPoint          *points;
  guint                   n_points;
  gboolean                is_stale, is_selected;
} Subject;

typedef void (*Painter) (cairo_t *cr, const Subject *subject);

static void
paint_line (cairo_t *cr, const Subject *s)
{
  hl_draw_stream_line (cr, s->theme, s->place, s->result, s->is_stale, s->is_selected);
}

static void
paint_label (cairo_t *cr, const Subject *s)
{
  hl_draw_stream_label (cr, s->theme, s->place, s->stream, s->result, s->is_stale, s->is_selected);
}

static void
paint_title (cairo_t *cr, const Subject *s)
{
  hl_draw_component_title (cr, s->theme, s->component);
}

static void
paint_shaft (cairo_t *cr, const Subject *s)
{
  hl_draw_shaft_line (cr, s->theme, s->points, s->n_points);
}

static gboolean
is_same_key (const GByteArray *a, const GByteArray *b)
{
  return a != NULL && a->len == b->len && memcmp (a->data, b->data, a->len) == 0;
}

/* Takes @key. */
static void
keep_node (GArray *nodes, guint n, GByteArray *key, const HlBox *box, Painter paint, const Subject *subject)
{
  HlKeptNode *kept = &g_array_index (nodes, HlKeptNode, n);
  graphene_rect_t bounds = GRAPHENE_RECT_INIT (floor (box->x), floor (box->y), ceil (box->width) + 1, ceil (box->height) + 1);
  cairo_t *cr;

  if (is_same_key (kept->key, key))
    {
      g_byte_array_unref (key);
      return;
    }
  hl_kept_node_clear (kept);
  kept->key = key;
  if (!(box->width > 0))
    return;
  kept->node = gsk_cairo_node_new (&bounds);
  cr = gsk_cairo_node_get_draw_context (kept->node);
  paint (cr, subject);
  cairo_destroy (cr);
}

static HlBox
box_of_points (const HlPoint *points, guint n, double margin)
{
  HlBox box = { 0 };
  double left = G_MAXDOUBLE, right = -G_MAXDOUBLE, top = G_MAXDOUBLE, bottom = -G_MAXDOUBLE;
  for (guint i = 0; i < n; i++)
    {
      left = MIN (left, points[i].x);
      right = MAX (right, points[i].x);
      top = MIN (top, points[i].y);
      bottom = MAX (bottom, points[i].y);
    }
  if (n > 0)
    box = (HlBox) { left - margin, top - margin, right - left + 2 * margin, bottom - top + 2 * margin };
  return box;
}

static HlBox
grown (const HlBox *box, double margin)
{
  if (!(box->width > 0))
    return *box;
  return (HlBox) { box->x - margin, box->y - margin, box->width + 2 * margin, box->height + 2 * margin };
}

static void
renew_stream (HlCanvas *self, guint n)
{
  const HlStream *stream = hl_plant_stream (hl_canvas_plant (self), n);
  const HlStreamPlace *place = hl_layout_stream (self->layout, n);
  HlStreamResult result = { 0 };
  Subject subject = { .theme = hl_appearance_theme (), .place = place, .stream = stream, .result = &result, .is_stale = self->is_stale,
                      .is_selected = hl_session_is_selected (self->session, stream->id) };
  GByteArray *line_key = g_byte_array_new (), *label_key = g_byte_array_new ();
  HlBox line_box, label_box;

  hl_stream_line_bounds (place, &line_box);
  hl_stream_label_bounds (place, &label_box);
  /* A stream just drawn, in a preview, is not in the solution yet. */
  if (n < hl_plant_n_streams (hl_solution_plant (self->shown)))
    hl_solution_stream (self->shown, n, &result);
  if (result.has_flow && result.has_state && hl_solution_is_partial (self->shown))
    subject.is_stale = FALSE;
  add_flags (line_key, subject.is_stale, subject.is_selected);
  add_result (line_key, &result);
  add_bytes (line_key, &place->look, sizeof place->look);
  add_bytes (line_key, &place->lead_from, sizeof place->lead_from);
  add_bytes (line_key, &place->lead_to, sizeof place->lead_to);
  add_bytes (line_key, place->points, place->n_points * sizeof *place->points);
  add_bytes (line_key, place->arcs, place->n_arcs * sizeof *place->arcs);
  keep_node (self->lines, n, line_key, &line_box, paint_line, &subject);

  add_flags (label_key, subject.is_stale, subject.is_selected);
  add_result (label_key, &result);
  add_bytes (label_key, &place->look, sizeof place->look);
  add_bytes (label_key, &place->label, sizeof place->label);
  add_bytes (label_key, &place->has_leader, sizeof place->has_leader);
  add_bytes (label_key, place->leader, sizeof place->leader);
  add_text (label_key, stream->id);
  add_text (label_key, place->label_lines[0]);
  add_text (label_key, place->label_lines[1]);
  keep_node (self->labels, n, label_key, &label_box, paint_label, &subject);
}

static void
renew_title (HlCanvas *self, guint n)
{
  const HlComponentPlace *place = hl_layout_component (self->layout, n);
  Subject subject = { .theme = hl_appearance_theme (), .component = place };
  GByteArray *key = g_byte_array_new ();
  HlBox box = grown (&place->title, 4);
  add_flags (key, FALSE, FALSE);
  add_bytes (key, &place->title, sizeof place->title);
  add_bytes (key, &place->title_align, sizeof place->title_align);
  add_text (key, place->title_lines[0]);
  add_text (key, place->title_lines[1]);
  keep_node (self->titles, n, key, &box, paint_title, &subject);
}

static void
renew_shaft (HlCanvas *self, guint n)
{
  Subject subject = { .theme = hl_appearance_theme () };
  GByteArray *key = g_byte_array_new ();
  HlBox box;
  subject.points = hl_layout_shaft (self->layout, n, &subject.n_points);
  box = box_of_points (subject.points, subject.n_points, 6);
  add_flags (key, FALSE, FALSE);
  add_bytes (key, subject.points, subject.n_points * sizeof *subject.points);
  keep_node (self->shafts, n, key, &box, paint_shaft, &subject);
}

void
hl_canvas_renew_nodes (HlCanvas *self)
{
  guint n_streams = hl_plant_n_streams (hl_canvas_plant (self)), n_components = hl_plant_n_components (hl_canvas_plant (self));
  guint n_shafts = hl_layout_n_shafts (self->layout);
  g_array_set_size (self->lines, n_streams);
  g_array_set_size (self->labels, n_streams);
  g_array_set_size (self->titles, n_components);
  g_array_set_size (self->shafts, n_shafts);
  for (guint n = 0; n < n_streams; n++)
    renew_stream (self, n);
  for (guint n = 0; n < n_components; n++)
    renew_title (self, n);
  for (guint n = 0; n < n_shafts; n++)
    renew_shaft (self, n);
}

/* Ground */

static GdkRGBA
rgba (const HlColour *colour, double alpha)
{
  return (GdkRGBA) { (float) colour->r, (float) colour->g, (float) colour->b, (float) (colour->a * alpha) };
}

static void
append_disc (GtkSnapshot *snapshot, double x, double y, double r, const GdkRGBA *colour)
{
  GskRoundedRect circle;
  graphene_rect_t box = GRAPHENE_RECT_INIT (x - r, y - r, 2 * r, 2 * r);
  gsk_rounded_rect_init_from_rect (&circle, &box, r);
  gtk_snapshot_push_rounded_clip (snapshot, &circle);
  gtk_snapshot_append_color (snapshot, colour, &box);
  gtk_snapshot_pop (snapshot);
}

static void
append_ring (GtkSnapshot *snapshot, double x, double y, double r, float width, const GdkRGBA *colour)
{
  GskRoundedRect circle;
  graphene_rect_t box = GRAPHENE_RECT_INIT (x - r, y - r, 2 * r, 2 * r);
  gsk_rounded_rect_init_from_rect (&circle, &box, r);
  gtk_snapshot_append_border (snapshot, &circle, (float[4]) { width, width, width, width },
                              (GdkRGBA[4]) { *colour, *colour, *colour, *colour });
}

/* One tile of the dotted ground, repeated by the renderer. */
static GskRenderNode *
dots_new (HlCanvas *self, double width, double height)
{
  GdkRGBA dot = rgba (&hl_appearance_theme ()->grid, 1);
  GtkSnapshot *snapshot = gtk_snapshot_new ();
  double step = DOT_STEP * self->zoom;
  graphene_rect_t tile;

  while (step < 14)
    step *= 2;
  tile = GRAPHENE_RECT_INIT (fmod (self->ox, step) - step / 2, fmod (self->oy, step) - step / 2, step, step);
  gtk_snapshot_push_repeat (snapshot, &GRAPHENE_RECT_INIT (0, 0, width, height), &tile);
  gtk_snapshot_append_color (snapshot, &dot, &GRAPHENE_RECT_INIT (tile.origin.x + step / 2 - 0.75, tile.origin.y + step / 2 - 0.75, 1.5, 1.5));
  gtk_snapshot_pop (snapshot);
  return gtk_snapshot_free_to_node (snapshot);
}

/* The dots are kept as a node, too: GSK takes a repeated tile for another one unless it is the very same. */
static void
draw_ground (HlCanvas *self, GtkSnapshot *snapshot, double width, double height)
{
  GdkRGBA ground = rgba (&hl_appearance_theme ()->ground, 1);
  const double places[] = { width, height, self->ox, self->oy, self->zoom };
  GByteArray *key = g_byte_array_new ();

  gtk_snapshot_append_color (snapshot, &ground, &GRAPHENE_RECT_INIT (0, 0, width, height));
  add_flags (key, FALSE, FALSE);
  add_bytes (key, places, sizeof places);
  if (!is_same_key (self->dots.key, key))
    {
      hl_kept_node_clear (&self->dots);
      self->dots.key = g_byte_array_ref (key);
      self->dots.node = dots_new (self, width, height);
    }
  if (self->dots.node != NULL)
    gtk_snapshot_append_node (snapshot, self->dots.node);
  g_byte_array_unref (key);
}

static void
push_view (HlCanvas *self, GtkSnapshot *snapshot)
{
  gtk_snapshot_save (snapshot);
  gtk_snapshot_translate (snapshot, &GRAPHENE_POINT_INIT (self->ox, self->oy));
  gtk_snapshot_scale (snapshot, self->zoom, self->zoom);
}

/* Each under a transform of its own: of a scaled group GSK repaints everything when one member changes. */
static void
append_kept (HlCanvas *self, GtkSnapshot *snapshot, GArray *nodes)
{
  for (guint n = 0; n < nodes->len; n++)
    if (g_array_index (nodes, HlKeptNode, n).node != NULL)
      {
        push_view (self, snapshot);
        gtk_snapshot_append_node (snapshot, g_array_index (nodes, HlKeptNode, n).node);
        gtk_snapshot_restore (snapshot);
      }
}

/* Marks over everything, in view pixels */

static void
draw_port (HlCanvas *self, GtkSnapshot *snapshot, const HlPortRef *port, double r, gboolean is_strong)
{
  const HlTheme *theme = hl_appearance_theme ();
  GdkRGBA accent = rgba (&theme->accent, 1), quiet = rgba (&theme->quiet, 0.8), ground = rgba (&theme->card, 1);
  double x, y, vx, vy;
  if (!hl_canvas_port_point (self, port, &x, &y))
    return;
  hl_canvas_to_view (self, x, y, &vx, &vy);
  append_disc (snapshot, vx, vy, r, is_strong ? &accent : &ground);
  append_ring (snapshot, vx, vy, r, 1.5f, is_strong ? &accent : &quiet);
}

static gboolean
shows_ports (HlCanvas *self, const char *id)
{
  return self->hovered == id || hl_session_is_selected (self->session, id);
}

/* Open ports: a small ring always, so that a plant shows where it is unfinished; strong where the pointer or selection is. */
static void
draw_open_ports (HlCanvas *self, GtkSnapshot *snapshot)
{
  HlPlant *plant = hl_canvas_plant (self);
  for (guint n = 0; n < hl_plant_n_components (plant); n++)
    {
      const HlComponent *component = hl_plant_component (plant, n);
      gboolean is_near = shows_ports (self, component->id);
      for (guint k = 0; k < hl_component_n_ports (component); k++)
        {
          HlPort port = hl_component_port (component, k);
          HlPortRef ref = { component->id, port.key };
          gboolean is_hot = self->hot.id == ref.id && self->hot.port == ref.port;
          if ((!is_near && port.kind->is_optional) || !hl_canvas_port_is_free (plant, &ref))
            continue;
          draw_port (self, snapshot, &ref, is_hot ? 6 : is_near ? 4.5 : 3, is_hot);
        }
    }
}

static void
draw_shaft_ends (HlCanvas *self, GtkSnapshot *snapshot)
{
  HlPlant *plant = hl_canvas_plant (self);
  GdkRGBA shaft = rgba (&hl_appearance_theme ()->shaft, 1), ground = rgba (&hl_appearance_theme ()->card, 1);
  for (guint n = 0; n < hl_plant_n_components (plant); n++)
    {
      const HlComponent *component = hl_plant_component (plant, n);
      for (int end = 0; end < 2 && shows_ports (self, component->id); end++)
        {
          double x, y, vx, vy;
          if (!hl_canvas_shaft_end (plant, component, end, &x, &y))
            continue;
          hl_canvas_to_view (self, x, y, &vx, &vy);
          gtk_snapshot_append_color (snapshot, &shaft, &GRAPHENE_RECT_INIT (vx - 4, vy - 4, 8, 8));
          gtk_snapshot_append_color (snapshot, &ground, &GRAPHENE_RECT_INIT (vx - 2.5, vy - 2.5, 5, 5));
        }
    }
}

static void
draw_polyline (GtkSnapshot *snapshot, const HlPoint *points, guint n, double width, const GdkRGBA *colour)
{
  for (guint i = 0; i + 1 < n; i++)
    {
      double left = MIN (points[i].x, points[i + 1].x), right = MAX (points[i].x, points[i + 1].x);
      double top = MIN (points[i].y, points[i + 1].y), bottom = MAX (points[i].y, points[i + 1].y);
      gtk_snapshot_append_color (snapshot, colour, &GRAPHENE_RECT_INIT (left - width / 2, top - width / 2, right - left + width, bottom - top + width));
    }
}

static void
draw_new_line (HlCanvas *self, GtkSnapshot *snapshot)
{
  GdkRGBA accent = rgba (&hl_appearance_theme ()->accent, 1);
  double x, y;
  guint n = 0;
  g_autofree HlPoint *points = NULL;

  for (guint i = 0; i < self->targets->len; i++)
    {
      const HlPortRef *target = &g_array_index (self->targets, HlPortRef, i);
      gboolean is_under = self->target.id == target->id && self->target.port == target->port;
      if (target->port != NULL)
        draw_port (self, snapshot, target, is_under ? 8 : 5.5, TRUE);
    }
  hl_canvas_to_canvas (self, self->last_x, self->last_y, &x, &y);
  if (self->branch >= 0)
    {
      double vx, vy;
      x = self->branch_x * HL_UNIT;
      y = self->branch_y * HL_UNIT;
      hl_canvas_to_view (self, x, y, &vx, &vy);
      append_disc (snapshot, vx, vy, 7, &accent);
    }
  else if (self->target.port != NULL)
    hl_canvas_port_point (self, &self->target, &x, &y);
  push_view (self, snapshot);
  if (self->mode == MODE_CONNECT)
    points = hl_route_preview (hl_canvas_plant (self), self->from.id, self->from.port, x, y, &n);
  else
    {
      double sx, sy;
      const HlComponent *component = hl_plant_find_component (hl_canvas_plant (self), self->from.id);
      int end = component->x * HL_UNIT < x ? 1 : 0;
      if (hl_canvas_shaft_end (hl_canvas_plant (self), component, end, &sx, &sy) || hl_canvas_shaft_end (hl_canvas_plant (self), component, 1 - end, &sx, &sy))
        {
          points = g_new (HlPoint, n = 3);
          points[0] = (HlPoint) { sx, sy };
          points[1] = (HlPoint) { x, sy };
          points[2] = (HlPoint) { x, y };
        }
    }
  draw_polyline (snapshot, points, n, 2 / self->zoom, &accent);
  gtk_snapshot_restore (snapshot);
}

static void
draw_rubber (HlCanvas *self, GtkSnapshot *snapshot)
{
  GdkRGBA accent = rgba (&hl_appearance_theme ()->accent, 1), fill = rgba (&hl_appearance_theme ()->accent, 0.10);
  GskRoundedRect frame;
  graphene_rect_t box = GRAPHENE_RECT_INIT (MIN (self->start_x, self->last_x), MIN (self->start_y, self->last_y),
                                            fabs (self->last_x - self->start_x), fabs (self->last_y - self->start_y));
  gtk_snapshot_append_color (snapshot, &fill, &box);
  gsk_rounded_rect_init_from_rect (&frame, &box, 0);
  gtk_snapshot_append_border (snapshot, &frame, (float[4]) { 1, 1, 1, 1 }, (GdkRGBA[4]) { accent, accent, accent, accent });
}

/* Where a component dragged from the shelf would stand. */
static void
draw_drop (HlCanvas *self, GtkSnapshot *snapshot)
{
  const HlTheme *theme = hl_appearance_theme ();
  g_autoptr (HlComponent) ghost = hl_component_new_bare (self->drop_kind, "", self->drop_x, self->drop_y);
  GdkRGBA accent = rgba (&theme->accent, 1);
  int hw, hh;
  double w, h;
  cairo_t *cr;

  ghost->turn = self->drop_turn;
  hl_component_half_size (ghost, &hw, &hh);
  w = hw * HL_UNIT + 4;
  h = hh * HL_UNIT + 4;
  push_view (self, snapshot);
  if (self->drop_stream >= 0)
    {
      const HlStreamPlace *place = hl_layout_stream (self->layout, (guint) self->drop_stream);
      draw_polyline (snapshot, place->points, place->n_points, 5, &accent);
    }
  gtk_snapshot_push_opacity (snapshot, 0.75);
  cr = gtk_snapshot_append_cairo (snapshot, &GRAPHENE_RECT_INIT (self->drop_x * HL_UNIT - w, self->drop_y * HL_UNIT - h, 2 * w, 2 * h));
  cairo_translate (cr, self->drop_x * HL_UNIT, self->drop_y * HL_UNIT);
  hl_draw_symbol (cr, theme, ghost);
  cairo_destroy (cr);
  gtk_snapshot_pop (snapshot);
  gtk_snapshot_restore (snapshot);
}

static void
draw_marks (HlCanvas *self, GtkSnapshot *snapshot)
{
  if (self->mode != MODE_MOVE && self->mode != MODE_CONNECT && self->mode != MODE_SHAFT)
    {
      draw_shaft_ends (self, snapshot);
      draw_open_ports (self, snapshot);
    }
  if (self->mode == MODE_CONNECT || self->mode == MODE_SHAFT)
    draw_new_line (self, snapshot);
  if (self->mode == MODE_RUBBER)
    draw_rubber (self, snapshot);
  if (self->drop_kind != NULL)
    draw_drop (self, snapshot);
}

void
hl_canvas_draw (HlCanvas *self, GtkSnapshot *snapshot)
{
  GtkWidget *widget = GTK_WIDGET (self);
  draw_ground (self, snapshot, gtk_widget_get_width (widget), gtk_widget_get_height (widget));
  hl_canvas_draw_ghosts (self, snapshot);
  append_kept (self, snapshot, self->shafts);
  append_kept (self, snapshot, self->lines);
  for (GtkWidget *child = gtk_widget_get_first_child (widget); child != NULL; child = gtk_widget_get_next_sibling (child))
    if (HL_IS_COMPONENT_ITEM (child))
      gtk_widget_snapshot_child (widget, child, snapshot);
  append_kept (self, snapshot, self->titles);
  append_kept (self, snapshot, self->labels);
  hl_canvas_draw_badges (self, snapshot);
  draw_marks (self, snapshot);
}
