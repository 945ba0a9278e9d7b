/* Which sizes of a component stay when it is rated, and what each of them finds.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/component.h"
#include <string.h>

static guint
count (const HlComponent *component, const HlRating *rating)
{
  return rating->repeat != NULL ? (guint) MAX (hl_component_option (component, rating->repeat), 0) : 1;
}

/* "extraction#.p" and 2 are "extraction2.p". */
static const char *
numbered (const char *key, int number)
{
  const char *mark = strchr (key, '#');
  if (mark == NULL)
    return g_intern_string (key);
  g_autofree char *whole = g_strdup_printf ("%.*s%d%s", (int) (mark - key), key, number, mark + 1);
  return g_intern_string (whole);
}

guint
hl_component_n_ratings (const HlComponent *component)
{
  guint n = 0;
  g_return_val_if_fail (component != NULL, 0);
  for (guint k = 0; k < component->kind->n_ratings; k++)
    n += count (component, &component->kind->ratings[k]);
  return n;
}

HlRatingPair
hl_component_rating (const HlComponent *component, guint n)
{
  HlRatingPair none = { NULL, NULL };
  g_return_val_if_fail (component != NULL, none);
  for (guint k = 0; k < component->kind->n_ratings; k++)
    {
      const HlRating *rating = &component->kind->ratings[k];
      if (n >= count (component, rating))
        {
          n -= count (component, rating);
          continue;
        }
      return (HlRatingPair) { numbered (rating->frozen, (int) n + 1 + rating->frozen_ahead), numbered (rating->found, (int) n + 1) };
    }
  g_return_val_if_reached (none);
}
