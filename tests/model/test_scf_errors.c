/* SPDX-License-Identifier: MIT */
/* The scf model against values from outside, block by block, with bounds on
 * both sides: worse is a fault, and better is a claim of the model, its
 * uncertainty or the manual that no longer holds and must be renewed. */
#include <math.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "base/units.h"
#include "scf_case.h"
#include "support/near.h"

enum { BLOCKS = 4, ELEMENTS_MAX = 118 };
static const char BLOCK[] = "spdf";

/* Deviations of a model from outside values. */
struct deviation {
    int z, block;
    double off;     /* eV, or relative */
    double claimed; /* standard uncertainty that the reading states */
};

struct sample {
    int count;
    struct deviation at[2 * ELEMENTS_MAX];
};

static void add(struct sample *sample, int z, double off, double claimed)
{
    const char *block = strchr(BLOCK, element_at(z)->block);
    ck_assert_ptr_nonnull(block);
    ck_assert_int_lt(sample->count, 2 * ELEMENTS_MAX);
    sample->at[sample->count++] =
        (struct deviation){z, (int)(block - BLOCK), off, claimed};
}

struct figures {
    int count;
    double mean, mean_absolute, rms, largest;
    int z; /* of the largest */
};

/* Of the elements of a block (-1: all), of even or odd Z (parity 0 or 1; -1:
 * both), without element `but` (0: with all). */
static struct figures figures_of(const struct sample *sample, int block,
                                 int parity, int but)
{
    struct figures f = {0};
    for (int i = 0; i < sample->count; i++) {
        const struct deviation *d = &sample->at[i];
        if ((block >= 0 && d->block != block) ||
            (parity >= 0 && d->z % 2 != parity) || d->z == but)
            continue;
        f.count++;
        f.mean += d->off;
        f.mean_absolute += fabs(d->off);
        f.rms += d->off * d->off;
        if (fabs(d->off) > f.largest) {
            f.largest = fabs(d->off);
            f.z = d->z;
        }
    }
    ck_assert_int_gt(f.count, 0);
    f.mean /= f.count;
    f.mean_absolute /= f.count;
    f.rms = sqrt(f.rms / f.count);
    return f;
}

/* What a block of a sample is like: figures, each to a width on both sides,
 * the largest to twice that. */
struct claim {
    int count;
    double mean, mean_absolute, rms, largest;
    int z;
};

static void within(double value, double claim, double width, const char *what,
                   char block)
{
    ck_assert_msg(fabs(value - claim) <= width,
                  "%s of block %c: %.5f, claimed %g ± %g", what, block, value,
                  claim, width);
}

static void check_blocks(const struct sample *sample, const char *what,
                         const struct claim *claims, int blocks, double width)
{
    int seen = 0;
    for (int b = 0; b < blocks; b++) {
        const struct claim *c = &claims[b];
        struct figures f = figures_of(sample, b, -1, 0);
        printf("# %s, block %c: %d, mean %+.4f, mean absolute %.4f, rms %.4f, "
               "largest %.4f (Z=%d)\n",
               what, BLOCK[b], f.count, f.mean, f.mean_absolute, f.rms,
               f.largest, f.z);
        ck_assert_int_eq(f.count, c->count);
        within(f.mean, c->mean, width, "mean", BLOCK[b]);
        within(f.mean_absolute, c->mean_absolute, width, "mean absolute",
               BLOCK[b]);
        within(f.rms, c->rms, width, "root mean square", BLOCK[b]);
        within(f.largest, c->largest, 2.0 * width, "largest", BLOCK[b]);
        ck_assert_int_eq(f.z, c->z);
        seen += f.count;
    }
    ck_assert_int_eq(seen, sample->count);
}

/* First ionization energies of Z = 1 … 103 less those of NIST ASD 5.12
 * (tests/atom/data/SOURCES.md), eV. */
static struct sample ionization_sample(void)
{
    struct scf_case scf;
    struct sample sample = {0};
    struct csv csv = csv_read_file(ATOM_DATA "/ionization.csv");
    scf_open(&scf);
    for (size_t i = 0; i < csv_rows(&csv); i++) {
        if ((int)csv_number(&csv, i, "stage") != 1)
            continue;
        int z = (int)csv_number(&csv, i, "z");
        scf_solve(&scf, z, 0);
        struct reading r = scf_read(&scf, QUANTITY_IONIZATION, NULL, 0, 0);
        ck_assert_msg(r.state == READING_OK && r.has_u, "Z=%d: %s", z,
                      r.reason);
        add(&sample, z, r.value.value - csv_number(&csv, i, "energy_ev"),
            r.u.value);
    }
    ck_assert_int_eq(sample.count, 103);
    csv_free(&csv);
    scf_close(&scf);
    return sample;
}

