/* Lays out the bands: one main band from fuel to net power, everything else joins or leaves it.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/bands-private.h"
#include "draw/text.h"
#include "plant/i18n.h"
#include <math.h>

#define LINE      1.25     /* from line to line over the size of the text */

static HlStripWay
way_of (const HlBand *band)
{
  switch (band->kind)
    {
    case HL_BAND_FUEL:
    case HL_BAND_HEAT:
    case HL_BAND_POWER:
    case HL_BAND_WATER_IN:
      return HL_STRIP_IN;
    case HL_BAND_DELIVERED:
    case HL_BAND_OWN:
      return HL_STRIP_UP;
    case HL_BAND_NET:
      return HL_STRIP_END;
    case HL_BAND_REST:
      return band->power < 0.0 ? HL_STRIP_IN : HL_STRIP_DOWN;
    default:
      return HL_STRIP_DOWN;
    }
}

static void
clear_strip (gpointer data)
{
  HlStrip *strip = data;
  for (guint i = 0; i < G_N_ELEMENTS (strip->lines); i++)
    g_free (strip->lines[i]);
}

static HlStrip *
nth (const HlBandsPicture *picture, guint n)
{
  return &g_array_index (picture->strips, HlStrip, n);
}

/* Strips in the order in which they join and leave. */
static void
add_strips (HlBandsPicture *picture)
{
  for (guint i = 0; i < picture->bands->bands->len; i++)
    {
      const HlBand *band = &g_array_index (picture->bands->bands, HlBand, i);
      HlStrip strip = { .kind = band->kind, .way = way_of (band), .power = fabs (band->power), .align = 0 };
      if (band->kind == HL_BAND_PUMPS)
        continue;
      strip.lines[0] = g_strdup (band->name);
      g_array_append_val (picture->strips, strip);
    }
}

static const char *
name_together (const HlBandsPicture *picture, HlBandKind kind)
{
  if (kind == HL_BAND_SHAFT_LOSS)
    return _("shaft, generator");
  if (kind == HL_BAND_DESTROYED)
    return _("destroyed elsewhere");
  return kind == HL_BAND_REJECTED && picture->of == HL_BANDS_EXERGY ? _("lost") : _("others");
}

/* Destroyed exergy comes largest first: what is too small stands together in the last of its strips, not here and there. */
static int
last_destroyed (const HlBandsPicture *picture)
{
  int last = -1;
  guint n = 0;
  for (guint i = 0; i < picture->strips->len; i++)
    if (nth (picture, i)->kind == HL_BAND_DESTROYED)
      {
        last = (int) i;
        n++;
      }
  return n > 3 ? last : -1;
}

/* Neighbours of one kind, the smallest first, become one. */
static gboolean
merge_smallest (HlBandsPicture *picture)
{
  int best = last_destroyed (picture);
  gboolean is_chosen = best >= 0;
  for (guint i = 1; !is_chosen && i < picture->strips->len; i++)
    if (nth (picture, i)->kind == nth (picture, i - 1)->kind && nth (picture, i)->way == nth (picture, i - 1)->way
        && (best < 0 || nth (picture, i)->power < nth (picture, (guint) best)->power))
      best = (int) i;
  if (best < 0)
    return FALSE;
  nth (picture, (guint) best - 1)->power += nth (picture, (guint) best)->power;
  g_free (nth (picture, (guint) best - 1)->lines[0]);
  nth (picture, (guint) best - 1)->lines[0] = g_strdup (name_together (picture, nth (picture, (guint) best)->kind));
  g_array_remove_index (picture->strips, (guint) best);
  return TRUE;
}

static void
write_numbers (HlBandsPicture *picture, HlUnitSet units)
{
  for (guint i = 0; i < picture->strips->len; i++)
    {
      HlStrip *strip = nth (picture, i);
      strip->lines[1] = hl_units_format (strip->power, HL_DIMENSION_POWER, units);
      strip->lines[2] = g_strdup_printf (strip->power < 0.001 * picture->bands->input ? "%.2f %%" : "%.1f %%", 100.0 * strip->power / picture->bands->input);
    }
}

/* --- geometry --- */

