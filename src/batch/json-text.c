/* A small JSON writer: indentation, commas, escapes.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#include "batch/json-text.h"

#include <math.h>
#include "batch/number.h"

#define MAX_DEPTH 16

struct _HlJsonText {
  GString *text;
  guint    depth;
  char     closing[MAX_DEPTH];
  gboolean has_members[MAX_DEPTH], is_flat[MAX_DEPTH];
};

HlJsonText *
hl_json_text_new (void)
{
  HlJsonText *self = g_new0 (HlJsonText, 1);
  self->text = g_string_new (NULL);
  return self;
}

static void
write_string (GString *text, const char *string)
{
  g_string_append_c (text, '"');
  for (const char *c = string; *c != '\0'; c++)
    if (*c == '"' || *c == '\\')
      g_string_append_printf (text, "\\%c", *c);
    else if (*c == '\n')
      g_string_append (text, "\\n");
    else if ((guchar) *c < 0x20 || *c == 0x7f)
      g_string_append_printf (text, "\\u%04x", (guint) *c);
    else
      g_string_append_c (text, *c);
  g_string_append_c (text, '"');
}

static void
write_line_start (HlJsonText *self)
{
  if (self->depth == 0 || self->is_flat[self->depth - 1])
    return;
  g_string_append_printf (self->text, "\n%*s", 2 * (int) self->depth, "");
}

static void
begin_member (HlJsonText *self, const char *name)
{
  if (self->depth > 0)
    {
      gboolean *has_members = &self->has_members[self->depth - 1];
      if (*has_members)
        g_string_append (self->text, self->is_flat[self->depth - 1] ? ", " : ",");
      *has_members = TRUE;
    }
  write_line_start (self);
  if (name != NULL)
    {
      write_string (self->text, name);
      g_string_append (self->text, ": ");
    }
}

void
hl_json_text_begin (HlJsonText *self, const char *name, char bracket, gboolean is_flat)
{
  g_return_if_fail (self->depth < MAX_DEPTH);
  begin_member (self, name);
  g_string_append_c (self->text, bracket);
  self->closing[self->depth] = bracket == '{' ? '}' : ']';
  self->has_members[self->depth] = FALSE;
  self->is_flat[self->depth] = is_flat || (self->depth > 0 && self->is_flat[self->depth - 1]);
  self->depth++;
}

void
hl_json_text_end (HlJsonText *self)
{
  g_return_if_fail (self->depth > 0);
  guint inner = --self->depth;
  if (self->has_members[inner] && !self->is_flat[inner])
    g_string_append_printf (self->text, "\n%*s", 2 * (int) inner, "");
  g_string_append_c (self->text, self->closing[inner]);
}

void
hl_json_text_number (HlJsonText *self, const char *name, double value)
{
  char digits[HL_NUMBER_SIZE];
  begin_member (self, name);
  if (isfinite (value))
    g_string_append_len (self->text, digits, (gssize) hl_number_print (value, digits));
  else
    g_string_append (self->text, "null");
}

void
hl_json_text_string (HlJsonText *self, const char *name, const char *value)
{
  begin_member (self, name);
  write_string (self->text, value);
}

void
hl_json_text_boolean (HlJsonText *self, const char *name, gboolean value)
{
  begin_member (self, name);
  g_string_append (self->text, value ? "true" : "false");
}

char *
hl_json_text_finish (HlJsonText *self)
{
  g_return_val_if_fail (self->depth == 0, NULL);
  g_string_append_c (self->text, '\n');
  char *text = g_string_free (self->text, FALSE);
  g_free (self);
  return text;
}
