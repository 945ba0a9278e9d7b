/* What can be done in the window, as actions: gestures, menus, shortcuts and tests all come through here.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-window-private.h"
#include "app/hl-settings.h"
#include "app/hl-edit.h"
#include "plant/i18n.h"

#define COPY_OFFSET 4      /* grid units that a duplicate lies beside its original */

static HlPlant *
plant_of (HlWindow *self)
{
  return hl_session_plant (self->session);
}

static void
say (HlWindow *self, const char *text)
{
  g_signal_emit_by_name (self->session, "message", text);
}

static void
say_error (HlWindow *self, const GError *error)
{
  say (self, error->message);
  gtk_widget_error_bell (GTK_WIDGET (self));
}

/* A step named "<verb> <selection>": @format has one %s. */
static void
apply_to_selection (HlWindow *self, const char *format, HlPlant *plant, gboolean settle)
{
  guint n;
  const char *const *ids = hl_session_selection (self->session, &n);
  g_autofree char *words = hl_edit_words (plant_of (self), ids, n);
  g_autofree char *name = NULL;
#pragma GCC diagnostic push
#pragma GCC diagnostic ignored "-Wformat-nonliteral"
  name = g_strdup_printf (format, words);
#pragma GCC diagnostic pop
  hl_session_apply (self->session, name, plant, NULL, settle);
}

/* History */

static void
undo_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  hl_session_cancel_preview (self->session);
  hl_session_undo (self->session);
}

static void
redo_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  hl_session_cancel_preview (self->session);
  hl_session_redo (self->session);
}

/* Components */

static void
add_at (HlWindow *self, const HlKind *kind, int x, int y)
{
  const char *id;
  HlPlant *plant = hl_edit_add (plant_of (self), kind, x, y, &id);
  g_autofree char *name = g_strdup_printf (_("Add %s %s"), _(kind->shelf_name), id);
  hl_session_apply (self->session, name, plant, NULL, TRUE);
  hl_session_select (self->session, id, FALSE);
}

static const HlKind *
known_kind (HlWindow *self, const char *id)
{
  const HlKind *kind = hl_kind_lookup (id);
  if (kind == NULL)
    {
      g_autofree char *text = g_strdup_printf (_("There is no component kind “%s”"), id);
      say (self, text);
    }
  return kind;
}

static void
add_component_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  const HlKind *kind = known_kind (self, g_variant_get_string (parameter, NULL));
  int x, y;
  if (kind == NULL)
    return;
  hl_canvas_middle (self->canvas, &x, &y);
  hl_edit_free_place (plant_of (self), kind, &x, &y);
  add_at (self, kind, x, y);
  hl_canvas_reveal (self->canvas, hl_session_selection (self->session, NULL)[0]);
}

static void
add_component_at_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  const char *id;
  int x, y;
  const HlKind *kind;
  g_variant_get (parameter, "(&sii)", &id, &x, &y);
  if ((kind = known_kind (self, id)) != NULL)
    add_at (self, kind, x, y);
}

static void
insert_component_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  const char *kind_id, *stream, *id;
  int x, y, turn;
  const HlKind *kind;
  g_autoptr (GError) error = NULL;
  HlPlant *plant;

  g_variant_get (parameter, "(&s&siii)", &kind_id, &stream, &x, &y, &turn);
  if ((kind = known_kind (self, kind_id)) == NULL)
    return;
  plant = hl_edit_insert (plant_of (self), stream, kind, x, y, turn, &id, &error);
  if (plant == NULL)
    say_error (self, error);
  else
    {
      g_autofree char *name = g_strdup_printf (_("Insert %s %s in stream %s"), _(kind->shelf_name), id, stream);
      hl_session_apply (self->session, name, plant, NULL, TRUE);
      hl_session_select (self->session, id, FALSE);
    }
}

static void
quick_add_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  hl_canvas_quick_add (HL_WINDOW (data)->canvas);
}

static guint
n_selected_components (HlWindow *self)
{
  guint n, count = 0;
  const char *const *ids = hl_session_selection (self->session, &n);
  for (guint i = 0; i < n; i++)
    count += hl_plant_find_component (plant_of (self), ids[i]) != NULL;
  return count;
}

