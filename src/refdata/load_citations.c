/* SPDX-License-Identifier: MIT */
/* The works that a data set cites. What is not certain of a record is part of
 * it: fields from memory must be there, fields that are not known must not. */
#include <string.h>

#include "base/text.h"
#include "refdata/load.h"

static const struct field citation_fields[] = {
    {"key", FIELD_TEXT, true},         {"type", FIELD_TEXT, true},
    {"authors", FIELD_TEXTS, false},   {"organizations", FIELD_TEXTS, false},
    {"title", FIELD_TEXT, false},      {"container", FIELD_TEXT, false},
    {"year", FIELD_INTEGER, false},    {"volume", FIELD_TEXT, false},
    {"pages", FIELD_TEXT, false},      {"doi", FIELD_TEXT, false},
    {"note", FIELD_TEXT, false},       {"from_memory", FIELD_TEXTS, false},
    {"not_known", FIELD_TEXTS, false},
};

#define FIELD_COUNT(fields) (sizeof(fields) / sizeof(fields)[0])

/* Publication years that are not a slip of the keyboard. */
#define YEAR_MIN 1800
#define YEAR_MAX 2100
#define CITATIONS_MAX 100
#define NAMES_MAX 1000

/* Name of a list of authors cut short, as BibTeX has it. */
#define OTHERS "others"

/* A list of names, ended by NULL; NULL without the key. */
static bool load_names(struct load *ld, const cJSON *object, const char *key,
                       const char *const **out)
{
    const cJSON *list = object_member(object, key);
    int count = list ? cJSON_GetArraySize(list) : 0;
    *out = NULL;
    if (!list)
        return true;
    if (count > NAMES_MAX)
        return status_fail(ld->st, STATUS_DATA, "%s: more than %d", key,
                           NAMES_MAX);
    const char **names =
        arena_array(&ld->out->arena, (size_t)count + 1, sizeof *names, ld->st);
    if (!names)
        return false;
    int place = 0;
    const cJSON *item;
    cJSON_ArrayForEach(item, list)
    {
        if (strcmp(item->valuestring, OTHERS) == 0 && item->next)
            return status_fail(ld->st, STATUS_DATA,
                               "%s: '%s' stands for the rest of the list and "
                               "comes last",
                               key, OTHERS);
        names[place] = load_copy(ld, item->valuestring);
        if (!names[place++])
            return false;
    }
    *out = names;
    return true;
}

/* ISO 26324: "10.", the registrant, "/", the item. Braces, which no registrant
 * uses, would end a BibTeX field. */
static bool check_doi(const char *doi, struct status *st)
{
    size_t registrant =
        strncmp(doi, "10.", 3) == 0 ? strspn(doi + 3, "0123456789.") : 0;
    const char *slash = doi + 3 + registrant;
    if (registrant > 0 && doi[3] != '.' && slash[-1] != '.' && *slash == '/' &&
        slash[1] != '\0' && !strpbrk(slash, " {}\\"))
        return true;
    return status_fail(st, STATUS_DATA,
                       "doi '%s': expected the bare identifier, such as "
                       "10.1063/1.1733573",
                       quoted(doi).text);
}

/* A list of fields of the record, each of which must be there, or must not. */
static bool load_doubts(struct load *ld, const cJSON *object, const char *key,
                        bool there, const char **out)
{
    const cJSON *item;
    cJSON_ArrayForEach(item, object_member(object, key))
    {
        const char *field = item->valuestring;
        size_t i = 2; /* key and type are ours, not the work's */
        while (i < 10 && strcmp(citation_fields[i].key, field) != 0)
            i++;
        if (i == 10)
            return status_fail(ld->st, STATUS_DATA,
                               "%s '%s': expected authors, organizations, "
                               "title, container, year, volume, pages or doi",
                               key, quoted(field).text);
        if ((object_member(object, field) != NULL) != there)
            return status_fail(
                ld->st, STATUS_DATA,
                there ? "%s: there is no %s" : "%s: there is a %s", key, field);
    }
    return load_list(ld, object, key, ", ", out);
}

/* What every citation has, and what the first, the main one, has. */
static bool check_citation(struct load *ld, const cJSON *object, bool first,
                           const struct citation *c)
{
    /* A table that goes from hand to hand can be without a year. */
    bool needs_year = strcmp(c->kind, "misc") != 0;
    if (object_member(object, "year") &&
        (c->year < YEAR_MIN || c->year > YEAR_MAX))
        return status_fail(ld->st, STATUS_DATA,
                           "year %d: expected one from %d to %d", c->year,
                           YEAR_MIN, YEAR_MAX);
    if (first && ((!c->authors && !c->organizations) || !c->title ||
                  (needs_year && c->year == 0)))
        return status_fail(ld->st, STATUS_DATA,
                           "the first citation needs authors or "
                           "organizations, title and, unless it is misc, "
                           "year");
    if (!c->title && !c->container)
        return status_fail(ld->st, STATUS_DATA,
                           "a title or a container is needed");
    return !c->doi || check_doi(c->doi, ld->st);
}

static bool load_citation(struct load *ld, const cJSON *object, bool first,
                          struct citation *c)
{
    static const char *const types[] = {"article", "book", "incollection",
                                        "techreport", "misc"};
    int type;
    if (!object_check(object, citation_fields, FIELD_COUNT(citation_fields),
                      ld->st))
        return false;
    if (!load_check_id(object_text(object, "key"), "key", ld->st) ||
        !load_word(ld, object, "type", types, FIELD_COUNT(types), &type))
        return false;
    c->kind = types[type];
    c->year = object_integer(object, "year", 0);
    return load_member(ld, object, "key", &c->key) &&
           load_names(ld, object, "authors", &c->authors) &&
           load_names(ld, object, "organizations", &c->organizations) &&
           load_member(ld, object, "title", &c->title) &&
           load_member(ld, object, "container", &c->container) &&
           load_member(ld, object, "volume", &c->volume) &&
           load_member(ld, object, "pages", &c->pages) &&
           load_member(ld, object, "doi", &c->doi) &&
           load_member(ld, object, "note", &c->note) &&
           load_doubts(ld, object, "from_memory", true, &c->from_memory) &&
           load_doubts(ld, object, "not_known", false, &c->not_known) &&
           check_citation(ld, object, first, c);
}

bool load_citations(struct load *ld)
{
    const cJSON *list = object_member(ld->root, "citations");
    int count = cJSON_GetArraySize(list);
    if (count > CITATIONS_MAX)
        return status_fail(ld->st, STATUS_DATA, "citations: more than %d",
                           CITATIONS_MAX);
    struct citation *citations =
        arena_array(&ld->out->arena, (size_t)count, sizeof *citations, ld->st);
    if (!citations)
        return false;
    int place = 0;
    const cJSON *object;
    cJSON_ArrayForEach(object, list)
    {
        struct citation *c = &citations[place++];
        bool ok = load_citation(ld, object, place == 1, c);
        for (int i = 0; ok && i < place - 1; i++)
            if (strcmp(citations[i].key, c->key) == 0)
                ok = status_fail(ld->st, STATUS_DATA,
                                 "key '%s' stands there twice", c->key);
        if (!ok)
            return status_context(ld->st, "citation %d", place);
    }
    ld->out->set.provenance.citations = citations;
    ld->out->set.provenance.citation_count = count;
    return true;
}
