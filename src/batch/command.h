/* Commands as tables: what each takes, and how its arguments are read.
 * SPDX-License-Identifier: GPL-3.0-or-later */
#pragma once
#include <glib.h>
G_BEGIN_DECLS

typedef enum {
  HL_EXIT_DONE,
  HL_EXIT_PLANT,     /* the plant has errors */
  HL_EXIT_USAGE,     /* the command line is wrong */
  HL_EXIT_FILE,      /* a file cannot be read or written */
} HlExit;

typedef struct {
  const char *name;             /* "json" for --json */
  const char *values;           /* N_("FILE"); one word a value, NULL for a switch */
  gboolean    is_repeatable;
  const char *help;             /* N_("one sentence") */
} HlBatchOption;

typedef struct _HlArguments HlArguments;

typedef struct {
  const char          *name;    /* "solve" */
  const char          *usage;   /* N_("PLANT [options]"); NULL where nothing follows */
  const char          *summary; /* N_("one line for the list of commands") */
  const char          *details; /* N_("paragraphs below the options"), or NULL */
  guint                least, most;             /* words that are not options */
  const HlBatchOption *options; guint n_options;
  HlExit             (*run) (const HlArguments *arguments);
} HlBatchCommand;

extern const HlBatchCommand hl_command_solve, hl_command_check, hl_command_note, hl_command_variants, hl_command_state, hl_command_kinds, hl_command_fluids, hl_command_fuel, hl_command_template;

/* Reads what follows the command's name; complains in full sentences. */
HlArguments *hl_arguments_parse   (const HlBatchCommand *command, int argc, char **argv, GError **error);
void         hl_arguments_free    (HlArguments *arguments);
guint        hl_arguments_n_words (const HlArguments *arguments);
const char  *hl_arguments_word    (const HlArguments *arguments, guint n);
/* The values of the @n-th time that an option was given; NULL when it was not that often. */
char *const *hl_arguments_option  (const HlArguments *arguments, const char *name, guint n);
/* The only value of an option that is given once at most; NULL when it was not given. */
const char  *hl_arguments_value   (const HlArguments *arguments, const char *name);
/* How many of the given options, of those named, write to standard output. */
guint        hl_arguments_count_standard_output (const HlArguments *arguments, const char *const *names);

#define HL_BATCH_ERROR (hl_batch_error_quark ())
GQuark hl_batch_error_quark (void);
typedef enum { HL_BATCH_ERROR_USAGE, HL_BATCH_ERROR_CONTENT } HlBatchError;

/* "heatloom-batch solve PLANT [options]"; g_free(). */
char  *hl_command_usage (const HlBatchCommand *command);
/* Says what is wrong on standard error and returns @status; takes the error. */
HlExit hl_complain (HlExit status, GError *error);

G_DEFINE_AUTOPTR_CLEANUP_FUNC (HlArguments, hl_arguments_free)
G_END_DECLS
