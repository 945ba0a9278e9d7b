/* Findings about media: a circuit carries one, and only one.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/diagnose.h"
#include "engine/circuits.h"
#include "engine/names.h"
#include "plant/circuit.h"
#include "plant/i18n.h"

#define MOST_NAMED 3

/* One medium of a circuit: how many streams carry it, and their numbers. */
typedef struct {
  const HlFluid *fluid;
  const char    *medium;
  guint          n;
  const char    *streams[MOST_NAMED + 1];
} Share;

static gboolean
is_all_one (const HlModel *model)
{
  guint n = hl_plant_n_streams (model->plant);
  for (guint i = 1; i < n; i++)
    if (hl_model_node (model, (int) i)->fluid != hl_model_node (model, 0)->fluid)
      return FALSE;
  return TRUE;
}

static void
count (GArray *shares, const HlFluid *fluid, const HlStream *stream)
{
  Share *share = NULL;
  for (guint k = 0; k < shares->len && share == NULL; k++)
    if (g_array_index (shares, Share, k).fluid == fluid)
      share = &g_array_index (shares, Share, k);
  if (share == NULL)
    {
      Share first = { .fluid = fluid, .medium = stream->medium };
      g_array_append_val (shares, first);
      share = &g_array_index (shares, Share, shares->len - 1);
    }
  if (share->n < MOST_NAMED)
    share->streams[share->n] = stream->id;
  share->n++;
}

static int
compare_shares (gconstpointer a, gconstpointer b)
{
  return (int) ((const Share *) b)->n - (int) ((const Share *) a)->n;
}

/* "water (stream 1, 2, 3 ...)" */
static char *
words_of (const Share *share)
{
  g_autofree char *list = g_strjoinv (", ", (char **) share->streams);
  return share->n == 1 ? g_strdup_printf (_("%s (stream %s)"), _(hl_fluid_name (share->fluid)), list)
         : g_strdup_printf (share->n > MOST_NAMED ? _("%s (streams %s …)") : _("%s (streams %s)"), _(hl_fluid_name (share->fluid)), list);
}

static void
report (const HlStream *first, GArray *shares, HlFindings *findings)
{
  g_autoptr (GPtrArray) words = g_ptr_array_new_with_free_func (g_free);
  HlAddress at = hl_address_stream (first->id, g_intern_static_string (""));
  g_array_sort (shares, compare_shares);
  for (guint k = 0; k < shares->len; k++)
    g_ptr_array_add (words, words_of (&g_array_index (shares, Share, k)));
  g_autofree char *list = hl_name_list ((char **) words->pdata, words->len, FALSE);
  HlFinding *finding = hl_findings_add (findings, HL_GRADE_ERROR, "mixed-media", at,
    g_strdup_printf (_("In the circuit of stream %s different media meet: %s. A circuit carries one medium; separate them by an exchanger, or make them one."),
                     first->id, list));
  for (guint k = 0; k < MIN (shares->len, MOST_NAMED); k++)
    {
      const Share *share = &g_array_index (shares, Share, k);
      hl_finding_mend_medium (finding, at, share->medium, g_strdup_printf (_("Make the circuit all %s"), _(hl_fluid_name (share->fluid))));
    }
}

gboolean
hl_diagnose_media (const HlModel *model, HlFindings *findings)
{
  guint n = hl_plant_n_streams (model->plant);
  gboolean found = FALSE;
  if (is_all_one (model))
    return FALSE;
  g_autofree int *circuits = hl_plant_circuits (model->plant);
  for (guint i = 0; i < n; i++)
    {
      if (circuits[i] != (int) i)
        continue;
      g_autoptr (GArray) shares = g_array_new (FALSE, TRUE, sizeof (Share));
      for (guint k = i; k < n; k++)
        if (circuits[k] == (int) i)
          count (shares, hl_model_node (model, (int) k)->fluid, hl_plant_stream (model->plant, k));
      if (shares->len < 2)
        continue;
      report (hl_plant_stream (model->plant, i), shares, findings);
      found = TRUE;
    }
  return found;
}
