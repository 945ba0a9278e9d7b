/* heatloom-batch solve and check: one plant, solved once.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include <stdio.h>
#include <string.h>
#include "batch/command.h"
#include "batch/plant-input.h"
#include "batch/solve-output.h"
#include "draw/export.h"
#include "plant/i18n.h"

/* The options that take a file name, which may be "-". */
static const char *const file_options[] = { "json", "csv", "summary", "ledger", "xlsx", "report", "drawing", "diagram", "heat", "bands", "exergy-bands", "exergy-bars", NULL };

/* Mistakes of the command line show before anything is read or written. */
static gboolean
check_usage (const HlArguments *arguments, GError **error)
{
  const char *drawing = hl_arguments_value (arguments, "drawing");
  HlFormat format;
  if (hl_arguments_count_standard_output (arguments, file_options) > 1)
    g_set_error (error, HL_BATCH_ERROR, HL_BATCH_ERROR_USAGE, _("only one output can go to standard output (-)"));
  else
    {
      if (!hl_check_pictures (NULL, arguments, error) || !hl_check_handover (arguments, error))
        return FALSE;
      return drawing == NULL || strcmp (drawing, "-") == 0 || hl_format_from_path (drawing, &format, error);
    }
  return FALSE;
}

static gboolean
write_outputs (const HlSolution *solution, HlDocument *document, const GArray *yielded, const HlArguments *arguments, GError **error)
{
  const char *json_path = hl_arguments_value (arguments, "json"), *csv_path = hl_arguments_value (arguments, "csv");
  const char *ledger_path = hl_arguments_value (arguments, "ledger"), *drawing = hl_arguments_value (arguments, "drawing");
  if (json_path != NULL)
    {
      g_autofree char *json = hl_solution_json (solution, yielded);
      if (!hl_export_text_file (json, json_path, error))
        return FALSE;
    }
  if (csv_path != NULL)
    {
      g_autofree char *csv = hl_ledger_csv (solution, hl_plant_units (hl_solution_plant (solution)));
      if (!hl_export_text_file (csv, csv_path, error))
        return FALSE;
    }
  if (ledger_path != NULL)
    {
      g_autofree char *text = hl_ledger_text (solution, hl_plant_units (hl_solution_plant (solution)));
      if (!hl_export_text_file (text, ledger_path, error))
        return FALSE;
    }
  return hl_write_handover (solution, document, arguments, error)
         && (drawing == NULL || hl_arguments_value (arguments, "paper") != NULL || hl_write_picture (solution, HL_PICTURE_DRAWING, -1, drawing, error))
         && hl_write_pictures (solution, document, arguments, error);
}

static HlExit
run_solve (const HlArguments *arguments)
{
  g_autoptr(GError) error = NULL;
  if (!check_usage (arguments, &error))
    return hl_complain (HL_EXIT_USAGE, g_steal_pointer (&error));
  HlExit failure;
  g_autoptr(HlDocument) document = NULL;
  int variant;
  g_autoptr(HlPlant) plant = hl_input_plant (arguments, &document, &variant, &failure, &error);
  if (plant == NULL)
    return hl_complain (failure, g_steal_pointer (&error));
  g_autoptr(GArray) yielded = g_array_new (FALSE, FALSE, sizeof (HlYield));
  if (!hl_check_pictures (plant, arguments, &error) || !hl_input_values (&plant, arguments, yielded, &error))
    return hl_complain (HL_EXIT_USAGE, g_steal_pointer (&error));
  const char *moved = hl_arguments_value (arguments, "sensitivity");
  HlAddress result;
  if (moved != NULL && !hl_address_parse (moved, plant, &result, &error))
    {
      g_prefix_error (&error, "--sensitivity: ");
      return hl_complain (HL_EXIT_USAGE, g_steal_pointer (&error));
    }

  /* What --set changes shows beside the other variants too. */
  g_autoptr(HlDocument) with_values = hl_document_with_plant (document, variant, plant);
  g_autoptr(HlSolution) solution = hl_solve (plant, NULL);
  if (!write_outputs (solution, with_values, yielded, arguments, &error))
    {
      HlExit status = g_error_matches (error, HL_BATCH_ERROR, HL_BATCH_ERROR_USAGE) ? HL_EXIT_USAGE : HL_EXIT_FILE;
      return hl_complain (status, g_steal_pointer (&error));
    }
  /* Where standard output carries a file, a person still hears of errors. */
  if (hl_arguments_count_standard_output (arguments, file_options) == 0)
    {
      hl_print_solution (stdout, solution, yielded);
      if (moved != NULL)
        hl_print_sensitivity (stdout, solution, &result);
    }
  else
    hl_print_findings (stderr, solution, HL_GRADE_ERROR);
  return hl_solution_is_solved (solution) ? HL_EXIT_DONE : HL_EXIT_PLANT;
}

