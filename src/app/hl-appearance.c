/* Light or dark: loads the style sheet with the colours of draw/theme.c put in front.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-appearance.h"
#include "app/compat.h"

static struct {
  HlAppearance          look;
  gboolean        system_is_dark;
  GtkCssProvider *provider;
  GDBusProxy     *portal;
} current;

static const char *const look_ids[] = { "system", "light", "dark" };

HlAppearance
hl_appearance_from_id (const char *id)
{
  for (guint n = 0; n < G_N_ELEMENTS (look_ids); n++)
    if (g_strcmp0 (id, look_ids[n]) == 0)
      return (HlAppearance) n;
  return HL_APPEARANCE_SYSTEM;
}

const char *
hl_appearance_id (HlAppearance look)
{
  return look_ids[look];
}

HlAppearance
hl_appearance_get (void)
{
  return current.look;
}

static gboolean
is_dark (void)
{
  return current.look == HL_APPEARANCE_DARK || (current.look == HL_APPEARANCE_SYSTEM && current.system_is_dark);
}

const HlTheme *
hl_appearance_theme (void)
{
  return hl_theme (is_dark () ? HL_THEME_DARK : HL_THEME_LIGHT);
}

static void
define_colour (GString *css, const char *name, const HlColour *colour)
{
  char buffer[4][G_ASCII_DTOSTR_BUF_SIZE];
  g_ascii_formatd (buffer[0], sizeof buffer[0], "%.1f", 255.0 * colour->r);
  g_ascii_formatd (buffer[1], sizeof buffer[1], "%.1f", 255.0 * colour->g);
  g_ascii_formatd (buffer[2], sizeof buffer[2], "%.1f", 255.0 * colour->b);
  g_ascii_formatd (buffer[3], sizeof buffer[3], "%.3f", colour->a);
  g_string_append_printf (css, "@define-color hl_%s rgba(%s,%s,%s,%s);\n", name, buffer[0], buffer[1], buffer[2], buffer[3]);
}

static char *
colours_as_css (const HlTheme *theme)
{
  const struct { const char *name; const HlColour *colour; } rows[] = {
    { "ground", &theme->ground }, { "card", &theme->card }, { "ink", &theme->ink }, { "quiet", &theme->quiet },
    { "hairline", &theme->hairline }, { "grid", &theme->grid }, { "accent", &theme->accent }, { "selection", &theme->selection },
    { "given", &theme->given }, { "assumed", &theme->assumed }, { "tied", &theme->tied }, { "found", &theme->found },
    { "hint", &theme->hint }, { "caution", &theme->caution }, { "warning", &theme->warning }, { "error", &theme->error },
    { "good", &theme->good },
  };
  GString *css = g_string_new (NULL);
  for (guint n = 0; n < G_N_ELEMENTS (rows); n++)
    define_colour (css, rows[n].name, rows[n].colour);
  return g_string_free (css, FALSE);
}

static void
load (void)
{
  g_autofree char *colours = colours_as_css (hl_appearance_theme ());
  g_autofree char *css = NULL;
  g_autoptr (GBytes) sheet = g_resources_lookup_data ("/local/heatloom/Heatloom/style.css", 0, NULL);
  g_autoptr (GBytes) panes = g_resources_lookup_data ("/local/heatloom/Heatloom/style-panes.css", 0, NULL);
  gboolean was_dark;
  g_object_get (gtk_settings_get_default (), "gtk-application-prefer-dark-theme", &was_dark, NULL);
  if (was_dark != is_dark ())      /* setting it anew has GTK read its whole theme again */
    g_object_set (gtk_settings_get_default (), "gtk-application-prefer-dark-theme", is_dark (), NULL);
  g_return_if_fail (sheet != NULL && panes != NULL);
  css = g_strconcat (colours, (const char *) g_bytes_get_data (sheet, NULL), (const char *) g_bytes_get_data (panes, NULL), NULL);
  hl_compat_load_css (current.provider, css);
}

void
hl_appearance_set (HlAppearance look)
{
  gboolean was_dark = is_dark ();
  current.look = look;
  if (current.provider != NULL && is_dark () != was_dark)
    load ();
}

/* The desktop's wish reaches us through the settings portal, where there is one: 1 asks for dark. */
static void
take_portal_value (GVariant *value)
{
  g_autoptr (GVariant) inner = g_variant_ref (value);
  gboolean was_dark = is_dark ();
  while (g_variant_is_of_type (inner, G_VARIANT_TYPE_VARIANT))
    {
      GVariant *next = g_variant_get_variant (inner);
      g_variant_unref (inner);
      inner = next;
    }
  if (!g_variant_is_of_type (inner, G_VARIANT_TYPE_UINT32))
    return;
  current.system_is_dark = g_variant_get_uint32 (inner) == 1;
  if (is_dark () != was_dark)
    load ();
}

static void
portal_signal_cb (GDBusProxy *proxy, const char *sender, const char *name, GVariant *arguments, gpointer data)
{
  const char *space, *key;
  g_autoptr (GVariant) value = NULL;
  if (g_strcmp0 (name, "SettingChanged") != 0 || !g_variant_is_of_type (arguments, G_VARIANT_TYPE ("(ssv)")))
    return;
  g_variant_get (arguments, "(&s&s@v)", &space, &key, &value);
  if (g_str_equal (space, "org.freedesktop.appearance") && g_str_equal (key, "color-scheme"))
    take_portal_value (value);
}

static void
portal_read_cb (GObject *source, GAsyncResult *result, gpointer data)
{
  g_autoptr (GVariant) reply = g_dbus_proxy_call_finish (G_DBUS_PROXY (source), result, NULL);
  g_autoptr (GVariant) value = NULL;
  if (reply == NULL)
    return;
  value = g_variant_get_child_value (reply, 0);
  take_portal_value (value);
}

static void
portal_ready_cb (GObject *source, GAsyncResult *result, gpointer data)
{
  current.portal = g_dbus_proxy_new_for_bus_finish (result, NULL);
  if (current.portal == NULL)
    return;
  g_signal_connect (current.portal, "g-signal", G_CALLBACK (portal_signal_cb), NULL);
  g_dbus_proxy_call (current.portal, "Read", g_variant_new ("(ss)", "org.freedesktop.appearance", "color-scheme"),
                     G_DBUS_CALL_FLAGS_NO_AUTO_START, 1000, NULL, portal_read_cb, NULL);
}

void
hl_appearance_start (void)
{
  if (current.provider != NULL)
    return;
  g_object_get (gtk_settings_get_default (), "gtk-application-prefer-dark-theme", &current.system_is_dark, NULL);
  current.provider = gtk_css_provider_new ();
  gtk_style_context_add_provider_for_display (gdk_display_get_default (), GTK_STYLE_PROVIDER (current.provider),
                                              GTK_STYLE_PROVIDER_PRIORITY_APPLICATION);
  load ();
  g_dbus_proxy_new_for_bus (G_BUS_TYPE_SESSION, G_DBUS_PROXY_FLAGS_DO_NOT_LOAD_PROPERTIES | G_DBUS_PROXY_FLAGS_DO_NOT_AUTO_START,
                            NULL, "org.freedesktop.portal.Desktop", "/org/freedesktop/portal/desktop",
                            "org.freedesktop.portal.Settings", NULL, portal_ready_cb, NULL);
}
