/* SPDX-License-Identifier: MIT */
/* From the words of a call to options and operands: POSIX utility conventions
 * with long options, nothing of what the words mean. */
#ifndef CLI_PARSE_H
#define CLI_PARSE_H

#include "base/status.h"
#include "cli/command.h"
#include "cli/option.h"

#define CALL_OPERANDS_MAX 512
#define CALL_OPTIONS_MAX 128

/* An option that was given, with its argument, "" for a flag. */
struct call_option {
    const struct option *option;
    const char *value;
};

/* Borrowed from argv. options[option_count]: in the order of the call; one that
 * may not be repeated is there at most once. help, version: one of them is in
 * the call, which is then not checked further. */
struct call {
    const struct command *command;
    int option_count;
    struct call_option options[CALL_OPTIONS_MAX];
    int operand_count;
    const char *operands[CALL_OPERANDS_MAX];
    bool help, version;
};

/* The argument of an option, "" for a flag; NULL when it was not given; of a
 * repeated one the last. */
const char *call_value(const struct call *call, const struct option *option);

/* Reads a call. The first operand names the command; options stand anywhere
 * before "--". Fails with STATUS_USAGE, naming the word: unknown option or
 * command (with the nearest known one), missing or needless argument, an
 * option given twice or one that the command does not take, too few or too
 * many operands. */
MUST_CHECK bool call_parse(int argc, char *const *argv, struct call *call,
                           struct status *st);

#endif
