/* SPDX-License-Identifier: MIT */
#include "screens/facts.h"

#include "canvas/flow.h"
#include "study/facts.h"

/* One fact: labelled where there is room, one line of it where there is not.
 */
static void draw_fact(const struct session *session, struct flow *flow,
                      const struct species *species, enum fact_id id,
                      bool narrow)
{
    char line[1024];
    struct text t = text_over(line, sizeof line);
    bool caution = id == FACT_CAUTION;
    if (!narrow && id != FACT_CONFIGURATION)
        text_addf(&t, "%s: ", fact_label(id));
    size_t labelled = t.length;
    study_fact(session->study, species, id, &t);
    enum role role = caution ? ROLE_CAUTION : ROLE_TEXT;
    if (t.length == labelled)
        return;
    if (!narrow) {
        flow_text(flow, role, 0, line);
        return;
    }
    if (flow->used < flow->area.rows)
        canvas_text(flow->canvas, flow->area.row + flow->used,
                    flow->area.column, flow->area.columns, role, line);
    flow->used++;
}

void screen_facts_draw(const struct session *session, struct canvas *canvas,
                       struct area area)
{
    /* What someone must see comes first: the rest may be cut off. */
    static const enum fact_id order[] = {
        FACT_CONFIGURATION, FACT_CAUTION,   FACT_CATEGORY, FACT_PLACE,
        FACT_WEIGHT,        FACT_OXIDATION, FACT_SUPPLY,   FACT_ABUNDANCE};
    const struct element *e = element_at(session->choice.z);
    struct flow flow = {canvas, area, 0, 0};
    char line[SESSION_TEXT_MAX];
    char ion[ION_TEXT_MAX];
    struct species species;
    snprintf(line, sizeof line, "%s  %d  %s",
             ion_print(e->z, session->choice.charge, ion), e->z, e->name);
    flow_text(&flow, ROLE_TITLE, 0, line);
    if (!session_species(session, &species)) {
        flow_text(&flow, ROLE_GAP, 0, "no such ion");
        return;
    }
    for (size_t i = 0; i < sizeof order / sizeof order[0]; i++)
        draw_fact(session, &flow, &species, order[i], area.rows < 8);
}
