/* Pictures to SVG, PDF and PNG, and texts to files; the same bytes for the same input.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/export.h"
#include <cairo-pdf.h>
#include <cairo-svg.h>
#include <math.h>
#include <stdio.h>
#include <string.h>
#include "draw/bands.h"
#include "draw/exergy-bars.h"
#include "draw/heat-diagram.h"
#include "draw/sheet.h"
#include "draw/state-diagram.h"
#include "draw/text.h"
#include "plant/i18n.h"

#define GHOST_SIZE 11.0     /* of the words that name the ghost [px] */
#define DIAGRAM_WIDTH  960.0
#define DIAGRAM_HEIGHT 600.0
#define POINTS_A_PIXEL 0.75       /* 72 points and 96 pixels an inch */
#define MOST_PIXELS    30000.0    /* what cairo's image surfaces hold */

static const struct { const char *ending; HlFormat format; } endings[] = {
  { ".svg", HL_FORMAT_SVG }, { ".pdf", HL_FORMAT_PDF }, { ".png", HL_FORMAT_PNG },
};

gboolean
hl_format_from_path (const char *path, HlFormat *format, GError **error)
{
  g_autofree char *lower = NULL;
  g_return_val_if_fail (path != NULL && format != NULL, FALSE);
  lower = g_ascii_strdown (path, -1);
  for (guint i = 0; i < G_N_ELEMENTS (endings); i++)
    if (g_str_has_suffix (lower, endings[i].ending))
      {
        *format = endings[i].format;
        return TRUE;
      }
  g_set_error (error, G_IO_ERROR, G_IO_ERROR_INVALID_FILENAME,
               _("%s: pictures are written as SVG, PDF or PNG; let the file's name end in .svg, .pdf or .png"), path);
  return FALSE;
}

static void
draw_state_diagram (cairo_t *cr, const HlTheme *theme, const HlSolution *solution, HlStateDiagramKind kind, double width, double height)
{
  g_autoptr (HlStateDiagram) diagram = hl_state_diagram_new_of_kind (solution, kind, hl_plant_units (hl_solution_plant (solution)), width, height);
  hl_state_diagram_draw (diagram, cr, theme, !hl_solution_is_solved (solution), -1);
}

static void
draw_bands (cairo_t *cr, const HlTheme *theme, const HlSolution *solution, HlBandsOf of, double width, double height)
{
  g_autoptr (HlBandsPicture) picture = hl_bands_picture_new_of (solution, of, hl_plant_units (hl_solution_plant (solution)), width, height);
  hl_bands_picture_draw (picture, cr, theme, !hl_solution_is_solved (solution));
}

static void
draw_exergy_bars (cairo_t *cr, const HlTheme *theme, const HlSolution *solution, double width, double height)
{
  g_autoptr (HlExergyBars) bars = hl_exergy_bars_new (solution, hl_plant_units (hl_solution_plant (solution)), width, height);
  hl_exergy_bars_draw (bars, cr, theme, !hl_solution_is_solved (solution));
}

static void
draw_heat (cairo_t *cr, const HlTheme *theme, const HlSolution *solution, int component, double width, double height)
{
  g_autoptr (HlHeatDiagram) diagram = hl_heat_diagram_new (solution, component, hl_plant_units (hl_solution_plant (solution)), width, height);
  hl_heat_diagram_draw (diagram, cr, theme, !hl_solution_is_solved (solution));
}

static void
draw_picture (cairo_t *cr, const HlTheme *theme, const HlSolution *solution, HlPicture picture, int component, double width, double height)
{
  hl_set_colour (cr, &theme->ground);
  cairo_paint (cr);
  switch (picture)
    {
    case HL_PICTURE_DRAWING:
      hl_draw_sheet (cr, theme, hl_solution_plant (solution), solution, width, height);
      break;
    case HL_PICTURE_HS_DIAGRAM:
      draw_state_diagram (cr, theme, solution, HL_STATE_DIAGRAM_HS, width, height);
      break;
    case HL_PICTURE_PH_DIAGRAM:
      draw_state_diagram (cr, theme, solution, HL_STATE_DIAGRAM_PH, width, height);
      break;
    case HL_PICTURE_BANDS:
      draw_bands (cr, theme, solution, HL_BANDS_ENERGY, width, height);
      break;
    case HL_PICTURE_EXERGY_BANDS:
      draw_bands (cr, theme, solution, HL_BANDS_EXERGY, width, height);
      break;
    case HL_PICTURE_EXERGY_BARS:
      draw_exergy_bars (cr, theme, solution, width, height);
      break;
    case HL_PICTURE_HEAT:
      draw_heat (cr, theme, solution, component, width, height);
      break;
    case HL_PICTURE_STATE_DIAGRAM:
    default:
      draw_state_diagram (cr, theme, solution, HL_STATE_DIAGRAM_TS, width, height);
    }
}

