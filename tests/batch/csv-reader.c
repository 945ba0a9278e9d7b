/* CSV by RFC 4180, with comments and blank lines left out, and mistakes named by line.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "batch/csv-reader.h"

#include <string.h>
#include "batch/command.h"

static FILE *
open_text (const char *text, gsize length)
{
  FILE *file = fmemopen ((char *) text, length, "r");
  g_assert_nonnull (file);
  return file;
}

/* Fields joined by '|', records by '/'. */
static char *
read_all (const char *text)
{
  g_autoptr(GError) error = NULL;
  GString *all = g_string_new (NULL);
  FILE *file = open_text (text, strlen (text));
  HlCsvReader *reader = hl_csv_reader_new (file);
  while (hl_csv_reader_next (reader, &error) == HL_CSV_RECORD)
    {
      for (guint i = 0; i < hl_csv_reader_n_fields (reader); i++)
        g_string_append_printf (all, "%s%s", i > 0 ? "|" : "", hl_csv_reader_field (reader, i));
      g_string_append_c (all, '/');
    }
  g_assert_no_error (error);
  hl_csv_reader_free (reader);
  fclose (file);
  return g_string_free (all, FALSE);
}

static void
assert_reads (const char *text, const char *expected)
{
  g_autofree char *all = read_all (text);
  g_assert_cmpstr (all, ==, expected);
}

static void
test_fields_are_split (void)
{
  assert_reads ("a,b\n1,2\n", "a|b/1|2/");
  assert_reads ("a,b\r\n1,2", "a|b/1|2/");
  assert_reads (",\n", "|/");
  assert_reads ("a\n", "a/");
}

static void
test_quotes_are_taken_off (void)
{
  assert_reads ("\"a,b\",\"say \"\"so\"\"\"\n", "a,b|say \"so\"/");
  assert_reads ("\"two\nlines\",x\ny,z\n", "two\nlines|x/y|z/");
  assert_reads ("\"\",1\n", "|1/");
}

static void
test_comments_and_blank_lines_are_left_out (void)
{
  assert_reads ("# said\n\n  \na\n#b\r\nc\n", "a/c/");
  assert_reads ("\xef\xbb\xbfp_Pa\n1\n", "p_Pa/1/");
  assert_reads ("# only this\n", "");
}

static void
test_raw_record_and_line_are_kept (void)
{
  static const char text[] = "#\n\"x\ny\",2\r\nz\n";
  g_autoptr(GError) error = NULL;
  gsize length;
  FILE *file = open_text (text, strlen (text));
  HlCsvReader *reader = hl_csv_reader_new (file);
  g_assert_cmpint (hl_csv_reader_next (reader, &error), ==, HL_CSV_RECORD);
  const char *raw = hl_csv_reader_raw (reader, &length);
  g_assert_cmpmem (raw, length, "\"x\ny\",2", 7);
  g_assert_cmpuint (hl_csv_reader_line (reader), ==, 2);
  g_assert_cmpint (hl_csv_reader_next (reader, &error), ==, HL_CSV_RECORD);
  g_assert_cmpuint (hl_csv_reader_line (reader), ==, 4);
  g_assert_cmpint (hl_csv_reader_next (reader, &error), ==, HL_CSV_END);
  hl_csv_reader_free (reader);
  fclose (file);
}

static void
test_an_open_quote_is_an_error_with_its_line (void)
{
  static const char text[] = "a,b\n1,\"2\n3,4\n";
  g_autoptr(GError) error = NULL;
  FILE *file = open_text (text, strlen (text));
  HlCsvReader *reader = hl_csv_reader_new (file);
  g_assert_cmpint (hl_csv_reader_next (reader, &error), ==, HL_CSV_RECORD);
  g_assert_cmpint (hl_csv_reader_next (reader, &error), ==, HL_CSV_ERROR);
  g_assert_error (error, HL_BATCH_ERROR, HL_BATCH_ERROR_CONTENT);
  g_assert_nonnull (strstr (error->message, "line 2"));
  hl_csv_reader_free (reader);
  fclose (file);
}

static void
test_what_is_quoted_reads_back (void)
{
  static const char *const fields[] = { "", "plain", "a,b", "say \"so\"", "two\nlines", "“7 bar”" };
  g_autoptr(GString) text = g_string_new (NULL);
  for (guint i = 0; i < G_N_ELEMENTS (fields); i++)
    {
      g_string_append (text, i > 0 ? "," : "");
      hl_csv_append_field (text, fields[i]);
    }
  g_string_append_c (text, '\n');
  assert_reads (text->str, "|plain|a,b|say \"so\"|two\nlines|“7 bar”/");
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/csv/fields-are-split", test_fields_are_split);
  g_test_add_func ("/csv/quotes-are-taken-off", test_quotes_are_taken_off);
  g_test_add_func ("/csv/comments-and-blank-lines-are-left-out", test_comments_and_blank_lines_are_left_out);
  g_test_add_func ("/csv/raw-record-and-line-are-kept", test_raw_record_and_line_are_kept);
  g_test_add_func ("/csv/an-open-quote-is-an-error-with-its-line", test_an_open_quote_is_an_error_with_its_line);
  g_test_add_func ("/csv/what-is-quoted-reads-back", test_what_is_quoted_reads_back);
  return g_test_run ();
}
