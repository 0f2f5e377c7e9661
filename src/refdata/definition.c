/* SPDX-License-Identifier: MIT */
#include "refdata/definition.h"

#include <assert.h>
#include <string.h>

static const struct definition definitions[] = {
    {QUANTITY_ZEFF, "orbital exponent, n zeta", DIMENSION_CHARGE, false},
    {QUANTITY_ZEFF, "from the energy, n sqrt(E/Ry)", DIMENSION_CHARGE, false},
    {QUANTITY_ZEFF, "screening rule, Z - S", DIMENSION_CHARGE, false},
    {QUANTITY_RADIUS, "radius of maximum radial density", DIMENSION_LENGTH,
     false},
    {QUANTITY_RADIUS, "covalent radius", DIMENSION_LENGTH, false},
    {QUANTITY_RADIUS, "double-bond covalent radius", DIMENSION_LENGTH, false},
    {QUANTITY_RADIUS, "triple-bond covalent radius", DIMENSION_LENGTH, false},
    {QUANTITY_RADIUS, "metallic radius, 12-coordination", DIMENSION_LENGTH,
     false},
    {QUANTITY_RADIUS, "metallic radius, structure as found", DIMENSION_LENGTH,
     false},
    {QUANTITY_RADIUS, "empirical atomic radius", DIMENSION_LENGTH, false},
    {QUANTITY_RADIUS, "van der Waals radius", DIMENSION_LENGTH, false},
    {QUANTITY_RADIUS, "effective ionic radius", DIMENSION_LENGTH, true},
    {QUANTITY_RADIUS, "crystal radius", DIMENSION_LENGTH, true},
    {QUANTITY_IONIZATION, "ionization energy", DIMENSION_ENERGY, false},
    {QUANTITY_ELECTRONEGATIVITY, "Pauling scale", DIMENSION_NUMBER, false},
    {QUANTITY_ELECTRONEGATIVITY, "Allred-Rochow scale", DIMENSION_NUMBER,
     false},
    {QUANTITY_ELECTRONEGATIVITY, "Allen scale", DIMENSION_NUMBER, false},
    {QUANTITY_ELECTRONEGATIVITY, "Mulliken scale, eV", DIMENSION_ENERGY, false},
    {QUANTITY_ISODENSITY, "radius at 0.001 electrons per cubic bohr",
     DIMENSION_LENGTH, false},
    {QUANTITY_AFFINITY, "electron affinity", DIMENSION_ENERGY, true},
    {QUANTITY_POLARIZABILITY, "dipole polarizability", DIMENSION_VOLUME, false},
};
#define DEFINITION_COUNT (sizeof definitions / sizeof definitions[0])

size_t definition_count(enum quantity_id quantity)
{
    size_t count = 0;
    for (size_t i = 0; i < DEFINITION_COUNT; i++)
        count += definitions[i].quantity == quantity;
    return count;
}

const struct definition *definition_at(enum quantity_id quantity, size_t place)
{
    assert(place < definition_count(quantity));
    size_t i = 0;
    for (;; i++)
        if (definitions[i].quantity == quantity && place-- == 0)
            return &definitions[i];
}

const struct definition *definition_find(enum quantity_id quantity,
                                         const char *text)
{
    for (size_t i = 0; i < DEFINITION_COUNT; i++)
        if (definitions[i].quantity == quantity &&
            strcmp(definitions[i].text, text) == 0)
            return &definitions[i];
    return NULL;
}

enum dimension definition_dimension(enum quantity_id quantity, const char *text)
{
    const struct definition *d = text ? definition_find(quantity, text) : NULL;
    return d ? d->dimension : quantity_at(quantity)->dimension;
}
