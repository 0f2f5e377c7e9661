/* SPDX-License-Identifier: MIT */
/* The whole program under main. */
#ifndef CLI_RUN_H
#define CLI_RUN_H

/* Carries a call out. Prints what it has to say on standard output, or one
 * line on standard error, and gives the exit status: 0 done, 1 the work
 * failed, 2 the call was wrong. */
int cli_run(int argc, char *const *argv);

#endif
