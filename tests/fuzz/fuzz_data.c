/* SPDX-License-Identifier: MIT */
/* Reference data: any bytes either load or fail with one clean sentence. A set
 * of values that loads is printed: as a source and as a reference of all
 * elements, in every format. */
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "base/text.h"
#include "fuzz/target.h"
#include "refdata/loader.h"
#include "report/rows.h"
#include "report/sources.h"
#include "study/facts.h"
#include "write/format.h"

static void require(bool held)
{
    if (!held)
        abort();
}

static void check_message(const char *message)
{
    size_t length = strlen(message);
    require(length > 0 && utf8_valid(message, length));
    for (size_t i = 0; i < length;) {
        uint32_t code;
        i += utf8_decode(message + i, length - i, &code);
        require(!utf8_is_control(code));
    }
}

static void check_set(const struct dataset *set)
{
    require(set->count > 0 && set->first[Z_MAX + 1] == set->count);
    require(set->provenance.citation_count > 0);
    if (set->kind != DATASET_VALUES)
        return;
    for (int i = 0; i < set->count; i++) {
        const struct entry *e = &set->values[i];
        struct reading r = dataset_entry_reading(set, e);
        require((r.state == READING_OK) == (e->gap == GAP_NONE));
        require(r.reason && r.remark);
    }
}

/* Writes a report in one format: something, in UTF-8. */
static void check_written(const struct format *format,
                          const struct report *report)
{
    char *text = NULL;
    size_t size = 0;
    struct status st = status_ok();
    FILE *out = open_memstream(&text, &size);
    require(out);
    require(format_write(format, out, report, &write_plain, &st));
    require(fclose(out) == 0);
    require(size > 0 && strlen(text) == size && utf8_valid(text, size));
    free(text);
}

static void print_sources(const struct study *study)
{
    struct source *sources = calloc(SOURCES_MAX, sizeof *sources);
    require(sources);
    int count = study_sources(study, sources, SOURCES_MAX);
    for (int f = 0; f < format_list_count; f++) {
        struct report report;
        report_begin(&report);
        report_sources(&report, format_list[f]->uses, sources, count);
        check_written(format_list[f], &report);
        report_clear(&report);
    }
    free(sources);
}

/* One row per element of the set, of the species and subshell that it speaks
 * of, or of the neutral atom. */
static size_t fill_rows(const struct study *study, const struct dataset *set,
                        const struct reference *reference, struct row *rows)
{
    size_t count = 0;
    for (int i = 0; i < set->count; i++) {
        const struct entry *e = &set->values[i];
        struct ask ask = {
            .z = e->z,
            .charge = e->charge,
            .quantity = set->quantity,
            .reference = reference,
            .n = e->n,
            .l = e->l,
            .site = {(enum coordination)e->coordination,
                     (enum spin_state)e->spin},
            .unit = set->unit,
        };
        struct species species;
        struct status st = status_ok();
        if (study_species(study, &ask, &species, &st))
            rows[count++] = study_row(study, &ask);
    }
    return count;
}

static void print_rows(const struct study *study, const struct dataset *set)
{
    const struct reference *reference =
        reference_find(study_references(study), set->provenance.id);
    struct row *rows = calloc((size_t)set->count, sizeof *rows);
    require(reference && rows);
    size_t count = fill_rows(study, set, reference, rows);
    for (int f = 0; count > 0 && f < format_list_count; f++) {
        struct report report;
        report_begin(&report);
        report_rows(&report, format_list[f]->uses, rows, count);
        check_written(format_list[f], &report);
        report_clear(&report);
    }
    free(rows);
}

/* As --data does, for sets that it takes. */
static void print_set(struct loaded *loaded)
{
    const struct dataset *set = &loaded->set;
    const char *id = set->provenance.id;
    struct catalogue catalogue = {.added_count = 1, .added = {loaded}};
    struct status st = status_ok();
    if (set->kind != DATASET_VALUES ||
        catalogue_find(catalogue_builtin(), id) ||
        strcmp(id, CATALOGUE_ZEFF_FROM_IONIZATION) == 0)
        return;
    struct study *study = study_new(&catalogue, &st);
    require(study);
    print_sources(study);
    print_rows(study, set);
    study_free(study);
}

int LLVMFuzzerTestOneInput(const uint8_t *data, size_t size)
{
    struct loaded *loaded;
    struct status st = status_ok();
    char *text = malloc(size + 1);
    if (!text)
        return 0;
    if (size > 0)
        memcpy(text, data, size);
    text[size] = '\0';
    if (dataset_load(text, size, &loaded, &st)) {
        check_set(&loaded->set);
        print_set(loaded);
        loaded_free(loaded);
    } else {
        require(st.code == STATUS_DATA || st.code == STATUS_MEMORY);
        check_message(st.message);
    }
    free(text);
    return 0;
}
