/* A plant turned into unknowns and equations, and the way back from an address to its unknown.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/model.h"
#include "engine/components/components.h"
#include "plant/circuit.h"
#include "engine/heads.h"
#include "engine/shafts.h"
#include "plant/i18n.h"
#include <math.h>
#include <string.h>

#define N_COMPONENTS(model) ((int) hl_plant_n_components ((model)->plant))

void
hl_model_free (HlModel *model)
{
  if (model == NULL)
    return;
  hl_system_free (model->system);
  g_array_unref (model->nodes);
  g_array_unref (model->ports);
  g_array_unref (model->own);
  g_array_unref (model->open_ports);
  g_array_unref (model->broken_ties);
  for (int k = 0; k < HL_N_SUMS; k++)
    {
      g_array_unref (model->sums[k]);
      g_array_unref (model->sums_of[k]);
    }
  g_array_unref (model->forms);
  g_atomic_rc_box_release (model->first_port);
  g_atomic_rc_box_release (model->first_own);
  g_atomic_rc_box_release (model->is_on_shaft);
  hl_plant_unref (model->plant);
  g_free (model);
}

/* --- nodes ------------------------------------------------------------------ */

static HlAddress
state_address (const HlModel *model, const HlNode *node, const char *letter)
{
  if (node->stream >= 0)
    return (HlAddress) { HL_OWNER_STREAM, hl_plant_stream (model->plant, (guint) node->stream)->id, letter };
  char key[128];
  g_snprintf (key, sizeof key, "%s.%s", node->port, letter);
  return (HlAddress) { HL_OWNER_COMPONENT, hl_plant_component (model->plant, (guint) node->component)->id, g_intern_string (key) };
}

/* Side streams carry a part of the main flow, cooling water much more: near enough to begin with. */
static double
part_of_flow (const HlNode *node)
{
  static const struct { const char *port; double part; } rows[] = {
    { "extraction", 0.06 }, { "drain", 0.06 }, { "spray", 0.02 }, { "cooling_", 40.0 }, { "water_", 20.0 },
  };
  for (guint k = 0; k < G_N_ELEMENTS (rows); k++)
    {
      gsize length = strlen (rows[k].port);
      if (strncmp (node->port, rows[k].port, length) == 0 || (node->to_port != NULL && strncmp (node->to_port, rows[k].port, length) == 0))
        return rows[k].part;
    }
  return NAN;
}

static void
add_node (HlModel *model, HlNode node)
{
  node.T = node.s = node.x = node.v = node.subcooling = -1;
  node.m = hl_system_add_var (model->system, HL_VAR_FLOW, state_address (model, &node, "m"), part_of_flow (&node));
  node.p = hl_system_add_var (model->system, HL_VAR_PRESSURE, state_address (model, &node, "p"), NAN);
  node.h = hl_system_add_var (model->system, HL_VAR_ENTHALPY, state_address (model, &node, "h"), NAN);
  hl_system_var (model->system, node.p)->scale = hl_system_var (model->system, node.h)->scale = hl_fluid_scale (node.fluid);
  g_array_append_val (model->nodes, node);
}

/* Streams' nodes, then for each component the list of its connected ports. */
static void
add_streams (HlModel *model)
{
  guint n_streams = hl_plant_n_streams (model->plant);
  int n = N_COMPONENTS (model);
  g_autofree int *ends = g_new (int, 2 * n_streams + 1);
  g_autofree int *count = g_new0 (int, n + 1);
  g_autoptr (GHashTable) index = g_hash_table_new (g_direct_hash, g_direct_equal);
  for (int c = 0; c < n; c++)
    g_hash_table_insert (index, (gpointer) hl_plant_component (model->plant, (guint) c)->id, GINT_TO_POINTER (c + 1));
  for (guint i = 0; i < n_streams; i++)
    {
      const HlStream *stream = hl_plant_stream (model->plant, i);
      HlNode node = { .stream = (int) i, .port = stream->from_port, .to_port = stream->to_port };
      node.component = ends[2 * i] = GPOINTER_TO_INT (g_hash_table_lookup (index, stream->from_id)) - 1;
      node.to_component = ends[2 * i + 1] = GPOINTER_TO_INT (g_hash_table_lookup (index, stream->to_id)) - 1;
      node.fluid = hl_plant_fluid (model->plant, stream->medium);
      if (node.fluid == NULL)
        node.fluid = model->water;
      add_node (model, node);
      for (int end = 0; end < 2; end++)
        if (ends[2 * i + end] >= 0)
          count[ends[2 * i + end]]++;
    }
  model->first_port = g_atomic_rc_box_alloc0 (sizeof (int) * (gsize) (n + 1));
  for (int c = 0; c < n; c++)
    model->first_port[c + 1] = model->first_port[c] + count[c];
  g_array_set_size (model->ports, (guint) model->first_port[n]);
  memset (count, 0, sizeof (int) * (gsize) n);
  for (guint i = 0; i < n_streams; i++)
    for (int end = 0; end < 2; end++)
      {
        const HlNode *node = hl_model_node (model, (int) i);
        int c = ends[2 * i + end];
        if (c < 0)
          continue;
        g_array_index (model->ports, HlPortNode, model->first_port[c] + count[c]++) =
          (HlPortNode) { end == 0 ? node->port : node->to_port, (int) i, end == 0 };
      }
}

