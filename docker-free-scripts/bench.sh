#!/usr/bin/env bash
# Measures speed against scipy in one run on this machine; prints a table and writes docs/BENCH.md and docs/bench.json.
# Exits non-zero when a bar is missed. `bench.sh envelope measure` runs the named benches alone and writes nothing.
set -uo pipefail
here=$(cd "$(dirname "$0")" && pwd)
export TROTLINE_DATA_DIR=${TROTLINE_BENCH_DATA_DIR:-$(cd "$here/.." && pwd)/.data-bench}
export TROTLINE_BUILD_DIR=${TROTLINE_BUILD_DIR:-$(cd "$here/.." && pwd)/.data/build}
. "$here/lib/common.sh"; . "$here/lib/build.sh"

cd "$ROOT"
mkdir -p "$RUN" "$LOGS"
need_node
need_packages /usr/sbin/mariadbd:mariadb-server mariadb:mariadb-client redis-server:redis-server curl:curl
/usr/bin/python3 -c 'import scipy' 2>/dev/null || install_packages python3-scipy
install_modules
build_application
export TROTLINE_TEST_BUILD=$BUILD
exec node tests/bench/run.mjs "$@"
