/* Finds room for titles and stream labels: every candidate gets a price, the cheapest wins.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/layout-private.h"
#include <math.h>
#include <string.h>

/* Prices.  Covering a symbol or other words is what must not happen, covering a foreign line what should not. */
#define PRICE_SYMBOL   2000.0    /* a grid point of a symbol */
#define PRICE_WORDS    40.0      /* a pixel squared of other words */
#define PRICE_LINE     110.0     /* a grid point of a foreign line */
#define PRICE_STRUCK   350.0     /* a grid point of a line that runs through a title, which has no ground of its own */
#define PRICE_OWN_LINE 14.0      /* a grid point of the own line that is not simply passed through */
#define KEPT           25.0      /* what a label gains by staying where it was */
#define TROUBLE        62.0      /* dearer: nowhere at its line without covering something; about the cheapest place with a leader */
#define NEAR_BY        60.0      /* pixels within which words may have to make room for a label */
#define COVERING       200.0     /* dearer: covers something */
#define SYMBOL_MARGIN  4.0
#define LINE_MARGIN    4.0
#define WORDS_MARGIN   3.0
#define GAP            6.0       /* between a line and a label beside it, a symbol and its title */

static HlFreeSpace *
chart (const HlLayout *layout)
{
  HlFreeSpace *space = hl_free_space_new (layout->left, layout->top, layout->right, layout->bottom);
  for (guint i = 0; i < layout->n_components; i++)
    {
      const HlComponent *c = hl_plant_component (layout->plant, i);
      int w, h;
      hl_component_half_size (c, &w, &h);
      hl_free_space_add_box (space, c->x - w, c->y - h, c->x + w, c->y + h);
    }
  for (guint i = 0; i < layout->n_streams; i++)
    hl_free_space_add_line (space, (HlGridPoint *) (gpointer) layout->ways[i]->data, layout->ways[i]->len);
  for (guint i = 0; i < layout->shafts->len; i++)
    {
      const HlShaftLink *link = &g_array_index (layout->shafts, HlShaftLink, i);
      hl_free_space_add_line (space, link->grid, link->n_points);
    }
  hl_free_space_close (space);
  return space;
}

/* Titles. */
typedef struct { int x, y; double price, off; } TitleSpot;   /* @off: pixels further out */

/* x = 1 right, -1 left of the box: y -1 top, 0 middle, 1 bottom.  x = 0 above or below by y: centred;
 * x = 2, -2: above or below, beginning or ending at the axis, clear of a line that leaves there. */
static const TitleSpot title_spots[] = {
  { 1, 0, 0 }, { 1, -1, 2 }, { 1, 1, 3 }, { 0, -1, 4 }, { 0, 1, 4 }, { -1, 0, 6 }, { -1, -1, 7 }, { -1, 1, 8 },
  { 2, -1, 5 }, { 2, 1, 6 }, { -2, -1, 8 }, { -2, 1, 9 },
  { 0, -1, 16, 14 }, { 0, 1, 16, 14 }, { 2, -1, 17, 14 }, { 2, 1, 18, 14 }, { -2, -1, 19, 14 }, { -2, 1, 20, 14 },
  { 0, -1, 26, 28 }, { 0, 1, 26, 28 }, { 2, -1, 27, 28 }, { 2, 1, 28, 28 }, { 1, 0, 22, 14 }, { -1, 0, 24, 14 },
};

