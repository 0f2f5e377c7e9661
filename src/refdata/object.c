/* SPDX-License-Identifier: MIT */
#include "refdata/object.h"

#include <assert.h>
#include <limits.h>
#include <stdint.h>
#include <string.h>

#include "base/text.h"

/* Digits that survive a double. */
#define SIGNIFICANT_MAX 15

struct quoted quoted(const char *s)
{
    struct quoted q;
    struct text t = text_over(q.text, sizeof q.text - 4);
    size_t length = strlen(s);
    for (size_t i = 0; i < length && !t.cut;) {
        uint32_t code;
        size_t used = utf8_decode(s + i, length - i, &code);
        if (utf8_is_control(code) || code == UTF8_INVALID)
            text_add(&t, "?");
        else
            text_add_bytes(&t, s + i, used);
        i += used;
    }
    if (t.cut) {
        t.capacity = sizeof q.text;
        text_add(&t, "...");
    }
    return q;
}

static const char *type_word(enum field_type type)
{
    switch (type) {
    case FIELD_TEXT:
        return "a text";
    case FIELD_DECIMAL:
        return "a text with the digits as printed, such as \"6.50\"";
    case FIELD_INTEGER:
        return "an integer";
    case FIELD_BOOLEAN:
        return "true or false";
    case FIELD_TEXTS:
        return "a list of texts";
    case FIELD_INTEGERS:
        return "a list of integers";
    case FIELD_OBJECTS:
        break;
    }
    return "a list of objects";
}

static const char *json_word(const cJSON *item)
{
    if (cJSON_IsString(item))
        return "a text";
    if (cJSON_IsNumber(item))
        return "a number";
    if (cJSON_IsBool(item))
        return "true or false";
    if (cJSON_IsArray(item))
        return "a list";
    return cJSON_IsObject(item) ? "an object" : "null";
}

static bool check_text(const cJSON *item, struct status *st)
{
    if (!cJSON_IsString(item))
        return status_fail(st, STATUS_DATA, "expected a text, got %s",
                           json_word(item));
    const char *s = item->valuestring;
    size_t length = strlen(s);
    if (length == 0)
        return status_fail(st, STATUS_DATA,
                           "empty; expected a text, or leave the key out");
    if (length > FIELD_TEXT_MAX)
        return status_fail(st, STATUS_DATA, "longer than %d bytes",
                           FIELD_TEXT_MAX);
    for (size_t i = 0; i < length;) {
        uint32_t code;
        i += utf8_decode(s + i, length - i, &code);
        if (utf8_is_control(code))
            return status_fail(st, STATUS_DATA, "a control character in '%s'",
                               quoted(s).text);
    }
    if (s[0] == ' ' || s[length - 1] == ' ')
        return status_fail(st, STATUS_DATA, "a space at the edge of '%s'",
                           quoted(s).text);
    return true;
}

bool decimal_parse(const char *literal, struct number *n, struct status *st)
{
    const char *whole = literal + (*literal == '-');
    size_t before = strspn(whole, "0123456789");
    const char *point = whole + before;
    size_t after = *point == '.' ? strspn(point + 1, "0123456789") : 0;
    const char *end = point + (*point == '.' ? 1 + after : 0);
    bool leading_zero = before > 1 && *whole == '0';
    if (*end == '(')
        return status_fail(st, STATUS_DATA,
                           "'%s' is not a decimal number; an uncertainty goes "
                           "under the key u",
                           quoted(literal).text);
    if (before == 0 || leading_zero || (*point == '.' && after == 0) || *end)
        return status_fail(st, STATUS_DATA,
                           "'%s' is not a decimal number; expected the digits "
                           "as printed, such as 6.50",
                           quoted(literal).text);
    /* Leading zeros of a number below 1 are not significant. */
    size_t zeros = 0;
    if (*whole == '0')
        zeros = 1 + (after ? strspn(point + 1, "0") : 0);
    double value;
    if (before + after - zeros > SIGNIFICANT_MAX ||
        after > NUMBER_DECIMALS_MAX || !text_to_double(literal, &value))
        return status_fail(st, STATUS_DATA,
                           "'%s' has more than %d significant digits or "
                           "decimal places",
                           quoted(literal).text, SIGNIFICANT_MAX);
    *n = (struct number){value, (int)after};
    if (*literal == '-' && value == 0.0)
        return status_fail(st, STATUS_DATA, "'%s': zero has no sign",
                           quoted(literal).text);
    return true;
}

