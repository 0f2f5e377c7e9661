/* SPDX-License-Identifier: MIT */
#include "session/site.h"

void session_asked_site(const struct session *s, const struct provenance *set,
                        struct text *t)
{
    const struct reference *reference =
        reference_find(study_references(s->study), set->id);
    if (!reference || !reference_has_sites(reference))
        return;
    text_add(t, " at ");
    reference_asked_site(reference, s->choice.site, t);
}

void session_stored_site(const struct reading *stored, struct text *t)
{
    if (stored->state == READING_OK)
        site_words(t, stored->site);
}
