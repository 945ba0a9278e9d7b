/* What the nameplate shows of a component, a stream, the plant, or several things at once.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-medium-row.h"
#include "app/hl-nameplate-private.h"
#include "app/hl-pane.h"
#include "app/hl-shared-row.h"
#include "plant/i18n.h"

#include <math.h>

/* Moisture of a turbine's exhaust: caution above 10 % (practitioners' texts), warning above 12 % (common practice, no source). */
#define MOISTURE_CAUTION 0.10
#define MOISTURE_WARNING 0.12

void
hl_nameplate_put_quantity (HlNameplateBody *body, HlSession *session, const char *heading, const HlAddress *address, const char *name)
{
  g_autofree char *key = hl_address_to_text (address);
  GtkWidget *row = hl_nameplate_body_find (body, key);

  if (row == NULL)
    row = hl_quantity_row_new (session, address, name);
  else
    hl_quantity_row_update (HL_QUANTITY_ROW (row));
  hl_nameplate_body_put (body, heading, key, row);
}

char *
hl_nameplate_stream_text (HlSession *session, const HlStream *stream)
{
  HlUnitSet units = hl_pane_units (session);
  GString *text = g_string_new (NULL);
  HlStreamResult result;

  hl_solution_stream (hl_session_solution (session),
                      (guint) hl_plant_stream_index (hl_session_plant (session), stream->id), &result);
  if (result.has_flow)
    {
      g_autofree char *m = hl_units_format (result.m, HL_DIMENSION_MASS_FLOW, units);
      g_string_append (text, m);
    }
  if (result.has_state)
    {
      gboolean is_wet = result.state.phase == HL_PHASE_TWO_PHASE;
      g_autofree char *p = hl_units_format (result.state.p, HL_DIMENSION_PRESSURE, units);
      g_autofree char *second = is_wet ? hl_units_format_number (result.state.x, HL_DIMENSION_RATIO, units)
                                       : hl_units_format (result.state.T, HL_DIMENSION_TEMPERATURE, units);
      g_string_append_printf (text, "%s%s · %s%s", text->len > 0 ? " · " : "", p, is_wet ? "x " : "", second);
    }
  return g_string_free (text, FALSE);
}

/* --- a component --- */

static void
put_options (HlNameplateBody *body, HlSession *session, const HlComponent *component)
{
  for (guint n = 0; n < component->kind->n_options; n++)
    {
      const HlOptionKind *option = &component->kind->options[n];
      g_autofree char *key = g_strdup_printf ("option %s", option->key);
      GtkWidget *row = hl_nameplate_body_find (body, key);
      if (row == NULL)
        row = hl_option_row_new (session, component->id, option);
      else
        hl_option_row_update (row);
      hl_nameplate_body_put (body, _("Arrangement"), key, row);
    }
}

/* A result that is read from the solution is shown where it has a value. */
static gboolean
is_absent (HlSession *session, const HlQuantityKind *kind, const HlAddress *address)
{
  double si;
  return (kind->flags & HL_QUANTITY_DERIVED) && !hl_solution_value (hl_session_solution (session), address, &si);
}

/* Groups in the order in which the kind first names them. */
static void
put_quantities (HlNameplateBody *body, HlSession *session, const HlComponent *component)
{
  guint n_quantities = hl_component_n_quantities (component);
  g_autoptr (GPtrArray) groups = g_ptr_array_new ();

  for (guint n = 0; n < n_quantities; n++)
    {
      const char *group = hl_component_quantity (component, n).kind->group;
      if (!g_ptr_array_find_with_equal_func (groups, group, g_str_equal, NULL))
        g_ptr_array_add (groups, (gpointer) group);
    }
  for (guint g = 0; g < groups->len; g++)
    for (guint n = 0; n < n_quantities; n++)
      {
        HlQuantity quantity = hl_component_quantity (component, n);
        const char *group = g_ptr_array_index (groups, g);
        if (!g_str_equal (quantity.kind->group, group))
          continue;
        HlAddress address = hl_address_component (component->id, quantity.key);
        g_autofree char *name = hl_component_quantity_name (component, n);
        if (is_absent (session, quantity.kind, &address))
          continue;
        hl_nameplate_put_quantity (body, session, _(group), &address, name);
      }
}

static void
put_limits (HlNameplateBody *body, HlSession *session, const HlComponent *component)
{
  HlAddress address = hl_address_component (component->id, g_intern_static_string ("exhaust_moisture"));
  double moisture;

  if (hl_component_quantity_kind (component, address.key) == NULL
      || !hl_solution_value (hl_session_solution (session), &address, &moisture) || !(moisture > 0.0))
    return;
  GtkWidget *row = hl_nameplate_body_find (body, "limit moisture");
  if (row == NULL)
    row = hl_limit_row_new ();
  hl_limit_row_set (row, _("Exhaust moisture"), moisture, MOISTURE_CAUTION, MOISTURE_WARNING);
  hl_nameplate_body_put (body, _("Limits"), "limit moisture", row);
}

