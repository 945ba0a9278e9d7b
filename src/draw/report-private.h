/* How the report is written: pages that fill from the top, headings that are found again, tables that break.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "draw/report.h"
#include "draw/tables.h"
G_BEGIN_DECLS

#define HL_REPORT_BODY  12.4      /* sizes of text [pixels at 96 dpi] */
#define HL_REPORT_SMALL 10.2
#define HL_REPORT_HEAD  18.0

typedef struct { char *title; int page; } HlReportSection;
typedef struct {
  cairo_t             *cr;
  cairo_surface_t     *surface;
  HlTheme              theme;
  const HlPlant       *plant;
  const HlSolution    *solution;
  const HlSheetFields *fields;
  HlPaper              paper;          /* of the drawing */
  gboolean             is_counting;    /* the first pass finds the pages of the sections, the second writes */
  double               page_width, page_height;    /* portrait [pixels] */
  double               width, height;  /* of this page */
  double               left, right, top, bottom, y;
  int                  page, n_pages;
  int                  column;         /* 0 and 1 where two stand side by side, -1 where there is one */
  double               column_top, lowest;
  GArray              *sections;       /* of HlReportSection, as this pass comes to them */
  const GArray        *contents;       /* those of the first pass; NULL in it */
} HlReport;

void hl_report_page       (HlReport *report, gboolean is_landscape);      /* a new one, with head and foot */
void hl_report_bare_page  (HlReport *report, double width, double height);
void hl_report_room       (HlReport *report, double height);              /* a new column or page unless so much is left */
void hl_report_break      (HlReport *report);                             /* a new column or page */
void hl_report_columns    (HlReport *report, gboolean are_two);           /* from here on */
void hl_report_section    (HlReport *report, const char *title);          /* numbered, in contents and bookmarks */
void hl_report_mark       (HlReport *report, const char *title, gboolean is_shown);
void hl_report_heading    (HlReport *report, const char *title);
void hl_report_paragraph  (HlReport *report, const char *text, double size, gboolean is_bold, gboolean is_quiet);
void hl_report_pair       (HlReport *report, const char *name, const char *value);
void hl_report_gap        (HlReport *report, double height);

/* Columns of a table, -1 last, as wide as those of @like (nullable) need to be; @last_heading (nullable) adds an empty box to tick at the end of each row. */
void hl_report_table      (HlReport *report, const HlTable *table, const HlTable *like, const int *columns, double size, const char *last_heading);

/* report-second-law.c: nothing where nothing is known. */
void hl_report_exchangers (HlReport *report);
void hl_report_exergy     (HlReport *report);

void hl_report_write      (HlReport *report);       /* the content */
G_END_DECLS
