/* SPDX-License-Identifier: MIT */
#include "element/provenance.h"

#include <string.h>

static int name_count(const char *const *names)
{
    int count = 0;
    while (names && names[count])
        count++;
    return count;
}

const char *provenance_definition(const struct provenance *provenance)
{
    return provenance->definition ? provenance->definition->text
                                  : provenance->title;
}

/* "A, B and C". */
static void add_names(struct text *t, const struct citation *c)
{
    int persons = name_count(c->authors);
    int count = persons + name_count(c->organizations);
    for (int i = 0; i < count; i++) {
        if (i > 0)
            text_add(t, i == count - 1 ? " and " : ", ");
        text_add(t,
                 i < persons ? c->authors[i] : c->organizations[i - persons]);
    }
}

/* A part with what stands before it, unless it is the first of all. */
static void add_part(struct text *t, size_t start, const char *before,
                     const char *part)
{
    if (!part)
        return;
    if (t->length > start)
        text_add(t, before);
    text_add(t, part);
}

static void add_remark(struct text *t, bool *begun, const char *before,
                       const char *remark)
{
    if (!remark)
        return;
    text_add(t, *begun ? "; " : " [");
    text_add(t, before);
    text_add(t, remark);
    *begun = true;
}

void citation_text(struct text *t, const struct citation *c,
                   enum citation_form form)
{
    size_t start = t->length;
    bool begun = false;
    /* An article is found by its journal; anything else by its title. */
    bool title = form == CITATION_FULL || !c->container ||
                 strcmp(c->kind, "article") != 0;
    add_names(t, c);
    add_part(t, start, ", ", title ? c->title : NULL);
    add_part(t, start, ", ", c->container);
    add_part(t, start, c->container ? " " : ", volume ", c->volume);
    add_part(t, start, ", ", c->pages);
    if (c->year)
        text_addf(t, t->length > start ? " (%d)" : "%d", c->year);
    add_part(t, start, ", doi ", c->doi);
    add_remark(t, &begun, "", c->note);
    add_remark(t, &begun, "not known: ", c->not_known);
    if (form == CITATION_FULL)
        add_remark(t, &begun, "from memory: ", c->from_memory);
    text_add(t, begun ? "]" : "");
}

bool cited_holds(struct cited_source source, int i)
{
    const struct provenance *p = source.provenance;
    return !source.only || i < p->common || source.only == &p->citations[i];
}

void cited_text(struct text *t, struct cited_source source,
                enum citation_form form)
{
    const struct provenance *p = source.provenance;
    if (!p)
        return;
    bool begun = p->unsourced != NULL;
    text_add(t, begun ? p->unsourced : "");
    for (int i = 0; i < p->citation_count; i++) {
        if (!cited_holds(source, i))
            continue;
        text_add(t, begun ? "; " : "");
        citation_text(t, &p->citations[i], form);
        begun = true;
    }
}
