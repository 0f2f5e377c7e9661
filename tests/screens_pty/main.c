/* SPDX-License-Identifier: MIT */
/* For realpath. */
#ifndef _XOPEN_SOURCE
#define _XOPEN_SOURCE 700
#endif

/* The finished program on a pseudo-terminal: screens OUTERSHELL. */
#include <stdio.h>
#include <stdlib.h>

#include "screens_pty/session.h"
#include "support/run.h"

int main(int argc, char **argv)
{
    if (argc != 2) {
        fprintf(stderr, "usage: test_screens OUTERSHELL\n");
        return EXIT_FAILURE;
    }
    static char path[4096]; /* the tests run in folders of their own */
    if (!realpath(argv[1], path)) {
        fprintf(stderr, "test_screens: %s: not there\n", argv[1]);
        return EXIT_FAILURE;
    }
    outershell = path;
    /* the wide descriptions are in a package of their own */
    if (!pty_has_term("xterm-direct") || !pty_has_term("tmux-256color"))
        return 77;
    TCase *(*const cases[])(void) = {case_shapes, case_ends, case_views,
                                     case_exports};
    Suite *suite = suite_create("screens");
    for (int i = 0; i < COUNT(cases); i++) {
        TCase *tc = cases[i]();
        tcase_set_timeout(tc, 60);
        tcase_add_checked_fixture(tc, session_make_folder,
                                  session_remove_folder);
        suite_add_tcase(suite, tc);
    }
    return run_suite(suite);
}
