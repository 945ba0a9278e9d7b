/* From a solution to the energy that comes in, comes back and goes out.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/bands-private.h"
#include "plant/i18n.h"
#include <math.h>
#include <string.h>

#define NEGLIGIBLE 1e-7    /* of the input: rounding of the solution, no band */

typedef struct {
  const HlSolution *solution;
  const HlPlant    *plant;
  HlBands          *bands;
  gboolean         *is_service;      /* by stream: cooling water and the like */
  double            internal, turbines;      /* what steam gives to rotors, and they to shafts [W] */
  double            shaft_driven;            /* taken by machines on shafts */
  double            shaft_motors;            /* given by motors on shafts */
  double            gearboxes;               /* lost in them */
  double            motors;                  /* electricity of all motors */
} Books;

static void
add (Books *books, HlBandKind kind, const char *name, double power)
{
  HlBand band = { kind, g_strdup (name), power };
  g_array_append_val (books->bands->bands, band);
}

static gboolean
own (const Books *books, const HlComponent *component, const char *key, double *value)
{
  HlAddress address = hl_address_component (component->id, g_intern_string (key));
  return hl_solution_value (books->solution, &address, value) && isfinite (*value);
}

/* A value that the balance cannot do without. */
static double
needed (Books *books, const HlComponent *component, const char *key)
{
  double value = 0.0;
  if (!own (books, component, key, &value))
    books->bands->is_complete = FALSE;
  return value;
}

/* 0 where the plant has no such result. */
static double
of_plant (Books *books, const char *key)
{
  guint n = hl_solution_n_results (books->solution);
  for (guint i = 0; i < n; i++)
    {
      double value;
      const HlQuantityKind *kind = hl_solution_result (books->solution, i, &value);
      if (strcmp (kind->key, key) == 0)
        return value;
    }
  return 0.0;
}

char *
hl_bands_label (const HlComponent *component)
{
  return component->name != NULL && component->name[0] != '\0' ? g_strdup_printf ("%s %s", component->id, component->name)
                                                               : g_strdup_printf ("%s %s", component->id, _(component->kind->shelf_name));
}

/* Streams that only a service circuit knows. */
static void
find_service (Books *books)
{
  guint n = hl_plant_n_streams (books->plant);
  g_autofree gboolean *is_cycle = g_new0 (gboolean, n + 1);
  books->is_service = g_new0 (gboolean, n + 1);
  for (guint i = 0; i < hl_solution_n_processes (books->solution); i++)
    {
      const HlProcess *process = hl_solution_process (books->solution, i);
      const int ends[2] = { process->from_stream, process->to_stream };
      for (int k = 0; k < 2; k++)
        if (ends[k] >= 0 && (guint) ends[k] < n)
          (process->is_service ? books->is_service : is_cycle)[ends[k]] = TRUE;
    }
  for (guint i = 0; i < n; i++)
    books->is_service[i] = books->is_service[i] && !is_cycle[i];
}

/* Flow and enthalpy at a port, where its stream belongs to the cycle. */
static gboolean
at_port (Books *books, const HlComponent *component, const char *port, double *m, double *h)
{
  const HlStream *stream = hl_plant_stream_at (books->plant, component->id, port);
  HlStreamResult result;
  int n = stream != NULL ? hl_plant_stream_index (books->plant, stream->id) : -1;
  if (n < 0 || books->is_service[n])
    return FALSE;
  hl_solution_stream (books->solution, (guint) n, &result);
  if (!result.has_flow || !result.has_state)
    {
      books->bands->is_complete = FALSE;
      return FALSE;
    }
  *m = result.m;
  *h = result.state.h;
  return TRUE;
}

static gboolean
is_kind (const HlComponent *component, const char *id)
{
  return strcmp (component->kind->id, id) == 0;
}

typedef struct { HlBandKind kind; double m, h; char *name; } Water;

