/* SPDX-License-Identifier: MIT */
#include "element/configuration.h"

#include <assert.h>
#include <math.h>
#include <stddef.h>
#include <string.h>

#include "base/text.h"

/* Occupations closer than this are the same: they are typed, not computed. */
#define OCCUPATION_TOLERANCE 1e-9

/* Each noble gas in closed subshells, in the order of a configuration. */
static const struct {
    const char *symbol;
    const char *closed;
} cores[] = {
    {"He", "1s"},
    {"Ne", "1s2s2p"},
    {"Ar", "1s2s2p3s3p"},
    {"Kr", "1s2s2p3s3p3d4s4p"},
    {"Xe", "1s2s2p3s3p3d4s4p4d5s5p"},
    {"Rn", "1s2s2p3s3p3d4s4p4d4f5s5p5d6s6p"},
    {"Og", "1s2s2p3s3p3d4s4p4d4f5s5p5d5f6s6p6d7s7p"},
};
#define CORE_COUNT (sizeof cores / sizeof cores[0])

static int find(const struct configuration *c, int n, int l)
{
    for (int i = 0; i < c->count; i++)
        if (c->shells[i].n == n && c->shells[i].l == l)
            return i;
    return -1;
}

bool configuration_change(struct configuration *c, int n, int l, double change)
{
    int i = find(c, n, l);
    double occ = (i < 0 ? 0.0 : c->shells[i].occ) + change;
    if (occ < -OCCUPATION_TOLERANCE || occ > 4 * l + 2 + OCCUPATION_TOLERANCE)
        return false;
    if (i < 0) {
        if (occ <= OCCUPATION_TOLERANCE)
            return true;
        assert(c->count < SUBSHELL_MAX);
        i = c->count++;
        while (i > 0 && (c->shells[i - 1].n > n ||
                         (c->shells[i - 1].n == n && c->shells[i - 1].l > l))) {
            c->shells[i] = c->shells[i - 1];
            i--;
        }
        c->shells[i] = (struct subshell){n, l, occ};
    } else if (occ <= OCCUPATION_TOLERANCE) {
        memmove(&c->shells[i], &c->shells[i + 1],
                (size_t)(c->count - i - 1) * sizeof c->shells[0]);
        c->count--;
    } else {
        c->shells[i].occ = occ;
    }
    return true;
}

/* Makes the closed subshells of a core the whole configuration. */
static void set_core(struct configuration *c, const char *closed)
{
    c->count = 0;
    for (const char *p = closed; *p; p += 2) {
        char label[SUBSHELL_TEXT_MAX] = {p[0], p[1], '\0'};
        struct subshell *s = &c->shells[c->count++];
        bool right = subshell_parse(label, &s->n, &s->l);
        assert(right);
        (void)right;
        s->occ = 4 * s->l + 2;
    }
}

static bool parse_core(const char **at, struct configuration *c,
                       struct status *st)
{
    const char *open = *at;
    const char *close = strchr(open, ']');
    if (!close)
        return status_fail(st, STATUS_USAGE,
                           "configuration '%s': '[' without ']'", open);
    size_t length = (size_t)(close - open - 1);
    for (size_t i = 0; i < CORE_COUNT; i++) {
        if (strlen(cores[i].symbol) == length &&
            strncmp(cores[i].symbol, open + 1, length) == 0) {
            set_core(c, cores[i].closed);
            *at = close + 1;
            return true;
        }
    }
    return status_fail(st, STATUS_USAGE,
                       "configuration core '%.*s': not a noble gas; expected "
                       "one of [He] [Ne] [Ar] [Kr] [Xe] [Rn] [Og]",
                       (int)(close - open + 1), open);
}

static bool parse_subshell(const char *word, size_t length, bool in_core,
                           struct configuration *c, struct status *st)
{
    char text[16];
    int n, l;
    double occ = 1.0;
    int shown = length > 24 ? 24 : (int)length;
    if (length < 2 || length >= sizeof text)
        return status_fail(st, STATUS_USAGE,
                           "configuration: '%.*s' is no subshell; expected "
                           "one such as 3d6",
                           shown, word);
    memcpy(text, word, length);
    text[length] = '\0';
    char label[SUBSHELL_TEXT_MAX] = {text[0], text[1], '\0'};
    if (!subshell_parse(label, &n, &l) ||
        (text[2] != '\0' &&
         (strspn(text + 2, "0123456789.") != strlen(text + 2) ||
          !text_to_double(text + 2, &occ))))
        return status_fail(st, STATUS_USAGE,
                           "configuration: '%s' is no subshell; expected one "
                           "such as 3d6 (s, p, d or f, n up to %d)",
                           text, N_MAX);
    if (occ <= 0.0)
        return status_fail(st, STATUS_USAGE,
                           "configuration: '%s' holds no electron", text);
    if (configuration_occupation(c, n, l) > 0.0)
        return status_fail(st, STATUS_USAGE,
                           "configuration: %s stands there twice%s", label,
                           in_core ? " (the core holds it already)" : "");
    if (!configuration_change(c, n, l, occ))
        return status_fail(st, STATUS_USAGE,
                           "configuration: %s is overfull; %s holds at most "
                           "%d electrons",
                           text, label, 4 * l + 2);
    return true;
}

