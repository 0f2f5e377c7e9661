/* SPDX-License-Identifier: MIT */
#include "screens/trend_layout.h"

#define TREND_TABLE_COLUMNS 48
#define TREND_BESIDE_MIN 110
#define TREND_BELOW_MIN 40
#define TREND_TABLE_ROWS 20
#define TREND_LINES 3

struct trend_layout screen_trend_layout(struct area area)
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
