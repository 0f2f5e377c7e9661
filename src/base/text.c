/* SPDX-License-Identifier: MIT */
#include "base/text.h"

#include <assert.h>
#include <errno.h>
#include <limits.h>
#include <math.h>
#include <stdarg.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

struct text text_over(char *data, size_t capacity)
{
    assert(capacity >= 1);
    data[0] = '\0';
    return (struct text){.data = data, .capacity = capacity};
}

/* What a growing text holds before it has grown, or where it cannot. */
static char nothing[1];

struct text text_growing(void)
{
    return (struct text){.data = nothing, .capacity = 1, .grows = true};
}

void text_free(struct text *t)
{
    if (t->grows && t->data != nothing)
        free(t->data);
    *t = text_growing();
}

void text_empty(struct text *t)
{
    t->length = 0;
    /* Of a growing text a shortage of memory is never forgotten. */
    t->cut = t->cut && t->grows;
    t->data[0] = '\0';
}

void text_truncate(struct text *t, size_t length)
{
    assert(length <= t->length);
    t->length = length;
    t->data[length] = '\0';
}

/* Room for n bytes more; false where memory is short. */
static bool grow(struct text *t, size_t n)
{
    size_t needed = t->length + n + 1;
    size_t capacity = t->capacity < 128 ? 128 : t->capacity;
    while (capacity < needed)
        capacity *= 2;
    char *data = t->data == nothing ? NULL : t->data;
    data = realloc(data, capacity);
    if (!data)
        return false;
    t->data = data;
    t->capacity = capacity;
    return true;
}

void text_add_bytes(struct text *t, const char *s, size_t n)
{
    size_t room = t->capacity - 1 - t->length;
    if (n > room && t->grows && grow(t, n))
        room = n;
    if (n > room) {
        t->cut = true;
        n = room;
        /* Step back to the start of the character that does not fit. */
        while (n > 0 && ((unsigned char)s[n] & 0xC0) == 0x80)
            n--;
    }
    memcpy(t->data + t->length, s, n);
    t->length += n;
    t->data[t->length] = '\0';
}

size_t utf8_whole(const char *s, size_t n)
{
    size_t start = n;
    while (start > 0 && n - start < 3 &&
           ((unsigned char)s[start - 1] & 0xC0) == 0x80)
        start--;
    if (start == 0)
        return n;
    unsigned char lead = (unsigned char)s[start - 1];
    size_t needed = lead >= 0xF0 ? 4 : lead >= 0xE0 ? 3 : lead >= 0xC0 ? 2 : 1;
    return n - start + 1 < needed ? start - 1 : n;
}

void text_add(struct text *t, const char *s)
{
    text_add_bytes(t, s, strlen(s));
}

void text_addf(struct text *t, const char *format, ...)
{
    char piece[1024];
    va_list args;
    va_start(args, format);
    int n = vsnprintf(piece, sizeof piece, format, args);
    va_end(args);
    if (n < 0)
        return;
    if ((size_t)n < sizeof piece) {
        text_add(t, piece);
        return;
    }
    /* vsnprintf counts bytes and may have halved the last character. */
    t->cut = true;
    text_add_bytes(t, piece, utf8_whole(piece, sizeof piece - 1));
}

size_t utf8_decode(const char *s, size_t len, uint32_t *code)
{
    static const uint32_t smallest[5] = {0, 0, 0x80, 0x800, 0x10000};
    const unsigned char *p = (const unsigned char *)s;
    *code = UTF8_INVALID;
    if (p[0] < 0x80) {
        *code = p[0];
        return 1;
    }
    size_t n = p[0] >= 0xF0 ? 4 : p[0] >= 0xE0 ? 3 : 2;
    if (p[0] < 0xC2 || p[0] > 0xF4 || n > len)
        return 1;
    uint32_t c = p[0] & (0xFFu >> (n + 1));
    for (size_t i = 1; i < n; i++) {
        if ((p[i] & 0xC0) != 0x80)
            return 1;
        c = c << 6 | (p[i] & 0x3Fu);
    }
    if (c < smallest[n] || c > 0x10FFFF || (c >= 0xD800 && c <= 0xDFFF))
        return 1;
    *code = c;
    return n;
}