static void
move_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  int dx, dy;
  guint n;
  const char *const *ids = hl_session_selection (self->session, &n);
  g_variant_get (parameter, "(ii)", &dx, &dy);
  if (n_selected_components (self) > 0 && (dx != 0 || dy != 0))
    apply_to_selection (self, _("Move %s"), hl_edit_move (hl_session_base (self->session), ids, n, dx, dy), FALSE);
  else
    hl_session_cancel_preview (self->session);
}

/* By arrow key: what a held key does is undone in one step. */
static void
nudge_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  int dx, dy;
  guint n;
  const char *const *ids = hl_session_selection (self->session, &n);
  g_autofree char *words = hl_edit_words (plant_of (self), ids, n);
  g_autofree char *name = g_strdup_printf (_("Move %s"), words);
  g_variant_get (parameter, "(ii)", &dx, &dy);
  hl_session_apply_again (self->session, name, hl_edit_move (hl_session_base (self->session), ids, n, dx, dy));
}

static void
turn_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  guint n;
  const char *const *ids = hl_session_selection (self->session, &n);
  apply_to_selection (self, _("Turn %s"), hl_edit_turn (plant_of (self), ids, n), FALSE);
}

static void
mirror_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  guint n;
  const char *const *ids = hl_session_selection (self->session, &n);
  apply_to_selection (self, _("Mirror %s"), hl_edit_mirror (plant_of (self), ids, n), FALSE);
}

static void
delete_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  guint n;
  const char *const *ids = hl_session_selection (self->session, &n);
  apply_to_selection (self, _("Delete %s"), hl_edit_delete (plant_of (self), ids, n), TRUE);
}

static void
duplicate_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  g_autoptr (GPtrArray) copies = g_ptr_array_new ();
  guint n;
  const char *const *ids = hl_session_selection (self->session, &n);
  HlPlant *plant = hl_edit_duplicate (plant_of (self), ids, n, COPY_OFFSET, COPY_OFFSET, copies);
  apply_to_selection (self, _("Duplicate %s"), plant, TRUE);
  hl_session_select_many (self->session, (const char *const *) copies->pdata, copies->len);
}

/* The clipboard carries a plant in the form of its file, as text: between windows, and to be looked at in an editor. */

static void
copy_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  guint n;
  const char *const *ids = hl_session_selection (self->session, &n);
  g_autoptr (HlPlant) extract = hl_edit_extract (plant_of (self), ids, n);
  g_autofree char *text = hl_plant_to_json (extract);
  gdk_clipboard_set_text (gtk_widget_get_clipboard (GTK_WIDGET (self)), text);
}

static void
cut_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  guint n;
  const char *const *ids = hl_session_selection (self->session, &n);
  copy_cb (action, parameter, data);
  apply_to_selection (self, _("Cut %s"), hl_edit_delete (plant_of (self), ids, n), TRUE);
}

static gboolean
is_taken (const HlPlant *plant, int x, int y)
{
  for (guint n = 0; n < hl_plant_n_components (plant); n++)
    if (hl_plant_component (plant, n)->x == x && hl_plant_component (plant, n)->y == y)
      return TRUE;
  return FALSE;
}

/* Where it was copied from, or so far beside it that it covers nothing pasted before. */
static int
paste_offset (const HlPlant *plant, const HlPlant *pasted)
{
  const HlComponent *first = hl_plant_component (pasted, 0);
  int offset = 0;
  while (is_taken (plant, first->x + offset, first->y + offset))
    offset += COPY_OFFSET;
  return offset;
}

static void
paste_text_cb (GObject *source, GAsyncResult *result, gpointer data)
{
  g_autoptr (HlWindow) self = data;
  g_autofree char *text = gdk_clipboard_read_text_finish (GDK_CLIPBOARD (source), result, NULL);
  g_autoptr (HlPlant) pasted = text != NULL ? hl_plant_from_json (text, -1, _("clipboard"), NULL) : NULL;
  g_autoptr (GPtrArray) copies = g_ptr_array_new ();
  g_autofree char *words = NULL, *name = NULL;
  HlPlant *plant;
  int offset;

  if (pasted == NULL || hl_plant_n_components (pasted) == 0)
    {
      say (self, _("The clipboard holds no components"));
      return;
    }
  offset = paste_offset (plant_of (self), pasted);
  plant = hl_edit_merge (plant_of (self), pasted, offset, offset, copies);
  words = hl_edit_words (plant, (const char *const *) copies->pdata, copies->len);
  name = g_strdup_printf (_("Paste %s"), words);
  hl_session_apply (self->session, name, plant, NULL, TRUE);
  hl_session_select_many (self->session, (const char *const *) copies->pdata, copies->len);
}

