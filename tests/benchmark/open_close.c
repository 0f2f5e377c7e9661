/* SPDX-License-Identifier: MIT */
/* Opens curses, shows the empty screen, closes: the least that any program
 * with screens must do. */
#include <curses.h>
#include <locale.h>
#include <stdio.h>

int main(void)
{
    setlocale(LC_CTYPE, "");
    SCREEN *screen = newterm(NULL, stdout, stdin);
    if (screen == NULL)
        return 1;
    cbreak();
    noecho();
    keypad(stdscr, TRUE);
    refresh();
    endwin();
    delscreen(screen);
    return 0;
}