static HlBox
title_box (const HlComponent *component, const TitleSpot *spot, const HlBox *title, int *align)
{
  int w, h;
  double x = component->x * HL_UNIT, y = component->y * HL_UNIT, half_width, half_height;
  HlBox box = *title;
  hl_component_half_size (component, &w, &h);
  half_width = w * HL_UNIT;
  half_height = h * HL_UNIT;
  if (spot->x == 1 || spot->x == -1)
    {
      *align = -spot->x;
      box.x = spot->x > 0 ? x + half_width + GAP + spot->off : x - half_width - GAP - spot->off - box.width;
      box.y = spot->y == 0 ? y - box.height / 2.0 : spot->y < 0 ? y - half_height - 2.0 : y + half_height + 2.0 - box.height;
      return box;
    }
  *align = spot->x == 0 ? 0 : spot->x > 0 ? -1 : 1;
  box.x = spot->x == 0 ? x - box.width / 2.0 : spot->x > 0 ? x + GAP : x - GAP - box.width;
  box.y = spot->y < 0 ? y - half_height - GAP + 1.0 - spot->off - box.height : y + half_height + GAP - 1.0 + spot->off;
  return box;
}

static void
place_title (HlLayout *layout, HlFreeSpace *space, guint n)
{
  const HlComponent *component = hl_plant_component (layout->plant, n);
  HlComponentPlace *place = &layout->components[n];
  double best_price = HUGE_VAL;
  HlBox best = place->title;
  for (guint i = 0; i < G_N_ELEMENTS (title_spots); i++)
    {
      int align;
      HlBox box = title_box (component, &title_spots[i], &place->title, &align);
      double price = title_spots[i].price
        + PRICE_SYMBOL * hl_free_space_boxes (space, &box, SYMBOL_MARGIN)
        + PRICE_STRUCK * hl_free_space_lines (space, &box, LINE_MARGIN)
        + PRICE_WORDS * hl_free_space_taken (space, &box, WORDS_MARGIN);
      if (price < best_price)
        {
          best_price = price;
          best = box;
          place->title_align = align;
        }
    }
  place->title = best;
  layout->title_prices[n] = best_price;
  hl_free_space_take (space, (int) n, &best);
}

/* Labels. */
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

/* A label at the end of a leader that leaves (@x, @y) towards (@dx, @dy); @shift moves it sideways. */
static void
try_led (LabelSearch *search, double x, double y, int dx, int dy, double distance, double shift, double base)
{
  double width = search->width, height = search->height;
  HlPoint leader[2] = { { x, y }, { x + dx * distance, y + dy * distance } };
  double price = base + 0.5 * distance + 0.04 * fabs (shift);
  double left = dx == 0 ? x - width / 2.0 + shift : dx > 0 ? leader[1].x : leader[1].x - width;
  double top = dy == 0 ? y - height / 2.0 : dy > 0 ? leader[1].y : leader[1].y - height;
  if (price >= search->best.price)
    return;
  price += price_of_leader (search, leader);
  try_label (search, left, top, price, HL_FIT_BESIDE, leader);
}

/* Where there is no room at the line: further out. */
static void
try_segment_led (LabelSearch *search, guint n)
{
  const HlGridPoint *a = &search->way[n], *b = &search->way[n + 1];
  gboolean is_across = a->y == b->y;
  int length = is_across ? ABS (b->x - a->x) : ABS (b->y - a->y);
  int dx = (b->x > a->x) - (b->x < a->x), dy = (b->y > a->y) - (b->y < a->y);
  for (int k = 1; k < length; k += length > 16 ? 2 : 1)
    {
      double x = (a->x + dx * k) * HL_UNIT, y = (a->y + dy * k) * HL_UNIT;
      double base = 55.0 + 0.9 * fabs (k - length / 2.0);
      for (double distance = 14.0; distance <= 160.0; distance += 8.0)
        for (int side = -1; side <= 1; side += 2)
          {
            if (!is_across)
              {
                try_led (search, x, y, side, 0, distance, 0.0, base);
                continue;
              }
            for (int shift = -2; shift <= 2; shift++)
              try_led (search, x, y, 0, side, distance, shift * search->width * 0.21, base);
          }
    }
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
take_leader (const HlStreamPlace *place, HlFreeSpace *space, int id, void (*act) (HlFreeSpace *space, int id, const HlBox *box))
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

static void
take_label (const HlLayout *layout, HlFreeSpace *space, guint n, void (*act) (HlFreeSpace *space, int id, const HlBox *box))
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

static void
settle_label (HlLayout *layout, HlFreeSpace *space, guint n, const HlLabelSpot *spot)
{
  HlStreamPlace *place = &layout->streams[n];
  layout->spots[n] = *spot;
  place->label = spot->box;
  place->has_leader = spot->has_leader;
  place->leader[0] = spot->leader[0];
  place->leader[1] = spot->leader[1];
  take_label (layout, space, n, hl_free_space_take);
}

static void
place_label (HlLayout *layout, HlFreeSpace *space, guint n, const HlBox *kept)
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
  settle_label (layout, space, n, &search.best);
}