size_t utf8_encode(uint32_t code, char *out)
{
    if (code < 0x80) {
        out[0] = (char)code;
        return 1;
    }
    size_t n = code < 0x800 ? 2 : code < 0x10000 ? 3 : 4;
    for (size_t i = n - 1; i > 0; i--) {
        out[i] = (char)(0x80 | (code & 0x3F));
        code >>= 6;
    }
    out[0] = (char)((0xF00u >> n & 0xFFu) | code);
    return n;
}

bool utf8_valid(const char *s, size_t len)
{
    for (size_t i = 0; i < len;) {
        uint32_t code;
        i += utf8_decode(s + i, len - i, &code);
        if (code == UTF8_INVALID)
            return false;
    }
    return true;
}

size_t utf8_length(const char *s)
{
    size_t len = strlen(s);
    size_t count = 0;
    for (size_t i = 0; i < len; count++) {
        uint32_t code;
        i += utf8_decode(s + i, len - i, &code);
    }
    return count;
}

bool utf8_is_control(uint32_t code)
{
    bool steering = (code >= 0x200B && code <= 0x200F) ||
                    (code >= 0x202A && code <= 0x202E) ||
                    (code >= 0x2060 && code <= 0x206F) || code == 0xFEFF;
    return code < 0x20 || (code >= 0x7F && code < 0xA0) || steering;
}

static char ascii_lower(char c)
{
    return (char)(c >= 'A' && c <= 'Z' ? c - 'A' + 'a' : c);
}

bool text_starts_ignoring_case(const char *s, const char *prefix)
{
    for (; *prefix; s++, prefix++)
        if (ascii_lower(*s) != ascii_lower(*prefix))
            return false;
    return true;
}

bool text_same_ignoring_case(const char *a, const char *b)
{
    return strlen(a) == strlen(b) && text_starts_ignoring_case(a, b);
}

static bool same_letter(char a, char b)
{
    return ascii_lower(a) == ascii_lower(b);
}

size_t text_edit_distance(const char *a, const char *b)
{
    enum { LONGEST = 32 };
    size_t la = strlen(a);
    size_t lb = strlen(b);
    if (la > LONGEST || lb > LONGEST)
        return SIZE_MAX;
    size_t rows[3][LONGEST + 1]; /* row i in rows[i % 3] */
    for (size_t j = 0; j <= lb; j++)
        rows[0][j] = j;
    for (size_t i = 1; i <= la; i++) {
        size_t *row = rows[i % 3];
        const size_t *above = rows[(i + 2) % 3];
        row[0] = i;
        for (size_t j = 1; j <= lb; j++) {
            size_t best =
                above[j - 1] + (same_letter(a[i - 1], b[j - 1]) ? 0 : 1);
            if (above[j] + 1 < best)
                best = above[j] + 1;
            if (row[j - 1] + 1 < best)
                best = row[j - 1] + 1;
            bool swapped = i > 1 && j > 1 && same_letter(a[i - 1], b[j - 2]) &&
                           same_letter(a[i - 2], b[j - 1]);
            if (swapped && rows[(i + 1) % 3][j - 2] + 1 < best)
                best = rows[(i + 1) % 3][j - 2] + 1;
            row[j] = best;
        }
    }
    return rows[la % 3][lb];
}

bool text_to_int(const char *s, int *value)
{
    const char *digits = s + (*s == '+' || *s == '-');
    if (*digits == '\0' || digits[strspn(digits, "0123456789")] != '\0')
        return false;
    errno = 0;
    long v = strtol(s, NULL, 10);
    if (errno != 0 || v < INT_MIN || v > INT_MAX)
        return false;
    *value = (int)v;
    return true;
}

#define DIGITS_EXACT 9 /* fit an int */

bool text_to_double(const char *s, double *value)
{
    if (*s == '\0' || s[strspn(s, "+-.0123456789eE")] != '\0')
        return false;
    /* Most numbers are a few digits: those are exact without strtod. */
    size_t digits = strspn(s, "0123456789");
    if (s[digits] == '\0' && digits <= DIGITS_EXACT) {
        int whole = 0;
        for (size_t i = 0; i < digits; i++)
            whole = 10 * whole + (s[i] - '0');
        *value = whole;
        return true;
    }
    char *end;
    double v = strtod(s, &end);
    if (end == s || *end != '\0' || !isfinite(v))
        return false;
    *value = v;
    return true;
}
