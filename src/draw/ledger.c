/* The ledger's columns: one row a column, read by window, CSV and text.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/ledger.h"
#include "plant/i18n.h"
#include <math.h>
#include <string.h>

typedef struct {
  const HlSolution *solution;
  const HlPlant    *plant;
  const HlStream   *stream;
  HlStreamResult    result;
} Row;

static char *
text_id (const Row *row)
{
  return g_strdup (row->stream->id);
}

/* "T1 extraction 2" */
static char *
port_text (const HlPlant *plant, const char *id, const char *port)
{
  const HlComponent *component = hl_plant_find_component (plant, id);
  g_autofree char *name = NULL;
  guint n;
  if (component == NULL || !hl_component_find_port (component, port, &n))
    return g_strdup (id);
  name = hl_component_port_name (component, n);
  return g_strdup_printf ("%s %s", id, name);
}

static char *
text_from (const Row *row)
{
  return port_text (row->plant, row->stream->from_id, row->stream->from_port);
}

static char *
text_to (const Row *row)
{
  return port_text (row->plant, row->stream->to_id, row->stream->to_port);
}

static char *
text_medium (const Row *row)
{
  const HlFluid *fluid = hl_fluid_lookup (row->stream->medium);
  return g_strdup (fluid != NULL ? _(hl_fluid_name (fluid)) : row->stream->medium);
}

/* The fluid's own words have no translations of theirs; these lines offer them to the translators. */
G_GNUC_UNUSED static const char *const words_of_fluids[] = { N_("Water and steam"), N_("liquid"), N_("vapour"), N_("supercritical"),
                                                                  N_("gas"), N_("Air"), N_("Flue gas"), N_("Gas mixture"),
                                                                  N_("Mineral oil"), N_("Engine oil, unused"), N_("Diphenyl and diphenyl oxide, eutectic"),
                                                                  N_("Ethylene glycol brine, 30 %"), N_("Propylene glycol brine, 40 %"),
                                                                  N_("Calcium chloride brine, 20 %") };

static char *
text_phase (const Row *row)
{
  const HlState *state = &row->result.state;
  if (!row->result.has_state)
    return g_strdup ("");
  /* A quality is known on the saturation line and between. */
  if (!isfinite (state->x))
    return g_strdup (_(hl_phase_name (state->phase)));
  if (row->result.fluid != NULL && !hl_fluid_has_dome (row->result.fluid))
    return g_strdup (_("gas with condensate"));
  if (state->x < 1e-6)
    return g_strdup (_("saturated liquid"));
  return g_strdup (state->x > 1.0 - 1e-6 ? _("saturated vapour") : _("wet steam"));
}

/* "given p, T; assumed m": which of the stream's values somebody has set; the rest follows from the solution. */
static char *
text_origin (const Row *row)
{
  static const char *const keys[] = { "m", "p", "T", "h", "s", "x", "v" };
  static const HlOrigin order[] = { HL_ORIGIN_GIVEN, HL_ORIGIN_ASSUMED, HL_ORIGIN_TIED };
  GString *text = g_string_new (NULL);
  for (guint i = 0; i < G_N_ELEMENTS (order); i++)
    {
      guint n = 0;
      for (guint k = 0; k < G_N_ELEMENTS (keys); k++)
        {
          HlAddress where;
          const HlValue *value = hl_plant_state_value (row->plant, row->stream, keys[k], &where);
          if (value == NULL || value->origin != order[i])
            continue;
          if (n == 0)
            g_string_append_printf (text, "%s%s ", text->len > 0 ? "; " : "", hl_origin_name (order[i]));
          g_string_append_printf (text, "%s%s", n > 0 ? ", " : "", keys[k]);
          n++;
        }
    }
  if (text->len == 0 && (row->result.has_state || row->result.has_flow))
    g_string_append (text, hl_origin_name (HL_ORIGIN_FOUND));
  return g_string_free (text, FALSE);
}

