/* SPDX-License-Identifier: MIT */
/* What the curves say at the selected step, in numbers. */
#include "screens/trend_table.h"

#include <stdio.h>

#include "analysis/summary.h"
#include "base/text.h"
#include "element/selection.h"
#include "screens/trend_marks.h"
#include "session/site.h"

#define UNEQUAL 0x2260
#define NAME_COLUMNS 14
#define VALUE_COLUMNS 10
#define RESIDUAL_COLUMNS 11
#define PERCENT_COLUMNS 9

/* The row of a series at the selected step, exact; false without such an ion.
 */
static bool row_at(const struct session *session, const struct model *model,
                   struct row *row)
{
    struct ask ask;
    if (!session_ask(session, session->choice.z, session->choice.charge, &ask))
        return false;
    ask.model = model;
    *row = study_row(session->study, &ask);
    return true;
}

static void signed_text(double value, int places, char *out, size_t size)
{
    char number[NUMBER_TEXT_MAX];
    number_print_places(value, places, number);
    snprintf(out, size, "%s%s", value > 0 ? "+" : "", number);
}

static enum role sign_role(double value)
{
    return value < 0 ? ROLE_BELOW : ROLE_ABOVE;
}

static void draw_model(const struct session *session, const struct trend *trend,
                       struct canvas *canvas, struct area a, int row, int curve)
{
    char text[NUMBER_TEXT_MAX + 4];
    struct row r;
    const struct model *model = trend->series[curve].model;
    int column = a.column + 2 + NAME_COLUMNS;
    canvas_put(canvas, row, a.column, screen_trend_role(model),
               screen_trend_mark(model));
    canvas_text(canvas, row, a.column + 2, NAME_COLUMNS - 1,
                screen_trend_role(model), model->id);
    if (!row_at(session, model, &r))
        return;
    if (r.value.state == READING_OK)
        canvas_right(canvas, row, column, VALUE_COLUMNS, ROLE_TEXT,
                     number_fit(r.value.value.value, r.unit->decimals,
                                VALUE_COLUMNS, text));
    if (r.state != ROW_OK) {
        int from = r.value.state == READING_OK ? column + VALUE_COLUMNS + 1
                                               : column + 1;
        canvas_text(canvas, row, from, a.column + a.columns - from, ROLE_GAP,
                    r.reason);
        return;
    }
    column += VALUE_COLUMNS;
    signed_text(r.residual.value, r.unit->decimals, text, sizeof text);
    canvas_right(canvas, row, column, RESIDUAL_COLUMNS,
                 sign_role(r.residual.value), text);
    column += RESIDUAL_COLUMNS;
    if (r.has_percent) {
        signed_text(r.percent.value, 1, text, sizeof text);
        canvas_right(canvas, row, column, PERCENT_COLUMNS,
                     sign_role(r.percent.value), text);
    }
    if (!r.like_with_like)
        canvas_put(canvas, row, column + PERCENT_COLUMNS + 1, ROLE_CAUTION,
                   UNEQUAL);
}

/* A stored value with its set and kind. */
static int draw_stored(struct canvas *canvas, struct area a, int row,
                       const struct reading *stored, const char *site,
                       bool second)
{
    char buffer[SESSION_TEXT_MAX];
    struct text t = text_over(buffer, sizeof buffer);
    uint32_t mark = second ? MARK_SECOND
                    : screen_trend_unmeasured(stored->evidence)
                        ? MARK_UNMEASURED
                        : MARK_STORED;
    enum role role = second ? ROLE_HEADING : ROLE_TITLE;
    canvas_put(canvas, row, a.column, role, mark);
    canvas_text(canvas, row, a.column + 2, a.columns - 2, role,
                stored->provenance->id);
    if (stored->state != READING_OK) {
        canvas_textf(canvas, row + 1, a.column + 2, a.columns - 2, ROLE_GAP,
                     "%s", stored->reason);
        return 2;
    }
    reading_text(&t, stored);
    if (site[0] != '\0')
        text_addf(&t, " at %s", site);
    text_addf(&t, ", %s", evidence_word(stored->evidence));
    canvas_text(canvas, row + 1, a.column + 2, a.columns - 2, ROLE_TEXT,
                buffer);
    return 2;
}

