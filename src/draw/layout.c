/* The layout of a plant: ways of the lines, arcs, shafts, then the words.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/layout-private.h"
#include <math.h>
#include <stdlib.h>

#define FIELD_MARGIN 14     /* room round the outermost components [grid units] */
#define SHAFT_LEAD   6.0    /* pixels that a shaft goes on beneath a symbol */
#define PICTURE_MARGIN 24.0

static void
stream_place_clear (HlStreamPlace *place)
{
  g_free (place->points);
  g_free (place->arcs);
  g_free (place->label_lines[0]);
  g_free (place->label_lines[1]);
}

static void
shaft_link_clear (gpointer data)
{
  HlShaftLink *link = data;
  g_free (link->points);
  g_free (link->grid);
}

HlLayout *
hl_layout_ref (HlLayout *layout)
{
  g_atomic_ref_count_inc (&layout->ref_count);
  return layout;
}

void
hl_layout_unref (HlLayout *layout)
{
  if (layout == NULL || !g_atomic_ref_count_dec (&layout->ref_count))
    return;
  for (guint i = 0; i < layout->n_streams; i++)
    {
      stream_place_clear (&layout->streams[i]);
      g_array_unref (layout->ways[i]);
    }
  for (guint i = 0; i < layout->n_components; i++)
    {
      g_free (layout->components[i].title_lines[0]);
      g_free (layout->components[i].title_lines[1]);
    }
  g_free (layout->streams);
  g_free (layout->spots);
  g_free (layout->title_prices);
  g_free (layout->ways);
  g_free (layout->components);
  g_array_unref (layout->shafts);
  hl_plant_unref (layout->plant);
  g_free (layout);
}

/* The field. */
static void
widen_field (HlLayout *layout, int left, int top, int right, int bottom)
{
  layout->left = MIN (layout->left, left);
  layout->top = MIN (layout->top, top);
  layout->right = MAX (layout->right, right);
  layout->bottom = MAX (layout->bottom, bottom);
}

static void
measure_field (HlLayout *layout)
{
  layout->left = layout->top = G_MAXINT / 4;
  layout->right = layout->bottom = -G_MAXINT / 4;
  for (guint i = 0; i < layout->n_components; i++)
    {
      const HlComponent *c = hl_plant_component (layout->plant, i);
      int w, h;
      hl_component_half_size (c, &w, &h);
      widen_field (layout, c->x - w, c->y - h, c->x + w, c->y + h);
    }
  for (guint i = 0; i < layout->n_streams; i++)
    {
      const HlStream *stream = hl_plant_stream (layout->plant, i);
      for (guint k = 0; k < stream->n_route; k++)
        widen_field (layout, stream->route[k].x, stream->route[k].y, stream->route[k].x, stream->route[k].y);
    }
  if (layout->left > layout->right)
    layout->left = layout->top = layout->right = layout->bottom = 0;
  layout->left -= FIELD_MARGIN;
  layout->top -= FIELD_MARGIN;
  layout->right += FIELD_MARGIN;
  layout->bottom += FIELD_MARGIN;
}

static HlRouter *
make_router (const HlLayout *layout)
{
  HlRouter *router = hl_router_new (layout->left, layout->top, layout->right, layout->bottom);
  for (guint i = 0; router != NULL && i < layout->n_components; i++)
    {
      const HlComponent *c = hl_plant_component (layout->plant, i);
      int w, h;
      hl_component_half_size (c, &w, &h);
      hl_router_add_box (router, c->x - w, c->y - h, c->x + w, c->y + h);
    }
  return router;
}

/* Shafts. */
static int
compare_along (gconstpointer a, gconstpointer b, gpointer is_down)
{
  const HlComponent *x = *(const HlComponent *const *) a, *y = *(const HlComponent *const *) b;
  int from = is_down ? x->y : x->x, to = is_down ? y->y : y->x;
  return (from > to) - (from < to);
}