START_TEST(ionization_energies_deviate_as_claimed)
{
    static const struct claim claims[BLOCKS] = {
        {14, 0.027, 0.077, 0.092, 0.189, 4},
        {30, 0.022, 0.082, 0.121, 0.343, 5},
        {31, -0.027, 0.144, 0.175, 0.531, 23},
        {28, -0.027, 0.07, 0.101, 0.279, 92},
    };
    struct sample sample = ionization_sample();
    check_blocks(&sample, "ionization", claims, BLOCKS, 0.01);
}
END_TEST

/* Counts that chance leaves 99.9 % of the time, where each of n deviations is
 * within its limit with this probability (normal approximation). */
static void check_coverage(int count, int n, double probability,
                           const char *what)
{
    double spread = 3.29 * sqrt(n * probability * (1.0 - probability));
    printf("# %s: %d of %d, expected %.1f ± %.1f\n", what, count, n,
           n * probability, spread);
    ck_assert_msg(fabs(count - n * probability) <= spread + 0.5,
                  "%s: %d of %d, expected %.1f ± %.1f", what, count, n,
                  n * probability, spread);
}

/* The uncertainty of a reading must be what the other elements of its block
 * show: it was fitted to all of them, so each is left out in its turn. Of a
 * normal distribution 68.3 % lie within it and 90 % within 1.645 of it. */
START_TEST(the_claimed_uncertainty_is_that_of_the_other_elements)
{
    struct sample sample = ionization_sample();
    for (int b = 0; b < BLOCKS; b++) {
        int n = 0, once = 0, wide = 0;
        double least = HUGE_VAL, most = 0.0;
        for (int i = 0; i < sample.count; i++) {
            const struct deviation *d = &sample.at[i];
            if (d->block != b)
                continue;
            double others = figures_of(&sample, b, -1, d->z).rms;
            double ratio = d->claimed / others;
            least = fmin(least, ratio);
            most = fmax(most, ratio);
            once += fabs(d->off) <= others;
            wide += fabs(d->off) <= 1.645 * others;
            n++;
        }
        printf("# block %c: claimed / left-one-out %.3f to %.3f\n", BLOCK[b],
               least, most);
        ck_assert_msg(least >= 0.90 && most <= 1.25,
                      "block %c: claimed / left-one-out %.3f to %.3f", BLOCK[b],
                      least, most);
        check_coverage(once, n, 0.683, "within u of the others");
        check_coverage(wide, n, 0.90, "within 1.645 u of the others");
    }
}
END_TEST

/* The uncertainty found from the elements of even Z must hold for those of odd
 * Z, and the other way round; and so must the claimed one for both. */
START_TEST(an_uncertainty_from_one_half_holds_for_the_other)
{
    struct sample sample = ionization_sample();
    for (int parity = 0; parity < 2; parity++) {
        int n = 0, held[2] = {0}, claimed[2] = {0};
        for (int i = 0; i < sample.count; i++) {
            const struct deviation *d = &sample.at[i];
            if (d->z % 2 != parity)
                continue;
            double u = figures_of(&sample, d->block, 1 - parity, 0).rms;
            held[0] += fabs(d->off) <= u;
            held[1] += fabs(d->off) <= 1.645 * u;
            claimed[0] += fabs(d->off) <= d->claimed;
            claimed[1] += fabs(d->off) <= 1.645 * d->claimed;
            n++;
        }
        check_coverage(held[0], n, 0.683, "within u of the other half");
        check_coverage(held[1], n, 0.90, "within 1.645 u of the other half");
        check_coverage(claimed[0], n, 0.683, "within the claimed u");
        check_coverage(claimed[1], n, 0.90, "within 1.645 of the claimed u");
    }
}
END_TEST

/* Isodensity radii against the corrected table of Rahm et al.
 * (tests/atom/data/SOURCES.md), relative. */
START_TEST(isodensity_radii_deviate_as_claimed)
{
    static const struct claim claims[BLOCKS] = {
        {14, 0.0027, 0.0087, 0.0101, 0.0176, 55},
        {30, 0.0061, 0.0066, 0.0078, 0.0174, 6},
        {30, -0.0032, 0.0045, 0.0067, 0.028, 48},
        {22, -0.0053, 0.0091, 0.0122, 0.0399, 70},
    };
    struct scf_case scf;
    struct sample sample = {0};
    struct csv csv = csv_read_file(ATOM_DATA "/isodensity.csv");
    scf_open(&scf);
    for (size_t i = 0; i < csv_rows(&csv); i++) {
        int z = (int)csv_number(&csv, i, "z");
        scf_solve(&scf, z, 0);
        add(&sample, z,
            scf_value(&scf, QUANTITY_ISODENSITY, NULL, 0, 0) /
                    csv_number(&csv, i, "radius_pm") -
                1.0,
            0.0);
    }
    check_blocks(&sample, "isodensity", claims, BLOCKS, 0.001);
    csv_free(&csv);
    scf_close(&scf);
}
END_TEST

