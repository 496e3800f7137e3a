#!/usr/bin/env bash
# server.sh start | stop | status | url: the project's own PostgreSQL on 127.0.0.1, apart from any that Debian runs.
#
#   start   starts it (the first time: creates it), and prints its address. Started by hand it outlives `make start`;
#           with `start --for-a-run` it is for one run alone.
#   stop    stops it; with `stop --after-a-run` only if it was not also started by hand.
#   status  says whether it runs. url prints its address, password and all.
#
# CLUSTER_DIR and DATABASE_PORT choose another one; CLUSTER_IS_THROWAWAY=yes trades its safety for speed.
source "$(dirname "${BASH_SOURCE[0]}")/common.sh"

cluster="${CLUSTER_DIR:-$DATA_DIR/postgres}"
data="$cluster/data"
log="$cluster/server.log"
kept="$cluster/started-by-hand"
role=leadline
export PGCONNECT_TIMEOUT=5

binaries() {
  local version
  version="$(as_owner cat "$data/PG_VERSION" 2>/dev/null || ls /usr/lib/postgresql 2>/dev/null | sort -n | tail -n 1)"
  echo "/usr/lib/postgresql/$version/bin"
}

# PostgreSQL refuses root, so root runs it as Debian's postgres account.
as_owner() {
  if [ "$(id -u)" = 0 ]; then
    (cd / && setpriv --reuid postgres --regid postgres --init-groups env -i PATH=/usr/bin:/bin LANG=C.UTF-8 "$@")
  else
    (cd / && env -i PATH=/usr/bin:/bin LANG=C.UTF-8 "$@")
  fi
}

url_at() { echo "postgresql://$role:$(cat "$cluster/password")@127.0.0.1:$1/${2:-leadline}"; }

ask() { "$(binaries)/psql" --no-psqlrc --quiet --tuples-only --no-align "$(url_at "$1" postgres)" --command "$2"; }

# The port of the running server, or failure. A pid file proves nothing (its process may be dead, a zombie or somebody
# else's by now), so whoever listens there is asked whose data it serves.
running_port() {
  local port
  port="$(as_owner sed -n 4p "$data/postmaster.pid" 2>/dev/null)" || return 1
  [ -n "$port" ] && [ "$(ask "$port" 'show data_directory' 2>/dev/null)" = "$data" ] && echo "$port"
}

# Every live process of this cluster works inside its data folder; a zombie has no folder. Only their owner can count on
# being shown it: root in a container may not.
has_processes() {
  [ -n "$(as_owner find -L /proc -maxdepth 2 -name cwd -samefile "$data" 2>/dev/null || true)" ]
}

create() {
  local password
  rm -rf -- "$data.partial"
  password="$(head -c 24 /dev/urandom | od -An -tx1 | tr -d ' \n')"
  (umask 077 && echo "$password" >"$cluster/password")
  [ "$(id -u)" != 0 ] || chown postgres "$cluster/password"
  as_owner "$(binaries)/initdb" --pgdata="$data.partial" --username="$role" --pwfile="$cluster/password" \
    --auth=scram-sha-256 --encoding=UTF8 --locale=C.UTF-8 >"$cluster/initdb.log" 2>&1 ||
    fail 'Database' "$(cause_in "$cluster/initdb.log")" "$cluster/initdb.log"
  as_owner tee -a "$data.partial/postgresql.conf" >/dev/null <<'SETTINGS'
listen_addresses = '127.0.0.1'
unix_socket_directories = ''
timezone = 'UTC'
log_timezone = 'UTC'
SETTINGS
  # The folder gets its name only when it is whole, so a broken-off creation is simply done again.
  as_owner mv "$data.partial" "$data"
}

make_folder() {
  can_keep "$cluster" 700
  [ "$(id -u)" != 0 ] || chown postgres "$cluster"
  as_owner test -x "$cluster" ||
    fail 'Database' "the account postgres cannot enter $cluster, so DATA_DIR must name a folder that it can"
}

