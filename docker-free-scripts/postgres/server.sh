# shellcheck shell=bash
# A PostgreSQL cluster in a folder: make, start, ask, stop. Knows nothing of Redshank's instances.
# Sourced after lib.sh. Debian's own cluster on 5432 is never looked at.

# Prints the folder of PostgreSQL's server programs: of version $1 where given, otherwise the newest from 15 on.
pg_bin() {
  local version=${1:-} dir best='' best_major=0 major
  for dir in /usr/lib/postgresql/*/bin "$(dirname "$(command -v initdb || echo /none)")"; do
    [[ -x $dir/initdb && -x $dir/pg_ctl && -x $dir/psql ]] || continue
    [[ $("$dir/initdb" --version) =~ [0-9]+ ]] || continue
    major=${BASH_REMATCH[0]}
    [[ -z $version || $major == "$version" ]] || continue
    ((major >= 15 && major > best_major)) && best=$dir best_major=$major
  done
  [[ -n $best ]] && printf '%s\n' "$best"
}

# The programs that fit the cluster in folder $1: its own version if it exists.
pg_bin_for() {
  local version=''
  [[ ! -f $1/PG_VERSION ]] || version=$(<"$1/PG_VERSION")
  pg_bin "$version" || fail "The database in $1 was made by PostgreSQL $version, which is not installed." \
    "Install it (apt-get install -y postgresql-$version), then start again."
}

# PostgreSQL refuses root, so root acts through the folder's owner, a new folder's owner being 'postgres'.
pg_user_for() {
  if ! is_root; then
    id -un
  elif [[ -d $1 ]]; then
    stat -c %U -- "$1"
  else
    echo postgres
  fi
}

# pg_as USER COMMAND…: from / because USER may not be allowed into the current folder; without the instance's lock.
pg_as() {
  local user=$1
  shift
  if [[ $user == "$(id -un)" ]]; then
    (cd / && exec "$@" </dev/null 9>&- 8>&-)
  else
    (cd / && exec runuser -u "$user" -- "$@" </dev/null 9>&- 8>&-)
  fi
}

# pg_make DIR PASSWORD: the superuser is redshank_admin. The folder appears whole or not at all.
pg_make() {
  local dir=$1 password=$2 bin user new=$1.making
  bin=$(pg_bin_for "$dir")
  user=$(pg_user_for "$dir")
  rm -rf -- "$new" "$new.password"
  install -m 600 -o "$user" /dev/null "$new.password"
  printf '%s\n' "$password" >"$new.password"
  install -d -m 700 -o "$user" "$new"
  pg_as "$user" "$bin/initdb" -D "$new" -U redshank_admin -E UTF8 --locale=C.UTF-8 \
    --auth-local=scram-sha-256 --auth-host=scram-sha-256 --pwfile="$new.password" || {
    rm -rf -- "$new" "$new.password"
    return 1
  }
  rm -f -- "$new.password"
  mv -T -- "$new" "$dir"
}

# Prints the process of the postmaster that serves folder $1, if one lives. A process number in postmaster.pid can
# belong to a stranger after a crash or a restart of the machine; a postmaster's working directory is its folder.
pg_pid() {
  local dir=$1 pid=''
  [[ -f $dir/postmaster.pid ]] || return 1
  pid=$(head -n 1 -- "$dir/postmaster.pid")
  [[ $pid =~ ^[0-9]+$ && $(readlink "/proc/$pid/cwd") == "$(realpath -- "$dir")" ]] 2>/dev/null || return 1
  printf '%s\n' "$pid"
}

# The port of the live postmaster in folder $1.
pg_port() { sed -n 4p -- "$1/postmaster.pid"; }

# Takes away what a server that did not stop properly left behind.
pg_clear_stale() {
  [[ -f $1/postmaster.pid ]] && ! pg_pid "$1" >/dev/null || return 0
  say '  the database was not stopped properly last time: it recovers by itself'
  rm -f -- "$1/postmaster.pid"
}

# pg_start DIR PORT OPTION…: listens on 127.0.0.1 alone, without a socket file.
pg_start() {
  local dir=$1 port=$2 bin user options
  shift 2
  bin=$(pg_bin_for "$dir")
  user=$(pg_user_for "$dir")
  options="-p $port -c listen_addresses=127.0.0.1 -c unix_socket_directories=''"
  local option
  for option in "$@"; do options+=" -c $option"; done
  pg_as "$user" "$bin/pg_ctl" -D "$dir" -o "$options" -l "$dir/server.log" -t 120 -w -s start
}

# pg_stop DIR: sessions are cut, nothing is lost. The last resort recovers at the next start.
pg_stop() {
  local dir=$1 bin user
  pg_pid "$dir" >/dev/null || return 0
  bin=$(pg_bin_for "$dir")
  user=$(pg_user_for "$dir")
  pg_as "$user" "$bin/pg_ctl" -D "$dir" -m fast -t 30 -w -s stop ||
    pg_as "$user" "$bin/pg_ctl" -D "$dir" -m immediate -t 30 -w -s stop
}

# pg_sql DIR PORT PASSWORD DATABASE: runs the SQL of standard input as redshank_admin; stops at the first fault.
pg_sql() {
  local bin
  bin=$(pg_bin_for "$1")
  PGPASSWORD=$3 "$bin/psql" -X -q -A -t -v ON_ERROR_STOP=1 -h 127.0.0.1 -p "$2" -U redshank_admin -d "$4" 8>&- 9>&-
}
