/* A document: a base plant and its variants, each the ordered differences from it; what a file holds.  Never modified once shared.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "plant/change.h"
G_BEGIN_DECLS

#define HL_DOCUMENT_BASE (-1)        /* in place of a variant's number: the base plant */

typedef struct _HlDocument HlDocument;
HL_PUBLIC HlDocument *hl_document_new   (HlPlant *base);                    /* (transfer full); without variants */
HL_PUBLIC HlDocument *hl_document_ref   (HlDocument *document);             /* atomic */
HL_PUBLIC void        hl_document_unref (HlDocument *document);
G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlDocument, hl_document_unref)

/* Reading */
HL_PUBLIC guint       hl_document_n_variants   (const HlDocument *document);
HL_PUBLIC const char *hl_document_variant_name (const HlDocument *document, int variant);        /* "" for the base */
HL_PUBLIC int         hl_document_find_variant (const HlDocument *document, const char *name);   /* HL_DOCUMENT_BASE: none of that name */
/* (transfer none) The base plant, or base and changes: the same plant each time it is asked for. */
HL_PUBLIC HlPlant    *hl_document_plant        (const HlDocument *document, int variant);
/* (element-type HlChange) (transfer none): none for the base. */
HL_PUBLIC const GPtrArray *hl_document_changes   (const HlDocument *document, int variant);
/* (element-type HlUnapplied) (transfer none): changes that stay with the variant and do not fit the base as it is now. */
HL_PUBLIC const GPtrArray *hl_document_unapplied (const HlDocument *document, int variant);
HL_PUBLIC gboolean    hl_document_equal        (const HlDocument *a, const HlDocument *b);

/* Editing: each returns a new document (transfer full).  Titles, units, formulation and unknown keys are the document's: changed anywhere
 * they change everywhere. */
HL_PUBLIC HlDocument *hl_document_with_plant    (const HlDocument *document, int variant, const HlPlant *plant);   /* what an edit made of it */
HL_PUBLIC HlDocument *hl_document_with_variant  (const HlDocument *document, const char *name, int from, GError **error);  /* put behind @from, with its changes */
HL_PUBLIC HlDocument *hl_document_with_name     (const HlDocument *document, int variant, const char *name, GError **error);
HL_PUBLIC HlDocument *hl_document_without       (const HlDocument *document, int variant);
HL_PUBLIC HlDocument *hl_document_with_order    (const HlDocument *document, int variant, int place);              /* moved to that place */
/* The variant becomes the base; the former base takes its place as a variant; all plants stay what they were. */
HL_PUBLIC HlDocument *hl_document_promoted      (const HlDocument *document, int variant);
HL_PUBLIC char       *hl_document_free_name     (const HlDocument *document, const char *stem);                    /* "summer 2"; g_free() */

/* JSON: a plant file with "variants", one change a line. */
HL_PUBLIC HlDocument *hl_document_from_json (const char *text, gssize length, const char *name, GError **error);
HL_PUBLIC char       *hl_document_to_json   (const HlDocument *document);                        /* g_free() */
HL_PUBLIC HlDocument *hl_document_load      (const char *path, GError **error);
HL_PUBLIC gboolean    hl_document_save      (const HlDocument *document, const char *path, GError **error);
G_END_DECLS
