/* Findings from a failed solve: which block, what its equation demands, with the numbers.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/diagnose.h"
#include "engine/names.h"
#include "plant/i18n.h"
#include <math.h>

static HlAddress
address_of (const HlModel *model, const HlEquation *e)
{
  if (e->component < 0)
    return hl_address_plant (g_intern_static_string (""));
  return hl_address_component (hl_plant_component (model->plant, (guint) e->component)->id, g_intern_static_string (""));
}

static void
offer_spec (const HlModel *model, const HlSpec *spec, HlFinding *finding)
{
  g_autofree char *name = hl_plant_describe (model->plant, &spec->address);
  hl_finding_mend (finding, HL_MEND_EDIT, spec->address, NAN, g_strdup_printf (_("Change %s"), name));
}

/* Values that were put in and that the block's equations use, to go and change. */
static void
offer_inputs (const HlModel *model, const int *equations, int n, HlFinding *finding)
{
  g_autoptr (GArray) specs = hl_diagnose_surplus (model, equations, n);
  for (guint k = 0; k < specs->len && finding->n_mends < 3; k++)
    offer_spec (model, hl_system_spec (model->system, g_array_index (specs, int, k)), finding);
}

/* A typed pressure or temperature which lies outside the range by itself, whatever equation stumbled over it. */
static const HlSpec *
spec_outside (const HlModel *model, const HlFluid *fluid)
{
  HlFluidLimits limits;
  hl_fluid_limits (fluid, &limits);
  for (guint k = 0; k < model->system->specs->len; k++)
    {
      const HlSpec *spec = hl_system_spec (model->system, k);
      HlVarKind kind = hl_system_var (model->system, spec->var)->kind;
      double value = hl_var_to_si (kind, spec->value);
      if (spec->origin == HL_ORIGIN_TIED || spec->address.key[0] == '\0')
        continue;
      if (kind == HL_VAR_PRESSURE && !(value >= limits.p_min && value <= limits.p_max))
        return spec;
      if (kind == HL_VAR_TEMPERATURE && !(value >= limits.T_min && value <= limits.T_max))
        return spec;
    }
  return NULL;
}

/* Arguments of the property call that the equation makes, as far as they show: pressure, temperature, enthalpy. */
static void
arguments (const HlModel *model, const HlEquation *e, const HlFluidLimits *limits, double *p, double *T, double *h, int *var)
{
  const HlSystem *system = model->system;
  const int *vars = hl_equation_vars (system, e);
  for (int k = 0; k < e->n; k++)
    {
      HlVarKind kind = hl_system_var (system, vars[k])->kind;
      double value = hl_system_value (system, vars[k]);
      if (kind == HL_VAR_PRESSURE && (!isfinite (*p) || value > limits->p_max || value < limits->p_min))
        {
          *p = value;
          *var = g_array_index (system->raw, int, e->first + k);
        }
      if (kind == HL_VAR_TEMPERATURE)
        *T = value;
      if (kind == HL_VAR_ENTHALPY && !isfinite (*h))
        *h = value;
    }
}

