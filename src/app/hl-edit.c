/* What the canvas can do to a plant, as functions from plant to plant.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-edit.h"
#include "plant/circuit.h"
#include "plant/i18n.h"

#define CLEARANCE 2     /* free grid units round a component that finds its own place */

static gboolean
is_among (const char *id, const char *const *ids, guint n)
{
  for (guint i = 0; i < n; i++)
    if (g_str_equal (ids[i], id))
      return TRUE;
  return FALSE;
}

/* Replaces *@plant by @next, which was made from it. */
static void
advance (HlPlant **plant, HlPlant *next)
{
  hl_plant_unref (*plant);
  *plant = next;
}

HlPlant *
hl_edit_add (const HlPlant *plant, const HlKind *kind, int x, int y, const char **id)
{
  g_autofree char *free_id = hl_plant_free_id (plant, kind->letter);
  if (id != NULL)
    *id = g_intern_string (free_id);
  return hl_plant_with_component (plant, hl_component_new (kind, free_id, x, y));
}

/* A line between two things that move together moves with them: its bends and its label. */
static void
move_inner_streams (HlPlant **plant, const char *const *ids, guint n, int dx, int dy)
{
  for (guint i = 0; i < hl_plant_n_streams (*plant); i++)
    {
      const HlStream *stream = hl_plant_stream (*plant, i);
      HlStream *moved;
      if (stream->n_route == 0 && !stream->has_label_place)
        continue;
      if (!is_among (stream->from_id, ids, n) || !is_among (stream->to_id, ids, n))
        continue;
      moved = hl_stream_copy (stream);
      for (guint k = 0; k < moved->n_route; k++)
        {
          moved->route[k].x += dx;
          moved->route[k].y += dy;
        }
      moved->label_x += dx;
      moved->label_y += dy;
      advance (plant, hl_plant_with_stream (*plant, moved));
    }
}

HlPlant *
hl_edit_move (const HlPlant *plant, const char *const *ids, guint n, int dx, int dy)
{
  HlPlant *result = hl_plant_ref ((HlPlant *) plant);
  for (guint i = 0; i < n; i++)
    {
      const HlComponent *component = hl_plant_find_component (result, ids[i]);
      HlComponent *moved;
      if (component == NULL)
        continue;
      moved = hl_component_copy (component);
      moved->x += dx;
      moved->y += dy;
      advance (&result, hl_plant_with_component (result, moved));
    }
  move_inner_streams (&result, ids, n, dx, dy);
  return result;
}

/* Middle of the components on the grid. */
static void
middle (const HlPlant *plant, const char *const *ids, guint n, int *x, int *y)
{
  int left = G_MAXINT, right = G_MININT, top = G_MAXINT, bottom = G_MININT;
  for (guint i = 0; i < n; i++)
    {
      const HlComponent *component = hl_plant_find_component (plant, ids[i]);
      if (component == NULL)
        continue;
      left = MIN (left, component->x);
      right = MAX (right, component->x);
      top = MIN (top, component->y);
      bottom = MAX (bottom, component->y);
    }
  *x = (int) (((gint64) left + right) / 2);
  *y = (int) (((gint64) top + bottom) / 2);
}

static void
turn_about (HlComponent *component, int cx, int cy)
{
  int dx = component->x - cx, dy = component->y - cy;
  component->x = cx - dy;
  component->y = cy + dx;
  component->turn = (component->turn + 1) % 4;
}

/* The mirror comes before the turn, so a left-right flip of the turned symbol turns it back the other way. */
static void
mirror_about (HlComponent *component, int cx, int cy)
{
  component->x = 2 * cx - component->x;
  component->turn = (4 - component->turn) % 4;
  component->is_mirrored = !component->is_mirrored;
}

