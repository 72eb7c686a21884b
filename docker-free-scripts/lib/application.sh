# The web and the worker process. Source it after common.sh, build.sh and services.sh.
WEB_PORT=${TROTLINE_WEB_PORT:-4310}
WORKER_PORT=${TROTLINE_WORKER_PORT:-4315}

# The environment of both roles, also kept in $RUN/env for the other scripts (readable by the owner alone).
write_environment() {
  (umask 077 && cat > "$RUN/env" <<ENV
TROTLINE_DATABASE_URL=mysql://trotline:$(secret mariadb)@127.0.0.1:$MARIADB_PORT/trotline
TROTLINE_REDIS_URL=${TROTLINE_REDIS_URL:-redis://127.0.0.1:$REDIS_PORT}
TROTLINE_SMTP_URL=${TROTLINE_SMTP_URL:-smtp://127.0.0.1:$SMTP_PORT}
TROTLINE_MAIL_FROM=${TROTLINE_MAIL_FROM:-Trotline <trotline@trotline.example>}
TROTLINE_ORIGIN=${TROTLINE_ORIGIN:-http://127.0.0.1:$WEB_PORT}
TROTLINE_STORAGE_DIR=${TROTLINE_STORAGE_DIR:-$DATA/storage}
TROTLINE_SECRETS_DIR=$SECRETS
TROTLINE_INSTANCE=${TROTLINE_INSTANCE:-main}
ENV
  )
}

start_role() {
  local role=$1 port=$2 variables=()
  mapfile -t variables < "$RUN/env"
  start_detached "$role" "$LOGS/$role.log" env "${variables[@]}" NODE_ENV=production TROTLINE_ROLE="$role" \
    NITRO_HOST=127.0.0.1 NITRO_PORT="$port" node "$BUILD/server/index.mjs"
}

is_ready() { curl -fsS -o /dev/null --max-time 2 "http://127.0.0.1:$1/api/ready"; }

start_application() {
  local running
  running=$(cat "$RUN/build" 2>/dev/null || true)
  if [ "$running" != "$BUILD" ]; then stop_application; fi
  if ! recorded_pid web >/dev/null; then
    require_port "$WEB_PORT" TROTLINE_WEB_PORT 'the web pages'
    start_role web "$WEB_PORT"
  fi
  if ! recorded_pid worker >/dev/null; then
    require_port "$WORKER_PORT" TROTLINE_WORKER_PORT "the worker's health page"
    start_role worker "$WORKER_PORT"
  fi
  printf '%s' "$BUILD" > "$RUN/build"
  wait_for 60 is_ready "$WEB_PORT" || fail "The web process is not ready; see $LOGS/web.log"
  wait_for 60 is_ready "$WORKER_PORT" || fail "The worker is not ready; see $LOGS/worker.log"
}

stop_application() {
  stop_process web 15
  stop_process worker 30
}
