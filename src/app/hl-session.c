/* What a window works on: plant with history, solution, selection, file.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-session.h"
#include "app/hl-trace.h"
#include "plant/i18n.h"

#define LONGEST_HISTORY 500
#define CLOSE_STEPS (1 * G_USEC_PER_SEC)     /* between presses of a key that make one step together */

/* A state of the document, and the step that led to it from the one before. */
typedef struct {
  HlDocument *document;
  char       *name;
  int         before, after;   /* variant in view when the step was made, in the document before, and then in this one */
} Step;

struct _HlSession {
  GObject     parent_instance;
  GPtrArray  *steps;         /* Step; never empty */
  guint       now;           /* index of the committed state */
  int         variant;       /* in view, of the committed document */
  gint64      again_time;    /* when hl_session_apply_again() made the last step; 0: something else did */
  HlPlant    *preview;       /* of a gesture in progress, or NULL */
  gboolean    has_solved_preview;
  HlSolution *solution;
  HlSolution *last_good;
  HlDocument *saved;         /* the state that the file holds, or NULL */
  char       *path;
  GPtrArray  *selection;     /* interned ids */
  char       *compared;      /* name of the variant that is compared with ("": the base), or of the plant below; NULL: none */
  HlPlant    *compared_plant;
};

enum { CHANGED, PREVIEWED, SELECTION_CHANGED, FILE_CHANGED, MESSAGE, GO_TO, N_SIGNALS };
static guint signals[N_SIGNALS];

G_DEFINE_FINAL_TYPE (HlSession, hl_session, G_TYPE_OBJECT)

static Step *
step_new (HlDocument *document, const char *name, int before, int after)
{
  Step *step = g_new (Step, 1);
  *step = (Step) { document, g_strdup (name), before, after };
  return step;
}

static void
step_free (gpointer data)
{
  Step *step = data;
  hl_document_unref (step->document);
  g_free (step->name);
  g_free (step);
}

static Step *
step_at (HlSession *self, guint n)
{
  return g_ptr_array_index (self->steps, n);
}

static HlDocument *
document (HlSession *self)
{
  return step_at (self, self->now)->document;
}

static HlPlant *
committed (HlSession *self)
{
  return hl_document_plant (document (self), self->variant);
}

static gboolean
has_id (HlPlant *plant, const char *id)
{
  return hl_plant_find_component (plant, id) != NULL || hl_plant_find_stream (plant, id) != NULL;
}

/* Ids that the present plant does not have leave the selection. */
static void
prune_selection (HlSession *self)
{
  gboolean is_changed = FALSE;
  for (guint n = self->selection->len; n-- > 0; )
    if (!has_id (hl_session_plant (self), g_ptr_array_index (self->selection, n)))
      {
        g_ptr_array_remove_index (self->selection, n);
        is_changed = TRUE;
      }
  if (is_changed)
    g_signal_emit (self, signals[SELECTION_CHANGED], 0);
}

static void
solve (HlSession *self)
{
  HlSolution *solution = hl_solve (hl_session_plant (self), self->solution);
  g_clear_pointer (&self->solution, hl_solution_unref);
  self->solution = solution;
  if (hl_solution_is_solved (solution))
    {
      g_clear_pointer (&self->last_good, hl_solution_unref);
      self->last_good = hl_solution_ref (solution);
    }
  hl_trace ("%s %.2f ms", hl_solution_is_solved (solution) ? "solved" : "unsolved", 1e3 * hl_solution_seconds (solution));
}

static void
plant_has_changed (HlSession *self)
{
  solve (self);
  prune_selection (self);
  g_signal_emit (self, signals[CHANGED], 0);
}

static void
forget_redo (HlSession *self)
{
  if (self->now + 1 < self->steps->len)
    g_ptr_array_remove_range (self->steps, self->now + 1, self->steps->len - self->now - 1);
}

/* Takes @next; @after: the variant in view from now on. */
static void
push_step (HlSession *self, HlDocument *next, const char *name, int after)
{
  forget_redo (self);
  g_ptr_array_add (self->steps, step_new (next, name, self->variant, after));
  if (self->steps->len > LONGEST_HISTORY)
    g_ptr_array_remove_index (self->steps, 0);
  self->now = self->steps->len - 1;
  self->variant = after;
}

/* Another variant's last good solution is no stand-in for this one's. */
static void
look_at (HlSession *self, int variant)
{
  if (variant != self->variant)
    g_clear_pointer (&self->last_good, hl_solution_unref);
  self->variant = variant;
}

