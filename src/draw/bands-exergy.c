/* From a solution to the exergy that comes in, is destroyed, lost and made.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/bands-private.h"
#include "plant/i18n.h"
#include <math.h>

static void
add (HlBands *bands, HlBandKind kind, char *name, double power)
{
  HlBand band = { kind, name, power };
  g_array_append_val (bands->bands, band);
}

/* What burns or heats destroys most of it before steam is made; what turns shafts, after. */
static HlBandKind
kind_of_destruction (const HlComponent *component, gboolean has_heat)
{
  const HlKind *kind = component->kind;
  if (has_heat)
    return HL_BAND_FIRING_LOSS;
  return kind->shaft == HL_SHAFT_GENERATOR || kind->shaft == HL_SHAFT_LOSS || g_str_equal (kind->id, "motor") ? HL_BAND_SHAFT_LOSS : HL_BAND_DESTROYED;
}

static gboolean
brings_heat (const HlSolution *solution, int component)
{
  for (guint k = 0; k < hl_solution_n_exergy_flows (solution); k++)
    {
      const HlExergyFlow *flow = hl_solution_exergy_flow (solution, k);
      if (flow->component == component && (flow->kind == HL_EXERGY_FUEL || flow->kind == HL_EXERGY_HEAT))
        return TRUE;
    }
  return FALSE;
}

static void
add_flow (HlBands *bands, const HlSolution *solution, const HlExergyFlow *flow)
{
  const HlComponent *component = flow->component >= 0 ? hl_plant_component (hl_solution_plant (solution), (guint) flow->component) : NULL;
  const char *id = component != NULL ? component->id : "";
  switch (flow->kind)
    {
    case HL_EXERGY_FUEL:
      add (bands, HL_BAND_FUEL, g_strdup_printf (_("fuel of %s"), id), flow->power);
      break;
    case HL_EXERGY_HEAT:
      add (bands, HL_BAND_HEAT, g_strdup_printf (_("heat of %s"), id), flow->power);
      break;
    case HL_EXERGY_STREAM_IN:
      add (bands, HL_BAND_WATER_IN, hl_bands_label (component), flow->power);
      break;
    case HL_EXERGY_COLD:
      add (bands, HL_BAND_WATER_IN, g_strdup_printf (_("cold of %s"), id), flow->power);
      break;
    case HL_EXERGY_ELECTRICITY:
      add (bands, HL_BAND_HEAT, g_strdup (_("electricity")), flow->power);
      break;
    case HL_EXERGY_DESTRUCTION:
      add (bands, kind_of_destruction (component, brings_heat (solution, flow->component)), g_strdup_printf (_("destroyed in %s"), id), flow->power);
      break;
    case HL_EXERGY_LOSS:
      add (bands, HL_BAND_REJECTED, g_strdup_printf (_("lost through %s"), id), flow->power);
      break;
    case HL_EXERGY_STREAM_OUT:
      add (bands, HL_BAND_REJECTED, g_strdup_printf (_("leaves at %s"), id), flow->power);
      break;
    case HL_EXERGY_OTHER:
      add (bands, HL_BAND_OWN, g_strdup (_("other consumers")), flow->power);
      break;
    case HL_EXERGY_DELIVERED:
      add (bands, HL_BAND_DELIVERED, hl_bands_label (component), flow->power);
      break;
    case HL_EXERGY_NET:
    default:
      add (bands, HL_BAND_NET, g_strdup (_("net power")), flow->power);
    }
}

/* Within a kind the largest first: what is too small for a band of its own then stands together. */
static int
compare_bands (gconstpointer a, gconstpointer b)
{
  const HlBand *x = a, *y = b;
  return x->kind != y->kind ? (int) x->kind - (int) y->kind : (x->power < y->power) - (x->power > y->power);
}

HlBands *
hl_bands_new_exergy (const HlSolution *solution)
{
  HlBands *bands = g_new0 (HlBands, 1);
  double rest = 0.0;
  g_return_val_if_fail (solution != NULL, NULL);
  bands->bands = g_array_new (FALSE, TRUE, sizeof (HlBand));
  for (guint k = 0; k < hl_solution_n_exergy_flows (solution); k++)
    {
      const HlExergyFlow *flow = hl_solution_exergy_flow (solution, k);
      gboolean comes_in = flow->kind < HL_EXERGY_DESTRUCTION;
      bands->input += comes_in ? flow->power : 0.0;
      rest += comes_in ? flow->power : -flow->power;
      add_flow (bands, solution, flow);
    }
  bands->is_complete = bands->input > 0.0;
  add (bands, HL_BAND_REST, g_strdup (_("not accounted for")), rest);
  hl_bands_clean (bands);
  g_array_sort (bands->bands, compare_bands);
  return bands;
}
