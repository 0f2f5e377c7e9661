#!/bin/sh
# Writes a header with the SHA-256 of files joined in order.
# Usage: data_hash.sh HEADER FILE...
set -eu
header=$1
shift
sum=$(cat "$@" | sha256sum)
printf '#define DATA_HASH "%s"\n' "${sum%% *}" >"$header"
