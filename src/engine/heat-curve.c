/* From the processes of a component to its curves of temperature over duty.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/heat-curve.h"
#include "engine/equations.h"
#include <math.h>
#include <string.h>

#define N_PIECES 48        /* of a process, before phase changes are located */
#define FLAT     1e-5      /* K: less is a jump of heat at one temperature */

HlLook
hl_stream_look (const HlStreamResult *result)
{
  if (result == NULL || !result->has_state)
    return HL_LOOK_UNKNOWN;
  switch (result->state.phase)
    {
    case HL_PHASE_LIQUID:
      return HL_LOOK_WATER;
    case HL_PHASE_TWO_PHASE:
      if (result->fluid != NULL && !hl_fluid_has_dome (result->fluid))
        return HL_LOOK_GAS;      /* with its condensate */
      /* The ends of the saturation line belong to their one-phase neighbours: a drain is water, drum steam is steam. */
      if (result->state.x < 1e-6)
        return HL_LOOK_WATER;
      return result->state.x > 1.0 - 1e-6 ? HL_LOOK_STEAM : HL_LOOK_WET;
    case HL_PHASE_GAS:
      return HL_LOOK_GAS;
    case HL_PHASE_VAPOUR:
    case HL_PHASE_SUPERCRITICAL:
    default:
      return HL_LOOK_STEAM;
    }
}

/* A stretch of a process: heat between two temperatures. */
typedef struct { double T_low, T_high, heat; HlLook look; } Stretch;
typedef struct {
  GArray *stretches;       /* of Stretch, from the cold end */
  guint   n_processes;
} Side;

static void
side_init (Side *side)
{
  side->stretches = g_array_new (FALSE, FALSE, sizeof (Stretch));
  side->n_processes = 0;
}

static HlStatus
state_along (const HlProcess *process, double t, HlState *state)
{
  /* A drain that enters a shell drops to the shell's pressure before it gives heat. */
  double p_from = process->kind == HL_PROCESS_THROTTLING ? process->to.p : process->from.p;
  return hl_fluid_state_ph (process->fluid, p_from + t * (process->to.p - p_from), process->from.h + t * (process->to.h - process->from.h), state);
}

static HlLook
look_of (const HlProcess *process, const HlState *state)
{
  HlStreamResult result = { .has_state = TRUE, .state = *state, .fluid = process->fluid };
  return process->is_service && state->phase == HL_PHASE_LIQUID ? HL_LOOK_COOLING : hl_stream_look (&result);
}

static void
add_stretch (const HlProcess *process, GArray *out, const HlState *a, const HlState *b)
{
  HlState middle;
  HlLook look = look_of (process, hl_fluid_state_ph (process->fluid, (a->p + b->p) / 2.0, (a->h + b->h) / 2.0, &middle) == HL_OK ? &middle : b);
  Stretch stretch = { a->T, b->T, process->m * (b->h - a->h), look };
  if (fabs (stretch.heat) > 0.0)
    g_array_append_val (out, stretch);
}

/* Where the look changes between two samples the change itself becomes a sample. */
static void
add_between (const HlProcess *process, GArray *out, double t_a, const HlState *a, double t_b, const HlState *b)
{
  HlState low = *a, middle;
  if (look_of (process, a) == look_of (process, b))
    {
      add_stretch (process, out, a, b);
      return;
    }
  for (int i = 0; i < 48; i++)
    {
      double t = (t_a + t_b) / 2.0;
      if (state_along (process, t, &middle) != HL_OK)
        break;
      if (look_of (process, &middle) == look_of (process, a))
        {
          low = middle;
          t_a = t;
        }
      else
        t_b = t;
    }
  add_stretch (process, out, a, &low);
  add_stretch (process, out, &low, b);
}

/* Appends the stretches of a process, from its start to its end; heat counts as the medium's gain. */
static gboolean
sample (const HlProcess *process, GArray *out)
{
  HlState last, next;
  guint n = out->len;
  if (state_along (process, 0.0, &last) != HL_OK)
    return FALSE;
  for (int i = 1; i <= N_PIECES; i++)
    {
      if (state_along (process, (double) i / N_PIECES, &next) != HL_OK)
        {
          g_array_set_size (out, n);
          return FALSE;
        }
      add_between (process, out, (i - 1.0) / N_PIECES, &last, (double) i / N_PIECES, &next);
      last = next;
    }
  return TRUE;
}

