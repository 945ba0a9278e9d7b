/* What is wrong with a solution, or unwise about it: laws first, then practice.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/exergy.h"
#include "engine/finding-private.h"
#include "engine/processes.h"
G_BEGIN_DECLS

typedef struct {
  const HlModel      *model;
  const HlNodeResult *states;      /* by node */
  const gboolean     *is_known;    /* of variables */
  gboolean            is_complete; /* everything was solved */
  const HlComponent  *component;
  int                 index;
  HlFindings         *findings;
  const HlExergy     *exergy;      /* whose entropy balances the second law is checked by */
} HlChecker;

/* Checks every component and then the plant. */
void hl_check_all (HlChecker *checker);

/* For components. */
const HlNodeResult *hl_check_port  (const HlChecker *checker, const char *port);             /* NULL: not connected */
const HlFluid      *hl_check_fluid (const HlChecker *checker, const char *port);             /* medium at a port; never NULL */
gboolean            hl_check_is_water (const HlChecker *checker, const char *port);          /* by either formulation */
gboolean            hl_check_own   (const HlChecker *checker, const char *key, double *value);   /* SI */
char               *hl_check_text  (const HlChecker *checker, HlDimension dimension, double value);  /* in the plant's units */
/* Adds a finding about @key of the component ("" for the whole); takes @text. */
HlFinding          *hl_check_add   (HlChecker *checker, HlGrade grade, const char *code, const char *key, char *text);
/* Offers to go to a quantity of the component. */
void                hl_check_offer (HlChecker *checker, HlFinding *finding, const char *key);
/* Entropy may not vanish in a component. */
void                hl_check_entropy (HlChecker *checker);
/* Pressure may not rise from the port "inlet" to "outlet". */
void                hl_check_pressure_falls (HlChecker *checker);
G_END_DECLS
