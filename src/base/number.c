/* SPDX-License-Identifier: MIT */
#include "base/number.h"

#include <assert.h>
#include <math.h>
#include <stdbool.h>
#include <stdint.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

/* Powers of ten that a double holds exactly. */
static const double power_of_ten[NUMBER_DECIMALS_MAX + 1] = {
    1e0, 1e1, 1e2,  1e3,  1e4,  1e5,  1e6,  1e7,
    1e8, 1e9, 1e10, 1e11, 1e12, 1e13, 1e14, 1e15};

/* Up to here an integer and the products below are sure of their units: the
 * rounding error of a product is under 1e15 2^-53 < 0.12. */
#define SURE_INTEGER 1e15

/* value in units of its last decimal place, when that is surely the integer
 * that printf would print; false when only printf can tell. */
static bool to_units(double value, int decimals, double *units)
{
    double scaled = value * power_of_ten[decimals];
    if (!(fabs(scaled) < SURE_INTEGER))
        return false;
    *units = nearbyint(scaled);
    return fabs(scaled - *units) < 0.5 - 0.125;
}

/* The double nearest to value's decimal form with so many places. A quotient
 * of two exact integers is rounded once, so it is that double. Where the
 * product leaves the last digit open, going through the printed form is the
 * only rounding that equals what is printed. */
static double snap(double value, int decimals)
{
    char s[400];
    double units;
    if (to_units(value, decimals, &units))
        return units == 0.0 ? 0.0 : units / power_of_ten[decimals];
    snprintf(s, sizeof s, "%.*f", decimals, value);
    double v = strtod(s, NULL);
    return v == 0.0 ? 0.0 : v;
}

static int clamp_places(int places)
{
    if (places < 0)
        return 0;
    return places > NUMBER_DECIMALS_MAX ? NUMBER_DECIMALS_MAX : places;
}

/* Places that give value `digits` significant digits. */
static int places_for(double value, int digits)
{
    if (value == 0.0)
        return 0;
    return digits - 1 - (int)floor(log10(fabs(value)));
}

struct number number_round(double value, int digits, int decimals)
{
    assert(isfinite(value));
    int places = places_for(value, digits);
    places = clamp_places(places > decimals ? places : decimals);
    return (struct number){snap(value, places), places};
}

struct number number_subtract(struct number a, struct number b)
{
    int places = a.decimals > b.decimals ? a.decimals : b.decimals;
    return (struct number){snap(a.value - b.value, places), places};
}

/* Significant digits of a, counted from its own places. */
static int digits_of(struct number a)
{
    return a.value == 0.0 ? 1
                          : a.decimals + 1 + (int)floor(log10(fabs(a.value)));
}

static struct number scale_to(struct number a, double factor, int digits)
{
    double scaled = a.value * factor;
    int places = clamp_places(places_for(scaled, digits));
    return (struct number){snap(scaled, places), places};
}

struct number number_scale(struct number a, double factor)
{
    return factor == 1.0 ? a : scale_to(a, factor, digits_of(a) + 1);
}

struct number number_scale_uncertainty(struct number u, double factor)
{
    int digits = digits_of(u);
    return factor == 1.0 ? u : scale_to(u, factor, digits < 2 ? 2 : digits);
}

const char *number_print(struct number n, char out[NUMBER_TEXT_MAX])
{
    double units;
    if (!to_units(n.value, n.decimals, &units) || units == 0.0) {
        snprintf(out, NUMBER_TEXT_MAX, "%.*f", n.decimals, n.value);
        return out;
    }
    char digits[NUMBER_TEXT_MAX];
    int count = 0;
    char *p = out;
    for (uint64_t rest = (uint64_t)fabs(units); rest > 0 || count <= n.decimals;
         rest /= 10)
        digits[count++] = (char)('0' + rest % 10);
    if (units < 0.0)
        *p++ = '-';
    while (count > 0) {
        *p++ = digits[--count];
        if (count == n.decimals && count > 0)
            *p++ = '.';
    }
    *p = '\0';
    return out;
}

const char *number_print_short(struct number n, char out[NUMBER_TEXT_MAX])
{
    number_print(n, out);
    if (strchr(out, '.')) {
        size_t len = strlen(out);
        while (out[len - 1] == '0')
            out[--len] = '\0';
        if (out[len - 1] == '.')
            out[--len] = '\0';
    }
    return out;
}

const char *number_print_places(double value, int places,
                                char out[NUMBER_TEXT_MAX])
{
    snprintf(out, NUMBER_TEXT_MAX, "%.*f", places, value);
    if (out[0] == '-' && out[strspn(out, "-0.")] == '\0')
        memmove(out, out + 1, strlen(out));
    return out;
}

int number_places_of(const char *literal)
{
    const char *point = strchr(literal, '.');
    const char *exponent = strpbrk(literal, "eE");
    const char *end = exponent ? exponent : literal + strlen(literal);
    int places = point && point < end ? (int)(end - point) - 1 : 0;
    if (exponent)
        places -= (int)strtol(exponent + 1, NULL, 10);
    return clamp_places(places);
}

const char *number_fit(double value, int places, int width,
                       char out[NUMBER_TEXT_MAX])
{
    for (; places >= 0; places--)
        if ((int)strlen(number_print_places(value, places, out)) <= width)
            return out;
    out[0] = '\0';
    return out;
}
