"""Runs the program under test; what every script here shares."""

import os
import pathlib
import subprocess
import tempfile
import unittest

PROGRAM = os.environ["LEAT_PROGRAM"]
VERSION = os.environ["LEAT_VERSION"]
CASES = pathlib.Path(__file__).resolve().parents[2] / "cases"

TUBE = """[passage]
shape = tube
diameter = 8 mm
length = 0.2 m
[fluid]
density = 865 kg/m^3
viscosity = 28 mPa.s
[inlet]
profile = flat
mean_velocity = 0.45 m/s
"""
SMALL = "[numerics]\ncells = 32 x 16\n"
CHANNEL = TUBE.replace("tube", "channel").replace("diameter", "gap")
ANNULUS = TUBE.replace("tube", "annulus").replace("diameter = 8 mm", "inner_diameter = 6 mm\nouter_diameter = 12 mm")


class ProgramTest(unittest.TestCase):
    """One scratch folder per test, which is also the current folder of the program."""

    def setUp(self):
        scratch = tempfile.TemporaryDirectory(prefix="leat-shell-")
        self.addCleanup(scratch.cleanup)
        self.folder = pathlib.Path(scratch.name)

    def write(self, name, content):
        path = self.folder / name
        path.write_bytes(content if isinstance(content, bytes) else content.encode())
        return name

    def run_leat(self, *arguments, code, timeout=120, **more):
        """Runs it to its end, checks the exit code, and gives (stdout, stderr)."""
        more.setdefault("stdout", subprocess.PIPE)
        done = subprocess.run([PROGRAM, *arguments], cwd=self.folder, stderr=subprocess.PIPE, timeout=timeout, **more)
        out = (done.stdout or b"").decode()
        err = done.stderr.decode()
        self.assertEqual(done.returncode, code, f"{arguments}\nstdout: {out[:2000]}\nstderr: {err[:2000]}")
        return out, err

    def files(self):
        return sorted(str(path.relative_to(self.folder)) for path in self.folder.rglob("*"))
