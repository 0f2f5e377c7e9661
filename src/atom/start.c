/* SPDX-License-Identifier: MIT */
#include <math.h>

#include "atom/solver.h"

/* Thomas–Fermi screening as a rational function, R. Latter, Phys. Rev. 99,
 * 510 (1955), doi 10.1103/PhysRev.99.510, equation 11 (coefficients from
 * memory; the start has no bearing on the result), with that paper's tail:
 * far out an electron sees the charge of the ion it leaves behind. */
static double screening(double x)
{
    double s = sqrt(x);
    return 1.0 /
           (1.0 + s * (0.02747 +
                       s * (1.243 + s * (-0.1486 +
                                         s * (0.2302 + s * (0.007298 +
                                                            s * 0.006944))))));
}

void atom_start_potential(struct atom_solver *solver)
{
    struct atom_space *space = solver->now;
    double Z = solver->Z, tail = (Z - solver->electrons + 1.0) / Z;
    double scale = pow(128.0 * Z / (9.0 * 9.869604401089358), 1.0 / 3.0) / Z;
    int points = solver->elements * LOBATTO_ORDER + 1;
    if (tail < 0.0)
        tail = 0.0;
    for (int i = 0; i < points; i++) {
        double q = screening(space->mesh.y[i] * scale);
        q = -(q > tail ? q : tail);
        for (int c = 0; c < solver->channels; c++)
            space->q[c * points + i] = q;
    }
    if (solver->a2 <= 0.0)
        return;
    mesh_derivative(&space->mesh, solver->elements, space->q, space->scratch);
    for (int i = 0; i < points; i++)
        for (int c = 0; c < solver->channels; c++)
            space->q[(solver->channels + c) * points + i] =
                space->scratch[i] / space->mesh.slope[i] * space->mesh.y[i] -
                space->q[i];
}
