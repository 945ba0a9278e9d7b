/* Tables of the second law and of heat exchange: what each component spends, makes, loses and destroys; zones of every exchanger.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/tables-private.h"
#include <math.h>
#include <string.h>
#include "draw/theme.h"
#include "plant/i18n.h"

static const char *
name_of (const HlComponent *component)
{
  return *component->name != '\0' ? component->name : _(component->kind->name);
}

/* In the column's own unit, whatever the size. */
static void
put (HlTable *table, guint row, guint column, double si, HlDimension dimension, HlUnitSet units)
{
  HlTableCell *cell = (HlTableCell *) hl_table_cell (table, row, column);
  const char *point;
  if (!isfinite (si))
    return;
  g_free (cell->text);
  cell->number = dimension == HL_DIMENSION_RATIO ? 100.0 * si : hl_units_to_display (si, dimension, units);
  cell->text = dimension == HL_DIMENSION_RATIO ? g_strdup_printf ("%.2f", cell->number) : hl_units_format_number (si, dimension, units);
  point = strchr (cell->text, '.');
  cell->decimals = point != NULL ? (int) strlen (point + 1) : 0;
}

static double
of_plant (const HlSolution *solution, const char *key)
{
  HlAddress address = hl_address_plant (g_intern_string (key));
  double value;
  return hl_solution_value (solution, &address, &value) ? value : NAN;
}

enum { ID, NAME, SPENT, MADE, LOST, DESTROYED, EFFICIENCY, PART, N_EXERGY };

static void
put_exergy (HlTable *table, guint row, HlUnitSet units, const double values[N_EXERGY])
{
  for (guint k = SPENT; k < N_EXERGY; k++)
    put (table, row, k, values[k], k < EFFICIENCY ? HL_DIMENSION_POWER : HL_DIMENSION_RATIO, units);
}

HlTable *
hl_table_exergy (const HlSolution *solution, HlUnitSet units)
{
  const HlPlant *plant = hl_solution_plant (solution);
  static const char *const heads[] = { N_("Spent"), N_("Made"), N_("Lost"), N_("Destroyed") };
  g_autoptr (GArray) rows = g_array_new (FALSE, FALSE, sizeof (guint));
  double input = of_plant (solution, "exergy_input");
  HlExergyBalance b;
  for (guint c = 0; c < hl_plant_n_components (plant); c++)
    if (isfinite (input) && hl_solution_exergy (solution, c, &b) && *b.words != '\0')
      g_array_append_val (rows, c);
  HlTable *table = hl_table_new (_("Exergy"), N_EXERGY, rows->len + (rows->len > 0));
  hl_table_head (table, ID, _("Component"), FALSE);
  hl_table_head (table, NAME, _("Name"), FALSE);
  for (guint k = 0; k < G_N_ELEMENTS (heads); k++)
    {
      g_autofree char *heading = g_strdup_printf ("%s [%s]", _(heads[k]), hl_units_label (HL_DIMENSION_POWER, units));
      hl_table_head (table, SPENT + k, heading, TRUE);
    }
  hl_table_head (table, EFFICIENCY, _("Efficiency [%]"), TRUE);
  hl_table_head (table, PART, _("Destroyed of input [%]"), TRUE);
  for (guint row = 0; row < rows->len; row++)
    {
      guint c = g_array_index (rows, guint, row);
      hl_solution_exergy (solution, c, &b);
      const double values[N_EXERGY] = { [SPENT] = b.fuel, [MADE] = b.product, [LOST] = b.loss, [DESTROYED] = b.destruction, [EFFICIENCY] = b.efficiency,
                                        [PART] = b.destruction / input };
      hl_table_set_text (table, row, ID, hl_plant_component (plant, c)->id);
      hl_table_set_text (table, row, NAME, name_of (hl_plant_component (plant, c)));
      put_exergy (table, row, units, values);
    }
  if (rows->len > 0)
    {
      double loss = of_plant (solution, "exergy_loss");
      const double values[N_EXERGY] = { [SPENT] = input, [MADE] = of_plant (solution, "exergy_product"), [LOST] = isfinite (loss) ? loss : 0.0,
                                        [DESTROYED] = of_plant (solution, "exergy_destruction"), [EFFICIENCY] = of_plant (solution, "exergy_efficiency"),
                                        [PART] = of_plant (solution, "exergy_destruction") / input };
      hl_table_set_text (table, rows->len, NAME, _("the whole plant"));
      put_exergy (table, rows->len, units, values);
      table->is_head[rows->len] = TRUE;
    }
  return table;
}

/* --- heat exchange -------------------------------------------------------------------- */

enum { X_ID, X_NAME, X_ZONE, X_HEAT, X_HOT_IN, X_HOT_OUT, X_COLD_IN, X_COLD_OUT, X_MEAN, X_UA, N_X };

