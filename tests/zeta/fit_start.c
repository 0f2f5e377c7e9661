/* SPDX-License-Identifier: MIT */
/* Makes src/zeta/start_table.c from this method's own results:
 *
 *     fit_start tests/zeta/data/species.csv > start_table.c
 *
 * solves the listed atoms and ions, ions of one electron count along Z, and
 * random valence configurations; fits the effective charges linearly in Z and
 * the electrons of each subshell, and the elements of the Hessian in Z, N and
 * 1/Z, by least squares that leave out what lies far off (solutions with a
 * diffuse d or f function). It begins from the table that is there, so run it
 * twice after a change of the method. */
#include <math.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "base/file.h"
#include "base/text.h"
#include "zeta/descent.h"
#include "zeta/layout.h"
#include "zeta/start.h"
#include "zeta/start_table.h"

#define SAMPLE_MAX 6000
#define HESSIAN_SAMPLES 3000 /* every sample up to here is differentiated */
#define RANDOM_COUNT 4000
#define CHARGE_FEATURES (START_CHARGE_COUNT + 2)
#define CURVATURE_FEATURES 4
#define WEIGHT_NEUTRAL 4.0
#define WEIGHT_LISTED 1.0
#define WEIGHT_OTHER 0.1

struct sample {
    double z, electrons, weight;
    int shells, variables;
    double occ[START_SUBSHELLS];
    int place[ENERGY_VARIABLE_MAX];
    double z_eff[ENERGY_SHELL_MAX];
    float *hessian; /* lower triangle over the scales, NULL when not taken */
};

struct fit {
    struct energy energy;
    struct descent descent;
    int count;
    struct sample samples[SAMPLE_MAX];
};

static const int l_first[BLOCK_COUNT] = {0, 8, 15, 21};
static const int fitted_place[START_CHARGE_COUNT] = {
    0, 1, 2, 3, 4, 5, 6, 8, 9, 10, 11, 12, 13, 15, 16, 17, 18, 21, 22,
};

/* To the minimum as zeta_step goes; x receives the variables. */
static bool minimise(struct fit *fit, double x[])
{
    struct energy *e = &fit->energy;
    struct descent *d = &fit->descent;
    double z_eff[ENERGY_SHELL_MAX];
    start_charges(&e->atom, z_eff);
    for (int i = 0; i < e->atom.variables; i++)
        x[i] = i < e->atom.shells ? log(z_eff[i] / e->atom.n[i]) : 0.0;
    if (!energy_evaluate(e, x))
        return false;
    d->tolerance = 1e-7;
    d->cap = 0.25;
    start_hessian(e, d->inverse);
    enum descent_state state =
        descent_begin(d, e->atom.variables, x, e->total, e->gradient);
    for (int i = 0; state == DESCENT_MORE && i < 200; i++) {
        bool fine = energy_evaluate(e, d->trial);
        state = descent_take(d, fine ? e->total : HUGE_VAL, e->gradient);
    }
    memcpy(x, d->x, sizeof d->x);
    return state == DESCENT_DONE && energy_evaluate(e, x);
}

/* Gradient and unscaled kinetic energy with variable i moved by h. */
static bool moved(struct energy *e, const double x[], int i, double h,
                  double gradient[], double *kinetic)
{
    double trial[ENERGY_VARIABLE_MAX];
    memcpy(trial, x, sizeof trial);
    trial[i] += h;
    double before = trial[0];
    if (!energy_evaluate(e, trial))
        return false;
    memcpy(gradient, e->gradient, sizeof e->gradient);
    *kinetic = e->kinetic * exp(2.0 * (before - trial[0]));
    return true;
}

/* The Hessian without the exact scaling, over the scales of the variables:
 * that of the scaled energy and the part that the scaling takes away. */
static bool differentiate(struct energy *e, const double x[],
                          const double scale[], float out[])
{
    const double h = 1e-4;
    int count = e->atom.variables;
    double up[ENERGY_VARIABLE_MAX], down[ENERGY_VARIABLE_MAX];
    double m[ENERGY_VARIABLE_MAX][ENERGY_VARIABLE_MAX];
    double slope[ENERGY_VARIABLE_MAX], t_up, t_down, kinetic = e->kinetic;
    for (int i = 0; i < count; i++) {
        if (!moved(e, x, i, h, up, &t_up) || !moved(e, x, i, -h, down, &t_down))
            return false;
        slope[i] = (t_up - t_down) / (2 * h);
        for (int j = 0; j < count; j++)
            m[i][j] = (up[j] - down[j]) / (2 * h);
    }
    for (int i = 0; i < count; i++)
        for (int j = 0; j <= i; j++)
            *out++ = (float)((0.5 * (m[i][j] + m[j][i]) +
                              slope[i] * slope[j] / (2 * kinetic)) /
                             (scale[i] * scale[j]));
    return true;
}

