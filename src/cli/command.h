/* SPDX-License-Identifier: MIT */
/* The one table of commands. */
#ifndef CLI_COMMAND_H
#define CLI_COMMAND_H

#include <stdbool.h>

#include "base/status.h"
#include "cli/option.h"

struct request;

/* name: NULL for the screens. operands: as in the usage line. least, most:
 * how many operands stand (most -1: any number). summary: what it does, for a
 * list of commands; about: sentences for its help and the manual; example: a
 * call without the program's name. run carries the command out; the request's
 * study is open. */
struct command {
    enum command_id id;
    const char *name;
    const char *operands;
    int least, most;
    const char *summary;
    const char *about;
    const char *example;
    bool (*run)(struct request *request, struct status *st);
};

/* Row of an id; its id is i, 0 <= i < COMMAND_COUNT. */
const struct command *command_at(int i);

/* By name, or NULL. */
const struct command *command_find(const char *name);

#endif