static void
say_yielded (HlSession *self, GArray *yielded)
{
  g_autoptr (GString) text = g_string_new (NULL);
  for (guint n = 0; yielded != NULL && n < yielded->len; n++)
    g_string_append_printf (text, "%s%s", n > 0 ? " · " : "", g_array_index (yielded, HlYield, n).text);
  g_signal_emit (self, signals[MESSAGE], 0, text->str);
}

/* Life */

static void
hl_session_init (HlSession *self)
{
  self->steps = g_ptr_array_new_with_free_func (step_free);
  self->selection = g_ptr_array_new ();
  self->variant = HL_DOCUMENT_BASE;
  g_ptr_array_add (self->steps, step_new (hl_document_new (hl_plant_new ()), NULL, HL_DOCUMENT_BASE, HL_DOCUMENT_BASE));
  self->saved = hl_document_ref (document (self));
  solve (self);
}

static void
hl_session_finalize (GObject *object)
{
  HlSession *self = HL_SESSION (object);
  g_clear_pointer (&self->steps, g_ptr_array_unref);
  g_clear_pointer (&self->selection, g_ptr_array_unref);
  g_clear_pointer (&self->preview, hl_plant_unref);
  g_clear_pointer (&self->solution, hl_solution_unref);
  g_clear_pointer (&self->last_good, hl_solution_unref);
  g_clear_pointer (&self->saved, hl_document_unref);
  g_clear_pointer (&self->path, g_free);
  g_clear_pointer (&self->compared, g_free);
  g_clear_pointer (&self->compared_plant, hl_plant_unref);
  G_OBJECT_CLASS (hl_session_parent_class)->finalize (object);
}

static void
hl_session_class_init (HlSessionClass *class)
{
  GType type = G_TYPE_FROM_CLASS (class);
  G_OBJECT_CLASS (class)->finalize = hl_session_finalize;
  signals[CHANGED] = g_signal_new ("changed", type, G_SIGNAL_RUN_LAST, 0, NULL, NULL, NULL, G_TYPE_NONE, 0);
  signals[PREVIEWED] = g_signal_new ("previewed", type, G_SIGNAL_RUN_LAST, 0, NULL, NULL, NULL, G_TYPE_NONE, 0);
  signals[SELECTION_CHANGED] = g_signal_new ("selection-changed", type, G_SIGNAL_RUN_LAST, 0, NULL, NULL, NULL, G_TYPE_NONE, 0);
  signals[FILE_CHANGED] = g_signal_new ("file-changed", type, G_SIGNAL_RUN_LAST, 0, NULL, NULL, NULL, G_TYPE_NONE, 0);
  signals[GO_TO] = g_signal_new ("go-to", type, G_SIGNAL_RUN_LAST, 0, NULL, NULL, NULL, G_TYPE_NONE, 1, G_TYPE_STRING);
  signals[MESSAGE] = g_signal_new ("message", type, G_SIGNAL_RUN_LAST, 0, NULL, NULL, NULL, G_TYPE_NONE, 1, G_TYPE_STRING);
}

HlSession *
hl_session_new (void)
{
  return g_object_new (HL_TYPE_SESSION, NULL);
}

/* What it holds */

HlPlant *
hl_session_plant (HlSession *self)
{
  return self->preview != NULL ? self->preview : committed (self);
}

HlPlant *
hl_session_base (HlSession *self)
{
  return committed (self);
}

HlDocument *
hl_session_document (HlSession *self)
{
  return document (self);
}

int
hl_session_variant (HlSession *self)
{
  return self->variant;
}

HlSolution *
hl_session_solution (HlSession *self)
{
  return self->solution;
}

HlSolution *
hl_session_last_good (HlSession *self)
{
  return self->last_good;
}

/* Edits */

/* Takes @next, the document after the step. */
static void
commit (HlSession *self, HlDocument *next, const char *name, int variant)
{
  int before = self->variant;
  g_clear_pointer (&self->preview, hl_plant_unref);
  self->has_solved_preview = FALSE;
  self->again_time = 0;
  push_step (self, next, name, variant);
  if (before != variant)
    g_clear_pointer (&self->last_good, hl_solution_unref);
  hl_trace ("step %s", name);
  plant_has_changed (self);
  g_signal_emit (self, signals[FILE_CHANGED], 0);
}

