#!/usr/bin/env bash
# Installs the Node packages of the lock file, unless they are there already.
source "$(dirname "${BASH_SOURCE[0]}")/common.sh"
log="$DATA_DIR/log/npm.log"

# npm writes node_modules/.package-lock.json last, so it tells a finished installation from a broken-off one. Packages for
# other processors are in the lock and rightly not on the disk.
installed_is_lock() {
  [ -f node_modules/.package-lock.json ] && node -e '
    const { readFileSync } = require("node:fs")
    const read = (path) => JSON.parse(readFileSync(path, "utf8")).packages
    const wanted = read("package-lock.json")
    const present = read("node_modules/.package-lock.json")
    delete wanted[""]
    const isThere = ([path, { version, integrity, optional, devOptional }]) =>
      path in present
        ? present[path].version === version && present[path].integrity === integrity
        : Boolean(optional || devOptional)
    const isWanted = (path) => path in wanted
    process.exit(Object.entries(wanted).every(isThere) && Object.keys(present).every(isWanted) ? 0 : 1)
  '
}

installed_is_lock && exit 0
echo 'Installing Node packages'
npm ci --include=dev >"$log" 2>&1 </dev/null || fail 'Node packages' "$(cause_in "$log")" "$log"
