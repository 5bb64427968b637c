# shellcheck shell=bash
# What the doctor looks at in REDSHANK_DATA, its database and its port. Sourced by doctor.sh; changes nothing.

# Below this an upload of the largest size (2 GB) and its copies do not fit any more.
needed_gb=5

check_data_folder() {
  resolve_data_folder
  if [[ ! -e $REDSHANK_DATA ]]; then
    if [[ -w $(nearest_folder "$REDSHANK_DATA") ]]; then
      good "$REDSHANK_DATA does not exist yet; npm start makes it"
    else
      bad "$REDSHANK_DATA cannot be made by $(id -un)" 'Choose another folder: REDSHANK_DATA=/path/to/folder npm start'
    fi
  elif [[ ! -w $REDSHANK_DATA || ! -x $REDSHANK_DATA ]]; then
    bad "$REDSHANK_DATA cannot be written by $(id -un)" 'Start as the user it belongs to, or choose another folder with REDSHANK_DATA.'
  elif [[ $(stat -c %a -- "$REDSHANK_DATA") == 7[01]0 ]]; then
    good "$REDSHANK_DATA is closed to other users"
  else
    bad "$REDSHANK_DATA is open to other users (mode $(stat -c %a -- "$REDSHANK_DATA"))" "chmod 700 '$REDSHANK_DATA'"
  fi
  check_secrets
}

check_secrets() {
  local open
  [[ -d $REDSHANK_SECRETS_DIR && -r $REDSHANK_SECRETS_DIR ]] || return 0
  open=$(find "$REDSHANK_SECRETS_DIR" -type f -perm /077 -printf '%f ')
  if [[ -z $open ]]; then
    good 'passwords and keys can be read by their owner only'
  else
    bad "other users can read: $open" "chmod 600 '$REDSHANK_SECRETS_DIR'/*"
  fi
}

# The folder itself or the nearest one above it that exists.
nearest_folder() {
  local dir=$1
  while [[ ! -d $dir ]]; do dir=$(dirname -- "$dir"); done
  printf '%s\n' "$dir"
}

check_disk() {
  local free
  free=$(($(df --output=avail -k -- "$(nearest_folder "$REDSHANK_DATA")" | tail -n 1) / 1024 / 1024))
  if ((free >= needed_gb)); then
    good "$free GB free for clips"
  elif ((free >= 1)); then
    hint "only $free GB free for clips" "A long clip with its copies needs up to $needed_gb GB: make room or move REDSHANK_DATA."
  else
    bad 'less than 1 GB free' 'Make room, or move REDSHANK_DATA to a larger disk.'
  fi
}

check_database() {
  local dir=$REDSHANK_DATA/database port pid
  [[ ! -s $REDSHANK_SECRETS_DIR/database-folder || -f $dir/PG_VERSION ]] || dir=$(<"$REDSHANK_SECRETS_DIR/database-folder")
  if [[ ! -f $dir/PG_VERSION ]]; then
    good 'no database yet; npm start makes it'
    return
  fi
  if ! pid=$(pg_pid "$dir"); then
    good "the database in $dir is stopped; npm start starts it"
    return
  fi
  port=$(pg_port "$dir")
  if pg_sql "$dir" "$port" "$(<"$REDSHANK_SECRETS_DIR/database-admin")" postgres <<<'select 1' >/dev/null 2>&1; then
    good "the database answers on 127.0.0.1:$port"
  else
    bad "the database runs (process $pid) but does not answer on 127.0.0.1:$port" "Its log is $dir/server.log; a stop and a new start usually mend it."
  fi
}

check_port() {
  local port=${PORT:-4600} host=${HOST:-127.0.0.1} status=0
  node "$scripts/port.mjs" check "$host" "$port" || status=$?
  if ((status == 0)); then
    good "port $port of $host is free"
  elif ((status == 3)) && instance_is_locked; then
    good "Redshank runs here: $(<"$REDSHANK_DATA/instance.lock")"
  elif ((status == 3)); then
    bad "port $port of $host is in use by another program" 'Stop that program, or choose another port: PORT=4601 npm start'
  else
    bad "port $port of $host cannot be opened" 'Check HOST and PORT; ports below 1024 need root.'
  fi
}

instance_is_locked() {
  [[ -f $REDSHANK_DATA/instance.lock ]] && ! flock -n "$REDSHANK_DATA/instance.lock" true
}