static int draw_stored_pair(struct canvas *canvas, struct area a, int row,
                            const struct row *r)
{
    char first[SESSION_TEXT_MAX];
    char second[SESSION_TEXT_MAX];
    struct text f = text_over(first, sizeof first);
    struct text s = text_over(second, sizeof second);
    session_stored_site(&r->reference, &f);
    session_stored_site(&r->against, &s);
    char text[NUMBER_TEXT_MAX + 4];
    char percent[NUMBER_TEXT_MAX + 4];
    int used = 0;
    if (r->reference.provenance)
        used += draw_stored(canvas, a, row, &r->reference, first, false);
    if (!r->against.provenance)
        return used;
    used += draw_stored(canvas, a, row + used, &r->against, second, true);
    if (!r->disagrees)
        return used;
    signed_text(r->disagreement.value, r->unit->decimals, text, sizeof text);
    signed_text(r->disagreement_percent.value, 1, percent, sizeof percent);
    canvas_textf(canvas, row + used, a.column + 2, a.columns - 2,
                 sign_role(r->disagreement.value),
                 "second - first: %s %s%s%s%s", text, r->unit->id,
                 r->has_disagreement_percent ? " (" : "",
                 r->has_disagreement_percent ? percent : "",
                 r->has_disagreement_percent ? " %)" : "");
    return used + 1;
}

static void draw_head(const struct session *session, struct canvas *canvas,
                      struct area a, const struct row *r)
{
    char ion[ION_TEXT_MAX];
    char label[SUBSHELL_TEXT_MAX];
    char configuration[CONFIGURATION_TEXT_MAX];
    char buffer[SESSION_TEXT_MAX];
    struct text t = text_over(buffer, sizeof buffer);
    const struct element *e = element_at(session->choice.z);
    text_addf(&t, "%s  %d  %s", ion_print(e->z, session->choice.charge, ion),
              e->z, e->name);
    if (r->n)
        text_addf(&t, ", %s", subshell_print(r->n, r->l, label));
    canvas_text(canvas, a.row, a.column, a.columns, ROLE_TITLE, buffer);
    t = text_over(buffer, sizeof buffer);
    text_add(&t, configuration_print(&r->species.configuration, configuration));
    if (r->species.origin != ORIGIN_STORED)
        text_addf(&t, " (%s)", configuration_origin_text(r->species.origin));
    canvas_text(canvas, a.row + 1, a.column, a.columns, ROLE_TEXT, buffer);
}

/* Mean size of the residuals of a curve along the walk, and the largest. */
static struct summary along(const struct trend *trend, int curve)
{
    struct summary s = {0};
    for (int i = 0; i < trend->walk.count; i++) {
        const struct trend_value *v = &trend->series[curve].values[i];
        if (v->has_residual)
            summary_add_residual(
                &s, trend->walk.steps[i].z, trend->walk.steps[i].charge,
                trend->site, v->residual, v->has_percent ? &v->percent : NULL);
        else
            s.gaps++;
    }
    return s;
}

static void draw_along(const struct trend *trend, struct canvas *canvas,
                       struct area a, int row)
{
    char text[NUMBER_TEXT_MAX + 4];
    char ion[ION_TEXT_MAX];
    int bottom = a.row + a.rows;
    if (row + 1 >= bottom || trend->series_count == 0)
        return;
    canvas_textf(canvas, row++, a.column, a.columns, ROLE_HEADING,
                 "%s: mean size, %s", walk_words(trend->walk.kind),
                 trend->unit->id);
    for (int s = 0; s < trend->series_count && row < bottom; s++, row++) {
        struct summary sum = along(trend, s);
        canvas_put(canvas, row, a.column,
                   screen_trend_role(trend->series[s].model),
                   screen_trend_mark(trend->series[s].model));
        canvas_text(canvas, row, a.column + 2, NAME_COLUMNS - 1,
                    screen_trend_role(trend->series[s].model),
                    trend->series[s].model->id);
        if (sum.count == 0) {
            canvas_textf(canvas, row, a.column + 3 + NAME_COLUMNS,
                         a.columns - 3 - NAME_COLUMNS, ROLE_GAP,
                         "no residual, %d gaps", sum.gaps);
            continue;
        }
        number_print_places(summary_mean_absolute(&sum), trend->unit->decimals,
                            text);
        canvas_right(canvas, row, a.column + 2 + NAME_COLUMNS, VALUE_COLUMNS,
                     ROLE_TEXT, text);
        signed_text(sum.largest, trend->unit->decimals, text, sizeof text);
        canvas_textf(canvas, row, a.column + 3 + NAME_COLUMNS + VALUE_COLUMNS,
                     a.columns - 3 - NAME_COLUMNS - VALUE_COLUMNS, ROLE_TEXT,
                     "at most %s (%s)", text,
                     ion_print_at(sum.largest_z, sum.largest_charge,
                                  sum.largest_site, ion));
    }
}

