# shellcheck shell=bash
# REDSHANK_DATA: database, uploads and secrets of one instance, and the lock that keeps it to one start at a time.
# Sourced after lib.sh.

# Sets REDSHANK_DATA (absolute) and REDSHANK_SECRETS_DIR, touching nothing.
resolve_data_folder() {
  local given=${REDSHANK_DATA:-$repo/redshank-data}
  # npm changes into the repository; INIT_CWD is where the person typed.
  [[ $given == /* ]] || given=${INIT_CWD:-$PWD}/$given
  REDSHANK_DATA=$(realpath -m -- "$given")
  REDSHANK_SECRETS_DIR=$REDSHANK_DATA/secrets
  export REDSHANK_DATA REDSHANK_SECRETS_DIR
}

use_data_folder() {
  resolve_data_folder
  mkdir -p -m 700 -- "$REDSHANK_DATA" 2>/dev/null || true
  [[ -d $REDSHANK_DATA && -w $REDSHANK_DATA && -x $REDSHANK_DATA ]] ||
    fail "The data folder $REDSHANK_DATA cannot be made or written by $(id -un)." \
      'Choose another one (REDSHANK_DATA=/path/to/folder npm start) or start as the user it belongs to.'
  is_root || [[ -O $REDSHANK_DATA ]] ||
    fail "The data folder $REDSHANK_DATA belongs to $(stat -c %U -- "$REDSHANK_DATA")." \
      'Start as that user, or choose another folder: REDSHANK_DATA=/path/to/folder npm start'
  # 710 is what lets the database's user pass through to its own folder, see postgres/instance.sh.
  [[ $(stat -c %a -- "$REDSHANK_DATA") == 7[01]0 ]] || chmod 700 -- "$REDSHANK_DATA"
  mkdir -p -m 700 -- "$REDSHANK_SECRETS_DIR"
  chmod 700 -- "$REDSHANK_SECRETS_DIR"
}

# Holds fd 9 until this script and the server it starts have ended, however they end.
lock_instance() {
  local file=$REDSHANK_DATA/instance.lock
  (umask 077 && : >>"$file")
  exec 9<>"$file"
  if ! flock -n 9; then
    local running
    running=$(cat -- "$file")
    fail "Redshank is already running on $REDSHANK_DATA: ${running:-it is just starting}." \
      'Stop that one first (Ctrl-C where it runs, or kill with its process number),' \
      'or start another beside it: REDSHANK_DATA=/path/to/other-folder PORT=4601 npm start'
  fi
  : >"$file"
}

# What a second start says of this one.
describe_instance() { printf '%s' "$1, process $$" >"$REDSHANK_DATA/instance.lock"; }
