/* SPDX-License-Identifier: MIT */
#include "report/audit.h"

#include <string.h>

#include "element/selection.h"
#include "refdata/catalogue.h"

#define DIGITS 12 /* of a statistic: more than the residuals have */

/* One record: a part of the table under one series. */
struct record {
    const struct audit *audit;
    const struct audit_series *series;
    struct audit_part part;
    struct summary summary;
};

static void put_statistic(const struct record *r, double value, struct text *t)
{
    char out[NUMBER_TEXT_MAX];
    if (r->summary.count > 0)
        text_add(t, number_print_short(number_round(value, DIGITS, 0), out));
}

static void put_quantity(const void *record, struct text *t)
{
    const struct record *r = record;
    text_add(t, quantity_at(r->series->quantity)->id);
}

static void put_unit(const void *record, struct text *t)
{
    const struct record *r = record;
    text_add(t, r->series->unit->id);
}

static void put_model(const void *record, struct text *t)
{
    const struct record *r = record;
    text_add(t, r->series->value->id);
}

static void put_set(const void *record, struct text *t)
{
    const struct record *r = record;
    if (r->series->reference)
        text_add(t, r->series->reference->id);
}

static void put_scope(const void *record, struct text *t)
{
    const struct record *r = record;
    text_add(t, audit_scope_id(r->part.scope));
}

static void put_scope_value(const void *record, struct text *t)
{
    const struct record *r = record;
    audit_part_text(r->part, t);
}

static void put_count(const void *record, struct text *t)
{
    const struct record *r = record;
    text_addf(t, "%d", r->summary.count);
}

static void put_gaps(const void *record, struct text *t)
{
    const struct record *r = record;
    text_addf(t, "%d", r->summary.gaps);
}

static void put_mean(const void *record, struct text *t)
{
    const struct record *r = record;
    if (r->summary.count > 0)
        put_statistic(r, summary_mean(&r->summary), t);
}

static void put_mean_absolute(const void *record, struct text *t)
{
    const struct record *r = record;
    if (r->summary.count > 0)
        put_statistic(r, summary_mean_absolute(&r->summary), t);
}

static void put_rms(const void *record, struct text *t)
{
    const struct record *r = record;
    if (r->summary.count > 0)
        put_statistic(r, summary_rms(&r->summary), t);
}

static void put_largest(const void *record, struct text *t)
{
    const struct record *r = record;
    put_statistic(r, r->summary.largest, t);
}

static void put_largest_symbol(const void *record, struct text *t)
{
    const struct record *r = record;
    char ion[ION_TEXT_MAX];
    if (r->summary.count > 0)
        text_add(t,
                 ion_print_at(r->summary.largest_z, r->summary.largest_charge,
                              r->summary.largest_site, ion));
}

/* "measured 82, extrapolated 18": the kinds of the stored values taken. */
static void put_evidence(const void *record, struct text *t)
{
    const struct record *r = record;
    int counts[EVIDENCE_COUNT] = {0};
    for (int i = 0; i < r->series->count; i++) {
        const struct audit_point *p = &r->series->points[i];
        if (p->state == ROW_OK && audit_holds(r->part, p))
            counts[p->evidence]++;
    }
    bool begun = false;
    for (int e = 0; e < EVIDENCE_COUNT; e++)
        if (counts[e] > 0) {
            text_addf(t, "%s%s %d", begun ? ", " : "",
                      evidence_id((enum evidence)e), counts[e]);
            begun = true;
        }
}

/* Symbols of the elements in the part that `tagged` is true of. */
static void put_elements(const struct record *r,
                         bool (*tagged)(const struct availability *a),
                         struct text *t)
{
    const struct dataset *set = catalogue_availability();
    bool there[Z_MAX + 1] = {false};
    bool begun = false;
    for (int i = 0; i < r->series->count; i++)
        if (audit_holds(r->part, &r->series->points[i]))
            there[r->series->points[i].z] = true;
    for (int z = 1; z <= Z_MAX; z++) {
        const struct availability *a = dataset_availability(set, z);
        if (!there[z] || !a || !tagged(a))
            continue;
        text_addf(t, "%s%s", begun ? " " : "", element_at(z)->symbol);
        begun = true;
    }
}

