#!/usr/bin/env bash
# scripts/command.sh NAME [arguments]: a command of the server's (reconcile, demo, darkroom-new), from nothing.
set -euo pipefail
. "$(dirname "${BASH_SOURCE[0]}")/lib/prepare.sh"
need_node
need_postgres
need_modules
exec node scripts/command.mjs "$@"
