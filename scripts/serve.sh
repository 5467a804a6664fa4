#!/usr/bin/env bash
# npm run serve: real use. No demo; its data lies in WETSIDE_DATA. docs/operate.md tells what it must be told.
set -euo pipefail
. "$(dirname "${BASH_SOURCE[0]}")/lib/prepare.sh"
need_node
node scripts/lib/real-check.mjs
[ -n "${DATABASE_URL:-}" ] || need_postgres
need_room "$WETSIDE_DATA" 300
only_one "$WETSIDE_DATA/running" 'Wetside already runs on this WETSIDE_DATA:'
need_modules
exec node scripts/serve.mjs "$@"
