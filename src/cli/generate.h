/* SPDX-License-Identifier: MIT */
/* The parts of the build's generator; no part of the program. */
#ifndef CLI_GENERATE_H
#define CLI_GENERATE_H

#include <stdio.h>

#include "base/status.h"
#include "cli/option.h"

/* Words of an option, symbols of the elements, names of the commands. */
void generate_words(FILE *out, const struct option *option);
void generate_symbols(FILE *out);
void generate_commands(FILE *out, const char *separator);

/* One completion each. */
void generate_bash(FILE *out);
void generate_zsh(FILE *out);
void generate_fish(FILE *out);

/* The manual: the template's lines, in which @SYNOPSIS@, @COMMANDS@,
 * @OPTIONS@, @QUANTITIES@ and @MODELS@ each stand for a part made from the
 * tables. */
MUST_CHECK bool generate_manual(FILE *out, const char *template_path,
                                struct status *st);

#endif