static void
put_connections (HlNameplateBody *body, HlSession *session, const HlComponent *component)
{
  const HlPlant *plant = hl_session_plant (session);
  guint n_ports = hl_component_n_ports (component);

  for (guint n = 0; n < n_ports; n++)
    {
      HlPort port = hl_component_port (component, n);
      const HlStream *stream = hl_plant_stream_at (plant, component->id, port.key);
      g_autofree char *key = g_strdup_printf ("port %s", port.key);
      g_autofree char *port_name = hl_component_port_name (component, n);
      g_autofree char *name = NULL, *text = NULL;
      GtkWidget *row = hl_nameplate_body_find (body, key);

      if (row == NULL)
        row = hl_link_row_new (session, TRUE);
      if (stream != NULL)
        {
          name = g_strdup_printf ("%s   %s", stream->id, port_name);
          text = hl_nameplate_stream_text (session, stream);
        }
      else
        {
          name = g_strdup (port_name);
          text = g_strdup (port.kind->is_optional ? _("not used") : _("not connected"));
        }
      hl_link_row_set (row, name, text, stream != NULL ? stream->id : NULL);
      hl_nameplate_body_put (body, _("Streams"), key, row);
    }
}

/* --- media --- */

static void
put_medium (HlNameplateBody *body, HlSession *session, const char *key, const char *name, const char *stream)
{
  GtkWidget *row = hl_nameplate_body_find (body, key);

  if (row == NULL)
    row = hl_medium_row_new (session);
  hl_medium_row_set (row, name, stream);
  hl_nameplate_body_put (body, _("Medium"), key, row);
}

/* One row for each side of the component that a line reaches. */
static void
put_media (HlNameplateBody *body, HlSession *session, const HlComponent *component)
{
  const HlPlant *plant = hl_session_plant (session);
  const HlStream *of_side[8] = { NULL };
  guint n_sides = 0;

  for (guint n = 0; n < hl_component_n_ports (component); n++)
    {
      HlPort port = hl_component_port (component, n);
      const HlStream *stream = hl_plant_stream_at (plant, component->id, port.key);
      int side = port.kind->side_circuit;
      if (stream == NULL || side < 0 || side >= (int) G_N_ELEMENTS (of_side) || of_side[side] != NULL)
        continue;
      of_side[side] = stream;
      n_sides++;
    }
  for (guint side = 0; side < G_N_ELEMENTS (of_side); side++)
    {
      if (of_side[side] == NULL)
        continue;
      g_autofree char *key = g_strdup_printf ("medium %u", side);
      g_autofree char *name = n_sides > 1 ? g_strdup_printf (_("Medium at stream %s"), of_side[side]->id) : g_strdup (_("Medium"));
      put_medium (body, session, key, name, of_side[side]->id);
    }
}

void
hl_nameplate_fill_component (HlNameplateBody *body, HlSession *session, const HlComponent *component)
{
  put_options (body, session, component);
  put_quantities (body, session, component);
  put_media (body, session, component);
  put_limits (body, session, component);
  put_connections (body, session, component);
}

/* --- a stream --- */

void
hl_nameplate_fill_stream (HlNameplateBody *body, HlSession *session, const HlStream *stream)
{
  const HlPlant *plant = hl_session_plant (session);
  const char *ends[] = { stream->from_id, stream->to_id };
  const char *ports[] = { stream->from_port, stream->to_port };
  guint n_quantities;
  const HlQuantityKind *quantities = hl_stream_quantities (&n_quantities);

  for (guint n = 0; n < n_quantities; n++)
    {
      HlAddress address = hl_address_stream (stream->id, quantities[n].key);
      const char *group = quantities[n].group;
      if (is_absent (session, &quantities[n], &address))
        continue;
      hl_nameplate_put_quantity (body, session, group != NULL ? _(group) : _("State"), &address, _(quantities[n].name));
    }
  put_medium (body, session, "medium", _("Medium"), stream->id);
  for (guint n = 0; n < G_N_ELEMENTS (ends); n++)
    {
      const HlComponent *component = hl_plant_find_component (plant, ends[n]);
      g_autofree char *key = g_strdup_printf ("end %u", n), *port_name = NULL, *name = NULL;
      GtkWidget *row = hl_nameplate_body_find (body, key);
      guint port;

      if (component == NULL || !hl_component_find_port (component, ports[n], &port))
        continue;
      if (row == NULL)
        row = hl_link_row_new (session, FALSE);
      port_name = hl_component_port_name (component, port);
      name = g_strdup_printf (n == 0 ? _("from %s") : _("to %s"), component->id);
      hl_link_row_set (row, name, port_name, component->id);
      hl_nameplate_body_put (body, _("Way"), key, row);
    }
}

/* --- the plant --- */

