#!/bin/sh
# Installs what is missing, builds an optimised leat under build/, and solves a first case. May be repeated.
set -eu
cd "$(dirname "$0")/.."
. cmake/packages.sh

leat_require_packages $leat_build_packages
if [ -f build/CMakeCache.txt ]; then
    leat_configure -DLEAT_BUILD_APPS=ON # leaves the choice of tests as it was
else
    leat_configure -DLEAT_BUILD_APPS=ON -DLEAT_BUILD_TESTS=OFF -DLEAT_BUILD_BENCHMARKS=OFF
fi
echo "== Building the program"
cmake --build build --parallel "$leat_processors" --target leat_program
echo "== build/apps/leat/leat solve cases/gearbox-return.case"
build/apps/leat/leat solve cases/gearbox-return.case
