/* SPDX-License-Identifier: MIT */
#include "export/audit.h"

#include <string.h>

#include "element/selection.h"
#include "refdata/catalogue.h"

#define FIELD_TEXT_MAX 1024
#define DIGITS 12 /* of a statistic: more than the residuals have */

/* One line of the audit. */
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

static void put_quantity(const struct record *r, struct text *t)
{
    text_add(t, quantity_at(r->series->quantity)->id);
}

static void put_unit(const struct record *r, struct text *t)
{
    text_add(t, r->series->unit->id);
}

static void put_model(const struct record *r, struct text *t)
{
    text_add(t, r->series->value->id);
}

static void put_set(const struct record *r, struct text *t)
{
    if (r->series->reference)
        text_add(t, r->series->reference->id);
}

static void put_scope(const struct record *r, struct text *t)
{
    text_add(t, audit_scope_id(r->part.scope));
}

static void put_scope_value(const struct record *r, struct text *t)
{
    audit_part_text(r->part, t);
}

static void put_count(const struct record *r, struct text *t)
{
    text_addf(t, "%d", r->summary.count);
}

static void put_gaps(const struct record *r, struct text *t)
{
    text_addf(t, "%d", r->summary.gaps);
}

static void put_mean(const struct record *r, struct text *t)
{
    if (r->summary.count > 0)
        put_statistic(r, summary_mean(&r->summary), t);
}

static void put_mean_absolute(const struct record *r, struct text *t)
{
    if (r->summary.count > 0)
        put_statistic(r, summary_mean_absolute(&r->summary), t);
}

static void put_rms(const struct record *r, struct text *t)
{
    if (r->summary.count > 0)
        put_statistic(r, summary_rms(&r->summary), t);
}

static void put_largest(const struct record *r, struct text *t)
{
    put_statistic(r, r->summary.largest, t);
}

static void put_largest_symbol(const struct record *r, struct text *t)
{
    char ion[ION_TEXT_MAX];
    if (r->summary.count > 0)
        text_add(
            t, ion_print(r->summary.largest_z, r->summary.largest_charge, ion));
}

/* "measured 82, extrapolated 18": the kinds of the stored values taken. */
static void put_evidence(const struct record *r, struct text *t)
{
    int counts[EVIDENCE_COUNT] = {0};
    for (int i = 0; i < r->series->count; i++) {
        const struct audit_point *p = &r->series->points[i];
        if (p->state == ROW_OK && audit_holds(r->part, p))
            counts[p->evidence]++;
    }
    for (int e = 0; e < EVIDENCE_COUNT; e++)
        if (counts[e] > 0)
            text_addf(t, "%s%s %d", t->length ? ", " : "",
                      evidence_id((enum evidence)e), counts[e]);
}

