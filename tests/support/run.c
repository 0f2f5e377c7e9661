/* SPDX-License-Identifier: MIT */
#include "support/run.h"

#include <stdlib.h>

int run_suite(Suite *suite)
{
    SRunner *runner = srunner_create(suite);
    srunner_run_all(runner, CK_ENV);
    int run = srunner_ntests_run(runner);
    int failed = srunner_ntests_failed(runner);
    srunner_free(runner);
    return run > 0 && failed == 0 ? EXIT_SUCCESS : EXIT_FAILURE;
}
