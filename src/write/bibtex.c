/* SPDX-License-Identifier: MIT */
/* BibTeX as its manual describes it (O. Patashnik, BibTeXing, 1988): fields in
 * braces, which balance; names joined by " and "; a name in braces is left as
 * it is. */
#include <stdlib.h>
#include <string.h>

#include "base/array.h"
#include "base/text.h"
#include "write/format.h"

/* Two ids, a point each, and a number. */
#define KEY_TEXT_MAX 128

/* One entry and what it is called. */
struct work {
    const struct citation *citation;
    char key[KEY_TEXT_MAX];
};

struct works {
    struct work *items; /* owned */
    size_t count, capacity;
};

/* A backslash before a brace would not keep BibTeX from counting it. */
static const char *tex_word(char c)
{
    switch (c) {
    case '\\':
        return "{\\textbackslash}";
    case '{':
        return "{\\textbraceleft}";
    case '}':
        return "{\\textbraceright}";
    case '~':
        return "{\\textasciitilde}";
    case '^':
        return "{\\textasciicircum}";
    default:
        return NULL;
    }
}

static void put_tex(FILE *out, const char *value)
{
    for (const char *p = value; *p; p++) {
        const char *word = tex_word(*p);
        if (word) {
            fputs(word, out);
            continue;
        }
        if (strchr("&%$#_", *p))
            putc('\\', out);
        putc(*p, out);
    }
}

static void put_field(FILE *out, const char *name, const char *value)
{
    if (!value)
        return;
    fprintf(out, ",\n  %s = {", name);
    put_tex(out, value);
    putc('}', out);
}

/* True when BibTeX would take a person's name apart wrongly: it holds "and",
 * or more commas than a name can have. */
static bool must_hold_together(const char *name)
{
    const char *comma = strchr(name, ',');
    if (comma && strchr(comma + 1, ','))
        return true;
    for (const char *p = name; (p = strchr(p, ' ')) != NULL; p++)
        if (text_starts_ignoring_case(p, " and "))
            return true;
    return false;
}

static void put_name(FILE *out, const char *name, bool whole)
{
    fputs(whole ? "{" : "", out);
    put_tex(out, name);
    fputs(whole ? "}" : "", out);
}

