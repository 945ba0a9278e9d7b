/* What must hold for every state diagram: texts apart, inside, and as wide as their boxes.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "diagram-checks.h"
#include "draw/text.h"

static gboolean
is_inside (const HlBox *box, const HlBox *frame)
{
  return box->x >= frame->x && box->y >= frame->y && box->x + box->width <= frame->x + frame->width && box->y + box->height <= frame->y + frame->height;
}

const HlMark *
mark_at (const HlStateDiagram *diagram, guint n)
{
  return &g_array_index (diagram->marks, HlMark, n);
}

/* All boxes of texts inside the axes. */
static GArray *
text_boxes (const HlStateDiagram *diagram)
{
  GArray *boxes = g_array_new (FALSE, FALSE, sizeof (HlBox));
  for (guint i = 0; i < diagram->marks->len; i++)
    if (mark_at (diagram, i)->label.is_placed)
      g_array_append_val (boxes, mark_at (diagram, i)->label.box);
  for (guint i = 0; i < diagram->texts->len; i++)
    g_array_append_val (boxes, g_array_index (diagram->texts, HlDiagramText, i).box);
  return boxes;
}

static void
assert_texts_are_apart (const HlStateDiagram *diagram)
{
  g_autoptr (GArray) boxes = text_boxes (diagram);
  for (guint i = 0; i < boxes->len; i++)
    {
      const HlBox *box = &g_array_index (boxes, HlBox, i);
      g_assert_true (is_inside (box, &diagram->frame));
      for (guint k = i + 1; k < boxes->len; k++)
        g_assert_false (hl_box_overlaps (box, &g_array_index (boxes, HlBox, k)));
      for (guint k = 0; k < diagram->marks->len; k++)
        {
          const HlMark *mark = mark_at (diagram, k);
          HlBox dot = { mark->at.x - mark->radius, mark->at.y - mark->radius, 2.0 * mark->radius, 2.0 * mark->radius };
          g_assert_false (hl_box_overlaps (box, &dot));
        }
    }
}

static void
assert_leaders_are_clear (const HlStateDiagram *diagram)
{
  for (guint i = 0; i < diagram->marks->len; i++)
    {
      const HlPlotLabelPlace *label = &mark_at (diagram, i)->label;
      for (guint k = 0; label->is_placed && label->has_leader && k < diagram->marks->len; k++)
        if (k != i && mark_at (diagram, k)->label.is_placed)
          g_assert_false (hl_segment_meets_box (label->leader[0], label->leader[1], &mark_at (diagram, k)->label.box));
    }
}

/* A text is drawn no wider than its box, whatever the theme's family. */
static void
assert_boxes_hold_their_texts (const HlStateDiagram *diagram)
{
  for (guint i = 0; i < diagram->marks->len; i++)
    for (int theme = 0; theme < HL_N_THEMES; theme++)
      {
        const HlMark *mark = mark_at (diagram, i);
        gboolean is_state = mark->kind == HL_MARK_STATE;
        double size = is_state ? diagram->number_size : 0.95 * diagram->text_size;
        if (mark->label.is_placed)
          g_assert_cmpfloat (hl_text_width (hl_theme (theme), mark->text, size, is_state), <=, mark->label.box.width + 1e-6);
      }
}

/* Every paint stays on the picture. */
static void
assert_nothing_is_clipped (const HlStateDiagram *diagram, HlThemeId theme)
{
  cairo_surface_t *surface = cairo_recording_surface_create (CAIRO_CONTENT_COLOR_ALPHA, NULL);
  cairo_t *cr = cairo_create (surface);
  double x, y, width, height;
  hl_state_diagram_draw (diagram, cr, hl_theme (theme), FALSE, 0);
  g_assert_cmpint (cairo_status (cr), ==, CAIRO_STATUS_SUCCESS);
  cairo_recording_surface_ink_extents (surface, &x, &y, &width, &height);
  g_assert_cmpfloat (x, >=, 0.0);
  g_assert_cmpfloat (y, >=, 0.0);
  g_assert_cmpfloat (x + width, <=, diagram->width);
  g_assert_cmpfloat (y + height, <=, diagram->height);
  cairo_destroy (cr);
  cairo_surface_destroy (surface);
}

guint
n_without_number (const HlStateDiagram *diagram)
{
  guint n = 0;
  for (guint i = 0; i < diagram->marks->len; i++)
    n += mark_at (diagram, i)->kind == HL_MARK_STATE && !mark_at (diagram, i)->label.is_placed;
  return n;
}

void
check_diagram (const HlStateDiagram *diagram)
{
  assert_texts_are_apart (diagram);
  assert_leaders_are_clear (diagram);
  assert_boxes_hold_their_texts (diagram);
  /* The two families of the themes. */
  assert_nothing_is_clipped (diagram, HL_THEME_DARK);
  assert_nothing_is_clipped (diagram, HL_THEME_PAPER);
}
