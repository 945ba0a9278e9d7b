/* A stream as a row of the ledger view: its cells as text and as numbers.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gio/gio.h>
#include "draw/ledger.h"
G_BEGIN_DECLS

#define HL_TYPE_LEDGER_LINE (hl_ledger_line_get_type ())
G_DECLARE_FINAL_TYPE (HlLedgerLine, hl_ledger_line, HL, LEDGER_LINE, GObject)
/* Signal "changed": the cells are other ones. */

HlLedgerLine *hl_ledger_line_new    (const char *id);      /* interned */
const char   *hl_ledger_line_id     (HlLedgerLine *self);
void          hl_ledger_line_update (HlLedgerLine *self, const HlSolution *solution, guint stream, HlUnitSet units);
const char   *hl_ledger_line_text   (HlLedgerLine *self, guint column);
/* Numbers by size, words with the numbers in them counted ("2" before "10"); what is unknown comes last. */
int           hl_ledger_line_compare (HlLedgerLine *a, HlLedgerLine *b, guint column);
G_END_DECLS
