/* SPDX-License-Identifier: MIT */
/* The site of an ion: how many neighbours it has, and its spin state there. */
#ifndef ELEMENT_SITE_H
#define ELEMENT_SITE_H

#include <stdbool.h>

#include "base/status.h"
#include "base/text.h"

/* Spin state of an ion at a site: its id, its words. */
#define SPIN_LIST(X)                                                           \
    X(SPIN_NONE, "", "")                                                       \
    X(SPIN_LOW, "low", "low spin")                                             \
    X(SPIN_HIGH, "high", "high spin")

/* Coordination as the trade writes it; the coordination number. */
#define COORDINATION_LIST(X)                                                   \
    X(COORDINATION_NONE, "", 0)                                                \
    X(COORDINATION_I, "I", 1)                                                  \
    X(COORDINATION_II, "II", 2)                                                \
    X(COORDINATION_III, "III", 3)                                              \
    X(COORDINATION_III_PY, "IIIPY", 3)                                         \
    X(COORDINATION_IV, "IV", 4)                                                \
    X(COORDINATION_IV_PY, "IVPY", 4)                                           \
    X(COORDINATION_IV_SQ, "IVSQ", 4)                                           \
    X(COORDINATION_V, "V", 5)                                                  \
    X(COORDINATION_VI, "VI", 6)                                                \
    X(COORDINATION_VII, "VII", 7)                                              \
    X(COORDINATION_VIII, "VIII", 8)                                            \
    X(COORDINATION_IX, "IX", 9)                                                \
    X(COORDINATION_X, "X", 10)                                                 \
    X(COORDINATION_XI, "XI", 11)                                               \
    X(COORDINATION_XII, "XII", 12)                                             \
    X(COORDINATION_XIV, "XIV", 14)

#define SITE_ENUM(name, id, words) name,
enum spin_state { SPIN_LIST(SITE_ENUM) SPIN_COUNT };
enum coordination { COORDINATION_LIST(SITE_ENUM) COORDINATION_COUNT };
#undef SITE_ENUM

/* Ids as in files, and words for a screen; never NULL. */
const char *spin_id(enum spin_state spin);
const char *spin_word(enum spin_state spin);
const char *coordination_id(enum coordination coordination);
int coordination_number(enum coordination coordination); /* 0 for none */

/* As someone types it: roman in any case or by its number, with the shape
 * behind it: "VI", "vi", "6", "IVSQ", "4sq". False when there is none. */
bool coordination_find(const char *text, enum coordination *found);

/* COORDINATION_NONE: the default of the data set that is read. SPIN_NONE: the
 * spin state that its source prefers there. Both: no site was named. */
struct site {
    enum coordination coordination;
    enum spin_state spin;
};

bool site_named(struct site site);
bool site_same(struct site a, struct site b);

/* What `site` leaves open is taken from `other`. */
struct site site_filled(struct site site, struct site other);

/* Reads what stands behind the '@' of an ion: "VI", "6,low", "high", in any
 * case; or "all", for every stored site (then *all is set and the site is that
 * of nobody). word: the whole, named in the message. Fails with STATUS_USAGE.
 */
MUST_CHECK bool site_parse(const char *text, const char *word,
                           struct site *site, bool *all, struct status *st);

/* Writes a site in the same notation, "VI,low", "" for none. Returns out. */
#define SITE_TEXT_MAX 12
const char *site_print(struct site site, char out[SITE_TEXT_MAX]);

/* Appends it in words: "VI, low spin". */
void site_words(struct text *t, struct site site);

#endif
