/* SPDX-License-Identifier: MIT */
#include "base/units.h"

#include <assert.h>
#include <string.h>

static const struct unit units[] = {
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
    return sizeof units / sizeof units[0];
}

const struct unit *unit_at(size_t i)
{
    assert(i < unit_count());
    return &units[i];
}

const struct unit *unit_find(const char *id)
{
    for (size_t i = 0; i < unit_count(); i++)
        if (strcmp(units[i].id, id) == 0)
            return &units[i];
    return NULL;
}

const struct unit *unit_base(enum dimension dimension)
{
    size_t i = 0;
    while (units[i].dimension != dimension)
        i++;
    return &units[i];
}
