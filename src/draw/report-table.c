/* Tables of the report: widths by content, long texts wrapped, headings again on every page.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/report-private.h"
#include <math.h>
#include <string.h>
#include "draw/sheet-private.h"
#include "draw/text.h"

#define MOST_COLUMNS 16
#define PADDING      0.55     /* of the text size, each side of a cell */
#define INDENT       1.2
#define LEAST_SIZE   0.75     /* of the usual size of the text */
#define TICK         "☐"

typedef struct {
  HlReport      *report;
  const HlTable *table, *like;
  int            columns[MOST_COLUMNS], n;    /* -1 in it: the box to tick */
  double         widths[MOST_COLUMNS], size, indent[MOST_COLUMNS];
  const char    *last_heading;
} Printer;

static const char *
heading_of (const Printer *p, int k)
{
  return p->columns[k] < 0 ? p->last_heading : p->table->columns[p->columns[k]].heading;
}

static const char *
text_in (const Printer *p, const HlTable *table, guint row, int k)
{
  return p->columns[k] < 0 ? TICK : hl_table_cell (table, row, (guint) p->columns[k])->text;
}

/* A group is named once, at its first row. */
static const char *
text_of (const Printer *p, guint row, int k)
{
  const char *text = text_in (p, p->table, row, k);
  if (p->table->has_parts && p->columns[k] == 0 && row > 0 && g_str_equal (text, text_in (p, p->table, row - 1, k)))
    return "";
  return text;
}

static gboolean
is_number (const Printer *p, int k)
{
  return p->columns[k] >= 0 && p->table->columns[p->columns[k]].is_number;
}

/* The widest of the words of a text, which cannot be broken. */
static double
widest_word (const Printer *p, const char *text, gboolean is_bold)
{
  g_auto (GStrv) words = g_strsplit (text, " ", -1);
  double widest = 0.0;
  for (guint i = 0; words[i] != NULL; i++)
    widest = MAX (widest, hl_text_width (&p->report->theme, words[i], p->size, is_bold));
  return widest;
}

/* Natural widths where they fit together; otherwise the wide columns of text share what is left.
 * FALSE where even the least widths are too much at this size. */
static gboolean
measure (Printer *p)
{
  double natural[MOST_COLUMNS], least[MOST_COLUMNS], room = p->report->right - p->report->left, sum = 0.0, low = 0.0, high = room;
  for (int k = 0; k < p->n; k++)
    {
      p->indent[k] = p->table->has_parts && !is_number (p, k) && k == (p->columns[0] == 0 ? 1 : 0) ? INDENT * p->size : 0.0;
      natural[k] = least[k] = widest_word (p, heading_of (p, k), TRUE);
      for (guint row = 0; row < p->like->n_rows; row++)
        {
          const char *text = text_in (p, p->like, row, k);
          double width = hl_text_width (&p->report->theme, text, p->size, FALSE) + p->indent[k];
          natural[k] = MAX (natural[k], width);
          least[k] = MAX (least[k], is_number (p, k) ? width : MIN (widest_word (p, text, FALSE), 14.0 * p->size) + p->indent[k]);
        }
      natural[k] = ceil (natural[k] * 1.01) + 2.0 * PADDING * p->size;
      least[k] = ceil (least[k] * 1.01) + 2.0 * PADDING * p->size;
      sum += natural[k];
    }
  memcpy (p->widths, natural, sizeof natural);
  if (sum <= room)
    return TRUE;
  for (int step = 0; step < 40; step++)
    {
      double limit = (low + high) / 2.0;
      sum = 0.0;
      for (int k = 0; k < p->n; k++)
        sum += p->widths[k] = MIN (natural[k], MAX (least[k], limit));
      *(sum > room ? &high : &low) = limit;
    }
  sum = 0.0;
  for (int k = 0; k < p->n; k++)
    sum += p->widths[k];
  return sum <= room + 1.0;
}

/* Smaller text where words would have to be torn; where nothing helps everything gives way alike. */
static void
choose_widths (Printer *p)
{
  double usual = p->size, room = p->report->right - p->report->left, sum = 0.0;
  while (!measure (p) && p->size > LEAST_SIZE * usual)
    p->size *= 0.97;
  for (int k = 0; k < p->n; k++)
    sum += p->widths[k];
  for (int k = 0; k < p->n && sum > room + 1.0; k++)
    p->widths[k] *= room / sum;
}

