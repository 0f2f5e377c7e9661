/* SPDX-License-Identifier: MIT */
#include "decimal.h"

#include <check.h>
#include <stdbool.h>
#include <string.h>

struct decimal decimal_read(const char *text)
{
    struct decimal d = {0};
    const char *digits = text + (text[0] == '-');
    const char *point = strchr(digits, '.');
    size_t whole = point ? (size_t)(point - digits) : strlen(digits);
    size_t length = strlen(digits);
    ck_assert_msg(whole > 0 && strspn(digits, "0123456789.") == length &&
                      (!point || !strchr(point + 1, '.')),
                  "no decimal number: '%s'", text);
    d.places = point ? (int)(length - whole) - 1 : 0;
    ck_assert_int_le(d.places, DECIMAL_PLACES);
    ck_assert_uint_lt(whole + DECIMAL_PLACES, DECIMAL_DIGITS);
    for (size_t i = 0, at = whole - 1 + DECIMAL_PLACES; i < length; i++)
        if (digits[i] != '.') {
            d.digits[at--] = (signed char)(digits[i] - '0');
            if (digits[i] != '0')
                d.sign = text[0] == '-' ? -1 : 1;
        }
    return d;
}

static int compare_size(const struct decimal *a, const struct decimal *b)
{
    for (int i = DECIMAL_DIGITS - 1; i >= 0; i--)
        if (a->digits[i] != b->digits[i])
            return a->digits[i] < b->digits[i] ? -1 : 1;
    return 0;
}

int decimal_compare(struct decimal a, struct decimal b)
{
    if (a.sign != b.sign)
        return a.sign < b.sign ? -1 : 1;
    return a.sign < 0 ? compare_size(&b, &a) : compare_size(&a, &b);
}

struct decimal decimal_subtract(struct decimal a, struct decimal b)
{
    struct decimal d = {.places = a.places > b.places ? a.places : b.places};
    bool add = a.sign * b.sign < 0;
    bool swap = !add && compare_size(&a, &b) < 0;
    const struct decimal *big = swap ? &b : &a;
    const struct decimal *small = swap ? &a : &b;
    int carry = 0;
    for (int i = 0; i < DECIMAL_DIGITS; i++) {
        int v = add ? big->digits[i] + small->digits[i] + carry
                    : big->digits[i] - small->digits[i] + carry;
        carry = v > 9 ? 1 : v < 0 ? -1 : 0;
        d.digits[i] = (signed char)(v - 10 * carry);
        if (d.digits[i])
            d.sign = 1;
    }
    ck_assert_int_eq(carry, 0);
    int sign = a.sign ? a.sign : -b.sign;
    d.sign *= swap && a.sign ? -sign : sign;
    return d;
}
