#!/bin/sh
# Installs what is missing, builds everything under build/, and runs all tests but the long ones. May be repeated.
set -eu
cd "$(dirname "$0")/.."
. cmake/packages.sh

leat_require_packages $leat_build_packages $leat_test_packages
leat_configure -DLEAT_BUILD_APPS=ON -DLEAT_BUILD_TESTS=ON -DLEAT_BUILD_BENCHMARKS=ON
echo "== Building"
cmake --build build --parallel "$leat_processors"
echo "== Testing; the long tests: ctest --test-dir build -L long"
ctest --test-dir build --output-on-failure --no-tests=error -LE long --parallel "$leat_processors"
