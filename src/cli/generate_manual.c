/* SPDX-License-Identifier: MIT */
#include "cli/generate.h"

#include <ctype.h>
#include <stdlib.h>
#include <string.h>

#include "base/file.h"
#include "cli/command.h"
#include "element/quantity.h"
#include "model/registry.h"
#include "screens/list.h"
#include "session/keys.h"

#define WIDTH 78 /* bytes of a line: the lint's limit is 80 */
#define TEMPLATE_BYTES_MAX ((size_t)1 << 20)

/* Text in lines of at most WIDTH bytes, a sentence beginning its own, no line
 * beginning with what is a command there. */
static void put_text(FILE *out, const char *text)
{
    size_t column = 0;
    bool ended = false;
    while (*text) {
        size_t length = strcspn(text, " ");
        if (column > 0 && (ended || column + 1 + length > WIDTH)) {
            putc('\n', out);
            column = 0;
        }
        if (column > 0)
            putc(' ', out);
        if (column == 0 && strchr(".'", text[0]))
            fputs("\\&", out);
        fwrite(text, 1, length, out);
        column += length + 1;
        ended = text[length - 1] == '.' && text[length] == ' ';
        text += length;
        text += strspn(text, " ");
    }
    putc('\n', out);
}

static void put_lower(FILE *out, const char *text)
{
    for (; *text; text++)
        putc(tolower((unsigned char)*text), out);
}

/* "[SELECTION...]" and "SELECTION..." as macros. */
static void put_operands(FILE *out, const char *operands)
{
    bool optional = operands[0] == '[';
    size_t length = strcspn(operands + optional, ".]");
    if (operands[0] == '\0')
        return;
    fputs(optional ? ".Op Ar " : ".Ar ", out);
    for (size_t i = 0; i < length; i++)
        putc(tolower((unsigned char)operands[i + optional]), out);
    fputs(strstr(operands, "...") ? " ...\n" : "\n", out);
}

static void put_synopsis(FILE *out)
{
    for (int c = 0; c < command_list_count; c++) {
        const struct command *command = command_list[c];
        fputs(".Nm\n", out);
        if (command->name)
            fprintf(out, ".Cm %s\n", command->name);
        fputs(".Op Ar option ...\n", out);
        put_operands(out, command->operands);
    }
}

static void put_commands(FILE *out)
{
    for (int c = 1; c < command_list_count; c++) {
        const struct command *command = command_list[c];
        fprintf(out, ".It Cm %s\n", command->name);
        put_text(out, command->about);
        fputs("Options:\n", out);
        for (const struct option *const *o = command->options; *o; o++)
            fprintf(out, ".Fl Fl %s %c\n", (*o)->name, o[1] ? ',' : '.');
    }
}

static void put_options(FILE *out)
{
    const struct option *options[COMMAND_OPTIONS_MAX];
    int count = command_options(options);
    for (int i = 0; i < count; i++) {
        const struct option *o = options[i];
        fputs(".It ", out);
        if (o->letter)
            fprintf(out, "Fl %c , ", o->letter);
        fprintf(out, "Fl Fl %s", o->name);
        if (o->argument) {
            fputs(" Ar ", out);
            put_lower(out, o->argument);
        }
        putc('\n', out);
        put_text(out, o->help);
    }
}

static void put_quantities(FILE *out)
{
    for (int q = 0; q < QUANTITY_COUNT; q++) {
        const struct quantity *quantity = quantity_at((enum quantity_id)q);
        fprintf(out, ".It Cm %s\n%s, in %s\n", quantity->id, quantity->title,
                unit_base(quantity->dimension)->title);
    }
}

static void put_models(FILE *out)
{
    for (int m = 0; m < model_count(); m++) {
        const struct model *model = model_at(m);
        fprintf(out, ".It Cm %s\n", model->id);
        put_text(out, model->title);
        fputs(".br\nDomain:\n", out);
        put_text(out, model->domain);
    }
}

/* Letters and signs that the manual's language takes for its own. */
static void put_key(FILE *out, const char *name)
{
    fputs(".It Sy ", out);
    if (strchr(".,;:!()[]|+-=/?", name[0]) && name[1] == '\0')
        fprintf(out, "\\&%s", name[0] == '-' ? "\\-" : name);
    else
        fputs(name, out);
    putc('\n', out);
}

static void put_keys(FILE *out)
{
    struct key_help help[KEY_ROWS_MAX];
    int count = session_key_help(screen_list, screen_list_count, help);
    for (int i = 0; i < count; i++) {
        char line[SESSION_TEXT_MAX];
        struct text t = text_over(line, sizeof line);
        session_key_explain(screen_list, screen_list_count, help, count, i, &t);
        put_key(out, help[i].row->name);
        put_text(out, line);
    }
}

static const struct {
    const char *mark;
    void (*put)(FILE *out);
} parts[] = {
    {"@SYNOPSIS@", put_synopsis}, {"@COMMANDS@", put_commands},
    {"@OPTIONS@", put_options},   {"@QUANTITIES@", put_quantities},
    {"@MODELS@", put_models},     {"@KEYS@", put_keys},
};

static void put_line(FILE *out, const char *line, size_t length)
{
    for (size_t i = 0; i < sizeof parts / sizeof parts[0]; i++)
        if (strlen(parts[i].mark) == length &&
            memcmp(parts[i].mark, line, length) == 0) {
            parts[i].put(out);
            return;
        }
    fwrite(line, 1, length, out);
    putc('\n', out);
}

bool generate_manual(FILE *out, const char *template_path, struct status *st)
{
    char *text;
    size_t size;
    if (!file_read(template_path, TEMPLATE_BYTES_MAX, &text, &size, st))
        return false;
    for (const char *line = text; *line;) {
        size_t length = strcspn(line, "\n");
        put_line(out, line, length);
        line += length;
        line += *line == '\n';
    }
    free(text);
    return true;
}
