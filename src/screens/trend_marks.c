/* SPDX-License-Identifier: MIT */
#include "screens/trend_marks.h"

uint32_t screen_trend_mark(const struct model *model)
{
    static const uint32_t marks[] = {0x25A0, 0x25B2, 0x25BC, 0x25C6, 0x25CF};
    return marks[model_index(model) % (int)(sizeof marks / sizeof marks[0])];
}

enum role screen_trend_role(const struct model *model)
{
    return (enum role)(ROLE_CURVE_1 + model_index(model) % 5);
}

bool screen_trend_unmeasured(enum evidence evidence)
{
    return evidence == EVIDENCE_EXTRAPOLATED ||
           evidence == EVIDENCE_THEORETICAL || evidence == EVIDENCE_ESTIMATED;
}
