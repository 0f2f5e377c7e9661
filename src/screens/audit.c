/* SPDX-License-Identifier: MIT */
#include "screens/audit.h"

#include <math.h>
#include <stdio.h>
#include <string.h>

#include "base/text.h"
#include "element/selection.h"
#include "screens/trend.h"

#define LABEL_COLUMNS 15

static const char *const statistic_names[STATISTIC_KINDS] = {
    [STATISTIC_MEAN_ABSOLUTE] = "mean size",
    [STATISTIC_PERCENT] = "mean size, %",
    [STATISTIC_MEAN] = "mean",
    [STATISTIC_RMS] = "RMS",
    [STATISTIC_LARGEST] = "largest",
    [STATISTIC_COUNTS] = "residuals/gaps",
};

bool audit_fill(const struct ui *ui, struct audit *audit, struct status *st)
{
    for (int m = 0; m < model_count(); m++) {
        if (model_offer_for(model_at(m), ui->choice.quantity, NULL) < 0)
            continue;
        for (int z = 1; z <= Z_MAX; z++) {
            struct ask ask;
            if (!ui_ask(ui, z, ui->choice.charge, &ask))
                continue;
            ask.model = model_at(m);
            ask.configuration = NULL; /* ground states alone are judged */
            struct row row = study_row(ui->study, &ask);
            if (!audit_add(audit, &row, st))
                return false;
        }
    }
    return true;
}

void audit_refresh(struct ui *ui)
{
    struct status st = status_ok();
    if (!ui->audit_stale)
        return;
    audit_clear(&ui->audit);
    if (audit_fill(ui, &ui->audit, &st))
        ui->audit_stale = false;
    else
        ui_report(ui, true, "%s", st.message);
}

const struct audit_series *audit_chosen(const struct ui *ui)
{
    for (int i = 0; i < ui->audit.count; i++)
        if (ui->choice.model &&
            strcmp(ui->audit.series[i].value->id, ui->choice.model->id) == 0)
            return &ui->audit.series[i];
    return NULL;
}

int audit_outliers(const struct ui *ui, const struct audit_series *series,
                   const struct audit_point *points[Z_MAX])
{
    int count = 0;
    for (int i = 0; series && i < series->count && count < Z_MAX; i++) {
        const struct audit_point *p = &series->points[i];
        if (p->state != ROW_OK || !audit_holds(ui->audit_part, p))
            continue;
        int at = count++;
        for (; at > 0 && fabs(points[at - 1]->residual) < fabs(p->residual);
             at--)
            points[at] = points[at - 1];
        points[at] = p;
    }
    return count;
}

static int part_place(const struct ui *ui, const struct audit_part *parts,
                      int count)
{
    for (int i = 0; i < count; i++)
        if (parts[i].scope == ui->audit_part.scope &&
            parts[i].value == ui->audit_part.value)
            return i;
    return 0;
}

static void part_text(struct audit_part part, struct text *t)
{
    if (part.scope == AUDIT_BLOCK) {
        text_addf(t, "%c block", part.value);
        return;
    }
    if (part.scope == AUDIT_ALL)
        text_add(t, "all");
    else if (part.scope != AUDIT_EVIDENCE)
        text_addf(t, "%s ", audit_scope_id(part.scope));
    audit_part_text(part, t);
}

static void cell_text(const struct audit_series *s, struct audit_part part,
                      enum statistic statistic, char *out, size_t size)
{
    struct summary sum = audit_summary(s, part);
    int places = s->unit->decimals;
    double value = 0.0;
    snprintf(out, size, "-");
    if (statistic == STATISTIC_COUNTS) {
        snprintf(out, size, "%d/%d", sum.count, sum.gaps);
        return;
    }
    if (sum.count == 0 ||
        (statistic == STATISTIC_PERCENT && sum.percent_count == 0))
        return;
    bool is_signed = false;
    if (statistic == STATISTIC_MEAN_ABSOLUTE) {
        value = summary_mean_absolute(&sum);
    } else if (statistic == STATISTIC_PERCENT) {
        value = summary_mean_absolute_percent(&sum);
        places = 1;
    } else if (statistic == STATISTIC_RMS) {
        value = summary_rms(&sum);
    } else {
        value = statistic == STATISTIC_MEAN ? summary_mean(&sum) : sum.largest;
        is_signed = value > 0.0;
    }
    char number[NUMBER_TEXT_MAX];
    number_fit(value, places, 6, number);
    snprintf(out, size, "%s%s", is_signed ? "+" : "", number);
}

