/* SPDX-License-Identifier: MIT */
/* Statistics of residuals for people, and which model is best where. */
#include "element/selection.h"
#include "export/audit.h"
#include "export/legend.h"

#define CELL_TEXT_MAX 256

static void add_number(struct table *table, bool there, double value,
                       int places, bool with_sign)
{
    char out[NUMBER_TEXT_MAX];
    if (!there) {
        table_cell(table, "-");
        return;
    }
    number_print_places(value, places, out);
    table_cellf(table, "%s%s", with_sign && value > 0.0 ? "+" : "", out);
}

static void add_part(struct table *table, struct audit_part part)
{
    char buffer[CELL_TEXT_MAX];
    struct text t = text_over(buffer, sizeof buffer);
    text_add(&t, audit_scope_id(part.scope));
    if (part.scope != AUDIT_ALL)
        text_add(&t, " ");
    audit_part_text(part, &t);
    table_cell(table, buffer);
}

static void add_set(struct table *table, struct legend *legend,
                    const struct provenance *set)
{
    char buffer[CELL_TEXT_MAX];
    struct text t = text_over(buffer, sizeof buffer);
    if (set)
        legend_set(legend, set, &t);
    table_cell(table, buffer);
}

static void add_line(struct table *table, struct legend *legend,
                     const struct audit_series *s, struct audit_part part)
{
    char ion[ION_TEXT_MAX];
    char buffer[CELL_TEXT_MAX];
    struct text t = text_over(buffer, sizeof buffer);
    struct summary sum = audit_summary(s, part);
    bool any = sum.count > 0;
    int places = s->unit->decimals;
    table_cell(table, quantity_at(s->quantity)->id);
    table_cell(table, s->value->id);
    add_set(table, legend, s->reference);
    add_part(table, part);
    table_cellf(table, "%d", sum.count);
    table_cellf(table, "%d", sum.gaps);
    add_number(table, any, any ? summary_mean(&sum) : 0.0, places, true);
    add_number(table, any, any ? summary_mean_absolute(&sum) : 0.0, places,
               false);
    add_number(table, sum.percent_count > 0,
               sum.percent_count ? summary_mean_absolute_percent(&sum) : 0.0, 1,
               false);
    add_number(table, any, any ? summary_rms(&sum) : 0.0, places, false);
    add_number(table, any, sum.largest, places, true);
    table_cell(table,
               any ? ion_print(sum.largest_z, sum.largest_charge, ion) : "-");
    table_cell(table, s->unit->id);
    const struct note notes[] = {
        {"not like with like; the model gives: ",
         s->like_with_like || !s->reference ? "" : s->value->definition},
        {"", s->repeats ? "the set is the same calculation, published" : ""},
        {"", s->reference ? "" : "no reference set for this quantity"},
    };
    legend_notes(legend, notes, sizeof notes / sizeof notes[0], &t);
    table_cell(table, buffer);
}

