/* The given value behind a state: which ones move it, and dragging the state by one of them.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-lever.h"

#include <math.h>

#define LEAST_EFFECT 0.02     /* pixels for a step of the value: what moves less stays where it is */
#define LEAST_ALONG  0.1      /* share of the movement that goes along the drag */

struct _HlLeverDrag {
  HlScrub              *scrub;
  HlSession            *session;
  const HlStateDiagram *diagram;
  HlStateDiagramKind    kind;
  const HlQuantityKind *quantity;
  const char           *stream_id;      /* interned */
  double                value;          /* [SI] */
  double                from_x, from_y; /* where the state was [pixels] */
  double                x, y;           /* of the state with that value [pixels] */
  double                slope_x, slope_y;   /* [pixels per SI unit of the value] */
};

/* --- which values --- */

/* The state of @stream with another value at @address; FALSE where the plant does not solve with it. */
static gboolean
state_with (HlSolution *solution, const HlAddress *address, double si, guint stream, HlState *state)
{
  HlValue value = { .origin = HL_ORIGIN_GIVEN, .value = si };
  g_autoptr (HlPlant) plant = hl_plant_with_value (hl_solution_plant (solution), address, &value, NULL);
  HlStreamResult result;

  if (plant == NULL)
    return FALSE;
  g_autoptr (HlSolution) other = hl_solve (plant, solution);
  if (!hl_solution_is_solved (other))
    return FALSE;
  hl_solution_stream (other, stream, &result);
  *state = result.state;
  return result.has_state;
}

static gboolean
is_known (const GArray *levers, const HlAddress *address)
{
  for (guint n = 0; n < levers->len; n++)
    if (hl_address_equal (&g_array_index (levers, HlLever, n).address, address))
      return TRUE;
  return FALSE;
}

/* A step up, or down where up is beyond its limit. */
static void
add_lever (GArray *levers, HlSolution *solution, guint stream, const HlState *before, const HlAddress *address, gboolean is_state)
{
  const HlPlant *plant = hl_solution_plant (solution);
  const HlQuantityKind *kind = hl_plant_quantity_kind (plant, address);
  HlLever lever = { .before = *before, .is_state = is_state };
  const HlValue *value = hl_scrub_value_at (plant, address, &lever.address);

  if (value == NULL || kind == NULL || is_known (levers, &lever.address))
    return;
  lever.value = value->value;
  double step = hl_scrub_step (kind, lever.value, hl_plant_units (plant), FALSE);
  for (int sign = 1; sign >= -1; sign -= 2)
    {
      lever.delta = hl_scrub_moved (plant, kind, lever.value, sign * step, step) - lever.value;
      if (fabs (lever.delta) > 0.0 && state_with (solution, &lever.address, lever.value + lever.delta, stream, &lever.after))
        {
          g_array_append_val (levers, lever);
          return;
        }
    }
}

static void
add_states (GArray *levers, HlSolution *solution, guint stream, const HlState *before, const HlStream *where)
{
  static const char *const keys[] = { "p", "T", "x" };

  for (guint n = 0; n < G_N_ELEMENTS (keys); n++)
    {
      HlAddress address = hl_address_stream (where->id, g_intern_static_string (keys[n]));
      add_lever (levers, solution, stream, before, &address, TRUE);
    }
}

GArray *
hl_levers_new (HlSolution *solution, guint stream)
{
  const HlPlant *plant = hl_solution_plant (solution);
  const HlStream *own = hl_plant_stream (plant, stream);
  const char *ends[] = { own->from_id, own->to_id };
  GArray *levers = g_array_new (FALSE, TRUE, sizeof (HlLever));
  HlStreamResult result;

  hl_solution_stream (solution, stream, &result);
  if (!hl_solution_is_solved (solution) || !result.has_state)
    return levers;
  add_states (levers, solution, stream, &result.state, own);
  for (guint n = 0; n < hl_plant_n_streams (plant); n++)
    {
      const HlStream *other = hl_plant_stream (plant, n);
      for (guint end = 0; end < G_N_ELEMENTS (ends); end++)
        if (g_strcmp0 (other->from_id, ends[end]) == 0 || g_strcmp0 (other->to_id, ends[end]) == 0)
          add_states (levers, solution, stream, &result.state, other);
    }
  for (guint end = 0; end < G_N_ELEMENTS (ends); end++)
    {
      const HlComponent *component = hl_plant_find_component (plant, ends[end]);
      for (guint n = 0; component != NULL && n < hl_component_n_quantities (component); n++)
        {
          HlAddress address = hl_address_component (component->id, hl_component_quantity (component, n).key);
          add_lever (levers, solution, stream, &result.state, &address, FALSE);
        }
    }
  return levers;
}

/* --- where states lie --- */

static void
place_of (const HlStateDiagram *diagram, HlStateDiagramKind kind, const HlState *state, double *x, double *y)
{
  hl_state_diagram_to_pixel (diagram, kind == HL_STATE_DIAGRAM_PH ? state->h : state->s,
                             kind == HL_STATE_DIAGRAM_TS ? state->T : kind == HL_STATE_DIAGRAM_HS ? state->h : state->p, x, y);
}

/* Far along the direction, and little across it. */
static double
score (const HlLever *lever, const HlStateDiagram *diagram, HlStateDiagramKind kind, double dx, double dy)
{
  double x0, y0, x1, y1;

  place_of (diagram, kind, &lever->before, &x0, &y0);
  place_of (diagram, kind, &lever->after, &x1, &y1);
  double length = hypot (x1 - x0, y1 - y0), drag = hypot (dx, dy);
  if (!(length > LEAST_EFFECT) || !(drag > 0.0))
    return 0.0;
  double along = fabs ((x1 - x0) * dx + (y1 - y0) * dy) / drag;
  return along > LEAST_ALONG * length ? along * along / length : 0.0;
}

