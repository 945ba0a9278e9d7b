/* A plant turned into unknowns and equations, and the way back from an address to its unknown.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/equations.h"
G_BEGIN_DECLS

/* The state of a stream, or of a port that no line reaches. */
typedef struct {
  int            stream;          /* index in the plant; -1: an open port */
  int            component, to_component;   /* where it comes from, or the one with the open port; where it goes or -1 */
  const char    *port, *to_port;
  const HlFluid *fluid;
  int            m, p, h;
  int            T, s, x, v;      /* -1: nobody asked */
  gboolean       T_drives;        /* the temperature sets the enthalpy; else it is computed from it */
  int            subcooling;      /* liquid this far below saturation: its temperature follows from that; -1: any state */
  gboolean       is_exhaust;      /* steam on its way to be condensed: may be wet */
  gboolean       T_is_free;       /* a temperature drives, and no pressure is put in: which of the two it sets, depends */
  gboolean       T_is_saturation; /* it sets the pressure, as for wet steam; else the enthalpy */
} HlNode;

typedef struct { const char *key; int node; gboolean is_out; } HlPortNode;
typedef struct { const char *key; int var; } HlOwn;

typedef enum {
  HL_SUM_TURBINE_POWER,           /* shaft power of turbines */
  HL_SUM_PUMP_POWER,              /* shaft power of pumps */
  HL_SUM_MOTOR_POWER,             /* electricity for pumps */
  HL_SUM_GROSS,                   /* at generators, and of turbines without one */
  HL_SUM_HEAT_INPUT,
  HL_SUM_FUEL_HEAT,
  HL_SUM_FUEL_FLOW,
  HL_SUM_CO2,
  HL_SUM_BIOGENIC_CO2,
  HL_SUM_DELIVERED,
  HL_SUM_REJECTED,
  HL_SUM_LIVE_STEAM,
  HL_SUM_COMPRESSOR_POWER,        /* shaft power of compressors: there is a reverse cycle, or a gas cycle */
  HL_N_SUMS
} HlSum;

/* Equations that a component wrote for a value that is just @at, or is not: they hold only as long. */
typedef struct { int component; const char *key; double at; gboolean holds; } HlForm;

typedef struct _HlModel {
  HlPlant  *plant;
  const HlFluid *water;           /* by the plant's formulation: of water that is drawn nowhere, and of ports that no line reaches */
  HlSystem *system;
  GArray   *nodes;                /* HlNode; the streams' come first, in their order */
  GArray   *ports;                /* HlPortNode by component */
  int      *first_port;           /* [n components + 1] */
  GArray   *own;                  /* HlOwn by component, the plant's last */
  int      *first_own;            /* [n components + 2] */
  GArray   *sums[HL_N_SUMS], *sums_of[HL_N_SUMS];    /* int: variables, and the component of each */
  GArray   *open_ports;           /* HlAddress: required ports that no line reaches */
  GArray   *broken_ties;          /* HlAddress: tied to something that the plant does not have */
  gboolean *is_on_shaft;          /* [n components] on a shaft that carries its power on */
  gboolean  has_gross;            /* something gives electricity */
  GArray   *forms;                /* HlForm */
  /* first_port, first_own and is_on_shaft are shared between models: g_atomic_rc_box. */
} HlModel;

HlModel *hl_model_new  (HlPlant *plant);
/* @other: [n nodes] where a free temperature is to set the other of pressure and enthalpy than the first guess says; or NULL. */
HlModel *hl_model_new_other (HlPlant *plant, const gboolean *other, guint n_other);
void     hl_model_free (HlModel *model);
/* Does the plant differ from the model's in the size of values only?  Then it may take over what the model was made of, and where
 * the unknowns stand. */
gboolean hl_model_fits        (const HlModel *model, HlPlant *plant);
HlModel *hl_model_with_values (const HlModel *model, HlPlant *plant);
gboolean hl_value_is_fixed_at (const HlValue *value, double at);       /* given or assumed as exactly this; NULL: not */
G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlModel, hl_model_free)

static inline HlNode *
hl_model_node (const HlModel *model, int n)
{
  return &g_array_index (model->nodes, HlNode, n);
}

/* Not drawn to its end: a required port of it has no line.  Known once its equations are written. */
gboolean hl_model_is_unfinished (const HlModel *model, int component);
int hl_model_port_node (const HlModel *model, int component, const char *port);         /* -1 */
int hl_model_own_var   (const HlModel *model, int component, const char *key);          /* component -1: the plant; -1 */
/* Variable of an address that exists already; -1. */
int hl_model_find_var  (const HlModel *model, const HlAddress *address);
/* Node and state letter of an address that names a state; FALSE for others. */
gboolean hl_model_find_state (const HlModel *model, const HlAddress *address, int *node, char *letter);

/* For components: what they are made of.  Keys live as long as the program: literals, or from hl_key(). */
typedef struct {
  HlModel           *model;
  HlSystem          *system;
  const HlComponent *component;
  int                index;
} HlEmit;

int      hl_emit_port      (HlEmit *emit, const char *key);               /* node; an open port gets one of its own */
int      hl_emit_optional  (HlEmit *emit, const char *key);               /* node or -1 */
int      hl_emit_own       (HlEmit *emit, const char *key, HlVarKind kind);
int      hl_emit_hidden    (HlEmit *emit, const char *key, HlVarKind kind);   /* a variable that no address reaches */
int      hl_emit_constant  (HlEmit *emit, HlVarKind kind, double value);
gboolean hl_emit_has_value (HlEmit *emit, const char *key);
gboolean hl_emit_is_fixed_at (HlEmit *emit, const char *key, double value);   /* given or assumed as exactly this */
const char *hl_key         (const char *base, int number);                 /* "extraction2" */
/* The air's temperature: of the plant's site, or an own quantity where the option says so. */
int      hl_emit_site     (HlEmit *emit, const char *option, const char *key, double site_value);
int      hl_emit_T         (HlEmit *emit, int node, gboolean drives);
void     hl_emit_sum       (HlEmit *emit, HlSum sum, int var);
void     hl_emit_guess     (HlEmit *emit, int node, double h);
HlEquation *hl_emit_done   (HlEmit *emit, HlEquation *equation, const char *says, int output);
/* in flows minus out flows is zero; merges where there is one of each. */
void     hl_emit_balance   (HlEmit *emit, const int *in, int n_in, const int *out, int n_out);

void     hl_emit_plant     (HlModel *model);
G_END_DECLS
