/* SPDX-License-Identifier: MIT */
/* The plots of the screen Atom, and the numbers at its cursor. */
#include <math.h>
#include <stdio.h>

#include "base/text.h"
#include "screens/atom_internal.h"

#define SAMPLES_MAX 600
#define TITLE_MAX 80
#define CURSOR_MARK 0x25B2

/* r begins at this part of the radius of the innermost shell, a0/Z, or of the
 * maximum of the chosen subshell, and ends where less than LEFT_OUT electrons
 * are beyond. */
static const double FIRST_PART = 0.05;
static const double NEAR_PART = 0.08;
static const double LEFT_OUT = 1e-3;
static const double HEADROOM = 1.06;

/* Radii (bohr) at which curves are sampled, and a curve in shown units. */
struct samples {
    int count;
    double r[SAMPLES_MAX];
    double value[SAMPLES_MAX];
    struct plot_point points[SAMPLES_MAX];
};

double screen_atom_length(const struct session *session)
{
    return BOHR_PM * session_unit(session, QUANTITY_RADIUS)->per_base;
}

enum role screen_atom_role(int l)
{
    return (enum role)(ROLE_CURVE_1 + l);
}

enum role screen_atom_overlay_role(int l)
{
    return l == 3 ? ROLE_CURVE_2 : ROLE_CURVE_4;
}

double screen_atom_radius(const struct atom_state *own,
                          const struct atom_report *report)
{
    int shell = screen_atom_shell(own, report);
    if (own->radius > 0.0)
        return own->radius;
    return report->subshells[shell < 0 ? report->subshell_count - 1 : shell]
        .peak_radius;
}

struct plot_axis screen_atom_axis(const struct session *session,
                                  const struct atom_state *own,
                                  const struct atom_report *report)
{
    int shell = screen_atom_shell(own, report);
    double first = FIRST_PART / report->species.z;
    double last = run_atom_extent(own->slots[SLOT_CHOSEN].run, LEFT_OUT);
    if (screen_atom_solved(session, own, SLOT_OVER))
        last = fmax(last, run_atom_extent(own->slots[SLOT_OVER].run, LEFT_OUT));
    if (!own->whole && shell >= 0)
        first = NEAR_PART * report->subshells[shell].peak_radius;
    else if (own->root)
        first = 0.0;
    double unit = screen_atom_length(session);
    return (struct plot_axis){
        .title = "",
        .scale = own->root ? PLOT_SQRT : PLOT_LOG,
        .low = first * unit,
        .high = plot_round_up(last * unit),
    };
}

static void sample_radii(const struct session *session,
                         const struct plot_axis *axis, int columns,
                         struct samples *s)
{
    s->count = 2 * columns + 1 < SAMPLES_MAX ? 2 * columns + 1 : SAMPLES_MAX;
    for (int i = 0; i < s->count; i++)
        s->r[i] = plot_value(axis, (double)i / (s->count - 1)) /
                  screen_atom_length(session);
}

/* Values to points; those of a density are per unit of length. */
static void to_points(const struct session *session, struct samples *s,
                      bool density)
{
    double unit = screen_atom_length(session);
    for (int i = 0; i < s->count; i++)
        s->points[i] = (struct plot_point){
            s->r[i] * unit, density ? s->value[i] / unit : s->value[i], true};
}

static double largest(const struct samples *s)
{
    double most = 0.0;
    for (int i = 0; i < s->count; i++)
        most = fmax(most, s->points[i].y);
    return most;
}

static void sample(const struct session *session, const struct atom_state *own,
                   int slot, enum atom_run_curve curve, int shell,
                   struct samples *s)
{
    run_atom_curve(own->slots[slot].run, curve, shell, s->count, s->r,
                   s->value);
    to_points(session, s, curve == RUN_DENSITY);
}

/* The density of the overlay that belongs to the chosen subshell (or to all
 * electrons): false when there is none (yet). */
