/* SPDX-License-Identifier: MIT */
/* A line being typed: where to jump, which file to write. */
#include <stdio.h>
#include <string.h>

#include "base/text.h"
#include "element/selection.h"
#include "screens/parts.h"

void prompt_open(struct ui *ui, enum prompt_kind kind, const char *text)
{
    ui->prompt.kind = kind;
    ui->prompt.from = ui->choice.z;
    snprintf(ui->prompt.text, sizeof ui->prompt.text, "%s", text);
    ui->prompt.length = (int)strlen(ui->prompt.text);
    ui->message[0] = '\0';
}

static void close_prompt(struct ui *ui)
{
    ui->prompt = (struct prompt){.kind = PROMPT_NONE};
}

static void type(struct prompt *p, uint32_t character)
{
    char bytes[4];
    if (utf8_is_control(character))
        return;
    size_t n = utf8_encode(character, bytes);
    if ((size_t)p->length + n >= sizeof p->text)
        return;
    memcpy(p->text + p->length, bytes, n);
    p->length += (int)n;
    p->text[p->length] = '\0';
}

static void erase(struct prompt *p)
{
    while (p->length > 0 &&
           ((unsigned char)p->text[p->length - 1] & 0xC0) == 0x80)
        p->length--;
    if (p->length > 0)
        p->length--;
    p->text[p->length] = '\0';
}

static enum effect accept_jump(struct ui *ui)
{
    bool found = element_jump(ui->prompt.text) != NULL;
    if (!found && ui->prompt.length > 0)
        ui_report(ui, true, "%s: no element has this symbol, name or number",
                  ui->prompt.text);
    close_prompt(ui);
    return EFFECT_REDRAW;
}

static enum effect accept_file(struct ui *ui)
{
    if (ui->prompt.length == 0) {
        close_prompt(ui);
        ui_report(ui, false, "nothing exported");
        return EFFECT_REDRAW;
    }
    snprintf(ui->path, sizeof ui->path, "%s", ui->prompt.text);
    ui->replace = false;
    close_prompt(ui);
    return EFFECT_WRITE;
}

static enum effect answer_overwrite(struct ui *ui, const struct event *event)
{
    bool yes = event->kind == EVENT_CHARACTER && event->character == 'y';
    if (event->kind != EVENT_CHARACTER && event->kind != EVENT_KEY)
        return EFFECT_NONE;
    close_prompt(ui);
    ui->replace = yes;
    if (yes)
        return EFFECT_WRITE;
    ui_report(ui, false, "%s left as it was", ui->path);
    return EFFECT_REDRAW;
}

void configuration_prompt(struct ui *ui)
{
    struct ask ask;
    struct species species;
    struct status st = status_ok();
    char text[CONFIGURATION_TEXT_MAX];
    if (!ui_ask(ui, ui->choice.z, ui->choice.charge, &ask) ||
        !study_species(ui->study, &ask, &species, &st)) {
        ui_report(ui, true, "no such ion");
        return;
    }
    configuration_print(&species.configuration, text);
    prompt_open(ui, PROMPT_CONFIGURATION, text);
}

/* An empty line gives the ground state back; a wrong one is told and stays to
 * be mended. */
static enum effect accept_configuration(struct ui *ui)
{
    struct choice *c = &ui->choice;
    struct status st = status_ok();
    struct species species;
    struct configuration typed = {0};
    struct ask ask = {.z = c->z, .charge = c->charge, .configuration = &typed};
    bool blank = ui->prompt.text[strspn(ui->prompt.text, " ")] == '\0';
    if (!blank && (!configuration_parse(ui->prompt.text, &typed, &st) ||
                   !study_species(ui->study, &ask, &species, &st))) {
        ui_report(ui, true, "%s", st.message);
        return EFFECT_REDRAW;
    }
    bool own = !blank && species.origin == ORIGIN_USER;
    c->configuration = own ? typed : (struct configuration){0};
    c->configured = (struct pin){c->z, c->charge};
    ui->stale = ui->comparison_stale = true;
    close_prompt(ui);
    ui_report(ui, false,
              own ? "configuration as given, for this species alone"
                  : "the ground state");
    return EFFECT_REDRAW;
}

static enum effect accept(struct ui *ui)
{
    if (ui->prompt.kind == PROMPT_JUMP)
        return accept_jump(ui);
    if (ui->prompt.kind == PROMPT_CONFIGURATION)
        return accept_configuration(ui);
    return accept_file(ui);
}

/* While a place is typed the selection goes along, so that Enter holds no
 * surprise; where the text fits none it is back where it came from. */
static void follow(struct ui *ui)
{
    const struct element *e = element_jump(ui->prompt.text);
    if (ui->prompt.kind == PROMPT_JUMP)
        ui_select(ui, e ? e->z : ui->prompt.from);
}

/* Behind a whole symbol or number a letter with which no element goes on is a
 * key again: "Ni" and "p" pins nickel. Behind part of a name it is a slip. */
