/* Addresses offered while a tie is typed: those that match, with their present values.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-tie-completion.h"
#include "app/hl-pane.h"
#include "app/hl-scrub.h"
#include "plant/i18n.h"

#include <string.h>

#define MOST_ROWS 60

struct _HlTieCompletion {
  GObject    parent_instance;
  GtkWidget *owner, *entry, *popover, *list, *scroller;      /* borrowed: the owner's */
  HlSession *session;
  HlAddress  own;
  GPtrArray *matches;                                /* of HlTieMatch: the rows */
  int        start, end;                             /* of the word they complete [characters] */
};

G_DEFINE_FINAL_TYPE (HlTieCompletion, hl_tie_completion, G_TYPE_OBJECT)

/* --- the word --- */

static gboolean
is_address_char (gunichar c)
{
  return g_unichar_isalnum (c) || c == '_' || c == '.' || c == ':';
}

gboolean
hl_tie_word (const char *text, int cursor, int *start, int *end)
{
  glong n_chars = g_utf8_strlen (text, -1), first;
  g_autofree gunichar *chars = g_utf8_to_ucs4_fast (text, -1, NULL);

  if (n_chars == 0 || chars[0] != '=' || cursor < 1 || cursor > n_chars)
    return FALSE;
  for (first = cursor; first > 1 && is_address_char (chars[first - 1]); first--)
    ;
  glong last = cursor;
  while (last < n_chars && is_address_char (chars[last]))
    last++;
  *start = (int) first;
  *end = (int) last;
  if (last > first)
    return !g_unichar_isdigit (chars[first]) && chars[first] != '.';    /* "0.23" is a factor */
  /* Where nothing is typed yet an address may begin after "=", a bracket and what multiplies; after a sign a number is as likely. */
  glong before = first - 1;
  while (before > 0 && g_unichar_isspace (chars[before]))
    before--;
  return chars[before] < 0x80 && strchr ("=*/(;", (int) chars[before]) != NULL;
}

/* --- what matches --- */

static void
match_free (gpointer data)
{
  HlTieMatch *match = data;
  g_free (match->text);
  g_free (match->value);
  g_free (match);
}

typedef struct {
  const HlSolution *solution;
  const HlPlant    *plant;
  const HlAddress  *own;
  HlDimension       dimension;
  char             *word;           /* folded */
  GHashTable       *seen;           /* texts */
  GPtrArray        *first, *rest;   /* begin with the word; hold it elsewhere */
  GPtrArray        *others;         /* begin with it, but are of another dimension: a tie may multiply and divide */
} Search;

/* Another name of the quantity itself: port and stream name one state. */
static gboolean
is_itself (const Search *search, const HlAddress *address)
{
  const char *key = NULL, *own_key = NULL;
  const HlStream *stream = hl_state_stream (search->plant, address, &key), *own = hl_state_stream (search->plant, search->own, &own_key);

  return hl_address_equal (address, search->own) || (stream != NULL && stream == own && g_strcmp0 (key, own_key) == 0);
}

static void
consider (Search *search, const HlAddress *address)
{
  const HlQuantityKind *kind = hl_plant_quantity_kind (search->plant, address);
  double si;

  if (kind == NULL || (kind->flags & HL_QUANTITY_DERIVED) || is_itself (search, address)
      || (kind->dimension != search->dimension && *search->word == '\0'))
    return;
  g_autofree char *text = hl_address_to_text (address);
  if (!g_hash_table_add (search->seen, g_strdup (text)))
    return;
  g_autofree char *folded = g_utf8_casefold (text, -1), *described = hl_plant_describe (search->plant, address);
  g_autofree char *folded_words = g_utf8_casefold (described, -1);
  gboolean begins = g_str_has_prefix (folded, search->word);
  gboolean is_like = kind->dimension == search->dimension;
  if (!begins && (!is_like || (strstr (folded, search->word) == NULL && strstr (folded_words, search->word) == NULL)))
    return;
  HlTieMatch *match = g_new0 (HlTieMatch, 1);
  match->address = *address;
  match->text = g_steal_pointer (&text);
  match->value = hl_solution_value (search->solution, address, &si) ? hl_quantity_format (kind, si, hl_plant_units (search->plant)) : g_strdup ("");
  g_ptr_array_add (!is_like ? search->others : begins ? search->first : search->rest, match);
}

