/* SPDX-License-Identifier: MIT */
/* The pane of the selected element: each model's value, the reference, the
 * residual, and how large residuals usually are there. */
#include "screens/pane.h"

#include <math.h>
#include <stdio.h>
#include <string.h>

#include "base/text.h"
#include "session/site.h"

#define BAR_FULL 0x2588
#define BAR_LEFT_HALF 0x258C
#define BAR_RIGHT_HALF 0x2590
#define AXIS 0x2502
#define UNEQUAL 0x2260
#define BAR_HALF_MAX 16
#define SET_COLUMNS_MIN 14 /* below this the sets are not named in the rows */
#define MODELS_MAX 16

/* Columns of the pane from the left; a width of 0 leaves one out. The bar takes
 * what is left. */
struct columns {
    int columns; /* needed for all but the bar */
    int name_width;
    int value, value_width;
    int reference, reference_width;
    int residual, residual_width;
    int percent, percent_width;
    int mark;
};
#define NAME 1
#define BAR 65

static const struct columns *columns_for(struct area a)
{
    static const struct columns wide = {64, 12, 13, 10, 24, 18,
                                        43, 10, 54, 8,  63};
    static const struct columns narrow = {40, 12, 13, 7, 21, 9,
                                          0,  0,  31, 7, 39};
    return a.columns >= wide.columns ? &wide : &narrow;
}

/* Residual in per cent, drawn from a middle axis: a full half is `full` per
 * cent. */
static void draw_bar(struct canvas *canvas, int row, int half, double percent,
                     double full)
{
    int axis = BAR + half;
    int steps = (int)(fmin(fabs(percent) / full, 1.0) * half * 2 + 0.5);
    enum role role = percent < 0 ? ROLE_BELOW : ROLE_ABOVE;
    int direction = percent < 0 ? -1 : 1;
    canvas_put(canvas, row, axis, ROLE_QUIET, AXIS);
    for (int i = 1; i <= steps / 2; i++)
        canvas_put(canvas, row, axis + direction * i, role, BAR_FULL);
    if (steps % 2)
        canvas_put(canvas, row, axis + direction * (steps / 2 + 1), role,
                   percent < 0 ? BAR_RIGHT_HALF : BAR_LEFT_HALF);
}

/* Columns of the bars on each side of their axis; 0 where there is no room. */
static int bar_half(struct area a)
{
    int half = (a.columns - BAR - 2) / 2;
    return half < 2 ? 0 : half > BAR_HALF_MAX ? BAR_HALF_MAX : half;
}

static void draw_signed(struct canvas *canvas, int row, int column, int width,
                        double value, int places)
{
    char out[NUMBER_TEXT_MAX];
    char text[NUMBER_TEXT_MAX + 1];
    number_fit(value, places, width - 1, out);
    bool plus = value > 0 && out[strspn(out, "0.")] != '\0';
    snprintf(text, sizeof text, "%s%s", plus ? "+" : "", out);
    /* The sign and the bar say which side: a colour here would cost a change
     * of colours for every number that changes with the selection. */
    canvas_right(canvas, row, column, width, ROLE_TEXT, text);
}

static void draw_reading(struct canvas *canvas, int row, int column, int width,
                         const struct reading *reading)
{
    char buffer[SESSION_TEXT_MAX];
    char out[NUMBER_TEXT_MAX];
    struct text t = text_over(buffer, sizeof buffer);
    if (reading->state != READING_OK) {
        canvas_right(canvas, row, column, width, ROLE_GAP, "-");
        return;
    }
    reading_text(&t, reading);
    if ((int)t.length > width) /* uncertainty and last digits stay in exports */
        number_fit(reading->value.value, reading->value.decimals, width, out);
    canvas_right(canvas, row, column, width, ROLE_TEXT,
                 (int)t.length > width ? out : buffer);
}

