#!/usr/bin/env bash
# REDSHANK_DATA=/new/folder npm run restore -- FILE.tar: makes an instance of what npm run back-up wrote. Only into a
# folder in which there is nothing yet; a restore that fails leaves nothing behind.

source "$(dirname "${BASH_SOURCE[0]}")/lib.sh"
source "$scripts/postgres/server.sh"
source "$scripts/packages.sh"
source "$scripts/data-folder.sh"
source "$scripts/postgres/instance.sh"

file=${1:-}
[[ -n $file && $file != -* && $# -eq 1 ]] ||
  fail 'Say which back-up.' 'REDSHANK_DATA=/path/to/new-folder npm run restore -- /path/to/FILE.tar'
[[ $file == /* ]] || file=${INIT_CWD:-$PWD}/$file
[[ -r $file ]] || fail "$file cannot be read." 'Say where the back-up lies, and act as the user it belongs to.'

resolve_data_folder
[[ ! -e $REDSHANK_DATA || -z $(ls -A -- "$REDSHANK_DATA") ]] ||
  fail "There is something in $REDSHANK_DATA already, and it is left as it is." \
    'Restore beside it: REDSHANK_DATA=/path/to/new-folder npm run restore -- FILE.tar'
need_packages postgresql
use_data_folder
lock_instance

restored=''
clean_up() {
  local status=$?
  trap '' INT TERM HUP
  stop_step
  instance_down || status=1
  if [[ -z $restored ]]; then
    [[ $instance_dir != /var/lib/redshank/* ]] || rm -rf -- "$instance_dir"
    find "$REDSHANK_DATA" -mindepth 1 -delete
  else
    rm -rf -- "$REDSHANK_DATA/restore.making"
  fi
  exit "$status"
}
trap clean_up EXIT
trap 'exit 130' INT TERM HUP

making=$REDSHANK_DATA/restore.making
mkdir -m 700 -- "$making"
unpack() {
  tar -C "$making" --no-same-owner -xf "$file" && head -n 1 "$making/made" | grep -qx 'redshank back-up 1'
}
whole() { (cd "$making" && sha256sum --check --quiet --strict sums); }
step 'Reading the back-up' unpack ||
  fail "$file is no back-up of Redshank, or was cut short." 'Take another one.'
step 'Checking that it is whole' whole ||
  fail "$file is damaged." 'Take another one; nothing was restored.'

cp -p -- "$making"/secrets/* "$REDSHANK_SECRETS_DIR/" 2>/dev/null || true
instance_up redshank

# The dump brings its own schemas: it goes into a database in which there is nothing.
admin=$(secret_of database-admin)
fill() {
  local bin
  bin=$(pg_bin_for "$instance_dir")
  printf 'drop database redshank;\ncreate database redshank owner redshank_owner template template0;\n' |
    pg_sql "$instance_dir" "$instance_port" "$admin" postgres
  PGPASSWORD=$admin "$bin/pg_restore" -h 127.0.0.1 -p "$instance_port" -U redshank_admin \
    --exit-on-error -d redshank "$making/database.dump"
  pg_sql "$instance_dir" "$instance_port" "$admin" redshank <"$scripts/postgres/ground.sql"
}
step 'Filling the database' fill ||
  fail 'The database could not be filled.' 'The lines above say why; nothing was restored.'
[[ ! -d $making/uploads ]] || mv -T -- "$making/uploads" "$REDSHANK_DATA/uploads"
restored=yes

say "✓ Restored into $REDSHANK_DATA what was there at $(sed -n 2p "$making/made")"
say '  Erasures of athletes after that moment are undone by this: repeat them before anybody works with it.'
say "  Start it: REDSHANK_DATA=$REDSHANK_DATA npm start"
