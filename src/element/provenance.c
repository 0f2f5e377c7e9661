/* SPDX-License-Identifier: MIT */
#include "element/provenance.h"

#include <string.h>

void citation_text(struct text *t, const struct citation *c)
{
    const char *first = c->authors ? c->authors : c->title;
    /* A container may stand alone: "Journal 1, 2". */
    if (first)
        text_add(t, first);
    /* An article is found by its journal; anything else by its title. */
    if (c->authors && c->title && c->container &&
        strcmp(c->kind, "article") != 0)
        text_addf(t, ", %s", c->title);
    if (c->container)
        text_addf(t, first ? ", %s" : "%s", c->container);
    if (c->volume)
        text_addf(t, " %s", c->volume);
    if (c->pages)
        text_addf(t, ", %s", c->pages);
    if (c->year)
        text_addf(t, " (%d)", c->year);
    if (c->doi)
        text_addf(t, ", doi %s", c->doi);
}

const char *provenance_definition(const struct provenance *provenance)
{
    return provenance->definition ? provenance->definition->text
                                  : provenance->title;
}

void provenance_text(struct text *t, const struct provenance *provenance)
{
    for (int i = 0; provenance && i < provenance->citation_count; i++) {
        if (i > 0)
            text_add(t, "; ");
        citation_text(t, &provenance->citations[i]);
    }
}
