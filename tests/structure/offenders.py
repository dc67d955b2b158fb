"""Every rule must catch its offenders, each planted alone in a clean tree, and must leave the clean tree in peace."""

import sys
import tempfile
from pathlib import Path

import habits
import layers
from tree import RULES, offences

HEADER = "#pragma once\nnamespace leat::{room} {{\n}}\n"
CLEAN = {
    "CMakeLists.txt": "project(leat)\n",
    ".ci/run": "printf exit\n",
    "build/lib/leat/other/generated.hpp": "namespace other {\n}\n",
    "lib/leat/leat.hpp": "#pragma once\n#include <leat/record/good.hpp>\n",
    "lib/leat/base/good.hpp": "#pragma once\n// never calls printf(), exit() or std::stod()\nnamespace leat {\n}\n",
    "lib/leat/mesh/good.cpp": "#include <leat/base/good.hpp>\n#include <Eigen/Core>\nnamespace leat::mesh {\n"
                              "const char* text = \"std::cout << abort()\";\nint n = 1'000; char c = '\"';\n"
                              "static_assert(true);\n}\n",
    "lib/leat/record/good.hpp": HEADER.format(room="record") + "#include <leat/passage/good.hpp>\n#include <hdf5.h>\n",
    "apps/leat/main.cpp": "#include <iostream>\nint main() { std::cout << 1; }\n",
    "tests/mesh/good.cpp": "#include \"catch.hpp\"\n",
    "tests/mesh/allocation/good.cpp": "\n",
}
IN_MESH = "lib/leat/mesh/offender.hpp"


def in_mesh(line):
    return {IN_MESH: HEADER.format(room="mesh") + line + "\n"}


OFFENDERS = [
    (layers.room_order, in_mesh("#include <leat/coupling/flow.hpp>")),
    (layers.room_order, in_mesh("#  include \"leat/field/layout.hpp\"")),
    (layers.room_order, in_mesh("#include <leat/leat.hpp>")),
    (layers.room_order, {"lib/leat/attic/offender.hpp": "#pragma once\n"}),
    (layers.full_include_paths, {**in_mesh("#include \"other.hpp\""), "lib/leat/mesh/other.hpp":
                                 HEADER.format(room="mesh")}),
    (layers.full_include_paths, in_mesh("#include \"../../../apps/leat/main.hpp\"")),
    (layers.full_include_paths, in_mesh("#include <support/allocation_counter.hpp>")),
    (layers.hdf5_in_record_only, {"apps/leat/offender.cpp": "#include <hdf5.h>\n"}),
    (layers.hdf5_in_record_only, in_mesh("#include <H5Fpublic.h>")),
    (layers.no_eigen_in_headers, in_mesh("#include <Eigen/Dense>")),
    (layers.namespace_is_room, {IN_MESH: HEADER.format(room="field")}),
    (layers.namespace_is_room, {IN_MESH: "#pragma once\nnamespace flow {\n}\n"}),
    (habits.no_printing, in_mesh("void f() { std::cerr << 1; }")),
    (habits.no_printing, in_mesh("void f() { std::snprintf(nullptr, 0, \"\"); }")),
    (habits.no_exit, in_mesh("void f() { std::abort(); }")),
    (habits.no_exit, in_mesh("void f() { assert(true); }")),
    (habits.no_locale, in_mesh("double f(const char* t) { return std::atof(t); }")),
    (habits.no_locale, in_mesh("std::ostringstream s;")),
    (habits.file_length, {"cases/offender.case": "#\n" * (habits.MOST_LINES + 1)}),
    (habits.top_level, {"notes.txt": "\n"}),
    (habits.telling_names, {"lib/leat/mesh/utils.hpp": HEADER.format(room="mesh")}),
    (habits.guarded_headers, {IN_MESH: "namespace leat::mesh {\n}\n"}),
    (habits.finished_text, in_mesh("// TO" "DO: the other half")),
    (habits.finished_text, in_mesh("// as iss" "ue 12 asks")),
    (habits.finished_text, {"cmake/offender.sh": "cd /wo" "rk/main\n"}),
    (habits.tests_are_built, {"tests/mesh/deep/offender.cpp": "\n"}),
    (habits.tests_are_built, {"tests/offender.cpp": "\n"}),
]


def offences_with(files):
    with tempfile.TemporaryDirectory() as folder:
        root = Path(folder).resolve()
        for name, text in {**CLEAN, **files}.items():
            path = root / name
            path.parent.mkdir(parents=True, exist_ok=True)
            path.write_text(text, encoding="utf-8")
        return offences(root)


def main():
    faults = [f"clean tree: {text}" for _, text in offences_with({})]
    for rule, files in OFFENDERS:
        caught_by = {found for found, _ in offences_with(files)}
        if caught_by != {rule}:
            names = sorted(found.__name__ for found in caught_by)
            faults.append(f"{rule.__name__}: offender {list(files)} was caught by {names}")
    for rule in RULES:
        if rule not in [offended for offended, _ in OFFENDERS]:
            faults.append(f"{rule.__name__} has no offender")
    print(*faults, f"{len(OFFENDERS)} offenders, {len(faults)} faults", sep="\n")
    return 1 if faults else 0


if __name__ == "__main__":
    sys.exit(main())
