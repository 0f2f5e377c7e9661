/* SPDX-License-Identifier: MIT */
/* Decimal numbers: as a source printed them, and as we print ours. */
#ifndef BASE_NUMBER_H
#define BASE_NUMBER_H

#include <stddef.h>

#define NUMBER_TEXT_MAX 40

/* A value with the number of decimal places that belong to it. Values are
 * decimal from the moment they are made (number_round), so that differences
 * of printed numbers are exact to the last digit. */
struct number {
    double value;
    int decimals; /* 0 … NUMBER_DECIMALS_MAX */
};
#define NUMBER_DECIMALS_MAX 15

/* value rounded to the places that give it at least `digits` significant
 * digits (1…15) and at least `decimals` places. value must be finite. */
struct number number_round(double value, int digits, int decimals);

/* a - b, with the places of the finer of the two: exact in decimal as long as
 * both have at most 15 significant digits there. */
struct number number_subtract(struct number a, struct number b);

/* a times a factor (a change of unit), with the places that keep the same
 * number of significant digits and one more. factor > 0. */
struct number number_scale(struct number a, double factor);

/* An uncertainty times a factor: as many significant digits as before, but
 * two at least. */
struct number number_scale_uncertainty(struct number u, double factor);

/* Writes with exactly n.decimals places ("0.10"). Returns out. */
const char *number_print(struct number n, char out[NUMBER_TEXT_MAX]);

/* Writes without trailing zeros ("0.1", "3"). Returns out. */
const char *number_print_short(struct number n, char out[NUMBER_TEXT_MAX]);

/* Writes with the given places, for a screen; "-0.0" is written "0.0". */
const char *number_print_places(double value, int places,
                                char out[NUMBER_TEXT_MAX]);

/* Writes with at most `places` places in at most `width` bytes, dropping places
 * from the end; "" when even the whole number does not fit. Returns out. */
const char *number_fit(double value, int places, int width,
                       char out[NUMBER_TEXT_MAX]);

/* Places behind the point of a decimal literal such as "13.60" (2); an
 * exponent shifts them ("1.5e-3": 4); never below 0. */
int number_places_of(const char *literal);

#endif
