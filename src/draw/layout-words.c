/* What titles and stream labels say, and how much room it takes.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/layout-private.h"
#include <math.h>
#include <string.h>
#include "draw/text.h"
#include "plant/i18n.h"

#define LONGEST_TITLE 220.0   /* pixels; longer names are cut */

/* The figures that a drawing shows beside a symbol; with their sign where a unit does not tell. */
static const struct {
  const char *kind;
  struct { const char *key, *sign; enum { PLAIN, UNITLESS, PER_CENT } form; } figures[2];    /* UNITLESS: the figure after it says the unit for both */
} figures_of_kind[] = {
  { "heat_input",    { { "heat", NULL } } },
  { "boiler",        { { "heat", NULL }, { "efficiency", "η" } } },
  { "turbine",       { { "power", NULL }, { "isentropic_efficiency", "η" } } },
  { "generator",     { { "power", NULL } } },
  { "feed_pump_turbine", { { "power", NULL }, { "isentropic_efficiency", "η" } } },
  { "gearbox",       { { "efficiency", "η" } } },
  { "control_stage", { { "power", NULL }, { "isentropic_efficiency", "η" } } },
  { "drain_pump",    { { "power", NULL } } },
  { "gland_seal",    { { "leak_fraction", "m", PER_CENT } } },
  { "condenser",     { { "heat", NULL } } },
  { "pump",          { { "power", NULL } } },
  { "pipe",          { { "pressure_loss", "Δp", PER_CENT } } },
  { "open_heater",   { { "heat", NULL } } },
  { "closed_heater", { { "terminal_difference", "TTD", UNITLESS }, { "drain_approach", "DCA" } } },
  { "steam_user",    { { "heat", NULL } } },
  { "district_heater", { { "heat", NULL } } },
  { "air_condenser", { { "heat", NULL } } },
  { "cooling_tower", { { "heat", NULL } } },
  { "compressor",    { { "power", NULL } } },
  { "motor",         { { "power", NULL } } },
  { "exchanger",     { { "heat", NULL } } },
  { "expander",      { { "power", NULL }, { "isentropic_efficiency", "η" } } },
  { "evaporator",    { { "heat", NULL } } },
  { "recuperator",   { { "heat", NULL } } },
};

/* A value from the solution, else what was typed or assumed. */
static gboolean
find_figure (const HlPlant *plant, const HlSolution *solution, const HlComponent *component, const char *key, double *value)
{
  HlAddress address = hl_address_component (component->id, key);
  const HlValue *typed;
  (void) plant;
  if (solution != NULL && hl_solution_value (solution, &address, value) && isfinite (*value))
    return TRUE;
  typed = hl_values_find (&component->values, address.key);
  if (typed == NULL || typed->origin == HL_ORIGIN_TIED)
    return FALSE;
  *value = typed->value;
  return isfinite (*value);
}

/* "14.89 MW · η 0.830", or NULL. */
static char *
figure_line (const HlPlant *plant, const HlSolution *solution, const HlComponent *component)
{
  GString *line = g_string_new (NULL);
  for (guint i = 0; i < G_N_ELEMENTS (figures_of_kind); i++)
    if (g_str_equal (figures_of_kind[i].kind, component->kind->id))
      for (guint k = 0; k < 2 && figures_of_kind[i].figures[k].key != NULL; k++)
        {
          const char *key = figures_of_kind[i].figures[k].key, *sign = figures_of_kind[i].figures[k].sign;
          const HlQuantityKind *kind = hl_component_quantity_kind (component, key);
          g_autofree char *text = NULL;
          double value;
          if (kind == NULL || !find_figure (plant, solution, component, key, &value))
            continue;
          switch (figures_of_kind[i].figures[k].form)
            {
            case UNITLESS: text = hl_units_format_number (value, kind->dimension, hl_plant_units (plant)); break;
            case PER_CENT: text = g_strdup_printf ("%.1f %%", value * 100.0); break;
            default:       text = hl_units_format (value, kind->dimension, hl_plant_units (plant)); break;
            }
          g_string_append_printf (line, "%s%s%s%s", line->len > 0 ? " · " : "", sign != NULL ? sign : "", sign != NULL ? " " : "", text);
        }
  return g_string_free (line, line->len == 0);
}