static bool has_caution(const struct availability *a)
{
    return a->radioactive != RADIOACTIVE_NO || a->hazards != 0;
}

static bool is_critical(const struct availability *a)
{
    return a->critical != 0;
}

static void put_cautions(const void *record, struct text *t)
{
    put_elements(record, has_caution, t);
}

static void put_critical(const void *record, struct text *t)
{
    put_elements(record, is_critical, t);
}

static void put_percent(const void *record, struct text *t)
{
    const struct record *r = record;
    if (r->summary.percent_count > 0)
        put_statistic(r, summary_mean_absolute_percent(&r->summary), t);
}

static void put_model_definition(const void *record, struct text *t)
{
    const struct record *r = record;
    text_add(t, provenance_definition(r->series->value));
}

static void put_set_definition(const void *record, struct text *t)
{
    const struct record *r = record;
    if (r->series->reference)
        text_add(t, provenance_definition(r->series->reference));
}

static void put_like(const void *record, struct text *t)
{
    const struct record *r = record;
    text_add(t, r->series->like_with_like ? "true" : "false");
}

/* Place among the models against the same set, over the species that all of
 * them have. */
static void put_place(const void *record, struct text *t)
{
    const struct record *r = record;
    struct audit_rank rank = audit_rank(r->audit, r->series->quantity,
                                        r->series->reference, r->part);
    int self = (int)(r->series - r->audit->series);
    for (int i = 0; i < rank.count; i++)
        if (rank.series[i] == self)
            text_addf(t, "%d", i + 1);
}

static const struct report_column columns[] = {
    {"quantity", COLUMN_TEXT, .put = put_quantity},
    {"unit", COLUMN_TEXT, .put = put_unit},
    {"model", COLUMN_TEXT, .put = put_model},
    {"reference_set", COLUMN_TEXT, .put = put_set},
    {"scope", COLUMN_TEXT, .put = put_scope},
    {"scope_value", COLUMN_TEXT, .put = put_scope_value},
    {"count", COLUMN_NUMBER, .put = put_count},
    {"gaps", COLUMN_NUMBER, .put = put_gaps},
    {"mean", COLUMN_NUMBER, .put = put_mean},
    {"mean_absolute", COLUMN_NUMBER, .put = put_mean_absolute},
    {"rms", COLUMN_NUMBER, .put = put_rms},
    {"largest", COLUMN_NUMBER, .put = put_largest},
    {"largest_symbol", COLUMN_TEXT, .put = put_largest_symbol},
    {"evidence", COLUMN_TEXT, .put = put_evidence},
    {"cautions", COLUMN_TEXT, .put = put_cautions},
    {"critical", COLUMN_TEXT, .put = put_critical},
    {"mean_absolute_percent", COLUMN_NUMBER, .put = put_percent,
     .json_only = true},
    {"model_definition", COLUMN_TEXT, .put = put_model_definition,
     .json_only = true},
    {"reference_definition", COLUMN_TEXT, .put = put_set_definition,
     .json_only = true},
    {"like_with_like", COLUMN_TRUTH, .put = put_like, .json_only = true},
    {"place", COLUMN_NUMBER, .put = put_place, .json_only = true},
};

/* What the records are: the places of all series and parts. */
struct place {
    const struct audit_series *series;
    struct audit_part part;
};

struct places {
    const struct audit *audit;
    struct place *items;
};

static const void *record_at(const void *data, size_t i, void *room)
{
    const struct places *places = data;
    const struct place *p = &places->items[i];
    struct record *r = room;
    *r = (struct record){places->audit, p->series, p->part,
                         audit_summary(p->series, p->part)};
    return r;
}

static void add_records(struct report *report, const struct audit *audit,
                        unsigned scopes)
{
    struct places *places = report_memory(report, sizeof *places);
    size_t most = (size_t)audit->count * AUDIT_PARTS_MAX;
    struct place *items = report_memory(report, most * sizeof *items);
    size_t count = 0;
    if (!places || !items)
        return;
    for (int i = 0; i < audit->count; i++) {
        struct audit_part parts[AUDIT_PARTS_MAX];
        const struct audit_series *s = &audit->series[i];
        int n = audit_parts(audit, s->quantity, scopes, parts);
        for (int p = 0; p < n; p++)
            items[count++] = (struct place){s, parts[p]};
    }
    *places = (struct places){audit, items};
    report->records = (struct report_records){
        .name = "audit",
        .columns = columns,
        .column_count = sizeof columns / sizeof columns[0],
        .data = places,
        .count = count,
        .room_size = sizeof(struct record),
        .at = record_at,
    };
}

