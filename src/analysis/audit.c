/* SPDX-License-Identifier: MIT */
#include "analysis/audit.h"

#include <assert.h>
#include <math.h>
#include <stdlib.h>
#include <string.h>

/* Charges that a species can have, both ends included. */
#define CHARGE_LOW (-16)
#define CHARGES (Z_MAX - CHARGE_LOW + 1)

const char *audit_scope_id(enum audit_scope scope)
{
    static const char *const ids[AUDIT_SCOPE_COUNT] = {
#define AUDIT_SCOPE_ID(scope, id) id,
        AUDIT_SCOPE_LIST(AUDIT_SCOPE_ID)
#undef AUDIT_SCOPE_ID
    };
    return ids[scope];
}

void audit_part_text(struct audit_part part, struct text *t)
{
    if (part.scope == AUDIT_BLOCK)
        text_addf(t, "%c", part.value);
    else if (part.scope == AUDIT_EVIDENCE)
        text_add(t, evidence_id((enum evidence)part.value));
    else if (part.scope != AUDIT_ALL)
        text_addf(t, "%d", part.value);
}

void audit_clear(struct audit *audit)
{
    for (int i = 0; i < audit->count; i++)
        free(audit->series[i].points);
    free(audit->series);
    *audit = (struct audit){0};
}

/* Room for one more item; false without memory. */
static bool grow(void **items, int count, int *capacity, size_t size)
{
    if (count < *capacity)
        return true;
    int more = *capacity ? 2 * *capacity : 16;
    void *larger = realloc(*items, (size_t)more * size);
    if (!larger)
        return false;
    *items = larger;
    *capacity = more;
    return true;
}

static struct audit_series *series_of(struct audit *audit,
                                      const struct row *row)
{
    for (int i = audit->count - 1; i >= 0; i--) {
        struct audit_series *s = &audit->series[i];
        if (s->quantity == row->quantity && s->value == row->value.provenance &&
            s->reference == row->reference.provenance && s->unit == row->unit)
            return s;
    }
    void *series = audit->series;
    bool ok =
        grow(&series, audit->count, &audit->capacity, sizeof *audit->series);
    audit->series = series;
    if (!ok)
        return NULL;
    struct audit_series *s = &audit->series[audit->count++];
    *s = (struct audit_series){.quantity = row->quantity,
                               .unit = row->unit,
                               .value = row->value.provenance,
                               .reference = row->reference.provenance,
                               .like_with_like = row->like_with_like,
                               .repeats = row->repeats};
    return s;
}

bool audit_add(struct audit *audit, const struct row *row, struct status *st)
{
    if (!row->value.provenance)
        return true;
    struct audit_series *s = series_of(audit, row);
    void *points = s ? s->points : NULL;
    if (!s || !grow(&points, s->count, &s->capacity, sizeof *s->points))
        return status_fail(st, STATUS_MEMORY, "out of memory");
    s->points = points;
    bool ok = row->state == ROW_OK;
    s->points[s->count++] = (struct audit_point){
        .z = (short)row->species.z,
        .charge = (short)row->species.charge,
        .site = row->species.site,
        .state = row->state,
        .evidence = row->reference.evidence,
        .has_reference = row->reference.state == READING_OK,
        .has_percent = ok && row->has_percent,
        .value = ok ? row->value.value.value : 0.0,
        .reference = ok ? row->reference.value.value : 0.0,
        .residual = ok ? row->residual.value : 0.0,
        .percent = ok && row->has_percent ? row->percent.value : 0.0,
    };
    return true;
}

bool audit_holds(struct audit_part part, const struct audit_point *point)
{
    const struct element *e = element_at(point->z);
    switch (part.scope) {
    case AUDIT_ALL:
        return true;
    case AUDIT_BLOCK:
        return e->block == part.value;
    case AUDIT_PERIOD:
        return e->period == part.value;
    case AUDIT_GROUP:
        return e->group == part.value;
    case AUDIT_CHARGE:
        return point->charge == part.value;
    case AUDIT_EVIDENCE:
        return point->has_reference && (int)point->evidence == part.value;
    case AUDIT_SCOPE_COUNT:
        break;
    }
    return false;
}

struct summary audit_summary(const struct audit_series *series,
                             struct audit_part part)
{
    return audit_summary_without(series, part, 0);
}

struct summary audit_summary_without(const struct audit_series *series,
                                     struct audit_part part, int z)
{
    struct summary summary = {0};
    for (int i = 0; i < series->count; i++) {
        const struct audit_point *p = &series->points[i];
        if (p->z == z || !audit_holds(part, p))
            continue;
        if (p->state == ROW_OK)
            summary_add_residual(&summary, p->z, p->charge, p->site,
                                 p->residual,
                                 p->has_percent ? &p->percent : NULL);
        else
            summary.gaps++;
    }
    return summary;
}

/* Adds the values of a scope that some species has, in their order. */
static int add_values(const bool *there, int low, int count,
                      enum audit_scope scope, struct audit_part *parts,
                      int used)
{
    for (int i = 0; i < count && used < AUDIT_PARTS_MAX; i++)
        if (there[i])
            parts[used++] = (struct audit_part){scope, low + i};
    return used;
}

/* Which values of each scope occur. */
struct occurring {
    bool periods[PERIOD_MAX + 1];
    bool groups[GROUP_MAX + 1];
    bool charges[CHARGES];
    bool evidences[EVIDENCE_COUNT];
    bool blocks[4];
};

