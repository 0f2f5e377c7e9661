/* SPDX-License-Identifier: MIT */
#include <math.h>
#include <stdio.h>
#include <string.h>
#include <xc.h>

#include "atom/hybrid.h"
#include "atom/result.h"
#include "atom/uniform.h"
#include "case.h"
#include "support/near.h"

/* c of libxc's relativistic exchange. */
static const double LIBXC_C = 137.0359996287515;

static void add(int id, int spins, const double *rho, double *energy,
                double v[2])
{
    xc_func_type f;
    double e, dv[2] = {0.0, 0.0};
    ck_assert_int_eq(xc_func_init(&f, id, spins), 0);
    xc_lda_exc_vxc(&f, 1, rho, &e, dv);
    *energy += e;
    v[0] += dv[0];
    v[1] += dv[1];
    xc_func_end(&f);
}

/* libxc 5.2 over densities of atoms, 1e-10 … 1e6 electrons/bohr³. */
START_TEST(uniform_gas_agrees_with_libxc)
{
    for (int k = 0; k < 42; k++) {
        double rho = 1.37e-10 * pow(2.385, k);
        double e, v, want = 0.0, vw[2] = {0.0, 0.0};
        uniform_lda(1, &rho, 0.0, &e, &v);
        add(XC_LDA_X, XC_UNPOLARIZED, &rho, &want, vw);
        add(XC_LDA_C_VWN, XC_UNPOLARIZED, &rho, &want, vw);
        near(e, want, 0.0, 1e-9, "LDA energy at %g", rho);
        near(v, vw[0], 0.0, 1e-9, "LDA potential at %g", rho);
    }
}
END_TEST

START_TEST(relativistic_exchange_agrees_with_libxc)
{
    for (int k = 0; k < 26; k++) {
        double rho = 1.37e-3 * pow(2.385, k);
        double e, v, want = 0.0, vw[2] = {0.0, 0.0};
        uniform_lda(1, &rho, LIBXC_C, &e, &v);
        add(XC_LDA_X_REL, XC_UNPOLARIZED, &rho, &want, vw);
        add(XC_LDA_C_VWN, XC_UNPOLARIZED, &rho, &want, vw);
        near(e, want, 0.0, 1e-8, "energy at %g", rho);
        near(v, vw[0], 0.0, 1e-8, "potential at %g", rho);
    }
}
END_TEST

START_TEST(spin_polarised_gas_agrees_with_libxc)
{
    for (int k = 0; k < 19; k++)
        for (int z = 0; z < 7; z++) {
            double rho = 1.37e-8 * pow(5.385, k), part = 0.5 + 0.0713 * z;
            double pair[2] = {rho * part, rho * (1.0 - part)};
            double e, up, down, want = 0.0, v[2] = {0.0, 0.0};
            uniform_lsd(1, &pair[0], &pair[1], 0.0, &e, &up, &down);
            add(XC_LDA_X, XC_POLARIZED, pair, &want, v);
            add(XC_LDA_C_VWN, XC_POLARIZED, pair, &want, v);
            near(e, want, 0.0, 1e-8, "LSD energy at %g %g", rho, part);
            near(up, v[0], 0.0, 1e-8, "majority at %g %g", rho, part);
            near(down, v[1], 0.0, 1e-8, "minority at %g %g", rho, part);
        }
}
END_TEST

/* v = d(ρε)/dρ, by central differences; covers the relativistic factor of
 * either spin and both of its branches. */
START_TEST(potentials_are_derivatives_of_the_energies)
{
    for (int k = 0; k < 24; k++)
        for (int z = 0; z < 3; z++) {
            double rho = 1.37e-6 * pow(3.385, k), part = 0.5 + 0.1713 * z;
            double n[2] = {rho * part, rho * (1.0 - part)}, v[2], e;
            uniform_lsd(1, &n[0], &n[1], 137.036, &e, &v[0], &v[1]);
            for (int c = 0; c < 2; c++) {
                double h = 1e-4 * n[c], side[2], other[2];
                for (int s = 0; s < 2; s++) {
                    double m[2] = {n[0], n[1]};
                    m[c] += s ? h : -h;
                    uniform_lsd(1, &m[0], &m[1], 137.036, &e, &other[0],
                                &other[1]);
                    side[s] = e * (m[0] + m[1]);
                }
                near((side[1] - side[0]) / (2.0 * h), v[c], 0.0, 2e-7,
                     "channel %d at %g %g", c, rho, part);
            }
        }
}
END_TEST

/* tests/atom/data/gga_total.csv, to 3e-6: the values are rounded to 1e-6, and
 * where libxc begins to take a density for zero moves them as much. */
