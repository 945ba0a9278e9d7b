/* Unknowns and equations of a plant, as plain arrays: what the numerical core works on.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/system.h"
#include <math.h>
#include <string.h>

HlSystem *
hl_system_new (void)
{
  HlSystem *system = g_new0 (HlSystem, 1);
  system->vars = g_array_sized_new (FALSE, FALSE, sizeof (HlVar), 512);
  system->equations = g_array_sized_new (FALSE, FALSE, sizeof (HlEquation), 256);
  system->specs = g_array_sized_new (FALSE, FALSE, sizeof (HlSpec), 128);
  system->index = g_array_sized_new (FALSE, FALSE, sizeof (int), 1024);
  system->raw = g_array_sized_new (FALSE, FALSE, sizeof (int), 1024);
  system->constants = g_array_sized_new (FALSE, FALSE, sizeof (double), 512);
  system->flow_scale = 1.0;
  return system;
}

void
hl_system_free (HlSystem *system)
{
  if (system == NULL)
    return;
  g_array_unref (system->vars);
  g_array_unref (system->equations);
  g_array_unref (system->specs);
  g_array_unref (system->index);
  g_array_unref (system->raw);
  g_array_unref (system->constants);
  g_clear_pointer (&system->root, g_atomic_rc_box_release);
  g_clear_pointer (&system->fixed_by, g_atomic_rc_box_release);
  g_free (system->x);
  g_free (system);
}

int
hl_system_add_var (HlSystem *system, HlVarKind kind, HlAddress address, double start)
{
  HlVar var = { address, kind, (int) system->vars->len, start, NULL };
  g_array_append_val (system->vars, var);
  return var.parent;
}

int
hl_system_find (const HlSystem *system, int var)
{
  int root = var;
  while (hl_system_var (system, root)->parent != root)
    root = hl_system_var (system, root)->parent;
  while (hl_system_var (system, var)->parent != root)
    {
      int next = hl_system_var (system, var)->parent;
      hl_system_var (system, var)->parent = root;
      var = next;
    }
  return root;
}

/* The older variable becomes the root, so that the result does not depend on the order of merging. */
void
hl_system_merge (HlSystem *system, int a, int b)
{
  a = hl_system_find (system, a);
  b = hl_system_find (system, b);
  if (a == b)
    return;
  int root = MIN (a, b), other = MAX (a, b);
  hl_system_var (system, other)->parent = root;
  double start = hl_system_var (system, other)->start;
  if (isnan (hl_system_var (system, root)->start))
    hl_system_var (system, root)->start = start;
  if (hl_system_var (system, root)->scale == NULL)
    hl_system_var (system, root)->scale = hl_system_var (system, other)->scale;
}

HlEquation *
hl_system_add_equation (HlSystem *system, HlResidual residual, HlVarKind kind, guint32 linear,
                        const int *vars, int n, const double *constants, int n_constants)
{
  g_assert (n >= 1 && n <= HL_EQUATION_MOST);
  HlEquation equation = { .residual = residual, .n = n, .first = (int) system->index->len,
                          .first_constant = (int) system->constants->len, .linear = linear,
                          .output = -1, .component = -1, .kind = kind };
  g_array_append_vals (system->index, vars, (guint) n);
  if (n_constants > 0)
    g_array_append_vals (system->constants, constants, (guint) n_constants);
  g_array_append_val (system->equations, equation);
  return hl_system_equation (system, system->equations->len - 1);
}

HlSpec *
hl_system_add_spec (HlSystem *system, int var, HlAddress address, HlOrigin origin, double value)
{
  HlSpec spec = { var, address, origin, value, hl_var_to_si (hl_system_var (system, var)->kind, value), -1 };
  g_array_append_val (system->specs, spec);
  return hl_system_spec (system, system->specs->len - 1);
}

/* r = x - a: a second value of a class which another value has fixed already. */
static HlStatus
same_as (G_GNUC_UNUSED const HlEquation *equation, const double *a, const double *x, double *r, double *dr)
{
  *r = x[0] - a[0];
  dr[0] = 1.0;
  return HL_OK;
}

