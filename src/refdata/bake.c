/* SPDX-License-Identifier: MIT */
/* A tool of the build: loads the data sets named on its command line through
 * the program's own loader and writes them as const C tables, so that the
 * program parses nothing at start. The output depends on nothing but the
 * files. Usage: bake OUTPUT.c INPUT.json… */
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "base/file.h"
#include "base/status.h"
#include "base/text.h"
#include "refdata/loader.h"

static void put_string(FILE *out, const char *s)
{
    if (!s) {
        fputs("NULL", out);
        return;
    }
    fputc('"', out);
    for (; *s; s++) {
        unsigned char c = (unsigned char)*s;
        if (c == '"' || c == '\\' || c == '?' || c < 0x20 || c >= 0x7F)
            fprintf(out, "\\%03o", c);
        else
            fputc(c, out);
    }
    fputc('"', out);
}

static void put_number(FILE *out, struct number n)
{
    char text[NUMBER_TEXT_MAX];
    number_print(n, text);
    fprintf(out, "{%s%s, %d}", text, strchr(text, '.') ? "" : ".0", n.decimals);
}

static const char *bool_word(bool b)
{
    return b ? "true" : "false";
}

/* The shared texts as numbers: a string literal may not be as long. */
static void put_strings(FILE *out, const struct dataset *set, size_t i)
{
    fprintf(out, "static const char strings_%zu[%zu] = {", i,
            set->strings_size);
    for (size_t k = 0; k < set->strings_size; k++)
        fprintf(out, "%s%d,", k % 20 == 0 ? "\n" : "", (int)set->strings[k]);
    fprintf(out, "\n};\n");
}

/* A list of names as an array of its own; nothing for NULL. */
static void put_names(FILE *out, const char *kind, const char *const *names,
                      size_t i, int k)
{
    if (!names)
        return;
    fprintf(out, "static const char *const %s_%zu_%d[] = {", kind, i, k);
    for (; *names; names++) {
        put_string(out, *names);
        fputs(", ", out);
    }
    fputs("NULL};\n", out);
}

static void put_citation(FILE *out, const struct citation *c, size_t i, int k)
{
    const struct {
        const char *name, *text;
    } texts[] = {
        {"key", c->key},
        {"kind", c->kind},
        {"title", c->title},
        {"container", c->container},
        {"volume", c->volume},
        {"pages", c->pages},
        {"doi", c->doi},
        {"note", c->note},
        {"from_memory", c->from_memory},
        {"not_known", c->not_known},
    };
    fprintf(out, "{.year = %d", c->year);
    if (c->authors)
        fprintf(out, ", .authors = authors_%zu_%d", i, k);
    if (c->organizations)
        fprintf(out, ", .organizations = organizations_%zu_%d", i, k);
    for (size_t t = 0; t < sizeof texts / sizeof *texts; t++) {
        fprintf(out, ", .%s = ", texts[t].name);
        put_string(out, texts[t].text);
    }
    fprintf(out, "},\n");
}

static void put_citations(FILE *out, const struct dataset *set, size_t i)
{
    const struct provenance *p = &set->provenance;
    for (int k = 0; k < p->citation_count; k++) {
        put_names(out, "authors", p->citations[k].authors, i, k);
        put_names(out, "organizations", p->citations[k].organizations, i, k);
    }
    fprintf(out, "static const struct citation citations_%zu[] = {\n", i);
    for (int k = 0; k < p->citation_count; k++)
        put_citation(out, &p->citations[k], i, k);
    fprintf(out, "};\n");
}

static void put_notes(FILE *out, const struct dataset *set, size_t i)
{
    if (set->note_count == 0)
        return;
    fprintf(out, "static const char *const notes_%zu[] = {\n", i);
    for (int k = 0; k < set->note_count; k++) {
        put_string(out, set->notes[k]);
        fprintf(out, ",\n");
    }
    fprintf(out, "};\n");
}

static void put_marks(FILE *out, const struct dataset *set, size_t i)
{
    if (set->mark_count == 0)
        return;
    fprintf(out, "static const struct mark marks_%zu[] = {\n", i);
    for (int k = 0; k < set->mark_count; k++) {
        fprintf(out, "{");
        put_string(out, set->marks[k].id);
        fprintf(out, ", ");
        put_string(out, set->marks[k].meaning);
        fprintf(out, "},\n");
    }
    fprintf(out, "};\n");
}

