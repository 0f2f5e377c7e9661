/* SPDX-License-Identifier: MIT */
#include "screens/trend.h"

#include <math.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "base/text.h"
#include "element/selection.h"
#include "canvas/plot.h"

#define LOG_FROM 20.0 /* ratio of highest to lowest that asks for it */
#define LABEL_MAX 16
#define BAR 0x2502
#define RULE_LEVEL 0x2500

uint32_t trend_mark(const struct model *model)
{
    static const uint32_t marks[] = {0x25A0, 0x25B2, 0x25BC, 0x25C6, 0x25CF};
    return marks[model_index(model) % (int)(sizeof marks / sizeof marks[0])];
}

enum role trend_role(const struct model *model)
{
    return (enum role)(ROLE_CURVE_1 + model_index(model) % 5);
}

bool trend_unmeasured(enum evidence evidence)
{
    return evidence == EVIDENCE_EXTRAPOLATED ||
           evidence == EVIDENCE_THEORETICAL || evidence == EVIDENCE_ESTIMATED;
}

int trend_models(const struct ui *ui, const struct model *models[])
{
    int count = 0;
    for (int m = 0; m < model_count() && count < TREND_MODELS_MAX; m++)
        if (!(ui->choice.hidden_curves >> m & 1u) &&
            model_offer_for(model_at(m), ui->choice.quantity, NULL) >= 0)
            models[count++] = model_at(m);
    return count;
}

static bool same_walk(const struct walk *a, const struct walk *b)
{
    return a->kind == b->kind && a->count == b->count &&
           memcmp(a->steps, b->steps, (size_t)a->count * sizeof a->steps[0]) ==
               0;
}

void trend_refresh(struct ui *ui)
{
    const struct model *models[TREND_MODELS_MAX];
    struct walk walk;
    struct ask ask;
    walk_fill(&walk, ui->choice.walk, ui->choice.z, ui->choice.charge);
    if (!ui->trend_stale && same_walk(&walk, &ui->trend.walk))
        return;
    ui->trend.walk = walk;
    (void)ui_ask(ui, ui->choice.z, ui->choice.charge, &ask);
    int count = trend_models(ui, models);
    trend_fill(&ui->trend, ui->study, &ask, models, count);
    ui->trend_stale = false;
}

/* Lowest and highest of what is drawn. */
struct range {
    bool any;
    double low, high;
};

static void widen(struct range *r, double value)
{
    r->low = r->any ? fmin(r->low, value) : value;
    r->high = r->any ? fmax(r->high, value) : value;
    r->any = true;
}

static struct range value_range(const struct trend *t)
{
    struct range r = {0};
    for (int i = 0; i < t->walk.count; i++) {
        for (int s = 0; s < t->series_count; s++)
            if (t->series[s].values[i].there)
                widen(&r, t->series[s].values[i].value);
        for (int s = 0; s < t->set_count; s++)
            if (t->sets[s].values[i].there)
                widen(&r, t->sets[s].values[i].value);
    }
    return r;
}

static bool residual_of(const struct trend_value *v, bool percent, double *out)
{
    *out = percent ? v->percent : v->residual;
    return percent ? v->has_percent : v->has_residual;
}

static struct range residual_range(const struct trend *t, bool percent)
{
    struct range r = {0};
    double value;
    for (int i = 0; i < t->walk.count; i++) {
        for (int s = 0; s < t->series_count; s++)
            if (residual_of(&t->series[s].values[i], percent, &value))
                widen(&r, value);
        if (residual_of(&t->disagreement[i], percent, &value))
            widen(&r, value);
    }
    if (r.any)
        widen(&r, 0.0);
    return r;
}

static bool is_log(const struct ui *ui, struct range r)
{
    bool can = r.any && r.low > 0.0;
    if (ui->choice.trend_axis == TREND_AXIS_AUTO)
        return can && r.high / r.low >= LOG_FROM;
    return can && ui->choice.trend_axis == TREND_AXIS_LOG;
}

