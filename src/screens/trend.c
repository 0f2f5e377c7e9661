/* SPDX-License-Identifier: MIT */
/* The screen Trend. */
#include "base/text.h"
#include "screens/list.h"
#include "screens/trend_view.h"
#include "session/command.h"
#include "session/rows.h"
#include "session/site.h"

struct trend_state {
    struct trend_view view;
};

/* What is shown, along what, in words. */
static void draw_title(const struct session *session, const struct trend *trend,
                       struct canvas *canvas)
{
    char buffer[SESSION_TEXT_MAX];
    char label[SUBSHELL_TEXT_MAX];
    struct text t = text_over(buffer, sizeof buffer);
    const struct choice *c = &session->choice;
    const struct quantity *q = quantity_at(c->quantity);
    text_addf(&t, "Trend   %s, %s   %s", q->title, trend->unit->id,
              walk_words(c->walk));
    if (c->walk < WALK_CHARGES)
        text_addf(&t, c->charge ? "   charge %+d" : "   neutral", c->charge);
    if (c->walk == WALK_ISOELECTRONIC)
        text_addf(&t, " of %d electrons", c->z - c->charge);
    if (q->per_subshell)
        text_addf(&t, "   %s",
                  c->n ? subshell_print(c->n, c->l, label) : "outermost");
    for (int s = 0; s < trend->set_count; s++) {
        text_addf(&t, "%s%s", s ? ", " : "   ", trend->sets[s].provenance->id);
        session_asked_site(session, trend->sets[s].provenance, &t);
    }
    canvas_text(canvas, 0, 0, canvas->columns, ROLE_TITLE, buffer);
}

static void draw(struct session *session, void *state, struct canvas *canvas)
{
    struct trend_state *own = state;
    struct area area = {1, 0, canvas->rows - 3, canvas->columns};
    screen_trend_draw(session, &own->view, canvas, area);
    draw_title(session, &own->view.trend, canvas);
}

/* The trend stays what it is, whatever the charge: only the selection goes
 * along it. */
static void go_along(struct session *session, struct trend_view *view, int by)
{
    const struct walk *w = &view->trend.walk;
    bool fresh = screen_trend_is_fresh(session, view);
    int at = walk_place(w, session->choice.z, session->choice.charge) + by;
    if (at < 0)
        at = 0;
    if (at >= w->count)
        at = w->count - 1;
    session_select_species(session, w->steps[at].z, w->steps[at].charge);
    if (fresh)
        view->choice_version = session->choice_version;
}

/* To the walk beside this one. */
static void go_across(struct session *session, int by)
{
    const struct choice *c = &session->choice;
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
    if (z >= 1 && z <= Z_MAX && session_ask(session, z, charge, &ask))
        session_select_species(session, z, charge);
}

static enum effect move(struct session *session, void *state, enum move move)
{
    struct trend_view *view = &((struct trend_state *)state)->view;
    int z = session->choice.z;
    screen_trend_refresh(session, view);
    if (move == MOVE_LEFT || move == MOVE_RIGHT)
        go_along(session, view, move == MOVE_LEFT ? -1 : 1);
    else if (move == MOVE_HOME || move == MOVE_END)
        go_along(session, view, move == MOVE_HOME ? -WALK_MAX : WALK_MAX);
    else if (move == MOVE_UP || move == MOVE_DOWN)
        go_across(session, move == MOVE_UP ? -1 : 1);
    else if (move == MOVE_PAGE_UP && z > 1)
        session_select(session, z - 1);
    else if (move == MOVE_PAGE_DOWN && z < Z_MAX)
        session_select(session, z + 1);
    return EFFECT_REDRAW;
}

static void wants(struct session *session, void *state)
{
    (void)state;
    screen_trend_want(session);
    session_want_selected(session);
}

static enum effect turn_percent(struct session *session, void *state)
{
    (void)state;
    session->choice.percent = !session->choice.percent;
    return EFFECT_REDRAW;
}

/* Told in words too: where the values leave no choice nothing is seen. */
static enum effect turn_axis(struct session *session, void *state)
{
    static const char *const words[VALUE_AXIS_COUNT] = {
        [VALUE_AXIS_AUTO] = "as the values ask for",
        [VALUE_AXIS_LINEAR] = "linear",
        [VALUE_AXIS_LOG] = "logarithmic where all values are above zero",
    };
    (void)state;
    struct choice *c = &session->choice;
    c->axis = (enum value_axis)((c->axis + 1) % VALUE_AXIS_COUNT);
    session_report(session, false, "axis: %s", words[c->axis]);
    return EFFECT_REDRAW;
}

static const struct key_row keys[] = {
    {50, 'b', 0, "b", "curves", "choose which models have a curve", true, 0, 0,
     &screen_trend_choose_curves, 0, 0},
    {70, 'z', 0, "z", "walk",
     "along period, group, row of the block, charges, isoelectronic "
     "series",
     true, 0, 0, &screen_trend_choose_walk, 0, 0},
    {90, 'v', 0, "v", "%",
     "residuals in the unit or in per cent of the reference", true, 0,
     turn_percent, 0, 0, 0},
    {100, 'g', 0, "g", "axis",
     "linear or logarithmic axis, or as the values ask for", true, 0, turn_axis,
     0, 0, 0},
};

