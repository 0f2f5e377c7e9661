/* SPDX-License-Identifier: MIT */
#include "cli/output.h"

#include <stdlib.h>
#include <string.h>
#include <sys/stat.h>
#include <unistd.h>

#include "canvas/glyph.h"

bool output_check(const struct request *request, struct status *st)
{
    struct file_draft draft;
    struct stat info;
    if (!request->output)
        return true;
    if (!request->force && stat(request->output, &info) == 0 &&
        S_ISREG(info.st_mode))
        return status_fail(st, STATUS_FILE,
                           "%s: exists already; --force would replace it",
                           request->output);
    if (!file_draft_open(&draft, request->output, request->force, st))
        return false;
    file_draft_discard(&draft);
    return true;
}

/* What TERM promises, for a line of text: no more than bold and 256 colours is
 * ever used here. */
static bool has_marks(const char *term)
{
    return term && term[0] && strcmp(term, "dumb") != 0 &&
           strcmp(term, "unknown") != 0;
}

static enum color_tier tier_of(const struct request *r, const char *term)
{
    bool many = r->color == COLOR_ALWAYS ||
                (term && (strstr(term, "256color") || strstr(term, "direct")));
    return terminal_color_choice(r->color, getenv("NO_COLOR"),
                                 many ? TIER_256 : TIER_MONO);
}

/* The control sequence that begins a role: bold for a heading, else a colour
 * where the tier has one. */
static const char *mark_of(enum role role, enum scheme scheme,
                           enum color_tier tier, char mark[OUTPUT_MARK_MAX])
{
    struct text t = text_over(mark, OUTPUT_MARK_MAX);
    struct paint paint = palette_paint(role, scheme, tier);
    if (role == ROLE_HEADING)
        text_add(&t, "\033[1m");
    else if (tier == TIER_256 && paint.foreground != PAINT_DEFAULT)
        text_addf(&t, "\033[38;5;%dm", paint.foreground);
    return mark;
}

static void choose_style(struct output *o, const struct request *r)
{
    const char *term = getenv("TERM");
    bool shown = !o->to_file && isatty(STDOUT_FILENO) && has_marks(term);
    o->style = write_plain;
    if (r->color == COLOR_NEVER || (r->color == COLOR_AUTO && !shown))
        return;
    enum color_tier tier = tier_of(r, term);
    o->style.heading = mark_of(ROLE_HEADING, r->scheme, tier, o->marks[0]);
    o->style.plus = mark_of(ROLE_ABOVE, r->scheme, tier, o->marks[1]);
    o->style.minus = mark_of(ROLE_BELOW, r->scheme, tier, o->marks[2]);
    o->style.end = "\033[0m";
}

bool output_open(struct output *output, const struct request *request,
                 struct status *st)
{
    *output = (struct output){.target = stdout, .to_file = request->output};
    choose_style(output, request);
    if (output->to_file) {
        if (!file_draft_open(&output->draft, request->output, request->force,
                             st))
            return false;
        output->target = output->draft.stream;
    }
    output->stream = output->target;
    if (!request->ascii)
        return true;
    output->stream = open_memstream(&output->memory, &output->size);
    if (output->stream)
        return true;
    if (output->to_file)
        file_draft_discard(&output->draft);
    return status_fail(st, STATUS_MEMORY, "out of memory");
}

/* Every character of the finished memory by its ASCII twin. */
static bool put_ascii(struct output *o, struct status *st)
{
    if (fclose(o->stream) != 0)
        return status_fail(st, STATUS_MEMORY, "out of memory");
    for (size_t i = 0; i < o->size;) {
        uint32_t code;
        i += utf8_decode(o->memory + i, o->size - i, &code);
        putc(code < 0x80 ? (int)code : (int)glyph_ascii(code), o->target);
    }
    return true;
}

bool output_close(struct output *output, bool ok, struct status *st)
{
    if (output->stream != output->target) {
        if (ok)
            ok = put_ascii(output, st);
        else
            fclose(output->stream);
        free(output->memory);
    }
    if (output->to_file && !ok)
        file_draft_discard(&output->draft);
    if (!ok)
        return false;
    if (output->to_file)
        return file_draft_commit(&output->draft, st);
    return file_flush(stdout, "standard output", st);
}

bool output_report(const struct request *request, const struct report *report,
                   struct status *st)
{
    struct output out;
    if (!report_whole(report, st) || !output_open(&out, request, st))
        return false;
    bool ok = format_write(request->format, out.stream, report, &out.style, st);
    return output_close(&out, ok, st);
}
