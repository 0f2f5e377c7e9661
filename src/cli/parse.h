/* SPDX-License-Identifier: MIT */
/* From the words of a call to options and operands: POSIX utility conventions
 * with long options, nothing of what the words mean. */
#ifndef CLI_PARSE_H
#define CLI_PARSE_H

#include "base/status.h"
#include "cli/command.h"
#include "cli/option.h"

#define CALL_OPERANDS_MAX 512
#define CALL_REPEATS_MAX 64

/* Borrowed from argv. value[id]: the argument of an option that was given, ""
 * for a flag, NULL when it was not given; of a repeated one the last.
 * repeats: all arguments of repeated options in order. help, version: one of
 * them stands in the call, which is then not checked further. */
struct call {
    const struct command *command;
    const char *value[OPTION_COUNT];
    int repeat_count;
    struct {
        enum option_id id;
        const char *value;
    } repeats[CALL_REPEATS_MAX];
    int operand_count;
    const char *operands[CALL_OPERANDS_MAX];
    bool help, version;
};

/* Reads a call. The first operand names the command; options stand anywhere
 * before "--". Fails with STATUS_USAGE, naming the word: unknown option or
 * command (with the nearest known one), missing or needless argument, an
 * option given twice or one that the command does not take, too few or too
 * many operands. */
MUST_CHECK bool call_parse(int argc, char *const *argv, struct call *call,
                           struct status *st);

#endif