# clear_the_way: waits for a server that is coming up or going down, then drops the pid file that a dead one left.
# Answers with success if a server turned out to be running.
clear_the_way() {
  local tries
  for ((tries = 0; tries < 120; tries++)); do
    has_processes || { as_owner rm -f "$data/postmaster.pid"; return 1; }
    running_port >/dev/null && return 0
    sleep 0.5
  done
  fail 'Database' "a server in $data neither answers nor ends" "$log"
}

start() {
  [[ "$DATABASE_PORT" =~ ^[0-9]{1,5}$ ]] && ((DATABASE_PORT >= 1 && DATABASE_PORT <= 65535)) ||
    fail 'Database' "DATABASE_PORT must be a port number, not \"$DATABASE_PORT\""
  [ "$DATABASE_PORT" != 5432 ] || fail 'Database' "port 5432 is left to Debian's own PostgreSQL, so DATABASE_PORT must be another"
  [ -x "$(binaries)/initdb" ] || fail 'Database' "PostgreSQL is not installed in $(binaries)"
  make_folder
  as_owner test -f "$data/PG_VERSION" || create
  if ! clear_the_way; then
    (exec 3<>"/dev/tcp/127.0.0.1/$DATABASE_PORT") 2>/dev/null &&
      fail 'Database' "port $DATABASE_PORT on 127.0.0.1 is taken by another program (choose another with DATABASE_PORT)"
    local options="-p $DATABASE_PORT"
    [ "${CLUSTER_IS_THROWAWAY:-no}" != yes ] ||
      options+=' -c fsync=off -c synchronous_commit=off -c full_page_writes=off -c max_connections=200'
    # What earlier runs complained of must not pass for the cause of this one.
    [ ! -f "$log" ] || as_owner mv "$log" "$log.1"
    as_owner "$(binaries)/pg_ctl" start --wait --timeout=60 --silent --pgdata="$data" --log="$log" --options="$options" \
      >"$cluster/start.log" 2>&1 || fail 'Database' "$(cause_in "$([ -s "$log" ] && echo "$log" || echo "$cluster/start.log")")" "$log"
  fi
  local port
  port="$(running_port)" || fail 'Database' 'the server started but does not answer' "$log"
  [ "$(ask "$port" "select 1 from pg_database where datname = 'leadline'")" = 1 ] ||
    ask "$port" 'create database leadline' 2>"$cluster/create.log" ||
    fail 'Database' "$(cause_in "$cluster/create.log")" "$cluster/create.log"
  url_at "$port"
}

stop() {
  has_processes || return 0
  as_owner "$(binaries)/pg_ctl" stop --wait --timeout=30 --silent --mode=fast --pgdata="$data" >"$cluster/stop.log" 2>&1 ||
    as_owner "$(binaries)/pg_ctl" stop --wait --timeout=30 --silent --mode=immediate --pgdata="$data" >>"$cluster/stop.log" 2>&1 ||
    fail 'Database' "it did not stop: $(cause_in "$cluster/stop.log")" "$cluster/stop.log"
}

# One start or stop at a time.
make_data_folder
exec 9>"$DATA_DIR/server.lock"
flock -w 120 9 || fail 'Database' 'another start or stop of it takes more than two minutes'

case "${1:-} ${2:-}" in
  'start ')
    start 9>&-
    touch "$kept"
    ;;
  'start --for-a-run') start 9>&- ;;
  'stop ')
    rm -f "$kept"
    stop 9>&-
    ;;
  'stop --after-a-run') [ -f "$kept" ] || stop 9>&- ;;
  'status ') running_port >/dev/null && echo running || echo stopped ;;
  'url ') url_at "$(running_port || echo "$DATABASE_PORT")" ;;
  *)
    echo 'usage: db/server.sh start | stop | status | url' >&2
    exit 2
    ;;
esac
