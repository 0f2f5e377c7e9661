/* SPDX-License-Identifier: MIT */
/* Fitted numbers that the search for the exponents begins with, made by
 * tests/zeta/fit_start.c. */
#ifndef ZETA_START_TABLE_H
#define ZETA_START_TABLE_H

#define START_CHARGE_COUNT 19 /* 1s … 7s, 2p … 7p, 3d … 6d, 4f, 5f */
#define START_CURVATURE_COUNT 318
#define START_SUBSHELLS 26 /* all n l with n <= 8, l <= 3 */
#define START_VARIABLES 52 /* an exponent and a rotation for each */

/* Effective charge of one subshell: constant + by_z Z + the sum over the 19
 * subshells, in the order of the table, of by_electrons times the electrons in
 * them. */
struct start_charge {
    int n, l;
    float constant, by_z;
    float by_electrons[START_CHARGE_COUNT];
};
extern const struct start_charge start_charges_fitted[START_CHARGE_COUNT];

/* Element of the Hessian between two variables, a >= b, over the product of
 * their scales: c[0] + c[1] Z/100 + c[2] N/100 + c[3] 10/Z with N electrons.
 * Variables count the subshells 1s … 8s, 2p … 8p, 3d … 8d, 4f … 8f, then in
 * the same order the rotations of the open orbital into them. The scale is zeta
 * sqrt(electrons) for an exponent; for a rotation the zeta of the inner
 * subshell times sqrt(holes of the open one). Absent pairs are small. */
struct start_curvature {
    unsigned char a, b;
    float c[4];
};
extern const struct start_curvature
    start_curvatures_fitted[START_CURVATURE_COUNT];

/* The entries of variable a are first[a] … first[a+1] - 1. */
extern const short start_curvature_first[START_VARIABLES + 1];

#endif
