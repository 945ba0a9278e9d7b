/* What the tests of the plant share: a small plant, and a check of error messages.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "plant/plant.h"
#include <math.h>
#include <string.h>

/* A complete loop with a shaft, an extraction to a deaerator, values of every origin and unknown keys at every level. */
#define LOOP_TEXT \
  "{\"heatloom\": 1, \"title\": \"Loop “A”\", \"units\": \"metric\", \"formulation\": \"if97\",\n" \
  " \"site\": {\"altitude\": 60, \"ambient_T\": 288.15, \"wet_bulb_T\": 285.15, \"dead_T\": 298.15, \"dead_p\": 101325, \"wind\": \"west\"},\n" \
  " \"components\": [\n" \
  "  {\"id\": \"B1\", \"kind\": \"boiler\", \"name\": \"boiler\", \"at\": [8, 12], \"reheats\": 0, \"fuel\": \"not named\", \"efficiency_by\": \"given\", \"blowdown\": \"none\", \"given\": {\"steam.T\": 758.15}, \"assumed\": {\"efficiency\": 0.9}},\n" \
  "  {\"id\": \"T1\", \"kind\": \"turbine\", \"at\": [20, 8], \"turn\": 1, \"mirror\": true, \"extractions\": 1, \"expansion\": \"straight line\", \"wetness\": \"none\", \"leaving_loss\": \"none\", \"given\": {\"exhaust.p\": 7000, \"inlet.p\": 6500000}, \"assumed\": {\"isentropic_efficiency\": 0.83}, \"tied\": {\"extraction1.p\": \"0.05*B1.steam.p+20000\"}, \"maker\": {\"name\": \"unknown\", \"years\": [1, 2.5]}},\n" \
  "  {\"id\": \"G1\", \"kind\": \"generator\", \"at\": [26, 8]},\n" \
  "  {\"id\": \"C1\", \"kind\": \"condenser\", \"at\": [24, 18], \"cooling\": \"none\"},\n" \
  "  {\"id\": \"P1\", \"kind\": \"pump\", \"at\": [14, 22], \"suction\": \"not checked\", \"assumed\": {\"isentropic_efficiency\": 0.75}},\n" \
  "  {\"id\": \"D1\", \"kind\": \"open_heater\", \"at\": [12, 22], \"inlets\": 1, \"vent\": \"none\"},\n" \
  "  {\"id\": \"P2\", \"kind\": \"pump\", \"at\": [6, 22], \"suction\": \"not checked\"}],\n" \
  " \"streams\": [\n" \
  "  {\"id\": \"live\", \"from\": \"B1.steam\", \"to\": \"T1.inlet\", \"medium\": \"water\", \"route\": [[10, 8], [11, 8]], \"label\": [12, 6]},\n" \
  "  {\"id\": \"2\", \"from\": \"T1.exhaust\", \"to\": \"C1.steam\", \"medium\": \"water\"},\n" \
  "  {\"id\": \"3\", \"from\": \"C1.condensate\", \"to\": \"P1.inlet\", \"medium\": \"water\"},\n" \
  "  {\"id\": \"4\", \"from\": \"P1.outlet\", \"to\": \"D1.inlet1\", \"medium\": \"water\", \"tied\": {\"m\": \"0.9*m:2\"}, \"paint\": \"green\"},\n" \
  "  {\"id\": \"5\", \"from\": \"T1.extraction1\", \"to\": \"D1.steam\", \"medium\": \"water\"},\n" \
  "  {\"id\": \"6\", \"from\": \"D1.outlet\", \"to\": \"P2.inlet\", \"medium\": \"water\"},\n" \
  "  {\"id\": \"7\", \"from\": \"P2.outlet\", \"to\": \"B1.feed\", \"medium\": \"water\"}],\n" \
  " \"shafts\": [\n" \
  "  {\"id\": \"S1\", \"joins\": [\"T1\", \"G1\"], \"colour\": 3}],\n" \
  " \"plant\": {\"given\": {\"net_power\": 12000000}, \"assumed\": {\"other_consumption_fraction\": 0.01}, \"tolerance\": {\"T1.inlet.p\": 0.01}},\n" \
  " \"texts\": [],\n" \
  " \"title_block\": {\"drawn\": \"E.M.\"},\n" \
  " \"variants\": [\n" \
  "  {\"name\": \"river cooling\", \"changes\": [{\"set\": \"C1.steam.p\", \"to\": 3360}, {\"add\": {\"id\": \"V1\", \"kind\": \"valve\"}}]},\n" \
  "  {\"name\": \"none\", \"changes\": [], \"big\": 1.5e+300, \"nothing\": null, \"yes\": true}]}\n"

static inline HlPlant *
loop_plant (void)
{
  GError *error = NULL;
  HlPlant *plant = hl_plant_from_json (LOOP_TEXT, -1, "loop.heatloom", &error);
  g_assert_no_error (error);
  return plant;
}

/* Asserts that an error was set and that its message holds this piece; clears it. */
static inline void
assert_message (GError **error, const char *piece)
{
  g_assert_nonnull (*error);
  if (strstr ((*error)->message, piece) == NULL)
    g_error ("message “%s” does not say “%s”", (*error)->message, piece);
  g_clear_error (error);
}

static inline void
assert_close (double value, double expected, double relative)
{
  if (!(fabs (value - expected) <= relative * fabs (expected)))
    g_error ("%.17g is not %.17g within %g", value, expected, relative);
}

static inline HlAddress
address (const HlPlant *plant, const char *text)
{
  HlAddress found;
  GError *error = NULL;
  hl_address_parse (text, plant, &found, &error);
  g_assert_no_error (error);
  return found;
}

static inline HlPlant *
with_given (HlPlant *plant, const char *text, double si)
{
  HlAddress where = address (plant, text);
  HlValue value = { .origin = HL_ORIGIN_GIVEN, .value = si };
  GError *error = NULL;
  HlPlant *edited = hl_plant_with_value (plant, &where, &value, &error);
  g_assert_no_error (error);
  return edited;
}
