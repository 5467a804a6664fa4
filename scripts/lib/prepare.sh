# What every command needs before Node's own scripts can run: source it, then call the steps.
# Works without node_modules.

ROOT="$(cd "$(dirname "${BASH_SOURCE[0]}")/../.." && pwd -P)"
cd "$ROOT"
# shellcheck source=packages.sh
. scripts/lib/packages.sh
need_folder() { # FOLDER: a place to write in
  [ ! -e "$1" ] || [ -d "$1" ] || die "$1 must be a folder and is something else: move it away and start again."
  mkdir -p "$1" 2>/dev/null && [ -w "$1" ] ||
    die "User $(id -un) cannot write in $1 (read-only, or another user's): make it writable and start again."
}
need_folder "$ROOT/.local"

# step SENTENCE COMMAND...: says what runs, then how long it took when that was noticeable.
step() {
  local sentence="$1" began=$SECONDS
  shift
  say "$sentence"
  "$@" || return
  [ $((SECONDS - began)) -lt 1 ] || say "  done in $((SECONDS - began)) s"
}

need_node() {
  command -v node >/dev/null || die 'Node is not installed: install Node 20.19 or newer (https://nodejs.org) and start again.'
  node -e 'const [a, b] = process.versions.node.split(".").map(Number); process.exit((a === 20 && b >= 19) || (a === 22 && b >= 12) || a > 22 ? 0 : 1)' ||
    die "Node $(node -v) is too old for Wetside: install Node 20.19 or newer (https://nodejs.org) and start again."
  command -v npm >/dev/null || die 'npm is not installed: install it beside Node and start again.'
}

# need_room FOLDER MEGABYTES: says so before a step that would fail halfway for want of room.
need_room() {
  local free
  free="$(df -Pm "$1" | awk 'NR == 2 { print $4 }')"
  [ "$free" -ge "$2" ] ||
    die "The disk that holds $1 has $free MB left and $2 MB are needed: make room and start again, nothing has been changed."
}

# npm ci, and when it fails whether that was the network.
install_modules() {
  local log code=0
  log="$(mktemp)"
  npm ci --loglevel=error --fetch-retries=2 --fetch-retry-mintimeout=2000 --fetch-retry-maxtimeout=10000 >"$log" 2>&1 9>&- 8>&- || code=$?
  [ "$code" = 0 ] || tail -n 15 "$log" >&2
  if grep -qE 'ENOTFOUND|EAI_AGAIN|ECONNREFUSED|ETIMEDOUT|ENETUNREACH|EHOSTUNREACH' "$log"; then
    rm -f "$log"
    die "npm does not reach $(npm config get registry): connect this machine to the network, or set npm's registry, and start again."
  fi
  rm -f "$log"
  return "$code"
}

# npm ci when what is installed is not what package-lock.json names. One at a time; others wait.
need_modules() {
  (
    flock 8
    if node scripts/lib/modules-current.mjs; then exit 0; fi
    need_room "$ROOT" 1200
    step 'Installing the npm packages (the first time takes a minute or two)' install_modules ||
      die 'npm ci failed: see the lines above, mend that and start again.'
    node scripts/lib/modules-current.mjs --stamp
  ) 8>>.local/npm.lock
}

# only_one NAME SENTENCE: holds the file NAME.lock for as long as this process (and what it becomes) lives.
only_one() {
  exec 9>>"$1.lock"
  flock -n 9 && return 0
  local where=''
  [ ! -s "$1.json" ] || where=" $(node -p 'JSON.parse(require("fs").readFileSync(process.argv[1], "utf8")).where ?? ""' "$1.json" 2>/dev/null || true)"
  die "$2$where"
}
