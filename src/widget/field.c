/* SPDX-License-Identifier: MIT */
#include "widget/field.h"

#include <stdio.h>
#include <string.h>

#include "base/text.h"

void field_set(struct field *field, const char *text)
{
    snprintf(field->text, sizeof field->text, "%s", text);
    field->length = (int)strlen(field->text);
}

void field_type(struct field *field, uint32_t character)
{
    char bytes[4];
    if (utf8_is_control(character))
        return;
    size_t n = utf8_encode(character, bytes);
    if ((size_t)field->length + n >= sizeof field->text)
        return;
    memcpy(field->text + field->length, bytes, n);
    field->length += (int)n;
    field->text[field->length] = '\0';
}

/* The last character whole, however many bytes it has. */
static void erase(struct field *field)
{
    while (field->length > 0 &&
           ((unsigned char)field->text[field->length - 1] & 0xC0) == 0x80)
        field->length--;
    if (field->length > 0)
        field->length--;
    field->text[field->length] = '\0';
}

bool field_edit(struct field *field, const struct event *event)
{
    bool is_key = event->kind == EVENT_KEY;
    if (event->kind == EVENT_CHARACTER || event->kind == EVENT_PASTE)
        field_type(field, event->character);
    else if (is_key && event->key == KEY_CODE_CLEAR)
        field_set(field, "");
    else if (is_key &&
             (event->key == KEY_CODE_ERASE || event->key == KEY_CODE_DELETE))
        erase(field);
    else
        return false;
    return true;
}

const char *field_tail(const char *text, int columns)
{
    while ((int)utf8_length(text) > columns && *text) {
        uint32_t code;
        text += utf8_decode(text, strlen(text), &code);
    }
    return text;
}

int field_draw(const struct field *field, struct canvas *canvas, int row,
               const char *label)
{
    int width = canvas->columns;
    bool narrow = (int)strlen(label) > width / 2; /* room for what is typed */
    int column = canvas_text(canvas, row, 0, narrow ? width / 2 : width,
                             ROLE_LABEL, label);
    /* The end of a long line is what is being typed. */
    const char *text = field_tail(field->text, width - column - 1);
    column = canvas_text(canvas, row, column, width - column, ROLE_FIELD, text);
    canvas->cursor_row = row;
    canvas->cursor_column = column < width ? column : width - 1;
    canvas->cursor_visible = true;
    return column;
}