/* Places and scales of the variables, as start.c has them. */
static void describe(const struct energy *e, struct sample *s, double scale[])
{
    const struct energy_atom *atom = &e->atom;
    for (int i = 0; i < atom->shells; i++) {
        s->place[i] = l_first[atom->l[i]] + atom->n[i] - atom->l[i] - 1;
        s->occ[s->place[i]] = atom->occ[i];
        s->electrons += atom->occ[i];
        s->z_eff[i] = atom->n[i] * e->zeta[i];
        scale[i] = sqrt(atom->occ[i]) * e->zeta[i];
    }
    for (int l = 0; l < BLOCK_COUNT; l++) {
        const struct energy_block *b = &atom->block[l];
        for (int i = 0; b->open > 0 && i < b->count - 1; i++) {
            s->place[b->kappa + i] = START_SUBSHELLS + l_first[l] + i;
            scale[b->kappa + i] =
                sqrt(b->full - b->open) * e->zeta[b->first + i];
        }
    }
}

static void add_sample(struct fit *fit, int z, const char *text, double weight)
{
    struct status st = status_ok();
    struct configuration c;
    char reason[ZETA_REASON_MAX];
    struct energy *e = &fit->energy;
    double x[DESCENT_MAX] = {0.0}, scale[ENERGY_VARIABLE_MAX];
    struct zeta_problem problem = {z, &c, ZETA_HUND, NULL};
    if (fit->count >= SAMPLE_MAX || !configuration_parse(text, &c, &st) ||
        !layout_fill(&e->atom, &problem, reason))
        return;
    energy_prepare(e);
    if (!minimise(fit, x))
        return;
    struct sample *s = &fit->samples[fit->count++];
    *s = (struct sample){.z = z, .weight = weight};
    s->shells = e->atom.shells;
    s->variables = e->atom.variables;
    describe(e, s, scale);
    size_t size = (size_t)s->variables * (size_t)(s->variables + 1) / 2;
    if (fit->count <= HESSIAN_SAMPLES)
        s->hessian = malloc(size * sizeof *s->hessian);
    if (s->hessian && !differentiate(e, x, scale, s->hessian)) {
        free(s->hessian);
        s->hessian = NULL;
    }
}

static void add_listed(struct fit *fit, char *data)
{
    for (char *row = data; row && *row;) {
        char *next = strchr(row, '\n');
        if (next)
            *next++ = '\0';
        char *charge = strchr(row, ',');
        char *text = charge ? strchr(charge + 1, ',') : NULL;
        char *end = text ? strchr(text + 1, ',') : NULL;
        int z;
        if (end) {
            *charge = *text = *end = '\0';
            bool neutral = strcmp(charge + 1, "0") == 0;
            if (text_to_int(row, &z))
                add_sample(fit, z, text + 1,
                           neutral ? WEIGHT_NEUTRAL : WEIGHT_LISTED);
        }
        row = next;
    }
}

static unsigned random_below(unsigned long long *state, unsigned bound)
{
    *state = *state * 6364136223846793005ULL + 1442695040888963407ULL;
    return (unsigned)(*state >> 33) % bound;
}

/* Ions of one electron count along Z, subshells filled by n, then l. */
static void add_isoelectronic(struct fit *fit)
{
    unsigned long long state = 11;
    for (int electrons = 1; electrons <= 103; electrons++) {
        char text[CONFIGURATION_TEXT_MAX];
        int left = electrons, length = 0;
        for (int n = 1; n <= 7; n++)
            for (int l = 0; l < n && l <= L_MAX && left > 0; l++) {
                int occ = left < 4 * l + 2 ? left : 4 * l + 2;
                length += snprintf(text + length, sizeof text - (size_t)length,
                                   "%s%d%c%d", length ? " " : "", n,
                                   subshell_letter(l), occ);
                left -= occ;
            }
        for (int i = 0; i < 8 && electrons + 4 <= 118; i++) {
            unsigned room = (unsigned)(118 - electrons - 3);
            if (i % 2 == 1 && room > 17)
                room = 17;
            add_sample(fit, electrons + 4 + (int)random_below(&state, room),
                       text, WEIGHT_OTHER);
        }
    }
}