static HlPlant *
change_about_middle (const HlPlant *plant, const char *const *ids, guint n, void (*change) (HlComponent *, int, int))
{
  HlPlant *result = hl_plant_ref ((HlPlant *) plant);
  int cx, cy;
  middle (plant, ids, n, &cx, &cy);
  for (guint i = 0; i < n; i++)
    {
      const HlComponent *component = hl_plant_find_component (result, ids[i]);
      HlComponent *changed;
      if (component == NULL)
        continue;
      changed = hl_component_copy (component);
      change (changed, cx, cy);
      advance (&result, hl_plant_with_component (result, changed));
    }
  return result;
}

HlPlant *
hl_edit_turn (const HlPlant *plant, const char *const *ids, guint n)
{
  return change_about_middle (plant, ids, n, turn_about);
}

HlPlant *
hl_edit_mirror (const HlPlant *plant, const char *const *ids, guint n)
{
  return change_about_middle (plant, ids, n, mirror_about);
}

HlPlant *
hl_edit_delete (const HlPlant *plant, const char *const *ids, guint n)
{
  g_autofree const char **list = g_new0 (const char *, n + 1);
  for (guint i = 0; i < n; i++)
    list[i] = ids[i];
  return hl_plant_without (plant, list);
}

/* Copying */

static const char *
copy_of (GHashTable *copies, const char *id)
{
  return g_hash_table_lookup (copies, id);
}

static void
copy_components (HlPlant **plant, const HlPlant *from, const char *const *ids, guint n, int dx, int dy, GHashTable *copies, GPtrArray *list)
{
  for (guint i = 0; i < n; i++)
    {
      const HlComponent *component = hl_plant_find_component (from, ids[i]);
      g_autofree char *free_id = NULL;
      HlComponent *copy;
      if (component == NULL)
        continue;
      free_id = hl_plant_free_id (*plant, component->kind->letter);
      copy = hl_component_copy (component);
      copy->id = g_intern_string (free_id);
      copy->x += dx;
      copy->y += dy;
      g_hash_table_insert (copies, (gpointer) component->id, (gpointer) copy->id);
      g_ptr_array_add (list, (gpointer) copy->id);
      advance (plant, hl_plant_with_component (*plant, copy));
    }
}

static void
copy_streams (HlPlant **plant, const HlPlant *from, int dx, int dy, GHashTable *copies)
{
  for (guint i = 0; i < hl_plant_n_streams (from); i++)
    {
      const HlStream *stream = hl_plant_stream (from, i);
      const char *from_copy = copy_of (copies, stream->from_id), *to_copy = copy_of (copies, stream->to_id);
      g_autofree char *free_id = NULL;
      HlStream *copy;
      if (from_copy == NULL || to_copy == NULL)
        continue;
      free_id = hl_plant_free_id (*plant, "");
      copy = hl_stream_copy (stream);
      copy->id = g_intern_string (free_id);
      copy->from_id = from_copy;
      copy->to_id = to_copy;
      for (guint k = 0; k < copy->n_route; k++)
        {
          copy->route[k].x += dx;
          copy->route[k].y += dy;
        }
      copy->label_x += dx;
      copy->label_y += dy;
      g_hash_table_insert (copies, (gpointer) stream->id, (gpointer) copy->id);
      advance (plant, hl_plant_with_stream (*plant, copy));
    }
}

static void
address_of_copy (HlAddress *address, gpointer data)
{
  if (address->owner != HL_OWNER_PLANT && copy_of (data, address->id) != NULL)
    address->id = copy_of (data, address->id);
}

/* Ties among what was copied join the copies; those to something else stay, as far as the plant has it. */
static void
map_ties (HlPlant **plant, GHashTable *copies)
{
  g_autoptr (GPtrArray) ids = g_ptr_array_new ();
  GHashTableIter iter;
  gpointer id;
  g_hash_table_iter_init (&iter, copies);
  while (g_hash_table_iter_next (&iter, NULL, &id))
    g_ptr_array_add (ids, id);
  g_ptr_array_add (ids, NULL);
  advance (plant, hl_plant_with_ties_mapped (*plant, (const char *const *) ids->pdata, address_of_copy, copies));
}

