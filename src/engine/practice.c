/* Rules of practice: what can be built and run, but is seldom wise; each with its source.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/practice.h"
#include "plant/i18n.h"
#include <math.h>
#include <string.h>

/* --- sources ------------------------------------------------------------------------ */

/* Where the limit of each practice finding comes from. */
static const struct { const char *code, *source; } sources[] = {
  { "exhaust-moisture", N_("10 % by practitioners' notes, 12 % common practice, no source") },
  { "leaving-velocity", N_("150 to 300 m/s: common practice, no source; loss = c²/2 by definition") },
  { "condenser-pressure", N_("common practice, no source") },
  { "steam-temperature", N_("593 °C: POWER magazine; about 600 °C in the best plants: Viswanathan and Bakker 2000; other limits from memory of piping handbooks") },
  { "pipe-steel", N_("graphitisation above 427 and 454 °C (800 and 850 °F): a boiler tube handbook") },
  { "small-difference", N_("common practice, no source") },
  { "small-approach", N_("limit of about 2.5 K: secondary text quoting the ASHRAE Handbook") },
  { "reheat-pressure", N_("textbook rule, from memory: 15 to 35 %, best often 20 to 25 %") },
  { "heater-rises", N_("textbook rule, from memory of El-Wakil: equal enthalpy rises are near the best") },
  { "feed-temperature", N_("textbook rule, from memory: about n/(n+1) of the way from condenser to boiler saturation, lower for cost") },
  { "wet-from-saturation", N_("common practice, no source") },
  { "exhaust-superheat", N_("common practice, no source") },
  { "near-critical", N_("common practice, no source") },
  { "vacuum-condenser", N_("common practice, no source") },
  { "no-line-loss", N_("extraction lines lose 2 to 7 per cent of the pressure: common practice, no source") },
  { "small-pinch", N_("V. Ganapathy, by the temperature of the gas: finned tubes 6-33 K, bare tubes 44-83 K") },
  { "large-pinch", N_("V. Ganapathy, by the temperature of the gas: finned tubes 6-33 K, bare tubes 44-83 K") },
  { "superheater-difference", N_("common practice, no source") },
  { "steaming-economiser", N_("common practice, no source") },
  { "below-acid-dew-point", N_("dew point: Verhoff and Banchero 1974; margin of 10 K: common practice, no source") },
  { "below-water-dew-point", N_("dew point by definition; that it matters: common practice, no source") },
  { "cold-stack", N_("90 °C for clean gas, 150 °C for gas with sulphur: quoted from a secondary text") },
  { "flue-gas-too-cold", N_("90 °C for clean fuel, 130 °C for fuel with sulphur: quoted from a secondary text") },
  { "unusual-value", N_("credible range of the component's table") },
};

const char *
hl_practice_source (const char *code)
{
  for (guint k = 0; k < G_N_ELEMENTS (sources); k++)
    if (g_str_equal (sources[k].code, code))
      return _(sources[k].source);
  return NULL;
}

/* --- media --------------------------------------------------------------------------- */

/* Type: sign of ds/dT of the saturated vapour at 0.60 to 0.88 of the critical temperature, calculated from the equations of state:
 * wet falls, dry rises, turning changes.  Limits [°C] are below what the named tests found, by a margin of our own. */
