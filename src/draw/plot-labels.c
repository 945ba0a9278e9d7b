/* Places texts in a plot so that they collide with nothing: a geometry search, no cairo.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/plot-labels.h"
#include <math.h>
#include <string.h>

#define CELL       3.0      /* pixels of a cell of the ink map */
#define BUCKET     40.0     /* pixels of a bucket of blocks */
#define GAP_X      3.5      /* least distance between two texts beside each other */
#define GAP_Y      1.5      /* the same, one above the other */
#define LEADER_AT  9.0      /* a text farther than this from its dot's rim gets a leader */

typedef struct {
  HlBox    box;
  int      owner;           /* index of the dot, or -1 */
  gboolean is_text;
  gboolean is_gone;         /* a text that was taken out again */
} Block;
typedef struct { HlPoint from, to; } Leader;

static HlBox
box_around (const Leader *leader)
{
  return (HlBox) { MIN (leader->from.x, leader->to.x), MIN (leader->from.y, leader->to.y),
                   fabs (leader->to.x - leader->from.x) + 1e-9, fabs (leader->to.y - leader->from.y) + 1e-9 };
}

struct _HlPlotLabels {
  HlBox    frame;
  int      columns, rows;
  double  *ink;             /* [(rows + 1) (columns + 1)] cost by cell, then summed from the corner */
  gboolean is_summed;
  GArray  *blocks;          /* of Block */
  int      bucket_columns, bucket_rows;
  GArray **buckets;         /* [bucket_rows bucket_columns] of guint: blocks that reach into it */
  GArray  *leaders;         /* of Leader */
};

HlPlotLabels *
hl_plot_labels_new (const HlBox *frame)
{
  HlPlotLabels *labels = g_new0 (HlPlotLabels, 1);
  labels->frame = *frame;
  labels->columns = (int) ceil (MAX (frame->width, CELL) / CELL);
  labels->rows = (int) ceil (MAX (frame->height, CELL) / CELL);
  labels->ink = g_new0 (double, (gsize) (labels->columns + 1) * (gsize) (labels->rows + 1));
  labels->blocks = g_array_new (FALSE, FALSE, sizeof (Block));
  labels->bucket_columns = (int) ceil (MAX (frame->width, 1.0) / BUCKET);
  labels->bucket_rows = (int) ceil (MAX (frame->height, 1.0) / BUCKET);
  labels->buckets = g_new0 (GArray *, labels->bucket_columns * labels->bucket_rows);
  labels->leaders = g_array_new (FALSE, FALSE, sizeof (Leader));
  return labels;
}

void
hl_plot_labels_free (HlPlotLabels *labels)
{
  if (labels == NULL)
    return;
  for (int i = 0; i < labels->bucket_columns * labels->bucket_rows; i++)
    g_clear_pointer (&labels->buckets[i], g_array_unref);
  g_free (labels->buckets);
  g_free (labels->ink);
  g_array_unref (labels->blocks);
  g_array_unref (labels->leaders);
  g_free (labels);
}

gboolean
hl_box_overlaps (const HlBox *a, const HlBox *b)
{
  return a->x < b->x + b->width && b->x < a->x + a->width && a->y < b->y + b->height && b->y < a->y + a->height;
}

/* Cuts the segment by the slabs of the box. */
gboolean
hl_segment_meets_box (HlPoint from, HlPoint to, const HlBox *box)
{
  const double start[2] = { from.x, from.y }, way[2] = { to.x - from.x, to.y - from.y };
  const double low[2] = { box->x, box->y }, high[2] = { box->x + box->width, box->y + box->height };
  double first = 0.0, last = 1.0;
  for (int i = 0; i < 2; i++)
    {
      double a, b;
      if (fabs (way[i]) < 1e-12)
        {
          if (start[i] < low[i] || start[i] > high[i])
            return FALSE;
          continue;
        }
      a = (low[i] - start[i]) / way[i];
      b = (high[i] - start[i]) / way[i];
      first = MAX (first, MIN (a, b));
      last = MIN (last, MAX (a, b));
    }
  return first <= last;
}

static gboolean
segments_cross (const Leader *a, const Leader *b)
{
  double ax = a->to.x - a->from.x, ay = a->to.y - a->from.y, bx = b->to.x - b->from.x, by = b->to.y - b->from.y;
  double det = ax * by - ay * bx, dx = b->from.x - a->from.x, dy = b->from.y - a->from.y, s, t;
  if (fabs (det) < 1e-12)
    return FALSE;
  s = (dx * by - dy * bx) / det;
  t = (dx * ay - dy * ax) / det;
  return s >= 0.0 && s <= 1.0 && t >= 0.0 && t <= 1.0;
}

