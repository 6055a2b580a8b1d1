#!/usr/bin/env bash
# Both README commands on a fresh Debian with Node 20 and nothing else: in a chroot, once as root and once as
# somebody with sudo. Each run ends with nothing left running, and with no program but Debian's own.
#
#   sudo scripts/fresh.sh            both; `scripts/fresh.sh root` or `scripts/fresh.sh user` for one
#   FRESH_CACHE=/var/tmp/fresh       keeps the base system and npm's downloads for the next time
#   FRESH_MIRROR=http://…            another Debian mirror
set -euo pipefail

project=$(cd "$(dirname "$0")/.." && pwd)
mirror=${FRESH_MIRROR:-http://deb.debian.org/debian}
security=${FRESH_SECURITY_MIRROR:-http://deb.debian.org/debian-security}
suite=$(. /etc/os-release && echo "$VERSION_CODENAME")
work=$(mktemp -d /var/tmp/keypeg-fresh.XXXXXX)
cache=${FRESH_CACHE:-$work/cache}
trap 'rm -rf --one-file-system "$work"' EXIT

if [ "$(id -u)" -ne 0 ]; then
  echo "A chroot needs root: sudo $0" >&2
  exit 2
fi
for program in debootstrap unshare chroot; do
  if ! command -v "$program" >/dev/null; then
    echo "Missing: $program. Run: apt-get install debootstrap util-linux" >&2
    exit 2
  fi
done
case "$(node --version)" in
  v20.*) ;;
  *) echo "Node 20 is wanted here, to be copied in" >&2 && exit 2 ;;
esac

# The base system: minbase, certificates and sudo. Node comes from this machine, as Debian's own may be older.
base_system() {
  local tar=$cache/base-$suite.tar
  mkdir -p "$cache"
  [ -f "$tar" ] && return
  echo "== base system ($suite)"
  debootstrap --variant=minbase --include=ca-certificates,sudo "$suite" "$work/base" "$mirror" >"$work/debootstrap.log" 2>&1 ||
    { tail -n 20 "$work/debootstrap.log" >&2 && return 1; }
  tar -C "$work/base" -cf "$tar.new" .
  mv "$tar.new" "$tar"
  rm -rf "$work/base"
}

# A root folder of its own for one run, with the project as it is committed.
make_root() {
  local root=$1 node npm
  mkdir -p "$root"
  tar -C "$root" -xf "$cache/base-$suite.tar"
  printf 'deb %s %s main\ndeb %s %s-updates main\ndeb %s %s-security main\n' \
    "$mirror" "$suite" "$mirror" "$suite" "$security" "$suite" >"$root/etc/apt/sources.list"
  node=$(readlink -f "$(command -v node)")
  npm=$(dirname "$(dirname "$(readlink -f "$(command -v npm)")")")
  install -D "$node" "$root/usr/local/bin/node"
  mkdir -p "$root/usr/local/lib/node_modules"
  cp -a "$npm" "$root/usr/local/lib/node_modules/npm"
  ln -s ../lib/node_modules/npm/bin/npm-cli.js "$root/usr/local/bin/npm"
  # How this machine reaches the outside: names, certificates, npm's own settings.
  cp -L /etc/resolv.conf /etc/hosts "$root/etc/"
  cp -L /etc/ssl/certs/ca-certificates.crt "$root/etc/ssl/certs/ca-certificates.crt"
  for file in "$(npm config get globalconfig)" "$(npm config get userconfig)"; do
    [ -f "$file" ] && cat "$file" >>"$root/etc/npmrc"
  done
  mkdir -p "$root/usr/local/etc" "$root/srv/keypeg" "$root/npm-cache"
  [ -f "$root/etc/npmrc" ] && cp "$root/etc/npmrc" "$root/usr/local/etc/npmrc"
  git -C "$project" archive HEAD | tar -C "$root/srv/keypeg" -xf -
  cp "$project/scripts/fresh-inside.sh" "$root/fresh-inside.sh"
}

# In mounts and process numbers of its own: whatever happens, both are gone with it.
inside() {
  local root=$1 npm=$2
  shift 2
  mkdir -p "$npm"
  unshare --mount --pid --fork --kill-child bash -c '
    set -e
    root=$1 npm=$2
    shift 2
    mount --bind /dev "$root/dev"
    mount -t tmpfs -o mode=1777 tmpfs "$root/dev/shm"
    mount -t proc proc "$root/proc"
    mount --bind "$npm" "$root/npm-cache"
    exec chroot "$root" "$@"' fresh "$root" "$npm" "$@"
}

base_system
summary=()
failed=0
for who in ${1:-root user}; do
  echo "== $who"
  make_root "$work/$who"
  if inside "$work/$who" "$cache/npm-$who" bash /fresh-inside.sh "$who"; then
    summary+=("$(cat "$work/$who/summary")")
  else
    failed=1
    summary+=("$who: FAILED after $(cat "$work/$who/summary" 2>/dev/null || echo nothing)")
  fi
  rm -rf --one-file-system "${work:?}/$who"
done
printf 'fresh: %s\n' "${summary[@]}"
exit "$failed"
