/* SPDX-License-Identifier: MIT */
#include "widget/hint.h"

#include <string.h>

int hint_draw(struct canvas *canvas, int row, int column, const char *key,
              const char *label)
{
    int need = (int)(strlen(key) + 1 + strlen(label));
    if (column + need > canvas->columns)
        return column;
    column = canvas_text(canvas, row, column, canvas->columns - column,
                         ROLE_KEY, key);
    return canvas_text(canvas, row, column + 1, canvas->columns - column - 1,
                       ROLE_LABEL, label) +
           2;
}
