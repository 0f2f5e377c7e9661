/* SPDX-License-Identifier: MIT */
/* Two objects that need each other: the test of links must find them. */
int ring_one(int n);
int ring_two(int n);

int ring_one(int n)
{
    return n > 0 ? ring_two(n - 1) : 0;
}