static bool sample_overlay(const struct session *session,
                           const struct atom_state *own,
                           const struct atom_report *report, struct samples *s)
{
    int shell = screen_atom_shell(own, report);
    const struct atom_report *over =
        screen_atom_solved(session, own, SLOT_OVER);
    const struct orbital_run *orbitals = screen_atom_orbitals(session, own);
    if (orbitals) {
        orbital_run_density(orbitals, shell, s->count, s->r, s->value);
        to_points(session, s, true);
        return true;
    }
    int other = over ? screen_atom_other_shell(report, shell, over) : -2;
    if (other == -2)
        return false;
    sample(session, own, SLOT_OVER, RUN_DENSITY, other, s);
    return true;
}

static void name_axis(const struct session *session, struct plot_axis *axis,
                      char title[TITLE_MAX])
{
    snprintf(title, TITLE_MAX, "r, %s",
             session_unit(session, QUANTITY_RADIUS)->id);
    axis->title = title;
}

/* The cursor: a dotted line, and a mark on the axis. */
static void draw_cursor_line(const struct session *session,
                             const struct atom_state *own,
                             const struct plot *plot,
                             const struct atom_report *report)
{
    int column;
    double r = screen_atom_radius(own, report) * screen_atom_length(session);
    plot_upright(plot, ROLE_TITLE, r);
    if (plot_column(plot, r, &column))
        canvas_put(plot->canvas, plot->inside.row + plot->inside.rows, column,
                   ROLE_TITLE, CURSOR_MARK);
}

/* A label where a curve is highest. */
static void label_top(const struct plot *plot, enum role role,
                      const struct samples *s, const char *text)
{
    int best = 0;
    for (int i = 1; i < s->count; i++)
        if (s->points[i].y > s->points[best].y)
            best = i;
    plot_label(plot, role, s->points[best].x, s->points[best].y, text);
}

static void draw_curve(const struct plot *plot, enum role role,
                       enum plot_pattern pattern, char letter,
                       const struct samples *s)
{
    plot_curve(plot, (struct plot_line){role, pattern, letter}, s->points,
               s->count);
}

static enum plot_style style_of(const struct session *session)
{
    return session->choice.braille ? PLOT_BRAILLE : PLOT_BLOCK;
}

/* The chosen subshell as an area, to whose height the axis is fitted; all
 * electrons as a curve, which may leave it; the overlay dashed. */
static bool draw_shell(const struct session *session,
                       const struct atom_state *own, struct canvas *canvas,
                       struct area area, const struct atom_report *report,
                       struct plot *plot)
{
    struct samples all;
    struct samples one;
    struct samples over;
    char x_title[TITLE_MAX];
    char y_title[TITLE_MAX];
    char label[LEVEL_TEXT_MAX];
    char name[ATOM_LABEL_MAX];
    int shell = screen_atom_shell(own, report);
    struct plot_axis x = screen_atom_axis(session, own, report);
    name_axis(session, &x, x_title);
    sample_radii(session, &x, area.columns, &all);
    sample_radii(session, &x, area.columns, &one);
    sample_radii(session, &x, area.columns, &over);
    sample(session, own, SLOT_CHOSEN, RUN_DENSITY, -1, &all);
    sample(session, own, SLOT_CHOSEN, RUN_DENSITY, shell, &one);
    bool has_over = sample_overlay(session, own, report, &over);
    double high = fmax(largest(&one), has_over ? largest(&over) : 0.0);
    snprintf(y_title, sizeof y_title, "D(r), e/%s",
             session_unit(session, QUANTITY_RADIUS)->id);
    struct plot_axis y = {.title = y_title,
                          .high = plot_round_up(HEADROOM * high)};
    if (!plot_open(plot, canvas, area, style_of(session), x, y))
        return false;
    const struct report_level *level =
        shell < 0 ? NULL : &report->subshells[shell];
    enum role over_role = screen_atom_overlay_role(level ? level->l : -1);
    enum role role = level ? screen_atom_role(level->l) : ROLE_CURVE_5;
    plot_fill(plot, role, one.points, one.count);
    if (level)
        draw_curve(plot, ROLE_CURVE_5, PLOT_SOLID, '*', &all);
    if (has_over)
        draw_curve(plot, over_role, PLOT_DASHED, 'o', &over);
    label_top(plot, role, &one, level ? level_print(level, label) : "all");
    if (has_over)
        label_top(plot, over_role, &over,
                  screen_atom_overlay_name(session, own, report, name));
    return true;
}