typedef enum { WET = 1, TURNING, DRY } Expansion;
static const struct { const char *fluid; Expansion expansion; double limit; const char *source, *hazard; } media[] = {
  { "water", WET, NAN, NULL, NULL },
  { "ammonia", WET, NAN, NULL, N_("safety class B2L: toxic, hardly flammable") },
  { "carbon-dioxide", WET, NAN, NULL, NULL },
  { "r32", WET, NAN, NULL, N_("safety class A2L: hardly flammable") },
  { "r134a", WET, 160.0, N_("from memory, weak"), NULL },
  { "propane", WET, NAN, NULL, N_("safety class A3: highly flammable") },
  { "acetone", WET, NAN, NULL, N_("a flammable liquid") },
  { "ethanol", WET, NAN, NULL, N_("a flammable liquid") },
  { "butane", TURNING, 270.0, N_("from memory, weak"), N_("safety class A3: highly flammable") },
  { "isobutane", TURNING, 270.0, N_("from memory, weak"), N_("safety class A3: highly flammable") },
  { "cyclopentane", TURNING, 275.0, N_("Energy Fuels 25 (2011) 4138: little decay at 300 °C over 12 days, much at 350 °C"), N_("a flammable liquid") },
  { "benzene", TURNING, NAN, NULL, N_("a flammable and toxic liquid") },
  { "r245fa", TURNING, 220.0, N_("from memory, weak"), N_("safety class B1: toxic") },
  { "r1233zde", TURNING, 150.0, N_("Purdue conference 2053: isomerises when held above"), NULL },
  { "r1234yf", TURNING, NAN, NULL, N_("safety class A2L: hardly flammable") },
  { "r1224ydz", TURNING, NAN, NULL, NULL },
  { "r1234zez", TURNING, NAN, NULL, NULL },
  { "r1234zee", TURNING, NAN, NULL, N_("safety class A2L: hardly flammable") },
  { "r1336mzze", TURNING, 220.0, N_("Int. J. Energy Res. 2019, er.4599, for the (Z) form; margin of common practice"), NULL },
  { "r227ea", TURNING, NAN, NULL, NULL },
  { "pentane", DRY, 270.0, N_("from memory, weak"), N_("safety class A3: highly flammable") },
  { "isopentane", DRY, 270.0, N_("from memory, weak"), N_("safety class A3: highly flammable") },
  { "hexane", DRY, NAN, NULL, N_("a flammable liquid") },
  { "octane", DRY, NAN, NULL, N_("a flammable liquid") },
  { "cyclohexane", DRY, NAN, NULL, N_("a flammable liquid") },
  { "toluene", DRY, 380.0, N_("Argonne ANL/CNSV-TM-192: a loop ran 3900 h at 316 to 358 °C; other tests to 399 °C"), N_("a flammable liquid") },
  { "ethylbenzene", DRY, NAN, NULL, N_("a flammable liquid") },
  { "p-xylene", DRY, NAN, NULL, N_("a flammable liquid") },
  { "r365mfc", DRY, NAN, NULL, NULL },
  { "mm", DRY, 290.0, N_("Energies 15 (2022) 3498: siloxanes decay markedly at 350 °C"), N_("a flammable liquid") },
  { "mdm", DRY, 290.0, N_("Energies 15 (2022) 3498: siloxanes decay markedly at 350 °C"), N_("a flammable liquid") },
  { "md2m", DRY, 290.0, N_("Energies 15 (2022) 3498: siloxanes decay markedly at 350 °C"), N_("a flammable liquid") },
  { "d4", DRY, 290.0, N_("Energies 15 (2022) 3498: siloxanes decay markedly at 350 °C"), N_("a flammable liquid") },
  { "d5", DRY, 290.0, N_("Energies 15 (2022) 3498: siloxanes decay markedly at 350 °C"), N_("a flammable liquid") },
};

static int
medium_of (const HlFluid *fluid)
{
  for (guint k = 0; k < G_N_ELEMENTS (media); k++)
    if (g_str_equal (media[k].fluid, hl_fluid_id (fluid)))
      return (int) k;
  return -1;
}

/* --- steam ----------------------------------------------------------------------------- */

static void
take_source (HlFinding *finding, const char *source)
{
  finding->source = _(source);
}

/* Below the limits of Cr-Mo steels: those of plain and of molybdenum steel.  Whether that was said. */
static gboolean
check_pipe_steel (HlChecker *checker, const char *port)
{
  const HlNodeResult *steam = hl_check_port (checker, port);
  if (steam == NULL || !steam->has_state || !(steam->st.T > 700.15 && steam->st.T <= 823.15) || !hl_check_is_water (checker, port))
    return FALSE;
  g_autofree char *T = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, steam->st.T), *key = g_strconcat (port, ".T", NULL);
  hl_check_add (checker, HL_GRADE_HINT, "pipe-steel", key,
    steam->st.T > 727.15 ? g_strdup_printf (_("Steam of %s leaves at %s: above 454 °C neither carbon nor carbon-molybdenum steel will do for its pipe; use a Cr-Mo steel."), checker->component->id, T)
                         : g_strdup_printf (_("Steam of %s leaves at %s: above 427 °C carbon steel will not do for its pipe."), checker->component->id, T));
  return TRUE;
}