static void
copy_shafts (HlPlant **plant, const HlPlant *from, GHashTable *copies)
{
  for (guint i = 0; i < hl_plant_n_shafts (from); i++)
    {
      const HlShaft *shaft = hl_plant_shaft (from, i);
      g_autofree const char **joins = g_new0 (const char *, shaft->n_joins);
      g_autofree char *free_id = NULL;
      guint n = 0;
      for (guint k = 0; k < shaft->n_joins; k++)
        if (copy_of (copies, shaft->joins[k]) != NULL)
          joins[n++] = copy_of (copies, shaft->joins[k]);
      if (n < 2)
        continue;
      free_id = hl_plant_free_id (*plant, "S");
      advance (plant, hl_plant_with_shaft (*plant, hl_shaft_new (free_id, joins, n)));
    }
}

HlPlant *
hl_edit_duplicate (const HlPlant *plant, const char *const *ids, guint n, int dx, int dy, GPtrArray *list)
{
  g_autoptr (GHashTable) copies = g_hash_table_new (g_str_hash, g_str_equal);
  HlPlant *result = hl_plant_ref ((HlPlant *) plant);
  copy_components (&result, plant, ids, n, dx, dy, copies, list);
  copy_streams (&result, plant, dx, dy, copies);
  copy_shafts (&result, plant, copies);
  map_ties (&result, copies);
  return result;
}

HlPlant *
hl_edit_merge (const HlPlant *plant, const HlPlant *other, int dx, int dy, GPtrArray *list)
{
  g_autoptr (GHashTable) copies = g_hash_table_new (g_str_hash, g_str_equal);
  HlPlant *result = hl_plant_ref ((HlPlant *) plant);
  guint n = hl_plant_n_components (other);
  g_autofree const char **ids = g_new0 (const char *, n + 1);
  for (guint i = 0; i < n; i++)
    ids[i] = hl_plant_component (other, i)->id;
  copy_components (&result, other, ids, n, dx, dy, copies, list);
  copy_streams (&result, other, dx, dy, copies);
  copy_shafts (&result, other, copies);
  map_ties (&result, copies);
  return result;
}

HlPlant *
hl_edit_extract (const HlPlant *plant, const char *const *ids, guint n)
{
  g_autofree const char **others = g_new0 (const char *, hl_plant_n_components (plant) + 1);
  guint n_others = 0;
  for (guint i = 0; i < hl_plant_n_components (plant); i++)
    if (!is_among (hl_plant_component (plant, i)->id, ids, n))
      others[n_others++] = hl_plant_component (plant, i)->id;
  return hl_plant_without (plant, others);
}

/* Lines */

static gboolean
is_outlet (const HlPlant *plant, const char *id, const char *port)
{
  const HlComponent *component = hl_plant_find_component (plant, id);
  guint n;
  return component != NULL && hl_component_find_port (component, port, &n)
         && hl_component_port (component, n).kind->direction == HL_PORT_OUT;
}

gboolean
hl_edit_can_connect (const HlPlant *plant, const char *a_id, const char *a_port, const char *b_id, const char *b_port, GError **error)
{
  if (is_outlet (plant, a_id, a_port))
    return hl_plant_can_connect (plant, a_id, a_port, b_id, b_port, error);
  return hl_plant_can_connect (plant, b_id, b_port, a_id, a_port, error);
}

HlPlant *
hl_edit_connect (const HlPlant *plant, const char *a_id, const char *a_port, const char *b_id, const char *b_port,
                 const char **stream, GError **error)
{
  g_autofree char *free_id = hl_plant_free_id (plant, "");
  if (!hl_edit_can_connect (plant, a_id, a_port, b_id, b_port, error))
    return NULL;
  if (stream != NULL)
    *stream = g_intern_string (free_id);
  HlStream *line = is_outlet (plant, a_id, a_port) ? hl_stream_new (free_id, a_id, a_port, b_id, b_port)
                                                  : hl_stream_new (free_id, b_id, b_port, a_id, a_port);
  line->medium = hl_plant_line_medium (plant, line->from_id, line->from_port, line->to_id, line->to_port);
  return hl_plant_with_stream (plant, line);
}

