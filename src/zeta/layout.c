/* SPDX-License-Identifier: MIT */
#include "zeta/layout.h"

#include <math.h>
#include <stdarg.h>
#include <stdio.h>
#include <string.h>

/* Writes the reason; false. */
PRINTF_LIKE(2, 3)
static bool refuse(char reason[], const char *format, ...)
{
    va_list arguments;
    va_start(arguments, format);
    vsnprintf(reason, ZETA_REASON_MAX, format, arguments);
    va_end(arguments);
    return false;
}

/* Whether the subshells of one l are what this method can do; fills the
 * block. */
static bool block_fill(struct energy_atom *atom, int l,
                       const int occ[N_MAX + 1], char reason[])
{
    struct energy_block *b = &atom->block[l];
    char label[SUBSHELL_TEXT_MAX];
    *b = (struct energy_block){.first = atom->shells, .full = 4 * l + 2};
    for (int n = l + 1; n <= N_MAX; n++) {
        if (occ[n] == 0)
            continue;
        if (n != l + 1 + b->count)
            return refuse(reason,
                          "%s is occupied but an inner subshell of the same l "
                          "is empty: this basis would collapse into it",
                          subshell_print(n, l, label));
        if (b->open > 0)
            return refuse(reason,
                          "%s is occupied outside a subshell of the same l "
                          "that is not full: this basis would collapse into it",
                          subshell_print(n, l, label));
        atom->n[atom->shells] = n;
        atom->l[atom->shells] = l;
        atom->occ[atom->shells++] = occ[n];
        b->count++;
        if (occ[n] < b->full)
            b->open = occ[n];
    }
    return true;
}

/* Occupations by l and n; refused when one is not whole. */
static bool occupations(const struct configuration *c,
                        int occ[BLOCK_COUNT][N_MAX + 1], char reason[])
{
    char label[SUBSHELL_TEXT_MAX];
    for (int i = 0; i < c->count; i++) {
        const struct subshell *s = &c->shells[i];
        double whole = floor(s->occ + 0.5);
        if (s->occ != whole)
            return refuse(reason,
                          "%s holds %g electrons: a term needs whole ones",
                          subshell_print(s->n, s->l, label), s->occ);
        occ[s->l][s->n] = (int)whole;
    }
    return true;
}

/* Coefficients of an open subshell beyond the closed-shell formula, which
 * gives q^2/2 F^0 - q^2/4 times the sum over k of (l k l; 000)^2 F^k. */
static void block_couple(struct energy_block *b, int l,
                         const struct zeta_problem *problem)
{
    double q = b->open;
    if (problem->term)
        for (int i = 0; i < COUPLING_ORDERS; i++)
            b->within[i] = i > l ? 0.0 : problem->term[i];
    else if (problem->coupling == ZETA_HUND)
        coupling_within_stretched(l, b->open, b->within);
    else
        coupling_within_average(l, b->open, b->within);
    b->within[0] = 0.5 * q * (q - 1.0) - 0.5 * q * q;
    for (int i = 0; i <= l; i++)
        b->within[i] += 0.25 * q * q * coupling_zero(l, 2 * i, l);
}

/* Between two open subshells; nothing for the average, which is the
 * closed-shell formula itself. */
static void blocks_couple(struct energy_atom *atom, int l1, int l2)
{
    struct energy_between *between = &atom->between[l1][l2];
    int q1 = atom->block[l1].open, q2 = atom->block[l2].open;
    coupling_between_stretched(l1, q1, l2, q2, between->direct,
                               between->exchange);
    between->direct[0] = 0.0;
    between->direct_any = l1 > 0;
    between->exchange_any = true;
    for (int i = 0; i <= l1; i++)
        between->exchange[i] +=
            0.5 * q1 * q2 * coupling_zero(l1, l2 - l1 + 2 * i, l2);
}

static bool couple(struct energy_atom *atom, const struct zeta_problem *problem,
                   char reason[])
{
    int open = 0;
    for (int l = 0; l < BLOCK_COUNT; l++)
        open += atom->block[l].open > 0;
    if (problem->term && open != 1)
        return refuse(reason, "a term is given but %d subshells are open",
                      open);
    memset(atom->between, 0, sizeof atom->between);
    for (int l1 = 0; l1 < BLOCK_COUNT; l1++) {
        struct energy_block *b = &atom->block[l1];
        if (b->open == 0)
            continue;
        block_couple(b, l1, problem);
        if (b->count > 1) {
            b->kappa = atom->variables;
            atom->variables += b->count - 1;
        }
        for (int l2 = l1 + 1; l2 < BLOCK_COUNT; l2++)
            if (atom->block[l2].open > 0 && problem->coupling == ZETA_HUND)
                blocks_couple(atom, l1, l2);
    }
    return true;
}

bool layout_fill(struct energy_atom *atom, const struct zeta_problem *problem,
                 char reason[ZETA_REASON_MAX])
{
    int occ[BLOCK_COUNT][N_MAX + 1] = {{0}};
    if (problem->configuration->count == 0)
        return refuse(reason, "there are no electrons");
    if (!occupations(problem->configuration, occ, reason))
        return false;
    atom->Z = problem->z;
    atom->shells = 0;
    for (int l = 0; l < BLOCK_COUNT; l++)
        if (!block_fill(atom, l, occ[l], reason))
            return false;
    atom->variables = atom->shells;
    return couple(atom, problem, reason);
}
