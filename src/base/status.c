/* SPDX-License-Identifier: MIT */
#include "base/status.h"

#include <assert.h>
#include <stdarg.h>
#include <stdio.h>
#include <string.h>

static const struct {
    const char *text;
    int exit_status;
} status_rows[STATUS_COUNT] = {
#define STATUS_ROW(code, text, exit_status) {text, exit_status},
    STATUS_LIST(STATUS_ROW)
#undef STATUS_ROW
};

struct status status_ok(void)
{
    return (struct status){.code = STATUS_OK};
}

const char *status_text(enum status_code code)
{
    assert(code < STATUS_COUNT);
    return status_rows[code].text;
}

int status_exit(enum status_code code)
{
    assert(code < STATUS_COUNT);
    return status_rows[code].exit_status;
}

/* A message cut by its buffer must not end in half a UTF-8 character. */
static void trim_partial_character(char *s, size_t capacity)
{
    size_t len = strlen(s);
    if (len + 1 < capacity)
        return;
    size_t start = len;
    while (start > 0 && ((unsigned char)s[start - 1] & 0xC0) == 0x80)
        start--;
    if (start > 0 && ((unsigned char)s[start - 1] & 0x80))
        s[start - 1] = '\0';
}

bool status_fail(struct status *st, enum status_code code, const char *format,
                 ...)
{
    assert(code != STATUS_OK);
    va_list args;
    va_start(args, format);
    vsnprintf(st->message, sizeof st->message, format, args);
    va_end(args);
    trim_partial_character(st->message, sizeof st->message);
    st->code = code;
    return false;
}

bool status_context(struct status *st, const char *format, ...)
{
    assert(st->code != STATUS_OK);
    char tail[STATUS_MESSAGE_MAX];
    memcpy(tail, st->message, sizeof tail);
    va_list args;
    va_start(args, format);
    int head = vsnprintf(st->message, sizeof st->message, format, args);
    va_end(args);
    if (head < 0)
        head = 0;
    size_t used = (size_t)head;
    bool whole = used < sizeof st->message;
    if (whole) {
        size_t room = sizeof st->message - used;
        int added = snprintf(st->message + used, room, ": %s", tail);
        whole = added >= 0 && (size_t)added < room;
    }
    if (!whole)
        trim_partial_character(st->message, sizeof st->message);
    return false;
}
