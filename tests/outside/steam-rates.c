/* Theoretical steam rates of UFC 3-540-02N / MIL-HDBK-1003/7 "Steam Power Plants" (US DoD 2004), table 8, solved as plants.
 * Gauge pressures are above 14.696 psi, vacuum is in inches of mercury at 0 °C.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plants.h"
#include "validation.h"
#include <math.h>

static const struct { double p_psig, T_F; double to_2_inHg, to_0_psig, to_150_psig; } rows[] = {
  { 100.0, NAN, 11.31, 22.73, NAN },
  { 250.0, 550.0, 8.78, 14.57, 71.8 },
  { 400.0, 750.0, 7.36, 11.19, 31.93 },
  { 600.0, 825.0, 6.76, 9.82, 22.15 },
  { 850.0, 900.0, 6.28, 8.81, 17.33 },
  { 1250.0, 950.0, 5.94, 8.10, 14.35 },
};

static double
from_psig (double p)
{
  return (p + 14.696) * 6894.757293168;
}

static double
steam_rate (double p_psig, double T_F, double p_out)
{
  g_autofree char *state = isnan (T_F) ? g_strdup ("steam.x=1") : g_strdup_printf ("steam.T=%.10g", (T_F + 459.67) / 1.8);
  g_autofree char *text = g_strdup_printf (
    "heat_input Q1 pressure_loss=0 steam.m=1 steam.p=%.10g %s\nturbine T1 exhaust.p=%.10g isentropic_efficiency=1 mechanical_efficiency=1\n"
    "boundary Y1 direction:0 outlet.T=300\nboundary Y2 direction:1\nY1.outlet > Q1.feed\nQ1.steam > T1.inlet\nT1.exhaust > Y2.inlet\n"
    "plant other_consumption_fraction=0\n", from_psig (p_psig), state, p_out);
  g_autoptr (HlPlant) plant = test_plant (text);
  g_autoptr (HlSolution) s = hl_solve (plant, NULL);
  test_assert_solved (s);
  return test_value (s, "plant.steam_rate") * 3.6e6 / 0.45359237;
}

static void
check (guint row, const char *exhaust, double rate, double printed, double step)
{
  g_autofree char *subject = isnan (rows[row].T_F) ? g_strdup_printf ("%.0f psig saturated to %s", rows[row].p_psig, exhaust)
                                                   : g_strdup_printf ("%.0f psig, %.0f °F to %s", rows[row].p_psig, rows[row].T_F, exhaust);
  if (!isnan (printed))
    validate ("Theoretical steam rates", subject, "UFC 3-540-02N / MIL-HDBK-1003/7 Steam Power Plants (US DoD 2004), table 8", "steam rate", "lb/kWh", printed, rate, 0.03 + 0.5 * step, 4);
}

static void
test_theoretical_steam_rates (void)
{
  for (guint k = 0; k < G_N_ELEMENTS (rows); k++)
    {
      check (k, "2 inHg", steam_rate (rows[k].p_psig, rows[k].T_F, 2.0 * 3386.389), rows[k].to_2_inHg, 0.01);
      check (k, "0 psig", steam_rate (rows[k].p_psig, rows[k].T_F, from_psig (0.0)), rows[k].to_0_psig, 0.01);
      if (!isnan (rows[k].to_150_psig))
        check (k, "150 psig", steam_rate (rows[k].p_psig, rows[k].T_F, from_psig (150.0)), rows[k].to_150_psig, rows[k].to_150_psig > 50.0 ? 0.1 : 0.01);
    }
}

int
main (int argc, char **argv)
{
  g_test_init (&argc, &argv, NULL);
  g_test_add_func ("/outside/steam-rates/theoretical", test_theoretical_steam_rates);
  return g_test_run ();
}
