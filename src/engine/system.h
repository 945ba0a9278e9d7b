/* Unknowns and equations of a plant, as plain arrays: what the numerical core works on.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/fluid-scale.h"
#include "plant/plant.h"
G_BEGIN_DECLS

/* What a variable is.  A pressure is carried as its natural logarithm. */
typedef enum {
  HL_VAR_FLOW,
  HL_VAR_PRESSURE,
  HL_VAR_ENTHALPY,
  HL_VAR_TEMPERATURE,
  HL_VAR_TEMPERATURE_DIFFERENCE,
  HL_VAR_ENTROPY,
  HL_VAR_VOLUME,
  HL_VAR_RATIO,
  HL_VAR_POWER,
  HL_VAR_CONDUCTANCE,
  HL_VAR_PRESSURE_DIFFERENCE,
  HL_VAR_HEAT_RATE,
  HL_VAR_STEAM_RATE,
  HL_VAR_LENGTH,
  HL_VAR_AREA,
  HL_VAR_APERTURE,
  HL_VAR_IRRADIANCE,
} HlVarKind;

/* Variables which are equal by structure form a class; its root stands for all of them. */
typedef struct {
  HlAddress address;
  HlVarKind kind;
  int       parent;       /* towards the root of its class; the root names itself */
  double    start;        /* cold start of the iteration, of a flow as a part of the plant's; NaN: the usual one of its kind */
  const HlFluidScale *scale;   /* of the medium whose state it is; NULL: of none */
} HlVar;

typedef struct _HlEquation HlEquation;

/* Residual and exact derivatives to the equation's own variables.
 * @a: the equation's constants; @x: its variables in its own order; @dr: dr/dx, same order. */
typedef HlStatus (*HlResidual) (const HlEquation *equation, const double *a, const double *x, double *r, double *dr);

struct _HlEquation {
  HlResidual     residual;
  HlResidual     in_block;         /* form of the same where another variable than number plain_for is sought, or several at once; NULL: no other */
  int            plain_for;
  const HlFluid *fluid, *other_fluid;   /* the other one: of an exchanger whose sides carry two media */
  int            n, first;         /* its variables in HlSystem.index */
  int            first_constant;   /* its constants in HlSystem.constants */
  guint32        linear;           /* bit k: linear in variable k while the others stand still */
  int            output;           /* position of the variable that the equation merely computes; -1: none */
  int            component;        /* index in the plant; -1: the plant as a whole */
  HlVarKind      kind;             /* of the residual: sets its scale */
  gboolean       is_balance;       /* a mass balance: constants are the signs of the flows */
  gboolean       is_dropped;       /* dependent on the others */
  const char    *says;             /* N_() words with {k} for variable k; NULL: written from its terms */
  const HlTie   *tie;              /* of a tie: its variables are the target and what the tie names, in order */
  const char    *source;           /* N_() where the equation comes from; NULL: by its form, see hl_equation_source() */
};

/* A value that somebody put in. */
typedef struct {
  int       var;
  HlAddress address;               /* where it stands in the plant */
  HlOrigin  origin;
  double    value;                 /* as carried: a pressure's logarithm */
  double    si;                    /* as it was put in; NaN: of a tie */
  int       equation;              /* of a tie, or of a second value of the same class; -1 */
} HlSpec;

typedef struct {
  GArray *vars;                    /* HlVar */
  GArray *equations;               /* HlEquation */
  GArray *specs;                   /* HlSpec */
  GArray *index;                   /* int: variables of the equations; roots once closed */
  GArray *raw;                     /* int: the same before merging, for names */
  GArray *constants;               /* double */
  int    *root;                    /* [n vars] once closed; it and fixed_by are g_atomic_rc_boxes, shared where only values differ */
  int    *fixed_by;                /* [n vars] of a root: index of the spec that fixes it; -1: free */
  double *x;                       /* [n vars] of roots */
  double  flow_scale;              /* [kg/s] */
} HlSystem;

#define hl_system_var(system, n)      (&g_array_index ((system)->vars, HlVar, n))
#define hl_system_equation(system, n) (&g_array_index ((system)->equations, HlEquation, n))
#define hl_system_spec(system, n)     (&g_array_index ((system)->specs, HlSpec, n))

HlSystem *hl_system_new  (void);
void      hl_system_free (HlSystem *system);
G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlSystem, hl_system_free)

int         hl_system_add_var      (HlSystem *system, HlVarKind kind, HlAddress address, double start);
void        hl_system_merge        (HlSystem *system, int a, int b);
int         hl_system_find         (const HlSystem *system, int var);    /* root, at any time */
HlEquation *hl_system_add_equation (HlSystem *system, HlResidual residual, HlVarKind kind, guint32 linear,
                                    const int *vars, int n, const double *constants, int n_constants);
HlSpec     *hl_system_add_spec     (HlSystem *system, int var, HlAddress address, HlOrigin origin, double value);
/* Ends building: roots are settled, the first value of each class fixes it, further ones become equations. */
void        hl_system_close        (HlSystem *system);

/* After other values were put in: the reference flow that goes with them. */
void        hl_system_rescale      (HlSystem *system);
double      hl_system_scale        (const HlSystem *system, HlVarKind kind);
double      hl_system_start        (const HlVar *var, double flow_scale);
HlStatus    hl_system_evaluate     (const HlSystem *system, int equation, double *r, double *dr);
/* In SI as the engineer knows it: a pressure, not its logarithm. */
double      hl_system_value        (const HlSystem *system, int var);
double      hl_var_to_si           (HlVarKind kind, double x);
double      hl_var_from_si         (HlVarKind kind, double value);
HlVarKind   hl_var_kind_of         (HlDimension dimension);

static inline const int *
hl_equation_vars (const HlSystem *system, const HlEquation *equation)
{
  return &g_array_index (system->index, int, equation->first);
}

/* The longest equation that a plant may have is checked against this when it is added. */
#define HL_EQUATION_MOST 256
G_END_DECLS
