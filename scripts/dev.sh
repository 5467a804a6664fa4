#!/usr/bin/env bash
# npm run dev: server and web rebuilt as files change, on the same database as npm start.
set -euo pipefail
. "$(dirname "${BASH_SOURCE[0]}")/lib/prepare.sh"
need_node
need_postgres
need_room "$ROOT/.local" 300
only_one .local/running 'Wetside already runs from this folder: use it, or stop it with Ctrl-C where it was started.'
need_modules
exec node scripts/dev.mjs "$@"
