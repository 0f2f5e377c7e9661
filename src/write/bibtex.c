/* SPDX-License-Identifier: MIT */
/* The sources of a report as BibTeX: one entry per citation, each key once. */
#include <string.h>

#include "write/format.h"

/* Characters that mean something to TeX are escaped. */
static void write_field(FILE *out, const char *name, const char *value)
{
    if (!value)
        return;
    fprintf(out, ",\n  %s = {", name);
    for (const char *p = value; *p; p++) {
        if (strchr("&%$#_{}", *p))
            putc('\\', out);
        putc(*p, out);
    }
    putc('}', out);
}

static bool written_before(const struct report *report, size_t source,
                           int citation)
{
    const char *key = report->sources[source]->citations[citation].key;
    for (size_t s = 0; s <= source; s++) {
        const struct provenance *p = report->sources[s];
        for (int c = 0; c < (s == source ? citation : p->citation_count); c++)
            if (strcmp(p->citations[c].key, key) == 0)
                return true;
    }
    return false;
}

/* What BibTeX calls the container of a kind of entry. */
static const char *container_field(const char *kind)
{
    static const struct {
        const char *kind, *field;
    } fields[] = {
        {"article", "journal"},
        {"book", "publisher"},
        {"incollection", "booktitle"},
        {"techreport", "institution"},
    };
    for (size_t i = 0; i < sizeof fields / sizeof *fields; i++)
        if (strcmp(kind, fields[i].kind) == 0)
            return fields[i].field;
    return "howpublished";
}

static void write_entry(FILE *out, const struct citation *c)
{
    fprintf(out, "@%s{%s", c->kind, c->key);
    write_field(out, "author", c->authors);
    write_field(out, "title", c->title);
    write_field(out, container_field(c->kind), c->container);
    write_field(out, "volume", c->volume);
    write_field(out, "pages", c->pages);
    if (c->year)
        fprintf(out, ",\n  year = {%d}", c->year);
    if (c->doi)
        fprintf(out, ",\n  doi = {%s}", c->doi);
    fputs("\n}\n\n", out);
}

static bool write_bibtex(FILE *out, const struct report *report,
                         const struct write_style *style, struct status *st)
{
    (void)style;
    (void)st;
    for (size_t s = 0; s < report->source_count; s++)
        for (int c = 0; c < report->sources[s]->citation_count; c++)
            if (!written_before(report, s, c))
                write_entry(out, &report->sources[s]->citations[c]);
    return true;
}

const struct format format_bibtex = {
    .id = "bibtex",
    .title = "the sources as BibTeX entries",
    .uses = REPORT_SOURCES,
    .for_people = true, /* its text may be turned into ASCII */
    .write = write_bibtex,
};
