"""Help, version, and command lines that cannot be understood."""

import unittest

from program import ProgramTest, VERSION


class Help(ProgramTest):
    def test_bare_call_shows_a_short_help_with_an_example(self):
        out, err = self.run_leat(code=0)
        self.assertIn("leat solve oil.case", out)
        self.assertIn("[passage]", out)
        self.assertEqual(err, "")

    def test_the_example_of_the_help_is_a_valid_case(self):
        out, _ = self.run_leat(code=0)
        start = out.index("  [passage]")
        self.write("oil.case", out[start:out.index("\nis solved by")])
        self.run_leat("check", "oil.case", code=0)

    def test_version(self):
        out, _ = self.run_leat("--version", code=0)
        self.assertEqual(out, f"leat {VERSION}\n")

    def test_long_help_lists_every_exit_code(self):
        out, _ = self.run_leat("--help", code=0)
        for code in (0, 1, 2, 64, 65, 66, 70, 73, 74, 130):
            self.assertRegex(out, rf"(?m)(^|\s){code} \w")

    def test_help_of_each_command_lists_its_options(self):
        out, _ = self.run_leat("solve", "--help", code=0)
        for option in ("--json", "--output DIR", "--force", "--quiet"):
            self.assertIn(option, out)
        out, _ = self.run_leat("check", "--help", code=0)
        self.assertIn("--json", out)
        self.assertNotIn("--output", out)

    def test_usage_errors(self):
        for arguments, message in (
            (["sovle"], "leat: unknown command 'sovle'; did you mean 'solve'?\n"),
            (["solve"], "leat: no case given; write leat solve CASE\n"),
            (["solve", "a", "--jsn"], "leat: unknown option '--jsn' of leat solve; did you mean '--json'?\n"),
            (["solve", "a", "--force"], "leat: --force overwrites result files; it needs --output DIR\n"),
        ):
            out, err = self.run_leat(*arguments, code=64)
            self.assertEqual(err, message)
            self.assertEqual(out, "")


if __name__ == "__main__":
    unittest.main()
