/* What happens to the medium inside components, collected for state diagrams.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/model.h"
#include "engine/solution.h"
G_BEGIN_DECLS

/* State at a node as far as it is known. */
typedef struct {
  gboolean has_flow, has_pressure, has_state, is_service;
  double   m, p;
  HlState  st;
} HlNodeResult;

typedef struct {
  const HlModel      *model;
  const HlNodeResult *states;      /* by node */
  const HlComponent  *component;
  int                 index;
  GArray             *out;         /* HlProcess */
  const gboolean     *is_known;    /* of variables */
} HlProcessSink;

int  hl_process_node     (const HlProcessSink *sink, const char *port);          /* -1 when not connected */
/* Adds the way from one node to another, where both states are known; with the isentropic end for machines. */
void hl_process_add      (HlProcessSink *sink, HlProcessKind kind, int from, int to);
/* The same where one end lies inside the component. */
void hl_process_add_to   (HlProcessSink *sink, HlProcessKind kind, int from, const HlState *to);
void hl_process_add_from (HlProcessSink *sink, HlProcessKind kind, const HlState *from, int to);
gboolean hl_process_own  (const HlProcessSink *sink, const char *key, double *value);   /* SI */
/* Cooling at the pressure of @from, then a drop to that of @to at constant enthalpy: a steam trap behind the heating surface.
 * Where the pressure does not fall, or that state is not known, plain cooling. */
void hl_process_add_trapped (HlProcessSink *sink, int from, int to);
G_END_DECLS
