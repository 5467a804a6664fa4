#!/usr/bin/env bash
# npm run prove:backup: a backup taken while loads are ticked off, restored elsewhere and counted again.
# Writes docs/proofs/backup.md. Works in copies in PROVE_DIR, ports from 55300.
set -uo pipefail
. "$(dirname "${BASH_SOURCE[0]}")/lib/prove.sh"
export PORT=55310 INBOX_PORT=55330 SMTP_PORT=55340 PG_PORT=55350
unset WETSIDE_DATA DATABASE_URL PG_DIR PG_PROFILE
mkdir -p "$WORK"
here="$WORK/here" there="$WORK/there" file="$WORK/darkrooms.backup"
rm -f "$file"
# prove:starting leaves a built copy; without one the start builds it.
[ -s "$BASE/.local/built.json" ] || copy_tree "$BASE"
if [ -s "$BASE/.local/built.json" ]; then copy_built "$here"; else copy_tree "$here"; fi
[ ! -d "$there/pg" ] || PG_DIR="$there/pg" "$here/scripts/postgres.sh" destroy
rm -rf "$there"
elsewhere=(env WETSIDE_DATA="$there")

say 'The demo runs; its mail server hangs, so that mails wait and are leased'
behind "$WORK/here.log" "$here" env MAIL_GRACE_S=0 SWEEP_S=1 bash scripts/start.sh
await "$WORK/here.log" 'Ctrl-C stops it' || exit 1
started=$job
address="$(grep -oE 'http://localhost:553[0-9]+' "$WORK/here.log" | head -n 1)"
inbox="$(grep -oE 'Its mail: http://localhost:[0-9]+' "$WORK/here.log" | grep -oE 'http.*')"
curl -fsS "$inbox/behaviour" -d '{"mode":"hang"}' >/dev/null
behind "$WORK/ticks.log" "$here" node scripts/lib/ticks.mjs "$address"
ticking=$job
await "$WORK/ticks.log" '^ticking' || exit 1
sql() { (cd "$here" && scripts/postgres.sh psql -Atc "$1"); }
until [ "$(sql "select count(*) from mails where state = 'leased'")" -gt 0 ]; do sleep 0.1; done
before="$(sql "select count(*) from actions where kind = 'load'")"
in_front "$WORK/backup.log" "$here" env COUNTS=1 npm run --silent backup -- "$file"
row 'a backup while loads are ticked off' "$WORK/backup.log" 'holds .* darkrooms?, .* rows in' 0
after="$(sql "select count(*) from actions where kind = 'load'")"
kill -TERM "$ticking"
code=0; wait "$ticking" || code=$?
row 'the ticks, all the while' "$WORK/ticks.log" '^[0-9]+ loads' 0
check 'the ticks, all the while' "loads recorded when the backup began: $before, when it had ended: $after" test "$after" -gt "$before"
in_front "$WORK/again.log" "$here" npm run --silent backup -- "$file"
row 'a backup over another' "$WORK/again.log" 'is there already: choose another name' 1
in_front "$WORK/running.log" "$here" npm run --silent restore -- "$file" --over
row 'a restore under a running program' "$WORK/running.log" 'Wetside runs on this database: stop it first' 1
job=$started
interrupt

say 'Restored elsewhere'
in_front "$WORK/restore.log" "$here" "${elsewhere[@]}" COUNTS=1 npm run --silent restore -- "$file"
row 'restored into an empty cluster' "$WORK/restore.log" '^Restored: ' 0
row 'what waited' "$WORK/restore.log" 'withdrawn: [1-9][0-9]* mails; ended: [1-9]' 0
same_counts() { [ "$(grep '^{' "$WORK/backup.log")" = "$(grep '^{' "$WORK/restore.log")" ]; }
check 'rows of every table, in the backup and restored' "$(grep '^{' "$WORK/backup.log" | tr -d '{}"' | sed 's/public\.//g; s/:/ /g; s/,/, /g')" same_counts
in_front "$WORK/reconcile.log" "$here" "${elsewhere[@]}" npm run --silent reconcile
row '`npm run reconcile` there' "$WORK/reconcile.log" 'all as folded' 0
states() { # of the restored mails and queue
  (cd "$here" && PG_DIR="$there/pg" scripts/postgres.sh psql -Atc "select count(*) filter (where state in ('waiting', 'leased')) || ' waiting or leased, ' || (select count(*) from graphile_worker.jobs) || ' in the queue; because: ' || coalesce(string_agg(distinct withdrawn_because, ', ') filter (where withdrawn_because = 'restored'), 'none') from mails")
}
code=0; states >"$WORK/states.log" || code=$?
row 'mails and queue there' "$WORK/states.log" '^0 waiting or leased, 0 in the queue; because: restored' 0
real=(SESSION_SECRET=0123456789abcdef0123456789abcdef SMTP_URL=smtp://127.0.0.1:55340 MAIL_FROM=wetside@darkroom.example PUBLIC_ORIGIN=https://darkroom.example)
behind "$WORK/serve.log" "$here" "${elsewhere[@]}" "${real[@]}" bash scripts/serve.sh
await "$WORK/serve.log" 'SIGTERM stops it' || exit 1
check '`npm run serve` there' '/api/ready answers 200: the roles, rights and row security are as the server demands' curl -fsS -o /dev/null http://127.0.0.1:55310/api/ready
interrupt
row '`npm run serve` there' "$WORK/serve.log" 'Wetside serves' 0
in_front "$WORK/refused.log" "$here" "${elsewhere[@]}" npm run --silent restore -- "$file"
row 'a restore over darkrooms' "$WORK/refused.log" 'say --over to put the backup in' 1
in_front "$WORK/over.log" "$here" "${elsewhere[@]}" npm run --silent restore -- "$file" --over
row 'a restore over darkrooms, with --over' "$WORK/over.log" 'is kept as the database wetside_before_restore' 0
head -c 20000 "$file" >"$WORK/half.backup"
in_front "$WORK/half.log" "$here" "${elsewhere[@]}" npm run --silent restore -- "$WORK/half.backup" --over
row 'a file that was cut short' "$WORK/half.log" 'is no whole backup|could not be restored' 1
in_front "$WORK/still.log" "$here" "${elsewhere[@]}" npm run --silent reconcile
row 'and what stood there then' "$WORK/still.log" 'all as folded' 0

PG_DIR="$there/pg" "$here/scripts/postgres.sh" destroy
clear_copy "$here"
rm -rf "$there" "$WORK/half.backup"
write_proof backup.md 'A backup, taken while loads are ticked off' 'Written by `npm run prove:backup`. `…` stands for the folder it worked in.'
