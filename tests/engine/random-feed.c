/* The water side of a random plant: pumps, heaters, their drains, and all condensate that comes back on the way to the boiler.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "random-plant.h"
#include <math.h>

typedef struct {
  RandomBuild *b;
  const char *at;                                   /* port that the water has reached */
  double      loss[MOST_HEATERS], p_line[MOST_HEATERS + 1];       /* pressure ahead of each heater */
  gboolean    is_cascaded[MOST_HEATERS];            /* its drain flows to the next lower one */
  int         n_inlets[MOST_HEATERS], next_inlet[MOST_HEATERS];   /* of open heaters */
  const char *open[MOST_HEATERS];
  const char *waiting_drain;                        /* of the heater above, seen from below */
  const char *drain[MOST_HEATERS], *drain_inlet[MOST_HEATERS];
  gboolean    has_spray, has_feed_pump;
} Train;

static void
choose_lines (Train *t)
{
  RandomBuild *b = t->b;
  double p = b->p_feed;
  t->p_line[b->n_heaters] = p;
  for (int i = b->n_heaters - 1; i >= 0; i--)
    {
      t->loss[i] = b->d->trims ? random_between (b->seed, "feed-loss", i, 0.0, 0.02) : 0.0;
      p = b->is_open[i] ? b->p_heater[i] : p / (1.0 - t->loss[i]);
      t->p_line[i] = p;
      gboolean forward = random_chance (b->seed, "forward-which", i, 0.25 * b->d->forward);
      t->is_cascaded[i] = !b->is_open[i] && !forward && (i > 0 || b->drain_port != NULL);
    }
  for (int i = 0; i < b->n_heaters; i++)
    t->n_inlets[i] = 1 + (i + 1 < b->n_heaters && t->is_cascaded[i + 1]);
}

/* Behind how many heaters the water is warm enough to take it. */
static int
slot_for (const Train *t, double T)
{
  const RandomBuild *b = t->b;
  for (int i = 0; i <= b->n_heaters; i++)
    if ((i == 0 ? b->T_end + 5.0 : b->T_heater[i - 1]) >= T)
      return i;
  return b->n_heaters;
}

static gboolean
goes_into (const Train *t, const RandomReturn *r)
{
  return r->slot < t->b->n_heaters && t->b->is_open[r->slot];
}

static void
place_return (Train *t, RandomReturn *r)
{
  if (r->slot < 0)
    r->slot = slot_for (t, r->T);
  if (goes_into (t, r))
    {
      if (t->n_inlets[r->slot] < 5)
        t->n_inlets[r->slot]++;
      else
        r->slot++;
    }
  if (r->is_free || !isnan (r->p))
    return;
  /* Condensate at a pressure of its own, well off that of the line. */
  double line = t->p_line[r->slot];
  r->p = fmax (random_decades (t->b->seed, "condensate-p", r->slot, 1.2e5, 6e5), 1.3 * random_p_sat (r->T));
  if (fabs (log (r->p / line)) < 0.35)
    r->p = 2.0 * line;
}

/* Brings it to the pressure of the line: up by a pump, down by a valve. */
static const char *
bring (RandomBuild *b, const char *port, double p, double p_line, gboolean is_free)
{
  if (is_free)
    return port;
  const char *id = p < p_line ? random_add (b, "P", "pump isentropic_efficiency=%.4g", random_between (b->seed, "return-pump", (int) b->items->len, 0.55, 0.8)) : random_add (b, "V", "valve");
  random_join (b, port, random_port (id, "inlet"));
  return random_port (id, "outlet");
}

static void
mix_in (Train *t, const char *port)
{
  const char *mixer = random_add (t->b, "M", "mixer inlets:2");
  random_join (t->b, t->at, random_port (mixer, "inlet1"));
  random_join (t->b, port, random_port (mixer, "inlet2"));
  t->at = random_port (mixer, "outlet");
}

static void
take_returns (Train *t, int slot)
{
  RandomBuild *b = t->b;
  for (int k = 0; k < b->n_returns; k++)
    if (b->returns[k].slot == slot)
      {
        const RandomReturn *r = &b->returns[k];
        const char *port = bring (b, r->port, r->p, t->p_line[slot], r->is_free);
        if (goes_into (t, r))
          random_join (b, port, random_port (t->open[slot], "inlet%d", ++t->next_inlet[slot]));
        else
          mix_in (t, port);
      }
}

