/* What a random plant consists of, how it gets smaller, and where its numbers come from.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "random-plant.h"
#include <math.h>

double
random_number (guint32 seed, const char *purpose, int count)
{
  guint64 z = ((guint64) seed << 32 | g_str_hash (purpose)) + 0x9e3779b97f4a7c15u * (guint64) (count + 1);
  for (int round = 0; round < 2; round++)
    {
      z = (z ^ (z >> 30)) * 0xbf58476d1ce4e5b9u;
      z = (z ^ (z >> 27)) * 0x94d049bb133111ebu;
      z ^= z >> 31;
    }
  return (double) (z >> 11) * 0x1p-53;
}

int
random_below (guint32 seed, const char *purpose, int count, int n)
{
  return MIN ((int) (random_number (seed, purpose, count) * n), n - 1);
}

double
random_between (guint32 seed, const char *purpose, int count, double low, double high)
{
  return low + random_number (seed, purpose, count) * (high - low);
}

double
random_decades (guint32 seed, const char *purpose, int count, double low, double high)
{
  return low * pow (high / low, random_number (seed, purpose, count));
}

gboolean
random_chance (guint32 seed, const char *purpose, int count, double share)
{
  return random_number (seed, purpose, count) < share;
}

RandomDesign
random_design (guint32 seed)
{
  RandomDesign d = { .seed = seed };
  d.sink = random_below (seed, "sink", 0, N_SINKS);
  d.reheats = random_below (seed, "reheats", 0, 3);
  d.heaters = random_below (seed, "heaters", 0, MOST_HEATERS + 1);
  d.open_heaters = random_below (seed, "open", 0, 3);
  d.forward = random_below (seed, "forward", 0, 3);
  d.users = random_chance (seed, "users", 0, 0.5) ? 1 + random_below (seed, "users", 1, 2) : 0;
  d.districts = random_chance (seed, "districts", 0, 0.3);
  d.feed_turbine = random_chance (seed, "feed-turbine", 0, 0.25);
  d.transformer = random_chance (seed, "transformer", 0, 0.25);
  d.spray = random_chance (seed, "spray", 0, 0.3);
  d.separator = random_chance (seed, "separator", 0, 0.25);
  d.twin = random_chance (seed, "twin", 0, 0.25);
  d.splits = random_below (seed, "splits", 0, 3);
  d.second_shaft = random_chance (seed, "second-shaft", 0, 0.3);
  d.gearbox = random_chance (seed, "gearbox", 0, 0.2);
  d.trims = random_below (seed, "trims", 0, 2);
  d.tricks = random_below (seed, "tricks", 0, 2);
  d.swaps = random_below (seed, "swaps", 0, 7);
  return d;
}

static const struct { const char *name; gsize offset; } parts[] = {
#define PART(field) { #field, G_STRUCT_OFFSET (RandomDesign, field) }
  PART (users), PART (districts), PART (feed_turbine), PART (transformer), PART (spray), PART (separator), PART (twin), PART (splits),
  PART (second_shaft), PART (gearbox), PART (tricks), PART (trims), PART (reheats), PART (open_heaters), PART (forward), PART (heaters),
  PART (sink), PART (swaps),
};

gboolean
random_simpler (const RandomDesign *design, int *step, RandomDesign *simpler)
{
  for (; *step < 2 * (int) G_N_ELEMENTS (parts); ++*step)
    {
      *simpler = *design;
      int *field = G_STRUCT_MEMBER_P (simpler, parts[*step % G_N_ELEMENTS (parts)].offset);
      if (*field <= 0)
        continue;
      /* All of it at first, then one less. */
      *field = *step < (int) G_N_ELEMENTS (parts) ? 0 : *field - 1;
      ++*step;
      return TRUE;
    }
  return FALSE;
}

char *
random_describe (const RandomDesign *design)
{
  GString *text = g_string_new (NULL);
  g_string_append_printf (text, "seed %u", design->seed);
  for (guint k = 0; k < G_N_ELEMENTS (parts); k++)
    g_string_append_printf (text, " %s %d", parts[k].name, G_STRUCT_MEMBER (int, design, parts[k].offset));
  return g_string_free (text, FALSE);
}