/* The pair of shaft ends of two neighbours that lie closest. */
static void
closest_ends (const HlComponent *a, const HlComponent *b, HlGridPoint ends[2], HlGridPoint inward[2])
{
  int best = G_MAXINT;
  for (int i = 0; i < 4; i++)
    {
      HlGridPoint p, q;
      int distance;
      hl_component_shaft_place (a, i % 2, &p.x, &p.y);
      hl_component_shaft_place (b, i / 2, &q.x, &q.y);
      distance = ABS (p.x - q.x) + ABS (p.y - q.y);
      if (distance >= best)
        continue;
      best = distance;
      ends[0] = p;
      ends[1] = q;
      inward[0].x = (a->x > p.x) - (a->x < p.x);
      inward[0].y = (a->y > p.y) - (a->y < p.y);
      inward[1].x = (b->x > q.x) - (b->x < q.x);
      inward[1].y = (b->y > q.y) - (b->y < q.y);
    }
}

static void
add_shaft_link (HlLayout *layout, const HlComponent *a, const HlComponent *b)
{
  HlShaftLink link = { 0 };
  HlGridPoint ends[2] = { { 0 } }, inward[2] = { { 0 } };
  closest_ends (a, b, ends, inward);
  link.grid = g_new (HlGridPoint, 4);
  link.grid[link.n_points++] = ends[0];
  if (ends[0].x != ends[1].x && ends[0].y != ends[1].y)
    {
      gboolean is_down = inward[0].x == 0;
      HlGridPoint first = ends[0], second = ends[1];
      if (is_down)
        first.y = second.y = (ends[0].y + ends[1].y) / 2;
      else
        first.x = second.x = (ends[0].x + ends[1].x) / 2;
      link.grid[link.n_points++] = first;
      link.grid[link.n_points++] = second;
    }
  link.grid[link.n_points++] = ends[1];
  link.points = g_new (HlPoint, link.n_points);
  for (guint i = 0; i < link.n_points; i++)
    link.points[i] = (HlPoint) { link.grid[i].x * HL_UNIT, link.grid[i].y * HL_UNIT };
  link.points[0].x += inward[0].x * SHAFT_LEAD;
  link.points[0].y += inward[0].y * SHAFT_LEAD;
  link.points[link.n_points - 1].x += inward[1].x * SHAFT_LEAD;
  link.points[link.n_points - 1].y += inward[1].y * SHAFT_LEAD;
  g_array_append_val (layout->shafts, link);
}

static void
lay_shaft (HlLayout *layout, const HlShaft *shaft)
{
  g_autoptr (GPtrArray) joined = g_ptr_array_new ();
  int left = G_MAXINT, right = -G_MAXINT, top = G_MAXINT, bottom = -G_MAXINT;
  gboolean has_gearbox = FALSE;
  for (guint i = 0; i < shaft->n_joins; i++)
    {
      const HlComponent *c = hl_plant_find_component (layout->plant, shaft->joins[i]);
      if (c == NULL)
        continue;
      g_ptr_array_add (joined, (gpointer) c);
      has_gearbox |= c->kind->shaft == HL_SHAFT_LOSS;
      left = MIN (left, c->x);
      right = MAX (right, c->x);
      top = MIN (top, c->y);
      bottom = MAX (bottom, c->y);
    }
  if (joined->len < 2)
    return;
  /* What a gearbox stands between matters, so its shaft is drawn in its order; any other along the way that it lies. */
  if (!has_gearbox)
    g_ptr_array_sort_with_data (joined, compare_along, GINT_TO_POINTER (bottom - top > right - left));
  for (guint i = 0; i + 1 < joined->len; i++)
    add_shaft_link (layout, joined->pdata[i], joined->pdata[i + 1]);
}

/* Lines. */
typedef struct {
  HlRouteEnd from, to;
  gboolean   is_whole;     /* both ports exist */
  gboolean   is_kept;      /* way taken over from the layout before */
  guint      stream;
  int        distance;
} Job;