/* Curves first, so that none runs over a label. */
static void draw_shells(const struct session *session,
                        const struct atom_state *own, const struct plot *plot,
                        const struct atom_report *report, struct samples *s)
{
    char label[LEVEL_TEXT_MAX];
    int count = report->subshell_count;
    for (int i = count - 1; i >= 0; i--) {
        int l = report->subshells[i].l;
        sample(session, own, SLOT_CHOSEN, RUN_DENSITY, i, s);
        draw_curve(plot, screen_atom_role(l), (enum plot_pattern)(l % 3),
                   subshell_letter(l), s);
    }
    sample(session, own, SLOT_CHOSEN, RUN_DENSITY, -1, s);
    draw_curve(plot, ROLE_CURVE_5, PLOT_SOLID, '*', s);
    for (int i = count - 1; i >= 0; i--) {
        const struct report_level *level = &report->subshells[i];
        sample(session, own, SLOT_CHOSEN, RUN_DENSITY, i, s);
        label_top(plot, screen_atom_role(level->l), s,
                  level_print(level, label));
    }
}

/* Every subshell and all electrons as curves, the chosen subshell as an area
 * as well; on a square-root axis so that outer ones can be seen. */
static bool draw_all(const struct session *session,
                     const struct atom_state *own, struct canvas *canvas,
                     struct area area, const struct atom_report *report,
                     struct plot *plot)
{
    struct samples s;
    char x_title[TITLE_MAX];
    char y_title[TITLE_MAX];
    int shell = screen_atom_shell(own, report);
    struct plot_axis x = screen_atom_axis(session, own, report);
    name_axis(session, &x, x_title);
    sample_radii(session, &x, area.columns, &s);
    sample(session, own, SLOT_CHOSEN, RUN_DENSITY, -1, &s);
    snprintf(y_title, sizeof y_title, "D(r), e/%s; root axis",
             session_unit(session, QUANTITY_RADIUS)->id);
    struct plot_axis y = {.title = y_title,
                          .scale = PLOT_SQRT,
                          .high = plot_round_up(HEADROOM * largest(&s))};
    if (!plot_open(plot, canvas, area, style_of(session), x, y))
        return false;
    if (shell >= 0) {
        sample(session, own, SLOT_CHOSEN, RUN_DENSITY, shell, &s);
        plot_fill(plot, screen_atom_role(report->subshells[shell].l), s.points,
                  s.count);
    }
    draw_shells(session, own, plot, report, &s);
    return true;
}

/* Electrons within r as an area, Z_eff(r) as a curve, on a square-root axis so
 * that the few charges outside can be seen. */
static bool draw_charge(const struct session *session,
                        const struct atom_state *own, struct canvas *canvas,
                        struct area area, const struct atom_report *report,
                        struct plot *plot)
{
    struct samples s;
    char x_title[TITLE_MAX];
    char name[ATOM_LABEL_MAX];
    struct plot_axis x = screen_atom_axis(session, own, report);
    struct plot_axis y = {.title = "e within r (area), Z_eff(r); root axis",
                          .scale = PLOT_SQRT,
                          .high = report->species.z};
    const struct atom_report *over =
        screen_atom_solved(session, own, SLOT_OVER);
    if (over && over->species.z > y.high)
        y.high = over->species.z;
    name_axis(session, &x, x_title);
    if (!plot_open(plot, canvas, area, style_of(session), x, y))
        return false;
    sample_radii(session, &x, area.columns, &s);
    sample(session, own, SLOT_CHOSEN, RUN_ENCLOSED, -1, &s);
    plot_fill(plot, ROLE_CURVE_5, s.points, s.count);
    if (over) {
        sample(session, own, SLOT_OVER, RUN_ZEFF, -1, &s);
        draw_curve(plot, screen_atom_overlay_role(-1), PLOT_DASHED, 'o', &s);
        plot_label(plot, screen_atom_overlay_role(-1), s.points[s.count / 3].x,
                   s.points[s.count / 3].y,
                   screen_atom_overlay_name(session, own, report, name));
    }
    sample(session, own, SLOT_CHOSEN, RUN_ZEFF, -1, &s);
    draw_curve(plot, ROLE_CURVE_1, PLOT_SOLID, '*', &s);
    plot_label(plot, ROLE_CURVE_1, s.points[s.count * 9 / 10].x,
               s.points[s.count * 9 / 10].y, "Z_eff(r)");
    return true;
}

