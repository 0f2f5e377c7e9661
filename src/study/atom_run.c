/* SPDX-License-Identifier: MIT */
#include "study/atom_run.h"

#include <assert.h>
#include <stdlib.h>

#include "atom/atom.h"
#include "atom/result.h"
#include "base/text.h"
#include "base/units.h"
#include "model/scf.h"

struct atom_run {
    struct atom_solver *solver;
    struct atom_report report;
};

struct atom_run *run_atom_new(struct status *st)
{
    struct atom_run *run = calloc(1, sizeof *run);
    if (!run) {
        status_fail(st, STATUS_MEMORY, "out of memory");
        return NULL;
    }
    run->solver = atom_solver_new(st);
    if (!run->solver) {
        free(run);
        return NULL;
    }
    run->report.state = REPORT_FAILED;
    return run;
}

void run_atom_free(struct atom_run *run)
{
    if (!run)
        return;
    atom_solver_free(run->solver);
    free(run);
}

static enum atom_functional functional_of(enum functional functional)
{
    static const enum atom_functional solvers[FUNCTIONAL_COUNT] = {
        [FUNCTIONAL_LDA] = ATOM_LDA,
        [FUNCTIONAL_LSD] = ATOM_LSD,
        [FUNCTIONAL_PBE] = ATOM_PBE,
    };
    return solvers[functional];
}

bool run_atom_begin(struct atom_run *run, const struct species *species,
                    const struct atom_method *method, struct status *st)
{
    bool dirac = method->relativity == RELATIVITY_DIRAC;
    double c = method->speed_of_light > 0.0 ? method->speed_of_light
                                            : SPEED_OF_LIGHT_AU;
    const struct atom_options options = {
        .functional = functional_of(method->functional),
        .relativity = dirac ? ATOM_DIRAC : ATOM_SCHROEDINGER,
        .speed_of_light = c,
    };
    run->report = (struct atom_report){
        .species = *species,
        .method = *method,
        .speed_of_light = c,
        .state = REPORT_FAILED,
    };
    if (dirac && c <= species->z)
        return status_fail(st, STATUS_USAGE,
                           "speed of light %.10g: expected more than the "
                           "nuclear charge, %d",
                           c, species->z);
    if (species->configuration.count == 0)
        return status_fail(st, STATUS_USAGE,
                           "a bare nucleus has no electron to solve for");
    if (!atom_begin(run->solver, species->z, &species->configuration, &options,
                    st))
        return false;
    run->report.state = REPORT_RUNNING;
    return true;
}

static struct report_level level_of(struct atom_orbital o)
{
    return (struct report_level){
        .n = o.n,
        .l = o.l,
        .twice_j = o.twice_j,
        .spin = o.spin,
        .occ = o.occ,
        .energy = o.energy,
        .mean_radius = o.mean_radius,
        .peak_radius = o.peak_radius,
        .zeff_energy = o.zeff_energy,
        .zeff_radius = o.zeff_size,
        .zeff_enclosed = o.zeff_enclosed,
    };
}

static void fill_results(struct atom_report *report,
                         const struct atom_solver *solver)
{
    struct atom_energy e = atom_energies(solver);
    report->etot = e.total;
    report->ekin = e.kinetic;
    report->ecoul = e.coulomb;
    report->eenuc = e.nuclear;
    report->exc = e.xc;
    report->level_count = atom_level_count(solver);
    report->subshell_count = atom_subshell_count(solver);
    assert(report->level_count <= REPORT_LEVELS_MAX);
    for (int i = 0; i < report->level_count; i++)
        report->levels[i] = level_of(atom_level_orbital(solver, i));
    for (int i = 0; i < report->subshell_count; i++)
        report->subshells[i] = level_of(atom_subshell_at(solver, i));
}

static void fill_reason(struct atom_report *report,
                        const struct atom_solver *solver, enum atom_state state)
{
    struct text t = text_over(report->reason, sizeof report->reason);
    int i = atom_culprit(solver);
    text_add(&t, atom_state_text(state));
    if (i < 0)
        return;
    struct atom_level level = atom_level_at(solver, i);
    struct report_level label = {.n = level.n,
                                 .l = level.l,
                                 .twice_j = level.twice_j,
                                 .spin = level.spin};
    char out[LEVEL_TEXT_MAX];
    text_addf(&t, " (%s%s%s)", level_print(&label, out), level.spin ? " " : "",
              level_spin_text(level.spin));
}

bool run_atom_step(struct atom_run *run)
{
    struct atom_report *report = &run->report;
    if (report->state != REPORT_RUNNING)
        return false;
    enum atom_state state = atom_step(run->solver);
    report->cycles = atom_cycles(run->solver);
    report->residual = atom_residual(run->solver);
    if (state == ATOM_RUNNING)
        return true;
    report->state = state == ATOM_CONVERGED ? REPORT_SOLVED : REPORT_FAILED;
    if (state == ATOM_CONVERGED)
        fill_results(report, run->solver);
    else
        fill_reason(report, run->solver, state);
    return false;
}

const struct atom_report *run_atom_report(const struct atom_run *run)
{
    return &run->report;
}

void run_atom_curve(const struct atom_run *run, enum atom_run_curve curve,
                    int subshell, int n, const double *r, double *out)
{
    static const enum atom_curve curves[] = {
        [RUN_DENSITY] = ATOM_CURVE_DENSITY,
        [RUN_ENCLOSED] = ATOM_CURVE_ENCLOSED,
        [RUN_ZEFF] = ATOM_CURVE_ZEFF,
    };
    assert(run->report.state == REPORT_SOLVED);
    atom_curve_at(run->solver, curves[curve], subshell, n, r, out);
}

double run_atom_extent(const struct atom_run *run, double electrons)
{
    assert(run->report.state == REPORT_SOLVED);
    return atom_extent(run->solver, electrons);
}

const struct provenance *run_atom_source(enum functional functional)
{
    return scf_atom_source(functional == FUNCTIONAL_PBE);
}