/* Keys are short and few at each component: comparing them is quicker than looking their atoms up. */
static gboolean
same (const char *a, const char *b)
{
  return a == b || strcmp (a, b) == 0;
}

int
hl_model_port_node (const HlModel *model, int component, const char *port)
{
  for (int k = model->first_port[component]; k < model->first_port[component + 1]; k++)
    if (same (g_array_index (model->ports, HlPortNode, k).key, port))
      return g_array_index (model->ports, HlPortNode, k).node;
  for (guint k = hl_plant_n_streams (model->plant); k < model->nodes->len; k++)
    {
      const HlNode *node = hl_model_node (model, (int) k);
      if (node->component == component && same (node->port, port))
        return (int) k;
    }
  return -1;
}

int
hl_model_own_var (const HlModel *model, int component, const char *key)
{
  int place = component < 0 ? N_COMPONENTS (model) : component;
  for (int k = model->first_own[place]; k < model->first_own[place + 1]; k++)
    if (same (g_array_index (model->own, HlOwn, k).key, key))
      return g_array_index (model->own, HlOwn, k).var;
  return -1;
}

gboolean
hl_model_find_state (const HlModel *model, const HlAddress *address, int *node, char *letter)
{
  const char *dot;
  if (address->owner == HL_OWNER_PLANT || address->key == NULL)
    return FALSE;
  if (address->owner == HL_OWNER_STREAM)
    {
      *node = hl_plant_stream_index (model->plant, address->id);
      *letter = address->key[0];
      return *node >= 0 && address->key[0] != '\0' && address->key[1] == '\0';
    }
  if ((dot = strchr (address->key, '.')) == NULL || dot[1] == '\0' || dot[2] != '\0')
    return FALSE;
  int component = hl_plant_component_index (model->plant, address->id);
  if (component < 0)
    return FALSE;
  gsize length = (gsize) (dot - address->key);
  *letter = dot[1];
  for (int k = model->first_port[component]; k < model->first_port[component + 1]; k++)
    {
      const HlPortNode *port = &g_array_index (model->ports, HlPortNode, k);
      if (strncmp (port->key, address->key, length) == 0 && port->key[length] == '\0')
        {
          *node = port->node;
          return TRUE;
        }
    }
  for (guint k = hl_plant_n_streams (model->plant); k < model->nodes->len; k++)
    {
      const HlNode *open = hl_model_node (model, (int) k);
      if (open->component == component && strncmp (open->port, address->key, length) == 0 && open->port[length] == '\0')
        {
          *node = (int) k;
          return TRUE;
        }
    }
  return FALSE;
}

static int
node_var (const HlNode *node, char letter)
{
  switch (letter)
    {
    case 'm': return node->m;
    case 'p': return node->p;
    case 'h': return node->h;
    case 'T': return node->T;
    case 's': return node->s;
    case 'x': return node->x;
    case 'v': return node->v;
    default: return -1;
    }
}

int
hl_model_find_var (const HlModel *model, const HlAddress *address)
{
  int node;
  char letter;
  if (address->owner == HL_OWNER_PLANT)
    return hl_model_own_var (model, -1, address->key);
  if (hl_model_find_state (model, address, &node, &letter))
    return node_var (hl_model_node (model, node), letter);
  if (address->owner != HL_OWNER_COMPONENT)
    return -1;
  int component = hl_plant_component_index (model->plant, address->id);
  return component < 0 ? -1 : hl_model_own_var (model, component, address->key);
}

/* --- what components call ------------------------------------------------------ */

