/* Plants for tests, written in a few lines of text.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/engine.h"
G_BEGIN_DECLS

/* One item a line:
 *   turbine T1 extractions:1 inlet.p=65e5 ~isentropic_efficiency=0.83     component; option:count, given=, ~assumed=
 *   new condenser C1 steam.p=7000 -cooling_p                              with all its assumed values, less those after -
 *   T1.exhaust > C1.steam                                                 stream, numbered from 1 in order
 *   medium 1 isopentane                                                   the circuit of stream 1 (below its streams)
 *   formulation iapws95
 *   shaft T1 G1
 *   plant net_power=12e6
 *   set T1.exhaust.x=0.9
 * Values in SI.  Ends the test where something is wrong. */
HlPlant *test_plant       (const char *text);
HlPlant *test_plant_set   (HlPlant *plant, const char *address, double value);     /* given; takes @plant */
HlPlant *test_plant_let_go (HlPlant *plant, const char *address);                  /* takes @plant */
double   test_value       (const HlSolution *solution, const char *address);       /* NaN where unknown */
/* Prints all findings and ends the test where the solution is not solved. */
void     test_assert_solved (const HlSolution *solution);
const HlFinding *test_finding (const HlSolution *solution, const char *code);      /* NULL where there is none */
void     test_print       (const HlSolution *solution);
#define  test_assert_near(value, expected, relative) \
  G_STMT_START { double v_ = (value), e_ = (expected); \
    if (!(ABS (v_ - e_) <= (relative) * ABS (e_))) \
      g_error ("%s:%d: %s is %.10g, not %.10g (off by %.2e)", __FILE__, __LINE__, #value, v_, e_, v_ / e_ - 1.0); } G_STMT_END

/* @n copies of the plant side by side, ids with the copy's number; every copy with its own flow at T1's inlet. */
HlPlant *test_plant_copies (const char *text, int n, double flow);
HlPlant *test_plant_copies_of (HlPlant *plant, int n, double flow);

extern const char *const test_simple_loop, *const test_reheat_plant, *const test_large_plant, *const test_industrial_plant;
G_END_DECLS
