#!/usr/bin/env bash
# npm run back-up -- FILE.tar: database, uploads and secrets of one instance in one file that only its owner can
# read. Works while the instance runs, and starts its database where it does not. Settings: REDSHANK_DATA,
# REDSHANK_S3_BUCKET (then the files lie in the bucket and are not in the back-up).

source "$(dirname "${BASH_SOURCE[0]}")/lib.sh"
source "$scripts/postgres/server.sh"
source "$scripts/data-folder.sh"
source "$scripts/postgres/instance.sh"

file=${1:-}
[[ -n $file && $file != -* && $# -eq 1 ]] ||
  fail 'Say where the back-up goes.' 'npm run back-up -- /path/to/redshank-2026-05-01.tar'
[[ $file == /* ]] || file=${INIT_CWD:-$PWD}/$file
[[ ! -e $file ]] || fail "$file is there already and is left as it is." 'Choose another name.'
[[ -d $(dirname -- "$file") ]] || fail "The folder of $file does not exist." 'Make it first, or choose another.'

resolve_data_folder
[[ -d $REDSHANK_SECRETS_DIR ]] || fail "There is no instance in $REDSHANK_DATA." \
  'Say which one: REDSHANK_DATA=/path/to/folder npm run back-up -- FILE.tar'
use_data_folder

making=$REDSHANK_DATA/back-up.making
clean_up() {
  local status=$?
  trap '' INT TERM HUP
  stop_step
  rm -rf -- "$making" "$file.making"
  instance_down || status=1
  exit "$status"
}
trap clean_up EXIT
trap 'exit 130' INT TERM HUP

# One at a time.
exec 8>"$REDSHANK_SECRETS_DIR/back-up.lock"
flock -n 8 || fail 'Another back-up of this instance is being made.' 'Wait until it has ended.'

choose_instance_dir
if pg_pid "$instance_dir" >/dev/null; then
  instance_port=$(pg_port "$instance_dir")
else
  lock_instance
  instance_up redshank
fi

rm -rf -- "$making"
mkdir -m 700 -- "$making" "$making/secrets"

# A file is never changed once it lies under its name, so a second name for it is a copy. What the dump speaks of was
# there before it or came while it was made.
copy_uploads() {
  [[ -d $REDSHANK_DATA/uploads ]] || return 0
  # a file that goes meanwhile was deleted for good
  cp -al --no-clobber -- "$REDSHANK_DATA/uploads" "$making/" 2>/dev/null || true
}
all_copied() {
  local path
  [[ -d $REDSHANK_DATA/uploads ]] || return 0
  (cd "$REDSHANK_DATA/uploads" && find . -path ./temp -prune -o -type f -print0) |
    while IFS= read -r -d '' path; do
      [[ -e $making/uploads/$path || ! -e $REDSHANK_DATA/uploads/$path ]] || return 1
    done
}
dump() {
  local bin
  bin=$(pg_bin_for "$instance_dir")
  (umask 077 && PGPASSWORD=$(secret_of database-admin) "$bin/pg_dump" -h 127.0.0.1 -p "$instance_port" \
    -U redshank_admin -Fc -f "$making/database.dump" redshank)
}

copy_uploads
step 'Copying the database' dump ||
  fail 'The database could not be copied.' 'The lines above say why; a full disk is the usual reason.'
copy_uploads
all_copied || fail 'Not every file could be copied.' 'A full disk is the usual reason: make room, then try again.'
rm -rf -- "$making/uploads/temp"

# The database's passwords and port belong to its cluster; a restored instance makes its own.
for secret in "$REDSHANK_SECRETS_DIR"/*; do
  case ${secret##*/} in
    database-* | back-up.lock) ;;
    *) cp -p -- "$secret" "$making/secrets/" ;;
  esac
done
(
  cd "$making"
  printf 'redshank back-up 1\n%s\n' "$(date -u +%Y-%m-%dT%H:%M:%SZ)" >made
  find . -type f ! -name sums -print0 | sort -z | xargs -0 sha256sum -- >sums
)
pack() { (umask 077 && tar -C "$making" -cf "$file.making" .); }
step 'Writing the back-up' pack ||
  fail "$file could not be written." 'The lines above say why; a full disk is the usual reason.'
mv -T -- "$file.making" "$file"

say "✓ $file ($(du -h -- "$file" | cut -f 1), for $(id -un) alone)"
[[ -z ${REDSHANK_S3_BUCKET:-} ]] || say '  The clips lie in the bucket and are not in it: keep versions of the bucket too.'
say '  It holds health data and the keys of this instance: keep it locked away, and no longer than you keep clips.'
