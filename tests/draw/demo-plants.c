/* Plants for the tests of pictures, built in code.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "demo-plants.h"
#include <string.h>

static void
put (HlPlant **plant, const char *kind, const char *id, int x, int y, const char *name)
{
  HlComponent *component = hl_component_new (hl_kind_lookup (kind), id, x, y);
  HlPlant *next;
  if (name != NULL)
    hl_component_set_name (component, name);
  next = hl_plant_with_component (*plant, component);
  hl_plant_unref (*plant);
  *plant = next;
}

/* Changes one placed component: @option may be NULL. */
static void
set (HlPlant **plant, const char *id, int turn, gboolean is_mirrored, const char *option, int value)
{
  HlComponent *component = hl_component_copy (hl_plant_find_component (*plant, id));
  HlPlant *next;
  component->turn = turn;
  component->is_mirrored = is_mirrored;
  if (option != NULL)
    hl_component_set_option (component, option, value);
  next = hl_plant_with_component (*plant, component);
  hl_plant_unref (*plant);
  *plant = next;
}

static void
join (HlPlant **plant, const char *from, const char *from_port, const char *to, const char *to_port)
{
  g_autofree char *id = hl_plant_free_id (*plant, "");
  HlPlant *next = hl_plant_with_stream (*plant, hl_stream_new (id, from, from_port, to, to_port));
  hl_plant_unref (*plant);
  *plant = next;
}

static void
join_shaft (HlPlant **plant, const char *id, const char *const *joins, guint n)
{
  HlPlant *next = hl_plant_with_shaft (*plant, hl_shaft_new (id, joins, n));
  hl_plant_unref (*plant);
  *plant = next;
}

static void
give_title (HlPlant **plant, const char *title)
{
  HlPlant *next = hl_plant_with_title (*plant, title);
  hl_plant_unref (*plant);
  *plant = next;
}

HlPlant *
hl_demo_simple_loop (void)
{
  static const char *const shaft[] = { "T1", "G1" };
  HlPlant *plant = hl_plant_new ();
  give_title (&plant, "Simple loop");
  put (&plant, "heat_input", "B1", 8, 20, "heat");
  put (&plant, "turbine", "T1", 28, 10, NULL);
  put (&plant, "generator", "G1", 42, 10, NULL);
  put (&plant, "condenser", "C1", 34, 24, NULL);
  put (&plant, "pump", "P1", 20, 32, NULL);
  set (&plant, "P1", 0, TRUE, NULL, 0);
  join (&plant, "B1", "steam", "T1", "inlet");
  join (&plant, "T1", "exhaust", "C1", "steam");
  join (&plant, "C1", "condensate", "P1", "inlet");
  join (&plant, "P1", "outlet", "B1", "feed");
  join_shaft (&plant, "S1", shaft, 2);
  return plant;
}

/* The extraction plant with its top left corner at (x, y); @suffix makes its ids its own. */
static void
put_extraction (HlPlant **plant, int x, int y, const char *suffix)
{
  enum { B1, T1, G1, C1, P1, D1, P2, X1, U1, M1, W1, N };
  static const char *const stems[N] = { "B1", "T1", "G1", "C1", "P1", "D1", "P2", "X1", "U1", "M1", "W1" };
  char id[N][16], shaft_id[16];
  const char *joins[2];
  for (guint i = 0; i < N; i++)
    g_snprintf (id[i], sizeof id[i], "%s%s", stems[i], suffix);
  g_snprintf (shaft_id, sizeof shaft_id, "S1%s", suffix);
  put (plant, "boiler", id[B1], x + 8, y + 20, "wood-fired boiler");
  put (plant, "turbine", id[T1], x + 32, y + 8, "turbine");
  set (plant, id[T1], 0, FALSE, "extractions", 2);
  put (plant, "generator", id[G1], x + 46, y + 8, NULL);
  put (plant, "condenser", id[C1], x + 41, y + 24, NULL);
  put (plant, "pump", id[P1], x + 34, y + 34, "condensate pump");
  set (plant, id[P1], 0, TRUE, NULL, 0);
  put (plant, "open_heater", id[D1], x + 21, y + 31, "deaerator");
  put (plant, "pump", id[P2], x + 14, y + 40, "feed pump");
  set (plant, id[P2], 0, TRUE, NULL, 0);
  put (plant, "steam_user", id[U1], x + 60, y + 22, "dryers");
  put (plant, "make_up", id[W1], x + 66, y + 40, NULL);
  set (plant, id[W1], 0, TRUE, NULL, 0);
  put (plant, "mixer", id[M1], x + 56, y + 40, NULL);
  set (plant, id[M1], 0, TRUE, NULL, 0);
  set (plant, id[D1], 0, FALSE, "inlets", 2);
  join (plant, id[B1], "steam", id[T1], "inlet");
  join (plant, id[T1], "exhaust", id[C1], "steam");
  join (plant, id[C1], "condensate", id[P1], "inlet");
  join (plant, id[P1], "outlet", id[D1], "inlet1");
  join (plant, id[D1], "outlet", id[P2], "inlet");
  join (plant, id[P2], "outlet", id[B1], "feed");
  join (plant, id[T1], "extraction1", id[U1], "steam");
  join (plant, id[T1], "extraction2", id[D1], "steam");
  join (plant, id[U1], "condensate", id[M1], "inlet2");
  join (plant, id[W1], "outlet", id[M1], "inlet1");
  join (plant, id[M1], "outlet", id[D1], "inlet2");
  joins[0] = id[T1];
  joins[1] = id[G1];
  join_shaft (plant, shaft_id, joins, 2);
}

