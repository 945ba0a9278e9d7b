/* What stands in each table.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/tables-private.h"
#include <math.h>
#include <string.h>
#include "draw/ledger.h"
#include "plant/i18n.h"

HlTable *
hl_table_summary (const HlSolution *solution, HlUnitSet units)
{
  enum { GROUP, NAME, VALUE, UNIT, BASIS, KEY, N };
  g_autoptr (HlSummary) summary = hl_summary_new (solution);
  HlTable *table = hl_table_new (_("Performance"), N, hl_summary_n_lines (summary));
  hl_table_head (table, GROUP, _("Group"), FALSE);
  hl_table_head (table, NAME, _("Quantity"), FALSE);
  hl_table_head (table, VALUE, _("Value"), TRUE);
  hl_table_head (table, UNIT, _("Unit"), FALSE);
  hl_table_head (table, BASIS, _("Basis"), FALSE);
  hl_table_head (table, KEY, _("Key"), FALSE);
  for (guint row = 0; row < table->n_rows; row++)
    {
      const HlSummaryLine *line = hl_summary_line (summary, row);
      hl_table_set_text (table, row, GROUP, line->group);
      hl_table_set_text (table, row, NAME, line->name);
      hl_table_set_text (table, row, UNIT, hl_table_set_value (table, row, VALUE, line->value, line->dimension, line->is_percent, units));
      hl_table_set_text (table, row, BASIS, line->basis);
      hl_table_set_text (table, row, KEY, line->key);
      table->is_head[row] = !line->is_part;
      table->has_parts = table->has_parts || line->is_part;
    }
  return table;
}

HlTable *
hl_table_streams (const HlSolution *solution, HlUnitSet units)
{
  HlTable *table;
  g_return_val_if_fail (solution != NULL, NULL);
  table = hl_table_new (_("Streams"), hl_ledger_n_columns (), hl_plant_n_streams (hl_solution_plant (solution)));
  for (guint column = 0; column < table->n_columns; column++)
    {
      const HlLedgerColumn *kind = hl_ledger_column (column);
      g_autofree char *heading = hl_ledger_heading (column, units);
      hl_table_head (table, column, heading, !kind->is_text);
      for (guint row = 0; row < table->n_rows; row++)
        {
          double value;
          g_autofree char *text = hl_ledger_cell (solution, row, column, units, &value);
          hl_table_set_text (table, row, column, text);
          if (!kind->is_text && isfinite (value))
            {
              const char *point = strchr (text, '.');
              HlTableCell *cell = (HlTableCell *) hl_table_cell (table, row, column);
              cell->number = hl_units_to_display (value, kind->dimension, units);
              cell->decimals = point != NULL ? (int) strlen (point + 1) : 0;
            }
        }
    }
  return table;
}

static const char *
component_label (const HlComponent *component)
{
  return *component->name != '\0' ? component->name : _(component->kind->name);
}

/* How a quantity came to its value: an own value, or that of the stream at its port. */
static const char *
origin_of (const HlPlant *plant, const HlAddress *address)
{
  const HlValue *value = hl_plant_value_wherever (plant, address, NULL);
  return hl_origin_name (value != NULL ? value->origin : HL_ORIGIN_FOUND);
}

