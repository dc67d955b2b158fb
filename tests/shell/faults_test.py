"""Cases that are wrong or cannot be read: one message per fault, the documented exit code, nothing printed as result."""

import os
import time
import unittest

from program import ProgramTest, TUBE


class Faults(ProgramTest):
    def refused(self, name, code, *messages):
        for command in ("solve", "check"):
            out, err = self.run_leat(command, name, code=code)
            self.assertEqual(out, "")
            self.assertEqual(err, "".join(f"leat: {name}{message}\n" for message in messages))

    def test_all_faults_in_one_pass(self):
        text = TUBE.replace("8 mm", "8").replace("length", "lenght").replace("28 mPa.s", "nan cP")
        self.refused(
            self.write("line.case", text + "mean_velocity = 1 m/s\nflow_rate = 1 L/min\n"),
            65,
            ":1: [passage] has no 'length', which shape = tube needs; write length = 1.5 m",
            ":3: [passage] diameter = 8: has no unit; a length is needed, such as 8 mm",
            ":4: unknown key 'lenght' in [passage]; did you mean 'length'?",
            ":7: [fluid] viscosity = nan cP: nan is not a finite number; a dynamic viscosity is needed, such as 8 mPa.s",
            ":11: 'mean_velocity' was already given in line 10; keep one of the two",
            ":12: 'flow_rate' states the flow again after 'mean_velocity' in line 10; keep exactly one",
        )

    def test_values_that_no_passage_has(self):
        for value, message in (
            ("0 mm", "must be finite and > 0 m"),
            ("-8 mm", "must be finite and > 0 m"),
            ("8 bar", "'bar' is a pressure (m-1.kg.s-2); a length is needed, such as mm"),
            ("1e400 mm", "1e400 is beyond the range of numbers (1e-307 to 1e308); a length is needed, such as 8 mm"),
        ):
            name = self.write("line.case", TUBE.replace("8 mm", value))
            self.refused(name, 65, f":3: [passage] diameter = {value}: {message}")

    def test_empty_file(self):
        self.refused(self.write("empty.case", ""), 65,
                     ": is empty; a case has the sections [passage], [fluid] and [inlet]")

    def test_binary_file(self):
        self.refused(self.write("image.case", b"\x89PNG\r\n\x1a\n\x00\x00"), 65,
                     ":1: holds a byte that is not UTF-8; this is no text file")
        self.refused(self.write("nul.case", TUBE.encode() + b"\x00"), 65,
                     ":11: holds a control byte; this is no text file")

    def test_ten_megabytes_of_one_line_are_refused_at_once(self):
        name = self.write("long.case", "x" * 10_000_000)
        start = time.monotonic()
        self.refused(name, 65, ":1: line is longer than 4096 bytes")
        self.assertLess(time.monotonic() - start, 10)

    def test_folder_and_missing_file(self):
        (self.folder / "folder.case").mkdir()
        self.refused("folder.case", 66, ": is a folder, not a file")
        self.refused("missing.case", 66, ": No such file or directory")

    def test_table_that_is_missing_or_wrong(self):
        name = self.write("line.case", TUBE.replace("flat", "table\ntable = pitot.csv"))
        self.refused(name, 66, ":10: [inlet] table = pitot.csv: cannot be read: No such file or directory")
        self.write("pitot.csv", "radius [mm], velocity [m/s]\n0, 1\n4; 0\n")
        for command in ("solve", "check"):
            _, err = self.run_leat(command, name, code=65)
            self.assertIn("leat: pitot.csv:3: '4; 0' does not have two columns; write position, velocity\n", err)

    def test_installation_without_units_is_an_internal_fault(self):
        name = self.write("line.case", TUBE)
        _, err = self.run_leat("check", name, code=70, env={**os.environ, "UDUNITS2_XML_PATH": "/nowhere"})
        self.assertIn("data base of units", err)
        self.assertEqual(err.count("\n"), 1)

    def test_file_is_named_as_the_user_gave_it(self):
        self.write("a.case", "")
        _, err = self.run_leat("check", "./a.case", code=65)
        self.assertTrue(err.startswith("leat: ./a.case: is empty"), err)


if __name__ == "__main__":
    unittest.main()
