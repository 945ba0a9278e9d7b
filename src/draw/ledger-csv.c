/* The ledger as CSV (RFC 4180).
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/export.h"
#include "draw/tables.h"

char *
hl_ledger_csv (const HlSolution *solution, HlUnitSet units)
{
  g_autoptr (HlTable) table = NULL;
  g_return_val_if_fail (solution != NULL, NULL);
  table = hl_table_streams (solution, units);
  return hl_table_csv (table);
}