static void add_part(struct report *report, struct report_table *table,
                     struct audit_part part)
{
    char buffer[64];
    struct text t = text_over(buffer, sizeof buffer);
    text_add(&t, audit_scope_id(part.scope));
    if (part.scope != AUDIT_ALL)
        text_add(&t, " ");
    audit_part_text(part, &t);
    report_cell(report, table, buffer);
}

static void add_line(struct report *report, struct report_table *table,
                     const struct audit_series *s, struct audit_part part)
{
    char ion[ION_TEXT_MAX];
    struct summary sum = audit_summary(s, part);
    bool any = sum.count > 0;
    bool percent = sum.percent_count > 0;
    int places = s->unit->decimals;
    report_cell(report, table, quantity_at(s->quantity)->id);
    report_cell(report, table, s->value->id);
    report_cell_set(report, table, s->reference);
    add_part(report, table, part);
    report_cellf(report, table, "%d", sum.count);
    report_cellf(report, table, "%d", sum.gaps);
    report_cell_number(report, table, any, any ? summary_mean(&sum) : 0.0,
                       places, true);
    report_cell_number(report, table, any,
                       any ? summary_mean_absolute(&sum) : 0.0, places, false);
    report_cell_number(report, table, percent,
                       percent ? summary_mean_absolute_percent(&sum) : 0.0, 1,
                       false);
    report_cell_number(report, table, any, any ? summary_rms(&sum) : 0.0,
                       places, false);
    report_cell_number(report, table, any, sum.largest, places, true);
    report_cell(report, table,
                any ? ion_print_at(sum.largest_z, sum.largest_charge,
                                   sum.largest_site, ion)
                    : "-");
    report_cell(report, table, s->unit->id);
    const struct report_note notes[] = {
        {"not like with like; the model gives: ",
         s->like_with_like || !s->reference ? ""
                                            : provenance_definition(s->value)},
        {"", s->repeats ? "the set is the same calculation, published" : ""},
        {"", s->reference ? "" : "no reference set for this quantity"},
    };
    report_cell_notes(report, table, notes, sizeof notes / sizeof notes[0]);
}

static void add_lines(struct report *report, const struct audit *audit,
                      unsigned scopes)
{
    static const struct table_column heads[] = {
        {"quantity", CELL_WORDS}, {"model", CELL_WORDS},
        {"set", CELL_WORDS},      {"where", CELL_WORDS},
        {"count", CELL_NUMBER},   {"gaps", CELL_NUMBER},
        {"mean", CELL_SIGNED},    {"mean abs", CELL_NUMBER},
        {"%", CELL_NUMBER},       {"rms", CELL_NUMBER},
        {"largest", CELL_SIGNED}, {"of", CELL_WORDS},
        {"unit", CELL_WORDS},     {"notes", CELL_WORDS}};
    struct report_table *table =
        report_table(report, heads, sizeof heads / sizeof heads[0]);
    for (int i = 0; i < audit->count; i++) {
        struct audit_part parts[AUDIT_PARTS_MAX];
        const struct audit_series *s = &audit->series[i];
        int count = audit_parts(audit, s->quantity, scopes, parts);
        for (int p = 0; p < count; p++)
            add_line(report, table, s, parts[p]);
    }
}

/* True for the first series of its quantity and set: ranks are told once. */
static bool is_first(const struct audit *audit, int which)
{
    for (int i = 0; i < which; i++)
        if (audit->series[i].quantity == audit->series[which].quantity &&
            audit->series[i].reference == audit->series[which].reference)
            return false;
    return true;
}

static void add_place(struct report *report, struct report_table *table,
                      const struct audit *audit, const struct audit_rank *rank,
                      int place)
{
    char out[NUMBER_TEXT_MAX];
    if (place >= rank->count) {
        report_cell(report, table, "");
        return;
    }
    const struct audit_series *s = &audit->series[rank->series[place]];
    report_cellf(report, table, "%s %s", s->value->id,
                 number_print_places(rank->mean_absolute[place],
                                     s->unit->decimals, out));
}

