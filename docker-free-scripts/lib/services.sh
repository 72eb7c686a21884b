# MariaDB, Redis and maildev on loopback, everything under $DATA. Source it after common.sh.
MARIADB_PORT=${TROTLINE_MARIADB_PORT:-4311}
REDIS_PORT=${TROTLINE_REDIS_PORT:-4312}
SMTP_PORT=${TROTLINE_SMTP_PORT:-4313}
MAIL_WEB_PORT=${TROTLINE_MAIL_WEB_PORT:-4314}
SECRETS=$DATA/secrets
# A socket path has at most 107 characters, whatever the length of the data folder's.
SOCKET=${TMPDIR:-/tmp}/trotline-$(printf '%s' "$DATA" | sha256sum | cut -c1-12).sock

secret() {
  mkdir -p "$SECRETS" && chmod 700 "$SECRETS"
  [ -s "$SECRETS/$1" ] || (umask 077 && node -e 'process.stdout.write(require("node:crypto").randomBytes(32).toString("hex"))' > "$SECRETS/$1")
  cat "$SECRETS/$1"
}

mariadb_admin() { mariadb-admin --no-defaults --socket="$SOCKET" --user="$(id -un)" "$@"; }

start_mariadb() {
  recorded_pid mariadb >/dev/null && return 0
  require_port "$MARIADB_PORT" TROTLINE_MARIADB_PORT MariaDB
  local server password
  server=$(command -v mariadbd || echo /usr/sbin/mariadbd)
  if [ ! -d "$DATA/mariadb/mysql" ]; then
    mariadb-install-db --no-defaults --user="$(id -un)" --datadir="$DATA/mariadb" --auth-root-authentication-method=socket --skip-test-db > "$LOGS/mariadb-install.log" 2>&1 ||
      fail "MariaDB's data folder could not be made; see $LOGS/mariadb-install.log"
  fi
  start_detached mariadb "$LOGS/mariadb.log" "$server" --no-defaults --user="$(id -un)" --datadir="$DATA/mariadb" \
    --bind-address=127.0.0.1 --port="$MARIADB_PORT" --socket="$SOCKET" --pid-file="$RUN/mariadbd.pid" \
    --skip-name-resolve --default-time-zone=+00:00 --character-set-server=utf8mb4 --collation-server=utf8mb4_unicode_ci \
    --max-allowed-packet=64M --innodb-buffer-pool-size=256M --innodb-log-file-size=128M
  wait_for 60 mariadb_admin ping || fail "MariaDB did not start; see $LOGS/mariadb.log"
  password=$(secret mariadb)
  mariadb --no-defaults --socket="$SOCKET" --user="$(id -un)" <<SQL
CREATE DATABASE IF NOT EXISTS trotline CHARACTER SET utf8mb4;
CREATE USER IF NOT EXISTS trotline@127.0.0.1 IDENTIFIED BY '$password';
GRANT ALL ON trotline.* TO trotline@127.0.0.1;
SQL
}

start_redis() {
  recorded_pid redis >/dev/null && return 0
  require_port "$REDIS_PORT" TROTLINE_REDIS_PORT Redis
  start_detached redis "$LOGS/redis.log" redis-server --bind 127.0.0.1 --port "$REDIS_PORT" --dir "$DATA" --save '' --appendonly no --maxmemory-policy noeviction
  wait_for 20 redis-cli -p "$REDIS_PORT" ping || fail "Redis did not start; see $LOGS/redis.log"
}

start_maildev() {
  recorded_pid maildev >/dev/null && return 0
  require_port "$SMTP_PORT" TROTLINE_SMTP_PORT 'mail, SMTP'
  require_port "$MAIL_WEB_PORT" TROTLINE_MAIL_WEB_PORT 'mail, reading'
  mkdir -p "$DATA/mail"
  start_detached maildev "$LOGS/maildev.log" node "$ROOT/node_modules/maildev/dist/bin/maildev.js" --ip 127.0.0.1 --smtp "$SMTP_PORT" --web-ip 127.0.0.1 --web "$MAIL_WEB_PORT" --mail-directory "$DATA/mail"
}

wait_for_maildev() { wait_for 30 port_is_taken "$MAIL_WEB_PORT" || fail "maildev did not start; see $LOGS/maildev.log"; }

start_services() {
  mkdir -p "$RUN" "$LOGS"
  start_maildev
  start_redis
  start_mariadb
  wait_for_maildev
}

stop_services() {
  recorded_pid mariadb >/dev/null && mariadb_admin shutdown >/dev/null 2>&1
  stop_process mariadb 30
  stop_process redis 10
  stop_process maildev 10
}
