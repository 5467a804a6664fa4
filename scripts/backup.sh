#!/usr/bin/env bash
# npm run backup -- FILE: all that the darkrooms hold in one file, beside a running program or without one.
set -euo pipefail
. "$(dirname "${BASH_SOURCE[0]}")/lib/prepare.sh"
need_node
need_postgres
need_modules
PG_BIN="$(postgres_bin)" exec node scripts/backup.mjs "$@"
