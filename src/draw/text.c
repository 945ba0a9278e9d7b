/* Text in pictures: layouts with fixed font options, and widths without shaping.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/text.h"

#define METER_SIZE 64.0   /* pixels at which advances are measured */

static void
set_font_options (PangoContext *context)
{
  static cairo_font_options_t *options;
  if (g_once_init_enter (&options))
    {
      /* Hinting follows the machine's settings unless named; without it text also scales smoothly with the zoom. */
      cairo_font_options_t *o = cairo_font_options_create ();
      cairo_font_options_set_hint_style (o, CAIRO_HINT_STYLE_NONE);
      cairo_font_options_set_hint_metrics (o, CAIRO_HINT_METRICS_OFF);
      cairo_font_options_set_antialias (o, CAIRO_ANTIALIAS_GRAY);
      g_once_init_leave (&options, o);
    }
  pango_cairo_context_set_font_options (context, options);
  pango_context_set_round_glyph_positions (context, FALSE);
}

static void
set_text (PangoLayout *layout, const char *family, const char *text, double size, gboolean is_bold)
{
  PangoFontDescription *font = pango_font_description_new ();
  PangoAttrList *attributes = pango_attr_list_new ();
  pango_font_description_set_family (font, family);
  pango_font_description_set_absolute_size (font, size * PANGO_SCALE);
  pango_font_description_set_weight (font, is_bold ? PANGO_WEIGHT_BOLD : PANGO_WEIGHT_NORMAL);
  pango_layout_set_font_description (layout, font);
  pango_attr_list_insert (attributes, pango_attr_font_features_new ("tnum=1"));
  pango_layout_set_attributes (layout, attributes);
  pango_layout_set_single_paragraph_mode (layout, TRUE);
  pango_layout_set_text (layout, text, -1);
  pango_attr_list_unref (attributes);
  pango_font_description_free (font);
}

PangoLayout *
hl_text_layout (cairo_t *cr, const HlTheme *theme, const char *text, double size, gboolean is_bold)
{
  PangoLayout *layout = pango_cairo_create_layout (cr);
  set_font_options (pango_layout_get_context (layout));
  set_text (layout, theme->font, text, size, is_bold);
  return layout;
}

/* Advances of single characters at METER_SIZE; one table a thread, so no lock. */
typedef struct {
  PangoLayout *layout;
  GHashTable  *faces;      /* "family" with a weight mark -> Face */
} Meter;
typedef struct {
  float       latin[0x250];   /* advance in pixels, < 0: not measured yet */
  GHashTable *others;         /* character -> float bits */
} Face;

static void
face_free (gpointer data)
{
  Face *face = data;
  g_hash_table_unref (face->others);
  g_free (face);
}

static void
meter_free (gpointer data)
{
  Meter *meter = data;
  g_clear_object (&meter->layout);
  g_hash_table_unref (meter->faces);
  g_free (meter);
}

static GPrivate meter_of_thread = G_PRIVATE_INIT (meter_free);

static Meter *
get_meter (void)
{
  Meter *meter = g_private_get (&meter_of_thread);
  if (meter == NULL)
    {
      PangoContext *context = pango_font_map_create_context (pango_cairo_font_map_get_default ());
      set_font_options (context);
      meter = g_new0 (Meter, 1);
      meter->layout = pango_layout_new (context);
      meter->faces = g_hash_table_new_full (g_str_hash, g_str_equal, g_free, face_free);
      g_object_unref (context);
      g_private_set (&meter_of_thread, meter);
    }
  return meter;
}

static Face *
get_face (Meter *meter, const char *family, gboolean is_bold)
{
  char key[256];
  Face *face;
  g_snprintf (key, sizeof key, "%c%s", is_bold ? 'b' : 'n', family);
  face = g_hash_table_lookup (meter->faces, key);
  if (face == NULL)
    {
      face = g_new0 (Face, 1);
      for (guint i = 0; i < G_N_ELEMENTS (face->latin); i++)
        face->latin[i] = -1.0f;
      face->others = g_hash_table_new (NULL, NULL);
      g_hash_table_insert (meter->faces, g_strdup (key), face);
    }
  return face;
}

static float
measure_character (Meter *meter, const char *family, gboolean is_bold, gunichar c)
{
  char text[8] = "";
  int width;
  text[g_unichar_to_utf8 (c, text)] = '\0';
  set_text (meter->layout, family, text, METER_SIZE, is_bold);
  pango_layout_get_size (meter->layout, &width, NULL);
  return (float) width / PANGO_SCALE;
}

static float
advance (Meter *meter, Face *face, const char *family, gboolean is_bold, gunichar c)
{
  union { float number; guint32 bits; } cell;
  gpointer found;
  if (c < G_N_ELEMENTS (face->latin))
    {
      if (face->latin[c] < 0.0f)
        face->latin[c] = measure_character (meter, family, is_bold, c);
      return face->latin[c];
    }
  if (g_hash_table_lookup_extended (face->others, GUINT_TO_POINTER (c), NULL, &found))
    cell.bits = GPOINTER_TO_UINT (found);
  else
    {
      cell.number = measure_character (meter, family, is_bold, c);
      g_hash_table_insert (face->others, GUINT_TO_POINTER (c), GUINT_TO_POINTER (cell.bits));
    }
  return cell.number;
}

double
hl_text_width (const HlTheme *theme, const char *text, double size, gboolean is_bold)
{
  Meter *meter = get_meter ();
  Face *face = get_face (meter, theme->font, is_bold);
  double width = 0.0;
  for (const char *c = text; *c != '\0'; c = g_utf8_next_char (c))
    width += advance (meter, face, theme->font, is_bold, g_utf8_get_char (c));
  return width * size / METER_SIZE;
}

double
hl_text_show (cairo_t *cr, const HlTheme *theme, const char *text, double x, double y, int align, double size, gboolean is_bold)
{
  PangoLayout *layout = hl_text_layout (cr, theme, text, size, is_bold);
  PangoLayoutLine *line = pango_layout_get_line_readonly (layout, 0);
  PangoRectangle extents;
  double width;
  pango_layout_line_get_extents (line, NULL, &extents);
  width = (double) extents.width / PANGO_SCALE;
  cairo_move_to (cr, x - (align < 0 ? 0.0 : align > 0 ? width : width / 2.0), y);
  if (cairo_surface_get_type (cairo_get_target (cr)) == CAIRO_SURFACE_TYPE_RECORDING)
    {
      /* A recording is replayed at any zoom, where glyphs would jump to whole pixels and the words fall apart. */
      pango_cairo_layout_line_path (cr, line);
      cairo_fill (cr);
    }
  else
    pango_cairo_show_layout_line (cr, line);
  g_object_unref (layout);
  return width;
}
