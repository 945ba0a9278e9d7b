/* Plants for tests, written in a few lines of text.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plants.h"
#include "plant/circuit.h"
#include <math.h>
#include <string.h>

const char *const test_simple_loop =
  "heat_input Q1 steam.T=758.15 pressure_loss=0\n"
  "turbine T1 inlet.p=65e5 exhaust.p=7000 isentropic_efficiency=0.83 mechanical_efficiency=0.985\n"
  "generator G1 efficiency=0.98\n"
  "condenser C1 subcooling=0 cooling_inlet_T=288.15 cooling_rise=10 cooling_p=2e5\n"
  "pump P1 isentropic_efficiency=0.75 motor_efficiency=0.95\n"
  "Q1.steam > T1.inlet\nT1.exhaust > C1.steam\nC1.condensate > P1.inlet\nP1.outlet > Q1.feed\n"
  "shaft T1 G1\nplant net_power=12e6 other_consumption_fraction=0\n";

const char *const test_reheat_plant =
  "boiler B1 reheats:1 steam.T=813.15 hot_reheat1.T=813.15 pressure_loss=0.08 reheat_pressure_loss1=0.09 efficiency=0.9 fuel_lhv=48e6 fuel_hhv_ratio=1.11\n"
  "turbine T1 extractions:1 inlet.p=140e5 extraction1.p=35e5 exhaust.p=34e5 isentropic_efficiency=0.87 mechanical_efficiency=0.99\n"
  "turbine T2 extractions:1 extraction1.p=6e5 exhaust.p=6000 isentropic_efficiency=0.88 mechanical_efficiency=0.99\n"
  "generator G1 efficiency=0.985\n"
  "condenser C1 subcooling=0 cooling_inlet_T=288.15 cooling_rise=10 cooling_p=2e5\n"
  "pump P1 isentropic_efficiency=0.8 motor_efficiency=0.95\n"
  "open_heater D1 inlets:2 outlet_subcooling=0\n"
  "pump P2 isentropic_efficiency=0.8 motor_efficiency=0.95\n"
  "closed_heater H1 terminal_difference=3 drain_approach=6 feed_pressure_loss=0.01\n"
  "valve V1\n"
  "B1.steam > T1.inlet\nT1.exhaust > B1.cold_reheat1\nT1.extraction1 > H1.steam\nB1.hot_reheat1 > T2.inlet\n"
  "T2.extraction1 > D1.steam\nT2.exhaust > C1.steam\nC1.condensate > P1.inlet\nP1.outlet > D1.inlet1\nD1.outlet > P2.inlet\n"
  "P2.outlet > H1.feed_inlet\nH1.feed_outlet > B1.feed\nH1.drain > V1.inlet\nV1.outlet > D1.inlet2\n"
  "shaft T1 T2 G1\nplant net_power=100e6 other_consumption_fraction=0.02\n";

/* 300 MW class: reheat, seven heaters with a deaerator among them, drains cascaded, line losses. */
const char *const test_large_plant =
  "boiler B1 reheats:1 steam.T=811.15 hot_reheat1.T=811.15 pressure_loss=0.08 reheat_pressure_loss1=0.095 efficiency=0.9 fuel_lhv=25.8e6 fuel_hhv_ratio=1.05\n"
  "turbine T1 inlet.p=163e5 exhaust.p=42e5 isentropic_efficiency=0.87 mechanical_efficiency=0.995\n"
  "splitter X1 outlets:2\n"
  "turbine T2 extractions:2 extraction1.p=20.5e5 extraction2.p=9.6e5 exhaust.p=9.59e5 isentropic_efficiency=0.91 mechanical_efficiency=0.995\n"
  "turbine T3 extractions:4 extraction1.p=4.3e5 extraction2.p=1.95e5 extraction3.p=0.8e5 extraction4.p=0.26e5 exhaust.p=5500 isentropic_efficiency=0.88 group_efficiency5=0.8 mechanical_efficiency=0.995\n"
  "generator G1 efficiency=0.987\n"
  "condenser C1 subcooling=0 cooling_inlet_T=291.15 cooling_rise=10 cooling_p=2e5\n"
  "pump P1 isentropic_efficiency=0.8 motor_efficiency=0.95\n"
  "closed_heater H1 terminal_difference=3 drain_approach=5.6 feed_pressure_loss=0\n"
  "closed_heater H2 terminal_difference=3 drain_approach=5.6 feed_pressure_loss=0\n"
  "closed_heater H3 terminal_difference=3 drain_approach=5.6 feed_pressure_loss=0\n"
  "closed_heater H4 terminal_difference=3 drain_approach=5.6 feed_pressure_loss=0\n"
  "open_heater D1 inlets:2 outlet_subcooling=0\n"
  "pump P2 isentropic_efficiency=0.83 motor_efficiency=0.95\n"
  "closed_heater H6 terminal_difference=0 drain_approach=5.6 feed_pressure_loss=0\n"
  "closed_heater H7 terminal_difference=0 drain_approach=5.6 feed_pressure_loss=0\n"
  "pipe L1 pressure_loss=0.04 heat_loss=0\npipe L2 pressure_loss=0.04 heat_loss=0\npipe L3 pressure_loss=0.04 heat_loss=0\n"
  "pipe L4 pressure_loss=0.04 heat_loss=0\npipe L5 pressure_loss=0.05 heat_loss=0\npipe L6 pressure_loss=0.04 heat_loss=0\n"
  "pipe L7 pressure_loss=0.04 heat_loss=0\nvalve V1\n"
  "B1.steam > T1.inlet\nT1.exhaust > X1.inlet\nX1.outlet1 > B1.cold_reheat1\nX1.outlet2 > L7.inlet\nL7.outlet > H7.steam\n"
  "B1.hot_reheat1 > T2.inlet\nT2.extraction1 > L6.inlet\nL6.outlet > H6.steam\nT2.extraction2 > L5.inlet\nL5.outlet > D1.steam\n"
  "T2.exhaust > T3.inlet\nT3.extraction1 > L4.inlet\nL4.outlet > H4.steam\nT3.extraction2 > L3.inlet\nL3.outlet > H3.steam\n"
  "T3.extraction3 > L2.inlet\nL2.outlet > H2.steam\nT3.extraction4 > L1.inlet\nL1.outlet > H1.steam\nT3.exhaust > C1.steam\n"
  "C1.condensate > P1.inlet\nP1.outlet > H1.feed_inlet\nH1.feed_outlet > H2.feed_inlet\nH2.feed_outlet > H3.feed_inlet\nH3.feed_outlet > H4.feed_inlet\n"
  "H4.feed_outlet > D1.inlet1\nH4.drain > H3.drain_inlet\nH3.drain > H2.drain_inlet\nH2.drain > H1.drain_inlet\nH1.drain > C1.drain\n"
  "D1.outlet > P2.inlet\nP2.outlet > H6.feed_inlet\nH6.feed_outlet > H7.feed_inlet\nH7.feed_outlet > B1.feed\nH7.drain > H6.drain_inlet\n"
  "H6.drain > V1.inlet\nV1.outlet > D1.inlet2\n"
  "shaft T1 T2 T3 G1\nplant net_power=290e6 other_consumption_fraction=0.05\n";

