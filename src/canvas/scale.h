/* SPDX-License-Identifier: MIT */
/* Classes of a coloured quantity: round bounds in the middle of the values,
 * open classes at both ends, so that one outlier does not flatten the rest. */
#ifndef CANVAS_SCALE_H
#define CANVAS_SCALE_H

#include <stdbool.h>

#include "canvas/role.h"

#define SCALE_CLASSES RAMP_STEPS

/* inner[i] parts class i from class i + 1. A balance is symmetric about zero,
 * its middle class holds it. count: values that were fitted; 0 means that
 * there is no scale. places: decimal places that tell the bounds apart. */
struct scale {
    bool balance;
    int count;
    double lowest, highest;
    double inner[SCALE_CLASSES - 1];
    int places;
};

/* Fits a scale to values[count] (finite); reorders them. */
struct scale scale_fit(double *values, int count, bool balance);

/* Class of a value, 0…SCALE_CLASSES-1. */
int scale_class(const struct scale *scale, double value);

/* Role that colours a class, and the glyph that says it without colour: '1' to
 * '9' on a ramp; on a balance v - = + ^ for far below, below, about equal,
 * above, far above. */
enum role scale_role(const struct scale *scale, int class_index);
char scale_glyph(const struct scale *scale, int class_index);

#endif
