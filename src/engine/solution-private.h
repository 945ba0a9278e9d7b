/* The inside of a solution.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/exergy.h"
#include "engine/finding-private.h"
#include "engine/model.h"
#include "engine/numbers.h"
#include "engine/processes.h"
#include "engine/solution.h"
G_BEGIN_DECLS

typedef struct { const HlQuantityKind *kind; double value; } HlPlantResult;

struct _HlSolution {
  gatomicrefcount ref_count;
  HlPlant       *plant;
  HlModel       *model;
  HlStructure   *structure;
  HlNumbers      numbers;
  HlNodeResult  *states;            /* [n nodes] */
  int           *circuits;          /* [n nodes] */
  GArray        *processes;         /* HlProcess */
  GArray        *results;           /* HlPlantResult */
  HlExergy      *exergy;
  HlFindings     findings, dismissed;
  gboolean       is_complete;       /* every unknown has its value */
  double         seconds;
  HlSolveEffort  effort;
};

/* Unknowns, equations and their structure.  @other: [n_other nodes] see hl_model_new_other(); or NULL.  @effort grows. */
void hl_solve_prepare (HlPlant *plant, const gboolean *other, guint n_other, HlModel **model, HlStructure **structure, HlSolveEffort *effort);

/* Does the plant differ from that of the solution in the size of values only, and had the structure nothing wrong? */
gboolean hl_solve_can_reuse (const HlSolution *start, HlPlant *plant);

/* How far a solve goes where blocks cannot be solved from their start: not further; to usual values, see numbers-relax.c; to these
 * from the beginning; and, counting on from there, to values near them. */
typedef enum { HL_PATIENCE_NONE, HL_PATIENCE_USUAL, HL_PATIENCE_USUAL_FIRST } HlPatience;
HlSolution *hl_solve_once (HlPlant *plant, const HlSolution *start, HlPatience patience);

/* results.c: what follows from the solved unknowns. */
void hl_results_states    (HlSolution *solution);
void hl_results_plant     (HlSolution *solution);
void hl_results_processes (HlSolution *solution);
/* Nodes between whose temperatures the Carnot efficiency counts; FALSE where there are none. */
gboolean hl_results_extremes (const HlSolution *solution, int *lowest, int *highest);
G_END_DECLS