static double
of_state (const Row *row, double value)
{
  return row->result.has_state ? value : NAN;
}

static double value_m (const Row *row) { return row->result.has_flow ? row->result.m : NAN; }
static double value_p (const Row *row) { return of_state (row, row->result.state.p); }
static double value_T (const Row *row) { return of_state (row, row->result.state.T); }
static double value_x (const Row *row) { return of_state (row, row->result.state.x); }
static double value_h (const Row *row) { return of_state (row, row->result.state.h); }
static double value_s (const Row *row) { return of_state (row, row->result.state.s); }
static double value_v (const Row *row) { return of_state (row, row->result.state.v); }
static double value_e (const Row *row) { return row->result.e; }
static double value_volume_flow (const Row *row) { return value_m (row) * value_v (row); }

typedef struct {
  HlLedgerColumn column;
  char        *(*text)  (const Row *row);     /* of a text column */
  double       (*value) (const Row *row);     /* of a numeric one [SI], NaN unknown */
} Column;

#define TEXT(key, name, function)              { { key, name, HL_DIMENSION_COUNT, TRUE }, function, NULL }
#define NUMBER(key, name, dimension, function) { { key, name, HL_DIMENSION_##dimension, FALSE }, NULL, function }

static const Column columns[] = {
  TEXT ("id", N_("Stream"), text_id),
  TEXT ("from", N_("From"), text_from),
  TEXT ("to", N_("To"), text_to),
  TEXT ("medium", N_("Medium"), text_medium),
  TEXT ("phase", N_("Phase"), text_phase),
  NUMBER ("m", N_("Flow"), MASS_FLOW, value_m),
  NUMBER ("p", N_("Pressure"), PRESSURE, value_p),
  NUMBER ("T", N_("Temperature"), TEMPERATURE, value_T),
  NUMBER ("x", N_("Quality"), RATIO, value_x),
  NUMBER ("h", N_("Enthalpy"), ENTHALPY, value_h),
  NUMBER ("s", N_("Entropy"), ENTROPY, value_s),
  NUMBER ("e", N_("Exergy"), ENTHALPY, value_e),
  NUMBER ("v", N_("Specific volume"), VOLUME, value_v),
  NUMBER ("volume_flow", N_("Volume flow"), VOLUME_FLOW, value_volume_flow),
  TEXT ("origin", N_("Origin"), text_origin),
};

guint
hl_ledger_n_columns (void)
{
  return G_N_ELEMENTS (columns);
}

const HlLedgerColumn *
hl_ledger_column (guint n)
{
  g_return_val_if_fail (n < G_N_ELEMENTS (columns), NULL);
  return &columns[n].column;
}

char *
hl_ledger_heading (guint column, HlUnitSet units)
{
  const char *unit;
  g_return_val_if_fail (column < G_N_ELEMENTS (columns), NULL);
  unit = columns[column].column.is_text ? "" : hl_units_label (columns[column].column.dimension, units);
  return unit[0] != '\0' ? g_strdup_printf ("%s [%s]", _(columns[column].column.name), unit) : g_strdup (_(columns[column].column.name));
}

char *
hl_ledger_cell (const HlSolution *solution, guint stream, guint column, HlUnitSet units, double *value)
{
  Row row = { .solution = solution };
  double number;
  g_return_val_if_fail (solution != NULL && column < G_N_ELEMENTS (columns), NULL);
  row.plant = hl_solution_plant (solution);
  g_return_val_if_fail (stream < hl_plant_n_streams (row.plant), NULL);
  row.stream = hl_plant_stream (row.plant, stream);
  hl_solution_stream (solution, stream, &row.result);
  if (columns[column].column.is_text)
    {
      if (value != NULL)
        *value = NAN;
      return columns[column].text (&row);
    }
  number = columns[column].value (&row);
  if (value != NULL)
    *value = number;
  return isfinite (number) ? hl_units_format_number (number, columns[column].column.dimension, units) : g_strdup ("");
}