/* Extraction-condensing, deaerator, process steam with part of its condensate back, make-up, cooling water in lines of its own. */
const char *const test_industrial_plant =
  "boiler B1 steam.T=758.15 pressure_loss=0.1 efficiency=0.87 fuel_lhv=9.08e6 fuel_hhv_ratio=1.15 steam.p=65e5\n"
  "valve V1 pressure_loss=0.04\n"
  "turbine T1 extractions:2 extraction1.p=6.3e5 extraction2.p=2.6e5 exhaust.p=7000 isentropic_efficiency=0.82 group_efficiency3=0.83 mechanical_efficiency=0.985\n"
  "generator G1 efficiency=0.975\n"
  "condenser C1 subcooling=0 cooling_rise=10 cooling_pressure_loss=0.2\n"
  "pump P1 isentropic_efficiency=0.75 motor_efficiency=0.95\n"
  "open_heater D1 inlets:3 outlet_subcooling=0 steam.p=2.5e5\n"
  "pump P2 isentropic_efficiency=0.74 motor_efficiency=0.95\n"
  "steam_user U1 heat=9e6 return_fraction=0.7 condensate.T=358.15\n"
  "make_up W1 outlet.T=288.15\n"
  "pipe L1 pressure_loss=0.04 heat_loss=50e3\npipe L2 heat_loss=0\n"
  "boundary Y1 direction:0 outlet.p=2.5e5 outlet.T=297.15\nboundary Y2 direction:1\n"
  "B1.steam > V1.inlet\nV1.outlet > T1.inlet\nT1.extraction1 > L1.inlet\nL1.outlet > U1.steam\nT1.extraction2 > L2.inlet\nL2.outlet > D1.steam\n"
  "T1.exhaust > C1.steam\nC1.condensate > P1.inlet\nP1.outlet > D1.inlet1\nU1.condensate > D1.inlet2\nW1.outlet > D1.inlet3\nD1.outlet > P2.inlet\n"
  "P2.outlet > B1.feed\nY1.outlet > C1.cooling_inlet\nC1.cooling_outlet > Y2.inlet\n"
  "shaft T1 G1\nplant gross_power=13e6 other_consumption_fraction=0.03\n"
  "";

typedef struct {
  HlPlant *plant;
  int n_streams, n_shafts;
} Builder;