/* A label whose line and size are as before stays when it covers no more than it did. */
static gboolean
keep_label (HlLayout *layout, HlFreeSpace *space, guint n, const HlLayout *previous, guint before)
{
  const HlLabelSpot *spot = &previous->spots[before];
  const GArray *way = layout->ways[n], *old = previous->ways[before];
  LabelSearch search = begin_search (layout, space, n);
  if (hl_plant_stream (layout->plant, n)->has_label_place || spot->box.width != search.width
      || way->len != old->len || memcmp (way->data, old->data, way->len * sizeof (HlGridPoint)) != 0)
    return FALSE;
  if (price_of_spot (&search, &spot->box, spot->base, spot->fit, HUGE_VAL) > spot->price + 1.0)
    return FALSE;
  settle_label (layout, space, n, spot);
  return TRUE;
}

typedef struct { guint stream; int freedom; } Turn;

static int
compare_turns (gconstpointer a, gconstpointer b)
{
  const Turn *x = a, *y = b;
  return x->freedom != y->freedom ? (x->freedom > y->freedom) - (x->freedom < y->freedom) : (x->stream > y->stream) - (x->stream < y->stream);
}

/* Labels with the least choice come first; hand-set ones before all. */
static GArray *
order_labels (const HlLayout *layout)
{
  GArray *turns = g_array_new (FALSE, FALSE, sizeof (Turn));
  for (guint i = 0; i < layout->n_streams; i++)
    {
      Turn turn = { i, 0 };
      if (layout->streams[i].label.width <= 0.0)
        continue;
      for (guint k = 0; k + 1 < layout->ways[i]->len; k++)
        {
          const HlGridPoint *a = &g_array_index (layout->ways[i], HlGridPoint, k);
          turn.freedom = MAX (turn.freedom, MAX (ABS (a[1].x - a->x), ABS (a[1].y - a->y)));
        }
      if (hl_plant_stream (layout->plant, i)->has_label_place)
        turn.freedom = -1;
      g_array_append_val (turns, turn);
    }
  g_array_sort (turns, compare_turns);
  return turns;
}

static const HlBox *
before_box (const HlLayout *previous, const int *before, guint n)
{
  return before[n] >= 0 && previous->streams[before[n]].label.width > 0.0 ? &previous->streams[before[n]].label : NULL;
}

/* Orders in which badly placed labels are tried anew: none is best for all plants. */
typedef enum { WORST_FIRST, LEFT_FIRST, RIGHT_FIRST, BEST_FIRST, N_ORDERS } Order;
typedef struct { guint stream; double rank; HlLabelSpot spot; } LabelBefore;
typedef struct { guint component; double price; HlBox title; int align; } TitleBefore;
/* Words taken away to be placed anew, and how they stood before. */
typedef struct { GArray *labels, *titles; double sum; } Shuffle;

static int
compare_labels (gconstpointer a, gconstpointer b)
{
  const LabelBefore *x = a, *y = b;
  if (x->rank > y->rank || x->rank < y->rank)
    return x->rank > y->rank ? 1 : -1;
  return (x->stream > y->stream) - (x->stream < y->stream);
}