static PangoLayout *
cell_layout (const Printer *p, const char *text, int k, gboolean is_bold, double indent)
{
  PangoLayout *layout = hl_text_layout (p->report->cr, &p->report->theme, text, p->size, is_bold);
  PangoAttrList *attributes;
  pango_layout_set_single_paragraph_mode (layout, FALSE);
  pango_layout_set_width (layout, (int) ((p->widths[k] - 2.0 * PADDING * p->size - indent) * PANGO_SCALE));
  pango_layout_set_wrap (layout, PANGO_WRAP_WORD_CHAR);
  pango_layout_set_auto_dir (layout, FALSE);
  /* A hyphen in an address or a unit would be read as part of it. */
  attributes = pango_attr_list_copy (pango_layout_get_attributes (layout));
  pango_attr_list_insert (attributes, pango_attr_insert_hyphens_new (FALSE));
  pango_layout_set_attributes (layout, attributes);
  pango_attr_list_unref (attributes);
  pango_layout_set_alignment (layout, is_number (p, k) ? PANGO_ALIGN_RIGHT : PANGO_ALIGN_LEFT);
  return layout;
}

static void
rule (const Printer *p, const HlColour *colour, double width)
{
  double total = 0.0;
  for (int k = 0; k < p->n; k++)
    total += p->widths[k];
  hl_set_colour (p->report->cr, colour);
  cairo_set_dash (p->report->cr, NULL, 0, 0.0);
  cairo_set_line_width (p->report->cr, width);
  cairo_move_to (p->report->cr, p->report->left, p->report->y);
  cairo_rel_line_to (p->report->cr, total, 0.0);
  cairo_stroke (p->report->cr);
}

static double
row_height (PangoLayout *const *cells, int n)
{
  double height = 0.0;
  for (int k = 0; k < n; k++)
    {
      PangoRectangle extents;
      /* Nothing needs no height; pango gives it that of another font. */
      if (*pango_layout_get_text (cells[k]) == '\0')
        continue;
      pango_layout_get_extents (cells[k], NULL, &extents);
      height = MAX (height, (double) extents.height / PANGO_SCALE);
    }
  return height;
}

static void
draw_row (const Printer *p, PangoLayout *const *cells, const double *indents, double height)
{
  double x = p->report->left, space = 0.28 * p->size;
  for (int k = 0; k < p->n; k++)
    {
      hl_set_colour (p->report->cr, &p->report->theme.ink);
      cairo_move_to (p->report->cr, x + PADDING * p->size + indents[k], p->report->y + space);
      pango_cairo_show_layout (p->report->cr, cells[k]);
      x += p->widths[k];
    }
  p->report->y += height + 2.0 * space;
}

static void
drop (PangoLayout **cells, int n)
{
  for (int k = 0; k < n; k++)
    g_object_unref (cells[k]);
}

static void
draw_headings (const Printer *p)
{
  PangoLayout *cells[MOST_COLUMNS];
  double none[MOST_COLUMNS] = { 0.0 };
  for (int k = 0; k < p->n; k++)
    cells[k] = cell_layout (p, heading_of (p, k), k, TRUE, 0.0);
  rule (p, &p->report->theme.ink, 1.2);
  draw_row (p, cells, none, row_height (cells, p->n));
  rule (p, &p->report->theme.ink, 0.8);
  drop (cells, p->n);
}

static void
draw_body_row (const Printer *p, guint row)
{
  PangoLayout *cells[MOST_COLUMNS];
  double indents[MOST_COLUMNS], height;
  for (int k = 0; k < p->n; k++)
    {
      indents[k] = p->table->is_head[row] ? 0.0 : p->indent[k];
      cells[k] = cell_layout (p, text_of (p, row, k), k, p->table->has_parts && p->columns[k] == 0, indents[k]);
    }
  height = row_height (cells, p->n);
  if (p->report->y + height + p->size > p->report->bottom)
    {
      hl_report_break (p->report);
      draw_headings (p);
    }
  draw_row (p, cells, indents, height);
  rule (p, &p->report->theme.hairline, 0.5);
  drop (cells, p->n);
}

void
hl_report_table (HlReport *report, const HlTable *table, const HlTable *like, const int *columns, double size, const char *last_heading)
{
  Printer p = { .report = report, .table = table, .like = like != NULL ? like : table, .size = size, .last_heading = last_heading };
  for (; columns[p.n] >= 0; p.n++)
    p.columns[p.n] = columns[p.n];
  if (last_heading != NULL)
    p.columns[p.n++] = -1;
  choose_widths (&p);
  hl_report_room (report, 7.0 * size);
  draw_headings (&p);
  for (guint row = 0; row < table->n_rows; row++)
    draw_body_row (&p, row);
  report->y += size;
}
