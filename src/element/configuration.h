/* SPDX-License-Identifier: MIT */
/* Electron configurations and their usual shorthand, `[Ar] 3d6 4s2`. */
#ifndef ELEMENT_CONFIGURATION_H
#define ELEMENT_CONFIGURATION_H

#include <stdbool.h>

#include "base/status.h"
#include "element/subshell.h"

#define SUBSHELL_MAX 26 /* all n l with n <= N_MAX, l <= L_MAX, l < n */
#define CONFIGURATION_TEXT_MAX 160

/* Occupied subshells in order of n, then l; none twice, none empty. */
struct configuration {
    int count;
    struct subshell shells[SUBSHELL_MAX];
};

/* Reads a configuration: an optional noble-gas core in square brackets, then
 * subshells with their occupation (`3d6`, a missing number means one, `3d5.5`
 * is allowed), separated by spaces; order does not matter. Refused with the reason
 * (STATUS_USAGE): unknown core, a label that is none, an overfull or repeated
 * subshell, one that the core holds already, nothing at all. */
MUST_CHECK bool configuration_parse(const char *text,
                                    struct configuration *configuration,
                                    struct status *st);

/* Writes the shorthand with the largest noble-gas core that leaves something
 * to write ("[He] 2s2 2p6", "1s2"); "none" for a bare nucleus. Returns out.
 */
const char *configuration_print(const struct configuration *configuration,
                                char out[CONFIGURATION_TEXT_MAX]);

/* Number of electrons. */
double configuration_electrons(const struct configuration *configuration);

/* Occupation of one subshell, 0 when it is absent. */
double configuration_occupation(const struct configuration *configuration,
                                int n, int l);

/* The subshell with the highest n, then highest l, or NULL when empty. */
const struct subshell *
configuration_outermost(const struct configuration *configuration);

/* The subshell of `before` that holds fewer electrons in `after`, as an ion is
 * made from its atom; NULL when there is none or more than one. */
const struct subshell *configuration_emptied(const struct configuration *before,
                                             const struct configuration *after);

/* Adds (or with a negative change removes) electrons in one subshell. False,
 * and nothing changed, when it would hold less than 0 or more than 4l+2. */
MUST_CHECK bool configuration_change(struct configuration *configuration, int n,
                                     int l, double change);

/* True when both hold the same subshells with the same occupations. */
bool configuration_same(const struct configuration *a,
                        const struct configuration *b);

/* A configuration of whole electrons as two printable characters a subshell,
 * for tables that are read often: in the order of n, then l. Returns out. */
#define CONFIGURATION_PACKED_MAX (2 * SUBSHELL_MAX + 1)
const char *configuration_pack(const struct configuration *configuration,
                               char out[CONFIGURATION_PACKED_MAX]);

/* Back from what configuration_pack made; nothing is checked. */
void configuration_unpack(const char *packed,
                          struct configuration *configuration);

/* Electrons in shell n. */
double configuration_shell(const struct configuration *configuration, int n);

#endif
