/* SPDX-License-Identifier: MIT */
/* `atom`: one self-consistent atom. */
#include "cli/command.h"
#include "cli/output.h"
#include "element/selection.h"
#include "report/solved.h"
#include "study/atom_run.h"

static const struct unit *unit_for(const struct request *r,
                                   enum dimension dimension, const char *usual)
{
    const struct unit *unit = r->units[dimension];
    return unit ? unit : unit_find(usual);
}

static bool write(const struct request *r, const struct atom_report *atom,
                  struct status *st)
{
    struct report report;
    report_begin(&report);
    report_solved(&report, r->format->uses, atom,
                  run_atom_source(r->method.functional),
                  unit_for(r, DIMENSION_ENERGY, "hartree"),
                  unit_for(r, DIMENSION_LENGTH, "pm"));
    bool ok = output_report(r, &report, st);
    report_clear(&report);
    return ok;
}

/* Solves to the end; an atom that has no result is a failure with its reason.
 */
static bool solve(struct atom_run *run, const struct request *r,
                  const struct species *species, struct status *st)
{
    char ion[ION_TEXT_MAX];
    ion_print(species->z, species->charge, ion);
    if (!run_atom_begin(run, species, &r->method, st))
        return status_context(st, "atom: %s", ion);
    while (run_atom_step(run))
        ;
    const struct atom_report *report = run_atom_report(run);
    return report->state == REPORT_SOLVED ||
           status_fail(st, STATUS_CONVERGENCE,
                       "atom: %s, %s, %s: %s (cycle %d); no number "
                       "is given",
                       ion, functional_title(r->method.functional),
                       relativity_title(r->method.relativity), report->reason,
                       report->cycles);
}

static bool run(struct request *r, struct status *st)
{
    struct species species;
    struct ask ask;
    if (r->atom_count != 1)
        return status_fail(st, STATUS_USAGE,
                           "atom: %d atoms chosen; expected one element or ion",
                           r->atom_count);
    ask = request_ask(r, 0, QUANTITY_ZEFF, NULL);
    if (!output_check(r, st) || !study_species(r->study, &ask, &species, st))
        return false;
    struct atom_run *run = run_atom_new(st);
    if (!run)
        return false;
    bool ok = solve(run, r, &species, st) && write(r, run_atom_report(run), st);
    run_atom_free(run);
    return ok;
}

static const struct option *const options[] = {
    &option_charge,     &option_configuration,
    &option_unit,       &option_functional,
    &option_relativity, &option_speed_of_light,
    OPTIONS_OF_OUTPUT,  NULL,
};

const struct command command_atom = {
    .name = "atom",
    .operands = "ELEMENT",
    .least = 1,
    .most = 1,
    .manner = {.chooses = true},
    .options = options,
    .summary = "solve one atom or ion and print what it is made of",
    .about =
        "Solves the Kohn-Sham equations of one atom or ion, spherical and with "
        "a "
        "point nucleus, until they are self-consistent. Prints the total "
        "energy "
        "and its parts, then for each subshell its electrons, orbital energy, "
        "mean "
        "radius, radius of the outermost maximum of the radial density D(r) "
        "and "
        "effective nuclear charge by each definition. The density that the "
        "model "
        "scf rests on is the default, LSD with the Dirac equation. An atom "
        "that "
        "does not converge or does not bind is a failure and gives no number. "
        "ELEMENT is a symbol, name or atomic number, or an ion that carries "
        "its "
        "charge (Fe3+).",
    .example = "atom Fe3+ --functional pbe --format csv",
    .run = run,
};
