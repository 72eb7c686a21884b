# Shared by the scripts beside it: places, messages, processes. Source it, do not run it.
ROOT=$(cd "$(dirname "${BASH_SOURCE[0]}")/../.." && pwd)
DATA=${TROTLINE_DATA_DIR:-$ROOT/.data}
RUN=$DATA/run
LOGS=$DATA/logs
export NUXT_TELEMETRY_DISABLED=1 npm_config_update_notifier=false

say() { printf '%s\n' "$*"; }
fail() { printf '%s\n' "$*" >&2; exit 1; }

# Ticks since boot at which a process began; tells a process from a later one with the same PID.
start_time() { awk '{ sub(/^.*\) /, ""); print $20 }' "/proc/$1/stat" 2>/dev/null; }

record_process() { printf '%s %s\n' "$2" "$(start_time "$2")" > "$RUN/$1.pid"; }

# Prints the PID when the recorded process still is the one that was started.
recorded_pid() {
  local pid begun
  [ -f "$RUN/$1.pid" ] || return 1
  read -r pid begun < "$RUN/$1.pid" || return 1
  [ -n "$begun" ] && [ "$(start_time "$pid")" = "$begun" ] && printf '%s' "$pid"
}

# stop_process <name> <seconds>: TERM, wait, KILL.
stop_process() {
  local pid left=$(( $2 * 10 ))
  if pid=$(recorded_pid "$1"); then
    kill -TERM "$pid" 2>/dev/null
    while recorded_pid "$1" >/dev/null && [ "$left" -gt 0 ]; do sleep 0.1; left=$((left - 1)); done
    recorded_pid "$1" >/dev/null && kill -KILL "$pid" 2>/dev/null
  fi
  rm -f "$RUN/$1.pid"
}

# start_detached <name> <log> <command...>: in its own session, so that Ctrl-C here does not reach it.
start_detached() {
  local name=$1 log=$2; shift 2
  setsid "$@" >> "$log" 2>&1 < /dev/null &
  record_process "$name" $!
}

port_is_taken() { (exec 3<>"/dev/tcp/127.0.0.1/$1") 2>/dev/null; }

# require_port <port> <variable> <what for>
require_port() {
  port_is_taken "$1" && fail "Port $1 ($3) is taken by another program. Choose another one with $2, for example: $2=$(($1 + 100)) bash docker-free-scripts/start.sh"
  return 0
}

# wait_for <seconds> <command...>
wait_for() {
  local left=$(( $1 * 10 )); shift
  until "$@" >/dev/null 2>&1; do
    left=$((left - 1)); [ "$left" -le 0 ] && return 1
    sleep 0.1
  done
}

# need_packages <command:package ...>: installs from Debian what is not there, or says what to install.
need_packages() {
  local missing=() pair
  for pair in "$@"; do
    [ -x "${pair%%:*}" ] || command -v "${pair%%:*}" >/dev/null 2>&1 || missing+=("${pair##*:}")
  done
  install_packages "${missing[@]}"
}

install_packages() {
  [ $# -eq 0 ] && return 0
  [ "$(id -u)" = 0 ] || fail "Not installed and only root can install: $*. Please run: sudo apt-get install --no-install-recommends $*"
  say "Installing from Debian: $*"
  mkdir -p "$LOGS"
  # RUNLEVEL=1 keeps the packages from starting servers of their own.
  { apt-get update -qq && RUNLEVEL=1 DEBIAN_FRONTEND=noninteractive apt-get install -y -qq --no-install-recommends "$@"; } > "$LOGS/apt.log" 2>&1 ||
    fail "Debian's packages could not be installed; see $LOGS/apt.log"
}

need_node() {
  command -v node >/dev/null 2>&1 && command -v npm >/dev/null 2>&1 || fail 'Node.js 20 and npm are needed and were not found on PATH.'
  [ "$(node -p 'process.versions.node.split(".")[0]')" = 20 ] || fail "Node.js 20 is needed; this is $(node -v)."
}

install_modules() {
  local mark=$ROOT/node_modules/.trotline-lock want
  want=$(sha256sum "$ROOT/package-lock.json" | cut -d' ' -f1)-$(node -v)
  [ -f "$mark" ] && [ "$(cat "$mark")" = "$want" ] && return 0
  say 'Installing npm packages (about a minute and a half) ...'
  mkdir -p "$LOGS"
  (cd "$ROOT" && npm ci --include=dev --no-audit --no-fund) > "$LOGS/npm.log" 2>&1 || fail "npm ci failed; see $LOGS/npm.log"
  printf '%s' "$want" > "$mark"
}
