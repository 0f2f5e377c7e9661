/* SPDX-License-Identifier: MIT */
#include "refdata/suites.h"
#include "support/run.h"

int main(void)
{
    Suite *suite = suite_create("refdata");
    suite_add_tcase(suite, builtin_case());
    suite_add_tcase(suite, lookup_case());
    suite_add_tcase(suite, ground_case());
    suite_add_tcase(suite, loader_case());
    suite_add_tcase(suite, worked_case());
    return run_suite(suite);
}
