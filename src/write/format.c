/* SPDX-License-Identifier: MIT */
#include "write/format.h"

#include <string.h>

const struct write_style write_plain = {"", "", "", ""};

const struct format *format_find(const char *id)
{
    for (int i = 0; i < format_list_count; i++)
        if (strcmp(format_list[i]->id, id) == 0)
            return format_list[i];
    return NULL;
}

bool format_write(const struct format *format, FILE *out,
                  const struct report *report, const struct write_style *style,
                  struct status *st)
{
    return report_whole(report, st) && format->write(out, report, style, st);
}
