/* SPDX-License-Identifier: MIT */
/* Physical constants and the units that numbers are shown in. */
#ifndef BASE_UNITS_H
#define BASE_UNITS_H

#include <stddef.h>

/* CODATA 2022 recommended values (Mohr, Newell, Taylor, Tiesinga,
 * Rev. Mod. Phys. 97, 025002 (2025), doi 10.1103/RevModPhys.97.025002);
 * standard uncertainty in the last digits in round brackets. */
#define HARTREE_EV 27.211386245981      /* eV, (30) */
#define RYDBERG_EV 13.605693122990      /* eV, (15) */
#define BOHR_PM 52.9177210544           /* pm, (82) */
#define SPEED_OF_LIGHT_AU 137.035999177 /* atomic units, 1/alpha, (21) */

/* Exact since the 2019 revision of the SI: e, h, c and N_A are defined. */
#define ELEMENTARY_CHARGE_C 1.602176634e-19
#define PLANCK_J_S 6.62607015e-34
#define LIGHT_M_S 299792458.0
#define AVOGADRO_PER_MOL 6.02214076e23
#define EV_KJ_PER_MOL (ELEMENTARY_CHARGE_C * AVOGADRO_PER_MOL / 1000.0)
#define EV_PER_CM (ELEMENTARY_CHARGE_C / (PLANCK_J_S * LIGHT_M_S * 100.0))

enum dimension {
    DIMENSION_NUMBER, /* a pure number: an electronegativity on its scale */
    DIMENSION_CHARGE, /* elementary charges */
    DIMENSION_LENGTH, /* base unit pm */
    DIMENSION_ENERGY, /* base unit eV */
    DIMENSION_VOLUME, /* base unit bohr^3 */
};

/* A unit of a dimension; value in this unit = value in the base unit times
 * `per_base`. decimals: places a screen shows. */
struct unit {
    const char *id;    /* as typed and as printed in CSV: "pm", "kJ/mol" */
    const char *title; /* in words: "picometre" */
    enum dimension dimension;
    double per_base;
    int decimals;
};

/* The table itself, for tables that are made when the program is built; all
 * others use the functions. */
extern const struct unit unit_table[];

/* Number of units, and the i-th one (0 <= i < count). The first unit of a
 * dimension is its base unit. */
size_t unit_count(void);
const struct unit *unit_at(size_t i);

/* The unit with this id, or NULL. */
const struct unit *unit_find(const char *id);

/* The base unit of a dimension; never NULL. */
const struct unit *unit_base(enum dimension dimension);

#endif