START_TEST(gradient_totals_meet_the_published_ones)
{
    struct csv csv = csv_read_file(DATA_DIR "/gga_total.csv");
    ck_assert_uint_eq(csv_rows(&csv), 17);
    struct atom_solver *solver = case_solver();
    double largest = 0.0;
    for (size_t i = 0; i < csv_rows(&csv); i++) {
        const char *name = csv_cell(&csv, i, "functional");
        struct atom_options options = {
            .functional = strncmp(name, "LSDA", 4) == 0 ? ATOM_LSD
                          : strstr(name, "VWN") != NULL ? ATOM_PBE_VWN
                                                        : ATOM_PBE};
        int Z = (int)csv_number(&csv, i, "z");
        case_solve(solver, Z, csv_cell(&csv, i, "configuration"), &options,
                   ATOM_CONVERGED);
        double want = csv_number(&csv, i, "etot_hartree");
        double got = atom_energies(solver).total;
        near(got, want, 3e-6, 0.0, "Z=%d %s", Z, name);
        largest = fmax(largest, fabs(got - want));
    }
    printf("# gradient functionals: largest deviation %.2g\n", largest);
    atom_solver_free(solver);
    csv_free(&csv);
}
END_TEST

enum { GRID = 6001 };

/* Simpson's rule in ln r, apart from the solver's own quadrature. */
static double integrate(const double *r, const double *f)
{
    double sum = 0.0, h = log(r[1] / r[0]);
    for (int i = 0; i < GRID; i++)
        sum += (i == 0 || i == GRID - 1 ? 1.0
                : i % 2                 ? 4.0
                                        : 2.0) *
               r[i] * f[i];
    return sum * h / 3.0;
}

static void log_grid(double *r, double first, double last)
{
    for (int i = 0; i < GRID; i++)
        r[i] = first * pow(last / first, (double)i / (GRID - 1));
}

START_TEST(the_density_integrates_to_the_electron_count)
{
    static double r[GRID], d[GRID], within[GRID];
    struct cases cases = cases_read();
    struct atom_solver *solver = case_solver();
    struct status st = status_ok();
    for (int Z = 1; Z <= 118; Z += 13)
        for (int dirac = 0; dirac < 2; dirac++) {
            struct species species;
            struct atom_options options = {
                .functional = ATOM_LSD,
                .relativity = dirac ? ATOM_DIRAC : ATOM_SCHROEDINGER};
            cases_species(&cases, Z, 0, &species);
            ck_assert(
                atom_begin(solver, Z, &species.configuration, &options, &st));
            ck_assert_int_eq(atom_solve(solver), ATOM_CONVERGED);
            log_grid(r, 1e-7 / Z, 44.0);
            atom_curve_at(solver, ATOM_CURVE_DENSITY, -1, GRID, r, d);
            near(integrate(r, d), Z, 1e-6, 0.0, "Z=%d electrons", Z);
            atom_curve_at(solver, ATOM_CURVE_ENCLOSED, -1, GRID, r, within);
            near(within[GRID - 1], Z, 1e-7, 0.0, "Z=%d enclosed", Z);
            double sum = 0.0;
            for (int i = 0; i < atom_subshell_count(solver); i++) {
                atom_curve_at(solver, ATOM_CURVE_DENSITY, i, GRID, r, d);
                struct atom_orbital o = atom_subshell_at(solver, i);
                near(integrate(r, d), o.occ, 1e-6, 0.0, "Z=%d subshell", Z);
                sum += o.occ;
            }
            near(sum, Z, 1e-12, 0.0, "Z=%d subshells", Z);
        }
    atom_solver_free(solver);
    cases_free(&cases);
}
END_TEST

/* 2T + E_nuc + E_coul = -∫ ρ r·∇v_xc d³r for a local functional (M. Levy, J.
 * P. Perdew, Phys. Rev. A 32, 2010 (1985), doi 10.1103/PhysRevA.32.2010,
 * equation 17), Schrödinger equation. */