/* What is typed fixes before what is merely assumed. */
static void
fix_classes (HlSystem *system)
{
  for (int pass = 0; pass < 2; pass++)
    for (guint k = 0; k < system->specs->len; k++)
      {
        HlSpec *spec = hl_system_spec (system, k);
        if (spec->origin == HL_ORIGIN_TIED || (spec->origin == HL_ORIGIN_GIVEN) != (pass == 0))
          continue;
        int root = system->root[spec->var];
        if (system->fixed_by[root] < 0)
          {
            system->fixed_by[root] = (int) k;
            system->x[root] = spec->value;
            continue;
          }
        int var = spec->var;
        hl_system_add_equation (system, same_as, hl_system_var (system, var)->kind, 1, &var, 1, &spec->value, 1);
        hl_system_spec (system, k)->equation = (int) system->equations->len - 1;
      }
}

/* What the typed flows and powers suggest, these at 1 MJ/kg.  A flow may be one of many, of cooling water or of a drain, so the
 * power of the plant keeps it within bounds; a power may be a pump's, so it says little where it is not the plant's. */
static double
guess_flow_scale (const HlSystem *system)
{
  double flow = 0.0, power = 0.0, of_plant = 0.0;
  for (guint k = 0; k < system->specs->len; k++)
    {
      const HlSpec *spec = hl_system_spec (system, k);
      HlVarKind kind = hl_system_var (system, spec->var)->kind;
      if (spec->origin == HL_ORIGIN_TIED)
        continue;
      double part = hl_system_var (system, system->root[spec->var])->start;
      if (kind == HL_VAR_FLOW)
        flow = fmax (flow, fabs (spec->value) / (isnan (part) ? 1.0 : part));
      if (kind == HL_VAR_POWER)
        power = fmax (power, fabs (spec->value) / 1e6);
      if (kind == HL_VAR_POWER && spec->address.owner == HL_OWNER_PLANT)
        of_plant = fmax (of_plant, fabs (spec->value) / 1e6);
    }
  if (of_plant > 0.0)
    return flow > 0.0 ? fmax (of_plant, fmin (flow, 3.0 * of_plant)) : of_plant;
  if (flow > 0.0)
    return power > 0.0 ? fmax (power, fmin (flow, 30.0 * power)) : flow;
  return power > 0.0 ? power : 1.0;
}

void
hl_system_close (HlSystem *system)
{
  guint n = system->vars->len;
  system->root = g_atomic_rc_box_alloc (sizeof (int) * MAX (n, 1));
  system->fixed_by = g_atomic_rc_box_alloc (sizeof (int) * MAX (n, 1));
  system->x = g_new (double, MAX (n, 1));
  for (guint i = 0; i < n; i++)
    {
      system->root[i] = hl_system_find (system, (int) i);
      system->fixed_by[i] = -1;
    }
  system->flow_scale = guess_flow_scale (system);
  for (guint i = 0; i < n; i++)
    system->x[i] = hl_system_start (hl_system_var (system, i), system->flow_scale);
  fix_classes (system);
  g_array_append_vals (system->raw, system->index->data, system->index->len);
  for (guint i = 0; i < system->index->len; i++)
    g_array_index (system->index, int, i) = system->root[g_array_index (system->index, int, i)];
}

void
hl_system_rescale (HlSystem *system)
{
  system->flow_scale = guess_flow_scale (system);
}

double
hl_system_scale (const HlSystem *system, HlVarKind kind)
{
  switch (kind)
    {
    case HL_VAR_FLOW: return system->flow_scale;
    case HL_VAR_ENTHALPY: return 1e6;
    case HL_VAR_TEMPERATURE: return 300.0;
    case HL_VAR_TEMPERATURE_DIFFERENCE: return 300.0;
    case HL_VAR_ENTROPY: return 3e3;
    case HL_VAR_POWER: return system->flow_scale * 1e6;
    case HL_VAR_CONDUCTANCE: return system->flow_scale * 1e5;
    case HL_VAR_PRESSURE_DIFFERENCE: return 1e6;
    case HL_VAR_STEAM_RATE: return 1e-6;
    case HL_VAR_LENGTH: return 10.0;
    case HL_VAR_AREA: return system->flow_scale * 1e-3;
    case HL_VAR_APERTURE: return 1e4;
    case HL_VAR_IRRADIANCE: return 1e3;
    default: return 1.0;
    }
}