#define NINE(base) { base, { base "1", base "2", base "3", base "4", base "5", base "6", base "7", base "8", base "9" } }

const char *
hl_key (const char *base, int number)
{
  static const struct { const char *base, *keys[9]; } usual[] = {
    NINE ("extraction"), NINE ("inlet"), NINE ("outlet"), NINE ("group_efficiency"), NINE ("fraction"),
    NINE ("cold_reheat"), NINE ("hot_reheat"), NINE ("reheat_pressure_loss"), NINE ("reheat_heat"),
  };
  for (guint k = 0; k < G_N_ELEMENTS (usual) && number >= 1 && number <= 9; k++)
    if (g_str_equal (usual[k].base, base))
      return usual[k].keys[number - 1];
  char key[64];
  g_snprintf (key, sizeof key, "%s%d", base, number);
  return g_intern_string (key);
}

int
hl_emit_optional (HlEmit *emit, const char *key)
{
  const HlModel *model = emit->model;
  for (int k = model->first_port[emit->index]; k < model->first_port[emit->index + 1]; k++)
    if (same (g_array_index (model->ports, HlPortNode, k).key, key))
      return g_array_index (model->ports, HlPortNode, k).node;
  return -1;
}

/* Medium of the lines on the same side of the component. */
static const HlFluid *
fluid_beside (const HlEmit *emit, const char *key)
{
  const HlModel *model = emit->model;
  const HlKind *kind = emit->component->kind;
  int side = hl_kind_side_of_port (kind, key);
  for (int k = model->first_port[emit->index]; k < model->first_port[emit->index + 1]; k++)
    {
      const HlPortNode *port = &g_array_index (model->ports, HlPortNode, k);
      if (hl_kind_side_of_port (kind, port->key) == side)
        return hl_model_node (model, port->node)->fluid;
    }
  guint n;
  const char *medium = hl_component_find_port (emit->component, key, &n) ? hl_component_port (emit->component, n).kind->medium : NULL;
  const HlFluid *made_for = medium != NULL ? hl_plant_fluid (model->plant, medium) : NULL;
  return made_for != NULL ? made_for : model->water;
}

int
hl_emit_port (HlEmit *emit, const char *key)
{
  int node = hl_emit_optional (emit, key);
  if (node >= 0)
    return node;
  for (guint k = hl_plant_n_streams (emit->model->plant); k < emit->model->nodes->len; k++)
    if (hl_model_node (emit->model, (int) k)->component == emit->index && same (hl_model_node (emit->model, (int) k)->port, key))
      return (int) k;
  HlNode open = { .stream = -1, .component = emit->index, .to_component = -1, .port = key, .fluid = fluid_beside (emit, key) };
  HlAddress address = hl_address_component (emit->component->id, open.port);
  g_array_append_val (emit->model->open_ports, address);
  add_node (emit->model, open);
  return (int) emit->model->nodes->len - 1;
}

int
hl_emit_hidden (HlEmit *emit, const char *key, HlVarKind kind)
{
  HlAddress address = { emit->component != NULL ? HL_OWNER_COMPONENT : HL_OWNER_PLANT, emit->component != NULL ? emit->component->id : "", key };
  return hl_system_add_var (emit->system, kind, address, NAN);
}

int
hl_emit_own (HlEmit *emit, const char *key, HlVarKind kind)
{
  HlOwn own = { key, -1 };
  own.var = hl_emit_hidden (emit, own.key, kind);
  g_array_append_val (emit->model->own, own);
  return own.var;
}

int
hl_emit_constant (HlEmit *emit, HlVarKind kind, double value)
{
  int var = hl_emit_hidden (emit, "", kind);
  hl_system_add_spec (emit->system, var, hl_system_var (emit->system, var)->address, HL_ORIGIN_GIVEN, hl_var_from_si (kind, value));
  return var;
}

int
hl_emit_site (HlEmit *emit, const char *option, const char *key, double site_value)
{
  if (hl_component_option (emit->component, option) != 0)
    return hl_emit_own (emit, key, HL_VAR_TEMPERATURE);
  int var = hl_emit_hidden (emit, key, HL_VAR_TEMPERATURE);
  HlAddress nowhere = hl_address_component (emit->component->id, "");
  hl_system_add_spec (emit->system, var, nowhere, HL_ORIGIN_GIVEN, site_value);
  return var;
}

