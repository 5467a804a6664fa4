#!/usr/bin/env bash
# npm test: everything, from nothing, on a database, ports and a browser of its own. The last line is the count.
set -euo pipefail
. "$(dirname "${BASH_SOURCE[0]}")/lib/prepare.sh"
need_node
only_one .local/testing 'The tests already run from this folder: wait for them to end.'
need_modules
exec node scripts/test.mjs "$@"
