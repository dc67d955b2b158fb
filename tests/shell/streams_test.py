"""Standard streams that fail, terminals, and interrupts."""

import os
import pty
import re
import signal
import subprocess
import time
import unittest

from program import PROGRAM, ProgramTest, SMALL, TUBE

# More work than these tests wait for.
ENDLESS = "[numerics]\ncells = 1280 x 320\ncoupling = simple\niterations = 1000000\ntolerance = 1e-14\n"


class Streams(ProgramTest):
    def test_full_device(self):
        self.write("line.case", TUBE + SMALL)
        with open("/dev/full", "wb") as full:
            for arguments in (["--version"], [], ["--help"], ["check", "line.case"], ["solve", "line.case", "--json"]):
                _, err = self.run_leat(*arguments, code=74, stdout=full)
                self.assertEqual(
                    err, "leat: cannot write the result to the standard output: No space left on device\n")

    def test_closed_output_harms_no_file(self):
        self.write("line.case", TUBE + SMALL)
        _, err = self.run_leat("solve", "line.case", "--output", "out", code=74, stdout=None,
                               preexec_fn=lambda: os.close(1))
        self.assertIn("cannot write the result", err)
        self.assertEqual((self.folder / "line.case").read_text(), TUBE + SMALL)
        self.assertNotIn(b"pressure drop", (self.folder / "out" / "line.h5").read_bytes()[:4096])

    def test_closed_pipe(self):
        reader, writer = os.pipe()
        os.close(reader)
        _, err = self.run_leat("--help", code=74, stdout=writer)
        os.close(writer)
        self.assertIn("Broken pipe", err)

    def on_terminal(self, until, **environment):
        """Starts an endless solve whose messages go to a terminal; gives process, terminal and what was shown."""
        self.write("endless.case", TUBE + ENDLESS)
        terminal, stderr = pty.openpty()
        self.addCleanup(os.close, terminal)
        process = subprocess.Popen([PROGRAM, "solve", "endless.case"], cwd=self.folder, stdout=subprocess.PIPE,
                                   stderr=stderr, env={**os.environ, "NO_COLOR": "", "TERM": "xterm", **environment})
        os.close(stderr)
        self.addCleanup(process.stdout.close)
        self.addCleanup(process.kill)
        return process, terminal, self.shown(terminal, until)

    def shown(self, terminal, until):
        text = b""
        end = time.monotonic() + 60
        while until not in text and time.monotonic() < end:
            text += os.read(terminal, 4096)
        self.assertIn(until, text)
        return text

    def test_interrupt_keeps_the_numbers(self):
        process, terminal, text = self.on_terminal(b"iteration")
        self.assertRegex(text, rb"\r\x1b\[Kgrid \d+ of \d+, iteration \d+: mass \S+, momentum \S+")
        process.send_signal(signal.SIGINT)
        self.shown(terminal, b"leat: interrupted")
        out = process.communicate(timeout=60)[0].decode()
        self.assertEqual(process.returncode, 130)
        self.assertIn("THESE NUMBERS ARE NOT USABLE", out)
        self.assertRegex(out, r"(?m)^  pressure drop +! ")

    def test_second_interrupt_stops_at_once(self):
        process, terminal, _ = self.on_terminal(b"iteration")
        process.send_signal(signal.SIGINT)
        process.send_signal(signal.SIGINT)
        self.assertEqual(process.wait(timeout=10), 130)

    def test_a_dumb_terminal_gets_plain_lines(self):
        for environment in ({"TERM": "dumb"}, {"NO_COLOR": "1"}):
            process, _, text = self.on_terminal(b"iteration", **environment)
            process.kill()
            process.wait()
            self.assertNotIn(b"\x1b", text)
            self.assertTrue(re.match(rb"leat: grid \d+ of \d+, iteration", text), text)


if __name__ == "__main__":
    unittest.main()
