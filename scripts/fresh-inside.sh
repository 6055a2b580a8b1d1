#!/usr/bin/env bash
# The part of fresh.sh that runs inside the chroot, as its first process: both README commands by one person.
set -uo pipefail

who=$1
cd /srv/keypeg || exit 1
export npm_config_cache=/npm-cache HOME=/root PATH=/usr/local/bin:/usr/bin:/bin:/usr/sbin:/sbin
export DEBIAN_FRONTEND=noninteractive LANG=C.UTF-8
apt-mark showmanual | sort >/manual-before

if [ "$who" = user ]; then
  useradd --create-home dev
  echo 'dev ALL=(ALL) NOPASSWD:ALL' >/etc/sudoers.d/dev
  chown -R dev:dev /srv/keypeg /npm-cache
fi

# Without a shell of its own a signal to npm reaches npm itself.
as() {
  if [ "$who" = user ]; then
    exec setpriv --reuid=dev --regid=dev --init-groups env HOME=/home/dev "$@"
  fi
  exec "$@"
}

fail() {
  echo "== $*" >&2
  exit 1
}

# What runs beside this shell, a line each. A zombie has no command line and is none.
others() {
  local pid line
  for pid in /proc/[0-9]*; do
    line=$(tr '\0' ' ' 2>/dev/null <"$pid/cmdline" | cut -c1-160)
    [ -n "$line" ] && echo "$line"
  done
}

# Of these, what the two commands start. The list is read first, so that no search finds itself.
ours() {
  local list
  list=$(others)
  grep -E '^([^ ]*/)?(mariadbd|node|chromium|npm)( |$)' <<<"$list"
}

pid_of() {
  local pid
  for pid in /proc/[0-9]*; do
    tr '\0' ' ' <"$pid/cmdline" 2>/dev/null | grep -q "^$1" && echo "${pid#/proc/}" && return
  done
}

nothing_left() {
  local left
  left=$(ours)
  [ -z "$left" ] || fail "left running after $1: $left"
}

# Waits for a line of npm start that names its address; prints the port.
port_of() {
  local log=$1 pid=$2 port
  for _ in $(seq 1 900); do
    port=$(sed -n 's#.*Keypeg  *http://127.0.0.1:\([0-9]*\)/.*#\1#p' "$log")
    [ -n "$port" ] && echo "$port" && return 0
    kill -0 "$pid" 2>/dev/null || return 1
    sleep 1
  done
  return 1
}

starts() {
  local log=$1
  (as setsid npm start) >"$log" 2>&1 &
  npm=$!
  port=$(port_of "$log" "$npm") || { cat "$log"; fail "npm start did not start"; }
  node -e 'fetch(process.argv[1]).then((r) => process.exit(r.ok ? 0 : 1), () => process.exit(1))' \
    "http://127.0.0.1:$port/healthz" || fail "/healthz does not answer"
}

# Sends a signal to a process, or to the group of a negative number, and waits for it.
ends() {
  kill "-$1" -- "$2" 2>/dev/null
  wait "${2#-}" 2>/dev/null
  sleep 1
}

# The check itself must be able to fail.
sleep 60 &
sleeper=$!
seen=$(others)
grep -q '^sleep 60' <<<"$seen" || fail "running processes are not seen"
kill "$sleeper"

checks=0
passed() {
  checks=$((checks + 1))
  echo "   ok: $1"
}

if [ "$who" = user ]; then
  mv /usr/bin/sudo /usr/bin/sudo.away
  if (as npm start) >/tmp/no-sudo.log 2>&1; then fail "npm start passed without sudo"; fi
  grep -q 'apt-get .*install mariadb-server-core' /tmp/no-sudo.log || { cat /tmp/no-sudo.log; fail "no line to type"; }
  mv /usr/bin/sudo.away /usr/bin/sudo
  passed "without sudo, the line to type is said"
fi

SECONDS=0
starts /tmp/start.log
start_s=$SECONDS
passed "npm start answers, $start_s s"
ends TERM "$npm"
nothing_left "SIGTERM to npm start"
passed "SIGTERM leaves nothing"

SECONDS=0
starts /tmp/again.log
passed "npm start again, $SECONDS s"
# What Ctrl-C does: the signal goes to the whole group in the foreground.
ends INT "-$npm"
nothing_left "Ctrl-C"
passed "Ctrl-C leaves nothing"

starts /tmp/parent.log
ends KILL "$npm"
for _ in $(seq 1 20); do
  [ -z "$(ours)" ] && break
  sleep 1
done
nothing_left "npm was killed over npm start"
passed "a lost parent ends it all"

starts /tmp/kill.log
kill -KILL "$(pid_of 'node scripts/start.mjs')" "$npm"
wait "$npm" 2>/dev/null
sleep 2
[ -n "$(ours)" ] || fail "SIGKILL was to leave children, so that the next run has something to clear"
starts /tmp/after-kill.log
databases=$(ours | grep '^/usr/sbin/mariadbd ')
[ "$(wc -l <<<"$databases")" -eq 1 ] || fail "not one database after the run that follows a SIGKILL: $databases"
ends TERM "$npm"
nothing_left "SIGKILL and the next run"
passed "the run after a SIGKILL clears what it left"

SECONDS=0
starts /tmp/both.log
(as npm test) >/tmp/test.log 2>&1
code=$?
test_s=$SECONDS
tail -n 3 /tmp/test.log
[ "$code" -eq 0 ] || { grep -E '✘|×|FAIL|Error' /tmp/test.log | head -n 40; fail "npm test failed beside npm start"; }
sum=$(grep -E '^[0-9]+ passed, [0-9]+ failed$' /tmp/test.log | tail -n 1)
passed "npm test beside npm start, $test_s s: $sum"
ends TERM "$npm"
nothing_left "npm test"
passed "npm test leaves nothing"

# Only what scripts/lib/packages.mjs names was installed by hand; every other program came with Debian.
named=$(sed -n '/PACKAGE_OF/,/};/s/.*: "\([a-z0-9+.-]*\)".*/\1/p' scripts/lib/packages.mjs | sort -u)
new=$(apt-mark showmanual | sort | comm -13 /manual-before -)
for package in $new; do
  grep -qx "$package" <<<"$named" || fail "$package was installed and is not in the list"
done
for program in /usr/bin/* /usr/sbin/*; do
  [ -f "$program" ] && ! [ -L "$program" ] || continue
  dpkg -S "$program" >/dev/null 2>&1 || dpkg -S "${program#/usr}" >/dev/null 2>&1 ||
    fail "$program belongs to no package"
done
passed "every program belongs to a package of the list or of the base system"

echo "$who: npm start ${start_s} s, npm test beside it ${test_s} s ($sum), $checks checks passed" >/summary
