/* Collecting findings and their mends.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "engine/finding.h"
G_BEGIN_DECLS

typedef struct {
  GArray *list;         /* HlFinding */
} HlFindings;

void       hl_findings_init  (HlFindings *findings);
void       hl_findings_clear (HlFindings *findings);
/* Takes @text.  The pointer is good until the next one is added. */
HlFinding *hl_findings_add   (HlFindings *findings, HlGrade grade, const char *code, HlAddress at, char *text);
/* Takes @text. */
void       hl_finding_mend   (HlFinding *finding, HlMendKind kind, HlAddress address, double value, char *text);
void       hl_finding_mend_medium (HlFinding *finding, HlAddress stream, const char *medium, char *text);
/* Gravest first, otherwise as they came. */
void       hl_findings_sort  (HlFindings *findings);
/* Moves those that the plant says are dismissed to @dismissed, which becomes a list. */
void       hl_findings_set_aside (HlFindings *findings, const HlPlant *plant, HlFindings *dismissed);
gboolean   hl_findings_have  (const HlFindings *findings, HlGrade at_least);
G_END_DECLS