/* Water through the doors of the plant: make-up, boundaries, what users lose, what vents let off. */
static void
collect_water (Books *books, const HlComponent *component, GArray *waters)
{
  gboolean is_user = is_kind (component, "steam_user");
  Water vent = { .kind = HL_BAND_WATER_OUT };
  if (own (books, component, "vent_flow", &vent.m) && vent.m > 0.0)
    {
      vent.h = needed (books, component, "vent_h");
      vent.name = g_strdup_printf (_("steam let off at %s"), component->id);
      g_array_append_val (waters, vent);
    }
  if (!is_kind (component, "make_up") && !is_kind (component, "boundary") && !is_user)
    return;
  for (guint i = 0; i < hl_component_n_ports (component); i++)
    {
      HlPort port = hl_component_port (component, i);
      Water water = { .kind = port.kind->direction == HL_PORT_OUT ? HL_BAND_WATER_IN : HL_BAND_WATER_OUT };
      if (is_user && strcmp (port.key, "condensate") != 0)
        continue;
      if (!at_port (books, component, port.key, &water.m, &water.h))
        continue;
      if (is_user)
        {
          water.kind = HL_BAND_WATER_OUT;
          water.m = needed (books, component, "lost_flow");
        }
      if (!(water.m > 0.0))
        continue;
      {
        g_autofree char *label = hl_bands_label (component);
        water.name = is_user ? g_strdup_printf (_("water lost in %s"), component->id) : g_steal_pointer (&label);
      }
      g_array_append_val (waters, water);
    }
}

/* Counted from the enthalpy of the coldest of it, so that no band runs backwards; mass balances, so no choice changes the sum. */
static void
add_waters (Books *books)
{
  g_autoptr (GArray) waters = g_array_new (FALSE, TRUE, sizeof (Water));
  double reference = G_MAXDOUBLE;
  for (guint i = 0; i < hl_plant_n_components (books->plant); i++)
    collect_water (books, hl_plant_component (books->plant, i), waters);
  for (guint i = 0; i < waters->len; i++)
    reference = MIN (reference, g_array_index (waters, Water, i).h);
  for (guint i = 0; i < waters->len; i++)
    {
      Water *water = &g_array_index (waters, Water, i);
      add (books, water->kind, water->name, water->m * (water->h - reference));
      g_free (water->name);
    }
}

static gboolean
pumps_service (const Books *books, guint component)
{
  for (guint i = 0; i < hl_solution_n_processes (books->solution); i++)
    {
      const HlProcess *process = hl_solution_process (books->solution, i);
      if (process->component == component && process->kind == HL_PROCESS_COMPRESSION)
        return process->is_service;
    }
  return FALSE;
}

/* What one component has to do with the energy of the plant. */
static void
add_component (Books *books, guint n)
{
  const HlComponent *component = hl_plant_component (books->plant, n);
  g_autofree char *label = hl_bands_label (component);
  double value;
  if (is_kind (component, "boiler"))
    {
      g_autofree char *fuel = g_strdup_printf (_("fuel of %s"), component->id), *loss = g_strdup_printf (_("losses of %s"), component->id);
      add (books, HL_BAND_FUEL, fuel, needed (books, component, "fuel_heat"));
      add (books, HL_BAND_FIRING_LOSS, loss, needed (books, component, "fuel_heat") - needed (books, component, "heat"));
    }
  else if (is_kind (component, "heat_input") || is_kind (component, "gas_source") || is_kind (component, "solar_field"))
    add (books, HL_BAND_HEAT, label, needed (books, component, "heat"));
  else if (is_kind (component, "motor"))
    {
      books->shaft_motors += needed (books, component, "power");
      books->motors += needed (books, component, "motor_power");
    }
  else if (component->kind->shaft == HL_SHAFT_LOSS)
    books->gearboxes += needed (books, component, "loss");
  else if (component->kind->shaft == HL_SHAFT_DRIVES)
    {
      books->internal += needed (books, component, "internal_power");
      books->turbines += needed (books, component, "power");
    }
  else if (component->kind->shaft == HL_SHAFT_DRIVEN)
    {
      double power = needed (books, component, "power");
      g_autofree char *name = g_strdup_printf (_("power of %s"), component->id);
      /* On a shaft it has no motor of its own. */
      if (own (books, component, "motor_power", &value) && value > 0.0)
        books->motors += value;
      else
        books->shaft_driven += power;
      /* What a fan gives comes back to the plant as heat of the gas. */
      add (books, pumps_service (books, n) && !is_kind (component, "fan") ? HL_BAND_OWN : HL_BAND_PUMPS, name, power);
    }
  else if (is_kind (component, "steam_user"))
    add (books, HL_BAND_DELIVERED, label, needed (books, component, "heat"));
  else if (is_kind (component, "condenser") || is_kind (component, "stack"))
    add (books, HL_BAND_REJECTED, label, needed (books, component, "heat"));
  else if (own (books, component, "heat_loss", &value))
    {
      g_autofree char *name = g_strdup_printf (_("heat loss of %s"), component->id);
      add (books, HL_BAND_HEAT_LOSS, name, value);
    }
}

