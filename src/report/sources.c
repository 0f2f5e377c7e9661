/* SPDX-License-Identifier: MIT */
#include "report/sources.h"

#include <string.h>

#define LABEL_INDENT 4
#define WORDS_COLUMN 8

static const struct provenance *provenance_of(const void *record)
{
    return ((const struct source *)record)->provenance;
}

static void put_source(const void *record, struct text *t)
{
    cited_text(t, (struct cited_source){provenance_of(record), NULL},
               CITATION_FULL);
}

static void put_kind(const void *record, struct text *t)
{
    text_add(t, provenance_of(record)->computed ? "model" : "data set");
}

static void put_id(const void *record, struct text *t)
{
    text_add(t, provenance_of(record)->id);
}

static void put_title(const void *record, struct text *t)
{
    text_add(t, provenance_of(record)->title);
}

static void put_quantity(const void *record, struct text *t)
{
    text_add(t, ((const struct source *)record)->quantity);
}

static void put_unit(const void *record, struct text *t)
{
    const char *unit = ((const struct source *)record)->unit;
    text_add(t, unit ? unit : "");
}

static void put_values(const void *record, struct text *t)
{
    int count = ((const struct source *)record)->count;
    if (count)
        text_addf(t, "%d", count);
}

static void put_terms(const void *record, struct text *t)
{
    const char *domain = ((const struct source *)record)->domain;
    text_add(t, domain ? domain : "");
}

static void put_notes(const void *record, struct text *t)
{
    const struct source *s = record;
    for (int i = 0; i < s->note_count; i++) {
        if (i > 0)
            text_add(t, " ");
        text_add(t, s->notes[i]);
    }
}

static const struct report_column columns[] = {
    {"kind", COLUMN_TEXT, .put = put_kind},
    {"id", COLUMN_TEXT, .put = put_id},
    {"title", COLUMN_TEXT, .put = put_title},
    {"quantity", COLUMN_TEXT, .put = put_quantity},
    {"unit", COLUMN_TEXT, .put = put_unit},
    {"values", COLUMN_NUMBER, .put = put_values},
    {"terms", COLUMN_TEXT, .put = put_terms},
    {"source", COLUMN_TEXT, .put = put_source},
    {"notes", COLUMN_TEXT, .put = put_notes},
};

static const void *source_at(const void *data, size_t i, void *room)
{
    (void)room;
    return (const struct source *)data + i;
}

static void add_words(struct report *report, const char *label,
                      const char *words)
{
    report_labelled(report, LABEL_INDENT, WORDS_COLUMN, label, words);
}

/* What a source is for, or holds. */
static void add_content(struct report *report, const struct source *s)
{
    char words[SOURCE_QUANTITY_MAX + 64];
    struct text t = text_over(words, sizeof words);
    text_add(&t, s->quantity);
    if (s->unit && s->unit[0])
        text_addf(&t, ", in %s", s->unit);
    if (s->count)
        text_addf(&t, "%s%d entries", t.length ? "; " : "", s->count);
    add_words(report, s->provenance->computed ? "for:" : "holds:", words);
}

static void add_citations(struct report *report, const struct provenance *p)
{
    struct text t = text_growing();
    if (p->unsourced)
        add_words(report, "source:", p->unsourced);
    for (int i = 0; i < p->citation_count; i++) {
        text_empty(&t);
        citation_text(&t, &p->citations[i], CITATION_FULL);
        report->failed = report->failed || t.cut;
        add_words(report, "source:", t.data);
    }
    text_free(&t);
}

/* A model tells its name and domain once, then what each part of it rests
 * on. */
static void add_blocks(struct report *report, const struct source *sources,
                       int count)
{
    for (int i = 0; i < count; i++) {
        const struct source *s = &sources[i];
        const struct provenance *p = s->provenance;
        bool again = i > 0 && strcmp(p->id, sources[i - 1].provenance->id) == 0;
        if (i > 0 && !again)
            report_gap(report);
        if (!again) {
            report_linef(report, "%s: %s", p->id, p->title);
            add_words(report, p->computed ? "domain:" : "terms:",
                      s->domain ? s->domain : "");
        }
        add_content(report, s);
        add_citations(report, p);
        for (int n = 0; n < s->note_count; n++)
            add_words(report, "note:", s->notes[n]);
    }
}

void report_sources(struct report *report, unsigned parts,
                    const struct source *sources, int count)
{
    report->records = (struct report_records){
        .name = "sources",
        .columns = columns,
        .column_count = sizeof columns / sizeof columns[0],
        .data = sources,
        .count = (size_t)count,
        .at = source_at,
    };
    if (parts & REPORT_BLOCKS)
        add_blocks(report, sources, count);
    for (int i = 0; i < count && (parts & REPORT_SOURCES); i++)
        report_source(report,
                      (struct cited_source){sources[i].provenance, NULL});
}
