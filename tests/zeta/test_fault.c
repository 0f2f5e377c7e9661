/* SPDX-License-Identifier: MIT */
/* The one allocation of a work space fails with STATUS_MEMORY, and nothing
 * allocates after it: with every allocation refused an atom is solved, read
 * and its Hessian taken. The linker sends the program's allocations here. */
#include <check.h>
#include <stdlib.h>

#include "support/run.h"
#include "zeta/zeta.h"

void *__real_malloc(size_t size);
void *__real_calloc(size_t count, size_t size);
void *__real_realloc(void *old, size_t size);
void *__wrap_malloc(size_t size);
void *__wrap_calloc(size_t count, size_t size);
void *__wrap_realloc(void *old, size_t size);

static bool refused;

void *__wrap_malloc(size_t size)
{
    return refused ? NULL : __real_malloc(size);
}

void *__wrap_calloc(size_t count, size_t size)
{
    return refused ? NULL : __real_calloc(count, size);
}

void *__wrap_realloc(void *old, size_t size)
{
    return refused ? NULL : __real_realloc(old, size);
}

START_TEST(a_work_space_without_memory_says_so)
{
    struct status st = status_ok();
    refused = true;
    struct zeta *work = zeta_new(&st);
    refused = false;
    ck_assert_ptr_null(work);
    ck_assert_int_eq(st.code, STATUS_MEMORY);
    zeta_free(work);
}
END_TEST

START_TEST(solving_allocates_nothing)
{
    struct status st = status_ok();
    struct configuration c;
    struct zeta_result r;
    double lowest = 0.0;
    ck_assert(configuration_parse("[Xe] 4f2 5d1 6s1 6p1", &c, &st));
    struct zeta *work = zeta_new(&st);
    ck_assert_ptr_nonnull(work);
    refused = true;
    bool begun =
        zeta_begin(work, &(struct zeta_problem){.z = 59, .configuration = &c});
    while (begun && zeta_step(work))
        ;
    zeta_read(work, &r);
    bool minimum = zeta_is_minimum(work, &lowest);
    refused = false;
    zeta_free(work);
    ck_assert(begun && minimum && lowest > 0.0);
    ck_assert_int_eq(r.count, c.count);
}
END_TEST

int main(void)
{
    Suite *suite = suite_create("zeta_fault");
    TCase *tc = tcase_create("fault");
    tcase_add_test(tc, a_work_space_without_memory_says_so);
    tcase_add_test(tc, solving_allocates_nothing);
    suite_add_tcase(suite, tc);
    return run_suite(suite);
}
