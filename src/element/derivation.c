/* SPDX-License-Identifier: MIT */
#include "element/derivation.h"

#include <math.h>

#include "base/units.h"

/* ---- Z_eff = n sqrt(I/Ry): one electron in the field of a point charge ----
 */

static int zeff_inputs(int charge,
                       struct derivation_input inputs[DERIVATION_INPUTS_MAX],
                       const char **reason)
{
    (void)charge;
    (void)reason;
    inputs[0] = (struct derivation_input){QUANTITY_IONIZATION, 0};
    return 1;
}

static double zeff_value(const double *x, int n, double *d)
{
    double z_eff = n * sqrt(x[0] / RYDBERG_EV);
    d[0] = 0.5 * z_eff / x[0];
    return z_eff;
}

const struct derivation derivation_zeff = {
    .id = "zeff_from_ionization",
    .title = "Z_eff from the stored ionization energy, n sqrt(I/Ry)",
    .domain = "the subshell that loses the electron",
    .definition = &definition_zeff_energy,
    .unsourced = "formula n sqrt(I/Ry): common practice, no source",
    .in_front = true,
    .of_emptied = true,
    .inputs = zeff_inputs,
    .value = zeff_value,
};

/* ---- Half the sum and half the difference of I and A ---- */

static const struct citation mulliken1934 = {
    .key = "mulliken1934",
    .kind = "article",
    .authors = CITATION_NAMES("R. S. Mulliken"),
    .title = "A New Electroaffinity Scale; Together with Data on Valence "
             "States and on Valence Ionization Potentials and Electron "
             "Affinities",
    .container = "J. Chem. Phys.",
    .year = 1934,
    .volume = "2",
    .pages = "782",
    .doi = "10.1063/1.1749394",
    .from_memory = "title",
};

/* The scale was made for atoms; A is never taken as zero. */
static int
mulliken_inputs(int charge,
                struct derivation_input inputs[DERIVATION_INPUTS_MAX],
                const char **reason)
{
    inputs[0] = (struct derivation_input){QUANTITY_IONIZATION, 0};
    inputs[1] = (struct derivation_input){QUANTITY_AFFINITY, 0};
    *reason = "the scale is defined for the neutral atom";
    return charge == 0 ? 2 : 0;
}

static double mulliken_value(const double *x, int n, double *d)
{
    (void)n;
    d[0] = d[1] = 0.5;
    return 0.5 * (x[0] + x[1]);
}

const struct derivation derivation_mulliken = {
    .id = "mulliken_from_ionization",
    .title = "Mulliken electronegativity from the stored I and A, (I + A)/2",
    .domain = "neutral atoms whose electron affinity is stored",
    .definition = &definition_mulliken,
    .citation = &mulliken1934,
    .inputs = mulliken_inputs,
    .value = mulliken_value,
};

static const struct citation parr1983 = {
    .key = "parr1983",
    .kind = "article",
    .authors = CITATION_NAMES("R. G. Parr", "R. G. Pearson"),
    .title = "Absolute hardness: companion parameter to absolute "
             "electronegativity",
    .container = "J. Am. Chem. Soc.",
    .year = 1983,
    .volume = "105",
    .pages = "7512",
    .doi = "10.1021/ja00364a005",
    .from_memory = "title",
};

/* Of an ion A is the ionization energy that made it. */
static int
hardness_inputs(int charge,
                struct derivation_input inputs[DERIVATION_INPUTS_MAX],
                const char **reason)
{
    inputs[0] = (struct derivation_input){QUANTITY_IONIZATION, 0};
    inputs[1] = charge > 0 ? (struct derivation_input){QUANTITY_IONIZATION, -1}
                           : (struct derivation_input){QUANTITY_AFFINITY, 0};
    *reason = "hardness is given for atoms and cations";
    return charge >= 0 ? 2 : 0;
}

static double hardness_value(const double *x, int n, double *d)
{
    (void)n;
    d[0] = 0.5;
    d[1] = -0.5;
    return 0.5 * (x[0] - x[1]);
}

const struct derivation derivation_hardness = {
    .id = "hardness_from_ionization",
    .title = "Chemical hardness from the stored I and A, (I - A)/2",
    .domain = "atoms whose electron affinity is stored; cations",
    .definition = &definition_hardness,
    .citation = &parr1983,
    .inputs = hardness_inputs,
    .value = hardness_value,
};

/* ---- What follows ---- */

/* Significant digits of a derived value at least; more where the inputs are
 * that sharp. */
#define DERIVED_DIGITS 7

struct reading derivation_reading(const struct derivation *derivation,
                                  const struct reading *readings, int count,
                                  int n, const struct provenance *provenance)
{
    double x[DERIVATION_INPUTS_MAX] = {0.0};
    double d[DERIVATION_INPUTS_MAX] = {0.0};
    double variance = 0.0;
    for (int i = 0; i < count; i++)
        x[i] = readings[i].value.value;
    double value = derivation->value(x, n, d);
    struct reading r =
        reading_computed(derivation->definition->quantity, value, provenance);
    r.has_u = true;
    r.evidence = readings[0].evidence;
    for (int i = 0; i < count; i++) {
        double share = d[i] * readings[i].u.value;
        r.has_u = r.has_u && readings[i].has_u;
        variance += readings[i].has_u ? share * share : 0.0;
        if (readings[i].evidence != r.evidence)
            r.evidence = EVIDENCE_DERIVED;
        if (r.remark[0] == '\0')
            r.remark = readings[i].remark;
    }
    if (r.has_u && variance > 0.0) {
        r.u = number_round(sqrt(variance), 2, 0);
        r.value = number_round(value, DERIVED_DIGITS, r.u.decimals);
    }
    r.has_u = r.has_u && variance > 0.0;
    return r;
}
