/* SPDX-License-Identifier: MIT */
/* The correlation energy of highly charged ions, where one orbital is all that
 * is left of a spin channel far out. */
#include <math.h>

#include "atom/hybrid.h"
#include "case.h"
#include "support/near.h"

static const struct atom_options DIRAC = {.functional = ATOM_LSD,
                                          .relativity = ATOM_DIRAC};

static struct hybrid_energy energy_of(int Z, const char *configuration)
{
    struct atom_solver *solver = case_solver();
    struct status st = status_ok();
    struct hybrid *hybrid = hybrid_new(&st);
    struct hybrid_energy e;
    case_solve(solver, Z, configuration, &DIRAC, ATOM_CONVERGED);
    ck_assert_msg(hybrid_evaluate(hybrid, solver, &e, &st), "%s", st.message);
    hybrid_free(hybrid);
    atom_solver_free(solver);
    return e;
}

/* Ionization energies of NIST ASD 5.12 (2024), doi 10.18434/T4W30F, beside the
 * differences of two ions each; the bound is wide since no spin–orbit shift is
 * in them. */
START_TEST(correlation_of_highly_charged_ions_is_like_that_of_others)
{
    static const struct {
        int Z;
        const char *atom, *ion;
        double ev, part;
    } pair[] = {
        {30, "[Ne] 3s2 3p4", "[Ne] 3s2 3p3", 490.6, 0.05},
        {30, "[Ne] 3s2 3p3", "[Ne] 3s2 3p2", 540.0, 0.05},
        {35, "[He] 2s2 2p2", "[He] 2s2 2p1", 3361.0, 0.05},
        {35, "[He] 2s2 2p1", "[He] 2s2", 3523.1, 0.05},
    };
    for (size_t i = 0; i < sizeof pair / sizeof pair[0]; i++) {
        struct hybrid_energy a = energy_of(pair[i].Z, pair[i].atom);
        struct hybrid_energy b = energy_of(pair[i].Z, pair[i].ion);
        double ratio = a.correlation / a.correlation_pbe;
        near(27.211386 * (b.total - a.total), pair[i].ev, 0.0, pair[i].part,
             "Z = %d, %s", pair[i].Z, pair[i].atom);
        ck_assert_msg(ratio > 1.0 && ratio < 1.2 && a.sound && b.sound,
                      "Z = %d, %s: %g", pair[i].Z, pair[i].atom, ratio);
    }
}
END_TEST

/* A correlation energy that cannot be one is told from one that can, and there
 * is another to take its place. */
START_TEST(a_correlation_that_cannot_be_is_not_sound)
{
    ck_assert(hybrid_correlation_sound(-0.65, -0.62, false));
    ck_assert(!hybrid_correlation_sound(29.19, -0.62, false));
    ck_assert(!hybrid_correlation_sound(-29.19, -0.62, false));
    ck_assert(!hybrid_correlation_sound(-0.5, -0.62, false));
    ck_assert(!hybrid_correlation_sound(NAN, -0.62, false));
    ck_assert(!hybrid_correlation_sound(-INFINITY, -0.62, false));
    ck_assert(hybrid_correlation_sound(0.0, -0.006, true));
    ck_assert(!hybrid_correlation_sound(1.0, -0.006, true));
    /* its shape is round: what differs is the correlation alone */
    struct hybrid_energy e = energy_of(7, "[He] 2s2 2p3");
    near(e.with_pbe - e.total, e.correlation_pbe - e.correlation, 1e-10, 0.0,
         "N with PBE correlation");
}
END_TEST

TCase *case_correlation(void)
{
    TCase *tc = tcase_create("correlation");
    tcase_add_test(tc,
                   correlation_of_highly_charged_ions_is_like_that_of_others);
    tcase_add_test(tc, a_correlation_that_cannot_be_is_not_sound);
    return tc;
}