/* Symbols of the elements in the part that `tagged` is true of. */
static void put_elements(const struct record *r,
                         bool (*tagged)(const struct availability *a),
                         struct text *t)
{
    const struct dataset *set = catalogue_availability();
    bool there[Z_MAX + 1] = {false};
    for (int i = 0; i < r->series->count; i++)
        if (audit_holds(r->part, &r->series->points[i]))
            there[r->series->points[i].z] = true;
    for (int z = 1; z <= Z_MAX; z++) {
        const struct availability *a = dataset_availability(set, z);
        if (there[z] && a && tagged(a))
            text_addf(t, "%s%s", t->length ? " " : "", element_at(z)->symbol);
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

static void put_cautions(const struct record *r, struct text *t)
{
    put_elements(r, has_caution, t);
}

static void put_critical(const struct record *r, struct text *t)
{
    put_elements(r, is_critical, t);
}

static void put_percent(const struct record *r, struct text *t)
{
    if (r->summary.percent_count > 0)
        put_statistic(r, summary_mean_absolute_percent(&r->summary), t);
}

static void put_model_definition(const struct record *r, struct text *t)
{
    text_add(t, r->series->value->definition);
}

static void put_set_definition(const struct record *r, struct text *t)
{
    if (r->series->reference)
        text_add(t, r->series->reference->definition);
}

static void put_like(const struct record *r, struct text *t)
{
    text_add(t, r->series->like_with_like ? "true" : "false");
}

/* Place among the models against the same set, over the species that all of
 * them have. */
static void put_place(const struct record *r, struct text *t)
{
    struct audit_rank rank = audit_rank(r->audit, r->series->quantity,
                                        r->series->reference, r->part);
    int self = (int)(r->series - r->audit->series);
    for (int i = 0; i < rank.count; i++)
        if (rank.series[i] == self)
            text_addf(t, "%d", i + 1);
}

static const struct {
    const char *name;
    void (*put)(const struct record *record, struct text *t);
    bool number;
    bool json_only;
} fields[] = {
    {"quantity", put_quantity, false, false},
    {"unit", put_unit, false, false},
    {"model", put_model, false, false},
    {"reference_set", put_set, false, false},
    {"scope", put_scope, false, false},
    {"scope_value", put_scope_value, false, false},
    {"count", put_count, true, false},
    {"gaps", put_gaps, true, false},
    {"mean", put_mean, true, false},
    {"mean_absolute", put_mean_absolute, true, false},
    {"rms", put_rms, true, false},
    {"largest", put_largest, true, false},
    {"largest_symbol", put_largest_symbol, false, false},
    {"evidence", put_evidence, false, false},
    {"cautions", put_cautions, false, false},
    {"critical", put_critical, false, false},
    {"mean_absolute_percent", put_percent, true, true},
    {"model_definition", put_model_definition, false, true},
    {"reference_definition", put_set_definition, false, true},
    {"like_with_like", put_like, true, true},
    {"place", put_place, true, true},
};
#define FIELD_COUNT ((int)(sizeof fields / sizeof fields[0]))

static void write_record(FILE *out, bool csv, const struct record *r)
{
    for (int f = 0; f < FIELD_COUNT; f++) {
        char buffer[FIELD_TEXT_MAX];
        struct text t = text_over(buffer, sizeof buffer);
        if (csv && fields[f].json_only)
            continue;
        fields[f].put(r, &t);
        if (csv) {
            csv_field(out, buffer, f == 0);
            continue;
        }
        fputs(f ? ", " : "", out);
        json_string(out, fields[f].name);
        fputs(": ", out);
        if (t.length == 0)
            fputs("null", out);
        else if (fields[f].number)
            fputs(buffer, out);
        else
            json_string(out, buffer);
    }
}

static void write_heading(FILE *out)
{
    for (int f = 0; f < FIELD_COUNT; f++)
        if (!fields[f].json_only)
            csv_field(out, fields[f].name, f == 0);
    csv_end(out);
}

bool audit_write(FILE *out, enum export_format format,
                 const struct audit *audit, unsigned scopes, struct status *st)
{
    bool csv = format == EXPORT_CSV;
    bool first = true;
    if (format == EXPORT_TEXT)
        return audit_write_text(out, audit, scopes, &table_plain, st);
    if (csv)
        write_heading(out);
    else
        fputs("{\"schema\": 1, \"audit\": [", out);
    for (int i = 0; i < audit->count; i++) {
        struct audit_part parts[AUDIT_PARTS_MAX];
        const struct audit_series *s = &audit->series[i];
        int count = audit_parts(audit, s->quantity, scopes, parts);
        for (int p = 0; p < count; p++) {
            struct record r = {audit, s, parts[p], audit_summary(s, parts[p])};
            if (!csv)
                fputs(first ? "\n  {" : ",\n  {", out);
            write_record(out, csv, &r);
            first = false;
            if (csv)
                csv_end(out);
            else
                fputs("}", out);
        }
    }
    if (!csv)
        fputs("\n]}\n", out);
    return true;
}
