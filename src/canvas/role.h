/* SPDX-License-Identifier: MIT */
/* What a cell of the canvas means; colours come later (terminal/palette.c). */
#ifndef CANVAS_ROLE_H
#define CANVAS_ROLE_H

/* Steps of the two colour scales. */
#define RAMP_STEPS                                                             \
    9 /* sequential: low to high, lightness strictly monotone                  \
       */
#define BALANCE_STEPS 9 /* diverging: the middle one is "no difference" */

/* role, letter in golden screens. A role never carries meaning alone: words,
 * brackets, signs or glyphs say the same. */
#define ROLE_LIST(X)                                                           \
    X(ROLE_TEXT, '.')    /* ordinary text */                                   \
    X(ROLE_TITLE, 'T')   /* what the screen shows, the selected element */     \
    X(ROLE_HEADING, 'H') /* headings of columns and parts */                   \
    X(ROLE_QUIET, 'q')   /* rules, frames, empty places */                     \
    X(ROLE_KEY, 'K')     /* a key that can be pressed */                       \
    X(ROLE_LABEL, 'L')   /* what that key does */                              \
    X(ROLE_CHOSEN, 'C')  /* the selected row or cell, reverse */               \
    X(ROLE_PIN, 'P')     /* a pinned element */                                \
    X(ROLE_GAP, 'G')     /* no number here */                                  \
    X(ROLE_ABOVE, '+')   /* model above reference */                           \
    X(ROLE_BELOW, '-')   /* model below reference */                           \
    X(ROLE_CAUTION, '!') /* a caution or a failure */                          \
    X(ROLE_FIELD, 'F')   /* a line being typed */                              \
    X(ROLE_CURVE_1, 'a')                                                       \
    X(ROLE_CURVE_2, 'b')                                                       \
    X(ROLE_CURVE_3, 'c')                                                       \
    X(ROLE_CURVE_4, 'd')                                                       \
    X(ROLE_CURVE_5, 'e')

enum role {
#define ROLE_ENUM(role, letter) role,
    ROLE_LIST(ROLE_ENUM)
#undef ROLE_ENUM
    /* The scales follow: ROLE_RAMP + i, ROLE_BALANCE + i. */
    ROLE_RAMP,
    ROLE_BALANCE = ROLE_RAMP + RAMP_STEPS,
    ROLE_COUNT = ROLE_BALANCE + BALANCE_STEPS
};

/* The letter that stands for a role in a golden screen: those of the list,
 * '1'…'9' for the ramp, 's'…'{' … for the balance; unique. */
char role_letter(enum role role);

#endif
