/* Random work in a window: no warning, no crash, and undoing everything gives the first plant back byte for byte.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "windows.h"

#define ROUNDS 4
#define ACTIONS 500      /* a round; each makes a step at most, and the history holds more */

static int
any (GRand *rand, guint n)
{
  return g_rand_int_range (rand, 0, (gint32) MAX (1, n));
}

static const HlComponent *
any_component (HlWindow *window, GRand *rand)
{
  HlPlant *plant = plant_of (window);
  guint n = hl_plant_n_components (plant);
  return n > 0 ? hl_plant_component (plant, (guint) any (rand, n)) : NULL;
}

static const HlStream *
any_stream (HlWindow *window, GRand *rand)
{
  HlPlant *plant = plant_of (window);
  guint n = hl_plant_n_streams (plant);
  return n > 0 ? hl_plant_stream (plant, (guint) any (rand, n)) : NULL;
}

static const char *
any_port (const HlComponent *component, GRand *rand)
{
  guint n = hl_component_n_ports (component);
  return n > 0 ? hl_component_port (component, (guint) any (rand, n)).key : "none";
}

/* --- what the monkey does ----------------------------------------------------------------- */

static void
add (HlWindow *window, GRand *rand)
{
  const HlKind *kind = hl_kind_nth ((guint) any (rand, hl_kind_count ()));
  if (hl_plant_n_components (plant_of (window)) < 40)
    act (window, "add-component-at", "(sii)", kind->id, any (rand, 90), any (rand, 60));
}

static void
insert (HlWindow *window, GRand *rand)
{
  const HlStream *stream = any_stream (window, rand);
  if (stream != NULL)
    act (window, "insert-component", "(ssiii)", hl_kind_nth ((guint) any (rand, hl_kind_count ()))->id, stream->id,
         any (rand, 90), any (rand, 60), any (rand, 4));
}

static void
connect (HlWindow *window, GRand *rand)
{
  const HlComponent *a = any_component (window, rand), *b = any_component (window, rand);
  if (a != NULL)
    act (window, "connect", "(ssss)", a->id, any_port (a, rand), b->id, any_port (b, rand));
}

static void
branch (HlWindow *window, GRand *rand)
{
  const HlComponent *a = any_component (window, rand);
  const HlStream *stream = any_stream (window, rand);
  if (a != NULL && stream != NULL)
    act (window, "branch", "(sssiii)", a->id, any_port (a, rand), stream->id, any (rand, 90), any (rand, 60), any (rand, 4));
}

static void
join (HlWindow *window, GRand *rand)
{
  const HlComponent *a = any_component (window, rand), *b = any_component (window, rand);
  if (a != NULL)
    act (window, "join-shaft", "(ss)", a->id, b->id);
}

static void
choose (HlWindow *window, GRand *rand)
{
  HlSession *session = hl_window_session (window);
  const HlComponent *component = any_component (window, rand);
  const HlStream *stream = any_stream (window, rand);
  if (component != NULL && any (rand, 3) > 0)
    hl_session_select (session, component->id, any (rand, 2));
  else if (stream != NULL)
    hl_session_select (session, stream->id, any (rand, 2));
}

static void
edit_selection (HlWindow *window, GRand *rand)
{
  static const char *const actions[] = { "turn", "mirror", "delete", "duplicate", "copy", "cut", "paste", "join-selection", "leave-shaft", "reset-label",
                                         "select-all", "deselect" };
  /* Whole plants are not copied: they would double with every turn. */
  guint n, which = (guint) any (rand, G_N_ELEMENTS (actions));
  hl_session_selection (hl_window_session (window), &n);
  if (n < 6 || which < 3)
    act (window, actions[which], NULL);
}

static void
move (HlWindow *window, GRand *rand)
{
  static const char *const edges[] = { "left", "centre", "right", "top", "middle", "bottom" };
  switch (any (rand, 4))
    {
    case 0: act (window, "move", "(ii)", any (rand, 21) - 10, any (rand, 21) - 10); break;
    case 1: act (window, "nudge", "(ii)", any (rand, 3) - 1, any (rand, 3) - 1); break;
    case 2: act (window, "align", "s", edges[any (rand, G_N_ELEMENTS (edges))]); break;
    default: act (window, "distribute", "s", any (rand, 2) ? "across" : "down"); break;
    }
}