/* Powers of the whole plant, and what its kinds deliver or reject beside those known by name. */
static void
add_totals (Books *books)
{
  double gross = of_plant (books, "gross_power"), own_consumption = of_plant (books, "own_consumption");
  double delivered = of_plant (books, "heat_delivered") - hl_bands_sum (books->bands, HL_BAND_DELIVERED);
  double rejected = of_plant (books, "heat_rejected") - hl_bands_sum (books->bands, HL_BAND_REJECTED);
  double driven = hl_bands_sum (books->bands, HL_BAND_PUMPS) + hl_bands_sum (books->bands, HL_BAND_OWN);
  double by_motors = driven - books->shaft_driven + books->shaft_motors;
  add (books, HL_BAND_DELIVERED, _("other heat delivered"), MAX (delivered, 0.0));
  add (books, HL_BAND_REJECTED, _("other heat rejected"), MAX (rejected, 0.0));
  add (books, HL_BAND_SHAFT_LOSS, _("mechanical losses"), books->internal - books->turbines);
  add (books, HL_BAND_SHAFT_LOSS, _("gearbox losses"), books->gearboxes);
  add (books, HL_BAND_SHAFT_LOSS, _("generator losses"), books->turbines + books->shaft_motors - books->shaft_driven - books->gearboxes - gross);
  add (books, HL_BAND_OWN, _("motor losses"), books->motors - by_motors);
  add (books, HL_BAND_OWN, _("other consumers"), own_consumption - books->motors);
  add (books, HL_BAND_NET, _("net power"), MAX (gross - own_consumption, 0.0));
  add (books, HL_BAND_POWER, _("power from outside"), MAX (own_consumption - gross, 0.0));
}

static gboolean
comes_in (HlBandKind kind)
{
  return kind == HL_BAND_FUEL || kind == HL_BAND_HEAT || kind == HL_BAND_POWER || kind == HL_BAND_WATER_IN;
}

/* In less out: pumps come back and count on neither side. */
static double
balance (const HlBands *bands)
{
  double sum = 0.0;
  for (guint i = 0; i < bands->bands->len; i++)
    {
      const HlBand *band = &g_array_index (bands->bands, HlBand, i);
      if (band->kind != HL_BAND_PUMPS)
        sum += comes_in (band->kind) ? band->power : -band->power;
    }
  return sum;
}

/* Within a kind the order of the plant stays. */
static int
compare_kinds (gconstpointer a, gconstpointer b)
{
  return (int) ((const HlBand *) a)->kind - (int) ((const HlBand *) b)->kind;
}

/* Nothing thinner than rounding is a band; one that runs the wrong way cannot be drawn. */
void
hl_bands_clean (HlBands *bands)
{
  for (guint i = bands->bands->len; i-- > 0;)
    {
      HlBand *band = &g_array_index (bands->bands, HlBand, i);
      if (fabs (band->power) > NEGLIGIBLE * bands->input && isfinite (band->power))
        {
          bands->is_complete = bands->is_complete && (band->power > 0.0 || band->kind == HL_BAND_REST);
          continue;
        }
      bands->is_complete = bands->is_complete && isfinite (band->power);
      g_free (band->name);
      g_array_remove_index (bands->bands, i);
    }
  g_array_sort (bands->bands, compare_kinds);
}

HlBands *
hl_bands_new (const HlSolution *solution)
{
  HlBands *bands = g_new0 (HlBands, 1);
  Books books = { .solution = solution, .plant = hl_solution_plant (solution), .bands = bands };
  bands->bands = g_array_new (FALSE, TRUE, sizeof (HlBand));
  bands->is_complete = TRUE;
  find_service (&books);
  for (guint n = 0; n < hl_plant_n_components (books.plant); n++)
    add_component (&books, n);
  add_waters (&books);
  add_totals (&books);
  bands->input = hl_bands_sum (bands, HL_BAND_FUEL) + hl_bands_sum (bands, HL_BAND_HEAT) + hl_bands_sum (bands, HL_BAND_POWER);
  add (&books, HL_BAND_REST, _("not accounted for"), balance (bands));
  bands->is_complete = bands->is_complete && bands->input > 0.0;
  hl_bands_clean (bands);
  g_free (books.is_service);
  return bands;
}

void
hl_bands_free (HlBands *bands)
{
  if (bands == NULL)
    return;
  for (guint i = 0; i < bands->bands->len; i++)
    g_free (g_array_index (bands->bands, HlBand, i).name);
  g_array_unref (bands->bands);
  g_free (bands);
}

double
hl_bands_sum (const HlBands *bands, HlBandKind kind)
{
  double sum = 0.0;
  for (guint i = 0; i < bands->bands->len; i++)
    if (g_array_index (bands->bands, HlBand, i).kind == kind)
      sum += g_array_index (bands->bands, HlBand, i).power;
  return sum;
}
