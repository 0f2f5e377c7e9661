/* SPDX-License-Identifier: MIT */
/* What is chosen, the same for every screen. */
#ifndef SESSION_CHOICE_H
#define SESSION_CHOICE_H

#include "analysis/comparison.h"
#include "element/element.h"
#include "element/selection.h"
#include "element/walk.h"
#include "study/study.h"

#define PIN_MAX COMPARISON_MAX

struct pin {
    int z, charge;
};

/* Which number of a row is shown where there is room for one. */
enum shown { SHOWN_VALUE, SHOWN_REFERENCE, SHOWN_RESIDUAL, SHOWN_COUNT };

/* The upright axis of a quantity: logarithmic where the values span much, or
 * as chosen. */
enum value_axis {
    VALUE_AXIS_AUTO,
    VALUE_AXIS_LINEAR,
    VALUE_AXIS_LOG,
    VALUE_AXIS_COUNT
};

struct choice {
    int z;
    int charge;
    enum quantity_id quantity;
    const struct model *model;         /* NULL: no model offers the quantity */
    const struct reference *reference; /* NULL: the default one */
    const struct reference *against;   /* NULL: no second one */
    unsigned evidence;                 /* kinds of stored values; 0: all */
    /* The user's own, of one species; no electrons: none. */
    struct configuration configuration;
    struct pin configured;
    int n, l;         /* n = 0: outermost */
    struct site site; /* of ions, for sets that tell sites apart */
    const struct unit *units[DIMENSION_VOLUME + 1]; /* NULL: base unit */
    int pin_count;
    struct pin pins[PIN_MAX];

    /* How it is shown. */
    enum shown shown;
    enum walk_kind walk;
    unsigned hidden_models; /* without a curve; bit by place in the registry */
    enum value_axis axis;
    bool percent; /* residuals in per cent of the reference */
    bool braille; /* curves in braille dots */
    enum grid_width grid;
    enum grid_group3 group3;
};

#endif
