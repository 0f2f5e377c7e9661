/* SPDX-License-Identifier: MIT */
#include "model/neighbour.h"

#include <math.h>

#include "base/units.h"
#include "refdata/catalogue.h"
#include "refdata/ground.h"

/* Subshells, by the energy of their levels, among which an electron is moved.
 */
enum { OUTER = 3 };

static const double ERROR_EV = 0.5, ERROR_PART = 0.005;
/* How far the difference of two levels may lie above zero for a move that
 * lowers the energy: of all ions of all elements, tried up to 40 eV, the
 * largest difference that was one is 0.9 eV (Bk8+, 5f5 6p4 to 5f4 6p5). */
static const double SCREEN_EV = 3.0;

/* The set that tells what is measured. */
static const char ENERGIES[] = "ionization_nist_asd_2024";

/* A subshell with the level that an electron leaves, and that one enters
 * (hartree); entering is infinite where there is no room. */
struct place {
    int n, l;
    double leaving, entering;
};

/* Energy of the level of a subshell with one spin and j, or NAN. */
static double level_of(const struct atom_solver *solver, int n, int l, int spin,
                       int twice_j)
{
    for (int i = 0; i < atom_level_count(solver); i++) {
        struct atom_level level = atom_level_at(solver, i);
        if (level.n == n && level.l == l && level.spin == spin &&
            level.twice_j == twice_j)
            return level.energy;
    }
    return NAN;
}

/* A majority fills first: electrons leave the minority while it holds any, and
 * enter the majority while it has room. Where no minority level is occupied
 * that of the majority stands in, which lies lower. Of either spin the 2l
 * states of j = l - 1/2 fill before those of l + 1/2, which lie higher by tens
 * of electronvolts in heavy ions. */
static struct place place_of(const struct atom_solver *solver,
                             const struct subshell *s)
{
    int half = 2 * s->l + 1, below = 2 * s->l - 1, above = 2 * s->l + 1;
    int leaves = s->occ > 2 * s->l ? above : below;
    int enters = s->occ > 2 * s->l - 1 ? above : below;
    double minor = level_of(solver, s->n, s->l, -1, leaves);
    struct place p = {s->n, s->l, minor, HUGE_VAL};
    if (!(s->occ > half))
        p.leaving = level_of(solver, s->n, s->l, 1, leaves);
    if (s->occ > 2 * half - 1)
        return p;
    p.entering = level_of(solver, s->n, s->l, -1, enters);
    if (!(s->occ > half - 1) || !isfinite(p.entering))
        p.entering = level_of(solver, s->n, s->l, 1, enters);
    return p;
}

/* The outermost places, highest first; their number. */
static int outer_places(const struct atom_solver *solver,
                        const struct configuration *c,
                        struct place place[OUTER + 1])
{
    int count = 0;
    for (int i = 0; i < c->count; i++) {
        struct place p = place_of(solver, &c->shells[i]);
        int at = count < OUTER ? count++ : OUTER;
        for (; at > 0 && place[at - 1].leaving < p.leaving; at--)
            place[at] = place[at - 1];
        place[at] = p;
    }
    return count;
}

bool neighbour_doubtful(const struct species *species)
{
    if (species->origin == ORIGIN_USER || species->charge < 1 ||
        species->z - species->charge <= 2)
        return false;
    if (species->origin == ORIGIN_RULE)
        return true;
    const struct dataset *set = catalogue_find(catalogue_builtin(), ENERGIES);
    struct reading energy =
        dataset_reading(set, species->z, species->charge, 0, 0);
    return energy.state != READING_OK ||
           energy.evidence == EVIDENCE_THEORETICAL;
}

double neighbour_error(const struct atom_solver *solver)
{
    double highest = -HUGE_VAL;
    for (int i = 0; i < atom_level_count(solver); i++)
        highest = fmax(highest, atom_level_at(solver, i).energy);
    return ERROR_EV / HARTREE_EV + ERROR_PART * fabs(highest);
}

int neighbour_list(const struct atom_solver *solver,
                   const struct configuration *c, struct subshell also,
                   struct configuration out[NEIGHBOURS_MAX])
{
    struct place place[OUTER + 2];
    int count = outer_places(solver, c, place), found = 0;
    if (also.n > 0)
        place[count++] = (struct place){also.n, also.l, -HUGE_VAL, -HUGE_VAL};
    for (int from = 0; from < count; from++)
        for (int to = 0; to < count && found < NEIGHBOURS_MAX; to++) {
            double change = place[to].entering - place[from].leaving;
            bool empty = place[to].entering <= -HUGE_VAL;
            if (from == to || (empty && place[from].l < 2) ||
                change * HARTREE_EV > SCREEN_EV ||
                place[from].leaving <= -HUGE_VAL)
                continue;
            out[found] = *c;
            found += configuration_change(&out[found], place[from].n,
                                          place[from].l, -1.0) &&
                     configuration_change(&out[found], place[to].n, place[to].l,
                                          1.0);
        }
    return found;
}

/* The lowest s subshell of the atom that an ion does not hold. */
static struct subshell lowest_empty_s(const struct species *ion,
                                      const struct configuration *atom)
{
    for (int i = 0; i < atom->count; i++)
        if (atom->shells[i].l == 0 &&
            configuration_occupation(&ion->configuration, atom->shells[i].n,
                                     0) <= 0.0)
            return atom->shells[i];
    return (struct subshell){0, 0, 0.0};
}

struct subshell neighbour_emptied(const struct species *species)
{
    struct subshell found = {0, 0, 0.0};
    struct species before;
    struct status st = status_ok();
    if (species->origin == ORIGIN_RULE &&
        ground_state(species->z, 0, &before, &st))
        found = lowest_empty_s(species, &before.configuration);
    if (found.n > 0 ||
        !ground_state(species->z, species->charge - 1, &before, &st))
        return found;
    const struct subshell *s =
        configuration_emptied(&before.configuration, &species->configuration);
    if (s &&
        configuration_occupation(&species->configuration, s->n, s->l) <= 0.0)
        found = *s;
    return found;
}
