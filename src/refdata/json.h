/* SPDX-License-Identifier: MIT */
/* JSON text, checked more strictly than the parser below does. */
#ifndef REFDATA_JSON_H
#define REFDATA_JSON_H

#include <stdbool.h>
#include <stddef.h>

#include "base/status.h"

/* Arrays and objects inside one another; the format itself needs four. */
#define JSON_DEPTH_MAX 16

/* True when data[size] is exactly one JSON value (RFC 8259) in UTF-8 with
 * nothing but white space around it, nested at most JSON_DEPTH_MAX deep, no
 * number outside the finite range, and no escape that gives a zero byte or half
 * a surrogate pair. Otherwise STATUS_DATA with line, column and what was
 * expected. Repeated keys are the business of object_check. */
MUST_CHECK bool json_check(const char *data, size_t size, struct status *st);

#endif