double
hl_system_start (const HlVar *var, double flow_scale)
{
  if (!isnan (var->start))
    return var->kind == HL_VAR_FLOW ? var->start * flow_scale : var->start;
  if (var->scale != NULL)
    switch (var->kind)
      {
      case HL_VAR_PRESSURE: return log (var->scale->p_usual);
      case HL_VAR_ENTHALPY: return hl_fluid_scale_enthalpy (var->scale, 5e5);
      case HL_VAR_TEMPERATURE: return var->scale->T_usual;
      default: break;
      }
  switch (var->kind)
    {
    case HL_VAR_FLOW: return flow_scale;
    case HL_VAR_PRESSURE: return log (5e5);
    case HL_VAR_ENTHALPY: return 5e5;
    case HL_VAR_TEMPERATURE: return 400.0;
    case HL_VAR_TEMPERATURE_DIFFERENCE: return 10.0;
    case HL_VAR_ENTROPY: return 3e3;
    case HL_VAR_VOLUME: return 0.1;
    case HL_VAR_RATIO: return 0.5;
    case HL_VAR_POWER: return flow_scale * 1e6;
    case HL_VAR_CONDUCTANCE: return flow_scale * 1e5;
    case HL_VAR_PRESSURE_DIFFERENCE: return 1e6;
    case HL_VAR_HEAT_RATE: return 2.5;
    case HL_VAR_STEAM_RATE: return 1e-6;
    case HL_VAR_LENGTH: return 5.0;
    case HL_VAR_AREA: return flow_scale * 1e-3;
    case HL_VAR_APERTURE: return 1e4;
    case HL_VAR_IRRADIANCE: return 800.0;
    }
  return 1.0;
}

HlStatus
hl_system_evaluate (const HlSystem *system, int n, double *r, double *dr)
{
  const HlEquation *equation = hl_system_equation (system, n);
  const int *vars = hl_equation_vars (system, equation);
  double x[HL_EQUATION_MOST];
  for (int k = 0; k < equation->n; k++)
    x[k] = system->x[vars[k]];
  HlStatus status = equation->residual (equation, &g_array_index (system->constants, double, equation->first_constant), x, r, dr);
  if (status == HL_OK && !isfinite (*r))
    return HL_NOT_CONVERGED;
  return status;
}

double
hl_var_to_si (HlVarKind kind, double x)
{
  return kind == HL_VAR_PRESSURE ? exp (x) : x;
}

double
hl_var_from_si (HlVarKind kind, double value)
{
  return kind == HL_VAR_PRESSURE ? log (value) : value;
}

double
hl_system_value (const HlSystem *system, int var)
{
  int root = system->root[var];
  /* What was put in reads back as it is, not as its logarithm gives it. */
  const HlSpec *spec = system->fixed_by[root] >= 0 ? hl_system_spec (system, system->fixed_by[root]) : NULL;
  if (spec != NULL && !(fabs (system->x[root] - spec->value) > 0.0))
    return spec->si;
  return hl_var_to_si (hl_system_var (system, var)->kind, system->x[root]);
}

HlVarKind
hl_var_kind_of (HlDimension dimension)
{
  switch (dimension)
    {
    case HL_DIMENSION_PRESSURE: return HL_VAR_PRESSURE;
    case HL_DIMENSION_PRESSURE_DIFFERENCE: return HL_VAR_PRESSURE_DIFFERENCE;
    case HL_DIMENSION_TEMPERATURE: return HL_VAR_TEMPERATURE;
    case HL_DIMENSION_TEMPERATURE_DIFFERENCE: return HL_VAR_TEMPERATURE_DIFFERENCE;
    case HL_DIMENSION_MASS_FLOW: return HL_VAR_FLOW;
    case HL_DIMENSION_ENTHALPY: return HL_VAR_ENTHALPY;
    case HL_DIMENSION_ENTROPY: return HL_VAR_ENTROPY;
    case HL_DIMENSION_VOLUME: return HL_VAR_VOLUME;
    case HL_DIMENSION_POWER: return HL_VAR_POWER;
    case HL_DIMENSION_CONDUCTANCE: return HL_VAR_CONDUCTANCE;
    case HL_DIMENSION_HEAT_RATE: return HL_VAR_HEAT_RATE;
    case HL_DIMENSION_APERTURE: return HL_VAR_APERTURE;
    case HL_DIMENSION_IRRADIANCE: return HL_VAR_IRRADIANCE;
    case HL_DIMENSION_EMISSION:
    case HL_DIMENSION_STEAM_RATE: return HL_VAR_STEAM_RATE;
    case HL_DIMENSION_LENGTH: return HL_VAR_LENGTH;
    case HL_DIMENSION_AREA: return HL_VAR_AREA;
    default: return HL_VAR_RATIO;
    }
}
