/* SPDX-License-Identifier: MIT */
#include "session/command.h"

void session_command_species(struct text *t, int z, int charge)
{
    char ion[ION_TEXT_MAX];
    text_addf(t, " %s", ion_print(z, charge, ion));
}

void session_command_own(const struct session *s, struct text *t)
{
    char text[CONFIGURATION_TEXT_MAX];
    configuration_print(&s->choice.configuration, text);
    text_addf(t, " --configuration '%s'", text);
}

void session_command_site(const struct session *s, struct text *t)
{
    const struct site *site = &s->choice.site;
    if (site->coordination != COORDINATION_NONE)
        text_addf(t, " --coordination %s", coordination_id(site->coordination));
    if (site->spin != SPIN_NONE)
        text_addf(t, " --spin %s", spin_id(site->spin));
}

void session_command_quantity(const struct session *s, struct text *t)
{
    text_addf(t, " --quantity %s", quantity_at(s->choice.quantity)->id);
}

/* Whether a set that tells sites apart is read: the chosen one, or the default
 * one of an ion's radius. */
static bool reads_sites(const struct choice *c, bool ions)
{
    if (c->against && reference_has_sites(c->against))
        return true;
    return c->reference ? reference_has_sites(c->reference)
                        : c->quantity == QUANTITY_RADIUS && ions;
}

void session_command_choices(const struct session *s, struct text *t, bool ions,
                             bool against)
{
    const struct choice *c = &s->choice;
    char label[SUBSHELL_TEXT_MAX];
    bool begun = false;
    if (c->n)
        text_addf(t, " --subshell %s", subshell_print(c->n, c->l, label));
    if (c->reference)
        text_addf(t, " --reference %s", c->reference->provenance->id);
    if (reads_sites(c, ions))
        session_command_site(s, t);
    if (c->against && against)
        text_addf(t, " --against %s", c->against->provenance->id);
    for (int e = 0; e < EVIDENCE_COUNT && c->evidence; e++)
        if (c->evidence >> e & 1u) {
            text_addf(t, "%s%s", begun ? "," : " --evidence ",
                      evidence_id((enum evidence)e));
            begun = true;
        }
}

void session_command_units(const struct session *s, struct text *t)
{
    bool begun = false;
    for (int d = 0; d <= DIMENSION_VOLUME; d++) {
        const struct unit *unit = s->choice.units[d];
        if (!unit || unit == unit_base((enum dimension)d))
            continue;
        text_addf(t, "%s%s", begun ? "," : " --unit ", unit->id);
        begun = true;
    }
}

void session_command_data(const struct session *s, struct text *t)
{
    if (s->data_option)
        text_addf(t, " %s", s->data_option);
    text_add(t, " --format csv");
}
