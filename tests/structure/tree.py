"""Checks the tree given as argument against every rule; prints each offence and fails when there is one."""

import sys
from pathlib import Path

import habits
import layers

RULES = layers.RULES + habits.RULES


def offences(root):
    """(rule, text) of every offence."""
    return [(rule, f"{path.relative_to(root)}:{line}: {text}") for rule in RULES for path, line, text in rule(root)]


if __name__ == "__main__":
    found = offences(Path(sys.argv[1]).resolve())
    for _, text in found:
        print(text)
    print(f"{len(RULES)} rules, {len(found)} offences")
    sys.exit(1 if found else 0)
