/* SPDX-License-Identifier: MIT */
/* What the map draws of its numbers. */
#ifndef SCREENS_MAP_GRID_H
#define SCREENS_MAP_GRID_H

#include "canvas/canvas.h"
#include "screens/map_cells.h"
#include "screens/map_layout.h"

/* What the map shows, in row 0, and how many elements have a number. */
void screen_map_title_draw(const struct session *session,
                           const struct map_cells *map, struct canvas *canvas);

/* The coloured cells with their headings, and the scale below. */
void screen_map_grid_draw(const struct session *session,
                          const struct map_cells *map, struct canvas *canvas,
                          const struct map_layout *l);

/* One element per line, the selected one in the middle. */
void screen_map_list_draw(const struct session *session,
                          const struct map_cells *map, struct canvas *canvas,
                          struct area a);

#endif
