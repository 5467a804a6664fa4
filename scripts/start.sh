#!/usr/bin/env bash
# npm start: the program with its demo, from nothing, on this machine alone. Safe to run again at any time.
set -euo pipefail
. "$(dirname "${BASH_SOURCE[0]}")/lib/prepare.sh"
need_node
need_postgres
need_room "$ROOT/.local" 300
only_one .local/running 'Wetside already runs from this folder: use it, or stop it with Ctrl-C where it was started.'
need_modules
exec node scripts/start.mjs "$@"