/* Round ends around a range; zero where it is near. */
static struct plot_axis axis_of(struct range r, bool log, const char *title)
{
    struct plot_axis axis = {.title = title};
    if (log) {
        axis.scale = PLOT_LOG;
        axis.low = r.low / 1.15;
        axis.high = r.high * 1.15;
        return axis;
    }
    double span = r.high - r.low;
    if (span <= 0.0)
        span = r.high != 0.0 ? fabs(r.high) : 1.0;
    if (r.low > 0.0 && r.low < 0.5 * r.high)
        r.low = 0.0;
    double step = plot_round_up(span / 8.0);
    axis.low = floor(r.low / step) * step;
    axis.high = ceil(r.high / step) * step;
    if (axis.high - axis.low < step)
        axis.high = axis.low + step;
    return axis;
}

/* Columns kept free for the names at the curves' ends. */
static int label_columns(const struct trend *t)
{
    size_t longest = strlen("reference");
    for (int s = 0; s < t->series_count; s++)
        if (strlen(t->series[s].model->id) > longest)
            longest = strlen(t->series[s].model->id);
    return (int)longest + 3;
}

/* Opens a plot whose steps stand at 0, 1, 2 …, a whole number of columns apart
 * where that wastes little, with room for the names behind the last one. */
static bool open_plot(struct plot *plot, const struct ui *ui,
                      struct canvas *canvas, struct area area,
                      struct plot_axis up)
{
    const struct trend *t = &ui->trend;
    int n = t->walk.count;
    struct plot_axis level = {
        .title = "", .low = -0.5, .high = n - 0.5, .whole = true};
    enum plot_style style = ui->choice.atom.braille ? PLOT_BRAILLE : PLOT_BLOCK;
    if (!plot_open(plot, canvas, area, style, level, up))
        return false;
    int labels = label_columns(t);
    int inside = plot->inside.columns;
    int room = inside > 2 * labels ? inside - labels : inside;
    int apart = room / n;
    bool even = apart > 0 && 5 * apart * n >= 4 * room;
    plot->x.high =
        even ? -0.5 + (double)inside / apart : -0.5 + (double)n * inside / room;
    return true;
}

static int step_column(const struct plot *plot, int step)
{
    int column = plot->inside.column;
    (void)plot_column(plot, step, &column);
    return column;
}

static void step_text(const struct trend *t, int step, char *out, size_t size)
{
    char ion[ION_TEXT_MAX];
    const struct walk_step *s = &t->walk.steps[step];
    if (t->walk.kind == WALK_CHARGES)
        snprintf(out, size, "%d%s", s->charge > 0 ? s->charge : -s->charge,
                 s->charge > 0   ? "+"
                 : s->charge < 0 ? "-"
                                 : "");
    else if (t->walk.kind == WALK_ISOELECTRONIC)
        snprintf(out, size, "%s", ion_print(s->z, s->charge, ion));
    else
        snprintf(out, size, "%s", element_at(s->z)->symbol);
}

/* What the level axis counts, at its right end where nothing else stands. */
static const char *step_title(enum walk_kind kind)
{
    return kind == WALK_CHARGES         ? "charge"
           : kind == WALK_ISOELECTRONIC ? "ion"
                                        : "element";
}

/* Names of the steps in place of numbers; the selected one always. */
static void draw_steps(const struct trend *t, const struct plot *plot, int at)
{
    char text[LABEL_MAX];
    const struct area *in = &plot->inside;
    int row = in->row + in->rows + 1;
    int width = 1;
    for (int i = 0; i < t->walk.count; i++) {
        step_text(t, i, text, sizeof text);
        width = (int)strlen(text) > width ? (int)strlen(text) : width;
    }
    canvas_fill(plot->canvas, row - 1, in->column, 1, in->columns, ROLE_QUIET,
                RULE_LEVEL);
    canvas_fill(plot->canvas, row, plot->area.column, 1, plot->area.columns,
                ROLE_TEXT, ' ');
    canvas_right(plot->canvas, row, plot->area.column, plot->area.columns,
                 ROLE_HEADING, step_title(t->walk.kind));
    int every = 1;
    while (every < t->walk.count &&
           step_column(plot, every) - step_column(plot, 0) < width + 1)
        every++;
    for (int i = 0; i < t->walk.count; i++) {
        bool near = at >= 0 && i != at &&
                    abs(step_column(plot, i) - step_column(plot, at)) <= width;
        if ((i % every != 0 && i != at) || near)
            continue;
        step_text(t, i, text, sizeof text);
        int column = step_column(plot, i) - ((int)strlen(text) - 1) / 2;
        canvas_text(plot->canvas, row, column, LABEL_MAX,
                    i == at ? ROLE_CHOSEN : ROLE_TEXT, text);
        if (i == at) {
            plot->canvas->cursor_row = row;
            plot->canvas->cursor_column = column;
        }
    }
}

