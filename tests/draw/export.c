/* Files: the same bytes each time, well formed, and errors that help.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/export.h"
#include <glib/gstdio.h>
#include <string.h>
#include <unistd.h>
#include "demo-plants.h"
#include "solution-fixture.h"

static HlSolution *
solved (void)
{
  g_autoptr (HlPlant) plant = hl_demo_extraction ();
  return hl_fixture_solution (plant, TRUE);
}

static GBytes *
bytes_of (const HlSolution *solution, HlPicture picture, HlFormat format, HlThemeId theme)
{
  g_autoptr (GError) error = NULL;
  GBytes *bytes = hl_export_picture (solution, picture, format, theme, 0.0, 0.0, 1.0, &error);
  g_assert_no_error (error);
  g_assert_nonnull (bytes);
  return bytes;
}

static void
test_same_bytes_twice (void)
{
  g_autoptr (HlSolution) solution = solved ();
  for (int picture = 0; picture <= HL_PICTURE_STATE_DIAGRAM; picture++)
    for (int format = 0; format <= HL_FORMAT_PNG; format++)
      for (int theme = 0; theme < HL_N_THEMES; theme++)
        {
          g_autoptr (GBytes) a = bytes_of (solution, picture, format, theme), b = bytes_of (solution, picture, format, theme);
          g_test_message ("picture %d format %d theme %d", picture, format, theme);
          g_assert_cmpuint (g_bytes_get_size (a), >, 2000);
          g_assert_true (g_bytes_equal (a, b));
        }
}

static void
test_themes_differ (void)
{
  g_autoptr (HlSolution) solution = solved ();
  g_autoptr (GBytes) light = bytes_of (solution, HL_PICTURE_DRAWING, HL_FORMAT_SVG, HL_THEME_LIGHT);
  g_autoptr (GBytes) dark = bytes_of (solution, HL_PICTURE_DRAWING, HL_FORMAT_SVG, HL_THEME_DARK);
  g_assert_false (g_bytes_equal (light, dark));
}

static void
count_element (GMarkupParseContext *context, const char *name, const char **names, const char **values, gpointer n, GError **error)
{
  (void) context; (void) names; (void) values; (void) error;
  *(guint *) n += g_str_equal (name, "path") || g_str_equal (name, "use");
}

static void
test_svg_is_well_formed (void)
{
  static const GMarkupParser parser = { .start_element = count_element };
  g_autoptr (HlSolution) solution = solved ();
  for (int picture = 0; picture <= HL_PICTURE_STATE_DIAGRAM; picture++)
    {
      g_autoptr (GBytes) bytes = bytes_of (solution, picture, HL_FORMAT_SVG, HL_THEME_PAPER);
      g_autoptr (GError) error = NULL;
      guint n_shapes = 0;
      g_autoptr (GMarkupParseContext) context = g_markup_parse_context_new (&parser, 0, &n_shapes, NULL);
      gsize length;
      const char *text = g_bytes_get_data (bytes, &length);
      g_assert_true (g_markup_parse_context_parse (context, text, (gssize) length, &error));
      g_assert_true (g_markup_parse_context_end_parse (context, &error));
      g_assert_no_error (error);
      g_assert_cmpuint (n_shapes, >, 60);
      g_assert_null (g_strstr_len (text, (gssize) length, "<text"));    /* outlines: no font needed to view it */
    }
}