static const HlValue *
value_of (HlEmit *emit, const char *key)
{
  const HlValues *values = &emit->component->values;
  for (guint k = 0; k < values->n; k++)
    if (same (values->entries[k].key, key))
      return &values->entries[k].value;
  return NULL;
}

gboolean
hl_emit_has_value (HlEmit *emit, const char *key)
{
  return value_of (emit, key) != NULL;
}

gboolean
hl_value_is_fixed_at (const HlValue *value, double at)
{
  return value != NULL && value->origin != HL_ORIGIN_TIED && fabs (value->value - at) < 1e-300;
}

gboolean
hl_emit_is_fixed_at (HlEmit *emit, const char *key, double value)
{
  HlForm form = { emit->index, key, value, hl_value_is_fixed_at (value_of (emit, key), value) };
  g_array_append_val (emit->model->forms, form);
  return form.holds;
}

static int
add_state_var (HlModel *model, const HlNode *node, HlVarKind kind, const char *letter)
{
  int var = hl_system_add_var (model->system, kind, state_address (model, node, letter), NAN);
  hl_system_var (model->system, var)->scale = hl_fluid_scale (node->fluid);
  return var;
}

static int
state_var (HlModel *model, int n, char letter, gboolean drives)
{
  HlNode *node = hl_model_node (model, n);
  HlSystem *system = model->system;
  switch (letter)
    {
    case 'T':
      node->T_drives |= drives;
      if (node->T < 0)
        node->T = add_state_var (model, node, HL_VAR_TEMPERATURE, "T");
      return node->T;
    case 's':
      if (node->s < 0)
        {
          node->s = add_state_var (model, node, HL_VAR_ENTROPY, "s");
          if (drives)
            hl_add_enthalpy_at_entropy (system, node->fluid, node->p, node->s, node->h)->component = node->component;
          else
            hl_add_entropy (system, node->fluid, node->p, node->h, node->s)->component = node->component;
        }
      return node->s;
    case 'x':
      if (node->x < 0)
        {
          node->x = hl_system_add_var (system, HL_VAR_RATIO, state_address (model, node, "x"), NAN);
          if (drives)
            hl_add_enthalpy_at_quality (system, node->fluid, node->p, node->x, node->h)->component = node->component;
          else
            hl_add_quality (system, node->fluid, node->p, node->h, node->x)->component = node->component;
        }
      return node->x;
    case 'v':
      if (node->v < 0)
        {
          node->v = add_state_var (model, node, HL_VAR_VOLUME, "v");
          hl_add_volume (system, node->fluid, node->p, node->h, node->v)->component = node->component;
        }
      return node->v;
    default:
      return node_var (node, letter);
    }
}

int
hl_emit_T (HlEmit *emit, int node, gboolean drives)
{
  return state_var (emit->model, node, 'T', drives);
}

/* Not drawn to its end: a required port of it has no line. */
gboolean
hl_model_is_unfinished (const HlModel *model, int component)
{
  for (guint k = 0; k < model->open_ports->len; k++)
    if (g_array_index (model->open_ports, HlAddress, k).id == hl_plant_component (model->plant, (guint) component)->id)
      return TRUE;
  return FALSE;
}

void
hl_emit_sum (HlEmit *emit, HlSum sum, int var)
{
  g_array_append_val (emit->model->sums[sum], var);
  g_array_append_val (emit->model->sums_of[sum], emit->index);
}

/* What is still being drawn does not count, else its unknown part would leave the whole plant unknown; but where no turbine is
 * connected yet it does, else a power that is put in would contradict what there is. */
static void
spare_unfinished (HlModel *model)
{
  gboolean has_turbine = FALSE;
  for (int c = 0; c < N_COMPONENTS (model) && model->open_ports->len > 0; c++)
    {
      const HlKind *kind = hl_plant_component (model->plant, (guint) c)->kind;
      has_turbine |= kind->shaft == HL_SHAFT_DRIVES && kind->n_ports > 0 && !hl_model_is_unfinished (model, c);
    }
  for (int sum = 0; has_turbine && sum < HL_N_SUMS; sum++)
    for (guint k = model->sums[sum]->len; k > 0; k--)
      {
        int component = g_array_index (model->sums_of[sum], int, k - 1);
        if (component < 0 || !hl_model_is_unfinished (model, component))
          continue;
        g_array_remove_index (model->sums[sum], k - 1);
        g_array_remove_index (model->sums_of[sum], k - 1);
      }
}

