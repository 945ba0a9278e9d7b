/* Findings and what their buttons do.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/finding.h"
#include "engine/finding-private.h"
#include "plant/circuit.h"
#include "plant/i18n.h"

static const struct { const char *id, *name; } grades[] = {
  [HL_GRADE_HINT] = { "hint", N_("hint") },
  [HL_GRADE_CAUTION] = { "caution", N_("caution") },
  [HL_GRADE_WARNING] = { "warning", N_("warning") },
  [HL_GRADE_ERROR] = { "error", N_("error") },
};

const char *
hl_grade_id (HlGrade grade)
{
  g_return_val_if_fail ((guint) grade < G_N_ELEMENTS (grades), "error");
  return grades[grade].id;
}

const char *
hl_grade_name (HlGrade grade)
{
  g_return_val_if_fail ((guint) grade < G_N_ELEMENTS (grades), "error");
  return _(grades[grade].name);
}

static void
clear_finding (gpointer data)
{
  HlFinding *finding = data;
  for (guint k = 0; k < finding->n_mends; k++)
    g_free (finding->mends[k].text);
  g_free (finding->mends);
  g_free (finding->text);
}

void
hl_findings_init (HlFindings *findings)
{
  findings->list = g_array_new (FALSE, FALSE, sizeof (HlFinding));
  g_array_set_clear_func (findings->list, clear_finding);
}

void
hl_findings_clear (HlFindings *findings)
{
  g_clear_pointer (&findings->list, g_array_unref);
}

HlFinding *
hl_findings_add (HlFindings *findings, HlGrade grade, const char *code, HlAddress at, char *text)
{
  HlFinding finding = { .grade = grade, .code = code, .text = text, .at = at };
  g_array_append_val (findings->list, finding);
  return &g_array_index (findings->list, HlFinding, findings->list->len - 1);
}

void
hl_finding_mend (HlFinding *finding, HlMendKind kind, HlAddress address, double value, char *text)
{
  finding->mends = g_renew (HlMend, finding->mends, finding->n_mends + 1);
  finding->mends[finding->n_mends++] = (HlMend) { kind, address, value, text, NULL };
}

void
hl_finding_mend_medium (HlFinding *finding, HlAddress stream, const char *medium, char *text)
{
  hl_finding_mend (finding, HL_MEND_MEDIUM, stream, 0.0, text);
  finding->mends[finding->n_mends - 1].medium = g_intern_string (medium);
}

gboolean
hl_finding_may_be_dismissed (const HlFinding *finding)
{
  return finding->grade <= HL_GRADE_CAUTION;
}

void
hl_findings_set_aside (HlFindings *findings, const HlPlant *plant, HlFindings *dismissed)
{
  hl_findings_init (dismissed);
  if (hl_plant_n_dismissed (plant) == 0)
    return;
  GArray *all = findings->list;
  hl_findings_init (findings);
  g_array_set_clear_func (all, NULL);
  for (guint k = 0; k < all->len; k++)
    {
      HlFinding *finding = &g_array_index (all, HlFinding, k);
      gboolean is_aside = hl_finding_may_be_dismissed (finding) && hl_plant_is_dismissed (plant, finding->code, &finding->at);
      g_array_append_vals (is_aside ? dismissed->list : findings->list, finding, 1);
    }
  g_array_unref (all);
}

/* Insertion keeps the order of equals; there are never many. */
void
hl_findings_sort (HlFindings *findings)
{
  HlFinding *list = (HlFinding *) (void *) findings->list->data;
  for (guint i = 1; i < findings->list->len; i++)
    {
      HlFinding moving = list[i];
      guint k = i;
      for (; k > 0 && list[k - 1].grade < moving.grade; k--)
        list[k] = list[k - 1];
      list[k] = moving;
    }
}

gboolean
hl_findings_have (const HlFindings *findings, HlGrade at_least)
{
  for (guint k = 0; k < findings->list->len; k++)
    if (g_array_index (findings->list, HlFinding, k).grade >= at_least)
      return TRUE;
  return FALSE;
}

/* A valve in the middle of a stream: the stream ends at it, and a new one goes on. */
static HlPlant *
insert_valve (HlPlant *plant, const char *id, GError **error)
{
  const HlStream *stream = hl_plant_find_stream (plant, id);
  const HlKind *kind = hl_kind_lookup ("valve");
  const HlComponent *from, *to;
  guint from_port, to_port;
  int x = 0, y = 0, x1, y1;
  HlSide side;
  if (stream == NULL || kind == NULL)
    {
      g_set_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_ADDRESS, _("there is no stream %s any more"), id);
      return NULL;
    }
  from = hl_plant_find_component (plant, stream->from_id);
  to = hl_plant_find_component (plant, stream->to_id);
  if (from != NULL && to != NULL && hl_component_find_port (from, stream->from_port, &from_port)
      && hl_component_find_port (to, stream->to_port, &to_port))
    {
      hl_component_port_place (from, from_port, &x, &y, &side);
      hl_component_port_place (to, to_port, &x1, &y1, &side);
      x = (x + x1) / 2;
      y = (y + y1) / 2;
    }
  g_autofree char *valve_id = hl_plant_free_id (plant, kind->letter);
  g_autofree char *stream_id = hl_plant_free_id (plant, "");
  HlComponent *valve = hl_component_new (kind, g_intern_string (valve_id), x, y);
  g_autoptr (HlPlant) with_valve = hl_plant_with_component (plant, valve);
  HlStream *first = hl_stream_copy (stream);
  HlStream *second = hl_stream_new (g_intern_string (stream_id), valve->id, g_intern_static_string ("outlet"), stream->to_id, stream->to_port);
  first->to_id = valve->id;
  first->to_port = g_intern_static_string ("inlet");
  g_clear_pointer (&first->route, g_free);
  first->n_route = 0;
  second->medium = stream->medium;
  g_autoptr (HlPlant) with_first = hl_plant_with_stream (with_valve, first);
  return hl_plant_with_stream (with_first, second);
}

HlPlant *
hl_mend_apply (const HlMend *mend, HlPlant *plant, GError **error)
{
  g_return_val_if_fail (mend != NULL && plant != NULL, NULL);
  switch (mend->kind)
    {
    case HL_MEND_GIVE:
      {
        HlValue value = { .origin = HL_ORIGIN_ASSUMED, .value = mend->value };
        return hl_plant_with_value (plant, &mend->address, &value, error);
      }
    case HL_MEND_LET_GO:
      return hl_plant_with_value (plant, &mend->address, NULL, error);
    case HL_MEND_INSERT_VALVE:
      return insert_valve (plant, mend->address.id, error);
    case HL_MEND_MEDIUM:
      return hl_plant_with_medium (plant, mend->address.id, mend->medium, error);
    case HL_MEND_EDIT:
    case HL_MEND_CONNECT:
      break;
    }
  return hl_plant_ref (plant);
}
