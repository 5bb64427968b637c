# shellcheck shell=bash
# What the doctor looks at on the machine and in the checkout. Sourced by doctor.sh.

missing=0

heading() { printf '\n%s\n' "$1"; }
good() { printf '  ✓ %s\n' "$1"; }
# Works without it, but less well.
hint() { printf '  ! %s\n    %s\n' "$1" "$2"; }
bad() {
  printf '  ✗ %s\n    %s\n' "$1" "$2"
  missing=$((missing + 1))
}

check_node() {
  if ! command -v node >/dev/null; then
    bad 'Node is missing' 'Install Node 20.19 or newer with npm.'
  elif node_is_new_enough; then
    good "Node $(node -v)"
  else
    bad "Node $(node -v) is too old" 'Install Node 20.19 or newer.'
  fi
  if command -v npm >/dev/null; then good "npm $(npm -v)"; else bad 'npm is missing' 'Install the npm that belongs to your Node.'; fi
}

# How a package comes in depends on who asks.
install_words() {
  local command="apt-get update && apt-get install -y --no-install-recommends $1"
  if is_root; then
    printf 'npm start installs it, or: %s' "$command"
  else
    printf "npm start installs it through sudo, or: sudo sh -c '%s'" "$command"
  fi
}

check_packages() {
  local bin
  if bin=$(pg_bin); then
    good "$("$bin/postgres" --version)"
  else
    bad 'PostgreSQL 15 or newer is missing (server programs)' "$(install_words postgresql)"
  fi
  if has_package ffmpeg; then
    good "$(ffmpeg -version | head -n 1 | cut -d ' ' -f 1-3)"
  else
    bad 'ffmpeg or ffprobe is missing' "$(install_words ffmpeg)"
  fi
  if has_package chromium-headless-shell; then
    good 'Chromium, for the browser tests'
  else
    hint 'Chromium is missing: only npm test and npm run bench need it' 'They install it.'
  fi
}

# ffmpeg_has KIND NAME WHY: KIND is encoder, decoder or filter.
ffmpeg_has() {
  local said
  # ffmpeg ends with 0 also for a name it does not know, so what it says decides
  said=$(ffmpeg -hide_banner -v error -h "$1=$2" 2>&1) || true
  [[ ${said,,} != "$1 $2"* ]] || return 0
  bad "ffmpeg has no $1 '$2'" "$3. Debian's own ffmpeg has it: apt-get install -y ffmpeg"
}

check_ffmpeg() {
  has_package ffmpeg || return 0
  local before=$missing
  ffmpeg_has encoder libx264 'The copies that the Bench and the replay play are made with it'
  ffmpeg_has encoder mjpeg 'Posters and preview pictures are made with it'
  ffmpeg_has decoder h264 'Most phones film in it'
  ffmpeg_has decoder hevc 'Many newer phones film in it'
  ffmpeg_has filter zscale 'HDR clips are brought to ordinary brightness with it'
  ffmpeg_has filter tonemap 'HDR clips are brought to ordinary brightness with it'
  ((missing > before)) || good 'ffmpeg can read and write what phones film and the Bench shows'
}

check_checkout() {
  if node "$scripts/lock-installed.mjs" 2>/dev/null; then
    good 'node_modules holds what package-lock.json asks for'
  else
    hint 'node_modules is missing or older than package-lock.json' 'npm start installs it (needs the npm registry).'
  fi
  if node "$scripts/build-stamp.mjs" check; then
    good 'Pages and server are built from the present sources'
  else
    hint 'Pages and server are not built from the present sources' 'npm start builds them.'
  fi
}

tried() {
  local works=$1 lacks=$2 advice=$3
  shift 3
  if "$@" >/dev/null 2>&1; then good "$works"; else hint "$lacks" "$advice"; fi
}

check_confinement() {
  tried 'bounded in memory, computing time and file size (prlimit)' 'not bounded in memory and computing time' \
    'prlimit belongs to util-linux: apt-get install -y util-linux' prlimit --core=0 --cpu=60 -- true
  tried 'at a lower priority than the web server (nice)' 'at the same priority as the web server' \
    'nice belongs to coreutils: apt-get install -y coreutils' nice -n 10 true
  tried 'ends with the worker that started it (setpriv)' 'may outlive the worker that started it' \
    'setpriv belongs to util-linux: apt-get install -y util-linux' setpriv --no-new-privs --pdeathsig KILL -- true
  tried 'without a network (unshare)' 'with access to the network' \
    'This machine permits no network namespaces; as root they work, or allow user namespaces (sysctl kernel.unprivileged_userns_clone=1).' \
    no_network_possible
}

no_network_possible() { unshare -n -- true || unshare -rn -- true; }

verdict() {
  if ((missing)); then
    printf '\n%d needed and missing; each line above says what to do.\n' "$missing"
    exit 1
  fi
  printf '\nNothing that is needed is missing.\n'
}