static cairo_status_t
append_bytes (void *bytes, const unsigned char *data, unsigned int length)
{
  g_byte_array_append (bytes, data, length);
  return CAIRO_STATUS_SUCCESS;
}

static cairo_surface_t *
open_surface (HlFormat format, const char *title, double width, double height, double scale, GByteArray *bytes)
{
  cairo_surface_t *surface;
  switch (format)
    {
    case HL_FORMAT_SVG:
      surface = cairo_svg_surface_create_for_stream (append_bytes, bytes, width, height);
      cairo_svg_surface_set_document_unit (surface, CAIRO_SVG_UNIT_PX);
      return surface;
    case HL_FORMAT_PDF:
      surface = cairo_pdf_surface_create_for_stream (append_bytes, bytes, width * POINTS_A_PIXEL, height * POINTS_A_PIXEL);
      cairo_pdf_surface_set_metadata (surface, CAIRO_PDF_METADATA_TITLE, title != NULL ? title : "");
      cairo_pdf_surface_set_metadata (surface, CAIRO_PDF_METADATA_CREATOR, "Heatloom " HL_VERSION);
      /* A fixed date: the same plant gives the same file on any day. */
      cairo_pdf_surface_set_metadata (surface, CAIRO_PDF_METADATA_CREATE_DATE, "2024-01-01T00:00:00Z");
      return surface;
    case HL_FORMAT_PNG:
    default:
      return cairo_image_surface_create (CAIRO_FORMAT_RGB24, (int) ceil (width * scale), (int) ceil (height * scale));
    }
}

static gboolean
check_size (double width, double height, double scale, HlFormat format, GError **error)
{
  double factor = format == HL_FORMAT_PNG ? scale : 1.0;
  if (width > 0.0 && height > 0.0 && factor > 0.0 && width * factor <= MOST_PIXELS && height * factor <= MOST_PIXELS)
    return TRUE;
  g_set_error (error, G_IO_ERROR, G_IO_ERROR_INVALID_ARGUMENT,
               _("a picture of %.0f x %.0f pixels cannot be made; width and height lie between 1 and %.0f"),
               width * factor, height * factor, MOST_PIXELS);
  return FALSE;
}

/* Closes the surface; FALSE with the reason where cairo could not draw. */
static gboolean
finish (cairo_t *cr, cairo_surface_t *surface, HlFormat format, GByteArray *bytes, GError **error)
{
  cairo_status_t status = cairo_status (cr);
  if (status == CAIRO_STATUS_SUCCESS)
    {
      if (format == HL_FORMAT_PNG)
        status = cairo_surface_write_to_png_stream (surface, append_bytes, bytes);
      else
        {
          cairo_show_page (cr);
          cairo_surface_finish (surface);
          status = cairo_surface_status (surface);
        }
    }
  if (status == CAIRO_STATUS_SUCCESS)
    return TRUE;
  g_set_error (error, G_IO_ERROR, G_IO_ERROR_FAILED, _("the picture could not be made: %s"), cairo_status_to_string (status));
  return FALSE;
}

/* Cairo numbers the surfaces of an SVG file on through the life of the program: "surface6" of the second file would be
 * "surface1" of the first.  Numbered anew in order of appearance the same picture has the same bytes. */
