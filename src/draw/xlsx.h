/* Tables as a workbook for spreadsheet programs.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <gio/gio.h>
#include "draw/variants.h"
G_BEGIN_DECLS
/* One sheet each for summary, streams, components, given and assumed values, findings; real numbers, shown as rounded for people.
 * The same bytes for the same input.  g_bytes_unref(). */
GBytes *hl_export_workbook (const HlSolution *solution, HlUnitSet units, GError **error);
/* The same with a sheet of the variants side by side; @comparison NULL: without. */
GBytes *hl_export_workbook_with (const HlSolution *solution, const HlComparison *comparison, HlUnitSet units, GError **error);
G_END_DECLS
