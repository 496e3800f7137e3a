#!/usr/bin/env bash
# packages.sh postgresql chromium …: installs those of the named Debian packages that are missing.
source "$(dirname "${BASH_SOURCE[0]}")/common.sh"
log="$DATA_DIR/log/packages.log"

missing=()
for wanted in "$@"; do
  case "$wanted" in
    postgresql) compgen -G '/usr/lib/postgresql/*/bin/initdb' >/dev/null || missing+=(postgresql-15) ;;
    chromium) [ -x /usr/bin/chromium ] || missing+=(chromium fonts-liberation) ;;
  esac
done
[ "${#missing[@]}" -gt 0 ] || exit 0

# Debian makes and starts a cluster on 5432 as it installs PostgreSQL, unless it is told before.
line="apt-get update && apt-get install --yes --no-install-recommends ${missing[*]}"
case "$line" in
  *postgresql*)
    settings=/etc/postgresql-common/createcluster.d
    line="mkdir -p $settings && echo create_main_cluster = false > $settings/leadline.conf && $line"
    ;;
esac

if [ "$(id -u)" = 0 ]; then
  as_root=()
elif sudo -n true 2>/dev/null; then
  as_root=(sudo -n)
else
  printf '%s stopped at Debian packages: %s must be installed by an administrator, with\n  %s\n' \
    "$LEADLINE_GOAL" "${missing[*]}" "sudo sh -c \"$line\"" >&2
  exit 1
fi

command -v apt-get >/dev/null || fail 'Debian packages' "${missing[*]} is missing and this is not a Debian system"
echo "Installing Debian packages: ${missing[*]}"
"${as_root[@]}" env DEBIAN_FRONTEND=noninteractive sh -c "$line" >"$log" 2>&1 </dev/null ||
  fail 'Debian packages' "$(cause_in "$log")" "$log"