static void note_point(struct occurring *o, const struct audit_point *p)
{
    const struct element *e = element_at(p->z);
    assert(p->charge >= CHARGE_LOW);
    o->periods[e->period] = true;
    o->groups[e->group] = true;
    o->charges[p->charge - CHARGE_LOW] = true;
    o->blocks[strchr("spdf", e->block) - "spdf"] = true;
    if (p->has_reference)
        o->evidences[p->evidence] = true;
}

static int count_true(const bool *there, int count)
{
    int n = 0;
    for (int i = 0; i < count; i++)
        n += there[i];
    return n;
}

static bool is_wanted(unsigned scopes, enum audit_scope scope, bool by_default)
{
    return scopes ? scopes >> scope & 1u : by_default;
}

int audit_parts(const struct audit *audit, enum quantity_id quantity,
                unsigned scopes, struct audit_part parts[AUDIT_PARTS_MAX])
{
    struct occurring o = {0};
    int used = 0;
    for (int i = 0; i < audit->count; i++)
        for (int p = 0; audit->series[i].quantity == quantity &&
                        p < audit->series[i].count;
             p++)
            note_point(&o, &audit->series[i].points[p]);
    if (is_wanted(scopes, AUDIT_ALL, true))
        parts[used++] = (struct audit_part){AUDIT_ALL, 0};
    for (int b = 0; b < 4 && is_wanted(scopes, AUDIT_BLOCK, true); b++)
        if (o.blocks[b])
            parts[used++] = (struct audit_part){AUDIT_BLOCK, "spdf"[b]};
    if (is_wanted(scopes, AUDIT_PERIOD, true))
        used =
            add_values(o.periods, 0, PERIOD_MAX + 1, AUDIT_PERIOD, parts, used);
    if (is_wanted(scopes, AUDIT_GROUP, true))
        used = add_values(o.groups + 1, 1, GROUP_MAX, AUDIT_GROUP, parts, used);
    if (is_wanted(scopes, AUDIT_CHARGE, count_true(o.charges, CHARGES) > 1))
        used = add_values(o.charges, CHARGE_LOW, CHARGES, AUDIT_CHARGE, parts,
                          used);
    if (is_wanted(scopes, AUDIT_EVIDENCE,
                  count_true(o.evidences, EVIDENCE_COUNT) > 1))
        used = add_values(o.evidences, 0, EVIDENCE_COUNT, AUDIT_EVIDENCE, parts,
                          used);
    return used;
}

static bool compared(const struct audit_point *p, struct audit_part part)
{
    return p->state == ROW_OK && audit_holds(part, p);
}

static int count_compared(const struct audit_series *s, struct audit_part part)
{
    int count = 0;
    for (int i = 0; i < s->count; i++)
        count += compared(&s->points[i], part);
    return count;
}

/* Marks the ions for which a series has a residual, when `before` series have
 * been marked: an ion at several sites counts once. */
static void mark_species(const struct audit_series *s, struct audit_part part,
                         unsigned char have[Z_MAX + 1][CHARGES], int before)
{
    for (int i = 0; i < s->count; i++) {
        const struct audit_point *p = &s->points[i];
        unsigned char *marks = &have[p->z][p->charge - CHARGE_LOW];
        if (compared(p, part) && *marks == before)
            *marks = (unsigned char)(before + 1);
    }
}

static double mean_of_common(const struct audit_series *s,
                             struct audit_part part,
                             unsigned char have[Z_MAX + 1][CHARGES], int models,
                             int *species)
{
    double sum = 0.0;
    int count = 0;
    for (int i = 0; i < s->count; i++) {
        const struct audit_point *p = &s->points[i];
        if (!compared(p, part) || have[p->z][p->charge - CHARGE_LOW] < models)
            continue;
        sum += fabs(p->residual);
        count++;
    }
    *species = count;
    return count > 0 ? sum / count : 0.0;
}

static void insert_rank(struct audit_rank *rank, int series, double mean)
{
    int i = rank->count++;
    for (; i > 0 && rank->mean_absolute[i - 1] > mean; i--) {
        rank->mean_absolute[i] = rank->mean_absolute[i - 1];
        rank->series[i] = rank->series[i - 1];
    }
    rank->mean_absolute[i] = mean;
    rank->series[i] = series;
}

struct audit_rank audit_rank(const struct audit *audit,
                             enum quantity_id quantity,
                             const struct provenance *reference,
                             struct audit_part part)
{
    struct audit_rank rank = {0};
    unsigned char have[Z_MAX + 1][CHARGES] = {{0}};
    int taking_part[AUDIT_RANK_MAX];
    int counts[AUDIT_RANK_MAX];
    int models = 0;
    int most = 0;
    for (int i = 0; i < audit->count && models < AUDIT_RANK_MAX; i++) {
        const struct audit_series *s = &audit->series[i];
        if (s->quantity != quantity || s->reference != reference)
            continue;
        rank.unlike += !s->like_with_like;
        rank.repeats += s->like_with_like && s->repeats;
        if (!s->like_with_like || s->repeats)
            continue;
        counts[models] = count_compared(s, part);
        most = counts[models] > most ? counts[models] : most;
        taking_part[models++] = i;
    }
    int kept = 0;
    for (int m = 0; m < models; m++)
        if (counts[m] > 0 && 2 * counts[m] >= most)
            taking_part[kept++] = taking_part[m];
    models = kept;
    for (int m = 0; m < models; m++)
        mark_species(&audit->series[taking_part[m]], part, have, m);
    for (int m = 0; m < models; m++) {
        double mean = mean_of_common(&audit->series[taking_part[m]], part, have,
                                     models, &rank.species);
        insert_rank(&rank, taking_part[m], mean);
    }
    if (rank.species == 0)
        rank.count = 0;
    return rank;
}
