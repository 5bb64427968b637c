#!/usr/bin/env bash
# A PostgreSQL cluster for tests and measurements, in a temporary folder, gone afterwards.
#
#   throwaway.sh start PID     prints its address as redshank_admin; it ends when process PID has ended
#   throwaway.sh stop ADDRESS  ends it at once
#   throwaway.sh start PID lasting   one that keeps what it has committed when its processes are killed
#   throwaway.sh kill ADDRESS        kills it, as a machine short of memory does
#   throwaway.sh again ADDRESS       starts it again; it recovers by itself
#
# The product's roles exist in it, all with the password of the address. Unless it is a lasting one, a crash may lose
# what it holds; when the machine itself stops, either may.

source "$(dirname "${BASH_SOURCE[0]}")/../lib.sh"
source "$scripts/postgres/server.sh"

quick=(fsync=off synchronous_commit=off full_page_writes=off wal_level=minimal max_wal_senders=0
  max_connections=200 max_wal_size=4GB)
lasting=(fsync=off wal_level=minimal max_wal_senders=0 max_connections=100)

# The folder's name holds the port, so that an address is enough to find it.
port_of() { sed -E 's#.*:([0-9]+)/.*#\1#' <<<"$1"; }
folder_of() { printf '%s/redshank-throwaway-%s' "${TMPDIR:-/tmp}" "$1"; }

start() {
  local watched=$1 kind=${2:-quick} password port dir said
  password=$(random_password)
  port=$(node "$scripts/port.mjs" free)
  dir=$(folder_of "$port")
  said=$(pg_make "$dir" "$password" 2>&1) || fail 'The throwaway database could not be made.' "$said"
  local -n options=$kind
  said=$(pg_start "$dir" "$port" "${options[@]}" 2>&1) ||
    fail 'The throwaway database did not start.' "$said" "Its log is $dir/server.log."
  {
    printf '\\set owner_password %s\n\\set app_password %s\n\\set jobs_password %s\n' "$password" "$password" "$password"
    cat -- "$scripts/postgres/roles.sql"
  } | pg_sql "$dir" "$port" "$password" postgres >&2
  setsid bash "${BASH_SOURCE[0]}" end-with "$watched" "$dir" </dev/null >/dev/null 2>&1 &
  printf 'postgres://redshank_admin:%s@127.0.0.1:%s/postgres\n' "$password" "$port"
}

remove() {
  local dir=$1
  [[ ! -d $dir ]] || pg_stop "$dir" || true
  rm -rf -- "$dir"
}

# A test run that is killed can not tidy up; this waits beside it and does.
end_with() {
  while [[ -d $2 ]] && kill -0 "$1" 2>/dev/null; do sleep 1; done
  remove "$2"
}

kill_all() {
  local dir=$1 pid status
  local -a pids
  pid=$(pg_pid "$dir") || return 0
  pids=("$pid")
  # its children too: those of a postmaster that is gone end by themselves, but not at once
  for status in $(grep -lsE "^PPid:[[:space:]]+$pid\$" /proc/[0-9]*/status); do
    status=${status#/proc/}
    pids+=("${status%/status}")
  done
  kill -KILL "${pids[@]}" 2>/dev/null || true
  while kill -0 "$pid" 2>/dev/null; do sleep 0.05; done
}

again() {
  local port=$1 dir said try
  dir=$(folder_of "$port")
  for try in 1 2 3 4 5; do
    pg_clear_stale "$dir" >&2
    if said=$(pg_start "$dir" "$port" "${lasting[@]}" 2>&1); then return 0; fi
    sleep 1
  done
  fail 'The killed database did not start again.' "$said"
}

case ${1:-} in
  start) start "${2:?process to end with}" "${3:-quick}" ;;
  stop) remove "$(folder_of "$(port_of "${2:?address}")")" ;;
  kill) kill_all "$(folder_of "$(port_of "${2:?address}")")" ;;
  again) again "$(port_of "${2:?address}")" ;;
  end-with) end_with "$2" "$3" ;;
  *) fail 'usage: throwaway.sh start PID | stop ADDRESS' ;;
esac
