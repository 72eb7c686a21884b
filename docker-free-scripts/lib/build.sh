# Builds the application once per state of its sources. Source it after common.sh.

# Everything that goes into a build: sources, lockfile, Node.
source_hash() {
  (cd "$ROOT" && { node -v; find app server shared public drizzle nuxt.config.ts tailwind.config.ts package-lock.json -type f -print0 | sort -z | xargs -0 sha256sum; } | sha256sum | cut -c1-16)
}

# Sets BUILD to the folder of the finished build; builds when there is none yet. The copy is what runs, so that a later
# build never pulls files from under a running server.
build_application() {
  local hash builds=${TROTLINE_BUILD_DIR:-$ROOT/.data/build}
  hash=$(source_hash)
  BUILD=$builds/$hash
  [ -f "$BUILD/server/index.mjs" ] && return 0
  say 'Building the application (about a minute) ...'
  mkdir -p "$builds" "$LOGS"
  (
    flock 9
    [ -f "$BUILD/server/index.mjs" ] && exit 0
    cd "$ROOT" && NODE_ENV=production npx nuxt build > "$LOGS/build.log" 2>&1 || exit 1
    rm -rf "$BUILD.part" && cp -r .output "$BUILD.part" && mv "$BUILD.part" "$BUILD"
    # Keep the three newest builds.
    ls -1dt "$builds"/*/ 2>/dev/null | tail -n +4 | xargs -r rm -rf
  ) 9> "$builds/.lock" || fail "The build failed; see $LOGS/build.log"
}
