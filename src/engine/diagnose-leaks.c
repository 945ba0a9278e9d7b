/* Findings about circuits that lose water which nothing makes good.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/diagnose.h"
#include "plant/i18n.h"
#include <math.h>

typedef struct {
  const HlModel  *model;
  HlFindings     *findings;
  const int      *sum;             /* [n vars] of the signs that a flow has in balances: 0 where it only passes */
  const int      *group;           /* [n vars] balances that share flows */
  const gboolean *gains, *loses;   /* by group: does something come in, go out */
} Leaks;

/* Quantities that are flows lost, the value that stops them, and how to say so. */
static const struct { const char *flow, *key; double value; const char *text, *mend; } losses[] = {
  { "lost_flow", "return_fraction", 1.0,
    N_("%s does not return all its steam, and its circuit has no make-up water. Add a make-up, or return all of it."), N_("Return all of it from %s") },
  { "vent_flow", "vent_fraction", 0.0,
    N_("%s lets steam off at its vent, and its circuit has no make-up water. Add a make-up, or let nothing off."), N_("Let nothing off at %s") },
};

static gboolean
drains (const Leaks *leaks, int var)
{
  int root = var >= 0 ? leaks->model->system->root[var] : -1;
  return root >= 0 && leaks->sum[root] != 0 && !leaks->gains[leaks->group[root]] && leaks->loses[leaks->group[root]];
}

/* What one component lets out of a circuit that nothing flows into. */
static gboolean
find_leaks_of (const Leaks *leaks, int c)
{
  const HlComponent *component = hl_plant_component (leaks->model->plant, (guint) c);
  gboolean found = FALSE;
  for (guint k = 0; k < G_N_ELEMENTS (losses); k++)
    if (drains (leaks, hl_model_own_var (leaks->model, c, losses[k].flow)))
      {
        HlAddress at = hl_address_component (component->id, g_intern_static_string (losses[k].key));
        HlFinding *finding = hl_findings_add (leaks->findings, HL_GRADE_ERROR, "no-make-up", at, g_strdup_printf (_(losses[k].text), component->id));
        hl_finding_mend (finding, HL_MEND_GIVE, at, losses[k].value, g_strdup_printf (_(losses[k].mend), component->id));
        found = TRUE;
      }
  int node = g_str_equal (component->kind->id, "boundary") && leaks->model->open_ports->len == 0
             ? hl_model_port_node (leaks->model, c, "inlet") : -1;
  if (node >= 0 && drains (leaks, hl_model_node (leaks->model, node)->m))
    {
      HlAddress at = hl_address_component (component->id, g_intern_static_string ("inlet.m"));
      hl_findings_add (leaks->findings, HL_GRADE_ERROR, "no-make-up", at,
        g_strdup_printf (_("At %s water leaves its circuit, which has no make-up water. Add a make-up, or lead it back."), component->id));
      found = TRUE;
    }
  return found;
}

/* Steam is lost somewhere, and nothing flows in: the balances would force every flow to nothing. */
gboolean
hl_diagnose_leaks (const HlModel *model, HlFindings *findings)
{
  HlSystem *system = model->system;
  guint n = system->vars->len;
  g_autofree int *sum = g_new0 (int, n + 1), *group = g_new (int, n + 1), *parent = g_new (int, n + 1);
  g_autofree gboolean *gains = g_new0 (gboolean, n + 1), *loses = g_new0 (gboolean, n + 1);
  gboolean found = FALSE;
  for (guint i = 0; i < n; i++)
    parent[i] = (int) i;
  for (guint k = 0; k < system->equations->len; k++)
    {
      const HlEquation *e = hl_system_equation (system, k);
      const int *vars = hl_equation_vars (system, e);
      const double *sign = &g_array_index (system->constants, double, e->first_constant);
      if (!e->is_balance)
        continue;
      for (int i = 0; i < e->n; i++)
        {
          sum[vars[i]] += (int) sign[i];
          int a = vars[i], b = vars[0];
          while (parent[a] != a)
            a = parent[a];
          while (parent[b] != b)
            b = parent[b];
          parent[a] = b;
        }
    }
  for (guint i = 0; i < n; i++)
    {
      int root = (int) i;
      while (parent[root] != root)
        root = parent[root];
      group[i] = root;
      gains[root] |= sum[i] > 0;
      loses[root] |= sum[i] < 0;
    }
  Leaks leaks = { model, findings, sum, group, gains, loses };
  for (guint c = 0; c < hl_plant_n_components (model->plant); c++)
    found |= find_leaks_of (&leaks, (int) c);
  return found;
}
