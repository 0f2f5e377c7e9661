/* SPDX-License-Identifier: MIT */
#include "screens/map_layout.h"

#include "session/screen.h"

#define HEAD_COLUMNS 3 /* period numbers left of the grid */
#define HEAD_ROWS 1    /* group numbers above it */
#define PANE_ROWS_MIN 7
#define PANE_ROWS_TALL 18 /* what must be left below cells of three rows */
#define SIDE_COLUMNS_MIN 34
#define TREND_COLUMNS_MIN 56 /* for a trend beside the map */
#define TREND_ROWS_MIN 16
#define TREND_FACTS_ROWS 9 /* what the facts keep above it */

/* Rows of the grid: periods, and in 18 columns a gap and two f rows. */
static int grid_height(enum grid_width width, int cell_rows, int gap)
{
    return grid_rows(width) * cell_rows + (width == GRID_18 ? gap : 0);
}

static int grid_breadth(enum grid_width width, int cell_columns)
{
    return HEAD_COLUMNS + grid_columns(width) * cell_columns;
}

static struct map_layout layout_whole(int rows, int columns,
                                      enum grid_width wanted)
{
    /* Cells from large to small; the first that leaves room for the rest is
     * taken: seven columns hold a number, four a symbol with its marks. */
    static const struct {
        int columns, rows;
    } cells[] = {{7, 3}, {7, 2}, {6, 3}, {6, 2}, {5, 2}, {4, 1}, {3, 1}};
    struct map_layout l = {.form = FORM_WHOLE};
    for (int try = 0; try < 2; try++) {
        l.width = try == 0 ? wanted : GRID_18;
        for (unsigned i = 0; i < sizeof cells / sizeof cells[0]; i++) {
            int height = HEAD_ROWS + grid_height(l.width, cells[i].rows, 1);
            /* title, scale, message, keys */
            int left = rows - height - 4;
            if (grid_breadth(l.width, cells[i].columns) > columns ||
                left < (cells[i].rows > 2 ? PANE_ROWS_TALL : PANE_ROWS_MIN))
                continue;
            l.cell_columns = cells[i].columns;
            l.cell_rows = cells[i].rows;
            l.grid = (struct area){1, 0, height,
                                   grid_breadth(l.width, l.cell_columns)};
            return l;
        }
    }
    l.form = FORM_SINGLE;
    return l;
}

static void place_rest(struct map_layout *l, int rows, int columns)
{
    l->message_row = rows - 2;
    l->key_row = rows - 1;
    l->scale = (struct area){l->grid.row + l->grid.rows, 0, 1, columns};
    int top = l->scale.row + 1;
    l->pane = (struct area){top, 0, l->message_row - top, columns};
    int beside = columns - l->grid.columns - 1;
    if (beside >= SIDE_COLUMNS_MIN)
        l->side = (struct area){l->grid.row, l->grid.columns + 1, l->grid.rows,
                                beside};
    int below = l->side.row + TREND_FACTS_ROWS;
    if (beside >= TREND_COLUMNS_MIN &&
        l->message_row - below >= TREND_ROWS_MIN) {
        /* Down the whole right side; the pane and the scale stay left. */
        l->trend = (struct area){below, l->side.column, l->message_row - below,
                                 beside};
        l->side.rows = TREND_FACTS_ROWS - 1;
        l->scale.columns = l->pane.columns = l->grid.columns;
    }
}

static struct map_layout layout_single(int rows, int columns)
{
    struct map_layout l = {.form = FORM_SINGLE, .width = GRID_18};
    l.cell_columns = columns >= grid_breadth(GRID_18, 4)   ? 4
                     : columns >= grid_breadth(GRID_18, 3) ? 3
                                                           : 2;
    l.cell_rows = 1;
    l.message_row = rows - 1;
    l.key_row = rows - 1;
    /* title, scale and keys; what is over parts the f rows from the rest and
     * heads the groups. */
    int spare = rows - 3 - grid_rows(GRID_18);
    l.grid = (struct area){spare >= 1 ? 1 : 0, 0,
                           HEAD_ROWS + grid_height(GRID_18, 1, spare >= 2), 0};
    l.grid.columns = grid_breadth(GRID_18, l.cell_columns);
    l.scale = (struct area){rows - 2, 0, 1, columns};
    l.pane = (struct area){1, 0, rows - 2, columns};
    return l;
}

struct map_layout screen_map_layout(int rows, int columns,
                                    enum grid_width wanted)
{
    if (rows < NEEDED_ROWS || columns < NEEDED_COLUMNS)
        return (struct map_layout){.form = FORM_SENTENCE};
    if (rows < 12 || columns < grid_breadth(GRID_18, 2))
        return (struct map_layout){.form = FORM_LIST,
                                   .pane = {1, 0, rows - 2, columns},
                                   .message_row = rows - 1,
                                   .key_row = rows - 1};
    struct map_layout l = layout_whole(rows, columns, wanted);
    if (l.form != FORM_WHOLE)
        return layout_single(rows, columns);
    place_rest(&l, rows, columns);
    return l;
}

struct area screen_map_cell(const struct map_layout *layout, int z,
                            enum grid_group3 group3)
{
    struct grid_place p = element_place(z, layout->width, group3);
    int gap = layout->grid.rows - HEAD_ROWS -
              grid_rows(layout->width) * layout->cell_rows;
    int row = layout->grid.row + HEAD_ROWS + p.row * layout->cell_rows;
    if (p.row >= PERIOD_MAX)
        row += gap;
    return (struct area){row,
                         layout->grid.column + HEAD_COLUMNS +
                             p.column * layout->cell_columns,
                         layout->cell_rows, layout->cell_columns};
}
