/* Pictures and tables to files: the same for window and batch.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gio/gio.h>
#include "draw/state-diagram.h"
G_BEGIN_DECLS

typedef enum {
  HL_PICTURE_DRAWING,
  HL_PICTURE_STATE_DIAGRAM,       /* T-s */
  HL_PICTURE_HS_DIAGRAM,
  HL_PICTURE_PH_DIAGRAM,
  HL_PICTURE_BANDS,               /* energy of the plant, widths to scale */
  HL_PICTURE_HEAT,                /* of one component, or composite curves of all exchangers */
  HL_PICTURE_EXERGY_BANDS,
  HL_PICTURE_EXERGY_BARS,         /* destroyed and lost, component by component */
} HlPicture;
typedef enum { HL_FORMAT_SVG, HL_FORMAT_PDF, HL_FORMAT_PNG } HlFormat;
gboolean hl_format_from_path (const char *path, HlFormat *format, GError **error);   /* by its ending; says which endings do */

/* @width, @height in pixels at 96 dpi, 0 for the picture's usual size (drawing: its extents; diagram 960 x 600); @scale multiplies PNG pixels.
 * Writes the same bytes for the same input. */
GBytes  *hl_export_picture      (const HlSolution *solution, HlPicture picture, HlFormat format, HlThemeId theme, double width, double height, double scale, GError **error);
/* The same of one component, an index of the plant; -1: of all. */
GBytes  *hl_export_component    (const HlSolution *solution, HlPicture picture, int component, HlFormat format, HlThemeId theme, double width, double height, double scale, GError **error);
gboolean hl_export_component_file (const HlSolution *solution, HlPicture picture, int component, HlFormat format, HlThemeId theme, const char *path, GError **error);
/* A state diagram with HlDiagramExtras. */
/* @ghost (nullable): of another variant, drawn pale beneath and told by @ghost_name. */
gboolean hl_export_diagram_file (const HlSolution *solution, const HlSolution *ghost, const char *ghost_name, HlStateDiagramKind kind, guint extras, HlFormat format, HlThemeId theme, const char *path, GError **error);
/* To a file (temporary file, then renamed); path "-" is standard output. */
gboolean hl_export_picture_file (const HlSolution *solution, HlPicture picture, HlFormat format, HlThemeId theme, const char *path, GError **error);
/* Any drawing of @width x @height pixels, drawn once by @draw. */
typedef void (*HlDrawFunc) (cairo_t *cr, gpointer data);
GBytes  *hl_export_drawn        (HlFormat format, const char *title, double width, double height, double scale, HlDrawFunc draw, gpointer data, GError **error);
/* The ledger: RFC 4180, units in the header, decimal points whatever the locale.  g_free(). */
char    *hl_ledger_csv          (const HlSolution *solution, HlUnitSet units);
/* The ledger in aligned columns, as rounded on screen.  g_free(). */
char    *hl_ledger_text         (const HlSolution *solution, HlUnitSet units);
gboolean hl_export_text_file    (const char *text, const char *path, GError **error);
gboolean hl_export_bytes_file   (GBytes *bytes, const char *path, GError **error);
G_END_DECLS
