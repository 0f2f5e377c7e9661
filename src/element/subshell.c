/* SPDX-License-Identifier: MIT */
#include "element/subshell.h"

#include <assert.h>
#include <string.h>

static const char letters[] = "spdf";

char subshell_letter(int l)
{
    assert(l >= 0 && l <= L_MAX);
    return letters[l];
}

bool subshell_parse(const char *text, int *n, int *l)
{
    if (text[0] < '1' || text[0] > '0' + N_MAX || text[1] == '\0' ||
        text[2] != '\0')
        return false;
    const char *letter = strchr(letters, text[1]);
    if (!letter || letter - letters >= text[0] - '0')
        return false;
    *n = text[0] - '0';
    *l = (int)(letter - letters);
    return true;
}

const char *subshell_print(int n, int l, char out[SUBSHELL_TEXT_MAX])
{
    assert(n >= 1 && n <= N_MAX);
    out[0] = (char)('0' + n);
    out[1] = subshell_letter(l);
    out[2] = '\0';
    return out;
}
