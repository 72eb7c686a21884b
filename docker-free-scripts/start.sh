#!/usr/bin/env bash
# Starts Trotline from an empty machine: servers, packages, build, database, demo. See README.md.
set -uo pipefail
here=$(cd "$(dirname "$0")" && pwd)
. "$here/lib/common.sh"; . "$here/lib/build.sh"; . "$here/lib/services.sh"; . "$here/lib/application.sh"

demo=yes; foreground=no
for option in "$@"; do
  case $option in
    --no-demo) demo=no ;;
    --foreground) foreground=yes ;;
    *) fail "Unknown option $option. Options: --foreground (stay, stop all on Ctrl-C), --no-demo (start empty)." ;;
  esac
done

begun=$(date +%s)
export TROTLINE_DATA_DIR=$DATA
mkdir -p "$RUN" "$LOGS"
exec 8> "$RUN/.start-lock"
flock -n 8 || fail 'Another start is under way in this data folder.'
need_node
need_packages /usr/sbin/mariadbd:mariadb-server mariadb:mariadb-client redis-server:redis-server curl:curl
install_modules
build_application
start_services 8>&-
write_environment
start_application 8>&-

if [ "$demo" = yes ]; then
  if [ ! -f "$DATA/demo-seeded" ]; then
    say 'Seeding the invented demo ...'
    node "$here/seed.mjs" --demo > "$LOGS/seed.log" 2>&1 || fail "The demo could not be seeded; see $LOGS/seed.log"
    touch "$DATA/demo-seeded"
  fi
  accounts="Demo accounts (password for all: trotline-demo):
  lead@trotline.example      Lead of the demo campaigns
  analyst@trotline.example   Analyst
  observer@trotline.example  Observer
  reader@trotline.example    Reader
  admin@trotline.example     Administrator of the service"
else
  accounts="$(node "$here/set-up-link.mjs" | tail -n 1)"
  accounts="Set up the first administrator here (once, within 24 hours):
  $accounts"
fi
flock -u 8

cat <<TXT

Trotline is ready (after $(( $(date +%s) - begun )) s).
  Open        ${TROTLINE_ORIGIN:-http://127.0.0.1:$WEB_PORT}
  Read mails  http://127.0.0.1:$MAIL_WEB_PORT
$accounts
  Logs        $LOGS
  Stop        bash docker-free-scripts/stop.sh
TXT

if [ "$foreground" = yes ]; then
  trap 'bash "$here/stop.sh"; exit 0' INT TERM
  say 'Running in the foreground; Ctrl-C stops all.'
  while recorded_pid web >/dev/null && recorded_pid worker >/dev/null; do sleep 1 & wait $!; done
  bash "$here/stop.sh"
  fail "A process ended by itself; see $LOGS."
fi
