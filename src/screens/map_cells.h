/* SPDX-License-Identifier: MIT */
/* The numbers of the map: one per element, prepared once per choice. */
#ifndef SCREENS_MAP_CELLS_H
#define SCREENS_MAP_CELLS_H

#include "analysis/audit.h"
#include "canvas/scale.h"
#include "session/session.h"

struct map_cell {
    enum row_state state;
    bool has_value;
    double value;
    int class_index;
    bool has_percent; /* of the residual */
    double percent;
};

/* cells[z]; usual: the audit of the chosen model at the chosen charge. Starts
 * as zeros, stale. */
struct map_cells {
    struct map_cell cells[Z_MAX + 1];
    struct scale scale;
    struct audit usual;
    unsigned choice_version, solved_version;
};

/* Brings them up to date with the session. */
void screen_map_refresh(struct session *session, struct map_cells *map);

#endif