HlPlant *
hl_demo_extraction (void)
{
  HlPlant *plant = hl_plant_new ();
  give_title (&plant, "Extraction-condensing plant");
  put_extraction (&plant, 0, 0, "");
  return plant;
}

HlPlant *
hl_demo_repeated (guint n)
{
  HlPlant *plant = hl_plant_new ();
  guint row = 1;
  while (row * row < n)
    row++;
  for (guint i = 0; i < n; i++)
    {
      char suffix[16];
      g_snprintf (suffix, sizeof suffix, "%u", i);
      put_extraction (&plant, (int) (i % row) * 80, (int) (i / row) * 56, suffix);
    }
  return plant;
}

HlPlant *
hl_demo_reheat (void)
{
  static const char *const shaft[] = { "T1", "T2", "G1" };
  HlPlant *plant = hl_plant_new ();
  give_title (&plant, "Reheat plant with two heaters");
  put (&plant, "boiler", "B1", 8, 20, "boiler");
  set (&plant, "B1", 0, FALSE, "reheats", 1);
  put (&plant, "turbine", "T1", 26, 8, "HP");
  set (&plant, "T1", 0, FALSE, "extractions", 0);
  put (&plant, "turbine", "T2", 42, 8, "LP");
  set (&plant, "T2", 0, FALSE, "extractions", 2);
  put (&plant, "generator", "G1", 56, 8, NULL);
  put (&plant, "condenser", "C1", 52, 24, NULL);
  put (&plant, "boundary", "Y1", 66, 22, "river");
  set (&plant, "Y1", 0, TRUE, "direction", 0);
  put (&plant, "boundary", "Y2", 66, 28, "back to river");
  set (&plant, "Y2", 0, FALSE, "direction", 1);
  put (&plant, "pump", "P1", 46, 34, "condensate pump");
  set (&plant, "P1", 0, TRUE, NULL, 0);
  put (&plant, "closed_heater", "H1", 37, 34, "heater 1");
  put (&plant, "open_heater", "D1", 27, 31, "deaerator");
  put (&plant, "pump", "P2", 18, 40, "feed pump");
  set (&plant, "P2", 0, TRUE, NULL, 0);
  put (&plant, "valve", "V1", 44, 41, NULL);
  set (&plant, "C1", 0, FALSE, "cooling", 0);
  join (&plant, "B1", "steam", "T1", "inlet");
  join (&plant, "T1", "exhaust", "B1", "cold_reheat1");
  join (&plant, "B1", "hot_reheat1", "T2", "inlet");
  join (&plant, "T2", "extraction1", "D1", "steam");
  join (&plant, "T2", "extraction2", "H1", "steam");
  join (&plant, "T2", "exhaust", "C1", "steam");
  join (&plant, "C1", "condensate", "P1", "inlet");
  join (&plant, "P1", "outlet", "H1", "feed_inlet");
  join (&plant, "H1", "feed_outlet", "D1", "inlet1");
  join (&plant, "H1", "drain", "V1", "inlet");
  join (&plant, "V1", "outlet", "C1", "drain");
  join (&plant, "D1", "outlet", "P2", "inlet");
  join (&plant, "P2", "outlet", "B1", "feed");
  join (&plant, "Y1", "outlet", "C1", "cooling_inlet");
  join (&plant, "C1", "cooling_outlet", "Y2", "inlet");
  join_shaft (&plant, "S1", shaft, 3);
  return plant;
}

