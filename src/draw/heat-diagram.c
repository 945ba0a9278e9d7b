/* Lays out the heat diagram: axes, curves, differences, texts that collide with nothing.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/heat-diagram-private.h"
#include "draw/text.h"
#include "plant/i18n.h"
#include <math.h>
#include <string.h>

#define LINE 1.04     /* height of a text's box over its size */

static void
clear_text (gpointer text)
{
  g_free (((HlHeatText *) text)->text);
}

static void
text_size (const char *text, double size, gboolean is_bold, double *width, double *height)
{
  /* Window and paper have different families; the picture is laid out once for all. */
  double light = hl_text_width (hl_theme (HL_THEME_LIGHT), text, size, is_bold), paper = hl_text_width (hl_theme (HL_THEME_PAPER), text, size, is_bold);
  *width = MAX (light, paper);
  *height = LINE * size;
}

/* --- words above the plot --- */

static gboolean
own_value (const HlSolution *solution, const HlComponent *component, const char *key, double *value)
{
  HlAddress address = hl_address_component (component->id, g_intern_string (key));
  return hl_solution_value (solution, &address, value) && isfinite (*value);
}

static char *
title_of (const HlSolution *solution, int component)
{
  const HlComponent *c;
  if (component == HL_HEAT_ALL)
    return g_strdup (_("All exchangers"));
  c = hl_plant_component (hl_solution_plant (solution), (guint) component);
  return g_strdup_printf ("%s · %s", c->id, c->name != NULL && c->name[0] != '\0' ? c->name : _(c->kind->name));
}

static char *
remark_of (const HlSolution *solution, int component, const HlHeatCurve *curve, HlUnitSet units)
{
  static const struct { const char *key, *format; HlDimension dimension; } values[] = {
    { "log_mean_difference", N_("log mean difference %s"), HL_DIMENSION_TEMPERATURE_DIFFERENCE },
    { "UA", N_("UA %s"), HL_DIMENSION_CONDUCTANCE },
  };
  GString *text;
  if (curve == NULL)
    return g_strdup ("");
  {
    g_autofree char *duty = hl_units_format (curve->duty, HL_DIMENSION_POWER, units);
    text = g_string_new (duty);
  }
  for (guint i = 0; component != HL_HEAT_ALL && i < G_N_ELEMENTS (values); i++)
    {
      double value;
      if (!own_value (solution, hl_plant_component (hl_solution_plant (solution), (guint) component), values[i].key, &value))
        continue;
      g_autofree char *number = hl_units_format (value, values[i].dimension, units);
      g_string_append (text, " · ");
      g_string_append_printf (text, _(values[i].format), number);
    }
  if (curve->hot->len == 0)
    g_string_append_printf (text, " · %s", _("the side that gives the heat is not modelled"));
  else if (curve->cold->len == 0)
    g_string_append_printf (text, " · %s", _("the side that takes the heat is not modelled"));
  return g_string_free (text, FALSE);
}

/* --- axes --- */

static void
take_side (const GArray *side, double *low, double *high)
{
  for (guint i = 0; i < side->len; i++)
    {
      *low = MIN (*low, g_array_index (side, HlHeatPoint, i).T);
      *high = MAX (*high, g_array_index (side, HlHeatPoint, i).T);
    }
}

static void
set_axes (HlHeatDiagram *diagram, HlUnitSet units)
{
  double size = diagram->text_size, left = hl_plot_axis_room_left (size), below = hl_plot_axis_room_below (size), above = 4.4 * size, right = 2.6 * size;
  double low = G_MAXDOUBLE, high = -G_MAXDOUBLE, range, room;
  diagram->frame = (HlBox) { left, above, MAX (diagram->width - left - right, 20.0), MAX (diagram->height - above - below, 20.0) };
  take_side (diagram->curve->hot, &low, &high);
  take_side (diagram->curve->cold, &low, &high);
  range = MAX (high - low, 1.0);
  /* Room for a line of zone names below the curves, and for temperatures on both sides. */
  room = MIN (2.6 * size / diagram->frame.height, 0.2) * range;
  hl_plot_axis_set (&diagram->heat_axis, HL_DIMENSION_POWER, units, 0.0, diagram->curve->duty,
                    diagram->frame.x, diagram->frame.x + diagram->frame.width, MAX (5.2 * size, diagram->frame.width / 10.0));
  hl_plot_axis_set (&diagram->T_axis, HL_DIMENSION_TEMPERATURE, units, low - 1.3 * room, high + room,
                    diagram->frame.y + diagram->frame.height, diagram->frame.y, MAX (2.5 * size, diagram->frame.height / 12.0));
}

