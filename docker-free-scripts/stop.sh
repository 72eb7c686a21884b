#!/usr/bin/env bash
# Ends exactly what start.sh started: each process is known by its PID and its start time.
set -uo pipefail
here=$(cd "$(dirname "$0")" && pwd)
. "$here/lib/common.sh"; . "$here/lib/services.sh"; . "$here/lib/application.sh"
[ -d "$RUN" ] || { say 'Nothing was started here.'; exit 0; }
stop_application
stop_services
rm -f "$RUN/build"
say 'Stopped.'