static void draw_heading(struct canvas *canvas, struct area a,
                         const struct row *row)
{
    char buffer[SESSION_TEXT_MAX];
    char label[SUBSHELL_TEXT_MAX];
    struct text t = text_over(buffer, sizeof buffer);
    const struct columns *c = columns_for(a);
    text_add(&t, quantity_at(row->quantity)->symbol);
    if (row->n)
        text_addf(&t, " %s", subshell_print(row->n, row->l, label));
    text_addf(&t, ", %s", row->unit->id);
    canvas_fill(canvas, a.row, 0, 1, a.columns, ROLE_QUIET, 0x2500);
    canvas_textf(canvas, a.row, NAME, c->value + 3, ROLE_HEADING, " %s ",
                 buffer);
    const struct {
        int column, width;
        const char *text;
    } heads[] = {
        {c->value, c->value_width, " value "},
        {c->reference, c->reference_width, " reference "},
        {c->residual, c->residual_width, " residual "},
        {c->percent, c->percent_width, " % "},
    };
    for (size_t i = 0; i < sizeof heads / sizeof heads[0]; i++)
        if (heads[i].width > 0)
            canvas_right(canvas, a.row, heads[i].column, heads[i].width + 1,
                         ROLE_HEADING, heads[i].text);
    if (bar_half(a) >= 7)
        canvas_text(canvas, a.row, BAR + bar_half(a) - 7, 15, ROLE_HEADING,
                    " below | above ");
}

/* Why there is no residual, from the first column that is then empty. */
static void draw_reason(struct canvas *canvas, struct area a, int row,
                        const struct row *r, bool chosen)
{
    const struct columns *c = columns_for(a);
    /* Of the models that are not chosen a word will do. */
    if (!chosen && r->state == ROW_NO_REFERENCE) {
        canvas_right(canvas, row, c->reference, c->reference_width, ROLE_GAP,
                     reading_state_word(READING_MISSING));
        return;
    }
    bool no_value = r->value.state != READING_OK && r->value.provenance;
    int from = no_value                           ? c->value
               : r->reference.state != READING_OK ? c->reference
                                                  : c->percent - 11;
    canvas_textf(canvas, row, from + 1, a.columns - from - 1, ROLE_GAP, "%s",
                 r->reason);
}

/* The reference of a row; a ditto mark where it is the one above. */
static void draw_reference(struct canvas *canvas, int row,
                           const struct columns *c, const struct row *r,
                           const struct row *above)
{
    bool same = above && above->reference.state == READING_OK &&
                above->value.state == READING_OK &&
                above->reference.provenance == r->reference.provenance;
    if (r->reference.state == READING_OK && same)
        canvas_right(canvas, row, c->reference, c->reference_width, ROLE_QUIET,
                     "\"");
    else
        draw_reading(canvas, row, c->reference, c->reference_width,
                     &r->reference);
}

/* Where the reference sets are named behind the bars; 0 where there is no
 * room for them. */
static int set_column(struct area a)
{
    int column = BAR + 2 * bar_half(a) + 3;
    return a.columns - column >= SET_COLUMNS_MIN ? column : 0;
}

/* The set of a row, unless it is the one above. */
static void draw_set(struct canvas *canvas, struct area a, int row,
                     const struct row *r, const struct row *above)
{
    int column = set_column(a);
    const struct provenance *p = r->reference.provenance;
    if (column > 0 && p && (!above || above->reference.provenance != p))
        canvas_text(canvas, row, column, a.columns - column, ROLE_QUIET, p->id);
}

/* The site that a stored radius stands for, in a line of its own below the
 * rows; gives the rows used. */
static int draw_site(struct canvas *canvas, struct area a,
                     const struct row *rows, int count)
{
    char site[SESSION_TEXT_MAX];
    for (int i = 0; i < count && a.rows > 0; i++) {
        struct text t = text_over(site, sizeof site);
        session_stored_site(&rows[i].reference, &t);
        if (t.length == 0)
            continue;
        canvas_textf(canvas, a.row, NAME, a.columns - NAME, ROLE_TEXT,
                     "stored at coordination %s", site);
        return 1;
    }
    return 0;
}

static void draw_row(struct canvas *canvas, struct area a, int row,
                     const struct row *r, const struct row *above, bool chosen,
                     double full)
{
    const struct columns *c = columns_for(a);
    char out[NUMBER_TEXT_MAX];
    const char *name = r->value.provenance ? r->value.provenance->id : "stored";
    canvas_textf(canvas, row, 0, c->name_width + 1,
                 chosen ? ROLE_TITLE : ROLE_TEXT, "%s%s", chosen ? ">" : " ",
                 name);
    if (r->value.state == READING_OK)
        canvas_right(canvas, row, c->value, c->value_width, ROLE_TEXT,
                     number_fit(r->value.value.value, r->unit->decimals,
                                c->value_width, out));
    if (r->reference.state == READING_OK &&
        (r->value.state == READING_OK || r->state == ROW_REFERENCE_ONLY))
        draw_reference(canvas, row, c, r, above);
    if (r->state == ROW_OK || r->state == ROW_REFERENCE_ONLY)
        draw_set(canvas, a, row, r, above);
    if (r->state == ROW_REFERENCE_ONLY)
        return;
    if (r->state != ROW_OK) {
        draw_reason(canvas, a, row, r, chosen);
        return;
    }
    if (c->residual_width > 0)
        draw_signed(canvas, row, c->residual, c->residual_width,
                    r->residual.value, r->unit->decimals);
    if (r->has_percent)
        draw_signed(canvas, row, c->percent, c->percent_width, r->percent.value,
                    1);
    if (!r->like_with_like)
        canvas_put(canvas, row, c->mark, ROLE_TEXT, UNEQUAL);
    if (r->has_percent && bar_half(a) > 0)
        draw_bar(canvas, row, bar_half(a), r->percent.value, full);
}