static bool is_blank_run(const struct canvas *c, int row, int column, int width)
{
    for (int i = column; i < column + width; i++)
        if (i >= c->columns || row < 0 || row >= c->rows ||
            c->cells[(size_t)row * (size_t)c->columns + (size_t)i].character !=
                ' ')
            return false;
    return true;
}

/* A name behind the last point of its curve, moved up or down to where nothing
 * stands. */
static void draw_name(const struct plot *plot, enum role role, uint32_t mark,
                      const char *name, const struct plot_point *points,
                      int count)
{
    int last = count - 1;
    int row;
    int column;
    int width = (int)strlen(name) + 2;
    while (last >= 0 && !points[last].there)
        last--;
    if (last < 0 || !plot_column(plot, points[last].x, &column) ||
        !plot_row(plot, points[last].y, &row))
        return;
    int end = plot->inside.column + plot->inside.columns;
    int bottom = plot->inside.row + plot->inside.rows;
    for (int away = 0; away < 2 * plot->inside.rows; away++) {
        int at = row + (away % 2 ? 1 : -1) * ((away + 1) / 2);
        int from = column + 2 + width <= end ? column + 2 : end - width;
        if (at < plot->inside.row || at >= bottom ||
            !is_blank_run(plot->canvas, at, from - 1, width + 1))
            continue;
        canvas_put(plot->canvas, at, from, role, mark);
        canvas_text(plot->canvas, at, from + 2, width - 2, role, name);
        return;
    }
}

/* One standard uncertainty up and down, where it is more than a cell. */
static void draw_bars(const struct plot *plot, const struct trend_set *set,
                      int count, bool around_zero)
{
    for (int i = 0; i < count; i++) {
        const struct trend_stored *v = &set->values[i];
        int top;
        int bottom;
        double middle = around_zero ? 0.0 : v->value;
        if (!v->there || !v->has_u || !plot_row(plot, middle + v->u, &top) ||
            !plot_row(plot, middle - v->u, &bottom))
            continue;
        for (int row = top; row <= bottom && top < bottom; row++)
            canvas_put(plot->canvas, row, step_column(plot, i), ROLE_QUIET,
                       BAR);
    }
}

static uint32_t stored_mark(const struct trend_set *set, int step)
{
    return set->against                                   ? MARK_SECOND
           : trend_unmeasured(set->values[step].evidence) ? MARK_UNMEASURED
                                                          : MARK_STORED;
}

static void draw_stored(const struct plot *plot, const struct trend_set *set,
                        int count)
{
    for (int i = 0; i < count; i++) {
        const struct trend_stored *v = &set->values[i];
        struct plot_point point = {i, v->value, v->there};
        uint32_t mark = stored_mark(set, i);
        plot_marks(plot, set->against ? ROLE_HEADING : ROLE_TITLE, mark, &point,
                   1);
    }
}

static void draw_curve(const struct plot *plot, const struct model *model,
                       const struct plot_point *points, int count)
{
    /* The marks are the numbers; what joins them is thin. */
    struct plot_line line = {
        trend_role(model),
        plot->style == PLOT_BRAILLE ? PLOT_SOLID : PLOT_DOTTED, '.'};
    plot_curve(plot, line, points, count);
}

static void set_points(const struct trend_set *set, int count,
                       struct plot_point *points)
{
    for (int i = 0; i < count; i++)
        points[i] =
            (struct plot_point){i, set->values[i].value, set->values[i].there};
}

