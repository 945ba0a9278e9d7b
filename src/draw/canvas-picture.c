/* The canvas as a picture: lines with their arcs, shafts, symbols, titles and labels.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/canvas-picture.h"
#include "draw/free-space.h"
#include "draw/text.h"

#define ARC_RADIUS   5.0
#define ARROW_LENGTH 8.0
#define ARROW_HALF   3.2
#define HALO         9.0    /* width of the glow under a selected line */

void
hl_draw_polyline (cairo_t *cr, const HlPoint *points, guint n_points)
{
  for (guint i = 0; i < n_points; i++)
    {
      if (i == 0)
        cairo_move_to (cr, points[i].x, points[i].y);
      else
        cairo_line_to (cr, points[i].x, points[i].y);
    }
}

/* One unit from @a towards @b. */
static HlPoint
direction (const HlPoint *a, const HlPoint *b)
{
  return (HlPoint) { (b->x > a->x) - (b->x < a->x), (b->y > a->y) - (b->y < a->y) };
}

/* A horizontal piece, jumping over the lines it crosses. */
static void
line_with_arcs (cairo_t *cr, const HlStreamPlace *place, const HlPoint *from, const HlPoint *to)
{
  gboolean is_rightward = to->x > from->x;
  for (guint n = 0; n < place->n_arcs; n++)
    {
      const HlPoint *arc = &place->arcs[is_rightward ? n : place->n_arcs - 1 - n];
      if (ABS (arc->y - from->y) > 0.5 || arc->x <= MIN (from->x, to->x) || arc->x >= MAX (from->x, to->x))
        continue;
      if (is_rightward)
        cairo_arc (cr, arc->x, arc->y, ARC_RADIUS, G_PI, 2.0 * G_PI);
      else
        cairo_arc_negative (cr, arc->x, arc->y, ARC_RADIUS, 0.0, G_PI);
    }
  cairo_line_to (cr, to->x, to->y);
}

/* @cut: pixels left out at the inlet's outline for the arrow. */
static void
stream_path (cairo_t *cr, const HlStreamPlace *place, double cut)
{
  guint n = place->n_points;
  HlPoint out = direction (&place->points[1], &place->points[0]), in = direction (&place->points[n - 2], &place->points[n - 1]);
  HlPoint last = { place->points[n - 1].x + in.x * (place->lead_to - cut), place->points[n - 1].y + in.y * (place->lead_to - cut) };
  cairo_move_to (cr, place->points[0].x + out.x * place->lead_from, place->points[0].y + out.y * place->lead_from);
  for (guint i = 0; i + 1 < n; i++)
    {
      const HlPoint *to = i + 2 == n ? &last : &place->points[i + 1];
      if (place->n_arcs > 0 && place->points[i].y == place->points[i + 1].y)
        line_with_arcs (cr, place, &place->points[i], to);
      else
        cairo_line_to (cr, to->x, to->y);
    }
}

static void
draw_arrow (cairo_t *cr, const HlTheme *theme, const HlStreamPlace *place, gboolean is_stale)
{
  guint n = place->n_points;
  HlPoint in = direction (&place->points[n - 2], &place->points[n - 1]);
  double x = place->points[n - 1].x + in.x * (place->lead_to - 1.0), y = place->points[n - 1].y + in.y * (place->lead_to - 1.0);
  cairo_move_to (cr, x, y);
  cairo_line_to (cr, x - in.x * ARROW_LENGTH - in.y * ARROW_HALF, y - in.y * ARROW_LENGTH + in.x * ARROW_HALF);
  cairo_line_to (cr, x - in.x * ARROW_LENGTH + in.y * ARROW_HALF, y - in.y * ARROW_LENGTH - in.x * ARROW_HALF);
  cairo_close_path (cr);
  hl_set_colour (cr, hl_look_colour (theme, place->look, is_stale));
  cairo_fill (cr);
}

void
hl_draw_stream_line (cairo_t *cr, const HlTheme *theme, const HlStreamPlace *place, const HlStreamResult *result, gboolean is_stale, gboolean is_selected)
{
  (void) result;    /* the place knows the look already: the state alone does not tell cooling water */
  if (place->n_points < 2)
    return;
  cairo_save (cr);
  cairo_new_path (cr);
  if (is_selected)
    {
      stream_path (cr, place, 0.0);
      hl_set_colour (cr, &theme->selection);
      cairo_set_dash (cr, NULL, 0, 0.0);
      cairo_set_line_join (cr, CAIRO_LINE_JOIN_ROUND);
      cairo_set_line_width (cr, HALO);
      cairo_stroke (cr);
    }
  stream_path (cr, place, ARROW_LENGTH - 1.0);
  hl_set_look_pen (cr, theme, place->look, is_stale);
  cairo_stroke (cr);
  draw_arrow (cr, theme, place, is_stale);
  cairo_restore (cr);
}

