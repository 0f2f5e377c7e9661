/* SPDX-License-Identifier: MIT */
/* The words that options accept, for checks, hints, help and completions. */
#ifndef CLI_WORDS_H
#define CLI_WORDS_H

#include "base/status.h"
#include "base/text.h"
#include "cli/option.h"
#include "study/reference.h"

#define WORD_MAX 192           /* words of one kind */
#define WORD_TEXT_MAX 64       /* one word of a list, terminator included */
#define WORD_LIST_TEXT_MAX 400 /* what fits into a message */

/* The word that stands for no model: stored values alone. The last one of its
 * kind. */
#define WORD_NO_MODEL "none"

/* Words of a kind in their order of display, and what each stands for, ""
 * where that is the word itself; borrowed. */
struct words {
    int count;
    const char *items[WORD_MAX];
    const char *titles[WORD_MAX];
};

/* Fills in the words of an option, none where it has none of its own.
 * references may be NULL: then there are no words for a data set. */
void words_fill(struct words *words, const struct option *option,
                const struct reference_list *references);

/* Adds a word, and what it stands for; one that is there already is left. */
void words_add(struct words *words, const char *word, const char *title);

/* The one of items[count] that a misspelt word may have meant: it starts with
 * it or differs in at most a quarter of the letters and one more, and in fewer
 * than the shorter of the two has. NULL when none is near. */
const char *word_nearest(const char *word, const char *const *items, int count);

/* Those of the words whose id or title holds `part`, in any case; of two
 * letters only the beginning of an id counts. One that is it in another case
 * stands alone. found[WORD_MAX] gets them; gives how many. */
int words_holding(const struct words *words, const char *part,
                  const char *found[WORD_MAX]);

/* Writes "a, b or c" with the given last conjunction; where not all fit, those
 * that do and "...". */
void words_join(struct text *t, const char *const *items, int count,
                const char *conjunction);

/* The next word of a comma list into out; *list moves behind it, to NULL at
 * the end. False when the word is longer than out. */
bool words_next(const char **list, char out[WORD_TEXT_MAX]);

/* Refuses a word that is none of its kind, naming option, word, those that it
 * is a part of or the nearest one, and all that are accepted as far as they
 * fit. Returns false. */
bool word_refuse(const struct option *option, const char *word,
                 const struct words *words, struct status *st);

#endif