/* Rows of all models that offer a quantity (or the reference alone). */
static int pane_rows(const struct session *session, enum quantity_id quantity,
                     struct row rows[MODELS_MAX])
{
    struct ask ask;
    int count = 0;
    if (!session_ask(session, session->choice.z, session->choice.charge, &ask))
        return 0;
    if (quantity != ask.quantity) {
        ask.quantity = quantity;
        ask.reference = ask.against = NULL;
        ask.n = quantity_at(quantity)->per_subshell ? ask.n : 0;
        ask.unit = session_unit(session, quantity);
    }
    for (int m = 0; m < model_count() && count < MODELS_MAX; m++) {
        ask.model = model_at(m);
        if (model_gives(ask.model, quantity))
            rows[count++] = study_row(session->study, &ask);
    }
    if (count == 0) {
        ask.model = NULL;
        rows[count++] = study_row(session->study, &ask);
    }
    return count;
}

/* What the bars of a group are drawn against: the largest residual, but
 * neither less than 10 nor more than 100 per cent. */
static double bar_full(const struct row *rows, int count)
{
    double full = 10.0;
    for (int i = 0; i < count; i++)
        if (rows[i].state == ROW_OK && rows[i].has_percent)
            full = fmax(full, fabs(rows[i].percent.value));
    return fmin(full, 100.0);
}

static int draw_group(const struct session *session, struct canvas *canvas,
                      struct area a, enum quantity_id quantity)
{
    struct row rows[MODELS_MAX];
    int count = pane_rows(session, quantity, rows);
    if (count == 0 || a.rows < 2)
        return 0;
    double full = bar_full(rows, count);
    draw_heading(canvas, a, &rows[0]);
    for (int i = 0; i < count && i + 1 < a.rows; i++) {
        const struct model *model = session->choice.model;
        bool chosen = quantity == session->choice.quantity && model &&
                      rows[i].value.provenance &&
                      strcmp(model->id, rows[i].value.provenance->id) == 0;
        draw_row(canvas, a, a.row + 1 + i, &rows[i], i ? &rows[i - 1] : NULL,
                 chosen, full);
    }
    int used = count + 1 < a.rows ? count + 1 : a.rows;
    struct area below = {a.row + used, a.column, a.rows - used, a.columns};
    /* Of the chosen quantity the line of the source says it. */
    return quantity == session->choice.quantity
               ? used
               : used + draw_site(canvas, below, rows, count);
}

/* The set, what it holds, and what its source says of this value. */
static int draw_source(const struct session *session, struct canvas *canvas,
                       struct area a)
{
    char buffer[1024];
    struct ask ask;
    struct text t = text_over(buffer, sizeof buffer);
    if (a.rows < 1 ||
        !session_ask(session, session->choice.z, session->choice.charge, &ask))
        return 0;
    struct row row = study_row(session->study, &ask);
    const struct provenance *p = row.reference.provenance;
    if (!p)
        return 0;
    /* The coordination and spin come first: the rest may be cut off. */
    text_addf(&t, "reference %s: ", p->id);
    if (row.reference.remark[0] != '\0')
        text_addf(&t, "%s; ", row.reference.remark);
    text_add(&t, provenance_definition(p));
    if (row.value.state == READING_OK && row.value.remark[0] != '\0')
        text_addf(&t, "; model: %s", row.value.remark);
    canvas_text(canvas, a.row, NAME, a.columns - NAME, ROLE_TEXT, buffer);
    if (a.rows < 2 || row.like_with_like || !row.value.provenance)
        return 1;
    canvas_put(canvas, a.row + 1, NAME, ROLE_TEXT, UNEQUAL);
    canvas_textf(canvas, a.row + 1, NAME + 2, a.columns - NAME - 2, ROLE_TEXT,
                 "the model gives another thing: %s",
                 provenance_definition(row.value.provenance));
    return 2;
}

