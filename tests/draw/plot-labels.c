/* The search for places of texts: nothing overlaps, lines are avoided, leaders are clear.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/plot-labels.h"
#include <math.h>

static const HlBox frame = { 10.0, 20.0, 400.0, 300.0 };

static void
test_segment_and_box (void)
{
  const HlBox box = { 10.0, 10.0, 20.0, 10.0 };
  g_assert_true (hl_segment_meets_box ((HlPoint) { 0.0, 15.0 }, (HlPoint) { 50.0, 15.0 }, &box));
  g_assert_true (hl_segment_meets_box ((HlPoint) { 15.0, 12.0 }, (HlPoint) { 16.0, 13.0 }, &box));
  g_assert_true (hl_segment_meets_box ((HlPoint) { 5.0, 5.0 }, (HlPoint) { 35.0, 25.0 }, &box));
  g_assert_false (hl_segment_meets_box ((HlPoint) { 0.0, 15.0 }, (HlPoint) { 9.0, 15.0 }, &box));
  g_assert_false (hl_segment_meets_box ((HlPoint) { 0.0, 15.0 }, (HlPoint) { 15.0, 40.0 }, &box));
  g_assert_false (hl_segment_meets_box ((HlPoint) { 0.0, 25.0 }, (HlPoint) { 50.0, 25.0 }, &box));
}

static void
test_boxes_that_share_an_edge_do_not_overlap (void)
{
  const HlBox a = { 0.0, 0.0, 10.0, 10.0 }, beside = { 10.0, 0.0, 10.0, 10.0 }, inside = { 4.0, 4.0, 2.0, 2.0 };
  g_assert_false (hl_box_overlaps (&a, &beside));
  g_assert_true (hl_box_overlaps (&a, &inside));
}

static void
test_a_lone_text_stands_close_and_needs_no_leader (void)
{
  g_autoptr (HlPlotLabels) labels = hl_plot_labels_new (&frame);
  HlPlotLabelWish wish = { 20.0, 10.0, { 200.0, 150.0 }, 5.0, 100.0, { 0.0, 0.0 } };
  HlPlotLabelPlace place;
  g_assert_true (hl_plot_labels_place (labels, &wish, 0, &place));
  g_assert_true (place.is_placed);
  g_assert_false (place.has_leader);
  /* Upper right, at the clearance. */
  g_assert_cmpfloat (place.box.x, >, 200.0);
  g_assert_cmpfloat (place.box.y + place.box.height, <=, 150.0);
  g_assert_cmpfloat (hypot (place.box.x - 200.0, place.box.y + place.box.height - 150.0), <, 6.5);
}

static void
test_a_text_avoids_a_line (void)
{
  g_autoptr (HlPlotLabels) labels = hl_plot_labels_new (&frame);
  HlPlotLabelWish wish = { 20.0, 10.0, { 200.0, 150.0 }, 5.0, 100.0, { 0.0, 0.0 } };
  HlPlotLabelPlace place;
  /* A fan of lines over the whole upper half: the text goes below. */
  for (double x = 100.0; x <= 300.0; x += 8.0)
    hl_plot_labels_add_line (labels, (HlPoint) { 200.0, 148.0 }, (HlPoint) { x, 50.0 }, 1.0);
  hl_plot_labels_add_line (labels, (HlPoint) { 100.0, 140.0 }, (HlPoint) { 300.0, 140.0 }, 1.0);
  g_assert_true (hl_plot_labels_place (labels, &wish, 0, &place));
  g_assert_cmpfloat (place.box.y, >=, 141.0);
}

