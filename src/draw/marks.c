/* What differs between two plants, as marks on the drawing: added, changed, removed.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/marks.h"
#include <math.h>
#include "plant/i18n.h"

struct _HlMarks {
  GHashTable *marks;                  /* interned id -> HlMark */
  GArray     *components, *streams;   /* removed; guint */
  guint       counts[HL_N_MARKS];
};

const char *
hl_mark_name (HlMark mark)
{
  static const char *const names[HL_N_MARKS] = { "", N_("added"), N_("changed"), N_("removed") };
  g_return_val_if_fail ((guint) mark < HL_N_MARKS, NULL);
  return mark != HL_MARK_NONE ? _(names[mark]) : "";
}

static gboolean
is_name (const HlChange *change)
{
  return g_str_has_suffix (hl_change_where (change), ".name");
}

static gboolean
has (const HlPlant *plant, const char *id)
{
  return hl_plant_find_component (plant, id) != NULL || hl_plant_find_stream (plant, id) != NULL;
}

/* What is removed and added again under its id is there in both, and another. */
static void
mark (HlMarks *self, const HlPlant *reference, const HlPlant *plant, const HlChange *change)
{
  const char *id = hl_change_owner (change);
  HlMark kind = hl_change_kind (change) == HL_CHANGE_ADD ? HL_MARK_ADDED : HL_MARK_CHANGED;
  if (hl_change_is_look (change) || is_name (change) || !has (plant, id))
    return;
  if (kind == HL_MARK_ADDED && has (reference, id))
    kind = HL_MARK_CHANGED;
  if (!g_hash_table_contains (self->marks, id))
    g_hash_table_insert (self->marks, (gpointer) g_intern_string (id), GINT_TO_POINTER (kind));
}

HlMarks *
hl_marks_new (const HlPlant *reference, const HlPlant *plant)
{
  HlMarks *self;
  g_autoptr (GPtrArray) changes = NULL;
  GHashTableIter iter;
  gpointer kind;
  g_return_val_if_fail (reference != NULL && plant != NULL, NULL);
  self = g_new0 (HlMarks, 1);
  self->marks = g_hash_table_new (g_str_hash, g_str_equal);
  self->components = g_array_new (FALSE, FALSE, sizeof (guint));
  self->streams = g_array_new (FALSE, FALSE, sizeof (guint));
  changes = hl_changes_between (reference, plant);
  for (guint i = 0; i < changes->len; i++)
    mark (self, reference, plant, changes->pdata[i]);
  for (guint i = 0; i < hl_plant_n_components (reference); i++)
    if (hl_plant_find_component (plant, hl_plant_component (reference, i)->id) == NULL)
      g_array_append_val (self->components, i);
  for (guint i = 0; i < hl_plant_n_streams (reference); i++)
    if (hl_plant_find_stream (plant, hl_plant_stream (reference, i)->id) == NULL)
      g_array_append_val (self->streams, i);
  g_hash_table_iter_init (&iter, self->marks);
  while (g_hash_table_iter_next (&iter, NULL, &kind))
    self->counts[GPOINTER_TO_INT (kind)]++;
  self->counts[HL_MARK_REMOVED] = self->components->len + self->streams->len;
  return self;
}

void
hl_marks_free (HlMarks *self)
{
  if (self == NULL)
    return;
  g_hash_table_unref (self->marks);
  g_array_unref (self->components);
  g_array_unref (self->streams);
  g_free (self);
}

HlMark
hl_marks_of (const HlMarks *self, const char *id)
{
  g_return_val_if_fail (self != NULL && id != NULL, HL_MARK_NONE);
  return (HlMark) GPOINTER_TO_INT (g_hash_table_lookup (self->marks, id));
}

guint
hl_marks_count (const HlMarks *self, HlMark kind)
{
  g_return_val_if_fail (self != NULL && (guint) kind < HL_N_MARKS, 0);
  return self->counts[kind];
}

const GArray *
hl_marks_removed_components (const HlMarks *self)
{
  g_return_val_if_fail (self != NULL, NULL);
  return self->components;
}

const GArray *
hl_marks_removed_streams (const HlMarks *self)
{
  g_return_val_if_fail (self != NULL, NULL);
  return self->streams;
}

/* Drawing */

const HlColour *
hl_mark_colour (const HlTheme *theme, HlMark kind)
{
  g_return_val_if_fail (theme != NULL, NULL);
  return kind == HL_MARK_ADDED ? &theme->good : kind == HL_MARK_REMOVED ? &theme->warning : &theme->accent;
}

void
hl_draw_mark (cairo_t *cr, const HlTheme *theme, HlMark kind, double x, double y, double radius)
{
  double arm = 0.55 * radius;
  if (kind == HL_MARK_NONE)
    return;
  hl_set_colour (cr, &theme->card);
  cairo_arc (cr, x, y, radius + 1.5, 0.0, 2.0 * G_PI);
  cairo_fill (cr);
  hl_set_colour (cr, hl_mark_colour (theme, kind));
  cairo_arc (cr, x, y, radius, 0.0, 2.0 * G_PI);
  cairo_fill (cr);
  hl_set_colour (cr, &theme->card);
  cairo_set_line_width (cr, 0.25 * radius);
  cairo_set_line_cap (cr, CAIRO_LINE_CAP_ROUND);
  cairo_set_line_join (cr, CAIRO_LINE_JOIN_ROUND);
  if (kind == HL_MARK_CHANGED)
    {
      cairo_move_to (cr, x, y - 1.1 * arm);
      cairo_line_to (cr, x + arm, y + 0.65 * arm);
      cairo_line_to (cr, x - arm, y + 0.65 * arm);
      cairo_close_path (cr);
    }
  else
    {
      cairo_move_to (cr, x - arm, y);
      cairo_line_to (cr, x + arm, y);
    }
  if (kind == HL_MARK_ADDED)
    {
      cairo_move_to (cr, x, y - arm);
      cairo_line_to (cr, x, y + arm);
    }
  cairo_stroke (cr);
}