void screen_atom_plots_draw(const struct session *session,
                            struct atom_state *own, struct canvas *canvas,
                            const struct atom_layout *l,
                            const struct atom_report *report)
{
    struct plot plot;
    enum atom_curves curves = own->curves;
    own->has_plot = false;
    if (l->charge.rows > 0 && curves != CURVES_CHARGE) {
        if (draw_charge(session, own, canvas, l->charge, report, &plot))
            draw_cursor_line(session, own, &plot, report);
    }
    struct area area = l->plot;
    if (curves == CURVES_CHARGE)
        area.rows += l->charge.rows;
    own->has_plot =
        curves == CURVES_SHELL
            ? draw_shell(session, own, canvas, area, report, &plot)
        : curves == CURVES_ALL
            ? draw_all(session, own, canvas, area, report, &plot)
            : draw_charge(session, own, canvas, area, report, &plot);
    if (!own->has_plot)
        return;
    draw_cursor_line(session, own, &plot, report);
    own->plot = plot;
}

/* Columns of the numbers at the cursor, from the left of their area. */
enum { LABEL_WIDTH = 12, CURSOR_COLUMNS = 44 };
static const struct {
    int first, width;
} number_columns[] = {{12, 13}, {25, 10}, {35, 9}};

/* One number, as far as the area has room. */
static void draw_cursor_cell(struct canvas *canvas, struct area a, int row,
                             int i, enum role role, const char *text)
{
    int first = number_columns[i].first;
    int width = number_columns[i].width;
    if (first + width > a.columns)
        width = a.columns - first;
    canvas_right(canvas, a.row + row, a.column + first, width, role, text);
}

/* A line of numbers at the cursor; what is not there stays blank. */
struct cursor_line {
    const char *label;
    enum role role;
    double density; /* electrons/bohr */
    bool has_within;
    double within;
    bool has_zeff;
    double zeff;
};

static void draw_cursor_numbers(const struct session *session,
                                struct canvas *canvas, struct area a, int row,
                                const struct cursor_line *line)
{
    char out[32];
    if (row >= a.rows)
        return;
    canvas_text(canvas, a.row + row, a.column, LABEL_WIDTH - 1, line->role,
                line->label);
    snprintf(out, sizeof out, "%.4g",
             line->density / screen_atom_length(session));
    draw_cursor_cell(canvas, a, row, 0, ROLE_TEXT, out);
    snprintf(out, sizeof out, "%.4f", line->within);
    if (line->has_within)
        draw_cursor_cell(canvas, a, row, 1, ROLE_TEXT, out);
    snprintf(out, sizeof out, "%.4f", line->zeff);
    if (line->has_zeff)
        draw_cursor_cell(canvas, a, row, 2, ROLE_TEXT, out);
}

static void draw_cursor_heading(const struct session *session,
                                struct canvas *canvas, struct area a, double r)
{
    char out[SESSION_TEXT_MAX];
    char number[NUMBER_TEXT_MAX];
    const struct unit *unit = session_unit(session, QUANTITY_RADIUS);
    snprintf(out, sizeof out, "%s %s",
             number_print_places(r * screen_atom_length(session),
                                 unit->decimals + 1, number),
             unit->id);
    canvas_text(canvas, a.row, a.column, LABEL_WIDTH, ROLE_TITLE, out);
    snprintf(out, sizeof out, "D, e/%s", unit->id);
    const char *const heads[] = {out, "within, e", "Z_eff(r)"};
    for (int i = 0; i < 3; i++)
        draw_cursor_cell(canvas, a, 0, i, ROLE_HEADING, heads[i]);
}

