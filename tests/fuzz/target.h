/* SPDX-License-Identifier: MIT */
#ifndef FUZZ_TARGET_H
#define FUZZ_TARGET_H

#include <stddef.h>
#include <stdint.h>

/* The entry point that fuzzing engines call; aborts on a broken promise. */
int LLVMFuzzerTestOneInput(const uint8_t *data, size_t size);

#endif
