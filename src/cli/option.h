/* SPDX-License-Identifier: MIT */
/* Options: what one is, how it reads itself, and those that there are. A
 * command lists the options that it takes; the parser, --help, the manual, the
 * completions and the tests iterate the commands. */
#ifndef CLI_OPTION_H
#define CLI_OPTION_H

#include <stdbool.h>
#include <stddef.h>

#include "base/status.h"

struct reference_list;
struct request;
struct words;

/* How often an option may stand and whether it takes an argument. */
enum option_kind {
    OPTION_FLAG,   /* no argument, once */
    OPTION_VALUE,  /* one argument, once */
    OPTION_REPEAT, /* one argument, any number of times */
};

/* When an option is read: before the study is opened, then what others rest
 * on, then the others; within a stage in the order of the command's list. */
enum option_stage { OPTION_BEFORE, OPTION_FIRST, OPTION_LATER };

/* letter: short form, 0 when there is none. argument: its name in help, NULL
 * for a flag. words fills in the words that an argument is made of, NULL for
 * free text or a number; file: it is a path, which the shell completes. list:
 * several words separated by commas. title: heading under which --help lists
 * the words, or NULL. apart: words that differ by a letter mean other things;
 * none is proposed for another. help: one clause.
 *
 * read understands the argument ("" for a flag) and puts it where it belongs in
 * the request; a repeated option is read once for each argument. It is called
 * when the option was given, with NULL otherwise where `always` says so. Fails
 * with STATUS_USAGE naming option and word, or as the file that it reads.
 * check, where there is one, judges a given argument once the species are
 * chosen. */
struct option {
    const char *name;
    char letter;
    const char *argument;
    enum option_kind kind;
    enum option_stage stage;
    void (*words)(struct words *words, const struct reference_list *references);
    bool file, list, apart, always;
    const char *title;
    const char *help;
    bool (*read)(struct request *request, const struct option *self,
                 const char *value, struct status *st);
    bool (*check)(const struct request *request, const struct option *self,
                  const char *value, struct status *st);
};

extern const struct option option_quantity;
extern const struct option option_model;
extern const struct option option_charge;
extern const struct option option_subshell;
extern const struct option option_configuration;
extern const struct option option_term;
extern const struct option option_reference;
extern const struct option option_against;
extern const struct option option_coordination;
extern const struct option option_spin;
extern const struct option option_evidence;
extern const struct option option_unit;
extern const struct option option_functional;
extern const struct option option_relativity;
extern const struct option option_speed_of_light;
extern const struct option option_sort;
extern const struct option option_scope;
extern const struct option option_data;
extern const struct option option_format;
extern const struct option option_output;
extern const struct option option_force;
extern const struct option option_color;
extern const struct option option_ascii;
extern const struct option option_background;
extern const struct option option_help;
extern const struct option option_version;

/* What every command that prints takes, for the end of its list; and the
 * screens. */
#define OPTIONS_OF_OUTPUT                                                      \
    &option_data, &option_format, &option_output, &option_force,               \
        &option_color, &option_ascii, &option_background, &option_help,        \
        &option_version

#endif