static gboolean
find_end (const HlPlant *plant, const char *component_id, const char *port, HlRouteEnd *end, double *lead)
{
  const HlComponent *component = hl_plant_find_component (plant, component_id);
  guint n;
  if (component == NULL || !hl_component_find_port (component, port, &n))
    return FALSE;
  hl_component_port_place (component, n, &end->x, &end->y, &end->side);
  end->any_side = FALSE;
  *lead = hl_symbol_lead (component, n);
  return TRUE;
}

static Job *
list_jobs (HlLayout *layout)
{
  Job *jobs = g_new0 (Job, layout->n_streams + 1);
  for (guint i = 0; i < layout->n_streams; i++)
    {
      const HlStream *stream = hl_plant_stream (layout->plant, i);
      HlStreamPlace *place = &layout->streams[i];
      jobs[i].stream = i;
      jobs[i].is_whole = find_end (layout->plant, stream->from_id, stream->from_port, &jobs[i].from, &place->lead_from)
        && find_end (layout->plant, stream->to_id, stream->to_port, &jobs[i].to, &place->lead_to);
      jobs[i].distance = ABS (jobs[i].from.x - jobs[i].to.x) + ABS (jobs[i].from.y - jobs[i].to.y);
    }
  return jobs;
}

static const HlGridPoint *
way_points (const GArray *way)
{
  return (const HlGridPoint *) (gconstpointer) way->data;
}

static gboolean
leaves_towards (const HlGridPoint *end, const HlGridPoint *next, HlSide side)
{
  switch (side)
    {
    case HL_SIDE_RIGHT: return next->x > end->x;
    case HL_SIDE_LEFT:  return next->x < end->x;
    case HL_SIDE_DOWN:  return next->y > end->y;
    default:            return next->y < end->y;
    }
}

/* The old way serves when its ends and hand-set bends are the same and nothing has been put across it. */
static gboolean
keep_way (HlLayout *layout, const HlLayout *previous, HlRouter *router, const Job *job)
{
  const HlStream *stream = hl_plant_stream (layout->plant, job->stream);
  int n = hl_plant_stream_index (previous->plant, stream->id);
  const HlStream *before = n >= 0 ? hl_plant_stream (previous->plant, n) : NULL;
  const HlGridPoint *points;
  guint n_points;
  if (before == NULL || previous->ways[n]->len < 2 || before->n_route != stream->n_route)
    return FALSE;
  for (guint i = 0; i < stream->n_route; i++)
    if (before->route[i].x != stream->route[i].x || before->route[i].y != stream->route[i].y)
      return FALSE;
  points = way_points (previous->ways[n]);
  n_points = previous->ways[n]->len;
  if (points[0].x != job->from.x || points[0].y != job->from.y
      || points[n_points - 1].x != job->to.x || points[n_points - 1].y != job->to.y)
    return FALSE;
  if (!leaves_towards (&points[0], &points[1], job->from.side) || !leaves_towards (&points[n_points - 1], &points[n_points - 2], job->to.side))
    return FALSE;
  if (hl_router_is_blocked (router, points, n_points, &job->from, &job->to))
    return FALSE;
  g_array_append_vals (layout->ways[job->stream], points, n_points);
  return TRUE;
}

static int
compare_jobs (gconstpointer a, gconstpointer b)
{
  const Job *x = a, *y = b;
  return x->distance != y->distance ? (x->distance > y->distance) - (x->distance < y->distance) : (x->stream > y->stream) - (x->stream < y->stream);
}

static void
route_one (HlLayout *layout, HlRouter *router, const Job *job)
{
  const HlStream *stream = hl_plant_stream (layout->plant, job->stream);
  GArray *way = layout->ways[job->stream];
  if (router == NULL)
    hl_router_plain_way (&job->from, &job->to, way);
  else
    {
      hl_router_find (router, &job->from, &job->to, stream->route, stream->n_route, way);
      if (stream->n_route == 0)
        hl_router_settle (router, way);
      hl_router_add_line (router, way_points (way), way->len);
    }
}