/* Radii of maximum radial density against the 1967 ones (E. Clementi, D. L.
 * Raimondi, W. P. Reinhardt, J. Chem. Phys. 47, 1300 (1967),
 * doi 10.1063/1.1712084), relative. Those are of single exponents: the
 * outermost subshells come out too wide, in the d block by a quarter; and Pd,
 * which has no 5s electron, is listed with one. */
START_TEST(radii_lie_below_those_of_single_exponents)
{
    static const struct claim claims[BLOCKS] = {
        {11, -0.1, 0.1, 0.112, 0.173, 55},
        {30, -0.062, 0.075, 0.083, 0.179, 13},
        {30, -0.232, 0.232, 0.251, 0.656, 46},
        {12, -0.18, 0.18, 0.191, 0.235, 64},
    };
    struct scf_case scf;
    struct sample sample = {0};
    struct csv csv = csv_read_file(REFDATA_DATA "/radii.csv");
    scf_open(&scf);
    for (size_t i = 0; i < csv_rows(&csv); i++) {
        int z = (int)csv_number(&csv, i, "z");
        if (strcmp(csv_cell(&csv, i, "set"), "calculated_clementi_1967") != 0)
            continue;
        scf_solve(&scf, z, 0);
        add(&sample, z,
            scf_value(&scf, QUANTITY_RADIUS, NULL, 0, 0) /
                    csv_number(&csv, i, "value_pm") -
                1.0,
            0.0);
    }
    check_blocks(&sample, "radius", claims, BLOCKS, 0.004);
    csv_free(&csv);
    scf_close(&scf);
}
END_TEST

/* Z_eff from the size of inner and outermost subshells against n ζ of the
 * printed table of 1963 (tests/refdata/data/clementi_zeff.csv), relative. The
 * model's is that of the hydrogen function n l with the same mean radius,
 * (3n² - l(l+1))/2; a single exponent has n(2n+1)/2. */
START_TEST(charges_from_the_size_are_near_the_exponents_of_1963)
{
    struct scf_case scf;
    double sum[2] = {0.0}, square[2] = {0.0}, largest[2] = {0.0};
    int count[2] = {0}, last = 0;
    struct csv csv = csv_read_file(REFDATA_DATA "/clementi_zeff.csv");
    scf_open(&scf);
    for (size_t i = 0; i < csv_rows(&csv); i++) {
        int z = (int)csv_number(&csv, i, "z"), n, l;
        ck_assert(subshell_parse(csv_cell(&csv, i, "subshell"), &n, &l));
        if (z != last)
            scf_solve(&scf, z, 0);
        last = z;
        struct reading outer =
            scf_read(&scf, QUANTITY_ZEFF, &definition_zeff_size, 0, 0);
        int which = outer.n == n && outer.l == l;
        double off =
            scf_value(&scf, QUANTITY_ZEFF, &definition_zeff_size, n, l) *
                (n * (2.0 * n + 1.0)) / (3.0 * n * n - l * (l + 1.0)) /
                csv_number(&csv, i, "zeff") -
            1.0;
        sum[which] += off;
        square[which] += off * off;
        largest[which] = fmax(largest[which], fabs(off));
        count[which]++;
    }
    static const struct {
        int count;
        double mean, rms, largest;
    } claim[2] = {{78, -0.039, 0.065, 0.240}, {17, -0.019, 0.097, 0.239}};
    for (int k = 0; k < 2; k++) {
        double mean = sum[k] / count[k], rms = sqrt(square[k] / count[k]);
        char outer = k ? 'o' : 'i';
        printf("# charge from the size, %s: %d, mean %+.4f, rms %.4f, largest "
               "%.4f\n",
               k ? "outermost" : "inner", count[k], mean, rms, largest[k]);
        ck_assert_int_eq(count[k], claim[k].count);
        within(mean, claim[k].mean, 0.003, "mean", outer);
        within(rms, claim[k].rms, 0.003, "root mean square", outer);
        within(largest[k], claim[k].largest, 0.006, "largest", outer);
    }
    csv_free(&csv);
    scf_close(&scf);
}
END_TEST

/* The number behind `key` in a text. */
static double number_behind(const char *text, const char *key)
{
    const char *at = strstr(text, key);
    ck_assert_msg(at != NULL, "'%s' in '%s'", key, text);
    return strtod(at + strlen(key), NULL);
}

/* Allen's factor per rydberg, as the rows of the worked examples print it
 * ("chi = 2.30016 CE(Ry)", Allen 1989), with which their configuration
 * energies must give their electronegativities. */
