/* The option that says whether air is that of the plant's site.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "plant/kinds/kinds.h"

enum { AIR_OF_SITE, AIR_OWN };
static const char *const air_words[] = { "site", "own", NULL };
static const char *const air_names[] = { N_("of the site"), N_("its own"), NULL };

#define AIR_OPTION \
  { .key = "air", .name = N_("Air temperature"), .least = 0, .most = 1, .usual = AIR_OF_SITE, .choices = air_words, .choice_names = air_names }
#define WITH_OWN_AIR .when_option = "air", .when_choice = AIR_OWN
