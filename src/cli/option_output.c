/* SPDX-License-Identifier: MIT */
/* Options of the whole program: what is added to the data, where the output
 * goes and how it looks. */
#include <string.h>

#include "cli/command.h"
#include "cli/read.h"

static bool read_data(struct request *r, const struct option *self,
                      const char *value, struct status *st)
{
    (void)self;
    return catalogue_add_file(&r->catalogue, value, st) ||
           status_context(st, "--data");
}

const struct option option_data = {
    .name = "data",
    .letter = 'd',
    .argument = "FILE",
    .kind = OPTION_REPEAT,
    .stage = OPTION_BEFORE,
    .file = true,
    .help =
        "add a data set of your own, in the form of outershell-data(5); may be "
        "repeated",
    .read = read_data,
};

static void format_words(struct words *words,
                         const struct reference_list *references)
{
    (void)references;
    for (int f = 0; f < format_list_count; f++)
        words_add(words, format_list[f]->id, format_list[f]->title);
}

static bool read_format(struct request *r, const struct option *self,
                        const char *value, struct status *st)
{
    int place;
    if (!read_choice(r, self, value, &place, st))
        return false;
    r->format = format_list[place];
    return true;
}

const struct option option_format = {
    .name = "format",
    .letter = 'f',
    .argument = "FORMAT",
    .kind = OPTION_VALUE,
    .stage = OPTION_BEFORE,
    .words = format_words,
    .title = "Formats",
    .help = "text, csv, json or bibtex, the sources alone (default: text)",
    .read = read_format,
};

static bool read_output(struct request *r, const struct option *self,
                        const char *value, struct status *st)
{
    (void)self;
    (void)st;
    r->output = strcmp(value, "-") == 0 ? NULL : value;
    return true;
}

const struct option option_output = {
    .name = "output",
    .letter = 'o',
    .argument = "FILE",
    .kind = OPTION_VALUE,
    .stage = OPTION_BEFORE,
    .file = true,
    .help = "write to a new file, whole or not at all (default, or with -: "
            "standard "
            "output)",
    .read = read_output,
};

static bool read_force(struct request *r, const struct option *self,
                       const char *value, struct status *st)
{
    (void)self;
    (void)value;
    r->force = true;
    return r->output ||
           status_fail(st, STATUS_USAGE,
                       "--force: nothing to replace without --output FILE");
}

const struct option option_force = {
    .name = "force",
    .letter = 'F',
    .kind = OPTION_FLAG,
    .stage = OPTION_BEFORE,
    .help = "let --output replace a file that exists",
    .read = read_force,
};

/* In the order of enum color_option. */
static void color_words(struct words *words,
                        const struct reference_list *references)
{
    (void)references;
    words_add(words, "auto", "");
    words_add(words, "always", "");
    words_add(words, "never", "");
}

static bool read_color(struct request *r, const struct option *self,
                       const char *value, struct status *st)
{
    int place;
    if (!read_choice(r, self, value, &place, st))
        return false;
    r->color = (enum color_option)place;
    return true;
}

const struct option option_color = {
    .name = "color",
    .argument = "WHEN",
    .kind = OPTION_VALUE,
    .stage = OPTION_BEFORE,
    .words = color_words,
    .help = "auto, always or never (default: auto, on a terminal unless "
            "NO_COLOR is "
            "set)",
    .read = read_color,
};

static bool read_ascii(struct request *r, const struct option *self,
                       const char *value, struct status *st)
{
    (void)self;
    (void)value;
    r->ascii = true;
    return r->format->for_people ||
           status_fail(st, STATUS_USAGE,
                       "--ascii: %s is always UTF-8; expected it with "
                       "--format text or bibtex",
                       r->format->id);
}

const struct option option_ascii = {
    .name = "ascii",
    .letter = 'a',
    .kind = OPTION_FLAG,
    .stage = OPTION_BEFORE,
    .help = "print and draw with ASCII characters alone",
    .read = read_ascii,
};

/* In the order of enum scheme. */
static void background_words(struct words *words,
                             const struct reference_list *references)
{
    (void)references;
    words_add(words, "terminal", "");
    words_add(words, "light", "");
    words_add(words, "dark", "");
    words_add(words, "contrast", "");
}

static bool read_background(struct request *r, const struct option *self,
                            const char *value, struct status *st)
{
    int place;
    if (!read_choice(r, self, value, &place, st))
        return false;
    r->scheme = (enum scheme)place;
    return true;
}

const struct option option_background = {
    .name = "background",
    .argument = "KIND",
    .kind = OPTION_VALUE,
    .stage = OPTION_BEFORE,
    .words = background_words,
    .help =
        "terminal (default): colours on the terminal's own background; light, "
        "dark, contrast: every colour set",
    .read = read_background,
};

/* The parser answers these two before anything is read. */
const struct option option_help = {
    .name = "help",
    .letter = 'h',
    .kind = OPTION_FLAG,
    .stage = OPTION_BEFORE,
    .help = "print help, for a command where one is named, and end",
};

const struct option option_version = {
    .name = "version",
    .letter = 'V',
    .kind = OPTION_FLAG,
    .stage = OPTION_BEFORE,
    .help = "print version, licence and data sets, and end",
};
