#!/usr/bin/env bash
# run.sh start | test | bench | check-ledger: makes the machine ready, then hands over to the TypeScript that runs the goal.
goal="$1"
export LEADLINE_GOAL="make $goal"
source "$(dirname "${BASH_SOURCE[0]}")/common.sh"

# A goal that never came to its tests still closes with the count that whoever reads the output looks for.
if [ "$goal" = test ]; then
  trap 'echo "0 passed, 1 failed"; exit 1' EXIT
fi
# Tests and benches make and drop databases: never on a server that is somebody's.
case "$goal" in test | bench) unset DATABASE_URL ;; esac

source db/preflight.sh

if [ "$goal" != check-ledger ]; then
  # Held until the process that follows by `exec` ends, however it ends.
  exec 8>"$DATA_DIR/$goal.lock"
  flock -n 8 || fail 'Lock' "another $LEADLINE_GOAL is running from this checkout"
fi

packages=()
[ -n "${DATABASE_URL:-}" ] || packages+=(postgresql)
case "$goal" in test | bench) packages+=(chromium) ;; esac
[ "${#packages[@]}" = 0 ] || bash db/packages.sh "${packages[@]}" 8>&-
flock "$DATA_DIR/setup.lock" bash db/node-modules.sh 8>&-

case "$goal" in
  start) program=src/server/launch.ts ;;
  test) program=test/run.ts ;;
  bench) program=test/bench/run.ts ;;
  check-ledger) program=src/server/launch/check-ledger.ts ;;
esac
exec node --conditions=react-server --import tsx "$program"
