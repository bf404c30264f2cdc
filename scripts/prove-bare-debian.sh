#!/usr/bin/env bash
# Proves "npm start", "npm run dev", "npm run stop" and "npm test" in a Debian 12 root that has only Node.js in it.
# Run as root:
#   scripts/prove-bare-debian.sh [folder]        (default: /tmp/evenrun-bare; kept at the end, to look at)
# Needs debootstrap, git and curl here; Node.js 20, npm's settings, the package sources and certificates are this machine's.
# AS=plain does the same as a user with sudo instead of root.
set -euo pipefail

project=$(cd "$(dirname "$0")/.." && pwd)
bare=${1:-/tmp/evenrun-bare}
port=${PORT:-3456}
who=root
packages=ca-certificates
verdict=0
if [ "${AS:-root}" = plain ]; then
  who=tester
  packages=ca-certificates,sudo
fi

main() {
  make_root
  trap release EXIT
  copy_node
  copy_reach
  copy_project
  echo "== Before: PostgreSQL and Chromium are $(inside 'ls -d /usr/lib/postgresql /usr/bin/chromium' 2>/dev/null || echo absent)"
  begin "npm start" "cold"
  interrupt
  begin "npm start" "warm, the database runs"
  stop
  begin "npm run dev" "the database stopped"
  interrupt
  step "npm test" inside 'npm test'
  begin "npm start" "beside the next test"
  step "npm test again, beside npm start" inside 'npm test'
  answers || fail "npm start no longer answers"
  stop
}

make_root() {
  # deb.debian.org is debootstrap's own default; DEBIAN_MIRROR names another.
  [ -e "$bare/etc/debian_version" ] ||
    debootstrap --variant=minbase --include="$packages" bookworm "$bare" ${DEBIAN_MIRROR:-}
  mount -t proc proc "$bare/proc"
  mount --rbind /dev "$bare/dev"
  mount --make-rslave "$bare/dev"
  mount -t sysfs sysfs "$bare/sys"
}

release() {
  inside 'npm run --silent stop' >/dev/null 2>&1 || true
  umount -R "$bare/dev" "$bare/proc" "$bare/sys" || true
}

copy_node() {
  local npm
  npm=$(cd "$(dirname "$(readlink -f "$(command -v npm)")")/.." && pwd)
  install -m 755 "$(command -v node)" "$bare/usr/local/bin/node"
  mkdir -p "$bare/usr/local/lib/node_modules"
  cp -a "$npm" "$bare/usr/local/lib/node_modules/"
  ln -sf ../lib/node_modules/npm/bin/npm-cli.js "$bare/usr/local/bin/npm"
  ln -sf ../lib/node_modules/npm/bin/npx-cli.js "$bare/usr/local/bin/npx"
}

# What this machine needs to reach packages at all: sources, certificates, name servers, npm's settings.
copy_reach() {
  local settings
  settings=$(npm config get globalconfig)
  mkdir -p "$bare/usr/local/etc"
  if [ -f "$settings" ]; then cp "$settings" "$bare/usr/local/etc/npmrc"; fi
  cp /etc/ssl/certs/ca-certificates.crt "$bare/etc/ssl/certs/ca-certificates.crt"
  cp /etc/resolv.conf /etc/hosts "$bare/etc/"
  if [ -f /etc/apt/sources.list.d/debian.sources ]; then
    cp /etc/apt/sources.list.d/debian.sources "$bare/etc/apt/sources.list.d/"
    rm -f "$bare/etc/apt/sources.list"
  fi
}

copy_project() {
  rm -rf "$bare/srv/evenrun"
  git clone --quiet "$project" "$bare/srv/evenrun"
  [ "$who" = root ] && return
  chroot "$bare" sh -c "id $who || useradd -m $who" >/dev/null 2>&1
  echo "$who ALL=(ALL) NOPASSWD: ALL" >"$bare/etc/sudoers.d/$who"
  chroot "$bare" chown -R "$who:" /srv/evenrun
}

inside() {
  chroot "$bare" setpriv --reuid="$who" --regid="$who" --init-groups env -i \
    PATH=/usr/local/sbin:/usr/local/bin:/usr/sbin:/usr/bin:/sbin:/bin HOME="$(home)" TERM=dumb CI=true PORT="$port" \
    NODE_EXTRA_CA_CERTS=/etc/ssl/certs/ca-certificates.crt \
    sh -c "cd /srv/evenrun && $1" </dev/null
}

home() {
  if [ "$who" = root ]; then echo /root; else echo "/home/$who"; fi
}

# Goes on where a check fails; the proof then fails as a whole.
step() {
  echo "== $1"
  shift
  local begun=$SECONDS
  if ! "$@"; then
    echo "== failed"
    verdict=1
  fi
  echo "== took $((SECONDS - begun)) s"
}

# Starts the product, and waits until its sign-in page answers.
begin() {
  echo "== $1, $2"
  local begun=$SECONDS
  inside "$1" &
  started=$!
  until answers; do
    kill -0 "$started" 2>/dev/null || fail "$1 ended early"
    sleep 1
  done
  echo "== the sign-in page answers after $((SECONDS - begun)) s"
}

answers() {
  curl -fs "http://127.0.0.1:$port/sign-in" >/dev/null
}

# Ends it with the signal of Ctrl-C; the database runs on.
interrupt() {
  inside "kill -INT \$(sed 's/.*\"pid\":\\([0-9]*\\).*/\\1/' .data/start.lock)"
  ended
}

# Ends it and the database; neither may answer any more.
stop() {
  inside 'npm run --silent stop'
  ended
  if (: <>"/dev/tcp/127.0.0.1/$(cat "$bare/srv/evenrun/.data/pg-port")") 2>/dev/null; then
    fail "the database still answers"
  fi
}

ended() {
  wait "$started" || true
  if answers; then fail "the web server still answers"; fi
}

fail() {
  echo "== failed: $1"
  exit 1
}

# On one line, so that bash has read it whole before the script may be changed under it.
main; exit "$verdict"
