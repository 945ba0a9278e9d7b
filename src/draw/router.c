/* Orthogonal routing: A* over cell and heading, with prices for bends, crossings and closeness.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/router.h"
#include <stdlib.h>
#include <string.h>

/* Prices.  A bend is worth a detour of five units, a crossing one of six; running along on another line is all but forbidden. */
#define STEP      10
#define BEND      50
#define CROSSING  60
#define OVERLAP   900
#define BESIDE    9       /* a unit of running one unit beside another line */
#define NEAR      12      /* a unit of running one unit beside a box */
#define NEARER    5       /* two units beside it */
#define BLOCKED   0x80
#define MOST_STEPS 400000

struct _HlRouter {
  int      left, top;            /* canvas place of cell 0 */
  int      width, height;        /* cells, a closed border of one cell included */
  guint8  *fixed;                /* BLOCKED, or the price of closeness to boxes */
  guint8  *across, *down;        /* lines that pass a cell horizontally and vertically */
  /* Search: one entry a state (cell * 4 + heading); valid where stamp == run. */
  guint32 *price;
  guint32 *stamp;
  guint8  *came;                 /* heading before */
  guint32  run;
  GArray  *heap;                 /* Open */
};
typedef struct { guint32 rank, state; } Open;

static const int step_x[4] = { 1, 0, -1, 0 };   /* as HlSide */
static const int step_y[4] = { 0, 1, 0, -1 };

HlRouter *
hl_router_new (int left, int top, int right, int bottom)
{
  HlRouter *router;
  gint64 width = (gint64) right - left + 3, height = (gint64) bottom - top + 3;
  gsize n;
  if (width < 3 || height < 3 || width > HL_ROUTER_MOST_CELLS || height > HL_ROUTER_MOST_CELLS
      || width * height > HL_ROUTER_MOST_CELLS)
    return NULL;
  router = g_new0 (HlRouter, 1);
  router->left = left - 1;
  router->top = top - 1;
  router->width = (int) width;
  router->height = (int) height;
  n = (gsize) (width * height);
  router->fixed = g_malloc0 (n);
  router->across = g_malloc0 (n);
  router->down = g_malloc0 (n);
  router->price = g_new (guint32, n * 4);
  router->stamp = g_new0 (guint32, n * 4);
  router->came = g_malloc (n * 4);
  router->heap = g_array_new (FALSE, FALSE, sizeof (Open));
  memset (router->fixed, BLOCKED, width);
  memset (router->fixed + n - width, BLOCKED, width);
  for (gsize y = 0; y < (gsize) height; y++)
    router->fixed[y * width] = router->fixed[y * width + width - 1] = BLOCKED;
  return router;
}

void
hl_router_free (HlRouter *router)
{
  if (router == NULL)
    return;
  g_free (router->fixed);
  g_free (router->across);
  g_free (router->down);
  g_free (router->price);
  g_free (router->stamp);
  g_free (router->came);
  g_array_unref (router->heap);
  g_free (router);
}

/* -1 outside the field or on its border. */
static int
cell_at (const HlRouter *router, int x, int y)
{
  int column = x - router->left, row = y - router->top;
  if (column < 1 || row < 1 || column >= router->width - 1 || row >= router->height - 1)
    return -1;
  return row * router->width + column;
}

static void
raise_fixed (HlRouter *router, int x, int y, guint8 value)
{
  int cell = cell_at (router, x, y);
  if (cell >= 0 && router->fixed[cell] < value)
    router->fixed[cell] = value;
}

void
hl_router_add_box (HlRouter *router, int left, int top, int right, int bottom)
{
  for (int y = top - 2; y <= bottom + 2; y++)
    for (int x = left - 2; x <= right + 2; x++)
      {
        int off_x = x < left ? left - x : x > right ? x - right : 0;
        int off_y = y < top ? top - y : y > bottom ? y - bottom : 0;
        int off = MAX (off_x, off_y);
        raise_fixed (router, x, y, off == 0 ? BLOCKED : off == 1 ? NEAR : NEARER);
      }
}