static bool write_lines(FILE *out, const struct audit *audit, unsigned scopes,
                        struct legend *legend, const struct table_style *style,
                        struct status *st)
{
    static const char *const heading[] = {
        "quantity", "model", "set", "where",   "count", "gaps", "mean",
        "mean abs", "%",     "rms", "largest", "of",    "unit", "notes"};
    struct table table = table_new("llllrrsrrrslll");
    for (size_t i = 0; i < sizeof heading / sizeof heading[0]; i++)
        table_cell(&table, heading[i]);
    for (int i = 0; i < audit->count; i++) {
        struct audit_part parts[AUDIT_PARTS_MAX];
        const struct audit_series *s = &audit->series[i];
        int count = audit_parts(audit, s->quantity, scopes, parts);
        for (int p = 0; p < count; p++)
            add_line(&table, legend, s, parts[p]);
    }
    return table_write_styled(&table, out, style, st);
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

static void add_place(struct table *table, const struct audit *audit,
                      const struct audit_rank *rank, int place)
{
    char out[NUMBER_TEXT_MAX];
    if (place >= rank->count) {
        table_cell(table, "");
        return;
    }
    const struct audit_series *s = &audit->series[rank->series[place]];
    table_cellf(table, "%s %s", s->value->id,
                number_print_places(rank->mean_absolute[place],
                                    s->unit->decimals, out));
}

/* Models that a ranking leaves out, as "shells and slater". */
static void left_out(const struct audit *audit, const struct audit_series *one,
                     bool unlike, struct text *t)
{
    const char *name = NULL;
    bool begun = false;
    for (int i = 0; i <= audit->count; i++) {
        const struct audit_series *s = &audit->series[i];
        bool end = i == audit->count;
        if (!end &&
            (s->quantity != one->quantity || s->reference != one->reference ||
             (unlike ? s->like_with_like : !s->repeats || !s->like_with_like)))
            continue;
        if (name)
            text_addf(t, "%s%s", !begun ? "" : end ? " and " : ", ", name);
        begun = begun || name;
        name = end ? NULL : s->value->id;
    }
}

/* Why models have no place: a residual against another thing is no error, and
 * one against the same calculation no test. */
static void write_left_out(FILE *out, const struct audit *audit,
                           struct legend *legend)
{
    bool any = false;
    for (int i = 0; i < audit->count; i++) {
        const struct audit_series *s = &audit->series[i];
        char letter[CELL_TEXT_MAX];
        char names[CELL_TEXT_MAX];
        struct text l = text_over(letter, sizeof letter);
        if (!s->reference || !is_first(audit, i))
            continue;
        legend_set(legend, s->reference, &l);
        for (int unlike = 1; unlike >= 0; unlike--) {
            struct text t = text_over(names, sizeof names);
            left_out(audit, s, unlike, &t);
            if (t.length == 0)
                continue;
            fprintf(out, "%s%s, set %s: %s not ranked: %s\n", any ? "" : "\n",
                    quantity_at(s->quantity)->id, letter, names,
                    unlike ? "not like with like, a residual is no error"
                           : "the set is the same calculation");
            any = true;
        }
    }
}

static int add_best(struct table *table, const struct audit *audit,
                    unsigned scopes, struct legend *legend, int which)
{
    struct audit_part parts[AUDIT_PARTS_MAX];
    const struct audit_series *s = &audit->series[which];
    int count = audit_parts(audit, s->quantity, scopes, parts);
    int lines = 0;
    for (int p = 0; p < count; p++) {
        struct audit_rank rank =
            audit_rank(audit, s->quantity, s->reference, parts[p]);
        if (rank.count < 2)
            continue;
        table_cell(table, quantity_at(s->quantity)->id);
        add_set(table, legend, s->reference);
        add_part(table, parts[p]);
        table_cellf(table, "%d", rank.species);
        for (int i = 0; i < 3; i++)
            add_place(table, audit, &rank, i);
        table_cell(table, s->unit->id);
        lines++;
    }
    return lines;
}

static bool write_best(FILE *out, const struct audit *audit, unsigned scopes,
                       struct legend *legend, const struct table_style *style,
                       struct status *st)
{
    static const char *const heading[] = {"quantity", "set",  "where",
                                          "common",   "best", "second",
                                          "third",    "unit"};
    struct table table = table_new("lllrllll");
    int lines = 0;
    for (size_t i = 0; i < sizeof heading / sizeof heading[0]; i++)
        table_cell(&table, heading[i]);
    for (int i = 0; i < audit->count; i++)
        if (is_first(audit, i))
            lines += add_best(&table, audit, scopes, legend, i);
    if (lines > 0)
        fputs("\nBest by mean absolute residual over the species that all of "
              "these models have (a model with\nless than half of the "
              "residuals does not take part)\n",
              out);
    if (lines > 0)
        return table_write_styled(&table, out, style, st);
    table_free(&table);
    return true;
}

bool audit_write_text(FILE *out, const struct audit *audit, unsigned scopes,
                      const struct table_style *style, struct status *st)
{
    struct legend legend = {0};
    bool ok = write_lines(out, audit, scopes, &legend, style, st) &&
              write_best(out, audit, scopes, &legend, style, st);
    if (ok)
        write_left_out(out, audit, &legend);
    if (ok && legend.failed)
        ok = status_fail(st, STATUS_MEMORY, "out of memory");
    if (ok)
        legend_write(&legend, "Reference sets", out);
    else
        legend_free(&legend);
    return ok;
}
