/* SPDX-License-Identifier: MIT */
/* Reading: from what curses gives to events. */
#include "terminal/inside.h"

#include <limits.h>
#include <string.h>
#include <time.h>
#include <wchar.h>

#include "base/text.h"

/* Codes of our own for define_key, above those that curses gives out at run
 * time to the extended keys of a description, within its 16 bits. */
enum { KEY_PASTE_BEGIN = 0x7F01, KEY_PASTE_END };

/* After this silence an unfinished sequence is given up; a paste whose end
 * mark never came as well, or the keyboard would stay dead. */
enum { SEQUENCE_PATIENCE_MS = 250, PASTE_PATIENCE_MS = 1500 };

long long terminal_clock(void)
{
    struct timespec now;
    if (clock_gettime(CLOCK_MONOTONIC, &now) != 0)
        return 0;
    return (long long)now.tv_sec * 1000 + now.tv_nsec / 1000000;
}

/* Both cursor-key modes and the forms that multiplexers and older emulators
 * send, whatever the description says. */
static const struct {
    const char *bytes;
    int code;
} extra_keys[] = {
    {"\033[A", KEY_UP},   {"\033OA", KEY_UP},     {"\033[B", KEY_DOWN},
    {"\033OB", KEY_DOWN}, {"\033[C", KEY_RIGHT},  {"\033OC", KEY_RIGHT},
    {"\033[D", KEY_LEFT}, {"\033OD", KEY_LEFT},   {"\033[H", KEY_HOME},
    {"\033OH", KEY_HOME}, {"\033[1~", KEY_HOME},  {"\033[7~", KEY_HOME},
    {"\033[F", KEY_END},  {"\033OF", KEY_END},    {"\033[4~", KEY_END},
    {"\033[8~", KEY_END}, {"\033[5~", KEY_PPAGE}, {"\033[6~", KEY_NPAGE},
    {"\033[3~", KEY_DC},  {"\033[Z", KEY_BTAB},   {"\033OM", KEY_ENTER},
};

void keys_define(const struct terminal *t)
{
    for (size_t i = 0; i < sizeof extra_keys / sizeof extra_keys[0]; i++) {
        /* codes above KEY_MAX were given to extended names of the description
         * (kcbt2), which say nothing to us */
        int known = key_defined(extra_keys[i].bytes);
        if (known == 0 || known > KEY_MAX)
            define_key(extra_keys[i].bytes, extra_keys[i].code);
    }
    if (t->paste_on.length > 0) {
        define_key("\033[200~", KEY_PASTE_BEGIN);
        define_key("\033[201~", KEY_PASTE_END);
    }
}

static struct event key_event(enum key key)
{
    return (struct event){.kind = EVENT_KEY, .key = key};
}

static const struct {
    wint_t code;
    enum key key;
} key_codes[] = {
    {KEY_UP, KEY_CODE_UP},           {KEY_DOWN, KEY_CODE_DOWN},
    {KEY_LEFT, KEY_CODE_LEFT},       {KEY_RIGHT, KEY_CODE_RIGHT},
    {KEY_HOME, KEY_CODE_HOME},       {KEY_END, KEY_CODE_END},
    {KEY_A1, KEY_CODE_HOME},         {KEY_C1, KEY_CODE_END},
    {KEY_A3, KEY_CODE_PAGE_UP},      {KEY_C3, KEY_CODE_PAGE_DOWN},
    {KEY_FIND, KEY_CODE_HOME},       {KEY_SELECT, KEY_CODE_END},
    {KEY_PPAGE, KEY_CODE_PAGE_UP},   {KEY_NPAGE, KEY_CODE_PAGE_DOWN},
    {KEY_ENTER, KEY_CODE_ENTER},     {KEY_BTAB, KEY_CODE_BACKTAB},
    {KEY_BACKSPACE, KEY_CODE_ERASE}, {KEY_DC, KEY_CODE_DELETE},
};

/* A click or a step of the wheel. */
static struct event mouse_event(void)
{
    MEVENT mouse;
    struct event event = {.kind = EVENT_NONE};
    if (getmouse(&mouse) != OK)
        return event;
    if (mouse.bstate & BUTTON1_PRESSED)
        event.button = MOUSE_LEFT;
    else if (mouse.bstate & BUTTON4_PRESSED)
        event.button = MOUSE_WHEEL_UP;
    else if (mouse.bstate & BUTTON5_PRESSED)
        event.button = MOUSE_WHEEL_DOWN;
    else
        return event;
    event.kind = EVENT_MOUSE;
    event.row = mouse.y;
    event.column = mouse.x;
    return event;
}

