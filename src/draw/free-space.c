/* Room on the canvas: sums over the grid for symbols and lines, tiles for words.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/free-space.h"
#include "draw/router.h"
#include <stdlib.h>

#define TILE 96.0    /* pixels */

typedef struct { int id; HlBox box; } Taken;

struct _HlFreeSpace {
  int     left, top, width, height;      /* grid points */
  int    *boxes, *lines;                 /* [(height + 1) (width + 1)]: counts, after closing sums of all above and left */
  int     tiles_across, tiles_down;
  GArray **tiles;                        /* [tiles] of Taken, or NULL */
};

HlFreeSpace *
hl_free_space_new (int left, int top, int right, int bottom)
{
  HlFreeSpace *space = g_new0 (HlFreeSpace, 1);
  gsize n;
  /* A plant strewn over a field too large to chart gets its words without regard to symbols and lines. */
  gboolean is_chartable = (gint64) right - left < HL_ROUTER_MOST_CELLS && (gint64) bottom - top < HL_ROUTER_MOST_CELLS
    && ((gint64) right - left + 1) * ((gint64) bottom - top + 1) <= HL_ROUTER_MOST_CELLS;
  space->left = left;
  space->top = top;
  space->width = is_chartable ? right - left + 1 : 0;
  space->height = is_chartable ? bottom - top + 1 : 0;
  n = (gsize) (space->width + 1) * (space->height + 1);
  space->boxes = g_new0 (int, n);
  space->lines = g_new0 (int, n);
  space->tiles_across = (int) (space->width * HL_UNIT / TILE) + 1;
  space->tiles_down = (int) (space->height * HL_UNIT / TILE) + 1;
  space->tiles = g_new0 (GArray *, (gsize) space->tiles_across * space->tiles_down);
  return space;
}

void
hl_free_space_free (HlFreeSpace *space)
{
  if (space == NULL)
    return;
  for (int i = 0; i < space->tiles_across * space->tiles_down; i++)
    if (space->tiles[i] != NULL)
      g_array_unref (space->tiles[i]);
  g_free (space->tiles);
  g_free (space->boxes);
  g_free (space->lines);
  g_free (space);
}

static void
count_point (const HlFreeSpace *space, int *counts, int x, int y)
{
  int column = x - space->left, row = y - space->top;
  if (column >= 0 && row >= 0 && column < space->width && row < space->height)
    counts[(row + 1) * (space->width + 1) + column + 1]++;
}

void
hl_free_space_add_box (HlFreeSpace *space, int left, int top, int right, int bottom)
{
  for (int y = top; y <= bottom; y++)
    for (int x = left; x <= right; x++)
      count_point (space, space->boxes, x, y);
}

void
hl_free_space_add_line (HlFreeSpace *space, const HlGridPoint *points, guint n_points)
{
  for (guint i = 0; i + 1 < n_points; i++)
    {
      const HlGridPoint *a = &points[i], *b = &points[i + 1];
      int n = MAX (abs (b->x - a->x), abs (b->y - a->y));
      int dx = (b->x > a->x) - (b->x < a->x), dy = (b->y > a->y) - (b->y < a->y);
      for (int k = 0; k <= n; k++)
        count_point (space, space->lines, a->x + dx * k, a->y + dy * k);
    }
}

static void
sum_up (const HlFreeSpace *space, int *counts)
{
  int stride = space->width + 1;
  for (int row = 1; row <= space->height; row++)
    for (int column = 1; column <= space->width; column++)
      counts[row * stride + column] += counts[(row - 1) * stride + column] + counts[row * stride + column - 1]
        - counts[(row - 1) * stride + column - 1];
}

void
hl_free_space_close (HlFreeSpace *space)
{
  sum_up (space, space->boxes);
  sum_up (space, space->lines);
}

typedef struct { int left, top, right, bottom; } GridBox;    /* grid points inside, ends included */

/* floor() as a call costs more than the rest of a question. */
static inline int
round_down (double x)
{
  int n = (int) x;
  return n - (x < n);
}

static inline GridBox
grid_inside (const HlBox *box, double margin)
{
  GridBox inside = {
    -round_down ((margin - box->x) / HL_UNIT), -round_down ((margin - box->y) / HL_UNIT),
    round_down ((box->x + box->width + margin) / HL_UNIT), round_down ((box->y + box->height + margin) / HL_UNIT) };
  return inside;
}

