/* Groups of rows that are changed in place: what stays keeps its widget, and with it the focus.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-nameplate-body.h"
#include "app/hl-pane.h"
#include "app/hl-quantity-row.h"
#include "app/hl-shared-row.h"

typedef struct {
  GtkWidget *widget;
  GtkWidget *card;         /* of a group: where its rows are */
  GtkWidget *last;         /* of a group: the row put last in this round */
  guint      round;
} Part;

struct _HlNameplateBody {
  GtkWidget   parent_instance;
  GHashTable *groups;      /* heading -> Part */
  GHashTable *rows;        /* key -> Part */
  GtkWidget  *last_group;
  guint       round;
};

G_DEFINE_FINAL_TYPE (HlNameplateBody, hl_nameplate_body, GTK_TYPE_WIDGET)

static Part *
group_for (HlNameplateBody *self, const char *heading)
{
  Part *group = g_hash_table_lookup (self->groups, heading);

  if (group == NULL)
    {
      group = g_new0 (Part, 1);
      group->widget = gtk_box_new (GTK_ORIENTATION_VERTICAL, 0);
      gtk_widget_add_css_class (group->widget, "pane-group");
      if (*heading != '\0')
        gtk_box_append (GTK_BOX (group->widget), hl_pane_heading (heading));
      group->card = gtk_box_new (GTK_ORIENTATION_VERTICAL, 0);
      gtk_widget_add_css_class (group->card, "pane-card");
      gtk_box_append (GTK_BOX (group->widget), group->card);
      gtk_widget_insert_after (group->widget, GTK_WIDGET (self), self->last_group);
      g_hash_table_insert (self->groups, g_strdup (heading), group);
    }
  else if (group->round != self->round && gtk_widget_get_prev_sibling (group->widget) != self->last_group)
    gtk_widget_insert_after (group->widget, GTK_WIDGET (self), self->last_group);
  if (group->round != self->round)
    {
      group->round = self->round;
      group->last = NULL;
      self->last_group = group->widget;
    }
  return group;
}

GtkWidget *
hl_nameplate_body_find (HlNameplateBody *self, const char *key)
{
  Part *row = g_hash_table_lookup (self->rows, key);
  return row != NULL ? row->widget : NULL;
}

void
hl_nameplate_body_put (HlNameplateBody *self, const char *heading, const char *key, GtkWidget *widget)
{
  Part *group = group_for (self, heading);
  Part *row = g_hash_table_lookup (self->rows, key);

  if (row == NULL)
    {
      row = g_new0 (Part, 1);
      row->widget = widget;
      g_hash_table_insert (self->rows, g_strdup (key), row);
    }
  if (gtk_widget_get_parent (widget) != group->card || gtk_widget_get_prev_sibling (widget) != group->last)
    {
      if (gtk_widget_get_parent (widget) == NULL || gtk_widget_get_parent (widget) == group->card)
        gtk_widget_insert_after (widget, group->card, group->last);
      else
        {
          g_object_ref (widget);
          gtk_box_remove (GTK_BOX (gtk_widget_get_parent (widget)), widget);
          gtk_widget_insert_after (widget, group->card, group->last);
          g_object_unref (widget);
        }
    }
  row->round = self->round;
  group->last = widget;
}

void
hl_nameplate_body_begin (HlNameplateBody *self)
{
  self->round++;
  self->last_group = NULL;
}

static void
drop_old (GHashTable *parts, guint round)
{
  GHashTableIter iter;
  Part *part;

  g_hash_table_iter_init (&iter, parts);
  while (g_hash_table_iter_next (&iter, NULL, (gpointer *) &part))
    if (part->round != round)
      {
        /* Losing the focus must not commit what was typed into a quantity that is gone. */
        if (HL_IS_QUANTITY_ROW (part->widget))
          g_free (hl_quantity_row_take_draft (HL_QUANTITY_ROW (part->widget)));
        else if (HL_IS_SHARED_ROW (part->widget))
          hl_shared_row_retire (HL_SHARED_ROW (part->widget));
        gtk_widget_unparent (part->widget);
        g_hash_table_iter_remove (&iter);
      }
}

void
hl_nameplate_body_end (HlNameplateBody *self)
{
  drop_old (self->rows, self->round);
  drop_old (self->groups, self->round);
}

void
hl_nameplate_body_clear (HlNameplateBody *self)
{
  hl_nameplate_body_begin (self);
  hl_nameplate_body_end (self);
}

void
hl_nameplate_body_foreach (HlNameplateBody *self, void (*func) (GtkWidget *row, gpointer data), gpointer data)
{
  GHashTableIter iter;
  Part *part;

  g_hash_table_iter_init (&iter, self->rows);
  while (g_hash_table_iter_next (&iter, NULL, (gpointer *) &part))
    func (part->widget, data);
}

static void
hl_nameplate_body_dispose (GObject *object)
{
  HlNameplateBody *self = HL_NAMEPLATE_BODY (object);
  if (self->rows != NULL)
    hl_nameplate_body_clear (self);
  g_clear_pointer (&self->rows, g_hash_table_unref);
  g_clear_pointer (&self->groups, g_hash_table_unref);
  G_OBJECT_CLASS (hl_nameplate_body_parent_class)->dispose (object);
}

static void
hl_nameplate_body_class_init (HlNameplateBodyClass *klass)
{
  GtkWidgetClass *widget_class = GTK_WIDGET_CLASS (klass);
  G_OBJECT_CLASS (klass)->dispose = hl_nameplate_body_dispose;
  gtk_widget_class_set_layout_manager_type (widget_class, GTK_TYPE_BOX_LAYOUT);
  gtk_widget_class_set_css_name (widget_class, "nameplatebody");
}

static void
hl_nameplate_body_init (HlNameplateBody *self)
{
  gtk_orientable_set_orientation (GTK_ORIENTABLE (gtk_widget_get_layout_manager (GTK_WIDGET (self))), GTK_ORIENTATION_VERTICAL);
  self->groups = g_hash_table_new_full (g_str_hash, g_str_equal, g_free, g_free);
  self->rows = g_hash_table_new_full (g_str_hash, g_str_equal, g_free, g_free);
}

GtkWidget *
hl_nameplate_body_new (void)
{
  return g_object_new (HL_TYPE_NAMEPLATE_BODY, NULL);
}
