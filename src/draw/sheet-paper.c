/* The heat balance drawing on a sheet of paper: its size, its frame and where the parts lie.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/sheet-private.h"
#include <math.h>
#include "draw/text.h"
#include "plant/i18n.h"

#define BINDING_EDGE   (20.0 * HL_MILLIMETRE)  /* ISO 5457: 20 mm at the left, 10 mm elsewhere */
#define EDGE           (10.0 * HL_MILLIMETRE)
#define FRAME_WIDTH    2.0
#define CENTRE_MARK    (5.0 * HL_MILLIMETRE)
#define FIELD_MARGIN   (4.0 * HL_MILLIMETRE)
#define LARGEST_SCALE  0.17                    /* of the drawing, per pixel of the sheet's text: words do not outgrow it */

/* ISO 216 and ANSI/ASME Y14.1, landscape; text sizes in pixels: 2.2 mm and up. */
static const struct { const char *name; double width, height, text; } papers[HL_N_PAPERS] = {
  [HL_PAPER_A4]      = { "A4", 297.0, 210.0, 8.4 },
  [HL_PAPER_A3]      = { "A3", 420.0, 297.0, 10.5 },
  [HL_PAPER_A2]      = { "A2", 594.0, 420.0, 12.5 },
  [HL_PAPER_A1]      = { "A1", 841.0, 594.0, 15.0 },
  [HL_PAPER_LETTER]  = { "Letter", 279.4, 215.9, 8.2 },
  [HL_PAPER_TABLOID] = { "Tabloid", 431.8, 279.4, 10.5 },
};

static const struct { const char *id; gsize offset; } field_ids[] = {
  { "variant", G_STRUCT_OFFSET (HlSheetFields, variant) }, { "case", G_STRUCT_OFFSET (HlSheetFields, case_name) },
  { "date", G_STRUCT_OFFSET (HlSheetFields, date) }, { "revision", G_STRUCT_OFFSET (HlSheetFields, revision) },
  { "drawn", G_STRUCT_OFFSET (HlSheetFields, drawn) }, { "checked", G_STRUCT_OFFSET (HlSheetFields, checked) },
  { "approved", G_STRUCT_OFFSET (HlSheetFields, approved) },
};

const char *
hl_paper_name (HlPaper paper)
{
  g_return_val_if_fail (paper < HL_N_PAPERS, NULL);
  return papers[paper].name;
}

gboolean
hl_paper_from_id (const char *id, HlPaper *paper, GError **error)
{
  g_autoptr (GString) all = g_string_new (NULL);
  g_return_val_if_fail (id != NULL && paper != NULL, FALSE);
  for (guint i = 0; i < HL_N_PAPERS; i++)
    {
      if (g_ascii_strcasecmp (id, papers[i].name) == 0)
        {
          *paper = (HlPaper) i;
          return TRUE;
        }
      g_string_append_printf (all, "%s%s", i > 0 ? ", " : "", papers[i].name);
    }
  g_set_error (error, G_IO_ERROR, G_IO_ERROR_INVALID_ARGUMENT, _("there is no paper “%s”; there are %s"), id, all->str);
  return FALSE;
}

void
hl_paper_size (HlPaper paper, double *width, double *height)
{
  g_return_if_fail (paper < HL_N_PAPERS);
  *width = papers[paper].width * HL_MILLIMETRE;
  *height = papers[paper].height * HL_MILLIMETRE;
}

const char *
hl_sheet_field_id (guint n)
{
  return n < G_N_ELEMENTS (field_ids) ? field_ids[n].id : NULL;
}

const char **
hl_sheet_field (HlSheetFields *fields, const char *id)
{
  g_return_val_if_fail (fields != NULL && id != NULL, NULL);
  for (guint i = 0; i < G_N_ELEMENTS (field_ids); i++)
    if (g_str_equal (field_ids[i].id, id))
      return &G_STRUCT_MEMBER (const char *, fields, field_ids[i].offset);
  return NULL;
}

/* The frame, and below the drawing's field the strip of legends, performance and title block. */
static void
place (HlPaper paper, HlBox *frame, HlBox *field, HlBox *strip)
{
  double width, height, text = papers[paper].text;
  hl_paper_size (paper, &width, &height);
  *frame = (HlBox) { BINDING_EDGE, EDGE, width - BINDING_EDGE - EDGE, height - 2.0 * EDGE };
  strip->width = MIN (frame->width, HL_STRIP_WIDTH * text);
  strip->height = HL_STRIP_HEIGHT * text;
  strip->x = frame->x + frame->width - strip->width;
  strip->y = frame->y + frame->height - strip->height;
  *field = (HlBox) { frame->x + FIELD_MARGIN, frame->y + FIELD_MARGIN, frame->width - 2.0 * FIELD_MARGIN,
                     frame->height - strip->height - 2.0 * FIELD_MARGIN };
}

