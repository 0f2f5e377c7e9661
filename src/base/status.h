/* SPDX-License-Identifier: MIT */
/* The one way in which an operation fails: a code and a sentence. */
#ifndef BASE_STATUS_H
#define BASE_STATUS_H

#include <stdbool.h>
#include <stddef.h>

#define MUST_CHECK __attribute__((warn_unused_result))
#define PRINTF_LIKE(at, first) __attribute__((format(printf, at, first)))

/* One list makes the codes, their short texts and the exit status that the
 * program ends with: code, text, exit status. */
#define STATUS_LIST(X)                                                         \
    X(STATUS_OK, "done", 0)                                                    \
    X(STATUS_USAGE, "wrong call", 2)                                           \
    X(STATUS_FILE, "file error", 1)                                            \
    X(STATUS_DATA, "wrong data", 1)                                            \
    X(STATUS_MEMORY, "out of memory", 1)                                       \
    X(STATUS_CONVERGENCE, "not converged", 1)                                  \
    X(STATUS_TERMINAL, "no usable terminal", 1)

enum status_code {
#define STATUS_ENUM(code, text, exit_status) code,
    STATUS_LIST(STATUS_ENUM)
#undef STATUS_ENUM
        STATUS_COUNT
};

#define STATUS_MESSAGE_MAX 512

/* code: what kind of failure; message: one sentence without a final period,
 * UTF-8, cut at a character boundary when too long. */
struct status {
    enum status_code code;
    char message[STATUS_MESSAGE_MAX];
};

/* A status that says "done". */
struct status status_ok(void);

/* Short text of a code, never NULL. */
const char *status_text(enum status_code code);

/* Exit status of the program for a code: 0, 1 or 2. */
int status_exit(enum status_code code);

/* Fills st and returns false, so that a failing function can end with
 * `return status_fail(st, …)`. code is not STATUS_OK. */
bool status_fail(struct status *st, enum status_code code, const char *format,
                 ...) PRINTF_LIKE(3, 4);

/* Puts "context: " in front of the message of a failed st; returns false. */
bool status_context(struct status *st, const char *format, ...)
    PRINTF_LIKE(2, 3);

#endif