/* Cuts @text so that it fits, with an ellipsis. */
static char *
fit_text (const HlTheme *theme, char *text, double size, double room)
{
  while (hl_text_width (theme, text, size, TRUE) > room && g_utf8_strlen (text, -1) > 4)
    {
      char *last = g_utf8_find_prev_char (text, text + strlen (text));
      char *cut;
      if (g_str_has_suffix (text, "…"))
        last = g_utf8_find_prev_char (text, last);
      *last = '\0';
      g_strchomp (text);
      cut = g_strconcat (text, "…", NULL);
      g_free (text);
      text = cut;
    }
  return text;
}

static void
set_title (HlComponentPlace *place, const HlComponent *component, const HlPlant *plant, const HlSolution *solution, const HlTheme *theme)
{
  char *head = component->name != NULL && *component->name != '\0'
    ? g_strconcat (component->id, " ", component->name, NULL) : g_strdup (component->id);
  double width;
  place->title_lines[0] = fit_text (theme, head, HL_TITLE_SIZE, LONGEST_TITLE);
  place->title_lines[1] = figure_line (plant, solution, component);
  width = hl_text_width (theme, place->title_lines[0], HL_TITLE_SIZE, TRUE);
  if (place->title_lines[1] != NULL)
    width = MAX (width, hl_text_width (theme, place->title_lines[1], HL_TITLE_FIGURE_SIZE, FALSE));
  place->title.width = ceil (width);
  place->title.height = HL_TITLE_LINE * (place->title_lines[1] != NULL ? 2 : 1);
}

/* "65 bar", not "65.00 bar": a label has no room for zeros that end a decimal. */
static char *
short_pressure (double p, HlUnitSet units)
{
  g_autofree char *number = hl_units_format_number (p, HL_DIMENSION_PRESSURE, units);
  if (strchr (number, '.') != NULL)
    {
      char *end = number + strlen (number);
      while (end[-1] == '0')
        end--;
      if (end[-1] == '.')
        end--;
      *end = '\0';
    }
  return g_strdup_printf ("%s %s", number, hl_units_label (HL_DIMENSION_PRESSURE, units));
}

/* "65 bar · 485.0 °C"; inside the dome the quality says more than the temperature. */
static char *
state_line (const HlState *state, HlUnitSet units)
{
  g_autofree char *pressure = short_pressure (state->p, units);
  if (state->phase == HL_PHASE_TWO_PHASE && state->x > 1e-6 && state->x < 1.0 - 1e-6)
    {
      g_autofree char *quality = hl_units_format_number (state->x, HL_DIMENSION_RATIO, units);
      return g_strdup_printf ("%s · x %s", pressure, quality);
    }
  g_autofree char *temperature = hl_units_format (state->T, HL_DIMENSION_TEMPERATURE, units);
  return g_strdup_printf ("%s · %s", pressure, temperature);
}

static void
set_label (HlStreamPlace *place, const HlStreamResult *result, HlUnitSet units, const HlTheme *theme)
{
  double width = 0.0;
  if (result->has_flow)
    place->label_lines[0] = hl_units_format (result->m, HL_DIMENSION_MASS_FLOW, units);
  if (result->has_state)
    place->label_lines[1] = state_line (&result->state, units);
  if (place->label_lines[0] != NULL)
    width = hl_text_width (theme, place->label_lines[0], HL_LABEL_FLOW_SIZE, TRUE);
  if (place->label_lines[1] != NULL)
    width = MAX (width, hl_text_width (theme, place->label_lines[1], HL_LABEL_STATE_SIZE, FALSE));
  place->label.height = HL_LABEL_HEIGHT;
  /* Whole pixels, and a little to spare, so that a changing last digit does not move the label. */
  place->label.width = width > 0.0 ? ceil ((HL_LABEL_TEXT_LEFT + width + HL_LABEL_TEXT_RIGHT) / 4.0) * 4.0 : HL_LABEL_HEIGHT;
}

