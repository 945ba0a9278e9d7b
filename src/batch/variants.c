/* heatloom-batch variants: the what-ifs of a plant side by side.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include <stdio.h>
#include "batch/command.h"
#include "batch/plant-input.h"
#include "draw/export.h"
#include "draw/variants.h"
#include "plant/i18n.h"

static gboolean
all_solved (const HlComparison *comparison)
{
  for (guint i = 0; i < hl_comparison_n_columns (comparison); i++)
    if (!hl_solution_is_solved (hl_comparison_solution (comparison, i)))
      return FALSE;
  return TRUE;
}

static HlExit
run_variants (const HlArguments *arguments)
{
  g_autoptr (GError) error = NULL;
  g_autoptr (HlDocument) document = hl_input_document (hl_arguments_word (arguments, 0), &error);
  const char *csv_path = hl_arguments_value (arguments, "csv");
  int reference;
  if (document == NULL)
    return hl_complain (HL_EXIT_FILE, g_steal_pointer (&error));
  if (!hl_input_variant (document, arguments, "reference", &reference, &error))
    return hl_complain (HL_EXIT_USAGE, g_steal_pointer (&error));
  g_autoptr (HlComparison) comparison = hl_comparison_new (document, reference, hl_arguments_option (arguments, "equal-duty", 0) != NULL, NULL);
  g_autoptr (HlTable) table = hl_table_variants (comparison);
  g_autofree char *text = csv_path != NULL ? hl_table_csv (table) : hl_table_text (table);
  if (!hl_export_text_file (text, csv_path != NULL ? csv_path : "-", &error))
    return hl_complain (HL_EXIT_FILE, g_steal_pointer (&error));
  return all_solved (comparison) ? HL_EXIT_DONE : HL_EXIT_PLANT;
}

static const HlBatchOption variants_options[] = {
  { "reference", N_("NAME"), FALSE, N_("show differences from this variant instead of from the base") },
  { "equal-duty", NULL, FALSE, N_("solve the others with the flows, powers and heats that the reference gives") },
  { "csv", N_("FILE"), FALSE, N_("write the table as CSV instead of text") },
};

const HlBatchCommand hl_command_variants = {
  .name = "variants",
  .usage = N_("PLANT [options]"),
  .summary = N_("print the variants of a plant side by side: changes, results, differences"),
  .details = N_(
    "A duty that the reference gives or assumes is given to the others too; where that is one value too many, an assumed one\n"
    "yields. Where a variant has no solution at that duty, it keeps its own and a note says so.\n"),
  .least = 1, .most = 1,
  .options = variants_options, .n_options = G_N_ELEMENTS (variants_options),
  .run = run_variants,
};
