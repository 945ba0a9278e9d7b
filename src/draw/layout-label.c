/* Finds the place of one stream label: every candidate gets a price, the cheapest wins.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/layout-private.h"
#include <math.h>
#include <string.h>

typedef struct {
  HlFreeSpace       *space;
  const HlGridPoint *way;
  guint              n_way;
  double             width, height;
  HlLabelSpot        best;
  const HlBox       *kept;         /* its place before, or NULL */
} LabelSearch;

/* Base price and what the label covers, given up once above @limit. */
static double
price_of_spot (const LabelSearch *search, const HlBox *box, double base, HlLabelFit fit, double limit)
{
  double price = base + PRICE_SYMBOL * hl_free_space_boxes (search->space, box, SYMBOL_MARGIN);
  int own, others;
  if (price >= limit)
    return price;
  own = hl_count_line_points (search->way, search->n_way, box, LINE_MARGIN);
  others = hl_free_space_lines (search->space, box, LINE_MARGIN) - own;
  if (fit != HL_FIT_BESIDE)    /* what the label must cover of its own line is no fault */
    own -= (int) (((fit == HL_FIT_ON_ACROSS ? box->width : box->height) + 2.0 * LINE_MARGIN) / HL_UNIT) + 1;
  price += PRICE_LINE * MAX (others, 0) + PRICE_OWN_LINE * MAX (own, 0);
  if (price >= limit)
    return price;
  return price + PRICE_WORDS * hl_free_space_taken (search->space, box, WORDS_MARGIN);
}

static void
try_label (LabelSearch *search, double x, double y, double base, HlLabelFit fit, const HlPoint *leader)
{
  HlBox box = { x, y, search->width, search->height };
  double price;
  if (search->kept != NULL && fabs (x - search->kept->x) < 5.0 && fabs (y - search->kept->y) < 5.0)
    base -= KEPT;
  if (base >= search->best.price)
    return;
  price = price_of_spot (search, &box, base, fit, search->best.price);
  if (price >= search->best.price)
    return;
  search->best = (HlLabelSpot) { .box = box, .base = base, .price = price, .fit = fit, .has_leader = leader != NULL };
  if (leader != NULL)
    {
      search->best.leader[0] = leader[0];
      search->best.leader[1] = leader[1];
    }
}

/* Candidates along one segment: on it, and on both sides. */
static void
try_segment (LabelSearch *search, guint n)
{
  const HlGridPoint *a = &search->way[n], *b = &search->way[n + 1];
  gboolean is_across = a->y == b->y;
  double width = search->width, height = search->height;
  double x = (a->x + b->x) / 2.0 * HL_UNIT, y = (a->y + b->y) / 2.0 * HL_UNIT;
  double length = (is_across ? ABS (b->x - a->x) : ABS (b->y - a->y)) * HL_UNIT;
  double along = is_across ? width : height;
  double base = 40.0 - 0.12 * MIN (length, 300.0);
  int most = (int) (MAX (length - along, 0.0) / 2.0 / HL_UNIT) + 3;
  double room_on = (length - along) / 2.0 - 14.0;    /* a piece of line must show at both ends */
  for (int k = -most; k <= most; k++)
    {
      double off = k * HL_UNIT, cx = is_across ? x + off : x, cy = is_across ? y : y + off;
      double price = base + 0.09 * fabs (off);
      if (fabs (off) <= room_on)
        try_label (search, cx - width / 2.0, cy - height / 2.0, price, is_across ? HL_FIT_ON_ACROSS : HL_FIT_ON_DOWN, NULL);
      if (fabs (off) > length / 2.0 + along / 4.0)
        continue;
      price += 14.0;
      if (is_across)
        {
          try_label (search, cx - width / 2.0, cy - GAP - height, price, HL_FIT_BESIDE, NULL);
          try_label (search, cx - width / 2.0, cy + GAP, price + 2.0, HL_FIT_BESIDE, NULL);
        }
      else
        {
          try_label (search, cx + GAP + 1.0, cy - height / 2.0, price, HL_FIT_BESIDE, NULL);
          try_label (search, cx - GAP - 1.0 - width, cy - height / 2.0, price + 2.0, HL_FIT_BESIDE, NULL);
        }
    }
}

/* What a leader runs over on its way. */
static double
price_of_leader (const LabelSearch *search, const HlPoint *leader)
{
  HlBox box = { MIN (leader[0].x, leader[1].x), MIN (leader[0].y, leader[1].y),
                fabs (leader[0].x - leader[1].x), fabs (leader[0].y - leader[1].y) };
  int lines = hl_free_space_lines (search->space, &box, 1.0) - hl_count_line_points (search->way, search->n_way, &box, 1.0);
  /* Crossing a line may be, running along on one may not. */
  return PRICE_SYMBOL * hl_free_space_boxes (search->space, &box, 2.0) + (lines > 3 ? 90.0 : 30.0) * MAX (lines, 0)
    + PRICE_WORDS * hl_free_space_taken (search->space, &box, 2.0);
}