/* Ports of a component that can stand in a line: the first inlet and the first outlet of one circuit. */
static gboolean
through_ports (const HlComponent *component, const char **inlet, const char **outlet)
{
  *inlet = *outlet = NULL;
  for (guint n = 0; n < hl_component_n_ports (component); n++)
    {
      HlPort port = hl_component_port (component, n);
      if (port.kind->direction == HL_PORT_IN && *inlet == NULL && g_str_has_prefix (port.key, "inlet"))
        *inlet = port.key;
      if (port.kind->direction == HL_PORT_OUT && *outlet == NULL && g_str_has_prefix (port.key, "outlet"))
        *outlet = port.key;
    }
  return *inlet != NULL && *outlet != NULL;
}

/* Whether the line goes straight through the symbol from left to right, so that it can be turned to lie in any line. */
static gboolean
runs_through (const HlComponent *component)
{
  const char *inlet, *outlet;
  guint n_in, n_out;
  return through_ports (component, &inlet, &outlet)
         && hl_component_find_port (component, inlet, &n_in) && hl_component_find_port (component, outlet, &n_out)
         && hl_component_port (component, n_in).kind->side == HL_SIDE_LEFT && hl_component_port (component, n_out).kind->side == HL_SIDE_RIGHT;
}

gboolean
hl_edit_can_insert (const HlKind *kind)
{
  g_autoptr (HlComponent) trial = hl_component_new_bare (kind, "x", 0, 0);
  const char *inlet, *outlet;
  return through_ports (trial, &inlet, &outlet);
}

HlPlant *
hl_edit_insert (const HlPlant *plant, const char *stream_id, const HlKind *kind, int x, int y, int turn, const char **id, GError **error)
{
  const HlStream *stream = hl_plant_find_stream (plant, stream_id);
  HlComponent *component;
  const char *inlet, *outlet, *own_id;
  g_autofree char *free_id = NULL, *component_id = NULL;
  HlPlant *result;
  HlStream *before;

  if (stream == NULL || !hl_edit_can_insert (kind))
    {
      g_set_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_CONTENT, _("A %s cannot stand in a line; draw lines to its ports"), _(kind->shelf_name));
      return NULL;
    }
  component_id = hl_plant_free_id (plant, kind->letter);
  own_id = g_intern_string (component_id);
  component = hl_component_new (kind, own_id, x, y);
  through_ports (component, &inlet, &outlet);
  if (runs_through (component))
    component->turn = turn;
  result = hl_plant_with_component (plant, component);
  free_id = hl_plant_free_id (result, "");
  before = hl_stream_copy (stream);
  before->to_id = own_id;
  before->to_port = g_intern_string (inlet);
  before->n_route = 0;
  before->has_label_place = FALSE;
  /* One kept, one new: the part before the component keeps the number and what was given of it. */
  {
    HlStream *after = hl_stream_new (free_id, own_id, outlet, stream->to_id, stream->to_port);
    after->medium = stream->medium;
    advance (&result, hl_plant_with_stream (result, before));
    advance (&result, hl_plant_with_stream (result, after));
  }
  if (id != NULL)
    *id = own_id;
  return result;
}

/* Turns a junction so that its side port looks towards a port.  Unturned it looks down; a mirrored one that is turned by half a
 * circle passes the line through the same way and looks to the other side. */
static void
face (HlComponent *junction, const HlPlant *plant, const char *id, const char *port)
{
  static const int look[4][2] = { { 0, 1 }, { -1, 0 }, { 0, -1 }, { 1, 0 } };    /* after so many quarter turns */
  const HlComponent *component = hl_plant_find_component (plant, id);
  HlSide side;
  guint n;
  int x, y;
  if (component == NULL || !hl_component_find_port (component, port, &n))
    return;
  hl_component_port_place (component, n, &x, &y, &side);
  if ((x - junction->x) * look[junction->turn][0] + (y - junction->y) * look[junction->turn][1] >= 0)
    return;
  junction->is_mirrored = TRUE;
  junction->turn = (junction->turn + 2) % 4;
}

