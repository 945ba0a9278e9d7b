/* Bars: exergy that each component destroys, and that leaves the plant through it, largest first.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/exergy-bars.h"
#include "draw/text.h"
#include "plant/i18n.h"
#include <math.h>

#define NEGLIGIBLE 1e-6      /* of what comes in: no bar */

struct _HlExergyBars {
  double  width, height, text_size, input, clear;
  double  from;              /* x where the bars begin */
  char   *title, *remark;
  GArray *bars;              /* HlExergyBar */
};

static void
clear_bar (gpointer data)
{
  HlExergyBar *bar = data;
  g_free (bar->name);
  g_free (bar->number);
}

static HlExergyBar *
nth (const HlExergyBars *bars, guint n)
{
  return &g_array_index (bars->bars, HlExergyBar, n);
}

static double
input_of (const HlSolution *solution)
{
  double input = 0.0;
  for (guint k = 0; k < hl_solution_n_exergy_flows (solution); k++)
    {
      const HlExergyFlow *flow = hl_solution_exergy_flow (solution, k);
      input += flow->kind < HL_EXERGY_DESTRUCTION ? flow->power : 0.0;
    }
  return input;
}

static char *
name_of (const HlSolution *solution, const HlExergyFlow *flow)
{
  if (flow->component < 0)
    return g_strdup (_("other consumers"));
  const HlComponent *component = hl_plant_component (hl_solution_plant (solution), (guint) flow->component);
  return g_strdup_printf ("%s %s", component->id, *component->name != '\0' ? component->name : _(component->kind->shelf_name));
}

static void
collect (HlExergyBars *bars, const HlSolution *solution)
{
  for (guint k = 0; k < hl_solution_n_exergy_flows (solution); k++)
    {
      const HlExergyFlow *flow = hl_solution_exergy_flow (solution, k);
      HlExergyBar bar = { .component = flow->component, .power = flow->power, .efficiency = NAN };
      HlExergyBalance balance;
      if (flow->kind < HL_EXERGY_DESTRUCTION || flow->kind == HL_EXERGY_DELIVERED || flow->kind == HL_EXERGY_NET || !(flow->power > NEGLIGIBLE * bars->input))
        continue;
      bar.is_loss = flow->kind != HL_EXERGY_DESTRUCTION;
      if (!bar.is_loss && hl_solution_exergy (solution, (guint) flow->component, &balance))
        bar.efficiency = balance.efficiency;
      bar.name = name_of (solution, flow);
      g_array_append_val (bars->bars, bar);
    }
}

static int
compare_bars (gconstpointer a, gconstpointer b)
{
  const HlExergyBar *x = a, *y = b;
  return (x->power < y->power) - (x->power > y->power);
}

/* What has no room of its own stands together in the last bar. */
static void
merge_beyond (HlExergyBars *bars, guint most)
{
  double rest = 0.0;
  guint n = bars->bars->len;
  if (n <= most)
    return;
  for (guint k = most - 1; k < n; k++)
    rest += nth (bars, k)->power;
  g_array_set_size (bars->bars, most - 1);
  HlExergyBar others = { .component = -1, .power = rest, .is_mixed = TRUE, .efficiency = NAN, .name = g_strdup_printf (_("%u others"), n - most + 1) };
  g_array_append_val (bars->bars, others);
}

static char *
number_of (const HlExergyBars *bars, const HlExergyBar *bar, HlUnitSet units)
{
  g_autofree char *power = hl_units_format (bar->power, HL_DIMENSION_POWER, units);
  double percent = 100.0 * bar->power / bars->input;
  GString *text = g_string_new (NULL);
  if (percent < 0.005)
    g_string_printf (text, "%s · < 0.01 %%", power);
  else
    g_string_printf (text, percent < 0.1 ? "%s · %.2f %%" : "%s · %.1f %%", power, percent);
  if (isfinite (bar->efficiency))
    g_string_append_printf (text, " · ε %.1f %%", 100.0 * bar->efficiency);
  return g_string_free (text, FALSE);
}

static double
text_width (const char *text, double size, gboolean is_bold)
{
  return MAX (hl_text_width (hl_theme (HL_THEME_LIGHT), text, size, is_bold), hl_text_width (hl_theme (HL_THEME_PAPER), text, size, is_bold));
}

