/* SPDX-License-Identifier: MIT */
#include "canvas/role.h"

#include <assert.h>

char role_letter(enum role role)
{
    static const char letters[] = {
#define ROLE_LETTER(role, letter) letter,
        ROLE_LIST(ROLE_LETTER)
#undef ROLE_LETTER
    };
    assert((int)role >= 0 && role < ROLE_COUNT);
    int i = (int)role;
    if (i < ROLE_RAMP)
        return letters[i];
    if (i < ROLE_BALANCE)
        return (char)('1' + (i - ROLE_RAMP));
    return (char)('s' + (i - ROLE_BALANCE));
}
