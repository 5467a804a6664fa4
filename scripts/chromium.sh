#!/usr/bin/env bash
# Prints where Chromium is, and installs Debian's when there is none.
set -euo pipefail
. "$(dirname "${BASH_SOURCE[0]}")/lib/packages.sh"
[ -x "${CHROMIUM:-/usr/bin/chromium}" ] || need_packages 'the browser tests' chromium fonts-liberation
[ -x "${CHROMIUM:-/usr/bin/chromium}" ] || die 'There is no browser to test with: install chromium, or name one in CHROMIUM.'
echo "${CHROMIUM:-/usr/bin/chromium}"