HlPlant *
hl_edit_branch (const HlPlant *plant, const char *a_id, const char *a_port, const char *stream, int x, int y, int turn,
                const char **id, GError **error)
{
  gboolean is_joining = is_outlet (plant, a_id, a_port);
  const HlKind *kind = hl_kind_lookup (is_joining ? "mixer" : "splitter");
  const char *own_id;
  HlPlant *result, *connected;
  HlComponent *junction;

  g_return_val_if_fail (kind != NULL, NULL);
  result = hl_edit_insert (plant, stream, kind, x, y, turn, &own_id, error);
  if (result == NULL)
    return NULL;
  junction = hl_component_copy (hl_plant_find_component (result, own_id));
  face (junction, plant, a_id, a_port);
  advance (&result, hl_plant_with_component (result, junction));
  connected = hl_edit_connect (result, a_id, a_port, own_id, is_joining ? "inlet2" : "outlet2", NULL, error);
  hl_plant_unref (result);
  if (id != NULL)
    *id = own_id;
  return connected;
}

HlPlant *
hl_edit_place_label (const HlPlant *plant, const char *stream_id, gboolean has_place, int x, int y)
{
  const HlStream *stream = hl_plant_find_stream (plant, stream_id);
  HlStream *placed;
  if (stream == NULL)
    return hl_plant_ref ((HlPlant *) plant);
  placed = hl_stream_copy (stream);
  placed->has_label_place = has_place;
  placed->label_x = x;
  placed->label_y = y;
  return hl_plant_with_stream (plant, placed);
}

/* Shafts */

static guint
count_joins (const HlPlant *plant, const char *id)
{
  const HlShaft *shaft = hl_plant_shaft_of (plant, id);
  return shaft != NULL ? shaft->n_joins : 1;
}

/* Writes the components on the shaft of @id, or @id alone, and returns how many. */
static guint
collect_joins (const HlPlant *plant, const char *id, const char **joins)
{
  const HlShaft *shaft = hl_plant_shaft_of (plant, id);
  if (shaft == NULL)
    {
      joins[0] = id;
      return 1;
    }
  for (guint n = 0; n < shaft->n_joins; n++)
    joins[n] = shaft->joins[n];
  return shaft->n_joins;
}

gboolean
hl_edit_can_join (const HlPlant *plant, const char *a_id, const char *b_id, GError **error)
{
  const HlComponent *a = hl_plant_find_component (plant, a_id), *b = hl_plant_find_component (plant, b_id);
  const HlShaft *shaft = hl_plant_shaft_of (plant, a_id);
  if (a == NULL || b == NULL || a->kind->shaft == HL_SHAFT_NONE || b->kind->shaft == HL_SHAFT_NONE)
    {
      g_set_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_CONTENT, _("A shaft joins turbines, pumps and generators only"));
      return FALSE;
    }
  if (a == b || (shaft != NULL && shaft == hl_plant_shaft_of (plant, b_id)))
    {
      g_set_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_CONTENT, _("%s and %s are on one shaft already"), a->id, b->id);
      return FALSE;
    }
  return TRUE;
}

static void
reverse_joins (const char **joins, guint n)
{
  for (guint k = 0; k < n / 2; k++)
    {
      const char *keep = joins[k];
      joins[k] = joins[n - 1 - k];
      joins[n - 1 - k] = keep;
    }
}