/* Values of models and sets. */
static void draw_values(const struct ui *ui, struct canvas *canvas,
                        struct area area, int at)
{
    const struct trend *t = &ui->trend;
    struct plot_point points[TREND_MODELS_MAX][WALK_MAX];
    struct plot_point stored[WALK_MAX];
    struct plot plot;
    char title[UI_TEXT_MAX];
    struct range r = value_range(t);
    int n = t->walk.count;
    bool log = is_log(ui, r);
    const struct quantity *q = quantity_at(t->quantity);
    snprintf(title, sizeof title, "%s, %s%s", q->title, t->unit->id,
             log ? " (logarithmic)" : "");
    if (!r.any) {
        canvas_text(canvas, area.row, area.column, area.columns, ROLE_GAP,
                    "no number along this walk");
        return;
    }
    if (!open_plot(&plot, ui, canvas, area, axis_of(r, log, title)))
        return;
    draw_steps(t, &plot, at);
    for (int s = 0; s < t->set_count; s++)
        draw_bars(&plot, &t->sets[s], n, false);
    for (int s = 0; s < t->series_count; s++) {
        for (int i = 0; i < n; i++)
            points[s][i] = (struct plot_point){i, t->series[s].values[i].value,
                                               t->series[s].values[i].there};
        draw_curve(&plot, t->series[s].model, points[s], n);
    }
    for (int s = 0; s < t->series_count; s++)
        plot_marks(&plot, trend_role(t->series[s].model),
                   trend_mark(t->series[s].model), points[s], n);
    for (int s = 0; s < t->set_count; s++)
        draw_stored(&plot, &t->sets[s], n);
    for (int s = 0; s < t->series_count; s++)
        draw_name(&plot, trend_role(t->series[s].model),
                  trend_mark(t->series[s].model), t->series[s].model->id,
                  points[s], n);
    for (int s = 0; s < t->set_count; s++) {
        const struct trend_set *set = &t->sets[s];
        int last = n - 1;
        while (last > 0 && !set->values[last].there)
            last--;
        set_points(set, n, stored);
        draw_name(&plot, set->against ? ROLE_HEADING : ROLE_TITLE,
                  stored_mark(set, last), set->against ? "second" : "reference",
                  stored, n);
    }
    plot_upright(&plot, ROLE_QUIET, at);
}

/* Model less reference; where there are two sets, the second less the first. */
static void draw_residuals(const struct ui *ui, struct canvas *canvas,
                           struct area area, int at)
{
    const struct trend *t = &ui->trend;
    struct plot_point points[WALK_MAX];
    struct plot plot;
    char title[UI_TEXT_MAX];
    int n = t->walk.count;
    bool percent = ui->choice.trend_percent;
    struct range r = residual_range(t, percent);
    snprintf(title, sizeof title, "model - reference, %s",
             percent ? "% of the reference" : t->unit->id);
    if (!r.any) {
        canvas_textf(canvas, area.row, area.column, area.columns, ROLE_GAP,
                     "%s: no residual along this walk", title);
        return;
    }
    if (!open_plot(&plot, ui, canvas, area, axis_of(r, false, title)))
        return;
    draw_steps(t, &plot, at);
    for (int s = 0; !percent && s < t->set_count; s++)
        if (!t->sets[s].against)
            draw_bars(&plot, &t->sets[s], n, true);
    for (int pass = 0; pass < 2; pass++)
        for (int s = 0; s <= t->series_count; s++) {
            bool sets = s == t->series_count;
            const struct trend_value *v =
                sets ? t->disagreement : t->series[s].values;
            for (int i = 0; i < n; i++) {
                points[i].x = i;
                points[i].there = residual_of(&v[i], percent, &points[i].y);
            }
            if (pass == 0 && !sets)
                draw_curve(&plot, t->series[s].model, points, n);
            else if (pass == 1)
                plot_marks(&plot,
                           sets ? ROLE_HEADING : trend_role(t->series[s].model),
                           sets ? MARK_SECOND : trend_mark(t->series[s].model),
                           points, n);
        }
    plot_level(&plot, ROLE_QUIET, 0.0);
    plot_upright(&plot, ROLE_QUIET, at);
}