static void
test_crowded_texts_never_touch (void)
{
  for (int round = 0; round < 30; round++)
    {
      g_autoptr (HlPlotLabels) labels = hl_plot_labels_new (&frame);
      HlPoint at[25];
      HlPlotLabelPlace places[G_N_ELEMENTS (at)];
      guint n_placed = 0;
      for (guint i = 0; i < G_N_ELEMENTS (at); i++)
        {
          /* All within a small part of the frame, so that many need leaders, but apart from each other. */
          HlBox dot;
          gboolean is_apart;
          do
            {
              at[i] = (HlPoint) { g_test_rand_double_range (150.0, 250.0), g_test_rand_double_range (120.0, 200.0) };
              is_apart = TRUE;
              for (guint k = 0; k < i; k++)
                is_apart = is_apart && hypot (at[k].x - at[i].x, at[k].y - at[i].y) > 9.0;
            }
          while (!is_apart);
          dot = (HlBox) { at[i].x - 4.0, at[i].y - 4.0, 8.0, 8.0 };
          hl_plot_labels_add_block (labels, &dot, (int) i);
        }
      for (guint i = 0; i < G_N_ELEMENTS (at); i++)
        {
          HlPlotLabelWish wish = { 18.0, 11.0, at[i], 6.0, 200.0, { 0.0, 0.0 } };
          n_placed += hl_plot_labels_place (labels, &wish, (int) i, &places[i]);
        }
      for (guint i = 0; i < G_N_ELEMENTS (at); i++)
        for (guint k = 0; places[i].is_placed && k < G_N_ELEMENTS (at); k++)
          {
            HlBox dot = { at[k].x - 4.0, at[k].y - 4.0, 8.0, 8.0 };
            g_assert_false (hl_box_overlaps (&places[i].box, &dot));
            if (k == i || !places[k].is_placed)
              continue;
            g_assert_false (hl_box_overlaps (&places[i].box, &places[k].box));
            if (places[i].has_leader)
              g_assert_false (hl_segment_meets_box (places[i].leader[0], places[i].leader[1], &places[k].box));
          }
      /* A dot ringed by others has no straight way out; the others find a place. */
      g_assert_cmpuint (n_placed, >=, 20);
    }
}

static void
test_a_removed_text_leaves_its_place_free (void)
{
  g_autoptr (HlPlotLabels) labels = hl_plot_labels_new (&frame);
  HlPlotLabelWish wish = { 20.0, 10.0, { 200.0, 150.0 }, 5.0, 100.0, { 0.0, 0.0 } };
  HlPlotLabelPlace first, second, third;
  g_assert_true (hl_plot_labels_place (labels, &wish, 0, &first));
  g_assert_false (hl_plot_labels_is_free (labels, &first.box));
  g_assert_true (hl_plot_labels_place (labels, &wish, 0, &second));
  g_assert_false (hl_box_overlaps (&first.box, &second.box));
  hl_plot_labels_remove (labels, &first);
  g_assert_true (hl_plot_labels_is_free (labels, &first.box));
  g_assert_true (hl_plot_labels_place (labels, &wish, 0, &third));
  g_assert_cmpmem (&third.box, sizeof (HlBox), &first.box, sizeof (HlBox));
}

static void
test_a_full_frame_refuses (void)
{
  g_autoptr (HlPlotLabels) labels = hl_plot_labels_new (&frame);
  HlPlotLabelWish wish = { 20.0, 10.0, { 200.0, 150.0 }, 5.0, 500.0, { 0.0, 0.0 } };
  HlPlotLabelPlace place;
  hl_plot_labels_add_block (labels, &frame, -1);
  g_assert_false (hl_plot_labels_place (labels, &wish, 0, &place));
  g_assert_false (place.is_placed);
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/draw/plot-labels/segment-and-box", test_segment_and_box);
  g_test_add_func ("/draw/plot-labels/boxes-that-share-an-edge", test_boxes_that_share_an_edge_do_not_overlap);
  g_test_add_func ("/draw/plot-labels/a-lone-text-stands-close", test_a_lone_text_stands_close_and_needs_no_leader);
  g_test_add_func ("/draw/plot-labels/a-text-avoids-a-line", test_a_text_avoids_a_line);
  g_test_add_func ("/draw/plot-labels/crowded-texts-never-touch", test_crowded_texts_never_touch);
  g_test_add_func ("/draw/plot-labels/a-removed-text-leaves-its-place", test_a_removed_text_leaves_its_place_free);
  g_test_add_func ("/draw/plot-labels/a-full-frame-refuses", test_a_full_frame_refuses);
  return g_test_run ();
}
