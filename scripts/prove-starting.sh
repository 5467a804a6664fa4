#!/usr/bin/env bash
# npm run prove:starting: what stands in the way of a start, each said in a sentence. Writes docs/proofs/starting.md.
# Needs root (it mounts small disks and becomes another user). Works in copies in PROVE_DIR, ports from 55300.
set -uo pipefail
. "$(dirname "${BASH_SOURCE[0]}")/lib/prove.sh"
[ "$(id -u)" = 0 ] || { say 'Run this as root: it mounts small disks and becomes another user.'; exit 1; }
export PORT=55310 INBOX_PORT=55330 SMTP_PORT=55340 PG_PORT=55350
unset WETSIDE_DATA DATABASE_URL PG_DIR PG_PROFILE
mkdir -p "$WORK"
READY='Ctrl-C stops it'
empty="$WORK/empty"
mkdir -p "$empty"

say 'A checkout in a path with spaces, built from nothing; its port taken; a second start'
copy_tree "$BASE"
node -e 'require("net").createServer().listen(55310, "127.0.0.1")' &
blocker=$!
trap 'kill "$blocker" 2>/dev/null' EXIT
behind "$WORK/base.log" "$BASE" bash scripts/start.sh
first=$job
await "$WORK/base.log" "$READY" || exit 1
in_front "$WORK/second.log" "$BASE" npm start
row 'a second `npm start` at once' "$WORK/second.log" 'already runs from this folder.*http://localhost' 1
job=$first
interrupt
row 'the port is taken' "$WORK/base.log" 'port 55310 is taken: Wetside uses 553' 0
row 'a checkout in a path with spaces' "$WORK/base.log" 'Wetside is ready' 0
kill "$blocker"

say 'Node is too old'
old="$WORK/old"
mkdir -p "$old"
echo 'Object.defineProperty(process, "version", { value: "v18.19.0" }); Object.defineProperty(process, "versions", { value: { ...process.versions, node: "18.19.0" } });' >"$old/old.cjs"
printf '#!/bin/sh\n[ "$1" != -v ] || { echo v18.19.0; exit; }\nexec %s -r %s "$@"\n' "$(command -v node)" "$old/old.cjs" >"$old/node"
chmod +x "$old/node"
in_front "$WORK/old.log" "$BASE" env PATH="$old:$PATH" npm start
row 'Node under 20.19' "$WORK/old.log" 'too old for Wetside: install Node 20.19' 1

say 'A user without sudo on a machine without PostgreSQL'
user="$WORK/user"
copy_built "$user"
chown nobody "$user" "$user/.local"
mkdir -p "$WORK/bin" && ln -sf "$(command -v node)" "$(command -v npm)" "$WORK/bin/"
in_front "$WORK/user.log" "$user" unshare -m sh -c '
  mount -t tmpfs none /usr/lib/postgresql && mount --bind /dev/null /var/lib/dpkg/status || exit 99
  exec setpriv --reuid=nobody --regid=nogroup --clear-groups env HOME="$2" PATH="$1:/usr/bin:/bin" npm_config_cache="$2" npm start' sh "$WORK/bin" "$user/.local"
row 'no PostgreSQL, and a user without sudo' "$WORK/user.log" 'install them as root \(apt-get install postgresql-common postgresql-15\)' 1

say 'The disk'
disk="$WORK/disk"
copy_built "$disk"
in_front "$WORK/full.log" "$disk" unshare -m sh -c 'mount -t tmpfs -o size=64m none .local && exec npm start'
row 'the disk is full' "$WORK/full.log" 'MB left and .* make room and start again' 1
in_front "$WORK/read-only.log" "$disk" unshare -m sh -c 'mount -t tmpfs -o ro none .local && exec npm start'
row 'the disk is read-only' "$WORK/read-only.log" 'cannot write in .*make it writable and start again' 1

say 'No network'
rm -rf "$disk/node_modules" "$empty" && mkdir "$empty"
in_front "$WORK/network.log" "$disk" env npm_config_registry=http://127.0.0.1:1/ npm_config_cache="$empty" npm start
row 'no network at `npm ci`' "$WORK/network.log" 'npm does not reach http://127.0.0.1:1/: connect' 1
clear_copy "$disk"