const HlLever *
hl_levers_along (const GArray *levers, const HlStateDiagram *diagram, HlStateDiagramKind kind, double dx, double dy)
{
  const HlLever *best = NULL;
  double most = 0.0;

  for (int states = 1; states >= 0 && best == NULL; states--)
    for (guint n = 0; n < levers->len; n++)
      {
        const HlLever *lever = &g_array_index (levers, HlLever, n);
        double its = lever->is_state == states ? score (lever, diagram, kind, dx, dy) : 0.0;
        if (its > most)
          {
            most = its;
            best = lever;
          }
      }
  return best;
}

/* --- dragging --- */

HlLeverDrag *
hl_lever_drag_begin (HlSession *session, const HlLever *lever, const char *stream_id, const HlStateDiagram *diagram, HlStateDiagramKind kind)
{
  HlScrub *scrub = hl_scrub_begin (session, &lever->address);
  double x, y;

  if (scrub == NULL)
    return NULL;
  HlLeverDrag *drag = g_new0 (HlLeverDrag, 1);
  drag->scrub = scrub;
  drag->session = session;
  drag->diagram = diagram;
  drag->kind = kind;
  drag->quantity = hl_plant_quantity_kind (hl_session_base (session), &lever->address);
  drag->stream_id = g_intern_string (stream_id);
  drag->value = lever->value;
  place_of (diagram, kind, &lever->before, &drag->from_x, &drag->from_y);
  drag->x = drag->from_x;
  drag->y = drag->from_y;
  place_of (diagram, kind, &lever->after, &x, &y);
  drag->slope_x = (x - drag->x) / lever->delta;
  drag->slope_y = (y - drag->y) / lever->delta;
  return drag;
}

/* Nothing at one go that the plant would hardly follow. */
static double
longest_step (const HlLeverDrag *drag)
{
  switch (drag->quantity->dimension)
    {
    case HL_DIMENSION_TEMPERATURE:
    case HL_DIMENSION_TEMPERATURE_DIFFERENCE:
      return 40.0;
    case HL_DIMENSION_RATIO:
      return 0.1;
    default:
      return 0.3 * MAX (fabs (drag->value), 1e-9);
    }
}

/* A value that could have been typed, near @si. */
static double
round_value (const HlLeverDrag *drag, double si)
{
  const HlPlant *plant = hl_session_base (drag->session);
  HlUnitSet units = hl_plant_units (plant);
  double start = hl_scrub_start (drag->scrub);
  double step = hl_scrub_step (drag->quantity, start, units, TRUE);
  double amount = hl_units_to_display (si, drag->quantity->dimension, units)
                  - hl_units_to_display (start, drag->quantity->dimension, units);

  return hl_scrub_moved (plant, drag->quantity, start, amount, step);
}

/* One step of the value towards the place, halved as long as the plant does not solve with it; FALSE: it is as near as it gets. */
static gboolean
approach (HlLeverDrag *drag, guint stream, double x, double y)
{
  double steep = drag->slope_x * drag->slope_x + drag->slope_y * drag->slope_y, longest = longest_step (drag);
  double step = ((x - drag->x) * drag->slope_x + (y - drag->y) * drag->slope_y) / steep;

  if (!isfinite (step))
    return FALSE;
  step = CLAMP (step, -longest, longest);
  for (int tried = 0; tried < 5; tried++, step /= 2.0)
    {
      double value = round_value (drag, drag->value + step), to_x, to_y, change = value - drag->value;
      HlState state;
      if (!(fabs (change) > 0.0))
        return FALSE;
      if (!state_with (hl_session_solution (drag->session), hl_scrub_address (drag->scrub), value, stream, &state))
        continue;
      place_of (drag->diagram, drag->kind, &state, &to_x, &to_y);
      /* A state that has stood still (steam became wet, say) keeps the slope it had. */
      if (hypot (to_x - drag->x, to_y - drag->y) > 0.01)
        {
          drag->slope_x = (to_x - drag->x) / change;
          drag->slope_y = (to_y - drag->y) / change;
        }
      drag->value = value;
      drag->x = to_x;
      drag->y = to_y;
      return TRUE;
    }
  return FALSE;
}

void
hl_lever_drag_to (HlLeverDrag *drag, double dx, double dy)
{
  int stream = hl_plant_stream_index (hl_session_base (drag->session), drag->stream_id);

  if (stream < 0)
    return;
  for (int round = 0; round < 4; round++)
    if (!approach (drag, (guint) stream, drag->from_x + dx, drag->from_y + dy))
      break;
  hl_scrub_to (drag->scrub, drag->value);
}

char *
hl_lever_drag_text (HlLeverDrag *drag)
{
  const HlPlant *plant = hl_session_base (drag->session);
  HlUnitSet units = hl_plant_units (plant);
  g_autofree char *what = hl_plant_describe (plant, hl_scrub_address (drag->scrub));
  g_autofree char *from = hl_quantity_format (drag->quantity, hl_scrub_start (drag->scrub), units);
  g_autofree char *to = hl_quantity_format (drag->quantity, drag->value, units);

  return g_strdup_printf ("%s: %s → %s", what, from, to);
}

void
hl_lever_drag_finish (HlLeverDrag *drag)
{
  hl_scrub_finish (drag->scrub);
  g_free (drag);
}

void
hl_lever_drag_cancel (HlLeverDrag *drag)
{
  hl_scrub_cancel (drag->scrub);
  g_free (drag);
}
