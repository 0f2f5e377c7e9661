/* SPDX-License-Identifier: MIT */
/* What --help and --version print, made from the tables. */
#ifndef CLI_HELP_H
#define CLI_HELP_H

#include <stdio.h>

#include "cli/command.h"

/* Help for a command, or the general help for the screens' row. */
void help_print(FILE *out, const struct command *command);

/* Name, version, licence, data sets with their hash. */
void version_print(FILE *out);

/* SHA-256 of the built-in data files, joined in the order of their names, in
 * hexadecimal. */
const char *data_hash(void);

#endif
