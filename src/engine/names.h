/* Words and numbers for variables and equations, for findings and explanations.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/model.h"
G_BEGIN_DECLS

/* "exhaust pressure of T1": the address that an engineer would look for; free with g_free(). */
HlAddress hl_name_address  (const HlModel *model, int var);
char     *hl_name_var      (const HlModel *model, int var);
char     *hl_name_value    (const HlModel *model, int var);            /* "0.070 bar", in the plant's units */
HlDimension hl_name_dimension (HlVarKind kind);
/* The equation with the names of its variables, or with their numbers. */
char     *hl_name_equation (const HlModel *model, int equation, gboolean with_numbers);
/* The same with {k} where variable k of the equation stands: for people in their language and units, or in SI with all digits. */
char     *hl_name_template (const HlModel *model, int equation, gboolean in_si);
/* "a", "a or b", "a, b or c"; frees nothing. */
char     *hl_name_list     (char *const *names, guint n, gboolean is_choice);
/* "T1", "T1 and C1": components of some equations. */
char     *hl_name_components (const HlModel *model, const int *equations, int n);
G_END_DECLS