/* Names stand on two rows in turn where columns are narrow. */
static void draw_heads(const struct ui *ui, struct canvas *canvas,
                       const struct audit_layout *l)
{
    const struct audit_series *chosen = audit_chosen(ui);
    for (int i = 0; i < ui->audit.count; i++) {
        const struct audit_series *s = &ui->audit.series[i];
        const struct model *model = model_find(s->value->id);
        int row = l->table.row + (l->cell_columns < 13 ? i % 2 : 0);
        int column = l->table.column + LABEL_COLUMNS + i * l->cell_columns;
        canvas_put(canvas, row, column, trend_role(model), trend_mark(model));
        canvas_textf(canvas, row, column + 1, 14,
                     s == chosen ? ROLE_TITLE : trend_role(model), "%s%s",
                     s->value->id,
                     s->like_with_like || !s->reference ? "" : "\xE2\x89\xA0");
    }
}

static void draw_part(const struct ui *ui, struct canvas *canvas,
                      const struct audit_layout *l, int row,
                      struct audit_part part, bool chosen)
{
    char text[UI_TEXT_MAX];
    struct text t = text_over(text, sizeof text);
    const struct audit_series *model = audit_chosen(ui);
    part_text(part, &t);
    canvas_textf(canvas, row, l->table.column, LABEL_COLUMNS,
                 chosen ? ROLE_CHOSEN : ROLE_TEXT, "%s%-13s",
                 chosen ? ">" : " ", text);
    for (int i = 0; i < ui->audit.count; i++) {
        const struct audit_series *s = &ui->audit.series[i];
        struct audit_rank rank =
            audit_rank(&ui->audit, s->quantity, s->reference, part);
        bool best = rank.count > 1 && rank.species > 1 && rank.series[0] == i;
        int column = l->table.column + LABEL_COLUMNS + i * l->cell_columns;
        cell_text(s, part, ui->choice.statistic, text, sizeof text);
        enum role role = text[0] == '-' && !text[1] ? ROLE_GAP
                         : s == model && chosen     ? ROLE_CHOSEN
                         : best                     ? ROLE_TITLE
                                                    : ROLE_TEXT;
        canvas_right(canvas, row, column, l->cell_columns - 1, role, text);
        if (best)
            canvas_put(canvas, row, column + l->cell_columns - 1, ROLE_TITLE,
                       '*');
    }
}

static void draw_table(struct ui *ui, struct canvas *canvas,
                       const struct audit_layout *l)
{
    struct audit_part parts[AUDIT_PARTS_MAX];
    int count = audit_parts(&ui->audit, ui->choice.quantity, 0, parts);
    int at = part_place(ui, parts, count);
    int heads = l->cell_columns < 13 ? 2 : 1;
    int room = l->table.rows - heads;
    int first = at >= room ? at - room + 1 : 0;
    draw_heads(ui, canvas, l);
    for (int i = 0; i < room && first + i < count; i++) {
        int row = l->table.row + heads + i;
        bool chosen = first + i == at;
        draw_part(ui, canvas, l, row, parts[first + i], chosen);
        if (chosen && !ui->audit_points) {
            canvas->cursor_row = row;
            canvas->cursor_column = l->table.column;
        }
    }
}

