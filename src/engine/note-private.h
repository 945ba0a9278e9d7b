/* Single lines of the calculation note.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/note.h"
#include "engine/solution-private.h"
G_BEGIN_DECLS

/* The line that finds what is at @address; NULL where it was put in, or is not known. */
HlNoteLine *hl_note_line_at          (const HlSolution *solution, const HlAddress *address);
HlNoteLine *hl_note_line_of_equation (const HlSolution *solution, int equation, int root);
HlNoteLine *hl_note_line_of_state    (const HlSolution *solution, int node, char letter, const HlAddress *address);
void        hl_note_line_free        (HlNoteLine *line);
G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlNoteLine, hl_note_line_free)
HlNoteTerm  hl_note_term_of_var      (const HlSolution *solution, int var);
void        hl_note_term_clear       (HlNoteTerm *term);
/* Where the value of a variable comes from: "given", "found"; g_free(). */
char       *hl_note_origin           (const HlSolution *solution, int root, HlOrigin *origin);
/* For each variable of a block the equation, by place, that is said to find it; g_free(). */
int        *hl_note_pair             (HlSystem *system, const int *equations, const int *vars, int n);
HlNoteLine *hl_note_line_new         (HlNoteKind kind, guint n_terms, guint result);
HlNoteTerm  hl_note_term_of_address  (const HlSolution *solution, const HlAddress *address, double value);
char       *hl_note_fill_in          (const HlNoteLine *line, const char *pattern, gboolean with_numbers);    /* {k} stands for term k */
/* note-exergy.c: lines of the second law; NULL where there is none. */
HlNoteLine *hl_note_line_of_exergy   (const HlSolution *solution, const HlAddress *address);
HlNoteLine *hl_note_line_of_stream_exergy (const HlSolution *solution, int node, const HlAddress *address);
/* The terms of a line other than its result, each once: "\n  name = value  (source)". */
void        hl_note_write_terms      (const HlNoteLine *line, GString *text);
G_END_DECLS