static void
draw_frame (cairo_t *cr, const HlTheme *theme, const HlBox *frame, HlPaper paper)
{
  double width, height;
  hl_paper_size (paper, &width, &height);
  hl_set_colour (cr, &theme->ink);
  cairo_set_dash (cr, NULL, 0, 0.0);
  cairo_set_line_width (cr, FRAME_WIDTH);
  cairo_rectangle (cr, frame->x, frame->y, frame->width, frame->height);
  cairo_stroke (cr);
  /* Centring marks for copying and folding. */
  cairo_move_to (cr, width / 2.0, frame->y);
  cairo_rel_line_to (cr, 0.0, -CENTRE_MARK);
  cairo_move_to (cr, width / 2.0, frame->y + frame->height);
  cairo_rel_line_to (cr, 0.0, CENTRE_MARK);
  cairo_move_to (cr, frame->x, height / 2.0);
  cairo_rel_line_to (cr, -CENTRE_MARK, 0.0);
  cairo_move_to (cr, frame->x + frame->width, height / 2.0);
  cairo_rel_line_to (cr, CENTRE_MARK, 0.0);
  cairo_stroke (cr);
}

static double
fitting_scale (const HlBox *field, const HlBox *extents)
{
  if (extents->width <= 0.0 || extents->height <= 0.0)
    return 0.0;
  return MIN (field->width / extents->width, field->height / extents->height);
}

static void
draw_in_field (cairo_t *cr, const HlTheme *theme, const HlLayout *layout, const HlPlant *plant, const HlSolution *solution, const HlBox *field, double scale)
{
  HlBox extents;
  hl_layout_extents (layout, &extents);
  if (scale <= 0.0)
    return;
  cairo_save (cr);
  cairo_translate (cr, field->x + field->width / 2.0, field->y + field->height / 2.0);
  cairo_scale (cr, scale, scale);
  cairo_translate (cr, -extents.x - extents.width / 2.0, -extents.y - extents.height / 2.0);
  hl_draw_canvas (cr, theme, layout, plant, solution);
  cairo_restore (cr);
}

void
hl_draw_paper_sheet (cairo_t *cr, const HlTheme *theme, const HlPlant *plant, const HlSolution *solution, HlPaper paper,
                     const HlSheetFields *fields, double scale)
{
  static const HlSheetFields none;
  g_autoptr (HlLayout) layout = hl_layout_new (plant, solution, theme);
  HlBox frame, field, strip, extents;
  HlStrip what = { theme, plant, solution, layout, fields != NULL ? fields : &none, papers[paper].text, papers[paper].name, 0.0 };
  g_return_if_fail (paper < HL_N_PAPERS);
  place (paper, &frame, &field, &strip);
  hl_layout_extents (layout, &extents);
  what.scale = scale > 0.0 ? scale : MIN (fitting_scale (&field, &extents), LARGEST_SCALE * papers[paper].text);
  cairo_save (cr);
  draw_in_field (cr, theme, layout, plant, solution, &field, what.scale);
  hl_draw_strip (cr, &what, &strip);
  draw_frame (cr, theme, &frame, paper);
  cairo_restore (cr);
}

typedef struct {
  HlTheme              theme;
  const HlSolution    *solution;
  HlPaper              paper;
  const HlSheetFields *fields;
  double               scale;
} Sheet;

static void
draw_sheet (cairo_t *cr, gpointer data)
{
  const Sheet *sheet = data;
  hl_set_colour (cr, &sheet->theme.ground);
  cairo_paint (cr);
  hl_draw_paper_sheet (cr, &sheet->theme, hl_solution_plant (sheet->solution), sheet->solution, sheet->paper, sheet->fields, sheet->scale);
}

GBytes *
hl_export_sheet (const HlSolution *solution, HlPaper paper, const HlSheetFields *fields, double scale, HlFormat format, GError **error)
{
  Sheet sheet = { *hl_theme (HL_THEME_PAPER), solution, paper, fields, scale };
  double width, height;
  g_return_val_if_fail (solution != NULL && paper < HL_N_PAPERS, NULL);
  sheet.theme.font = HL_EXPORT_FONT;
  hl_paper_size (paper, &width, &height);
  if (scale > 0.0)
    {
      g_autoptr (HlLayout) layout = hl_layout_new (hl_solution_plant (solution), solution, &sheet.theme);
      HlBox frame, field, strip, extents;
      place (paper, &frame, &field, &strip);
      hl_layout_extents (layout, &extents);
      if (fitting_scale (&field, &extents) < scale)
        {
          g_set_error (error, G_IO_ERROR, G_IO_ERROR_INVALID_ARGUMENT,
                       _("at scale %.2f the drawing is larger than a sheet of %s; %.2f fits, or take a larger paper"),
                       scale, papers[paper].name, floor (100.0 * fitting_scale (&field, &extents)) / 100.0);
          return NULL;
        }
    }
  /* 200 pixels an inch: sharp in print. */
  return hl_export_drawn (format, hl_plant_title (hl_solution_plant (solution)), width, height, 200.0 / 96.0, draw_sheet, &sheet, error);
}
