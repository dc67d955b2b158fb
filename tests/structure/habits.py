"""Habits of the code: what the library never does, how long files are, where they lie, what words they hold."""

import re

from source import CODE_SUFFIXES, TEXT_SUFFIXES, code_of, files_below, lines_matching, read

MOST_LINES = 500
TOP_LEVEL = {"CMakeLists.txt", "README.md", "DEVELOPERS.md", "lib", "apps", "tests", "benchmarks", "cases", "cmake"}


def never_in_library(pattern, why):
    def rule(root):
        for path in files_below(root / "lib", CODE_SUFFIXES):
            for number, found in lines_matching(code_of(path), pattern):
                yield path, number, f"{found}: {why}"
    return rule


no_printing = never_in_library(
    r"\bstd::(cout|cerr|clog|wcout|wcerr)\b|\b\w*printf\s*\(|\b(puts|fputs|putchar|perror)\s*\(|#\s*include\s*<iostream>",
    "the library does not print, nor format by printf")
no_exit = never_in_library(
    r"\b(exit|_exit|quick_exit|abort|terminate|assert)\s*\(|\b(std::)?(signal|sigaction)\s*\(",
    "the library ends no program and handles no signal")
no_locale = never_in_library(
    r"\b(setlocale|ato[fil]|strto[dfl]|strtold|sto[dfil]|stold|sscanf)\s*\(|\b\w*stringstream\b",
    "text and numbers are converted by from_chars and to_chars, which know no locale")


def file_length(root):
    for path in files_below(root, TEXT_SUFFIXES):
        lines = read(path).count("\n")
        if lines > MOST_LINES:
            yield path, lines, f"has {lines} lines, more than {MOST_LINES}"


def top_level(root):
    for path in sorted(root.iterdir()):
        if path.name not in TOP_LEVEL and not path.name.startswith((".", "build")):
            yield path, 1, "has no place at the top level"


def telling_names(root):
    for path in files_below(root, TEXT_SUFFIXES):
        for part in path.relative_to(root).parts:
            if re.fullmatch(r"(util|utils|utility|utilities|helper|helpers|common|misc)(\.\w+)?", part):
                yield path, 1, f"the name {part} does not tell what is inside"


def guarded_headers(root):
    for path in files_below(root, {".hpp"}):
        if not re.match(r"#pragma once\n", read(path)):
            yield path, 1, "does not begin with #pragma once"


def finished_text(root):
    # Spelled so that this file itself holds none of the words.
    unfinished = r"\b(TO[D]O|FIX[M]E|XX[X])\b|\bissue [#]?\d|\bdesign[.]md\b|\bstyle[.]md\b|(?<![\w.])/(work|home|root)/"
    for path in files_below(root, TEXT_SUFFIXES):
        for number, found in lines_matching(read(path), unfinished):
            yield path, number, f"'{found}' has no place in the project's files"


def tests_are_built(root):
    # Only these folders are looked through for test sources.
    tests = root / "tests"
    for path in files_below(tests, {".cpp"}):
        folders = path.relative_to(tests).parts[:-1]
        built = len(folders) == 1 or folders[1:] == ("allocation",) or folders[:1] == ("embedding",)
        if not built:
            yield path, 1, "lies where no test program takes it up"


RULES = [no_printing, no_exit, no_locale, file_length, top_level, telling_names, guarded_headers, finished_text,
         tests_are_built]
