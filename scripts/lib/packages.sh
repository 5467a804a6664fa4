# Debian packages, for scripts that must work before node_modules exists. Source it.

say() { printf '%s\n' "$*" >&2; }
die() { say "$*"; exit 1; }

# need_packages PURPOSE PACKAGE...: installs what is missing, as root or through sudo.
need_packages() {
  local reason="$1" package missing=() all
  shift
  for package in "$@"; do
    [ "$(dpkg-query -W -f='${db:Status-Status}' "$package" 2>/dev/null)" = installed ] || missing+=("$package")
  done
  [ ${#missing[@]} -gt 0 ] || return 0
  # Whoever has to ask somebody else for them should have to ask once.
  all="${missing[*]} ${ALSO_NEEDED:-}" all="${all% }"
  local plea="Wetside needs the Debian packages $all for $reason: install them as root (apt-get install $all) and start again."
  command -v apt-get >/dev/null || die "$plea"
  local sudo=()
  if [ "$(id -u)" != 0 ]; then
    command -v sudo >/dev/null || die "$plea"
    # Without a terminal sudo cannot ask for a passphrase.
    if [ -t 0 ]; then sudo=(sudo); else sudo=(sudo -n); fi
    "${sudo[@]}" true 2>/dev/null || die "$plea"
  fi
  say "  installing ${missing[*]} from Debian"
  local apt=("${sudo[@]}" env DEBIAN_FRONTEND=noninteractive apt-get -qq -o DPkg::Lock::Timeout=300)
  local log
  log="$(mktemp)"
  if ! { "${apt[@]}" update && "${apt[@]}" install -y --no-install-recommends "${missing[@]}"; } >"$log" 2>&1 9>&-; then
    tail -n 15 "$log" >&2
    rm -f "$log"
    die "Debian's packages ${missing[*]} could not be installed: see the lines above, mend that and start again."
  fi
  rm -f "$log"
}

# The server without a cluster of Debian's own, which would take port 5432 and a place among the services.
need_postgres() {
  [ -z "$(postgres_bin)" ] || return 0
  ALSO_NEEDED=postgresql-15 need_packages 'its database' postgresql-common
  local rule=/etc/postgresql-common/createcluster.d/wetside.conf sudo=()
  [ "$(id -u)" = 0 ] || sudo=(sudo)
  "${sudo[@]}" mkdir -p "${rule%/*}"
  echo 'create_main_cluster = false' | "${sudo[@]}" tee "$rule" >/dev/null
  need_packages 'its database' postgresql-15
  [ -n "$(postgres_bin)" ] || die 'PostgreSQL is installed but its initdb is not under /usr/lib/postgresql: install postgresql-15.'
}

# The folder of PostgreSQL's programs: 15 if it is there, else the newest after it. Empty when there is none.
postgres_bin() {
  local dir best=''
  for dir in /usr/lib/postgresql/15/bin $(ls -d /usr/lib/postgresql/*/bin 2>/dev/null | sort -Vr); do
    [ -x "$dir/initdb" ] && [ "$(basename "${dir%/bin}")" -ge 15 ] && { best="$dir"; break; }
  done
  echo "$best"
}
