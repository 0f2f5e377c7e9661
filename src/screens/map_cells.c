/* SPDX-License-Identifier: MIT */
#include "screens/map_cells.h"

/* The number that the map shows of a row, if there is one. */
static bool shown_number(const struct row *row, enum shown shown, double *value)
{
    if (shown == SHOWN_RESIDUAL) {
        *value = row->residual.value;
        return row->state == ROW_OK;
    }
    const struct reading *r =
        shown == SHOWN_VALUE ? &row->value : &row->reference;
    *value = r->value.value;
    return r->state == READING_OK;
}

static void fill_cell(struct session *session, struct map_cells *map, int z)
{
    struct map_cell *cell = &map->cells[z];
    struct ask ask;
    *cell = (struct map_cell){.state = ROW_OUTSIDE_MODEL};
    if (!session_ask(session, z, session->choice.charge, &ask))
        return;
    struct row row = study_row(session->study, &ask);
    cell->state = row.state;
    cell->has_value = shown_number(&row, session->choice.shown, &cell->value);
    cell->has_percent = row.state == ROW_OK && row.has_percent;
    cell->percent = cell->has_percent ? row.percent.value : 0.0;
    struct status st = status_ok();
    if (!audit_add(&map->usual, &row, &st))
        session_report(session, true, "%s", st.message);
}

static bool is_fresh(const struct session *session, const struct map_cells *map)
{
    /* The map changes with its own model alone. */
    const struct model *model = session->choice.model;
    return map->choice_version == session->choice_version &&
           (map->solved_version == session->solved_version || !model ||
            model->closed);
}

void screen_map_refresh(struct session *session, struct map_cells *map)
{
    double values[Z_MAX];
    int count = 0;
    if (is_fresh(session, map))
        return;
    audit_clear(&map->usual);
    for (int z = 1; z <= Z_MAX; z++) {
        fill_cell(session, map, z);
        if (map->cells[z].has_value)
            values[count++] = map->cells[z].value;
    }
    map->scale =
        scale_fit(values, count, session->choice.shown == SHOWN_RESIDUAL);
    for (int z = 1; z <= Z_MAX; z++)
        if (map->cells[z].has_value)
            map->cells[z].class_index =
                scale_class(&map->scale, map->cells[z].value);
    map->choice_version = session->choice_version;
    map->solved_version = session->solved_version;
}
