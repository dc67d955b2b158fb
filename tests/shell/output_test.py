"""Result files: where they go, what is never overwritten, and what happens when they cannot be written."""

import os
import resource
import signal
import subprocess
import unittest

from program import ProgramTest, SMALL, TUBE


def no_file_beyond_four_kibibytes():
    signal.signal(signal.SIGXFSZ, signal.SIG_IGN)
    resource.setrlimit(resource.RLIMIT_FSIZE, (4096, 4096))


class Output(ProgramTest):
    def setUp(self):
        super().setUp()
        self.write("line.case", TUBE + SMALL)

    def test_both_files_are_written_and_named(self):
        out, _ = self.run_leat("solve", "line.case", "--output", "new/out", code=0)
        self.assertIn("Written: new/out/line.h5\n", out)
        self.assertEqual(self.files(), ["line.case", "new", "new/out", "new/out/line.h5", "new/out/line.xdmf"])

    def test_existing_files_are_kept_unless_forced(self):
        for existing in ("line.h5", "line.xdmf"):
            self.write(existing, "mine")
            out, err = self.run_leat("solve", "line.case", "--output", ".", code=73)
            self.assertEqual(out, "")
            self.assertRegex(err, rf"\Aleat: .*{existing}: .*--force overwrites\n\Z")
            self.assertEqual((self.folder / existing).read_text(), "mine")
            self.assertEqual(self.files(), sorted(["line.case", existing]))
            (self.folder / existing).unlink()
        self.write("line.h5", "mine")
        self.run_leat("solve", "line.case", "--output", ".", "--force", code=0)
        self.assertIn(b"HDF", (self.folder / "line.h5").read_bytes())

    def test_place_that_cannot_be_made(self):
        for place, named in (("line.case/out", "line.case"), ("/proc/leat", "/proc")):
            out, err = self.run_leat("solve", "line.case", "--output", place, code=73)
            self.assertEqual(out, "")
            self.assertTrue(err.startswith(f"leat: {named}"), err)
        self.assertEqual(self.files(), ["line.case"])

    def test_a_wrong_case_writes_nothing(self):
        self.write("bad.case", TUBE.replace("8 mm", "0 mm"))
        self.run_leat("solve", "bad.case", "--output", "out", code=65)
        self.assertEqual(self.files(), ["bad.case", "line.case"])

    def check_failed_write(self, place, **more):
        (self.folder / place / "line.h5").write_text("mine")
        out, err = self.run_leat("solve", "line.case", "--output", place, "--force", code=74, **more)
        self.assertIn("pressure drop", out)  # the work is not lost
        self.assertEqual(err.count("\n"), 1)
        self.assertEqual((self.folder / place / "line.h5").read_text(), "mine")
        self.assertEqual(os.listdir(self.folder / place), ["line.h5"])

    def test_file_size_limit(self):
        (self.folder / "out").mkdir()
        self.check_failed_write("out", preexec_fn=no_file_beyond_four_kibibytes)

    def test_full_disk(self):
        (self.folder / "small").mkdir()
        mount = ["mount", "-t", "tmpfs", "-o", "size=16k", "tmpfs", str(self.folder / "small")]
        if os.geteuid() != 0 or subprocess.run(mount, stderr=subprocess.DEVNULL).returncode != 0:
            self.skipTest("a small disk can be made by root only; the size limit above stands in for it")
        try:
            self.check_failed_write("small")
        finally:
            subprocess.run(["umount", str(self.folder / "small")], check=True)


if __name__ == "__main__":
    unittest.main()
