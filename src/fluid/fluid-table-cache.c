/* Tables of (p,h) on disk, in the user's cache folder; what does not fit or is damaged is not read.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "fluid/fluid-table-private.h"

#include <string.h>

#define FORM 1                        /* changes whenever the table's layout or making does */

typedef struct {
  char    magic[16];
  guint32 form, size;
  char    equation[72];               /* checksum of what the equation answers, so that a changed one has its own table */
  char    content[72];                /* checksum of the table */
} Header;

/* Numbers that change when a coefficient does. */
static char *
fingerprint (const HlHelmholtz *eq)
{
  HlState states[24];
  memset (states, 0, sizeof states);
  for (guint i = 0; i < G_N_ELEMENTS (states); i++)
    hl_helmholtz_state (eq, eq->dc * (0.03 + 0.12 * i), eq->Tc * (0.7 + 0.031 * (i * 7 % 24)), &states[i]);
  g_autoptr (GChecksum) sum = g_checksum_new (G_CHECKSUM_SHA256);
  for (guint i = 0; i < G_N_ELEMENTS (states); i++)
    {
      const double values[] = { states[i].p, states[i].h, states[i].s, states[i].cv };
      g_checksum_update (sum, (const guchar *) values, sizeof values);
    }
  const double range[] = { eq->T_min, eq->T_max, eq->p_max, eq->Tc, eq->pc, eq->dc, eq->R };
  g_checksum_update (sum, (const guchar *) range, sizeof range);
  return g_strdup (g_checksum_get_string (sum));
}

char *
hl_table_path (const HlHelmholtz *eq)
{
  g_autofree char *equation = fingerprint (eq), *name = g_strdup_printf ("%s-%.16s.table", eq->fluid.id, equation);
  return g_build_filename (g_get_user_cache_dir (), "heatloom", "tables", name, NULL);
}

static void
fill_header (const HlFluidTable *table, Header *header)
{
  g_autofree char *equation = fingerprint (table->eq);
  g_autofree char *content = g_compute_checksum_for_data (G_CHECKSUM_SHA256, (const guchar *) &table->data, sizeof table->data);
  memset (header, 0, sizeof *header);
  g_strlcpy (header->magic, "heatloom table", sizeof header->magic);
  header->form = FORM;
  header->size = (guint32) sizeof table->data;
  g_strlcpy (header->equation, equation, sizeof header->equation);
  g_strlcpy (header->content, content, sizeof header->content);
}

/* TRUE where the file is whole, of this form and of this equation. */
gboolean
hl_table_load (HlFluidTable *table)
{
  g_autofree char *path = hl_table_path (table->eq);
  g_autoptr (GMappedFile) file = g_mapped_file_new (path, FALSE, NULL);
  Header header, expected;
  if (file == NULL || g_mapped_file_get_length (file) != sizeof header + sizeof table->data)
    return FALSE;
  memcpy (&header, g_mapped_file_get_contents (file), sizeof header);
  memcpy (&table->data, g_mapped_file_get_contents (file) + sizeof header, sizeof table->data);
  fill_header (table, &expected);
  if (memcmp (&header, &expected, sizeof header) == 0)
    return TRUE;
  memset (&table->data, 0, sizeof table->data);
  return FALSE;
}

/* A cache that cannot be written is no error: the table is made again next time. */
void
hl_table_save (const HlFluidTable *table)
{
  g_autofree char *path = hl_table_path (table->eq), *folder = g_path_get_dirname (path), *bytes = g_malloc (sizeof (Header) + sizeof table->data);
  Header header;
  fill_header (table, &header);
  memcpy (bytes, &header, sizeof header);
  memcpy (bytes + sizeof header, &table->data, sizeof table->data);
  if (g_mkdir_with_parents (folder, 0700) != 0 || !g_file_set_contents (path, bytes, (gssize) (sizeof header + sizeof table->data), NULL))
    g_debug ("%s cannot be written", path);
}
