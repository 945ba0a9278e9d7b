/* The inside of a document.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "plant/change-private.h"
#include "plant/document.h"
G_BEGIN_DECLS

#define HL_MAX_VARIANTS 200
#define HL_MAX_CHANGES 20000
#define HL_MAX_VARIANT_NAME 200          /* bytes */

typedef struct {
  gatomicrefcount ref_count;
  char       *name;
  GPtrArray  *changes;                   /* HlChange; never changed once shared */
  JsonObject *extra;                     /* unknown keys of the file; or NULL */
} HlVariant;

/* What base and changes make; an atomic box, shared with documents of the same base. */
typedef struct {
  HlPlant   *plant;
  GPtrArray *unapplied;                  /* HlUnapplied */
} HlMade;

struct _HlDocument {
  gatomicrefcount ref_count;
  HlPlant   *base;
  GPtrArray *variants;                   /* HlVariant; shared with other documents */
  GMutex     lock;                       /* of @made, as a document may be asked from several threads */
  HlMade   **made;                       /* [variants]; NULL until asked for */
};

HlVariant  *hl_variant_new            (const char *name, GPtrArray *changes, JsonObject *extra);   /* takes all but the name */
void        hl_variant_unref          (HlVariant *variant);
/* Takes base and variants; what @former (nullable) has made of the same base and variant serves again. */
HlDocument *hl_document_build         (HlPlant *base, GPtrArray *variants, const HlDocument *former);
gboolean    hl_variant_name_is_good   (const char *name, GError **error);
G_END_DECLS