static void
lay_out (HlExergyBars *bars, HlUnitSet units)
{
  double size = bars->text_size, top = 5.4 * size, bottom = bars->height - 0.8 * size, names = 0.0, numbers = 0.0, largest = 0.0;
  guint most = (guint) MAX (2.0, floor ((bottom - top) / (1.5 * size)));
  merge_beyond (bars, most);
  double row = MIN ((bottom - top) / bars->bars->len, 2.6 * size);
  for (guint k = 0; k < bars->bars->len; k++)
    {
      HlExergyBar *bar = nth (bars, k);
      bar->number = number_of (bars, bar, units);
      names = MAX (names, text_width (bar->name, size, FALSE));
      numbers = MAX (numbers, text_width (bar->number, size, FALSE));
      largest = MAX (largest, bar->power);
    }
  /* In a narrow picture the words grow small before the bars vanish. */
  double number_size = size * MIN (1.0, 0.42 * bars->width / numbers);
  names = MIN (names, 0.30 * bars->width);
  bars->from = 1.3 * size + names + 0.6 * size;
  double room = MAX (bars->width - bars->from - numbers * number_size / size - 2.0 * size, 0.1 * bars->width);
  for (guint k = 0; k < bars->bars->len; k++)
    {
      HlExergyBar *bar = nth (bars, k);
      double y = top + k * row, wide = text_width (bar->name, size, FALSE), shown = MIN (wide, names);
      bar->size = size * shown / wide;
      bar->name_box = (HlBox) { bars->from - 0.6 * size - shown, y + 0.5 * (row - 1.2 * size), shown, 1.2 * size };
      bar->bar = (HlBox) { bars->from, y + 0.18 * row, room * bar->power / largest, 0.64 * row };
      bar->number_box = (HlBox) { bar->bar.x + bar->bar.width + 0.5 * size, bar->name_box.y, text_width (bar->number, number_size, FALSE), 1.2 * number_size };
    }
}

HlExergyBars *
hl_exergy_bars_new (const HlSolution *solution, HlUnitSet units, double width, double height)
{
  HlExergyBars *bars = g_new0 (HlExergyBars, 1);
  g_return_val_if_fail (solution != NULL, NULL);
  const char *title = hl_plant_title (hl_solution_plant (solution));
  bars->width = MAX (width, 60.0);
  bars->height = MAX (height, 60.0);
  bars->text_size = 10.5 * CLAMP (sqrt (bars->width * bars->height / (960.0 * 600.0)), 0.85, 1.3);
  bars->title = g_strdup (title != NULL && title[0] != '\0' ? title : _("Exergy of the plant"));
  bars->input = input_of (solution);
  bars->bars = g_array_new (FALSE, TRUE, sizeof (HlExergyBar));
  g_array_set_clear_func (bars->bars, clear_bar);
  bars->remark = g_strdup (_("exergy destroyed and lost, as a part of all that comes in; ε: exergy made over exergy spent"));
  if (!(bars->input > 0.0))
    return bars;
  collect (bars, solution);
  g_array_sort (bars->bars, compare_bars);
  if (bars->bars->len > 0)
    lay_out (bars, units);
  return bars;
}

void
hl_exergy_bars_keep_clear (HlExergyBars *bars, double right)
{
  bars->clear = right;
}

void
hl_exergy_bars_free (HlExergyBars *bars)
{
  if (bars == NULL)
    return;
  g_array_unref (bars->bars);
  g_free (bars->title);
  g_free (bars->remark);
  g_free (bars);
}

guint
hl_exergy_bars_n (const HlExergyBars *bars)
{
  return bars->bars->len;
}

const HlExergyBar *
hl_exergy_bars_nth (const HlExergyBars *bars, guint n)
{
  g_return_val_if_fail (n < bars->bars->len, NULL);
  return nth (bars, n);
}

gboolean
hl_exergy_overlay (const HlSolution *solution, guint component, double *part, char **text)
{
  double input = input_of (solution);
  HlExergyBalance balance;
  g_return_val_if_fail (part != NULL, FALSE);
  if (!(input > 0.0) || !hl_solution_exergy (solution, component, &balance) || !(balance.destruction > NEGLIGIBLE * input))
    return FALSE;
  *part = balance.destruction / input;
  if (text != NULL)
    {
      g_autofree char *power = hl_units_format (balance.destruction, HL_DIMENSION_POWER, hl_plant_units (hl_solution_plant (solution)));
      *text = g_strdup_printf (*part < 0.001 ? "%s · %.2f %%" : "%s · %.1f %%", power, 100.0 * *part);
    }
  return TRUE;
}

/* --- drawing ------------------------------------------------------------------------ */

