/* SPDX-License-Identifier: MIT */
/* The screen Audit: how large the residuals of each model are, and where;
 * model against reference as a scatter whose species can be reached. */
#include <string.h>

#include "base/text.h"
#include "canvas/flow.h"
#include "report/audit.h"
#include "screens/audit_internal.h"
#include "screens/audit_layout.h"
#include "screens/list.h"
#include "screens/trend_marks.h"
#include "session/command.h"
#include "session/rows.h"
#include "session/site.h"

#define LABEL_COLUMNS 15

static const char *const statistic_names[STATISTIC_KINDS] = {
    [STATISTIC_MEAN_ABSOLUTE] = "mean size",
    [STATISTIC_PERCENT] = "mean size, %",
    [STATISTIC_MEAN] = "mean",
    [STATISTIC_RMS] = "RMS",
    [STATISTIC_LARGEST] = "largest",
    [STATISTIC_COUNTS] = "residuals/gaps",
};

static void clear(void *state)
{
    struct audit_state *own = state;
    audit_clear(&own->audit);
}

/* All models over all elements at the chosen charge. */
static bool fill(const struct session *session, struct audit *audit,
                 struct status *st)
{
    for (int m = 0; m < model_count(); m++) {
        if (!model_gives(model_at(m), session->choice.quantity))
            continue;
        for (int z = 1; z <= Z_MAX; z++) {
            struct ask ask;
            if (!session_ask(session, z, session->choice.charge, &ask))
                continue;
            ask.model = model_at(m);
            ask.configuration = NULL; /* ground states alone are judged */
            struct row row = study_row(session->study, &ask);
            if (!audit_add(audit, &row, st))
                return false;
        }
    }
    return true;
}

/* Brings the audit up to date. */
static bool refresh(const struct session *session, struct audit_state *own,
                    struct status *st)
{
    if (own->choice_version == session->choice_version &&
        own->solved_version == session->solved_version)
        return true;
    audit_clear(&own->audit);
    if (!fill(session, &own->audit, st))
        return false;
    own->choice_version = session->choice_version;
    own->solved_version = session->solved_version;
    return true;
}

/* The same; a failure is told to the user. */
static void look(struct session *session, struct audit_state *own)
{
    struct status st = status_ok();
    if (!refresh(session, own, &st))
        session_report(session, true, "%s", st.message);
}

