# shellcheck shell=bash
# The database of one instance: where it lies, its port, its roles, its addresses.
# Sourced after lib.sh, data-folder.sh and postgres/server.sh.

instance_dir=''
instance_started=''

secret_of() {
  local file=$REDSHANK_SECRETS_DIR/$1
  [[ -s $file ]] || random_password | write_secret "$file"
  cat -- "$file"
}

# Sets instance_dir. Inside the data folder where the database's user can get there; for root, whose folders
# 'postgres' often cannot enter, otherwise below /var/lib/redshank under a hash of the data folder's path.
choose_instance_dir() {
  local remembered=$REDSHANK_SECRETS_DIR/database-folder
  instance_dir=$REDSHANK_DATA/database
  if [[ -f $instance_dir/PG_VERSION ]]; then
    ! is_root || let_postgres_in || true
    return
  fi
  if [[ -s $remembered ]]; then
    instance_dir=$(<"$remembered")
    [[ -f $instance_dir/PG_VERSION ]] || fail "The database of this data folder should be in $instance_dir, but is not." \
      'Bring that folder back, or, to begin anew with nothing in it, choose another REDSHANK_DATA.'
    return
  fi
  if is_root && ! let_postgres_in; then
    local base n=1
    base=/var/lib/redshank/$(printf '%s' "$REDSHANK_DATA" | sha256sum | cut -c 1-16)
    instance_dir=$base
    while [[ -e $instance_dir ]]; do
      say "  $instance_dir belongs to an earlier data folder of this name and is left as it is (not wanted any more: rm -rf $instance_dir)"
      n=$((n + 1))
      instance_dir=$base-$n
    done
    install -d -m 755 /var/lib/redshank
    say "  the user 'postgres' cannot enter $REDSHANK_DATA: the database goes to $instance_dir"
  fi
}

# The group may pass through, not list; everything below is closed by itself.
let_postgres_in() {
  local owner
  owner=$(pg_user_for "$REDSHANK_DATA/database")
  chgrp -- "$(id -g "$owner")" "$REDSHANK_DATA" 2>/dev/null && chmod 710 -- "$REDSHANK_DATA" &&
    pg_as "$owner" test -x "$REDSHANK_DATA" && return 0
  chmod 700 -- "$REDSHANK_DATA"
  return 1
}

# Sets instance_port: the stored one, or a new one where none is stored or a stranger has taken it.
choose_instance_port() {
  local file=$REDSHANK_SECRETS_DIR/database-port
  instance_port=''
  [[ ! -s $file ]] || instance_port=$(<"$file")
  if [[ -z $instance_port ]] || ! node "$scripts/port.mjs" check 127.0.0.1 "$instance_port"; then
    [[ -z $instance_port ]] || say "  the database's port $instance_port is taken by another program: choosing a new one"
    instance_port=$(node "$scripts/port.mjs" free)
    write_secret "$file" <<<"$instance_port"
  fi
}

# instance_up DATABASE: makes what is missing, starts, and exports the three addresses the server signs in with.
instance_up() {
  local database=$1 admin owner app jobs
  choose_instance_dir
  admin=$(secret_of database-admin)
  owner=$(secret_of database-owner)
  app=$(secret_of database-app)
  jobs=$(secret_of database-jobs)

  if [[ ! -f $instance_dir/PG_VERSION ]]; then
    step 'Making the database' pg_make "$instance_dir" "$admin" ||
      fail "The database could not be made in $instance_dir." 'The lines above say why; a full disk and a read-only folder are the usual reasons.'
    write_secret "$REDSHANK_SECRETS_DIR/database-folder" <<<"$instance_dir"
  fi
  if pg_pid "$instance_dir" >/dev/null; then
    say '✓ The database was still running'
    instance_port=$(pg_port "$instance_dir")
  else
    pg_clear_stale "$instance_dir"
    choose_instance_port
    # Logged statements and error details can hold names of people, so neither is written to the server's log.
    step 'Starting the database' pg_start "$instance_dir" "$instance_port" \
      log_error_verbosity=terse log_min_error_statement=panic ||
      fail 'The database did not start.' "Its log is $instance_dir/server.log; the usual reasons are a full disk and too little memory."
  fi
  instance_started=yes

  prepare_database "$database" "$admin" "$owner" "$app" "$jobs" >/dev/null ||
    fail 'The database runs, but its roles could not be set up.' \
      "If $REDSHANK_SECRETS_DIR was lost or replaced, bring back the one that belongs to this database."

  local at=127.0.0.1:$instance_port/$database
  export DATABASE_URL=postgres://redshank_app:$app@$at
  export DATABASE_OWNER_URL=postgres://redshank_owner:$owner@$at
  export DATABASE_JOBS_URL=postgres://redshank_jobs:$jobs@$at
}

prepare_database() {
  local database=$1 admin=$2
  {
    # Over standard input, so that no password shows in the list of processes.
    printf '\\set owner_password %s\n\\set app_password %s\n\\set jobs_password %s\n' "$3" "$4" "$5"
    cat -- "$scripts/postgres/roles.sql"
    printf "select 'create database %s owner redshank_owner' where not exists (select from pg_database where datname = '%s')\n\\gexec\n" \
      "$database" "$database"
  } | pg_sql "$instance_dir" "$instance_port" "$admin" postgres &&
    pg_sql "$instance_dir" "$instance_port" "$admin" "$database" <"$scripts/postgres/ground.sql"
}

instance_down() {
  [[ -n $instance_started ]] || return 0
  instance_started=''
  [[ $instance_dir != "$REDSHANK_DATA"/* ]] || ! is_root || let_postgres_in || true
  pg_stop "$instance_dir"
}