say 'A first start that is interrupted'
cut="$WORK/cut"
copy_built "$cut"
behind "$WORK/cut-1.log" "$cut" bash scripts/start.sh
await "$WORK/cut-1.log" 'Starting the database'
interrupt
row 'Ctrl-C while the database is made' "$WORK/cut-1.log" 'Told to stop while starting' 130
behind "$WORK/cut-2.log" "$cut" bash scripts/start.sh
await "$WORK/cut-2.log" 'Looking after the demo'
deeds() { (cd "$cut" && scripts/postgres.sh psql -Atc 'select count(*) from actions'); }
until [ "$(deeds)" -gt 5 ]; do sleep 0.05; done
interrupt
row 'Ctrl-C while the demo is played' "$WORK/cut-2.log" 'Told to stop while starting' 130
behind "$WORK/cut-3.log" "$cut" bash scripts/start.sh
await "$WORK/cut-3.log" "$READY"
interrupt
row 'the start after them' "$WORK/cut-3.log" 'it is played anew' 0
row 'the start after them' "$WORK/cut-3.log" 'Wetside is ready' 0
in_front "$WORK/cut-4.log" "$cut" npm run reconcile
row 'and its figures' "$WORK/cut-4.log" 'all as folded' 0

say 'A damaged .local'
echo '{ "server' >"$cut/.local/built.json"
echo 'x' >"$cut/.local/running.json"
echo 'short' >"$cut/.local/secret"
in_front "$WORK/secret.log" "$cut" npm start
row 'the secret is damaged' "$WORK/secret.log" 'is damaged: delete it and start again' 1
rm "$cut/.local/secret"
behind "$WORK/notes.log" "$cut" bash scripts/start.sh
await "$WORK/notes.log" "$READY"
interrupt
row 'the notes of builds and runs are damaged' "$WORK/notes.log" 'Wetside is ready' 0
: >"$cut/.local/pg/data/global/pg_control"
in_front "$WORK/damaged.log" "$cut" npm start
row 'the database’s files are damaged' "$WORK/damaged.log" 'Nothing has been deleted.*scripts/postgres.sh destroy' 1
check 'the database’s files are damaged' 'they are all still there' test -s "$cut/.local/pg/data/PG_VERSION" -a -d "$cut/.local/pg/data/base"
rm "$cut/.local/pg/data/PG_VERSION"
in_front "$WORK/damaged-2.log" "$cut" npm start
row 'the database’s folder is no database any more' "$WORK/damaged-2.log" 'is damaged .*Nothing has been deleted.*scripts/postgres.sh destroy' 1
in_front "$WORK/destroy.log" "$cut" scripts/postgres.sh destroy
behind "$WORK/anew.log" "$cut" bash scripts/start.sh
await "$WORK/anew.log" "$READY"
interrupt
row 'the start after `scripts/postgres.sh destroy`' "$WORK/anew.log" 'Wetside is ready' 0

say 'A migration that fails halfway'
node - "$cut" <<'JS'
const fs = require('fs');
const folder = process.argv[2] + '/db/migrations/';
const journal = JSON.parse(fs.readFileSync(folder + 'meta/_journal.json', 'utf8'));
const last = journal.entries.at(-1);
journal.entries.push({ ...last, idx: last.idx + 1, when: last.when + 60000, tag: '9999_trial' });
fs.writeFileSync(folder + 'meta/_journal.json', JSON.stringify(journal));
fs.writeFileSync(folder + '9999_trial.sql', 'create table identity.trial (id integer);\n--> statement-breakpoint\nselect no_such_function();\n');
JS
in_front "$WORK/migration.log" "$cut" npm start
row 'a migration fails halfway' "$WORK/migration.log" 'db/migrations/9999_trial.sql failed .*no_such_function.*mend that file and start again' 1
in_front "$WORK/half.log" "$cut" npm run --silent psql -- -Atc "select 'its table: ' || coalesce(to_regclass('identity.trial')::text, 'none')"
row 'and what it had done' "$WORK/half.log" 'its table: none' 0
sed -i 's/no_such_function/pg_backend_pid/' "$cut/db/migrations/9999_trial.sql"
behind "$WORK/mended.log" "$cut" bash scripts/start.sh
await "$WORK/mended.log" "$READY"
interrupt
row 'the start after it is mended' "$WORK/mended.log" 'Wetside is ready' 0
clear_copy "$cut"
clear_copy "$user"