static double *
cell (HlPlotLabels *labels, int row, int column)
{
  return &labels->ink[(gsize) row * (gsize) (labels->columns + 1) + (gsize) column];
}

void
hl_plot_labels_add_line (HlPlotLabels *labels, HlPoint from, HlPoint to, double weight)
{
  double length = hypot (to.x - from.x, to.y - from.y);
  int steps = (int) ceil (length / (CELL / 2.0));
  g_return_if_fail (!labels->is_summed);
  if (!isfinite (length) || length > 1e5)
    return;
  for (int i = 0; i < steps; i++)
    {
      double t = (i + 0.5) / steps;
      int column = (int) floor ((from.x + t * (to.x - from.x) - labels->frame.x) / CELL);
      int row = (int) floor ((from.y + t * (to.y - from.y) - labels->frame.y) / CELL);
      if (column >= 0 && row >= 0 && column < labels->columns && row < labels->rows)
        *cell (labels, row + 1, column + 1) += weight * length / steps;
    }
}

/* Turns the map into sums from the upper left corner, so that any box costs four look-ups. */
static void
sum_up (HlPlotLabels *labels)
{
  if (labels->is_summed)
    return;
  for (int row = 1; row <= labels->rows; row++)
    for (int column = 1; column <= labels->columns; column++)
      *cell (labels, row, column) += *cell (labels, row - 1, column) + *cell (labels, row, column - 1) - *cell (labels, row - 1, column - 1);
  labels->is_summed = TRUE;
}

double
hl_plot_labels_cost (HlPlotLabels *labels, const HlBox *box)
{
  int left = (int) floor ((box->x - labels->frame.x) / CELL), top = (int) floor ((box->y - labels->frame.y) / CELL);
  int right = (int) ceil ((box->x + box->width - labels->frame.x) / CELL), bottom = (int) ceil ((box->y + box->height - labels->frame.y) / CELL);
  sum_up (labels);
  left = CLAMP (left, 0, labels->columns);
  right = CLAMP (right, 0, labels->columns);
  top = CLAMP (top, 0, labels->rows);
  bottom = CLAMP (bottom, 0, labels->rows);
  return *cell (labels, bottom, right) - *cell (labels, top, right) - *cell (labels, bottom, left) + *cell (labels, top, left);
}

/* Buckets that a box reaches into; what lies outside of the frame counts to its edge. */
typedef struct { int left, top, right, bottom; } Span;

static Span
span_of (const HlPlotLabels *labels, const HlBox *box)
{
  Span span;
  span.left = CLAMP ((int) floor ((box->x - labels->frame.x) / BUCKET), 0, labels->bucket_columns - 1);
  span.right = CLAMP ((int) floor ((box->x + box->width - labels->frame.x) / BUCKET), 0, labels->bucket_columns - 1);
  span.top = CLAMP ((int) floor ((box->y - labels->frame.y) / BUCKET), 0, labels->bucket_rows - 1);
  span.bottom = CLAMP ((int) floor ((box->y + box->height - labels->frame.y) / BUCKET), 0, labels->bucket_rows - 1);
  return span;
}

static void
add_block (HlPlotLabels *labels, const Block *block)
{
  Span span = span_of (labels, &block->box);
  guint n = labels->blocks->len;
  g_array_append_val (labels->blocks, *block);
  for (int row = span.top; row <= span.bottom; row++)
    for (int column = span.left; column <= span.right; column++)
      {
        GArray **bucket = &labels->buckets[row * labels->bucket_columns + column];
        if (*bucket == NULL)
          *bucket = g_array_new (FALSE, FALSE, sizeof (guint));
        g_array_append_val (*bucket, n);
      }
}

/* Calls @visit for the blocks near @box, some more than once, until it says TRUE. */
typedef gboolean (*VisitBlock) (const Block *block, gpointer data);

static gboolean
any_block_near (const HlPlotLabels *labels, const HlBox *box, VisitBlock visit, gpointer data)
{
  Span span = span_of (labels, box);
  for (int row = span.top; row <= span.bottom; row++)
    for (int column = span.left; column <= span.right; column++)
      {
        const GArray *bucket = labels->buckets[row * labels->bucket_columns + column];
        for (guint i = 0; bucket != NULL && i < bucket->len; i++)
          {
            const Block *block = &g_array_index (labels->blocks, Block, g_array_index (bucket, guint, i));
            if (!block->is_gone && visit (block, data))
              return TRUE;
          }
      }
  return FALSE;
}

void
hl_plot_labels_add_block (HlPlotLabels *labels, const HlBox *box, int owner)
{
  Block block = { .box = *box, .owner = owner };
  add_block (labels, &block);
}

typedef struct { const HlBox *box; HlBox wide; } Candidate;