static void
paste_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  gdk_clipboard_read_text_async (gtk_widget_get_clipboard (GTK_WIDGET (data)), NULL, paste_text_cb, g_object_ref (data));
}

/* Lines and shafts */

static void
connect_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  const char *a_id, *a_port, *b_id, *b_port;
  g_autoptr (GError) error = NULL;
  HlPlant *plant;
  const char *stream;

  g_variant_get (parameter, "(&s&s&s&s)", &a_id, &a_port, &b_id, &b_port);
  plant = hl_edit_connect (plant_of (self), a_id, a_port, b_id, b_port, &stream, &error);
  if (plant == NULL)
    say_error (self, error);
  else
    {
      g_autofree char *name = g_strdup_printf (_("Connect %s to %s"), a_id, b_id);
      hl_session_apply (self->session, name, plant, NULL, TRUE);
    }
}

static void
branch_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  const char *a_id, *a_port, *stream, *id;
  int x, y, turn;
  g_autoptr (GError) error = NULL;
  HlPlant *plant;

  g_variant_get (parameter, "(&s&s&siii)", &a_id, &a_port, &stream, &x, &y, &turn);
  plant = hl_edit_branch (plant_of (self), a_id, a_port, stream, x, y, turn, &id, &error);
  if (plant == NULL)
    say_error (self, error);
  else
    {
      g_autofree char *name = g_strdup_printf (_("Connect %s to stream %s"), a_id, stream);
      hl_session_apply (self->session, name, plant, NULL, TRUE);
    }
}

static void
replug_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  const char *stream, *id, *port;
  g_autoptr (GError) error = NULL;
  HlPlant *plant;
  g_variant_get (parameter, "(&s&s&s)", &stream, &id, &port);
  plant = hl_edit_replug (plant_of (self), stream, id, port, &error);
  if (plant == NULL)
    say_error (self, error);
  else if (hl_plant_equal (plant, plant_of (self)))
    hl_plant_unref (plant);
  else
    {
      g_autofree char *name = g_strdup_printf (_("Move the end of stream %s to %s"), stream, id);
      hl_session_apply (self->session, name, plant, NULL, TRUE);
    }
}

static void
bend_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  g_autoptr (GVariantIter) points = NULL;
  g_autoptr (GArray) bends = g_array_new (FALSE, FALSE, sizeof (HlGridPoint));
  const char *stream;
  HlGridPoint bend;
  g_variant_get (parameter, "(&sa(ii))", &stream, &points);
  while (g_variant_iter_next (points, "(ii)", &bend.x, &bend.y))
    g_array_append_val (bends, bend);
  if (hl_plant_find_stream (hl_session_base (self->session), stream) != NULL)
    {
      g_autofree char *name = g_strdup_printf (_("Bend stream %s"), stream);
      hl_session_apply (self->session, name,
                        hl_edit_route (hl_session_base (self->session), stream, (const HlGridPoint *) bends->data, bends->len), NULL, FALSE);
    }
}

static void
straighten_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  guint n;
  const char *const *ids = hl_session_selection (self->session, &n);
  if (n == 1)
    apply_to_selection (self, _("Let stream %s find its way"), hl_edit_route (plant_of (self), ids[0], NULL, 0), FALSE);
}

static void
apply_shaft (HlWindow *self, HlPlant *plant, const GError *error, char *name)
{
  if (plant == NULL)
    say_error (self, error);
  else
    hl_session_apply (self->session, name, plant, NULL, TRUE);
  g_free (name);
}

static void
join_shaft_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  const char *a_id, *b_id;
  g_autoptr (GError) error = NULL;
  HlPlant *plant;
  g_variant_get (parameter, "(&s&s)", &a_id, &b_id);
  plant = hl_edit_join_shaft (plant_of (self), a_id, b_id, &error);
  apply_shaft (self, plant, error, g_strdup_printf (_("Put %s and %s on one shaft"), a_id, b_id));
}

