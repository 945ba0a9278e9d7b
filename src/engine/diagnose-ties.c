/* Findings about ties: what they name is gone, or they run in a circle.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/diagnose.h"
#include "plant/i18n.h"
#include <math.h>

static void
offer_change (const HlModel *model, HlFinding *finding, HlAddress address)
{
  g_autofree char *name = hl_plant_describe (model->plant, &address);
  hl_finding_mend (finding, HL_MEND_EDIT, address, NAN, g_strdup_printf (_("Change %s"), name));
}

/* Whether the address names a state or a quantity that some equation makes. */
static gboolean
is_made (const HlModel *model, const HlAddress *address)
{
  int node;
  char letter;
  return hl_model_find_state (model, address, &node, &letter) || hl_model_find_var (model, address) >= 0;
}

/* "H1.steam.p, but there is no component H1 any more": why what a tie names cannot be had. */
static char *
why_missing (const HlModel *model, const HlTie *tie)
{
  const HlPlant *plant = model->plant;
  for (guint k = 0; k < hl_tie_n_of (tie); k++)
    {
      const HlAddress *of = hl_tie_of (tie, k);
      g_autofree char *text = hl_address_to_text (of);
      if (of->owner == HL_OWNER_COMPONENT && hl_plant_find_component (plant, of->id) == NULL)
        return g_strdup_printf (_("%s, but there is no component %s any more"), text, of->id);
      if (of->owner == HL_OWNER_STREAM && hl_plant_find_stream (plant, of->id) == NULL)
        return g_strdup_printf (_("%s, but there is no stream %s any more"), text, of->id);
      if (hl_plant_quantity_kind (plant, of) == NULL)
        return g_strdup_printf (_("%s, which %s does not have as it is now"), text, of->owner == HL_OWNER_PLANT ? _("the plant") : of->id);
    }
  /* The kind has it, but nothing here makes it: an efficiency of a plant without fuel. */
  for (guint k = 0; k < hl_tie_n_of (tie); k++)
    if (!is_made (model, hl_tie_of (tie, k)))
      {
        g_autofree char *text = hl_address_to_text (hl_tie_of (tie, k));
        return g_strdup_printf (_("%s, which nothing in this plant makes"), text);
      }
  return g_strdup (_("more quantities than a tie can hold"));
}

static void
find_broken (const HlModel *model, HlFindings *findings)
{
  for (guint k = 0; k < model->broken_ties->len; k++)
    {
      HlAddress at = g_array_index (model->broken_ties, HlAddress, k);
      const HlValue *value = hl_plant_value (model->plant, &at);
      if (value == NULL || value->origin != HL_ORIGIN_TIED)
        continue;
      g_autofree char *name = hl_plant_describe (model->plant, &at), *why = why_missing (model, value->tie);
      HlFinding *finding = hl_findings_add (findings, HL_GRADE_ERROR, "tie-broken", at,
        g_strdup_printf (_("%s is tied to %s. Tie it to another quantity, give it a number, or let it be found."), name, why));
      offer_change (model, finding, at);
      hl_finding_mend (finding, HL_MEND_LET_GO, at, NAN, g_strdup_printf (_("Let %s be found"), name));
    }
}

/* --- circles ------------------------------------------------------------------------- */

typedef struct {
  const HlModel *model;
  int           *tie_of;      /* [n vars] of a root: the spec of its tie; -1 */
  guint8        *state;       /* [n specs] 0 not seen, 1 on the way, 2 done */
  GArray        *way;         /* int: specs */
} Search;

static void
report_circle (const Search *search, guint first, HlFindings *findings)
{
  const HlModel *model = search->model;
  guint n = search->way->len - first;
  g_autoptr (GString) ties = g_string_new (NULL);
  HlAddress at = hl_system_spec (model->system, g_array_index (search->way, int, first))->address;
  for (guint k = 0; k < n; k++)
    {
      const HlSpec *spec = hl_system_spec (model->system, g_array_index (search->way, int, first + k));
      const HlValue *value = hl_plant_value (model->plant, &spec->address);
      g_autofree char *where = hl_address_to_text (&spec->address), *tie = value != NULL ? hl_tie_format (model->plant, &spec->address, value) : NULL;
      g_string_append_printf (ties, "%s%s = %s", k > 0 ? ", " : "", where, tie != NULL ? tie : "");
    }
  HlFinding *finding = hl_findings_add (findings, HL_GRADE_ERROR, "tie-circle", at,
    n == 1 ? g_strdup_printf (_("A tie leads back to itself: %s; both are the same number in this plant. Give it a number, or tie it to something else."), ties->str)
           : g_strdup_printf (_("Ties run in a circle: %s. None of them can be worked out before the others. Give one of them a number, or let it be found."), ties->str));
  for (guint k = 0; k < n && k < 3; k++)
    offer_change (model, finding, hl_system_spec (model->system, g_array_index (search->way, int, first + k))->address);
}

/* Follows a tie to what it names; comes upon one that is still on the way where they run in a circle. */
static gboolean
follow (Search *search, int index, HlFindings *findings)
{
  HlSystem *system = search->model->system;
  const HlEquation *e = hl_system_equation (system, hl_system_spec (system, index)->equation);
  const int *vars = hl_equation_vars (system, e);
  gboolean found = FALSE;
  search->state[index] = 1;
  g_array_append_val (search->way, index);
  for (int k = 1; k < e->n && !found; k++)
    {
      int next = search->tie_of[vars[k]];
      if (next < 0 || search->state[next] == 2)
        continue;
      if (search->state[next] == 0)
        {
          found = follow (search, next, findings);
          continue;
        }
      guint first = 0;
      while (g_array_index (search->way, int, first) != next)
        first++;
      report_circle (search, first, findings);
      found = TRUE;
    }
  search->state[index] = 2;
  g_array_set_size (search->way, search->way->len - 1);
  return found;
}

static gboolean
find_circles (const HlModel *model, HlFindings *findings)
{
  HlSystem *system = model->system;
  guint n_vars = system->vars->len, n_specs = system->specs->len;
  g_autofree int *tie_of = g_new (int, n_vars + 1);
  g_autofree guint8 *state = g_new0 (guint8, n_specs + 1);
  g_autoptr (GArray) way = g_array_new (FALSE, FALSE, sizeof (int));
  Search search = { model, tie_of, state, way };
  gboolean found = FALSE;
  for (guint v = 0; v <= n_vars; v++)
    tie_of[v] = -1;
  for (guint k = 0; k < n_specs; k++)
    {
      const HlSpec *spec = hl_system_spec (system, k);
      if (spec->origin == HL_ORIGIN_TIED && spec->equation >= 0)
        tie_of[system->root[spec->var]] = (int) k;
    }
  for (guint k = 0; k < n_specs; k++)
    if (hl_system_spec (system, k)->origin == HL_ORIGIN_TIED && hl_system_spec (system, k)->equation >= 0 && state[k] == 0)
      found |= follow (&search, (int) k, findings);
  return found;
}

gboolean
hl_diagnose_ties (const HlModel *model, HlFindings *findings)
{
  find_broken (model, findings);
  return !find_circles (model, findings);
}
