#pragma once

#include <leat/mesh/duct.hpp>
#include <leat/mesh/grid.hpp>
#include <leat/passage/options.hpp>
#include <leat/passage/passage.hpp>

#include <vector>

namespace leat::passage {

/// The grid of a passage in units of the hydraulic diameter. Across: radius of a tube or annulus, distance from the
/// lower wall up to the middle of a channel.
struct DuctGrid {
    std::vector<double> along;  ///< faces from the inlet, tail included
    std::vector<double> across; ///< faces
    int end = 0;                ///< along[end] is the end of the passage
    bool cylindrical = false;

    mesh::Grid<2> grid() const;
    /// True where every second face can be left out in both directions, the end staying a face.
    bool can_coarsen() const noexcept;
    /// The grid whose cells are unions of two by two cells of this one; can_coarsen() must hold.
    DuctGrid coarsened() const;
};

/// Cells along (tail excluded) and across, and their gradings, for a valid passage.
DuctGrid choose_grid(const Passage& passage, const Derived& derived, const Accuracy& accuracy, const Options& options);

} // namespace leat::passage
