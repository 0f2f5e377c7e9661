/* SPDX-License-Identifier: MIT */
/* Model against reference, one mark per species, and the species themselves.
 */
#include "screens/audit_internal.h"

#include <math.h>
#include <string.h>

#include "canvas/plot.h"
#include "screens/trend_marks.h"

#define LOG_FROM 20.0
#define DIAGONAL_POINTS 48
#define MARK_CURSOR 0x25CE

const struct audit_series *screen_audit_chosen(const struct session *session,
                                               const struct audit_state *own)
{
    for (int i = 0; i < own->audit.count; i++)
        if (session->choice.model && strcmp(own->audit.series[i].value->id,
                                            session->choice.model->id) == 0)
            return &own->audit.series[i];
    return NULL;
}

int screen_audit_outliers(const struct audit_state *own,
                          const struct audit_series *series,
                          const struct audit_point *points[Z_MAX])
{
    int count = 0;
    for (int i = 0; series && i < series->count && count < Z_MAX; i++) {
        const struct audit_point *p = &series->points[i];
        if (p->state != ROW_OK || !audit_holds(own->part, p))
            continue;
        int at = count++;
        for (; at > 0 && fabs(points[at - 1]->residual) < fabs(p->residual);
             at--)
            points[at] = points[at - 1];
        points[at] = p;
    }
    return count;
}

/* One scale for both axes, so that equal values lie on the diagonal. */
static struct plot_axis common_axis(const struct audit_point *const *points,
                                    int count)
{
    struct plot_axis axis = {.title = "reference"};
    double low = fmin(points[0]->value, points[0]->reference);
    double high = low;
    for (int i = 0; i < count; i++) {
        low = fmin(low, fmin(points[i]->value, points[i]->reference));
        high = fmax(high, fmax(points[i]->value, points[i]->reference));
    }
    if (low > 0.0 && high / low >= LOG_FROM) {
        axis.scale = PLOT_LOG;
        axis.low = low / 1.2;
        axis.high = high * 1.2;
        return axis;
    }
    double span = high > low ? high - low : fmax(fabs(high), 1.0);
    double step = plot_round_up(span / 6.0);
    axis.low = floor(low / step) * step;
    axis.high = ceil(high / step) * step;
    if (axis.high <= axis.low)
        axis.high = axis.low + step;
    return axis;
}

static void draw_diagonal(const struct plot *plot)
{
    struct plot_point points[DIAGONAL_POINTS];
    struct plot_line line = {ROLE_QUIET, PLOT_DOTTED, '.'};
    for (int i = 0; i < DIAGONAL_POINTS; i++) {
        double v = plot_value(&plot->x, i / (DIAGONAL_POINTS - 1.0));
        points[i] = (struct plot_point){v, v, true};
    }
    plot_curve(plot, line, points, DIAGONAL_POINTS);
}

void screen_audit_scatter_draw(const struct session *session,
                               const struct audit_state *own,
                               struct canvas *canvas, struct area area)
{
    const struct audit_point *points[Z_MAX];
    const struct audit_series *s = screen_audit_chosen(session, own);
    char title[SESSION_TEXT_MAX];
    char ion[ION_TEXT_MAX];
    struct plot plot;
    int count = screen_audit_outliers(own, s, points);
    if (count == 0) {
        canvas_text(canvas, area.row, area.column, area.columns, ROLE_GAP,
                    "no residual here");
        return;
    }
    struct plot_axis axis = common_axis(points, count);
    struct plot_axis up = axis;
    snprintf(title, sizeof title, "%s, %s", s->value->id, s->unit->id);
    up.title = title;
    enum plot_style style = session->choice.braille ? PLOT_BRAILLE : PLOT_BLOCK;
    if (!plot_open(&plot, canvas, area, style, axis, up))
        return;
    draw_diagonal(&plot);
    const struct model *model = model_find(s->value->id);
    for (int i = count - 1; i >= 0; i--) {
        struct plot_point at = {points[i]->reference, points[i]->value, true};
        plot_marks(&plot, screen_trend_role(model), screen_trend_mark(model),
                   &at, 1);
    }
    int chosen = own->point < count ? own->point : count - 1;
    const struct audit_point *p = points[chosen];
    struct plot_point at = {p->reference, p->value, true};
    plot_marks(&plot, ROLE_CHOSEN, MARK_CURSOR, &at, 1);
    (void)plot_label(&plot, ROLE_TITLE, at.x, at.y,
                     ion_print_at(p->z, p->charge, p->site, ion));
}

static void draw_outlier(struct canvas *canvas, struct area a, int row,
                         const struct audit_series *s,
                         const struct audit_point *p, bool chosen)
{
    char ion[ION_TEXT_MAX];
    char value[NUMBER_TEXT_MAX];
    char reference[NUMBER_TEXT_MAX];
    char residual[NUMBER_TEXT_MAX];
    int places = s->unit->decimals;
    enum role sign = p->residual < 0 ? ROLE_BELOW : ROLE_ABOVE;
    canvas_textf(canvas, row, a.column, a.columns,
                 chosen ? ROLE_CHOSEN : ROLE_TEXT, "%s%-5s", chosen ? ">" : " ",
                 ion_print_at(p->z, p->charge, p->site, ion));
    number_fit(p->residual, places, 8, residual);
    canvas_right(canvas, row, a.column + 6, 10, sign, residual);
    if (p->residual > 0)
        canvas_put(canvas, row, a.column + 15 - (int)strlen(residual), sign,
                   '+');
    if (p->has_percent && a.columns >= 26)
        canvas_textf(canvas, row, a.column + 16, 10, sign, "%+8.1f%%",
                     p->percent);
    if (a.columns >= 48)
        canvas_textf(canvas, row, a.column + 27, a.columns - 27, ROLE_TEXT,
                     "%9s for %s", number_fit(p->value, places, 9, value),
                     number_fit(p->reference, places, 9, reference));
}

void screen_audit_outliers_draw(const struct session *session,
                                const struct audit_state *own,
                                struct canvas *canvas, struct area area)
{
    const struct audit_point *points[Z_MAX];
    const struct audit_series *s = screen_audit_chosen(session, own);
    int count = screen_audit_outliers(own, s, points);
    int room = area.rows - 1;
    if (count == 0 || room < 1)
        return;
    int at = own->point < count ? own->point : count - 1;
    int first = at >= room ? at - room + 1 : 0;
    canvas_textf(canvas, area.row, area.column, area.columns, ROLE_HEADING,
                 "worst, %s: %s", s->unit->id,
                 own->points ? "Enter opens" : "Enter");
    for (int i = 0; i < room && first + i < count; i++) {
        bool chosen = own->points && first + i == at;
        int row = area.row + 1 + i;
        draw_outlier(canvas, area, row, s, points[first + i], chosen);
        if (chosen) {
            canvas->cursor_row = row;
            canvas->cursor_column = area.column;
        }
    }
}