START_TEST(the_virial_relation_holds)
{
    static double r[GRID], d[GRID], rho[GRID], e[GRID], v[GRID], f[GRID];
    static const struct {
        int Z;
        const char *configuration;
    } atom[] = {{2, "1s2"}, {18, "[Ar]"}, {36, "[Kr]"}, {92, "[Rn] 5f4 7s2"}};
    struct atom_solver *solver = case_solver();
    for (size_t k = 0; k < sizeof atom / sizeof *atom; k++) {
        int Z = atom[k].Z;
        const char *text = Z == 18   ? "[Ne] 3s2 3p6"
                           : Z == 36 ? "[Ar] 3d10 4s2 4p6"
                                     : atom[k].configuration;
        case_solve(solver, Z, text, &(struct atom_options){0}, ATOM_CONVERGED);
        log_grid(r, 1e-6 / Z, 30.0);
        atom_curve_at(solver, ATOM_CURVE_DENSITY, -1, GRID, r, d);
        for (int i = 0; i < GRID; i++)
            rho[i] = d[i] / (4.0 * acos(-1.0) * r[i] * r[i]);
        uniform_lda(GRID, rho, 0.0, e, v);
        double h = log(r[1] / r[0]);
        for (int i = 0; i < GRID; i++) {
            int a = i > 0 ? i - 1 : 0, b = i < GRID - 1 ? i + 1 : i;
            f[i] = d[i] * (v[b] - v[a]) / (h * (b - a));
        }
        struct atom_energy energy = atom_energies(solver);
        double sum = 2.0 * energy.kinetic + energy.nuclear + energy.coulomb;
        near(sum, integrate(r, f), 0.0, 1e-5, "Z=%d virial", Z);
    }
    atom_solver_free(solver);
}
END_TEST

/* Correlation of revTPSS in a closed-shell ion without nodes, 1s2 2p6, from its
 * curves alone: R = √(D/f)/r, the kinetic energy density Σ f/8π (R'² + l(l+1)
 * R²/r²), libxc, Simpson's rule. */
START_TEST(meta_correlation_is_that_of_the_orbitals)
{
    static double r[GRID], d[2][GRID], R[2][GRID], f[GRID];
    static const double electrons[2] = {2.0, 6.0};
    struct atom_solver *solver = case_solver();
    struct status st = status_ok();
    struct hybrid *hybrid = hybrid_new(&st);
    struct hybrid_energy e;
    xc_func_type meta;
    case_solve(solver, 12, "1s2 2p6",
               &(struct atom_options){.functional = ATOM_LSD}, ATOM_CONVERGED);
    ck_assert(hybrid_evaluate(hybrid, solver, &e, &st));
    log_grid(r, 1e-6, 25.0);
    for (int s = 0; s < 2; s++) {
        atom_curve_at(solver, ATOM_CURVE_DENSITY, s, GRID, r, d[s]);
        for (int i = 0; i < GRID; i++)
            R[s][i] = sqrt(d[s][i] / electrons[s]) / r[i];
    }
    ck_assert_int_eq(xc_func_init(&meta, XC_MGGA_C_REVTPSS, XC_POLARIZED), 0);
    double step = log(r[1] / r[0]), pi = acos(-1.0);
    for (int i = 1; i < GRID - 1; i++) {
        double rho = 0.0, slope = 0.0, tau = 0.0, zero[2] = {0.0}, ec = 0.0;
        for (int s = 0; s < 2; s++) { /* of one spin */
            double by_r = (R[s][i + 1] - R[s][i - 1]) / (2.0 * step * r[i]);
            double part = 0.5 * electrons[s] / (4.0 * pi),
                   over = R[s][i] / r[i];
            rho += part * R[s][i] * R[s][i];
            slope += 2.0 * part * R[s][i] * by_r;
            tau += 0.5 * part * (by_r * by_r + (s == 1) * 2.0 * over * over);
        }
        double n[2] = {rho, rho}, t[2] = {tau, tau};
        double g[3] = {slope * slope, slope * slope, slope * slope};
        if (rho > 1e-12)
            xc_mgga_exc(&meta, 1, n, g, zero, t, &ec);
        f[i] = (d[0][i] + d[1][i]) * ec;
    }
    f[0] = f[GRID - 1] = 0.0;
    near(e.correlation, integrate(r, f), 0.0, 2e-5, "Mg4+, 1s2 2p6");
    xc_func_end(&meta);
    hybrid_free(hybrid);
    atom_solver_free(solver);
}
END_TEST

TCase *case_functionals(void)
{
    TCase *c = tcase_create("functionals");
    tcase_add_test(c, uniform_gas_agrees_with_libxc);
    tcase_add_test(c, relativistic_exchange_agrees_with_libxc);
    tcase_add_test(c, spin_polarised_gas_agrees_with_libxc);
    tcase_add_test(c, potentials_are_derivatives_of_the_energies);
    tcase_add_test(c, gradient_totals_meet_the_published_ones);
    tcase_add_test(c, the_density_integrates_to_the_electron_count);
    tcase_add_test(c, the_virial_relation_holds);
    tcase_add_test(c, meta_correlation_is_that_of_the_orbitals);
    return c;
}