void
hl_emit_guess (HlEmit *emit, int node, double h)
{
  int var = hl_model_node (emit->model, node)->h;
  hl_system_var (emit->system, var)->start = hl_fluid_scale_enthalpy (hl_fluid_scale (hl_model_node (emit->model, node)->fluid), h);
}

HlEquation *
hl_emit_done (HlEmit *emit, HlEquation *equation, const char *says, int output)
{
  equation->component = emit->index;
  if (says != NULL)
    equation->says = says;
  if (output >= 0)
    equation->output = output;
  return equation;
}

void
hl_emit_balance (HlEmit *emit, const int *in, int n_in, const int *out, int n_out)
{
  int vars[HL_EQUATION_MOST], n = 0;
  double signs[HL_EQUATION_MOST];
  if (n_in == 1 && n_out == 1)
    {
      hl_system_merge (emit->system, in[0], out[0]);
      return;
    }
  for (int k = 0; k < n_in; k++, n++)
    {
      vars[n] = in[k];
      signs[n] = 1.0;
    }
  for (int k = 0; k < n_out; k++, n++)
    {
      vars[n] = out[k];
      signs[n] = -1.0;
    }
  HlEquation *e = hl_add_linear (emit->system, HL_VAR_FLOW, vars, signs, n, 0.0);
  e->component = emit->index;
  e->is_balance = TRUE;
}

/* --- values ------------------------------------------------------------------- */

/* Variable of an address, made where it does not exist yet; -1 when the plant has no such thing now. */
static int
want_var (HlModel *model, const HlAddress *address, gboolean drives)
{
  int node;
  char letter;
  if (hl_model_find_state (model, address, &node, &letter))
    return state_var (model, node, letter, drives);
  return hl_model_find_var (model, address);
}

/* The same where the component's or stream's place is known already. */
static int
want_own_var (HlModel *model, int component, int stream, const char *key)
{
  if (stream >= 0)
    return state_var (model, stream, key[0], TRUE);
  const char *dot = component >= 0 ? strchr (key, '.') : NULL;
  if (dot == NULL)
    return hl_model_own_var (model, component, key);
  gsize length = (gsize) (dot - key);
  for (int k = model->first_port[component]; k < model->first_port[component + 1]; k++)
    {
      const HlPortNode *port = &g_array_index (model->ports, HlPortNode, k);
      if (strncmp (port->key, key, length) == 0 && port->key[length] == '\0')
        return state_var (model, port->node, dot[1], TRUE);
    }
  HlAddress address = { HL_OWNER_COMPONENT, hl_plant_component (model->plant, (guint) component)->id, key };
  return want_var (model, &address, TRUE);
}

static void
add_value (HlModel *model, HlAddress address, int component, int stream, const HlValue *value)
{
  int var = want_own_var (model, component, stream, address.key);
  if (var < 0)
    return;
  HlSystem *system = model->system;
  if (value->origin != HL_ORIGIN_TIED)
    {
      double x = hl_var_from_si (hl_system_var (system, var)->kind, value->value);
      if (isfinite (x))
        hl_system_add_spec (system, var, address, value->origin, x)->si = value->value;
      return;
    }
  int of[HL_EQUATION_MOST];
  for (guint k = 0; k < hl_tie_n_of (value->tie); k++)
    if (k >= HL_EQUATION_MOST - 1 || (of[k] = want_var (model, hl_tie_of (value->tie, k), FALSE)) < 0)
      {
        g_array_append_val (model->broken_ties, address);
        return;
      }
  hl_add_tie (system, var, value->tie, of);
  int equation = (int) system->equations->len - 1;
  if (address.owner == HL_OWNER_COMPONENT)
    hl_system_equation (system, equation)->component = hl_plant_component_index (model->plant, address.id);
  hl_system_add_spec (system, var, address, HL_ORIGIN_TIED, NAN)->equation = equation;
}

static void
add_values (HlModel *model)
{
  for (int c = 0; c < N_COMPONENTS (model); c++)
    {
      const HlComponent *component = hl_plant_component (model->plant, (guint) c);
      for (guint k = 0; k < component->values.n; k++)
        {
          const HlValueEntry *entry = &component->values.entries[k];
          add_value (model, (HlAddress) { HL_OWNER_COMPONENT, component->id, entry->key }, c, -1, &entry->value);
        }
    }
  for (guint i = 0; i < hl_plant_n_streams (model->plant); i++)
    {
      const HlStream *stream = hl_plant_stream (model->plant, i);
      for (guint k = 0; k < stream->values.n; k++)
        add_value (model, (HlAddress) { HL_OWNER_STREAM, stream->id, stream->values.entries[k].key }, -1, (int) i, &stream->values.entries[k].value);
    }
  const HlValues *values = hl_plant_values (model->plant);
  for (guint k = 0; k < values->n; k++)
    add_value (model, (HlAddress) { HL_OWNER_PLANT, g_intern_static_string (""), values->entries[k].key }, -1, -1, &values->entries[k].value);
}

