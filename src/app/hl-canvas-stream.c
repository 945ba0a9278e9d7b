/* Lines under the hand: a segment dragged aside, an end taken off its port, what a stream carries where the pointer rests.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-canvas-private.h"
#include "app/hl-edit.h"
#include "plant/i18n.h"

#define END_REACH 14.0     /* of a line's end, where a drag takes it off its port [view px] */
#define STUB 2             /* a line leaves a port this far before it bends [grid units] */

static int
to_grid (double pixels)
{
  return (int) floor (pixels / HL_UNIT + 0.5);
}

/* --- bends ------------------------------------------------------------------------ */

void
hl_canvas_begin_bend (HlCanvas *self)
{
  int n = hl_plant_stream_index (hl_canvas_plant (self), self->grabbed);
  const HlStreamPlace *place = hl_layout_stream (self->layout, (guint) n);
  HlPoint pressed;
  self->mode = MODE_BEND;
  self->base = hl_plant_ref (hl_canvas_plant (self));
  hl_canvas_to_canvas (self, self->start_x, self->start_y, &pressed.x, &pressed.y);
  self->bend_segment = hl_canvas_segment_at (place, pressed.x, pressed.y, &pressed);
  g_clear_pointer (&self->bend_way, g_array_unref);
  self->bend_way = g_array_sized_new (FALSE, FALSE, sizeof (HlPoint), place->n_points);
  g_array_append_vals (self->bend_way, place->points, place->n_points);
}

/* Corners of the line with the grabbed segment moved across itself; at a port a stub stays. */
static GArray *
bent_way (HlCanvas *self, double dx, double dy)
{
  GArray *bends = g_array_new (FALSE, FALSE, sizeof (HlGridPoint));
  const HlPoint *way = (const HlPoint *) self->bend_way->data;
  guint n = self->bend_way->len, k = self->bend_segment;
  gboolean is_level = fabs (way[k + 1].x - way[k].x) > fabs (way[k + 1].y - way[k].y);
  int by_x = is_level ? 0 : to_grid (dx / self->zoom), by_y = is_level ? to_grid (dy / self->zoom) : 0;
  int ahead_x = is_level ? (way[k + 1].x > way[k].x ? STUB : -STUB) : 0, ahead_y = is_level ? 0 : (way[k + 1].y > way[k].y ? STUB : -STUB);
  for (guint i = 0; i < n; i++)
    {
      HlGridPoint at = { to_grid (way[i].x), to_grid (way[i].y) };
      gboolean is_moved = i == k || i == k + 1, is_end = i == 0 || i + 1 == n;
      if (is_moved)
        {
          at.x += by_x + (is_end ? (i == 0 ? ahead_x : -ahead_x) : 0);
          at.y += by_y + (is_end ? (i == 0 ? ahead_y : -ahead_y) : 0);
        }
      if (is_moved || !is_end)
        g_array_append_val (bends, at);
    }
  return bends;
}

void
hl_canvas_update_bend (HlCanvas *self, double dx, double dy)
{
  g_autoptr (GArray) bends = bent_way (self, dx, dy);
  hl_session_preview (self->session, hl_edit_route (self->base, self->grabbed, (const HlGridPoint *) bends->data, bends->len), FALSE);
}

void
hl_canvas_end_bend (HlCanvas *self, double dx, double dy)
{
  g_autoptr (GArray) bends = bent_way (self, dx, dy);
  GVariantBuilder builder;
  g_variant_builder_init (&builder, G_VARIANT_TYPE ("a(ii)"));
  for (guint n = 0; n < bends->len; n++)
    {
      const HlGridPoint *bend = &g_array_index (bends, HlGridPoint, n);
      g_variant_builder_add (&builder, "(ii)", bend->x, bend->y);
    }
  gtk_widget_activate_action (GTK_WIDGET (self), "win.bend", "(sa(ii))", self->grabbed, &builder);
}

/* --- ends ------------------------------------------------------------------------- */

/* The port at the other end of a line whose end lies under the pointer. */
gboolean
hl_canvas_line_end_at (HlCanvas *self, double vx, double vy, const char **stream_id, HlPortRef *other)
{
  int n = hl_canvas_label_at (self, vx, vy) < 0 ? hl_canvas_stream_at (self, vx, vy) : -1;
  const HlStream *stream = n >= 0 ? hl_plant_stream (hl_canvas_plant (self), (guint) n) : NULL;
  HlPortRef from, to;
  double fx, fy, tx, ty;
  if (stream == NULL)
    return FALSE;
  from = (HlPortRef) { stream->from_id, stream->from_port };
  to = (HlPortRef) { stream->to_id, stream->to_port };
  if (!hl_canvas_port_point (self, &from, &fx, &fy) || !hl_canvas_port_point (self, &to, &tx, &ty))
    return FALSE;
  hl_canvas_to_view (self, fx, fy, &fx, &fy);
  hl_canvas_to_view (self, tx, ty, &tx, &ty);
  *stream_id = stream->id;
  *other = hypot (tx - vx, ty - vy) < hypot (fx - vx, fy - vy) ? from : to;
  return MIN (hypot (tx - vx, ty - vy), hypot (fx - vx, fy - vy)) <= END_REACH;
}

/* --- what it carries ----------------------------------------------------------------- */

static void
append_value (GString *text, const char *key, double si, HlUnitSet units)
{
  const HlQuantityKind *kind = hl_stream_quantity_lookup (key);
  g_autofree char *value = hl_quantity_format (kind, si, units);
  g_string_append_printf (text, "\n%s: %s", _(kind->name), value);
}

char *
hl_canvas_describe_stream (HlCanvas *self, guint n)
{
  HlPlant *plant = hl_canvas_plant (self);
  const HlStream *stream = hl_plant_stream (plant, n);
  GString *text = g_string_new (NULL);
  HlUnitSet units = hl_plant_units (plant);
  HlStreamResult result;
  guint from, to;
  const HlComponent *source = hl_plant_find_component (plant, stream->from_id), *target = hl_plant_find_component (plant, stream->to_id);
  g_autofree char *from_name = hl_component_find_port (source, stream->from_port, &from) ? hl_component_port_name (source, from) : g_strdup ("");
  g_autofree char *to_name = hl_component_find_port (target, stream->to_port, &to) ? hl_component_port_name (target, to) : g_strdup ("");
  /* Translators: a stream: its number, where it comes from and where it goes, as component and port */
  g_string_append_printf (text, _("Stream %s: %s %s to %s %s"), stream->id, stream->from_id, from_name, stream->to_id, to_name);
  if (hl_solution_plant (self->shown) != plant && !hl_plant_equal (hl_solution_plant (self->shown), plant))
    return g_string_free (text, FALSE);
  hl_solution_stream (self->shown, n, &result);
  if (result.fluid != NULL)
    g_string_append_printf (text, "\n%s", _(hl_fluid_name (result.fluid)));
  if (result.has_flow)
    append_value (text, "m", result.m, units);
  if (result.has_state)
    {
      append_value (text, "p", result.state.p, units);
      append_value (text, "T", result.state.T, units);
      if (isfinite (result.state.x))
        append_value (text, "x", result.state.x, units);
      append_value (text, "h", result.state.h, units);
      append_value (text, "s", result.state.s, units);
      append_value (text, "v", result.state.v, units);
    }
  return g_string_free (text, FALSE);
}