static void
take_process (Side *side, const HlProcess *process, gboolean is_hot)
{
  g_autoptr (GArray) own = g_array_new (FALSE, FALSE, sizeof (Stretch));
  if (!sample (process, own) || own->len == 0)
    return;
  for (guint i = 0; i < own->len; i++)
    {
      Stretch stretch = g_array_index (own, Stretch, is_hot ? own->len - 1 - i : i);
      if (is_hot)
        stretch = (Stretch) { stretch.T_high, stretch.T_low, -stretch.heat, stretch.look };
      g_array_append_val (side->stretches, stretch);
    }
  side->n_processes++;
}

static gboolean
own_value (const HlSolution *solution, guint component, const char *key, double *value)
{
  HlAddress address = hl_address_component (hl_plant_component (hl_solution_plant (solution), component)->id, g_intern_string (key));
  return hl_solution_value (solution, &address, value) && isfinite (*value);
}

/* Cooling water that is not drawn: a straight line. */
static void
take_own_cooling (Side *cold, const HlSolution *solution, guint component, double heat)
{
  double T, rise;
  if (!own_value (solution, component, "cooling_inlet_T", &T) || !own_value (solution, component, "cooling_rise", &rise) || !(rise > 0.0))
    return;
  Stretch stretch = { T, T + rise, heat, HL_LOOK_COOLING };
  g_array_append_val (cold->stretches, stretch);
  cold->n_processes = 1;
}

static double
heat_of (const Side *side)
{
  double heat = 0.0;
  for (guint i = 0; i < side->stretches->len; i++)
    heat += g_array_index (side->stretches, Stretch, i).heat;
  return heat;
}

/* What gives heat and what takes it in a component. */
static void
collect (const HlSolution *solution, guint component, Side *hot, Side *cold)
{
  for (guint i = 0; i < hl_solution_n_processes (solution); i++)
    {
      const HlProcess *process = hl_solution_process (solution, i);
      double gain = process->m * (process->to.h - process->from.h);
      gboolean is_drain = process->kind == HL_PROCESS_THROTTLING && process->to.h < process->from.h * (1.0 - 1e-9);
      if (process->component != component || process->fluid == NULL || !isfinite (gain))
        continue;
      if (process->kind == HL_PROCESS_HEATING && gain > 0.0)
        take_process (cold, process, FALSE);
      else if ((process->kind == HL_PROCESS_COOLING || is_drain) && gain < 0.0)
        take_process (hot, process, TRUE);
    }
  if (hot->n_processes > 0 && cold->n_processes == 0)
    take_own_cooling (cold, solution, component, heat_of (hot));
}

static void
append_side (Side *to, const Side *from)
{
  g_array_append_vals (to->stretches, from->stretches->data, from->stretches->len);
  to->n_processes += from->n_processes;
}

static void
collect_all (const HlSolution *solution, Side *hot, Side *cold)
{
  for (guint n = 0; n < hl_plant_n_components (hl_solution_plant (solution)); n++)
    {
      Side own_hot, own_cold;
      side_init (&own_hot);
      side_init (&own_cold);
      collect (solution, n, &own_hot, &own_cold);
      if (own_hot.n_processes > 0 && own_cold.n_processes > 0)
        {
          append_side (hot, &own_hot);
          append_side (cold, &own_cold);
        }
      g_array_unref (own_hot.stretches);
      g_array_unref (own_cold.stretches);
    }
}

static void
append_point (GArray *curve, double heat, double T, HlLook look)
{
  HlHeatPoint point = { heat, T, look };
  g_array_append_val (curve, point);
}

/* One process: its own way. */
static void
curve_of_one (const Side *side, GArray *curve)
{
  double heat = 0.0;
  for (guint i = 0; i < side->stretches->len; i++)
    {
      const Stretch *stretch = &g_array_index (side->stretches, Stretch, i);
      if (i == 0)
        append_point (curve, 0.0, stretch->T_low, stretch->look);
      heat += stretch->heat;
      append_point (curve, heat, stretch->T_high, stretch->look);
    }
}

static int
compare_doubles (gconstpointer a, gconstpointer b)
{
  double x = *(const double *) a, y = *(const double *) b;
  return (x > y) - (x < y);
}

/* Heat of all stretches between two neighbouring temperatures, or at one; the look of the largest. */
static double
heat_within (const Side *side, double T_a, double T_b, HlLook *look)
{
  double sum = 0.0, largest = 0.0;
  for (guint i = 0; i < side->stretches->len; i++)
    {
      const Stretch *stretch = &g_array_index (side->stretches, Stretch, i);
      double low = MIN (stretch->T_low, stretch->T_high), high = MAX (stretch->T_low, stretch->T_high), heat = 0.0;
      if (high - low < FLAT)
        heat = T_a == T_b && low == T_a ? stretch->heat : 0.0;
      else if (T_b > T_a)
        heat = stretch->heat * MAX (0.0, MIN (high, T_b) - MAX (low, T_a)) / (high - low);
      sum += heat;
      if (heat > largest)
        {
          largest = heat;
          *look = stretch->look;
        }
    }
  return sum;
}