static gboolean
is_in_the_way (const Block *block, gpointer data)
{
  const Candidate *candidate = data;
  return hl_box_overlaps (block->is_text ? &candidate->wide : candidate->box, &block->box);
}

gboolean
hl_plot_labels_is_free (HlPlotLabels *labels, const HlBox *box)
{
  const HlBox *frame = &labels->frame;
  Candidate candidate = { box, { box->x - GAP_X, box->y - GAP_Y, box->width + 2.0 * GAP_X, box->height + 2.0 * GAP_Y } };
  if (!(box->x >= frame->x && box->y >= frame->y && box->x + box->width <= frame->x + frame->width && box->y + box->height <= frame->y + frame->height))
    return FALSE;
  if (any_block_near (labels, &candidate.wide, is_in_the_way, &candidate))
    return FALSE;
  for (guint i = 0; i < labels->leaders->len; i++)
    {
      const Leader *leader = &g_array_index (labels->leaders, Leader, i);
      HlBox around = box_around (leader);
      if (hl_box_overlaps (&around, &candidate.wide) && hl_segment_meets_box (leader->from, leader->to, &candidate.wide))
        return FALSE;
    }
  return TRUE;
}

typedef struct { const Leader *leader; int owner; } Crossing;

static gboolean
is_crossed (const Block *block, gpointer data)
{
  const Crossing *crossing = data;
  return (crossing->owner < 0 || block->owner != crossing->owner)
         && hl_segment_meets_box (crossing->leader->from, crossing->leader->to, &block->box);
}

static gboolean
leader_is_free (HlPlotLabels *labels, const Leader *leader, int owner)
{
  HlBox around = box_around (leader);
  Crossing crossing = { leader, owner };
  if (any_block_near (labels, &around, is_crossed, &crossing))
    return FALSE;
  for (guint i = 0; i < labels->leaders->len; i++)
    if (segments_cross (leader, &g_array_index (labels->leaders, Leader, i)))
      return FALSE;
  return TRUE;
}

void
hl_plot_labels_take (HlPlotLabels *labels, const HlBox *box, HlPlotLabelPlace *place)
{
  Block block = { .box = *box, .owner = -1, .is_text = TRUE };
  add_block (labels, &block);
  place->is_placed = TRUE;
  place->box = *box;
}

void
hl_plot_labels_remove (HlPlotLabels *labels, const HlPlotLabelPlace *place)
{
  if (!place->is_placed)
    return;
  for (guint i = 0; i < labels->blocks->len; i++)
    {
      Block *block = &g_array_index (labels->blocks, Block, i);
      if (block->is_text && !block->is_gone && memcmp (&block->box, &place->box, sizeof (HlBox)) == 0)
        {
          block->is_gone = TRUE;
          break;
        }
    }
  for (guint i = 0; place->has_leader && i < labels->leaders->len; i++)
    if (memcmp (&g_array_index (labels->leaders, Leader, i), place->leader, sizeof (Leader)) == 0)
      {
        g_array_remove_index_fast (labels->leaders, i);
        break;
      }
}

static double
distance_to_box (HlPoint point, const HlBox *box, HlPoint *nearest)
{
  nearest->x = CLAMP (point.x, box->x, box->x + box->width);
  nearest->y = CLAMP (point.y, box->y, box->y + box->height);
  return sqrt ((nearest->x - point.x) * (nearest->x - point.x) + (nearest->y - point.y) * (nearest->y - point.y));
}

/* Box in direction (@dx, @dy) whose nearest point lies @distance from the anchor. */
static HlBox
box_at (const HlPlotLabelWish *wish, double dx, double dy, double distance)
{
  double longest = MAX (fabs (dx), fabs (dy)), missing;
  double centre_x = wish->anchor.x + dx * distance + dx / longest * wish->width / 2.0;
  double centre_y = wish->anchor.y + dy * distance + dy / longest * wish->height / 2.0;
  HlBox box = { centre_x - wish->width / 2.0, centre_y - wish->height / 2.0, wish->width, wish->height };
  HlPoint nearest;
  /* Between side and diagonal the box's flat side comes nearer than its corner would. */
  missing = distance - distance_to_box (wish->anchor, &box, &nearest);
  if (missing > 0.0)
    {
      box.x += dx / longest * missing;
      box.y += dy / longest * missing;
    }
  return box;
}