/* Shown: what has a value or is usually given; all of them where the plant has no solution yet. */
static gboolean
plant_quantity_is_shown (HlSession *session, const HlQuantityKind *kind)
{
  HlAddress address = hl_address_plant (kind->key);
  double si;

  return hl_plant_value (hl_session_plant (session), &address) != NULL || kind->flags & HL_QUANTITY_USUAL
         || hl_solution_value (hl_session_solution (session), &address, &si);
}

void
hl_nameplate_fill_plant (HlNameplateBody *body, HlSession *session)
{
  guint n_quantities;
  const HlQuantityKind *quantities = hl_plant_quantities (&n_quantities);
  GtkWidget *row = hl_nameplate_body_find (body, "units");

  for (guint n = 0; n < n_quantities; n++)
    {
      HlAddress address = hl_address_plant (quantities[n].key);
      const char *group = quantities[n].group;
      if (plant_quantity_is_shown (session, &quantities[n]))
        hl_nameplate_put_quantity (body, session, group != NULL ? _(group) : _("Plant"), &address, _(quantities[n].name));
    }
  if (row == NULL)
    row = hl_units_row_new (session);
  else
    hl_units_row_update (row);
  hl_nameplate_body_put (body, _("Sheet"), "units", row);
  row = hl_nameplate_body_find (body, "formulation");
  if (row == NULL)
    row = hl_formulation_row_new (session);
  else
    hl_formulation_row_update (row);
  hl_nameplate_body_put (body, _("Sheet"), "formulation", row);
  for (HlSiteNumber which = 0; which < HL_N_SITE_NUMBERS; which++)
    {
      g_autofree char *key = g_strdup_printf ("site %u", which);
      row = hl_nameplate_body_find (body, key);
      if (row == NULL)
        row = hl_site_row_new (session, which);
      else
        hl_site_row_update (row);
      hl_nameplate_body_put (body, _("Site"), key, row);
    }
}

/* --- several --- */

static gboolean
have_quantity (const HlPlant *plant, const char *const *ids, guint n_ids, const HlQuantityKind *kind, const char *key)
{
  for (guint n = 0; n < n_ids; n++)
    {
      HlAddress address = hl_address_component (ids[n], key);
      const HlQuantityKind *its = hl_plant_quantity_kind (plant, &address);
      if (its == NULL || its->dimension != kind->dimension)
        return FALSE;
    }
  return TRUE;
}

/* What all the components have in common, in the order of the first one; streams that are selected with them do not matter. */
static void
put_shared (HlNameplateBody *body, HlSession *session, const char *const *ids, guint n_ids)
{
  const HlPlant *plant = hl_session_plant (session);
  g_autofree const char **components = g_new (const char *, n_ids);
  guint n_components = 0;

  for (guint n = 0; n < n_ids; n++)
    if (hl_plant_find_component (plant, ids[n]) != NULL)
      components[n_components++] = ids[n];
  const HlComponent *first = n_components > 1 ? hl_plant_find_component (plant, components[0]) : NULL;
  for (guint n = 0; first != NULL && n < hl_component_n_quantities (first); n++)
    {
      HlQuantity quantity = hl_component_quantity (first, n);
      g_autofree char *key = g_strdup_printf ("shared %s", quantity.key), *name = hl_component_quantity_name (first, n);
      GtkWidget *row = hl_nameplate_body_find (body, key);
      if (quantity.kind->flags & HL_QUANTITY_DERIVED)
        continue;
      if (!have_quantity (plant, components, n_components, quantity.kind, quantity.key))
        continue;
      if (row == NULL)
        row = hl_shared_row_new (session, quantity.key, name);
      else
        hl_shared_row_update (HL_SHARED_ROW (row));
      hl_nameplate_body_put (body, _("For all of them"), key, row);
    }
}

void
hl_nameplate_fill_many (HlNameplateBody *body, HlSession *session)
{
  const HlPlant *plant = hl_session_plant (session);
  guint n_selected;
  const char *const *ids = hl_session_selection (session, &n_selected);

  put_shared (body, session, ids, n_selected);
  for (guint n = 0; n < n_selected; n++)
    {
      const HlComponent *component = hl_plant_find_component (plant, ids[n]);
      const HlStream *stream = hl_plant_find_stream (plant, ids[n]);
      g_autofree char *key = g_strdup_printf ("link %s", ids[n]), *text = NULL;
      GtkWidget *row = hl_nameplate_body_find (body, key);

      if (component == NULL && stream == NULL)
        continue;
      if (row == NULL)
        row = hl_link_row_new (session, FALSE);
      if (stream != NULL)
        text = hl_nameplate_stream_text (session, stream);
      else
        text = g_strdup (component->name != NULL && *component->name != '\0' ? component->name : _(component->kind->name));
      hl_link_row_set (row, ids[n], text, ids[n]);
      hl_nameplate_body_put (body, stream != NULL ? _("Streams") : _("Components"), key, row);
    }
}
