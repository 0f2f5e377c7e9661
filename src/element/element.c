/* SPDX-License-Identifier: MIT */
#include "element/element.h"

#include <assert.h>
#include <stddef.h>
#include <stdint.h>
#include <stdlib.h>
#include <string.h>

#include "base/text.h"

/* Symbols and names: IUPAC. One row per atomic number, in order. */
/* clang-format off */
static const struct element elements[Z_MAX] = {
    {1, "H", "hydrogen", 1, 1, 's'},
    {2, "He", "helium", 1, 18, 's'},
    {3, "Li", "lithium", 2, 1, 's'},
    {4, "Be", "beryllium", 2, 2, 's'},
    {5, "B", "boron", 2, 13, 'p'},
    {6, "C", "carbon", 2, 14, 'p'},
    {7, "N", "nitrogen", 2, 15, 'p'},
    {8, "O", "oxygen", 2, 16, 'p'},
    {9, "F", "fluorine", 2, 17, 'p'},
    {10, "Ne", "neon", 2, 18, 'p'},
    {11, "Na", "sodium", 3, 1, 's'},
    {12, "Mg", "magnesium", 3, 2, 's'},
    {13, "Al", "aluminium", 3, 13, 'p'},
    {14, "Si", "silicon", 3, 14, 'p'},
    {15, "P", "phosphorus", 3, 15, 'p'},
    {16, "S", "sulfur", 3, 16, 'p'},
    {17, "Cl", "chlorine", 3, 17, 'p'},
    {18, "Ar", "argon", 3, 18, 'p'},
    {19, "K", "potassium", 4, 1, 's'},
    {20, "Ca", "calcium", 4, 2, 's'},
    {21, "Sc", "scandium", 4, 3, 'd'},
    {22, "Ti", "titanium", 4, 4, 'd'},
    {23, "V", "vanadium", 4, 5, 'd'},
    {24, "Cr", "chromium", 4, 6, 'd'},
    {25, "Mn", "manganese", 4, 7, 'd'},
    {26, "Fe", "iron", 4, 8, 'd'},
    {27, "Co", "cobalt", 4, 9, 'd'},
    {28, "Ni", "nickel", 4, 10, 'd'},
    {29, "Cu", "copper", 4, 11, 'd'},
    {30, "Zn", "zinc", 4, 12, 'd'},
    {31, "Ga", "gallium", 4, 13, 'p'},
    {32, "Ge", "germanium", 4, 14, 'p'},
    {33, "As", "arsenic", 4, 15, 'p'},
    {34, "Se", "selenium", 4, 16, 'p'},
    {35, "Br", "bromine", 4, 17, 'p'},
    {36, "Kr", "krypton", 4, 18, 'p'},
    {37, "Rb", "rubidium", 5, 1, 's'},
    {38, "Sr", "strontium", 5, 2, 's'},
    {39, "Y", "yttrium", 5, 3, 'd'},
    {40, "Zr", "zirconium", 5, 4, 'd'},
    {41, "Nb", "niobium", 5, 5, 'd'},
    {42, "Mo", "molybdenum", 5, 6, 'd'},
    {43, "Tc", "technetium", 5, 7, 'd'},
    {44, "Ru", "ruthenium", 5, 8, 'd'},
    {45, "Rh", "rhodium", 5, 9, 'd'},
    {46, "Pd", "palladium", 5, 10, 'd'},
    {47, "Ag", "silver", 5, 11, 'd'},
    {48, "Cd", "cadmium", 5, 12, 'd'},
    {49, "In", "indium", 5, 13, 'p'},
    {50, "Sn", "tin", 5, 14, 'p'},
    {51, "Sb", "antimony", 5, 15, 'p'},
    {52, "Te", "tellurium", 5, 16, 'p'},
    {53, "I", "iodine", 5, 17, 'p'},
    {54, "Xe", "xenon", 5, 18, 'p'},
    {55, "Cs", "caesium", 6, 1, 's'},
    {56, "Ba", "barium", 6, 2, 's'},
    {57, "La", "lanthanum", 6, 0, 'f'},
    {58, "Ce", "cerium", 6, 0, 'f'},
    {59, "Pr", "praseodymium", 6, 0, 'f'},
    {60, "Nd", "neodymium", 6, 0, 'f'},
    {61, "Pm", "promethium", 6, 0, 'f'},
    {62, "Sm", "samarium", 6, 0, 'f'},
    {63, "Eu", "europium", 6, 0, 'f'},
    {64, "Gd", "gadolinium", 6, 0, 'f'},
    {65, "Tb", "terbium", 6, 0, 'f'},
    {66, "Dy", "dysprosium", 6, 0, 'f'},
    {67, "Ho", "holmium", 6, 0, 'f'},
    {68, "Er", "erbium", 6, 0, 'f'},
    {69, "Tm", "thulium", 6, 0, 'f'},
    {70, "Yb", "ytterbium", 6, 0, 'f'},
    {71, "Lu", "lutetium", 6, 3, 'd'},
    {72, "Hf", "hafnium", 6, 4, 'd'},
    {73, "Ta", "tantalum", 6, 5, 'd'},
    {74, "W", "tungsten", 6, 6, 'd'},
    {75, "Re", "rhenium", 6, 7, 'd'},
    {76, "Os", "osmium", 6, 8, 'd'},
    {77, "Ir", "iridium", 6, 9, 'd'},
    {78, "Pt", "platinum", 6, 10, 'd'},
    {79, "Au", "gold", 6, 11, 'd'},
    {80, "Hg", "mercury", 6, 12, 'd'},
    {81, "Tl", "thallium", 6, 13, 'p'},
    {82, "Pb", "lead", 6, 14, 'p'},
    {83, "Bi", "bismuth", 6, 15, 'p'},
    {84, "Po", "polonium", 6, 16, 'p'},
    {85, "At", "astatine", 6, 17, 'p'},
    {86, "Rn", "radon", 6, 18, 'p'},
    {87, "Fr", "francium", 7, 1, 's'},
    {88, "Ra", "radium", 7, 2, 's'},
    {89, "Ac", "actinium", 7, 0, 'f'},
    {90, "Th", "thorium", 7, 0, 'f'},
    {91, "Pa", "protactinium", 7, 0, 'f'},
    {92, "U", "uranium", 7, 0, 'f'},
    {93, "Np", "neptunium", 7, 0, 'f'},
    {94, "Pu", "plutonium", 7, 0, 'f'},
    {95, "Am", "americium", 7, 0, 'f'},
    {96, "Cm", "curium", 7, 0, 'f'},
    {97, "Bk", "berkelium", 7, 0, 'f'},
    {98, "Cf", "californium", 7, 0, 'f'},
    {99, "Es", "einsteinium", 7, 0, 'f'},
    {100, "Fm", "fermium", 7, 0, 'f'},
    {101, "Md", "mendelevium", 7, 0, 'f'},
    {102, "No", "nobelium", 7, 0, 'f'},
    {103, "Lr", "lawrencium", 7, 3, 'd'},
    {104, "Rf", "rutherfordium", 7, 4, 'd'},
    {105, "Db", "dubnium", 7, 5, 'd'},
    {106, "Sg", "seaborgium", 7, 6, 'd'},
    {107, "Bh", "bohrium", 7, 7, 'd'},
    {108, "Hs", "hassium", 7, 8, 'd'},
    {109, "Mt", "meitnerium", 7, 9, 'd'},
    {110, "Ds", "darmstadtium", 7, 10, 'd'},
    {111, "Rg", "roentgenium", 7, 11, 'd'},
    {112, "Cn", "copernicium", 7, 12, 'd'},
    {113, "Nh", "nihonium", 7, 13, 'p'},
    {114, "Fl", "flerovium", 7, 14, 'p'},
    {115, "Mc", "moscovium", 7, 15, 'p'},
    {116, "Lv", "livermorium", 7, 16, 'p'},
    {117, "Ts", "tennessine", 7, 17, 'p'},
    {118, "Og", "oganesson", 7, 18, 'p'},
};
/* clang-format on */

