/* SPDX-License-Identifier: MIT */
/* What the options share in reading their words. */
#ifndef CLI_READ_H
#define CLI_READ_H

#include "cli/request.h"
#include "cli/words.h"

/* Place of a word among those of the option, -1 with st filled when it is none
 * of them. */
int read_place(const struct request *request, const struct option *option,
               const char *word, struct status *st);

/* An option that is one word out of a few: *choice becomes its place. */
MUST_CHECK bool read_choice(const struct request *request,
                            const struct option *option, const char *value,
                            int *choice, struct status *st);

/* Goes through a list of words: the next one into word, *list behind it, NULL
 * at the end. False, with st filled, for a word that is longer than any. */
MUST_CHECK bool read_next(const struct option *option, const char **list,
                          char word[WORD_TEXT_MAX], struct status *st);

/* Words of a list as bits by their place. */
MUST_CHECK bool read_bits(const struct request *request,
                          const struct option *option, const char *value,
                          unsigned *bits, struct status *st);

/* Fails: a word is named twice in a list. */
bool read_twice(const struct option *option, const char *word,
                struct status *st);

#endif