void
hl_bands_picture_edges (const HlBandsPicture *picture, double x, double *top, double *bottom)
{
  *top = *bottom = picture->top;
  if (picture->has_loop && x >= picture->loop_to)
    *top -= picture->loop_width;
  if (picture->has_loop && x >= picture->loop_from)
    *top += picture->loop_width;
  for (guint i = 0; i < picture->strips->len; i++)
    {
      const HlStrip *strip = nth (picture, i);
      if (strip->way == HL_STRIP_IN)
        *bottom += strip->width;
      else if (strip->way == HL_STRIP_DOWN && x >= strip->x)
        *bottom -= strip->width;
      else if (strip->way == HL_STRIP_UP && x >= strip->x)
        *top += strip->width;
    }
}

static double
sum_of (const HlBandsPicture *picture, gboolean is_out)
{
  double sum = 0.0;
  for (guint i = 0; i < picture->strips->len; i++)
    if ((nth (picture, i)->way == HL_STRIP_DOWN || nth (picture, i)->way == HL_STRIP_UP) == is_out
        && (is_out || nth (picture, i)->way == HL_STRIP_IN))
      sum += nth (picture, i)->power;
  return sum;
}

static guint
n_leaving (const HlBandsPicture *picture)
{
  guint n = 0;
  for (guint i = 0; i < picture->strips->len; i++)
    n += nth (picture, i)->way == HL_STRIP_DOWN || nth (picture, i)->way == HL_STRIP_UP;
  return n;
}

static void
set_scale (HlBandsPicture *picture, double room_across)
{
  double pumps = hl_bands_sum (picture->bands, HL_BAND_PUMPS), in = sum_of (picture, FALSE) + pumps, out = sum_of (picture, TRUE);
  double across = room_across - n_leaving (picture) * (picture->radius + 1.2 * picture->text_size);
  picture->scale = 0.36 * picture->height / in;
  if (out > 0.0)
    picture->scale = MIN (picture->scale, MAX (across, 0.2 * room_across) / out);
  for (guint i = 0; i < picture->strips->len; i++)
    nth (picture, i)->width = nth (picture, i)->power * picture->scale;
  picture->has_loop = pumps > 0.0;
  picture->loop_width = pumps * picture->scale;
}

static double
natural_width (const HlBandsPicture *picture, const HlStrip *strip)
{
  double width = 1.0;
  for (guint i = 0; i < G_N_ELEMENTS (strip->lines); i++)
    if (strip->lines[i] != NULL)
      {
        double light = hl_text_width (hl_theme (HL_THEME_LIGHT), strip->lines[i], picture->text_size, i == 1);
        width = MAX (width, MAX (light, hl_text_width (hl_theme (HL_THEME_PAPER), strip->lines[i], picture->text_size, i == 1)));
      }
  return width;
}

static gboolean
leaves (const HlStrip *strip)
{
  return strip->way == HL_STRIP_DOWN || strip->way == HL_STRIP_UP;
}

/* Length of the main band that the words of a strip ask for beyond its own; upwards they have more room. */
static double
wanted_gap (const HlBandsPicture *picture, const HlStrip *strip)
{
  double wanted = MAX (0.5 * picture->text_size, natural_width (picture, strip) + 4.0 - picture->radius - strip->width);
  return strip->way == HL_STRIP_UP ? 0.35 * wanted : wanted;
}

/* Strips leave one after the other; what is left of the length lies between them as their words need it. */
static void
set_places (HlBandsPicture *picture, double from, double to)
{
  double used = 0.0, wanted = 0.5 * picture->text_size, share, more, x;
  gboolean is_power = FALSE;
  /* Without a firing loss the words of what comes in need room before the first strip leaves. */
  if (!(hl_bands_sum (picture->bands, HL_BAND_FIRING_LOSS) > 0.0))
    from += MIN (6.0 * picture->text_size, 0.12 * picture->width);
  x = from;
  for (guint i = 0; i < picture->strips->len; i++)
    if (leaves (nth (picture, i)))
      {
        used += picture->radius + nth (picture, i)->width;
        wanted += wanted_gap (picture, nth (picture, i));
      }
  share = MIN (1.0, MAX (0.0, to - from - used) / wanted);
  more = MAX (0.0, to - from - used - wanted) / (n_leaving (picture) + 0.5);
  picture->steam_from = picture->power_from = from;
  for (guint i = 0; i < picture->strips->len; i++)
    {
      HlStrip *strip = nth (picture, i);
      double gap = share * wanted_gap (picture, strip) + more;
      strip->x = strip->way == HL_STRIP_IN ? picture->left : x;
      if (!leaves (strip))
        continue;
      x += gap / 2.0;
      if (strip->kind == HL_BAND_SHAFT_LOSS || strip->kind == HL_BAND_OWN)
        {
          if (!is_power)
            picture->power_from = x - gap / 4.0;
          is_power = TRUE;
        }
      strip->x = x;
      x += picture->radius + strip->width + gap / 2.0;
      if (strip->kind == HL_BAND_FIRING_LOSS)
        picture->steam_from = x;
    }
  if (!is_power)
    picture->power_from = x;
  picture->loop_to = picture->steam_from + 1.5 * picture->loop_width + picture->radius + 1.0;
  picture->loop_from = MAX (x, picture->loop_to + 4.0 * picture->radius);
}

