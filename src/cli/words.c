/* SPDX-License-Identifier: MIT */
#include "cli/words.h"

#include <stdint.h>
#include <string.h>

/* Bytes of a refused word that a message shows. */
#define WORD_SHOWN_MAX 41

void words_add(struct words *words, const char *word, const char *title)
{
    for (int i = 0; i < words->count; i++)
        if (strcmp(words->items[i], word) == 0)
            return;
    if (words->count == WORD_MAX)
        return;
    words->titles[words->count] = title;
    words->items[words->count++] = word;
}

void words_fill(struct words *words, const struct option *option,
                const struct reference_list *references)
{
    words->count = 0;
    if (option->words)
        option->words(words, references);
}

const char *word_nearest(const char *word, const char *const *items, int count)
{
    const char *best = NULL;
    size_t least = SIZE_MAX;
    size_t length = strlen(word);
    for (int i = 0; i < count; i++) {
        size_t other = strlen(items[i]);
        size_t longer = other > length ? other : length;
        size_t shorter = other > length ? length : other;
        size_t distance = text_edit_distance(word, items[i]);
        if (length >= 2 && text_starts_ignoring_case(items[i], word))
            distance = 1;
        if (distance <= longer / 4 + 1 && distance < least &&
            distance < shorter) {
            least = distance;
            best = items[i];
        }
    }
    return best;
}

/* True when `part` stands somewhere in a text, in any case. */
static bool holds(const char *text, const char *part)
{
    for (; *text; text++)
        if (text_starts_ignoring_case(text, part))
            return true;
    return false;
}

int words_holding(const struct words *words, const char *part,
                  const char *found[WORD_MAX])
{
    int count = 0;
    size_t length = strlen(part);
    for (int i = 0; i < words->count; i++)
        if (text_same_ignoring_case(words->items[i], part)) {
            found[0] = words->items[i];
            return 1;
        }
    for (int i = 0; i < words->count && length >= 2; i++) {
        bool any =
            length > 2
                ? holds(words->items[i], part) || holds(words->titles[i], part)
                : text_starts_ignoring_case(words->items[i], part);
        if (any)
            found[count++] = words->items[i];
    }
    return count;
}

void words_join(struct text *t, const char *const *items, int count,
                const char *conjunction)
{
    for (int i = 0; i < count; i++) {
        bool last = i == count - 1;
        size_t more = last ? 0 : strlen(", ...");
        size_t need = strlen(items[i]) + strlen(conjunction) + 2 + more;
        if (t->length + need >= t->capacity) {
            text_add(t, i > 0 ? ", ..." : "...");
            t->cut = true;
            return;
        }
        if (i > 0 && last)
            text_addf(t, " %s ", conjunction);
        else if (i > 0)
            text_add(t, ", ");
        text_add(t, items[i]);
    }
}

bool words_next(const char **list, char out[WORD_TEXT_MAX])
{
    size_t length = strcspn(*list, ",");
    if (length >= WORD_TEXT_MAX)
        return false;
    memcpy(out, *list, length);
    out[length] = '\0';
    *list = (*list)[length] ? *list + length + 1 : NULL;
    return true;
}

bool word_refuse(const struct option *option, const char *word,
                 const struct words *words, struct status *st)
{
    char all[WORD_LIST_TEXT_MAX];
    char meant[WORD_LIST_TEXT_MAX];
    const char *near[WORD_MAX];
    struct text t = text_over(all, sizeof all);
    struct text m = text_over(meant, sizeof meant);
    int count = words_holding(words, word + strspn(word, " "), near);
    if (count == 0 && !option->apart) {
        near[0] = word_nearest(word, words->items, words->count);
        count = near[0] != NULL;
    }
    words_join(&t, words->items, words->count, "or");
    words_join(&m, near, count, "or");
    char shown[WORD_SHOWN_MAX];
    struct text w = text_over(shown, sizeof shown);
    text_add(&w, word[0] ? word : "an empty word");
    const char *rest = w.cut ? "..." : "";
    if (count > 0 && (t.cut || t.length + m.length > WORD_LIST_TEXT_MAX - 50))
        return status_fail(st, STATUS_USAGE,
                           "--%s %s%s: not accepted; did you mean %s?",
                           option->name, shown, rest, meant);
    if (count > 0)
        return status_fail(st, STATUS_USAGE,
                           "--%s %s%s: not accepted; did you mean %s? "
                           "(expected %s)",
                           option->name, shown, rest, meant, all);
    return status_fail(st, STATUS_USAGE, "--%s %s%s: not accepted; expected %s",
                       option->name, shown, rest, all);
}
