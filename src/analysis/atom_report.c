/* SPDX-License-Identifier: MIT */
#include "analysis/atom_report.h"

#include <assert.h>

#include "base/text.h"

const struct atom_method method_default = {FUNCTIONAL_LSD, RELATIVITY_DIRAC,
                                           0.0};

struct names {
    const char *id, *title;
};

static const struct names functionals[] = {
#define FUNCTIONAL_NAMES(functional, id, title) {id, title},
    FUNCTIONAL_LIST(FUNCTIONAL_NAMES)
#undef FUNCTIONAL_NAMES
};

static const struct names relativities[] = {
#define RELATIVITY_NAMES(relativity, id, title) {id, title},
    RELATIVITY_LIST(RELATIVITY_NAMES)
#undef RELATIVITY_NAMES
};

const char *functional_id(enum functional functional)
{
    return functionals[functional].id;
}

const char *functional_title(enum functional functional)
{
    return functionals[functional].title;
}

const char *relativity_id(enum relativity relativity)
{
    return relativities[relativity].id;
}

const char *relativity_title(enum relativity relativity)
{
    return relativities[relativity].title;
}

const char *level_print(const struct report_level *level,
                        char out[LEVEL_TEXT_MAX])
{
    char shell[SUBSHELL_TEXT_MAX];
    struct text t = text_over(out, LEVEL_TEXT_MAX);
    text_add(&t, subshell_print(level->n, level->l, shell));
    if (level->twice_j)
        text_addf(&t, "%d/2", level->twice_j);
    assert(!t.cut);
    return out;
}

const char *level_spin_text(int spin)
{
    return spin > 0 ? "majority" : spin < 0 ? "minority" : "";
}