/* Calls back each cell of a polyline with whether it is passed horizontally and vertically. */
static void
mark_line (HlRouter *router, const HlGridPoint *points, guint n_points, int by)
{
  for (guint i = 0; i + 1 < n_points; i++)
    {
      const HlGridPoint *a = &points[i], *b = &points[i + 1];
      gboolean is_across = a->y == b->y;
      guint8 *marks = is_across ? router->across : router->down;
      int n = abs (is_across ? b->x - a->x : b->y - a->y);
      int dx = (b->x > a->x) - (b->x < a->x), dy = (b->y > a->y) - (b->y < a->y);
      for (int k = 0; k <= n; k++)
        {
          int cell = cell_at (router, a->x + dx * k, a->y + dy * k);
          if (cell >= 0 && (by > 0 ? marks[cell] < 255 : marks[cell] > 0))
            marks[cell] = (guint8) (marks[cell] + by);
        }
    }
}

void
hl_router_add_line (HlRouter *router, const HlGridPoint *points, guint n_points)
{
  mark_line (router, points, n_points, 1);
}

void
hl_router_remove_line (HlRouter *router, const HlGridPoint *points, guint n_points)
{
  mark_line (router, points, n_points, -1);
}

/* What it costs to be in a cell while heading that way. */
static inline guint32
price_of_cell (const HlRouter *router, int cell, int heading)
{
  guint32 price = STEP + (router->fixed[cell] & 0x7f);
  const guint8 *along, *cross;
  int aside;
  if (heading % 2 == 0)
    {
      along = router->across;
      cross = router->down;
      aside = router->width;
    }
  else
    {
      along = router->down;
      cross = router->across;
      aside = 1;
    }
  if (along[cell])
    price += OVERLAP;
  if (cross[cell])
    price += CROSSING;
  if (along[cell - aside])
    price += BESIDE;
  if (along[cell + aside])
    price += BESIDE;
  return price;
}

static inline guint32
price_of_turn (const HlRouter *router, int cell, int new_heading)
{
  const guint8 *along = new_heading % 2 == 0 ? router->across : router->down;
  return BEND + (along[cell] ? OVERLAP : 0);
}

/* Fewest bends from a heading to another one over the distance (dx, dy); never too many, so that A* stays exact. */
static inline int
least_bends (int dx, int dy, int heading, int last_heading)
{
  int ahead = dx * step_x[heading] + dy * step_y[heading];
  int aside = abs (heading % 2 == 0 ? dy : dx);
  if (last_heading < 0)
    {
      if (aside == 0)
        return ahead >= 0 ? 0 : 3;
      return ahead >= 0 ? 1 : 2;
    }
  switch ((last_heading - heading + 4) % 4)
    {
    case 0:
      if (aside == 0)
        return ahead >= 0 ? 0 : 4;
      return ahead > 0 ? 2 : 4;
    case 2:
      return aside > 0 ? 2 : 4;
    default:
      return ahead >= 0 && dx * step_x[last_heading] + dy * step_y[last_heading] >= 0 ? 1 : 3;
    }
}

static void
heap_push (GArray *heap, guint32 rank, guint32 state)
{
  Open entry = { rank, state };
  Open *items;
  guint i = heap->len;
  g_array_append_val (heap, entry);
  items = (Open *) (gpointer) heap->data;
  while (i > 0 && items[(i - 1) / 2].rank > rank)
    {
      items[i] = items[(i - 1) / 2];
      i = (i - 1) / 2;
    }
  items[i] = entry;
}

static Open
heap_pop (GArray *heap)
{
  Open *items = (Open *) (gpointer) heap->data;
  Open first = items[0], last = items[heap->len - 1];
  guint n = heap->len - 1, i = 0;
  g_array_set_size (heap, n);
  while (2 * i + 1 < n)
    {
      guint child = 2 * i + 1;
      if (child + 1 < n && items[child + 1].rank < items[child].rank)
        child++;
      if (items[child].rank >= last.rank)
        break;
      items[i] = items[child];
      i = child;
    }
  if (n > 0)
    items[i] = last;
  return first;
}

typedef struct {
  int      start, goal;         /* cells */
  int      goal_x, goal_y;
  int      start_heading;       /* -1: any */
  int      goal_heading;        /* -1: any */
  gboolean must_start_straight;
  guint32  haste;                /* eighths by which what lies ahead counts more than it costs: less is looked at, more paid */
  gboolean starts_at_bend;       /* a hand has set a bend here: where all else is equal the line turns here, not later */
} Leg;

