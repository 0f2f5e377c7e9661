/* SPDX-License-Identifier: MIT */
/* Where a command writes: standard output, or a new file, whole or not at
 * all. */
#ifndef CLI_OUTPUT_H
#define CLI_OUTPUT_H

#include "base/file.h"
#include "cli/request.h"
#include "write/format.h"

#define OUTPUT_MARK_MAX 32

/* stream: write here. With --ascii it is memory[size] first, and goes to
 * `target` when it is complete. */
struct output {
    FILE *stream;
    FILE *target;
    struct file_draft draft;
    bool to_file;
    char *memory;
    size_t size;
    struct write_style style;
    char marks[4][OUTPUT_MARK_MAX];
};

/* Refuses a target that cannot be written before the work is done for it:
 * exists already, no such folder. Leaves nothing behind. */
MUST_CHECK bool output_check(const struct request *request, struct status *st);

/* Opens the output; style holds the marks that suit it: none in a file or a
 * pipe unless --color always asks for them. */
MUST_CHECK bool output_open(struct output *output,
                            const struct request *request, struct status *st);

/* Ends the output. With ok the file gets its name, or standard output is
 * flushed and every write error reported (STATUS_FILE); without, the file is
 * dropped and st stays as it is. Gives whether all went well. */
MUST_CHECK bool output_close(struct output *output, bool ok, struct status *st);

/* A whole report to the request's output in its format. */
MUST_CHECK bool output_report(const struct request *request,
                              const struct report *report, struct status *st);

#endif
