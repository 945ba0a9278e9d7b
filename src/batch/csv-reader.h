/* Reads CSV record by record (RFC 4180: quotes, doubled quotes, line ends inside quotes), in one pass.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <stdio.h>
#include <glib.h>
G_BEGIN_DECLS

typedef struct _HlCsvReader HlCsvReader;
typedef enum { HL_CSV_RECORD, HL_CSV_END, HL_CSV_ERROR } HlCsvOutcome;

HlCsvReader *hl_csv_reader_new      (FILE *file);            /* borrowed */
void         hl_csv_reader_free     (HlCsvReader *reader);
/* The next record that is neither blank nor a line beginning with '#'; errors are of reading, or of an open quote. */
HlCsvOutcome hl_csv_reader_next     (HlCsvReader *reader, GError **error);
/* Of the present record, until the next call. */
gulong       hl_csv_reader_line     (const HlCsvReader *reader);                 /* of its first character, from 1 */
guint        hl_csv_reader_n_fields (const HlCsvReader *reader);
const char  *hl_csv_reader_field    (const HlCsvReader *reader, guint n);        /* without its quotes */
const char  *hl_csv_reader_raw      (const HlCsvReader *reader, gsize *length);  /* as it stands, without its line end */

/* Appends a field, quoted where it must be. */
void         hl_csv_append_field    (GString *text, const char *field);
G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlCsvReader, hl_csv_reader_free)
G_END_DECLS
