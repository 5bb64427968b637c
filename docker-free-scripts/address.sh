# shellcheck shell=bash
# HOST, PORT and PUBLIC_URL. Sourced after lib.sh.

use_address() {
  HOST=${HOST:-127.0.0.1}
  PORT=${PORT:-4600}
  local shown=$HOST
  case $HOST in
    0.0.0.0 | ::) shown=127.0.0.1 ;;
    *:*) shown="[$HOST]" ;;
  esac
  PUBLIC_URL=${PUBLIC_URL:-http://$shown:$PORT}
  export HOST PORT PUBLIC_URL
  need_free_port
}

# Asked before the long set-up and again just before the server starts.
need_free_port() {
  local status=0
  node "$scripts/port.mjs" check "$HOST" "$PORT" || status=$?
  case $status in
    0) ;;
    2) fail "PORT=$PORT is not a port." 'Give a number from 1 to 65535: PORT=4601 npm start' ;;
    3) fail "Port $PORT of $HOST is in use by another program." \
      'Stop that program, or start on another port: PORT=4601 npm start' ;;
    4) fail "Port $PORT may not be opened by $(id -un)." 'Ports below 1024 need root; choose a higher one: PORT=4600 npm start' ;;
    5) fail "HOST=$HOST is not an address of this machine." 'Use 127.0.0.1 (this machine only) or 0.0.0.0 (all its addresses).' ;;
    *) fail "Port $PORT of $HOST cannot be opened." 'Try another: PORT=4601 npm start' ;;
  esac
}