static gboolean
has_spec (const HlSystem *system, int var)
{
  int root = hl_system_find (system, var);
  for (guint k = 0; k < system->specs->len; k++)
    if (hl_system_find (system, hl_system_spec (system, k)->var) == root)
      return TRUE;
  return FALSE;
}

/* Temperatures that somebody asked for.  One given where no pressure is: wet steam takes its pressure from it, dry steam and
 * water their enthalpy.  Steam on its way to a condenser is taken for wet at first, all else for dry. */
static void
add_temperatures (HlModel *model, const gboolean *other, guint n_other)
{
  for (guint k = 0; k < model->nodes->len; k++)
    {
      HlNode *node = hl_model_node (model, (int) k);
      HlEquation *e;
      if (node->T < 0)
        continue;
      node->T_is_free = node->T_drives && node->subcooling < 0 && !has_spec (model->system, node->p);
      node->T_is_saturation = node->T_is_free && node->is_exhaust != (k < n_other && other[k]);
      if (node->subcooling >= 0)
        {
          e = hl_add_subcooled_temperature (model->system, node->fluid, node->p, node->subcooling, node->T);
          e->output = 2;
        }
      else if (!node->T_drives)
        e = hl_add_temperature (model->system, node->fluid, node->p, node->h, node->T);
      else if (node->T_is_saturation)
        e = hl_add_saturation (model->system, node->fluid, node->p, node->T);
      else if (node->T_is_free)
        e = hl_add_enthalpy_condition (model->system, node->fluid, node->p, node->T, node->h);
      else
        e = hl_add_enthalpy_at_temperature (model->system, node->fluid, node->p, node->T, node->h);
      e->component = node->component;
    }
}

/* --- building ------------------------------------------------------------------- */

HlModel *
hl_model_new_other (HlPlant *plant, const gboolean *other, guint n_other)
{
  HlModel *model = g_new0 (HlModel, 1);
  model->plant = hl_plant_ref (plant);
  model->water = hl_plant_fluid (plant, "water");
  model->system = hl_system_new ();
  model->nodes = g_array_sized_new (FALSE, FALSE, sizeof (HlNode), 64);
  model->ports = g_array_sized_new (FALSE, FALSE, sizeof (HlPortNode), 128);
  model->own = g_array_sized_new (FALSE, FALSE, sizeof (HlOwn), 256);
  model->open_ports = g_array_new (FALSE, FALSE, sizeof (HlAddress));
  model->forms = g_array_new (FALSE, FALSE, sizeof (HlForm));
  model->broken_ties = g_array_new (FALSE, FALSE, sizeof (HlAddress));
  for (int k = 0; k < HL_N_SUMS; k++)
    {
      model->sums[k] = g_array_new (FALSE, FALSE, sizeof (int));
      model->sums_of[k] = g_array_new (FALSE, FALSE, sizeof (int));
    }
  add_streams (model);
  hl_shafts_look (model);
  int n = N_COMPONENTS (model);
  model->first_own = g_atomic_rc_box_alloc0 (sizeof (int) * (gsize) (n + 2));
  for (int c = 0; c < n; c++)
    {
      HlEmit emit = { model, model->system, hl_plant_component (plant, (guint) c), c };
      const HlComponentModel *component_model = hl_component_model (emit.component->kind);
      model->first_own[c] = (int) model->own->len;
      if (component_model != NULL)
        component_model->emit (&emit);
      hl_heads_emit_elevation (&emit);
    }
  model->first_own[n] = model->first_own[n + 1] = (int) model->own->len;
  hl_shafts_add (model);
  hl_heads_add (model);
  spare_unfinished (model);
  hl_emit_plant (model);
  model->first_own[n + 1] = (int) model->own->len;
  add_values (model);
  add_temperatures (model, other, n_other);
  hl_system_close (model->system);
  return model;
}

HlModel *
hl_model_new (HlPlant *plant)
{
  return hl_model_new_other (plant, NULL, 0);
}