/* Several: added up by temperature. */
static void
curve_of_many (const Side *side, GArray *curve)
{
  g_autoptr (GArray) T = g_array_new (FALSE, FALSE, sizeof (double));
  double heat = 0.0;
  for (guint i = 0; i < side->stretches->len; i++)
    {
      Stretch *stretch = &g_array_index (side->stretches, Stretch, i);
      if (fabs (stretch->T_high - stretch->T_low) < FLAT)
        stretch->T_high = stretch->T_low;
      g_array_append_val (T, stretch->T_low);
      g_array_append_val (T, stretch->T_high);
    }
  g_array_sort (T, compare_doubles);
  for (guint i = 0; i < T->len; i++)
    {
      double here = g_array_index (T, double, i), before = i > 0 ? g_array_index (T, double, i - 1) : here, added;
      HlLook look = HL_LOOK_WATER;
      if (i > 0 && here == before)
        continue;
      added = i > 0 ? heat_within (side, before, here, &look) : 0.0;
      heat += added;
      /* Gaps without heat make a step straight up. */
      append_point (curve, heat, here, look);
      added = heat_within (side, here, here, &look);
      if (added > 0.0)
        append_point (curve, heat += added, here, look);
    }
}

static void
make_curve (const Side *side, GArray *curve)
{
  if (side->n_processes == 1)
    curve_of_one (side, curve);
  else
    curve_of_many (side, curve);
}

double
hl_heat_curve_at (const GArray *side, double heat)
{
  for (guint i = 1; i < side->len; i++)
    {
      const HlHeatPoint *a = &g_array_index (side, HlHeatPoint, i - 1), *b = &g_array_index (side, HlHeatPoint, i);
      double slack = 1e-9 * fabs (g_array_index (side, HlHeatPoint, side->len - 1).heat);
      if (heat < a->heat - slack || heat > b->heat + slack)
        continue;
      return b->heat > a->heat ? a->T + CLAMP ((heat - a->heat) / (b->heat - a->heat), 0.0, 1.0) * (b->T - a->T) : b->T;
    }
  return NAN;
}

double
hl_heat_curve_difference (const HlHeatCurve *curve, double heat)
{
  return hl_heat_curve_at (curve->hot, heat) - hl_heat_curve_at (curve->cold, heat);
}

static void
try_pinch (HlHeatCurve *curve, double heat)
{
  double difference = hl_heat_curve_difference (curve, heat);
  if (!isfinite (difference) || (curve->has_pinch && !(difference < curve->pinch - 1e-6)))
    return;
  curve->has_pinch = TRUE;
  curve->pinch = difference;
  curve->pinch_heat = heat;
}

/* Where a curve bends: at its points lies the least difference; at a step on either side of it. */
static void
look_for_pinch (HlHeatCurve *curve, const GArray *side)
{
  for (guint i = 0; i < side->len; i++)
    {
      double heat = g_array_index (side, HlHeatPoint, i).heat;
      try_pinch (curve, heat);
      if (heat < curve->duty * (1.0 - 1e-6))
        try_pinch (curve, heat + 1e-7 * curve->duty);
    }
}

static void
add_borders (HlHeatCurve *curve, const GArray *side)
{
  for (guint i = 1; i + 1 < side->len; i++)
    {
      const HlHeatPoint *here = &g_array_index (side, HlHeatPoint, i), *next = &g_array_index (side, HlHeatPoint, i + 1);
      gboolean is_new = here->look != next->look && here->heat > 0.004 * curve->duty && here->heat < 0.996 * curve->duty;
      for (guint k = 0; k < curve->borders->len && is_new; k++)
        is_new = fabs (g_array_index (curve->borders, double, k) - here->heat) > 0.004 * curve->duty;
      if (is_new)
        g_array_append_val (curve->borders, here->heat);
    }
  g_array_sort (curve->borders, compare_doubles);
}

/* --- zones ---------------------------------------------------------------------------- */

/* A curve just before and just behind a heat, where it may step. */
static double
temperature_near (const GArray *side, double heat, double slack)
{
  return hl_heat_curve_at (side, MAX (heat + slack, 0.0));
}

static HlLook
look_within (const GArray *side, double middle)
{
  for (guint i = 1; i < side->len; i++)
    if (g_array_index (side, HlHeatPoint, i).heat >= middle)
      return g_array_index (side, HlHeatPoint, i).look;
  return HL_LOOK_UNKNOWN;
}