static double
rank_of (const HlLayout *layout, guint n, Order order)
{
  const HlGridPoint *first = &g_array_index (layout->ways[n], HlGridPoint, 0);
  switch (order)
    {
    case LEFT_FIRST:  return first->x;
    case RIGHT_FIRST: return -first->x;
    case BEST_FIRST:  return layout->spots[n].price;
    default:          return -layout->spots[n].price;
    }
}

static gboolean
is_near_line (const HlBox *box, const GArray *way)
{
  return hl_count_line_points ((const HlGridPoint *) (gconstpointer) way->data, way->len, box, NEAR_BY) > 0;
}

static void
take_label_away (HlLayout *layout, HlFreeSpace *space, Shuffle *shuffle, guint n, double rank)
{
  LabelBefore label = { n, rank, layout->spots[n] };
  shuffle->sum += label.spot.price;
  g_array_append_val (shuffle->labels, label);
  take_label (layout, space, n, hl_free_space_give_back);
}

static void
take_title_away (HlLayout *layout, HlFreeSpace *space, Shuffle *shuffle, guint n)
{
  const HlComponentPlace *place = &layout->components[n];
  TitleBefore title = { n, layout->title_prices[n], place->title, place->title_align };
  shuffle->sum += title.price;
  g_array_append_val (shuffle->titles, title);
  hl_free_space_give_back (space, (int) n, &place->title);
}

static double
place_labels (HlLayout *layout, HlFreeSpace *space, const Shuffle *shuffle, guint from)
{
  double sum = 0.0;
  for (guint i = from; i < shuffle->labels->len; i++)
    {
      guint n = g_array_index (shuffle->labels, LabelBefore, i).stream;
      place_label (layout, space, n, NULL);
      sum += layout->spots[n].price;
    }
  return sum;
}

static double
place_titles (HlLayout *layout, HlFreeSpace *space, const Shuffle *shuffle)
{
  double sum = 0.0;
  for (guint i = 0; i < shuffle->titles->len; i++)
    {
      guint n = g_array_index (shuffle->titles, TitleBefore, i).component;
      place_title (layout, space, n);
      sum += layout->title_prices[n];
    }
  return sum;
}

/* All words of the shuffle, placed again, back to where they stood. */
static void
undo_shuffle (HlLayout *layout, HlFreeSpace *space, const Shuffle *shuffle)
{
  for (guint i = 0; i < shuffle->titles->len; i++)
    {
      const TitleBefore *before = &g_array_index (shuffle->titles, TitleBefore, i);
      HlComponentPlace *place = &layout->components[before->component];
      hl_free_space_give_back (space, (int) before->component, &place->title);
      place->title = before->title;
      place->title_align = before->align;
      layout->title_prices[before->component] = before->price;
      hl_free_space_take (space, (int) before->component, &place->title);
    }
  for (guint i = 0; i < shuffle->labels->len; i++)
    take_label (layout, space, g_array_index (shuffle->labels, LabelBefore, i).stream, hl_free_space_give_back);
  for (guint i = 0; i < shuffle->labels->len; i++)
    {
      const LabelBefore *before = &g_array_index (shuffle->labels, LabelBefore, i);
      settle_label (layout, space, before->stream, &before->spot);
    }
}

static Shuffle
begin_shuffle (void)
{
  return (Shuffle) { g_array_new (FALSE, FALSE, sizeof (LabelBefore)), g_array_new (FALSE, FALSE, sizeof (TitleBefore)), 0.0 };
}

static void
end_shuffle (HlLayout *layout, HlFreeSpace *space, Shuffle *shuffle, double new_sum)
{
  if (!(new_sum < shuffle->sum - 1.0))
    undo_shuffle (layout, space, shuffle);
  g_array_unref (shuffle->labels);
  g_array_unref (shuffle->titles);
}

