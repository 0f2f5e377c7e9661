/* SPDX-License-Identifier: MIT */
#include "session/session.h"

#include <stdarg.h>

void session_init(struct session *s, struct study *study)
{
    *s = (struct session){
        .study = study,
        .choice =
            {
                .z = 26,
                .quantity = QUANTITY_ZEFF,
                .model = model_find("slater"),
                .shown = SHOWN_VALUE,
            },
        .wanting = true,
        .choice_version = 1,
        .selection_version = 1,
        .solved_version = 1,
    };
}

void session_report(struct session *s, bool caution, const char *format, ...)
{
    va_list args;
    va_start(args, format);
    int n = vsnprintf(s->message, sizeof s->message, format, args);
    va_end(args);
    if (n >= (int)sizeof s->message)
        s->message[utf8_whole(s->message, sizeof s->message - 1)] = '\0';
    s->caution = caution;
}

void session_go(struct session *s, const char *id)
{
    s->go = id;
}

void session_touch(struct session *s)
{
    s->choice_version++;
}

void session_select(struct session *s, int z)
{
    s->choice.z = z;
    s->selection_version++;
}

void session_select_species(struct session *s, int z, int charge)
{
    session_select(s, z);
    if (charge == s->choice.charge)
        return;
    s->choice.charge = charge;
    session_touch(s);
}

void session_select_quantity(struct session *s, enum quantity_id quantity)
{
    struct choice *c = &s->choice;
    c->quantity = quantity;
    c->reference = c->against = NULL;
    if (!quantity_at(quantity)->per_subshell)
        c->n = c->l = 0;
    session_touch(s);
    if (c->model && model_gives(c->model, quantity))
        return;
    c->model = NULL;
    for (int m = 0; m < model_count() && !c->model; m++)
        if (model_gives(model_at(m), quantity))
            c->model = model_at(m);
    if (!c->model)
        c->shown = SHOWN_REFERENCE;
}

const struct unit *session_unit(const struct session *s,
                                enum quantity_id quantity)
{
    enum dimension d = quantity_at(quantity)->dimension;
    return s->choice.units[d] ? s->choice.units[d] : unit_base(d);
}

bool session_is_own(const struct session *s, int z, int charge)
{
    const struct choice *c = &s->choice;
    return c->configuration.count > 0 && c->configured.z == z &&
           c->configured.charge == charge;
}

bool session_ask(const struct session *s, int z, int charge, struct ask *ask)
{
    const struct choice *c = &s->choice;
    *ask = (struct ask){
        .z = z,
        .charge = charge,
        .quantity = c->quantity,
        .model = c->model,
        .reference = c->reference,
        .against = c->against,
        .evidence = c->evidence,
        .n = c->n,
        .l = c->l,
        .site = c->site,
        .unit = session_unit(s, c->quantity),
    };
    if (session_is_own(s, z, charge))
        ask->configuration = &c->configuration;
    struct species species;
    struct status st = status_ok();
    return study_species(s->study, ask, &species, &st);
}

bool session_species(const struct session *s, struct species *species)
{
    struct ask ask;
    struct status st = status_ok();
    return session_ask(s, s->choice.z, s->choice.charge, &ask) &&
           study_species(s->study, &ask, species, &st);
}

int session_pin_place(const struct session *s, int z, int charge)
{
    for (int i = 0; i < s->choice.pin_count; i++)
        if (s->choice.pins[i].z == z && s->choice.pins[i].charge == charge)
            return i;
    return -1;
}

void session_want(struct session *s, int z, int charge,
                  const struct model *model, bool first)
{
    struct ask ask;
    struct status st = status_ok();
    if (model->closed || !session_ask(s, z, charge, &ask))
        return;
    ask.model = model;
    if (model_gives(model, ask.quantity) &&
        !study_want(s->study, &ask, first, &st))
        session_report(s, true, "%s", st.message);
}

void session_want_selected(struct session *s)
{
    for (int m = model_count() - 1; m >= 0; m--)
        session_want(s, s->choice.z, s->choice.charge, model_at(m), true);
}