static void put_values(FILE *out, const struct dataset *set, size_t i)
{
    fprintf(out, "static const struct entry rows_%zu[] = {\n", i);
    for (int k = 0; k < set->count; k++) {
        const struct entry *e = &set->values[k];
        fprintf(out, "{");
        put_number(out, e->value);
        fprintf(out, ", ");
        put_number(out, e->u);
        fprintf(out, ", %u, %u, %u, %u, %d, %d, %d, %d, %u, %u, %u, %u, %u, ",
                (unsigned)e->variant, (unsigned)e->note, (unsigned)e->remark,
                (unsigned)e->marks, e->z, e->charge, e->n, e->l,
                (unsigned)e->coordination, (unsigned)e->spin,
                (unsigned)e->evidence, (unsigned)e->gap, (unsigned)e->source);
        fprintf(out, "%s, %s},\n", bool_word(e->has_u),
                bool_word(e->preferred));
    }
}

static void put_elements(FILE *out, const struct dataset *set, size_t i)
{
    fprintf(out, "static const struct element_facts rows_%zu[] = {\n", i);
    for (int k = 0; k < set->count; k++) {
        const struct element_facts *f = &set->elements[k];
        fprintf(out, "{");
        put_number(out, f->weight);
        fprintf(out, ", %u, %u, %u, %u, %u, %d, %d, %u, %s, %s},\n",
                (unsigned)f->configuration, (unsigned)f->shells,
                (unsigned)f->term, (unsigned)f->category, (unsigned)f->note,
                f->z, f->longest_lived, (unsigned)f->status,
                bool_word(f->has_weight), bool_word(f->has_stable_isotope));
    }
}

static void put_configurations(FILE *out, const struct dataset *set, size_t i)
{
    fprintf(out, "static const struct configuration_entry rows_%zu[] = {\n", i);
    for (int k = 0; k < set->count; k++) {
        const struct configuration_entry *c = &set->configurations[k];
        fprintf(out, "{%u, %u, %u, %u, %d, %d, %u, %s},\n",
                (unsigned)c->configuration, (unsigned)c->shells,
                (unsigned)c->term, (unsigned)c->note, c->z, c->charge,
                (unsigned)c->status, bool_word(c->irregular));
    }
}

static void put_oxidation_states(FILE *out, const struct dataset *set, size_t i)
{
    fprintf(out, "static const struct oxidation_state rows_%zu[] = {\n", i);
    for (int k = 0; k < set->count; k++) {
        const struct oxidation_state *o = &set->oxidation_states[k];
        fprintf(out, "{%d, %d, %s},\n", o->z, o->state, bool_word(o->main));
    }
}

static void put_availability(FILE *out, const struct dataset *set, size_t i)
{
    fprintf(out, "static const struct availability rows_%zu[] = {\n", i);
    for (int k = 0; k < set->count; k++) {
        const struct availability *a = &set->availability[k];
        fprintf(out, "{");
        put_number(out, a->abundance);
        fprintf(out, ", ");
        put_number(out, a->abundance_2014);
        fprintf(out, ", %u, %u, %u, %d, %u, %s, %s},\n", (unsigned)a->hazards,
                (unsigned)a->hazard_basis, (unsigned)a->critical, a->z,
                (unsigned)a->radioactive, bool_word(a->has_abundance),
                bool_word(a->has_abundance_2014));
    }
}

/* What each kind writes and the member that points to it. */
static const struct {
    void (*put)(FILE *out, const struct dataset *set, size_t i);
    const char *member;
} kinds[DATASET_KIND_COUNT] = {
    [DATASET_VALUES] = {put_values, "values"},
    [DATASET_ELEMENTS] = {put_elements, "elements"},
    [DATASET_CONFIGURATIONS] = {put_configurations, "configurations"},
    [DATASET_OXIDATION_STATES] = {put_oxidation_states, "oxidation_states"},
    [DATASET_AVAILABILITY] = {put_availability, "availability"},
};

static void put_member(FILE *out, const char *name, const char *text)
{
    fprintf(out, "    .%s = ", name);
    put_string(out, text);
    fprintf(out, ",\n");
}

/* The unit is found by id when the program is linked, not copied: a data set
 * points into the table of units. */
static size_t unit_place(const struct unit *unit)
{
    size_t i = 0;
    while (unit_at(i) != unit)
        i++;
    return i;
}