/* Price up to a state and at least on to the goal. */
static inline guint32
rank_of (const HlRouter *router, const Leg *leg, int cell, int heading, guint32 price)
{
  int x = cell % router->width + router->left, y = cell / router->width + router->top;
  int dx = leg->goal_x - x, dy = leg->goal_y - y;
  guint32 ahead = STEP * (abs (dx) + abs (dy)) + BEND * least_bends (dx, dy, heading, leg->goal_heading);
  return price + ahead + ahead * leg->haste / 8;
}

static void
open_state (HlRouter *router, const Leg *leg, int cell, int heading, int came, guint32 price)
{
  guint32 state = (guint32) cell * 4 + heading;
  if (router->stamp[state] == router->run && router->price[state] <= price)
    return;
  router->stamp[state] = router->run;
  router->price[state] = price;
  router->came[state] = (guint8) came;
  heap_push (router->heap, rank_of (router, leg, cell, heading, price), state);
}

static void
expand (HlRouter *router, const Leg *leg, int cell, int heading, guint32 price)
{
  const int offsets[4] = { 1, router->width, -1, -router->width };
  for (int turn = 3; turn <= 5; turn++)    /* left, straight, right */
    {
      int new_heading = (heading + turn) % 4;
      int next = cell + offsets[new_heading];
      guint32 total = price;
      if (turn != 4)
        {
          if (cell == leg->start && leg->must_start_straight)
            continue;
          total += price_of_turn (router, cell, new_heading);
        }
      else if (cell == leg->start && leg->starts_at_bend)
        total += STEP / 2;
      if (router->fixed[next] == BLOCKED)
        continue;
      open_state (router, leg, next, new_heading, heading, total + price_of_cell (router, next, new_heading));
    }
}

/* Appends the corners of the way found, its first cell left out when @skip_first; returns the last heading. */
static int
trace (HlRouter *router, const Leg *leg, guint32 state, gboolean skip_first, GArray *way)
{
  const int offsets[4] = { 1, router->width, -1, -router->width };
  guint insert_at = way->len;
  int last_heading = state % 4, cell = state / 4, heading = last_heading;
  HlGridPoint point = { leg->goal_x, leg->goal_y };
  g_array_insert_val (way, insert_at, point);
  while (cell != leg->start)
    {
      int before = router->came[cell * 4 + heading];
      cell -= offsets[heading];
      if (cell != leg->start && before != heading)
        {
          point.x = cell % router->width + router->left;
          point.y = cell / router->width + router->top;
          g_array_insert_val (way, insert_at, point);
        }
      heading = before;
    }
  if (!skip_first)
    {
      point.x = cell % router->width + router->left;
      point.y = cell / router->width + router->top;
      g_array_insert_val (way, insert_at, point);
    }
  return last_heading;
}

/* Returns the heading at the goal, -1 where there is no way, -2 where @most steps did not find one. */
static int
search_with_haste (HlRouter *router, const Leg *leg, guint most, gboolean skip_first, GArray *way)
{
  router->run++;
  g_array_set_size (router->heap, 0);
  for (int heading = 0; heading < 4; heading++)
    if (leg->start_heading < 0 || heading == leg->start_heading)
      open_state (router, leg, leg->start, heading, heading, 0);
  for (guint n = 0; router->heap->len > 0; n++)
    {
      Open best = heap_pop (router->heap);
      int cell = best.state / 4, heading = best.state % 4;
      if (n >= most)
        return -2;
      if (cell == leg->goal && (leg->goal_heading < 0 || heading == leg->goal_heading))
        return trace (router, leg, best.state, skip_first, way);
      if (best.rank > rank_of (router, leg, cell, heading, router->price[best.state]))
        continue;    /* improved since, and expanded then */
      expand (router, leg, cell, heading, router->price[best.state]);
    }
  return -1;
}

/* Carefully first; through a thicket of lines, where nearly every way costs the same, with haste. */
static int
search (HlRouter *router, Leg *leg, gboolean skip_first, GArray *way)
{
  static const struct { guint32 haste; guint most; } tries[] = { { 1, 4000 }, { 8, 6000 }, { 40, MOST_STEPS } };
  int heading = -2;
  for (guint i = 0; i < G_N_ELEMENTS (tries) && heading == -2; i++)
    {
      leg->haste = tries[i].haste;
      heading = search_with_haste (router, leg, tries[i].most, skip_first, way);
    }
  return heading;
}

