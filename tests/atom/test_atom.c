/* SPDX-License-Identifier: MIT */
#include "case.h"
#include "support/run.h"

int main(void)
{
    Suite *suite = suite_create("atom");
    suite_add_tcase(suite, case_nist());
    suite_add_tcase(suite, case_states());
    suite_add_tcase(suite, case_functionals());
    suite_add_tcase(suite, case_hybrid());
    suite_add_tcase(suite, case_term());
    suite_add_tcase(suite, case_correlation());
    suite_add_tcase(suite, case_level());
    return run_suite(suite);
}