void
hl_session_apply (HlSession *self, const char *name, HlPlant *plant, const HlAddress *edited, gboolean settle)
{
  g_autoptr (GArray) yielded = NULL;
  g_return_if_fail (plant != NULL);

  if (settle)
    {
      HlPlant *settled = hl_settle_from (plant, edited, hl_session_solution (self), &yielded);
      hl_plant_unref (plant);
      plant = settled;
    }
  commit (self, hl_document_with_plant (document (self), self->variant, plant), name, self->variant);
  hl_plant_unref (plant);
  say_yielded (self, yielded);
}

void
hl_session_apply_document (HlSession *self, const char *name, HlDocument *next, int variant)
{
  g_return_if_fail (next != NULL && variant >= HL_DOCUMENT_BASE && variant < (int) hl_document_n_variants (next));
  commit (self, next, name, variant);
  g_signal_emit (self, signals[MESSAGE], 0, "");
}

void
hl_session_show_variant (HlSession *self, int variant)
{
  g_return_if_fail (variant >= HL_DOCUMENT_BASE && variant < (int) hl_document_n_variants (document (self)));
  if (variant == self->variant)
    return;
  g_clear_pointer (&self->preview, hl_plant_unref);
  self->has_solved_preview = FALSE;
  self->again_time = 0;
  look_at (self, variant);
  hl_trace ("variant %s", hl_document_variant_name (document (self), variant));
  plant_has_changed (self);
  g_signal_emit (self, signals[MESSAGE], 0, "");
}

void
hl_session_apply_again (HlSession *self, const char *name, HlPlant *plant)
{
  gint64 now = g_get_monotonic_time ();
  Step *last = step_at (self, self->now);
  gboolean is_again = self->again_time != 0 && now - self->again_time < CLOSE_STEPS && self->now > 0
                      && g_strcmp0 (last->name, name) == 0 && last->document != self->saved && last->after == self->variant;

  if (is_again)
    {
      HlDocument *next = hl_document_with_plant (last->document, self->variant, plant);
      forget_redo (self);
      hl_document_unref (last->document);
      last->document = next;
      hl_plant_unref (plant);
      plant_has_changed (self);
      g_signal_emit (self, signals[FILE_CHANGED], 0);
    }
  else
    hl_session_apply (self, name, plant, NULL, FALSE);
  self->again_time = now;
}

void
hl_session_preview (HlSession *self, HlPlant *plant, gboolean with_solve)
{
  g_clear_pointer (&self->preview, hl_plant_unref);
  self->preview = plant;
  self->has_solved_preview |= with_solve;
  if (with_solve)
    plant_has_changed (self);
  else
    g_signal_emit (self, signals[PREVIEWED], 0);
}

void
hl_session_cancel_preview (HlSession *self)
{
  if (self->preview == NULL)
    return;
  g_clear_pointer (&self->preview, hl_plant_unref);
  if (self->has_solved_preview)
    plant_has_changed (self);
  else
    g_signal_emit (self, signals[CHANGED], 0);    /* the solution still belongs to this plant */
  self->has_solved_preview = FALSE;
}

gboolean
hl_session_set_value (HlSession *self, const HlAddress *address, const HlValue *value, GError **error)
{
  g_autofree char *described = NULL, *name = NULL;
  HlPlant *plant = hl_plant_with_value (committed (self), address, value, error);
  if (plant == NULL)
    return FALSE;
  described = hl_plant_describe (plant, address);
  /* Translators: names of undoable steps; %s is for instance "isentropic efficiency of T1" */
  name = g_strdup_printf (value != NULL ? _("Set %s") : _("Let go of %s"), described);
  hl_session_apply (self, name, plant, address, TRUE);
  return TRUE;
}

gboolean
hl_session_set_text (HlSession *self, const HlAddress *address, const char *text, GError **error)
{
  g_autofree char *trimmed = g_strstrip (g_strdup (text));
  HlValue value;
  if (*trimmed == '\0')
    return hl_session_set_value (self, address, NULL, error);
  if (!hl_value_parse (committed (self), address, trimmed, &value, error))
    return FALSE;
  return hl_session_set_value (self, address, &value, error);
}

gboolean
hl_session_mend (HlSession *self, const HlMend *mend, GError **error)
{
  HlPlant *plant = hl_mend_apply (mend, committed (self), error);
  if (plant == NULL)
    return FALSE;
  if (plant == committed (self))
    {
      hl_plant_unref (plant);
      hl_session_go_to (self, &mend->address);
      return TRUE;
    }
  /* No settling: it would give back at once what a mend lets go. */
  hl_session_apply (self, mend->text, plant, NULL, FALSE);
  return TRUE;
}