static void
draw_line (const HlExergyBars *bars, cairo_t *cr, const HlTheme *theme, const char *text, double y, double size, gboolean is_bold)
{
  double room = bars->width - bars->clear - 2.6 * bars->text_size, width = hl_text_width (theme, text, size, is_bold);
  if (width > room)
    size *= MAX (0.98 * room / width, 0.3);
  hl_text_show (cr, theme, text, 1.3 * bars->text_size, y, -1, size, is_bold);
}

static void
draw_bar (const HlExergyBars *bars, const HlExergyBar *bar, cairo_t *cr, const HlTheme *theme, gboolean is_stale)
{
  const HlColour *colour = is_stale ? &theme->stale : bar->is_mixed ? &theme->gas : bar->is_loss ? &theme->cooling : &theme->steam;
  double baseline = bar->name_box.y + 0.95 * bars->text_size, number_size = bar->number_box.height / 1.2;
  cairo_rectangle (cr, bar->bar.x, bar->bar.y, MAX (bar->bar.width, 0.8), bar->bar.height);
  cairo_set_source_rgba (cr, colour->r, colour->g, colour->b, 0.82 * colour->a);
  cairo_fill (cr);
  hl_set_colour (cr, is_stale ? &theme->quiet : &theme->ink);
  hl_text_show (cr, theme, bar->name, bar->name_box.x + bar->name_box.width, baseline, 1, bar->size, FALSE);
  hl_set_colour (cr, &theme->quiet);
  hl_text_show (cr, theme, bar->number, bar->number_box.x, baseline, -1, number_size, FALSE);
}

/* Which colour means what, right above the bars. */
static void
draw_key (const HlExergyBars *bars, cairo_t *cr, const HlTheme *theme, gboolean is_stale)
{
  const char *words[2] = { _("destroyed"), _("lost to the surroundings") };
  const HlColour *colours[2] = { &theme->steam, &theme->cooling };
  double size = 0.92 * bars->text_size, x = bars->from;
  gboolean is_used[2] = { FALSE, FALSE };
  for (guint k = 0; k < bars->bars->len; k++)
    if (!nth (bars, k)->is_mixed)
      is_used[nth (bars, k)->is_loss] = TRUE;
  for (guint k = 0; k < 2; k++)
    {
      if (!is_used[k])
        continue;
      const HlColour *colour = is_stale ? &theme->stale : colours[k];
      cairo_rectangle (cr, x, 4.15 * bars->text_size, 0.7 * size, 0.7 * size);
      cairo_set_source_rgba (cr, colour->r, colour->g, colour->b, 0.82 * colour->a);
      cairo_fill (cr);
      hl_set_colour (cr, &theme->quiet);
      hl_text_show (cr, theme, words[k], x + size, 4.15 * bars->text_size + 0.68 * size, -1, size, FALSE);
      x += 2.4 * size + hl_text_width (theme, words[k], size, FALSE);
    }
}

static void
draw_empty (const HlExergyBars *bars, cairo_t *cr, const HlTheme *theme)
{
  const char *text = _("Bars appear here as soon as the exergy of the whole plant is known.");
  double size = bars->text_size, width = hl_text_width (theme, text, size, FALSE);
  if (width > 0.95 * bars->width)
    size *= 0.93 * bars->width / width;
  hl_set_colour (cr, &theme->quiet);
  hl_text_show (cr, theme, text, bars->width / 2.0, bars->height / 2.0, 0, size, FALSE);
}

void
hl_exergy_bars_draw (const HlExergyBars *bars, cairo_t *cr, const HlTheme *theme, gboolean is_stale)
{
  g_return_if_fail (bars != NULL && cr != NULL && theme != NULL);
  cairo_save (cr);
  cairo_rectangle (cr, 0.0, 0.0, bars->width, bars->height);
  hl_set_colour (cr, &theme->ground);
  cairo_fill (cr);
  if (bars->bars->len == 0)
    draw_empty (bars, cr, theme);
  else
    {
      hl_set_colour (cr, &theme->ink);
      draw_line (bars, cr, theme, bars->title, 1.8 * bars->text_size, 1.25 * bars->text_size, TRUE);
      hl_set_colour (cr, &theme->quiet);
      draw_line (bars, cr, theme, bars->remark, 3.1 * bars->text_size, bars->text_size, FALSE);
      draw_key (bars, cr, theme, is_stale);
      for (guint k = 0; k < bars->bars->len; k++)
        draw_bar (bars, nth (bars, k), cr, theme, is_stale);
    }
  cairo_restore (cr);
}