static GByteArray *
renumber_surfaces (const GByteArray *svg)
{
  static const char mark[] = "surface";
  g_autoptr (GHashTable) numbers = g_hash_table_new (NULL, NULL);
  GByteArray *out = g_byte_array_sized_new (svg->len);
  const char *text = (const char *) svg->data, *end = text + svg->len, *from = text, *found;
  while ((found = g_strstr_len (from, end - from, mark)) != NULL)
    {
      const char *digits = found + strlen (mark), *after = digits;
      char number[16];
      guint old = 0;
      gpointer new_number;
      while (after < end && g_ascii_isdigit (*after) && old < 100000000)
        old = old * 10 + (guint) (*after++ - '0');
      g_byte_array_append (out, (const guint8 *) from, (guint) (digits - from));
      from = after;
      if (after == digits || found == text || (found[-1] != '"' && found[-1] != '#'))
        {
          g_byte_array_append (out, (const guint8 *) digits, (guint) (after - digits));
          continue;
        }
      new_number = g_hash_table_lookup (numbers, GUINT_TO_POINTER (old));
      if (new_number == NULL)
        {
          new_number = GUINT_TO_POINTER (g_hash_table_size (numbers) + 1);
          g_hash_table_insert (numbers, GUINT_TO_POINTER (old), new_number);
        }
      g_snprintf (number, sizeof number, "%u", GPOINTER_TO_UINT (new_number));
      g_byte_array_append (out, (const guint8 *) number, (guint) strlen (number));
    }
  g_byte_array_append (out, (const guint8 *) from, (guint) (end - from));
  return out;
}

GBytes *
hl_export_drawn (HlFormat format, const char *title, double width, double height, double scale, HlDrawFunc draw, gpointer data, GError **error)
{
  g_autoptr (GByteArray) bytes = g_byte_array_new ();
  cairo_surface_t *surface;
  cairo_t *cr;
  gboolean is_done;
  g_return_val_if_fail (draw != NULL, NULL);
  if (!check_size (width, height, scale, format, error))
    return NULL;
  surface = open_surface (format, title, width, height, scale, bytes);
  cr = cairo_create (surface);
  if (format == HL_FORMAT_PDF)
    cairo_scale (cr, POINTS_A_PIXEL, POINTS_A_PIXEL);
  else if (format == HL_FORMAT_PNG)
    cairo_scale (cr, scale, scale);
  draw (cr, data);
  is_done = finish (cr, surface, format, bytes, error);
  cairo_destroy (cr);
  cairo_surface_destroy (surface);
  if (!is_done)
    return NULL;
  return g_byte_array_free_to_bytes (format == HL_FORMAT_SVG ? renumber_surfaces (bytes) : g_byte_array_ref (bytes));
}

typedef struct {
  HlTheme           theme;
  const HlSolution *solution;
  HlPicture         picture;
  int               component;
  double            width, height;
} Picture;

static void
draw_picture_cb (cairo_t *cr, gpointer data)
{
  const Picture *picture = data;
  draw_picture (cr, &picture->theme, picture->solution, picture->picture, picture->component, picture->width, picture->height);
}

GBytes *
hl_export_component (const HlSolution *solution, HlPicture picture, int component, HlFormat format, HlThemeId theme_id, double width, double height, double scale, GError **error)
{
  Picture what = { .solution = solution, .picture = picture, .component = component, .width = DIAGRAM_WIDTH, .height = DIAGRAM_HEIGHT };
  const HlPlant *plant;
  g_return_val_if_fail (solution != NULL, NULL);
  plant = hl_solution_plant (solution);
  what.theme = *hl_theme (theme_id);
  what.theme.font = HL_EXPORT_FONT;    /* the machine's own fonts would change the bytes */
  if (picture == HL_PICTURE_DRAWING && !(width > 0.0 && height > 0.0))
    hl_sheet_usual_size (&what.theme, plant, solution, &what.width, &what.height);
  what.width = width > 0.0 ? width : what.width;
  what.height = height > 0.0 ? height : what.height;
  return hl_export_drawn (format, hl_plant_title (plant), what.width, what.height, scale > 0.0 ? scale : 1.0, draw_picture_cb, &what, error);
}

GBytes *
hl_export_picture (const HlSolution *solution, HlPicture picture, HlFormat format, HlThemeId theme, double width, double height, double scale, GError **error)
{
  return hl_export_component (solution, picture, -1, format, theme, width, height, scale, error);
}

