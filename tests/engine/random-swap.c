/* The same plant with other values put in: each given in place of one that it hangs on.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "random-swap.h"
#include <math.h>
#include <string.h>

/* A change of a quantity that an engineer would call noticeable [SI]. */
static double
noticeable (const HlQuantityKind *kind, double value)
{
  switch (kind->dimension)
    {
    case HL_DIMENSION_TEMPERATURE: return 5.0;
    case HL_DIMENSION_TEMPERATURE_DIFFERENCE: return 2.0;
    case HL_DIMENSION_RATIO: return 0.02;
    case HL_DIMENSION_ENTHALPY: return 2e4;
    case HL_DIMENSION_ENTROPY: return 50.0;
    default: return 0.1 * fabs (value);
    }
}

/* Nothing that could be given for another: what follows from the whole by comparing; and the efficiency of a group, which
 * stands for that of its section until it is given, and so adds a value instead of finding one. */
static gboolean
is_out_of_question (const HlAddress *address)
{
  if (address->owner == HL_OWNER_COMPONENT && g_str_has_prefix (address->key, "group_efficiency"))
    return TRUE;
  return address->owner == HL_OWNER_PLANT && (g_str_equal (address->key, "carnot_efficiency") || g_str_equal (address->key, "exhaust_moisture"));
}

static HlAddress
any_address (HlPlant *plant, guint32 seed, int count)
{
  guint n;
  int owner = random_below (seed, "swap-owner", count, 10);
  if (owner == 0)
    {
      const HlQuantityKind *kinds = hl_plant_quantities (&n);
      return hl_address_plant (g_intern_string (kinds[random_below (seed, "swap-plant", count, (int) n)].key));
    }
  if (owner < 4)
    {
      static const char *const keys[] = { "m", "p", "T", "x" };
      const HlStream *stream = hl_plant_stream (plant, (guint) random_below (seed, "swap-stream", count, (int) hl_plant_n_streams (plant)));
      return hl_address_stream (stream->id, g_intern_string (keys[random_below (seed, "swap-letter", count, G_N_ELEMENTS (keys))]));
    }
  const HlComponent *c = hl_plant_component (plant, (guint) random_below (seed, "swap-component", count, (int) hl_plant_n_components (plant)));
  n = hl_component_n_quantities (c);
  if (n == 0)
    return hl_address_plant (g_intern_static_string ("gross_power"));
  return hl_address_component (c->id, hl_component_quantity (c, (guint) random_below (seed, "swap-quantity", count, (int) n)).key);
}

/* Components that an address belongs to: its own, or both ends of its stream. */
static guint
owners (HlPlant *plant, const HlAddress *address, const char *ids[2])
{
  if (address->owner == HL_OWNER_COMPONENT)
    {
      ids[0] = address->id;
      return 1;
    }
  const HlStream *stream = address->owner == HL_OWNER_STREAM ? hl_plant_find_stream (plant, address->id) : NULL;
  if (stream == NULL)
    return 0;
  ids[0] = stream->from_id;
  ids[1] = stream->to_id;
  return 2;
}

/* Is it what an engineer would let go for this one: of the same component, or of one that a stream joins to it; for a result of
 * the plant another such, or an efficiency? */
static gboolean
are_near (HlPlant *plant, const HlAddress *a, const HlAddress *b)
{
  const char *of_a[2], *of_b[2];
  guint n_a = owners (plant, a, of_a), n_b = owners (plant, b, of_b);
  if (n_a == 0)
    return n_b == 0 || (hl_plant_quantity_kind (plant, b)->dimension == HL_DIMENSION_RATIO && strstr (b->key, "efficiency") != NULL);
  if (n_b == 0)
    return TRUE;
  for (guint i = 0; i < n_a; i++)
    for (guint j = 0; j < n_b; j++)
      {
        if (of_a[i] == of_b[j])
          return TRUE;
        for (guint k = 0; k < hl_plant_n_streams (plant); k++)
          {
            const HlStream *stream = hl_plant_stream (plant, k);
            if ((stream->from_id == of_a[i] && stream->to_id == of_b[j]) || (stream->from_id == of_b[j] && stream->to_id == of_a[i]))
              return TRUE;
          }
      }
  return FALSE;
}