/* The chosen figures in words. */
static void summary_text(const struct ui *ui, const struct audit_series *s,
                         struct text *t)
{
    char number[NUMBER_TEXT_MAX];
    char ion[ION_TEXT_MAX];
    struct summary sum = audit_summary(s, ui->audit_part);
    int places = s->unit->decimals;
    text_addf(t, "%s, ", s->value->id);
    part_text(ui->audit_part, t);
    text_addf(t, ": %d residuals, %d gaps", sum.count, sum.gaps);
    if (sum.count == 0)
        return;
    text_addf(t, "; mean %s%s", summary_mean(&sum) > 0 ? "+" : "",
              number_print_places(summary_mean(&sum), places, number));
    text_addf(t, ", mean size %s",
              number_print_places(summary_mean_absolute(&sum), places, number));
    if (sum.percent_count > 0)
        text_addf(t, " (%.0f %%)", summary_mean_absolute_percent(&sum));
    text_addf(t, ", RMS %s",
              number_print_places(summary_rms(&sum), places, number));
    text_addf(t, ", largest %s%s", sum.largest > 0 ? "+" : "",
              number_print_places(sum.largest, places, number));
    text_addf(t, " %s (%s)", s->unit->id,
              ion_print(sum.largest_z, sum.largest_charge, ion));
}

static void rank_text(const struct ui *ui, const struct audit_series *s,
                      struct text *t)
{
    char number[NUMBER_TEXT_MAX];
    struct audit_rank rank =
        audit_rank(&ui->audit, s->quantity, s->reference, ui->audit_part);
    if (rank.unlike > 0)
        text_add(t, "not ranked: not like with like, where \xE2\x89\xA0; ");
    if (rank.repeats > 0)
        text_add(t, "not ranked: the set is the same calculation; ");
    if (rank.count < 2) {
        text_add(t, "no best is named");
        return;
    }
    text_addf(t, "best * on the %d that all have: ", rank.species);
    for (int i = 0; i < rank.count; i++)
        text_addf(t, "%s%s %s", i ? ", " : "",
                  ui->audit.series[rank.series[i]].value->id,
                  number_print_places(rank.mean_absolute[i], s->unit->decimals,
                                      number));
    text_addf(t, " %s", s->unit->id);
}

static void draw_words(const struct ui *ui, struct canvas *canvas,
                       struct area a)
{
    char text[2 * UI_TEXT_MAX];
    struct text t = text_over(text, sizeof text);
    struct flow flow = {canvas, a, 0, 0};
    const struct audit_series *s = audit_chosen(ui);
    if (!s)
        return;
    summary_text(ui, s, &t);
    flow_text(&flow, ROLE_TEXT, 0, text);
    t = text_over(text, sizeof text);
    rank_text(ui, s, &t);
    if (t.length > 0)
        flow_text(&flow, ROLE_TEXT, 0, text);
    if (s->like_with_like || !s->reference)
        return;
    t = text_over(text, sizeof text);
    text_addf(&t,
              "\xE2\x89\xA0 not like with like: the model gives %s; the "
              "reference is %s",
              s->value->definition, s->reference->definition);
    flow_text(&flow, ROLE_CAUTION, 0, text);
}

static void draw_title(const struct ui *ui, struct canvas *canvas)
{
    char text[UI_TEXT_MAX];
    struct text t = text_over(text, sizeof text);
    const struct choice *c = &ui->choice;
    const struct audit_series *s = audit_chosen(ui);
    const struct quantity *q = quantity_at(c->quantity);
    text_addf(&t, "Audit   %s", q->title);
    if (s && c->statistic != STATISTIC_PERCENT &&
        c->statistic != STATISTIC_COUNTS)
        text_addf(&t, ", %s", s->unit->id);
    text_addf(&t, ": %s   ", statistic_names[c->statistic]);
    if (c->charge)
        text_addf(&t, "charge %+d   ", c->charge);
    if (c->evidence)
        for (int e = 0; e < EVIDENCE_COUNT; e++)
            if (c->evidence >> e & 1u)
                text_addf(&t, "%s alone   ", evidence_id((enum evidence)e));
    if (s && s->reference) {
        text_add(&t, s->reference->id);
        add_asked_site(ui, s->reference, &t);
    }
    canvas_text(canvas, 0, 0, canvas->columns, ROLE_TITLE, text);
}

