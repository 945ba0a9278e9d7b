/* The outcome of a solve: immutable, reference-counted, holds the plant that it belongs to.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/finding.h"
G_BEGIN_DECLS

typedef struct _HlSolution HlSolution;
HL_PUBLIC HlSolution *hl_solution_ref   (HlSolution *solution);
HL_PUBLIC void        hl_solution_unref (HlSolution *solution);
G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlSolution, hl_solution_unref)

HL_PUBLIC HlPlant *hl_solution_plant     (const HlSolution *solution);
HL_PUBLIC gboolean hl_solution_is_solved (const HlSolution *solution);   /* converged, and no finding of grade error */
/* Not solved as a whole, because something is still to be connected or given; what is known of it is settled all the same. */
HL_PUBLIC gboolean hl_solution_is_partial (const HlSolution *solution);
HL_PUBLIC double   hl_solution_seconds   (const HlSolution *solution);   /* time of the whole solve */

/* A stream's state, by its index in the plant. */
typedef struct {
  gboolean has_flow;      /* m is known */
  gboolean has_state;     /* state is known */
  double   m;             /* [kg/s] */
  HlState  state;
  const HlFluid *fluid;
  double   e;             /* specific flow exergy [J/kg], physical, from the site's dead state; NaN unknown */
} HlStreamResult;
HL_PUBLIC void     hl_solution_stream (const HlSolution *solution, guint stream, HlStreamResult *result);

/* Value of any address that the solution knows [SI]: own quantities, port and stream states, plant results. */
HL_PUBLIC gboolean hl_solution_value  (const HlSolution *solution, const HlAddress *address, double *value);

/* Plant results in the order of hl_plant_quantities(): only those whose terms exist. */
HL_PUBLIC guint                 hl_solution_n_results (const HlSolution *solution);
HL_PUBLIC const HlQuantityKind *hl_solution_result    (const HlSolution *solution, guint n, double *value);

/* What happens to the medium inside components, for state diagrams; in flow order. */
typedef enum {
  HL_PROCESS_EXPANSION,     /* turbine group: has an isentropic end state */
  HL_PROCESS_COMPRESSION,   /* pump: has an isentropic end state */
  HL_PROCESS_HEATING,       /* along an isobar, or nearly so */
  HL_PROCESS_COOLING,       /* the same, heat leaves: condensing, desuperheating */
  HL_PROCESS_THROTTLING,    /* constant enthalpy */
  HL_PROCESS_MIXING,        /* at constant pressure towards the mixture */
  HL_PROCESS_LINE,          /* pipe with losses */
} HlProcessKind;
typedef struct {
  HlProcessKind  kind;
  guint          component;                 /* index in the plant */
  int            from_stream, to_stream;    /* index in the plant; -1 where the end is inside a component */
  HlState        from, to;
  gboolean       has_isentropic;
  HlState        isentropic;                /* end state at constant entropy */
  const HlFluid *fluid;
  double         m;                         /* [kg/s]; NaN unknown */
  gboolean       is_service;                /* cooling water and the like: not part of the cycle's picture by default */
} HlProcess;
HL_PUBLIC guint            hl_solution_n_processes (const HlSolution *solution);
HL_PUBLIC const HlProcess *hl_solution_process     (const HlSolution *solution, guint n);

HL_PUBLIC guint            hl_solution_n_findings  (const HlSolution *solution);
HL_PUBLIC const HlFinding *hl_solution_finding     (const HlSolution *solution, guint n);   /* gravest first */
/* Findings that the plant says are dismissed: not among those above. */
HL_PUBLIC guint            hl_solution_n_dismissed (const HlSolution *solution);
HL_PUBLIC const HlFinding *hl_solution_dismissed   (const HlSolution *solution, guint n);
HL_PUBLIC gboolean         hl_solution_has_grade   (const HlSolution *solution, HlGrade at_least);

/* One line on how things stand: "Solved · 12.00 MW net · 31.2 % · 3 values assumed", or "One value is missing: ...".  g_free(). */
HL_PUBLIC char *hl_solution_summary (const HlSolution *solution);

/* Second law of one component: product = what it is there for, fuel = what that costs.  fuel = product + loss + destruction. */
typedef struct {
  double      fuel, product;    /* [W] */
  double      loss;             /* leaves for the surroundings, or with cooling water, unused [W] */
  double      destruction;      /* dead state temperature times the entropy produced [W] */
  double      efficiency;       /* product over fuel; NaN where nothing is made, as in a valve or a condenser */
  const char *words;            /* translated: what counts as fuel and as product; "" where it only passes on */
} HlExergyBalance;
HL_PUBLIC gboolean hl_solution_exergy (const HlSolution *solution, guint component, HlExergyBalance *balance);

/* Second law of the whole plant: what comes in is made, lost or destroyed.  In this order, components within a kind in the plant's. */
typedef enum {
  HL_EXERGY_FUEL,           /* in: chemical exergy of fuel */
  HL_EXERGY_HEAT,           /* in: heat at the temperature at which it passes */
  HL_EXERGY_STREAM_IN,      /* in: streams from outside */
  HL_EXERGY_COLD,           /* in: heat left to surroundings colder than the dead state */
  HL_EXERGY_ELECTRICITY,    /* in: where the plant takes more than it makes */
  HL_EXERGY_DESTRUCTION,    /* gone: in each component */
  HL_EXERGY_LOSS,           /* out: with heat to the surroundings, cooling water, water lost */
  HL_EXERGY_STREAM_OUT,     /* out: streams that leave */
  HL_EXERGY_OTHER,          /* out: consumers of electricity that are not drawn */
  HL_EXERGY_DELIVERED,      /* made: with heat delivered */
  HL_EXERGY_NET,            /* made: net power */
} HlExergyFlowKind;
typedef struct _HlExergyFlow { HlExergyFlowKind kind; int component; double power; } HlExergyFlow;    /* component -1: the plant; [W] */
HL_PUBLIC guint               hl_solution_n_exergy_flows (const HlSolution *solution);   /* 0 where something is not known */
HL_PUBLIC const HlExergyFlow *hl_solution_exergy_flow    (const HlSolution *solution, guint n);

/* How a found value came about: the equation in words and numbers, its inputs and their origin; several lines. NULL where unknown.  g_free(). */
HL_PUBLIC char *hl_solution_explain (const HlSolution *solution, const HlAddress *address);

/* How a result moves with a value that was put in (given or assumed), all others held: d result / d value [SI over SI].
 * FALSE where the plant is not solved, or one of the two is not such. */
HL_PUBLIC gboolean hl_solution_sensitivity   (const HlSolution *solution, const HlAddress *result, const HlAddress *given, double *value);
/* The same for all values put in, in one go.  Returns: (transfer full) (nullable): element-type HlSensitivity, g_array_unref(). */
typedef struct { HlAddress given; double value, derivative; } HlSensitivity;
HL_PUBLIC GArray  *hl_solution_sensitivities (const HlSolution *solution, const HlAddress *result);

/* Balances of the whole plant, relative to the largest term. */
HL_PUBLIC void hl_solution_balances (const HlSolution *solution, double *mass, double *energy);

/* Sizes and effort, for benchmarks. */
typedef struct {
  guint  n_unknowns, n_blocks, largest_block, n_iterations;
  double seconds_build, seconds_structure, seconds_numbers, seconds_results;
} HlSolveEffort;
HL_PUBLIC void hl_solution_effort (const HlSolution *solution, HlSolveEffort *effort);
G_END_DECLS
