/* SPDX-License-Identifier: MIT */
#include "zeta/zeta.h"

#include <assert.h>
#include <math.h>
#include <stdarg.h>
#include <stddef.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "element/element.h"
#include "zeta/descent.h"
#include "zeta/energy.h"
#include "zeta/jacobi.h"
#include "zeta/layout.h"
#include "zeta/orbital.h"
#include "zeta/start.h"

/* Largest relative change of an exponent that is left when solved. */
static const double step_tolerance = 1e-7;
/* Largest change of ln zeta in a step: farther out the parabola is no guide. */
static const double step_cap = 0.25;
/* Below this exponent (1/bohr) an electron is taken to escape: the most
 * diffuse function of a neutral atom (4f in a field of one charge) has 0.25. */
static const double zeta_escaped = 0.03;
#define EVALUATIONS_MAX 300

struct zeta {
    struct energy energy;
    struct descent descent;
    double x[ENERGY_VARIABLE_MAX];
    enum zeta_state state;
    char reason[ZETA_REASON_MAX];
    bool anion;
    int evaluations;
    struct configuration configuration;
    struct zeta_subshell shells[ENERGY_SHELL_MAX]; /* in energy's order */
};

const char *zeta_state_text(enum zeta_state state)
{
    static const char *const texts[] = {
#define ZETA_TEXT(state, text) text,
        ZETA_STATE_LIST(ZETA_TEXT)
#undef ZETA_TEXT
    };
    assert(state < ZETA_STATE_COUNT);
    return texts[state];
}

struct zeta *zeta_new(struct status *st)
{
    struct zeta *work = malloc(sizeof *work);
    if (!work) {
        status_fail(st, STATUS_MEMORY,
                    "out of memory for the single-zeta atom");
        return NULL;
    }
    zeta_slater_tables_fill(&work->energy.tables);
    work->state = ZETA_REFUSED;
    work->reason[0] = '\0';
    work->configuration.count = 0;
    work->evaluations = 0;
    return work;
}

void zeta_free(struct zeta *work)
{
    free(work);
}

/* Ends the work with a state and a reason; false. */
PRINTF_LIKE(3, 4)
static bool finish(struct zeta *work, enum zeta_state state, const char *format,
                   ...)
{
    va_list arguments;
    work->state = state;
    va_start(arguments, format);
    vsnprintf(work->reason, sizeof work->reason, format, arguments);
    va_end(arguments);
    return false;
}

bool zeta_begin(struct zeta *work, const struct zeta_problem *problem)
{
    assert(problem->z >= 1 && problem->z <= Z_MAX);
    struct energy_atom *atom = &work->energy.atom;
    work->configuration = *problem->configuration;
    work->state = ZETA_RUNNING;
    work->reason[0] = '\0';
    work->evaluations = 0;
    double electrons = configuration_electrons(problem->configuration);
    work->anion = electrons > problem->z + 0.5;
    if (!layout_fill(atom, problem, work->reason)) {
        work->state = ZETA_REFUSED;
        return false;
    }
    energy_prepare(&work->energy);
    double z_eff[ENERGY_SHELL_MAX];
    start_charges(atom, z_eff);
    for (int i = 0; i < atom->variables; i++)
        work->x[i] = i < atom->shells ? log(z_eff[i] / atom->n[i]) : 0.0;
    return true;
}

/* The state of a finished descent. */
static void conclude(struct zeta *work)
{
    const struct energy_atom *atom = &work->energy.atom;
    char label[SUBSHELL_TEXT_MAX];
    orbitals_fill(&work->energy, work->shells);
    work->state = ZETA_SOLVED;
    for (int i = 0; i < atom->shells; i++) {
        const struct zeta_subshell *s = &work->shells[i];
        subshell_print(s->n, s->l, label);
        if (i > 0 && s->l == s[-1].l && s->zeta >= s[-1].zeta) {
            finish(work, ZETA_DISORDERED,
                   "the exponent of %s is larger than that of the subshell "
                   "inside it",
                   label);
            return;
        }
        if (s->energy >= 0.0 && work->state == ZETA_SOLVED)
            finish(work, ZETA_UNBOUND,
                   "the orbital energy of %s is %+.4f hartree: not bound in "
                   "this minimal basis",
                   label, s->energy);
    }
}

/* True when the smallest exponent says that an electron leaves. */
static bool escapes(struct zeta *work)
{
    const struct energy_atom *atom = &work->energy.atom;
    char label[SUBSHELL_TEXT_MAX];
    for (int i = 0; i < atom->shells; i++) {
        if (work->energy.zeta[i] < zeta_escaped) {
            finish(work, ZETA_ESCAPED,
                   "the exponent of %s falls below %g 1/bohr: its electrons "
                   "escape",
                   subshell_print(atom->n[i], atom->l[i], label), zeta_escaped);
            return true;
        }
    }
    return false;
}