static int
sum_inside (const HlFreeSpace *space, const int *sums, const HlBox *box, double margin)
{
  GridBox g = grid_inside (box, margin);
  int stride = space->width + 1;
  int left = CLAMP (g.left - space->left, 0, space->width), right = CLAMP (g.right - space->left + 1, 0, space->width);
  int top = CLAMP (g.top - space->top, 0, space->height), bottom = CLAMP (g.bottom - space->top + 1, 0, space->height);
  if (right <= left || bottom <= top)
    return 0;
  return sums[bottom * stride + right] - sums[top * stride + right] - sums[bottom * stride + left] + sums[top * stride + left];
}

int
hl_free_space_boxes (const HlFreeSpace *space, const HlBox *box, double margin)
{
  return sum_inside (space, space->boxes, box, margin);
}

int
hl_free_space_lines (const HlFreeSpace *space, const HlBox *box, double margin)
{
  return sum_inside (space, space->lines, box, margin);
}

int
hl_count_line_points (const HlGridPoint *points, guint n_points, const HlBox *box, double margin)
{
  GridBox g = grid_inside (box, margin);
  int n = 0;
  for (guint i = 0; i + 1 < n_points; i++)
    {
      int left = MAX (MIN (points[i].x, points[i + 1].x), g.left), right = MIN (MAX (points[i].x, points[i + 1].x), g.right);
      int top = MAX (MIN (points[i].y, points[i + 1].y), g.top), bottom = MIN (MAX (points[i].y, points[i + 1].y), g.bottom);
      if (right >= left && bottom >= top)
        n += MAX (right - left, bottom - top) + 1;
    }
  return n;
}

/* Calls for each tile that the box touches; those beyond the edge count to the outermost tile. */
static void
tiles_of (const HlFreeSpace *space, const HlBox *box, double margin, int *left, int *top, int *right, int *bottom)
{
  double x = box->x - space->left * HL_UNIT, y = box->y - space->top * HL_UNIT;
  *left = (int) CLAMP ((x - margin) / TILE, 0.0, space->tiles_across - 1);
  *right = (int) CLAMP ((x + box->width + margin) / TILE, 0.0, space->tiles_across - 1);
  *top = (int) CLAMP ((y - margin) / TILE, 0.0, space->tiles_down - 1);
  *bottom = (int) CLAMP ((y + box->height + margin) / TILE, 0.0, space->tiles_down - 1);
}

void
hl_free_space_take (HlFreeSpace *space, int id, const HlBox *box)
{
  Taken entry = { id, *box };
  int left, top, right, bottom;
  tiles_of (space, box, 0.0, &left, &top, &right, &bottom);
  for (int row = top; row <= bottom; row++)
    for (int column = left; column <= right; column++)
      {
        GArray **tile = &space->tiles[row * space->tiles_across + column];
        if (*tile == NULL)
          *tile = g_array_new (FALSE, FALSE, sizeof (Taken));
        g_array_append_val (*tile, entry);
      }
}

void
hl_free_space_give_back (HlFreeSpace *space, int id, const HlBox *box)
{
  int left, top, right, bottom;
  tiles_of (space, box, 0.0, &left, &top, &right, &bottom);
  for (int row = top; row <= bottom; row++)
    for (int column = left; column <= right; column++)
      {
        GArray *tile = space->tiles[row * space->tiles_across + column];
        for (guint i = tile != NULL ? tile->len : 0; i-- > 0;)
          if (g_array_index (tile, Taken, i).id == id)
            g_array_remove_index_fast (tile, i);
      }
}

static double
overlap (double a, double a_size, double b, double b_size)
{
  return MIN (a + a_size, b + b_size) - MAX (a, b);
}

double
hl_free_space_taken (const HlFreeSpace *space, const HlBox *box, double margin)
{
  double area = 0.0;
  int left, top, right, bottom;
  tiles_of (space, box, margin, &left, &top, &right, &bottom);
  for (int row = top; row <= bottom; row++)
    for (int column = left; column <= right; column++)
      {
        const GArray *tile = space->tiles[row * space->tiles_across + column];
        for (guint i = 0; tile != NULL && i < tile->len; i++)
          {
            const HlBox *other = &g_array_index (tile, Taken, i).box;
            double across = overlap (box->x - margin, box->width + 2.0 * margin, other->x, other->width);
            double down = overlap (box->y - margin, box->height + 2.0 * margin, other->y, other->height);
            if (across > 0.0 && down > 0.0)
              area += across * down;
          }
      }
  return area;
}
