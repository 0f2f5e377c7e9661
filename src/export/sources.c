/* SPDX-License-Identifier: MIT */
#include "export/sources.h"

#include <string.h>

#define FIELD_TEXT_MAX 2048
#define WIDTH 100
#define INDENT 8

static const char *or_empty(const char *s)
{
    return s ? s : "";
}

/* A line with a label, its text in lines of WIDTH columns. */
static void put_line(FILE *out, const char *label, const char *text)
{
    int column = fprintf(out, "    %s", label);
    while (*text) {
        int length = (int)strcspn(text, " ");
        if (column > INDENT && column + 1 + length > WIDTH)
            column = fprintf(out, "\n%*s", INDENT - 1, "") - 1;
        column += fprintf(out, " %.*s", length, text);
        text += length;
        text += strspn(text, " ");
    }
    putc('\n', out);
}

/* A model tells its name and domain once, then what each part of it rests
 * on. */
static void write_text(FILE *out, const struct source *s, bool again)
{
    char buffer[FIELD_TEXT_MAX];
    const struct provenance *p = s->provenance;
    struct text t = text_over(buffer, sizeof buffer);
    if (!again)
        fprintf(out, "%s: %s\n", p->id, p->title);
    if (!again)
        put_line(out, p->computed ? "domain:" : "terms:", or_empty(s->domain));
    text_add(&t, s->quantity);
    if (s->unit && s->unit[0])
        text_addf(&t, ", in %s", s->unit);
    if (s->count)
        text_addf(&t, "%s%d entries", t.length ? "; " : "", s->count);
    put_line(out, p->computed ? "for:" : "holds:", buffer);
    for (int i = 0; i < p->citation_count; i++) {
        t = text_over(buffer, sizeof buffer);
        citation_text(&t, &p->citations[i]);
        put_line(out, "source:", buffer);
    }
    for (int i = 0; i < s->note_count; i++)
        put_line(out, "note:", s->notes[i]);
}

static void notes_text(struct text *t, const struct source *s)
{
    for (int i = 0; i < s->note_count; i++) {
        if (i > 0)
            text_add(t, " ");
        text_add(t, s->notes[i]);
    }
}

enum { SOURCE_FIELDS = 9 };

static const char *const names[SOURCE_FIELDS] = {"kind",     "id",     "title",
                                                 "quantity", "unit",   "values",
                                                 "terms",    "source", "notes"};

/* The fields of one source, in the order of names. */
static void field_text(const struct source *s, int field, struct text *t)
{
    const struct provenance *p = s->provenance;
    const char *const plain[SOURCE_FIELDS] = {
        p->computed ? "model" : "data set",
        p->id,
        p->title,
        s->quantity,
        or_empty(s->unit),
        NULL,
        or_empty(s->domain),
        NULL,
        NULL,
    };
    if (plain[field])
        text_add(t, plain[field]);
    else if (field == 5 && s->count)
        text_addf(t, "%d", s->count);
    else if (field == 7)
        provenance_text(t, p);
    else if (field == 8)
        notes_text(t, s);
}

static void write_record(FILE *out, enum export_format format,
                         const struct source *s)
{
    for (int f = 0; f < SOURCE_FIELDS; f++) {
        char buffer[4 * FIELD_TEXT_MAX];
        struct text t = text_over(buffer, sizeof buffer);
        field_text(s, f, &t);
        if (format == EXPORT_CSV) {
            csv_field(out, buffer, f == 0);
            continue;
        }
        fputs(f ? ", " : "", out);
        json_string(out, names[f]);
        fputs(": ", out);
        if (t.length == 0)
            fputs("null", out);
        else if (f == 5)
            fputs(buffer, out);
        else
            json_string(out, buffer);
    }
}

bool sources_write(FILE *out, enum export_format format,
                   const struct source *sources, int count, struct status *st)
{
    (void)st;
    if (format == EXPORT_JSON)
        fputs("{\"schema\": 1, \"sources\": [", out);
    if (format == EXPORT_CSV) {
        for (int f = 0; f < SOURCE_FIELDS; f++)
            csv_field(out, names[f], f == 0);
        csv_end(out);
    }
    for (int i = 0; i < count; i++) {
        if (format == EXPORT_TEXT) {
            bool again = i > 0 && strcmp(sources[i].provenance->id,
                                         sources[i - 1].provenance->id) == 0;
            if (i > 0 && !again)
                putc('\n', out);
            write_text(out, &sources[i], again);
            continue;
        }
        if (format == EXPORT_JSON)
            fputs(i ? ",\n  {" : "\n  {", out);
        write_record(out, format, &sources[i]);
        if (format == EXPORT_JSON)
            fputs("}", out);
        else
            csv_end(out);
    }
    if (format == EXPORT_JSON)
        fputs("\n]}\n", out);
    return true;
}

/* Characters that mean something to TeX are escaped. */
static void bibtex_field(FILE *out, const char *name, const char *value)
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

static bool seen_before(const struct source *sources, int i, int c)
{
    const char *key = sources[i].provenance->citations[c].key;
    for (int s = 0; s <= i; s++) {
        const struct provenance *p = sources[s].provenance;
        for (int k = 0; k < (s == i ? c : p->citation_count); k++)
            if (strcmp(p->citations[k].key, key) == 0)
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
    bibtex_field(out, "author", c->authors);
    bibtex_field(out, "title", c->title);
    bibtex_field(out, container_field(c->kind), c->container);
    bibtex_field(out, "volume", c->volume);
    bibtex_field(out, "pages", c->pages);
    if (c->year)
        fprintf(out, ",\n  year = {%d}", c->year);
    if (c->doi)
        fprintf(out, ",\n  doi = {%s}", c->doi);
    fputs("\n}\n\n", out);
}

void sources_write_bibtex(FILE *out, const struct source *sources, int count)
{
    for (int i = 0; i < count; i++) {
        const struct provenance *p = sources[i].provenance;
        for (int c = 0; c < p->citation_count; c++)
            if (!seen_before(sources, i, c))
                write_entry(out, &p->citations[c]);
    }
}