static void
take (Builder *b, HlPlant *next)
{
  g_assert_nonnull (next);
  hl_plant_unref (b->plant);
  b->plant = next;
}

static void
set_word (HlComponent *component, const char *word)
{
  const char *colon = strchr (word, ':'), *equals = strchr (word, '=');
  if (*word == '-')
    {
      hl_component_set_value (component, g_intern_string (word + 1), NULL);
      return;
    }
  if (colon != NULL && equals == NULL)
    {
      g_autofree char *key = g_strndup (word, (gsize) (colon - word));
      if (hl_kind_find_option (component->kind, key) < 0)
        g_error ("%s has no option %s", component->id, key);
      hl_component_set_option (component, key, atoi (colon + 1));
      return;
    }
  gboolean assumed = *word == '~';
  if (equals == NULL)
    g_error ("cannot read \"%s\"", word);
  g_autofree char *key = g_strndup (word + assumed, (gsize) (equals - word) - (gsize) assumed);
  HlValue value = { .origin = assumed ? HL_ORIGIN_ASSUMED : HL_ORIGIN_GIVEN, .value = g_ascii_strtod (equals + 1, NULL) };
  const char *interned = g_intern_string (key);
  if (hl_component_quantity_kind (component, interned) == NULL)
    g_error ("%s has no quantity %s", component->id, key);
  hl_component_set_value (component, interned, &value);
}

static void
add_component (Builder *b, char **words, gboolean with_defaults)
{
  const HlKind *kind = hl_kind_lookup (words[0]);
  if (kind == NULL || words[1] == NULL)
    g_error ("no kind %s", words[0]);
  int n = (int) hl_plant_n_components (b->plant);
  const char *id = g_intern_string (words[1]);
  HlComponent *component = with_defaults ? hl_component_new (kind, id, 14 * n, 0) : hl_component_new_bare (kind, id, 14 * n, 0);
  for (char **word = words + 2; *word != NULL; word++)
    if (**word != '\0')
      set_word (component, *word);
  take (b, hl_plant_with_component (b->plant, component));
}

static void
add_stream (Builder *b, const char *from, const char *to)
{
  g_auto (GStrv) a = g_strsplit (from, ".", 2), c = g_strsplit (to, ".", 2);
  g_autofree char *id = g_strdup_printf ("%d", ++b->n_streams);
  g_autoptr (GError) error = NULL;
  if (!hl_plant_can_connect (b->plant, g_intern_string (a[0]), g_intern_string (a[1]), g_intern_string (c[0]), g_intern_string (c[1]), &error))
    g_error ("%s > %s: %s", from, to, error->message);
  HlStream *stream = hl_stream_new (g_intern_string (id), g_intern_string (a[0]), g_intern_string (a[1]), g_intern_string (c[0]), g_intern_string (c[1]));
  take (b, hl_plant_with_stream (b->plant, stream));
}

HlPlant *
test_plant_set (HlPlant *plant, const char *text, double number)
{
  HlAddress address;
  g_autoptr (GError) error = NULL;
  HlValue value = { .origin = HL_ORIGIN_GIVEN, .value = number };
  if (!hl_address_parse (text, plant, &address, &error))
    g_error ("%s", error->message);
  HlPlant *next = hl_plant_with_value (plant, &address, &value, &error);
  if (next == NULL)
    g_error ("%s", error->message);
  hl_plant_unref (plant);
  return next;
}

HlPlant *
test_plant_let_go (HlPlant *plant, const char *text)
{
  HlAddress address;
  g_autoptr (GError) error = NULL;
  if (!hl_address_parse (text, plant, &address, &error))
    g_error ("%s", error->message);
  HlPlant *next = hl_plant_with_value (plant, &address, NULL, &error);
  if (next == NULL)
    g_error ("%s", error->message);
  hl_plant_unref (plant);
  return next;
}

static void
read_line (Builder *b, const char *line)
{
  g_auto (GStrv) words = g_strsplit (line, " ", -1);
  if (words[0] == NULL || *words[0] == '\0')
    return;
  if (words[1] != NULL && g_str_equal (words[1], ">"))
    add_stream (b, words[0], words[2]);
  else if (g_str_equal (words[0], "shaft"))
    {
      for (char **word = words + 1; *word != NULL; word++)
        {
          const char *name = g_intern_string (*word);
          g_free (*word);
          *word = g_strdup (name);
        }
      g_autofree char *id = g_strdup_printf ("S%d", ++b->n_shafts);
      take (b, hl_plant_with_shaft (b->plant, hl_shaft_new (g_intern_string (id), (const char *const *) words + 1, g_strv_length (words) - 1)));
    }
  else if (g_str_equal (words[0], "medium"))
    {
      g_autoptr (GError) error = NULL;
      HlPlant *next = hl_plant_with_medium (b->plant, words[1], words[2], &error);
      g_assert_no_error (error);
      take (b, next);
    }
  else if (g_str_equal (words[0], "formulation"))
    take (b, hl_plant_with_formulation (b->plant, words[1]));
  else if (g_str_equal (words[0], "plant"))
    for (char **word = words + 1; *word != NULL; word++)
      {
        char *equals = strchr (*word, '=');
        g_autofree char *address = g_strdup_printf ("plant.%.*s", (int) (equals - *word), *word);
        b->plant = test_plant_set (b->plant, address, g_ascii_strtod (equals + 1, NULL));
      }
  else if (g_str_equal (words[0], "set"))
    {
      g_auto (GStrv) parts = g_strsplit (words[1], "=", 2);
      b->plant = test_plant_set (b->plant, parts[0], g_ascii_strtod (parts[1], NULL));
    }
  else if (g_str_equal (words[0], "new"))
    add_component (b, words + 1, TRUE);
  else
    add_component (b, words, FALSE);
}

