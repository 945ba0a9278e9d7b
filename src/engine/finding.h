/* Findings: what is missing, contradictory, infeasible or against good practice, and how to mend it.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "plant/plant.h"
G_BEGIN_DECLS

typedef enum { HL_GRADE_HINT, HL_GRADE_CAUTION, HL_GRADE_WARNING, HL_GRADE_ERROR } HlGrade;
HL_PUBLIC const char *hl_grade_id   (HlGrade grade);     /* "caution" */
HL_PUBLIC const char *hl_grade_name (HlGrade grade);     /* translated */

typedef enum {
  HL_MEND_GIVE,            /* set @address to @value as assumed (a deficit) */
  HL_MEND_LET_GO,          /* let @address be found (a surplus) */
  HL_MEND_EDIT,            /* nothing automatic: go to @address and change it */
  HL_MEND_INSERT_VALVE,    /* insert a throttle valve in stream @address.id */
  HL_MEND_CONNECT,         /* go to the open port @address (component, port key) */
  HL_MEND_MEDIUM,          /* make the whole circuit of stream @address.id carry @medium */
} HlMendKind;

typedef struct {
  HlMendKind kind;
  HlAddress  address;
  double     value;        /* SI; of GIVE */
  char      *text;         /* translated button text: "Give exhaust pressure of T1: 0.07 bar" */
  const char *medium;      /* interned id of a medium; of MEDIUM, else NULL */
} HlMend;

typedef struct {
  HlGrade   grade;
  const char *code;        /* static, stable: "missing-value", "surplus-value", "open-port", "temperature-cross", "exhaust-moisture" ... */
  char     *text;          /* translated sentence: what, where, how much */
  const char *source;      /* translated: where a limit of practice comes from; NULL for laws and structure */
  HlAddress at;            /* what it is about; key "" for the whole component or plant */
  guint     n_mends;
  HlMend   *mends;
} HlFinding;

/* Hints and cautions may be put aside (hl_plant_with_dismissed()); what is wrong may not. */
HL_PUBLIC gboolean hl_finding_may_be_dismissed (const HlFinding *finding);

/* What the window does when a mend button is pressed.  NULL with error where it cannot; EDIT and CONNECT return the plant itself. */
HL_PUBLIC HlPlant *hl_mend_apply (const HlMend *mend, HlPlant *plant, GError **error);
G_END_DECLS