HlTable *
hl_table_components (const HlSolution *solution, HlUnitSet units)
{
  enum { ID, NAME, KIND, QUANTITY, VALUE, UNIT, ORIGIN, ADDRESS, N };
  const HlPlant *plant = hl_solution_plant (solution);
  g_autoptr (GArray) rows = g_array_new (FALSE, FALSE, sizeof (guint) * 2);
  HlTable *table;
  for (guint i = 0; i < hl_plant_n_components (plant); i++)
    {
      const HlComponent *component = hl_plant_component (plant, i);
      for (guint k = 0; k < hl_component_n_quantities (component); k++)
        {
          guint row[2] = { i, k };
          HlAddress address = hl_address_component (component->id, hl_component_quantity (component, k).key);
          double value;
          if (hl_solution_value (solution, &address, &value) && isfinite (value))
            g_array_append_val (rows, row);
        }
    }
  table = hl_table_new (_("Components"), N, rows->len);
  hl_table_head (table, ID, _("Component"), FALSE);
  hl_table_head (table, NAME, _("Name"), FALSE);
  hl_table_head (table, KIND, _("Kind"), FALSE);
  hl_table_head (table, QUANTITY, _("Quantity"), FALSE);
  hl_table_head (table, VALUE, _("Value"), TRUE);
  hl_table_head (table, UNIT, _("Unit"), FALSE);
  hl_table_head (table, ORIGIN, _("Origin"), FALSE);
  hl_table_head (table, ADDRESS, _("Address"), FALSE);
  for (guint row = 0; row < rows->len; row++)
    {
      const guint *at = (const guint *) (const void *) (rows->data + row * sizeof (guint) * 2);
      const HlComponent *component = hl_plant_component (plant, at[0]);
      HlQuantity quantity = hl_component_quantity (component, at[1]);
      HlAddress address = hl_address_component (component->id, quantity.key);
      g_autofree char *name = hl_component_quantity_name (component, at[1]), *text = hl_address_to_text (&address);
      double value = NAN;
      hl_solution_value (solution, &address, &value);
      hl_table_set_text (table, row, ID, component->id);
      hl_table_set_text (table, row, NAME, component_label (component));
      hl_table_set_text (table, row, KIND, _(component->kind->name));
      hl_table_set_text (table, row, QUANTITY, name);
      hl_table_set_text (table, row, UNIT, hl_table_set_value (table, row, VALUE, value, quantity.kind->dimension,
                                                               (quantity.kind->flags & HL_QUANTITY_PERCENT) != 0, units));
      hl_table_set_text (table, row, ORIGIN, origin_of (plant, &address));
      hl_table_set_text (table, row, ADDRESS, text);
    }
  return table;
}

typedef struct { HlAddress address; HlValue value; } Held;

static void
collect (GArray *all, const HlPlant *plant, HlOwner owner, const char *id, const HlValues *values, gboolean assumed_only)
{
  for (guint n = 0; n < values->n; n++)
    {
      Held held = { { owner, id, values->entries[n].key }, values->entries[n].value };
      if ((!assumed_only || held.value.origin == HL_ORIGIN_ASSUMED) && hl_plant_quantity_kind (plant, &held.address) != NULL)
        g_array_append_val (all, held);
    }
}

/* Number that a repeated key ends with, from 1; 0 when there is none. */
static int
number_of (const HlPlant *plant, const HlAddress *address)
{
  const HlComponent *component = address->owner == HL_OWNER_COMPONENT ? hl_plant_find_component (plant, address->id) : NULL;
  for (guint k = 0; component != NULL && k < hl_component_n_quantities (component); k++)
    if (hl_component_quantity (component, k).key == address->key)
      return hl_component_quantity (component, k).number;
  return 0;
}

/* Where a value comes from.  An assumed value that is not the usual one cannot lean on the usual one's source. */
static char *
source_of (const HlPlant *plant, const Held *held, const HlQuantityKind *kind, HlUnitSet units)
{
  const HlComponent *owner = held->address.owner == HL_OWNER_COMPONENT ? hl_plant_find_component (plant, held->address.id) : NULL;
  double usual = hl_component_default (owner, kind, number_of (plant, &held->address));
  const char *source = hl_component_default_source (owner, kind);
  gboolean has_source = source != NULL && *source != '\0';
  g_autofree char *usual_text = NULL, *tie = NULL;
  switch (held->value.origin)
    {
    case HL_ORIGIN_GIVEN:
      return g_strdup (_("given by the engineer"));
    case HL_ORIGIN_TIED:
      tie = hl_tie_format (plant, &held->address, &held->value);
      return g_strdup_printf (_("tied: %s"), tie);
    case HL_ORIGIN_ASSUMED:
    case HL_ORIGIN_FOUND:
    default:
      break;
    }
  if (!has_source)
    return g_strdup (_("assumed, no source"));
  if (!isfinite (usual) || fabs (held->value.value - usual) <= 1e-9 * fabs (usual))
    return g_strdup (_(source));
  usual_text = hl_quantity_format (kind, usual, units);
  return g_strdup_printf (_("assumed for this plant; usual is %s: %s"), usual_text, _(source));
}

