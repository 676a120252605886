# What scripts/start and scripts/test need before anything of the project can run: Node.js 20 (checked), Debian packages
# and npm packages (installed when missing). Sourced by both; says what is wrong in one sentence and ends the run.

trouble() { printf '\n%s\n' "$*" >&2; exit 1; }

# Runs a command quietly with a line that shows it is running; its output is kept in $log.
step() {
  local label=$1 began=$SECONDS said=0 pid
  shift
  log=$root/.tmp/setup.log
  "$@" </dev/null >"$log" 2>&1 &
  pid=$!
  # a command in the background does not hear Ctrl-C by itself
  trap 'kill -TERM "$pid" 2>/dev/null; trap - INT TERM; exit 130' INT TERM
  while kill -0 "$pid" 2>/dev/null; do
    if [ -t 1 ]; then printf '\r  %s … %s s' "$label" $((SECONDS - began))
    elif [ $((SECONDS - began - said)) -ge 15 ] || { [ $said = 0 ] && [ $SECONDS != $began ]; }; then said=$((SECONDS - began)); echo "  $label … $said s"; fi
    sleep 0.2
  done
  trap - INT TERM
  [ ! -t 1 ] || printf '\r\033[K'
  wait "$pid" && { [ $((SECONDS - began)) -lt 1 ] || echo "  $label: $((SECONDS - began)) s"; }
}

full_disk() { grep -qiE 'ENOSPC|no space left' "$log"; }

need_node() {
  local have
  command -v node >/dev/null || trouble "Node.js is not installed. Install Node.js 20 (20.20 or a later 20), then run this again."
  have=$(node -p process.versions.node)
  case $have in
    20.*) [ "$(node -p 'process.versions.node.split(".")[1] >= 20')" = true ] && return ;;
  esac
  trouble "Node.js is $have here, and 20.20 or a later 20 is needed. Install Node.js 20, then run this again."
}

need_room() { # folder, MB
  local free
  free=$(df -Pm "$1" | awk 'NR == 2 { print $4 }')
  [ "$free" -ge "$2" ] || trouble "The disk is nearly full: $free MB are free and $2 MB are needed. Make room, then run this again."
}

# need_debian COMMAND-PATTERN PACKAGE…: installs the packages unless the pattern finds a file
need_debian() {
  local pattern=$1 as_root=()
  shift
  if compgen -G "$pattern" >/dev/null; then return; fi
  command -v apt-get >/dev/null || trouble "$* is missing, and this machine has no apt-get. Install it, then run this again."
  if [ "$(id -u)" != 0 ]; then
    sudo -n true 2>/dev/null || trouble "$* is missing and only root may install it. Run: sudo apt-get install --no-install-recommends $*"
    as_root=(sudo -n)
  fi
  need_room / 1000
  if [ "$1" = postgresql ] && [ ! -e /etc/postgresql-common/createcluster.conf ]; then
    # Debian would also make and start a database for the whole machine; this project has its own
    "${as_root[@]}" sh -c 'mkdir -p /etc/postgresql-common && echo "create_main_cluster = false" >/etc/postgresql-common/createcluster.conf'
  fi
  step "Fetching Debian's package lists" "${as_root[@]}" apt-get update -q || true # an old list may still do
  step "Installing $*" "${as_root[@]}" env DEBIAN_FRONTEND=noninteractive apt-get install -y -q --no-install-recommends -o Dpkg::Options::=--force-confold "$@" || {
    ! full_disk || trouble "Installing $* did not work because the disk is full. Make room, then run this again."
    trouble "$* could not be had from Debian's package server ($(grep -m1 -E '^(E|Err):?' "$log" || tail -1 "$log")). Check the network, then run this again."
  }
  compgen -G "$pattern" >/dev/null || trouble "$* was installed, but $pattern is not there."
}

need_packages() {
  local stamp=$root/node_modules/.leafhalt-lock
  if [ -e "$stamp" ] && cmp -s "$stamp" "$root/package-lock.json"; then return; fi
  if [ -e "$root/node_modules/.package-lock.json" ] && [ "$root/node_modules/.package-lock.json" -nt "$root/package-lock.json" ]; then
    cp "$root/package-lock.json" "$stamp"
    return
  fi
  need_room "$root" 1500
  (cd "$root" && step "Installing npm packages" npm ci --prefer-offline --no-audit --no-fund --no-progress) || {
    ! full_disk || trouble "Installing npm packages did not work because the disk is full. Make room, then run this again."
    trouble "An npm package could not be had ($(grep -m1 -E 'npm (error|ERR!) ' "$log" | cut -c1-200 || true)). Check the network, then run this again; the whole log is .tmp/setup.log."
  }
  cp "$root/package-lock.json" "$stamp"
}

need_postgres() { need_debian '/usr/lib/postgresql/*/bin/initdb' postgresql; }