/* All labels that stand badly are placed anew; where that was no better they stay. */
static void
shuffle_troubled (HlLayout *layout, HlFreeSpace *space, const GArray *turns, Order order)
{
  Shuffle shuffle = begin_shuffle ();
  for (guint i = 0; i < turns->len; i++)
    {
      guint n = g_array_index (turns, Turn, i).stream;
      if (layout->spots[n].price >= TROUBLE)
        take_label_away (layout, space, &shuffle, n, rank_of (layout, n, order));
    }
  g_array_sort (shuffle.labels, compare_labels);
  end_shuffle (layout, space, &shuffle, place_labels (layout, space, &shuffle, 0));
}

/* All words near one line make room for its label: it is placed first, then they. */
static void
shuffle_around (HlLayout *layout, HlFreeSpace *space, const GArray *turns, guint stream, Order order, gboolean are_titles_first)
{
  Shuffle shuffle = begin_shuffle ();
  double sum = 0.0;
  for (guint i = 0; i < turns->len; i++)
    {
      guint n = g_array_index (turns, Turn, i).stream;
      if (n == stream || is_near_line (&layout->streams[n].label, layout->ways[stream]))
        take_label_away (layout, space, &shuffle, n, n == stream ? -HUGE_VAL : rank_of (layout, n, order));
    }
  for (guint c = 0; c < layout->n_components; c++)
    if (is_near_line (&layout->components[c].title, layout->ways[stream]))
      take_title_away (layout, space, &shuffle, c);
  g_array_sort (shuffle.labels, compare_labels);
  place_label (layout, space, stream, NULL);
  sum += layout->spots[stream].price;
  if (are_titles_first)
    sum += place_titles (layout, space, &shuffle);
  sum += place_labels (layout, space, &shuffle, 1);
  if (!are_titles_first)
    sum += place_titles (layout, space, &shuffle);
  end_shuffle (layout, space, &shuffle, sum);
}

static void
shuffle_around_all (HlLayout *layout, HlFreeSpace *space, const GArray *turns)
{
  for (guint i = 0; i < turns->len; i++)
    {
      guint n = g_array_index (turns, Turn, i).stream;
      for (int k = 0; k < 2 * N_ORDERS && layout->spots[n].price > COVERING; k++)
        shuffle_around (layout, space, turns, n, k / 2, k % 2 == 0);
    }
}

static gboolean
is_any_covering (const HlLayout *layout)
{
  for (guint i = 0; i < layout->n_streams; i++)
    if (layout->spots[i].price > COVERING)
      return TRUE;
  return FALSE;
}

void
hl_layout_place_words (HlLayout *layout, const HlLayout *previous)
{
  g_autoptr (HlFreeSpace) space = chart (layout);
  g_autoptr (GArray) turns = order_labels (layout);
  g_autofree int *before = g_new (int, layout->n_streams + 1);        /* index in @previous, -1: none */
  g_autofree gboolean *is_kept = g_new0 (gboolean, layout->n_streams + 1);
  for (guint i = 0; i < layout->n_components; i++)
    place_title (layout, space, i);
  for (guint i = 0; i < turns->len; i++)
    {
      guint n = g_array_index (turns, Turn, i).stream;
      before[n] = previous != NULL ? hl_plant_stream_index (previous->plant, hl_plant_stream (layout->plant, n)->id) : -1;
      is_kept[n] = before[n] >= 0 && keep_label (layout, space, n, previous, (guint) before[n]);
    }
  /* After the first round each is placed again with all the others there. */
  for (int round = 0; round < 2; round++)
    for (guint i = 0; i < turns->len; i++)
      {
        guint n = g_array_index (turns, Turn, i).stream;
        if (is_kept[n])
          continue;
        if (round > 0)
          take_label (layout, space, n, hl_free_space_give_back);
        place_label (layout, space, n, before_box (previous, before, n));
      }
  /* In a drag what moved must only be good enough; the layout after it gets the care. */
  for (int k = 0; previous == NULL && k < N_ORDERS && is_any_covering (layout); k++)
    shuffle_troubled (layout, space, turns, k);
  if (previous == NULL)
    shuffle_around_all (layout, space, turns);
}