/* Comparing */

HlPlant *
hl_session_reference (HlSession *self, const char **name)
{
  int variant = HL_DOCUMENT_BASE;
  if (self->compared_plant != NULL)
    {
      if (name != NULL)
        *name = self->compared;
      return self->compared_plant;
    }
  if (self->compared != NULL && *self->compared != '\0')
    variant = hl_document_find_variant (document (self), self->compared);
  if (variant == self->variant)
    return NULL;
  if (name != NULL)
    *name = variant == HL_DOCUMENT_BASE ? C_("variant", "Base") : hl_document_variant_name (document (self), variant);
  return hl_document_plant (document (self), variant);
}

static void
compare (HlSession *self, HlPlant *plant, const char *name)
{
  char *own = g_strdup (name);
  g_clear_pointer (&self->compared_plant, hl_plant_unref);
  self->compared_plant = plant;
  g_free (self->compared);
  self->compared = own;
  g_signal_emit (self, signals[CHANGED], 0);
}

void
hl_session_compare_variant (HlSession *self, int variant)
{
  compare (self, NULL, hl_document_variant_name (document (self), variant));
}

void
hl_session_compare_plant (HlSession *self, HlPlant *plant, const char *name)
{
  compare (self, plant, name);
}

void
hl_session_compare_end (HlSession *self)
{
  compare (self, NULL, NULL);
}

gboolean
hl_session_is_comparing (HlSession *self)
{
  return self->compared != NULL;
}

/* Kept with the base, so that all variants have it. */
void
hl_session_dismiss (HlSession *self, const HlFinding *finding, gboolean is_dismissed)
{
  HlPlant *base = hl_document_plant (document (self), HL_DOCUMENT_BASE);
  g_autoptr (HlPlant) plant = hl_plant_with_dismissed (base, finding->code, &finding->at, is_dismissed);
  hl_session_apply_document (self, is_dismissed ? _("Dismiss a finding") : _("Restore a finding"),
                             hl_document_with_plant (document (self), HL_DOCUMENT_BASE, plant), self->variant);
}

/* History */

gboolean
hl_session_can_undo (HlSession *self)
{
  return self->now > 0;
}

gboolean
hl_session_can_redo (HlSession *self)
{
  return self->now + 1 < self->steps->len;
}

const char *
hl_session_undo_name (HlSession *self)
{
  return hl_session_can_undo (self) ? step_at (self, self->now)->name : NULL;
}

const char *
hl_session_redo_name (HlSession *self)
{
  return hl_session_can_redo (self) ? step_at (self, self->now + 1)->name : NULL;
}

/* What was done in a variant is undone in that variant, so that it is seen. */
static void
go_to_step (HlSession *self, guint n)
{
  int variant = n < self->now ? step_at (self, self->now)->before : step_at (self, n)->after;
  g_clear_pointer (&self->preview, hl_plant_unref);
  self->again_time = 0;
  self->now = n;
  look_at (self, variant);
  plant_has_changed (self);
  g_signal_emit (self, signals[FILE_CHANGED], 0);
  g_signal_emit (self, signals[MESSAGE], 0, "");
}

void
hl_session_undo (HlSession *self)
{
  if (hl_session_can_undo (self))
    go_to_step (self, self->now - 1);
}

void
hl_session_redo (HlSession *self)
{
  if (hl_session_can_redo (self))
    go_to_step (self, self->now + 1);
}

/* Selection */

const char *const *
hl_session_selection (HlSession *self, guint *n)
{
  if (n != NULL)
    *n = self->selection->len;
  return (const char *const *) self->selection->pdata;
}

gboolean
hl_session_is_selected (HlSession *self, const char *id)
{
  return id != NULL && g_ptr_array_find (self->selection, g_intern_string (id), NULL);
}

void
hl_session_select (HlSession *self, const char *id, gboolean extend)
{
  guint place;
  const char *interned = id != NULL ? g_intern_string (id) : NULL;

  if (interned != NULL && !has_id (hl_session_plant (self), interned))
    return;
  if (extend && interned != NULL)
    {
      if (g_ptr_array_find (self->selection, interned, &place))
        g_ptr_array_remove_index (self->selection, place);
      else
        g_ptr_array_add (self->selection, (gpointer) interned);
    }
  else if (!extend)
    {
      if (interned == NULL ? self->selection->len == 0
                           : self->selection->len == 1 && g_ptr_array_index (self->selection, 0) == interned)
        return;
      g_ptr_array_set_size (self->selection, 0);
      if (interned != NULL)
        g_ptr_array_add (self->selection, (gpointer) interned);
    }
  g_signal_emit (self, signals[SELECTION_CHANGED], 0);
}