/* Two or more selected, and each has a shaft. */
static gboolean
can_join_selection (HlWindow *self)
{
  guint n;
  const char *const *ids = hl_session_selection (self->session, &n);
  gboolean is_one_shaft = TRUE;
  for (guint i = 0; i < n; i++)
    {
      const HlComponent *component = hl_plant_find_component (plant_of (self), ids[i]);
      if (component == NULL || component->kind->shaft == HL_SHAFT_NONE)
        return FALSE;
      if (i > 0 && hl_edit_can_join (plant_of (self), ids[0], ids[i], NULL))
        is_one_shaft = FALSE;
    }
  return n >= 2 && !is_one_shaft;
}

static void
join_selection_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  guint n;
  const char *const *ids = hl_session_selection (self->session, &n);
  HlPlant *plant = hl_plant_ref (plant_of (self));
  for (guint i = 1; i < n; i++)
    {
      HlPlant *next = hl_edit_can_join (plant, ids[0], ids[i], NULL) ? hl_edit_join_shaft (plant, ids[0], ids[i], NULL) : NULL;
      if (next == NULL)
        continue;
      hl_plant_unref (plant);
      plant = next;
    }
  apply_to_selection (self, _("Put %s on one shaft"), plant, TRUE);
}

static void
leave_shaft_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  guint n;
  const char *const *ids = hl_session_selection (self->session, &n);
  g_autoptr (GError) error = NULL;
  HlPlant *plant;
  if (n != 1)
    return;
  plant = hl_edit_leave_shaft (plant_of (self), ids[0], &error);
  apply_shaft (self, plant, error, g_strdup_printf (_("Take %s off its shaft"), ids[0]));
}

static void
connect_menu_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  guint n;
  const char *const *ids = hl_session_selection (self->session, &n);
  if (n == 1)
    hl_canvas_ask_connection (self->canvas, ids[0]);
}

static void
move_label_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  const char *stream;
  int x, y;
  g_autofree char *name = NULL;
  g_variant_get (parameter, "(&sii)", &stream, &x, &y);
  name = g_strdup_printf (_("Move the label of stream %s"), stream);
  hl_session_apply (self->session, name, hl_edit_place_label (hl_session_base (self->session), stream, TRUE, x, y), NULL, FALSE);
}

static void
reset_label_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  guint n;
  const char *const *ids = hl_session_selection (self->session, &n);
  if (n == 1)
    apply_to_selection (self, _("Let the label of %s find its place"), hl_edit_place_label (plant_of (self), ids[0], FALSE, 0, 0), FALSE);
}

/* Selection */

static void
select_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  hl_session_select (HL_WINDOW (data)->session, g_variant_get_string (parameter, NULL), FALSE);
}

static void
select_all_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  guint n = hl_plant_n_components (plant_of (self));
  g_autofree const char **ids = g_new0 (const char *, n + 1);
  for (guint i = 0; i < n; i++)
    ids[i] = hl_plant_component (plant_of (self), i)->id;
  hl_session_select_many (self->session, ids, n);
}

static void
deselect_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  if (!hl_canvas_cancel (self->canvas))
    hl_session_select (self->session, NULL, FALSE);
}

/* Values */

static void
set_value_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  const char *where, *text;
  HlAddress address;
  g_autoptr (GError) error = NULL;
  g_variant_get (parameter, "(&s&s)", &where, &text);
  if (!hl_address_parse (where, plant_of (self), &address, &error)
      || !hl_session_set_text (self->session, &address, text, &error))
    say_error (self, error);
}

static void
units_cb (GSimpleAction *action, GVariant *value, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  HlUnitSet units;
  if (!hl_unit_set_from_id (g_variant_get_string (value, NULL), &units) || units == hl_plant_units (plant_of (self)))
    return;
  hl_settings_set_string ("units", hl_unit_set_id (units));     /* of the next new plant */
  hl_session_apply (self->session, _("Change units"), hl_plant_with_units (plant_of (self), units), NULL, FALSE);
}

/* Order */

/* A step only where something moved. */
static void
apply_order (HlWindow *self, const char *format, HlPlant *plant)
{
  if (plant == plant_of (self))
    hl_plant_unref (plant);
  else
    apply_to_selection (self, format, plant, FALSE);
}

static void
align_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  static const char *const words[] = { "left", "centre", "right", "top", "middle", "bottom" };
  HlWindow *self = HL_WINDOW (data);
  guint n;
  const char *const *ids = hl_session_selection (self->session, &n);
  for (guint i = 0; i < G_N_ELEMENTS (words); i++)
    if (g_str_equal (words[i], g_variant_get_string (parameter, NULL)))
      apply_order (self, _("Align %s"), hl_edit_align (plant_of (self), ids, n, (HlAlignment) i));
}

