/* SPDX-License-Identifier: MIT */
#include "support/oklab.h"

#include <math.h>

static double linear(double v)
{
    return v <= 0.04045 ? v / 12.92 : pow((v + 0.055) / 1.055, 2.4);
}

static double encoded(double v)
{
    return v <= 0.0031308 ? v * 12.92 : 1.055 * pow(v, 1 / 2.4) - 0.055;
}

static void components(uint32_t rgb, double out[3])
{
    for (int i = 0; i < 3; i++)
        out[i] = linear((rgb >> (16 - 8 * i) & 0xFF) / 255.0);
}

static void multiply(const double m[3][3], const double in[3], double out[3])
{
    for (int i = 0; i < 3; i++)
        out[i] = m[i][0] * in[0] + m[i][1] * in[1] + m[i][2] * in[2];
}

/* Machado et al. 2009, severity 1.0; the numbers are from memory, and each row
 * sums to one, so that greys stay grey (tests/terminal checks it). */
static const double missing[VISION_COUNT][3][3] = {
    [VISION_FULL] = {{1, 0, 0}, {0, 1, 0}, {0, 0, 1}},
    [VISION_PROTAN] = {{0.152286, 1.052583, -0.204868},
                       {0.114503, 0.786281, 0.099216},
                       {-0.003882, -0.048116, 1.051998}},
    [VISION_DEUTAN] = {{0.367322, 0.860646, -0.227968},
                       {0.280085, 0.672501, 0.047413},
                       {-0.011820, 0.042940, 0.968881}},
    [VISION_TRITAN] = {{1.255528, -0.076749, -0.178779},
                       {-0.078411, 0.930809, 0.147602},
                       {0.004733, 0.691367, 0.303900}},
};

struct oklab oklab_of(uint32_t rgb, enum vision vision)
{
    static const double to_lms[3][3] = {
        {0.4122214708, 0.5363325363, 0.0514459929},
        {0.2119034982, 0.6806995451, 0.1073969566},
        {0.0883024619, 0.2817188376, 0.6299787005}};
    static const double to_lab[3][3] = {
        {0.2104542553, 0.7936177850, -0.0040720468},
        {1.9779984951, -2.4285922050, 0.4505937099},
        {0.0259040371, 0.7827717662, -0.8086757660}};
    double given[3];
    double seen[3];
    double lms[3];
    double lab[3];
    components(rgb, given);
    multiply(missing[vision], given, seen);
    for (int i = 0; i < 3; i++)
        seen[i] = fmin(1, fmax(0, seen[i]));
    multiply(to_lms, seen, lms);
    for (int i = 0; i < 3; i++)
        lms[i] = cbrt(lms[i]);
    multiply(to_lab, lms, lab);
    return (struct oklab){lab[0], lab[1], lab[2]};
}

uint32_t oklab_rgb(struct oklab color, bool *inside)
{
    static const double to_lms[3][3] = {{1, 0.3963377774, 0.2158037573},
                                        {1, -0.1055613458, -0.0638541728},
                                        {1, -0.0894841775, -1.2914855480}};
    static const double to_rgb[3][3] = {
        {4.0767416621, -3.3077115913, 0.2309699292},
        {-1.2684380046, 2.6097574011, -0.3413193965},
        {-0.0041960863, -0.7034186147, 1.7076147010}};
    double lab[3] = {color.L, color.a, color.b};
    double lms[3];
    double out[3];
    multiply(to_lms, lab, lms);
    for (int i = 0; i < 3; i++)
        lms[i] = lms[i] * lms[i] * lms[i];
    multiply(to_rgb, lms, out);
    uint32_t rgb = 0;
    *inside = true;
    for (int i = 0; i < 3; i++) {
        if (out[i] < -1e-6 || out[i] > 1 + 1e-6)
            *inside = false;
        double v = encoded(fmin(1, fmax(0, out[i])));
        rgb = rgb << 8 | (uint32_t)lround(255 * v);
    }
    return rgb;
}

struct oklab oklab_polar(double L, double chroma, double hue)
{
    double angle = hue * acos(-1) / 180;
    return (struct oklab){L, chroma * cos(angle), chroma * sin(angle)};
}

double oklab_chroma(struct oklab color)
{
    return hypot(color.a, color.b);
}

double oklab_hue(struct oklab color)
{
    double hue = atan2(color.b, color.a) * 180 / acos(-1);
    return hue < 0 ? hue + 360 : hue;
}

double oklab_distance(struct oklab a, struct oklab b)
{
    return sqrt((a.L - b.L) * (a.L - b.L) + (a.a - b.a) * (a.a - b.a) +
                (a.b - b.b) * (a.b - b.b));
}

double oklab_chroma_max(double L, double hue)
{
    double low = 0;
    double high = 0.5;
    for (int i = 0; i < 40; i++) {
        double middle = (low + high) / 2;
        bool inside;
        oklab_rgb(oklab_polar(L, middle, hue), &inside);
        if (inside)
            low = middle;
        else
            high = middle;
    }
    return low;
}

double luminance(uint32_t rgb)
{
    double c[3];
    components(rgb, c);
    return 0.2126 * c[0] + 0.7152 * c[1] + 0.0722 * c[2];
}

double contrast(uint32_t a, uint32_t b)
{
    double ya = luminance(a) + 0.05;
    double yb = luminance(b) + 0.05;
    return ya > yb ? ya / yb : yb / ya;
}
