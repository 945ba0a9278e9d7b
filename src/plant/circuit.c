/* Circuits: streams that share their medium, joined through the components they pass; the two sides of an exchanger are two.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/circuit.h"
#include "plant/i18n.h"
#include "plant/plant-private.h"
#include <string.h>

static const HlFormulation formulations[] = {
  { "if97", N_("IAPWS-IF97") },
  { "iapws95", N_("IAPWS-95") },
};

/* "inlet#" in the table stands for "inlet1", "inlet2" ... */
int
hl_kind_side_of_port (const HlKind *kind, const char *port)
{
  g_return_val_if_fail (kind != NULL && port != NULL, 0);
  for (guint k = 0; k < kind->n_ports; k++)
    {
      const char *name = kind->ports[k].key;
      gsize length = strcspn (name, "#");
      if (strncmp (name, port, length) == 0 && (name[length] == '#' ? g_ascii_isdigit (port[length]) : port[length] == '\0'))
        return kind->ports[k].side_circuit;
    }
  return 0;
}

static int
find (int *circuits, int stream)
{
  while (circuits[stream] != stream)
    stream = circuits[stream] = circuits[circuits[stream]];
  return stream;
}

static void
join (int *circuits, int a, int b)
{
  a = find (circuits, a);
  b = find (circuits, b);
  circuits[MAX (a, b)] = MIN (a, b);
}

/* Calls for every pair of a line and the first one met on its side of the component. */
static void
join_through (const HlPlant *plant, const HlComponent *component, int *circuits)
{
  int first[8];
  for (guint side = 0; side < G_N_ELEMENTS (first); side++)
    first[side] = -1;
  for (guint k = 0; k < hl_component_n_ports (component); k++)
    {
      HlPort port = hl_component_port (component, k);
      const HlStream *stream = hl_plant_stream_at (plant, component->id, port.key);
      int side = port.kind->side_circuit;
      if (stream == NULL || side < 0 || side >= (int) G_N_ELEMENTS (first))
        continue;
      int index = hl_plant_stream_index (plant, stream->id);
      if (first[side] < 0)
        first[side] = index;
      else
        join (circuits, first[side], index);
    }
}

int *
hl_plant_circuits (const HlPlant *plant)
{
  g_return_val_if_fail (plant != NULL, NULL);
  guint n = hl_plant_n_streams (plant);
  int *circuits = g_new (int, n + 1);
  for (guint i = 0; i < n; i++)
    circuits[i] = (int) i;
  for (guint c = 0; c < hl_plant_n_components (plant); c++)
    join_through (plant, hl_plant_component (plant, c), circuits);
  for (guint i = 0; i < n; i++)
    circuits[i] = find (circuits, (int) i);
  return circuits;
}

const char *
hl_plant_port_medium (const HlPlant *plant, const char *component_id, const char *port)
{
  g_return_val_if_fail (plant != NULL && component_id != NULL && port != NULL, NULL);
  const HlComponent *component = hl_plant_find_component (plant, component_id);
  if (component == NULL)
    return NULL;
  int side = hl_kind_side_of_port (component->kind, port);
  for (guint k = 0; k < hl_component_n_ports (component); k++)
    {
      HlPort other = hl_component_port (component, k);
      const HlStream *stream = other.kind->side_circuit == side ? hl_plant_stream_at (plant, component->id, other.key) : NULL;
      if (stream != NULL)
        return stream->medium;
    }
  return NULL;
}

/* What a port is made for, where no line says it. */
static const char *
medium_of_kind (const HlPlant *plant, const char *component_id, const char *port)
{
  const HlComponent *component = hl_plant_find_component (plant, component_id);
  guint n;
  if (component == NULL || !hl_component_find_port (component, port, &n))
    return NULL;
  return hl_component_port (component, n).kind->medium;
}

const char *
hl_plant_line_medium (const HlPlant *plant, const char *from_id, const char *from_port, const char *to_id, const char *to_port)
{
  const char *medium = hl_plant_port_medium (plant, from_id, from_port);
  if (medium == NULL)
    medium = hl_plant_port_medium (plant, to_id, to_port);
  if (medium == NULL)
    medium = medium_of_kind (plant, from_id, from_port);
  if (medium == NULL)
    medium = medium_of_kind (plant, to_id, to_port);
  return medium != NULL ? g_intern_string (medium) : g_intern_static_string ("water");
}

HlPlant *
hl_plant_with_medium (const HlPlant *plant, const char *stream_id, const char *medium, GError **error)
{
  g_return_val_if_fail (plant != NULL && stream_id != NULL && medium != NULL, NULL);
  int at = hl_plant_stream_index (plant, stream_id);
  if (at < 0)
    {
      g_set_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_ADDRESS, _("there is no stream “%s”"), stream_id);
      return NULL;
    }
  if (hl_fluid_lookup (medium) == NULL)
    {
      g_set_error (error, HL_PLANT_ERROR, HL_PLANT_ERROR_CONTENT, _("there is no medium “%s”; heatloom-batch fluids lists them"), medium);
      return NULL;
    }
  g_autofree int *circuits = hl_plant_circuits (plant);
  HlPlant *edited = hl_plant_share (plant);
  hl_plant_own_streams (edited);
  for (guint i = 0; i < edited->streams->len; i++)
    {
      HlStream *stream = edited->streams->pdata[i];
      if (circuits[i] != circuits[at] || stream->medium == g_intern_string (medium))
        continue;
      HlStream *changed = hl_stream_copy (stream);
      changed->medium = g_intern_string (medium);
      edited->streams->pdata[i] = changed;
      hl_stream_unref (stream);
    }
  return edited;
}

const HlFluid *
hl_plant_fluid (const HlPlant *plant, const char *medium)
{
  g_return_val_if_fail (plant != NULL && medium != NULL, NULL);
  if (g_str_equal (medium, "water"))
    return g_str_equal (plant->formulation, "iapws95") ? hl_fluid_lookup ("water-95") : hl_fluid_water ();
  return hl_fluid_lookup (medium);
}

const HlFormulation *
hl_formulations (guint *n)
{
  *n = G_N_ELEMENTS (formulations);
  return formulations;
}

const char *
hl_plant_formulation_name (const HlPlant *plant)
{
  g_return_val_if_fail (plant != NULL, NULL);
  for (guint i = 0; i < G_N_ELEMENTS (formulations); i++)
    if (g_str_equal (formulations[i].id, plant->formulation))
      return _(formulations[i].name);
  return plant->formulation;
}

HlPlant *
hl_plant_with_formulation (const HlPlant *plant, const char *formulation)
{
  g_return_val_if_fail (plant != NULL && formulation != NULL, NULL);
  HlPlant *edited = hl_plant_share (plant);
  edited->formulation = g_intern_string (formulation);
  return edited;
}