static void export_file(const struct session *session, const void *state,
                        struct text *t)
{
    (void)state;
    text_addf(t, "trend-%s.csv", quantity_at(session->choice.quantity)->id);
}

static int export_lacks(struct session *session, void *state)
{
    struct trend_state *own = state;
    const struct trend *trend = &own->view.trend;
    int count = 0;
    screen_trend_refresh(session, &own->view);
    for (int i = 0; i < trend->walk.count; i++)
        for (int m = 0; m < trend->series_count; m++)
            count += session_lacks(session, trend->walk.steps[i].z,
                                   trend->walk.steps[i].charge,
                                   trend->series[m].model);
    return count;
}

/* Every step of the trend under every model that has a curve. */
static bool collect(const struct session *session, const struct trend *trend,
                    struct rows *rows, struct status *st)
{
    for (int i = 0; i < trend->walk.count; i++) {
        const struct walk_step *step = &trend->walk.steps[i];
        struct ask ask;
        if (!session_ask(session, step->z, step->charge, &ask))
            continue;
        ask.model = NULL;
        if (trend->series_count == 0 &&
            !session_rows_add(session, rows, &ask, st))
            return false;
        for (int m = 0; m < trend->series_count; m++) {
            ask.model = trend->series[m].model;
            if (!session_rows_add(session, rows, &ask, st))
                return false;
        }
    }
    return true;
}

static bool export_report(struct session *session, void *state, unsigned parts,
                          struct report *report, struct status *st)
{
    struct trend_state *own = state;
    struct rows rows = {0};
    screen_trend_refresh(session, &own->view);
    bool ok = collect(session, &own->view.trend, &rows, st);
    return session_rows_report(&rows, ok, parts, report, st);
}

/* The words that choose the steps of a walk. */
static void add_walk(const struct session *session, const struct trend *trend,
                     struct text *t)
{
    const struct choice *c = &session->choice;
    const struct element *e = element_at(c->z);
    int lead = e->block == 'd' ? 1 : e->block == 'f' ? 2 : 0;
    if (c->walk == WALK_PERIOD)
        text_addf(t, " period:%d", e->period);
    else if (c->walk == WALK_BLOCK)
        text_addf(t, " block:%d%c", e->period - lead, e->block);
    else if (c->walk == WALK_ISOELECTRONIC)
        text_addf(t, " electrons:%d", c->z - c->charge);
    else if (c->walk == WALK_CHARGES)
        text_addf(t, " %s --charge all", e->symbol);
    else if (e->group)
        text_addf(t, " group:%d", e->group);
    else
        for (int i = 0; i < trend->walk.count; i++)
            text_addf(t, " %s", element_at(trend->walk.steps[i].z)->symbol);
    if (c->charge && c->walk < WALK_CHARGES)
        text_addf(t, " --charge %d", c->charge);
}

static void export_command(struct session *session, void *state, struct text *t)
{
    const struct trend *trend = &((struct trend_state *)state)->view.trend;
    bool ions = false;
    for (int i = 0; i < trend->walk.count; i++) {
        const struct walk_step *step = &trend->walk.steps[i];
        if (session_is_own(session, step->z, step->charge))
            return;
        ions = ions || step->charge != 0;
    }
    text_add(t, "outershell list");
    add_walk(session, trend, t);
    session_command_quantity(session, t);
    for (int m = 0; m < trend->series_count; m++)
        text_addf(t, "%s%s", m ? "," : " --model ", trend->series[m].model->id);
    if (trend->series_count == 0 &&
        quantity_at(session->choice.quantity)->modelled)
        text_add(t, " --model none");
    session_command_choices(session, t, ions, true);
    session_command_units(session, t);
    session_command_data(session, t);
}

static const struct export_ops exports[] = {{
    .label = "the trend",
    .file = export_file,
    .lacks = export_lacks,
    .report = export_report,
    .command = export_command,
}};

const struct screen_ops screen_trend = {
    .id = "trend",
    .title = "Trend",
    .state_size = sizeof(struct trend_state),
    .key = {190, 't', 0, "t", "trend",
            "the quantity along a period, a group, charges", true, 0, 0, 0, 0,
            0},
    .groups = KEYS_QUANTITY | KEYS_SPECIES | KEYS_CHARGE | KEYS_UNIT |
              KEYS_SECOND | KEYS_CONFIGURATION | KEYS_SITE | KEYS_CURVES |
              KEYS_SIDEWAYS,
    .keys = keys,
    .key_count = sizeof keys / sizeof keys[0],
    .exports = exports,
    .export_count = 1,
    .draw = draw,
    .move = move,
    .wants = wants,
};