static HlPoint
pixel (const HlHeatDiagram *diagram, double heat, double T)
{
  return (HlPoint) { hl_plot_axis_to_pixel (&diagram->heat_axis, heat), hl_plot_axis_to_pixel (&diagram->T_axis, T) };
}

/* --- curves and differences --- */

static HlPlotColour
colour_of (HlLook look)
{
  switch (look)
    {
    case HL_LOOK_STEAM:
      return HL_PLOT_STEAM;
    case HL_LOOK_WET:
      return HL_PLOT_WET;
    case HL_LOOK_COOLING:
      return HL_PLOT_COOLING;
    case HL_LOOK_GAS:
      return HL_PLOT_GAS;
    default:
      return HL_PLOT_WATER;
    }
}

/* The hot side bold, the cold side finer: a cue beside the colour. */
static void
add_curve (HlHeatDiagram *diagram, const GArray *side, double width)
{
  HlPlotSeries *series = NULL;
  for (guint i = 1; i < side->len; i++)
    {
      const HlHeatPoint *a = &g_array_index (side, HlHeatPoint, i - 1), *b = &g_array_index (side, HlHeatPoint, i);
      if (series == NULL || colour_of (b->look) != series->colour)
        {
          series = hl_plot_series_new (colour_of (b->look), b->look == HL_LOOK_GAS ? HL_PLOT_DASHED : HL_PLOT_SOLID, width);
          hl_plot_layer_add (diagram->curves, series);
          hl_plot_series_add (series, a->heat, a->T);
        }
      hl_plot_series_add (series, b->heat, b->T);
    }
}

static void
add_gap (HlHeatDiagram *diagram, double heat, gboolean is_pinch)
{
  double hot = hl_heat_curve_at (diagram->curve->hot, heat), cold = hl_heat_curve_at (diagram->curve->cold, heat);
  HlHeatGap gap = { pixel (diagram, heat, hot), pixel (diagram, heat, cold), is_pinch };
  if (!isfinite (hot) || !isfinite (cold))
    return;
  for (guint i = 0; i < diagram->gaps->len; i++)
    if (fabs (g_array_index (diagram->gaps, HlHeatGap, i).hot.x - gap.hot.x) < 3.0)
      return;
  g_array_append_val (diagram->gaps, gap);
}

/* The pinch, both ends, and every border between zones. */
static void
add_gaps (HlHeatDiagram *diagram)
{
  const HlHeatCurve *curve = diagram->curve;
  if (!curve->has_pinch)
    return;
  add_gap (diagram, curve->pinch_heat, TRUE);
  add_gap (diagram, 0.0, FALSE);
  add_gap (diagram, curve->duty, FALSE);
  for (guint i = 0; i < curve->borders->len; i++)
    add_gap (diagram, g_array_index (curve->borders, double, i), FALSE);
}

/* --- texts --- */

static void
add_text (HlHeatDiagram *diagram, HlHeatTextKind kind, const char *text, double size, const HlBox *box)
{
  HlHeatText item = { kind, g_strdup (text), *box, size };
  g_array_append_val (diagram->texts, item);
}

