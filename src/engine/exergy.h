/* Second law: what passes through each component as exergy and as entropy, term by term.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/processes.h"
G_BEGIN_DECLS

/* What a term has to do with its component. */
typedef enum {
  HL_ROLE_SIDE,             /* one of the component's sides: what it gives up in sum is fuel, what it gains is product */
  HL_ROLE_FUEL,
  HL_ROLE_PRODUCT,
  HL_ROLE_LOSS,             /* leaves for the surroundings; where it comes in instead, it is fuel */
  HL_ROLE_LEAK,             /* friction and the like: heat at the temperature of the dead state, worth nothing */
} HlExergyRole;

/* Where a term passes the boundary of the plant. */
typedef enum {
  HL_DOOR_NONE, HL_DOOR_FUEL, HL_DOOR_HEAT, HL_DOOR_STREAM, HL_DOOR_DELIVERED, HL_DOOR_LOSS,
} HlExergyDoor;

typedef enum { HL_TERM_FLOW, HL_TERM_WATER, HL_TERM_POWER, HL_TERM_HEAT, HL_TERM_FUEL } HlTermForm;

/* A temperature: at a node, of a variable (and a difference added to it), or a constant. */
typedef struct { int node, var, plus; double constant; } HlExergyT;

typedef struct {
  HlTermForm   form;
  HlExergyRole role;
  HlExergyDoor door;
  int          side;
  double       sign;        /* 1 where it comes in */
  int          power;       /* flow, power or heat: a variable */
  int          node;        /* FLOW: whose state it has */
  int          p, h;        /* WATER: variables, of the medium @fluid */
  const HlFluid *fluid;
  HlExergyT    a, b;        /* HEAT: passes at the logarithmic mean of both */
  int          ratio;       /* FUEL: exergy over heat, a variable; -1: the constant */
  double       ratio_value;
} HlExergyTerm;

/* How a term moves with a variable of the system [SI]. */
typedef struct { int var; double exergy, entropy; } HlExergySlope;
#define HL_EXERGY_SLOPES 8

typedef struct {
  gboolean is_known;
  double   fuel, product, loss, destruction;      /* [W] */
  double   efficiency;      /* product over fuel; NaN where there is no product */
  double   produced;        /* entropy inside, without what friction gives to the surroundings [W/K]; NaN unknown */
  const char *words;        /* for translation: what counts as fuel and as product */
} HlExergyResult;

/* The dead state of a medium. */
typedef struct { const HlFluid *fluid; gboolean is_known; double h, s; } HlDeadState;

typedef struct {
  double    T0, p0;
  GArray   *dead;           /* HlDeadState */
  GArray   *terms;          /* HlExergyTerm */
  guint    *first;          /* [n components + 1] in @terms */
  HlExergyResult *results;  /* [n components] */
  GArray   *flows;          /* HlExergyFlow of solution.h */
} HlExergy;

typedef struct {
  const HlModel      *model;
  const HlNodeResult *states;
  const gboolean     *is_known;
  const int          *circuits;
  const HlComponent  *component;
  int                 index;
  GArray             *terms;
} HlExergySink;

/* What counts at a kind, in words and as terms; @book NULL: by its sides, its power and its motor. */
typedef struct {
  const char *kind;
  void      (*book) (HlExergySink *sink);
  const char *words;
} HlExergyKind;
const HlExergyKind *hl_exergy_kind (const HlKind *kind);

/* For the kinds.  What is not known is booked too: it leaves the result unknown. */
void hl_exergy_sides  (HlExergySink *sink, HlExergyRole role);                    /* all ports */
HlExergyTerm *hl_exergy_flow  (HlExergySink *sink, HlExergyRole role, double sign, int flow, int node);
HlExergyTerm *hl_exergy_power (HlExergySink *sink, HlExergyRole role, double sign, const char *key);   /* NULL where there is no such quantity */
HlExergyTerm *hl_exergy_heat  (HlExergySink *sink, HlExergyRole role, double sign, const char *key, HlExergyT a, HlExergyT b);
int  hl_exergy_own    (const HlExergySink *sink, const char *key);               /* variable; -1 */
int  hl_exergy_node   (const HlExergySink *sink, const char *port);              /* -1 */

struct _HlSolution;
void   hl_exergy_solve (struct _HlSolution *solution);
void   hl_exergy_free  (HlExergy *exergy);
/* Exergy [W] and entropy [W/K] of a term, counted in; FALSE where unknown.  @slopes: [HL_EXERGY_SLOPES] or NULL. */
gboolean hl_exergy_evaluate (const struct _HlSolution *solution, const HlExergyTerm *term, double *exergy, double *entropy,
                             HlExergySlope *slopes, int *n_slopes);
/* Specific flow exergy of a state [J/kg]; FALSE where the medium has no dead state. */
gboolean hl_exergy_of_state (const struct _HlSolution *solution, const HlFluid *fluid, const HlState *state, double *e);
/* With which weight a term, counted in, is part of "exergy_fuel", "exergy_product" or "exergy_loss" of its component. */
double   hl_exergy_weight   (const struct _HlSolution *solution, guint component, const HlExergyTerm *term, const char *key);
/* "exergy_destruction" and the like of a component, -1 of the plant; FALSE where there is none. */
gboolean hl_exergy_value    (const struct _HlSolution *solution, int component, const char *key, double *value);
/* The same as slopes to variables, each given to @add. */
typedef void (*HlExergyAdd) (gpointer data, int var, double slope);
gboolean hl_exergy_slopes   (const struct _HlSolution *solution, int component, const char *key, HlExergyAdd add, gpointer data);

/* exergy-plant.c */
gboolean hl_exergy_flow_counts  (int kind, const char *key);      /* is a flow of this kind part of that result of the plant? */
struct _HlExergyFlow;
/* Is term @n one of those that a flow sums up? */
gboolean hl_exergy_is_part      (const struct _HlSolution *solution, guint n, const struct _HlExergyFlow *flow);
void     hl_exergy_collect      (struct _HlSolution *solution);
gboolean hl_exergy_plant_value  (const struct _HlSolution *solution, const char *key, double *value);
gboolean hl_exergy_plant_slopes (const struct _HlSolution *solution, const char *key, HlExergyAdd add, gpointer data);
G_END_DECLS
