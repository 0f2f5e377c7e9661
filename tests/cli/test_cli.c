/* SPDX-License-Identifier: MIT */
#include "suites.h"
#include "support/run.h"

int main(void)
{
    Suite *suite = suite_create("cli");
    suite_add_tcase(suite, parse_cases());
    suite_add_tcase(suite, made_cases());
    suite_add_tcase(suite, call_cases());
    suite_add_tcase(suite, output_cases());
    suite_add_tcase(suite, residual_cases());
    suite_add_tcase(suite, stream_cases());
    suite_add_tcase(suite, atom_cases());
    suite_add_tcase(suite, audit_cases());
    suite_add_tcase(suite, compare_cases());
    suite_add_tcase(suite, site_cases());
    suite_add_tcase(suite, source_cases());
    suite_add_tcase(suite, good_cases());
    return run_suite(suite);
}