/* By a program of another house, where there is one. */
static void
test_svg_can_be_rendered (void)
{
  g_autofree char *program = g_find_program_in_path ("rsvg-convert");
  g_autofree char *folder = g_dir_make_tmp ("heatloom-export-XXXXXX", NULL);
  g_autofree char *svg = g_build_filename (folder, "a.svg", NULL), *png = g_build_filename (folder, "a.png", NULL);
  char *arguments[] = { program, (char *) "-o", png, svg, NULL };
  g_autoptr (HlSolution) solution = solved ();
  g_autoptr (GError) error = NULL;
  int status;
  if (program == NULL)
    {
      g_test_skip ("rsvg-convert is not installed");
      g_rmdir (folder);
      return;
    }
  g_assert_true (hl_export_picture_file (solution, HL_PICTURE_DRAWING, HL_FORMAT_SVG, HL_THEME_PAPER, svg, &error));
  g_assert_true (g_spawn_sync (NULL, arguments, NULL, G_SPAWN_DEFAULT, NULL, NULL, NULL, NULL, &status, &error));
  g_assert_no_error (error);
  g_assert_true (g_spawn_check_wait_status (status, NULL));
  g_assert_true (g_file_test (png, G_FILE_TEST_EXISTS));
  g_unlink (svg);
  g_unlink (png);
  g_rmdir (folder);
}

static void
test_formats_are_what_they_say (void)
{
  g_autoptr (HlSolution) solution = solved ();
  g_autoptr (GBytes) pdf = bytes_of (solution, HL_PICTURE_DRAWING, HL_FORMAT_PDF, HL_THEME_PAPER);
  g_autoptr (GBytes) png = bytes_of (solution, HL_PICTURE_STATE_DIAGRAM, HL_FORMAT_PNG, HL_THEME_PAPER);
  gsize length;
  const guint8 *data = g_bytes_get_data (pdf, &length);
  g_assert_true (memcmp (data, "%PDF-1.", 7) == 0);
  g_assert_nonnull (g_strstr_len ((const char *) data + length - 32, 32, "%%EOF"));
  data = g_bytes_get_data (png, &length);
  g_assert_true (memcmp (data, "\x89PNG\r\n\x1a\n", 8) == 0);
  g_assert_cmpuint (data[18] << 8 | data[19], ==, 960);    /* the usual size of a diagram, in the header's big-endian words */
  g_assert_cmpuint (data[22] << 8 | data[23], ==, 600);
}

static void
test_scale_multiplies_pixels (void)
{
  g_autoptr (HlSolution) solution = solved ();
  g_autoptr (GBytes) png = hl_export_picture (solution, HL_PICTURE_DRAWING, HL_FORMAT_PNG, HL_THEME_DARK, 640.0, 400.0, 2.0, NULL);
  const guint8 *data = g_bytes_get_data (png, NULL);
  g_assert_cmpuint (data[18] << 8 | data[19], ==, 1280);
  g_assert_cmpuint (data[22] << 8 | data[23], ==, 800);
}

static void
test_size_out_of_reach_is_refused (void)
{
  g_autoptr (HlSolution) solution = solved ();
  g_autoptr (GError) error = NULL;
  g_assert_null (hl_export_picture (solution, HL_PICTURE_DRAWING, HL_FORMAT_PNG, HL_THEME_PAPER, 20000.0, 400.0, 4.0, &error));
  g_assert_error (error, G_IO_ERROR, G_IO_ERROR_INVALID_ARGUMENT);
  g_assert_nonnull (strstr (error->message, "80000"));
}

static void
test_empty_plant_has_a_sheet (void)
{
  g_autoptr (HlPlant) plant = hl_plant_new ();
  g_autoptr (HlSolution) solution = hl_fixture_solution (plant, FALSE);
  g_autoptr (GBytes) bytes = bytes_of (solution, HL_PICTURE_DRAWING, HL_FORMAT_SVG, HL_THEME_PAPER);
  g_assert_cmpuint (g_bytes_get_size (bytes), >, 500);
}

static void
test_format_by_ending (void)
{
  g_autoptr (GError) error = NULL;
  HlFormat format = HL_FORMAT_PNG;
  g_assert_true (hl_format_from_path ("a/drawing.svg", &format, NULL));
  g_assert_cmpint (format, ==, HL_FORMAT_SVG);
  g_assert_true (hl_format_from_path ("DRAWING.PDF", &format, NULL));
  g_assert_cmpint (format, ==, HL_FORMAT_PDF);
  g_assert_true (hl_format_from_path ("x.png", &format, NULL));
  g_assert_cmpint (format, ==, HL_FORMAT_PNG);
  g_assert_false (hl_format_from_path ("drawing.bmp", &format, &error));
  g_assert_error (error, G_IO_ERROR, G_IO_ERROR_INVALID_FILENAME);
  g_assert_nonnull (strstr (error->message, "drawing.bmp"));
  g_assert_nonnull (strstr (error->message, ".svg"));
  g_assert_nonnull (strstr (error->message, ".pdf"));
  g_assert_nonnull (strstr (error->message, ".png"));
}