/* Labels at the end of leaders that leave (@x, @y) towards (@dx, @dy), nearest first. */
static void
try_led (LabelSearch *search, double x, double y, int dx, int dy, double base)
{
  double width = search->width, height = search->height;
  for (double distance = 14.0; distance <= LONGEST_LEADER; distance += 8.0)
    {
      HlPoint leader[2] = { { x, y }, { x + dx * distance, y + dy * distance } };
      double price = base + 0.5 * distance;
      if (price >= search->best.price)
        return;
      price += price_of_leader (search, leader);
      if (price >= search->best.price)
        return;    /* a longer one runs over no less */
      if (dx != 0)
        try_label (search, dx > 0 ? leader[1].x : leader[1].x - width, y - height / 2.0, price, HL_FIT_BESIDE, leader);
      for (int shift = -2; dx == 0 && shift <= 2; shift++)
        try_label (search, x - width / 2.0 + shift * 0.21 * width, dy > 0 ? leader[1].y : leader[1].y - height,
                   price + 0.01 * ABS (shift) * width, HL_FIT_BESIDE, leader);
    }
}

/* Where there is no room at the line: further out. */
static void
try_segment_led (LabelSearch *search, guint n)
{
  const HlGridPoint *a = &search->way[n], *b = &search->way[n + 1];
  gboolean is_across = a->y == b->y;
  int length = is_across ? ABS (b->x - a->x) : ABS (b->y - a->y), pace = MAX (length / 14, 1);
  int dx = (b->x > a->x) - (b->x < a->x), dy = (b->y > a->y) - (b->y < a->y);
  for (int k = 1; k < length; k += pace)
    for (int side = -1; side <= 1; side += 2)
      try_led (search, (a->x + dx * k) * HL_UNIT, (a->y + dy * k) * HL_UNIT, is_across ? 0 : side, is_across ? side : 0,
               55.0 + 0.9 * fabs (k - length / 2.0));
}

/* The nearest points of line and label: where a leader in any direction runs. Returns the distance. */
static double
nearest_points (const LabelSearch *search, const HlBox *box, HlPoint leader[2])
{
  double x = box->x + box->width / 2.0, y = box->y + box->height / 2.0, nearest = HUGE_VAL;
  for (guint i = 0; i + 1 < search->n_way; i++)
    {
      const HlGridPoint *a = &search->way[i], *b = &search->way[i + 1];
      double inset_x = 0.2 * HL_UNIT * ABS (b->x - a->x), inset_y = 0.2 * HL_UNIT * ABS (b->y - a->y);   /* off the ends */
      HlPoint on = { CLAMP (x, MIN (a->x, b->x) * HL_UNIT + inset_x, MAX (a->x, b->x) * HL_UNIT - inset_x),
                     CLAMP (y, MIN (a->y, b->y) * HL_UNIT + inset_y, MAX (a->y, b->y) * HL_UNIT - inset_y) };
      HlPoint edge = { CLAMP (on.x, box->x + 10.0, box->x + box->width - 10.0), CLAMP (on.y, box->y, box->y + box->height) };
      double distance = hypot (on.x - edge.x, on.y - edge.y);
      if (distance >= nearest)
        continue;
      nearest = distance;
      leader[0] = on;
      leader[1] = edge;
    }
  return nearest;
}

/* A label that a hand has put away from its line is led back to it. */
static void
lead_back (LabelSearch *search)
{
  HlLabelSpot *spot = &search->best;
  spot->has_leader = nearest_points (search, &spot->box, spot->leader) > GAP + 4.0;
}

/* What a slanted leader runs over, looked at every few pixels. */
static double
price_of_slanted_leader (const LabelSearch *search, const HlPoint *leader, double limit)
{
  double length = hypot (leader[1].x - leader[0].x, leader[1].y - leader[0].y), price = 0.0;
  int n = (int) (length / 5.0);
  for (int k = 0; k < n && price < limit; k++)
    {
      double t = (k + 0.5) / n;
      HlBox at = { leader[0].x + t * (leader[1].x - leader[0].x), leader[0].y + t * (leader[1].y - leader[0].y), 0.0, 0.0 };
      int lines = hl_free_space_lines (search->space, &at, 5.0) - hl_count_line_points (search->way, search->n_way, &at, 5.0);
      price += PRICE_SYMBOL * hl_free_space_boxes (search->space, &at, 5.0) + 25.0 * MAX (lines, 0)
        + PRICE_WORDS * hl_free_space_taken (search->space, &at, 3.0);
    }
  return price;
}

