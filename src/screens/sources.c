/* SPDX-License-Identifier: MIT */
/* The screen Sources: what every number rests on: models and data sets with
 * their citations. */
#include <stdio.h>

#include "base/text.h"
#include "canvas/flow.h"
#include "screens/list.h"
#include "study/facts.h"

/* False where memory was short: then a text is not whole. */
static bool flow_source(struct flow *flow, const struct source *s)
{
    const struct provenance *p = s->provenance;
    struct text t = text_growing();
    bool whole = true;
    text_addf(&t, "%s  %s", p->id, p->title);
    flow_text(flow, ROLE_HEADING, 0, t.data);
    whole = whole && !t.cut;
    text_empty(&t);
    text_addf(&t, "%s for %s", p->computed ? "model" : "data set", s->quantity);
    if (s->unit && s->unit[0])
        text_addf(&t, " in %s", s->unit);
    if (s->count)
        text_addf(&t, ", %d values", s->count);
    if (s->domain && s->domain[0])
        text_addf(&t, "; %s", s->domain);
    flow_text(flow, ROLE_TEXT, 2, t.data);
    whole = whole && !t.cut;
    if (p->unsourced)
        flow_text(flow, ROLE_TEXT, 2, p->unsourced);
    for (int i = 0; i < p->citation_count; i++) {
        text_empty(&t);
        citation_text(&t, &p->citations[i], CITATION_FULL);
        flow_text(flow, ROLE_TEXT, 2, t.data);
        whole = whole && !t.cut;
    }
    for (int i = 0; i < s->note_count; i++)
        flow_text(flow, ROLE_QUIET, 4, s->notes[i]);
    flow_blank(flow);
    text_free(&t);
    return whole;
}

struct sources_state {
    int scroll;
};

static void draw(struct session *session, void *state, struct canvas *canvas)
{
    struct sources_state *own = state;
    struct source sources[SOURCES_MAX] = {0};
    struct area area = {1, 1, canvas->rows - 3, canvas->columns - 2};
    struct flow flow = {canvas, area, own->scroll, 0};
    int count = study_sources(session->study, sources, SOURCES_MAX);
    bool whole = true;
    for (int i = 0; i < count; i++)
        whole = flow_source(&flow, &sources[i]) && whole;
    if (!whole)
        session_report(session, true, "out of memory");
    /* A scroll past the end comes back to the last full page. */
    int last = flow.used > area.rows ? flow.used - area.rows : 0;
    if (own->scroll <= last)
        return;
    own->scroll = last;
    canvas_fill(canvas, area.row, 0, area.rows, canvas->columns, ROLE_TEXT,
                ' ');
    draw(session, state, canvas);
}

static enum effect move(struct session *session, void *state, enum move move)
{
    struct sources_state *own = state;
    own->scroll = scroll_move(own->scroll, move, session->rows);
    return EFFECT_REDRAW;
}

static enum effect mouse(struct session *session, void *state,
                         const struct event *event)
{
    struct sources_state *own = state;
    (void)session;
    if (event->button == MOUSE_LEFT)
        return EFFECT_NONE;
    own->scroll = scroll_wheel(own->scroll, event->button == MOUSE_WHEEL_UP);
    return EFFECT_REDRAW;
}

static void wants(struct session *session, void *state)
{
    (void)state;
    session_want_selected(session);
}

const struct screen_ops screen_sources = {
    .id = "sources",
    .title = "Sources",
    .state_size = sizeof(struct sources_state),
    .key = {320, 's', 0, "s", "sources", "what the numbers rest on", true, 0, 0,
            0, 0, 0},
    .draw = draw,
    .move = move,
    .mouse = mouse,
    .wants = wants,
};