/* The audit of the chosen model against the set that the selected element is
 * shown against; NULL when there is none. */
static const struct audit_series *usual_series(const struct session *session,
                                               const struct audit *usual)
{
    struct ask ask;
    if (!session->choice.model ||
        !session_ask(session, session->choice.z, session->choice.charge, &ask))
        return NULL;
    struct row row = study_row(session->study, &ask);
    for (int i = 0; i < usual->count; i++)
        if (usual->series[i].value == row.value.provenance &&
            usual->series[i].reference == row.reference.provenance)
            return &usual->series[i];
    return NULL;
}

/* How large residuals usually are in the block, this element left out. */
static int draw_usual(const struct session *session, const struct audit *usual,
                      struct canvas *canvas, struct area a)
{
    char buffer[SESSION_TEXT_MAX];
    char number[NUMBER_TEXT_MAX];
    char ion[ION_TEXT_MAX];
    struct text t = text_over(buffer, sizeof buffer);
    const struct element *e = element_at(session->choice.z);
    const struct audit_series *series = usual_series(session, usual);
    struct audit_part part = {AUDIT_BLOCK, e->block};
    if (a.rows < 1 || !series)
        return 0;
    struct summary s = audit_summary_without(series, part, e->z);
    int places = series->unit->decimals;
    text_addf(&t, "%s, %c block without %s: ", series->value->id, e->block,
              e->symbol);
    if (s.count == 0) {
        text_addf(&t, "no residual, %d gaps", s.gaps);
    } else {
        text_addf(
            &t, "mean size %s %s",
            number_print_places(summary_mean_absolute(&s), places, number),
            series->unit->id);
        if (s.percent_count > 0)
            text_addf(&t, " (%.0f %%)", summary_mean_absolute_percent(&s));
        text_addf(
            &t, ", largest %s%s (%s)", s.largest > 0 ? "+" : "",
            number_print_places(s.largest, places, number),
            ion_print_at(s.largest_z, s.largest_charge, s.largest_site, ion));
        if (a.columns >= 100)
            text_addf(&t, "; %d residuals, %d gaps", s.count, s.gaps);
    }
    canvas_text(canvas, a.row, NAME, a.columns - NAME, ROLE_TEXT, buffer);
    return 1;
}

/* Models that stand against another set than the chosen one, where the rows
 * do not name the sets; gives the rows used. */
static int draw_other_sets(const struct session *session, struct canvas *canvas,
                           struct area a)
{
    struct row rows[MODELS_MAX];
    struct ask ask;
    int used = 0;
    if (set_column(a) > 0 ||
        !session_ask(session, session->choice.z, session->choice.charge, &ask))
        return 0;
    struct row chosen = study_row(session->study, &ask);
    int count = pane_rows(session, session->choice.quantity, rows);
    for (int i = 0; i < count && used < a.rows; i++) {
        const struct provenance *p = rows[i].reference.provenance;
        if (rows[i].state != ROW_OK || p == chosen.reference.provenance)
            continue;
        canvas_textf(canvas, a.row + used, NAME, a.columns - NAME, ROLE_TEXT,
                     "%s: reference %s: %s%s%s", rows[i].value.provenance->id,
                     p->id, rows[i].reference.remark,
                     rows[i].reference.remark[0] ? "; " : "",
                     provenance_definition(p));
        used++;
    }
    return used;
}

void screen_pane_draw(const struct session *session, const struct audit *usual,
                      struct canvas *canvas, struct area area)
{
    struct area left = area;
    enum quantity_id chosen = session->choice.quantity;
    int used = draw_group(session, canvas, left, chosen);
    left.row += used;
    left.rows -= used;
    used = draw_source(session, canvas, left);
    left.row += used;
    left.rows -= used;
    used = draw_usual(session, usual, canvas, left);
    left.row += used;
    left.rows -= used;
    used = draw_other_sets(session, canvas, left);
    left.row += used;
    left.rows -= used;
    /* Other quantities while there is room for a heading and a row. */
    for (int q = 0; q < QUANTITY_COUNT && left.rows >= 2; q++) {
        if ((enum quantity_id)q == chosen)
            continue;
        used = draw_group(session, canvas, left, (enum quantity_id)q);
        left.row += used;
        left.rows -= used;
    }
}
