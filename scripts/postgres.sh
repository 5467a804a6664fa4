#!/usr/bin/env bash
# A private PostgreSQL cluster on loopback, apart from any that Debian runs.
#
#   scripts/postgres.sh start               installs, makes and starts what is missing; safe to repeat
#   scripts/postgres.sh stop | status | destroy
#   scripts/postgres.sh database NAME       the four roles, that database and its schema, as they must be
#   scripts/postgres.sh grant-jobs NAME     lets wetside_jobs make its schema; revoke-jobs NAME takes it back
#   scripts/postgres.sh url ROLE [NAME]     app, admin, jobs or super
#   scripts/postgres.sh env                 shell exports of those
#   scripts/postgres.sh psql [arguments]    as wetside_admin; PG_ROLE=app for another
#
# PG_PROFILE=test   the tests' cluster: .local/test-pg, nothing made durable
# PG_DIR            another folder for the cluster
# PG_DB             another database name than wetside
# PG_PORT           the first port to try
# PG_HERE=1         the cluster lies in PG_DIR or nowhere
set -euo pipefail
umask 022
ROOT="$(cd "$(dirname "${BASH_SOURCE[0]}")/.." && pwd -P)"
# shellcheck source=lib/packages.sh
. "$ROOT/scripts/lib/packages.sh"

PROFILE="${PG_PROFILE:-durable}"
DB="${PG_DB:-wetside}"
case "$PROFILE" in
  durable) WANTED="${PG_DIR:-$ROOT/.local/pg}" FIRST_PORT="${PG_PORT:-54320}" ;;
  test) WANTED="${PG_DIR:-$ROOT/.local/test-pg}" FIRST_PORT="${PG_PORT:-54420}" ;;
  *) die "PG_PROFILE is durable or test, not $PROFILE." ;;
esac
WANTED="$(realpath -m "$WANTED")"

# ---- the place: PLACE (folder), DATA, SERVER_USER ------------------------------------------------
# The server never runs as root; as root it runs as postgres, who cannot enter a home like /root. Then the
# cluster lies under /var/lib/wetside, in a folder named after the path it was wanted at.
FALLBACK="/var/lib/wetside/$(printf %s "$WANTED" | sha256sum | cut -c1-12)"
settle() {
  PLACE="$WANTED"
  SERVER_USER="$(id -un)"
  if [ "$(id -u)" = 0 ]; then
    SERVER_USER=postgres
    [ -n "${PG_HERE:-}" ] || [ -f "$WANTED/data/PG_VERSION" ] || [ ! -f "$FALLBACK/data/PG_VERSION" ] || PLACE="$FALLBACK"
    # Made by a person without root and now run with it: the server stays theirs.
    [ ! -d "$PLACE/data" ] || SERVER_USER="$(stat -c %U "$PLACE/data")"
  elif [ -d "$WANTED" ] && [ ! -w "$WANTED" ]; then
    die "The database in $WANTED belongs to $(stat -c %U "$WANTED"): run this as root, as the first time."
  fi
  DATA="$PLACE/data"
}
as_server() {
  if [ "$(id -u)" = 0 ]; then (cd / && exec runuser -u "$SERVER_USER" -- "$@"); else "$@"; fi
}
make_place() {
  if [ ! -d "$DATA" ]; then
    mkdir -p "$PLACE"
    if ! as_server test -x "$(dirname "$PLACE")"; then
      [ -z "${PG_HERE:-}" ] || die "User $SERVER_USER, who runs the database, cannot reach $WANTED: choose a place that others may pass through, such as /srv, or let them (chmod o+x on the folders above)."
      rmdir "$PLACE" 2>/dev/null || true
      PLACE="$FALLBACK" DATA="$FALLBACK/data"
      mkdir -p "$PLACE"
      say "  user $SERVER_USER cannot reach $WANTED: the database is kept in $PLACE"
    fi
  fi
  [ "$(id -u)" != 0 ] || chown "$SERVER_USER" "$PLACE"
  chmod 700 "$PLACE"
  as_server test -x "$PLACE" || die "User $SERVER_USER cannot reach $PLACE any more: let others pass through the folders above it (chmod o+x) and start again."
}

