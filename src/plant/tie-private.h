/* The inside of ties: their steps, and what reading and writing share.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "plant/component.h"
G_BEGIN_DECLS

typedef enum {
  HL_TIE_NUMBER,
  HL_TIE_QUANTITY,
  HL_TIE_NEGATE,
  HL_TIE_ADD,
  HL_TIE_SUBTRACT,
  HL_TIE_MULTIPLY,
  HL_TIE_DIVIDE,
  HL_TIE_MIN,
  HL_TIE_MAX,
  HL_TIE_SQRT,
} HlTieOp;

/* One step of a calculation that runs from the first to the last; operands are earlier steps. */
typedef struct {
  HlTieOp     op;
  guint       n, first;       /* operands: how many, and the first of them in HlTie.operands */
  double      number;         /* of NUMBER [SI] */
  HlDimension dimension;      /* of NUMBER: how it is shown; a difference of temperatures is told from a temperature */
  guint       quantity;       /* of QUANTITY: place in HlTie.of */
} HlTieStep;

#define HL_TIE_MOST_STEPS 256

struct _HlTie {
  guint      n_steps, n_operands, n_of;
  HlTieStep *steps;
  guint     *operands;
  HlAddress *of;              /* each quantity once */
  char      *text;            /* as in a file */
  gboolean   is_linear;
  gboolean   is_level_free;   /* true in °C as in K: levels enter with a weight of 1 in all, or 0 for a difference */
};

/* A tie under construction: steps are added operands first. */
typedef struct {
  GArray *steps, *operands, *of;
} HlTieDraft;
void         hl_tie_draft_init     (HlTieDraft *draft);
void         hl_tie_draft_clear    (HlTieDraft *draft);
guint        hl_tie_draft_number   (HlTieDraft *draft, double number, HlDimension dimension);
guint        hl_tie_draft_quantity (HlTieDraft *draft, const HlAddress *of);
guint        hl_tie_draft_op       (HlTieDraft *draft, HlTieOp op, const guint *operands, guint n);
/* Clears the draft; the same draft gives the same pointer. */
const HlTie *hl_tie_intern         (HlTieDraft *draft, gboolean is_level_free);

typedef enum {
  HL_TIE_AS_FILE,             /* "2*C1.steam.p+10000" */
  HL_TIE_AS_TYPED,            /* "2*C1.steam.p + 0.1 bar" */
  HL_TIE_AS_FORMULA,          /* "2 × {1} + 10000" */
  HL_TIE_AS_WORDS,            /* "2 × {1} + 0.1 bar" */
} HlTieStyle;
char *hl_tie_write (const HlTie *tie, HlTieStyle style, HlUnitSet units);

/* Powers of kg, m, s and K, in quarters, so that roots of roots still have one. */
typedef struct { gint8 power[4]; } HlBaseUnits;
HlBaseUnits hl_dimension_base    (HlDimension dimension);
gboolean    hl_base_equal        (HlBaseUnits a, HlBaseUnits b);
gboolean    hl_base_is_none      (HlBaseUnits base);
/* The dimension that has these units; HL_N_DIMENSIONS: none has. */
HlDimension hl_dimension_of_base (HlBaseUnits base);
/* "a pressure"; of what has no name its units: "kg2/m s4".  g_free() */
char       *hl_base_name         (HlBaseUnits base);
HlBaseUnits hl_base_product      (HlBaseUnits a, HlBaseUnits b, int sign);
/* FALSE where the root has no units any more. */
gboolean    hl_base_root         (HlBaseUnits base, HlBaseUnits *root);
G_END_DECLS