/* The cells from a port out of its own box are opened for its line, and closed again afterwards. */
typedef struct { int cell; guint8 was; } Opened;

static void
open_cell (HlRouter *router, int cell, GArray *opened)
{
  Opened entry = { cell, router->fixed[cell] };
  router->fixed[cell] = 0;
  g_array_append_val (opened, entry);
}

static void
open_lane (HlRouter *router, const HlRouteEnd *end, GArray *opened)
{
  for (int k = 0; k < 16; k++)
    {
      int cell = cell_at (router, end->x + (end->any_side ? 0 : k * step_x[end->side]),
                          end->y + (end->any_side ? 0 : k * step_y[end->side]));
      if (cell < 0 || router->fixed[cell] != BLOCKED)
        return;
      open_cell (router, cell, opened);
    }
}

static void
close_again (HlRouter *router, GArray *opened)
{
  for (guint i = opened->len; i-- > 0;)
    {
      const Opened *entry = &g_array_index (opened, Opened, i);
      router->fixed[entry->cell] = entry->was;
    }
}

static gboolean
crosses_box (const HlRouter *router, const HlGridPoint *points, guint n_points)
{
  for (guint i = 0; i + 1 < n_points; i++)
    {
      const HlGridPoint *a = &points[i], *b = &points[i + 1];
      int n = MAX (abs (b->x - a->x), abs (b->y - a->y));
      int dx = (b->x > a->x) - (b->x < a->x), dy = (b->y > a->y) - (b->y < a->y);
      for (int k = 0; k <= n; k++)
        {
          int cell = cell_at (router, a->x + dx * k, a->y + dy * k);
          if (cell < 0 || router->fixed[cell] == BLOCKED)
            return TRUE;
        }
    }
  return FALSE;
}

gboolean
hl_router_is_blocked (HlRouter *router, const HlGridPoint *points, guint n_points, const HlRouteEnd *from, const HlRouteEnd *to)
{
  g_autoptr (GArray) opened = g_array_new (FALSE, FALSE, sizeof (Opened));
  gboolean is_blocked;
  open_lane (router, from, opened);
  open_lane (router, to, opened);
  is_blocked = crosses_box (router, points, n_points);
  close_again (router, opened);
  return is_blocked;
}

static void
drop_straight_points (GArray *way)
{
  for (guint i = 1; i + 1 < way->len;)
    {
      const HlGridPoint *a = &g_array_index (way, HlGridPoint, i - 1), *b = a + 1, *c = a + 2;
      gboolean is_on_row = a->y == b->y && b->y == c->y, is_on_column = a->x == b->x && b->x == c->x;
      if (is_on_row || is_on_column)
        g_array_remove_index (way, i);
      else
        i++;
    }
}

static gboolean
find_legs (HlRouter *router, const HlRouteEnd *from, const HlRouteEnd *to, const HlGridPoint *via, guint n_via, GArray *way)
{
  Leg leg = { .start_heading = from->any_side ? -1 : (int) from->side, .must_start_straight = !from->any_side };
  leg.start = cell_at (router, from->x, from->y);
  for (guint i = 0; i <= n_via; i++)
    {
      gboolean is_last = i == n_via;
      leg.goal_x = is_last ? to->x : via[i].x;
      leg.goal_y = is_last ? to->y : via[i].y;
      leg.goal = cell_at (router, leg.goal_x, leg.goal_y);
      leg.goal_heading = is_last && !to->any_side ? ((int) to->side + 2) % 4 : -1;
      if (leg.start < 0 || leg.goal < 0)
        return FALSE;
      if (leg.start == leg.goal && !is_last)
        continue;
      leg.start_heading = search (router, &leg, way->len > 0, way);
      if (leg.start_heading < 0)
        return FALSE;
      leg.start = leg.goal;
      leg.must_start_straight = FALSE;
      leg.starts_at_bend = TRUE;
    }
  return TRUE;
}

