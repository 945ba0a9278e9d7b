# Installs Debian packages and prepares build directories; read by src/run.sh and tests/run.sh.
# SPDX-License-Identifier: GPL-3.0-or-later

# What the build itself needs.  fonts, themes and loaders are what the window needs to look right.
build_packages='gcc libc6-dev meson ninja-build pkg-config gettext
  libglib2.0-dev libjson-glib-dev libsuitesparse-dev libcairo2-dev libpango1.0-dev libgtk-4-dev libxlsxwriter-dev
  adwaita-icon-theme librsvg2-common fonts-dejavu-core'

say () { printf '%s\n' "$@"; }
fail () { printf 'heatloom: %s\n' "$*" >&2; exit 1; }

# The packages of the list that are not there.
missing_packages () {
  there=$(dpkg-query -W -f ' ${Package}=${db:Status-Status} ' "$@" 2>/dev/null)
  for package in "$@"
  do
    case $there in
      *" $package=installed "*) ;;
      *) printf '%s ' "$package" ;;
    esac
  done
}

# Makes sure that the packages are there; asks nothing and does nothing when they are.
need_packages () {
  if ! command -v dpkg-query >/dev/null 2>&1
  then
    say "This is not a Debian system, so nothing is installed.  On Debian the packages are: $*" >&2
    return 0
  fi
  missing=$(missing_packages "$@")
  [ -n "$missing" ] || return 0
  by_hand="Install them by hand, then run this again:
  apt-get install --no-install-recommends $missing"

  as_root=
  if [ "$(id -u)" -ne 0 ]
  then
    command -v sudo >/dev/null 2>&1 \
      || fail "packages are missing, and there is neither root nor sudo to install them.
$by_hand"
    as_root='sudo'
    # Without a terminal nobody can type a password.
    [ -t 0 ] || as_root='sudo -n'
    $as_root true || fail "packages are missing, and sudo was refused.
$by_hand"
  fi
  command -v apt-get >/dev/null 2>&1 || fail "packages are missing, and there is no apt-get.
$by_hand"

  say "Installing: $missing"
  # A repository that has nothing to do with us may be out of reach; only the installation decides.
  $as_root apt-get -q -o DPkg::Lock::Timeout=300 update </dev/null \
    || say "apt-get update had errors; trying with the lists that are there." >&2
  $as_root env DEBIAN_FRONTEND=noninteractive \
    apt-get -q -y -o DPkg::Lock::Timeout=300 install --no-install-recommends $missing </dev/null \
    || fail "the packages could not be installed (is there a network, and a Debian mirror in /etc/apt?).
$by_hand"
}

# Configures DIR once with the given options, and builds the targets in $targets, all when there are none; quick when
# nothing has changed.
targets=
build_in () {
  dir=$1
  shift
  if [ ! -f "$dir/meson-private/coredata.dat" ]
  then
    meson setup "$dir" "$@" || fail "meson could not configure $dir; its message above says what is missing."
  elif ! grep -qF "\"source\": \"$PWD\"" "$dir/meson-info/meson-info.json" 2>/dev/null
  then
    # Made from sources that lay elsewhere, or never finished.
    meson setup --wipe "$dir" "$@" || fail "meson could not configure $dir; remove it and run this again."
  fi
  ninja -C "$dir" $targets || fail "the build in $dir failed; the first error above is the one to look at."
}