static struct report_table *open_ranks(struct report *report)
{
    static const struct table_column heads[] = {
        {"quantity", CELL_WORDS}, {"set", CELL_WORDS},  {"where", CELL_WORDS},
        {"common", CELL_NUMBER},  {"best", CELL_WORDS}, {"second", CELL_WORDS},
        {"third", CELL_WORDS},    {"unit", CELL_WORDS}};
    report_gap(report);
    report_line(report,
                "Best by mean absolute residual over the species that all of "
                "these models have (a model with\nless than half of the "
                "residuals does not take part)");
    return report_table(report, heads, sizeof heads / sizeof heads[0]);
}

/* The order of the models of one quantity and set; the table is opened with its
 * first line. */
static void add_ranks(struct report *report, struct report_table **table,
                      const struct audit *audit, unsigned scopes, int which)
{
    struct audit_part parts[AUDIT_PARTS_MAX];
    const struct audit_series *s = &audit->series[which];
    int count = audit_parts(audit, s->quantity, scopes, parts);
    for (int p = 0; p < count; p++) {
        struct audit_rank rank =
            audit_rank(audit, s->quantity, s->reference, parts[p]);
        if (rank.count < 2)
            continue;
        if (!*table)
            *table = open_ranks(report);
        report_cell(report, *table, quantity_at(s->quantity)->id);
        report_cell_set(report, *table, s->reference);
        add_part(report, *table, parts[p]);
        report_cellf(report, *table, "%d", rank.species);
        for (int i = 0; i < 3; i++)
            add_place(report, *table, audit, &rank, i);
        report_cell(report, *table, s->unit->id);
    }
}

/* Models that a ranking leaves out, as "shells and slater". */
static void left_out(const struct audit *audit, const struct audit_series *one,
                     bool unlike, struct text *t)
{
    const char *name = NULL;
    bool begun = false;
    for (int i = 0; i < audit->count; i++) {
        const struct audit_series *s = &audit->series[i];
        if (s->quantity != one->quantity || s->reference != one->reference ||
            (unlike ? s->like_with_like : !s->repeats || !s->like_with_like))
            continue;
        if (name)
            text_addf(t, "%s%s", begun ? ", " : "", name);
        begun = begun || name;
        name = s->value->id;
    }
    if (name)
        text_addf(t, "%s%s", begun ? " and " : "", name);
}

/* Why models have no place: a residual against another thing is no error, and
 * one against the same calculation no test. */
static void add_left_out(struct report *report, const struct audit *audit)
{
    bool any = false;
    for (int i = 0; i < audit->count; i++) {
        const struct audit_series *s = &audit->series[i];
        char letter[16];
        struct text l = text_over(letter, sizeof letter);
        if (!s->reference || !is_first(audit, i))
            continue;
        report_set_letter(report_set_place(report, s->reference), &l);
        for (int unlike = 1; unlike >= 0; unlike--) {
            char names[256];
            struct text t = text_over(names, sizeof names);
            left_out(audit, s, unlike, &t);
            if (t.length == 0)
                continue;
            if (!any)
                report_gap(report);
            any = true;
            report_linef(report, "%s, set %s: %s not ranked: %s",
                         quantity_at(s->quantity)->id, letter, names,
                         unlike ? "not like with like, a residual is no error"
                                : "the set is the same calculation");
        }
    }
}

void report_audit(struct report *report, unsigned parts,
                  const struct audit *audit, unsigned scopes)
{
    struct report_table *ranks = NULL;
    if (parts & REPORT_RECORDS)
        add_records(report, audit, scopes);
    if (parts & REPORT_BLOCKS) {
        add_lines(report, audit, scopes);
        for (int i = 0; i < audit->count; i++)
            if (is_first(audit, i))
                add_ranks(report, &ranks, audit, scopes, i);
        add_left_out(report, audit);
        report_legends(report);
    }
    for (int i = 0; i < audit->count && (parts & REPORT_SOURCES); i++) {
        report_source(report,
                      (struct cited_source){audit->series[i].value, NULL});
        report_source(report,
                      (struct cited_source){audit->series[i].reference, NULL});
    }
}