void
hl_session_select_many (HlSession *self, const char *const *ids, guint n)
{
  g_ptr_array_set_size (self->selection, 0);
  for (guint i = 0; i < n; i++)
    if (has_id (hl_session_plant (self), ids[i]) && !hl_session_is_selected (self, ids[i]))
      g_ptr_array_add (self->selection, (gpointer) g_intern_string (ids[i]));
  g_signal_emit (self, signals[SELECTION_CHANGED], 0);
}

void
hl_session_go_to (HlSession *self, const HlAddress *address)
{
  g_autofree char *text = hl_address_to_text (address);
  hl_session_select (self, address->owner == HL_OWNER_PLANT ? NULL : address->id, FALSE);
  g_signal_emit (self, signals[GO_TO], 0, text);
}

/* File */

void
hl_session_reset (HlSession *self, HlPlant *plant, const char *path)
{
  hl_session_reset_document (self, hl_document_new (plant), path);
}

void
hl_session_reset_document (HlSession *self, HlDocument *next, const char *path)
{
  char *own_path = g_strdup (path);    /* @path may be ours */
  gboolean had_selection = self->selection->len > 0;
  g_clear_pointer (&self->preview, hl_plant_unref);
  g_clear_pointer (&self->last_good, hl_solution_unref);
  g_clear_pointer (&self->saved, hl_document_unref);
  g_clear_pointer (&self->compared, g_free);
  g_clear_pointer (&self->compared_plant, hl_plant_unref);
  g_free (self->path);
  self->path = own_path;
  g_ptr_array_set_size (self->steps, 0);
  g_ptr_array_add (self->steps, step_new (next, NULL, HL_DOCUMENT_BASE, HL_DOCUMENT_BASE));
  self->now = 0;
  self->variant = HL_DOCUMENT_BASE;
  self->saved = hl_document_ref (next);
  g_ptr_array_set_size (self->selection, 0);
  g_clear_pointer (&self->solution, hl_solution_unref);    /* of another plant: no start for this one */
  plant_has_changed (self);
  if (had_selection)
    g_signal_emit (self, signals[SELECTION_CHANGED], 0);
  g_signal_emit (self, signals[FILE_CHANGED], 0);
  g_signal_emit (self, signals[MESSAGE], 0, "");
}

gboolean
hl_session_open (HlSession *self, const char *path, GError **error)
{
  HlDocument *next = hl_document_load (path, error);
  if (next == NULL)
    return FALSE;
  hl_session_reset_document (self, next, path);
  return TRUE;
}

gboolean
hl_session_revert (HlSession *self, GError **error)
{
  HlDocument *next;
  if (self->path == NULL)
    {
      g_set_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_FILE, _("This plant has no file yet; choose one with Save as"));
      return FALSE;
    }
  next = hl_document_load (self->path, error);
  if (next == NULL)
    return FALSE;
  g_clear_pointer (&self->saved, hl_document_unref);
  self->saved = hl_document_ref (next);
  hl_session_apply_document (self, _("Revert to the file"), next, hl_document_find_variant (next, hl_document_variant_name (document (self), self->variant)));
  return TRUE;
}

gboolean
hl_session_save (HlSession *self, const char *path, GError **error)
{
  g_autofree char *target = g_strdup (path != NULL ? path : self->path);
  if (target == NULL)
    {
      g_set_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_FILE, _("This plant has no file yet; choose one with Save as"));
      return FALSE;
    }
  if (!hl_document_save (document (self), target, error))
    return FALSE;
  g_clear_pointer (&self->saved, hl_document_unref);
  self->saved = hl_document_ref (document (self));
  g_free (self->path);
  self->path = g_steal_pointer (&target);
  hl_trace ("saved %s", self->path);
  g_signal_emit (self, signals[FILE_CHANGED], 0);
  return TRUE;
}

const char *
hl_session_path (HlSession *self)
{
  return self->path;
}

gboolean
hl_session_is_dirty (HlSession *self)
{
  return document (self) != self->saved && !hl_document_equal (document (self), self->saved);
}

char *
hl_session_display_name (HlSession *self)
{
  const char *title = hl_plant_title (committed (self));
  if (title != NULL && *title != '\0')
    return g_strdup (title);
  if (self->path != NULL)
    return g_path_get_basename (self->path);
  return g_strdup (_("Untitled plant"));
}