HlTable *
hl_table_values (const HlSolution *solution, HlUnitSet units, gboolean assumed_only)
{
  enum { WHAT, VALUE, UNIT, ORIGIN, SOURCE, ADDRESS, N };
  const HlPlant *plant = hl_solution_plant (solution);
  g_autoptr (GArray) all = g_array_new (FALSE, FALSE, sizeof (Held));
  HlTable *table;
  for (guint n = 0; n < hl_plant_n_components (plant); n++)
    collect (all, plant, HL_OWNER_COMPONENT, hl_plant_component (plant, n)->id, &hl_plant_component (plant, n)->values, assumed_only);
  for (guint n = 0; n < hl_plant_n_streams (plant); n++)
    collect (all, plant, HL_OWNER_STREAM, hl_plant_stream (plant, n)->id, &hl_plant_stream (plant, n)->values, assumed_only);
  collect (all, plant, HL_OWNER_PLANT, g_intern_static_string (""), hl_plant_values (plant), assumed_only);
  table = hl_table_new (assumed_only ? _("Assumed values") : _("Given and assumed values"), N, all->len);
  hl_table_head (table, WHAT, _("Quantity"), FALSE);
  hl_table_head (table, VALUE, _("Value"), TRUE);
  hl_table_head (table, UNIT, _("Unit"), FALSE);
  hl_table_head (table, ORIGIN, _("Origin"), FALSE);
  hl_table_head (table, SOURCE, _("Source"), FALSE);
  hl_table_head (table, ADDRESS, _("Address"), FALSE);
  for (guint row = 0; row < all->len; row++)
    {
      const Held *held = &g_array_index (all, Held, row);
      const HlQuantityKind *kind = hl_plant_quantity_kind (plant, &held->address);
      g_autofree char *words = hl_plant_describe (plant, &held->address), *source = source_of (plant, held, kind, units);
      g_autofree char *address = hl_address_to_text (&held->address);
      double value = held->value.value;
      /* What a tie comes to only the solution knows. */
      if (held->value.origin == HL_ORIGIN_TIED && !hl_solution_value (solution, &held->address, &value))
        value = NAN;
      hl_table_set_text (table, row, WHAT, words);
      hl_table_set_text (table, row, UNIT, hl_table_set_value (table, row, VALUE, value, kind->dimension,
                                                               (kind->flags & HL_QUANTITY_PERCENT) != 0, units));
      hl_table_set_text (table, row, ORIGIN, hl_origin_name (held->value.origin));
      hl_table_set_text (table, row, SOURCE, source);
      hl_table_set_text (table, row, ADDRESS, address);
    }
  return table;
}

HlTable *
hl_table_findings (const HlSolution *solution)
{
  enum { GRADE, WHERE, TEXT, MENDS, N };
  HlTable *table;
  g_return_val_if_fail (solution != NULL, NULL);
  guint open = hl_solution_n_findings (solution);
  table = hl_table_new (_("Findings"), N, open + hl_solution_n_dismissed (solution));
  hl_table_head (table, GRADE, _("Grade"), FALSE);
  hl_table_head (table, WHERE, _("Where"), FALSE);
  hl_table_head (table, TEXT, _("Finding"), FALSE);
  hl_table_head (table, MENDS, _("What would mend it"), FALSE);
  for (guint row = 0; row < table->n_rows; row++)
    {
      const HlFinding *finding = row < open ? hl_solution_finding (solution, row) : hl_solution_dismissed (solution, row - open);
      g_autofree char *grade = row < open ? g_strdup (hl_grade_name (finding->grade)) : g_strdup_printf (_("%s, dismissed"), hl_grade_name (finding->grade));
      g_autofree char *words = finding->source != NULL ? g_strdup_printf (_("%s Source: %s."), finding->text, finding->source) : g_strdup (finding->text);
      g_autoptr (GString) mends = g_string_new (NULL);
      gboolean has_key = finding->at.key != NULL && *finding->at.key != '\0';
      g_autofree char *where = has_key ? hl_address_to_text (&finding->at)
                                       : g_strdup (finding->at.owner == HL_OWNER_PLANT ? _("Plant") : finding->at.id);
      for (guint k = 0; k < finding->n_mends; k++)
        g_string_append_printf (mends, "%s%s", k > 0 ? "; " : "", finding->mends[k].text);
      hl_table_set_text (table, row, GRADE, grade);
      hl_table_set_text (table, row, WHERE, where);
      hl_table_set_text (table, row, TEXT, words);
      hl_table_set_text (table, row, MENDS, mends->str);
    }
  return table;
}