static void
distribute_cb (GSimpleAction *action, GVariant *parameter, gpointer data)
{
  HlWindow *self = HL_WINDOW (data);
  guint n;
  const char *const *ids = hl_session_selection (self->session, &n);
  apply_order (self, _("Space %s evenly"),
               hl_edit_distribute (plant_of (self), ids, n, g_str_equal (g_variant_get_string (parameter, NULL), "across")));
}

static const GActionEntry entries[] = {
  { "align", align_cb, "s" },
  { "distribute", distribute_cb, "s" },
  { "undo", undo_cb },
  { "redo", redo_cb },
  { "quick-add", quick_add_cb },
  { "add-component", add_component_cb, "s" },
  { "add-component-at", add_component_at_cb, "(sii)" },
  { "insert-component", insert_component_cb, "(ssiii)" },
  { "move", move_cb, "(ii)" },
  { "nudge", nudge_cb, "(ii)" },
  { "turn", turn_cb },
  { "mirror", mirror_cb },
  { "delete", delete_cb },
  { "duplicate", duplicate_cb },
  { "copy", copy_cb },
  { "cut", cut_cb },
  { "paste", paste_cb },
  { "connect", connect_cb, "(ssss)" },
  { "branch", branch_cb, "(sssiii)" },
  { "replug", replug_cb, "(sss)" },
  { "bend", bend_cb, "(sa(ii))" },
  { "straighten", straighten_cb },
  { "connect-menu", connect_menu_cb },
  { "join-shaft", join_shaft_cb, "(ss)" },
  { "join-selection", join_selection_cb },
  { "leave-shaft", leave_shaft_cb },
  { "move-label", move_label_cb, "(sii)" },
  { "reset-label", reset_label_cb },
  { "select", select_cb, "s" },
  { "select-all", select_all_cb },
  { "deselect", deselect_cb },
  { "set-value", set_value_cb, "(ss)" },
  { "units", NULL, "s", "'metric'", units_cb },
};

void
hl_window_add_actions (HlWindow *self)
{
  g_action_map_add_action_entries (G_ACTION_MAP (self), entries, G_N_ELEMENTS (entries), self);
}

static void
enable (HlWindow *self, const char *name, gboolean is_enabled)
{
  g_simple_action_set_enabled (G_SIMPLE_ACTION (g_action_map_lookup_action (G_ACTION_MAP (self), name)), is_enabled);
}

void
hl_window_update_actions (HlWindow *self)
{
  HlPlant *plant = plant_of (self);
  guint n, n_components = n_selected_components (self);
  const char *const *ids = hl_session_selection (self->session, &n);
  const HlComponent *single = n == 1 ? hl_plant_find_component (plant, ids[0]) : NULL;
  const HlStream *stream = n == 1 ? hl_plant_find_stream (plant, ids[0]) : NULL;
  gboolean has_components = hl_plant_n_components (plant) > 0;

  enable (self, "undo", hl_session_can_undo (self->session));
  enable (self, "redo", hl_session_can_redo (self->session));
  enable (self, "move", n_components > 0);
  enable (self, "nudge", n_components > 0);
  enable (self, "turn", n_components > 0);
  enable (self, "align", n_components > 1);
  enable (self, "distribute", n_components > 2);
  enable (self, "mirror", n_components > 0);
  enable (self, "duplicate", n_components > 0);
  enable (self, "copy", n_components > 0);
  enable (self, "cut", n_components > 0);
  enable (self, "delete", n > 0);
  enable (self, "connect-menu", single != NULL);
  enable (self, "join-selection", can_join_selection (self));
  enable (self, "leave-shaft", single != NULL && hl_plant_shaft_of (plant, single->id) != NULL);
  enable (self, "straighten", stream != NULL && stream->n_route > 0);
  enable (self, "reset-label", stream != NULL && stream->has_label_place);
  enable (self, "select-all", has_components);
  enable (self, "zoom-fit", has_components);
  enable (self, "export", has_components);
  enable (self, "revert", hl_session_path (self->session) != NULL);
  g_simple_action_set_state (G_SIMPLE_ACTION (g_action_map_lookup_action (G_ACTION_MAP (self), "units")),
                             g_variant_new_string (hl_unit_set_id (hl_plant_units (plant))));
}
