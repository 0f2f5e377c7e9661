/* SPDX-License-Identifier: MIT */
/* How much of a screen fits. */
#ifndef SCREENS_FORM_H
#define SCREENS_FORM_H

enum form {
    FORM_SENTENCE, /* too small for anything but saying so */
    FORM_LIST,     /* elements below each other */
    FORM_SINGLE,   /* one part at a time */
    FORM_WHOLE     /* all parts together */
};

#endif
