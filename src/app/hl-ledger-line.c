/* A stream as a row of the ledger view: its cells as text and as numbers.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-ledger-line.h"

#include <math.h>

struct _HlLedgerLine {
  GObject     parent_instance;
  const char *id;
  char      **texts;       /* [columns] */
  double     *values;      /* [columns] SI; NaN unknown, or text */
};

enum { CHANGED, N_SIGNALS };
static guint signals[N_SIGNALS];

G_DEFINE_FINAL_TYPE (HlLedgerLine, hl_ledger_line, G_TYPE_OBJECT)

static void
hl_ledger_line_finalize (GObject *object)
{
  HlLedgerLine *self = HL_LEDGER_LINE (object);
  g_strfreev (self->texts);
  g_free (self->values);
  G_OBJECT_CLASS (hl_ledger_line_parent_class)->finalize (object);
}

static void
hl_ledger_line_class_init (HlLedgerLineClass *klass)
{
  G_OBJECT_CLASS (klass)->finalize = hl_ledger_line_finalize;
  signals[CHANGED] = g_signal_new ("changed", G_TYPE_FROM_CLASS (klass), G_SIGNAL_RUN_LAST, 0, NULL, NULL, NULL, G_TYPE_NONE, 0);
}

static void
hl_ledger_line_init (HlLedgerLine *self)
{
  guint n = hl_ledger_n_columns ();

  self->texts = g_new0 (char *, n + 1);
  self->values = g_new (double, n);
  for (guint i = 0; i < n; i++)
    {
      self->texts[i] = g_strdup ("");
      self->values[i] = NAN;
    }
}

HlLedgerLine *
hl_ledger_line_new (const char *id)
{
  HlLedgerLine *self = g_object_new (HL_TYPE_LEDGER_LINE, NULL);
  self->id = id;
  return self;
}

const char *
hl_ledger_line_id (HlLedgerLine *self)
{
  return self->id;
}

void
hl_ledger_line_update (HlLedgerLine *self, const HlSolution *solution, guint stream, HlUnitSet units)
{
  gboolean is_other = FALSE;

  for (guint n = 0; n < hl_ledger_n_columns (); n++)
    {
      char *text = hl_ledger_cell (solution, stream, n, units, &self->values[n]);
      if (g_strcmp0 (text, self->texts[n]) == 0)
        {
          g_free (text);
          continue;
        }
      g_free (self->texts[n]);
      self->texts[n] = text;
      is_other = TRUE;
    }
  if (is_other)
    g_signal_emit (self, signals[CHANGED], 0);
}

const char *
hl_ledger_line_text (HlLedgerLine *self, guint column)
{
  return self->texts[column];
}

int
hl_ledger_line_compare (HlLedgerLine *a, HlLedgerLine *b, guint column)
{
  if (hl_ledger_column (column)->is_text)
    {
      g_autofree char *first = g_utf8_collate_key_for_filename (a->texts[column], -1);
      g_autofree char *second = g_utf8_collate_key_for_filename (b->texts[column], -1);
      return strcmp (first, second);
    }
  double x = a->values[column], y = b->values[column];
  if (isnan (x) || isnan (y))
    return isnan (x) - isnan (y);
  return (x > y) - (x < y);
}
