/* The JSON of a solution: the contract with scripts, SI with the unit in each key.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "batch/solve-output.h"

#include <math.h>
#include "batch/json-text.h"
#include "draw/tables.h"
#include "engine/heat-curve.h"

static void
write_quantity (HlJsonText *json, const char *key, HlDimension dimension, double value)
{
  g_autofree char *name = g_strconcat (key, hl_dimension_json_suffix (dimension), NULL);
  hl_json_text_number (json, name, value);
}

static void
write_plant (HlJsonText *json, const HlSolution *solution)
{
  hl_json_text_begin (json, "plant", '{', FALSE);
  for (guint i = 0; i < hl_solution_n_results (solution); i++)
    {
      double value;
      const HlQuantityKind *kind = hl_solution_result (solution, i, &value);
      write_quantity (json, kind->key, kind->dimension, value);
    }
  hl_json_text_end (json);
}

static void
write_streams (HlJsonText *json, const HlSolution *solution)
{
  const HlPlant *plant = hl_solution_plant (solution);
  hl_json_text_begin (json, "streams", '{', FALSE);
  for (guint i = 0; i < hl_plant_n_streams (plant); i++)
    {
      HlStreamResult result;
      hl_solution_stream (solution, i, &result);
      const HlState *state = result.has_state ? &result.state : NULL;
      hl_json_text_begin (json, hl_plant_stream (plant, i)->id, '{', TRUE);
      hl_json_text_number (json, "m_kg_s", result.has_flow ? result.m : NAN);
      hl_json_text_number (json, "p_Pa", state != NULL ? state->p : NAN);
      hl_json_text_number (json, "T_K", state != NULL ? state->T : NAN);
      hl_json_text_number (json, "h_J_kg", state != NULL ? state->h : NAN);
      hl_json_text_number (json, "s_J_kgK", state != NULL ? state->s : NAN);
      hl_json_text_number (json, "e_J_kg", result.e);
      hl_json_text_number (json, "x", state != NULL ? state->x : NAN);
      hl_json_text_end (json);
    }
  hl_json_text_end (json);
}

static void
write_components (HlJsonText *json, const HlSolution *solution)
{
  const HlPlant *plant = hl_solution_plant (solution);
  hl_json_text_begin (json, "components", '{', FALSE);
  for (guint i = 0; i < hl_plant_n_components (plant); i++)
    {
      const HlComponent *component = hl_plant_component (plant, i);
      hl_json_text_begin (json, component->id, '{', FALSE);
      for (guint k = 0; k < hl_component_n_quantities (component); k++)
        {
          HlQuantity quantity = hl_component_quantity (component, k);
          HlAddress address = hl_address_component (component->id, quantity.key);
          double value;
          /* A quantity that does not exist in this plant, an efficiency nobody asked for, is left out. */
          if (hl_solution_value (solution, &address, &value) && isfinite (value))
            write_quantity (json, quantity.key, quantity.kind->dimension, value);
        }
      hl_json_text_end (json);
    }
  hl_json_text_end (json);
}

/* What comes in, what is made, lost and destroyed, by words that stay the same. */
static void
write_exergy (HlJsonText *json, const HlSolution *solution)
{
  static const char *const words[] = {
    [HL_EXERGY_FUEL] = "fuel", [HL_EXERGY_HEAT] = "heat", [HL_EXERGY_STREAM_IN] = "stream_in", [HL_EXERGY_COLD] = "cold",
    [HL_EXERGY_ELECTRICITY] = "electricity", [HL_EXERGY_DESTRUCTION] = "destruction", [HL_EXERGY_LOSS] = "loss",
    [HL_EXERGY_STREAM_OUT] = "stream_out", [HL_EXERGY_OTHER] = "other", [HL_EXERGY_DELIVERED] = "delivered", [HL_EXERGY_NET] = "net",
  };
  hl_json_text_begin (json, "exergy", '[', FALSE);
  for (guint i = 0; i < hl_solution_n_exergy_flows (solution); i++)
    {
      const HlExergyFlow *flow = hl_solution_exergy_flow (solution, i);
      hl_json_text_begin (json, NULL, '{', TRUE);
      hl_json_text_string (json, "what", words[flow->kind]);
      hl_json_text_string (json, "at", flow->component >= 0 ? hl_plant_component (hl_solution_plant (solution), (guint) flow->component)->id : "plant");
      hl_json_text_number (json, "power_W", flow->power);
      hl_json_text_end (json);
    }
  hl_json_text_end (json);
}

static void
write_performance (HlJsonText *json, const HlSolution *solution)
{
  g_autoptr (HlSummary) summary = hl_summary_new (solution);
  hl_json_text_begin (json, "performance", '{', FALSE);
  for (guint n = 0; n < hl_summary_n_lines (summary); n++)
    {
      const HlSummaryLine *line = hl_summary_line (summary, n);
      write_quantity (json, line->key, line->dimension, line->value);
    }
  hl_json_text_end (json);
}

static void
write_curve (HlJsonText *json, const char *name, const GArray *side)
{
  hl_json_text_begin (json, name, '[', TRUE);
  for (guint i = 0; i < side->len; i++)
    {
      const HlHeatPoint *point = &g_array_index (side, HlHeatPoint, i);
      hl_json_text_begin (json, NULL, '[', TRUE);
      hl_json_text_number (json, NULL, point->heat);
      hl_json_text_number (json, NULL, point->T);
      hl_json_text_end (json);
    }
  hl_json_text_end (json);
}