HlPlant *
hl_demo_heater_row (guint n)
{
  HlPlant *plant = hl_plant_new ();
  put (&plant, "boiler", "B1", 6, 24, NULL);
  put (&plant, "turbine", "T1", 40, 8, NULL);
  set (&plant, "T1", 0, FALSE, "extractions", (int) n);
  put (&plant, "condenser", "C1", 26 + 11 * (int) n, 22, NULL);
  put (&plant, "pump", "P1", 20 + 11 * (int) n, 36, NULL);
  set (&plant, "P1", 0, TRUE, NULL, 0);
  join (&plant, "B1", "steam", "T1", "inlet");
  join (&plant, "T1", "exhaust", "C1", "steam");
  join (&plant, "C1", "condensate", "P1", "inlet");
  for (guint i = 1; i <= n; i++)
    {
      g_autofree char *id = g_strdup_printf ("H%u", i), *extraction = g_strdup_printf ("extraction%u", i);
      g_autofree char *before = g_strdup_printf ("H%u", i - 1);
      put (&plant, "closed_heater", id, 10 + 11 * (int) i, 36, NULL);
      join (&plant, "T1", extraction, id, "steam");
      if (i > 1)
        {
          join (&plant, id, "feed_outlet", before, "feed_inlet");
          join (&plant, before, "drain", id, "drain_inlet");
        }
    }
  {
    g_autofree char *last = g_strdup_printf ("H%u", n);
    join (&plant, "P1", "outlet", last, "feed_inlet");
    join (&plant, last, "drain", "C1", "drain");
  }
  join (&plant, "H1", "feed_outlet", "B1", "feed");
  return plant;
}

HlPlant *
hl_demo_random (guint32 seed, guint n_components)
{
  static const char *const kinds[] = { "pump", "valve", "condenser", "closed_heater", "open_heater", "turbine", "boiler", "steam_user", "splitter", "mixer", "pipe" };
  GRand *random = g_rand_new_with_seed (seed);
  HlPlant *plant = hl_plant_new ();
  guint row = 1;
  while (row * row < n_components)
    row++;
  for (guint i = 0; i < n_components; i++)
    {
      g_autofree char *id = g_strdup_printf ("K%u", i);
      put (&plant, kinds[g_rand_int_range (random, 0, G_N_ELEMENTS (kinds))], id,
           (int) (i % row) * 14 + g_rand_int_range (random, 0, 5), (int) (i / row) * 13 + g_rand_int_range (random, 0, 5), NULL);
      set (&plant, id, g_rand_int_range (random, 0, 4), g_rand_boolean (random), NULL, 0);
    }
  for (guint i = 0; i < n_components * 3; i++)
    {
      const HlComponent *from = hl_plant_component (plant, g_rand_int_range (random, 0, n_components));
      const HlComponent *to = hl_plant_component (plant, g_rand_int_range (random, 0, n_components));
      HlPort out, in;
      if (hl_component_n_ports (from) == 0 || hl_component_n_ports (to) == 0)
        continue;
      out = hl_component_port (from, g_rand_int_range (random, 0, hl_component_n_ports (from)));
      in = hl_component_port (to, g_rand_int_range (random, 0, hl_component_n_ports (to)));
      if (hl_plant_can_connect (plant, from->id, out.key, to->id, in.key, NULL))
        join (&plant, from->id, out.key, to->id, in.key);
    }
  g_rand_free (random);
  return plant;
}

HlPlant *
hl_demo_all_kinds (int turn, gboolean is_mirrored)
{
  HlPlant *plant = hl_plant_new ();
  for (guint i = 0; i < hl_kind_count (); i++)
    {
      const HlKind *kind = hl_kind_nth (i);
      g_autofree char *id = g_strdup_printf ("%s1", kind->letter);
      put (&plant, kind->id, id, 6 + (int) (i % 5) * 14, 6 + (int) (i / 5) * 11, kind->id);
      set (&plant, id, turn, is_mirrored, NULL, 0);
    }
  return plant;
}
