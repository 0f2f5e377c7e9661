/* SPDX-License-Identifier: MIT */
#include "cli/read.h"

#include <string.h>

int read_place(const struct request *r, const struct option *option,
               const char *word, struct status *st)
{
    struct words words;
    words_fill(&words, option, r->study ? study_references(r->study) : NULL);
    for (int i = 0; i < words.count; i++)
        if (strcmp(words.items[i], word) == 0)
            return i;
    word_refuse(option, word, &words, st);
    return -1;
}

bool read_choice(const struct request *r, const struct option *option,
                 const char *value, int *choice, struct status *st)
{
    *choice = read_place(r, option, value, st);
    return *choice >= 0;
}

bool read_next(const struct option *option, const char **list,
               char word[WORD_TEXT_MAX], struct status *st)
{
    return words_next(list, word) ||
           status_fail(st, STATUS_USAGE, "--%s %.20s...: no such word",
                       option->name, *list);
}

bool read_twice(const struct option *option, const char *word,
                struct status *st)
{
    return status_fail(st, STATUS_USAGE, "--%s %s: named twice", option->name,
                       word);
}

bool read_bits(const struct request *r, const struct option *option,
               const char *value, unsigned *bits, struct status *st)
{
    char word[WORD_TEXT_MAX];
    *bits = 0;
    while (value) {
        if (!read_next(option, &value, word, st))
            return false;
        int place = read_place(r, option, word, st);
        if (place < 0)
            return false;
        if (*bits >> place & 1u)
            return read_twice(option, word, st);
        *bits |= 1u << place;
    }
    return true;
}