gboolean
hl_router_find (HlRouter *router, const HlRouteEnd *from, const HlRouteEnd *to, const HlGridPoint *via, guint n_via, GArray *way)
{
  g_autoptr (GArray) opened = g_array_new (FALSE, FALSE, sizeof (Opened));
  gboolean is_found;
  g_array_set_size (way, 0);
  open_lane (router, from, opened);
  open_lane (router, to, opened);
  for (guint i = 0; i < n_via; i++)
    {
      int cell = cell_at (router, via[i].x, via[i].y);
      if (cell >= 0 && router->fixed[cell] == BLOCKED)
        open_cell (router, cell, opened);
    }
  is_found = find_legs (router, from, to, via, n_via, way);
  close_again (router, opened);
  if (!is_found)
    hl_router_plain_way (from, to, way);
  drop_straight_points (way);
  return is_found;
}

static guint32
price_of_segment (const HlRouter *router, const HlGridPoint *a, const HlGridPoint *b)
{
  int heading = a->y == b->y ? 0 : 1;
  int n = abs (heading == 0 ? b->x - a->x : b->y - a->y);
  int dx = (b->x > a->x) - (b->x < a->x), dy = (b->y > a->y) - (b->y < a->y);
  guint32 price = 0;
  for (int k = 0; k <= n; k++)
    {
      int cell = cell_at (router, a->x + dx * k, a->y + dy * k);
      if (cell < 0)
        return G_MAXINT32;
      price += router->fixed[cell] == BLOCKED ? 20 * OVERLAP : price_of_cell (router, cell, heading);
    }
  return price;
}

/* @points: four corners of a step; the middle pair lies at @at. */
static guint32
price_of_step (const HlRouter *router, const HlGridPoint *points, gboolean is_across, int at)
{
  HlGridPoint moved[4] = { points[0], points[1], points[2], points[3] };
  if (is_across)
    moved[1].y = moved[2].y = at;
  else
    moved[1].x = moved[2].x = at;
  return price_of_segment (router, &moved[0], &moved[1]) + price_of_segment (router, &moved[1], &moved[2])
    + price_of_segment (router, &moved[2], &moved[3]);
}

static void
settle_segment (HlRouter *router, HlGridPoint *points)
{
  gboolean is_across = points[1].y == points[2].y;
  int from = is_across ? points[0].y : points[0].x, to = is_across ? points[3].y : points[3].x;
  int at = is_across ? points[1].y : points[1].x;
  int low = MIN (from, to) + 1, high = MAX (from, to) - 1, best = at;
  guint32 best_price;
  if (at <= MIN (from, to) || at >= MAX (from, to))
    return;    /* a detour, not a step: the search has put it where it must be */
  best_price = price_of_step (router, points, is_across, at) + abs (2 * at - from - to);
  for (int k = low; k <= high; k++)
    {
      guint32 price = price_of_step (router, points, is_across, k) + abs (2 * k - from - to);
      if (price < best_price)
        {
          best_price = price;
          best = k;
        }
    }
  if (is_across)
    points[1].y = points[2].y = best;
  else
    points[1].x = points[2].x = best;
}

void
hl_router_settle (HlRouter *router, GArray *way)
{
  for (guint i = 0; i + 3 < way->len; i++)
    settle_segment (router, &g_array_index (way, HlGridPoint, i));
}

static void
append_point (GArray *way, int x, int y)
{
  HlGridPoint point = { x, y };
  if (way->len > 0)
    {
      const HlGridPoint *last = &g_array_index (way, HlGridPoint, way->len - 1);
      if (last->x == x && last->y == y)
        return;
    }
  g_array_append_val (way, point);
}

void
hl_router_plain_way (const HlRouteEnd *from, const HlRouteEnd *to, GArray *way)
{
  int out_x = from->x + (from->any_side ? 0 : step_x[from->side]), out_y = from->y + (from->any_side ? 0 : step_y[from->side]);
  int in_x = to->x + (to->any_side ? 0 : step_x[to->side]), in_y = to->y + (to->any_side ? 0 : step_y[to->side]);
  g_array_set_size (way, 0);
  append_point (way, from->x, from->y);
  append_point (way, out_x, out_y);
  if (!from->any_side && from->side % 2 == 0)
    append_point (way, out_x, in_y);
  else
    append_point (way, in_x, out_y);
  append_point (way, in_x, in_y);
  append_point (way, to->x, to->y);
  if (way->len == 1)
    {
      HlGridPoint point = { to->x, to->y };
      g_array_append_val (way, point);
    }
  drop_straight_points (way);
}
