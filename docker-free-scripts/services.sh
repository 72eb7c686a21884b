#!/usr/bin/env bash
# MariaDB, Redis and maildev alone: services.sh start | stop. Ports and data folder by the same variables as start.sh.
set -uo pipefail
here=$(cd "$(dirname "$0")" && pwd)
. "$here/lib/common.sh"; . "$here/lib/services.sh"; . "$here/lib/application.sh"
case ${1:-} in
  start) start_services; write_environment; say "Services are up; their addresses are in $RUN/env" ;;
  stop) stop_services; say 'Services are stopped.' ;;
  *) fail 'Use: services.sh start | stop' ;;
esac
