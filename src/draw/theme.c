/* The three themes, and the pens of the media.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/theme.h"
#include "plant/i18n.h"

#define RGB(hex) { ((hex) >> 16 & 0xff) / 255.0, ((hex) >> 8 & 0xff) / 255.0, ((hex) & 0xff) / 255.0, 1.0 }

/* Media colours are, or lie near, those of the colour-blind-safe set of Okabe and Ito (2008): vermillion, orange, blue,
 * sky blue; darkened on light grounds and lightened on dark ones until thin lines and small text keep their contrast. */
static const HlTheme themes[HL_N_THEMES] = {
  [HL_THEME_LIGHT] = {
    .ground = RGB (0xfdfdfb), .card = RGB (0xffffff), .ink = RGB (0x23282d), .quiet = RGB (0x666c73),
    .hairline = RGB (0xd9d6cd), .grid = RGB (0xdedcd4), .accent = RGB (0x00626b), .selection = RGB (0xc4e2e3),
    .steam = RGB (0xc8500a), .wet = RGB (0xd9920a), .water = RGB (0x0a66a8), .cooling = RGB (0x4aa3d8),
    .gas = RGB (0x7b8188), .shaft = RGB (0x7b8188), .stale = RGB (0xb5b3ad),
    .given = RGB (0x23282d), .assumed = RGB (0x86681a), .tied = RGB (0x00626b), .found = RGB (0x0a66a8),
    .hint = RGB (0x3a7fae), .caution = RGB (0xd9920a), .warning = RGB (0xc8500a), .error = RGB (0xb3261e), .good = RGB (0x2e8b57),
    .dome_fill = RGB (0xe9f2f5), .dome_line = RGB (0x3b4147),
    .font = "Inter, Cantarell, DejaVu Sans, Sans",
  },
  [HL_THEME_DARK] = {
    .ground = RGB (0x1f2428), .card = RGB (0x2a3036), .ink = RGB (0xeef0f1), .quiet = RGB (0xa2a9b0),
    .hairline = RGB (0x434a51), .grid = RGB (0x363c42), .accent = RGB (0x4fb8c0), .selection = RGB (0x24474c),
    .steam = RGB (0xf0813f), .wet = RGB (0xf0b73f), .water = RGB (0x5aaeea), .cooling = RGB (0x9ad4f6),
    .gas = RGB (0x9aa1a8), .shaft = RGB (0x9aa1a8), .stale = RGB (0x60676e),
    .given = RGB (0xeef0f1), .assumed = RGB (0xdcbb5c), .tied = RGB (0x4fb8c0), .found = RGB (0x74bcf0),
    .hint = RGB (0x7cb8e0), .caution = RGB (0xf0b73f), .warning = RGB (0xf0813f), .error = RGB (0xf2736b), .good = RGB (0x5fc98d),
    .dome_fill = RGB (0x283840), .dome_line = RGB (0xdfe3e6),
    .font = "Inter, Cantarell, DejaVu Sans, Sans",
  },
  [HL_THEME_PAPER] = {
    .ground = RGB (0xffffff), .card = RGB (0xffffff), .ink = RGB (0x1b1f23), .quiet = RGB (0x575d63),
    .hairline = RGB (0xcfccc4), .grid = RGB (0xe6e4de), .accent = RGB (0x00626b), .selection = RGB (0xc4e2e3),
    .steam = RGB (0xc04a06), .wet = RGB (0xcf8a06), .water = RGB (0x0a5f9e), .cooling = RGB (0x3f97cc),
    .gas = RGB (0x70767c), .shaft = RGB (0x70767c), .stale = RGB (0xb0aea8),
    .given = RGB (0x1b1f23), .assumed = RGB (0x7d6118), .tied = RGB (0x00626b), .found = RGB (0x0a5f9e),
    .hint = RGB (0x3a7fae), .caution = RGB (0xcf8a06), .warning = RGB (0xc04a06), .error = RGB (0xb3261e), .good = RGB (0x2e8b57),
    .dome_fill = RGB (0xedf4f7), .dome_line = RGB (0x33393e),
    .font = "DejaVu Sans",
  },
};

const HlTheme *
hl_theme (HlThemeId id)
{
  g_return_val_if_fail (id < HL_N_THEMES, &themes[HL_THEME_LIGHT]);
  return &themes[id];
}

void
hl_set_colour (cairo_t *cr, const HlColour *colour)
{
  cairo_set_source_rgba (cr, colour->r, colour->g, colour->b, colour->a);
}

/* The pens: colour by place in HlTheme, weight and dash as the second cue. */
static const struct {
  gsize       colour;
  double      width;
  double      dash[2];       /* 0: solid */
  const char *name;
} pens[HL_N_LOOKS] = {
  [HL_LOOK_UNKNOWN] = { G_STRUCT_OFFSET (HlTheme, quiet),   1.6, { 0, 0 },      N_("state not known") },
  [HL_LOOK_STEAM]   = { G_STRUCT_OFFSET (HlTheme, steam),   2.8, { 0, 0 },      N_("steam") },
  [HL_LOOK_WET]     = { G_STRUCT_OFFSET (HlTheme, wet),     2.8, { 14.0, 2.5 }, N_("wet steam") },
  [HL_LOOK_WATER]   = { G_STRUCT_OFFSET (HlTheme, water),   2.0, { 0, 0 },      N_("water, condensate") },
  [HL_LOOK_COOLING] = { G_STRUCT_OFFSET (HlTheme, cooling), 1.4, { 0, 0 },      N_("cooling water") },
  [HL_LOOK_GAS]     = { G_STRUCT_OFFSET (HlTheme, gas),     2.0, { 7.0, 4.0 },  N_("gas") },
};

const char *
hl_look_name (HlLook look)
{
  g_return_val_if_fail (look < HL_N_LOOKS, "");
  return _(pens[look].name);
}

const HlColour *
hl_look_colour (const HlTheme *theme, HlLook look, gboolean is_stale)
{
  g_return_val_if_fail (look < HL_N_LOOKS, &theme->ink);
  return is_stale ? &theme->stale : &G_STRUCT_MEMBER (HlColour, theme, pens[look].colour);
}

void
hl_set_look_pen (cairo_t *cr, const HlTheme *theme, HlLook look, gboolean is_stale)
{
  g_return_if_fail (look < HL_N_LOOKS);
  hl_set_colour (cr, hl_look_colour (theme, look, is_stale));
  cairo_set_line_width (cr, pens[look].width);
  cairo_set_dash (cr, pens[look].dash, pens[look].dash[0] > 0.0 ? 2 : 0, 0.0);
  cairo_set_line_join (cr, CAIRO_LINE_JOIN_MITER);
  cairo_set_line_cap (cr, CAIRO_LINE_CAP_BUTT);
}

void
hl_set_stream_pen (cairo_t *cr, const HlTheme *theme, const HlStreamResult *result, gboolean is_stale)
{
  hl_set_look_pen (cr, theme, hl_stream_look (result), is_stale);
}

const HlColour *
hl_stream_colour (const HlTheme *theme, const HlStreamResult *result, gboolean is_stale)
{
  return hl_look_colour (theme, hl_stream_look (result), is_stale);
}