/* The capsule that all labels are. */
static void
capsule (cairo_t *cr, const HlBox *box)
{
  double r = box->height / 2.0;
  cairo_new_sub_path (cr);
  cairo_arc (cr, box->x + box->width - r, box->y + r, r, -G_PI_2, G_PI_2);
  cairo_arc (cr, box->x + r, box->y + r, r, G_PI_2, 1.5 * G_PI);
  cairo_close_path (cr);
}

/* The stream's number, in a ring of the medium's colour. */
static void
draw_ring (cairo_t *cr, const HlTheme *theme, const char *id, double x, double y, const HlColour *colour)
{
  double size = 9.5, room = 2.0 * HL_LABEL_RING - 4.0, width = hl_text_width (theme, id, size, TRUE);
  if (width > room)
    size = MAX (size * room / width, 5.0);
  hl_set_colour (cr, colour);
  cairo_set_line_width (cr, 1.4);
  cairo_arc (cr, x, y, HL_LABEL_RING, 0.0, 2.0 * G_PI);
  cairo_stroke (cr);
  hl_text_show (cr, theme, id, x, y + size * 0.36, 0, size, TRUE);
}

static void
draw_label_words (cairo_t *cr, const HlTheme *theme, const HlStreamPlace *place, gboolean is_stale)
{
  double x = place->label.x + HL_LABEL_TEXT_LEFT, y = place->label.y;
  gboolean has_both = place->label_lines[0] != NULL && place->label_lines[1] != NULL;
  if (place->label_lines[0] != NULL)
    {
      hl_set_colour (cr, is_stale ? &theme->quiet : &theme->ink);
      hl_text_show (cr, theme, place->label_lines[0], x, y + (has_both ? 12.3 : 17.8), -1, HL_LABEL_FLOW_SIZE, TRUE);
    }
  if (place->label_lines[1] != NULL)
    {
      hl_set_colour (cr, &theme->quiet);
      hl_text_show (cr, theme, place->label_lines[1], x, y + (has_both ? 23.4 : 17.4), -1, HL_LABEL_STATE_SIZE, FALSE);
    }
}

/* A hairline with a dot on the stream's line. */
static void
draw_leader (cairo_t *cr, const HlTheme *theme, const HlStreamPlace *place, const HlColour *colour)
{
  hl_set_colour (cr, &theme->quiet);
  cairo_set_line_width (cr, 0.8);
  hl_draw_polyline (cr, place->leader, 2);
  cairo_stroke (cr);
  hl_set_colour (cr, colour);
  cairo_arc (cr, place->leader[0].x, place->leader[0].y, 2.6, 0.0, 2.0 * G_PI);
  cairo_fill (cr);
}

void
hl_draw_stream_label (cairo_t *cr, const HlTheme *theme, const HlStreamPlace *place, const HlStream *stream, const HlStreamResult *result, gboolean is_stale, gboolean is_selected)
{
  const HlColour *colour = hl_look_colour (theme, place->look, is_stale);
  const HlBox *box = &place->label;
  (void) result;
  if (box->width <= 0.0)
    return;
  cairo_save (cr);
  cairo_set_dash (cr, NULL, 0, 0.0);
  cairo_new_path (cr);
  if (place->has_leader)
    draw_leader (cr, theme, place, colour);
  capsule (cr, box);
  hl_set_colour (cr, &theme->card);
  cairo_fill_preserve (cr);
  hl_set_colour (cr, is_selected ? &theme->accent : &theme->hairline);
  cairo_set_line_width (cr, is_selected ? 1.8 : 1.0);
  cairo_stroke (cr);
  draw_ring (cr, theme, stream->id, box->x + box->height / 2.0, box->y + box->height / 2.0, colour);
  if (place->label_lines[0] != NULL || place->label_lines[1] != NULL)
    {
      hl_set_colour (cr, colour);
      cairo_rectangle (cr, box->x + 28.0, box->y + 6.0, 2.4, box->height - 12.0);
      cairo_fill (cr);
      draw_label_words (cr, theme, place, is_stale);
    }
  cairo_restore (cr);
}

/* Grows @box so that (@x, @y) lies inside; a negative width: nothing in it yet. */
static void
include (HlBox *box, double x, double y)
{
  double right = MAX (box->x + box->width, x), bottom = MAX (box->y + box->height, y);
  if (box->width < 0.0)
    {
      *box = (HlBox) { x, y, 0.0, 0.0 };
      return;
    }
  box->x = MIN (box->x, x);
  box->y = MIN (box->y, y);
  box->width = right - box->x;
  box->height = bottom - box->y;
}

