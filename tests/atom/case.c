/* SPDX-License-Identifier: MIT */
#include "case.h"

#include <stdio.h>

struct atom_solver *case_solver(void)
{
    struct status st = status_ok();
    struct atom_solver *solver = atom_solver_new(&st);
    ck_assert_ptr_nonnull(solver);
    return solver;
}

void case_solve(struct atom_solver *solver, int Z, const char *configuration,
                const struct atom_options *options, enum atom_state want)
{
    struct status st = status_ok();
    struct configuration parsed;
    ck_assert_msg(configuration_parse(configuration, &parsed, &st), "%s",
                  st.message);
    ck_assert_msg(atom_begin(solver, Z, &parsed, options, &st), "%s",
                  st.message);
    enum atom_state state = atom_solve(solver);
    ck_assert_msg(state == want, "Z=%d %s: %s after %d cycles", Z,
                  configuration, atom_state_text(state), atom_cycles(solver));
}

struct cases cases_read(void)
{
    return (struct cases){csv_read_file(DATA_DIR "/configurations.csv")};
}

void cases_free(struct cases *cases)
{
    csv_free(&cases->csv);
}

void cases_species(const struct cases *cases, int Z, int charge,
                   struct species *species)
{
    struct status st = status_ok();
    int at = -1, best = -1;
    for (size_t i = 0; i < csv_rows(&cases->csv); i++) {
        int q = (int)csv_number(&cases->csv, i, "charge");
        if ((int)csv_number(&cases->csv, i, "z") == Z && q <= charge &&
            q > best) {
            best = q;
            at = (int)i;
        }
    }
    ck_assert_int_ge(at, 0);
    *species = (struct species){.z = Z, .charge = charge};
    ck_assert_msg(
        configuration_parse(csv_cell(&cases->csv, (size_t)at, "configuration"),
                            &species->configuration, &st),
        "%s", st.message);
    for (; best < charge; best++) {
        const struct subshell *s =
            configuration_outermost(&species->configuration);
        ck_assert(
            configuration_change(&species->configuration, s->n, s->l, -1.0));
        at = -1;
    }
    term_parse(at >= 0 ? csv_cell(&cases->csv, (size_t)at, "term") : "",
               &species->term);
}
