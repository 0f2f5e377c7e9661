/* SPDX-License-Identifier: MIT */
/* The elements: who they are and where they stand in the grid. */
#ifndef ELEMENT_ELEMENT_H
#define ELEMENT_ELEMENT_H

#include <stdbool.h>

#define Z_MAX 118
#define PERIOD_MAX 7
#define GROUP_MAX 18

/* Group and block: group 3 is Sc, Y, Lu, Lr (Scerri, Chemistry International
 * 2021, provisional report of the IUPAC project); La…Yb and Ac…No have group
 * 0 and stand in the f block. */
struct element {
    int z;
    const char *symbol;
    const char *name; /* lower case */
    int period;       /* 1…7 */
    int group;        /* 1…18, 0 in the f block */
    char block;       /* 's' 'p' 'd' 'f' */
};

/* The element with this atomic number, 1 <= z <= Z_MAX. */
const struct element *element_at(int z);

/* By symbol, case-sensitive ("Co" is not "CO"); NULL when there is none. */
const struct element *element_by_symbol(const char *symbol);

/* By symbol, English name in any case (aluminium and aluminum, caesium and
 * cesium, sulfur and sulphur), or atomic number; NULL when there is none. */
const struct element *element_find(const char *text);

/* The element that a misspelt text may have meant, for a hint: its symbol in
 * another case or with a letter too many ("Fee"), a name that differs in a
 * letter or two, the beginning of one name alone. NULL when nothing is near. */
const struct element *element_nearest(const char *text);

/* What someone types to jump: an exact symbol first, then a number, a symbol
 * in any case, the start of a name. NULL when nothing fits. */
const struct element *element_jump(const char *text);

/* How the grid is laid. */
enum grid_width { GRID_18, GRID_32 };
enum grid_group3 { GRID_LU_LR, GRID_LA_AC };

/* Row and column from 0. GRID_18: 18 columns, rows 0…6 the periods, 7 and 8
 * the f rows (14 columns, starting at column 3 under the gap they fill).
 * GRID_32: 32 columns, 7 rows. */
struct grid_place {
    int row, column;
};
struct grid_place element_place(int z, enum grid_width width,
                                enum grid_group3 group3);

/* Rows and columns of an arrangement. */
int grid_rows(enum grid_width width);
int grid_columns(enum grid_width width);

/* The nearest element from z in a direction (one of dx, dy is -1 or 1, the
 * other 0), skipping empty places; z itself at an edge. */
int element_neighbour(int z, int dx, int dy, enum grid_width width,
                      enum grid_group3 group3);

#endif
