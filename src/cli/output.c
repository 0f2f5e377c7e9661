/* SPDX-License-Identifier: MIT */
#include "cli/output.h"

bool output_check(const struct request *request, struct status *st)
{
    struct file_draft draft;
    if (!request->output)
        return true;
    if (!file_draft_open(&draft, request->output, request->force, st))
        return false;
    file_draft_discard(&draft);
    return true;
}

bool output_open(struct output *output, const struct request *request,
                 struct status *st)
{
    *output = (struct output){.stream = stdout, .to_file = request->output};
    if (!output->to_file)
        return true;
    if (!file_draft_open(&output->draft, request->output, request->force, st))
        return false;
    output->stream = output->draft.stream;
    return true;
}

bool output_close(struct output *output, bool ok, struct status *st)
{
    if (output->to_file && !ok)
        file_draft_discard(&output->draft);
    if (!ok)
        return false;
    if (output->to_file)
        return file_draft_commit(&output->draft, st);
    return file_flush(stdout, "standard output", st);
}
