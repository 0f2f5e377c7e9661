/* SPDX-License-Identifier: MIT */
#include "cli/request.h"

#include <stdlib.h>

#include "cli/choose.h"
#include "cli/command.h"
#include "cli/words.h"

/* One option with every argument that it was given. */
static bool read_option(struct request *r, const struct option *option,
                        struct status *st)
{
    const struct call *call = r->call;
    bool given = false;
    if (!option->read)
        return true;
    for (int i = 0; i < call->option_count; i++) {
        if (call->options[i].option != option)
            continue;
        given = true;
        if (!option->read(r, option, call->options[i].value, st))
            return false;
    }
    return given || !option->always || option->read(r, option, NULL, st);
}

static bool read_stage(struct request *r, enum option_stage stage,
                       struct status *st)
{
    for (const struct option *const *o = r->call->command->options; *o; o++)
        if ((*o)->stage == stage && !read_option(r, *o, st))
            return false;
    return true;
}

/* A command that cannot be asked for quantities works on all. */
static void take_all_quantities(struct request *r)
{
    if (r->quantity_count > 0)
        return;
    for (int q = 0; q < QUANTITY_COUNT; q++)
        r->quantities[r->quantity_count++] = (enum quantity_id)q;
}

static bool check_options(const struct request *r, struct status *st)
{
    const struct call *call = r->call;
    for (int i = 0; i < call->option_count; i++) {
        const struct option *o = call->options[i].option;
        if (o->check && !o->check(r, o, call->options[i].value, st))
            return false;
    }
    return true;
}

static bool open_state(struct request *r, struct status *st)
{
    size_t size = r->call->command->state_size;
    if (size == 0)
        return true;
    r->state = calloc(1, size);
    return r->state || status_fail(st, STATUS_MEMORY, "out of memory");
}

bool request_open(struct request *r, const struct call *call, struct status *st)
{
    *r = (struct request){.call = call,
                          .format = format_list[0],
                          .color = COLOR_AUTO,
                          .scheme = SCHEME_TERMINAL,
                          .method = method_default};
    if (!open_state(r, st) || !read_stage(r, OPTION_BEFORE, st))
        return false;
    r->study = study_new(&r->catalogue, st);
    if (!r->study || !read_stage(r, OPTION_FIRST, st))
        return false;
    take_all_quantities(r);
    return read_stage(r, OPTION_LATER, st) &&
           (!call->command->manner.chooses || choose_atoms(r, st)) &&
           check_options(r, st);
}

void request_close(struct request *r)
{
    study_free(r->study);
    catalogue_clear(&r->catalogue);
    free(r->state);
}

struct ask request_ask(const struct request *r, int atom,
                       enum quantity_id quantity, const struct model *model)
{
    const struct quantity *q = quantity_at(quantity);
    struct ask ask = {.z = r->atoms[atom].z,
                      .charge = r->atoms[atom].charge,
                      .quantity = quantity,
                      .model = model,
                      .reference = r->references[quantity],
                      .against = r->against[quantity],
                      .evidence = r->evidence,
                      .site = r->atoms[atom].site,
                      .unit = r->units[q->dimension]};
    if (r->has_configuration)
        ask.configuration = &r->configuration;
    if (q->per_subshell) {
        ask.n = r->n;
        ask.l = r->l;
    }
    return ask;
}