/* A pressure or temperature beyond the fluid's range, with the limit named. */
static gboolean
find_range (const HlModel *model, int equation, HlFindings *findings)
{
  HlSystem *system = model->system;
  const HlEquation *e = hl_system_equation (system, equation);
  double r, dr[HL_EQUATION_MOST], p = NAN, T = NAN, h = NAN;
  int var = -1;
  HlStatus status = e->fluid != NULL ? hl_system_evaluate (system, equation, &r, dr) : HL_OK;
  if (status == HL_OK)
    return FALSE;
  HlFluidLimits limits;
  HlSaturation sat;
  hl_fluid_limits (e->fluid, &limits);
  arguments (model, e, &limits, &p, &T, &h, &var);
  if (!isfinite (p))
    return FALSE;
  gboolean wants_saturation = p > limits.p_critical && p <= limits.p_max && hl_fluid_saturation_p (e->fluid, p, &sat) != HL_OK && hl_equation_wants_saturation (e);
  g_autofree char *why = wants_saturation ? hl_fluid_explain_failure (e->fluid, HL_OUTSIDE_RANGE, "px", p, 0.0)
                       : isfinite (T) ? hl_fluid_explain_failure (e->fluid, status, "pT", p, T)
                       : hl_fluid_explain_failure (e->fluid, status, "ph", p, h);
  const HlSpec *spec = wants_saturation ? NULL : spec_outside (model, e->fluid);
  g_autofree char *name = spec != NULL ? hl_plant_describe (model->plant, &spec->address) : hl_name_var (model, var);
  g_autofree char *where = hl_name_components (model, &equation, 1);
  HlFinding *finding = hl_findings_add (findings, HL_GRADE_ERROR, "outside-range", spec != NULL ? spec->address : address_of (model, e),
    e->fluid == model->water
      ? g_strdup_printf (_("%s: a state lies outside the range of the property formulation: %s. Look at %s."), where, why, name)
      : g_strdup_printf (_("%s: a state lies outside the range of %s: %s. Look at %s."), where, _(hl_fluid_name (e->fluid)), why, name));
  if (spec != NULL)
    offer_spec (model, spec, finding);
  else
    offer_inputs (model, &equation, 1, finding);
  return TRUE;
}

static void
find_singular (const HlModel *model, const int *equations, int n, const HlNumbers *numbers, HlFindings *findings)
{
  g_autoptr (GPtrArray) names = g_ptr_array_new_with_free_func (g_free);
  for (int k = 0; k < numbers->n_null && names->len < 4; k++)
    g_ptr_array_add (names, hl_name_var (model, numbers->null_vars[k]));
  g_autofree char *list = hl_name_list ((char **) names->pdata, names->len, FALSE);
  g_autofree char *where = hl_name_components (model, equations, n);
  HlFinding *finding = hl_findings_add (findings, HL_GRADE_ERROR, "not-determined", address_of (model, hl_system_equation (model->system, equations[0])),
    g_strdup_printf (_("The values around %s do not settle %s: as many are given as needed, but some say the same thing. Give another one, and let one of those be found."),
                     where, list));
  for (int k = 0; k < numbers->n_null && k < 3; k++)
    {
      HlAddress address = hl_name_address (model, numbers->null_vars[k]);
      if (hl_plant_quantity_kind (model->plant, &address) == NULL)
        continue;
      g_autofree char *name = hl_name_var (model, numbers->null_vars[k]);
      hl_finding_mend (finding, HL_MEND_EDIT, address, NAN, g_strdup_printf (_("Enter %s"), name));
    }
}

void
hl_diagnose_numbers (const HlModel *model, const HlStructure *structure, const HlNumbers *numbers, HlFindings *findings)
{
  if (numbers->failed == HL_FAILED_NOT)
    return;
  const int *equations = structure->equations;
  int n = structure->n_solved;
  if (numbers->block >= 0)
    {
      equations += structure->start[numbers->block];
      n = structure->start[numbers->block + 1] - structure->start[numbers->block];
    }
  int worst = numbers->worst >= 0 ? numbers->worst : equations[0];
  if (numbers->failed == HL_FAILED_SINGULAR)
    {
      find_singular (model, equations, n, numbers, findings);
      return;
    }
  if (find_range (model, worst, findings))
    return;
  for (int k = 0; k < n; k++)
    if (find_range (model, equations[k], findings))
      return;
  g_autofree char *where = hl_name_components (model, equations, n);
  g_autofree char *words = hl_name_equation (model, worst, FALSE), *values = hl_name_equation (model, worst, TRUE);
  HlFinding *finding = hl_findings_add (findings, HL_GRADE_ERROR, "no-solution", address_of (model, hl_system_equation (model->system, worst)),
    g_strdup_printf (_("No solution at %s. What could not be met: %s. Last values: %s."), where, words, values));
  offer_inputs (model, equations, n, finding);
}
