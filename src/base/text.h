/* SPDX-License-Identifier: MIT */
/* Bounded text in a caller's buffer, and the UTF-8 that it is made of. */
#ifndef BASE_TEXT_H
#define BASE_TEXT_H

#include <stdbool.h>
#include <stddef.h>
#include <stdint.h>

#include "base/status.h"

/* A text in a fixed buffer, or in one that grows; `cut` says that something
 * was left out: the buffer was full, or memory was short. Always terminated,
 * never ends in half a character. */
struct text {
    char *data;
    size_t capacity; /* bytes in data, terminator included; >= 1 */
    size_t length;
    bool cut;
    bool grows; /* data is owned */
};

/* An empty text over data[capacity]. */
struct text text_over(char *data, size_t capacity);

/* An empty text that grows as needed; text_free releases it. Where memory is
 * short it stays empty and cut. */
struct text text_growing(void);
void text_free(struct text *t);

/* Makes it empty again, keeping its buffer; or as long as it was at an earlier
 * length. A growing text that was cut for want of memory stays so. */
void text_empty(struct text *t);
void text_truncate(struct text *t, size_t length);

/* Appends a terminated string. */
void text_add(struct text *t, const char *s);

/* Appends the first n bytes of s. */
void text_add_bytes(struct text *t, const char *s, size_t n);

/* Appends formatted output; at most 1023 bytes of it, cut between
 * characters. */
void text_addf(struct text *t, const char *format, ...) PRINTF_LIKE(2, 3);

/* Decodes one character of s (len bytes, len >= 1). Gives the bytes used,
 * 1…4, and the code point; an invalid byte gives 1 and UTF8_INVALID. */
size_t utf8_decode(const char *s, size_t len, uint32_t *code);
#define UTF8_INVALID UINT32_C(0xFFFFFFFF)
#define UTF8_REPLACEMENT UINT32_C(0xFFFD)

/* Writes code as UTF-8 to out[4]; gives the number of bytes, 1…4. */
size_t utf8_encode(uint32_t code, char *out);

/* How many of the first n bytes of s are left when a character that does not
 * end within them is taken away; n when they end with a whole one. */
size_t utf8_whole(const char *s, size_t n);

/* True when all len bytes are well-formed UTF-8 (no surrogates, no
 * overlong forms, at most U+10FFFF). */
bool utf8_valid(const char *s, size_t len);

/* Characters in a terminated string; an invalid byte counts one. */
size_t utf8_length(const char *s);

/* True for a control character: C0, DEL or C1, and for what steers a text
 * unseen: zero-width characters and marks of direction. */
bool utf8_is_control(uint32_t code);

/* ASCII case-insensitive comparison, independent of the locale. */
bool text_same_ignoring_case(const char *a, const char *b);

/* True when s starts with prefix, ignoring ASCII case. */
bool text_starts_ignoring_case(const char *s, const char *prefix);

/* Smallest number of single-character edits (insert, delete, replace, swap
 * with the next, each letter edited at most once, ASCII case ignored) that turn
 * a into b; strings over 32 bytes give SIZE_MAX. */
size_t text_edit_distance(const char *a, const char *b);

/* A whole decimal integer, optional sign, nothing else; false otherwise or
 * when it does not fit an int. */
bool text_to_int(const char *s, int *value);

/* A whole decimal number as strtod reads it in the C locale, finite, nothing
 * before or behind it, no hexadecimal form. */
bool text_to_double(const char *s, double *value);

#endif
