/* SPDX-License-Identifier: MIT */
#include "additions/tally.h"

#include <string.h>

#include "report/report.h"

struct tally_state {
    int count;
    int step;
    char name[32];
};

static void init(struct session *s, void *state)
{
    struct tally_state *own = state;
    (void)s;
    own->step = 1;
}

static void draw(struct session *s, void *state, struct canvas *canvas)
{
    const struct tally_state *own = state;
    (void)s;
    canvas_textf(canvas, 2, 0, canvas->columns, ROLE_TEXT, "counted %d for %s",
                 own->count, own->name[0] ? own->name : "nobody");
}

static enum effect count(struct session *s, void *state)
{
    struct tally_state *own = state;
    (void)s;
    own->count += own->step;
    return EFFECT_REDRAW;
}

/* A list of its own. */
static void fill_steps(struct session *s, void *state, struct chooser *list)
{
    const struct tally_state *own = state;
    (void)s;
    for (int i = 1; i <= 100; i *= 10)
        chooser_add(list, i, own->step == i, "by %d", i);
}

static void take_step(struct session *s, void *state, int value)
{
    struct tally_state *own = state;
    (void)s;
    own->step = value;
}

static const struct chooser_ops choose_step = {
    .title = "Step",
    .fill = fill_steps,
    .take = take_step,
};

/* A line of its own. */
static enum effect accept_name(struct session *s, void *state, const char *line)
{
    struct tally_state *own = state;
    if (strlen(line) >= sizeof own->name) {
        session_report(s, true, "the name is too long");
        return EFFECT_NONE;
    }
    memcpy(own->name, line, strlen(line) + 1);
    return EFFECT_REDRAW;
}

static const struct prompt_ops prompt_name = {
    .label = "for whom: ",
    .accept = accept_name,
};

static const struct key_row keys[] = {
    {500, '#', 0, "#", "count", "count one step on", true, 0, count, 0, 0, 0},
    {510, '%', 0, "%", "step", "choose how far a step counts", true, 0, 0,
     &choose_step, 0, 0},
    {520, '!', 0, "!", "name", "say for whom it is counted", true, 0, 0, 0,
     &prompt_name, 0},
};

static void export_file(const struct session *s, const void *state,
                        struct text *t)
{
    (void)s;
    (void)state;
    text_add(t, "tally.csv");
}

static const void *at(const void *data, size_t i, void *room)
{
    (void)i;
    (void)room;
    return data;
}

static void put_count(const void *record, struct text *t)
{
    const struct tally_state *own = record;
    text_addf(t, "%d", own->count);
}

static bool export_report(struct session *s, void *state, unsigned parts,
                          struct report *report, struct status *st)
{
    static const struct report_column columns[] = {
        {.id = "count", .kind = COLUMN_NUMBER, .put = put_count},
    };
    (void)s;
    (void)st;
    if (parts & REPORT_RECORDS)
        report->records = (struct report_records){
            .name = "counts",
            .columns = columns,
            .column_count = 1,
            .data = state,
            .count = 1,
            .at = at,
        };
    return true;
}

static void export_command(struct session *s, void *state, struct text *t)
{
    (void)s;
    (void)state;
    text_add(t, "outershell tally --format csv");
}

static const struct export_ops exports[] = {{
    .label = "the count",
    .file = export_file,
    .report = export_report,
    .command = export_command,
}};

static void save(const struct session *s, const void *state, struct text *t)
{
    const struct tally_state *own = state;
    (void)s;
    text_addf(t, "tally %d\n", own->count);
}

static bool load(struct session *s, void *state, const char *key,
                 const char *value)
{
    struct tally_state *own = state;
    (void)s;
    return strcmp(key, "tally") == 0 && text_to_int(value, &own->count);
}

const struct screen_ops screen_tally = {
    .id = "tally",
    .title = "Tally",
    .state_size = sizeof(struct tally_state),
    .key = {325, '&', 0, "&", "tally", "how often a key was pressed", true, 0,
            0, 0, 0, 0},
    .groups = KEYS_SPECIES,
    .keys = keys,
    .key_count = sizeof keys / sizeof keys[0],
    .exports = exports,
    .export_count = 1,
    .init = init,
    .draw = draw,
    .save = save,
    .load = load,
};
