/* Another variant as a ghost in the state diagram: which one, and its solution.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-diagram-ghost.h"
#include "app/hl-pane.h"
#include "plant/i18n.h"

struct _HlDiagramGhost {
  HlSession  *session;
  void      (*changed) (gpointer data);
  gpointer    data;
  GtkWidget  *chooser;         /* 0 none, 1 the base, then the variants */
  char       *name;            /* of the one chosen, "" the base; NULL none */
  HlSolution *solution;        /* of it; NULL where it is the plant in view, or has none */
  GPtrArray  *listed;          /* names that stand in the chooser */
  gboolean    is_filling;
};

/* The variant chosen: HL_DOCUMENT_BASE - 1 for none, or where it is gone. */
static int
chosen (HlDiagramGhost *self)
{
  HlDocument *document = hl_session_document (self->session);
  int variant;
  if (self->name == NULL)
    return HL_DOCUMENT_BASE - 1;
  if (*self->name == '\0')
    return HL_DOCUMENT_BASE;
  variant = hl_document_find_variant (document, self->name);
  return variant == HL_DOCUMENT_BASE ? HL_DOCUMENT_BASE - 1 : variant;
}

/* A list of choices is dear to fill, and edits rarely change it. */
static gboolean
is_listed (HlDiagramGhost *self, HlDocument *document)
{
  if (self->listed == NULL || self->listed->len != hl_document_n_variants (document))
    return FALSE;
  for (guint n = 0; n < self->listed->len; n++)
    if (!g_str_equal (self->listed->pdata[n], hl_document_variant_name (document, (int) n)))
      return FALSE;
  return TRUE;
}

static void
fill_chooser (HlDiagramGhost *self)
{
  HlDocument *document = hl_session_document (self->session);
  g_autoptr (GtkStringList) names = NULL;
  if (is_listed (self, document))
    return;
  g_clear_pointer (&self->listed, g_ptr_array_unref);
  self->listed = g_ptr_array_new_with_free_func (g_free);
  for (guint n = 0; n < hl_document_n_variants (document); n++)
    g_ptr_array_add (self->listed, g_strdup (hl_document_variant_name (document, (int) n)));
  names = gtk_string_list_new (NULL);
  gtk_string_list_append (names, _("no ghost"));
  gtk_string_list_append (names, C_("variant", "Base"));
  for (guint n = 0; n < hl_document_n_variants (document); n++)
    gtk_string_list_append (names, hl_document_variant_name (document, (int) n));
  self->is_filling = TRUE;
  gtk_drop_down_set_model (GTK_DROP_DOWN (self->chooser), G_LIST_MODEL (names));
  gtk_drop_down_set_selected (GTK_DROP_DOWN (self->chooser), (guint) (chosen (self) + 2));
  self->is_filling = FALSE;
  gtk_widget_set_visible (self->chooser, hl_document_n_variants (document) > 0);
}

void
hl_diagram_ghost_update (HlDiagramGhost *self)
{
  int variant = chosen (self);
  gboolean is_other = variant >= HL_DOCUMENT_BASE && variant != hl_session_variant (self->session);
  HlPlant *plant = is_other ? hl_document_plant (hl_session_document (self->session), variant) : NULL;
  fill_chooser (self);
  if (plant == (self->solution != NULL ? hl_solution_plant (self->solution) : NULL))
    return;
  g_clear_pointer (&self->solution, hl_solution_unref);
  if (plant != NULL)
    self->solution = hl_solve (plant, hl_session_solution (self->session));
  self->changed (self->data);
}

void
hl_diagram_ghost_choose (HlDiagramGhost *self, const char *variant)
{
  char *name = g_strdup (variant);
  g_free (self->name);
  self->name = name;
  self->is_filling = TRUE;
  gtk_drop_down_set_selected (GTK_DROP_DOWN (self->chooser), (guint) (chosen (self) + 2));
  self->is_filling = FALSE;
  hl_diagram_ghost_update (self);
}

static void
selected_cb (HlDiagramGhost *self)
{
  guint selected = gtk_drop_down_get_selected (GTK_DROP_DOWN (self->chooser));
  if (self->is_filling || selected == GTK_INVALID_LIST_POSITION)
    return;
  hl_diagram_ghost_choose (self, selected == 0 ? NULL : hl_document_variant_name (hl_session_document (self->session), (int) selected - 2));
}

HlDiagramGhost *
hl_diagram_ghost_new (HlSession *session, void (*changed) (gpointer data), gpointer data)
{
  HlDiagramGhost *self = g_new0 (HlDiagramGhost, 1);
  self->session = g_object_ref (session);
  self->changed = changed;
  self->data = data;
  self->chooser = g_object_ref_sink (gtk_drop_down_new (NULL, NULL));
  hl_pane_set_accessible (self->chooser, _("Variant drawn pale beneath"), NULL);
  gtk_widget_set_tooltip_text (self->chooser, _("Variant drawn pale beneath"));
  g_signal_connect_swapped (self->chooser, "notify::selected", G_CALLBACK (selected_cb), self);
  fill_chooser (self);
  return self;
}

void
hl_diagram_ghost_free (HlDiagramGhost *self)
{
  g_signal_handlers_disconnect_by_data (self->chooser, self);
  g_clear_object (&self->chooser);
  g_clear_pointer (&self->solution, hl_solution_unref);
  g_clear_pointer (&self->listed, g_ptr_array_unref);
  g_clear_object (&self->session);
  g_free (self->name);
  g_free (self);
}

GtkWidget *
hl_diagram_ghost_chooser (HlDiagramGhost *self)
{
  return self->chooser;
}

HlSolution *
hl_diagram_ghost_solution (HlDiagramGhost *self)
{
  return self->solution;
}