static void
type (HlWindow *window, GRand *rand)
{
  static const char *const texts[] = { "80 bar", "0.85", "480 °C", "", "=", "-3", "1e300", "12 MW", "=2*", "kg", "0", "=plant.net_power", "5 K", "35 t/h", "½" };
  const HlComponent *component = any_component (window, rand);
  g_autofree char *address = NULL;
  guint n = component != NULL ? hl_component_n_quantities (component) : 0;
  if (n > 0)
    address = g_strdup_printf ("%s.%s", component->id, hl_component_quantity (component, (guint) any (rand, n)).key);
  act (window, "set-value", "(ss)", address != NULL ? address : "plant.net_power", texts[any (rand, G_N_ELEMENTS (texts))]);
}

static void
drag_about (HlWindow *window, GRand *rand)
{
  HlCanvas *canvas = canvas_of (window);
  int width = gtk_widget_get_width (GTK_WIDGET (canvas)), height = gtk_widget_get_height (GTK_WIDGET (canvas));
  double x = any (rand, (guint) width), y = any (rand, (guint) height);
  const HlComponent *component = any_component (window, rand);
  if (component != NULL && any (rand, 3) > 0)
    locate (canvas, component->id, any (rand, 2) && hl_component_n_ports (component) > 0 ? any_port (component, rand) : NULL, &x, &y);
  drag (canvas, x, y, any (rand, (guint) width), any (rand, (guint) height));
}

static void
look_about (HlWindow *window, GRand *rand)
{
  static const char *const views[] = { "zoom-in", "zoom-out", "zoom-fit", "zoom-normal" };
  static const char *const tabs[] = { "state", "heat", "bands", "ledger", "findings" };
  static const char *const units[] = { "metric", "si", "us" };
  switch (any (rand, 3))
    {
    case 0: act (window, views[any (rand, G_N_ELEMENTS (views))], NULL); break;
    case 1: act (window, "tab", "s", tabs[any (rand, G_N_ELEMENTS (tabs))]); break;
    default: g_action_group_change_action_state (G_ACTION_GROUP (window), "units", g_variant_new_string (units[any (rand, G_N_ELEMENTS (units))])); break;
    }
}

static void
go_back_or_forth (HlWindow *window, GRand *rand)
{
  act (window, any (rand, 3) ? "undo" : "redo", NULL);
}

static void
mend (HlWindow *window, GRand *rand)
{
  HlSession *session = hl_window_session (window);
  HlSolution *solution = hl_session_solution (session);
  guint n = hl_solution_n_findings (solution);
  const HlFinding *finding = n > 0 ? hl_solution_finding (solution, (guint) any (rand, n)) : NULL;
  if (finding != NULL && finding->n_mends > 0)
    hl_session_mend (session, &finding->mends[any (rand, finding->n_mends)], NULL);
}

static void (*const deeds[]) (HlWindow *window, GRand *rand) = {
  add, add, insert, connect, connect, connect, branch, join, choose, choose, choose, edit_selection, edit_selection, move, type, type, drag_about, look_about,
  go_back_or_forth, mend,
};

/* A round from a demo plant or an empty sheet, all of it undone at the end. */
static void
test_undoing_everything_gives_the_first_plant_back (void)
{
  g_autoptr (GRand) rand = g_rand_new_with_seed (20261201);
  static const char *const begin[] = { "tallow-fen.heatloom", NULL, "linden-row.heatloom" };
  for (int round = 0; round < ROUNDS; round++)
    {
      HlWindow *window = new_window ();
      g_autofree char *before = NULL, *after = NULL;
      guint n_steps = 0;
      if (begin[round % 3] != NULL)
        act (window, "open-demo", "s", begin[round % 3]);
      before = hl_plant_to_json (plant_of (window));
      for (int n = 0; n < ACTIONS; n++)
        {
          deeds[any (rand, G_N_ELEMENTS (deeds))] (window, rand);
          while (n % 10 == 0 && g_main_context_iteration (NULL, FALSE))
            ;
        }
      spin (20);
      while (hl_session_can_undo (hl_window_session (window)))
        {
          hl_session_undo (hl_window_session (window));
          n_steps++;
        }
      after = hl_plant_to_json (plant_of (window));
      g_assert_cmpstr (after, ==, before);
      g_test_message ("round %d: %u steps undone", round, n_steps);
      g_assert_cmpuint (n_steps, >, 20);
      g_assert_false (hl_session_is_dirty (hl_window_session (window)));
      end_window (window);
    }
}

int
main (int argc, char **argv)
{
  if (!windows_init (&argc, &argv))
    return 0;
  g_test_add_func ("/app/monkey/undo", test_undoing_everything_gives_the_first_plant_back);
  return windows_run ();
}
