/* SPDX-License-Identifier: MIT */
/* Decimal numbers as the text that prints them, exact: no double here. */
#ifndef TESTS_CLI_DECIMAL_H
#define TESTS_CLI_DECIMAL_H

#define DECIMAL_PLACES 18
#define DECIMAL_DIGITS 40

/* digits[0] is the last one, of 10^-DECIMAL_PLACES. places: those printed. */
struct decimal {
    int sign; /* -1, 0, 1 */
    int places;
    signed char digits[DECIMAL_DIGITS];
};

/* Reads a number; aborts the test when it is none or has an exponent. */
struct decimal decimal_read(const char *text);

struct decimal decimal_subtract(struct decimal a, struct decimal b);

/* -1, 0 or 1 as a is below, equal to or above b. */
int decimal_compare(struct decimal a, struct decimal b);

#endif
