/* SPDX-License-Identifier: MIT */
#include "solve.h"

#include <check.h>

struct zeta *work_space(void)
{
    struct status st = status_ok();
    struct zeta *work = zeta_new(&st);
    ck_assert_msg(work != NULL, "%s", st.message);
    return work;
}

struct zeta_result solve(struct zeta *work, int z, const char *text,
                         enum zeta_coupling coupling, const double *term)
{
    struct status st = status_ok();
    struct configuration c;
    struct zeta_result r;
    ck_assert_msg(configuration_parse(text, &c, &st), "%s: %s", text,
                  st.message);
    struct zeta_problem problem = {z, &c, coupling, term};
    if (zeta_begin(work, &problem))
        while (zeta_step(work))
            ;
    zeta_read(work, &r);
    return r;
}

bool has_values(const struct zeta_result *r)
{
    return r->state == ZETA_SOLVED || r->state == ZETA_UNBOUND;
}

const struct zeta_subshell *subshell_of(const struct zeta_result *r, int n,
                                        int l)
{
    for (int i = 0; i < r->count; i++)
        if (r->shells[i].n == n && r->shells[i].l == l)
            return &r->shells[i];
    ck_abort_msg("no subshell %d %d", n, l);
    return NULL;
}
