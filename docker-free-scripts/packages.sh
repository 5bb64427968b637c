# shellcheck shell=bash
# Debian packages: which are missing, and how they come in. Sourced after lib.sh and postgres/server.sh.

# Programs are looked for, not packages: a PostgreSQL or ffmpeg from elsewhere serves as well.
has_package() {
  case $1 in
    postgresql) pg_bin >/dev/null ;;
    ffmpeg) command -v ffmpeg >/dev/null && command -v ffprobe >/dev/null ;;
    chromium-headless-shell) [[ -x /usr/bin/$1 ]] ;;
    *) command -v "$1" >/dev/null ;;
  esac
}

missing_packages() {
  local name
  for name in "$@"; do has_package "$name" || printf '%s\n' "$name"; done
}

# need_packages NAME…: installs what is missing, as root or through sudo.
need_packages() {
  local missing root=() command
  mapfile -t missing < <(missing_packages "$@")
  ((${#missing[@]})) || return 0
  command="apt-get update && apt-get install -y --no-install-recommends ${missing[*]}"

  command -v apt-get >/dev/null || fail "Missing: ${missing[*]}, and this machine has no apt-get to install them." \
    'Install PostgreSQL 15 or newer (server programs) and ffmpeg by hand, for tests also Chromium as /usr/bin/chromium-headless-shell; then start again.'
  if ! is_root; then
    can_sudo "${missing[*]}" || fail "Missing: ${missing[*]}. Installing them needs root." \
      'Type this once, then start again:' "sudo sh -c '$command'"
    root=(sudo -n)
  fi

  local apt=("${root[@]}" env DEBIAN_FRONTEND=noninteractive apt-get -q -o DPkg::Lock::Timeout=180 -o Acquire::Retries=2)
  # A list that could not be refreshed (one foreign mirror is down) need not stop the packages wanted here.
  step 'Refreshing the list of Debian packages' "${apt[@]}" -o APT::Update::Error-Mode=any update ||
    say '  not all lists could be refreshed: going on with those that are here'
  if ! step "Installing ${missing[*]}" "${apt[@]}" install -y --no-install-recommends "${missing[@]}"; then
    mapfile -t missing < <(missing_packages "${missing[@]}")
    fail "Still missing: ${missing[*]}." \
      'The lines above say why. If the package mirror cannot be reached from here, mend the network or the lists in /etc/apt, then start again;' \
      "or install by hand: $command"
  fi
  mapfile -t missing < <(missing_packages "${missing[@]}")
  ((${#missing[@]} == 0)) || fail "Installed, yet not found: ${missing[*]}." 'Run npm run doctor to see what it looks for.'
}

# Without a password where that is allowed; at a terminal sudo may ask for it once.
can_sudo() {
  command -v sudo >/dev/null || return 1
  sudo -n true 2>/dev/null && return 0
  [[ -t 0 && -t 2 ]] || return 1
  say "Missing: $1. sudo installs them and may ask for your password."
  sudo -v && sudo -n true 2>/dev/null
}
