#!/usr/bin/env bash
# Compares the engine's numbers with published values, scipy and exact arithmetic, and writes docs/VALIDATION.md.
# The same comparisons are gates of `test.sh truth`, some of them with fewer cases. Exits non-zero when a bar is missed.
set -uo pipefail
here=$(cd "$(dirname "$0")" && pwd)
. "$here/lib/common.sh"

cd "$ROOT"
mkdir -p "$LOGS"
need_node
/usr/bin/python3 -c 'import scipy' 2>/dev/null || install_packages python3-scipy
install_modules
[ -d .nuxt ] || npx nuxt prepare > "$LOGS/prepare.log" 2>&1 || fail "nuxt prepare failed; see $LOGS/prepare.log"
TROTLINE_WRITE_VALIDATION=1 npx vitest run --project truth tests/truth/validation.test.ts || fail 'A comparison misses its bar; docs/VALIDATION.md says which.'
say 'Written: docs/VALIDATION.md'