/* Spellings in use beside IUPAC's. */
static const struct {
    const char *name;
    const char *symbol;
} other_spellings[] = {
    {"aluminum", "Al"},
    {"cesium", "Cs"},
    {"sulphur", "S"},
};

const struct element *element_at(int z)
{
    assert(z >= 1 && z <= Z_MAX);
    return &elements[z - 1];
}

const struct element *element_by_symbol(const char *symbol)
{
    for (int z = 1; z <= Z_MAX; z++)
        if (strcmp(elements[z - 1].symbol, symbol) == 0)
            return &elements[z - 1];
    return NULL;
}

static const struct element *by_number(const char *text)
{
    int z;
    if (text[0] < '0' || text[0] > '9' || !text_to_int(text, &z))
        return NULL;
    return z >= 1 && z <= Z_MAX ? &elements[z - 1] : NULL;
}

static const struct element *by_name(const char *text)
{
    for (int z = 1; z <= Z_MAX; z++)
        if (text_same_ignoring_case(elements[z - 1].name, text))
            return &elements[z - 1];
    for (size_t i = 0; i < sizeof other_spellings / sizeof *other_spellings;
         i++)
        if (text_same_ignoring_case(other_spellings[i].name, text))
            return element_by_symbol(other_spellings[i].symbol);
    return NULL;
}

