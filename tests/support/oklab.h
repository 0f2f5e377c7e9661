/* SPDX-License-Identifier: MIT */
/* Colour science for the tests, apart from the program's code. */
#ifndef SUPPORT_OKLAB_H
#define SUPPORT_OKLAB_H

#include <stdbool.h>
#include <stdint.h>

/* Vision: as it is, and with one kind of cone missing. */
enum vision { VISION_FULL, VISION_PROTAN, VISION_DEUTAN, VISION_TRITAN };
#define VISION_COUNT 4

/* OKLab, Ottosson 2020, "A perceptual color space for image processing"
 * (https://bottosson.github.io/posts/oklab/): L 0 … 1, a, b. */
struct oklab {
    double L, a, b;
};

/* 0xRRGGBB to OKLab, as seen with a vision: sRGB by IEC 61966-2-1; missing
 * cones by Machado, Oliveira, Fernandes 2009, table 1, severity 1.0, on linear
 * components (doi 10.1109/TVCG.2009.113). */
struct oklab oklab_of(uint32_t rgb, enum vision vision);

/* The nearest 0xRRGGBB, and whether the colour lies inside sRGB. */
uint32_t oklab_rgb(struct oklab color, bool *inside);

/* L, chroma and hue in degrees to OKLab. */
struct oklab oklab_polar(double L, double chroma, double hue);

double oklab_chroma(struct oklab color);
double oklab_hue(struct oklab color); /* 0 … 360 */
double oklab_distance(struct oklab a, struct oklab b);

/* The largest chroma inside sRGB at this lightness and hue. */
double oklab_chroma_max(double L, double hue);

/* Relative luminance and contrast ratio, WCAG 2.2. */
double luminance(uint32_t rgb);
double contrast(uint32_t a, uint32_t b);

#endif