static void
set_edges (HlBandsPicture *picture, double tip_up, double tip_down)
{
  double bottom, top;
  for (guint i = 0; i < picture->strips->len; i++)
    {
      HlStrip *strip = nth (picture, i);
      hl_bands_picture_edges (picture, strip->x - 1e-6, &top, &bottom);
      strip->edge = strip->way == HL_STRIP_UP ? top : bottom;
      strip->tip = strip->way == HL_STRIP_UP ? tip_up : strip->way == HL_STRIP_DOWN ? tip_down : picture->right;
    }
  hl_bands_picture_edges (picture, picture->loop_from - 1e-6, &top, &bottom);
  picture->loop_edge = top;
}

/* --- labels --- */

static double
middle_of (const HlBandsPicture *picture, const HlStrip *strip)
{
  return strip->x + picture->radius + strip->width / 2.0;
}

/* How far a label may reach from its middle without meeting that of a neighbour on the same side. */
static double
reach_of (const HlBandsPicture *picture, guint n)
{
  const HlStrip *strip = nth (picture, n);
  double middle = middle_of (picture, strip), reach = MIN (middle - 2.0, picture->width - middle - 2.0);
  for (guint i = 0; i < picture->strips->len; i++)
    if (i != n && nth (picture, i)->way == strip->way)
      reach = MIN (reach, fabs (middle_of (picture, nth (picture, i)) - middle) / 2.0 - 1.5);
  return MAX (reach, 1.0);
}

static void
set_label (HlBandsPicture *picture, HlStrip *strip, double room)
{
  double width = natural_width (picture, strip);
  strip->size = picture->text_size * MIN (1.0, room / width * 0.98);
  strip->label.width = width * strip->size / picture->text_size;
  strip->label.height = 3.0 * LINE * strip->size;
}

static void
set_labels (HlBandsPicture *picture)
{
  double y = picture->top - 0.6 * picture->text_size, column = picture->steam_from - picture->left;
  guint n_in = 0;
  for (guint i = 0; i < picture->strips->len; i++)
    n_in += nth (picture, i)->way == HL_STRIP_IN;
  for (guint i = 0; i < picture->strips->len; i++)
    {
      HlStrip *strip = nth (picture, i);
      if (strip->way == HL_STRIP_UP || strip->way == HL_STRIP_DOWN)
        {
          set_label (picture, strip, 2.0 * reach_of (picture, i));
          strip->label.x = middle_of (picture, strip) - strip->label.width / 2.0;
          strip->label.y = strip->way == HL_STRIP_UP ? strip->tip - strip->label.height - 2.0 : strip->tip + 2.0;
        }
      else if (strip->way == HL_STRIP_END)
        {
          double top, bottom;
          hl_bands_picture_edges (picture, picture->right, &top, &bottom);
          set_label (picture, strip, picture->width - picture->right - 1.9 * picture->text_size);
          strip->align = -1;
          strip->label.x = picture->right + 1.6 * picture->text_size;
          strip->label.y = (top + bottom) / 2.0 - strip->label.height / 2.0;
        }
    }
  /* What comes in stands above the beginning of the main band, side by side. */
  for (guint i = 0, k = 0; i < picture->strips->len; i++)
    {
      HlStrip *strip = nth (picture, i);
      if (strip->way != HL_STRIP_IN)
        continue;
      set_label (picture, strip, column / n_in - 3.0);
      strip->align = -1;
      strip->label.x = picture->left + k++ * column / n_in;
      strip->label.y = y - strip->label.height;
    }
}

