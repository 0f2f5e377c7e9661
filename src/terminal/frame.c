/* SPDX-License-Identifier: MIT */
#include "terminal/inside.h"

#include <fcntl.h>
#include <sys/mman.h>
#include <unistd.h>

/* No cell needs more bytes than both colours, attributes and a move. */
enum { NAMES_MAX = 8, CHUNK = 16384, CELL_BYTES = 64 };

/* Room for a whole frame ahead of it: curses does not tell when a write fails,
 * and on full shared memory the screen would stay blank. */
static bool reserve(struct terminal *t)
{
    int rows;
    int columns;
    getmaxyx(stdscr, rows, columns);
    off_t need = (off_t)(rows + 1) * (columns + 1) * CELL_BYTES;
    if (need > t->stage_room && posix_fallocate(t->stage_fd, 0, need) != 0)
        return false;
    if (need > t->stage_room)
        t->stage_room = need;
    return true;
}

void frame_open(struct terminal *t)
{
    t->stage_fd = -1;
    t->stage_room = 0;
    for (int i = 0; i < NAMES_MAX && t->stage_fd < 0; i++) {
        char name[64];
        snprintf(name, sizeof name, "/frame-%ld-%d", (long)getpid(), i);
        t->stage_fd = shm_open(name, O_RDWR | O_CREAT | O_EXCL, 0600);
        if (t->stage_fd >= 0)
            shm_unlink(name); /* the descriptor is enough */
    }
}

void frame_close(struct terminal *t)
{
    if (t->stage_fd >= 0)
        close(t->stage_fd);
    t->stage_fd = -1;
}

void frame_begin(struct terminal *t)
{
    /* when it comes back from a stop, curses asks the terminal for its modes
     * and size and must find it */
    if (t->stage_fd < 0 || isendwin())
        return;
    if (!reserve(t) || lseek(t->stage_fd, 0, SEEK_SET) != 0 ||
        dup2(t->stage_fd, fileno(t->stream)) < 0)
        frame_close(t);
}

void frame_end(struct terminal *t)
{
    if (t->stage_fd < 0)
        return;
    dup2(t->output_fd, fileno(t->stream));
    off_t end = lseek(t->stage_fd, 0, SEEK_CUR);
    for (off_t at = 0; at < end;) {
        char chunk[CHUNK];
        size_t want = end - at < CHUNK ? (size_t)(end - at) : CHUNK;
        ssize_t got = pread(t->stage_fd, chunk, want, at);
        if (got <= 0)
            return;
        terminal_send(t, chunk, (size_t)got);
        at += got;
    }
}