/* Heat over logarithmic mean difference, piece by piece between the points of both curves. */
static double
conductance_between (const HlHeatCurve *curve, double from, double to, double slack)
{
  g_autoptr (GArray) cuts = g_array_new (FALSE, FALSE, sizeof (double));
  const GArray *sides[] = { curve->hot, curve->cold };
  double sum = 0.0;
  g_array_append_val (cuts, from);
  g_array_append_val (cuts, to);
  for (guint s = 0; s < 2; s++)
    for (guint i = 0; i < sides[s]->len; i++)
      {
        double heat = g_array_index (sides[s], HlHeatPoint, i).heat;
        if (heat > from + slack && heat < to - slack)
          g_array_append_val (cuts, heat);
      }
  g_array_sort (cuts, compare_doubles);
  for (guint i = 1; i < cuts->len; i++)
    {
      double a = g_array_index (cuts, double, i - 1), b = g_array_index (cuts, double, i), unused[2];
      if (!(b > a + slack))
        continue;
      double d_a = temperature_near (curve->hot, a, slack) - temperature_near (curve->cold, a, slack);
      double d_b = temperature_near (curve->hot, b, -slack) - temperature_near (curve->cold, b, -slack);
      if (!(d_a > 0.0 && d_b > 0.0))
        return NAN;
      sum += (b - a) / hl_log_mean (d_a, d_b, &unused[0], &unused[1]);
    }
  return sum;
}

static void
find_zones (HlHeatCurve *curve)
{
  double from = 0.0, slack = 1e-9 * curve->duty;
  for (guint k = 0; k <= curve->borders->len; k++)
    {
      double to = k < curve->borders->len ? g_array_index (curve->borders, double, k) : curve->duty;
      HlHeatZone zone = { .heat = to - from, .hot_out = temperature_near (curve->hot, from, slack), .hot_in = temperature_near (curve->hot, to, -slack),
                          .cold_in = temperature_near (curve->cold, from, slack), .cold_out = temperature_near (curve->cold, to, -slack),
                          .hot = look_within (curve->hot, (from + to) / 2.0), .cold = look_within (curve->cold, (from + to) / 2.0) };
      zone.conductance = conductance_between (curve, from, to, slack);
      zone.mean_difference = zone.heat / zone.conductance;
      g_array_append_val (curve->zones, zone);
      from = to;
    }
}

HlHeatCurve *
hl_heat_curve_new (const HlSolution *solution, int component)
{
  HlHeatCurve *curve;
  Side hot, cold;
  g_return_val_if_fail (solution != NULL && component < (int) hl_plant_n_components (hl_solution_plant (solution)), NULL);
  side_init (&hot);
  side_init (&cold);
  if (component == HL_HEAT_ALL)
    collect_all (solution, &hot, &cold);
  else
    collect (solution, (guint) component, &hot, &cold);
  curve = g_new0 (HlHeatCurve, 1);
  curve->hot = g_array_new (FALSE, FALSE, sizeof (HlHeatPoint));
  curve->cold = g_array_new (FALSE, FALSE, sizeof (HlHeatPoint));
  curve->borders = g_array_new (FALSE, FALSE, sizeof (double));
  curve->zones = g_array_new (FALSE, FALSE, sizeof (HlHeatZone));
  curve->duty = MAX (heat_of (&hot), heat_of (&cold));
  if (hot.n_processes > 0)
    make_curve (&hot, curve->hot);
  if (cold.n_processes > 0)
    make_curve (&cold, curve->cold);
  g_array_unref (hot.stretches);
  g_array_unref (cold.stretches);
  if (!(curve->duty > 0.0))
    {
      hl_heat_curve_free (curve);
      return NULL;
    }
  look_for_pinch (curve, curve->hot);
  look_for_pinch (curve, curve->cold);
  /* With many exchangers every one would add its borders. */
  if (component != HL_HEAT_ALL)
    {
      add_borders (curve, curve->hot);
      add_borders (curve, curve->cold);
      if (curve->hot->len > 1 && curve->cold->len > 1)
        find_zones (curve);
    }
  return curve;
}

void
hl_heat_curve_free (HlHeatCurve *curve)
{
  if (curve == NULL)
    return;
  g_array_unref (curve->hot);
  g_array_unref (curve->cold);
  g_array_unref (curve->borders);
  g_array_unref (curve->zones);
  g_free (curve);
}

GArray *
hl_heat_exchangers (const HlSolution *solution)
{
  GArray *components = g_array_new (FALSE, FALSE, sizeof (guint));
  for (guint n = 0; n < hl_plant_n_components (hl_solution_plant (solution)); n++)
    {
      g_autoptr (HlHeatCurve) curve = hl_heat_curve_new (solution, (int) n);
      if (curve != NULL)
        g_array_append_val (components, n);
    }
  return components;
}
