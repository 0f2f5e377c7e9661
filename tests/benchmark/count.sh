#!/bin/sh
# SPDX-License-Identifier: MIT
# count.sh LABEL LIMIT PROGRAM [ARGUMENT...]
# Counts the instructions of a whole process and prints them beside the limit,
# in millions; fails above it. Skipped (status 77) where valgrind is absent.
label=$1 limit=$2
shift 2
command -v valgrind >/dev/null || { echo "$label: no valgrind here"; exit 77; }
report=$(mktemp) || exit 1
trap 'rm -f "$report"' EXIT
valgrind --tool=callgrind --callgrind-out-file=/dev/null --log-file="$report" \
    "$@" >/dev/null || exit 1
sed -n 's/.*Collected : \([0-9]*\).*/\1/p' "$report" |
    awk -v label="$label" -v limit="$limit" '
        { count = $1 / 1e6
          printf "%s: %.2f million instructions (limit %g)\n", label, count, limit }
        END { exit NR == 1 && count <= limit ? 0 : 1 }'
