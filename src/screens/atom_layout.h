/* SPDX-License-Identifier: MIT */
#ifndef SCREENS_ATOM_LAYOUT_H
#define SCREENS_ATOM_LAYOUT_H

#include <stdbool.h>

#include "canvas/area.h"
#include "screens/form.h"

/* The screen Atom: a table of subshells, numbers at the cursor, plots. In
 * FORM_SINGLE table and plots have the same area, one is shown at a time.
 * levels: energies and levels below the table; charge: the second plot. Areas
 * with no rows are absent. Row 0 is the title, row 1 the state, the last two
 * are message and keys. */
struct atom_layout {
    enum form form;
    bool wide; /* the table has all its columns */
    struct area table, levels, cursor, plot, charge;
};

/* shells: subshells of the atom. */
struct atom_layout screen_atom_layout(int rows, int columns, int shells);

#endif
