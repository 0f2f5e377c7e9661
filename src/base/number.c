/* SPDX-License-Identifier: MIT */
#include "base/number.h"

#include <assert.h>
#include <math.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

/* The double nearest to value's decimal form with so many places. Going
 * through the printed form is the only rounding that equals what is printed. */
static double snap(double value, int decimals)
{
    char s[400];
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

struct number number_scale(struct number a, double factor)
{
    if (factor == 1.0)
        return a;
    double scaled = a.value * factor;
    /* Significant digits of a, counted from its own places. */
    int digits =
        a.value == 0.0 ? 1 : a.decimals + 1 + (int)floor(log10(fabs(a.value)));
    int places = clamp_places(places_for(scaled, digits + 1));
    return (struct number){snap(scaled, places), places};
}

const char *number_print(struct number n, char out[NUMBER_TEXT_MAX])
{
    snprintf(out, NUMBER_TEXT_MAX, "%.*f", n.decimals, n.value);
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
