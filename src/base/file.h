/* SPDX-License-Identifier: MIT */
/* Files read whole and written whole: never half. */
#ifndef BASE_FILE_H
#define BASE_FILE_H

#include <signal.h>
#include <stdbool.h>
#include <stddef.h>
#include <stdio.h>

#include "base/status.h"

/* Reads a regular file (or a pipe) whole into *data, terminated by a zero
 * byte that is not counted in *size; the caller frees *data. Fails with
 * STATUS_FILE when it cannot be opened or read, STATUS_DATA when it is larger
 * than limit bytes, STATUS_MEMORY. */
MUST_CHECK bool file_read(const char *path, size_t limit, char **data,
                          size_t *size, struct status *st);

/* A file being written for a target; nothing appears under the target's name
 * before file_draft_commit. Where the system has files without a name the draft
 * is one, and vanishes with the process, whatever ends it. Else it has a name
 * beside its target, and the signals that end a program wait while it is open.
 * A name beside the target is also taken for the moment in which an existing
 * one is replaced; those signals wait, and only SIGKILL could leave it. */
struct file_draft {
    FILE *stream; /* write here */
    struct file_sink *sink;
    char *target;
    char *temporary; /* NULL: the draft has no name */
    bool replace;
    bool holding; /* signals wait; before: those that waited already */
    sigset_t before;
};

/* Opens a draft for target. replace: an existing regular file, or the one that
 * a link leads to, may be overwritten; without it an existing one is refused
 * (STATUS_FILE) now and again at commit. On failure nothing is left behind. */
MUST_CHECK bool file_draft_open(struct file_draft *draft, const char *target,
                                bool replace, struct status *st);

/* Flushes, checks every write (the message has the reason of the first that
 * failed), and gives the draft its name; keeps the permissions of a file it
 * replaces. On failure the draft is removed and an existing target is
 * untouched. Releases the draft either way. */
MUST_CHECK bool file_draft_commit(struct file_draft *draft, struct status *st);

/* Drops the draft; target untouched. Safe on a released draft. */
void file_draft_discard(struct file_draft *draft);

/* Removes drafts with a name that were left beside `target` more than an hour
 * ago: a process that was killed could not. For targets that are the
 * program's own. */
void file_draft_sweep(const char *target);

/* Flushes a stream that the program was given (standard output) and reports
 * earlier and present write errors as STATUS_FILE naming `name`. */
MUST_CHECK bool file_flush(FILE *stream, const char *name, struct status *st);

#endif
