/* The calculation note: every found number of a solution with its equation, in the order of solving.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/solution.h"
G_BEGIN_DECLS

/* A number that appears in the note. */
typedef struct {
  HlAddress   address;      /* key "" where no address reaches it, as for a sum inside */
  char       *name;         /* translated: "internal power of T1" */
  HlDimension dimension;
  double      value;        /* SI */
  char       *shown;        /* with its unit, in the plant's unit set */
  HlOrigin    origin;
  char       *source;       /* translated: "given", "assumed; common practice ...", "tied: =...", "found" */
} HlNoteTerm;

typedef enum {
  HL_NOTE_EQUATION,         /* solved, alone or with others */
  HL_NOTE_STATE,            /* a property of a stream, from its pressure and enthalpy */
  HL_NOTE_RESULT,           /* a result of the plant that is read from all states */
} HlNoteKind;

typedef struct {
  HlNoteKind  kind;
  guint       step, n_together;     /* from 1, in solving order; how many lines share this step because they are solved together */
  guint       n_terms, result;      /* terms[result] is what this line finds */
  HlNoteTerm *terms;
  char       *formula;              /* SI, untranslated, with {k} for terms[k] */
  char       *words, *numbers;      /* translated: the equation with names, and with numbers and units put in */
  const char *source;               /* translated: where the equation comes from */
  const char *properties;           /* formulation of the medium's properties; NULL where none is called */
  const HlFluid *fluid, *other_fluid;   /* the medium, and that of the cold side where an exchanger has two; or NULL */
} HlNoteLine;

typedef struct _HlNote HlNote;
/* Of a plant that is not solved, the lines of what is known. */
HL_PUBLIC HlNote           *hl_note_new      (const HlSolution *solution);
HL_PUBLIC void              hl_note_free     (HlNote *note);
G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlNote, hl_note_free)
/* What was put in: given, assumed. */
HL_PUBLIC guint             hl_note_n_inputs (const HlNote *note);
HL_PUBLIC const HlNoteTerm *hl_note_input    (const HlNote *note, guint n);
/* What was found. */
HL_PUBLIC guint             hl_note_n_lines  (const HlNote *note);
HL_PUBLIC const HlNoteLine *hl_note_line     (const HlNote *note, guint n);
HL_PUBLIC char             *hl_note_to_text  (const HlNote *note);    /* g_free() */
G_END_DECLS
