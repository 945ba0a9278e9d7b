/* Reads tables of expected values for tests: comma-separated, '#' lines are comments, the first other line names the columns.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <glib.h>
G_BEGIN_DECLS

typedef struct _Csv Csv;

/* Every call aborts the test where file, column or number is not there: a test
 * must not pass because its data is missing. */
Csv        *csv_read       (const char *first_element, ...) G_GNUC_NULL_TERMINATED;   /* path below tests/ */
Csv        *csv_parse      (const char *text, const char *name);
void        csv_free       (Csv *csv);
guint       csv_n_rows     (const Csv *csv);
gboolean    csv_has_column (const Csv *csv, const char *column);
const char *csv_text       (const Csv *csv, guint row, const char *column);
gboolean    csv_is_empty   (const Csv *csv, guint row, const char *column);
double      csv_number     (const Csv *csv, guint row, const char *column);
double      csv_last_digit (const Csv *csv, guint row, const char *column);   /* worth of one unit of the last printed digit */

G_DEFINE_AUTOPTR_CLEANUP_FUNC (Csv, csv_free)

/* The value agrees with the printed number to so many units of its last digit;
 * 0.5 means that it rounds to the printed one. */
#define csv_assert_prints(csv, row, column, value, units) \
  csv_assert_prints_at (G_STRLOC, (csv), (row), (column), (value), (units))
void csv_assert_prints_at (const char *where, const Csv *csv, guint row, const char *column, double value, double units);

/* |value - expected| <= relative * |expected| */
#define csv_assert_near(csv, row, column, value, relative) \
  csv_assert_near_at (G_STRLOC, (csv), (row), (column), (value), (relative))
void csv_assert_near_at (const char *where, const Csv *csv, guint row, const char *column, double value, double relative);

G_END_DECLS