void draw_trend(struct ui *ui, struct canvas *canvas, struct area area)
{
    trend_refresh(ui);
    const struct trend *t = &ui->trend;
    int at = walk_place(&t->walk, ui->choice.z, ui->choice.charge);
    struct trend_layout l = layout_trend(area);
    draw_values(ui, canvas, l.values, at);
    if (l.residuals.rows > 0)
        draw_residuals(ui, canvas, l.residuals, at);
    if (l.full)
        draw_trend_table(ui, canvas, l.table, at);
    else
        draw_trend_lines(ui, canvas, l.table, at);
}

/* What is shown, along what, in words. */
static void draw_title(const struct ui *ui, struct canvas *canvas)
{
    char buffer[UI_TEXT_MAX];
    char label[SUBSHELL_TEXT_MAX];
    struct text t = text_over(buffer, sizeof buffer);
    const struct choice *c = &ui->choice;
    const struct quantity *q = quantity_at(c->quantity);
    text_addf(&t, "Trend   %s, %s   %s", q->title, ui->trend.unit->id,
              walk_words(c->walk));
    if (c->walk < WALK_CHARGES)
        text_addf(&t, c->charge ? "   charge %+d" : "   neutral", c->charge);
    if (c->walk == WALK_ISOELECTRONIC)
        text_addf(&t, " of %d electrons", c->z - c->charge);
    if (q->per_subshell)
        text_addf(&t, "   %s",
                  c->n ? subshell_print(c->n, c->l, label) : "outermost");
    for (int s = 0; s < ui->trend.set_count; s++) {
        text_addf(&t, "%s%s", s ? ", " : "   ",
                  ui->trend.sets[s].provenance->id);
        add_asked_site(ui, ui->trend.sets[s].provenance, &t);
    }
    canvas_text(canvas, 0, 0, canvas->columns, ROLE_TITLE, buffer);
}

static void draw(struct ui *ui, struct canvas *canvas)
{
    struct area area = {1, 0, canvas->rows - 3, canvas->columns};
    draw_trend(ui, canvas, area);
    draw_title(ui, canvas);
}

static enum effect go_along(struct ui *ui, int by)
{
    const struct walk *w = &ui->trend.walk;
    int at = walk_place(w, ui->choice.z, ui->choice.charge) + by;
    if (at < 0)
        at = 0;
    if (at >= w->count)
        at = w->count - 1;
    ui_select_species(ui, w->steps[at].z, w->steps[at].charge, true);
    return EFFECT_REDRAW;
}

/* To the walk beside this one. */
static enum effect go_across(struct ui *ui, int by)
{
    const struct choice *c = &ui->choice;
    struct ask ask;
    int z = c->z;
    int charge = c->charge;
    if (c->walk == WALK_CHARGES)
        z += by;
    else if (c->walk == WALK_ISOELECTRONIC)
        charge -= by;
    else
        z = element_neighbour(z, c->walk == WALK_GROUP ? by : 0,
                              c->walk == WALK_GROUP ? 0 : by, GRID_18,
                              c->group3);
    if (z < 1 || z > Z_MAX || !ui_ask(ui, z, charge, &ask))
        return EFFECT_REDRAW;
    ui_select_species(ui, z, charge, false);
    return EFFECT_REDRAW;
}

static enum effect update(struct ui *ui, enum action action)
{
    trend_refresh(ui);
    if (action == ACTION_LEFT || action == ACTION_RIGHT)
        return go_along(ui, action == ACTION_LEFT ? -1 : 1);
    if (action == ACTION_HOME || action == ACTION_END)
        return go_along(ui, action == ACTION_HOME ? -WALK_MAX : WALK_MAX);
    if (action == ACTION_UP || action == ACTION_DOWN)
        return go_across(ui, action == ACTION_UP ? -1 : 1);
    if (action == ACTION_PAGE_UP && ui->choice.z > 1)
        ui_select(ui, ui->choice.z - 1);
    else if (action == ACTION_PAGE_DOWN && ui->choice.z < Z_MAX)
        ui_select(ui, ui->choice.z + 1);
    else
        return EFFECT_NONE;
    return EFFECT_REDRAW;
}

const struct screen_ops screen_trend = {"Trend", update, draw};
