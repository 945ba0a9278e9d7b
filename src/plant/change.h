/* A change: one difference of a variant from its base, in the form of a plant file.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "plant/plant.h"
G_BEGIN_DECLS

typedef enum {
  HL_CHANGE_SET,        /* {"set": address, "to": value}: a quantity, an option, a place, a medium, a figure of the site */
  HL_CHANGE_REMOVE,     /* {"remove": id}: a component, stream or shaft */
  HL_CHANGE_ADD,        /* {"add": {...}}: the same, as it stands in the lists of a file */
} HlChangeKind;

typedef struct _HlChange HlChange;                /* immutable */
HL_PUBLIC HlChange    *hl_change_ref   (HlChange *change);
HL_PUBLIC void         hl_change_unref (HlChange *change);
HL_PUBLIC HlChangeKind hl_change_kind  (const HlChange *change);
HL_PUBLIC const char  *hl_change_where (const HlChange *change);      /* address of what is set; id of what is removed or added */
HL_PUBLIC const char  *hl_change_owner (const HlChange *change);      /* id of the component, stream or shaft; "" for the plant */
HL_PUBLIC gboolean     hl_change_is_look (const HlChange *change);    /* moves or turns the drawing only */
HL_PUBLIC gboolean     hl_change_equal (const HlChange *a, const HlChange *b);
HL_PUBLIC char        *hl_change_to_json (const HlChange *change);    /* one line; g_free() */
/* The quantity that is set; FALSE where the change sets none, or @plant has no such quantity. */
HL_PUBLIC gboolean     hl_change_address (const HlChange *change, const HlPlant *plant, HlAddress *address);
/* In words of the reader: "extraction pressure of T1", "add V3 (throttle valve)". g_free(). */
HL_PUBLIC char        *hl_change_describe (const HlChange *change, const HlPlant *base, const HlPlant *plant);
/* What the change sets, as people read it in @plant, which has it; "" where it sets nothing.  g_free(). */
HL_PUBLIC char        *hl_change_shown  (const HlChange *change, const HlPlant *plant);

/* A change that did not apply, and why. */
typedef struct {
  HlChange *change;
  char     *why;        /* translated */
} HlUnapplied;

/* @plant with one change made (transfer full); NULL with the reason where it does not apply. */
HL_PUBLIC HlPlant   *hl_change_apply   (const HlChange *change, const HlPlant *plant, GError **error);
/* All of them in order.  Those that do not apply are left out and appended to @unapplied (nullable, of HlUnapplied *). */
HL_PUBLIC HlPlant   *hl_changes_apply  (const GPtrArray *changes, const HlPlant *plant, GPtrArray *unapplied);
HL_PUBLIC GPtrArray *hl_unapplied_list (void);                         /* empty list that frees its items */
/* What leads from @base to @plant, in an order that applies: (element-type HlChange).  Title, units, formulation and keys that the program
 * does not know belong to the document and make no change. */
HL_PUBLIC GPtrArray *hl_changes_between (const HlPlant *base, const HlPlant *plant);

/* Whether what stands at @address differs: another value, origin, or none.  FALSE where one of the plants has no such quantity. */
HL_PUBLIC gboolean   hl_plant_differs_at (const HlPlant *a, const HlPlant *b, const HlAddress *address);

G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlChange, hl_change_unref)
G_END_DECLS
