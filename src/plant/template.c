/* Plants to start from: the list, and how they are put together.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/template-draft.h"
#include "plant/i18n.h"
#include <math.h>
#include <string.h>

enum { SIMPLE, REGENERATIVE, REHEAT, EXTRACTION, BACK_PRESSURE };

static const HlTemplate templates[] = {
  [SIMPLE] = { "simple", N_("Simple loop"), N_("Boiler, turbine, condenser and pump: the least that makes power from steam."), 0, 0, 0 },
  [REGENERATIVE] = { "regenerative", N_("Regenerative"),
    N_("One turbine with extractions that heat the feedwater: closed heaters, a deaerator among them, drains cascaded."), 1, 8, 4 },
  [REHEAT] = { "reheat", N_("Reheat"), N_("High-pressure section, reheat, low-pressure section; feedwater heaters with a deaerator among them."), 1, 8, 4 },
  [EXTRACTION] = { "extraction-condensing", N_("Extraction-condensing"),
    N_("Process steam and deaerator steam from extractions; the rest makes power down to the condenser."), 0, 0, 0 },
  [BACK_PRESSURE] = { "back-pressure", N_("Back-pressure"), N_("All exhaust goes to the process steam user and the deaerator; power follows the heat."), 0, 0, 0 },
};

guint
hl_template_count (void)
{
  return G_N_ELEMENTS (templates);
}

const HlTemplate *
hl_template_nth (guint n)
{
  return n < G_N_ELEMENTS (templates) ? &templates[n] : NULL;
}

const HlTemplate *
hl_template_lookup (const char *id)
{
  for (guint n = 0; n < G_N_ELEMENTS (templates); n++)
    if (g_strcmp0 (templates[n].id, id) == 0)
      return &templates[n];
  return NULL;
}

HlPlant *
hl_template_build (const HlTemplate *self, int heaters)
{
  heaters = CLAMP (heaters, self->least, self->most);
  switch (self - templates)
    {
    case REGENERATIVE:
      return hl_template_steam_build (heaters, FALSE);
    case REHEAT:
      return hl_template_steam_build (heaters, TRUE);
    case EXTRACTION:
      return hl_template_extraction_build ();
    case BACK_PRESSURE:
      return hl_template_back_pressure_build ();
    default:
      return hl_template_steam_build (0, FALSE);
    }
}

/* --- drafts ------------------------------------------------------------------------ */

static void
advance (HlDraft *draft, HlPlant *next)
{
  hl_plant_unref (draft->plant);
  draft->plant = next;
}

HlDraft
hl_draft_begin (char *title)
{
  g_autoptr (HlPlant) empty = hl_plant_new ();
  HlDraft draft = { hl_plant_with_title (empty, title) };
  g_free (title);
  return draft;
}

HlPlant *
hl_draft_end (HlDraft *draft)
{
  return g_steal_pointer (&draft->plant);
}

void
hl_draft_put (HlDraft *draft, const char *kind, const char *id, const char *name, int x, int y, gboolean is_mirrored,
              const char *option, int choice)
{
  HlComponent *component = hl_component_new (hl_kind_lookup (kind), id, x, y);
  hl_component_set_name (component, name);
  component->is_mirrored = is_mirrored;
  if (option != NULL)
    hl_component_set_option (component, option, choice);
  advance (draft, hl_plant_with_component (draft->plant, component));
}

void
hl_draft_turn (HlDraft *draft, const char *id, int turn)
{
  HlComponent *component = hl_component_copy (hl_plant_find_component (draft->plant, id));
  component->turn = turn;
  advance (draft, hl_plant_with_component (draft->plant, component));
}

void
hl_draft_assume (HlDraft *draft, const char *text, double si)
{
  g_autoptr (GError) error = NULL;
  HlAddress address;
  HlValue value = { .origin = HL_ORIGIN_ASSUMED, .value = si };
  HlPlant *next;
  if (!hl_address_parse (text, draft->plant, &address, &error)
      || (next = hl_plant_with_value (draft->plant, &address, isnan (si) ? NULL : &value, &error)) == NULL)
    g_error ("template: %s", error->message);      /* a mistake in this program, not in what anybody typed */
  advance (draft, next);
}

void
hl_draft_line (HlDraft *draft, const char *from, const char *to, const HlGridPoint *bends, guint n_bends)
{
  g_auto (GStrv) out = g_strsplit (from, ".", 2);
  g_auto (GStrv) in = g_strsplit (to, ".", 2);
  g_autofree char *id = hl_plant_free_id (draft->plant, "");
  HlStream *stream = hl_stream_new (id, out[0], out[1], in[0], in[1]);
  stream->route = g_memdup2 (bends, n_bends * sizeof *bends);
  stream->n_route = n_bends;
  advance (draft, hl_plant_with_stream (draft->plant, stream));
}

void
hl_draft_shaft (HlDraft *draft, const char *const *joins, guint n)
{
  g_autofree char *id = hl_plant_free_id (draft->plant, "S");
  advance (draft, hl_plant_with_shaft (draft->plant, hl_shaft_new (id, joins, n)));
}