static void
check_leaving_velocity (HlChecker *checker)
{
  double loss;
  if (!hl_check_own (checker, "exhaust_loss", &loss) || !(loss > 0.0))
    return;
  double c = sqrt (2.0 * loss);
  if (c >= 150.0 && c <= 300.0)
    return;
  g_autofree char *h = hl_check_text (checker, HL_DIMENSION_ENTHALPY, loss);
  HlFinding *finding = hl_check_add (checker, HL_GRADE_CAUTION, "leaving-velocity", "exhaust_loss",
    g_strdup_printf (c > 300.0 ? _("Exhaust loss of %s, %s, means a leaving velocity of %.0f m/s; above 300 m/s the last blades are too small. Choose a larger exhaust, or a higher exhaust pressure.")
                               : _("Exhaust loss of %s, %s, means a leaving velocity of %.0f m/s; below 150 m/s the last blades are larger than they need to be."),
                     checker->component->id, h, c));
  hl_check_offer (checker, finding, "exhaust_loss");
  hl_check_offer (checker, finding, "exhaust.p");
}

/* --- expansion and condensing of any medium ----------------------------------------------- */

static void
check_expansion (HlChecker *checker)
{
  const HlNodeResult *in = hl_check_port (checker, "inlet"), *out = hl_check_port (checker, "exhaust");
  HlSaturation sat;
  int medium = medium_of (hl_check_fluid (checker, "inlet"));
  if (medium < 0 || in == NULL || out == NULL || !in->has_state || !out->has_state)
    return;
  const HlFluid *fluid = hl_check_fluid (checker, "inlet");
  if (media[medium].expansion == WET && hl_fluid_saturation_p (fluid, in->p, &sat) == HL_OK && in->st.T < sat.T + 2.0 && in->st.h > sat.h_liquid)
    {
      HlFinding *finding = hl_check_add (checker, HL_GRADE_HINT, "wet-from-saturation", "inlet.T",
        g_strdup_printf (_("%s expands from saturation a medium whose expansion ends wet. Superheat it, or take a medium of another kind."), checker->component->id));
      hl_check_offer (checker, finding, "inlet.T");
    }
  const HlStream *line = hl_plant_stream_at (checker->model->plant, checker->component->id, "exhaust");
  const HlComponent *next = line != NULL ? hl_plant_find_component (checker->model->plant, line->to_id) : NULL;
  if (media[medium].expansion != DRY || next == NULL || strstr (next->kind->id, "recuperator") != NULL || strstr (next->kind->id, "exchanger") != NULL
      || hl_fluid_saturation_p (fluid, out->p, &sat) != HL_OK || !(out->st.T > sat.T + 20.0))
    return;
  g_autofree char *d = hl_check_text (checker, HL_DIMENSION_TEMPERATURE_DIFFERENCE, out->st.T - sat.T);
  hl_check_add (checker, HL_GRADE_HINT, "exhaust-superheat", "exhaust.T",
    g_strdup_printf (_("Exhaust of %s is %s superheated, and no recuperator takes that heat. Put one between exhaust and condenser."), checker->component->id, d));
}

static void
check_vacuum (HlChecker *checker)
{
  const HlNodeResult *in = hl_check_port (checker, "steam");
  double air = hl_plant_site_pressure (checker->model->plant);
  if (in == NULL || !in->has_pressure || hl_check_is_water (checker, "steam") || !(in->p < air))
    return;
  g_autofree char *p = hl_check_text (checker, HL_DIMENSION_PRESSURE, in->p), *ambient = hl_check_text (checker, HL_DIMENSION_PRESSURE, air);
  HlFinding *finding = hl_check_add (checker, HL_GRADE_HINT, "vacuum-condenser", "steam.p",
    g_strdup_printf (_("%s condenses at %s, below the ambient %s: air leaks in, and a vacuum system is needed."), checker->component->id, p, ambient));
  hl_check_offer (checker, finding, "steam.p");
}

