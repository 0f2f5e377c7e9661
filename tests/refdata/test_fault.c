/* SPDX-License-Identifier: MIT */
/* Every allocation of the loader fails once in turn: the answer is always
 * STATUS_MEMORY, nothing leaks (the sanitizer build looks), and the catalogue
 * is as before. cJSON is told to use what the linker has put in the place of
 * malloc. */
#include <check.h>
#include <cjson/cJSON.h>
#include <stdio.h>
#include <stdlib.h>

#include "refdata/catalogue.h"
#include "refdata/loader.h"
#include "support/fault.h"
#include "support/run.h"

/* Adds one file with all but `limit` allocations refused. */
static bool add_with(const char *path, long limit, struct catalogue *catalogue,
                     struct status *st)
{
    cJSON_Hooks hooks = {malloc, free};
    cJSON_InitHooks(&hooks);
    fault_grant(limit);
    bool ok = catalogue_add_file(catalogue, path, st);
    fault_grant(-1);
    cJSON_InitHooks(NULL);
    return ok;
}

static void every_allocation_fails(const char *name)
{
    char path[512];
    snprintf(path, sizeof path, "%s/good/%s.json", CASES_DIR, name);
    for (long limit = 0;; limit++) {
        struct catalogue catalogue = {0};
        struct status st = status_ok();
        ck_assert_int_lt(limit, 100000);
        if (add_with(path, limit, &catalogue, &st)) {
            ck_assert_int_gt(limit, 20);
            ck_assert_int_eq(catalogue.added_count, 1);
            catalogue_clear(&catalogue);
            return;
        }
        /* A limit that is used up on the way is the only reason. */
        ck_assert_msg(st.code == STATUS_MEMORY, "%s, after %ld: %s", name,
                      limit, st.message);
        ck_assert_int_eq(catalogue.added_count, 0);
    }
}

START_TEST(test_every_allocation_of_a_set_of_values_fails_once)
{
    every_allocation_fails("marks_and_sources");
    every_allocation_fails("site");
    every_allocation_fails("gaps");
}
END_TEST

/* The other kinds, which a catalogue does not take. */
START_TEST(test_every_allocation_of_a_table_fails_once)
{
    static const char *const names[] = {"elements", "configurations",
                                        "oxidation_states", "availability"};
    for (size_t i = 0; i < sizeof names / sizeof *names; i++) {
        char path[512];
        struct catalogue catalogue = {0};
        struct status st = status_ok();
        long limit = 0;
        snprintf(path, sizeof path, "%s/good/%s.json", CASES_DIR, names[i]);
        do {
            ck_assert(!add_with(path, limit++, &catalogue, &st));
        } while (st.code == STATUS_MEMORY);
        ck_assert_int_eq(st.code, STATUS_DATA);
        ck_assert_int_gt(limit, 20);
    }
}
END_TEST

int main(void)
{
    Suite *suite = suite_create("refdata allocation");
    TCase *tc = tcase_create("fault");
    tcase_add_test(tc, test_every_allocation_of_a_set_of_values_fails_once);
    tcase_add_test(tc, test_every_allocation_of_a_table_fails_once);
    suite_add_tcase(suite, tc);
    return run_suite(suite);
}