bool configuration_parse(const char *text, struct configuration *configuration,
                         struct status *st)
{
    struct configuration c = {0};
    const char *p = text + strspn(text, " ");
    if (*p == '[' && !parse_core(&p, &c, st))
        return false;
    const struct configuration core = c;
    while (*(p += strspn(p, " "))) {
        size_t length = strcspn(p, " ");
        int n, l;
        char label[SUBSHELL_TEXT_MAX] = {p[0], length > 1 ? p[1] : '\0', '\0'};
        bool in_core = subshell_parse(label, &n, &l) &&
                       configuration_occupation(&core, n, l) > 0.0;
        if (!parse_subshell(p, length, in_core, &c, st))
            return false;
        p += length;
    }
    if (c.count == 0)
        return status_fail(st, STATUS_USAGE,
                           "configuration: empty; expected one such as "
                           "'[Ar] 3d6 4s2'");
    *configuration = c;
    return true;
}

/* True when c holds all of core in closed form and something more. */
static bool holds_core(const struct configuration *c,
                       const struct configuration *core)
{
    for (int i = 0; i < core->count; i++) {
        const struct subshell *s = &core->shells[i];
        if (fabs(configuration_occupation(c, s->n, s->l) - s->occ) >
            OCCUPATION_TOLERANCE)
            return false;
    }
    return c->count > core->count;
}

const char *configuration_print(const struct configuration *configuration,
                                char out[CONFIGURATION_TEXT_MAX])
{
    struct text t = text_over(out, CONFIGURATION_TEXT_MAX);
    struct configuration core = {0};
    struct configuration used = {0};
    if (configuration->count == 0)
        text_add(&t, "none");
    for (size_t i = 0; i < CORE_COUNT; i++) {
        set_core(&core, cores[i].closed);
        if (!holds_core(configuration, &core))
            continue;
        used = core;
        t = text_over(out, CONFIGURATION_TEXT_MAX);
        text_addf(&t, "[%s]", cores[i].symbol);
    }
    for (int i = 0; i < configuration->count; i++) {
        const struct subshell *s = &configuration->shells[i];
        if (configuration_occupation(&used, s->n, s->l) > 0.0)
            continue;
        text_addf(&t, "%s%d%c%.10g", t.length ? " " : "", s->n,
                  subshell_letter(s->l), s->occ);
    }
    return out;
}

double configuration_electrons(const struct configuration *configuration)
{
    double sum = 0.0;
    for (int i = 0; i < configuration->count; i++)
        sum += configuration->shells[i].occ;
    return sum;
}

double configuration_occupation(const struct configuration *configuration,
                                int n, int l)
{
    int i = find(configuration, n, l);
    return i < 0 ? 0.0 : configuration->shells[i].occ;
}

const struct subshell *
configuration_outermost(const struct configuration *configuration)
{
    if (configuration->count == 0)
        return NULL;
    return &configuration->shells[configuration->count - 1];
}

const struct subshell *configuration_emptied(const struct configuration *before,
                                             const struct configuration *after)
{
    const struct subshell *emptied = NULL;
    int k = 0; /* both go upwards in n, then l */
    for (int i = 0; i < before->count; i++) {
        const struct subshell *s = &before->shells[i];
        const struct subshell *o = after->shells;
        while (k < after->count &&
               (o[k].n < s->n || (o[k].n == s->n && o[k].l < s->l)))
            k++;
        bool there = k < after->count && o[k].n == s->n && o[k].l == s->l;
        if ((there ? o[k].occ : 0.0) > s->occ - OCCUPATION_TOLERANCE)
            continue;
        if (emptied)
            return NULL;
        emptied = s;
    }
    return emptied;
}

bool configuration_same(const struct configuration *a,
                        const struct configuration *b)
{
    if (a->count != b->count)
        return false;
    for (int i = 0; i < a->count; i++) {
        const struct subshell *s = &a->shells[i];
        if (fabs(configuration_occupation(b, s->n, s->l) - s->occ) >
            OCCUPATION_TOLERANCE)
            return false;
    }
    return true;
}

double configuration_shell(const struct configuration *configuration, int n)
{
    double sum = 0.0;
    for (int i = 0; i < configuration->count; i++)
        if (configuration->shells[i].n == n)
            sum += configuration->shells[i].occ;
    return sum;
}

/* Characters from '0' upwards are printable and need no escape but for the
 * backslash, which neither range reaches: n, l to 4n + l, 4 … 35; electrons 1
 * … 14. */
const char *configuration_pack(const struct configuration *configuration,
                               char out[CONFIGURATION_PACKED_MAX])
{
    char *p = out;
    for (int i = 0; i < configuration->count; i++) {
        const struct subshell *s = &configuration->shells[i];
        *p++ = (char)('0' + 4 * s->n + s->l);
        *p++ = (char)('0' + (int)s->occ);
    }
    *p = '\0';
    return out;
}

void configuration_unpack(const char *packed,
                          struct configuration *configuration)
{
    configuration->count = 0;
    for (; packed[0] && packed[1]; packed += 2) {
        int place = packed[0] - '0';
        configuration->shells[configuration->count++] =
            (struct subshell){place / 4, place % 4, (double)(packed[1] - '0')};
    }
}
