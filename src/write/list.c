/* SPDX-License-Identifier: MIT */
#include "write/format.h"

const struct format *const format_list[] = {
    &format_text,
    &format_csv,
    &format_json,
    &format_bibtex,
};
const int format_list_count = sizeof format_list / sizeof format_list[0];
