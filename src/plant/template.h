/* Plants to start from: common layouts, drawn and valued so far that they solve; every value in them is assumed.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "plant/plant.h"
G_BEGIN_DECLS

typedef struct {
  const char *id;              /* "reheat" */
  const char *name;            /* "Reheat", marked for translation */
  const char *help;            /* one sentence, marked for translation */
  int         least, most;     /* feedwater heaters that can be asked for; both 0: no choice */
  int         usual;
} HlTemplate;

HL_PUBLIC guint             hl_template_count  (void);
HL_PUBLIC const HlTemplate *hl_template_nth    (guint n);
HL_PUBLIC const HlTemplate *hl_template_lookup (const char *id);     /* NULL when unknown */
/* @heaters: number of feedwater heaters, clamped to what the template allows; ignored where it has no choice. */
HL_PUBLIC HlPlant          *hl_template_build  (const HlTemplate *self, int heaters);
G_END_DECLS
