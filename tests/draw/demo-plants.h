/* Plants for the tests of pictures, built in code.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include "plant/plant.h"
G_BEGIN_DECLS
HlPlant *hl_demo_simple_loop (void);
HlPlant *hl_demo_extraction  (void);     /* boiler, turbine with two extractions, deaerator, process steam, condenser */
HlPlant *hl_demo_reheat      (void);     /* reheat, closed and open heater, cooling water */
HlPlant *hl_demo_heater_row  (guint n);  /* a turbine with up to eight extractions over a row of closed heaters */
HlPlant *hl_demo_repeated    (guint n);  /* @n copies of the extraction plant side by side */
HlPlant *hl_demo_random      (guint32 seed, guint n_components);   /* boxes strewn apart, ports joined at random */
HlPlant *hl_demo_all_kinds   (int turn, gboolean is_mirrored);     /* one of each, unconnected */
G_END_DECLS