HlPlant *
test_plant (const char *text)
{
  Builder b = { hl_plant_new (), 0, 0 };
  b.plant = test_plant_let_go (b.plant, "plant.net_power");
  g_auto (GStrv) lines = g_strsplit (text, "\n", -1);
  for (char **line = lines; *line != NULL; line++)
    read_line (&b, *line);
  return b.plant;
}

double
test_value (const HlSolution *solution, const char *text)
{
  HlAddress address;
  double value;
  g_autoptr (GError) error = NULL;
  if (!hl_address_parse (text, hl_solution_plant (solution), &address, &error))
    g_error ("%s", error->message);
  return hl_solution_value (solution, &address, &value) ? value : NAN;
}

void
test_print (const HlSolution *solution)
{
  g_autofree char *summary = hl_solution_summary (solution);
  g_printerr ("# %s\n", summary);
  for (guint k = 0; k < hl_solution_n_findings (solution); k++)
    {
      const HlFinding *finding = hl_solution_finding (solution, k);
      g_printerr ("#   %s [%s] %s\n", hl_grade_id (finding->grade), finding->code, finding->text);
      for (guint m = 0; m < finding->n_mends; m++)
        g_printerr ("#      - %s\n", finding->mends[m].text);
    }
}

void
test_assert_solved (const HlSolution *solution)
{
  if (hl_solution_is_solved (solution))
    return;
  test_print (solution);
  g_error ("not solved");
}

const HlFinding *
test_finding (const HlSolution *solution, const char *code)
{
  for (guint k = 0; k < hl_solution_n_findings (solution); k++)
    if (g_str_equal (hl_solution_finding (solution, k)->code, code))
      return hl_solution_finding (solution, k);
  return NULL;
}

static const char *
copy_id (const char *id, int number)
{
  g_autofree char *text = g_strdup_printf ("%s_%d", id, number);
  return g_intern_string (text);
}

static void
add_copy (Builder *b, HlPlant *plant, int number, double flow)
{
  for (guint i = 0; i < hl_plant_n_components (plant); i++)
    {
      HlComponent *component = hl_component_copy (hl_plant_component (plant, i));
      HlValue value = { .origin = HL_ORIGIN_GIVEN, .value = flow };
      if (g_str_equal (component->id, "T1"))
        hl_component_set_value (component, g_intern_static_string ("inlet.m"), &value);
      component->id = copy_id (component->id, number);
      take (b, hl_plant_with_component (b->plant, component));
    }
  for (guint i = 0; i < hl_plant_n_streams (plant); i++)
    {
      const HlStream *stream = hl_plant_stream (plant, i);
      take (b, hl_plant_with_stream (b->plant, hl_stream_new (copy_id (stream->id, number), copy_id (stream->from_id, number), stream->from_port,
                                                               copy_id (stream->to_id, number), stream->to_port)));
    }
  for (guint i = 0; i < hl_plant_n_shafts (plant); i++)
    {
      const HlShaft *shaft = hl_plant_shaft (plant, i);
      g_autofree const char **joins = g_new (const char *, shaft->n_joins);
      for (guint k = 0; k < shaft->n_joins; k++)
        joins[k] = copy_id (shaft->joins[k], number);
      take (b, hl_plant_with_shaft (b->plant, hl_shaft_new (copy_id (shaft->id, number), joins, shaft->n_joins)));
    }
}

HlPlant *
test_plant_copies (const char *text, int n, double flow)
{
  g_autoptr (HlPlant) plant = test_plant (text);
  return test_plant_copies_of (plant, n, flow);
}

HlPlant *
test_plant_copies_of (HlPlant *plant, int n, double flow)
{
  Builder b = { hl_plant_new (), 0, 0 };
  b.plant = test_plant_let_go (b.plant, "plant.net_power");
  for (int k = 1; k <= n; k++)
    add_copy (&b, plant, k, flow);
  return b.plant;
}