/* The last resort: anywhere around, led back by a slanted leader. */
static void
try_anywhere (LabelSearch *search)
{
  int left = G_MAXINT, right = G_MININT, top = G_MAXINT, bottom = G_MININT;
  for (guint i = 0; i < search->n_way; i++)
    {
      left = MIN (left, search->way[i].x);
      right = MAX (right, search->way[i].x);
      top = MIN (top, search->way[i].y);
      bottom = MAX (bottom, search->way[i].y);
    }
  for (double y = top * HL_UNIT - 110.0; y <= bottom * HL_UNIT + 110.0 - search->height; y += 12.0)
    for (double x = left * HL_UNIT - 190.0; x <= right * HL_UNIT + 190.0 - search->width; x += 15.0)
      {
        HlBox box = { x, y, search->width, search->height };
        HlPoint leader[2];
        double distance = nearest_points (search, &box, leader), base = 80.0 + 0.7 * distance;
        if (distance < GAP || distance > 110.0 || base >= search->best.price
            || price_of_spot (search, &box, base, HL_FIT_BESIDE, search->best.price) >= search->best.price)
          continue;
        base += price_of_slanted_leader (search, leader, search->best.price);
        try_label (search, x, y, base, HL_FIT_BESIDE, leader);
      }
}

static void
search_label (LabelSearch *search)
{
  for (guint i = 0; i + 1 < search->n_way; i++)
    try_segment (search, i);
  if (search->best.price > TROUBLE)
    for (guint i = 0; i + 1 < search->n_way; i++)
      try_segment_led (search, i);
  if (search->best.price > COVERING)
    try_anywhere (search);
}

/* A leader takes a thin strip, in pieces where it is slanted, so that later labels keep off it. */
static void
take_leader (const HlStreamPlace *place, HlFreeSpace *space, int id, HlTakeFunc act)
{
  const HlPoint *a = &place->leader[0], *b = &place->leader[1];
  gboolean is_slanted = fabs (a->x - b->x) > 1.0 && fabs (a->y - b->y) > 1.0;
  int n = is_slanted ? (int) (hypot (a->x - b->x, a->y - b->y) / 8.0) + 1 : 1;
  for (int k = 0; k < n; k++)
    {
      double x = a->x + (b->x - a->x) * k / n, y = a->y + (b->y - a->y) * k / n;
      double next_x = a->x + (b->x - a->x) * (k + 1) / n, next_y = a->y + (b->y - a->y) * (k + 1) / n;
      HlBox strip = { MIN (x, next_x) - 1.0, MIN (y, next_y) - 1.0, fabs (next_x - x) + 2.0, fabs (next_y - y) + 2.0 };
      act (space, id, &strip);
    }
}

void
hl_layout_take_label (const HlLayout *layout, HlFreeSpace *space, guint n, HlTakeFunc act)
{
  const HlStreamPlace *place = &layout->streams[n];
  int id = (int) (layout->n_components + n);
  act (space, id, &place->label);
  if (place->has_leader)
    take_leader (place, space, id, act);
}

static LabelSearch
begin_search (const HlLayout *layout, HlFreeSpace *space, guint n)
{
  const HlStreamPlace *place = &layout->streams[n];
  LabelSearch search = { .space = space, .width = place->label.width, .height = place->label.height };
  search.way = (HlGridPoint *) (gpointer) layout->ways[n]->data;
  search.n_way = layout->ways[n]->len;
  search.best.box = place->label;
  search.best.price = HUGE_VAL;
  return search;
}

void
hl_layout_settle_label (HlLayout *layout, HlFreeSpace *space, guint n, const HlLabelSpot *spot)
{
  HlStreamPlace *place = &layout->streams[n];
  layout->spots[n] = *spot;
  place->label = spot->box;
  place->has_leader = spot->has_leader;
  place->leader[0] = spot->leader[0];
  place->leader[1] = spot->leader[1];
  hl_layout_take_label (layout, space, n, hl_free_space_take);
}

void
hl_layout_place_label (HlLayout *layout, HlFreeSpace *space, guint n, const HlBox *kept)
{
  const HlStream *stream = hl_plant_stream (layout->plant, n);
  LabelSearch search = begin_search (layout, space, n);
  search.kept = kept;
  if (stream->has_label_place)
    {
      search.best.box.x = stream->label_x * HL_UNIT - search.width / 2.0;
      search.best.box.y = stream->label_y * HL_UNIT - search.height / 2.0;
      search.best.price = 0.0;
      lead_back (&search);
    }
  else
    search_label (&search);
  hl_layout_settle_label (layout, space, n, &search.best);
}

/* A label whose line and size are as before stays when it covers no more than it did. */
gboolean
hl_layout_keep_label (HlLayout *layout, HlFreeSpace *space, guint n, const HlLayout *previous, guint before)
{
  const HlLabelSpot *spot = &previous->spots[before];
  const GArray *way = layout->ways[n], *old = previous->ways[before];
  LabelSearch search = begin_search (layout, space, n);
  if (hl_plant_stream (layout->plant, n)->has_label_place || spot->box.width != search.width
      || way->len != old->len || memcmp (way->data, old->data, way->len * sizeof (HlGridPoint)) != 0)
    return FALSE;
  if (price_of_spot (&search, &spot->box, spot->base, spot->fit, HUGE_VAL) > spot->price + 1.0)
    return FALSE;
  hl_layout_settle_label (layout, space, n, spot);
  return TRUE;
}