void screen_trend_table_draw(const struct session *session,
                             const struct trend *trend, struct canvas *canvas,
                             struct area area, int at)
{
    struct row r;
    int row = area.row + 3;
    int bottom = area.row + area.rows;
    if (at < 0 ||
        !row_at(session, trend->series_count ? trend->series[0].model : NULL,
                &r)) {
        canvas_text(canvas, area.row, area.column, area.columns, ROLE_GAP,
                    "no such ion");
        return;
    }
    draw_head(session, canvas, area, &r);
    row += draw_stored_pair(canvas, area, row, &r) + 1;
    if (trend->series_count > 0 && row < bottom) {
        int column = area.column + 2 + NAME_COLUMNS;
        canvas_textf(canvas, row, area.column, NAME_COLUMNS, ROLE_HEADING,
                     "model, %s", r.unit->id);
        canvas_right(canvas, row, column, VALUE_COLUMNS, ROLE_HEADING, "value");
        canvas_right(canvas, row, column + VALUE_COLUMNS, RESIDUAL_COLUMNS,
                     ROLE_HEADING, "residual");
        canvas_right(canvas, row, column + VALUE_COLUMNS + RESIDUAL_COLUMNS,
                     PERCENT_COLUMNS, ROLE_HEADING, "%");
        row++;
    }
    for (int s = 0; s < trend->series_count && row < bottom; s++)
        draw_model(session, trend, canvas, area, row++, s);
    draw_along(trend, canvas, area, row + 1);
}

/* Entries flow from left to right; one that does not fit begins a new row. */
struct line {
    struct canvas *canvas;
    struct area area;
    int row, column;
};

static void put_entry(struct line *l, enum role role, uint32_t mark,
                      const char *text)
{
    int width = (int)utf8_length(text) + 2;
    int end = l->area.column + l->area.columns;
    if (l->column > l->area.column && l->column + width > end) {
        l->row++;
        l->column = l->area.column;
    }
    if (l->row >= l->area.row + l->area.rows)
        return;
    canvas_put(l->canvas, l->row, l->column, role, mark);
    l->column = canvas_text(l->canvas, l->row, l->column + 2,
                            end - l->column - 2, ROLE_TEXT, text) +
                2;
}

static void entry_text(const struct row *r, const char *name, struct text *t)
{
    char value[NUMBER_TEXT_MAX];
    char percent[NUMBER_TEXT_MAX + 4];
    text_addf(t, "%s ", name);
    if (r->value.state != READING_OK) {
        text_add(t, row_state_id(r->state));
        return;
    }
    text_add(
        t, number_print_places(r->value.value.value, r->unit->decimals, value));
    if (r->state != ROW_OK)
        return;
    if (r->has_percent) {
        signed_text(r->percent.value, 1, percent, sizeof percent);
        text_addf(t, " %s%%", percent);
    }
    if (!r->like_with_like)
        text_add(t, " \xE2\x89\xA0");
}

void screen_trend_lines_draw(const struct session *session,
                             const struct trend *trend, struct canvas *canvas,
                             struct area area, int at)
{
    char ion[ION_TEXT_MAX];
    char buffer[SESSION_TEXT_MAX];
    struct line l = {canvas, area, area.row, area.column};
    struct row r;
    if (area.rows < 1 || at < 0 ||
        !row_at(session, trend->series_count ? trend->series[0].model : NULL,
                &r))
        return;
    l.column = canvas_textf(
                   canvas, l.row, l.column, area.columns, ROLE_TITLE, "%s",
                   ion_print(session->choice.z, session->choice.charge, ion)) +
               2;
    struct text text = text_over(buffer, sizeof buffer);
    if (r.reference.state == READING_OK)
        reading_text(&text, &r.reference);
    else
        text_add(&text, r.reference.reason);
    char site[SESSION_TEXT_MAX];
    struct text where = text_over(site, sizeof site);
    session_stored_site(&r.reference, &where);
    if (where.length > 0)
        text_addf(&text, " at %s", site);
    bool measured = !screen_trend_unmeasured(r.reference.evidence);
    if (!measured)
        text_addf(&text, " (%s)", evidence_id(r.reference.evidence));
    put_entry(&l, ROLE_TITLE, measured ? MARK_STORED : MARK_UNMEASURED, buffer);
    if (r.against.provenance) {
        text = text_over(buffer, sizeof buffer);
        if (r.against.state == READING_OK)
            reading_text(&text, &r.against);
        else
            text_add(&text, r.against.reason);
        if (r.disagrees) {
            char difference[NUMBER_TEXT_MAX + 4];
            signed_text(r.disagreement.value, r.unit->decimals, difference,
                        sizeof difference);
            text_addf(&text, " (%s)", difference);
        }
        put_entry(&l, ROLE_HEADING, MARK_SECOND, buffer);
    }
    for (int s = 0; s < trend->series_count; s++) {
        if (!row_at(session, trend->series[s].model, &r))
            continue;
        text = text_over(buffer, sizeof buffer);
        entry_text(&r, trend->series[s].model->id, &text);
        put_entry(&l, screen_trend_role(trend->series[s].model),
                  screen_trend_mark(trend->series[s].model), buffer);
    }
}
