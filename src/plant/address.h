/* Addresses: the one grammar that names any quantity of a plant.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "fluid/fluid.h"
G_BEGIN_DECLS

typedef enum { HL_OWNER_COMPONENT, HL_OWNER_STREAM, HL_OWNER_PLANT } HlOwner;

/* T1.isentropic_efficiency    {COMPONENT, "T1", "isentropic_efficiency"}
 * T1.inlet.p                  {COMPONENT, "T1", "inlet.p"}
 * m:1 or stream:1.m           {STREAM, "1", "m"};  a stream whose id is a name also as live.m
 * plant.net_power             {PLANT, "", "net_power"}
 * Strings are interned: compare and copy as pointers, never free. */
typedef struct {
  HlOwner     owner;
  const char *id;
  const char *key;
} HlAddress;

typedef struct _HlPlant HlPlant;

HL_PUBLIC HlAddress hl_address_component (const char *id, const char *key);
HL_PUBLIC HlAddress hl_address_stream    (const char *id, const char *key);
HL_PUBLIC HlAddress hl_address_plant     (const char *key);
HL_PUBLIC gboolean  hl_address_equal     (const HlAddress *a, const HlAddress *b);
HL_PUBLIC char     *hl_address_to_text   (const HlAddress *address);   /* canonical; g_free() */
/* Parses the grammar and checks that @plant has such a quantity; @plant may be NULL to check the grammar only. */
HL_PUBLIC gboolean  hl_address_parse     (const char *text, const HlPlant *plant, HlAddress *address, GError **error);
G_END_DECLS
