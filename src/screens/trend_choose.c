/* SPDX-License-Identifier: MIT */
#include "screens/trend_view.h"

/* One line per model, on or off; Enter turns it and the list stays. */
static void fill_curves(struct session *session, void *state, struct chooser *c)
{
    (void)state;
    for (int m = 0; m < model_count(); m++)
        if (model_gives(model_at(m), session->choice.quantity))
            chooser_add(c, m, false, "[%c] %s",
                        session->choice.hidden_models >> m & 1u ? ' ' : 'x',
                        model_at(m)->id);
}

static void take_curve(struct session *session, void *state, int value)
{
    (void)state;
    session->choice.hidden_models ^= 1u << value;
}

const struct chooser_ops screen_trend_choose_curves = {
    .title = "Curves",
    .hint = "Enter turns a curve on or off; Esc ends",
    .stays = true,
    .fill = fill_curves,
    .take = take_curve,
};

/* The one after the present walk is offered first: opened and accepted, the
 * list goes through them. */
static void fill_walks(struct session *session, void *state, struct chooser *c)
{
    (void)state;
    enum walk_kind next =
        (enum walk_kind)((session->choice.walk + 1) % WALK_COUNT);
    for (int k = 0; k < WALK_COUNT; k++)
        chooser_add(c, k, k == (int)next, "%s: %s%s",
                    walk_id((enum walk_kind)k), walk_words((enum walk_kind)k),
                    k == (int)session->choice.walk ? ", as now" : "");
}

static void take_walk(struct session *session, void *state, int value)
{
    (void)state;
    session->choice.walk = (enum walk_kind)value;
}

const struct chooser_ops screen_trend_choose_walk = {
    .title = "Walk",
    .fill = fill_walks,
    .take = take_walk,
};
