/* SPDX-License-Identifier: MIT */
#include "element/evidence.h"

#include <string.h>

static const struct {
    const char *id;
    const char *word;
    const char *left_out;
} rows[EVIDENCE_COUNT] = {
#define EVIDENCE_ROW(name, id, word)                                           \
    {id, word, "only a value of another kind is stored: " word},
    EVIDENCE_LIST(EVIDENCE_ROW)
#undef EVIDENCE_ROW
};

const char *evidence_id(enum evidence evidence)
{
    return rows[evidence].id;
}

const char *evidence_word(enum evidence evidence)
{
    return rows[evidence].word;
}

const char *evidence_left_out(enum evidence evidence)
{
    return rows[evidence].left_out;
}

bool evidence_find(const char *id, enum evidence *found)
{
    for (int e = 0; e < EVIDENCE_COUNT; e++)
        if (strcmp(rows[e].id, id) == 0) {
            *found = (enum evidence)e;
            return true;
        }
    return false;
}

bool evidence_chosen(unsigned choice, enum evidence evidence)
{
    return choice == 0 || (choice >> evidence & 1u);
}