static void
place_text (HlHeatDiagram *diagram, HlPlotLabels *labels, HlHeatTextKind kind, const char *text, HlPoint anchor, HlPoint towards, double clearance)
{
  double size = (kind == HL_HEAT_TEXT_PINCH ? 1.1 : 1.0) * diagram->text_size;
  HlPlotLabelWish wish = { .anchor = anchor, .clearance = clearance, .reach = 46.0, .towards = towards };
  HlPlotLabelPlace place = { .is_placed = FALSE };
  text_size (text, size, kind == HL_HEAT_TEXT_PINCH, &wish.width, &wish.height);
  if (hl_plot_labels_place (labels, &wish, -1, &place))
    add_text (diagram, kind, text, size, &place.box);
}

static void
add_difference (HlHeatDiagram *diagram, HlPlotLabels *labels, const HlHeatGap *gap, HlUnitSet units)
{
  double T_hot = hl_plot_axis_from_pixel (&diagram->T_axis, gap->hot.y), T_cold = hl_plot_axis_from_pixel (&diagram->T_axis, gap->cold.y);
  g_autofree char *number = hl_units_format (T_hot - T_cold, HL_DIMENSION_TEMPERATURE_DIFFERENCE, units);
  g_autofree char *text = g_strdup_printf (gap->is_pinch ? _("pinch %s") : "%s", number);
  HlPoint anchor = { gap->hot.x, (gap->hot.y + gap->cold.y) / 2.0 };
  gboolean is_left = gap->hot.x > diagram->frame.x + diagram->frame.width / 2.0;
  HlPoint towards = { is_left ? -1.0 : 1.0, 0.0 };
  /* Between curves that run close there is no room for words. */
  if (fabs (gap->cold.y - gap->hot.y) < 1.8 * diagram->text_size)
    {
      anchor = gap->cold;
      towards = (HlPoint) { is_left ? -0.5 : 0.5, 0.85 };
    }
  place_text (diagram, labels, gap->is_pinch ? HL_HEAT_TEXT_PINCH : HL_HEAT_TEXT_DIFFERENCE, text, anchor, towards, 5.0);
}

static void
add_end (HlHeatDiagram *diagram, HlPlotLabels *labels, const HlHeatPoint *end, gboolean is_hot, gboolean is_right, HlUnitSet units)
{
  g_autofree char *text = hl_units_format (end->T, HL_DIMENSION_TEMPERATURE, units);
  HlPoint towards = { is_right ? -0.5 : 0.5, is_hot ? -0.85 : 0.85 };
  place_text (diagram, labels, HL_HEAT_TEXT_TEMPERATURE, text, pixel (diagram, end->heat, end->T), towards, 7.0);
}

static const char *
zone_name (HlLook look, gboolean is_hot)
{
  switch (look)
    {
    case HL_LOOK_STEAM:
      return is_hot ? _("desuperheating") : _("superheating");
    case HL_LOOK_WET:
      return is_hot ? _("condensing") : _("evaporating");
    case HL_LOOK_WATER:
      return is_hot ? _("subcooling") : _("heating water");
    default:
      return NULL;
    }
}

/* Names of the zones of a side along the foot of the picture, where they are wide enough. */
static void
add_zones (HlHeatDiagram *diagram, HlPlotLabels *labels, const GArray *side, gboolean is_hot)
{
  double size = 0.95 * diagram->text_size;
  for (guint i = 1; i < side->len;)
    {
      HlLook look = g_array_index (side, HlHeatPoint, i).look;
      double from = g_array_index (side, HlHeatPoint, i - 1).heat, width, height, room;
      const char *name = zone_name (look, is_hot);
      HlPoint a, b;
      HlBox box;
      while (i < side->len && g_array_index (side, HlHeatPoint, i).look == look)
        i++;
      if (name == NULL)
        continue;
      a = pixel (diagram, from, diagram->T_axis.low);
      b = pixel (diagram, g_array_index (side, HlHeatPoint, i - 1).heat, diagram->T_axis.low);
      text_size (name, size, FALSE, &width, &height);
      room = b.x - a.x;
      box = (HlBox) { (a.x + b.x - width) / 2.0, a.y - height - 3.0, width, height };
      if (room < width + 6.0 || !hl_plot_labels_is_free (labels, &box) || hl_plot_labels_cost (labels, &box) > 0.5)
        continue;
      {
        HlPlotLabelPlace place;
        hl_plot_labels_take (labels, &box, &place);
      }
      add_text (diagram, HL_HEAT_TEXT_ZONE, name, size, &box);
    }
}

