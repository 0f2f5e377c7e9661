/* SPDX-License-Identifier: MIT */
/* What exactly a number is. Values of one quantity under two definitions are
 * not like with like: a covalent radius is no ionic radius. */
#ifndef ELEMENT_DEFINITION_H
#define ELEMENT_DEFINITION_H

#include <stdbool.h>
#include <stddef.h>

#include "element/quantity.h"

/* What a definition says of its numbers; bits. */
enum definition_trait {
    /* a scale of its own: never subtracted from numbers of another */
    DEFINITION_SCALE = 1,
    /* found for ions at a site: what an ion's number stands against first */
    DEFINITION_OF_IONS = 2,
    /* may be negative: an ion of hydrogen can have such a radius */
    DEFINITION_SIGNED = 4
};

/* Two definitions are the same when they are one object. name: what the object
 * is called behind `definition_`; text is in files, rows and on screen.
 * dimension: of its unit, for Mulliken's electronegativities are energies. */
struct definition {
    const char *name;
    enum quantity_id quantity;
    const char *text;
    enum dimension dimension;
    unsigned traits;
};

/* name, quantity, text, dimension, traits: a new definition is one row. */
#define DEFINITION_LIST(X)                                                     \
    X(zeff_exponent, ZEFF, "orbital exponent, n zeta", CHARGE, 0)              \
    X(zeff_energy, ZEFF, "from the energy, n sqrt(E/Ry)", CHARGE, 0)           \
    X(zeff_rule, ZEFF, "screening rule, Z - S", CHARGE, 0)                     \
    X(zeff_size, ZEFF, "from the size, mean radius", CHARGE, 0)                \
    X(zeff_enclosed, ZEFF, "Gauss's law at the radial maximum", CHARGE, 0)     \
    X(radial_maximum, RADIUS, "radius of maximum radial density", LENGTH, 0)   \
    X(covalent, RADIUS, "covalent radius", LENGTH, 0)                          \
    X(covalent_double, RADIUS, "double-bond covalent radius", LENGTH, 0)       \
    X(covalent_triple, RADIUS, "triple-bond covalent radius", LENGTH, 0)       \
    X(metallic_12, RADIUS, "metallic radius, 12-coordination", LENGTH, 0)      \
    X(metallic_found, RADIUS, "metallic radius, structure as found", LENGTH,   \
      0)                                                                       \
    X(empirical, RADIUS, "empirical atomic radius", LENGTH, 0)                 \
    X(van_der_waals, RADIUS, "van der Waals radius", LENGTH, 0)                \
    X(ionic_effective, RADIUS, "effective ionic radius", LENGTH,               \
      DEFINITION_OF_IONS | DEFINITION_SIGNED)                                  \
    X(ionic_crystal, RADIUS, "crystal radius", LENGTH,                         \
      DEFINITION_OF_IONS | DEFINITION_SIGNED)                                  \
    X(ionization, IONIZATION, "ionization energy", ENERGY, 0)                  \
    X(pauling, ELECTRONEGATIVITY, "Pauling scale", NUMBER, DEFINITION_SCALE)   \
    X(allred_rochow, ELECTRONEGATIVITY, "Allred-Rochow scale", NUMBER,         \
      DEFINITION_SCALE)                                                        \
    X(allen, ELECTRONEGATIVITY, "Allen scale", NUMBER, DEFINITION_SCALE)       \
    X(mulliken, ELECTRONEGATIVITY, "Mulliken scale, eV", ENERGY,               \
      DEFINITION_SCALE)                                                        \
    X(isodensity, ISODENSITY, "radius at 0.001 electrons per cubic bohr",      \
      LENGTH, 0)                                                               \
    X(affinity, AFFINITY, "electron affinity", ENERGY, DEFINITION_SIGNED)      \
    X(polarizability, POLARIZABILITY, "dipole polarizability", VOLUME, 0)      \
    X(hardness, HARDNESS, "chemical hardness, (I - A)/2", ENERGY, 0)

#define DEFINITION_EXTERN(name, quantity, text, dimension, traits)             \
    extern const struct definition definition_##name;
DEFINITION_LIST(DEFINITION_EXTERN)
#undef DEFINITION_EXTERN

/* Number of definitions of a quantity (at least 1) and the i-th one. */
size_t definition_count(enum quantity_id quantity);
const struct definition *definition_at(enum quantity_id quantity, size_t i);

/* By text; NULL when the quantity has none such. */
const struct definition *definition_find(enum quantity_id quantity,
                                         const char *text);

/* Whether numbers under two definitions may be subtracted: under one and the
 * same, or both of a quantity and dimension where neither is a scale of its
 * own. False where one is NULL. */
bool definition_subtracts(const struct definition *a,
                          const struct definition *b);

#endif
