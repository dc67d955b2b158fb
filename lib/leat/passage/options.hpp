#pragma once

#include <leat/base/error.hpp>
#include <leat/coupling/coupling.hpp>
#include <leat/scheme/scheme.hpp>

#include <array>
#include <optional>
#include <string>
#include <vector>

namespace leat {

/// The accuracy that is wanted.
struct Accuracy {
    /// Wanted half-width of the band on the pressure drop, relative to
    /// max(|value|, 1 % of the developed-flow pressure drop over the same length); 1e-5 .. 0.5.
    double band = 0.002;
    /// Further numbers, by their names in Numbers, on which a band so narrow is wanted, relative to |value|.
    /// One that turns out to be absent asks for nothing.
    std::vector<std::string> band_on{};
};

/// How to compute. The defaults serve; every member is for the curious.
struct Options {
    Scheme scheme_along = Scheme::linear_upwind; ///< convection along the passage
    Scheme scheme_across = Scheme::central;      ///< convection across it
    std::optional<Coupling> coupling{};          ///< default: the fastest, see DEVELOPERS.md
    /// Cells along and across the solved part of the passage (the tail of `continues` comes on top);
    /// along a multiple of 8, across a multiple of 4, 16 x 8 .. 5120 x 1280. The solve is then on these and
    /// on their coarsenings, whatever the band comes to. Default: refined until the wanted bands are met.
    std::optional<std::array<int, 2>> cells{};
    /// Most cells of the finest grid, tail included, when `cells` is not given; 10,000 .. 100,000,000.
    int cell_budget = 400000;
    std::optional<Relaxation> relaxation{}; ///< default: chosen by the coupling
    int iterations = 20000;                 ///< most outer iterations on the finest grid, >= 1
    /// Converged when every imbalance (mass, momentum; normalised as in the README) <= tolerance; 1e-14 .. 1e-2.
    double tolerance = 1e-9;
    /// Distances from the inlet (m), increasing, within [0, length], at which stations are read; empty: a default list.
    std::vector<double> stations{};
    bool keep_fields = false; ///< fill Answer::fields (wanted for a result file)
};

/// Every fault of the three, found in one pass. `length` is the passage's, for the stations (0: unknown).
std::vector<Fault> faults_of(const Accuracy& accuracy, const Options& options, double length);

} // namespace leat