/* What the kind names, and the states at the ports that lines lead to. */
static void
consider_component (Search *search, const HlComponent *component)
{
  guint n_states;
  const HlQuantityKind *states = hl_stream_quantities (&n_states);

  for (guint n = 0; n < hl_component_n_quantities (component); n++)
    {
      HlAddress address = hl_address_component (component->id, hl_component_quantity (component, n).key);
      consider (search, &address);
    }
  for (guint n = 0; n < hl_component_n_ports (component); n++)
    for (guint k = 0; k < n_states; k++)
      {
        HlPort port = hl_component_port (component, n);
        g_autofree char *key = g_strdup_printf ("%s.%s", port.key, states[k].key);
        HlAddress address = hl_address_component (component->id, g_intern_string (key));
        if (hl_plant_stream_at (search->plant, component->id, port.key) != NULL)
          consider (search, &address);
      }
}

GPtrArray *
hl_tie_matches (const HlSolution *solution, const HlAddress *own, const char *word)
{
  const HlPlant *plant = hl_solution_plant (solution);
  const HlQuantityKind *kind = hl_plant_quantity_kind (plant, own);
  Search search = { .solution = solution, .plant = plant, .own = own, .first = g_ptr_array_new_with_free_func (match_free) };
  guint n_states, n_quantities;
  const HlQuantityKind *states = hl_stream_quantities (&n_states), *quantities = hl_plant_quantities (&n_quantities);

  if (kind == NULL)
    return search.first;
  search.dimension = kind->dimension;
  search.word = g_utf8_casefold (word, -1);
  search.seen = g_hash_table_new_full (g_str_hash, g_str_equal, g_free, NULL);
  search.rest = g_ptr_array_new ();
  search.others = g_ptr_array_new ();
  for (guint n = 0; n < hl_plant_n_components (plant); n++)
    consider_component (&search, hl_plant_component (plant, n));
  for (guint n = 0; n < hl_plant_n_streams (plant); n++)
    for (guint k = 0; k < n_states; k++)
      {
        HlAddress address = hl_address_stream (hl_plant_stream (plant, n)->id, states[k].key);
        consider (&search, &address);
      }
  for (guint n = 0; n < n_quantities; n++)
    {
      HlAddress address = hl_address_plant (quantities[n].key);
      consider (&search, &address);
    }
  g_ptr_array_extend_and_steal (search.first, search.rest);
  g_ptr_array_extend_and_steal (search.first, search.others);
  g_hash_table_unref (search.seen);
  g_free (search.word);
  return search.first;
}

/* --- the list --- */

static gboolean
is_open (HlTieCompletion *self)
{
  return self->popover != NULL && gtk_widget_get_visible (self->popover);
}

void
hl_tie_completion_close (HlTieCompletion *self)
{
  if (is_open (self))
    gtk_popover_popdown (GTK_POPOVER (self->popover));
}

static GtkWidget *
build_row (HlTieCompletion *self, const HlTieMatch *match)
{
  GtkWidget *row = gtk_list_box_row_new (), *box = gtk_box_new (GTK_ORIENTATION_HORIZONTAL, 16), *words = gtk_box_new (GTK_ORIENTATION_VERTICAL, 0);
  g_autofree char *described = hl_plant_describe (hl_session_plant (self->session), &match->address);
  GtkWidget *name = hl_pane_label (match->text, NULL), *what = hl_pane_label (described, "quiet"), *value = hl_pane_label (match->value, "number");

  gtk_label_set_ellipsize (GTK_LABEL (what), PANGO_ELLIPSIZE_END);
  gtk_widget_set_hexpand (words, TRUE);
  gtk_box_append (GTK_BOX (words), name);
  gtk_box_append (GTK_BOX (words), what);
  gtk_box_append (GTK_BOX (box), words);
  gtk_box_append (GTK_BOX (box), value);
  gtk_list_box_row_set_child (GTK_LIST_BOX_ROW (row), box);
  hl_pane_set_accessible (row, match->text, match->value);
  return row;
}