static void
put_zone (HlTable *table, guint row, HlUnitSet units, const HlHeatZone *zone)
{
  const struct { guint column; double value; HlDimension dimension; } cells[] = {
    { X_HEAT, zone->heat, HL_DIMENSION_POWER }, { X_HOT_IN, zone->hot_in, HL_DIMENSION_TEMPERATURE }, { X_HOT_OUT, zone->hot_out, HL_DIMENSION_TEMPERATURE },
    { X_COLD_IN, zone->cold_in, HL_DIMENSION_TEMPERATURE }, { X_COLD_OUT, zone->cold_out, HL_DIMENSION_TEMPERATURE },
    { X_MEAN, zone->mean_difference, HL_DIMENSION_TEMPERATURE_DIFFERENCE }, { X_UA, zone->conductance, HL_DIMENSION_CONDUCTANCE },
  };
  for (guint k = 0; k < G_N_ELEMENTS (cells); k++)
    put (table, row, cells[k].column, cells[k].value, cells[k].dimension, units);
}

/* Zones of one exchanger, and a line for the whole above them. */
static guint
put_exchanger (HlTable *table, guint row, const HlSolution *solution, guint component, const HlHeatCurve *curve, HlUnitSet units)
{
  const HlComponent *it = hl_plant_component (hl_solution_plant (solution), component);
  guint n = curve->zones->len;
  const HlHeatZone *first = &g_array_index (curve->zones, HlHeatZone, 0), *last = &g_array_index (curve->zones, HlHeatZone, n - 1);
  HlHeatZone all = { .hot_in = last->hot_in, .hot_out = first->hot_out, .cold_in = first->cold_in, .cold_out = last->cold_out };
  for (guint k = 0; k < n; k++)
    {
      all.heat += g_array_index (curve->zones, HlHeatZone, k).heat;
      all.conductance += g_array_index (curve->zones, HlHeatZone, k).conductance;
    }
  all.mean_difference = all.heat / all.conductance;
  hl_table_set_text (table, row, X_ID, it->id);
  hl_table_set_text (table, row, X_NAME, name_of (it));
  hl_table_set_text (table, row, X_ZONE, _("the whole"));
  put_zone (table, row, units, &all);
  table->is_head[row] = TRUE;
  for (guint k = n; n > 1 && k-- > 0;)
    {
      const HlHeatZone *zone = &g_array_index (curve->zones, HlHeatZone, k);
      g_autofree char *words = g_strdup_printf (_("%s over %s"), hl_look_name (zone->hot), hl_look_name (zone->cold));
      hl_table_set_text (table, ++row, X_ID, it->id);
      hl_table_set_text (table, row, X_ZONE, words);
      put_zone (table, row, units, zone);
      table->has_parts = TRUE;
    }
  return row + 1;
}

static void
head_exchangers (HlTable *table, HlUnitSet units)
{
  static const struct { guint column; const char *name; HlDimension dimension; } heads[] = {
    { X_HEAT, N_("Heat"), HL_DIMENSION_POWER }, { X_HOT_IN, N_("Hot in"), HL_DIMENSION_TEMPERATURE }, { X_HOT_OUT, N_("Hot out"), HL_DIMENSION_TEMPERATURE },
    { X_COLD_IN, N_("Cold in"), HL_DIMENSION_TEMPERATURE }, { X_COLD_OUT, N_("Cold out"), HL_DIMENSION_TEMPERATURE },
    { X_MEAN, N_("Mean difference"), HL_DIMENSION_TEMPERATURE_DIFFERENCE }, { X_UA, N_("UA"), HL_DIMENSION_CONDUCTANCE },
  };
  hl_table_head (table, X_ID, _("Component"), FALSE);
  hl_table_head (table, X_NAME, _("Name"), FALSE);
  hl_table_head (table, X_ZONE, _("Zone"), FALSE);
  for (guint k = 0; k < G_N_ELEMENTS (heads); k++)
    {
      g_autofree char *heading = g_strdup_printf ("%s [%s]", _(heads[k].name), hl_units_label (heads[k].dimension, units));
      hl_table_head (table, heads[k].column, heading, TRUE);
    }
}

HlTable *
hl_table_exchangers (const HlSolution *solution, HlUnitSet units)
{
  g_autoptr (GArray) components = hl_heat_exchangers (solution);
  guint n_rows = 0, row = 0;
  for (guint pass = 0;; pass++)
    {
      HlTable *table = pass == 1 ? hl_table_new (_("Heat exchange"), N_X, n_rows) : NULL;
      if (table != NULL)
        head_exchangers (table, units);
      for (guint k = 0; k < components->len; k++)
        {
          guint component = g_array_index (components, guint, k);
          g_autoptr (HlHeatCurve) curve = hl_heat_curve_new (solution, (int) component);
          if (curve == NULL || curve->zones->len == 0)
            continue;
          if (table != NULL)
            row = put_exchanger (table, row, solution, component, curve, units);
          else
            n_rows += curve->zones->len > 1 ? curve->zones->len + 1 : 1;
        }
      if (table != NULL)
        return table;
    }
}
