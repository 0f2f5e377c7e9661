/* SPDX-License-Identifier: MIT */
int ring_one(int n);
int ring_two(int n);

int ring_two(int n)
{
    return n > 0 ? ring_one(n - 1) : 1;
}