static void
write_zones (HlJsonText *json, const GArray *zones)
{
  hl_json_text_begin (json, "zones", '[', FALSE);
  for (guint k = 0; k < zones->len; k++)
    {
      const HlHeatZone *zone = &g_array_index (zones, HlHeatZone, k);
      hl_json_text_begin (json, NULL, '{', TRUE);
      hl_json_text_number (json, "heat_W", zone->heat);
      hl_json_text_number (json, "hot_in_K", zone->hot_in);
      hl_json_text_number (json, "hot_out_K", zone->hot_out);
      hl_json_text_number (json, "cold_in_K", zone->cold_in);
      hl_json_text_number (json, "cold_out_K", zone->cold_out);
      hl_json_text_number (json, "mean_difference_K", zone->mean_difference);
      hl_json_text_number (json, "UA_W_K", zone->conductance);
      hl_json_text_end (json);
    }
  hl_json_text_end (json);
}

/* Zones, pinch and both curves, heat [W] and temperature [K] from the cold end on. */
static void
write_exchangers (HlJsonText *json, const HlSolution *solution)
{
  g_autoptr (GArray) components = hl_heat_exchangers (solution);
  hl_json_text_begin (json, "exchangers", '{', FALSE);
  for (guint k = 0; k < components->len; k++)
    {
      guint component = g_array_index (components, guint, k);
      g_autoptr (HlHeatCurve) curve = hl_heat_curve_new (solution, (int) component);
      if (curve->zones->len == 0)
        continue;
      hl_json_text_begin (json, hl_plant_component (hl_solution_plant (solution), component)->id, '{', FALSE);
      hl_json_text_number (json, "heat_W", curve->duty);
      hl_json_text_number (json, "pinch_K", curve->has_pinch ? curve->pinch : NAN);
      hl_json_text_number (json, "pinch_at_W", curve->has_pinch ? curve->pinch_heat : NAN);
      write_zones (json, curve->zones);
      write_curve (json, "hot", curve->hot);
      write_curve (json, "cold", curve->cold);
      hl_json_text_end (json);
    }
  hl_json_text_end (json);
}

static void
write_address (HlJsonText *json, const char *name, const HlAddress *address)
{
  /* A finding about a whole component or the plant carries no key. */
  if (address->key == NULL || *address->key == '\0')
    {
      hl_json_text_string (json, name, address->owner == HL_OWNER_PLANT ? "plant" : address->id);
      return;
    }
  g_autofree char *text = hl_address_to_text (address);
  hl_json_text_string (json, name, text);
}

static void
write_finding (HlJsonText *json, const HlFinding *finding)
{
  hl_json_text_begin (json, NULL, '{', FALSE);
  hl_json_text_string (json, "grade", hl_grade_id (finding->grade));
  hl_json_text_string (json, "code", finding->code);
  hl_json_text_string (json, "text", finding->text);
  if (finding->source != NULL)
    hl_json_text_string (json, "source", finding->source);
  write_address (json, "at", &finding->at);
  hl_json_text_begin (json, "mends", '[', FALSE);
  for (guint k = 0; k < finding->n_mends; k++)
    hl_json_text_string (json, NULL, finding->mends[k].text);
  hl_json_text_end (json);
  hl_json_text_end (json);
}

/* Those that are dismissed stand apart, where there are any. */
static void
write_findings (HlJsonText *json, const HlSolution *solution)
{
  hl_json_text_begin (json, "findings", '[', FALSE);
  for (guint i = 0; i < hl_solution_n_findings (solution); i++)
    write_finding (json, hl_solution_finding (solution, i));
  hl_json_text_end (json);
  if (hl_solution_n_dismissed (solution) == 0)
    return;
  hl_json_text_begin (json, "dismissed", '[', FALSE);
  for (guint i = 0; i < hl_solution_n_dismissed (solution); i++)
    write_finding (json, hl_solution_dismissed (solution, i));
  hl_json_text_end (json);
}

static void
write_yielded (HlJsonText *json, const GArray *yielded)
{
  hl_json_text_begin (json, "yielded", '[', FALSE);
  for (guint i = 0; i < yielded->len; i++)
    {
      const HlYield *yield = &g_array_index (yielded, HlYield, i);
      hl_json_text_begin (json, NULL, '{', TRUE);
      write_address (json, "at", &yield->address);
      hl_json_text_boolean (json, "came_back", yield->came_back);
      hl_json_text_string (json, "text", yield->text);
      hl_json_text_end (json);
    }
  hl_json_text_end (json);
}

char *
hl_solution_json (const HlSolution *solution, const GArray *yielded)
{
  HlJsonText *json = hl_json_text_new ();
  hl_json_text_begin (json, NULL, '{', FALSE);
  hl_json_text_boolean (json, "solved", hl_solution_is_solved (solution));
  write_plant (json, solution);
  write_streams (json, solution);
  write_components (json, solution);
  write_performance (json, solution);
  write_exchangers (json, solution);
  write_exergy (json, solution);
  write_findings (json, solution);
  write_yielded (json, yielded);
  hl_json_text_end (json);
  return hl_json_text_finish (json);
}