static void put_dataset(FILE *out, const struct dataset *set, size_t i)
{
    fprintf(out, "static const struct dataset set_%zu = {\n", i);
    put_member(out, "provenance.id", set->provenance.id);
    put_member(out, "provenance.title", set->provenance.title);
    if (set->provenance.definition)
        fprintf(out, "    .provenance.definition = &definition_%s,\n",
                set->provenance.definition->name);
    put_member(out, "licence", set->licence);
    put_member(out, "absent", set->absent);
    fprintf(out, "    .provenance.citations = citations_%zu,\n", i);
    fprintf(out, "    .provenance.citation_count = %d,\n",
            set->provenance.citation_count);
    fprintf(out, "    .kind = (enum dataset_kind)%d,\n", (int)set->kind);
    if (set->note_count)
        fprintf(out, "    .notes = notes_%zu, .note_count = %d,\n", i,
                set->note_count);
    if (set->mark_count)
        fprintf(out, "    .marks = marks_%zu, .mark_count = %d,\n", i,
                set->mark_count);
    if (set->unit)
        fprintf(out, "    .unit = &unit_table[%zu],\n", unit_place(set->unit));
    fprintf(out,
            "    .quantity = (enum quantity_id)%d,\n"
            "    .evidence = (enum evidence)%d,\n"
            "    .default_coordination = (enum coordination)%d,\n"
            "    .rank = %d, .count = %d,\n",
            (int)set->quantity, (int)set->evidence,
            (int)set->default_coordination, set->rank, set->count);
    fprintf(out, "    .strings = strings_%zu, .strings_size = %zu,\n", i,
            set->strings_size);
    fprintf(out, "    .%s = rows_%zu,\n    .first = {", kinds[set->kind].member,
            i);
    for (int z = 0; z <= Z_MAX + 1; z++)
        fprintf(out, "%s%u,", z % 16 == 0 ? "\n" : "", (unsigned)set->first[z]);
    fprintf(out, "\n    },\n};\n");
}

static void put_file(FILE *out, struct loaded **sets, size_t count)
{
    fprintf(out, "/* Made by bake from data/; do not edit. */\n"
                 "#include \"refdata/builtin.h\"\n");
    for (size_t i = 0; i < count; i++) {
        const struct dataset *set = &sets[i]->set;
        fprintf(out, "\n/* %s */\n", set->provenance.id);
        put_strings(out, set, i);
        put_citations(out, set, i);
        put_notes(out, set, i);
        put_marks(out, set, i);
        kinds[set->kind].put(out, set, i);
        fprintf(out, "};\n");
        put_dataset(out, set, i);
    }
    fprintf(out, "\nconst struct dataset *const refdata_builtin[] = {\n");
    for (size_t i = 0; i < count; i++)
        fprintf(out, "    &set_%zu,\n", i);
    fprintf(out, "};\nconst size_t refdata_builtin_count = %zu;\n", count);
}

/* No id twice, no rank twice within a quantity. */
static bool check_together(struct loaded **sets, size_t count,
                           struct status *st)
{
    for (size_t i = 0; i < count; i++)
        for (size_t j = 0; j < i; j++) {
            const struct dataset *a = &sets[i]->set;
            const struct dataset *b = &sets[j]->set;
            if (strcmp(a->provenance.id, b->provenance.id) == 0)
                return status_fail(st, STATUS_DATA, "two sets with the id %s",
                                   a->provenance.id);
            if (a->kind == DATASET_VALUES && b->kind == DATASET_VALUES &&
                a->quantity == b->quantity && a->rank == b->rank)
                return status_fail(st, STATUS_DATA,
                                   "%s and %s have the same rank %d",
                                   a->provenance.id, b->provenance.id, a->rank);
        }
    return true;
}

static bool bake(const char *output, char **inputs, struct loaded **sets,
                 size_t count, struct status *st)
{
    struct file_draft draft;
    for (size_t i = 0; i < count; i++)
        if (!dataset_load_file(inputs[i], &sets[i], st))
            return false;
    if (!check_together(sets, count, st) ||
        !file_draft_open(&draft, output, true, st))
        return false;
    put_file(draft.stream, sets, count);
    return file_draft_commit(&draft, st);
}

int main(int argc, char **argv)
{
    if (argc < 3) {
        fprintf(stderr, "usage: bake OUTPUT.c INPUT.json...\n");
        return 2;
    }
    size_t count = (size_t)argc - 2;
    struct loaded **sets = calloc(count, sizeof(void *));
    struct status st = status_ok();
    if (!sets)
        (void)status_fail(&st, STATUS_MEMORY, "out of memory");
    else if (!bake(argv[1], argv + 2, sets, count, &st))
        fprintf(stderr, "bake: %s\n", st.message);
    for (size_t i = 0; sets && i < count; i++)
        loaded_free(sets[i]);
    free(sets);
    return status_exit(st.code);
}
