/* SPDX-License-Identifier: MIT */
#include "canvas/scale.h"

#include <assert.h>
#include <math.h>
#include <stdlib.h>

#define INNER (SCALE_CLASSES - 1)

static int by_value(const void *a, const void *b)
{
    double x = *(const double *)a;
    double y = *(const double *)b;
    return (x > y) - (x < y);
}

/* Decimal places that show a step whole. */
static int places_of(double step)
{
    int places = 0;
    while (places < 12 && fabs(step - floor(step + 0.5)) > 1e-6 * step) {
        step *= 10.0;
        places++;
    }
    return places;
}

/* The smallest round number of two digits at most that is not below x > 0. */
static double round_up(double x)
{
    static const double steps[] = {1.0, 1.2, 1.5, 2.0, 2.5, 3.0,
                                   4.0, 5.0, 6.0, 8.0, 10.0};
    double power = pow(10.0, floor(log10(x)));
    int i = 0;
    while (steps[i] * power < x * (1.0 - 1e-12))
        i++;
    return steps[i] * power;
}

static double quantile(const double *sorted, int count, double q)
{
    return sorted[(int)(q * (count - 1) + 0.5)];
}

struct scale scale_fit(double *values, int count, bool balance)
{
    struct scale s = {.balance = balance, .count = count};
    if (count == 0)
        return s;
    qsort(values, (size_t)count, sizeof *values, by_value);
    s.lowest = values[0];
    s.highest = values[count - 1];
    double low = quantile(values, count, 0.05);
    double high = quantile(values, count, 0.95);
    double size = fmax(fabs(low), fabs(high));
    double span = balance ? 2.0 * size : high - low;
    double step =
        round_up(span > 0.0 ? span / (INNER - 1) : fmax(size, 1.0) / 10.0);
    double start =
        balance ? -(INNER - 1) / 2.0 * step : ceil(low / step) * step;
    for (int i = 0; i < INNER; i++)
        s.inner[i] = start + i * step;
    s.places = places_of(step);
    if (places_of(fabs(s.inner[0])) > s.places)
        s.places = places_of(fabs(s.inner[0]));
    return s;
}

int scale_class(const struct scale *scale, double value)
{
    int c = 0;
    while (c < INNER && value >= scale->inner[c])
        c++;
    return c;
}

enum role scale_role(const struct scale *scale, int class_index)
{
    assert(class_index >= 0 && class_index < SCALE_CLASSES);
    return (enum role)((scale->balance ? ROLE_BALANCE : ROLE_RAMP) +
                       class_index);
}

char scale_glyph(const struct scale *scale, int class_index)
{
    static const char ramp[] = "123456789";
    static const char balance[] = "vv--=++^^";
    return scale->balance ? balance[class_index] : ramp[class_index];
}