static struct cursor_line line_of(const struct atom_state *own, int slot,
                                  int shell, double r)
{
    const struct atom_run *run = own->slots[slot].run;
    struct cursor_line line = {.has_within = true, .has_zeff = shell < 0};
    run_atom_curve(run, RUN_DENSITY, shell, 1, &r, &line.density);
    run_atom_curve(run, RUN_ENCLOSED, shell, 1, &r, &line.within);
    run_atom_curve(run, RUN_ZEFF, -1, 1, &r, &line.zeff);
    return line;
}

/* Numbers of all electrons below each other, where the table is too broad. */
static void draw_cursor_narrow(const struct session *session,
                               const struct atom_state *own,
                               struct canvas *canvas, struct area a, double r)
{
    char out[NUMBER_TEXT_MAX];
    const struct unit *unit = session_unit(session, QUANTITY_RADIUS);
    const struct cursor_line line = line_of(own, SLOT_CHOSEN, -1, r);
    const struct {
        const char *name, *unit;
        double value;
    } rows[] = {
        {"r", "", r * screen_atom_length(session)},
        {"D(r)", "e/", line.density / screen_atom_length(session)},
        {"within", "e", line.within},
        {"Z_eff(r)", "e", line.zeff},
    };
    for (int i = 0; i < 4 && i < a.rows; i++) {
        if (i == 1)
            snprintf(out, sizeof out, "%.4g", rows[i].value);
        else
            number_print_places(rows[i].value, i == 0 ? unit->decimals + 1 : 4,
                                out);
        canvas_textf(canvas, a.row + i, a.column, a.columns,
                     i == 0 ? ROLE_TITLE : ROLE_TEXT, "%-8s %10s %s%s",
                     rows[i].name, out, rows[i].unit, i < 2 ? unit->id : "");
    }
}

void screen_atom_cursor_draw(const struct session *session,
                             const struct atom_state *own,
                             struct canvas *canvas, struct area a,
                             const struct atom_report *report)
{
    char ion[ION_TEXT_MAX];
    char label[LEVEL_TEXT_MAX];
    char name[ATOM_LABEL_MAX];
    int shell = screen_atom_shell(own, report);
    double r = screen_atom_radius(own, report);
    int row = 1;
    if (a.rows == 0)
        return;
    if (a.columns < CURSOR_COLUMNS) {
        draw_cursor_narrow(session, own, canvas, a, r);
        return;
    }
    draw_cursor_heading(session, canvas, a, r);
    struct cursor_line line = line_of(own, SLOT_CHOSEN, -1, r);
    line.label = ion_print(report->species.z, report->species.charge, ion);
    line.role = ROLE_CURVE_5;
    draw_cursor_numbers(session, canvas, a, row++, &line);
    if (shell >= 0) {
        line = line_of(own, SLOT_CHOSEN, shell, r);
        line.label = level_print(&report->subshells[shell], label);
        line.role = screen_atom_role(report->subshells[shell].l);
        draw_cursor_numbers(session, canvas, a, row++, &line);
    }
    const struct atom_report *over =
        screen_atom_solved(session, own, SLOT_OVER);
    const struct orbital_run *orbitals = screen_atom_orbitals(session, own);
    if (orbitals) {
        line = (struct cursor_line){0};
        orbital_run_density(orbitals, shell, 1, &r, &line.density);
    } else if (over) {
        int other = screen_atom_other_shell(report, shell, over);
        line = line_of(own, SLOT_OVER, other < 0 ? -1 : other, r);
        line.has_zeff = true;
    } else {
        return;
    }
    line.label = screen_atom_overlay_name(session, own, report, name);
    line.role =
        screen_atom_overlay_role(shell < 0 ? -1 : report->subshells[shell].l);
    draw_cursor_numbers(session, canvas, a, row, &line);
}
