# Sourced by the other scripts of this folder: where things lie, and how a failing step says so.
set -euo pipefail

PROJECT="$(cd "$(dirname "${BASH_SOURCE[0]}")/.." && pwd -P)"
cd "$PROJECT"

# What is kept between starts: the cluster, the session secret, uploads, logs. PostgreSQL refuses to run as root, and the
# account it then runs as may be unable to enter this checkout, so root keeps its data outside.
if [ -n "${DATA_DIR:-}" ]; then
  DATA_DIR="$(realpath -m -- "$DATA_DIR")"
elif [ "$(id -u)" = 0 ]; then
  DATA_DIR="/var/lib/leadline/$(printf %s "$PROJECT" | sha256sum | cut -c1-12)"
else
  DATA_DIR="$PROJECT/.leadline"
fi
export DATA_DIR
export DATABASE_PORT="${DATABASE_PORT:-54329}"
export NEXT_TELEMETRY_DISABLED=1

# fail STEP CAUSE [LOG]: one sentence, then the end.
fail() {
  printf '%s stopped at %s: %s%s.\n' "${LEADLINE_GOAL:-db/server.sh}" "$1" "$2" "${3:+ (details: $3)}" >&2
  exit 1
}

# cause_in LOG: the line of a log that best says why a command failed, without its full stop.
cause_in() {
  if grep -qE 'No space left on device|ENOSPC' "$1"; then
    echo 'the disk is full'
    return
  fi
  local line
  line="$(grep -E '^E: |^npm error .|^initdb: error|(FATAL|PANIC|ERROR): ' "$1" |
    grep -vE '^npm error (code|syscall|errno|path|dest|file|A complete log) ' | head -n 1 || true)"
  [ -n "$line" ] || line="$(grep -v '^[[:space:]]*$' "$1" | tail -n 1 || true)"
  line="${line#E: }"
  line="${line#npm error }"
  line="${line#network }"
  printf '%s' "${line:-it gave no reason}" | sed -E 's/[[:space:].]+$//' | cut -c1-300
}

# can_keep FOLDER [MODE]: creates it where it is not there yet, and proves that it takes a few kilobytes.
can_keep() {
  local complaint probe="$1/.space-probe-$$"
  complaint="$({ [ -d "$1" ] || install -d -m "${2:-755}" -- "$1"; } 2>&1 && (head -c 65536 /dev/zero >"$probe") 2>&1)" || {
    rm -f -- "$probe"
    case "$complaint" in
      *'No space left'*) fail 'Disk' "there is no space left in $1" ;;
      *) fail 'Disk' "$1 cannot be written (${complaint##*: })" ;;
    esac
  }
  rm -f -- "$probe"
}

# Others may pass through root's data folder, as the account of PostgreSQL must, but see nothing of it.
make_data_folder() {
  if [ "$(id -u)" = 0 ]; then
    case "$DATA_DIR" in /var/lib/leadline/*) can_keep /var/lib/leadline 711 ;; esac
    can_keep "$DATA_DIR" 711
  else
    can_keep "$DATA_DIR" 700
  fi
  can_keep "$DATA_DIR/log" 700
}