static void
lay_out (HlBandsPicture *picture)
{
  double size = picture->text_size, head = 3.9 * size, label = 3.0 * LINE * size;
  double column = MIN (8.5 * size, 0.2 * picture->width);     /* for the words of net power */
  double tip_up = head + label + 3.0, tip_down = picture->height - label - 6.0;
  picture->left = 1.3 * size;
  picture->right = picture->width - column - 1.9 * size;
  picture->radius = 0.55 * size;
  set_scale (picture, picture->right - picture->left - 7.0 * size - MIN (6.0 * size, 0.12 * picture->width));
  picture->top = MAX (tip_up + 2.4 * size + picture->loop_width, 0.30 * picture->height);
  set_places (picture, picture->left + 5.0 * size, picture->right - 1.5 * size - 2.0 * picture->loop_width);
  picture->loop_level = picture->top - picture->loop_width - 1.1 * size;
  set_edges (picture, tip_up, tip_down);
  set_labels (picture);
}

/* "exergy, widths to scale; counted from 15.0 °C and 1.013 bar" */
static char *
exergy_remark (const HlSolution *solution, HlUnitSet units)
{
  const HlSite *site = hl_plant_site (hl_solution_plant (solution));
  g_autofree char *T = hl_units_format (site->dead_T, HL_DIMENSION_TEMPERATURE, units), *p = hl_units_format (site->dead_p, HL_DIMENSION_PRESSURE, units);
  return g_strdup_printf (_("exergy, widths to scale; counted from %s and %s"), T, p);
}

HlBandsPicture *
hl_bands_picture_new (const HlSolution *solution, HlUnitSet units, double width, double height)
{
  return hl_bands_picture_new_of (solution, HL_BANDS_ENERGY, units, width, height);
}

void
hl_bands_picture_keep_clear (HlBandsPicture *picture, double right)
{
  picture->clear = right;
}

HlBandsPicture *
hl_bands_picture_new_of (const HlSolution *solution, HlBandsOf of, HlUnitSet units, double width, double height)
{
  HlBandsPicture *picture = g_new0 (HlBandsPicture, 1);
  const char *title = hl_plant_title (hl_solution_plant (solution));
  picture->width = MAX (width, 60.0);
  picture->height = MAX (height, 60.0);
  picture->text_size = 10.5 * CLAMP (sqrt (picture->width * picture->height / (960.0 * 600.0)), 0.85, 1.3);
  picture->of = of;
  picture->bands = of == HL_BANDS_EXERGY ? hl_bands_new_exergy (solution) : hl_bands_new (solution);
  picture->title = g_strdup (title != NULL && title[0] != '\0' ? title : of == HL_BANDS_EXERGY ? _("Exergy of the plant") : _("Energy of the plant"));
  picture->remark = of == HL_BANDS_EXERGY ? exergy_remark (solution, units) : g_strdup ("");
  picture->strips = g_array_new (FALSE, TRUE, sizeof (HlStrip));
  g_array_set_clear_func (picture->strips, clear_strip);
  if (!picture->bands->is_complete)
    return picture;
  add_strips (picture);
  /* In a small picture neighbours of a kind share a strip. */
  while (n_leaving (picture) * 9.0 * picture->text_size > picture->width && merge_smallest (picture));
  write_numbers (picture, units);
  if (hl_bands_sum (picture->bands, HL_BAND_PUMPS) > 0.0)
    {
      g_autofree char *pumps = hl_units_format (hl_bands_sum (picture->bands, HL_BAND_PUMPS), HL_DIMENSION_POWER, units);
      g_free (picture->remark);
      picture->remark = g_strdup_printf (_("energy, widths to scale; pumps give %s back to the water"), pumps);
    }
  lay_out (picture);
  return picture;
}

void
hl_bands_picture_free (HlBandsPicture *picture)
{
  if (picture == NULL)
    return;
  hl_bands_free (picture->bands);
  g_free (picture->title);
  g_free (picture->remark);
  g_array_unref (picture->strips);
  g_free (picture);
}
