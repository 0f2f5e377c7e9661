/* SPDX-License-Identifier: MIT */
/* Eigenvalues of small symmetric matrices. */
#ifndef ZETA_JACOBI_H
#define ZETA_JACOBI_H

/* Turns a[count][stride] (symmetric) into its eigenvalues on the diagonal, in
 * no order; vectors[count][stride], or NULL, receives the eigenvectors as
 * columns. Jacobi 1846; rotations as in Golub and Van Loan, Matrix
 * Computations (1996), section 8.4. */
void jacobi(int count, int stride, double *a, double *vectors);

#endif