/* Short lines first, then each once more with all the others in place. */
static void
route_all (HlLayout *layout, const HlLayout *previous)
{
  g_autoptr (HlRouter) router = make_router (layout);
  g_autofree Job *jobs = list_jobs (layout);
  for (guint i = 0; router != NULL && i < layout->shafts->len; i++)
    {
      const HlShaftLink *link = &g_array_index (layout->shafts, HlShaftLink, i);
      hl_router_add_line (router, link->grid, link->n_points);
    }
  for (guint i = 0; router != NULL && previous != NULL && i < layout->n_streams; i++)
    if (jobs[i].is_whole && (jobs[i].is_kept = keep_way (layout, previous, router, &jobs[i])))
      hl_router_add_line (router, way_points (layout->ways[i]), layout->ways[i]->len);
  qsort (jobs, layout->n_streams, sizeof (Job), compare_jobs);
  for (int round = 0; round < 2; round++)
    for (guint i = 0; i < layout->n_streams; i++)
      {
        const GArray *way = layout->ways[jobs[i].stream];
        if (!jobs[i].is_whole || jobs[i].is_kept || (round > 0 && router == NULL))
          continue;
        if (round > 0)
          hl_router_remove_line (router, way_points (way), way->len);
        route_one (layout, router, &jobs[i]);
      }
}

static void
set_points (HlLayout *layout)
{
  for (guint i = 0; i < layout->n_streams; i++)
    {
      HlStreamPlace *place = &layout->streams[i];
      const HlGridPoint *way = way_points (layout->ways[i]);
      place->n_points = layout->ways[i]->len;
      place->points = g_new (HlPoint, place->n_points + 1);
      for (guint k = 0; k < place->n_points; k++)
        place->points[k] = (HlPoint) { way[k].x * HL_UNIT, way[k].y * HL_UNIT };
    }
}

/* Arcs: where a horizontal piece of one line meets the inside of a vertical piece of another. */
typedef struct { int x, top, bottom; } Upright;

static int
compare_uprights (gconstpointer a, gconstpointer b)
{
  const Upright *p = a, *q = b;
  return (p->x > q->x) - (p->x < q->x);
}

static GArray *
list_uprights (const HlLayout *layout)
{
  GArray *uprights = g_array_new (FALSE, FALSE, sizeof (Upright));
  for (guint i = 0; i < layout->n_streams; i++)
    for (guint k = 0; k + 1 < layout->ways[i]->len; k++)
      {
        const HlGridPoint *a = &g_array_index (layout->ways[i], HlGridPoint, k);
        Upright upright = { a->x, MIN (a[0].y, a[1].y), MAX (a[0].y, a[1].y) };
        if (a[0].x == a[1].x && upright.bottom > upright.top)
          g_array_append_val (uprights, upright);
      }
  g_array_sort (uprights, compare_uprights);
  return uprights;
}

static void
add_arcs_of_piece (GArray *arcs, const GArray *uprights, const HlGridPoint *a)
{
  int left = MIN (a[0].x, a[1].x), right = MAX (a[0].x, a[1].x);
  guint low = 0, high = uprights->len;
  while (low < high)
    {
      guint middle = (low + high) / 2;
      if (g_array_index (uprights, Upright, middle).x <= left)
        low = middle + 1;
      else
        high = middle;
    }
  for (; low < uprights->len; low++)
    {
      const Upright *u = &g_array_index (uprights, Upright, low);
      HlPoint arc = { u->x * HL_UNIT, a->y * HL_UNIT };
      if (u->x >= right)
        return;
      if (a->y > u->top && a->y < u->bottom
          && (arcs->len == 0 || g_array_index (arcs, HlPoint, arcs->len - 1).x < arc.x || g_array_index (arcs, HlPoint, arcs->len - 1).y != arc.y))
        g_array_append_val (arcs, arc);
    }
}