static void add_random(struct fit *fit)
{
    static const struct {
        const char *core, *valence; /* pairs of n and l */
        int electrons;
    } rooms[] = {
        {"He", "2s2p", 2},      {"Ne", "3s3p3d", 10},   {"Ar", "4s3d4p", 18},
        {"Kr", "5s4d5p4f", 36}, {"Xe", "6s4f5d6p", 54}, {"Rn", "7s5f6d7p", 86},
    };
    unsigned long long state = 7;
    for (int made = 0; made < RANDOM_COUNT;) {
        unsigned k = random_below(&state, 6);
        int count = (int)strlen(rooms[k].valence) / 2, room = 0;
        int l[4], n[4], occ[4] = {0};
        for (int i = 0; i < count; i++) {
            char label[] = {rooms[k].valence[(size_t)2 * i],
                            rooms[k].valence[(size_t)2 * i + 1], '\0'};
            if (!subshell_parse(label, &n[i], &l[i]))
                return;
            room += 4 * l[i] + 2;
        }
        int valence = 1 + (int)random_below(&state, (unsigned)room);
        int z = rooms[k].electrons + valence + (int)random_below(&state, 4);
        if (z > 118)
            continue;
        for (int left = valence; left > 0;) {
            unsigned i = random_below(&state, (unsigned)count);
            if (occ[i] < 4 * l[i] + 2) {
                occ[i]++;
                left--;
            }
        }
        char text[CONFIGURATION_TEXT_MAX];
        int length = snprintf(text, sizeof text, "[%s]", rooms[k].core);
        for (int i = 0; i < count; i++)
            if (occ[i] > 0)
                length +=
                    snprintf(text + length, sizeof text - (size_t)length,
                             " %d%c%d", n[i], subshell_letter(l[i]), occ[i]);
        add_sample(fit, z, text, WEIGHT_OTHER);
        made++;
    }
}

/* Normal equations a c = b of at most CHARGE_FEATURES unknowns, by Gauss's
 * elimination; a ridge keeps columns apart that never move alone. */
struct normal {
    int count;
    double a[CHARGE_FEATURES][CHARGE_FEATURES], b[CHARGE_FEATURES], sum;
};

static void normal_add(struct normal *m, const double f[], double y, double w)
{
    m->sum += w;
    for (int i = 0; i < m->count; i++) {
        m->b[i] += w * f[i] * y;
        for (int j = 0; j < m->count; j++)
            m->a[i][j] += w * f[i] * f[j];
    }
}

static void normal_solve(struct normal *m, double ridge, double c[])
{
    for (int i = 0; i < m->count; i++)
        m->a[i][i] += ridge * m->sum;
    for (int i = 0; i < m->count; i++)
        for (int k = i + 1; k < m->count; k++) {
            double factor = m->a[k][i] / m->a[i][i];
            for (int j = i; j < m->count; j++)
                m->a[k][j] -= factor * m->a[i][j];
            m->b[k] -= factor * m->b[i];
        }
    for (int i = m->count - 1; i >= 0; i--) {
        c[i] = m->b[i];
        for (int j = i + 1; j < m->count; j++)
            c[i] -= m->a[i][j] * c[j];
        c[i] /= m->a[i][i];
    }
}

static double product(int count, const double a[], const double b[])
{
    double sum = 0.0;
    for (int i = 0; i < count; i++)
        sum += a[i] * b[i];
    return sum;
}

/* Twelve rounds; what is off by more than a shrinking bound in ln Z_eff is
 * left out. */
static void fit_charge(const struct fit *fit, int place, double c[])
{
    enum { ROUNDS = 12 };
    memset(c, 0, CHARGE_FEATURES * sizeof *c);
    for (int round = 0; round < ROUNDS; round++) {
        struct normal m = {.count = CHARGE_FEATURES};
        double bound = 0.12 * (1.0 + 4.0 * (1.0 - (double)round / ROUNDS));
        for (int k = 0; k < fit->count; k++) {
            const struct sample *s = &fit->samples[k];
            double f[CHARGE_FEATURES] = {1.0, s->z};
            for (int i = 0; i < START_CHARGE_COUNT; i++)
                f[2 + i] = s->occ[fitted_place[i]];
            for (int i = 0; i < s->shells; i++) {
                double y = s->z_eff[i];
                double now = product(CHARGE_FEATURES, c, f);
                if (s->place[i] != place)
                    continue;
                if (round == 0 || (now > 0.0 && fabs(log(now / y)) < bound))
                    normal_add(&m, f, y, s->weight / (y * y));
            }
        }
        normal_solve(&m, 1e-6, c);
    }
}

/* Element a, b of the scaled Hessians; its largest fitted size is returned, 0
 * when the pair never stands together. */