static void
fill (HlTieCompletion *self, const char *word)
{
  GtkListBoxRow *row;

  g_clear_pointer (&self->matches, g_ptr_array_unref);
  self->matches = hl_tie_matches (hl_session_solution (self->session), &self->own, word);
  if (self->matches->len > MOST_ROWS)
    g_ptr_array_set_size (self->matches, MOST_ROWS);
  while ((row = gtk_list_box_get_row_at_index (GTK_LIST_BOX (self->list), 0)) != NULL)
    gtk_list_box_remove (GTK_LIST_BOX (self->list), GTK_WIDGET (row));
  for (guint n = 0; n < self->matches->len; n++)
    gtk_list_box_append (GTK_LIST_BOX (self->list), build_row (self, g_ptr_array_index (self->matches, n)));
  gtk_adjustment_set_value (gtk_scrolled_window_get_vadjustment (GTK_SCROLLED_WINDOW (self->scroller)), 0.0);
}

/* Nothing is left to complete once the word is a whole address. */
static gboolean
is_whole (HlTieCompletion *self, const char *word)
{
  for (guint n = 0; n < self->matches->len; n++)
    if (g_str_equal (((HlTieMatch *) g_ptr_array_index (self->matches, n))->text, word))
      return TRUE;
  return FALSE;
}

static void
open_under_entry (HlTieCompletion *self)
{
  graphene_rect_t bounds;

  if (!gtk_widget_compute_bounds (self->entry, self->owner, &bounds))
    return;
  gtk_popover_set_pointing_to (GTK_POPOVER (self->popover), &(GdkRectangle) { (int) bounds.origin.x, (int) bounds.origin.y,
                                                                              (int) bounds.size.width, (int) bounds.size.height });
  gtk_popover_popup (GTK_POPOVER (self->popover));
}

void
hl_tie_completion_update (HlTieCompletion *self)
{
  const char *text = gtk_editable_get_text (GTK_EDITABLE (self->entry));
  int cursor = gtk_editable_get_position (GTK_EDITABLE (self->entry));

  if (!hl_tie_word (text, cursor, &self->start, &self->end))
    {
      hl_tie_completion_close (self);
      return;
    }
  g_autofree char *word = g_utf8_substring (text, self->start, self->end);
  fill (self, word);
  if (self->matches->len == 0 || is_whole (self, word))
    hl_tie_completion_close (self);
  else if (!is_open (self))
    open_under_entry (self);
}

static void
take (HlTieCompletion *self, guint n)
{
  g_autofree char *text = g_strdup (((HlTieMatch *) g_ptr_array_index (self->matches, n))->text);
  int at = self->start;

  hl_tie_completion_close (self);
  gtk_editable_delete_text (GTK_EDITABLE (self->entry), self->start, self->end);
  gtk_editable_insert_text (GTK_EDITABLE (self->entry), text, -1, &at);
  gtk_editable_set_position (GTK_EDITABLE (self->entry), at);
  hl_tie_completion_close (self);
}

static void
row_activated_cb (GtkListBox *list, GtkListBoxRow *row, HlTieCompletion *self)
{
  take (self, (guint) gtk_list_box_row_get_index (row));
}

/* The entry keeps the focus: the chosen row is scrolled to by hand. */
static void
choose (HlTieCompletion *self, int step)
{
  GtkListBoxRow *row = gtk_list_box_get_selected_row (GTK_LIST_BOX (self->list));
  int now = row != NULL ? gtk_list_box_row_get_index (row) : -1, n = (int) self->matches->len;
  int next = now < 0 ? (step > 0 ? 0 : n - 1) : CLAMP (now + step, 0, n - 1);
  GtkAdjustment *adjustment = gtk_scrolled_window_get_vadjustment (GTK_SCROLLED_WINDOW (self->scroller));
  graphene_rect_t bounds;

  row = gtk_list_box_get_row_at_index (GTK_LIST_BOX (self->list), next);
  gtk_list_box_select_row (GTK_LIST_BOX (self->list), row);
  if (gtk_widget_compute_bounds (GTK_WIDGET (row), self->list, &bounds))
    gtk_adjustment_clamp_page (adjustment, bounds.origin.y, bounds.origin.y + bounds.size.height);
}

