/* SPDX-License-Identifier: MIT */
/* Running a program as a user does, and what came of it. */
#ifndef SUPPORT_PROGRAM_H
#define SUPPORT_PROGRAM_H

#include <stddef.h>

#define PROGRAM_ARGUMENTS_MAX 200

/* Where standard output goes. */
enum program_output {
    PROGRAM_CAPTURED,
    PROGRAM_FULL,        /* the device that is always full */
    PROGRAM_CLOSED,      /* the descriptor does not exist */
    PROGRAM_BROKEN,      /* a pipe without a reader */
    PROGRAM_BROKEN_MUTE, /* the same, with SIGPIPE ignored */
};

/* arguments[count] without the program's name. input: given on standard input,
 * NULL for an empty one. environment: "NAME=value" settings added to our own,
 * ended by NULL; may be NULL. folder: where it runs, NULL for here. */
struct program {
    const char *path;
    int count;
    const char *arguments[PROGRAM_ARGUMENTS_MAX];
    const char *input;
    size_t input_size;
    const char *const *environment;
    const char *folder;
    enum program_output output;
};

/* out and err are terminated, their sizes do not count that; status is the
 * exit status, or -1 when it died of `signal`. */
struct program_result {
    char *out, *err;
    size_t out_size, err_size;
    int status, signal;
};

/* Runs it to its end; aborts the test when that cannot be done. */
struct program_result program_run(const struct program *program);
void program_free(struct program_result *result);

/* Splits a line into arguments as a shell would: blanks part words, quotes
 * '…' hold them together, and \xNN, \n, \\ stand for bytes. The words live in
 * store[size]. Aborts the test when it does not fit. */
void program_split(struct program *program, const char *line, char *store,
                   size_t size);

/* program_split and program_run for a binary. */
struct program_result program_call(const char *path, const char *line);

/* Replaces \xNN, \n and \\ in place; gives the length. */
size_t program_unescape(char *text);

#endif
