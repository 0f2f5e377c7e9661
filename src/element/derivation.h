/* SPDX-License-Identifier: MIT */
/* Quantities that follow from others by definition: the same formula for stored
 * values, of which they make one more reference, and for what a model gives. */
#ifndef ELEMENT_DERIVATION_H
#define ELEMENT_DERIVATION_H

#include "element/definition.h"
#include "element/provenance.h"
#include "element/reading.h"

#define DERIVATION_INPUTS_MAX 2
#define DERIVATION_TEXT_MAX 128

/* An input: a quantity of the same element, its charge higher by `step`. */
struct derivation_input {
    enum quantity_id quantity;
    int step;
};

/* id, title: of the reference that it makes of stored values; domain: what it
 * holds for, in words. in_front: that reference is the first of its quantity,
 * else the last. of_emptied: the quantity belongs to the subshell that loses
 * the next electron, and is asked of it alone. inputs gives the inputs of a
 * species of this charge and their number; 0, with *reason, where the quantity
 * has no meaning there. value works in base units: x[count] are the inputs, n
 * is the principal quantum number of the emptied subshell (0 unless
 * of_emptied), d[count] receives the partial derivatives, by which
 * uncertainties go over. */
struct derivation {
    const char *id;
    const char *title;
    const char *domain;
    const struct definition *definition;
    const struct citation *citation; /* of the formula, or NULL and: */
    const char *unsourced;           /* what no work is cited for */
    bool in_front;
    bool of_emptied;
    int (*inputs)(int charge,
                  struct derivation_input inputs[DERIVATION_INPUTS_MAX],
                  const char **reason);
    double (*value)(const double *x, int n, double *d);
};

extern const struct derivation derivation_zeff;
extern const struct derivation derivation_mulliken;
extern const struct derivation derivation_hardness;

/* The value that follows from readings[count], all of them ok and in base
 * units: its uncertainty where each has one that counts (a computed one without
 * is exact to its digits: then none), their evidence where it is the same, the
 * first remark among them. */
struct reading derivation_reading(const struct derivation *derivation,
                                  const struct reading *readings, int count,
                                  int n, const struct provenance *provenance);

/* All of them; DERIVATION_MAX at most. */
#define DERIVATION_MAX 16
extern const struct derivation *const derivation_list[];
extern const int derivation_list_count;

#endif
