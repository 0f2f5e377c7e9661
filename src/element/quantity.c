/* SPDX-License-Identifier: MIT */
#include "element/quantity.h"

#include <assert.h>
#include <string.h>

/* Ranges: wide enough for every charge state of every element (the last
 * ionization energy of Z = 118 is near 2.6e5 eV, that of Z = 1 is 13.6 eV; H+
 * has a negative effective ionic radius), narrow enough to catch a value in
 * the wrong unit. */
static const struct quantity quantities[QUANTITY_COUNT] = {
    [QUANTITY_ZEFF] = {"zeff", "effective nuclear charge", "Z_eff",
                       DIMENSION_CHARGE, 0.0, 120.0, true, true},
    [QUANTITY_RADIUS] = {"radius", "radius", "r", DIMENSION_LENGTH, -50.0,
                         1000.0, true, true},
    [QUANTITY_IONIZATION] = {"ionization", "ionization energy", "I",
                             DIMENSION_ENERGY, 0.0, 3e5, false, true},
    [QUANTITY_ELECTRONEGATIVITY] = {"electronegativity", "electronegativity",
                                    "chi", DIMENSION_NUMBER, 0.0, 15.0, false,
                                    true},
    [QUANTITY_ISODENSITY] = {"isodensity", "isodensity radius", "r_iso",
                             DIMENSION_LENGTH, 10.0, 1000.0, false, true},
    [QUANTITY_AFFINITY] = {"affinity", "electron affinity", "A",
                           DIMENSION_ENERGY, -5.0, 10.0, false, false},
    [QUANTITY_POLARIZABILITY] = {"polarizability", "dipole polarizability",
                                 "alpha", DIMENSION_VOLUME, 0.1, 1000.0, false,
                                 false},
    [QUANTITY_HARDNESS] = {"hardness", "chemical hardness", "eta",
                           DIMENSION_ENERGY, 0.0, 2e5, false, true},
};

const struct quantity *quantity_at(enum quantity_id id)
{
    assert(id < QUANTITY_COUNT);
    return &quantities[id];
}

bool quantity_find(const char *id, enum quantity_id *found)
{
    for (int q = 0; q < QUANTITY_COUNT; q++)
        if (strcmp(quantities[q].id, id) == 0) {
            *found = (enum quantity_id)q;
            return true;
        }
    return false;
}