static void put_authors(FILE *out, const struct citation *c)
{
    const char *separator = "";
    if (!c->authors && !c->organizations)
        return;
    fputs(",\n  author = {", out);
    for (const char *const *n = c->authors; n && *n; n++) {
        fputs(separator, out);
        put_name(out, *n, must_hold_together(*n));
        separator = " and ";
    }
    for (const char *const *n = c->organizations; n && *n; n++) {
        fputs(separator, out);
        put_name(out, *n, true);
        separator = " and ";
    }
    putc('}', out);
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

static void put_note(FILE *out, const struct citation *c)
{
    const struct {
        const char *before, *text;
    } parts[] = {{"", c->note},
                 {"not known: ", c->not_known},
                 {"from memory: ", c->from_memory}};
    const char *separator = ",\n  note = {";
    for (size_t i = 0; i < sizeof parts / sizeof *parts; i++) {
        if (!parts[i].text)
            continue;
        fprintf(out, "%s%s", separator, parts[i].before);
        put_tex(out, parts[i].text);
        separator = "; ";
    }
    if (separator[0] == ';')
        putc('}', out);
}

static void put_entry(FILE *out, const struct work *work)
{
    const struct citation *c = work->citation;
    fprintf(out, "@%s{%s", c->kind, work->key);
    put_authors(out, c);
    /* Inner braces keep the capitals of a title. */
    if (c->title) {
        fputs(",\n  title = {{", out);
        put_tex(out, c->title);
        fputs("}}", out);
    }
    put_field(out, container_field(c->kind), c->container);
    put_field(out, "volume", c->volume);
    put_field(out, "pages", c->pages);
    if (c->year)
        fprintf(out, ",\n  year = {%d}", c->year);
    /* Styles read it as it is; the loader lets no brace through. */
    if (c->doi)
        fprintf(out, ",\n  doi = {%s}", c->doi);
    put_note(out, c);
    fputs("\n}\n\n", out);
}

static bool same_text(const char *a, const char *b)
{
    return a == b || (a && b && strcmp(a, b) == 0);
}

static bool same_names(const char *const *a, const char *const *b)
{
    if (!a || !b)
        return a == b;
    while (*a && *b && strcmp(*a, *b) == 0) {
        a++;
        b++;
    }
    return *a == *b;
}

static bool same_work(const struct citation *a, const struct citation *b)
{
    return a == b ||
           (same_text(a->key, b->key) && same_text(a->kind, b->kind) &&
            same_names(a->authors, b->authors) &&
            same_names(a->organizations, b->organizations) &&
            same_text(a->title, b->title) &&
            same_text(a->container, b->container) && a->year == b->year &&
            same_text(a->volume, b->volume) && same_text(a->pages, b->pages) &&
            same_text(a->doi, b->doi) && same_text(a->note, b->note) &&
            same_text(a->from_memory, b->from_memory) &&
            same_text(a->not_known, b->not_known));
}

static bool key_taken(const struct works *works, const char *key)
{
    for (size_t i = 0; i < works->count; i++)
        if (text_same_ignoring_case(works->items[i].key, key))
            return true;
    return false;
}

/* A key of its own for a work: its own one, with the source's id, numbered. */
static void choose_key(const struct works *works, struct work *work,
                       const char *source)
{
    struct text t = text_over(work->key, sizeof work->key);
    text_add(&t, work->citation->key);
    if (key_taken(works, work->key)) {
        t = text_over(work->key, sizeof work->key);
        text_addf(&t, "%s.%s", source, work->citation->key);
    }
    size_t length = t.length;
    for (int number = 2; key_taken(works, work->key); number++) {
        t.length = length;
        text_addf(&t, ".%d", number);
    }
}

/* Adds the work unless it is there. False without memory. */
static bool add_work(struct works *works, const struct citation *citation,
                     const char *source, bool *added)
{
    *added = false;
    for (size_t i = 0; i < works->count; i++)
        if (same_work(works->items[i].citation, citation))
            return true;
    if (!array_grow(&works->items, works->count, &works->capacity,
                    sizeof *works->items))
        return false;
    struct work *work = &works->items[works->count];
    work->citation = citation;
    choose_key(works, work, source);
    works->count++;
    *added = true;
    return true;
}

static bool write_source(FILE *out, const struct report *report, size_t i,
                         struct works *works)
{
    const struct cited_source *source = &report->sources[i];
    const struct provenance *p = source->provenance;
    bool told = false;
    bool ok = true;
    for (size_t k = 0; k < i; k++)
        told = told || strcmp(report->sources[k].provenance->id, p->id) == 0;
    if (p->unsourced && !told)
        fprintf(out, "%% %s: %s\n\n", p->id, p->unsourced);
    for (int c = 0; ok && c < p->citation_count; c++) {
        bool added;
        if (!cited_holds(*source, c))
            continue;
        ok = add_work(works, &p->citations[c], p->id, &added);
        if (ok && added)
            put_entry(out, &works->items[works->count - 1]);
    }
    return ok;
}

static bool write_bibtex(FILE *out, const struct report *report,
                         const struct write_style *style, struct status *st)
{
    struct works works = {0};
    bool ok = true;
    (void)style;
    for (size_t i = 0; ok && i < report->source_count; i++)
        ok = write_source(out, report, i, &works);
    free(works.items);
    return ok || status_fail(st, STATUS_MEMORY, "out of memory");
}

const struct format format_bibtex = {
    .id = "bibtex",
    .title = "the sources as BibTeX entries",
    .uses = REPORT_SOURCES,
    .for_people = true, /* its text may be turned into ASCII */
    .write = write_bibtex,
};
