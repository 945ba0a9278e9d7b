/* Laws that every plant of a test must keep.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "plants.h"
#include "engine/equations.h"
#include "engine/model.h"
#include "engine/solution-private.h"
G_BEGIN_DECLS

/* Exact derivatives against differences: of one equation where it stands, and of all equations around a plant's solution. */
void  test_check_equation    (const HlSystem *system, int number);
void  test_check_derivatives (const char *text);
void  test_assert_balanced   (const HlSolution *solution);
/* Gives every found quantity in turn, so that an assumed one yields, and wants the same solution back.  How many were given. */
guint test_give_each         (const char *text);
/* The plant solved must have a finding of that code and grade whose sentence holds @part. */
void  test_expect_finding    (const char *text, const char *code, HlGrade grade, const char *part);
G_END_DECLS
