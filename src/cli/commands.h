/* SPDX-License-Identifier: MIT */
/* What each command runs. Every function carries a request out and writes to
 * its output; failures are the request's. */
#ifndef CLI_COMMANDS_H
#define CLI_COMMANDS_H

#include "cli/request.h"

MUST_CHECK bool cli_screens(struct request *request, struct status *st);
MUST_CHECK bool cli_list(struct request *request, struct status *st);
MUST_CHECK bool cli_compare(struct request *request, struct status *st);
MUST_CHECK bool cli_atom(struct request *request, struct status *st);
MUST_CHECK bool cli_audit(struct request *request, struct status *st);
MUST_CHECK bool cli_sources(struct request *request, struct status *st);

#endif
