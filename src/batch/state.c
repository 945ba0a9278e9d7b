/* heatloom-batch state: one state of a medium, or a table of them.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include <errno.h>
#include <math.h>
#include <stdio.h>
#include <string.h>
#include "batch/command.h"
#include "batch/json-text.h"
#include "batch/state-pair.h"
#include "batch/state-table.h"
#include "draw/export.h"
#include "plant/i18n.h"
#include "plant/units.h"

/* What may be typed: 'p=80 bar'. */
static const struct { const char *sign; HlStateKey key; HlDimension dimension; } inputs[] = {
  { "p", HL_STATE_P, HL_DIMENSION_PRESSURE },
  { "T", HL_STATE_T, HL_DIMENSION_TEMPERATURE },
  { "h", HL_STATE_H, HL_DIMENSION_ENTHALPY },
  { "s", HL_STATE_S, HL_DIMENSION_ENTROPY },
  { "x", HL_STATE_X, HL_DIMENSION_RATIO },
};

static gboolean
read_input (const char *text, HlStateKey *key, double *value, GError **error)
{
  const char *equals = strchr (text, '=');
  g_autofree char *sign = equals != NULL ? g_strstrip (g_strndup (text, (gsize) (equals - text))) : g_strdup ("");
  for (guint i = 0; i < G_N_ELEMENTS (inputs); i++)
    if (strcmp (sign, inputs[i].sign) == 0)
      {
        *key = inputs[i].key;
        if (hl_units_parse (equals + 1, inputs[i].dimension, HL_UNITS_METRIC, hl_site_pressure (0.0), value, error))
          return TRUE;
        g_prefix_error (error, "%s: ", text);
        return FALSE;
      }
  g_set_error (error, HL_BATCH_ERROR, HL_BATCH_ERROR_USAGE,
               _("“%s” names none of p, T, h, s, x; write for instance 'p=80 bar' 'T=480 °C'"), text);
  return FALSE;
}

static gboolean
read_state (const HlFluid *fluid, const char *first, const char *second, HlState *state, GError **error)
{
  HlStateKey keys[2];
  double values[2];
  g_autofree char *message = NULL;
  if (!read_input (first, &keys[0], &values[0], error) || !read_input (second, &keys[1], &values[1], error))
    return FALSE;
  if (keys[0] == keys[1])
    g_set_error (error, HL_BATCH_ERROR, HL_BATCH_ERROR_USAGE, _("“%s” and “%s” are the same quantity; a state needs two different ones"),
                 first, second);
  else if (!hl_state_from_pair (fluid, keys[0], values[0], keys[1], values[1], state, &message))
    g_set_error (error, HL_BATCH_ERROR, HL_BATCH_ERROR_USAGE, "%s, %s: %s", first, second, message);
  else
    return TRUE;
  return FALSE;
}

static char *
state_json (const HlFluid *fluid, const HlState *state)
{
  HlJsonText *json = hl_json_text_new ();
  hl_json_text_begin (json, NULL, '{', FALSE);
  hl_json_text_string (json, "fluid", hl_fluid_id (fluid));
  hl_json_text_string (json, "formulation", hl_fluid_formulation (fluid));
  hl_json_text_string (json, "phase", hl_phase_name (state->phase));
  const struct { const char *name; double value; } members[] = {
    { "p_Pa", state->p }, { "T_K", state->T }, { "h_J_kg", state->h }, { "s_J_kgK", state->s }, { "x", state->x },
    { "rho_kg_m3", 1.0 / state->v }, { "v_m3_kg", state->v }, { "u_J_kg", state->u },
    { "cp_J_kgK", state->cp }, { "cv_J_kgK", state->cv }, { "w_m_s", state->w },
  };
  for (guint i = 0; i < G_N_ELEMENTS (members); i++)
    hl_json_text_number (json, members[i].name, members[i].value);
  hl_json_text_end (json);
  return hl_json_text_finish (json);
}

static void
print_row (const char *name, const char *text)
{
  printf ("  %s%*s%s\n", name, (int) MAX (1, 26 - g_utf8_strlen (name, -1)), "", text);
}

static void
print_quantity (const char *name, double value, HlDimension dimension)
{
  if (!isfinite (value))
    return;
  g_autofree char *text = hl_units_format (value, dimension, HL_UNITS_METRIC);
  print_row (name, text);
}

static void
print_state (const HlFluid *fluid, const HlState *state)
{
  printf ("%s (%s)\n", _(hl_fluid_name (fluid)), hl_fluid_formulation (fluid));
  print_row (_("Phase"), _(hl_phase_name (state->phase)));
  print_quantity (_("Pressure"), state->p, HL_DIMENSION_PRESSURE);
  print_quantity (_("Temperature"), state->T, HL_DIMENSION_TEMPERATURE);
  print_quantity (_("Vapour fraction"), state->x, HL_DIMENSION_RATIO);
  print_quantity (_("Specific enthalpy"), state->h, HL_DIMENSION_ENTHALPY);
  print_quantity (_("Specific entropy"), state->s, HL_DIMENSION_ENTROPY);
  print_quantity (_("Specific volume"), state->v, HL_DIMENSION_VOLUME);
  g_autofree char *density = g_strdup_printf ("%.6g kg/m³", 1.0 / state->v);
  print_row (_("Density"), density);
  print_quantity (_("Internal energy"), state->u, HL_DIMENSION_ENTHALPY);
  print_quantity (_("Heat capacity cp"), state->cp, HL_DIMENSION_ENTROPY);
  print_quantity (_("Heat capacity cv"), state->cv, HL_DIMENSION_ENTROPY);
  if (isfinite (state->w))
    {
      g_autofree char *speed = g_strdup_printf ("%.1f m/s", state->w);
      print_row (_("Speed of sound"), speed);
    }
}

