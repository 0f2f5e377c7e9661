/* SPDX-License-Identifier: MIT */
/* Solves self-consistent atoms and nothing else, to have its instructions
 * counted:
 *
 *     atom_count FUNCTIONAL RELATIVITY CONFIGURATIONS.csv
 *     atom_count FUNCTIONAL RELATIVITY Z CONFIGURATION
 *
 * FUNCTIONAL lda, lsd or pbe, RELATIVITY none or dirac. Solves the neutral
 * atoms and singly charged cations of a list (columns z, symbol, charge,
 * configuration), each cation from its atom, or one atom; prints how many
 * ended in which state and the total energy of the last. */
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "atom/atom.h"
#include "base/file.h"
#include "base/text.h"

enum { STATES = ATOM_OUT_OF_REACH + 1 };

static bool solve(struct atom_solver *solver, int z, const char *text,
                  const struct atom_options *options, int count[STATES],
                  struct status *st)
{
    struct configuration configuration;
    if (!configuration_parse(text, &configuration, st) ||
        !atom_begin(solver, z, &configuration, options, st))
        return false;
    count[atom_solve(solver)]++;
    return true;
}

/* One row of the list; the heading and higher ions are passed over. */
static bool solve_row(struct atom_solver *solver, char *row,
                      struct atom_options *options, int count[STATES],
                      struct status *st)
{
    char *field[4] = {row};
    for (int i = 1; i < 4; i++) {
        char *comma = strchr(field[i - 1], ',');
        if (!comma)
            return true;
        *comma = '\0';
        field[i] = comma + 1;
    }
    char *end = strchr(field[3], ',');
    int z, charge;
    if (!end || !text_to_int(field[0], &z) || !text_to_int(field[2], &charge) ||
        charge > 1)
        return true;
    *end = '\0';
    options->warm = charge == 1;
    return solve(solver, z, field[3], options, count, st);
}

static bool solve_list(struct atom_solver *solver, const char *path,
                       struct atom_options *options, int count[STATES],
                       struct status *st)
{
    char *data = NULL;
    size_t size;
    if (!file_read(path, 1 << 20, &data, &size, st))
        return false;
    bool ok = true;
    for (char *row = data; ok && row && *row;) {
        char *next = strchr(row, '\n');
        if (next)
            *next++ = '\0';
        ok = solve_row(solver, row, options, count, st);
        row = next;
    }
    free(data);
    return ok;
}

static bool options_read(char **argv, struct atom_options *options)
{
    static const char *const functional[] = {"lda", "lsd", "pbe"};
    for (int i = 0; i < 3; i++)
        if (strcmp(argv[1], functional[i]) == 0) {
            options->functional = (enum atom_functional)i;
            options->relativity =
                strcmp(argv[2], "dirac") == 0 ? ATOM_DIRAC : ATOM_SCHROEDINGER;
            return true;
        }
    return false;
}

int main(int argc, char **argv)
{
    struct status st = status_ok();
    struct atom_options options = {.functional = ATOM_LDA};
    int count[STATES] = {0}, z = 0;
    if (argc < 4 || argc > 5 || !options_read(argv, &options) ||
        (argc == 5 && !text_to_int(argv[3], &z))) {
        fprintf(stderr, "usage: atom_count lda|lsd|pbe none|dirac "
                        "CONFIGURATIONS.csv | Z CONFIGURATION\n");
        return EXIT_FAILURE;
    }
    struct atom_solver *solver = atom_solver_new(&st);
    bool ok = solver &&
              (argc == 5 ? solve(solver, z, argv[4], &options, count, &st)
                         : solve_list(solver, argv[3], &options, count, &st));
    if (!ok)
        fprintf(stderr, "atom_count: %s\n", st.message);
    for (int i = 0; i < STATES; i++)
        if (count[i] > 0)
            printf("%4d %s\n", count[i], atom_state_text((enum atom_state)i));
    if (ok)
        printf("%.9f hartree\n", atom_energies(solver).total);
    atom_solver_free(solver);
    return ok && count[ATOM_CONVERGED] > 0 ? EXIT_SUCCESS : EXIT_FAILURE;
}