static bool ends_jump(const struct prompt *p, const struct event *event)
{
    struct prompt longer = *p;
    if (p->kind != PROMPT_JUMP || event->kind != EVENT_CHARACTER ||
        event->character == ' ')
        return false;
    bool whole = element_by_symbol(p->text) ||
                 (p->length > 0 && p->text[0] >= '1' && p->text[0] <= '9' &&
                  element_find(p->text));
    type(&longer, event->character);
    return whole && !element_jump(longer.text);
}

enum effect prompt_update(struct ui *ui, const struct event *event)
{
    struct prompt *p = &ui->prompt;
    if (p->kind == PROMPT_OVERWRITE)
        return answer_overwrite(ui, event);
    if (ends_jump(p, event)) {
        close_prompt(ui);
        return ui_update(ui, event);
    }
    if (event->kind == EVENT_CHARACTER || event->kind == EVENT_PASTE) {
        ui->message[0] = '\0';
        type(p, event->character);
        follow(ui);
        return EFFECT_REDRAW;
    }
    if (event->kind != EVENT_KEY)
        return EFFECT_NONE;
    if (event->key == KEY_CODE_ERASE || event->key == KEY_CODE_DELETE) {
        erase(p);
        follow(ui);
    } else if (event->key == KEY_CODE_CLEAR) {
        p->length = 0;
        p->text[0] = '\0';
        follow(ui);
    } else if (event->key == KEY_CODE_ESCAPE) {
        ui_select(ui, p->from);
        close_prompt(ui);
    } else if (event->key == KEY_CODE_ENTER) {
        return accept(ui);
    } else if (p->kind == PROMPT_JUMP) {
        /* An arrow ends the jump and moves on from there. */
        close_prompt(ui);
        return ui_update(ui, event);
    }
    return EFFECT_REDRAW;
}

/* The end of a text, at most `columns` characters of it. */
static const char *tail(const char *text, int columns)
{
    while ((int)utf8_length(text) > columns && *text) {
        uint32_t code;
        text += utf8_decode(text, strlen(text), &code);
    }
    return text;
}

void prompt_draw(const struct ui *ui, struct canvas *canvas, int row)
{
    static const char *const asks[] = {
        [PROMPT_NONE] = "",
        [PROMPT_JUMP] = "element: ",
        [PROMPT_FILE] = "write CSV to: ",
        [PROMPT_OVERWRITE] = "",
        [PROMPT_CONFIGURATION] = "configuration (none: ground state): ",
    };
    int width = canvas->columns;
    if (ui->prompt.kind == PROMPT_OVERWRITE) {
        static const char question[] = " exists; overwrite it? y/n";
        const char *name = tail(ui->path, width - (int)sizeof question + 1);
        canvas_textf(canvas, row, 0, width, ROLE_CAUTION, "%s%s", name,
                     question);
        return;
    }
    const char *ask = asks[ui->prompt.kind];
    bool narrow = (int)strlen(ask) > width / 2; /* room for what is typed */
    int column = canvas_text(canvas, row, 0, narrow ? width / 2 : width,
                             ROLE_LABEL, ask);
    /* The end of a long line is what is being typed. */
    const char *text = tail(ui->prompt.text, width - column - 1);
    column = canvas_text(canvas, row, column, width - column, ROLE_FIELD, text);
    canvas->cursor_row = row;
    canvas->cursor_column = column < width ? column : width - 1;
    canvas->cursor_visible = true;
    const struct element *e = element_jump(ui->prompt.text);
    if (ui->prompt.kind == PROMPT_JUMP && e)
        canvas_textf(canvas, row, column + 2, width - column - 2, ROLE_QUIET,
                     "%s %d %s", e->symbol, e->z, e->name);
    else if (ui->prompt.kind == PROMPT_JUMP && ui->prompt.length > 0)
        canvas_text(canvas, row, column + 2, width - column - 2, ROLE_CAUTION,
                    "no such element");
}

void export_prompt(struct ui *ui, enum export_scope scope)
{
    char name[UI_TEXT_MAX];
    char ion[ION_TEXT_MAX];
    struct text t = text_over(name, sizeof name);
    const char *quantity = quantity_at(ui->choice.quantity)->id;
    ui->scope = scope;
    if (scope == SCOPE_ROW)
        text_addf(&t, "%s-%s.csv",
                  ion_print(ui->choice.z, ui->choice.charge, ion), quantity);
    else if (scope == SCOPE_PINS)
        text_addf(&t, "pinned-%s.csv", quantity);
    else if (scope == SCOPE_SHEET)
        text_addf(&t, "%s-%s.csv",
                  ui->choice.model ? ui->choice.model->id : "reference",
                  quantity);
    else if (scope == SCOPE_ATOM)
        text_addf(&t, "%s-atom.csv",
                  ion_print(ui->choice.z, ui->choice.charge, ion));
    else if (scope == SCOPE_TREND)
        text_addf(&t, "trend-%s.csv", quantity);
    else if (scope == SCOPE_AUDIT)
        text_addf(&t, "audit-%s.csv", quantity);
    else
        text_add(&t, "compare.csv");
    prompt_open(ui, PROMPT_FILE, name);
}
