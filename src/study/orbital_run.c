/* SPDX-License-Identifier: MIT */
#include "study/orbital_run.h"

#include <math.h>
#include <stdlib.h>

#include "model/slater.h"
#include "zeta/zeta.h"

/* As for the model single-zeta. */
#define ZETA_Z_LAST 103

struct orbital_run {
    enum orbital_kind kind;
    struct species species;
    enum orbital_state state;
    const char *reason;
    struct {
        double n_star, zeta;
    } slater[SUBSHELL_MAX];
    struct zeta *zeta; /* made when first needed */
    struct zeta_result result;
};

struct orbital_run *orbital_run_new(struct status *st)
{
    struct orbital_run *run = calloc(1, sizeof *run);
    if (!run) {
        status_fail(st, STATUS_MEMORY, "out of memory");
        return NULL;
    }
    run->state = ORBITAL_FAILED;
    run->reason = "not begun";
    return run;
}

void orbital_run_free(struct orbital_run *run)
{
    if (!run)
        return;
    zeta_free(run->zeta);
    free(run);
}

static void fail(struct orbital_run *run, const char *reason)
{
    run->state = ORBITAL_FAILED;
    run->reason = reason;
}

static void begin_slater(struct orbital_run *run)
{
    const struct configuration *c = &run->species.configuration;
    run->state = ORBITAL_SOLVED;
    for (int i = 0; i < c->count; i++) {
        const struct subshell *s = &c->shells[i];
        double n_star = slater_n_star(s->n);
        double z_eff = run->species.z - slater_sigma(c, s->n, s->l);
        if (n_star <= 0.0 || z_eff <= 0.0) {
            fail(run, n_star <= 0.0
                          ? "Slater's rules have no n* for this shell"
                          : "Slater's rules screen the nucleus fully");
            return;
        }
        run->slater[i].n_star = n_star;
        run->slater[i].zeta = z_eff / n_star;
    }
}

static void begin_zeta(struct orbital_run *run)
{
    if (run->species.z > ZETA_Z_LAST) {
        fail(run, "the calculation is not relativistic and ends with Lr");
        return;
    }
    struct status st = status_ok();
    const struct zeta_problem problem = {
        .z = run->species.z,
        .configuration = &run->species.configuration,
        .coupling = ZETA_HUND,
    };
    if (!run->zeta)
        run->zeta = zeta_new(&st);
    if (!run->zeta) {
        fail(run, "out of memory");
        return;
    }
    run->state = ORBITAL_RUNNING;
    if (zeta_begin(run->zeta, &problem))
        return;
    zeta_read(run->zeta, &run->result);
    fail(run, run->result.reason);
}

void orbital_run_begin(struct orbital_run *run, enum orbital_kind kind,
                       const struct species *species)
{
    run->kind = kind;
    run->species = *species;
    run->reason = "";
    if (kind == ORBITAL_SLATER)
        begin_slater(run);
    else
        begin_zeta(run);
}

bool orbital_run_step(struct orbital_run *run)
{
    if (run->state != ORBITAL_RUNNING || zeta_step(run->zeta))
        return run->state == ORBITAL_RUNNING;
    zeta_read(run->zeta, &run->result);
    if (run->result.state == ZETA_SOLVED || run->result.state == ZETA_UNBOUND)
        run->state = ORBITAL_SOLVED;
    else
        fail(run, run->result.reason);
    return false;
}

enum orbital_state orbital_run_state(const struct orbital_run *run)
{
    return run->state;
}

const char *orbital_run_reason(const struct orbital_run *run)
{
    return run->reason;
}

/* P² of a normalised function r^n* e^(-zeta r):
 * (2 zeta)^(2n*+1)/Gamma(2n*+1) r^2n* e^(-2 zeta r), by logarithms. */
static double slater_square(double n_star, double zeta, double r)
{
    if (r <= 0.0)
        return 0.0;
    double power = 2.0 * n_star;
    return exp((power + 1.0) * log(2.0 * zeta) - lgamma(power + 1.0) +
               power * log(r) - 2.0 * zeta * r);
}

static double square(const struct orbital_run *run, int shell, double r)
{
    if (run->kind == ORBITAL_SLATER)
        return slater_square(run->slater[shell].n_star, run->slater[shell].zeta,
                             r);
    double p = zeta_orbital(&run->result, shell, r);
    return p * p;
}

void orbital_run_density(const struct orbital_run *run, int subshell, int count,
                         const double *r, double *out)
{
    const struct configuration *c = &run->species.configuration;
    for (int i = 0; i < count; i++) {
        out[i] = 0.0;
        for (int s = 0; s < c->count; s++)
            if (subshell < 0 || subshell == s)
                out[i] += c->shells[s].occ * square(run, s, r[i]);
    }
}
