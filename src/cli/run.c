/* SPDX-License-Identifier: MIT */
#include "cli/run.h"

#include <fcntl.h>
#include <signal.h>
#include <stdlib.h>
#include <string.h>
#include <unistd.h>

#include "base/file.h"
#include "base/text.h"
#include "cli/command.h"
#include "cli/help.h"
#include "cli/request.h"
#include "cli/words.h"

/* A closed standard stream is replaced by one that fails, so that no file
 * opened later takes its number and receives what was meant for the stream. */
static void hold_standard_streams(void)
{
    for (int fd = STDIN_FILENO; fd <= STDERR_FILENO; fd++)
        if (fcntl(fd, F_GETFD) == -1 &&
            open("/dev/null", fd == STDIN_FILENO ? O_WRONLY : O_RDONLY) != fd)
            _exit(1);
}

/* One line, whatever the words of the call hold: control characters and bytes
 * that are no UTF-8 are shown as '?'. */
static void complain(const struct status *st)
{
    char line[STATUS_MESSAGE_MAX];
    struct text t = text_over(line, sizeof line);
    size_t length = strlen(st->message);
    for (size_t i = 0; i < length;) {
        uint32_t code;
        size_t n = utf8_decode(st->message + i, length - i, &code);
        if (code == UTF8_INVALID || utf8_is_control(code))
            text_add(&t, "?");
        else
            text_add_bytes(&t, st->message + i, n);
        i += n;
    }
    fprintf(stderr, "outershell: %s\n", line);
}

static bool check_has_screen(const struct call *call, struct status *st)
{
    const char *names[WORD_MAX];
    char all[WORD_LIST_TEXT_MAX];
    struct text t = text_over(all, sizeof all);
    int count = 0;
    if (!call->command->manner.needs_terminal || isatty(STDOUT_FILENO))
        return true;
    for (int c = 0; c < command_list_count && count < WORD_MAX; c++)
        if (command_list[c]->name)
            names[count++] = command_list[c]->name;
    words_join(&t, names, count, "or");
    return status_fail(st, STATUS_USAGE,
                       "no command: expected %s; the screens need a terminal "
                       "on standard output",
                       all);
}

static bool carry_out(const struct call *call, struct status *st)
{
    struct request *request = malloc(sizeof *request);
    if (!request)
        return status_fail(st, STATUS_MEMORY, "out of memory");
    bool ok =
        request_open(request, call, st) && call->command->run(request, st);
    request_close(request);
    free(request);
    return ok;
}

static bool run(int argc, char *const *argv, struct call *call,
                struct status *st)
{
    if (!call_parse(argc, argv, call, st))
        return false;
    if (call->help || call->version) {
        if (call->help)
            help_print(stdout, call->command);
        else
            version_print(stdout);
        return file_flush(stdout, "standard output", st);
    }
    return check_has_screen(call, st) && carry_out(call, st);
}

int cli_run(int argc, char *const *argv)
{
    struct status st = status_ok();
    hold_standard_streams();
#ifdef SIGXFSZ
    /* a limit on the size of files is told like a full disk */
    signal(SIGXFSZ, SIG_IGN);
#endif
    struct call *call = malloc(sizeof *call);
    if (!call)
        status_fail(&st, STATUS_MEMORY, "out of memory");
    else if (run(argc, argv, call, &st))
        st = status_ok();
    if (st.code != STATUS_OK)
        complain(&st);
    free(call);
    return status_exit(st.code);
}
