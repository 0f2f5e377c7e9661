/* SPDX-License-Identifier: MIT */
#include "screens/layout.h"

#define HEAD_COLUMNS 3 /* period numbers left of the grid */
#define HEAD_ROWS 1    /* group numbers above it */
#define PANE_ROWS_MIN 7
#define PANE_ROWS_TALL 18 /* what must be left below cells of three rows */
#define SIDE_COLUMNS_MIN 34
#define TREND_COLUMNS_MIN 56 /* for a trend beside the map */
#define TREND_ROWS_MIN 16
#define TREND_FACTS_ROWS 9 /* what the facts keep above it */
#define TREND_TABLE_COLUMNS 48
#define TREND_BESIDE_MIN 110
#define TREND_BELOW_MIN 40
#define TREND_TABLE_ROWS 20
#define TREND_LINES 3
#define AUDIT_LABEL_COLUMNS 15

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

struct map_layout layout_map(int rows, int columns, enum grid_width wanted)
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

struct area layout_cell(const struct map_layout *layout, int z,
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

#define TABLE_COLUMNS 34
#define TABLE_COLUMNS_WIDE 64
#define CURSOR_ROWS 4
#define CHARGE_ROWS_MIN 14 /* below it a second plot shows too little */
#define LEVELS_ROWS_MIN 4

static struct atom_layout layout_atom_single(int rows, int columns)
{
    /* Numbers and plot where both fit, else one of them. */
    int free = rows - 4;
    int cursor = free >= 12 ? CURSOR_ROWS : free < 5 ? free : 0;
    struct area all = {2, 0, free, columns};
    return (struct atom_layout){
        .form = FORM_SINGLE,
        .wide = columns >= TABLE_COLUMNS_WIDE,
        .table = all,
        .cursor = {2, 0, cursor, columns},
        .plot = {2 + cursor, 0, free - cursor, columns},
    };
}

struct atom_layout layout_atom(int rows, int columns, int shells)
{
    if (rows < NEEDED_ROWS || columns < NEEDED_COLUMNS)
        return (struct atom_layout){.form = FORM_SENTENCE};
    if (rows < 20 || columns < 60)
        return layout_atom_single(rows, columns);
    struct atom_layout l = {.form = FORM_WHOLE, .wide = columns >= 110};
    int left = l.wide ? TABLE_COLUMNS_WIDE : TABLE_COLUMNS;
    int height = rows - 4;
    int used = shells + 3; /* two headings and all electrons */
    l.table = (struct area){2, 0, used < height ? used : height, left};
    if (height - used - 1 >= LEVELS_ROWS_MIN)
        l.levels = (struct area){2 + used + 1, 0, height - used - 1, left};
    int column = left + 2;
    int right = columns - column;
    l.cursor = (struct area){2, column, CURSOR_ROWS, right};
    int top = 2 + CURSOR_ROWS;
    int free = height - CURSOR_ROWS;
    int charge = free * 2 / 5 >= CHARGE_ROWS_MIN ? free * 2 / 5 : 0;
    l.plot = (struct area){top, column, free - charge, right};
    l.charge = (struct area){top + free - charge, column, charge, right};
    return l;
}

struct trend_layout layout_trend(struct area area)
{
    bool beside = area.columns >= TREND_BESIDE_MIN;
    struct trend_layout l = {.full = beside || area.rows >= TREND_BELOW_MIN};
    struct area plots = area;
    if (beside) {
        plots.columns -= TREND_TABLE_COLUMNS + 2;
        l.table = (struct area){area.row, plots.column + plots.columns + 2,
                                area.rows, TREND_TABLE_COLUMNS};
    } else {
        int lines = l.full           ? TREND_TABLE_ROWS
                    : area.rows < 14 ? 1
                                     : TREND_LINES;
        plots.rows -= lines;
        l.table = (struct area){area.row + plots.rows, area.column, lines,
                                area.columns};
    }
    /* Each plot has a title, an axis and names besides its inside. */
    int residuals = plots.rows < 15 ? 0 : plots.rows * 2 / 5;
    l.values = (struct area){plots.row, plots.column, plots.rows - residuals,
                             plots.columns};
    l.residuals = (struct area){plots.row + plots.rows - residuals,
                                plots.column, residuals, plots.columns};
    return l;
}

struct audit_layout layout_audit(int rows, int columns, int models)
{
    struct audit_layout l = {.cell_columns = columns >= 118 ? 13 : 8};
    int words = columns >= 110 ? 3 : 4;
    int height = rows - 3 - words; /* title, message, keys */
    int table = AUDIT_LABEL_COLUMNS + models * l.cell_columns;
    int right = columns - table - 2;
    l.words = (struct area){rows - 2 - words, 0, words, columns};
    l.table = (struct area){1, 0, height, table < columns ? table : columns};
    if (right < 22)
        return l;
    int scatter = height * 3 / 5;
    if (scatter > right * 2 / 3 && height - right * 2 / 3 > 6)
        scatter = right * 2 / 3;
    l.scatter = (struct area){1, table + 2, scatter, right};
    l.points = (struct area){1 + scatter, table + 2, height - scatter, right};
    return l;
}