static void
set_arcs (HlLayout *layout)
{
  g_autoptr (GArray) uprights = list_uprights (layout);
  for (guint i = 0; i < layout->n_streams; i++)
    {
      GArray *arcs = g_array_new (FALSE, FALSE, sizeof (HlPoint));
      for (guint k = 0; k + 1 < layout->ways[i]->len; k++)
        {
          const HlGridPoint *a = &g_array_index (layout->ways[i], HlGridPoint, k);
          if (a[0].y == a[1].y)
            add_arcs_of_piece (arcs, uprights, a);
        }
      layout->streams[i].n_arcs = arcs->len;
      layout->streams[i].arcs = (HlPoint *) (gpointer) g_array_free (arcs, FALSE);
    }
}

/* Extents. */
static void
include (HlBox *extents, double x, double y, double width, double height)
{
  double right = MAX (extents->x + extents->width, x + width), bottom = MAX (extents->y + extents->height, y + height);
  if (extents->width < 0.0)
    {
      *extents = (HlBox) { x, y, width, height };
      return;
    }
  extents->x = MIN (extents->x, x);
  extents->y = MIN (extents->y, y);
  extents->width = right - extents->x;
  extents->height = bottom - extents->y;
}

static void
measure_extents (HlLayout *layout)
{
  HlBox extents = { 0.0, 0.0, -1.0, -1.0 };
  for (guint i = 0; i < layout->n_components; i++)
    {
      const HlComponent *c = hl_plant_component (layout->plant, i);
      const HlBox *title = &layout->components[i].title;
      int w, h;
      hl_component_half_size (c, &w, &h);
      include (&extents, (c->x - w) * HL_UNIT, (c->y - h) * HL_UNIT, 2.0 * w * HL_UNIT, 2.0 * h * HL_UNIT);
      include (&extents, title->x, title->y, title->width, title->height);
    }
  for (guint i = 0; i < layout->n_streams; i++)
    {
      const HlStreamPlace *place = &layout->streams[i];
      for (guint k = 0; k < place->n_points; k++)
        include (&extents, place->points[k].x, place->points[k].y, 0.0, 0.0);
      if (place->label.width > 0.0)
        include (&extents, place->label.x, place->label.y, place->label.width, place->label.height);
    }
  if (extents.width < 0.0)
    extents = (HlBox) { 0.0, 0.0, 0.0, 0.0 };
  layout->extents = (HlBox) { extents.x - PICTURE_MARGIN, extents.y - PICTURE_MARGIN,
                              extents.width + 2.0 * PICTURE_MARGIN, extents.height + 2.0 * PICTURE_MARGIN };
}

HlLayout *
hl_layout_next (const HlLayout *previous, const HlPlant *plant, const HlSolution *solution, const HlTheme *theme)
{
  HlLayout *layout;
  g_return_val_if_fail (plant != NULL && theme != NULL, NULL);
  layout = g_new0 (HlLayout, 1);
  g_atomic_ref_count_init (&layout->ref_count);
  layout->plant = hl_plant_ref ((HlPlant *) plant);
  layout->n_streams = hl_plant_n_streams (plant);
  layout->n_components = hl_plant_n_components (plant);
  layout->streams = g_new0 (HlStreamPlace, layout->n_streams + 1);
  layout->title_prices = g_new0 (double, layout->n_components + 1);
  layout->spots = g_new0 (HlLabelSpot, layout->n_streams + 1);
  layout->components = g_new0 (HlComponentPlace, layout->n_components + 1);
  layout->ways = g_new0 (GArray *, layout->n_streams + 1);
  for (guint i = 0; i < layout->n_streams; i++)
    layout->ways[i] = g_array_new (FALSE, FALSE, sizeof (HlGridPoint));
  layout->shafts = g_array_new (FALSE, FALSE, sizeof (HlShaftLink));
  g_array_set_clear_func (layout->shafts, shaft_link_clear);
  measure_field (layout);
  for (guint i = 0; i < hl_plant_n_shafts (plant); i++)
    lay_shaft (layout, hl_plant_shaft (plant, i));
  route_all (layout, previous);
  set_points (layout);
  set_arcs (layout);
  hl_layout_set_looks (layout, solution);
  hl_layout_set_words (layout, solution, theme);
  hl_layout_place_words (layout, previous);
  measure_extents (layout);
  return layout;
}