static void draw(struct ui *ui, struct canvas *canvas)
{
    audit_refresh(ui);
    draw_title(ui, canvas);
    if (ui->audit.count == 0) {
        canvas_textf(canvas, 2, 0, canvas->columns, ROLE_GAP,
                     "no model computes %s; w chooses another quantity",
                     quantity_at(ui->choice.quantity)->title);
        return;
    }
    struct audit_layout l =
        layout_audit(canvas->rows, canvas->columns, ui->audit.count);
    if (l.scatter.rows > 0) {
        draw_table(ui, canvas, &l);
        draw_scatter(ui, canvas, l.scatter);
        draw_outliers(ui, canvas, l.points);
    } else if (ui->audit_points) {
        draw_outliers(ui, canvas, l.table);
    } else {
        draw_table(ui, canvas, &l);
    }
    draw_words(ui, canvas, l.words);
}

static void move_part(struct ui *ui, int by)
{
    struct audit_part parts[AUDIT_PARTS_MAX];
    int count = audit_parts(&ui->audit, ui->choice.quantity, 0, parts);
    int at = part_place(ui, parts, count) + by;
    if (count == 0)
        return;
    at = at < 0 ? 0 : at >= count ? count - 1 : at;
    ui->audit_part = parts[at];
    ui->audit_point = 0;
}

static void move_model(struct ui *ui, int by)
{
    const struct audit_series *chosen = audit_chosen(ui);
    if (!chosen)
        return;
    int to = (int)(chosen - ui->audit.series) + by;
    if (to < 0 || to >= ui->audit.count)
        return;
    ui->choice.model = model_find(chosen[by].value->id);
    ui->stale = true;
    ui->audit_point = 0;
}

static void move_point(struct ui *ui, int by)
{
    const struct audit_point *points[Z_MAX];
    int count = audit_outliers(ui, audit_chosen(ui), points);
    int at = ui->audit_point + by;
    at = at >= count ? count - 1 : at;
    ui->audit_point = at < 0 ? 0 : at;
}

static enum effect open_point(struct ui *ui)
{
    const struct audit_point *points[Z_MAX];
    int count = audit_outliers(ui, audit_chosen(ui), points);
    if (count == 0)
        return EFFECT_REDRAW;
    if (!ui->audit_points) {
        ui->audit_points = true;
        ui->audit_point = 0;
        return EFFECT_REDRAW;
    }
    const struct audit_point *p =
        points[ui->audit_point < count ? ui->audit_point : count - 1];
    ui_select_species(ui, p->z, p->charge, false);
    ui->screen = SCREEN_MAP;
    ui->detail = true;
    return EFFECT_REDRAW;
}

static enum effect update(struct ui *ui, enum action action)
{
    int page = ui->rows > 12 ? ui->rows - 10 : 2;
    int by = action == ACTION_UP          ? -1
             : action == ACTION_DOWN      ? 1
             : action == ACTION_PAGE_UP   ? -page
             : action == ACTION_PAGE_DOWN ? page
             : action == ACTION_HOME      ? -AUDIT_PARTS_MAX
             : action == ACTION_END       ? AUDIT_PARTS_MAX
                                          : 0;
    audit_refresh(ui);
    if (by && ui->audit_points)
        move_point(ui, by);
    else if (by)
        move_part(ui, by);
    else if (action == ACTION_LEFT || action == ACTION_RIGHT)
        move_model(ui, action == ACTION_LEFT ? -1 : 1);
    else if (action == ACTION_OPEN)
        return open_point(ui);
    else if (action == ACTION_BACK && ui->audit_points)
        ui->audit_points = false;
    else if (action == ACTION_BACK)
        ui->screen = SCREEN_MAP;
    else
        return EFFECT_NONE;
    return EFFECT_REDRAW;
}

const struct screen_ops screen_audit = {"Audit", update, draw};