/* A leader from the dot's rim to the near side of the box; none where they are close enough to be read together. */
static gboolean
make_leader (const HlPlotLabelWish *wish, const HlBox *box, Leader *leader)
{
  HlPoint nearest;
  double distance = distance_to_box (wish->anchor, box, &nearest);
  if (distance < wish->clearance + LEADER_AT)
    return FALSE;
  leader->from.x = wish->anchor.x + (nearest.x - wish->anchor.x) * wish->clearance / distance;
  leader->from.y = wish->anchor.y + (nearest.y - wish->anchor.y) * wish->clearance / distance;
  leader->to.x = nearest.x + (wish->anchor.x - nearest.x) * 1.5 / distance;
  leader->to.y = nearest.y + (wish->anchor.y - nearest.y) * 1.5 / distance;
  return TRUE;
}

typedef struct { const HlBox *box; int owner; double own, cost; } Reading;

static gboolean
add_ambiguity (const Block *block, gpointer data)
{
  Reading *reading = data;
  HlPoint centre = { block->box.x + block->box.width / 2.0, block->box.y + block->box.height / 2.0 }, nearest;
  if (block->owner >= 0 && block->owner != reading->owner)
    {
      double closer = reading->own + 3.0 - distance_to_box (centre, reading->box, &nearest);
      reading->cost = MAX (reading->cost, MIN (closer, 6.0));
    }
  return FALSE;
}

/* A text that stands nearer to another dot than to its own would be read as that dot's. */
static double
ambiguity (HlPlotLabels *labels, const HlPlotLabelWish *wish, const HlBox *box, int owner)
{
  HlPoint nearest;
  Reading reading = { box, owner, distance_to_box (wish->anchor, box, &nearest), 0.0 };
  double around = MIN (reading.own + 3.0, BUCKET);
  HlBox near = { box->x - around, box->y - around, box->width + 2.0 * around, box->height + 2.0 * around };
  any_block_near (labels, &near, add_ambiguity, &reading);
  return reading.cost;
}

#define N_DIRECTIONS 48
#define FEW          3      /* near by every third of them will do */

static const HlPoint *
directions (void)
{
  static HlPoint table[N_DIRECTIONS];
  static gsize is_ready;
  if (g_once_init_enter (&is_ready))
    {
      for (int k = 0; k < N_DIRECTIONS; k++)
        table[k] = (HlPoint) { cos (2.0 * G_PI * k / N_DIRECTIONS), sin (2.0 * G_PI * k / N_DIRECTIONS) };
      g_once_init_leave (&is_ready, 1);
    }
  return table;
}

gboolean
hl_plot_labels_place (HlPlotLabels *labels, const HlPlotLabelWish *wish, int owner, HlPlotLabelPlace *place)
{
  gboolean has_wish = hypot (wish->towards.x, wish->towards.y) > 0.5;
  double preferred_x = has_wish ? wish->towards.x : 0.8, preferred_y = has_wish ? wish->towards.y : -0.6, best = G_MAXDOUBLE;
  Leader best_leader = { { 0.0, 0.0 }, { 0.0, 0.0 } };
  gboolean best_has_leader = FALSE;
  HlBox best_box = { 0.0, 0.0, 0.0, 0.0 };
  place->is_placed = place->has_leader = FALSE;
  for (double distance = wish->clearance; distance <= wish->reach; distance += MAX (2.0, 0.22 * distance))
    {
      double far = 0.5 * (distance - wish->clearance);
      if (far >= best)
        break;
      for (int k = 0; k < N_DIRECTIONS; k += distance < 24.0 ? FEW : 1)
        {
          double dx = directions ()[k].x, dy = directions ()[k].y;
          double turn = 1.0 - (dx * preferred_x + dy * preferred_y), cost;
          HlBox box = box_at (wish, dx, dy, distance), wide;
          HlPoint nearest;
          Leader leader;
          gboolean has_leader;
          if (distance_to_box (wish->anchor, &box, &nearest) < wish->clearance - 0.3)
            continue;
          cost = far + 1.2 * turn;
          if (cost >= best || !hl_plot_labels_is_free (labels, &box))
            continue;
          wide = (HlBox) { box.x - 1.0, box.y - 1.0, box.width + 2.0, box.height + 2.0 };
          cost += 0.35 * hl_plot_labels_cost (labels, &wide);
          if (cost >= best)
            continue;
          cost += ambiguity (labels, wish, &box, owner);
          has_leader = make_leader (wish, &box, &leader);
          if (has_leader)
            cost += 6.0;
          if (cost >= best || (has_leader && !leader_is_free (labels, &leader, owner)))
            continue;
          best = cost;
          best_box = box;
          best_has_leader = has_leader;
          if (has_leader)
            best_leader = leader;
        }
    }
  if (best == G_MAXDOUBLE)
    return FALSE;
  hl_plot_labels_take (labels, &best_box, place);
  place->has_leader = best_has_leader;
  if (best_has_leader)
    {
      memcpy (place->leader, &best_leader, sizeof (Leader));
      g_array_append_val (labels->leaders, best_leader);
    }
  return TRUE;
}
