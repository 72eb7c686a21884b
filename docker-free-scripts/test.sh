#!/usr/bin/env bash
# Every check of the project on real services. Its last line is "N passed, N failed"; any failure, or a part in which
# no test ran, makes it exit non-zero. `test.sh unit e2e` runs the named parts alone.
set -uo pipefail
here=$(cd "$(dirname "$0")" && pwd)
export TROTLINE_DATA_DIR=${TROTLINE_TEST_DATA_DIR:-$(cd "$here/.." && pwd)/.data-test}
# Builds are shared with start.sh: the same sources give the same folder.
export TROTLINE_BUILD_DIR=${TROTLINE_BUILD_DIR:-$(cd "$here/.." && pwd)/.data/build}
. "$here/lib/common.sh"; . "$here/lib/build.sh"

all='lint types layers unit truth components integration e2e'
parts=${*:-$all}
reports=$DATA/reports
cd "$ROOT"
mkdir -p "$RUN" "$LOGS" && rm -rf "$reports" && mkdir -p "$reports"

need_node
need_packages /usr/sbin/mariadbd:mariadb-server mariadb:mariadb-client redis-server:redis-server curl:curl /usr/bin/chromium:chromium
python_packages=()
for pair in scipy:python3-scipy lmfit:python3-lmfit astropy:python3-astropy; do
  /usr/bin/python3 -c "import importlib.util, sys; sys.exit(importlib.util.find_spec('${pair%%:*}') is None)" 2>/dev/null || python_packages+=("${pair##*:}")
done
install_packages "${python_packages[@]}"
install_modules

wanted() { case " $parts " in *" $1 "*) return 0 ;; *) return 1 ;; esac; }

# check <part> <command...>: a part that passes or fails as one.
check() {
  local part=$1; shift
  wanted "$part" || return 0
  say "== $part"
  if "$@" > "$LOGS/$part.log" 2>&1; then echo '{"passed":1,"failed":0}' > "$reports/$part.json"
  else echo '{"passed":0,"failed":1}' > "$reports/$part.json"; tail -n 60 "$LOGS/$part.log"; fi
}

# suite <part> <vitest project>
suite() {
  wanted "$1" || return 0
  say "== $1"
  npx vitest run --project "$2" --reporter=default --reporter=json --outputFile.json="$reports/$1.json"
}

npx nuxt prepare > "$LOGS/prepare.log" 2>&1 || fail "nuxt prepare failed; see $LOGS/prepare.log"
check lint npx eslint . --max-warnings 0
check types npm run -s typecheck
check layers node "$here/check-layers.mjs"
suite unit unit
suite truth truth
suite components nuxt
if wanted integration || wanted e2e; then
  build_application
  export TROTLINE_TEST_BUILD=$BUILD
fi
suite integration integration
if wanted e2e; then
  say '== e2e'
  PLAYWRIGHT_JSON_OUTPUT_NAME="$reports/e2e.json" npx playwright test
fi

node "$here/lib/count-tests.mjs" "$reports" $parts
