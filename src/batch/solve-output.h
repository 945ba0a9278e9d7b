/* A solution as JSON and as text.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <stdio.h>
#include "batch/command.h"
#include "draw/export.h"
#include "engine/engine.h"
#include "plant/document.h"
G_BEGIN_DECLS

/* @yielded: of HlYield, in order. */
char *hl_solution_json      (const HlSolution *solution, const GArray *yielded);    /* g_free() */
void  hl_print_solution     (FILE *out, const HlSolution *solution, const GArray *yielded);
/* Findings of at least @grade, each with its place and mends. */
void  hl_print_findings     (FILE *out, const HlSolution *solution, HlGrade at_least);
/* Those that the plant says are dismissed. */
void hl_print_dismissed (FILE *out, const HlSolution *solution);
/* Summary, workbook, drawing on paper: mistakes of the command line first, then the files. */
gboolean hl_check_handover  (const HlArguments *arguments, GError **error);
gboolean hl_write_handover  (const HlSolution *solution, HlDocument *document, const HlArguments *arguments, GError **error);   /* @document: its variants go into tables */
/* State diagrams, heat diagrams: mistakes of the command line first, those in @plant too where it is known; then the files. */
gboolean hl_check_pictures  (const HlPlant *plant, const HlArguments *arguments, GError **error);
gboolean hl_write_pictures  (const HlSolution *solution, HlDocument *document, const HlArguments *arguments, GError **error);   /* @document: of --ghost */
/* @component: an index, or -1. */
gboolean hl_write_picture   (const HlSolution *solution, HlPicture picture, int component, const char *path, GError **error);
/* How the result moves with 1 % more of each value put in, the largest effect first. */
void  hl_print_sensitivity  (FILE *out, const HlSolution *solution, const HlAddress *result);
G_END_DECLS