static HlExit
run_check (const HlArguments *arguments)
{
  g_autoptr(GError) error = NULL;
  HlExit failure;
  g_autoptr(HlPlant) plant = hl_input_plant (arguments, NULL, NULL, &failure, &error);
  if (plant == NULL)
    return hl_complain (failure, g_steal_pointer (&error));
  g_autoptr(HlSolution) solution = hl_solve (plant, NULL);
  hl_print_findings (stdout, solution, HL_GRADE_HINT);
  if (hl_solution_n_findings (solution) == 0)
    printf ("%s\n", _("nothing found"));
  if (hl_arguments_option (arguments, "all", 0) != NULL)
    hl_print_dismissed (stdout, solution);
  gboolean is_strict = hl_arguments_option (arguments, "strict", 0) != NULL;
  gboolean is_bad = !hl_solution_is_solved (solution) || hl_solution_has_grade (solution, is_strict ? HL_GRADE_WARNING : HL_GRADE_ERROR);
  return is_bad ? HL_EXIT_PLANT : HL_EXIT_DONE;
}

static const HlBatchOption solve_options[] = {
  { "sensitivity", N_("ADDRESS"), FALSE, N_("print how this result moves with 1 % more of each value put in") },
  { "variant", N_("NAME"), FALSE, N_("take this variant of the plant instead of its base") },
  { "set", N_("ADDRESS=VALUE"), TRUE, N_("give a value, as 'T1.inlet.p=80 bar'; may be repeated") },
  { "medium", N_("STREAM=MEDIUM"), TRUE, N_("put the circuit of a stream on another medium, as '1=isopentane'; may be repeated") },
  { "json", N_("FILE"), FALSE, N_("write results, streams and findings as JSON, in SI") },
  { "csv", N_("FILE"), FALSE, N_("write the ledger of all streams as CSV, in the plant's units") },
  { "summary", N_("FILE"), FALSE, N_("write the performance summary as CSV, each figure with its unit and basis") },
  { "ledger", N_("FILE"), FALSE, N_("write the ledger as text in aligned columns") },
  { "xlsx", N_("FILE"), FALSE, N_("write summary, streams, components, values and findings as a workbook") },
  { "drawing", N_("FILE"), FALSE, N_("write the drawing; .svg, .pdf or .png") },
  { "report", N_("FILE"), FALSE, N_("write everything as one PDF: basis, drawing, diagram, tables, findings, assumed values, equations") },
  { "paper", N_("SIZE"), FALSE, N_("put the drawing on a sheet with title block and legends: A4, A3, A2, A1, Letter, Tabloid") },
  { "scale", N_("NUMBER"), FALSE, N_("scale of the drawing on its sheet; as large as fits when it is not given") },
  { "field", N_("NAME=TEXT"), TRUE, N_("fill a field of the sheet: variant, case, date, revision, drawn, checked, approved; may be repeated") },
  { "diagram", N_("ts|hs|ph FILE"), TRUE, N_("write a state diagram: temperature-entropy, enthalpy-entropy, pressure-enthalpy; may be repeated") },
  { "ghost", N_("NAME"), FALSE, N_("draw this variant, or the base, pale beneath the state diagrams") },
  { "diagram-shows", N_("LIST"), FALSE, N_("show beside the cycle: areas, sources, table, isobars; parted by commas") },
  { "heat", N_("COMPONENT FILE"), TRUE, N_("write temperature over heat of an exchanger, or of all together (all); may be repeated") },
  { "bands", N_("FILE"), FALSE, N_("write where the energy of the plant comes from and goes, as bands to scale") },
  { "exergy-bands", N_("FILE"), FALSE, N_("write where its exergy comes from, is destroyed, lost and made, as bands to scale") },
  { "exergy-bars", N_("FILE"), FALSE, N_("write the exergy that each component destroys and loses, as bars") },
};

const HlBatchCommand hl_command_solve = {
  .name = "solve",
  .usage = N_("PLANT [options]"),
  .summary = N_("solve a plant, print its results, write them to files"),
  .details = N_(
    "PLANT is a *.heatloom file. --set works like typing into the window: the value becomes given, and where that is\n"
    "one too many, an assumed value yields; the output says which. A value that begins with = ties the quantity to\n"
    "another one: --set 'H1.steam.p==0.5*T1.inlet.p'. A picture written to - is SVG.\n"),
  .least = 1, .most = 1,
  .options = solve_options, .n_options = G_N_ELEMENTS (solve_options),
  .run = run_solve,
};

static const HlBatchOption check_options[] = {
  { "variant", N_("NAME"), FALSE, N_("take this variant of the plant instead of its base") },
  { "strict", NULL, FALSE, N_("a warning counts as an error") },
  { "all", NULL, FALSE, N_("print the dismissed ones too") },
};

const HlBatchCommand hl_command_check = {
  .name = "check",
  .usage = N_("PLANT [options]"),
  .summary = N_("print what is missing, contradictory or against good practice"),
  .details = N_("The exit status is 1 where a finding is an error.\n"),
  .least = 1, .most = 1,
  .options = check_options, .n_options = G_N_ELEMENTS (check_options),
  .run = run_check,
};
