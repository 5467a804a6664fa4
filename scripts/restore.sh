#!/usr/bin/env bash
# npm run restore -- FILE [--over]: a backup into an empty database, or over what stands there.
set -euo pipefail
. "$(dirname "${BASH_SOURCE[0]}")/lib/prepare.sh"
need_node
need_postgres
[ -z "${WETSIDE_DATA:-}" ] || need_folder "$WETSIDE_DATA"
only_one "${WETSIDE_DATA:-.local}/running" 'Wetside runs on this database: stop it first, then restore. It is at'
need_modules
PG_BIN="$(postgres_bin)" exec node scripts/restore.mjs "$@"
