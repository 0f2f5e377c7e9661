/* SPDX-License-Identifier: MIT */
#include "base/units.h"

#include <assert.h>
#include <string.h>

const struct unit unit_table[] = {
    {"1", "pure number", DIMENSION_NUMBER, 1.0, 2},
    {"e", "elementary charges", DIMENSION_CHARGE, 1.0, 3},
    {"pm", "picometre", DIMENSION_LENGTH, 1.0, 1},
    {"angstrom", "angstrom", DIMENSION_LENGTH, 0.01, 3},
    {"bohr", "bohr radius", DIMENSION_LENGTH, 1.0 / BOHR_PM, 3},
    {"eV", "electronvolt", DIMENSION_ENERGY, 1.0, 3},
    {"kJ/mol", "kilojoule per mole", DIMENSION_ENERGY, EV_KJ_PER_MOL, 1},
    {"hartree", "hartree", DIMENSION_ENERGY, 1.0 / HARTREE_EV, 4},
    {"cm-1", "wavenumber per centimetre", DIMENSION_ENERGY, EV_PER_CM, 0},
    {"bohr3", "cubic bohr", DIMENSION_VOLUME, 1.0, 2},
};

size_t unit_count(void)
{
    return sizeof unit_table / sizeof unit_table[0];
}

const struct unit *unit_at(size_t i)
{
    assert(i < unit_count());
    return &unit_table[i];
}

const struct unit *unit_find(const char *id)
{
    for (size_t i = 0; i < unit_count(); i++)
        if (strcmp(unit_table[i].id, id) == 0)
            return &unit_table[i];
    return NULL;
}

const struct unit *unit_base(enum dimension dimension)
{
    size_t i = 0;
    while (unit_table[i].dimension != dimension)
        i++;
    return &unit_table[i];
}
