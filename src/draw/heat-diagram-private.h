/* What the files of the heat diagram share: the finished picture.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "draw/heat-diagram.h"
#include "draw/plot-labels.h"
#include "draw/plot-layer.h"
G_BEGIN_DECLS

typedef enum { HL_HEAT_TEXT_TEMPERATURE, HL_HEAT_TEXT_DIFFERENCE, HL_HEAT_TEXT_PINCH, HL_HEAT_TEXT_ZONE } HlHeatTextKind;
typedef struct {
  HlHeatTextKind kind;
  char          *text;
  HlBox          box;
  double         size;
} HlHeatText;
/* A difference that is read off: a thin line from curve to curve. */
typedef struct { HlPoint hot, cold; gboolean is_pinch; } HlHeatGap;

struct _HlHeatDiagram {
  double       width, height, text_size;
  HlHeatCurve *curve;           /* NULL: nothing to show */
  char        *title, *remark;  /* remark: the numbers in words; "" none */
  HlPlotAxis   heat_axis, T_axis;
  HlBox        frame;
  HlPlotLayer *curves;
  GArray      *gaps;            /* of HlHeatGap */
  GArray      *texts;           /* of HlHeatText */
};
G_END_DECLS