const struct element *element_find(const char *text)
{
    const struct element *found = element_by_symbol(text);
    if (!found)
        found = by_number(text);
    return found ? found : by_name(text);
}

/* The element whose name differs least from a text, in at most one letter of a
 * short one and two of a longer one. */
static const struct element *nearest_name(const char *text)
{
    const struct element *best = NULL;
    size_t least = strlen(text) > 4 ? 3 : 2;
    for (int z = 1; z <= Z_MAX; z++) {
        size_t d = text_edit_distance(elements[z - 1].name, text);
        if (d < least) {
            least = d;
            best = &elements[z - 1];
        }
    }
    return best;
}

/* The only one whose name begins with a text; NULL when there is none or there
 * are several. */
static const struct element *only_beginning(const char *text)
{
    const struct element *found = NULL;
    for (int z = 1; z <= Z_MAX; z++) {
        if (!text_starts_ignoring_case(elements[z - 1].name, text))
            continue;
        if (found)
            return NULL;
        found = &elements[z - 1];
    }
    return found;
}

const struct element *element_nearest(const char *text)
{
    size_t length = strlen(text);
    /* A wrong case is the commonest slip, and no edit at all. */
    for (int z = 1; z <= Z_MAX; z++)
        if (text_same_ignoring_case(elements[z - 1].symbol, text))
            return &elements[z - 1];
    /* One letter wrong in a symbol makes another symbol as a rule: of so short
     * a text nothing can be said. */
    if (length < 3)
        return NULL;
    const struct element *near = nearest_name(text);
    if (!near)
        near = only_beginning(text);
    /* A symbol with a letter too many. */
    for (int z = 1; !near && length == 3 && z <= Z_MAX; z++) {
        const struct element *e = &elements[z - 1];
        if (strlen(e->symbol) == 2 &&
            text_starts_ignoring_case(text, e->symbol) &&
            strchr("abcdefghijklmnopqrstuvwxyz", text[2]))
            near = e;
    }
    return near;
}

const struct element *element_jump(const char *text)
{
    if (text[0] == '\0')
        return NULL;
    const struct element *found = element_find(text);
    if (found)
        return found;
    for (int z = 1; z <= Z_MAX; z++)
        if (text_same_ignoring_case(elements[z - 1].symbol, text))
            return &elements[z - 1];
    for (int z = 1; z <= Z_MAX; z++)
        if (text_starts_ignoring_case(elements[z - 1].name, text))
            return &elements[z - 1];
    return NULL;
}

int grid_rows(enum grid_width width)
{
    return width == GRID_18 ? 9 : 7;
}

int grid_columns(enum grid_width width)
{
    return width == GRID_18 ? 18 : 32;
}

/* Place of z in its f row, 0…13, or -1 when it stands in the main grid. */
static int f_row_position(int z, enum grid_group3 group3)
{
    int first = group3 == GRID_LU_LR ? 57 : 58;
    for (int row = 0; row < 2; row++, first += 32)
        if (z >= first && z < first + 14)
            return z - first;
    return -1;
}

struct grid_place element_place(int z, enum grid_width width,
                                enum grid_group3 group3)
{
    const struct element *e = element_at(z);
    int f = f_row_position(z, group3);
    int row = e->period - 1;
    if (f >= 0)
        return width == GRID_18 ? (struct grid_place){row + 2, f + 3}
                                : (struct grid_place){row, f + 2};
    /* La and Ac, when they are given group 3, carry group 0 in the table. */
    int group = e->group ? e->group : 3;
    int column = group - 1;
    if (width == GRID_32 && group >= 3)
        column += 14;
    return (struct grid_place){row, column};
}

int element_neighbour(int z, int dx, int dy, enum grid_width width,
                      enum grid_group3 group3)
{
    struct grid_place from = element_place(z, width, group3);
    int best = z;
    int least = INT32_MAX;
    for (int other = 1; other <= Z_MAX; other++) {
        struct grid_place to = element_place(other, width, group3);
        int along =
            dx ? (to.column - from.column) * dx : (to.row - from.row) * dy;
        int across = dx ? to.row - from.row : to.column - from.column;
        if (along <= 0)
            continue;
        /* Left and right stay in the row; up and down take the nearest row
         * and in it the nearest column. */
        if (dx && across != 0)
            continue;
        int cost = along * 64 + abs(across);
        if (cost < least) {
            least = cost;
            best = other;
        }
    }
    return best;
}
