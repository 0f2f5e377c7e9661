/* SPDX-License-Identifier: MIT */
/* Subshells and configurations, and their usual shorthand. */
#ifndef ELEMENT_SUBSHELL_H
#define ELEMENT_SUBSHELL_H

#include <stdbool.h>

#include "base/status.h"

#define N_MAX 8 /* principal quantum numbers 1…8 */
#define L_MAX 3 /* s, p, d, f */
#define SUBSHELL_TEXT_MAX 4

/* n, l and the electrons in it, 0 < occ <= 4l+2 where it stands in a
 * configuration. */
struct subshell {
    int n, l;
    double occ;
};

/* The letter of l, 0 <= l <= L_MAX. */
char subshell_letter(int l);

/* "3d" to n and l; false when text is not exactly such a label with
 * 1 <= n <= N_MAX and l < n. */
bool subshell_parse(const char *text, int *n, int *l);

/* Writes "3d"; returns out. */
const char *subshell_print(int n, int l, char out[SUBSHELL_TEXT_MAX]);

#endif
