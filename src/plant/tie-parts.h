/* Parts of an expression while it is read: what each is, and how two become one.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "plant/plant-private.h"
#include "plant/tie-private.h"
#include "plant/units-private.h"
G_BEGIN_DECLS

/* A part of the expression that is read already.
 *
 * A number in °C, °F or barg is a difference plus a datum.  What it stands for shows only in its company: "20 °C + 5 °C" is
 * 25 °C, "T1.exhaust.T - 5 °C" takes 5 K off, and "max(T1.exhaust.T; 60 °C)" means 60 °C as such.  Until then the datum
 * is kept apart.  A bare number takes its unit from its company too. */
typedef struct _Part Part;
struct _Part {
  HlTieOp      op;
  guint        n;
  Part       **operands;
  HlAddress    of;               /* of QUANTITY */
  gboolean     is_constant;      /* no quantity in it */
  gboolean     is_bare;          /* a number that nobody gave a unit */
  gboolean     is_unknown;       /* a quantity that the plant does not have: fits everywhere */
  double       number, datum;    /* of NUMBER [SI] */
  const HlUnit *unit;            /* the unit with a datum that was used in it */
  HlBaseUnits  base;
  HlDimension  dimension;        /* how a number beside it is meant and shown; HL_N_DIMENSIONS: none has these units */
  double       weight;           /* temperatures: how often the zero point counts; NaN: cannot be said */
};

typedef struct {
  const HlPlant *plant;
  HlDimension    dimension;      /* of the quantity that gets the value */
  gboolean       is_file;        /* bare numbers are SI, and quantities may have vanished */
  const char    *text, *at;
  guint          depth;
  GPtrArray     *parts;          /* all of them, to be freed */
  GError       **error;
} Parser;

/* Sets the parser's error: what was read, and why not; always NULL. */
gpointer hl_tie_refuse (Parser *parser, const char *format, ...) G_GNUC_PRINTF (2, 3);

/* Each returns the new part, or NULL with the parser's error.  Parts live as long as the parser. */
Part    *hl_part_new      (Parser *parser, HlTieOp op, Part *const *operands, guint n);
Part    *hl_part_negate   (Parser *parser, Part *part);
Part    *hl_part_add      (Parser *parser, Part *left, Part *right, gboolean subtract);
Part    *hl_part_multiply (Parser *parser, Part *left, Part *right, gboolean divide);
Part    *hl_part_root     (Parser *parser, Part *part);
Part    *hl_part_extreme  (Parser *parser, HlTieOp op, Part **list, guint n);    /* MIN or MAX */
void     hl_part_free     (gpointer part);
G_END_DECLS