bool zeta_step(struct zeta *work)
{
    if (work->state != ZETA_RUNNING)
        return false;
    struct energy *e = &work->energy;
    struct descent *d = &work->descent;
    enum descent_state next;
    bool first = work->evaluations++ == 0;
    double *x = first ? work->x : d->trial;
    bool fine = energy_evaluate(e, x);
    if (first) {
        if (!fine)
            return finish(work, ZETA_UNCONVERGED,
                          "no energy at the exponents to begin with");
        d->tolerance = step_tolerance;
        d->cap = step_cap;
        start_hessian(e, d->inverse);
        next = descent_begin(d, e->atom.variables, x, e->total, e->gradient);
    } else {
        if (fine && escapes(work))
            return false;
        next = descent_take(d, fine ? e->total : HUGE_VAL, e->gradient);
    }
    if (next == DESCENT_DONE)
        conclude(work);
    else if (next == DESCENT_STUCK)
        finish(work, ZETA_UNCONVERGED,
               "no lower energy found after %d evaluations", work->evaluations);
    else if (work->evaluations >= EVALUATIONS_MAX)
        finish(work, ZETA_UNCONVERGED, "not converged after %d evaluations",
               work->evaluations);
    return work->state == ZETA_RUNNING;
}

static bool has_values(const struct zeta *work)
{
    return work->state == ZETA_SOLVED || work->state == ZETA_UNBOUND;
}

void zeta_read(const struct zeta *work, struct zeta_result *result)
{
    const struct energy *e = &work->energy;
    *result = (struct zeta_result){
        .state = work->state,
        .anion = work->anion,
        .evaluations = work->evaluations,
    };
    memcpy(result->reason, work->reason, sizeof result->reason);
    if (!has_values(work))
        return;
    result->total = e->total;
    result->kinetic = e->kinetic;
    result->virial = (e->kinetic - e->total) / e->kinetic;
    double square = 0.0;
    for (int i = 0; i < e->atom.variables; i++)
        square += e->gradient[i] * e->gradient[i];
    result->gradient_norm = sqrt(square);
    result->count = work->configuration.count;
    for (int i = 0; i < result->count; i++) {
        const struct subshell *s = &work->configuration.shells[i];
        result->shells[i] =
            work->shells[e->atom.block[s->l].first + s->n - s->l - 1];
    }
}

double zeta_orbital(const struct zeta_result *result, int shell, double r)
{
    assert(shell >= 0 && shell < result->count && r >= 0.0);
    const struct zeta_subshell *own = &result->shells[shell];
    double zeta[N_MAX];
    int count = 0;
    for (int i = 0; i < result->count; i++)
        if (result->shells[i].l == own->l)
            zeta[count++] = result->shells[i].zeta;
    return zeta_orbital_value(own->l, count, zeta, own->coefficient, r);
}

/* Least eigenvalue of the Hessian, by central differences of the gradient.
 * The common scale of the exponents is always at its best, so that direction
 * has lost its curvature; at the virial ratio 2 it is twice the kinetic energy,
 * and it is put back. */
static double least_curvature(struct energy *e, const double x[])
{
    static const double h = 1e-4; /* change of a variable */
    int count = e->atom.variables, shells = e->atom.shells;
    double scale = 2.0 * e->kinetic / ((double)shells * shells);
    double a[ENERGY_VARIABLE_MAX][ENERGY_VARIABLE_MAX],
        moved[2][ENERGY_VARIABLE_MAX];
    double gradient[ENERGY_VARIABLE_MAX] = {0.0};
    for (int i = 0; i < count; i++) {
        for (int side = 0; side < 2; side++) {
            memcpy(moved[side], x, (size_t)count * sizeof *x);
            moved[side][i] += side == 0 ? -h : h;
            if (!energy_evaluate(e, moved[side]))
                return -HUGE_VAL;
            for (int j = 0; j < count; j++)
                a[i][j] = (e->gradient[j] - gradient[j]) / (2 * h);
            memcpy(gradient, e->gradient, sizeof gradient);
        }
    }
    for (int i = 0; i < count; i++) {
        for (int j = 0; j <= i; j++) {
            double mean = 0.5 * (a[i][j] + a[j][i]);
            if (i < shells)
                mean += scale;
            a[i][j] = mean;
            a[j][i] = mean;
        }
    }
    jacobi(count, ENERGY_VARIABLE_MAX, &a[0][0], NULL);
    double lowest = a[0][0];
    for (int i = 1; i < count; i++)
        lowest = fmin(lowest, a[i][i]);
    return lowest;
}

bool zeta_is_minimum(struct zeta *work, double *lowest)
{
    assert(has_values(work));
    struct energy *e = &work->energy;
    double x[ENERGY_VARIABLE_MAX], gradient[ENERGY_VARIABLE_MAX];
    double total = e->total, kinetic = e->kinetic;
    memcpy(gradient, e->gradient, sizeof gradient);
    memcpy(x, work->evaluations > 1 ? work->descent.trial : work->x, sizeof x);
    *lowest = least_curvature(e, x);
    bool again = energy_evaluate(e, x);
    assert(again);
    (void)again;
    e->total = total;
    e->kinetic = kinetic;
    memcpy(e->gradient, gradient, sizeof gradient);
    return *lowest > 0.0;
}
