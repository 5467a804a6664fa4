# What every command needs before Node's own scripts can run: source it, then call the steps.
# Works without node_modules.

ROOT="$(cd "$(dirname "${BASH_SOURCE[0]}")/../.." && pwd -P)"
cd "$ROOT"
mkdir -p .local
# shellcheck source=packages.sh
. scripts/lib/packages.sh

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

# npm ci when what is installed is not what package-lock.json names. One at a time; others wait.
need_modules() {
  (
    flock 8
    if node scripts/lib/modules-current.mjs; then exit 0; fi
    step 'Installing the npm packages (the first time takes a minute or two)' npm ci --loglevel=error 9>&- 8>&- >&2 ||
      die 'npm ci failed: see the lines above, mend that and start again.'
    node scripts/lib/modules-current.mjs --stamp
  ) 8>>.local/npm.lock
}

# only_one NAME SENTENCE: holds .local/NAME.lock for as long as this process (and what it becomes) lives.
only_one() {
  exec 9>>".local/$1.lock"
  flock -n 9 && return 0
  local where=''
  [ ! -s ".local/$1.json" ] || where=" $(node -p 'JSON.parse(require("fs").readFileSync(process.argv[1], "utf8")).where ?? ""' ".local/$1.json" 2>/dev/null || true)"
  die "$2$where"
}
