/* SPDX-License-Identifier: MIT */
/* How far each model can be trusted where: residuals of many species, gathered
 * by model and reference set, and their statistics by part of the table. */
#ifndef ANALYSIS_AUDIT_H
#define ANALYSIS_AUDIT_H

#include "analysis/row.h"
#include "analysis/summary.h"
#include "base/status.h"
#include "base/text.h"

/* By what statistics are parted; its id in options and exports. */
#define AUDIT_SCOPE_LIST(X)                                                    \
    X(AUDIT_ALL, "all")                                                        \
    X(AUDIT_BLOCK, "block")                                                    \
    X(AUDIT_PERIOD, "period")                                                  \
    X(AUDIT_GROUP, "group")                                                    \
    X(AUDIT_CHARGE, "charge")                                                  \
    X(AUDIT_EVIDENCE, "evidence")

enum audit_scope {
#define AUDIT_SCOPE_ENUM(scope, id) scope,
    AUDIT_SCOPE_LIST(AUDIT_SCOPE_ENUM)
#undef AUDIT_SCOPE_ENUM
        AUDIT_SCOPE_COUNT
};

const char *audit_scope_id(enum audit_scope scope);

/* One part: value is 0 for AUDIT_ALL, the letter of a block, the number of a
 * period, group or charge, or an enum evidence. */
struct audit_part {
    enum audit_scope scope;
    int value;
};

/* Writes "d", "4", "3", "measured"; nothing for AUDIT_ALL. */
void audit_part_text(struct audit_part part, struct text *t);

/* One species. residual and percent in the series' unit; only in ROW_OK. */
struct audit_point {
    short z, charge;
    struct site site;
    enum row_state state;
    enum evidence evidence; /* of the reference value */
    bool has_reference, has_percent;
    double value, reference, residual, percent;
};

/* A model (or a second set) against one reference set; reference is NULL where
 * no set was at hand. points[count] are owned by the audit. */
struct audit_series {
    enum quantity_id quantity;
    const struct unit *unit;
    const struct provenance *value;
    const struct provenance *reference;
    bool like_with_like;
    bool repeats; /* as in struct row */
    int count, capacity;
    struct audit_point *points;
};

/* Starts as {0}. */
struct audit {
    int count, capacity;
    struct audit_series *series;
};
void audit_clear(struct audit *audit);

/* Adds a row to the series it belongs to; rows without a model are passed
 * over. Fails with STATUS_MEMORY. */
MUST_CHECK bool audit_add(struct audit *audit, const struct row *row,
                          struct status *st);

/* Whether a part holds a species. */
bool audit_holds(struct audit_part part, const struct audit_point *point);

/* Statistics of a series over a part. */
struct summary audit_summary(const struct audit_series *series,
                             struct audit_part part);

/* The same without one element: how large residuals usually are where it
 * stands. */
struct summary audit_summary_without(const struct audit_series *series,
                                     struct audit_part part, int z);

/* The parts of the chosen scopes (bit 1 << scope each; 0: all, block, period,
 * group, and charge and evidence where there is more than one of them) in which
 * the series of a quantity have species, at most max. */
#define AUDIT_PARTS_MAX 256
int audit_parts(const struct audit *audit, enum quantity_id quantity,
                unsigned scopes, struct audit_part parts[AUDIT_PARTS_MAX]);

/* The models against one reference set in order of their mean absolute
 * residual over the species of a part for which all of them have one. A model
 * that gives another thing than the set holds does not take part: its residual
 * is no error; nor does one whose calculation the set is; nor one that has less
 * than half as many residuals in the part as the one with the most: the others
 * would be judged on a few species. series: indices into audit->series, best
 * first; species: how many were compared; unlike, repeats: how many were left
 * out because of the definition, or as the same calculation. */
#define AUDIT_RANK_MAX 24
struct audit_rank {
    int count;
    int species;
    int unlike, repeats;
    int series[AUDIT_RANK_MAX];
    double mean_absolute[AUDIT_RANK_MAX];
};
struct audit_rank audit_rank(const struct audit *audit,
                             enum quantity_id quantity,
                             const struct provenance *reference,
                             struct audit_part part);

#endif