static gboolean
write_standard_output (const void *data, gsize length, GError **error)
{
  if (fwrite (data, 1, length, stdout) == length && fflush (stdout) == 0)
    return TRUE;
  g_set_error (error, G_IO_ERROR, g_io_error_from_errno (errno), _("standard output could not be written: %s"), g_strerror (errno));
  return FALSE;
}

static gboolean
write_file (const char *path, const void *data, gsize length, GError **error)
{
  g_autoptr (GError) failure = NULL;
  if (g_str_equal (path, "-"))
    return write_standard_output (data, length, error);
  if (g_file_set_contents_full (path, data, (gssize) length, G_FILE_SET_CONTENTS_CONSISTENT | G_FILE_SET_CONTENTS_DURABLE, 0666, &failure))
    return TRUE;
  g_set_error (error, failure->domain, failure->code,
               _("%s cannot be written: %s; choose a folder that exists and that you may write to"), path, failure->message);
  return FALSE;
}

gboolean
hl_export_component_file (const HlSolution *solution, HlPicture picture, int component, HlFormat format, HlThemeId theme, const char *path, GError **error)
{
  double scale = format == HL_FORMAT_PNG ? 2.0 : 1.0;    /* sharp on screens and slides */
  g_autoptr (GBytes) bytes = hl_export_component (solution, picture, component, format, theme, 0.0, 0.0, scale, error);
  return bytes != NULL && hl_export_bytes_file (bytes, path, error);
}

typedef struct {
  HlTheme         theme;
  HlStateDiagram *diagram, *ghost;     /* @ghost NULL: none */
  const char     *ghost_name;
  gboolean        is_stale;
} Diagram;

static void
draw_diagram_cb (cairo_t *cr, gpointer data)
{
  const Diagram *what = data;
  g_autofree char *words = NULL;
  hl_state_diagram_draw_over (what->diagram, what->ghost, cr, &what->theme, what->is_stale, -1);
  if (what->ghost == NULL)
    return;
  words = g_strdup_printf (_("grey: %s"), what->ghost_name);
  hl_set_colour (cr, &what->theme.quiet);
  hl_text_show (cr, &what->theme, words, DIAGRAM_WIDTH - 10.0, DIAGRAM_HEIGHT - 8.0, 1, GHOST_SIZE, FALSE);
}

gboolean
hl_export_diagram_file (const HlSolution *solution, const HlSolution *ghost, const char *ghost_name, HlStateDiagramKind kind, guint extras, HlFormat format, HlThemeId theme, const char *path, GError **error)
{
  const HlPlant *plant = hl_solution_plant (solution);
  g_autoptr (HlStateDiagram) diagram = hl_state_diagram_new_with (solution, kind, extras, hl_plant_units (plant), DIAGRAM_WIDTH, DIAGRAM_HEIGHT);
  g_autoptr (HlStateDiagram) beneath = ghost != NULL ? hl_state_diagram_new_on (ghost, diagram) : NULL;
  Diagram what = { *hl_theme (theme), diagram, beneath, ghost_name, !hl_solution_is_solved (solution) };
  what.theme.font = HL_EXPORT_FONT;
  g_autoptr (GBytes) bytes = hl_export_drawn (format, hl_plant_title (plant), DIAGRAM_WIDTH, DIAGRAM_HEIGHT, format == HL_FORMAT_PNG ? 2.0 : 1.0,
                                              draw_diagram_cb, &what, error);
  return bytes != NULL && hl_export_bytes_file (bytes, path, error);
}

gboolean
hl_export_bytes_file (GBytes *bytes, const char *path, GError **error)
{
  gsize length;
  const void *data;
  g_return_val_if_fail (bytes != NULL && path != NULL, FALSE);
  data = g_bytes_get_data (bytes, &length);
  return write_file (path, data, length, error);
}

gboolean
hl_export_picture_file (const HlSolution *solution, HlPicture picture, HlFormat format, HlThemeId theme, const char *path, GError **error)
{
  return hl_export_component_file (solution, picture, -1, format, theme, path, error);
}

gboolean
hl_export_text_file (const char *text, const char *path, GError **error)
{
  g_return_val_if_fail (text != NULL && path != NULL, FALSE);
  return write_file (path, text, strlen (text), error);
}
