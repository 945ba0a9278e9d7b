/* Reads pairs, appends states; one pass, so that a table may be longer than the memory.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "batch/state-table.h"

#include <errno.h>
#include <math.h>
#include <string.h>
#include "batch/command.h"
#include "batch/csv-reader.h"
#include "batch/number.h"
#include "batch/state-pair.h"
#include "plant/i18n.h"

#define FLUSH_AT (1u << 18)

static const char *const column_names[HL_N_STATE_KEYS] = { "p_Pa", "T_K", "h_J_kg", "s_J_kgK", "rho_kg_m3", "x" };
static const char *const out_names[] = {
  "out_phase", "out_p_Pa", "out_T_K", "out_rho_kg_m3", "out_x", "out_h_J_kg", "out_s_J_kgK", "out_cp_J_kgK", "out_w_m_s", "out_error",
};

typedef struct {
  guint       n_columns;
  HlStateKey  keys[2];
  guint       columns[2];        /* where they stand */
} TableHead;

static gboolean
read_head (const HlCsvReader *reader, TableHead *head, GError **error)
{
  guint n_found = 0;
  head->n_columns = hl_csv_reader_n_fields (reader);
  for (guint column = 0; column < head->n_columns; column++)
    {
      g_autofree char *name = g_strstrip (g_strdup (hl_csv_reader_field (reader, column)));
      for (guint i = 0; i < G_N_ELEMENTS (out_names); i++)
        if (strcmp (name, out_names[i]) == 0)
          {
            g_set_error (error, HL_BATCH_ERROR, HL_BATCH_ERROR_CONTENT,
                         _("line %lu: there is a column %s already; give it another name"), hl_csv_reader_line (reader), name);
            return FALSE;
          }
      for (guint key = 0; key < HL_N_STATE_KEYS; key++)
        if (strcmp (name, column_names[key]) == 0)
          {
            if (n_found < 2)
              {
                head->keys[n_found] = key;
                head->columns[n_found] = column;
              }
            n_found++;
          }
    }
  if (n_found == 2 && head->keys[0] != head->keys[1])
    return TRUE;
  g_autofree char *list = g_strjoinv (" ", (char **) (const char *[]) { column_names[0], column_names[1], column_names[2],
                                      column_names[3], column_names[4], column_names[5], NULL });
  g_set_error (error, HL_BATCH_ERROR, HL_BATCH_ERROR_CONTENT,
               _("line %lu: the header names %u of the columns %s; it must name two different ones, separated by commas"),
               hl_csv_reader_line (reader), n_found, list);
  return FALSE;
}

static void
append_number (GString *text, double value)
{
  char digits[HL_NUMBER_SIZE];
  g_string_append_c (text, ',');
  if (isfinite (value))
    g_string_append_len (text, digits, (gssize) hl_number_print (value, digits));
}

static void
append_state (GString *text, const HlState *state)
{
  g_string_append_c (text, ',');
  g_string_append (text, hl_phase_name (state->phase));
  const double values[] = { state->p, state->T, 1.0 / state->v, state->x, state->h, state->s, state->cp, state->w };
  for (guint i = 0; i < G_N_ELEMENTS (values); i++)
    append_number (text, values[i]);
  g_string_append_c (text, ',');
}

static void
append_failure (GString *text, const char *message)
{
  for (guint i = 0; i < G_N_ELEMENTS (out_names); i++)
    g_string_append_c (text, ',');
  hl_csv_append_field (text, message);
}

static gboolean
row_state (const HlFluid *fluid, const HlCsvReader *reader, const TableHead *head, HlState *state, char **message)
{
  double values[2];
  if (hl_csv_reader_n_fields (reader) != head->n_columns)
    {
      *message = g_strdup_printf (_("the row has %u columns, the header %u"), hl_csv_reader_n_fields (reader), head->n_columns);
      return FALSE;
    }
  for (guint i = 0; i < 2; i++)
    {
      const char *field = hl_csv_reader_field (reader, head->columns[i]);
      if (!hl_number_read (field, &values[i]))
        {
          *message = g_strdup_printf (_("%s is “%s”, which is not a number with a decimal point"), column_names[head->keys[i]], field);
          return FALSE;
        }
    }
  return hl_state_from_pair (fluid, head->keys[0], values[0], head->keys[1], values[1], state, message);
}

/* The row as it stands; where it has too few or too many columns, as many as the header, so that what is appended
 * stands in its place. */
static void
append_row (GString *text, const HlCsvReader *reader, guint n_columns)
{
  guint n_fields = hl_csv_reader_n_fields (reader);
  if (n_fields == n_columns)
    {
      gsize length;
      const char *raw = hl_csv_reader_raw (reader, &length);
      g_string_append_len (text, raw, (gssize) length);
      return;
    }
  for (guint i = 0; i < n_columns; i++)
    {
      if (i > 0)
        g_string_append_c (text, ',');
      if (i < n_fields)
        hl_csv_append_field (text, hl_csv_reader_field (reader, i));
    }
}

static gboolean
flush_text (GString *text, FILE *out, GError **error)
{
  gsize n = fwrite (text->str, 1, text->len, out);
  gboolean is_whole = n == text->len;
  if (!is_whole)
    g_set_error (error, HL_BATCH_ERROR, HL_BATCH_ERROR_CONTENT, _("the table could not be written: %s"), g_strerror (errno));
  g_string_set_size (text, 0);
  return is_whole;
}

gboolean
hl_state_table (const HlFluid *fluid, FILE *in, FILE *out, gulong *n_rows, gulong *n_failed, GError **error)
{
  g_autoptr(HlCsvReader) reader = hl_csv_reader_new (in);
  g_autoptr(GString) text = g_string_sized_new (FLUSH_AT + 4096);
  TableHead head;
  *n_rows = *n_failed = 0;

  HlCsvOutcome outcome = hl_csv_reader_next (reader, error);
  if (outcome == HL_CSV_END)
    g_set_error (error, HL_BATCH_ERROR, HL_BATCH_ERROR_CONTENT, _("the table is empty; its first line must name the columns"));
  if (outcome != HL_CSV_RECORD || !read_head (reader, &head, error))
    return FALSE;

  append_row (text, reader, head.n_columns);
  for (guint i = 0; i < G_N_ELEMENTS (out_names); i++)
    g_string_append_printf (text, ",%s", out_names[i]);
  g_string_append_c (text, '\n');

  while ((outcome = hl_csv_reader_next (reader, error)) == HL_CSV_RECORD)
    {
      HlState state;
      g_autofree char *message = NULL;
      append_row (text, reader, head.n_columns);
      ++*n_rows;
      if (row_state (fluid, reader, &head, &state, &message))
        append_state (text, &state);
      else
        {
          ++*n_failed;
          append_failure (text, message);
        }
      g_string_append_c (text, '\n');
      if (text->len >= FLUSH_AT && !flush_text (text, out, error))
        return FALSE;
    }
  /* What was right before the mistake is still written. */
  return flush_text (text, out, outcome == HL_CSV_END ? error : NULL) && outcome == HL_CSV_END;
}
