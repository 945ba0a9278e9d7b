/* True paths of processes and isobars in the plane of a state diagram, sampled until they look smooth.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/state-diagram-private.h"
#include <math.h>

#define FLAT     0.12     /* pixels that a chord may deviate from the curve */
#define NEAR     0.15     /* pixels to which a change of phase is located */
#define MAX_DEEP 22       /* halvings of the parameter */
#define N_START  6        /* equal pieces to begin with, so that no bend is missed */

typedef struct Path Path;
struct Path {
  HlStatus (*at) (const Path *path, double t, HlState *state);
  const HlFluid    *fluid;
  HlState           from, to;
  double            factor;                /* of an expansion or compression: (h2 - h1) / (h2s - h1) */
  HlStateDiagramKind kind;
  const HlPlotAxis *x_axis, *y_axis;
  GArray           *points;
  gboolean          has_failed;
};

/* Heating, cooling, mixing, pipes: pressure and enthalpy run in proportion. */
static HlStatus
at_proportional (const Path *path, double t, HlState *state)
{
  return hl_fluid_state_ph (path->fluid, path->from.p + t * (path->to.p - path->from.p), path->from.h + t * (path->to.h - path->from.h), state);
}

static double
pressure_between (const Path *path, double t)
{
  return path->from.p * pow (path->to.p / path->from.p, t);
}

/* The line of constant isentropic efficiency through both ends. */
static HlStatus
at_constant_efficiency (const Path *path, double t, HlState *state)
{
  HlState ideal;
  HlStatus status = hl_fluid_state_ps (path->fluid, pressure_between (path, t), path->from.s, &ideal);
  if (status != HL_OK)
    return status;
  return hl_fluid_state_ph (path->fluid, ideal.p, path->from.h + path->factor * (ideal.h - path->from.h), state);
}

static HlStatus
at_throttling (const Path *path, double t, HlState *state)
{
  return hl_fluid_state_ph (path->fluid, pressure_between (path, t), path->from.h + t * (path->to.h - path->from.h), state);
}

/* Isobar from the lower to the higher temperature: from and to carry p and T only. */
static HlStatus
at_isobar (const Path *path, double t, HlState *state)
{
  return hl_fluid_state_pT (path->fluid, path->from.p, path->from.T + t * (path->to.T - path->from.T), state);
}

/* Isotherm from the higher to the lower pressure: from and to carry p and T only. */
static HlStatus
at_isotherm (const Path *path, double t, HlState *state)
{
  return hl_fluid_state_pT (path->fluid, pressure_between (path, t), path->from.T, state);
}

/* The vertical of T-s and h-s. */
static HlStatus
at_constant_entropy (const Path *path, double t, HlState *state)
{
  return hl_fluid_state_ps (path->fluid, pressure_between (path, t), path->from.s, state);
}

static HlLook
look_of (const HlState *state)
{
  HlStreamResult result = { .has_state = TRUE, .state = *state };
  return hl_stream_look (&result);
}

static void
add (Path *path, const HlState *state)
{
  HlPathPoint point = { state->s, state->T, state->p, state->h, look_of (state) };
  g_array_append_val (path->points, point);
}

static HlPoint
pixel (const Path *path, const HlState *state)
{
  HlPoint at = hl_axes_state (path->kind, state);
  return (HlPoint) { hl_plot_axis_to_pixel (path->x_axis, at.x), hl_plot_axis_to_pixel (path->y_axis, at.y) };
}

static double
off_chord (HlPoint a, HlPoint b, HlPoint c)
{
  double dx = b.x - a.x, dy = b.y - a.y, length = hypot (dx, dy);
  return length > 1e-9 ? fabs ((c.x - a.x) * dy - (c.y - a.y) * dx) / length : hypot (c.x - a.x, c.y - a.y);
}

/* Adds the points after @a up to and with @b. */
static void
refine (Path *path, double t_a, const HlState *a, double t_b, const HlState *b, int deep)
{
  double t = (t_a + t_b) / 2.0;
  HlPoint pixel_a = pixel (path, a), pixel_b = pixel (path, b);
  gboolean changes = look_of (a) != look_of (b);
  HlState middle;
  if (path->has_failed)
    return;
  if (deep >= MAX_DEEP || hypot (pixel_b.x - pixel_a.x, pixel_b.y - pixel_a.y) < (changes ? NEAR : 2.0))
    {
      add (path, b);
      return;
    }
  if (path->at (path, t, &middle) != HL_OK)
    {
      path->has_failed = TRUE;
      return;
    }
  if (!changes && look_of (&middle) == look_of (a) && off_chord (pixel_a, pixel_b, pixel (path, &middle)) < FLAT)
    {
      add (path, &middle);
      add (path, b);
      return;
    }
  refine (path, t_a, a, t, &middle, deep + 1);
  refine (path, t, &middle, t_b, b, deep + 1);
}

/* Samples from state to state; the ends themselves are taken as they are. */
static void
sample (Path *path)
{
  HlState last = path->from;
  double t_last = 0.0;
  add (path, &path->from);
  for (int i = 1; i <= N_START && !path->has_failed; i++)
    {
      double t = (double) i / N_START;
      HlState next = path->to;
      if (i < N_START && path->at (path, t, &next) != HL_OK)
        path->has_failed = TRUE;
      else
        refine (path, t_last, &last, t, &next, 0);
      last = next;
      t_last = t;
    }
}

