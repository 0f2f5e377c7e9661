/* SPDX-License-Identifier: MIT */
/* What every number rests on: models and data sets with their citations. */
#include <stdio.h>

#include "base/text.h"
#include "screens/parts.h"
#include "study/facts.h"

static void flow_source(struct flow *flow, const struct source *s)
{
    char line[1024];
    const struct provenance *p = s->provenance;
    struct text t = text_over(line, sizeof line);
    text_addf(&t, "%s  %s", p->id, p->title);
    flow_text(flow, ROLE_HEADING, 0, line);
    t = text_over(line, sizeof line);
    text_addf(&t, "%s for %s", p->computed ? "model" : "data set", s->quantity);
    if (s->unit && s->unit[0])
        text_addf(&t, " in %s", s->unit);
    if (s->count)
        text_addf(&t, ", %d values", s->count);
    if (s->domain && s->domain[0])
        text_addf(&t, "; %s", s->domain);
    flow_text(flow, ROLE_TEXT, 2, line);
    for (int i = 0; i < p->citation_count; i++) {
        t = text_over(line, sizeof line);
        citation_text(&t, &p->citations[i]);
        flow_text(flow, ROLE_TEXT, 2, line);
    }
    for (int i = 0; i < s->note_count; i++)
        flow_text(flow, ROLE_QUIET, 4, s->notes[i]);
    flow_blank(flow);
}

static void draw(struct ui *ui, struct canvas *canvas)
{
    struct source sources[SOURCES_MAX] = {0};
    struct area area = {1, 1, canvas->rows - 3, canvas->columns - 2};
    struct flow flow = {canvas, area, ui->scroll[SCREEN_SOURCES], 0};
    int count = study_sources(ui->study, sources, SOURCES_MAX);
    for (int i = 0; i < count; i++)
        flow_source(&flow, &sources[i]);
    /* A scroll past the end comes back to the last full page. */
    int last = flow.used > area.rows ? flow.used - area.rows : 0;
    if (ui->scroll[SCREEN_SOURCES] <= last)
        return;
    ui->scroll[SCREEN_SOURCES] = last;
    canvas_fill(canvas, area.row, 0, area.rows, canvas->columns, ROLE_TEXT,
                ' ');
    draw(ui, canvas);
}

static enum effect update(struct ui *ui, enum action action)
{
    (void)ui;
    (void)action;
    return EFFECT_NONE;
}

const struct screen_ops screen_sources = {"Sources", update, draw};
