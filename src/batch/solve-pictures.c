/* The diagrams that solve writes: what the command line asks for, and the files.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include <string.h>
#include "batch/plant-input.h"
#include "batch/solve-output.h"
#include "draw/heat-diagram.h"
#include "draw/state-diagram.h"
#include "plant/i18n.h"

static gboolean
check_path (const char *path, GError **error)
{
  HlFormat format;
  return strcmp (path, "-") == 0 || hl_format_from_path (path, &format, error);
}

/* @diagram: which, and the file. */
static gboolean
check_diagram (char *const *diagram, GError **error)
{
  HlStateDiagramKind kind;
  if (hl_state_diagram_kind_from_id (diagram[0], &kind))
    return check_path (diagram[1], error);
  g_set_error (error, HL_BATCH_ERROR, HL_BATCH_ERROR_USAGE, _("--diagram: there is no diagram “%s”; there are ts, hs and ph"), diagram[0]);
  return FALSE;
}

/* @heat: which component, and the file. */
static gboolean
check_heat (const HlPlant *plant, char *const *heat, GError **error)
{
  if (plant == NULL || strcmp (heat[0], "all") == 0 || hl_plant_component_index (plant, heat[0]) >= 0)
    return check_path (heat[1], error);
  g_set_error (error, HL_BATCH_ERROR, HL_BATCH_ERROR_USAGE, _("--heat: there is no component “%s”; all stands for all exchangers together"), heat[0]);
  return FALSE;
}

/* Pictures of the whole plant that have an option of their own. */
static const struct { const char *option; HlPicture picture; } whole[] = {
  { "bands", HL_PICTURE_BANDS }, { "exergy-bands", HL_PICTURE_EXERGY_BANDS }, { "exergy-bars", HL_PICTURE_EXERGY_BARS },
};

gboolean
hl_check_pictures (const HlPlant *plant, const HlArguments *arguments, GError **error)
{
  char *const *values;
  const char *shown = hl_arguments_value (arguments, "diagram-shows");
  guint extras;
  if (shown != NULL && !hl_diagram_extras_parse (shown, &extras))
    {
      g_set_error (error, HL_BATCH_ERROR, HL_BATCH_ERROR_USAGE, _("--diagram-shows: “%s” holds something else than areas, sources, table and isobars, parted by commas"), shown);
      return FALSE;
    }
  for (guint n = 0; (values = hl_arguments_option (arguments, "diagram", n)) != NULL; n++)
    if (!check_diagram (values, error))
      return FALSE;
  for (guint n = 0; (values = hl_arguments_option (arguments, "heat", n)) != NULL; n++)
    if (!check_heat (plant, values, error))
      return FALSE;
  for (guint k = 0; k < G_N_ELEMENTS (whole); k++)
    {
      const char *path = hl_arguments_value (arguments, whole[k].option);
      if (path != NULL && !check_path (path, error))
        return FALSE;
    }
  return TRUE;
}

gboolean
hl_write_picture (const HlSolution *solution, HlPicture picture, int component, const char *path, GError **error)
{
  /* A picture without a file name has no ending that says its format. */
  HlFormat format = HL_FORMAT_SVG;
  if (strcmp (path, "-") != 0 && !hl_format_from_path (path, &format, error))
    return FALSE;
  return hl_export_component_file (solution, picture, component, format, HL_THEME_PAPER, path, error);
}

/* The variant of --ghost; "base" is the base where no variant is called so.  FALSE: there is none of that name. */
static gboolean
find_ghost (const HlDocument *document, const HlArguments *arguments, int *variant, GError **error)
{
  const char *name = hl_arguments_value (arguments, "ghost");
  *variant = HL_DOCUMENT_BASE;
  if (name == NULL || (strcmp (name, "base") == 0 && hl_document_find_variant (document, name) == HL_DOCUMENT_BASE))
    return TRUE;
  return hl_input_variant (document, arguments, "ghost", variant, error);
}

static gboolean
write_diagrams (const HlSolution *solution, HlDocument *document, const HlArguments *arguments, GError **error)
{
  g_autoptr (HlSolution) ghost = NULL;
  int variant;
  const char *shown = hl_arguments_value (arguments, "diagram-shows");
  char *const *diagram;
  guint extras = 0;
  if (shown != NULL)
    hl_diagram_extras_parse (shown, &extras);
  if (!find_ghost (document, arguments, &variant, error))
    return FALSE;
  if (hl_arguments_value (arguments, "ghost") != NULL)
    ghost = hl_solve (hl_document_plant (document, variant), solution);
  for (guint n = 0; (diagram = hl_arguments_option (arguments, "diagram", n)) != NULL; n++)
    {
      HlStateDiagramKind kind;
      HlFormat format = HL_FORMAT_SVG;
      if (!hl_state_diagram_kind_from_id (diagram[0], &kind))
        continue;
      if (strcmp (diagram[1], "-") != 0 && !hl_format_from_path (diagram[1], &format, error))
        return FALSE;
      if (!hl_export_diagram_file (solution, ghost, hl_arguments_value (arguments, "ghost"), kind, extras, format, HL_THEME_PAPER, diagram[1], error))
        return FALSE;
    }
  return TRUE;
}

/* The id of a component, even where it is "all", comes first. */
static gboolean
write_heats (const HlSolution *solution, const HlArguments *arguments, GError **error)
{
  char *const *heat;
  for (guint n = 0; (heat = hl_arguments_option (arguments, "heat", n)) != NULL; n++)
    {
      int component = hl_plant_component_index (hl_solution_plant (solution), heat[0]);
      if (!hl_write_picture (solution, HL_PICTURE_HEAT, component >= 0 ? component : HL_HEAT_ALL, heat[1], error))
        return FALSE;
    }
  return TRUE;
}

gboolean
hl_write_pictures (const HlSolution *solution, HlDocument *document, const HlArguments *arguments, GError **error)
{
  if (!write_diagrams (solution, document, arguments, error) || !write_heats (solution, arguments, error))
    return FALSE;
  for (guint k = 0; k < G_N_ELEMENTS (whole); k++)
    {
      const char *path = hl_arguments_value (arguments, whole[k].option);
      if (path != NULL && !hl_write_picture (solution, whole[k].picture, -1, path, error))
        return FALSE;
    }
  return TRUE;
}