static int part_place(const struct audit_state *own,
                      const struct audit_part *parts, int count)
{
    for (int i = 0; i < count; i++)
        if (parts[i].scope == own->part.scope &&
            parts[i].value == own->part.value)
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
static void draw_heads(const struct session *session,
                       const struct audit_state *own, struct canvas *canvas,
                       const struct audit_layout *l)
{
    const struct audit_series *chosen = screen_audit_chosen(session, own);
    for (int i = 0; i < own->audit.count; i++) {
        const struct audit_series *s = &own->audit.series[i];
        const struct model *model = model_find(s->value->id);
        int row = l->table.row + (l->cell_columns < 13 ? i % 2 : 0);
        int column = l->table.column + LABEL_COLUMNS + i * l->cell_columns;
        canvas_put(canvas, row, column, screen_trend_role(model),
                   screen_trend_mark(model));
        canvas_textf(canvas, row, column + 1, 14,
                     s == chosen ? ROLE_TITLE : screen_trend_role(model),
                     "%s%s", s->value->id,
                     s->like_with_like || !s->reference ? "" : "\xE2\x89\xA0");
    }
}

static void draw_part(const struct session *session,
                      const struct audit_state *own, struct canvas *canvas,
                      const struct audit_layout *l, int row,
                      struct audit_part part, bool chosen)
{
    char text[SESSION_TEXT_MAX];
    struct text t = text_over(text, sizeof text);
    const struct audit_series *model = screen_audit_chosen(session, own);
    part_text(part, &t);
    canvas_textf(canvas, row, l->table.column, LABEL_COLUMNS,
                 chosen ? ROLE_CHOSEN : ROLE_TEXT, "%s%-13s",
                 chosen ? ">" : " ", text);
    for (int i = 0; i < own->audit.count; i++) {
        const struct audit_series *s = &own->audit.series[i];
        struct audit_rank rank =
            audit_rank(&own->audit, s->quantity, s->reference, part);
        bool best = rank.count > 1 && rank.species > 1 && rank.series[0] == i;
        int column = l->table.column + LABEL_COLUMNS + i * l->cell_columns;
        cell_text(s, part, own->statistic, text, sizeof text);
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

static void draw_table(struct session *session, struct audit_state *own,
                       struct canvas *canvas, const struct audit_layout *l)
{
    struct audit_part parts[AUDIT_PARTS_MAX];
    int count = audit_parts(&own->audit, session->choice.quantity, 0, parts);
    int at = part_place(own, parts, count);
    int heads = l->cell_columns < 13 ? 2 : 1;
    int room = l->table.rows - heads;
    int first = at >= room ? at - room + 1 : 0;
    draw_heads(session, own, canvas, l);
    for (int i = 0; i < room && first + i < count; i++) {
        int row = l->table.row + heads + i;
        bool chosen = first + i == at;
        draw_part(session, own, canvas, l, row, parts[first + i], chosen);
        if (chosen && !own->points) {
            canvas->cursor_row = row;
            canvas->cursor_column = l->table.column;
        }
    }
}

/* The chosen figures in words. */
static void summary_text(const struct audit_state *own,
                         const struct audit_series *s, struct text *t)
{
    char number[NUMBER_TEXT_MAX];
    char ion[ION_TEXT_MAX];
    struct summary sum = audit_summary(s, own->part);
    int places = s->unit->decimals;
    text_addf(t, "%s, ", s->value->id);
    part_text(own->part, t);
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
    text_addf(
        t, " %s (%s)", s->unit->id,
        ion_print_at(sum.largest_z, sum.largest_charge, sum.largest_site, ion));
}

static void rank_text(const struct audit_state *own,
                      const struct audit_series *s, struct text *t)
{
    char number[NUMBER_TEXT_MAX];
    struct audit_rank rank =
        audit_rank(&own->audit, s->quantity, s->reference, own->part);
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
                  own->audit.series[rank.series[i]].value->id,
                  number_print_places(rank.mean_absolute[i], s->unit->decimals,
                                      number));
    text_addf(t, " %s", s->unit->id);
}

static void draw_words(const struct session *session,
                       const struct audit_state *own, struct canvas *canvas,
                       struct area a)
{
    char text[2 * SESSION_TEXT_MAX];
    struct text t = text_over(text, sizeof text);
    struct flow flow = {canvas, a, 0, 0};
    const struct audit_series *s = screen_audit_chosen(session, own);
    if (!s)
        return;
    summary_text(own, s, &t);
    flow_text(&flow, ROLE_TEXT, 0, text);
    t = text_over(text, sizeof text);
    rank_text(own, s, &t);
    if (t.length > 0)
        flow_text(&flow, ROLE_TEXT, 0, text);
    if (s->like_with_like || !s->reference)
        return;
    t = text_over(text, sizeof text);
    text_addf(&t,
              "\xE2\x89\xA0 not like with like: the model gives %s; the "
              "reference is %s",
              provenance_definition(s->value),
              provenance_definition(s->reference));
    flow_text(&flow, ROLE_CAUTION, 0, text);
}

static void draw_title(const struct session *session,
                       const struct audit_state *own, struct canvas *canvas)
{
    char text[SESSION_TEXT_MAX];
    struct text t = text_over(text, sizeof text);
    const struct choice *c = &session->choice;
    const struct audit_series *s = screen_audit_chosen(session, own);
    const struct quantity *q = quantity_at(c->quantity);
    text_addf(&t, "Audit   %s", q->title);
    if (s && own->statistic != STATISTIC_PERCENT &&
        own->statistic != STATISTIC_COUNTS)
        text_addf(&t, ", %s", s->unit->id);
    text_addf(&t, ": %s   ", statistic_names[own->statistic]);
    if (c->charge)
        text_addf(&t, "charge %+d   ", c->charge);
    if (c->evidence)
        for (int e = 0; e < EVIDENCE_COUNT; e++)
            if (c->evidence >> e & 1u)
                text_addf(&t, "%s alone   ", evidence_id((enum evidence)e));
    if (s && s->reference) {
        text_add(&t, s->reference->id);
        session_asked_site(session, s->reference, &t);
    }
    canvas_text(canvas, 0, 0, canvas->columns, ROLE_TITLE, text);
}

static void draw(struct session *session, void *state, struct canvas *canvas)
{
    struct audit_state *own = state;
    look(session, own);
    draw_title(session, own, canvas);
    if (own->audit.count == 0) {
        canvas_textf(canvas, 2, 0, canvas->columns, ROLE_GAP,
                     "no model computes %s; w chooses another quantity",
                     quantity_at(session->choice.quantity)->title);
        return;
    }
    struct audit_layout l =
        screen_audit_layout(canvas->rows, canvas->columns, own->audit.count);
    if (l.scatter.rows > 0) {
        draw_table(session, own, canvas, &l);
        screen_audit_scatter_draw(session, own, canvas, l.scatter);
        screen_audit_outliers_draw(session, own, canvas, l.points);
    } else if (own->points) {
        screen_audit_outliers_draw(session, own, canvas, l.table);
    } else {
        draw_table(session, own, canvas, &l);
    }
    draw_words(session, own, canvas, l.words);
}

static void move_part(struct session *session, struct audit_state *own, int by)
{
    struct audit_part parts[AUDIT_PARTS_MAX];
    int count = audit_parts(&own->audit, session->choice.quantity, 0, parts);
    int at = part_place(own, parts, count) + by;
    if (count == 0)
        return;
    at = at < 0 ? 0 : at >= count ? count - 1 : at;
    own->part = parts[at];
    own->point = 0;
}

static void move_model(struct session *session, struct audit_state *own, int by)
{
    const struct audit_series *chosen = screen_audit_chosen(session, own);
    if (!chosen)
        return;
    int to = (int)(chosen - own->audit.series) + by;
    if (to < 0 || to >= own->audit.count)
        return;
    session->choice.model = model_find(chosen[by].value->id);
    session_touch(session);
    own->point = 0;
}

static void move_point(struct session *session, struct audit_state *own, int by)
{
    const struct audit_point *points[Z_MAX];
    int count =
        screen_audit_outliers(own, screen_audit_chosen(session, own), points);
    int at = own->point + by;
    at = at >= count ? count - 1 : at;
    own->point = at < 0 ? 0 : at;
}

static enum effect open_point(struct session *session, void *state)
{
    struct audit_state *own = state;
    look(session, own);
    const struct audit_point *points[Z_MAX];
    int count =
        screen_audit_outliers(own, screen_audit_chosen(session, own), points);
    if (count == 0)
        return EFFECT_REDRAW;
    if (!own->points) {
        own->points = true;
        own->point = 0;
        return EFFECT_REDRAW;
    }
    const struct audit_point *p =
        points[own->point < count ? own->point : count - 1];
    session_select_species(session, p->z, p->charge);
    session_go(session, "map");
    session->detail = true;
    return EFFECT_REDRAW;
}

static enum effect move(struct session *session, void *state, enum move move)
{
    struct audit_state *own = state;
    int page = session->rows > 12 ? session->rows - 10 : 2;
    int by = move == MOVE_UP          ? -1
             : move == MOVE_DOWN      ? 1
             : move == MOVE_PAGE_UP   ? -page
             : move == MOVE_PAGE_DOWN ? page
             : move == MOVE_HOME      ? -AUDIT_PARTS_MAX
             : move == MOVE_END       ? AUDIT_PARTS_MAX
                                      : 0;
    look(session, own);
    if (by == 0)
        move_model(session, own, move == MOVE_LEFT ? -1 : 1);
    else if (own->points)
        move_point(session, own, by);
    else
        move_part(session, own, by);
    return EFFECT_REDRAW;
}

static bool back(struct session *session, void *state)
{
    struct audit_state *own = state;
    bool was = own->points;
    (void)session;
    own->points = false;
    return was;
}

static void wants(struct session *session, void *state)
{
    (void)state;
    for (int m = 0; m < model_count(); m++)
        for (int z = 1; z <= Z_MAX; z++)
            session_want(session, z, session->choice.charge, model_at(m),
                         false);
    session_want_selected(session);
}

static enum effect turn_statistic(struct session *session, void *state)
{
    struct audit_state *own = state;
    (void)session;
    own->statistic = (enum statistic)((own->statistic + 1) % STATISTIC_KINDS);
    return EFFECT_REDRAW;
}

static const struct key_row keys[] = {
    {110, 'v', 0, "v", "figure",
     "mean size, per cent, mean, root mean square, largest, or counts", true, 0,
     turn_statistic, 0, 0, 0},
    {380, 0, KEY_CODE_ENTER, "Enter", "open",
     "to the species of the part, then to the selected one on the map", true, 0,
     open_point, 0, 0, 0},
};

static void export_file(const struct session *session, const void *state,
                        struct text *t)
{
    (void)state;
    text_addf(t, "audit-%s.csv", quantity_at(session->choice.quantity)->id);
}

static int export_lacks(struct session *session, void *state)
{
    (void)state;
    int count = 0;
    for (int z = 1; z <= Z_MAX; z++)
        count += session_lacks_models(session, z, session->choice.charge);
    return count;
}

static bool export_report(struct session *session, void *state, unsigned parts,
                          struct report *report, struct status *st)
{
    struct audit_state *own = state;
    if (!refresh(session, own, st))
        return false;
    report_audit(report, parts, &own->audit, 0);
    return true;
}

static void export_command(struct session *session, void *state, struct text *t)
{
    (void)state;
    text_add(t, "outershell audit");
    session_command_quantity(session, t);
    if (session->choice.charge)
        text_addf(t, " --charge %d", session->choice.charge);
    session_command_choices(session, t, session->choice.charge != 0, false);
    session_command_units(session, t);
    session_command_data(session, t);
}

static const struct export_ops exports[] = {{
    .label = "the audit",
    .file = export_file,
    .lacks = export_lacks,
    .report = export_report,
    .command = export_command,
}};

const struct screen_ops screen_audit = {
    .id = "audit",
    .title = "Audit",
    .state_size = sizeof(struct audit_state),
    .key = {220, 'd', 0, "d", "audit",
            "how large the residuals of each model are, and where", true, 0, 0,
            0, 0, 0},
    .groups =
        KEYS_QUANTITY | KEYS_MODEL | KEYS_CHARGE | KEYS_UNIT | KEYS_SIDEWAYS,
    .keys = keys,
    .key_count = sizeof keys / sizeof keys[0],
    .exports = exports,
    .export_count = 1,
    .clear = clear,
    .draw = draw,
    .move = move,
    .back = back,
    .wants = wants,
};
