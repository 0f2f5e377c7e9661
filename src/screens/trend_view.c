/* SPDX-License-Identifier: MIT */
#include "screens/trend_view.h"

#include <math.h>
#include <stdlib.h>
#include <string.h>

#include "canvas/plot.h"
#include "screens/trend_layout.h"
#include "screens/trend_marks.h"
#include "screens/trend_table.h"

#define LOG_FROM 20.0 /* ratio of highest to lowest that asks for it */
#define LABEL_MAX 16
#define BAR 0x2502
#define RULE_LEVEL 0x2500

int screen_trend_models(const struct session *session,
                        const struct model *models[])
{
    int count = 0;
    for (int m = 0; m < model_count() && count < TREND_MODELS_MAX; m++)
        if (!(session->choice.hidden_models >> m & 1u) &&
            model_gives(model_at(m), session->choice.quantity))
            models[count++] = model_at(m);
    return count;
}

bool screen_trend_is_fresh(const struct session *session,
                           const struct trend_view *view)
{
    return view->choice_version == session->choice_version &&
           view->solved_version == session->solved_version;
}

static bool same_walk(const struct walk *a, const struct walk *b)
{
    return a->kind == b->kind && a->count == b->count &&
           memcmp(a->steps, b->steps, (size_t)a->count * sizeof a->steps[0]) ==
               0;
}

void screen_trend_refresh(const struct session *session,
                          struct trend_view *view)
{
    const struct choice *c = &session->choice;
    const struct model *models[TREND_MODELS_MAX];
    struct walk walk;
    struct ask ask;
    walk_fill(&walk, c->walk, c->z, c->charge);
    if (screen_trend_is_fresh(session, view) &&
        same_walk(&walk, &view->trend.walk))
        return;
    view->trend.walk = walk;
    (void)session_ask(session, c->z, c->charge, &ask);
    int count = screen_trend_models(session, models);
    trend_fill(&view->trend, session->study, &ask, models, count);
    view->choice_version = session->choice_version;
    view->solved_version = session->solved_version;
}

void screen_trend_want(struct session *session)
{
    const struct choice *c = &session->choice;
    const struct model *models[TREND_MODELS_MAX];
    struct walk walk;
    int count = screen_trend_models(session, models);
    walk_fill(&walk, c->walk, c->z, c->charge);
    for (int m = count - 1; m >= 0; m--)
        for (int i = walk.count - 1; i >= 0; i--)
            session_want(session, walk.steps[i].z, walk.steps[i].charge,
                         models[m], true);
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

static bool is_log(const struct session *session, struct range r)
{
    bool can = r.any && r.low > 0.0;
    if (session->choice.axis == VALUE_AXIS_AUTO)
        return can && r.high / r.low >= LOG_FROM;
    return can && session->choice.axis == VALUE_AXIS_LOG;
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
static bool open_plot(struct plot *plot, const struct session *session,
                      const struct trend_view *view, struct canvas *canvas,
                      struct area area, struct plot_axis up)
{
    const struct trend *t = &view->trend;
    int n = t->walk.count;
    struct plot_axis level = {
        .title = "", .low = -0.5, .high = n - 0.5, .whole = true};
    enum plot_style style = session->choice.braille ? PLOT_BRAILLE : PLOT_BLOCK;
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
    return set->against ? MARK_SECOND
           : screen_trend_unmeasured(set->values[step].evidence)
               ? MARK_UNMEASURED
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
        screen_trend_role(model),
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
static void draw_values(const struct session *session,
                        const struct trend_view *view, struct canvas *canvas,
                        struct area area, int at)
{
    const struct trend *t = &view->trend;
    struct plot_point points[TREND_MODELS_MAX][WALK_MAX];
    struct plot_point stored[WALK_MAX];
    struct plot plot;
    char title[SESSION_TEXT_MAX];
    struct range r = value_range(t);
    int n = t->walk.count;
    bool log = is_log(session, r);
    const struct quantity *q = quantity_at(t->quantity);
    snprintf(title, sizeof title, "%s, %s%s", q->title, t->unit->id,
             log ? " (logarithmic)" : "");
    if (!r.any) {
        canvas_text(canvas, area.row, area.column, area.columns, ROLE_GAP,
                    "no number along this walk");
        return;
    }
    if (!open_plot(&plot, session, view, canvas, area, axis_of(r, log, title)))
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
        plot_marks(&plot, screen_trend_role(t->series[s].model),
                   screen_trend_mark(t->series[s].model), points[s], n);
    for (int s = 0; s < t->set_count; s++)
        draw_stored(&plot, &t->sets[s], n);
    for (int s = 0; s < t->series_count; s++)
        draw_name(&plot, screen_trend_role(t->series[s].model),
                  screen_trend_mark(t->series[s].model), t->series[s].model->id,
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
static void draw_residuals(const struct session *session,
                           const struct trend_view *view, struct canvas *canvas,
                           struct area area, int at)
{
    const struct trend *t = &view->trend;
    struct plot_point points[WALK_MAX];
    struct plot plot;
    char title[SESSION_TEXT_MAX];
    int n = t->walk.count;
    bool percent = session->choice.percent;
    struct range r = residual_range(t, percent);
    snprintf(title, sizeof title, "model - reference, %s",
             percent ? "% of the reference" : t->unit->id);
    if (!r.any) {
        canvas_textf(canvas, area.row, area.column, area.columns, ROLE_GAP,
                     "%s: no residual along this walk", title);
        return;
    }
    if (!open_plot(&plot, session, view, canvas, area,
                   axis_of(r, false, title)))
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
                plot_marks(
                    &plot,
                    sets ? ROLE_HEADING : screen_trend_role(t->series[s].model),
                    sets ? MARK_SECOND : screen_trend_mark(t->series[s].model),
                    points, n);
        }
    plot_level(&plot, ROLE_QUIET, 0.0);
    plot_upright(&plot, ROLE_QUIET, at);
}

void screen_trend_draw(const struct session *session, struct trend_view *view,
                       struct canvas *canvas, struct area area)
{
    screen_trend_refresh(session, view);
    const struct trend *t = &view->trend;
    int at = walk_place(&t->walk, session->choice.z, session->choice.charge);
    struct trend_layout l = screen_trend_layout(area);
    draw_values(session, view, canvas, l.values, at);
    if (l.residuals.rows > 0)
        draw_residuals(session, view, canvas, l.residuals, at);
    if (l.full)
        screen_trend_table_draw(session, &view->trend, canvas, l.table, at);
    else
        screen_trend_lines_draw(session, &view->trend, canvas, l.table, at);
}
