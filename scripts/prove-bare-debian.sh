#!/usr/bin/env bash
# Proves "npm start" and "npm test" in a Debian 12 root that has only Node.js in it. Run as root:
#   scripts/prove-bare-debian.sh [folder]        (default: /tmp/evenrun-bare; kept at the end, to look at)
# Needs debootstrap, git and curl here; Node.js 20, npm's settings, the package sources and certificates are this machine's.
# AS=plain does the same as a user with sudo instead of root.
set -euo pipefail

project=$(cd "$(dirname "$0")/.." && pwd)
bare=${1:-/tmp/evenrun-bare}
port=${PORT:-3456}
who=root
packages=ca-certificates
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
  start_once cold
  start_once warm
  step "npm test" inside 'npm test'
  step "npm test again" inside 'npm test'
  inside 'npm run --silent stop'
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

step() {
  echo "== $1"
  shift
  local begun=$SECONDS
  "$@" || echo "== failed with code $?"
  echo "== took $((SECONDS - begun)) s"
}

# Starts the product, waits until it answers, looks at the sign-in page, and stops it with the signal of Ctrl-C.
start_once() {
  echo "== npm start, $1"
  local begun=$SECONDS
  inside 'npm start' &
  local started=$!
  until curl -fs "http://127.0.0.1:$port/sign-in" >/dev/null; do
    kill -0 "$started" 2>/dev/null || { echo "== npm start ended early"; exit 1; }
    sleep 1
  done
  echo "== the sign-in page answers after $((SECONDS - begun)) s"
  inside "kill -INT \$(sed 's/.*\"pid\":\\([0-9]*\\).*/\\1/' .data/start.lock)"
  wait "$started" || true
}

main
