/* SPDX-License-Identifier: MIT */
/* Where the parts of the map stand for a size of the terminal. */
#ifndef SCREENS_MAP_LAYOUT_H
#define SCREENS_MAP_LAYOUT_H

#include "canvas/area.h"
#include "element/element.h"
#include "screens/form.h"

/* rows 0 is the title, the last two are message and keys (in FORM_LIST and
 * FORM_SINGLE the last row is both). Areas with no rows are absent. side:
 * facts of the element, right of the grid; where it is absent they stand in
 * the gap of the grid above the d block. */
struct map_layout {
    enum form form;
    enum grid_width width;
    int cell_columns, cell_rows;
    struct area grid; /* with its headings: one row above, three columns left */
    struct area scale;
    struct area pane;
    struct area side;
    struct area trend; /* below the facts, where the side is large */
    int message_row, key_row;
};

struct map_layout screen_map_layout(int rows, int columns,
                                    enum grid_width wanted);

/* Top left of an element's cell. */
struct area screen_map_cell(const struct map_layout *layout, int z,
                            enum grid_group3 group3);

#endif
