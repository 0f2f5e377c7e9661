/* SPDX-License-Identifier: MIT */
/* The forms in which a report is written. */
#ifndef WRITE_FORMAT_H
#define WRITE_FORMAT_H

#include <stdio.h>

#include "report/report.h"

/* Control sequences around marked words, "" for none: headings, signed cells
 * above and below zero, and what ends a mark. */
struct write_style {
    const char *heading, *plus, *minus, *end;
};
extern const struct write_style write_plain;

/* One format. uses: the parts of a report (bits of enum report_part) that it
 * writes; the others need not be filled. for_people: it may be turned into
 * ASCII and marked with colours; other formats are always UTF-8. write writes a
 * whole report; write errors are the stream's, it fails with STATUS_MEMORY. */
struct format {
    const char *id;
    const char *title;
    unsigned uses;
    bool for_people;
    bool (*write)(FILE *out, const struct report *report,
                  const struct write_style *style, struct status *st);
};

extern const struct format format_text;
extern const struct format format_csv;
extern const struct format format_json;
extern const struct format format_bibtex;

/* All formats, the default one first. */
extern const struct format *const format_list[];
extern const int format_list_count;

/* By id; NULL when there is none. */
const struct format *format_find(const char *id);

/* Writes a report; a report that is not whole is refused with
 * STATUS_MEMORY and nothing is written. */
MUST_CHECK bool format_write(const struct format *format, FILE *out,
                             const struct report *report,
                             const struct write_style *style,
                             struct status *st);

#endif