static void
grow (HlBox *box, double margin)
{
  *box = (HlBox) { box->x - margin, box->y - margin, box->width + 2.0 * margin, box->height + 2.0 * margin };
}

void
hl_stream_line_bounds (const HlStreamPlace *place, HlBox *box)
{
  *box = (HlBox) { 0.0, 0.0, -1.0, 0.0 };
  for (guint i = 0; i < place->n_points; i++)
    include (box, place->points[i].x, place->points[i].y);
  if (box->width < 0.0)
    box->width = 0.0;
  else
    grow (box, MAX (MAX (place->lead_from, place->lead_to), ARC_RADIUS) + HALO / 2.0 + 1.0);
}

void
hl_stream_label_bounds (const HlStreamPlace *place, HlBox *box)
{
  *box = place->label;
  if (!(box->width > 0.0))
    return;
  if (place->has_leader)
    for (guint i = 0; i < 2; i++)
      include (box, place->leader[i].x, place->leader[i].y);
  grow (box, 4.0);
}

void
hl_draw_shaft_line (cairo_t *cr, const HlTheme *theme, const HlPoint *points, guint n_points)
{
  cairo_save (cr);
  cairo_set_dash (cr, NULL, 0, 0.0);
  cairo_set_line_cap (cr, CAIRO_LINE_CAP_BUTT);
  cairo_set_line_join (cr, CAIRO_LINE_JOIN_MITER);
  cairo_new_path (cr);
  hl_draw_polyline (cr, points, n_points);
  hl_set_colour (cr, &theme->shaft);
  cairo_set_line_width (cr, 5.4);
  cairo_stroke_preserve (cr);
  hl_set_colour (cr, &theme->ground);
  cairo_set_line_width (cr, 3.0);
  cairo_stroke (cr);
  cairo_restore (cr);
}

void
hl_draw_component_title (cairo_t *cr, const HlTheme *theme, const HlComponentPlace *place)
{
  const HlBox *box = &place->title;
  double x = place->title_align < 0 ? box->x : place->title_align > 0 ? box->x + box->width : box->x + box->width / 2.0;
  HlColour veil = theme->ground;
  if (place->title_lines[0] == NULL)
    return;
  /* Where there is no place without a line, the line steps back behind the words. */
  veil.a = 0.8;
  hl_set_colour (cr, &veil);
  cairo_rectangle (cr, box->x - 1.0, box->y, box->width + 2.0, box->height);
  cairo_fill (cr);
  hl_set_colour (cr, &theme->ink);
  hl_text_show (cr, theme, place->title_lines[0], x, box->y + 10.6, place->title_align, HL_TITLE_SIZE, TRUE);
  if (place->title_lines[1] == NULL)
    return;
  hl_set_colour (cr, &theme->quiet);
  hl_text_show (cr, theme, place->title_lines[1], x, box->y + 10.6 + HL_TITLE_LINE - 0.4, place->title_align, HL_TITLE_FIGURE_SIZE, FALSE);
}

static void
draw_lines (cairo_t *cr, const HlTheme *theme, const HlLayout *layout, const HlPlant *plant, gboolean is_stale)
{
  for (guint i = 0; i < hl_layout_n_shafts (layout); i++)
    {
      guint n_points;
      const HlPoint *points = hl_layout_shaft (layout, i, &n_points);
      hl_draw_shaft_line (cr, theme, points, n_points);
    }
  for (guint i = 0; i < hl_plant_n_streams (plant); i++)
    hl_draw_stream_line (cr, theme, hl_layout_stream (layout, i), NULL, is_stale, FALSE);
}

void
hl_draw_canvas (cairo_t *cr, const HlTheme *theme, const HlLayout *layout, const HlPlant *plant, const HlSolution *solution)
{
  gboolean is_stale = solution != NULL && !hl_solution_is_solved (solution);
  draw_lines (cr, theme, layout, plant, is_stale);
  for (guint i = 0; i < hl_plant_n_components (plant); i++)
    {
      const HlComponent *component = hl_plant_component (plant, i);
      cairo_save (cr);
      cairo_translate (cr, component->x * HL_UNIT, component->y * HL_UNIT);
      hl_draw_symbol (cr, theme, component);
      cairo_restore (cr);
    }
  for (guint i = 0; i < hl_plant_n_components (plant); i++)
    hl_draw_component_title (cr, theme, hl_layout_component (layout, i));
  for (guint i = 0; i < hl_plant_n_streams (plant); i++)
    hl_draw_stream_label (cr, theme, hl_layout_stream (layout, i), hl_plant_stream (plant, i), NULL, is_stale, FALSE);
}
