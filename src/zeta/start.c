/* SPDX-License-Identifier: MIT */
#include "zeta/start.h"

#include <math.h>

#include "zeta/start_table.h"

/* Where l begins in the order 1s … 8s, 2p … 8p, 3d … 8d, 4f … 8f. */
static const int l_first[BLOCK_COUNT] = {0, 8, 15, 21};
/* Where it begins in the fitted table, and how many n stand there. */
static const int fitted_first[BLOCK_COUNT] = {0, 7, 13, 17};
static const int fitted_count[BLOCK_COUNT] = {7, 6, 4, 2};
/* Smallest effective charge to begin with: the rule goes astray far from the
 * atoms it was fitted to. */
static const double least_charge = 0.8;
/* Curvatures over the scale where the fit has none or is astray. */
static const double plain_exponent = 0.8, plain_rotation = 1.5;
static const double least_curvature = 0.2;

/* Place in the fitted table, or -1. */
static int fitted_place(int n, int l)
{
    int i = n - l - 1;
    return i < fitted_count[l] ? fitted_first[l] + i : -1;
}

/* For subshells that the fit does not know (8s, 7d, 6f …): inner shells screen
 * fully, the other electrons of the same shell by one third. */
static double counted_charge(const struct energy_atom *atom, int i)
{
    double sigma = 0.0;
    for (int j = 0; j < atom->shells; j++) {
        if (atom->n[j] < atom->n[i])
            sigma += atom->occ[j];
        else if (atom->n[j] == atom->n[i])
            sigma += (atom->occ[j] - (i == j)) / 3.0;
    }
    return atom->Z - sigma;
}

void start_charges(const struct energy_atom *atom, double z_eff[])
{
    for (int i = 0; i < atom->shells; i++) {
        int place = fitted_place(atom->n[i], atom->l[i]);
        double z = counted_charge(atom, i);
        if (place >= 0) {
            const struct start_charge *row = &start_charges_fitted[place];
            z = row->constant + row->by_z * atom->Z;
            for (int j = 0; j < atom->shells; j++) {
                int other = fitted_place(atom->n[j], atom->l[j]);
                if (other >= 0)
                    z += (double)row->by_electrons[other] * atom->occ[j];
            }
        }
        z_eff[i] = z > least_charge ? z : least_charge;
    }
}

/* Scales and table places of the variables; at[place] is the variable there,
 * or -1. */
static void variables_scale(const struct energy *e, double scale[], int place[],
                            int at[])
{
    const struct energy_atom *atom = &e->atom;
    for (int i = 0; i < START_VARIABLES; i++)
        at[i] = -1;
    for (int i = 0; i < atom->shells; i++) {
        scale[i] = sqrt(atom->occ[i]) * e->zeta[i];
        place[i] = l_first[atom->l[i]] + atom->n[i] - atom->l[i] - 1;
        at[place[i]] = i;
    }
    for (int l = 0; l < BLOCK_COUNT; l++) {
        const struct energy_block *b = &atom->block[l];
        for (int i = 0; b->open > 0 && i < b->count - 1; i++) {
            int variable = b->kappa + i;
            scale[variable] = sqrt(b->full - b->open) * e->zeta[b->first + i];
            place[variable] = START_SUBSHELLS + l_first[l] + i;
            at[place[variable]] = variable;
        }
    }
}

void start_hessian(const struct energy *e,
                   double hessian[][ENERGY_VARIABLE_MAX])
{
    double scale[ENERGY_VARIABLE_MAX];
    int place[ENERGY_VARIABLE_MAX];
    int at[START_VARIABLES];
    variables_scale(e, scale, place, at);
    double electrons = 0.0;
    for (int i = 0; i < e->atom.shells; i++)
        electrons += e->atom.occ[i];
    double feature[4] = {1.0, e->atom.Z / 100.0, electrons / 100.0,
                         10.0 / e->atom.Z};
    for (int i = 0; i < e->atom.variables; i++) {
        for (int j = 0; j < i; j++)
            hessian[i][j] = 0.0;
        hessian[i][i] = i < e->atom.shells ? plain_exponent : plain_rotation;
        hessian[i][i] *= scale[i] * scale[i];
    }
    for (int i = 0; i < e->atom.variables; i++) {
        int last = start_curvature_first[place[i] + 1];
        for (int k = start_curvature_first[place[i]]; k < last; k++) {
            const struct start_curvature *row = &start_curvatures_fitted[k];
            int j = at[row->b];
            if (j < 0)
                continue;
            double h = 0.0;
            for (int f = 0; f < 4; f++)
                h += row->c[f] * feature[f];
            if (i == j && h < least_curvature)
                continue;
            h *= scale[i] * scale[j];
            hessian[i > j ? i : j][i > j ? j : i] = h;
        }
    }
}