say 'Real use'
none=(env -u WETSIDE_DATA -u SESSION_SECRET -u SMTP_URL -u MAIL_FROM -u PUBLIC_ORIGIN)
real=(env SESSION_SECRET=0123456789abcdef0123456789abcdef SMTP_URL=smtp://127.0.0.1:55340 MAIL_FROM=wetside@darkroom.example
  PUBLIC_ORIGIN=https://darkroom.example WETSIDE_DATA="$WORK/real")
in_front "$WORK/serve-none.log" "$BASE" "${none[@]}" npm run serve
for name in SESSION_SECRET SMTP_URL MAIL_FROM PUBLIC_ORIGIN WETSIDE_DATA; do
  row "\`npm run serve\` without $name" "$WORK/serve-none.log" "^$name must be set" 1
done
refused() { # CASE PATTERN NAME=VALUE…
  local case="$1" pattern="$2"
  shift 2
  in_front "$WORK/serve-bad.log" "$BASE" "${real[@]}" env "$@" npm run serve
  row "\`npm run serve\`, $case" "$WORK/serve-bad.log" "$pattern" 1
}
refused 'PUBLIC_ORIGIN on plain http' '^PUBLIC_ORIGIN must start with https' PUBLIC_ORIGIN=http://darkroom.example
refused 'a short secret' '^SESSION_SECRET must have at least 32' SESSION_SECRET=short
refused 'the data in the checkout' '^WETSIDE_DATA must lie outside' WETSIDE_DATA="$BASE/data"
refused 'one of three logins' '^DATABASE_ADMIN_URL must be set where DATABASE_URL' DATABASE_URL=postgres://app@127.0.0.1:1/w
refused 'a clock that is moved' '^CLOCK_OFFSET is for demo' CLOCK_OFFSET=P1D
refused 'data where the database cannot go' 'cannot reach /root/.*choose a place' WETSIDE_DATA=/root/.wetside-trial
rm -rf /root/.wetside-trial
behind "$WORK/serve.log" "$BASE" "${real[@]}" bash scripts/serve.sh
await "$WORK/serve.log" 'SIGTERM stops it'
serving=$job
check '`npm run serve`' '/api/health and /api/ready answer 200' sh -c 'curl -fsS http://127.0.0.1:55310/api/health && curl -fsS http://127.0.0.1:55310/api/ready' >/dev/null
in_front "$WORK/serve-second.log" "$BASE" "${real[@]}" npm run serve
row 'a second `npm run serve`' "$WORK/serve-second.log" 'already runs on this WETSIDE_DATA: https://darkroom.example' 1
refused 'its port taken' '^Port 55310 is taken' WETSIDE_DATA="$WORK/other"
PG_DIR="$WORK/real/pg" "$BASE/scripts/postgres.sh" stop
until PG_DIR="$WORK/real/pg" "$BASE/scripts/postgres.sh" status >/dev/null && curl -fs http://127.0.0.1:55310/api/ready >/dev/null; do
  kill -0 "$serving" || break
  sleep 0.2
done
job=$serving
interrupt
row '`npm run serve`, its database stopped by hand' "$WORK/serve.log" 'The database has gone: starting it again' 0
for place in real other; do PG_DIR="$WORK/$place/pg" "$BASE/scripts/postgres.sh" destroy; done
rm -rf "$WORK/real" "$WORK/other"

write_proof starting.md 'Starting, and what stands in its way' 'Written by `npm run prove:starting`, in copies of the checkout. `…` stands for the folder they lie in.'
