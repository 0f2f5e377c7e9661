/* SPDX-License-Identifier: MIT */
/* Commands: what one is, and the list of them. */
#ifndef CLI_COMMAND_H
#define CLI_COMMAND_H

#include <stdbool.h>

#include "base/status.h"
#include "cli/option.h"

struct request;

/* Which species, quantities and sets a command works from where the call does
 * not say. */
struct command_manner {
    bool chooses;        /* operands are species; none means all elements */
    bool all_quantities; /* not only the usual ones */
    bool all_sets;       /* every reference, not the default one */
    bool one_set;        /* at most one reference of a quantity */
    bool needs_models;   /* a quantity asked for by name must have one of the
                            models named */
    bool sets_beside;    /* a second set stands beside the models, not in their
                            place */
    bool needs_terminal;
};

/* name: NULL for the screens. operands: as in the usage line. least, most:
 * how many operands there may be (most -1: any number). options ends with NULL.
 * summary: what it does, for a list of commands; about: sentences for its help
 * and the manual; example: a call without the program's name. state_size: bytes
 * that the command's own options fill in (request->state, zero at the start).
 * run carries the command out; the request's study is open. */
struct command {
    const char *name;
    const char *operands;
    int least, most;
    struct command_manner manner;
    const struct option *const *options;
    const char *summary;
    const char *about;
    const char *example;
    size_t state_size;
    bool (*run)(struct request *request, struct status *st);
};

/* What a selection is, for the `about` of commands that take some. */
#define COMMAND_SELECTION                                                      \
    "A selection is a symbol, name or atomic number (Fe, iron, 26), an ion "   \
    "that carries its charge (Fe3+, Cs+, O2-) and may carry its site "         \
    "(Co3+@VI,low, Sr2+@12, Fe2+@all for every stored one), a run by atomic "  \
    "number "                                                                  \
    "(Sc-Zn), period:4, group:13, block:d, block:4f, or an isoelectronic "     \
    "series (electrons:10); - reads selections from "                          \
    "standard input, one per line. What is chosen twice counts once."

extern const struct command command_screens;
extern const struct command command_print; /* list */
extern const struct command command_compare;
extern const struct command command_atom;
extern const struct command command_audit;
extern const struct command command_sources;

/* All commands; the first is the call without one. */
extern const struct command *const command_list[];
extern const int command_list_count;

/* By name, or NULL. */
const struct command *command_find(const char *name);

/* True when a command takes the option. */
bool command_takes(const struct command *command, const struct option *option);

/* All options of all commands, each once, in the order of their names; gives
 * how many. */
#define COMMAND_OPTIONS_MAX 96
int command_options(const struct option *options[COMMAND_OPTIONS_MAX]);

/* The option of any command with this long name without dashes (length bytes),
 * or with this letter; NULL when there is none. */
const struct option *command_option(const char *name, size_t length);
const struct option *command_option_letter(char letter);

#endif
