/* SPDX-License-Identifier: MIT */
#include "terminal/sequence.h"

enum { BEL = 0x07, CAN = 0x18, SUB = 0x1A, ESC = 0x1B };

static enum sequence_state after_escape(uint32_t character)
{
    switch (character) {
    case '[':
        return SEQUENCE_BEGUN;
    case 'O':
        return SEQUENCE_SINGLE;
    case ']':
    case 'P':
    case 'X':
    case '^':
    case '_':
        return SEQUENCE_STRING;
    case ESC:
        return SEQUENCE_ESCAPE;
    default:
        return SEQUENCE_NONE;
    }
}

static enum sequence_state after_string(uint32_t character)
{
    if (character == BEL)
        return SEQUENCE_NONE;
    return character == ESC ? SEQUENCE_STRING_ESCAPE : SEQUENCE_STRING;
}

static enum sequence_state after_control(uint32_t character)
{
    if (character == ESC)
        return SEQUENCE_ESCAPE;
    bool more = character >= 0x20 && character <= 0x3F;
    return more ? SEQUENCE_CONTROL : SEQUENCE_NONE;
}

void sequence_feed(enum sequence_state *state, uint32_t character)
{
    if (character == CAN || character == SUB) {
        *state = SEQUENCE_NONE; /* these two cancel any sequence */
        return;
    }
    switch (*state) {
    case SEQUENCE_ESCAPE:
        *state = after_escape(character);
        break;
    case SEQUENCE_BEGUN:
        *state = character == '['   ? SEQUENCE_CONSOLE
                 : character == 'M' ? SEQUENCE_MOUSE_3
                                    : after_control(character);
        break;
    case SEQUENCE_CONTROL:
        *state = after_control(character);
        break;
    case SEQUENCE_MOUSE_3:
        *state = SEQUENCE_MOUSE_2;
        break;
    case SEQUENCE_MOUSE_2:
        *state = SEQUENCE_MOUSE_1;
        break;
    case SEQUENCE_SINGLE:
        if ((character < '0' || character > '9') && character != ';')
            *state = SEQUENCE_NONE;
        break;
    case SEQUENCE_STRING:
        *state = after_string(character);
        break;
    case SEQUENCE_STRING_ESCAPE:
        *state = character == '\\' ? SEQUENCE_NONE : after_escape(character);
        break;
    case SEQUENCE_NONE:
    case SEQUENCE_MOUSE_1:
    case SEQUENCE_CONSOLE:
        *state = SEQUENCE_NONE;
        break;
    }
}