/* Steam that comes to a heater straight from a turbine has lost nothing on its way. */
static void
check_line_loss (HlChecker *checker)
{
  HlPlant *plant = checker->model->plant;
  const HlStream *line = hl_plant_stream_at (plant, checker->component->id, "steam");
  const HlComponent *from = line != NULL ? hl_plant_find_component (plant, line->from_id) : NULL;
  if (from == NULL || !g_str_equal (from->kind->id, "turbine") || !g_str_has_prefix (line->from_port, "extraction"))
    return;
  HlFinding *finding = hl_check_add (checker, HL_GRADE_HINT, "no-line-loss", "steam.p",
    g_strdup_printf (_("The extraction line from %s to %s has no pressure loss; 2 to 7 %% are common."), from->id, checker->component->id));
  hl_finding_mend (finding, HL_MEND_INSERT_VALVE, hl_address_stream (line->id, g_intern_static_string ("")), NAN,
                   g_strdup_printf (_("Insert a throttle valve in stream %s"), line->id));
}

/* --- the feed line -------------------------------------------------------------------------- */

typedef struct { guint n; double least, most, first_T, last_T; const char *smallest, *largest; } Feed;

static void
look_at_heater (HlChecker *checker, Feed *feed)
{
  gboolean is_closed = g_str_equal (checker->component->kind->id, "closed_heater");
  const HlNodeResult *in = hl_check_port (checker, is_closed ? "feed_inlet" : "inlet1"), *out = hl_check_port (checker, is_closed ? "feed_outlet" : "outlet");
  if (in == NULL || out == NULL || !in->has_state || !out->has_state || !hl_check_is_water (checker, "steam"))
    return;
  double rise = out->st.h - in->st.h;
  if (feed->n++ == 0 || rise < feed->least)
    {
      feed->least = rise;
      feed->smallest = checker->component->id;
    }
  if (feed->n == 1 || rise > feed->most)
    {
      feed->most = rise;
      feed->largest = checker->component->id;
    }
}

static void
report_rises (HlChecker *checker, const Feed *feed)
{
  if (feed->n < 2 || !(feed->least > 0.0) || !(feed->most > 2.5 * feed->least))
    return;
  g_autofree char *least = hl_check_text (checker, HL_DIMENSION_ENTHALPY, feed->least), *most = hl_check_text (checker, HL_DIMENSION_ENTHALPY, feed->most);
  hl_findings_add (checker->findings, HL_GRADE_HINT, "heater-rises", hl_address_component (feed->largest, g_intern_static_string ("")),
    g_strdup_printf (_("The feed heaters rise unequally: %s by %s, %s by %s. Equal rises are near the best; move the extraction pressures."), feed->largest, most, feed->smallest, least));
}

/* Final feedwater against n/(n+1) of the way from condenser to boiler saturation: only what lies far off. */
static void
report_final_feed (HlChecker *checker, const Feed *feed, double T_condenser)
{
  const HlNodeResult *in = hl_check_port (checker, "feed"), *out = hl_check_port (checker, "steam");
  HlSaturation sat;
  if (feed->n == 0 || in == NULL || out == NULL || !in->has_state || !out->has_pressure || !hl_check_is_water (checker, "steam")
      || hl_fluid_saturation_p (hl_check_fluid (checker, "steam"), out->p, &sat) != HL_OK || !(sat.T > T_condenser + 50.0))
    return;
  double share = (in->st.T - T_condenser) / (sat.T - T_condenser), best = feed->n / (feed->n + 1.0);
  if (share < best + 0.10 && share > best - 0.35)
    return;
  g_autofree char *T = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, in->st.T);
  g_autofree char *rule = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, T_condenser + best * (sat.T - T_condenser));
  hl_check_add (checker, HL_GRADE_HINT, "feed-temperature", "feed.T",
    g_strdup_printf (ngettext_hl ("Feedwater of %s comes at %s; with %u heater the best is about %s, less for cost.", "Feedwater of %s comes at %s; with %u heaters the best is about %s, less for cost.", feed->n),
                     checker->component->id, T, feed->n, rule));
}

static gboolean
is_heat_source (const HlComponent *component)
{
  return g_str_equal (component->kind->id, "boiler") || g_str_equal (component->kind->id, "heat_input");
}

