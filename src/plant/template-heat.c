/* Templates of plants that deliver process steam: extraction-condensing and back-pressure.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "plant/template-draft.h"
#include "plant/i18n.h"
#include <math.h>

/* Live steam to the turbine, its set, and the water side that both have: user, deaerator with make-up, feed pump. */
static void
put_common (HlDraft *draft, int turbine_x, int extractions, int tank_x, int user_x)
{
  const char *const joins[] = { "T1", "G1" };
  const HlGridPoint bends[] = { { tank_x + 8, 45 }, { tank_x + 8, extractions > 0 ? 38 : 37 } };
  hl_draft_put (draft, "boiler", "B1", _("boiler"), 8, 26, FALSE, NULL, 0);
  hl_draft_put (draft, "turbine", "T1", _("turbine"), turbine_x, 9, FALSE, "extractions", extractions);
  hl_draft_put (draft, "generator", "G1", _("generator"), turbine_x + 12, 9, FALSE, NULL, 0);
  hl_draft_shaft (draft, joins, G_N_ELEMENTS (joins));
  hl_draft_put (draft, "steam_user", "U1", _("process"), user_x, 26, FALSE, NULL, 0);
  hl_draft_put (draft, "open_heater", "D1", _("deaerator"), tank_x, 37, FALSE, "inlets", extractions > 0 ? 3 : 2);
  hl_draft_put (draft, "make_up", "W1", _("make-up water"), tank_x + 18, 45, TRUE, NULL, 0);
  hl_draft_put (draft, "pump", "P2", _("feed pump"), 22, 46, TRUE, NULL, 0);
  hl_draft_assume (draft, "U1.return_fraction", 0.7);
  hl_draft_assume (draft, "U1.heat", 8e6);
  hl_draft_assume (draft, "T1.inlet.p", 45e5);
  hl_draft_assume (draft, "B1.steam.T", 793.15);
  hl_draft_line (draft, "B1.steam", "T1.inlet", HL_LANE (8, 4, turbine_x - MAX (2, extractions + 1)));
  hl_draft_line (draft, "D1.outlet", "P2.inlet", HL_BEND (tank_x, 46));
  hl_draft_line (draft, "P2.outlet", "B1.feed", HL_BEND (8, 46));
  hl_draft_assume (draft, "U1.condensate.p", NAN);        /* that of the deaerator */
  hl_draft_line (draft, "W1.outlet", extractions > 0 ? "D1.inlet3" : "D1.inlet1", bends, G_N_ELEMENTS (bends));
}

HlPlant *
hl_template_extraction_build (void)
{
  HlDraft draft = hl_draft_begin (g_strdup (_("Extraction-condensing plant")));
  put_common (&draft, 34, 2, 50, 33);
  hl_draft_put (&draft, "condenser", "C1", _("condenser"), 70, 26, FALSE, NULL, 0);
  hl_draft_assume (&draft, "C1.cooling_inlet_T", 293.15);
  hl_draft_put (&draft, "pump", "P1", _("condensate pump"), 62, 37, TRUE, NULL, 0);
  hl_draft_line (&draft, "T1.extraction1", "U1.steam", HL_STRAIGHT);
  hl_draft_line (&draft, "T1.extraction2", "D1.steam", HL_LANE (35, 18, 50));
  hl_draft_line (&draft, "T1.exhaust", "C1.steam", HL_LANE (37, 15, 70));
  hl_draft_line (&draft, "C1.condensate", "P1.inlet", HL_BEND (70, 37));
  hl_draft_line (&draft, "P1.outlet", "D1.inlet1", HL_STRAIGHT);
  hl_draft_line (&draft, "U1.condensate", "D1.inlet2", HL_BEND (33, 37));
  return hl_draft_end (&draft);
}

HlPlant *
hl_template_back_pressure_build (void)
{
  HlDraft draft = hl_draft_begin (g_strdup (_("Back-pressure plant")));
  put_common (&draft, 30, 0, 50, 32);
  hl_draft_put (&draft, "splitter", "X1", "", 32, 18, TRUE, NULL, 0);
  hl_draft_turn (&draft, "X1", 3);
  hl_draft_assume (&draft, "T1.exhaust.p", 3e5);
  hl_draft_assume (&draft, "plant.net_power", NAN);       /* power follows the heat */
  hl_draft_line (&draft, "T1.exhaust", "X1.inlet", HL_STRAIGHT);
  hl_draft_line (&draft, "X1.outlet1", "U1.steam", HL_STRAIGHT);
  hl_draft_line (&draft, "X1.outlet2", "D1.steam", HL_BEND (50, 18));
  hl_draft_line (&draft, "U1.condensate", "D1.inlet2", HL_BEND (32, 37));
  return hl_draft_end (&draft);
}
