/* Shafts: lines of machines in order; gearboxes cut a shaft into parts, and each part's powers balance.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "engine/shafts.h"
#include "engine/components/components.h"

static HlShaftRole
role_of (const HlModel *model, int component)
{
  return component >= 0 ? hl_plant_component (model->plant, (guint) component)->kind->shaft : HL_SHAFT_NONE;
}

static gboolean
is_taker (HlShaftRole role)
{
  return role == HL_SHAFT_DRIVEN || role == HL_SHAFT_GENERATOR;
}

/* Without a generator drawn a turbine counts as if on one without loss; one that is made to drive something does not. */
static gboolean
gives_electricity (const HlModel *model, int component)
{
  const HlKind *kind = hl_plant_component (model->plant, (guint) component)->kind;
  return kind->shaft == HL_SHAFT_GENERATOR
         || (kind->shaft == HL_SHAFT_DRIVES && kind->n_ports > 0 && !kind->only_drives && !model->is_on_shaft[component]);
}

void
hl_shafts_look (HlModel *model)
{
  HlPlant *plant = model->plant;
  int n = (int) hl_plant_n_components (plant);
  model->is_on_shaft = g_atomic_rc_box_alloc0 (sizeof (gboolean) * (gsize) (n + 1));
  for (guint i = 0; i < hl_plant_n_shafts (plant); i++)
    {
      const HlShaft *shaft = hl_plant_shaft (plant, i);
      gboolean gives = FALSE, takes = FALSE;
      for (guint k = 0; k < shaft->n_joins; k++)
        {
          HlShaftRole role = role_of (model, hl_plant_component_index (plant, shaft->joins[k]));
          gives |= role == HL_SHAFT_DRIVES;
          takes |= is_taker (role);
        }
      for (guint k = 0; gives && takes && k < shaft->n_joins; k++)
        {
          int c = hl_plant_component_index (plant, shaft->joins[k]);
          if (c >= 0)
            model->is_on_shaft[c] = TRUE;
        }
    }
  for (int c = 0; c < n; c++)
    model->has_gross |= gives_electricity (model, c);
}

/* --- which way power runs through a gearbox ------------------------------------------ */

typedef struct { gboolean gives, takes, has_generator; } Side;

static Side
look_at_side (const HlModel *model, const int *joins, int from, int to)
{
  Side side = { FALSE, FALSE, FALSE };
  for (int k = from; k < to; k++)
    {
      HlShaftRole role = role_of (model, joins[k]);
      side.gives |= role == HL_SHAFT_DRIVES;
      side.takes |= is_taker (role);
      side.has_generator |= role == HL_SHAFT_GENERATOR;
    }
  return side;
}

/* From the first joins to the last, or back?  Where one side only gives or only takes it is sure; else towards the generator
 * for a first reading, and the gearbox's equation holds either way. */
static gboolean
runs_forward (const HlModel *model, const int *joins, int n, int at, gboolean *is_sure)
{
  Side before = look_at_side (model, joins, 0, at), after = look_at_side (model, joins, at + 1, n);
  *is_sure = TRUE;
  if (!before.takes || !after.gives)
    return TRUE;
  if (!before.gives || !after.takes)
    return FALSE;
  *is_sure = FALSE;
  return !before.has_generator || after.has_generator;
}

/* --- balances --------------------------------------------------------------------------- */

/* The powers of one part of a shaft, collected until a gearbox or the end closes it. */
typedef struct { int vars[HL_EQUATION_MOST], n; double signs[HL_EQUATION_MOST]; } Part;

static void
add_term (Part *part, int var, double sign)
{
  if (var < 0 || part->n >= HL_EQUATION_MOST)
    return;
  part->vars[part->n] = var;
  part->signs[part->n++] = sign;
}

static void
close_part (HlModel *model, Part *part)
{
  if (part->n > 0)
    hl_add_linear (model->system, HL_VAR_POWER, part->vars, part->signs, part->n, 0.0);
  part->n = 0;
}

static void
pass_gearbox (HlModel *model, Part *part, const int *joins, int n, int at)
{
  int in = hl_model_own_var (model, joins[at], "input_power"), out = hl_model_own_var (model, joins[at], "output_power");
  int efficiency = hl_model_own_var (model, joins[at], "efficiency");
  gboolean is_sure, forward = runs_forward (model, joins, n, at, &is_sure);
  hl_gearbox_emit_passage (model, joins[at], in, efficiency, out, is_sure);
  add_term (part, forward ? in : out, forward ? -1.0 : 1.0);
  close_part (model, part);
  add_term (part, forward ? out : in, forward ? 1.0 : -1.0);
}

static gboolean
has_finished_driver (const HlModel *model, const HlShaft *shaft)
{
  for (guint k = 0; k < shaft->n_joins; k++)
    {
      int c = hl_plant_component_index (model->plant, shaft->joins[k]);
      if (role_of (model, c) == HL_SHAFT_DRIVES && !hl_model_is_unfinished (model, c))
        return TRUE;
    }
  return FALSE;
}

/* What is still being drawn waits beside the shaft while others drive it. */
static void
add_shaft (HlModel *model, const HlShaft *shaft)
{
  gboolean spares_unfinished = has_finished_driver (model, shaft);
  g_autofree int *joins = g_new (int, shaft->n_joins + 1);
  Part part = { .n = 0 };
  int n = 0;
  for (guint k = 0; k < shaft->n_joins; k++)
    {
      int c = hl_plant_component_index (model->plant, shaft->joins[k]);
      if (c >= 0 && model->is_on_shaft[c] && !(spares_unfinished && hl_model_is_unfinished (model, c)))
        joins[n++] = c;
    }
  for (int k = 0; k < n; k++)
    {
      HlShaftRole role = role_of (model, joins[k]);
      if (role == HL_SHAFT_LOSS)
        pass_gearbox (model, &part, joins, n, k);
      else
        add_term (&part, hl_model_own_var (model, joins[k], role == HL_SHAFT_GENERATOR ? "shaft_power" : "power"),
                  role == HL_SHAFT_DRIVES ? 1.0 : -1.0);
    }
  close_part (model, &part);
}

void
hl_shafts_add (HlModel *model)
{
  for (guint i = 0; i < hl_plant_n_shafts (model->plant); i++)
    add_shaft (model, hl_plant_shaft (model->plant, i));
}