gboolean
hl_tie_completion_key (HlTieCompletion *self, guint key)
{
  GtkListBoxRow *row;

  if (!is_open (self))
    return FALSE;
  row = gtk_list_box_get_selected_row (GTK_LIST_BOX (self->list));
  switch (key)
    {
    case GDK_KEY_Down:
    case GDK_KEY_KP_Down:
      choose (self, 1);
      return TRUE;
    case GDK_KEY_Up:
    case GDK_KEY_KP_Up:
      choose (self, -1);
      return TRUE;
    case GDK_KEY_Tab:
      take (self, row != NULL ? (guint) gtk_list_box_row_get_index (row) : 0);
      return TRUE;
    case GDK_KEY_Return:
    case GDK_KEY_KP_Enter:
      if (row == NULL)
        return FALSE;                     /* nothing chosen: Return is for the entry */
      take (self, (guint) gtk_list_box_row_get_index (row));
      return TRUE;
    case GDK_KEY_Escape:
      hl_tie_completion_close (self);
      return TRUE;
    default:
      return FALSE;
    }
}

/* --- life --- */

static void
hl_tie_completion_finalize (GObject *object)
{
  HlTieCompletion *self = HL_TIE_COMPLETION (object);
  g_clear_weak_pointer (&self->popover);
  g_clear_object (&self->session);
  g_clear_pointer (&self->matches, g_ptr_array_unref);
  G_OBJECT_CLASS (hl_tie_completion_parent_class)->finalize (object);
}

static void
hl_tie_completion_class_init (HlTieCompletionClass *klass)
{
  G_OBJECT_CLASS (klass)->finalize = hl_tie_completion_finalize;
}

static void
hl_tie_completion_init (HlTieCompletion *self)
{
}

HlTieCompletion *
hl_tie_completion_new (GtkWidget *owner, GtkWidget *entry, HlSession *session, const HlAddress *own)
{
  HlTieCompletion *self = g_object_new (HL_TYPE_TIE_COMPLETION, NULL);

  self->entry = entry;
  self->session = g_object_ref (session);
  self->own = *own;
  self->list = gtk_list_box_new ();
  gtk_list_box_set_activate_on_single_click (GTK_LIST_BOX (self->list), TRUE);
  hl_pane_set_accessible (self->list, _("Quantities that it could follow"), NULL);
  g_signal_connect (self->list, "row-activated", G_CALLBACK (row_activated_cb), self);
  self->scroller = gtk_scrolled_window_new ();
  gtk_scrolled_window_set_policy (GTK_SCROLLED_WINDOW (self->scroller), GTK_POLICY_NEVER, GTK_POLICY_AUTOMATIC);
  gtk_scrolled_window_set_propagate_natural_height (GTK_SCROLLED_WINDOW (self->scroller), TRUE);
  gtk_scrolled_window_set_max_content_height (GTK_SCROLLED_WINDOW (self->scroller), 260);
  gtk_widget_set_size_request (self->scroller, 270, -1);
  gtk_scrolled_window_set_child (GTK_SCROLLED_WINDOW (self->scroller), self->list);
  self->popover = gtk_popover_new ();
  gtk_widget_add_css_class (self->popover, "tie-completion");
  gtk_popover_set_autohide (GTK_POPOVER (self->popover), FALSE);     /* or it would take the keys */
  gtk_popover_set_has_arrow (GTK_POPOVER (self->popover), FALSE);
  gtk_popover_set_position (GTK_POPOVER (self->popover), GTK_POS_BOTTOM);
  gtk_widget_set_can_focus (self->popover, FALSE);
  gtk_popover_set_child (GTK_POPOVER (self->popover), self->scroller);
  gtk_widget_set_parent (self->popover, owner);
  g_object_add_weak_pointer (G_OBJECT (self->popover), (gpointer *) &self->popover);
  self->owner = owner;
  return self;
}