static HlExit
run_table (const HlFluid *fluid, const char *path)
{
  FILE *in = strcmp (path, "-") == 0 ? stdin : fopen (path, "r");
  if (in == NULL)
    {
      GError *error = g_error_new (HL_BATCH_ERROR, HL_BATCH_ERROR_CONTENT, _("%s cannot be read: %s"), path, g_strerror (errno));
      return hl_complain (HL_EXIT_FILE, error);
    }
  g_autoptr(GError) error = NULL;
  gulong n_rows, n_failed;
  gboolean is_done = hl_state_table (fluid, in, stdout, &n_rows, &n_failed, &error);
  if (in != stdin)
    fclose (in);
  if (!is_done)
    {
      g_prefix_error (&error, "%s: ", path);
      return hl_complain (HL_EXIT_FILE, g_steal_pointer (&error));
    }
  if (n_failed > 0)
    fprintf (stderr, ngettext_hl ("heatloom-batch: %lu of %lu rows has no state; its out_error says why\n",
                                  "heatloom-batch: %lu of %lu rows have no state; their out_error says why\n", n_failed),
             n_failed, n_rows);
  return HL_EXIT_DONE;
}

static HlExit
run_state (const HlArguments *arguments)
{
  g_autoptr(GError) error = NULL;
  const char *id = hl_arguments_word (arguments, 0), *table = hl_arguments_value (arguments, "table");
  const char *json_path = hl_arguments_value (arguments, "json");
  g_autoptr(GError) why = NULL;
  const HlFluid *fluid = hl_fluid_find (id, &why);
  if (fluid == NULL && g_error_matches (why, HL_FLUID_ERROR, HL_FLUID_ERROR_GAS))
    g_set_error_literal (&error, HL_BATCH_ERROR, HL_BATCH_ERROR_USAGE, why->message);
  else if (fluid == NULL)
    g_set_error (&error, HL_BATCH_ERROR, HL_BATCH_ERROR_USAGE, _("there is no medium “%s”; heatloom-batch fluids lists them"), id);
  else if (table != NULL && (json_path != NULL || hl_arguments_n_words (arguments) > 1))
    g_set_error (&error, HL_BATCH_ERROR, HL_BATCH_ERROR_USAGE, _("--table takes its states from the table; leave the others out"));
  else if (table == NULL && hl_arguments_n_words (arguments) != 3)
    g_set_error (&error, HL_BATCH_ERROR, HL_BATCH_ERROR_USAGE,
                 _("a state needs two quantities, for instance 'p=80 bar' 'T=480 °C', or --table FILE"));
  if (error != NULL)
    return hl_complain (HL_EXIT_USAGE, g_steal_pointer (&error));
  if (table != NULL)
    return run_table (fluid, table);

  HlState state;
  if (!read_state (fluid, hl_arguments_word (arguments, 1), hl_arguments_word (arguments, 2), &state, &error))
    return hl_complain (HL_EXIT_USAGE, g_steal_pointer (&error));
  if (json_path == NULL)
    {
      print_state (fluid, &state);
      return HL_EXIT_DONE;
    }
  g_autofree char *json = state_json (fluid, &state);
  if (!hl_export_text_file (json, json_path, &error))
    return hl_complain (HL_EXIT_FILE, g_steal_pointer (&error));
  return HL_EXIT_DONE;
}

static const HlBatchOption options[] = {
  { "json", N_("FILE"), FALSE, N_("write the state as JSON, in SI") },
  { "table", N_("FILE"), FALSE, N_("read a CSV of states, write it with every property to standard output") },
};

const HlBatchCommand hl_command_state = {
  .name = "state",
  .usage = N_("MEDIUM QUANTITY=VALUE QUANTITY=VALUE | MEDIUM --table FILE"),
  .summary = N_("the state of a medium from two quantities, or a table of states"),
  .details = N_(
    "The medium is water, or another one that heatloom-batch fluids lists. The quantities are two of p, T, h, s, x,\n"
    "with units: 'p=80 bar' 'T=480 °C'. A bare number is in bar, °C, kJ/kg, kJ/(kg K).\n\n"
    "The header of a table names two of p_Pa T_K h_J_kg s_J_kgK rho_kg_m3 x. Other columns are copied, lines\n"
    "that begin with # are left out. Every row gets out_phase out_p_Pa out_T_K out_rho_kg_m3 out_x out_h_J_kg\n"
    "out_s_J_kgK out_cp_J_kgK out_w_m_s in full precision; a row without a state gets them empty, and out_error\n"
    "says why.\n"),
  .least = 1, .most = 3,
  .options = options, .n_options = G_N_ELEMENTS (options),
  .run = run_state,
};
