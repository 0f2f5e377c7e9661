#!/bin/sh
# What the linker sees of the layers: links.sh LIBRARY... where the folder of
# a library is the last one of its path. No cycle among the folders, none
# among the objects of one folder, and no first word of public symbols
# (canvas_put: canvas) in two folders. A list of kinds (*_list.c, or list.c but
# for the command of that name) only names them: what it names is not counted
# as needed within its folder.
work=$(mktemp -d) || exit 1
trap 'rm -rf "$work"' EXIT
failed=0

# "folder object type symbol"; names of the compiler's own begin with _.
for library in "$@"; do
    folder=$(basename "$(dirname "$library")")
    nm -A -P "$library" 2>/dev/null |
        awk -v folder="$folder" '$2 !~ /^[_.]/ {
            object = $1
            sub(/.*\[/, "", object)
            sub(/\]:$/, "", object)
            sub(/.*\//, "", object)
            print folder, object, $3, $2
        }'
done >"$work/symbols"

awk '{ line[NR] = $0 }
     $3 ~ /^[TDBRVW]$/ { from[$4] = $1; object[$4] = $2 }
     END {
         for (i = 1; i <= NR; i++) {
             split(line[i], f, " ")
             if (f[3] != "U" || !(f[4] in from))
                 continue
             if (from[f[4]] != f[1])
                 print "folder", f[1], from[f[4]]
             else if (object[f[4]] != f[2] && !(f[2] ~ /_list\.c\.o$/) &&
                      !(f[2] == "list.c.o" && f[1] != "cli"))
                 print "object", f[1] "/" f[2], f[1] "/" object[f[4]]
         }
     }' "$work/symbols" | sort -u >"$work/links"

for kind in folder object; do
    awk -v kind=$kind '$1 == kind { print $2, $3 }' "$work/links" |
        tsort >/dev/null 2>"$work/loops"
    if [ -s "$work/loops" ]; then
        echo "a link cycle among the ${kind}s:"
        cat "$work/loops"
        failed=1
    fi
done

awk '$3 ~ /^[TDBR]$/ { word = $4; sub(/_.*/, "", word); print word, $1 }' \
    "$work/symbols" | sort -u |
    awk '{ count[$1]++; folders[$1] = folders[$1] " " $2 }
         END { for (w in count) if (count[w] > 1) print w "_:" folders[w] }' \
    >"$work/shared"
if [ -s "$work/shared" ]; then
    echo "first words of symbols in two folders:"
    cat "$work/shared"
    failed=1
fi

# Something was seen: a test that reads nothing would find nothing.
[ "$(wc -l <"$work/links")" -gt 1 ] || {
    echo "no links seen"
    failed=1
}
exit $failed
