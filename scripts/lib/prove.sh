# What the proofs of starting and of backups share: copies of the checkout outside it, and a table. Source it.
#   PROVE_DIR=/var/tmp/wetside-starting   where the copies lie

TOP="$(cd "$(dirname "${BASH_SOURCE[0]}")/../.." && pwd -P)"
WORK="${PROVE_DIR:-/var/tmp/wetside-starting}"
BASE="$WORK/a path with spaces/wetside"
rows='' failed=0
say() { printf '%s\n' "$*" >&2; }

# copy_tree DEST: the files as they are now, with node_modules as links to the same files.
copy_tree() {
  clear_copy "$1"
  mkdir -p "$1"
  (cd "$TOP" && git ls-files -z -co --exclude-standard | xargs -0 sh -c 'for f; do [ ! -e "$f" ] || printf "%s\0" "$f"; done' sh |
    tar --null -T - -cf -) | tar -C "$1" -xf -
  link_modules "$TOP" "$1"
}
link_modules() { # FROM TO
  local folder
  (cd "$1" && ls -d node_modules {apps,packages}/*/node_modules db/node_modules 2>/dev/null) | while read -r folder; do
    mkdir -p "$2/$folder" && cp -al "$1/$folder/." "$2/$folder/"
  done
}
# copy_built DEST: the built copy again, without what its runs left behind.
copy_built() {
  clear_copy "$1"
  mkdir -p "$1/.local"
  tar -C "$BASE" --exclude=node_modules --exclude=./.local -cf - . | tar -C "$1" -xf -
  cp -a "$BASE/.local/built.json" "$1/.local/"
  link_modules "$BASE" "$1"
}
clear_copy() {
  [ ! -x "$1/scripts/postgres.sh" ] || "$1/scripts/postgres.sh" destroy
  rm -rf "$1"
}

# in_front LOG FOLDER COMMAND…: runs it to its end; $code is how it ended.
in_front() {
  local log="$1" folder="$2"
  shift 2
  code=0
  (cd "$folder" && "$@") >"$log" 2>&1 </dev/null || code=$?
}
# behind LOG FOLDER COMMAND…: runs it in a process group of its own, as a terminal would; $job is its number.
behind() {
  local log="$1" folder="$2"
  shift 2
  : >"$log"
  set -m
  (cd "$folder" && exec "$@") >"$log" 2>&1 </dev/null &
  job=$!
  set +m
}
# await LOG PATTERN: until the log says so, or the job has ended.
await() {
  until grep -qE -- "$2" "$1"; do
    kill -0 "$job" 2>/dev/null || { say "It ended before it said: $2"; tail -n 30 "$1" >&2; return 1; }
    sleep 0.1
  done
}
interrupt() { # Ctrl-C; $code is how it ended
  kill -INT -- "-$job" 2>/dev/null || true
  code=0
  wait "$job" || code=$?
}

# row CASE LOG PATTERN EXPECTED-CODE: one line of the table; what was printed must match, the code must be that.
row() {
  local line mark=yes
  line="$(grep -E -- "$3" "$2" | tail -n 1 | sed "s#$WORK#…#g; s/^ *//; s/|/\\\\|/g" || true)"
  if [ -z "$line" ] || { [ "$4" = 'not 0' ] && [ "$code" = 0 ]; } || { [ "$4" != 'not 0' ] && [ "$code" != "$4" ]; }; then
    mark=NO failed=$((failed + 1))
    say "  not as it should be (code $code, wanted $4: $3):"
    tail -n 12 "$2" >&2
  fi
  say "  $mark: $1 · $code · $line"
  rows+="| $1 | ${line:-nothing of the kind} | $code | $mark |"$'\n'
}
check() { # CASE WHAT COMMAND…: a line for something that must hold
  local case="$1" what="$2" mark=yes
  shift 2
  "$@" || { mark=NO; failed=$((failed + 1)); }
  say "  $mark: $case · $what"
  rows+="| $case | ($what) | – | $mark |"$'\n'
}
write_proof() { # FILE TITLE INTRODUCTION
  {
    printf '# %s\n\n' "$2"
    echo "$(date -u +%F), commit $(git -C "$TOP" rev-parse --short HEAD 2>/dev/null || echo 'none yet'), Node $(node -v). $3"
    printf '\n| case | what was printed, or (what was looked at) | exit code | as it should be |\n| --- | --- | ---: | --- |\n%s' "$rows"
  } >"$TOP/docs/proofs/$1"
  (cd "$TOP" && node_modules/.bin/prettier --log-level warn --write "docs/proofs/$1") || true
  say "Written: docs/proofs/$1"
  [ "$failed" = 0 ] || { say "$failed not as they should be"; exit 1; }
}
