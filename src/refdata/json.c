/* SPDX-License-Identifier: MIT */
/* A recursive descent over RFC 8259 that builds nothing. It stands in front
 * of the parser because that one takes "01", 1e400, trailing text after the
 * first zero byte, and any bytes as UTF-8, and says only where it stopped. */
#include "refdata/json.h"

#include <math.h>
#include <stdlib.h>
#include <string.h>

#include "base/text.h"

struct scan {
    const char *start, *at, *end;
    int depth;
    struct status *st;
};

static bool fail_at(struct scan *s, const char *where, const char *what)
{
    int line = 1;
    const char *line_start = s->start;
    for (const char *p = s->start; p < where; p++)
        if (*p == '\n') {
            line++;
            line_start = p + 1;
        }
    return status_fail(s->st, STATUS_DATA, "line %d, column %d: %s", line,
                       (int)(where - line_start) + 1, what);
}

static bool fail_here(struct scan *s, const char *what)
{
    if (s->at == s->end && strncmp(what, "expected", 8) == 0)
        return fail_at(s, s->at, "the text ends inside a value");
    return fail_at(s, s->at, what);
}

static void skip_space(struct scan *s)
{
    while (s->at < s->end && (*s->at == ' ' || *s->at == '\n' ||
                              *s->at == '\t' || *s->at == '\r'))
        s->at++;
}

static bool next_is(struct scan *s, char c)
{
    if (s->at == s->end || *s->at != c)
        return false;
    s->at++;
    return true;
}

static bool hex4(struct scan *s, unsigned *code)
{
    *code = 0;
    for (int i = 0; i < 4; i++, s->at++) {
        /* Both cases, so that the place modulo 16 is the digit. */
        static const char digits[] = "0123456789abcdef0123456789ABCDEF";
        const char *digit = NULL;
        if (s->at < s->end && *s->at != '\0')
            digit = strchr(digits, *s->at);
        if (!digit)
            return fail_here(s, "expected four hexadecimal digits after \\u");
        *code = *code << 4 | (unsigned)(digit - digits) % 16;
    }
    return true;
}

static bool scan_unicode_escape(struct scan *s)
{
    const char *from = s->at;
    unsigned high, low;
    if (!hex4(s, &high))
        return false;
    if (high == 0)
        return fail_at(s, from, "a zero character cannot stand in a text");
    if (high < 0xD800 || high > 0xDFFF)
        return true;
    if (high > 0xDBFF || !next_is(s, '\\') || !next_is(s, 'u') ||
        !hex4(s, &low) || low < 0xDC00 || low > 0xDFFF)
        return fail_at(s, from, "half a surrogate pair");
    return true;
}

static bool scan_string(struct scan *s)
{
    if (!next_is(s, '"'))
        return fail_here(s, "expected '\"'");
    while (s->at < s->end) {
        unsigned char c = (unsigned char)*s->at;
        if (c < 0x20)
            return fail_here(s, "a control character in a text; write it as "
                                "an escape or close the quotation mark");
        s->at++;
        if (c == '"')
            return true;
        if (c != '\\')
            continue;
        if (next_is(s, 'u')) {
            if (!scan_unicode_escape(s))
                return false;
        } else if (s->at == s->end || !strchr("\"\\/bfnrt", *s->at)) {
            return fail_here(s, "an escape that JSON does not have");
        } else {
            s->at++;
        }
    }
    return fail_here(s, "expected '\"' at the end of a text");
}

static size_t scan_digits(struct scan *s)
{
    const char *from = s->at;
    while (s->at < s->end && *s->at >= '0' && *s->at <= '9')
        s->at++;
    return (size_t)(s->at - from);
}

static bool scan_number(struct scan *s)
{
    const char *from = s->at;
    (void)next_is(s, '-');
    const char *whole = s->at;
    size_t digits = scan_digits(s);
    if (digits == 0)
        return fail_here(s, "expected a JSON value");
    if (digits > 1 && *whole == '0')
        return fail_at(s, from, "a number that starts with a needless zero");
    if (next_is(s, '.') && scan_digits(s) == 0)
        return fail_here(s, "expected a digit after the decimal point");
    if (next_is(s, 'e') || next_is(s, 'E')) {
        if (!next_is(s, '+'))
            (void)next_is(s, '-');
        if (scan_digits(s) == 0)
            return fail_here(s, "expected a digit in the exponent");
    }
    /* The data end with a zero byte, so that strtod stops. */
    if (!isfinite(strtod(from, NULL)))
        return fail_at(s, from, "a number too large to be finite");
    return true;
}

static bool scan_word(struct scan *s)
{
    static const char *const words[] = {"true", "false", "null"};
    for (size_t i = 0; i < sizeof words / sizeof *words; i++) {
        size_t length = strlen(words[i]);
        if ((size_t)(s->end - s->at) >= length &&
            memcmp(s->at, words[i], length) == 0) {
            s->at += length;
            return true;
        }
    }
    return fail_here(s, "expected a JSON value");
}

static bool scan_value(struct scan *s);

static bool scan_member(struct scan *s)
{
    if (s->at == s->end || *s->at != '"')
        return fail_here(s, "expected a key in quotation marks");
    if (!scan_string(s))
        return false;
    skip_space(s);
    if (!next_is(s, ':'))
        return fail_here(s, "expected ':' after a key");
    return scan_value(s);
}

/* The inside of an object or array whose opening bracket has been read. */
static bool scan_items(struct scan *s, char closing)
{
    bool object = closing == '}';
    if (++s->depth > JSON_DEPTH_MAX)
        return fail_here(s, "nested too deep");
    skip_space(s);
    if (!next_is(s, closing)) {
        do {
            skip_space(s);
            if (!(object ? scan_member(s) : scan_value(s)))
                return false;
            skip_space(s);
        } while (next_is(s, ','));
        if (!next_is(s, closing))
            return fail_here(s, object ? "expected ',' or '}' after a value"
                                       : "expected ',' or ']' after a value");
    }
    s->depth--;
    return true;
}

static bool scan_value(struct scan *s)
{
    skip_space(s);
    if (next_is(s, '{'))
        return scan_items(s, '}');
    if (next_is(s, '['))
        return scan_items(s, ']');
    if (s->at < s->end && *s->at == '"')
        return scan_string(s);
    if (s->at < s->end && strchr("tfn", *s->at) && *s->at)
        return scan_word(s);
    return scan_number(s);
}

static bool check_encoding(struct scan *s)
{
    if (s->end - s->start >= 3 && memcmp(s->start, "\xEF\xBB\xBF", 3) == 0)
        return fail_at(s, s->start, "a byte order mark; expected plain UTF-8");
    for (const char *p = s->start; p < s->end;) {
        uint32_t code;
        size_t used = utf8_decode(p, (size_t)(s->end - p), &code);
        if (code == UTF8_INVALID)
            return fail_at(s, p, "not UTF-8");
        if (code == 0)
            return fail_at(s, p, "a zero byte");
        p += used;
    }
    return true;
}

bool json_check(const char *data, size_t size, struct status *st)
{
    struct scan s = {.start = data, .at = data, .end = data + size, .st = st};
    if (!check_encoding(&s))
        return false;
    skip_space(&s);
    if (s.at == s.end)
        return status_fail(st, STATUS_DATA, "the file is empty");
    if (!scan_value(&s))
        return false;
    skip_space(&s);
    if (s.at != s.end)
        return fail_here(&s, "text after the end of the data set");
    return true;
}
