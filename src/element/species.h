/* SPDX-License-Identifier: MIT */
/* An atom or ion in one configuration: what a model is asked about. */
#ifndef ELEMENT_SPECIES_H
#define ELEMENT_SPECIES_H

#include <stdbool.h>

#include "base/text.h"
#include "element/configuration.h"
#include "element/site.h"

/* Where a configuration comes from. */
enum configuration_origin {
    ORIGIN_STORED,    /* an evaluated table */
    ORIGIN_PREDICTED, /* a table entry that is itself a prediction */
    ORIGIN_RULE,      /* electrons taken from highest n, then highest l */
    ORIGIN_USER,      /* typed by the user */
};

/* Words for an origin: "stored", "predicted", "by rule", "given". */
const char *configuration_origin_text(enum configuration_origin origin);

#define TERM_TEXT_MAX 24

/* A ground term as tables print it: "2P*1/2" ('*' odd parity), "J=4" when only
 * J is known. -1 in multiplicity, big_l or twice_j: not known. */
struct term {
    char text[TERM_TEXT_MAX]; /* "" when unknown */
    int multiplicity;         /* 2S+1 */
    int big_l;                /* L: S P D F G H I K L M = 0…9 */
    int twice_j;              /* 2J */
};

/* Reads a printed term; fields that the text does not hold are -1. False when
 * the text is not of that form (then all are unknown). */
bool term_parse(const char *text, struct term *term);

/* The site is that of an ion in a solid; none where none was named. The same
 * ion at two sites is two species; a free atom's properties do not know it. */
struct species {
    int z;
    int charge;
    struct site site;
    struct configuration configuration;
    enum configuration_origin origin;
    struct term term;
    /* Which subshell loses the next electron, where that has been worked out:
     * 1 + its place in the configuration, -1 when the ion differs in more than
     * one subshell or there is none; 0 when nobody has looked. */
    int emptied;
};

/* Writes an ion as the trade does, "Fe3+", "Cs+", "O2-", and a neutral atom
 * by its symbol. Returns out. */
#define ION_TEXT_MAX 20
const char *ion_print(int z, int charge, char out[ION_TEXT_MAX]);

/* The same with its site where one was named: "Co3+@VI,low". */
const char *ion_print_at(int z, int charge, struct site site,
                         char out[ION_TEXT_MAX]);
const char *species_print(const struct species *species,
                          char out[ION_TEXT_MAX]);

/* Appends a configuration with where it comes from when that is not a table:
 * "[Ar] 3d6 (by rule)". */
void species_configuration_text(struct text *t, const struct species *species);

#endif
