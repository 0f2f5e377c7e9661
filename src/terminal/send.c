/* SPDX-License-Identifier: MIT */
#include <errno.h>
#include <unistd.h>

#include "terminal/inside.h"

void terminal_send(const struct terminal *t, const char *bytes, size_t length)
{
    while (length > 0) {
        ssize_t done = write(t->output_fd, bytes, length);
        if (done < 0 && errno == EINTR)
            continue;
        if (done <= 0)
            return; /* the terminal has gone; terminal_wait will say so */
        bytes += done;
        length -= (size_t)done;
    }
}