static void
test_missing_folder_is_named (void)
{
  g_autoptr (HlSolution) solution = solved ();
  g_autoptr (GError) error = NULL, text_error = NULL;
  g_assert_false (hl_export_picture_file (solution, HL_PICTURE_DRAWING, HL_FORMAT_SVG, HL_THEME_PAPER, "/nonexistent/folder/a.svg", &error));
  g_assert_nonnull (error);
  g_assert_nonnull (strstr (error->message, "/nonexistent/folder/a.svg"));
  g_assert_nonnull (strstr (error->message, "folder that exists"));
  g_assert_false (hl_export_text_file ("text", "/nonexistent/folder/a.csv", &text_error));
  g_assert_nonnull (strstr (text_error->message, "/nonexistent/folder/a.csv"));
}

static void
test_files_are_replaced_whole (void)
{
  g_autofree char *folder = g_dir_make_tmp ("heatloom-export-XXXXXX", NULL);
  g_autofree char *path = g_build_filename (folder, "ledger.csv", NULL);
  g_autofree char *text = NULL;
  g_autoptr (GDir) dir = NULL;
  guint n_files = 0;
  g_assert_true (hl_export_text_file ("a much longer first text\n", path, NULL));
  g_assert_true (hl_export_text_file ("second\n", path, NULL));
  g_assert_true (g_file_get_contents (path, &text, NULL, NULL));
  g_assert_cmpstr (text, ==, "second\n");
  dir = g_dir_open (folder, 0, NULL);
  while (g_dir_read_name (dir) != NULL)
    n_files++;
  g_assert_cmpuint (n_files, ==, 1);    /* no temporary file is left */
  g_unlink (path);
  g_rmdir (folder);
}

static void
write_to_standard_output (void)
{
  g_autoptr (HlSolution) solution = solved ();
  _exit (hl_export_picture_file (solution, HL_PICTURE_DRAWING, HL_FORMAT_SVG, HL_THEME_PAPER, "-", NULL) ? 0 : 1);
}

static void
test_dash_is_standard_output (void)
{
  if (g_test_subprocess ())
    write_to_standard_output ();
  g_test_trap_subprocess (NULL, 0, 0);
  g_test_trap_assert_passed ();
  g_test_trap_assert_stdout ("*<svg *</svg>*");
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/draw/export/same-bytes-twice", test_same_bytes_twice);
  g_test_add_func ("/draw/export/themes-differ", test_themes_differ);
  g_test_add_func ("/draw/export/svg-is-well-formed", test_svg_is_well_formed);
  g_test_add_func ("/draw/export/svg-can-be-rendered", test_svg_can_be_rendered);
  g_test_add_func ("/draw/export/formats-are-what-they-say", test_formats_are_what_they_say);
  g_test_add_func ("/draw/export/scale-multiplies-pixels", test_scale_multiplies_pixels);
  g_test_add_func ("/draw/export/size-out-of-reach-is-refused", test_size_out_of_reach_is_refused);
  g_test_add_func ("/draw/export/empty-plant-has-a-sheet", test_empty_plant_has_a_sheet);
  g_test_add_func ("/draw/export/format-by-ending", test_format_by_ending);
  g_test_add_func ("/draw/export/missing-folder-is-named", test_missing_folder_is_named);
  g_test_add_func ("/draw/export/files-are-replaced-whole", test_files_are_replaced_whole);
  g_test_add_func ("/draw/export/dash-is-standard-output", test_dash_is_standard_output);
  return g_test_run ();
}
