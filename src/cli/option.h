/* SPDX-License-Identifier: MIT */
/* The one table of options. The parser, --help, the manual, the completions
 * and the tests all iterate it. */
#ifndef CLI_OPTION_H
#define CLI_OPTION_H

#include <stdbool.h>
#include <stddef.h>

/* Ids of commands, one bit each in option.commands. COMMAND_SCREENS is the
 * call without a command. */
enum command_id {
    COMMAND_SCREENS,
    COMMAND_LIST,
    COMMAND_COMPARE,
    COMMAND_ATOM,
    COMMAND_AUDIT,
    COMMAND_SOURCES,
    COMMAND_COUNT
};

enum option_id {
    OPTION_QUANTITY,
    OPTION_MODEL,
    OPTION_CHARGE,
    OPTION_SUBSHELL,
    OPTION_CONFIGURATION,
    OPTION_TERM,
    OPTION_REFERENCE,
    OPTION_AGAINST,
    OPTION_COORDINATION,
    OPTION_SPIN,
    OPTION_EVIDENCE,
    OPTION_UNIT,
    OPTION_FUNCTIONAL,
    OPTION_RELATIVITY,
    OPTION_SPEED_OF_LIGHT,
    OPTION_SORT,
    OPTION_SCOPE,
    OPTION_DATA,
    OPTION_FORMAT,
    OPTION_OUTPUT,
    OPTION_FORCE,
    OPTION_COLOR,
    OPTION_ASCII,
    OPTION_BACKGROUND,
    OPTION_HELP,
    OPTION_VERSION,
    OPTION_COUNT
};

/* How often an option may stand and whether it takes an argument. */
enum option_kind {
    OPTION_FLAG,   /* no argument, once */
    OPTION_VALUE,  /* one argument, once */
    OPTION_REPEAT, /* one argument, any number of times */
};

/* Which words an argument is made of (words.h lists them). */
enum word_kind {
    WORDS_NONE, /* free text, a number, or no argument */
    WORDS_QUANTITY,
    WORDS_MODEL,
    WORDS_REFERENCE,
    WORDS_COORDINATION,
    WORDS_SPIN,
    WORDS_EVIDENCE,
    WORDS_SORT,
    WORDS_SCOPE,
    WORDS_UNIT,
    WORDS_SUBSHELL,
    WORDS_TERM,
    WORDS_FUNCTIONAL,
    WORDS_RELATIVITY,
    WORDS_FORMAT,
    WORDS_COLOR,
    WORDS_BACKGROUND,
    WORDS_FILE, /* a path: the shell completes it */
};

/* letter: short form, 0 when there is none. argument: its name in help, NULL
 * for a flag. list: several words parted by commas. help: one clause. */
struct option {
    enum option_id id;
    const char *name;
    char letter;
    const char *argument;
    enum option_kind kind;
    enum word_kind words;
    bool list;
    unsigned commands;
    const char *help;
};

/* The i-th option in the order of the help, 0 <= i < OPTION_COUNT; its id is
 * i. */
const struct option *option_at(int i);

/* By long name without dashes (length bytes), or by letter; NULL when there is
 * none. */
const struct option *option_by_name(const char *name, size_t length);
const struct option *option_by_letter(char letter);

/* True when a command takes the option. */
bool option_belongs(const struct option *option, enum command_id command);

#endif
