#!/usr/bin/env bash
# npm run prove:start: `npm start` from nothing and again, in a clean clone and in a bare Debian 12 root, timed.
# Needs root and debootstrap (apt-get install debootstrap). Writes docs/proofs/start.md.
#   PROVE_DIR=/var/tmp/wetside-prove   where clone and root are made; the root is kept for the next time
#   MIRROR=http://deb.debian.org/debian
set -euo pipefail
TOP="$(cd "$(dirname "${BASH_SOURCE[0]}")/.." && pwd -P)"
WORK="${PROVE_DIR:-/var/tmp/wetside-prove}"
MIRROR="${MIRROR:-http://deb.debian.org/debian}"
BARE="$WORK/bare"
say() { printf '%s\n' "$*" >&2; }
[ "$(id -u)" = 0 ] || { say 'Run this as root: it makes a Debian root and enters it.'; exit 1; }
command -v debootstrap >/dev/null || { say 'Install debootstrap first: apt-get install debootstrap'; exit 1; }
mkdir -p "$WORK"

# Starts once with the command given, waits for its last line, stops it by Ctrl-C; prints the seconds.
once() { # log, command…
  local log="$1"; shift
  : > "$log"
  local from to
  from="$(date +%s.%N)"
  # A session of its own, so that Ctrl-C reaches everything that npm began, as in a terminal.
  setsid "$@" > "$log" 2>&1 &
  local pid=$!
  while ! grep -q 'Ctrl-C stops it' "$log"; do
    kill -0 "$pid" 2>/dev/null || { say "It ended before it was ready:"; tail -30 "$log" >&2; return 1; }
    sleep 0.2
  done
  to="$(date +%s.%N)"
  kill -INT -- "-$pid"
  wait "$pid" || true
  awk -v a="$from" -v b="$to" 'BEGIN { printf "%.1f", b - a }'
}

fresh_clone() { rm -rf "$1"; git clone -q "$TOP" "$1"; }

make_bare() {
  if [ ! -x "$BARE/usr/bin/apt-get" ]; then
    say 'Making a bare Debian 12 root'
    debootstrap --variant=minbase bookworm "$BARE" "$MIRROR" > "$WORK/debootstrap.log"
  fi
  # This machine's Node and npm, and how it reaches the registries; nothing else of it.
  install -D "$(readlink -f "$(command -v node)")" "$BARE/usr/bin/node"
  local npm; npm="$(cd "$(dirname "$(readlink -f "$(command -v npm)")")/.." && pwd -P)"
  mkdir -p "$BARE/usr/lib/node_modules"
  rm -rf "$BARE/usr/lib/node_modules/npm"
  cp -a "$npm" "$BARE/usr/lib/node_modules/npm"
  ln -sf ../lib/node_modules/npm/bin/npm-cli.js "$BARE/usr/bin/npm"
  ln -sf ../lib/node_modules/npm/bin/npx-cli.js "$BARE/usr/bin/npx"
  cp /etc/resolv.conf "$BARE/etc/resolv.conf"
  for file in /usr/etc/npmrc /etc/ssl/certs/ca-certificates.crt; do
    [ -f "$file" ] && install -D "$file" "$BARE$file"
  done
  mountpoint -q "$BARE/proc" || mount -t proc proc "$BARE/proc"
  mountpoint -q "$BARE/dev" || mount --rbind /dev "$BARE/dev"
}
leave_bare() { umount -l "$BARE/proc" "$BARE/dev" 2>/dev/null || true; }
trap leave_bare EXIT

fresh_clone "$WORK/clone"
say 'A clean clone, cold'
clone_cold="$(once "$WORK/clone-cold.log" npm --prefix "$WORK/clone" start)"
say "  $clone_cold s; again, warm"
clone_warm="$(once "$WORK/clone-warm.log" npm --prefix "$WORK/clone" start)"
say "  $clone_warm s"

make_bare
fresh_clone "$BARE/srv/wetside"
# Nothing installed on the first start of a bare root: not PostgreSQL, not sudo, not git.
have="$(chroot "$BARE" sh -c 'for c in psql initdb sudo git python3 gcc; do command -v $c; done' | tr '\n' ' ' || true)"
say "A bare Debian root (of psql, initdb, sudo, git, python3, gcc it has: ${have:-none}), cold"
bare_cold="$(once "$WORK/bare-cold.log" chroot "$BARE" /usr/bin/env -i PATH=/usr/sbin:/usr/bin:/sbin:/bin HOME=/root LANG=C.UTF-8 sh -c 'cd /srv/wetside && exec npm start')"
say "  $bare_cold s; again, warm"
bare_warm="$(once "$WORK/bare-warm.log" chroot "$BARE" /usr/bin/env -i PATH=/usr/sbin:/usr/bin:/sbin:/bin HOME=/root LANG=C.UTF-8 sh -c 'cd /srv/wetside && exec npm start')"
say "  $bare_warm s"

{
  echo '# `npm start`, from nothing and again'
  echo
  echo "$(date -u +%F), commit $(git -C "$TOP" rev-parse --short HEAD), Node $(node -v), $(nproc) cores. Written by \`npm run prove:start\`."
  echo
  echo '| where | cold, seconds | warm, seconds |'
  echo '| --- | ---: | ---: |'
  echo "| a clean clone, no node_modules, no .local | $clone_cold | $clone_warm |"
  echo "| a bare Debian 12 root (debootstrap minbase; before it: ${have:-nothing of psql, initdb, sudo, git, python3, gcc}) | $bare_cold | $bare_warm |"
  echo
  echo 'The last lines of the cold start in the bare root:'
  echo
  echo '```'
  sed -n '/Wetside is ready/,/Ctrl-C stops it/p' "$WORK/bare-cold.log"
  echo '```'
} > "$TOP/docs/proofs/start.md"
say 'Written: docs/proofs/start.md'