static void
check_feed_line (HlChecker *checker)
{
  HlPlant *plant = checker->model->plant;
  Feed feed = { 0 };
  double T_condenser = NAN;
  for (guint c = 0; c < hl_plant_n_components (plant); c++)
    {
      checker->index = (int) c;
      checker->component = hl_plant_component (plant, c);
      const char *kind = checker->component->kind->id;
      const HlNodeResult *steam = hl_check_port (checker, "steam");
      HlSaturation sat;
      if (g_str_equal (kind, "closed_heater") || g_str_equal (kind, "open_heater"))
        look_at_heater (checker, &feed);
      else if (strstr (kind, "condenser") != NULL && steam != NULL && steam->has_pressure && hl_check_is_water (checker, "steam")
               && hl_fluid_saturation_p (hl_check_fluid (checker, "steam"), steam->p, &sat) == HL_OK)
        T_condenser = isnan (T_condenser) ? sat.T : fmin (T_condenser, sat.T);
    }
  report_rises (checker, &feed);
  for (guint c = 0; c < hl_plant_n_components (plant) && !isnan (T_condenser); c++)
    {
      checker->index = (int) c;
      checker->component = hl_plant_component (plant, c);
      if (is_heat_source (checker->component))
        report_final_feed (checker, &feed, T_condenser);
    }
}

/* --- the media themselves --------------------------------------------------------------------- */

/* Each medium once: how hot it gets, and what it does to people. */
static void
check_media (HlChecker *checker)
{
  const HlModel *model = checker->model;
  for (guint k = 0; k < G_N_ELEMENTS (media); k++)
    {
      int hottest = -1;
      for (guint i = 0; i < hl_plant_n_streams (model->plant); i++)
        {
          const HlNodeResult *node = &checker->states[i];
          if (node->has_state && medium_of (hl_model_node (model, (int) i)->fluid) == (int) k && (hottest < 0 || node->st.T > checker->states[hottest].st.T))
            hottest = (int) i;
        }
      if (hottest < 0)
        continue;
      const HlStream *stream = hl_plant_stream (model->plant, (guint) hottest);
      const char *name = _(hl_fluid_name (hl_model_node (model, hottest)->fluid));
      double T = checker->states[hottest].st.T;
      if (!isnan (media[k].limit) && T > media[k].limit + 273.15)
        {
          g_autofree char *here = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, T), *most = hl_check_text (checker, HL_DIMENSION_TEMPERATURE, media[k].limit + 273.15);
          take_source (hl_findings_add (checker->findings, HL_GRADE_CAUTION, "medium-decays", hl_address_stream (stream->id, g_intern_static_string ("T")),
            g_strdup_printf (_("Stream %s carries %s at %s; above %s it may decay, and at the tube wall it is hotter still. Ask the maker, or stay below."), stream->id, name, here, most)),
            media[k].source);
        }
      if (media[k].hazard != NULL)
        take_source (hl_findings_add (checker->findings, HL_GRADE_HINT, "medium-hazard", hl_address_stream (stream->id, g_intern_static_string ("")),
          g_strdup_printf (_("The plant holds %s: %s. Codes such as EN 378, ISO 5149 and ATEX 2014/34/EU decide what that asks for."), name, _(media[k].hazard))),
          N_("ANSI/ASHRAE 34 for refrigerants, from memory in part; others as flammable liquids by CLP/GHS"));
    }
}

void
hl_check_practice (HlChecker *checker)
{
  HlPlant *plant = checker->model->plant;
  for (guint c = 0; c < hl_plant_n_components (plant); c++)
    {
      checker->index = (int) c;
      checker->component = hl_plant_component (plant, c);
      const char *kind = checker->component->kind->id;
      if (is_heat_source (checker->component))
        {
          gboolean is_said = check_pipe_steel (checker, "steam");
          for (int k = 1; k <= hl_component_option (checker->component, "reheats") && !is_said; k++)
            is_said = check_pipe_steel (checker, hl_key ("hot_reheat", k));
        }
      else if (g_str_equal (kind, "turbine"))
        {
          check_leaving_velocity (checker);
          check_expansion (checker);
        }
      else if (g_str_equal (kind, "condenser") || g_str_equal (kind, "air_condenser"))
        check_vacuum (checker);
      else if (g_str_equal (kind, "closed_heater") || g_str_equal (kind, "open_heater"))
        check_line_loss (checker);
    }
  check_feed_line (checker);
  checker->component = NULL;
  check_media (checker);
}
