/* SPDX-License-Identifier: MIT */
/* SHA-256 (FIPS 180-4), by which the built-in data are told apart: anyone can
 * compare it with sha256sum. */
#ifndef CLI_SHA256_H
#define CLI_SHA256_H

#include <stddef.h>
#include <stdint.h>

#define SHA256_TEXT_MAX 65

struct sha256 {
    uint32_t state[8];
    uint64_t length; /* bytes so far */
    unsigned char block[64];
};

void sha256_begin(struct sha256 *s);
void sha256_add(struct sha256 *s, const void *data, size_t size);

/* Ends the sum and writes it in hexadecimal. */
void sha256_end(struct sha256 *s, char out[SHA256_TEXT_MAX]);

#endif