# ---- secrets: made once, one line a role ---------------------------------------------------------
make_passwords() {
  [ ! -s "$PLACE/passwords" ] || return 0
  [ ! -f "$DATA/PG_VERSION" ] || die "The passwords of the database in $PLACE are gone: put the file back, or begin anew with scripts/postgres.sh destroy."
  local role
  (
    umask 077
    for role in postgres wetside_admin wetside_jobs wetside_app; do
      echo "$role $(od -An -N24 -tx1 /dev/urandom | tr -d ' \n')"
    done >"$PLACE/passwords.new"
  )
  mv "$PLACE/passwords.new" "$PLACE/passwords"
}
password() { awk -v role="$1" '$1 == role { print $2 }' "$PLACE/passwords" 2>/dev/null; }
port() { cat "$PLACE/port" 2>/dev/null; }
url() {
  local role
  case "$1" in
    app | admin | jobs) role="wetside_$1" ;;
    super) role=postgres ;;
    *) die "There is no role $1: app, admin, jobs or super." ;;
  esac
  [ -s "$PLACE/port" ] || die 'The database has not been started yet: run scripts/postgres.sh start.'
  echo "postgres://$role:$(password "$role")@127.0.0.1:$(port)/${2:-$DB}"
}
super() { PGPASSWORD="$(password postgres)" "$BIN/psql" -h 127.0.0.1 -p "$(port)" -U postgres -d postgres -X -q -v ON_ERROR_STOP=1 "$@"; }

# ---- start and stop ------------------------------------------------------------------------------
# Every process of a cluster has its data folder as working folder: that tells ours from all others.
ours() { [ -n "$1" ] && [ "$(as_server readlink "/proc/$1/cwd" 2>/dev/null)" = "$DATA" ]; }
postmaster() { head -n 1 "$DATA/postmaster.pid" 2>/dev/null || true; }
ready() { ours "$(postmaster)" && "$BIN/pg_isready" -q -h 127.0.0.1 -p "$(port)"; }
left_over() {
  as_server sh -c 'for p in /proc/[0-9]*; do [ "$(readlink "$p/cwd" 2>/dev/null)" = "$1" ] && exit 0; done; exit 1' sh "$DATA"
}

if [ -n "${PG_HERE:-}" ]; then
  BEGIN_ANEW='Nothing has been deleted. Keep the folder, and restore the last backup into a new one (docs/operate.md).'
else
  BEGIN_ANEW="Nothing has been deleted. Put the files back from a copy if you have one; to begin anew without what it held, run scripts/postgres.sh destroy and start again."
fi
make_cluster() {
  [ ! -f "$DATA/PG_VERSION" ] || return 0
  [ ! -e "$DATA" ] || die "The database in $PLACE is damaged ($DATA holds no PG_VERSION). $BEGIN_ANEW"
  # Made beside and moved into place whole: a start that was cut short leaves no half of a cluster.
  local new="$PLACE/data.new" secret="$PLACE/super.pw"
  as_server rm -rf "$new"
  (umask 077 && password postgres >"$secret")
  [ "$(id -u)" != 0 ] || chown "$SERVER_USER" "$secret"
  as_server "$BIN/initdb" -D "$new" -U postgres -E UTF8 --locale=C.UTF-8 -A scram-sha-256 --pwfile="$secret" \
    $([ "$PROFILE" = test ] && echo --no-sync || echo --data-checksums) >/dev/null 9>&- ||
    die "PostgreSQL could not make its files in $PLACE: see the lines above, mend that (room on the disk, rights) and start again."
  rm -f "$secret"
  {
    echo "listen_addresses = '127.0.0.1'"
    echo "unix_socket_directories = ''"
    echo "timezone = 'UTC'"
    echo "log_timezone = 'UTC'"
    echo 'max_connections = 200'
    if [ "$PROFILE" = test ]; then
      printf '%s = off\n' fsync synchronous_commit full_page_writes
    fi
  } | as_server tee -a "$new/postgresql.conf" >/dev/null
  mv "$new" "$DATA"
}

port_taken() { (exec 3<>"/dev/tcp/127.0.0.1/$1") 2>/dev/null; }
run_server() {
  local pid wish try
  pid="$(postmaster)"
  if [ -n "$pid" ] && ! ours "$pid"; then
    # A server that was killed: its children end by themselves within moments, and no other may start beside them.
    for try in $(seq 100); do left_over || break; sleep 0.1; done
    ! left_over || die "Parts of a killed database server still run in $DATA: end them and start again."
    # Its number may be another program's by now, which PostgreSQL takes for a running server.
    ! [ -d "/proc/$pid" ] || rm -f "$DATA/postmaster.pid"
  fi
  wish="$(port || true)"
  : "${wish:=$FIRST_PORT}"
  [ ! -f "$PLACE/log" ] || [ "$(stat -c %s "$PLACE/log")" -lt 20000000 ] || mv "$PLACE/log" "$PLACE/log.old"
  for try in $(seq 100); do
    if ! port_taken "$wish"; then
      echo "$wish" >"$PLACE/port"
      # 9>&-: the server must not hold this script's lock.
      if as_server "$BIN/pg_ctl" -D "$DATA" -l "$PLACE/log" -o "-p $wish" -s -w -t 60 start >/dev/null 2>&1 9>&-; then return 0; fi
      tail -n 5 "$PLACE/log" 2>/dev/null | grep -q 'Address already in use' || break
    fi
    wish=$((wish + 1))
  done
  tail -n 15 "$PLACE/log" >&2 || true
  die "PostgreSQL did not start: the lines above are the end of its log, $PLACE/log. If its files are damaged: $BEGIN_ANEW"
}

