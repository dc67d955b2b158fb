# Sourced by try.sh and test.sh: brings in what the machine lacks, and configures build/.

leat_build_packages="g++ cmake make libhdf5-dev libboost-program-options-dev libudunits2-dev \
nlohmann-json3-dev"
leat_test_packages="catch2 libeigen3-dev hdf5-tools pkg-config python3 python3-h5py"

# A package counts as there when it is installed, or, for a tool, when its command is found.
leat_has_package()
{
    dpkg-query -W -f='${Status}' "$1" 2>/dev/null | grep -q 'install ok installed' && return 0
    case $1 in
    g++ | cmake | make | pkg-config) command -v "$1" >/dev/null 2>&1 ;;
    *) return 1 ;;
    esac
}

# leat_require_packages PACKAGE...: installs those that are missing, or says how and stops.
leat_require_packages()
{
    if ! command -v dpkg-query >/dev/null 2>&1 || ! command -v apt-get >/dev/null 2>&1; then
        echo "== This system has no apt-get. Needed, by their Debian names: $*"
        command -v cmake >/dev/null 2>&1 || { echo "leat: cmake is missing" >&2; exit 1; }
        return 0
    fi
    leat_missing=
    for leat_package in "$@"; do
        leat_has_package "$leat_package" || leat_missing="$leat_missing $leat_package"
    done
    [ -n "$leat_missing" ] || return 0
    if [ "$(id -u)" -ne 0 ]; then
        echo "leat: packages are missing; install them by this command, then start this script again:" >&2
        echo "    sudo apt-get update && sudo apt-get install --yes --no-install-recommends$leat_missing" >&2
        exit 1
    fi
    echo "== Installing$leat_missing"
    DEBIAN_FRONTEND=noninteractive
    export DEBIAN_FRONTEND
    # A list that cannot be renewed may still serve, so only the installation decides.
    apt-get update || echo "leat: the package lists could not be renewed; going on with those at hand" >&2
    # shellcheck disable=SC2086 # one word per package
    apt-get install --yes --no-install-recommends $leat_missing || {
        echo "leat: installing$leat_missing failed" >&2
        exit 1
    }
}

# leat_configure OPTION...: configures build/ as an optimised build for this machine, in a way that may be repeated.
leat_configure()
{
    leat_cache=build/CMakeCache.txt
    # A folder configured for another place (a copied tree) cannot be used again.
    if [ -f "$leat_cache" ] && ! grep -qxF "CMAKE_HOME_DIRECTORY:INTERNAL=$(pwd -P)" "$leat_cache"; then
        echo "== build/ belongs to another source folder; configuring it anew"
        rm -rf "$leat_cache" build/CMakeFiles
    fi
    if [ ! -f "$leat_cache" ] && [ -z "${CMAKE_GENERATOR:-}" ] && command -v ninja >/dev/null 2>&1; then
        set -- -G Ninja "$@"
    fi
    echo "== Configuring"
    cmake -S . -B build -DCMAKE_BUILD_TYPE=Release -DLEAT_NATIVE=ON "$@" || {
        echo "leat: configuring failed; needed, by their Debian names: $leat_build_packages $leat_test_packages" >&2
        exit 1
    }
}

leat_processors=$(nproc 2>/dev/null || echo 2)
