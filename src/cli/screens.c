/* SPDX-License-Identifier: MIT */
/* The call without a command. */
#include "cli/commands.h"

bool cli_screens(struct request *request, struct status *st)
{
    (void)request;
    return status_fail(st, STATUS_TERMINAL,
                       "this build has no screens; --help lists the commands");
}