/* A key that curses knows. */
static struct event from_code(struct terminal *t, wint_t code)
{
    if (code == KEY_RESIZE) {
        t->resized = true;
        return (struct event){.kind = EVENT_NONE};
    }
    t->sequence = SEQUENCE_NONE;
    if (code == KEY_PASTE_BEGIN || code == KEY_PASTE_END) {
        t->pasting = code == KEY_PASTE_BEGIN;
        t->paste_ms = terminal_clock();
        return (struct event){.kind = EVENT_NONE};
    }
    if (code == KEY_MOUSE && t->mouse)
        return mouse_event();
    if (code == KEY_MOUSE) {
        /* not asked for, so curses leaves the rest to us */
        t->sequence = t->short_mouse ? SEQUENCE_MOUSE_3 : SEQUENCE_CONTROL;
        t->sequence_ms = terminal_clock();
        return (struct event){.kind = EVENT_NONE};
    }
    if (t->pasting) /* a key's sequence inside pasted text is no key press */
        return (struct event){.kind = EVENT_NONE};
    for (size_t i = 0; i < sizeof key_codes / sizeof key_codes[0]; i++)
        if (key_codes[i].code == code)
            return key_event(key_codes[i].key);
    return (struct event){.kind = EVENT_NONE};
}

static struct event from_control(wint_t c)
{
    char erase = erasechar();
    if (c == '\n' || c == '\r')
        return key_event(KEY_CODE_ENTER);
    if (c == '\t')
        return key_event(KEY_CODE_TAB);
    if (c == 0x08 || c == 0x7F || (erase > 0 && c == (wint_t)erase))
        return key_event(KEY_CODE_ERASE);
    if (c == 0x15)
        return key_event(KEY_CODE_CLEAR);
    if (c == 0x0C)
        return key_event(KEY_CODE_REPAINT);
    return (struct event){.kind = EVENT_NONE};
}

static struct event from_character(struct terminal *t, wint_t c)
{
    if (t->pasting) {
        bool kept = c == '\n' || c == '\r' || c == '\t' || !utf8_is_control(c);
        return (struct event){.kind = kept ? EVENT_PASTE : EVENT_NONE,
                              .character = c == '\r' ? '\n' : (uint32_t)c};
    }
    if (utf8_is_control((uint32_t)c))
        return from_control(c);
    return (struct event){.kind = EVENT_CHARACTER, .character = (uint32_t)c};
}

/* One byte more of a character. Bytes are decoded here and not by get_wch,
 * which keeps up to eight bytes of what is no character and loses the good one
 * behind them; and a key's code, above 255, cannot be taken for a letter. */
static bool complete(struct terminal *t, int byte, wint_t *character)
{
    t->partial[t->partial_length++] = (char)byte;
    wchar_t c = 0;
    mbstate_t fresh;
    memset(&fresh, 0, sizeof fresh);
    size_t n = mbrtowc(&c, t->partial, t->partial_length, &fresh);
    bool full = t->partial_length == sizeof t->partial;
    if (n == (size_t)-2 && !full)
        return false;
    bool begun_before = t->partial_length > 1;
    t->partial_length = 0;
    if (n != (size_t)-1 && n != (size_t)-2) {
        *character = (wint_t)c;
        return true;
    }
    /* the bytes before were none; this one may begin another */
    return begun_before && !full && complete(t, byte, character);
}

/* All is read: what waited for that. */
static bool nothing_left(struct terminal *t, struct event *event)
{
    if (t->sequence == SEQUENCE_ESCAPE) {
        t->sequence = SEQUENCE_NONE;
        *event = key_event(KEY_CODE_ESCAPE); /* it came alone */
        return true;
    }
    if (!t->resized)
        return false;
    t->resized = false;
    t->everything = true;
    *event = (struct event){.kind = EVENT_RESIZE};
    getmaxyx(stdscr, event->row, event->column);
    return true;
}

/* Gives up what was left unfinished long ago. */
static void forget_stale(struct terminal *t, long long now)
{
    if (t->sequence != SEQUENCE_NONE &&
        now - t->sequence_ms > SEQUENCE_PATIENCE_MS)
        t->sequence = SEQUENCE_NONE;
    if (t->pasting && now - t->paste_ms > PASTE_PATIENCE_MS)
        t->pasting = false;
}

/* One character or key; EVENT_NONE when it gives no event by itself. */
static struct event digest(struct terminal *t, bool key, wint_t c)
{
    long long now = terminal_clock();
    forget_stale(t, now);
    t->paste_ms = now;
    if (key)
        return from_code(t, c);
    if (t->sequence != SEQUENCE_NONE) {
        sequence_feed(&t->sequence, (uint32_t)c);
        t->sequence_ms = now;
        return (struct event){.kind = EVENT_NONE};
    }
    if (c == 0x1B) {
        t->sequence = SEQUENCE_ESCAPE;
        t->sequence_ms = now;
        return (struct event){.kind = EVENT_NONE};
    }
    return from_character(t, c);
}

bool terminal_read(struct terminal *t, struct event *event)
{
    for (;;) {
        int code = getch();
        if (code == ERR)
            return nothing_left(t, event);
        wint_t character = 0;
        if (code > UCHAR_MAX) {
            t->partial_length = 0;
            *event = digest(t, true, (wint_t)code);
        } else if (complete(t, code, &character)) {
            *event = digest(t, false, character);
        } else {
            continue;
        }
        if (event->kind != EVENT_NONE)
            return true;
    }
}
