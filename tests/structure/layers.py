"""A room may include only itself and the rooms above it: who knows of whom."""

import re

from source import CODE_SUFFIXES, code_of, files_below, includes_of

# Ground floor first.
ROOMS = ["base", "mesh", "field", "linear", "scheme", "balance", "coupling", "monitor", "cascade", "passage", "record"]


def room_order(root):
    library = root / "lib" / "leat"
    for path in files_below(library, CODE_SUFFIXES):
        parts = path.relative_to(library).parts
        if parts == ("leat.hpp",):
            continue
        if len(parts) < 2 or parts[0] not in ROOMS:
            yield path, 1, "lies in no known room"
            continue
        for number, included in includes_of(path):
            match = re.match(r"leat/([^/]+)", included)
            if not match:
                continue
            if match[1] not in ROOMS:
                yield path, number, f"includes {included}, which is no room"
            elif ROOMS.index(match[1]) > ROOMS.index(parts[0]):
                yield path, number, f"room {parts[0]} includes {included} of a room below it"


def full_include_paths(root):
    # A bare name would escape the rule above.
    for path in files_below(root / "lib", CODE_SUFFIXES):
        for number, included in includes_of(path):
            if (path.parent / included).exists() and not included.startswith("leat/"):
                yield path, number, f"includes {included}; spell it <leat/ROOM/...>"
            if re.match(r"(\.\./)*(apps|tests|benchmarks|support|reference|catch2?)\b", included):
                yield path, number, f"the library includes {included}"


def hdf5_in_record_only(root):
    for folder in ("lib", "apps"):
        for path in files_below(root / folder, CODE_SUFFIXES):
            inside = path.is_relative_to(root / "lib" / "leat" / "record")
            for number, included in includes_of(path):
                if re.match(r"(hdf5|H5\w*)(_hl)?\.h", included) and not inside:
                    yield path, number, f"includes {included} outside the room record"


def no_eigen_in_headers(root):
    for path in files_below(root / "lib", {".hpp"}):
        for number, included in includes_of(path):
            if included.startswith(("Eigen/", "unsupported/Eigen")):
                yield path, number, f"a header includes {included}: no Eigen object crosses the boundary"


def namespace_is_room(root):
    library = root / "lib" / "leat"
    for path in files_below(library, CODE_SUFFIXES):
        room = path.relative_to(library).parts[0]
        if room not in ROOMS:
            continue
        allowed = {"leat", f"leat::{room}"}
        named = re.findall(r"\bnamespace\s+(leat[\w:]*)\s*\{", code_of(path))
        for name in named:
            if name not in allowed and not name.startswith(f"leat::{room}::"):
                yield path, 1, f"declares namespace {name} in room {room}"
        if not named:
            yield path, 1, f"declares neither namespace leat nor leat::{room}"


RULES = [room_order, full_include_paths, hdf5_in_record_only, no_eigen_in_headers, namespace_is_room]
