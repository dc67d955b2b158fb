"""Cases that are solved: numbers, documents, exit codes."""

import json
import math
import unittest

from program import ANNULUS, CASES, CHANNEL, ProgramTest, SMALL, TUBE, VERSION

NUMBERS = (
    "reynolds_number hydraulic_diameter mean_velocity mass_flow_rate pressure_drop pressure_drop_from_rest "
    "pumping_power apparent_friction_factor apparent_friction_reynolds incremental_pressure_number development_length "
    "core_velocity_ratio peak_velocity_ratio wall_shear_outlet friction_reynolds_outlet wall_shear_mean"
).split()
STATIONS = (
    "x x_plus core_pressure mean_pressure apparent_friction_reynolds local_friction_reynolds wall_shear "
    "core_velocity_ratio peak_velocity_ratio"
).split()


def finite_only(constant):
    raise AssertionError(f"{constant} in a document")


class Result(ProgramTest):
    def document(self, *arguments, code=0):
        out, err = self.run_leat(*arguments, "--json", code=code)
        self.assertEqual(err, "")
        return json.loads(out, parse_constant=finite_only)

    def check_contract(self, document, walls):
        self.assertEqual(document["program"], "leat")
        self.assertEqual(document["version"], VERSION)
        for key in ("case", "outcome", "usable", "numbers", "imbalances", "grids", "cautions", "stations"):
            self.assertIn(key, document)
        self.assertGreaterEqual(document["numbers"].keys(), set(NUMBERS))
        for name, number in document["numbers"].items():
            self.assertGreaterEqual(number.keys(), {"value", "band", "unit", "usable"}, name)
            if number["value"] is None or number["band"] is None or not number["usable"]:
                self.assertTrue(number.get("reason"), f"{name} does not say why")
        self.assertGreaterEqual(document["imbalances"].keys(), {"mass", "momentum", "energy"})
        for grid in document["grids"]:
            self.assertEqual(len(grid["cells"]), 2)
            self.assertGreaterEqual(grid.keys(), {"iterations", "seconds"})
        stations = document["stations"]
        self.assertEqual({key for key in stations if key not in STATIONS}, set(walls))
        self.assertGreaterEqual(stations.keys(), set(STATIONS))
        for name, column in stations.items():
            self.assertEqual(len(column), len(stations["x"]), name)

    def test_document_of_each_shape(self):
        for text, walls in (
            (TUBE, []),
            (CHANNEL, ["wall_shear_lower", "wall_shear_upper"]),
            (ANNULUS, ["wall_shear_inner", "wall_shear_outer"]),
        ):
            document = self.document("solve", self.write("my.line.case", text + SMALL))
            self.check_contract(document, walls)
            self.assertEqual(document["case"], "my.line")
            self.assertEqual(document["outcome"], "converged")
            self.assertIs(document["usable"], True)
            self.assertGreater(document["numbers"]["pressure_drop"]["value"], 0)
            self.assertLessEqual(document["imbalances"]["mass"], 1e-9)

    def test_table_of_numbers(self):
        out, err = self.run_leat("solve", self.write("line.case", TUBE + SMALL), code=0)
        self.assertEqual(err, "")
        self.assertRegex(out, r"\Aline: converged in [\d.]+ s")
        self.assertRegex(out, r"(?m)^  pressure drop +[\d.]+ ± [\d.]+  Pa ")
        self.assertRegex(out, r"(?m)^ +[\d.]+  Pa +handbook: .*Shah")
        self.assertRegex(out, r"(?m)^Imbalances: mass \S+, momentum \S+$")
        self.assertNotIn("\x1b", out)

    def test_wanted_bands_are_met_by_refinement(self):
        wish = "[accuracy]\nband = 0.5 %\nband_on = development_length, core_velocity_ratio\n"
        document = self.document("solve", self.write("line.case", TUBE + wish))
        for name in ("pressure_drop", "development_length", "core_velocity_ratio"):
            number = document["numbers"][name]
            self.assertGreater(number["band"], 0)
            self.assertLessEqual(number["band"], 0.005 * number["value"], name)
        self.assertGreaterEqual(len(document["grids"]), 3)

    def test_cells_spent_before_the_wanted_band(self):
        name = self.write("line.case", TUBE + "[accuracy]\nband = 0.001 %\n[numerics]\ncell_budget = 10000\n")
        document = self.document("solve", name, code=1)
        self.assertEqual(document["outcome"], "out_of_budget")
        self.assertIs(document["usable"], True)
        drop = document["numbers"]["pressure_drop"]
        self.assertGreater(drop["band"], 1e-5 * drop["value"])
        self.assertIn("budget of 10000 cells", drop["reason"])
        along, across = document["grids"][-1]["cells"]
        self.assertLessEqual(along * across, 10000)
        out, err = self.run_leat("solve", name, code=1)
        self.assertRegex(out, r"(?m)^  pressure drop +! [\d.]+ ± [\d.]+  Pa ")
        self.assertNotIn("NOT USABLE", out)

    def test_developed_tube_is_the_formula_of_hagen_and_poiseuille(self):
        name = self.write("line.case", TUBE.replace("flat", "developed") + SMALL)
        value = self.document("solve", name)["numbers"]["pressure_drop"]["value"]
        self.assertTrue(math.isclose(value, 32 * 28e-3 * 0.45 * 0.2 / 8e-3**2, rel_tol=0.01), value)

    def test_too_few_iterations_mark_the_numbers_and_exit_1(self):
        name = self.write("line.case", TUBE + SMALL + "iterations = 3\n")
        out, _ = self.run_leat("solve", name, code=1)
        self.assertIn("THESE NUMBERS ARE NOT USABLE", out)
        self.assertRegex(out, r"(?m)^  pressure drop +! [-\d.e+]+  Pa ")
        document = self.document("solve", name, code=1)
        self.assertIs(document["usable"], False)
        self.assertEqual(document["outcome"], "out_of_budget")
        self.assertFalse(any(number["usable"] for number in document["numbers"].values()))

    def test_divergence_exits_2_with_finite_numbers(self):
        text = TUBE.replace("mean_velocity = 0.45 m/s", "reynolds_number = 1e5")
        name = self.write("line.case", text + "[numerics]\ncells = 64 x 32\ncoupling = simple\n"
                          "scheme_along = central\nrelaxation = 1 1\n")
        out, _ = self.run_leat("solve", name, code=2)
        self.assertIn("line: diverged", out)
        self.assertIn("THESE NUMBERS ARE NOT USABLE", out)
        self.assertFalse(any(number["usable"] for number in self.document("solve", name, code=2)["numbers"].values()))

    def test_check_shows_the_passage_without_solving(self):
        name = self.write("line.case", TUBE)
        out, _ = self.run_leat("check", name, code=0)
        self.assertRegex(out, r"(?m)^  reynolds number +111\.21$")
        for word in ("Regime: laminar", "Handbook estimate", "Grids", "Memory"):
            self.assertIn(word, out)
        document = self.document("check", name)
        self.assertIs(document["valid"], True)
        self.assertAlmostEqual(document["derived"]["reynolds_number"]["value"], 111.214, places=3)
        self.assertTrue(document["grids"])

    def test_cases_of_the_project_are_valid(self):
        cases = sorted(CASES.glob("*.case"))
        self.assertGreaterEqual(len(cases), 3)
        for case in cases:
            self.run_leat("check", str(case), code=0)


if __name__ == "__main__":
    unittest.main()