static void
add_pump (Train *t, int slot)
{
  RandomBuild *b = t->b;
  const char *pump = random_add (b, "P", "pump isentropic_efficiency=%.4g motor_efficiency=%.4g", random_between (b->seed, "pump", slot, 0.65, 0.87), random_between (b->seed, "motor", slot, 0.88, 0.97));
  random_join (b, t->at, random_port (pump, "inlet"));
  t->at = random_port (pump, "outlet");
  gboolean is_feed = TRUE;
  for (int i = slot; i < b->n_heaters; i++)
    is_feed &= !b->is_open[i];
  if (!is_feed)
    return;
  if (b->feed_pump != NULL)
    g_string_append_printf (b->rest, "shaft %s %s\n", b->feed_pump, pump);
  if (b->spray_port != NULL)
    {
      const char *split = random_add (b, "X", "splitter outlets:2");
      random_join (b, t->at, random_port (split, "inlet"));
      t->at = random_port (split, "outlet1");
      random_join (b, random_port (split, "outlet2"), b->spray_port);
    }
}

static void
add_open (Train *t, int i)
{
  RandomBuild *b = t->b;
  double subcooling = b->d->tricks && random_chance (b->seed, "open-sub", i, 0.3) ? random_between (b->seed, "open-sub", i + 50, 0.0, 5.0) : 0.0;
  t->open[i] = random_add (b, "D", "open_heater inlets:%d outlet_subcooling=%.6g", t->n_inlets[i], subcooling);
  random_join (b, b->heater_steam[i], random_port (t->open[i], "steam"));
  random_join (b, t->at, random_port (t->open[i], "inlet%d", ++t->next_inlet[i]));
  take_returns (t, i);
  t->at = random_port (t->open[i], "outlet");
}

/* A pumped drain leaves saturated: its heat is wanted; a cascaded one is cooled by the feed. */
static void
add_closed (Train *t, int i)
{
  RandomBuild *b = t->b;
  double rise = b->T_heater[i] - (i > 0 ? b->T_heater[i - 1] : b->T_end);
  const char *id = t->is_cascaded[i]
    ? random_add (b, "H", "closed_heater terminal_difference=%.6g drain_approach=%.6g feed_pressure_loss=%.6g", random_between (b->seed, "ttd", i, 0.5, 5.0),
                  fmin (random_between (b->seed, "dca", i, 2.8, 10.0), 0.5 * rise), t->loss[i])
    : random_add (b, "H", "closed_heater terminal_difference=%.6g -drain_approach drain_subcooling=%.6g feed_pressure_loss=%.6g", random_between (b->seed, "ttd", i, 0.5, 5.0),
                  random_chance (b->seed, "drain-sub", i, 0.5) ? 0.0 : random_between (b->seed, "drain-sub", i + 50, 0.0, 0.3 * rise), t->loss[i]);
  random_join (b, b->heater_steam[i], random_port (id, "steam"));
  random_join (b, t->at, random_port (id, "feed_inlet"));
  t->at = random_port (id, "feed_outlet");
  t->drain[i] = random_port (id, "drain");
  t->drain_inlet[i] = random_port (id, "drain_inlet");
  if (!t->is_cascaded[i])
    random_return (b, t->drain[i], b->p_heater[i], b->T_heater[i], i + 1, FALSE);
}

static void
lead_drains (Train *t)
{
  RandomBuild *b = t->b;
  for (int i = 0; i < b->n_heaters; i++)
    {
      if (!t->is_cascaded[i])
        continue;
      if (i == 0)
        random_join (b, t->drain[i], b->drain_port);
      else if (b->is_open[i - 1])
        random_join (b, bring (b, t->drain[i], b->p_heater[i], b->p_heater[i - 1], FALSE), random_port (t->open[i - 1], "inlet%d", ++t->next_inlet[i - 1]));
      else
        random_join (b, t->drain[i], t->drain_inlet[i - 1]);
    }
}

void
random_feed (RandomBuild *b)
{
  Train t = { .b = b, .at = b->source };
  choose_lines (&t);
  for (int k = 0; k < b->n_returns; k++)
    place_return (&t, &b->returns[k]);
  /* A pumped drain meets the line behind its heater: count it where that is an open heater's inlet. */
  for (int i = 0; i + 1 < b->n_heaters; i++)
    if (!b->is_open[i] && !t.is_cascaded[i] && b->is_open[i + 1])
      t.n_inlets[i + 1]++;
  gboolean wants_pump = TRUE;
  for (int i = 0; i <= b->n_heaters; i++)
    {
      if (wants_pump)
        add_pump (&t, i);
      wants_pump = i < b->n_heaters && b->is_open[i];
      if (wants_pump)
        {
          add_open (&t, i);
          continue;
        }
      take_returns (&t, i);
      if (i < b->n_heaters)
        add_closed (&t, i);
    }
  lead_drains (&t);
  random_join (b, t.at, random_port (b->boiler, "feed"));
}
