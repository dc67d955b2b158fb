"""Reads the files of the tree for the rules."""

import re
from pathlib import Path

CODE_SUFFIXES = {".cpp", ".hpp"}
TEXT_SUFFIXES = CODE_SUFFIXES | {".txt", ".cmake", ".in", ".sh", ".py", ".md", ".case"}

# Comments and literals, so that a rule on code does not stumble over a word in them. An apostrophe between digits
# separates them and opens nothing.
NOT_CODE = re.compile(
    r'(?P<keep>^[ \t]*#[ \t]*include[^\n]*)'
    r'|R"(?P<mark>[^(\s]*)\(.*?\)(?P=mark)"'
    r'|//[^\n]*|/\*.*?\*/|"(?:\\.|[^"\\\n])*"|(?<![0-9A-Fa-f])\'(?:\\.|[^\'\\\n])+\'',
    re.DOTALL | re.MULTILINE)


def read(path):
    return path.read_text(encoding="utf-8")


def code_of(path):
    """The text with comments and literals blanked, line numbers kept."""
    def blank(match):
        return match["keep"] or "".join(c for c in match[0] if c == "\n") or " "
    return NOT_CODE.sub(blank, read(path))


def includes_of(path):
    """(line number, included path) of every include."""
    found = []
    for number, line in enumerate(code_of(path).splitlines(), 1):
        match = re.match(r'\s*#\s*include\s*[<"]([^>"]+)[>"]', line)
        if match:
            found.append((number, match[1]))
    return found


def files_below(folder, suffixes):
    """Every file with one of the suffixes, in a fixed order; builds and hidden folders are left out."""
    return [path for path in sorted(Path(folder).rglob("*"))
            if path.suffix in suffixes and path.is_file()
            and not any(part.startswith((".", "build", "__")) for part in path.relative_to(folder).parts)]


def lines_matching(text, pattern):
    """(line number, what matched) of every match."""
    return [(text.count("\n", 0, match.start()) + 1, match[0].strip()) for match in re.finditer(pattern, text)]