/* The solution may belong to a plant of a moment ago: streams are matched by id. */
static gboolean
find_result (const HlLayout *layout, const HlSolution *solution, guint stream, HlStreamResult *result)
{
  const HlPlant *solved = solution != NULL ? hl_solution_plant (solution) : NULL;
  int n = solved == layout->plant ? (int) stream : -1;
  if (solved == NULL)
    return FALSE;
  if (n < 0)
    n = hl_plant_stream_index (solved, hl_plant_stream (layout->plant, stream)->id);
  if (n < 0)
    return FALSE;
  hl_solution_stream (solution, (guint) n, result);
  return TRUE;
}

void
hl_layout_set_words (HlLayout *layout, const HlSolution *solution, const HlTheme *theme)
{
  for (guint i = 0; i < layout->n_components; i++)
    set_title (&layout->components[i], hl_plant_component (layout->plant, i), layout->plant, solution, theme);
  for (guint i = 0; i < layout->n_streams && solution != NULL; i++)
    {
      HlStreamResult result = { 0 };
      find_result (layout, solution, i, &result);
      set_label (&layout->streams[i], &result, hl_plant_units (layout->plant), theme);
    }
}

/* Cooling water goes on through these as what it is. */
static gboolean
passes_cooling_on (const HlKind *kind)
{
  static const char *const ids[] = { "pump", "drain_pump", "pipe", "valve", "splitter", "mixer", NULL };
  return g_strv_contains (ids, kind->id);
}

static gboolean
is_cooling_end (const HlPlant *plant, const char *component_id, const char *port, const gboolean *is_cooling_component)
{
  int n = hl_plant_component_index (plant, component_id);
  if (n < 0)
    return FALSE;
  return is_cooling_component[n] || g_str_has_prefix (port, "cooling_");
}

static void
spread_cooling (const HlLayout *layout, gboolean *is_cooling_component, gboolean *is_cooling_stream)
{
  for (gboolean is_changed = TRUE; is_changed;)
    {
      is_changed = FALSE;
      for (guint i = 0; i < layout->n_streams; i++)
        {
          const HlStream *stream = hl_plant_stream (layout->plant, i);
          const char *const ends[2] = { stream->from_id, stream->to_id };
          if (is_cooling_stream[i]
              || !(is_cooling_end (layout->plant, stream->from_id, stream->from_port, is_cooling_component)
                   || is_cooling_end (layout->plant, stream->to_id, stream->to_port, is_cooling_component)))
            continue;
          is_cooling_stream[i] = is_changed = TRUE;
          for (guint k = 0; k < 2; k++)
            {
              int n = hl_plant_component_index (layout->plant, ends[k]);
              if (n >= 0 && passes_cooling_on (hl_plant_component (layout->plant, n)->kind))
                is_cooling_component[n] = TRUE;
            }
        }
    }
}

void
hl_layout_set_looks (HlLayout *layout, const HlSolution *solution)
{
  g_autofree gboolean *is_cooling_component = g_new0 (gboolean, layout->n_components + 1);
  g_autofree gboolean *is_cooling_stream = g_new0 (gboolean, layout->n_streams + 1);
  spread_cooling (layout, is_cooling_component, is_cooling_stream);
  for (guint i = 0; i < layout->n_streams; i++)
    {
      HlStreamResult result = { 0 };
      find_result (layout, solution, i, &result);
      layout->streams[i].look = hl_stream_look (&result);
      if (is_cooling_stream[i] && (layout->streams[i].look == HL_LOOK_WATER || layout->streams[i].look == HL_LOOK_UNKNOWN))
        layout->streams[i].look = HL_LOOK_COOLING;
    }
}
