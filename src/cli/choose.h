/* SPDX-License-Identifier: MIT */
/* Reading the operands of a request: which atoms and ions are meant. */
#ifndef CLI_CHOOSE_H
#define CLI_CHOOSE_H

#include "cli/request.h"

/* Fills the request's atoms from its operands ("-" reads words from standard
 * input) and --charge. In list no operand means all elements. Atoms that were
 * not named by themselves and do not exist at the charge are left out. Fails
 * with STATUS_USAGE naming the word; STATUS_FILE when standard input cannot be
 * read. */
MUST_CHECK bool choose_atoms(struct request *request, struct status *st);

#endif