/* The value put in that goes: one of those on which the quantity depends neither hardly nor wildly. */
static gboolean
choose_partner (const HlSolution *solution, const HlAddress *address, double value, guint32 seed, int count, gboolean is_near, HlAddress *partner)
{
  HlPlant *plant = hl_solution_plant (solution);
  const HlQuantityKind *kind = hl_plant_quantity_kind (plant, address);
  g_autoptr (GArray) all = hl_solution_sensitivities (solution, address);
  g_autoptr (GArray) fit = g_array_new (FALSE, FALSE, sizeof (HlAddress));
  for (guint k = 0; all != NULL && k < all->len; k++)
    {
      const HlSensitivity *s = &g_array_index (all, HlSensitivity, k);
      const HlQuantityKind *other = hl_plant_quantity_kind (plant, &s->given);
      if (other == NULL || is_out_of_question (&s->given) || (is_near && !are_near (plant, address, &s->given)))
        continue;
      double change = fabs (s->derivative) * noticeable (other, s->value) / noticeable (kind, value);
      if (change > 0.1 && change < 10.0)
        g_array_append_val (fit, s->given);
    }
  if (fit->len == 0)
    return FALSE;
  *partner = g_array_index (fit, HlAddress, random_below (seed, "swap-partner", count, (int) fit->len));
  return TRUE;
}

HlPlant *
random_swap (const HlSolution *solution, guint32 seed, int count, gboolean is_near, char **what)
{
  HlPlant *plant = hl_solution_plant (solution);
  for (int attempt = 0; attempt < 20; attempt++)
    {
      HlAddress address = any_address (plant, seed, 100 * count + attempt), partner;
      double value;
      const HlQuantityKind *kind = hl_plant_quantity_kind (plant, &address);
      if (kind == NULL || is_out_of_question (&address) || hl_plant_value_wherever (plant, &address, NULL) != NULL || !hl_solution_value (solution, &address, &value)
          || !(fabs (value) > 1e-9) || !choose_partner (solution, &address, value, seed, 100 * count + attempt, is_near, &partner))
        continue;
      HlValue given = { .origin = HL_ORIGIN_GIVEN, .value = value };
      g_autoptr (HlPlant) typed = hl_plant_with_value (plant, &address, &given, NULL);
      if (typed == NULL)
        continue;
      g_autofree char *a = hl_address_to_text (&address), *b = hl_address_to_text (&partner);
      *what = g_strdup_printf ("%s=%.9g given, %s found", a, value, b);
      return hl_plant_with_value (typed, &partner, NULL, NULL);
    }
  return NULL;
}

static void
shuffle (guint *order, guint n, guint32 seed, const char *purpose)
{
  for (guint k = 0; k < n; k++)
    order[k] = k;
  for (guint k = n; k > 1; k--)
    {
      guint other = (guint) random_below (seed, purpose, (int) k, (int) k), keep = order[k - 1];
      order[k - 1] = order[other];
      order[other] = keep;
    }
}

HlPlant *
random_reorder (HlPlant *plant, guint32 seed)
{
  HlPlant *other = hl_plant_new ();
  guint n = hl_plant_n_components (plant), n_streams = hl_plant_n_streams (plant);
  g_autofree guint *order = g_new (guint, MAX (n, n_streams) + 1);
#define TAKE(expression) G_STMT_START { HlPlant *taken_ = (expression); g_assert_nonnull (taken_); hl_plant_unref (other); other = taken_; } G_STMT_END
  shuffle (order, n, seed, "order-components");
  for (guint k = 0; k < n; k++)
    TAKE (hl_plant_with_component (other, hl_component_ref ((HlComponent *) hl_plant_component (plant, order[k]))));
  shuffle (order, n_streams, seed, "order-streams");
  for (guint k = 0; k < n_streams; k++)
    TAKE (hl_plant_with_stream (other, hl_stream_ref ((HlStream *) hl_plant_stream (plant, order[k]))));
  for (guint k = 0; k < hl_plant_n_shafts (plant); k++)
    TAKE (hl_plant_with_shaft (other, hl_shaft_ref ((HlShaft *) hl_plant_shaft (plant, k))));
  TAKE (hl_plant_with_site (other, hl_plant_site (plant)));
  guint n_kinds;
  const HlQuantityKind *kinds = hl_plant_quantities (&n_kinds);
  for (guint k = 0; k < n_kinds; k++)
    {
      HlAddress address = hl_address_plant (g_intern_string (kinds[k].key));
      TAKE (hl_plant_with_value (other, &address, hl_plant_value (plant, &address), NULL));
    }
#undef TAKE
  return other;
}