static double fit_curvature(const struct fit *fit, int a, int b, double c[])
{
    double spread = HUGE_VAL, largest = 0.0;
    memset(c, 0, CURVATURE_FEATURES * sizeof *c);
    for (int round = 0; round < 6; round++) {
        struct normal m = {.count = CURVATURE_FEATURES};
        double square = 0.0;
        largest = 0.0;
        for (int k = 0; k < fit->count; k++) {
            const struct sample *s = &fit->samples[k];
            int i = s->variables - 1, j = i;
            while (i >= 0 && s->place[i] != a)
                i--;
            while (j >= 0 && s->place[j] != b)
                j--;
            if (i < 0 || j < 0 || !s->hessian)
                continue;
            if (i < j) {
                int swap = i;
                i = j;
                j = swap;
            }
            double f[CURVATURE_FEATURES] = {1.0, s->z / 100, s->electrons / 100,
                                            10 / s->z};
            double y = (double)s->hessian[i * (i + 1) / 2 + j];
            double now = product(CURVATURE_FEATURES, c, f);
            double off = round ? (y - now) / spread / 1.5 : 0.0;
            double w = s->weight / (1.0 + off * off);
            normal_add(&m, f, y, w);
            square += w * (y - now) * (y - now);
            largest = fmax(largest, fabs(now));
        }
        if (m.sum <= 0.0)
            return 0.0;
        spread = sqrt(square / m.sum) + 1e-9;
        normal_solve(&m, 1e-3, c);
    }
    return largest;
}

static void print_charges(const struct fit *fit)
{
    printf("const struct start_charge "
           "start_charges_fitted[START_CHARGE_COUNT] = {\n");
    for (int p = 0; p < START_CHARGE_COUNT; p++) {
        double c[CHARGE_FEATURES];
        int l = BLOCK_COUNT - 1;
        while (l_first[l] > fitted_place[p])
            l--;
        fit_charge(fit, fitted_place[p], c);
        printf("    {%d, %d, %#.5gf, %#.5gf, {",
               fitted_place[p] - l_first[l] + l + 1, l, c[0], c[1]);
        for (int i = 0; i < START_CHARGE_COUNT; i++)
            printf("%s%#.4gf,", i % 7 == 0 ? "\n        " : " ", c[2 + i]);
        printf("\n    }},\n");
    }
    printf("};\n\n");
}

static void print_curvatures(const struct fit *fit)
{
    int first[START_VARIABLES + 1], count = 0;
    printf("const struct start_curvature\n    start_curvatures_fitted"
           "[START_CURVATURE_COUNT] = {\n");
    for (int a = 0; a < START_VARIABLES; a++) {
        first[a] = count;
        for (int b = 0; b <= a; b++) {
            double c[CURVATURE_FEATURES];
            double largest = fit_curvature(fit, a, b, c);
            if (largest <= 0.0 || (a != b && largest < 0.01))
                continue;
            printf("    {%d, %d, {%.4ff, %.4ff, %.4ff, %.4ff}},\n", a, b, c[0],
                   c[1], c[2], c[3]);
            count++;
        }
    }
    first[START_VARIABLES] = count;
    printf("};\n\nconst short start_curvature_first[START_VARIABLES + 1] = {");
    for (int a = 0; a <= START_VARIABLES; a++)
        printf("%s%d,", a % 13 == 0 ? "\n    " : " ", first[a]);
    printf("\n};\n/* clang-format on */\n");
    fprintf(stderr, "START_CURVATURE_COUNT is %d\n", count);
}

int main(int argc, char **argv)
{
    struct status st = status_ok();
    char *data = NULL;
    size_t size;
    struct fit *fit = calloc(1, sizeof *fit);
    if (argc != 2 || !fit || !file_read(argv[1], 1 << 20, &data, &size, &st)) {
        fprintf(stderr, "usage: fit_start SPECIES.csv\n%s\n", st.message);
        free(fit);
        return EXIT_FAILURE;
    }
    zeta_slater_tables_fill(&fit->energy.tables);
    add_listed(fit, data);
    add_isoelectronic(fit);
    add_random(fit);
    free(data);
    printf("/* SPDX-License-Identifier: MIT */\n"
           "/* Made by tests/zeta/fit_start.c from %d solved atoms and ions. "
           "These numbers\n * decide how soon the search ends and which of two "
           "minima it finds, never the\n * result in that minimum. */\n"
           "#include \"zeta/start_table.h\"\n\n/* clang-format off */\n",
           fit->count);
    print_charges(fit);
    print_curvatures(fit);
    for (int k = 0; k < fit->count; k++)
        free(fit->samples[k].hessian);
    free(fit);
    return EXIT_SUCCESS;
}