static double allen_factor(void)
{
    struct csv csv = csv_read_file("data/worked_examples_screening.csv");
    double factor = 0.0;
    int seen = 0;
    for (size_t i = 0; i < csv_rows(&csv); i++) {
        const char *output = csv_cell(&csv, i, "output");
        if (strcmp(csv_cell(&csv, i, "method"), "allen") != 0 ||
            strncmp(output, "chi = ", 6) != 0)
            continue;
        factor = number_behind(output, "chi = ");
        double energy =
            number_behind(csv_cell(&csv, i, "inputs"), "configuration energy ");
        near(factor * energy / RYDBERG_EV, csv_number(&csv, i, "value"),
             csv_number(&csv, i, "tolerance"), 0.0, "%s",
             csv_cell(&csv, i, "inputs"));
        seen++;
    }
    ck_assert_int_eq(seen, 2);
    csv_free(&csv);
    return factor;
}

/* Where all valence electrons are s electrons of one subshell, the
 * configuration energy is the ionization energy. With that of NIST ASD the
 * factor must give the printed values (tests/refdata/data/electronegativity.csv
 * from L. C. Allen, J. Am. Chem. Soc. 111, 9003 (1989), and J. B. Mann, T. L.
 * Meek, L. C. Allen, ibid. 122, 2780 (2000)), to a unit of their last digit;
 * that of He is off by three. */
START_TEST(the_allen_scale_has_its_factor)
{
    static const struct {
        int z;
        double printed, ionization, unit;
    } atom[] = {
        {2, 4.160, 24.587389011, 3.5e-3}, {3, 0.912, 5.391714996, 1e-3},
        {4, 1.576, 9.322699, 1e-3},       {11, 0.869, 5.13907696, 1e-3},
        {12, 1.293, 7.646236, 1e-3},      {19, 0.734, 4.34066373, 1e-3},
        {20, 1.034, 6.11315547, 1e-3},    {37, 0.706, 4.1771281, 1e-3},
        {38, 0.963, 5.69486745, 1e-3},    {55, 0.659, 3.89390572743, 1e-3},
        {56, 0.881, 5.2116646, 1e-3},
    };
    struct scf_case scf;
    double factor = allen_factor();
    scf_open(&scf);
    for (size_t i = 0; i < sizeof atom / sizeof *atom; i++) {
        scf_solve(&scf, atom[i].z, 0);
        double chi = scf_value(&scf, QUANTITY_ELECTRONEGATIVITY, NULL, 0, 0);
        double energy = scf_value(&scf, QUANTITY_IONIZATION, NULL, 0, 0);
        near(chi / energy * RYDBERG_EV, factor, 0.0, 1e-7, "Z=%d factor",
             atom[i].z);
        near(chi / energy * atom[i].ionization, atom[i].printed, atom[i].unit,
             0.0, "Z=%d in print", atom[i].z);
    }
    scf_close(&scf);
}
END_TEST

/* The whole scale, relative. */
START_TEST(allen_electronegativities_deviate_as_claimed)
{
    static const struct claim claims[BLOCKS - 1] = {
        {14, 0.007, 0.012, 0.014, 0.022, 11},
        {30, -0.004, 0.021, 0.029, 0.076, 82},
        {30, -0.045, 0.084, 0.11, 0.266, 24},
    };
    struct scf_case scf;
    struct sample sample = {0};
    struct csv csv = csv_read_file(REFDATA_DATA "/electronegativity.csv");
    scf_open(&scf);
    for (size_t i = 0; i < csv_rows(&csv); i++) {
        if (strcmp(csv_cell(&csv, i, "scale"), "allen") != 0)
            continue;
        int z = (int)csv_number(&csv, i, "z");
        scf_solve(&scf, z, 0);
        add(&sample, z,
            scf_value(&scf, QUANTITY_ELECTRONEGATIVITY, NULL, 0, 0) /
                    csv_number(&csv, i, "value") -
                1.0,
            0.0);
    }
    check_blocks(&sample, "Allen", claims, BLOCKS - 1, 0.003);
    csv_free(&csv);
    scf_close(&scf);
}
END_TEST

TCase *case_scf_errors(void)
{
    TCase *c = tcase_create("errors");
    tcase_set_timeout(c, 20.0);
    tcase_add_test(c, ionization_energies_deviate_as_claimed);
    tcase_add_test(c, the_claimed_uncertainty_is_that_of_the_other_elements);
    tcase_add_test(c, an_uncertainty_from_one_half_holds_for_the_other);
    tcase_add_test(c, isodensity_radii_deviate_as_claimed);
    tcase_add_test(c, radii_lie_below_those_of_single_exponents);
    tcase_add_test(c, charges_from_the_size_are_near_the_exponents_of_1963);
    tcase_add_test(c, the_allen_scale_has_its_factor);
    tcase_add_test(c, allen_electronegativities_deviate_as_claimed);
    return c;
}
