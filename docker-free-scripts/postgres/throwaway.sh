#!/usr/bin/env bash
# A PostgreSQL cluster for tests and measurements, in a temporary folder, gone afterwards.
#
#   throwaway.sh start PID     prints its address as redshank_admin; it ends when process PID has ended
#   throwaway.sh stop ADDRESS  ends it at once
#
# The product's roles exist in it, all with the password of the address. Durability is off: a crash may lose it.

source "$(dirname "${BASH_SOURCE[0]}")/../lib.sh"
source "$scripts/postgres/server.sh"

# The folder's name holds the port, so that an address is enough to find it.
folder_of() { printf '%s/redshank-throwaway-%s' "${TMPDIR:-/tmp}" "$1"; }

start() {
  local watched=$1 password port dir said
  password=$(random_password)
  port=$(node "$scripts/port.mjs" free)
  dir=$(folder_of "$port")
  said=$(pg_make "$dir" "$password" 2>&1) || fail 'The throwaway database could not be made.' "$said"
  said=$(pg_start "$dir" "$port" fsync=off synchronous_commit=off full_page_writes=off wal_level=minimal \
    max_wal_senders=0 max_connections=200 max_wal_size=4GB 2>&1) ||
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

case ${1:-} in
  start) start "${2:?process to end with}" ;;
  stop) remove "$(folder_of "$(sed -E 's#.*:([0-9]+)/.*#\1#' <<<"${2:?address}")")" ;;
  end-with) end_with "$2" "$3" ;;
  *) fail 'usage: throwaway.sh start PID | stop ADDRESS' ;;
esac