static void
set_process (Path *path, const HlProcess *process)
{
  path->fluid = process->fluid;
  path->from = process->from;
  path->to = process->to;
  path->at = at_proportional;
  if (process->kind == HL_PROCESS_THROTTLING && process->to.p > 0.0)
    path->at = at_throttling;
  if (process->kind == HL_PROCESS_EXPANSION || process->kind == HL_PROCESS_COMPRESSION)
    {
      HlState ideal = process->isentropic;
      if (!process->has_isentropic && hl_fluid_state_ps (process->fluid, process->to.p, process->from.s, &ideal) != HL_OK)
        return;
      if (fabs (ideal.h - process->from.h) < 1e-6)
        return;
      path->factor = (process->to.h - process->from.h) / (ideal.h - process->from.h);
      path->at = at_constant_efficiency;
    }
}

GArray *
hl_process_path (const HlProcess *process, HlStateDiagramKind kind, const HlPlotAxis *x_axis, const HlPlotAxis *y_axis)
{
  Path path = { .kind = kind, .x_axis = x_axis, .y_axis = y_axis };
  g_return_val_if_fail (process->fluid != NULL, NULL);
  path.points = g_array_new (FALSE, FALSE, sizeof (HlPathPoint));
  set_process (&path, process);
  sample (&path);
  if (path.has_failed)
    {
      g_array_set_size (path.points, 0);
      add (&path, &path.from);
      add (&path, &path.to);
    }
  return path.points;
}

GArray *
hl_isobar_path (const HlFluid *fluid, double p, double T_low, double T_high, HlStateDiagramKind kind, const HlPlotAxis *x_axis, const HlPlotAxis *y_axis)
{
  Path path = { .at = at_isobar, .fluid = fluid, .kind = kind, .x_axis = x_axis, .y_axis = y_axis };
  HlState liquid, vapour;
  path.points = g_array_new (FALSE, FALSE, sizeof (HlPathPoint));
  if (hl_fluid_state_px (fluid, p, 0.0, &liquid) == HL_OK && hl_fluid_state_px (fluid, p, 1.0, &vapour) == HL_OK)
    {
      add (&path, &liquid);
      path.from = vapour;
    }
  else if (hl_fluid_state_pT (fluid, p, T_low, &path.from) != HL_OK)
    return path.points;
  if (path.from.T >= T_high)
    {
      add (&path, &path.from);
      return path.points;
    }
  if (hl_fluid_state_pT (fluid, p, T_high, &path.to) == HL_OK)
    sample (&path);
  else
    add (&path, &path.from);
  return path.points;
}

/* Samples one piece of an isotherm; where the equation does not reach its start, nothing. */
static void
add_isotherm_piece (Path *path, double T, double p_from, double p_to)
{
  if (!(p_from > p_to) || hl_fluid_state_pT (path->fluid, p_from, T, &path->from) != HL_OK
      || hl_fluid_state_pT (path->fluid, p_to, T, &path->to) != HL_OK)
    return;
  sample (path);
}

GArray *
hl_isotherm_path (const HlFluid *fluid, double T, double p_high, double p_low, HlStateDiagramKind kind, const HlPlotAxis *x_axis, const HlPlotAxis *y_axis, guint *n_kept)
{
  Path path = { .at = at_isotherm, .fluid = fluid, .kind = kind, .x_axis = x_axis, .y_axis = y_axis };
  HlState liquid, vapour;
  path.points = g_array_new (FALSE, FALSE, sizeof (HlPathPoint));
  *n_kept = 0;
  if (hl_fluid_state_Tx (fluid, T, 0.0, &liquid) == HL_OK && hl_fluid_state_Tx (fluid, T, 1.0, &vapour) == HL_OK)
    {
      /* The saturated ends are those of the dome; the pieces stop just short of them. */
      if (isfinite (p_high))
        {
          add_isotherm_piece (&path, T, p_high, liquid.p * (1.0 + 1e-9));
          add (&path, &liquid);
        }
      add (&path, &vapour);
      *n_kept = path.points->len;
      add_isotherm_piece (&path, T, vapour.p * (1.0 - 1e-9), p_low);
    }
  else if (isfinite (p_high))
    add_isotherm_piece (&path, T, p_high, p_low);
  return path.points;
}

GArray *
hl_ideal_path (const HlProcess *process, HlStateDiagramKind kind, const HlPlotAxis *x_axis, const HlPlotAxis *y_axis)
{
  Path path = { .at = at_constant_entropy, .fluid = process->fluid, .from = process->from, .to = process->isentropic,
                .kind = kind, .x_axis = x_axis, .y_axis = y_axis };
  path.points = g_array_new (FALSE, FALSE, sizeof (HlPathPoint));
  /* Straight in T-s and h-s: sampling would only cut it into pieces. */
  if (kind == HL_STATE_DIAGRAM_PH)
    sample (&path);
  if (kind != HL_STATE_DIAGRAM_PH || path.has_failed)
    {
      g_array_set_size (path.points, 0);
      add (&path, &path.from);
      add (&path, &path.to);
    }
  return path.points;
}