HlPlant *
hl_edit_join_shaft (const HlPlant *plant, const char *a_id, const char *b_id, GError **error)
{
  const HlShaft *a_shaft, *b_shaft;
  g_autofree const char **joins = NULL;
  g_autofree char *id = NULL;
  guint n, n_b;
  HlPlant *result;

  if (!hl_edit_can_join (plant, a_id, b_id, error))
    return NULL;
  a_shaft = hl_plant_shaft_of (plant, a_id);
  b_shaft = hl_plant_shaft_of (plant, b_id);
  joins = g_new0 (const char *, count_joins (plant, a_id) + count_joins (plant, b_id));
  n = collect_joins (plant, a_id, joins);
  /* A shaft is a line: where the ends allow, the two that are joined come to lie side by side. */
  if (joins[n - 1] != g_intern_string (a_id) && joins[0] == g_intern_string (a_id))
    reverse_joins (joins, n);
  n_b = collect_joins (plant, b_id, joins + n);
  if (joins[n] != g_intern_string (b_id) && joins[n + n_b - 1] == g_intern_string (b_id))
    reverse_joins (joins + n, n_b);
  n += n_b;
  id = a_shaft != NULL ? g_strdup (a_shaft->id) : b_shaft != NULL ? g_strdup (b_shaft->id) : hl_plant_free_id (plant, "S");
  result = hl_plant_ref ((HlPlant *) plant);
  if (a_shaft != NULL && b_shaft != NULL)
    {
      const char *gone[] = { b_shaft->id, NULL };
      advance (&result, hl_plant_without (result, gone));
    }
  advance (&result, hl_plant_with_shaft (result, hl_shaft_new (id, joins, n)));
  return result;
}

HlPlant *
hl_edit_leave_shaft (const HlPlant *plant, const char *id, GError **error)
{
  const HlShaft *shaft = hl_plant_shaft_of (plant, id);
  g_autofree const char **joins = NULL;
  guint n = 0;

  if (shaft == NULL)
    {
      g_set_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_CONTENT, _("%s is on no shaft"), id);
      return NULL;
    }
  joins = g_new0 (const char *, shaft->n_joins + 1);
  for (guint k = 0; k < shaft->n_joins; k++)
    if (!g_str_equal (shaft->joins[k], id))
      joins[n++] = shaft->joins[k];
  if (n < 2)
    {
      const char *gone[] = { shaft->id, NULL };
      return hl_plant_without (plant, gone);
    }
  return hl_plant_with_shaft (plant, hl_shaft_new (shaft->id, joins, n));
}

/* Places and words */

static gboolean
is_free (const HlPlant *plant, const HlComponent *trial)
{
  int hw, hh;
  hl_component_half_size (trial, &hw, &hh);
  for (guint n = 0; n < hl_plant_n_components (plant); n++)
    {
      const HlComponent *other = hl_plant_component (plant, n);
      int ow, oh;
      hl_component_half_size (other, &ow, &oh);
      if (ABS (other->x - trial->x) < hw + ow + CLEARANCE && ABS (other->y - trial->y) < hh + oh + CLEARANCE)
        return FALSE;
    }
  return TRUE;
}

void
hl_edit_free_place (const HlPlant *plant, const HlKind *kind, int *x, int *y)
{
  g_autoptr (HlComponent) trial = hl_component_new_bare (kind, "x", *x, *y);
  for (int ring = 0; ring < 200; ring += 2)
    for (int dy = -ring; dy <= ring; dy += 2)
      for (int dx = -ring; dx <= ring; dx += MAX (ABS (dy) == ring ? 2 : 2 * ring, 2))
        {
          trial->x = *x + dx;
          trial->y = *y + dy;
          if (is_free (plant, trial))
            {
              *x = trial->x;
              *y = trial->y;
              return;
            }
        }
}

char *
hl_edit_words (const HlPlant *plant, const char *const *ids, guint n)
{
  if (n == 1)
    return hl_plant_find_stream (plant, ids[0]) != NULL ? g_strdup_printf (_("stream %s"), ids[0]) : g_strdup (ids[0]);
  if (n == 2)
    return g_strdup_printf (_("%s and %s"), ids[0], ids[1]);
  return g_strdup_printf (ngettext_hl ("%u item", "%u items", n), n);
}
