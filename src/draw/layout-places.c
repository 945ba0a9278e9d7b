/* Finds room for titles and stream labels together: in turn first, then making room where something is covered.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/layout-private.h"
#include <math.h>

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
  hl_layout_take_label (layout, space, n, hl_free_space_give_back);
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
      hl_layout_place_label (layout, space, n, NULL);
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
    hl_layout_take_label (layout, space, g_array_index (shuffle->labels, LabelBefore, i).stream, hl_free_space_give_back);
  for (guint i = 0; i < shuffle->labels->len; i++)
    {
      const LabelBefore *before = &g_array_index (shuffle->labels, LabelBefore, i);
      hl_layout_settle_label (layout, space, before->stream, &before->spot);
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

/* All labels that stand badly are placed anew; where that was no better they stay.  Returns how many they were. */
static int
shuffle_troubled (HlLayout *layout, HlFreeSpace *space, const GArray *turns, Order order)
{
  Shuffle shuffle = begin_shuffle ();
  int n_placed;
  for (guint i = 0; i < turns->len; i++)
    {
      guint n = g_array_index (turns, Turn, i).stream;
      if (layout->spots[n].price >= TROUBLE)
        take_label_away (layout, space, &shuffle, n, rank_of (layout, n, order));
    }
  g_array_sort (shuffle.labels, compare_labels);
  n_placed = (int) shuffle.labels->len;
  end_shuffle (layout, space, &shuffle, place_labels (layout, space, &shuffle, 0));
  return n_placed;
}

/* All words near one line make room for its label: it is placed first, then they.  Returns how many labels were placed. */
static int
shuffle_around (HlLayout *layout, HlFreeSpace *space, const GArray *turns, guint stream, Order order, gboolean are_titles_first)
{
  Shuffle shuffle = begin_shuffle ();
  double sum = 0.0;
  int n_placed;
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
  hl_layout_place_label (layout, space, stream, NULL);
  sum += layout->spots[stream].price;
  if (are_titles_first)
    sum += place_titles (layout, space, &shuffle);
  sum += place_labels (layout, space, &shuffle, 1);
  if (!are_titles_first)
    sum += place_titles (layout, space, &shuffle);
  n_placed = (int) shuffle.labels->len;
  end_shuffle (layout, space, &shuffle, sum);
  return n_placed;
}

static void
shuffle_around_all (HlLayout *layout, HlFreeSpace *space, const GArray *turns, int care)
{
  for (guint i = 0; i < turns->len; i++)
    {
      guint n = g_array_index (turns, Turn, i).stream;
      for (int k = 0; k < 2 * N_ORDERS && layout->spots[n].price > COVERING && care > 0; k++)
        care -= shuffle_around (layout, space, turns, n, k / 2, k % 2 == 0);
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
  int care = CARE;
  for (guint i = 0; i < layout->n_components; i++)
    place_title (layout, space, i);
  for (guint i = 0; i < turns->len; i++)
    {
      guint n = g_array_index (turns, Turn, i).stream;
      before[n] = previous != NULL ? hl_plant_stream_index (previous->plant, hl_plant_stream (layout->plant, n)->id) : -1;
      is_kept[n] = before[n] >= 0 && hl_layout_keep_label (layout, space, n, previous, (guint) before[n]);
    }
  /* After the first round each is placed again with all the others there. */
  for (int round = 0; round < 2; round++)
    for (guint i = 0; i < turns->len; i++)
      {
        guint n = g_array_index (turns, Turn, i).stream;
        if (is_kept[n])
          continue;
        if (round > 0)
          hl_layout_take_label (layout, space, n, hl_free_space_give_back);
        hl_layout_place_label (layout, space, n, before_box (previous, before, n));
      }
  /* In a drag what moved must only be good enough; the layout after it gets the care. */
  for (int k = 0; previous == NULL && k < N_ORDERS && care > 0 && is_any_covering (layout); k++)
    care -= shuffle_troubled (layout, space, turns, k);
  if (previous == NULL)
    shuffle_around_all (layout, space, turns, care);
}
