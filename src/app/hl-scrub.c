/* Changing a value step by step or under a gesture: solved live, one undoable step.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "app/hl-scrub.h"
#include "plant/i18n.h"

#include <math.h>
#include <string.h>

struct _HlScrub {
  HlSession *session;
  HlAddress  address;      /* where the value lives */
  double     start, now;   /* [SI] */
};

/* --- steps --- */

/* The next lower 1, 2 or 5 of a decade. */
static double
round_step (double size)
{
  double decade = pow (10.0, floor (log10 (size))), lead = size / decade;
  return decade * (lead < 2.0 ? 1.0 : lead < 5.0 ? 2.0 : 5.0);
}

/* What a percent is taken of: the value, or where it is nothing the credible range. */
static double
size_of (const HlQuantityKind *kind, double si, HlUnitSet units)
{
  double shown = fabs (hl_units_to_display (si, kind->dimension, units));

  if (shown > 1e-9)
    return shown;
  shown = fabs (hl_units_to_display (kind->credible_high, kind->dimension, units));
  return isfinite (shown) && shown > 1e-9 ? shown : 1.0;
}

double
hl_scrub_step (const HlQuantityKind *kind, double si, HlUnitSet units, gboolean is_fine)
{
  double step;

  switch (kind->dimension)
    {
    case HL_DIMENSION_TEMPERATURE:
      step = 1.0;
      break;
    case HL_DIMENSION_TEMPERATURE_DIFFERENCE:
      step = 0.5;
      break;
    case HL_DIMENSION_RATIO:
      step = kind->flags & HL_QUANTITY_PERCENT || fabs (si) < 0.1 ? 0.001 : 0.01;
      break;
    case HL_DIMENSION_COUNT:
      step = 1.0;
      break;
    default:
      step = round_step (0.01 * size_of (kind, si, units) * (1.0 + 1e-9));
    }
  return is_fine ? 0.1 * step : step;
}

double
hl_scrub_moved (const HlPlant *plant, const HlQuantityKind *kind, double si, double amount, double step)
{
  HlUnitSet units = hl_plant_units (plant);
  double shown = hl_units_to_display (si, kind->dimension, units) + amount, moved;
  int decimals = CLAMP ((int) ceil (-log10 (step) - 1e-9), 0, 12);
  g_autofree char *text = g_strdup_printf ("%.*f", decimals, step * round (shown / step));

  if (fabs (amount) < 0.5 * step)
    return si;
  /* By way of the text that somebody would type: the same number then stands in entry and file. */
  return hl_units_parse (text, kind->dimension, units, hl_plant_site_pressure (plant), &moved, NULL) ? moved : si;
}

/* --- values --- */

const HlStream *
hl_state_stream (const HlPlant *plant, const HlAddress *address, const char **key)
{
  const char *dot;

  if (address->owner == HL_OWNER_STREAM)
    {
      *key = address->key;
      return hl_plant_find_stream (plant, address->id);
    }
  if (address->owner != HL_OWNER_COMPONENT || (dot = strrchr (address->key, '.')) == NULL
      || hl_stream_quantity_lookup (dot + 1) == NULL)
    return NULL;
  g_autofree char *port = g_strndup (address->key, dot - address->key);
  *key = dot + 1;
  return hl_plant_stream_at (plant, address->id, port);
}

const HlValue *
hl_scrub_value_at (const HlPlant *plant, const HlAddress *address, HlAddress *where)
{
  HlAddress carrier;
  const HlValue *value = hl_plant_value_wherever (plant, address, &carrier);

  if (value == NULL || (value->origin != HL_ORIGIN_GIVEN && value->origin != HL_ORIGIN_ASSUMED) || !isfinite (value->value))
    return NULL;
  if (where != NULL)
    *where = carrier;
  return value;
}

/* Moved by hand it is no longer assumed. */
static HlPlant *
plant_with (HlSession *session, const HlAddress *address, double si, GError **error)
{
  HlValue value = { .origin = HL_ORIGIN_GIVEN, .value = si };
  return hl_plant_with_value (hl_session_base (session), address, &value, error);
}

static char *
step_name (HlSession *session, const HlAddress *address)
{
  g_autofree char *described = hl_plant_describe (hl_session_base (session), address);
  return g_strdup_printf (_("Set %s"), described);
}

gboolean
hl_scrub_by_keys (HlSession *session, const HlAddress *address, int steps, gboolean is_fine, GError **error)
{
  HlPlant *base = hl_session_base (session);
  const HlQuantityKind *kind = hl_plant_quantity_kind (base, address);
  HlAddress where;
  const HlValue *value = hl_scrub_value_at (base, address, &where);

  if (value == NULL || kind == NULL)
    {
      g_set_error_literal (error, HL_PLANT_ERROR, HL_PLANT_ERROR_CONTENT,
                           _("Only a given or assumed value can be moved in steps; type one to give it"));
      return FALSE;
    }
  double step = hl_scrub_step (kind, value->value, hl_plant_units (base), is_fine);
  HlPlant *plant = plant_with (session, &where, hl_scrub_moved (base, kind, value->value, steps * step, step), error);
  if (plant == NULL)
    return FALSE;
  g_autofree char *name = step_name (session, &where);
  hl_session_apply_again (session, name, plant);
  return TRUE;
}

/* --- a gesture --- */

HlScrub *
hl_scrub_begin (HlSession *session, const HlAddress *address)
{
  HlAddress where;
  const HlValue *value = hl_scrub_value_at (hl_session_base (session), address, &where);

  if (value == NULL)
    return NULL;
  HlScrub *scrub = g_new0 (HlScrub, 1);
  scrub->session = g_object_ref (session);
  scrub->address = where;
  scrub->start = scrub->now = value->value;
  return scrub;
}

const HlAddress *
hl_scrub_address (const HlScrub *scrub)
{
  return &scrub->address;
}

double
hl_scrub_start (const HlScrub *scrub)
{
  return scrub->start;
}

gboolean
hl_scrub_to (HlScrub *scrub, double si)
{
  HlPlant *plant;

  if (!(fabs (si - scrub->now) > 0.0))
    return TRUE;
  if ((plant = plant_with (scrub->session, &scrub->address, si, NULL)) == NULL)
    return FALSE;
  scrub->now = si;
  hl_session_preview (scrub->session, plant, TRUE);
  return TRUE;
}

static void
scrub_free (HlScrub *scrub)
{
  g_object_unref (scrub->session);
  g_free (scrub);
}

/* An undo or another edit in between has ended the preview: then there is nothing left to keep. */
void
hl_scrub_finish (HlScrub *scrub)
{
  HlSession *session = scrub->session;

  if (hl_session_plant (session) == hl_session_base (session))
    ;
  else if (!(fabs (scrub->now - scrub->start) > 0.0))
    hl_session_cancel_preview (session);
  else
    {
      g_autofree char *name = step_name (session, &scrub->address);
      hl_session_apply (session, name, hl_plant_ref (hl_session_plant (session)), &scrub->address, FALSE);
    }
  scrub_free (scrub);
}

void
hl_scrub_cancel (HlScrub *scrub)
{
  hl_session_cancel_preview (scrub->session);
  scrub_free (scrub);
}

static gboolean
cancel_idle (gpointer data)
{
  hl_scrub_cancel (data);
  return G_SOURCE_REMOVE;
}

void
hl_scrub_cancel_later (HlScrub *scrub)
{
  g_idle_add (cancel_idle, scrub);
}
