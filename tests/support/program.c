/* SPDX-License-Identifier: MIT */
#include "support/program.h"

#include <check.h>
#include <errno.h>
#include <fcntl.h>
#include <poll.h>
#include <stdbool.h>
#include <signal.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <sys/wait.h>
#include <unistd.h>

struct reader {
    int fd;
    char *data;
    size_t size, capacity;
};

static void open_pipe(int ends[2])
{
    ck_assert_int_eq(pipe(ends), 0);
    fcntl(ends[0], F_SETFD, FD_CLOEXEC);
    fcntl(ends[1], F_SETFD, FD_CLOEXEC);
}

/* False at the end of the stream. */
static bool take(struct reader *r)
{
    if (r->size + 1 >= r->capacity) {
        r->capacity = r->capacity ? 2 * r->capacity : 1 << 16;
        r->data = realloc(r->data, r->capacity);
        ck_assert_ptr_nonnull(r->data);
    }
    ssize_t n = read(r->fd, r->data + r->size, r->capacity - r->size - 1);
    if (n < 0 && errno == EINTR)
        return true;
    ck_assert_int_ge(n, 0);
    r->size += (size_t)n;
    r->data[r->size] = '\0';
    return n > 0;
}

/* The child's side: never returns. */
static void become(const struct program *p, int in, int out, int err)
{
    char *argv[PROGRAM_ARGUMENTS_MAX + 2];
    memcpy(argv, &p->path, sizeof p->path);
    for (int i = 0; i < p->count; i++)
        memcpy(&argv[i + 1], &p->arguments[i], sizeof argv[0]);
    argv[p->count + 1] = NULL;
    for (int i = 0; p->environment && p->environment[i]; i++) {
        const char *equals = strchr(p->environment[i], '=');
        char name[64];
        snprintf(name, sizeof name, "%.*s", (int)(equals - p->environment[i]),
                 p->environment[i]);
        setenv(name, equals + 1, 1);
    }
    /* the program does not inherit what the tests ignore or hold back */
    sigset_t none;
    sigemptyset(&none);
    sigprocmask(SIG_SETMASK, &none, NULL);
    signal(SIGHUP, SIG_DFL);
    signal(SIGINT, SIG_DFL);
    signal(SIGQUIT, SIG_DFL);
    signal(SIGTERM, SIG_DFL);
    signal(SIGPIPE, p->output == PROGRAM_BROKEN_MUTE ? SIG_IGN : SIG_DFL);
    if (p->folder && chdir(p->folder) != 0)
        _exit(126);
    dup2(in, STDIN_FILENO);
    dup2(err, STDERR_FILENO);
    if (p->output == PROGRAM_CLOSED)
        close(STDOUT_FILENO);
    else
        dup2(out, STDOUT_FILENO);
    execv(p->path, argv);
    _exit(127);
}

/* Feeds the input and collects both streams until they end. */
static void serve(const struct program *p, int in, struct reader *out,
                  struct reader *err)
{
    size_t length = p->input_size ? p->input_size
                    : p->input    ? strlen(p->input)
                                  : 0;
    size_t sent = 0;
    if (length == 0) {
        close(in);
        in = -1;
    }
    while (in >= 0 || out->fd >= 0 || err->fd >= 0) {
        struct pollfd fds[3] = {
            {in, POLLOUT, 0}, {out->fd, POLLIN, 0}, {err->fd, POLLIN, 0}};
        if (poll(fds, 3, -1) < 0)
            continue;
        if (fds[0].revents) {
            ssize_t n = write(in, p->input + sent, length - sent);
            if (n > 0)
                sent += (size_t)n;
            if (n < 0 || sent == length) {
                close(in);
                in = -1;
            }
        }
        struct reader *readers[2] = {out, err};
        for (int i = 0; i < 2; i++)
            if (fds[i + 1].revents && !take(readers[i])) {
                close(readers[i]->fd);
                readers[i]->fd = -1;
            }
    }
}

static int output_end(const struct program *p, int capture)
{
    int ends[2];
    if (p->output == PROGRAM_FULL)
        return open("/dev/full", O_WRONLY | O_CLOEXEC);
    if (p->output != PROGRAM_BROKEN && p->output != PROGRAM_BROKEN_MUTE)
        return dup(capture);
    open_pipe(ends);
    close(ends[0]);
    return ends[1];
}

struct program_result program_run(const struct program *p)
{
    int in[2];
    int out[2];
    int err[2];
    int state;
    signal(SIGPIPE, SIG_IGN);
    open_pipe(in);
    open_pipe(out);
    open_pipe(err);
    int target = output_end(p, out[1]);
    ck_assert_int_ge(target, 0);
    fflush(NULL);
    pid_t child = fork();
    ck_assert_int_ge(child, 0);
    if (child == 0)
        become(p, in[0], target, err[1]);
    close(in[0]);
    close(out[1]);
    close(err[1]);
    close(target);
    struct reader o = {.fd = out[0]};
    struct reader e = {.fd = err[0]};
    serve(p, in[1], &o, &e);
    while (waitpid(child, &state, 0) < 0)
        ck_assert_int_eq(errno, EINTR);
    struct program_result r = {.out = o.data,
                               .err = e.data,
                               .out_size = o.size,
                               .err_size = e.size,
                               .status = -1};
    if (WIFEXITED(state))
        r.status = WEXITSTATUS(state);
    else
        r.signal = WTERMSIG(state);
    ck_assert_msg(r.status != 126 && r.status != 127, "cannot run %s", p->path);
    return r;
}

void program_free(struct program_result *result)
{
    free(result->out);
    free(result->err);
    *result = (struct program_result){0};
}

/* One byte written as an escape at s into *out; gives the bytes of s used. */
static size_t unescape_one(const char *s, char *out)
{
    if (s[0] == '\\' && s[1] == 'n') {
        *out = '\n';
        return 2;
    }
    if (s[0] == '\\' && s[1] == 'x' && s[2] && s[3]) {
        char hex[3] = {s[2], s[3], '\0'};
        *out = (char)strtol(hex, NULL, 16);
        return 4;
    }
    *out = s[0] == '\\' ? s[1] : s[0];
    return s[0] == '\\' ? 2 : 1;
}

size_t program_unescape(char *text)
{
    char *out = text;
    for (const char *s = text; *s; out++)
        s += unescape_one(s, out);
    *out = '\0';
    return (size_t)(out - text);
}

void program_split(struct program *program, const char *line, char *store,
                   size_t size)
{
    char *out = store;
    const char *s = line + strspn(line, " ");
    while (*s) {
        ck_assert_int_lt(program->count, PROGRAM_ARGUMENTS_MAX);
        program->arguments[program->count++] = out;
        bool quoted = false;
        while (*s && (quoted || *s != ' ')) {
            ck_assert_uint_lt((size_t)(out - store) + 2, size);
            if (*s == '\'') {
                quoted = !quoted;
                s++;
            } else {
                s += unescape_one(s, out++);
            }
        }
        *out++ = '\0';
        s += strspn(s, " ");
    }
}

struct program_result program_call(const char *path, const char *line)
{
    static char store[8192];
    struct program p = {.path = path};
    program_split(&p, line, store, sizeof store);
    return program_run(&p);
}