static bool check_integer(const cJSON *item, struct status *st)
{
    if (!cJSON_IsNumber(item))
        return status_fail(st, STATUS_DATA, "expected an integer, got %s",
                           json_word(item));
    double v = item->valuedouble;
    if (v < -1e6 || v > 1e6 || v != (double)(int)v)
        return status_fail(st, STATUS_DATA, "expected an integer, got %g", v);
    return true;
}

static bool check_list(const cJSON *list, enum field_type type,
                       struct status *st)
{
    if (!cJSON_IsArray(list))
        return status_fail(st, STATUS_DATA, "expected %s, got %s",
                           type_word(type), json_word(list));
    if (!list->child)
        return status_fail(st, STATUS_DATA, "an empty list");
    int place = 0;
    const cJSON *item;
    cJSON_ArrayForEach(item, list)
    {
        place++;
        bool ok = type == FIELD_TEXTS      ? check_text(item, st)
                  : type == FIELD_INTEGERS ? check_integer(item, st)
                                           : cJSON_IsObject(item);
        if (!ok && type == FIELD_OBJECTS)
            return status_fail(st, STATUS_DATA,
                               "item %d: expected an object, got %s", place,
                               json_word(item));
        if (!ok)
            return status_context(st, "item %d", place);
    }
    return true;
}

static bool check_type(const cJSON *item, enum field_type type,
                       struct status *st)
{
    struct number n;
    switch (type) {
    case FIELD_TEXT:
        return check_text(item, st);
    case FIELD_DECIMAL:
        if (!cJSON_IsString(item))
            return status_fail(st, STATUS_DATA, "expected %s, got %s",
                               type_word(type), json_word(item));
        return check_text(item, st) && decimal_parse(item->valuestring, &n, st);
    case FIELD_INTEGER:
        return check_integer(item, st);
    case FIELD_BOOLEAN:
        if (!cJSON_IsBool(item))
            return status_fail(st, STATUS_DATA, "expected %s, got %s",
                               type_word(type), json_word(item));
        return true;
    case FIELD_TEXTS:
    case FIELD_INTEGERS:
    case FIELD_OBJECTS:
        break;
    }
    return check_list(item, type, st);
}

static bool unknown_key(const char *key, const struct field *fields,
                        size_t count, struct status *st)
{
    const char *nearest = NULL;
    size_t least = 3;
    char known[256];
    struct text list = text_over(known, sizeof known);
    for (size_t i = 0; i < count; i++) {
        text_addf(&list, "%s%s", i ? " " : "", fields[i].key);
        size_t d = text_edit_distance(key, fields[i].key);
        if (d < least && d < strlen(key)) {
            least = d;
            nearest = fields[i].key;
        }
    }
    if (nearest)
        return status_fail(st, STATUS_DATA,
                           "unknown key '%s'; did you mean %s?",
                           quoted(key).text, nearest);
    return status_fail(st, STATUS_DATA, "unknown key '%s'; expected one of: %s",
                       quoted(key).text, known);
}

bool object_check(const cJSON *object, const struct field *fields, size_t count,
                  struct status *st)
{
    uint64_t seen = 0;
    assert(count <= 64);
    if (!cJSON_IsObject(object))
        return status_fail(st, STATUS_DATA, "expected an object, got %s",
                           json_word(object));
    const cJSON *item;
    cJSON_ArrayForEach(item, object)
    {
        size_t i = 0;
        while (i < count && strcmp(fields[i].key, item->string) != 0)
            i++;
        if (i == count)
            return unknown_key(item->string, fields, count, st);
        if (seen >> i & 1)
            return status_fail(st, STATUS_DATA, "key '%s' stands there twice",
                               fields[i].key);
        seen |= UINT64_C(1) << i;
        if (!check_type(item, fields[i].type, st))
            return status_context(st, "%s", fields[i].key);
    }
    for (size_t i = 0; i < count; i++)
        if (fields[i].required && !(seen >> i & 1))
            return status_fail(st, STATUS_DATA,
                               "key '%s' is missing; expected %s",
                               fields[i].key, type_word(fields[i].type));
    return true;
}

const cJSON *object_member(const cJSON *object, const char *key)
{
    return cJSON_GetObjectItemCaseSensitive(object, key);
}

const char *object_text(const cJSON *object, const char *key)
{
    const cJSON *item = object_member(object, key);
    return item ? item->valuestring : NULL;
}

int object_integer(const cJSON *object, const char *key, int absent)
{
    const cJSON *item = object_member(object, key);
    return item ? (int)item->valuedouble : absent;
}

bool object_boolean(const cJSON *object, const char *key)
{
    return cJSON_IsTrue(object_member(object, key));
}

bool object_decimal(const cJSON *object, const char *key, struct number *n)
{
    const char *literal = object_text(object, key);
    struct status st;
    return literal && decimal_parse(literal, n, &st);
}
