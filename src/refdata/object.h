/* SPDX-License-Identifier: MIT */
/* JSON objects of a known shape: checked once against a table of their keys,
 * then read without failure. */
#ifndef REFDATA_OBJECT_H
#define REFDATA_OBJECT_H

#include <cjson/cJSON.h>
#include <stdbool.h>
#include <stddef.h>

#include "base/number.h"
#include "base/status.h"

enum field_type {
    FIELD_TEXT,    /* not empty, no control character, at most TEXT_MAX bytes */
    FIELD_DECIMAL, /* a text that holds the digits of a decimal number */
    FIELD_INTEGER,
    FIELD_BOOLEAN,
    FIELD_TEXTS,    /* an array of FIELD_TEXT, not empty */
    FIELD_INTEGERS, /* an array of integers, not empty */
    FIELD_OBJECTS,  /* an array of objects, not empty */
};

struct field {
    const char *key;
    enum field_type type;
    bool required;
};

#define FIELD_TEXT_MAX 1024

/* True when object is one, each of its keys is in fields[count], none stands
 * twice, each has its type, and none that is required is missing. Otherwise
 * STATUS_DATA naming the key and what was expected. */
MUST_CHECK bool object_check(const cJSON *object, const struct field *fields,
                             size_t count, struct status *st);

/* The member with this key, or NULL. */
const cJSON *object_member(const cJSON *object, const char *key);

/* A text member of a checked object, or NULL when it is absent. */
const char *object_text(const cJSON *object, const char *key);

/* An integer member of a checked object, or `absent`. */
int object_integer(const cJSON *object, const char *key, int absent);

/* A boolean member of a checked object, or false. */
bool object_boolean(const cJSON *object, const char *key);

/* The decimal number in a FIELD_DECIMAL member, digit for digit; false when
 * it is absent. */
bool object_decimal(const cJSON *object, const char *key, struct number *n);

/* Reads the digits of a decimal literal: sign, digits, point, digits; at most
 * 15 significant digits, so that number_print gives them back. */
MUST_CHECK bool decimal_parse(const char *literal, struct number *n,
                              struct status *st);

/* Text from a file made fit for a message: short, no control characters. */
struct quoted {
    char text[64];
};
struct quoted quoted(const char *s);

#endif
