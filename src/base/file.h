/* SPDX-License-Identifier: MIT */
/* Files read whole and written whole: never half. */
#ifndef BASE_FILE_H
#define BASE_FILE_H

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

/* A file being written beside its target; nothing appears under the target's
 * name before file_commit. */
struct file_draft {
    FILE *stream; /* write here */
    char *target;
    char *temporary;
    bool replace;
};

/* Opens a draft for target. replace: an existing regular file, or the one that
 * a link leads to, may be overwritten; without it an existing one is refused
 * (STATUS_FILE) now and again at commit. On failure nothing is left behind. */
MUST_CHECK bool file_draft_open(struct file_draft *draft, const char *target,
                                bool replace, struct status *st);

/* Flushes, checks every write, and gives the draft its name; keeps the
 * permissions of a file it replaces. On failure the draft is removed and an
 * existing target is untouched. Releases the draft either way. */
MUST_CHECK bool file_draft_commit(struct file_draft *draft, struct status *st);

/* Drops the draft; target untouched. Safe on a released draft. */
void file_draft_discard(struct file_draft *draft);

/* Flushes a stream that the program was given (standard output) and reports
 * earlier and present write errors as STATUS_FILE naming `name`. */
MUST_CHECK bool file_flush(FILE *stream, const char *name, struct status *st);

#endif