start() {
  need_postgres
  BIN="$(postgres_bin)"
  settle
  make_place
  # One starter at a time.
  exec 9>"$PLACE/lock"
  flock 9
  make_passwords
  make_cluster
  ready || run_server
  ready || die "PostgreSQL does not answer on port $(port): see its log, $PLACE/log."
  database "$DB"
  exec 9>&-
}
stop() {
  if ours "$(postmaster)"; then as_server "$BIN/pg_ctl" -D "$DATA" -s -m fast -w -t 60 stop; fi
}

# ---- roles and databases -------------------------------------------------------------------------
name_of_database() { [[ "${1:-}" =~ ^[a-z_][a-z0-9_]{0,62}$ ]] || die 'A database needs a name of small letters, digits and underlines.'; }
database() {
  name_of_database "$1"
  super >/dev/null <<SQL
set client_min_messages = warning;
select 'create role ' || r.line
  from (values (1, 'wetside_owner', 'wetside_owner nologin'),
               (2, 'wetside_jobs', 'wetside_jobs login password ''$(password wetside_jobs)'''),
               (3, 'wetside_app', 'wetside_app login password ''$(password wetside_app)'''),
               (4, 'wetside_admin', 'wetside_admin login bypassrls password ''$(password wetside_admin)''')) r (n, name, line)
 where not exists (select from pg_roles where rolname = r.name) order by n \gexec
grant wetside_owner, wetside_jobs to wetside_admin;
select 'create database $1 owner wetside_owner' where not exists (select from pg_database where datname = '$1') \gexec
SQL
  # What each role may do in it stands in db/sql, where the tests' databases take it from too.
  grant_jobs "$1"
  revoke_jobs "$1"
}
grant_jobs() { super -d "$1" -f "$ROOT/db/sql/database.sql"; }
revoke_jobs() { super -d "$1" -f "$ROOT/db/sql/jobs-done.sql"; }

running() {
  settle
  BIN="$(postgres_bin)"
  [ -n "$BIN" ] && ready || die 'The database is not running: run scripts/postgres.sh start.'
}

case "${1:-}" in
  start) start ;;
  stop) settle; BIN="$(postgres_bin)"; stop ;;
  status)
    settle
    BIN="$(postgres_bin)"
    if [ -n "$BIN" ] && ready; then echo "running on 127.0.0.1:$(port), in $PLACE"; else echo 'not running'; exit 3; fi
    ;;
  database) running; database "${2:-}" ;;
  grant-jobs) running; name_of_database "${2:-}"; grant_jobs "$2" ;;
  revoke-jobs) running; name_of_database "${2:-}"; revoke_jobs "$2" ;;
  url) settle; url "${2:-}" "${3:-$DB}" ;;
  env)
    settle
    url app >/dev/null
    printf "export DATABASE_%s='%s'\n" URL "$(url app)" ADMIN_URL "$(url admin)" JOBS_URL "$(url jobs)" SUPER_URL "$(url super)"
    ;;
  psql)
    shift
    settle
    BIN="$(postgres_bin)"
    began=no
    [ -n "$BIN" ] && ready || { began=yes; start; }
    code=0
    # By environment: a password in the arguments could be read by every program on the machine.
    login="${PG_ROLE:-admin}"
    case "$login" in super) login=postgres ;; app | admin | jobs) login="wetside_$login" ;; esac
    PGPASSWORD="$(password "$login")" PGHOST=127.0.0.1 PGPORT="$(port)" PGUSER="$login" PGDATABASE="$DB" "$BIN/psql" "$@" || code=$?
    [ "$began" = no ] || stop
    exit "$code"
    ;;
  destroy)
    settle
    BIN="$(postgres_bin)"
    [ -z "$BIN" ] || stop
    # By name: PG_DIR may be a folder that holds other things too.
    (cd "$PLACE" 2>/dev/null && rm -rf data data.new passwords passwords.new super.pw port log log.old lock) || true
    rmdir "$PLACE" 2>/dev/null || true
    ;;
  *) die 'Say start, stop, status, destroy, database, grant-jobs, revoke-jobs, url, env or psql.' ;;
esac
