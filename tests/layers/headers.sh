#!/bin/sh
# Every header compiles alone: headers.sh SOURCE_FOLDER COMPILER...
src=$1
shift
failed=0
count=0
for header in "$src"/*/*.h; do
    count=$((count + 1))
    "$@" -std=c17 -D_POSIX_C_SOURCE=200809L -fsyntax-only -Wall -Wextra \
        -Werror -x c -I"$src" -include "$header" \
        /dev/null || {
        echo "does not compile alone: $header"
        failed=1
    }
done
[ "$count" -gt 20 ] || failed=1
exit $failed