HlLayout *
hl_layout_new (const HlPlant *plant, const HlSolution *solution, const HlTheme *theme)
{
  return hl_layout_next (NULL, plant, solution, theme);
}

const HlStreamPlace *
hl_layout_stream (const HlLayout *layout, guint stream)
{
  g_return_val_if_fail (stream < layout->n_streams, NULL);
  return &layout->streams[stream];
}

const HlComponentPlace *
hl_layout_component (const HlLayout *layout, guint component)
{
  g_return_val_if_fail (component < layout->n_components, NULL);
  return &layout->components[component];
}

void
hl_layout_extents (const HlLayout *layout, HlBox *box)
{
  *box = layout->extents;
}

guint
hl_layout_n_shafts (const HlLayout *layout)
{
  return layout->shafts->len;
}

const HlPoint *
hl_layout_shaft (const HlLayout *layout, guint n, guint *n_points)
{
  const HlShaftLink *link;
  g_return_val_if_fail (n < layout->shafts->len, NULL);
  link = &g_array_index (layout->shafts, HlShaftLink, n);
  *n_points = link->n_points;
  return link->points;
}

static double
distance_to_piece (const HlPoint *a, const HlPoint *b, double x, double y)
{
  double nearest_x = CLAMP (x, MIN (a->x, b->x), MAX (a->x, b->x)), nearest_y = CLAMP (y, MIN (a->y, b->y), MAX (a->y, b->y));
  return hypot (x - nearest_x, y - nearest_y);
}

int
hl_layout_stream_at (const HlLayout *layout, double x, double y, double within)
{
  double nearest = within;
  int found = -1;
  for (guint i = 0; i < layout->n_streams; i++)
    {
      const HlBox *label = &layout->streams[i].label;
      if (label->width > 0.0 && x >= label->x && y >= label->y && x <= label->x + label->width && y <= label->y + label->height)
        return (int) i;
    }
  for (guint i = 0; i < layout->n_streams; i++)
    for (guint k = 0; k + 1 < layout->streams[i].n_points; k++)
      {
        double distance = distance_to_piece (&layout->streams[i].points[k], &layout->streams[i].points[k + 1], x, y);
        if (distance <= nearest)
          {
            nearest = distance;
            found = (int) i;
          }
      }
  return found;
}

HlPoint *
hl_route_preview (const HlPlant *plant, const char *from_id, const char *from_port, double x, double y, guint *n)
{
  HlLayout field = { .plant = (HlPlant *) plant, .n_components = hl_plant_n_components (plant) };
  HlRouteEnd from, to = { .x = (int) lround (x / HL_UNIT), .y = (int) lround (y / HL_UNIT), .any_side = TRUE };
  g_autoptr (HlRouter) router = NULL;
  g_autoptr (GArray) way = g_array_new (FALSE, FALSE, sizeof (HlGridPoint));
  HlPoint *points;
  double lead;
  *n = 0;
  if (!find_end (plant, from_id, from_port, &from, &lead))
    return NULL;
  measure_field (&field);
  widen_field (&field, to.x - 4, to.y - 4, to.x + 4, to.y + 4);
  router = make_router (&field);
  if (router != NULL)
    hl_router_find (router, &from, &to, NULL, 0, way);
  else
    hl_router_plain_way (&from, &to, way);
  points = g_new (HlPoint, way->len);
  for (guint i = 0; i < way->len; i++)
    points[i] = (HlPoint) { way_points (way)[i].x * HL_UNIT, way_points (way)[i].y * HL_UNIT };
  *n = way->len;
  return points;
}