static void
add_ink (HlHeatDiagram *diagram, HlPlotLabels *labels, const GArray *side)
{
  for (guint i = 1; i < side->len; i++)
    {
      const HlHeatPoint *a = &g_array_index (side, HlHeatPoint, i - 1), *b = &g_array_index (side, HlHeatPoint, i);
      hl_plot_labels_add_line (labels, pixel (diagram, a->heat, a->T), pixel (diagram, b->heat, b->T), 3.0);
    }
}

static void
add_ends (HlHeatDiagram *diagram, HlPlotLabels *labels, const GArray *side, gboolean is_hot, HlUnitSet units)
{
  if (side->len == 0)
    return;
  add_end (diagram, labels, &g_array_index (side, HlHeatPoint, 0), is_hot, FALSE, units);
  add_end (diagram, labels, &g_array_index (side, HlHeatPoint, side->len - 1), is_hot, TRUE, units);
}

static void
add_texts (HlHeatDiagram *diagram, HlUnitSet units)
{
  const HlHeatCurve *curve = diagram->curve;
  HlBox inside = { diagram->frame.x + 2.0, diagram->frame.y + 1.0, diagram->frame.width - 3.0, diagram->frame.height - 3.0 };
  g_autoptr (HlPlotLabels) labels = hl_plot_labels_new (&inside);
  add_ink (diagram, labels, curve->hot);
  add_ink (diagram, labels, curve->cold);
  for (guint i = 0; i < diagram->gaps->len; i++)
    {
      const HlHeatGap *gap = &g_array_index (diagram->gaps, HlHeatGap, i);
      hl_plot_labels_add_line (labels, gap->hot, gap->cold, 1.0);
    }
  for (guint i = 0; i < diagram->gaps->len; i++)
    add_difference (diagram, labels, &g_array_index (diagram->gaps, HlHeatGap, i), units);
  add_ends (diagram, labels, curve->hot, TRUE, units);
  add_ends (diagram, labels, curve->cold, FALSE, units);
  if (curve->borders->len > 0)
    {
      add_zones (diagram, labels, curve->hot, TRUE);
      add_zones (diagram, labels, curve->cold, FALSE);
    }
}

HlHeatDiagram *
hl_heat_diagram_new (const HlSolution *solution, int component, HlUnitSet units, double width, double height)
{
  HlHeatDiagram *diagram = g_new0 (HlHeatDiagram, 1);
  diagram->width = MAX (width, 60.0);
  diagram->height = MAX (height, 60.0);
  diagram->text_size = 10.5 * CLAMP (sqrt (diagram->width * diagram->height / (960.0 * 600.0)), 0.9, 1.3);
  diagram->curve = hl_heat_curve_new (solution, component);
  diagram->title = title_of (solution, component);
  diagram->remark = remark_of (solution, component, diagram->curve, units);
  diagram->curves = hl_plot_layer_new ();
  diagram->gaps = g_array_new (FALSE, FALSE, sizeof (HlHeatGap));
  diagram->texts = g_array_new (FALSE, FALSE, sizeof (HlHeatText));
  g_array_set_clear_func (diagram->texts, clear_text);
  if (diagram->curve == NULL)
    return diagram;
  set_axes (diagram, units);
  add_curve (diagram, diagram->curve->cold, 2.0);
  add_curve (diagram, diagram->curve->hot, 2.8);
  add_gaps (diagram);
  add_texts (diagram, units);
  return diagram;
}

void
hl_heat_diagram_free (HlHeatDiagram *diagram)
{
  if (diagram == NULL)
    return;
  hl_heat_curve_free (diagram->curve);
  g_free (diagram->title);
  g_free (diagram->remark);
  hl_plot_layer_free (diagram->curves);
  g_array_unref (diagram->gaps);
  g_array_unref (diagram->texts);
  g_free (diagram);
}
